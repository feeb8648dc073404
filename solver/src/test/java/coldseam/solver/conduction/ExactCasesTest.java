package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.orthotropic;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.data.Percentage.withPercentage;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Details whose heat flow is known in closed form. */
class ExactCasesTest {
  private static final int[] FIRST = {0};
  private static final int[] SECOND = {1};

  private static double coupling(Solution solution) {
    return solution.coupling(FIRST, SECOND).value();
  }

  /** ISO 6946: U = 1/(Rsi + Σ d/λ + Rse); 0.213478349 here. Exact in any conforming element. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 0.3, 1.1, 2.9})
  void layeredWallIsExactAtAnyRotation(double angle) {
    Space inside = space("indoors", 20, 0.13);
    Space outside = space("outdoors", 0, 0.04);
    double cos = Math.cos(angle);
    double sin = Math.sin(angle);
    Solution solution =
        new Sketch()
            .moved(p -> new Point(cos * p.x() - sin * p.y(), sin * p.x() + cos * p.y()))
            .know(inside)
            .know(outside)
            .box(material("plaster", 0.57), 0, 0, 0.015, 0.7)
            .box(material("brick", 0.50), 0.015, 0, 0.255, 0.7)
            .box(material("wool", 0.035), 0.255, 0, 0.395, 0.7)
            .box(material("render", 1.0), 0.395, 0, 0.403, 0.7)
            .facing(inside, 0, 0, 0, 0.7)
            .facing(outside, 0.403, 0, 0.403, 0.7)
            .solve();
    double resistance = 0.13 + 0.015 / 0.57 + 0.24 / 0.50 + 0.14 / 0.035 + 0.008 / 1.0 + 0.04;

    assertThat(1 / resistance).isCloseTo(0.213478349, within(1e-9));
    assertThat(coupling(solution)).isCloseTo(0.7 / resistance, within(1e-12));
    TemperatureField field = solution.temperatures(new double[] {20, 0});
    double behindBrick = 20 - 20 * (0.13 + 0.015 / 0.57 + 0.24 / 0.50) / resistance;
    assertThat(field.at(new Point(cos * 0.255 - sin * 0.31, sin * 0.255 + cos * 0.31)))
        .isCloseTo(behindBrick, within(1e-10));
  }

  /** Adds c(ρ) of the conformal map dz/dw = (d₁/π) √((w−1)/(w+ρ²))/w to the arms. */
  static double cornerTerm(double rho) {
    return (2 / rho * Math.atan(rho)
            + 2 * rho * Math.atan(1 / rho)
            - Math.log(16 * rho * rho / Math.pow(1 + rho * rho, 2)))
        / Math.PI;
  }

  /** Exact: conformal map of the L to a half plane; arms long enough for the end not to matter. */
  @ParameterizedTest
  @ValueSource(doubles = {1, 1.5, 2, 3, 4})
  void isothermalCorner(double rho) {
    double d1 = rho;
    double d2 = 1;
    double l1 = 3 * d1;
    double l2 = 3 * d2;
    Solution solution = corner(d1, d2, l1, l2, 0, 0, material("stone", 1)).solve();

    // the arm along x has thickness d1
    assertThat(coupling(solution))
        .isCloseTo(l1 / d1 + l2 / d2 + cornerTerm(rho), withPercentage(0.003));
  }

  /** Computed: the same L with arms of 2 and of 1, ends adiabatic, elements of high degree. */
  @ParameterizedTest
  @CsvSource({"2, 4.55872844", "1, 2.55852316"})
  void isothermalCornerWithShortArms(double arm, double expected) {
    Solution solution = corner(1, 1, arm, arm, 0, 0, material("stone", 1)).solve();

    assertThat(coupling(solution)).isCloseTo(expected, withPercentage(0.003));
  }

  /** Arm along x of thickness d1 and inner length l1, arm along y of thickness d2. */
  private static Sketch corner(
      double d1, double d2, double l1, double l2, double rsi, double rse, Material material) {
    Space inside = space("indoors", 1, rsi);
    Space outside = space("outdoors", 0, rse);
    double x = d2 + l1;
    double y = d1 + l2;
    return new Sketch()
        .accuracy(1e-4)
        .know(inside)
        .know(outside)
        .polygon(material, 0, 0, x, 0, x, d1, d2, d1, d2, y, 0, y)
        .facing(inside, x, d1, d2, d1, d2, y)
        .facing(outside, 0, y, 0, 0, x, 0);
  }

