package coldseam.solver.detail;

import java.util.Optional;
import java.util.OptionalDouble;

/**
 * An ambient on one side of the detail.
 *
 * @param name unique among the fills of a detail
 * @param temperatureC temperature, °C; for a floating space it is ignored and may be NaN
 * @param relativeHumidity 0 to 1, if stated
 * @param exposure inside or outside
 * @param heatLoss films for heat flow
 * @param surface films for surface temperatures
 * @param floating how the space's temperature follows from the others, if it floats
 */
public record Space(
    String name,
    double temperatureC,
    OptionalDouble relativeHumidity,
    Exposure exposure,
    FilmRule heatLoss,
    FilmRule surface,
    Optional<Floating> floating)
    implements Fill {
  /**
   * A space whose temperature is a result: the heat it receives through the detail leaves it by a
   * stated conductance.
   *
   * @param conductanceWPerMK extra conductance to another space, W/(m·K) per metre of detail; 0 for
   *     zero net flow
   * @param to the other space, empty when the conductance is 0
   */
  public record Floating(double conductanceWPerMK, String to) {
    /**
     * Checks the figure.
     *
     * @throws IllegalArgumentException if the conductance is negative or has nowhere to go
     */
    public Floating {
      if (!(conductanceWPerMK >= 0) || !Double.isFinite(conductanceWPerMK)) {
        throw new IllegalArgumentException("a conductance is a finite number, 0 or more");
      }
      if (conductanceWPerMK > 0 && to.isEmpty()) {
        throw new IllegalArgumentException("a conductance needs a space it leads to");
      }
    }
  }

  /**
   * Checks the figures.
   *
   * @throws IllegalArgumentException if the name is empty, the temperature is not finite although
   *     the space does not float, or the humidity is not in [0, 1]
   */
  public Space {
    if (name.isEmpty()) {
      throw new IllegalArgumentException("a space needs a name");
    }
    if (floating.isEmpty() && !Double.isFinite(temperatureC)) {
      throw new IllegalArgumentException(name + ": the temperature must be finite");
    }
    if (relativeHumidity.isPresent()
        && !(relativeHumidity.getAsDouble() >= 0 && relativeHumidity.getAsDouble() <= 1)) {
      throw new IllegalArgumentException(name + ": a relative humidity lies in [0, 1]");
    }
  }

  /** The films of one set. */
  public FilmRule films(FilmSet set) {
    return set == FilmSet.HEAT_LOSS ? heatLoss : surface;
  }

  /**
   * A space with the films of ISO 6946 and ISO 13788.
   *
   * @param name the name
   * @param temperatureC °C
   * @param exposure inside or outside
   * @return the space
   */
  public static Space of(String name, double temperatureC, Exposure exposure) {
    boolean inside = exposure == Exposure.INSIDE;
    return new Space(
        name,
        temperatureC,
        OptionalDouble.empty(),
        exposure,
        inside ? FilmRule.ISO_6946_INSIDE : FilmRule.ISO_6946_OUTSIDE,
        inside ? FilmRule.ISO_13788_INSIDE : FilmRule.ISO_13788_OUTSIDE,
        Optional.empty());
  }
}
