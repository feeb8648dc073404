package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.nio.file.Path;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The ground as it is written, and what it adds to a case. */
class GroundReaderTest {
  private static final String HEAD =
      Written.HEAD
          + """
          values: {wide: 8000}
          materials:
            masonry: {conductivity: 0.5}
            board: {conductivity: 0.035}
          spaces:
            indoors: {temperature: 20, exposure: inside}
            outdoors: {temperature: 0, exposure: outside}
          """;

  private static final String SLAB =
      """
      section:
        - {fill: indoors, box: [-4000, 0, 0, 1500]}
        - {fill: board, box: [-4000, -100, 0, 0]}
        - {fill: masonry, box: [0, -600, 300, 1500]}
      """;

  private static final String PLACE =
      "wall: [0, 300], floor-level: 0, ground-level: -100, between: [indoors, outdoors]";

  @TempDir private Path folder;

  private Detail detail(String text) throws CaseException {
    return Written.read(folder, text).detail(Optional.empty());
  }

  private static Wanted.FloorEdge edge(Detail detail) {
    return detail.wanted().stream()
        .filter(Wanted.FloorEdge.class::isInstance)
        .map(Wanted.FloorEdge.class::cast)
        .findFirst()
        .orElseThrow();
  }

  /** By hand: R 0.1/0.035, d_t = 0.3 + 2 (0.17 + R + 0.04), U of ISO 13370 for B' 8. */
  @Test
  void a_slab_by_default() throws CaseException {
    Detail detail = detail(HEAD + "ground: {" + PLACE + "}\n" + SLAB);
    Wanted.FloorEdge edge = edge(detail);
    assertThat(edge.characteristicM()).isEqualTo(8);
    assertThat(edge.soilWPerMK()).isEqualTo(2);
    assertThat(edge.resistanceM2KPerW()).isCloseTo(0.1 / 0.035, offset(1e-9));
    double thickness = 0.3 + 2 * (0.21 + 0.1 / 0.035);
    assertThat(edge.equivalentM()).isCloseTo(thickness, offset(1e-9));
    assertThat(edge.floorUWPerM2K())
        .isCloseTo(
            4 / (Math.PI * 8 + thickness) * Math.log(Math.PI * 8 / thickness + 1), offset(1e-9));
    assertThat(detail.areas().get(0).rings().get(0))
        .extracting(p -> Math.round(p.x() * 1000))
        .containsExactly(-4000L, 20300L, 20300L, -4000L);
    assertThat(detail.areas().get(0).rings().get(0))
        .extracting(p -> Math.round(p.y() * 1000))
        .containsExactly(-20100L, -20100L, -100L, -100L);
    assertThat(detail.assumptions())
        .extracting(a -> a.what())
        .contains("width of the floor B'", "block of soil", "R of the floor");
    assertThat(detail.wanted())
        .filteredOn(Wanted.Psi.class::isInstance)
        .extracting(w -> ((Wanted.Psi) w).name())
        .containsExactly("floor edge internal A", "floor edge external A", "floor edge internal B");
  }

  /** The same building mirrored has the same numbers. */
  @Test
  void outdoors_may_lie_on_the_left() throws CaseException {
    String mirrored =
        """
        ground: {wall: [0, -300], floor-level: 0, ground-level: -100, between: [indoors, outdoors]}
        section:
          - {fill: indoors, box: [4000, 0, 0, 1500]}
          - {fill: board, box: [4000, -100, 0, 0]}
          - {fill: masonry, box: [0, -600, -300, 1500]}
        """;
    Result right = solved(HEAD + "ground: {" + PLACE + "}\n" + SLAB);
    Result left = solved(HEAD + mirrored);
    for (int i = 0; i < 3; i++) {
      assertThat(left.psi().get(i).valueWPerMK().value())
          .isCloseTo(right.psi().get(i).valueWPerMK().value(), offset(1e-3));
    }
    assertThat(left.floorEdge().orElseThrow().factorWPerMK().getAsDouble())
        .isCloseTo(right.floorEdge().orElseThrow().factorWPerMK().getAsDouble(), offset(1e-3));
  }