  /** Computed: elements of degree 8 graded to the corner, eight digits stable. */
  @Test
  void cornerWithFilms() {
    Sketch sketch = corner(0.3, 0.3, 1.5, 1.5, 0.13, 0.04, material("block", 0.5));
    Solution solution = sketch.surfaceTemperatures().solve();
    TemperatureField field = solution.temperatures(new double[] {1, 0});

    assertThat(coupling(solution)).isCloseTo(4.07021518, withPercentage(0.003));
    assertThat(field.at(new Point(0.3, 0.3))).isCloseTo(0.68989851, within(2e-4));
    assertThat(field.at(new Point(0, 0))).isCloseTo(0.00234707, within(2e-4));
  }

  /** Computed like the corner before it, with Rsi 0.25. */
  @Test
  void cornerWithFilmsForSurfaceTemperature() {
    Sketch sketch =
        corner(0.3, 0.3, 1.5, 1.5, 0.25, 0.04, material("block", 0.5)).surfaceTemperatures();
    Solution solution = sketch.solve();

    assertThat(coupling(solution)).isCloseTo(3.49577114, withPercentage(0.003));
    assertThat(solution.temperatures(new double[] {1, 0}).at(new Point(0.3, 0.3)))
        .isCloseTo(0.56545814, within(2e-4));
  }

  /** A polygon of the circle's area, n corners. */
  private static double equalArea(double radius, int corners) {
    double step = 2 * Math.PI / corners;
    return radius * Math.sqrt(step / Math.sin(step));
  }

  private static Sketch ring(
      int corners, double r1, double r2, double e, Space inside, Space outside, Material material) {
    double wide = 2 * r2;
    return new Sketch()
        .accuracy(1e-4)
        .know(inside)
        .know(outside)
        .box(outside, -wide, -wide, wide, wide)
        .disc(material, 0, 0, equalArea(r2, corners), corners)
        .disc(inside, e, 0, equalArea(r1, corners), corners);
  }

  /**
   * Exact: 1/L = Ri/(2πr₁) + ln(r₂/r₁)/(2πλ) + Re/(2πr₂). The faces of polygons of equal area are
   * longer by π²/6n², so the films pass more by that part.
   */
  @ParameterizedTest
  @ValueSource(ints = {24, 48, 96, 192})
  void hollowCylinderWithFilms(int corners) {
    Solution solution =
        ring(
                corners,
                0.1,
                0.2,
                0,
                space("pipe", 20, 0.13),
                space("room", 0, 0.04),
                material("shell", 0.5))
            .solve();
    double resistance = (0.13 / 0.1 + Math.log(2) / 0.5 + 0.04 / 0.2) / (2 * Math.PI);
    double chords = 1.7 / (corners * (double) corners);

    assertThat(1 / resistance).isCloseTo(2.17690385, within(1e-8));
    assertThat(coupling(solution)).isCloseTo(1 / resistance, withPercentage(100 * chords + 0.003));
    TemperatureField field = solution.temperatures(new double[] {20, 0});
    double middle = 20 - 20 * (0.13 / 0.1 + Math.log(1.5) / 0.5) / (2 * Math.PI * resistance);
    assertThat(field.at(new Point(0.15 * Math.cos(1), 0.15 * Math.sin(1))))
        .isCloseTo(middle, within(20 * (chords + 2e-4)));
  }

  /** Exact: layers in series, 0.591679241. */
  @Test
  void insulatedPipe() {
    Space inside = space("pipe", 60, 0.1);
    Space outside = space("room", 0, 0.04);
    int n = 96;
    Solution solution =
        new Sketch()
            .accuracy(1e-4)
            .know(inside)
            .know(outside)
            .box(outside, -1, -1, 1, 1)
            .disc(material("foam", 0.04), 0, 0, equalArea(0.16, n), n)
            .disc(material("steel", 50), 0, 0, equalArea(0.11, n), n)
            .disc(inside, 0, 0, equalArea(0.10, n), n)
            .solve();

    assertThat(coupling(solution)).isCloseTo(0.591679241, withPercentage(0.02));
  }

  /** Exact: bipolar coordinates, S = 2π/acosh((r₁² + r₂² − e²)/(2 r₁ r₂)). */
  @ParameterizedTest
  @CsvSource({"1, 3, 1, 6.52850261", "0.05, 0.2, 0.1, 5.89012307", "1, 2, 0, 9.064720284"})
  void eccentricCylinders(double r1, double r2, double e, double expected) {
    double exact = 2 * Math.PI / acosh((r1 * r1 + r2 * r2 - e * e) / (2 * r1 * r2));
    Solution solution =
        ring(180, r1, r2, e, space("in", 1, 0), space("out", 0, 0), material("shell", 1)).solve();

    assertThat(exact).isCloseTo(expected, within(1e-8));
    assertThat(coupling(solution)).isCloseTo(exact, withPercentage(0.01));
  }

