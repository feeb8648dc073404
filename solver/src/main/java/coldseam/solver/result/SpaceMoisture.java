package coldseam.solver.result;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * The moisture check of the surfaces that face one space (ISO 13788:2012). Surface temperatures are
 * estimates; a limit counts as kept only if it is kept by more than their estimated error. What
 * condenses inside the construction is not assessed.
 *
 * @param space the space
 * @param airC its temperature, °C; of a floating space that of the case
 * @param humidity where its humidity comes from, in words
 * @param atSurface relative humidity at the surface that governs: 0.8 for mould, 1 for condensation
 * @param months in the order of the case; a single climate is one month without a name
 * @param critical index of the month that needs the highest temperature factor; empty if outdoors
 *     is never colder
 * @param surface the surface in that month
 * @param onGlazing whether the coldest point lies on glazing or a frame, which the standard judges
 *     by condensation alone
 */
public record SpaceMoisture(
    String space,
    double airC,
    String humidity,
    double atSurface,
    List<Month> months,
    OptionalInt critical,
    Optional<Surface> surface,
    boolean onGlazing) {
  /** Copies the list. */
  public SpaceMoisture {
    months = List.copyOf(months);
  }

  /**
   * One month.
   *
   * @param name its name, empty for a single climate
   * @param outsideC temperature outdoors, °C
   * @param insideC temperature of the space, °C
   * @param counts whether outdoors is colder than the space; else nothing is required
   * @param vapourPa vapour pressure of the air indoors, margins included, Pa
   * @param dewPointC surface temperature below which water condenses, °C
   * @param mouldC surface temperature below which mould may grow, °C
   * @param requiredForMould temperature factor needed against mould; NaN where nothing is required
   * @param requiredForCondensation temperature factor needed against condensation
   * @param surfaceC coldest surface temperature, °C
   * @param fRsi its temperature factor; NaN where nothing is required
   * @param errorK estimated error of the surface temperature, K
   */
  public record Month(
      String name,
      double outsideC,
      double insideC,
      boolean counts,
      double vapourPa,
      double dewPointC,
      double mouldC,
      double requiredForMould,
      double requiredForCondensation,
      double surfaceC,
      double fRsi,
      double errorK) {
    /** Relative humidity at the coldest point; above 1 water condenses there. */
    public double surfaceHumidity() {
      return vapourPa / MoistureLimits.saturationPa(surfaceC);
    }

    /**
     * How far the coldest point stays above a limit.
     *
     * @param atSurface relative humidity of the limit
     * @return K, negative below it
     */
    public double marginK(double atSurface) {
      return surfaceC - limitC(atSurface);
    }

    /** The surface temperature at which a relative humidity is reached, °C. */
    public double limitC(double atSurface) {
      return MoistureLimits.criticalC(vapourPa, atSurface);
    }

    /** The temperature factor needed to stay below a relative humidity; NaN if nothing is. */
    public double required(double atSurface) {
      return counts
          ? MoistureLimits.requiredFactor(limitC(atSurface), insideC, outsideC)
          : Double.NaN;
    }
  }

  /**
   * The developed surface in the critical month.
   *
   * @param samples temperatures along it; NaN parts pieces that do not join
   * @param lengthM its developed length, m
   * @param belowMouldM length of it below the limit for mould, m
   * @param belowDewPointM length of it below the dew point, m
   */
  public record Surface(
      List<Result.Sample> samples, double lengthM, double belowMouldM, double belowDewPointM) {
    /** Copies the list. */
    public Surface {
      samples = List.copyOf(samples);
    }
  }

  /**
   * What can be said of a limit in all months that count.
   *
   * @param atSurface relative humidity of the limit
   * @return the verdict
   */
  public Verdict verdict(double atSurface) {
    Verdict worst = Verdict.MET;
    for (Month month : months) {
      if (month.counts()) {
        Verdict own = Verdict.of(month.marginK(atSurface), month.errorK());
        worst = own.compareTo(worst) > 0 ? own : worst;
      }
    }
    return worst;
  }
}