  private Result solved(String text) throws CaseException {
    return Solver.solve(detail(text), Accuracy.STANDARD, Progress.SILENT);
  }

  /**
   * F is the flow through the floor's surface for each kelvin: what is left of L2D is the wall's.
   */
  @Test
  void the_factor_of_the_edge_is_the_flow_through_the_floor() throws CaseException {
    Result result =
        solved(
            HEAD
                + "ground: {"
                + PLACE
                + "}\nstretches: {inner face: {along: [[0, 0], [0, 1500]]}}\n"
                + SLAB);
    double wall =
        result.stretches().stream()
            .filter(s -> s.name().equals("inner face"))
            .findFirst()
            .orElseThrow()
            .heatFlowWPerM();
    double factor = result.floorEdge().orElseThrow().factorWPerMK().getAsDouble();
    assertThat(factor + wall / 20)
        .isCloseTo(result.couplings().get(0).valueWPerMK().value(), offset(1e-6));
    assertThat(factor).isBetween(0.5, 1.5);
  }

  @Test
  void what_is_typed_replaces_what_is_drawn() throws CaseException {
    Wanted.FloorEdge edge =
        edge(
            detail(
                HEAD
                    + "ground: {"
                    + PLACE
                    + ", width: 6 m, soil: clay, resistance: 2.0, psi: false,"
                    + " edge: {lies: vertical, extent: 1 m, thickness: 70, conductivity: 0.035}}\n"
                    + SLAB.replace("-4000", "-3000")));
    assertThat(edge.soilWPerMK()).isEqualTo(1.5);
    double t = 0.3 + 1.5 * 2.21;
    double u = 3 / (Math.PI * 6 + t) * Math.log(Math.PI * 6 / t + 1);
    double extra = (2 - 0.07 / 1.5) * 1.5;
    double edgePsi = -1.5 / Math.PI * (Math.log(2 / t + 1) - Math.log(2 / (t + extra) + 1));
    assertThat(edge.floorUWPerM2K()).isCloseTo(u + 2 * edgePsi / 6, offset(1e-9));
  }

  private static final String SUSPENDED =
      HEAD.replace("  outdoors:", "  crawl space: {floats: true, exposure: inside}\n  outdoors:")
          + """
          ground:
            floor: suspended
            wall: [0, 300]
            floor-level: 0
            ground-level: -400
            between: [indoors, outdoors]
          section:
            - {fill: indoors, box: [-4000, 0, 0, 1500]}
            - {fill: board, box: [-4000, -100, 0, 0]}
            - {fill: masonry, box: [0, -900, 300, 1500]}
            - {fill: crawl space, box: [-4000, -400, 0, -100]}
          """;

  private static final String VOID =
      "  void: {space: crawl space, height: 400, wall-U: 1.3, openings: 1500, wind: 4,"
          + " shielding: average}\n";

  /** Couplings only, unless the void is described and a ψ asked for. */
  @Test
  void a_suspended_floor_gives_couplings_first() throws CaseException {
    Result plain = solved(SUSPENDED);
    assertThat(plain.psi()).isEmpty();
    assertThat(plain.couplings()).hasSize(3);
    assertThat(plain.floorEdge().orElseThrow().factorWPerMK()).isEmpty();
    assertThat(plain.floorEdge().orElseThrow().of().kind()).isEqualTo("suspended floor");

    Detail described = detail(SUSPENDED.replace("section:", VOID + "  psi: true\nsection:"));
    Space crawl = described.spaces().get(described.spaceIndex("crawl space"));
    assertThat(crawl.floating().orElseThrow().conductanceWPerMK()).isCloseTo(0.2175, offset(1e-9));
    Result result = Solver.solve(described, Accuracy.STANDARD, Progress.SILENT);
    assertThat(result.psi()).hasSize(1);
    Result.LinearTransmittance psi = result.psi().get(0);
    assertThat(psi.subtracted()).extracting(Result.Subtracted::name).contains("floor by ISO 13370");
    assertThat(result.assumptions())
        .anyMatch(a -> a.source().startsWith("ISO 10211:2017") && a.value().contains("suspended"));
    double colder = result.spaces().get(described.spaceIndex("crawl space")).temperatureC();
    double warmer = plain.spaces().get(described.spaceIndex("crawl space")).temperatureC();
    assertThat(colder).isLessThan(warmer);
  }