  private static double acosh(double x) {
    return Math.log(x + Math.sqrt(x * x - 1));
  }

  /**
   * Exact series of a fin on an isothermal base: μ tan μ = hw/λ, c = 2 sin μ/(μ + sin μ cos μ), θ =
   * Σ c cos(ky) f(x)/f(0), f = cosh k(L−x), or with a film at the tip cosh + (h/λk) sinh.
   */
  private static double fin(double length, boolean tipFilm, double x, double y, boolean flow) {
    double lambda = 2;
    double w = 0.1;
    double h = 25;
    double sum = 0;
    for (int n = 0; n < 4000; n++) {
      double low = n * Math.PI;
      double high = low + Math.PI / 2;
      for (int i = 0; i < 80; i++) {
        double mid = (low + high) / 2;
        if (mid * Math.sin(mid) < h * w / lambda * Math.cos(mid) == (n % 2 == 0)) {
          low = mid;
        } else {
          high = mid;
        }
      }
      double mu = low;
      double c = 2 * Math.sin(mu) / (mu + Math.sin(mu) * Math.cos(mu));
      double k = mu / w;
      double b = tipFilm ? h / (lambda * k) : 0;
      double decay = Math.exp(-2 * k * length);
      double atBase = (1 + b) + (1 - b) * decay;
      if (flow) {
        double slope = ((1 + b) - (1 - b) * decay) / atBase;
        sum += 2 * lambda * c * Math.sin(mu) * slope;
      } else {
        double here = (1 + b) * Math.exp(-k * x) + (1 - b) * Math.exp(k * (x - 2 * length));
        sum += c * Math.cos(k * y) * here / atBase;
      }
    }
    return sum;
  }

  @ParameterizedTest
  @CsvSource({
    "0.3, false, 3.935739, 0.13892998, 0.29687798, 0.08298845",
    "0.3, true, 3.967072, 0.05954822, 0.27836099, 0.03557537",
    "1.2, false, 3.963056, 3.20962e-5, 0.00427331, 1.91687e-5",
    "1.2, true, 3.963056, 1.36988e-5, 0.00427324, 8.18129e-6"
  })
  void finOnAnIsothermalBase(
      double length, boolean tipFilm, double flow, double tip, double middle, double corner) {
    Space base = space("base", 1, 0);
    Space air = space("air", 0, 0.04);
    Sketch sketch =
        new Sketch()
            .accuracy(1e-4)
            .know(base)
            .know(air)
            .box(material("fin", 2), 0, -0.1, length, 0.1)
            .facing(base, 0, -0.1, 0, 0.1);
    if (tipFilm) {
      sketch.facing(air, 0, 0.1, length, 0.1, length, -0.1, 0, -0.1);
    } else {
      sketch.facing(air, 0, 0.1, length, 0.1).facing(air, 0, -0.1, length, -0.1);
    }
    Solution solution = sketch.solve();
    TemperatureField field = solution.temperatures(new double[] {1, 0});

    assertThat(fin(length, tipFilm, 0, 0, true)).isCloseTo(flow, within(2e-3));
    assertThat(fin(length, tipFilm, length, 0, false)).isCloseTo(tip, within(1e-8));
    assertThat(coupling(solution)).isCloseTo(flow, withPercentage(0.003));
    assertThat(field.at(new Point(length, 0))).isCloseTo(tip, within(2e-4));
    assertThat(field.at(new Point(length / 2, 0))).isCloseTo(middle, within(2e-4));
    assertThat(field.at(new Point(length, 0.1))).isCloseTo(corner, within(2e-4));
  }

  /** Exact: Keller 1964, Dykhne 1970: √(ab). The centre is singular, θ ~ r^α, α from 0.59 down. */
  @ParameterizedTest
  @CsvSource({"1, 4, 0.003", "1, 9, 0.004", "0.04, 2.0, 0.02"})
  void checkerboard(double a, double b, double percent) {
    Solution solution = checkerboard(a, b).accuracy(a * b < 1 ? 2e-3 : 1e-4).solve();

    assertThat(coupling(solution)).isCloseTo(Math.sqrt(a * b), withPercentage(percent));
    Certificate.Certified proved =
        (Certificate.Certified) solution.coupling(new int[] {0}, new int[] {1}).certificate();
    assertThat(Math.sqrt(a * b)).isBetween(proved.lower(), proved.upper());
    assertThat(solution.temperatures(new double[] {1, 0}).at(new Point(0.5, 0.5)))
        .isCloseTo(0.5, within(0.01));
  }

