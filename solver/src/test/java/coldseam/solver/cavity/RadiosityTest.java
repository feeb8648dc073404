package coldseam.solver.cavity;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class RadiosityTest {
  private static List<Point> outline(double... xy) {
    List<Point> points = new ArrayList<>();
    for (int i = 0; i < xy.length; i += 2) {
      points.add(new Point(xy[i], xy[i + 1]));
    }
    return points;
  }

  private static Radiosity uncut(List<Point> outline, double emissivity) {
    double[] all = new double[outline.size()];
    Arrays.fill(all, emissivity);
    return Radiosity.of(outline, all, Double.POSITIVE_INFINITY);
  }

  /**
   * Opposed strips of width w at distance h, F = √(1 + (h/w)²) − h/w; strips at a right angle with
   * a common edge, widths w and h, F = ½ (1 + h/w − √(1 + (h/w)²)): the classical two-dimensional
   * view factors (for instance Siegel and Howell, Thermal Radiation Heat Transfer, appendix), from
   * memory.
   */
  @ParameterizedTest
  @ValueSource(doubles = {0.01, 0.3, 1, 4, 100})
  void opposedAndPerpendicularStrips(double h) {
    Radiosity box = uncut(outline(0, 0, 1, 0, 1, h, 0, h), 0.9);
    assertThat(box.viewFactor(0, 2)).isCloseTo(Math.hypot(1, h) - h, within(1e-13));
    assertThat(box.viewFactor(0, 1)).isCloseTo((1 + h - Math.hypot(1, h)) / 2, within(1e-13));
    assertThat(box.viewFactor(0, 3)).isCloseTo((1 + h - Math.hypot(1, h)) / 2, within(1e-13));
    assertThat(box.viewFactor(0, 0)).isZero();
  }

  /** The sides of a triangle, F_12 = (L1 + L2 − L3)/(2 L1): textbook, three-sided enclosure. */
  @Test
  void triangle() {
    Radiosity triangle = uncut(outline(0, 0, 4, 0, 0, 3), 0.9);
    assertThat(triangle.viewFactor(0, 1)).isCloseTo((4 + 5 - 3) / 8.0, within(1e-14));
    assertThat(triangle.viewFactor(1, 2)).isCloseTo((5 + 3 - 4) / 10.0, within(1e-14));
    assertThat(triangle.viewFactor(2, 0)).isCloseTo((3 + 4 - 5) / 6.0, within(1e-14));
  }

  /**
   * L of three unit squares. Strings by hand: from the long bottom (0,0)-(2,0) to the end
   * (1,2)-(0,2) crossed √5 + 2√2, uncrossed (1 + √2) + 2, the third bent at the inner corner (1,1).
   * The two ends just miss each other.
   */
  @Test
  void cornerBlocksTheView() {
    Radiosity el = uncut(outline(0, 0, 2, 0, 2, 1, 1, 1, 1, 2, 0, 2), 0.9);
    double exchanged = (Math.sqrt(5) + 2 * Math.sqrt(2) - 3 - Math.sqrt(2)) / 2;
    assertThat(el.viewFactor(0, 4)).isCloseTo(exchanged / 2, within(1e-14));
    assertThat(el.viewFactor(4, 0)).isCloseTo(exchanged, within(1e-14));
    assertThat(el.viewFactor(1, 4)).isCloseTo(0, within(1e-15));
    assertThat(el.viewFactor(2, 3)).isCloseTo(0, within(1e-15));
  }

  /**
   * An outside check of shadowing: rays from points of each side, spread by the sine of the angle
   * (Lambert), counted where they first meet the outline.
   */
  @Test
  void raysFindTheSameViewFactors() {
    List<Point> comb =
        outline(
            0, 0, 5, 0, 5, 3, 4, 2.9, 3.7, 0.8, 3.2, 1.1, 3, 3, 1.6, 2.2, 1.4, 0.7, 1, 2.5, 0, 2);
    Radiosity enclosure = uncut(comb, 0.9);
    int n = comb.size();
    int points = 200;
    int angles = 200;
    for (int i = 0; i < n; i++) {
      double[] hits = new double[n];
      Point a = comb.get(i);
      Point b = comb.get((i + 1) % n);
      double length = a.distance(b);
      double tx = (b.x() - a.x()) / length;
      double ty = (b.y() - a.y()) / length;
      for (int p = 0; p < points; p++) {
        double s = (p + 0.5) / points * length;
        for (int k = 0; k < angles; k++) {
          double along = -1 + 2 * (k + 0.5) / angles;
          double away = Math.sqrt(1 - along * along);
          int met =
              firstMet(
                  comb,
                  i,
                  a.x() + s * tx,
                  a.y() + s * ty,
                  along * tx - away * ty,
                  along * ty + away * tx);
          hits[met] += 1.0 / (points * angles);
        }
      }
      for (int j = 0; j < n; j++) {
        assertThat(enclosure.viewFactor(i, j)).as(i + " to " + j).isCloseTo(hits[j], within(2e-3));
      }
    }
  }

  private static int firstMet(
      List<Point> outline, int own, double x, double y, double dx, double dy) {
    int met = -1;
    double nearest = Double.POSITIVE_INFINITY;
    for (int j = 0; j < outline.size(); j++) {
      Point c = outline.get(j);
      Point d = outline.get((j + 1) % outline.size());
      double ex = d.x() - c.x();
      double ey = d.y() - c.y();
      double det = dx * ey - dy * ex;
      double t = ((c.x() - x) * ey - (c.y() - y) * ex) / det;
      double u = ((c.x() - x) * dy - (c.y() - y) * dx) / det;
      if (j != own && t > 0 && u >= 0 && u <= 1 && t < nearest) {
        nearest = t;
        met = j;
      }
    }
    return met;
  }

  /** Star-shaped polygons with reflex corners, turned and cut into faces. */
  @Test
  void factorsAreReciprocalAndSumToOne() {
    Random random = new Random(20);
    for (int trial = 0; trial < 60; trial++) {
      List<Point> star = new ArrayList<>();
      int corners = 3 + random.nextInt(12);
      for (int i = 0; i < corners; i++) {
        double angle = 2 * Math.PI * (i + 0.8 * random.nextDouble()) / corners;
        double radius = 0.02 * (0.2 + random.nextDouble());
        star.add(new Point(5 + radius * Math.cos(angle), -3 + radius * Math.sin(angle)));
      }
      if (corners < 5) {
        star = outline(5, -3, 5.03, -3.001, 5.031, -2.98, 5.01, -2.985);
      }
      double[] emissivities = new double[star.size()];
      for (int i = 0; i < emissivities.length; i++) {
        emissivities[i] = random.nextDouble();
      }
      checkExchange(Radiosity.of(star, emissivities, 0.004), random);
    }
  }

  private static void checkExchange(Radiosity enclosure, Random random) {
    int n = enclosure.faces().size();
    double[] same = new double[n];
    double[] mixed = new double[n];
    for (int i = 0; i < n; i++) {
      double sum = 0;
      for (int j = 0; j < n; j++) {
        double f = enclosure.viewFactor(i, j);
        assertThat(f).isBetween(0.0, 1.0);
        sum += f;
        double there = enclosure.faces().get(i).lengthM() * f;
        double back = enclosure.faces().get(j).lengthM() * enclosure.viewFactor(j, i);
        assertThat(there).isCloseTo(back, within(1e-15));
      }
      assertThat(sum).isCloseTo(1, within(1e-9));
      same[i] = 290;
      mixed[i] = 250 + 60 * random.nextDouble();
    }
    assertThat(enclosure.netFlowsWPerM2(same)).containsOnly(0.0);
    assertThat(enclosure.dissipationWKPerM(same)).isZero();
    double[] flows = enclosure.netFlowsWPerM2(mixed);
    double total = 0;
    double turnover = 0;
    double dissipation = 0;
    for (int i = 0; i < n; i++) {
      double flow = enclosure.faces().get(i).lengthM() * flows[i];
      total += flow;
      turnover += Math.abs(flow);
      dissipation += flow * mixed[i];
    }
    assertThat(total).isCloseTo(0, within(1e-13 * turnover));
    assertThat(enclosure.dissipationWKPerM(mixed)).isPositive();
    assertThat(enclosure.dissipationWKPerM(mixed))
        .isCloseTo(dissipation, within(1e-10 * turnover * 300));
  }

  /** The grey balance itself, put together here from view factors and solved by iteration. */
  @Test
  void flowsSatisfyTheGreyBalance() {
    List<Point> el = outline(0, 0, 2, 0, 2, 1, 1, 1, 1, 2, 0, 2);
    double[] emissivities = {0.9, 0.1, 0.5, 0.9, 0.05, 1};
    Radiosity enclosure = Radiosity.of(el, emissivities, 0.5);
    int n = enclosure.faces().size();
    double[] t = new double[n];
    for (int i = 0; i < n; i++) {
      t[i] = 270 + 3 * i;
    }
    double[] leaving = new double[n];
    for (int sweep = 0; sweep < 2000; sweep++) {
      for (int i = 0; i < n; i++) {
        double e = enclosure.faces().get(i).emissivity();
        leaving[i] = e * 5.67e-8 * Math.pow(t[i], 4) + (1 - e) * arriving(enclosure, leaving, i);
      }
    }
    double[] flows = enclosure.netFlowsWPerM2(t);
    for (int i = 0; i < n; i++) {
      assertThat(flows[i]).isCloseTo(leaving[i] - arriving(enclosure, leaving, i), within(1e-9));
    }
  }

  private static double arriving(Radiosity enclosure, double[] leaving, int face) {
    double sum = 0;
    for (int j = 0; j < leaving.length; j++) {
      sum += enclosure.viewFactor(face, j) * leaving[j];
    }
    return sum;
  }

  /** Two endless parallel grey planes, q = σ (T1⁴ − T2⁴)/(1/ε1 + 1/ε2 − 1): textbook. */
  @Test
  void wideGapExchangesLikeParallelPlanes() {
    List<Point> gap = outline(0, 0, 1000, 0, 1000, 0.01, 0, 0.01);
    Radiosity enclosure =
        Radiosity.of(gap, new double[] {0.9, 0, 0.2, 0}, Double.POSITIVE_INFINITY);
    double[] flows = enclosure.netFlowsWPerM2(new double[] {293.15, 283, 273.15, 283});
    double expected =
        5.67e-8 * (Math.pow(293.15, 4) - Math.pow(273.15, 4)) / (1 / 0.9 + 1 / 0.2 - 1);
    assertThat(flows[0]).isCloseTo(expected, within(2e-5 * expected));
    assertThat(flows[2]).isCloseTo(-expected, within(2e-5 * expected));
  }

  /**
   * A square cavity whose side faces give back what they receive: the series form of ISO 10077-2 is
   * then exact, F = ½ (1 + √2 − 1), but for the linearisation 4 T_m³ ΔT of T1⁴ − T2⁴, which is
   * corrected here: T1⁴ − T2⁴ = 4 T_m³ ΔT (1 + (ΔT/2T_m)²).
   */
  @Test
  void squareCavityGivesTheEquivalentConductivity() {
    double side = 0.02;
    List<Point> square = outline(0, 0, side, 0, side, side, 0, side);
    for (double emissivity : new double[] {0.9, 0.3, 1}) {
      double[] all = {emissivity, emissivity, emissivity, emissivity};
      Radiosity enclosure = Radiosity.of(square, all, Double.POSITIVE_INFINITY);
      double difference = 20;
      double warm = 283 + difference / 2;
      double cold = 283 - difference / 2;
      // By symmetry the side faces lie half way in T⁴.
      double aside = Math.pow((Math.pow(warm, 4) + Math.pow(cold, 4)) / 2, 0.25);
      double[] flows = enclosure.netFlowsWPerM2(new double[] {aside, warm, aside, cold});
      assertThat(flows[0]).isCloseTo(0, within(1e-9));
      EquivalentConductivity equivalent =
          EquivalentConductivity.at(
              new CavityBox(side, side),
              new Emissivities(emissivity, emissivity),
              RadiationForm.SERIES,
              difference,
              283);
      double correction = 1 + Math.pow(difference / 2 / 283, 2);
      assertThat(flows[1] / difference)
          .isCloseTo(equivalent.radiationWPerM2K() * correction, within(1e-9));
      assertThat(equivalent.gasConductivityWPerMK() + side * flows[1] / difference / correction)
          .isCloseTo(equivalent.conductivityWPerMK(), within(1e-10));
    }
  }

  @Test
  void bareFacesExchangeNothing() {
    Radiosity box = uncut(outline(0, 0, 1, 0, 1, 1, 0, 1), 0);
    assertThat(box.netFlowsWPerM2(new double[] {200, 300, 250, 310})).containsOnly(0.0);
  }

  @Test
  void refusesWhatIsNoEnclosure() {
    assertThatThrownBy(() -> uncut(outline(0, 0, 1, 0), 0.9))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> uncut(outline(0, 0, 0, 1, 1, 1, 1, 0), 0.9))
        .hasMessageContaining("counter-clockwise");
    assertThatThrownBy(() -> uncut(outline(0, 0, 1, 1, 1, 0, 0, 1), 0.9))
        .hasMessageContaining("crosses");
    assertThatThrownBy(() -> uncut(outline(0, 0, 2, 0, 2, 1, 1, 0, 0, 1), 0.9))
        .hasMessageContaining("touches");
    assertThatThrownBy(() -> uncut(outline(0, 0, 2, 0, 2, 1, 3, 1, 1, 1, 0, 1), 0.9))
        .hasMessageContaining("touches");
    assertThatThrownBy(() -> uncut(outline(0, 0, 1, 0, 0, 1), 1.2))
        .hasMessageContaining("emissivity");
    Radiosity triangle = uncut(outline(0, 0, 1, 0, 0, 1), 0.9);
    assertThatThrownBy(() -> triangle.netFlowsWPerM2(new double[] {1, 2}))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> triangle.netFlowsWPerM2(new double[] {1, 2, -3}))
        .isInstanceOf(IllegalArgumentException.class);
  }
}