  @Test
  void a_cellar_takes_off_its_walls_in_the_ground() throws CaseException {
    String cellar =
        HEAD
            + """
            ground:
              floor: cellar
              wall: [0, 300]
              floor-level: -2000
              ground-level: 0
              between: [indoors, outdoors]
              psi: true
            section:
              - {fill: indoors, box: [-4000, -2000, 0, 1500]}
              - {fill: board, box: [-4000, -2100, 0, -2000]}
              - {fill: masonry, box: [0, -2100, 300, 1500]}
            """;
    Result result = solved(cellar);
    assertThat(result.psi().get(0).subtracted())
        .extracting(Result.Subtracted::name)
        .containsExactly("wall", "wall below the ground by ISO 13370", "floor by ISO 13370");
    Wanted.FloorEdge of = result.floorEdge().orElseThrow().of();
    double wall = 2 * (0.13 + 0.6 + 0.04);
    double t = Math.min(wall, 0.3 + 2 * (0.21 + 0.1 / 0.035));
    assertThat(of.wallUWPerM2K().getAsDouble())
        .isCloseTo(
            4 / (Math.PI * 2) * (1 + 0.5 * t / (t + 2)) * Math.log(2 / wall + 1), offset(1e-9));
    assertThat(Math.abs(result.psi().get(0).valueWPerMK().value())).isLessThan(0.3);
  }

  @Test
  void what_is_wrong_with_a_ground() {
    assertThat(
            Written.problems(
                folder,
                HEAD
                    + "ground: {floor: cellar, wall: [0, 0], floor-level: 0, ground-level: -100,"
                    + " void: {space: x}, soil: hollow}\n"
                    + SLAB))
        .containsExactly(
            "10:9: `ground` has no `between`; add `between: [indoors, outdoors]`",
            "10:31: the wall has no thickness; write `[x inside, x outside]`",
            "10:39: the floor of the cellar does not lie below the ground; give a `floor-level` below"
                + " `ground-level`, or `floor: slab`",
            "10:75: `void` belongs to a suspended floor; leave it away, or write `floor: suspended`",
            "10:81: `void` of `ground` has no `height`; add `height: 0.3 m`, of the floor over the"
                + " ground",
            "10:81: `void` of `ground` has no `wall-U`; add `wall-U: 1.5`, of its walls",
            "10:81: `void` of `ground` has no `openings`; add `openings: 1500`, mm2 per m of edge",
            "10:81: `void` of `ground` has no `wind`; add `wind: 4`, in m/s",
            "10:81: `void` of `ground` has no `shielding`; add `shielding: average`, `sheltered` or"
                + " `exposed`",
            "10:99: the soil conducts nothing; name a material, e.g. `sand and gravel`");
    assertThat(Written.problems(folder, HEAD + "ground: {" + PLACE + ", width: 9 m}\n" + SLAB))
        .containsExactly(
            "10:1: no floor is met at its plane of symmetry, (-4500, 0) mm; draw the floor from the"
                + " wall to there, half its width, or type `resistance`");
    assertThat(Written.problems(folder, HEAD + "view: plan\nground: {" + PLACE + "}\n" + SLAB))
        .containsExactly(
            "11:1: the ground lies below; draw a vertical view with up as up: leave `up` away");
    assertThat(Written.problems(folder, SUSPENDED.replace("floor: suspended", "floor: slab")))
        .anyMatch(p -> p.contains("`crawl space` is met under the floor"));
  }
}