  static Sketch checkerboard(double a, double b) {
    Space left = space("left", 1, 0);
    Space right = space("right", 0, 0);
    Material first = material("first", a);
    Material second = material("second", b);
    return new Sketch()
        .accuracy(1e-4)
        .know(left)
        .know(right)
        .box(first, 0, 0, 0.5, 0.5)
        .box(first, 0.5, 0.5, 1, 1)
        .box(second, 0.5, 0, 1, 0.5)
        .box(second, 0, 0.5, 0.5, 1)
        .facing(left, 0, 0, 0, 1)
        .facing(right, 1, 0, 1, 1);
  }

  /**
   * Exact: phase interchange (Keller 1964), G(a,b) G′(b,a) = ab; the two values computed with
   * elements of high degree.
   */
  @Test
  void phaseInterchange() {
    double upright = coupling(inclusion(1, 10, false).solve());
    double turned = coupling(inclusion(10, 1, true).solve());

    assertThat(upright).isCloseTo(1.54422, withPercentage(0.003));
    assertThat(turned).isCloseTo(6.47576, withPercentage(0.003));
    assertThat(upright * turned).isCloseTo(10, withPercentage(0.006));
  }

  private static Sketch inclusion(double matrix, double centre, boolean turned) {
    Space hot = space("hot", 1, 0);
    Space cold = space("cold", 0, 0);
    Sketch sketch =
        new Sketch()
            .accuracy(1e-4)
            .know(hot)
            .know(cold)
            .box(material("matrix", matrix), 0, 0, 1, 1)
            .box(material("centre", centre), 0.25, 0.25, 0.75, 0.75);
    return turned
        ? sketch.facing(hot, 0, 0, 1, 0).facing(cold, 0, 1, 1, 1)
        : sketch.facing(hot, 0, 0, 0, 1).facing(cold, 1, 0, 1, 1);
  }

  /** Rayleigh's square array (1892), series confirmed by elements of high degree. */
  @ParameterizedTest
  @CsvSource({
    "10, 0.1, 1.17822180",
    "10, 0.3, 1.65203601",
    "10, 0.5, 2.415467",
    "0.1, 0.1, 0.84873663",
    "0.1, 0.3, 0.60531368",
    "0.1, 0.5, 0.413999"
  })
  void squareArrayOfCylinders(double k, double fraction, double expected) {
    Space left = space("left", 1, 0);
    Space right = space("right", 0, 0);
    int n = 96;
    Solution solution =
        new Sketch()
            .accuracy(1e-4)
            .know(left)
            .know(right)
            .box(material("matrix", 1), -0.5, -0.5, 0.5, 0.5)
            .disc(material("cylinder", k), 0, 0, equalArea(Math.sqrt(fraction / Math.PI), n), n)
            .facing(left, -0.5, -0.5, -0.5, 0.5)
            .facing(right, 0.5, -0.5, 0.5, 0.5)
            .solve();

    assertThat(coupling(solution)).isCloseTo(expected, withPercentage(0.01));
  }

  private static double slantedConductance(double width) {
    Space below = space("below", 0, 0);
    Space above = space("above", 1, 0);
    return coupling(
        new Sketch()
            .accuracy(1e-4)
            .know(below)
            .know(above)
            .box(orthotropic("slanted", 2, 0.5, Math.PI / 6), 0, 0, width, 1)
            .facing(below, 0, 0, width, 0)
            .facing(above, 0, 1, width, 1)
            .solve());
  }

  /**
   * Exact for W/H = √(kxx/kyy): the affine map to isotropy makes a rhombus, so G = √(k₁k₂). Other
   * widths computed with elements of high degree.
   */
  @Test
  void rotatedOrthotropicRectangle() {
    assertThat(slantedConductance(Math.sqrt(1.625 / 0.875))).isCloseTo(1, withPercentage(0.003));
    assertThat(slantedConductance(1)).isCloseTo(0.703188710, withPercentage(0.003));
    assertThat(slantedConductance(10)).isCloseTo(8.54319377, withPercentage(0.003));
    assertThat(slantedConductance(0.1)).isCloseTo(0.0623317338, withPercentage(0.003));
  }

  /** Exact: x → x √(ky/kx) maps to an isotropic corner of √(kx ky) with ρ = 2. */
  @Test
  void orthotropicCorner() {
    Solution solution = corner(1, 1, 6, 3, 0, 0, orthotropic("grained", 4, 1, 0)).solve();

    assertThat(coupling(solution)).isCloseTo(6 + 4 * 3 + 2 * cornerTerm(2), withPercentage(0.003));
  }

