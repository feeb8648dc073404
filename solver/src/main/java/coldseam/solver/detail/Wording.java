package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/** How figures are written in faults, assumptions and warnings: plainly, lengths in mm. */
public final class Wording {
  private static final int PLACE_DECIMALS = 1;
  private static final int SIZE_DIGITS = 4;
  private static final int FIGURE_DIGITS = 6;

  /** Shorter lengths are none: below it points of a drawing are the same. */
  private static final double SHORTEST_M = Resolution.STANDARD.snapM();

  private Wording() {}

  /**
   * A number with up to six significant digits and no exponent.
   *
   * @param value any finite number
   * @return its text
   */
  public static String figure(double value) {
    return plain(BigDecimal.valueOf(value).round(new MathContext(FIGURE_DIGITS)));
  }

  /**
   * A length in mm, to a tenth or to four significant digits, whichever is finer.
   *
   * @param lengthM the length, m
   * @return text such as "340 mm"
   */
  public static String length(double lengthM) {
    if (Math.abs(lengthM) < SHORTEST_M) {
      return "0 mm";
    }
    BigDecimal mm = BigDecimal.valueOf(lengthM * 1000);
    int digits = Math.max(SIZE_DIGITS, mm.precision() - mm.scale() + PLACE_DECIMALS);
    return plain(mm.round(new MathContext(digits, RoundingMode.HALF_EVEN))) + " mm";
  }

  /**
   * A place in the drawing, to a tenth of a mm.
   *
   * @param point the place, m
   * @return text such as "(120, 0.5) mm"
   */
  public static String place(Point point) {
    return "(" + coordinate(point.x()) + ", " + coordinate(point.y()) + ") mm";
  }

  private static String coordinate(double metres) {
    return plain(
        BigDecimal.valueOf(metres * 1000).setScale(PLACE_DECIMALS, RoundingMode.HALF_EVEN));
  }

  private static String plain(BigDecimal value) {
    return value.signum() == 0 ? "0" : value.stripTrailingZeros().toPlainString();
  }
}
