package coldseam.mesh.plane;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Signs are compared with determinants in {@link BigDecimal}, which are exact. */
class PredicatesTest {
  private static final double[] SCALES = {1, 1e-4, 1e-9, 1e-13, 0x1p-52};

  @Test
  void orientationOfNearlyCollinearPointsIsExact() {
    Random random = new Random(1);
    int zeros = 0;
    for (int trial = 0; trial < 40_000; trial++) {
      double[] p = nearlyCollinear(random, SCALES[trial % SCALES.length]);
      int expected = orientation(p);
      int sign = Predicates.orientation(p[0], p[1], p[2], p[3], p[4], p[5]);
      int exact = Predicates.exactOrientation(p[0], p[1], p[2], p[3], p[4], p[5]);
      zeros += expected == 0 ? 1 : 0;
      assertThat(sign).as("trial %d", trial).isEqualTo(expected);
      assertThat(exact).as("trial %d", trial).isEqualTo(expected);
    }
    assertThat(zeros).as("the points must be hard").isGreaterThan(100);
  }

  @Test
  void inCircleOfNearlyCocircularPointsIsExact() {
    Random random = new Random(2);
    int zeros = 0;
    int unfiltered = 0;
    for (int trial = 0; trial < 20_000; trial++) {
      double[] p = nearlyCocircular(random, SCALES[trial % SCALES.length]);
      int expected = inCircle(p);
      int sign = Predicates.inCircle(p[0], p[1], p[2], p[3], p[4], p[5], p[6], p[7]);
      int exact = Predicates.exactInCircle(p[0], p[1], p[2], p[3], p[4], p[5], p[6], p[7]);
      zeros += expected == 0 ? 1 : 0;
      unfiltered += floating(p) != expected ? 1 : 0;
      assertThat(sign).as("trial %d", trial).isEqualTo(expected);
      assertThat(exact).as("trial %d", trial).isEqualTo(expected);
    }
    assertThat(zeros).as("the points must be hard").isGreaterThan(100);
    assertThat(unfiltered).as("plain floating point must fail on them").isGreaterThan(100);
  }

  @Test
  void cornersOfARectangleAreOnOneCircle() {
    assertThat(Predicates.inCircle(0.1, 0.2, 0.4, 0.2, 0.4, 0.7, 0.1, 0.7)).isZero();
    assertThat(Predicates.inCircle(0.1, 0.2, 0.4, 0.2, 0.4, 0.7, 0.1, Math.nextDown(0.7)))
        .isEqualTo(1);
    assertThat(Predicates.inCircle(0.1, 0.2, 0.4, 0.2, 0.4, 0.7, 0.1, Math.nextUp(0.7)))
        .isEqualTo(-1);
  }

  /** Three points near a line through a far-off place, the third moved by about the scale. */
  private static double[] nearlyCollinear(Random random, double scale) {
    double x = random.nextInt(3) * 100 * random.nextDouble();
    double y = random.nextInt(3) * 100 * random.nextDouble();
    double dx = random.nextInt(2) == 0 ? random.nextDouble() : 0.25 * random.nextInt(4);
    double dy = random.nextInt(2) == 0 ? random.nextDouble() : 0.25 * random.nextInt(4);
    double along = random.nextInt(4) * 0.5;
    return new double[] {
      x,
      y,
      x + dx,
      y + dy,
      x + along * dx + random.nextInt(3) * scale * random.nextDouble(),
      y + along * dy + random.nextInt(3) * scale * random.nextDouble()
    };
  }

  /** Corners of a turned and shifted rectangle, the last moved by about the scale. */
  private static double[] nearlyCocircular(Random random, double scale) {
    double x = random.nextInt(2) * 100 * random.nextDouble();
    double y = random.nextInt(2) * 100 * random.nextDouble();
    double ux = random.nextInt(2) == 0 ? random.nextDouble() : 0.5 * random.nextInt(3);
    double uy = random.nextInt(2) == 0 ? random.nextDouble() : 0.5 * random.nextInt(3);
    double stretch = random.nextInt(2) == 0 ? 1 + random.nextInt(4) : random.nextDouble();
    double vx = -uy * stretch;
    double vy = ux * stretch;
    return new double[] {
      x,
      y,
      x + ux,
      y + uy,
      x + ux + vx,
      y + uy + vy,
      x + vx + random.nextInt(2) * scale * (random.nextDouble() - 0.5),
      y + vy + random.nextInt(2) * scale * (random.nextDouble() - 0.5)
    };
  }

  private static int orientation(double[] p) {
    return cross(minus(p[0], p[4]), minus(p[1], p[5]), minus(p[2], p[4]), minus(p[3], p[5]))
        .signum();
  }

  private static int inCircle(double[] p) {
    BigDecimal ax = minus(p[0], p[6]);
    BigDecimal ay = minus(p[1], p[7]);
    BigDecimal bx = minus(p[2], p[6]);
    BigDecimal by = minus(p[3], p[7]);
    BigDecimal cx = minus(p[4], p[6]);
    BigDecimal cy = minus(p[5], p[7]);
    BigDecimal a = ax.multiply(ax).add(ay.multiply(ay));
    BigDecimal b = bx.multiply(bx).add(by.multiply(by));
    BigDecimal c = cx.multiply(cx).add(cy.multiply(cy));
    return a.multiply(cross(bx, by, cx, cy))
        .add(b.multiply(cross(cx, cy, ax, ay)))
        .add(c.multiply(cross(ax, ay, bx, by)))
        .signum();
  }

  private static int floating(double[] p) {
    double ax = p[0] - p[6];
    double ay = p[1] - p[7];
    double bx = p[2] - p[6];
    double by = p[3] - p[7];
    double cx = p[4] - p[6];
    double cy = p[5] - p[7];
    return (int)
        Math.signum(
            (ax * ax + ay * ay) * (bx * cy - by * cx)
                + (bx * bx + by * by) * (cx * ay - cy * ax)
                + (cx * cx + cy * cy) * (ax * by - ay * bx));
  }

  private static BigDecimal cross(BigDecimal ax, BigDecimal ay, BigDecimal bx, BigDecimal by) {
    return ax.multiply(by).subtract(ay.multiply(bx));
  }

  private static BigDecimal minus(double a, double b) {
    return new BigDecimal(a).subtract(new BigDecimal(b));
  }
}
