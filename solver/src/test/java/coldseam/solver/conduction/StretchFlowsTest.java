package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.data.Percentage.withPercentage;

import coldseam.solver.detail.Space;
import org.junit.jupiter.api.Test;

class StretchFlowsTest {
  /** A corner with fixed faces, each face in several stretches whose ends are not corners. */
  @Test
  void stretchesAtFixedTemperatureAddUpToTheSpace() {
    Space inside = space("indoors", 20, 0);
    Space outside = space("outdoors", -5, 0);
    Solution solution =
        new Sketch()
            .know(inside)
            .know(outside)
            .polygon(material("stone", 1.7), 0, 0, 3, 0, 3, 1, 1, 1, 1, 3, 0, 3)
            .facing(inside, 3, 1, 2, 1)
            .facing(inside, 2, 1, 1, 1, 1, 1.1)
            .facing(inside, 1, 1.1, 1, 3)
            .facing(outside, 0, 3, 0, 2)
            .facing(outside, 0, 2, 0, 0, 1.3, 0)
            .facing(outside, 1.3, 0, 3, 0)
            .solve();
    double[] temperatures = {20, -5};
    double flow = solution.spaceFlow(0, temperatures);
    double[] stretches = new double[6];
    for (int s = 0; s < 6; s++) {
      stretches[s] = solution.stretchFlow(s, temperatures);
    }

    assertThat(stretches[0] + stretches[1] + stretches[2]).isCloseTo(flow, within(1e-9 * flow));
    assertThat(stretches[3] + stretches[4] + stretches[5]).isCloseTo(-flow, within(1e-9 * flow));
    assertThat(solution.spaceFlow(1, temperatures)).isEqualTo(-flow);
    for (int s = 0; s < 3; s++) {
      assertThat(stretches[s]).isPositive();
      assertThat(stretches[3 + s]).isNegative();
    }
    // far along the arm the flow is that of the undisturbed wall, λ ΔT/d = 42.5 W/m²
    assertThat(stretches[0]).isCloseTo(42.5, withPercentage(1));
    // the mirror image of the outer stretch from 2 to 3 is that from 3 down to 2
    assertThat(stretches[3]).isCloseTo(-42.5, withPercentage(1));
  }

  /** By symmetry the two legs of the same corner carry the same. */
  @Test
  void aFixedCornerIsSharedEvenlyByTheTwoLegs() {
    Space inside = space("indoors", 1, 0);
    Space outside = space("outdoors", 0, 0);
    Solution solution =
        new Sketch()
            .know(inside)
            .know(outside)
            .polygon(material("stone", 1), 0, 0, 3, 0, 3, 1, 1, 1, 1, 3, 0, 3)
            .facing(inside, 3, 1, 1, 1)
            .facing(inside, 1, 1, 1, 3)
            .facing(outside, 0, 3, 0, 0, 3, 0)
            .solve();
    double[] temperatures = {1, 0};

    assertThat(solution.stretchFlow(0, temperatures))
        .isCloseTo(solution.stretchFlow(1, temperatures), withPercentage(0.05));
  }

  /** Beside a stretch with a film, fixed temperature and given flow meet in one vertex each. */
  @Test
  void everythingThatEntersLeaves() {
    Space warm = space("warm", 20, 0.13);
    Space fixed = space("fixed", 3, 0);
    Solution solution =
        new Sketch()
            .know(warm)
            .know(fixed)
            .box(material("block", 0.8), 0, 0, 2, 1)
            .facing(warm, 0, 0, 0, 1)
            .facing(fixed, 0, 1, 0.7, 1)
            .flow(35, 0.7, 1, 2, 1)
            .facing(fixed, 2, 0, 2, 1)
            .flow(-10, 0.3, 0, 1, 0)
            .solve();
    double[] temperatures = {20, 3};
    double given = 35 * 1.3 - 10 * 0.7;
    double sum = 0;
    for (int s = 0; s < 5; s++) {
      sum += solution.stretchFlow(s, temperatures);
    }

    assertThat(solution.prescribedFlow()).isCloseTo(given, within(1e-12));
    assertThat(solution.stretchFlow(2, temperatures)).isCloseTo(35 * 1.3, within(1e-12));
    assertThat(solution.stretchFlow(4, temperatures)).isCloseTo(-7, within(1e-12));
    assertThat(solution.stretchFlow(0, temperatures))
        .isCloseTo(solution.spaceFlow(0, temperatures), within(1e-9 * given));
    assertThat(solution.stretchFlow(1, temperatures) + solution.stretchFlow(3, temperatures))
        .isCloseTo(solution.spaceFlow(1, temperatures), within(1e-9 * given));
    assertThat(sum).isCloseTo(0, within(1e-9 * given));
    assertThat(solution.spaceFlow(0, temperatures) + solution.spaceFlow(1, temperatures) + given)
        .isCloseTo(0, within(1e-9 * given));
  }

  /** Exact: a rod that is heated at one end with q and cooled at the other through Rs. */
  @Test
  void givenFlowWarmsTheHeatedFace() {
    Space air = space("air", 5, 0.04);
    Solution solution =
        new Sketch()
            .know(air)
            .box(material("rod", 0.5), 0, 0, 0.2, 0.1)
            .flow(40, 0, 0, 0, 0.1)
            .facing(air, 0.2, 0, 0.2, 0.1)
            .solve();
    double[] temperatures = {5};

    assertThat(solution.temperatures(temperatures).at(new coldseam.mesh.plane.Point(0, 0.05)))
        .isCloseTo(5 + 40 * (0.2 / 0.5 + 0.04), within(1e-10));
    assertThat(solution.spaceFlow(0, temperatures)).isCloseTo(-4, within(1e-12));
    assertThat(solution.stretchFlow(1, temperatures)).isCloseTo(-4, within(1e-11));
    assertThat(solution.matrix(0, 0)).isCloseTo(0, within(1e-12));
  }

  @Test
  void equalTemperaturesCarryExactlyNothing() {
    Space a = space("a", 17, 0.13);
    Space b = space("b", 17, 0);
    Space c = space("c", 17, 0.04);
    Solution solution =
        new Sketch()
            .know(a)
            .know(b)
            .know(c)
            .box(material("block", 0.8), 0, 0, 2, 1)
            .box(material("foil", 160), 0.5, 0, 0.501, 1)
            .facing(a, 0, 0, 0, 1)
            .facing(b, 0.7, 1, 2, 1)
            .facing(c, 2, 0, 2, 0.5)
            .solve();
    double[] temperatures = {17, 17, 17};
    TemperatureField field = solution.temperatures(temperatures);

    for (int i = 0; i < 3; i++) {
      assertThat(solution.spaceFlow(i, temperatures)).isZero();
      assertThat(solution.stretchFlow(i, temperatures)).isZero();
    }
    for (int n = 0; n < solution.mesh().vertexCount(); n++) {
      assertThat(field.atNode(n)).isEqualTo(17);
    }
  }

  @Test
  void aStretchAlongACutOffPlaneCarriesNothing() {
    Space a = space("a", 20, 0.13);
    Space b = space("b", 0, 0.04);
    Solution solution =
        new Sketch()
            .know(a)
            .know(b)
            .box(material("block", 0.8), 0, 0, 2, 1)
            .facing(a, 0, 0, 0, 1)
            .facing(b, 2, 0, 2, 1)
            .along(0, 0, 2, 0)
            .solve();

    assertThat(solution.stretchFlow(2, new double[] {20, 0})).isZero();
  }
}