  /**
   * Exact: a parallelogram between isotherms whose other sides follow the flux K∇θ carries a linear
   * field, whatever the angle of the grain. Reproduced to rounding.
   */
  @ParameterizedTest
  @ValueSource(doubles = {0, 0.5236, 1, 2.5})
  void linearFieldInARotatedOrthotropicParallelogram(double grain) {
    double kxy = 1.5 * Math.sin(grain) * Math.cos(grain);
    double kyy = 2 * Math.pow(Math.sin(grain), 2) + 0.5 * Math.pow(Math.cos(grain), 2);
    double lean = 0.4 * kxy / kyy;
    Space below = space("below", 0, 0);
    Space above = space("above", 1, 0);
    Solution solution =
        new Sketch()
            .know(below)
            .know(above)
            .polygon(
                orthotropic("grained", 2, 0.5, grain), 0, 0, 0.7, 0, 0.7 + lean, 0.4, lean, 0.4)
            .facing(below, 0, 0, 0.7, 0)
            .facing(above, lean, 0.4, 0.7 + lean, 0.4)
            .solve();

    assertThat(coupling(solution)).isCloseTo(kyy * 0.7 / 0.4, withPercentage(1e-9));
    assertThat(solution.temperatures(new double[] {0, 1}).at(new Point(0.35 + lean / 4, 0.1)))
        .isCloseTo(0.25, within(1e-12));
  }

  /**
   * A cylinder below an isothermal plane, exact in the half plane: 2π/acosh(depth/radius); the
   * field falls with the square of the distance, so that cutting at R leaves out about (2a/R)² / 2.
   */
  @Test
  void buriedCylinder() {
    Space pipe = space("pipe", 1, 0);
    Space surface = space("surface", 0, 0);
    Solution solution =
        new Sketch()
            .accuracy(1e-4)
            .know(pipe)
            .know(surface)
            .box(material("soil", 1), -150, -150, 150, 0)
            .disc(pipe, 0, -1.5, equalArea(0.5, 96), 96)
            .facing(surface, -150, 0, 150, 0)
            .solve();

    assertThat(coupling(solution)).isCloseTo(2 * Math.PI / acosh(3), withPercentage(0.02));
  }

  /** Computed: a wall and partition between two rooms and outdoors, eight digits stable. */
  @Test
  void threeSpaces() {
    Space out = space("outdoors", 0, 0.04);
    Space a = space("room a", 20, 0.13);
    Space b = space("room b", 15, 0.13);
    Material masonry = material("masonry", 1.0);
    Solution solution =
        new Sketch()
            .know(out)
            .know(a)
            .know(b)
            .box(material("insulation", 0.04), 0, 0, 3, 0.1)
            .box(masonry, 0, 0.1, 3, 0.3)
            .box(masonry, 1.4, 0.3, 1.6, 1.8)
            .facing(out, 0, 0, 3, 0)
            .facing(a, 0, 0.3, 1.4, 0.3, 1.4, 1.8)
            .facing(b, 1.6, 1.8, 1.6, 0.3, 3, 0.3)
            .surfaceTemperatures()
            .solve();
    double[] temperatures = {0, 20, 15};

    assertThat(solution.matrix(0, 1)).isCloseTo(-0.5227053, withPercentage(0.01));
    assertThat(solution.matrix(0, 2)).isCloseTo(-0.5227053, withPercentage(0.01));
    assertThat(solution.matrix(1, 2)).isCloseTo(-3.5469738, withPercentage(0.01));
    assertThat(solution.spaceFlow(0, temperatures)).isCloseTo(-18.29469, within(2e-3));
    assertThat(solution.spaceFlow(1, temperatures)).isCloseTo(28.18897, within(3e-3));
    assertThat(solution.spaceFlow(2, temperatures)).isCloseTo(-9.89429, within(3e-3));
    TemperatureField field = solution.temperatures(temperatures);
    assertThat(field.at(new Point(1.4, 0.3))).isCloseTo(17.85127, within(8e-3));
    assertThat(field.at(new Point(1.6, 0.3))).isCloseTo(15.67579, within(8e-3));
    double[] weights = new double[3];
    for (int k = 0; k < 3; k++) {
      double[] unit = new double[3];
      unit[k] = 1;
      weights[k] = solution.temperatures(unit).at(new Point(1.4, 0.3));
    }
    assertThat(weights).containsExactly(new double[] {0.0420841, 0.696506, 0.261410}, within(4e-4));
    assertThat(weights[0] + weights[1] + weights[2]).isCloseTo(1, within(1e-12));
  }
}
