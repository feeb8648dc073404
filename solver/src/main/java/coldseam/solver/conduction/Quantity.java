package coldseam.solver.conduction;

/**
 * A number and what is known about its error.
 *
 * @param value the number, SI; infinite where the stated problem has no finite answer
 * @param certificate proved bounds, or why there are none
 */
public record Quantity(double value, Certificate certificate) {
  /** Half the width of the proved interval, or the estimate where nothing is proved. */
  public double halfWidth() {
    if (certificate instanceof Certificate.Certified proved) {
      return Math.max(proved.upper() - value, value - proved.lower());
    }
    return ((Certificate.NotCertified) certificate).estimatedHalfWidth();
  }

  /** Whether bounds are proved. */
  public boolean certified() {
    return certificate instanceof Certificate.Certified;
  }
}
