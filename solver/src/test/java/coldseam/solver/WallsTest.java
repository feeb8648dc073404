package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static coldseam.solver.DrawnDetail.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.EdgeCondition;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;

/**
 * Walls whose U is known: layers by ISO 6946, framed walls between the two resistance limits of ISO
 * 6946 and against separate elements of high degree on graded meshes ("computed").
 */
class WallsTest {
  /** 1 h·ft²·°F/Btu in m²·K/W. */
  private static final double R_IP = 0.1761102;

  private static final double INCH = 25.4;
  private static final List<String> IN = List.of("indoors");
  private static final List<String> OUT = List.of("outdoors");

  private static Wanted.Transmittance u() {
    return new Wanted.Transmittance("wall", IN, OUT, OptionalDouble.empty());
  }

  /** Layers upwards from y = 0, each {thickness in mm, λ}. */
  private static DrawnDetail layered(Space inside, Space outside, double[]... layers) {
    double top = 0;
    for (double[] layer : layers) {
      top += layer[0];
    }
    DrawnDetail drawn =
        new DrawnDetail().box(inside, 0, -300, 400, 0).box(outside, 0, top, 400, top + 300);
    double y = 0;
    for (int i = 0; i < layers.length; i++) {
      drawn.box(material("layer " + i, layers[i][1]), 0, y, 400, y + layers[i][0]);
      y += layers[i][0];
    }
    return drawn.want(u());
  }

  /** ISO 6946 by hand: RT 4.684316, U 0.213478; interface temperatures at 20/−5 °C. */
  @Test
  void layered_wall_a() {
    Result result =
        layered(
                room("indoors", 20),
                outdoors(-5),
                new double[] {15, 0.57},
                new double[] {240, 0.50},
                new double[] {140, 0.035},
                new double[] {8, 1.0})
            .point("inside", 200, 0, FilmSet.HEAT_LOSS)
            .point("plaster", 200, 15, FilmSet.HEAT_LOSS)
            .point("brick", 200, 255, FilmSet.HEAT_LOSS)
            .point("insulation", 200, 395, FilmSet.HEAT_LOSS)
            .point("render", 200, 403, FilmSet.HEAT_LOSS)
            .solve(1e-3);
    Result.EffectiveTransmittance wall = result.transmittances().get(0);
    assertThat(wall.widthM()).isCloseTo(0.4, within(1e-9));
    assertThat(wall.valueWPerM2K().value()).isCloseTo(0.213478349, within(1e-9));
    assertThat(wall.resistanceM2KPerW().value()).isCloseTo(4.684316, within(1e-6));
    double[] expected = {19.3062, 19.1657, 16.6040, -4.7438, -4.7865};
    for (int i = 0; i < expected.length; i++) {
      assertThat(result.points().get(i).temperatureC()).isCloseTo(expected[i], within(6e-5));
    }
    Result.SpaceResult indoors = result.spaces().get(0);
    assertThat(indoors.heatFlowWPerM()).isCloseTo(0.4 * 5.336959, within(1e-6));
    // with Rsi 0.25
    assertThat(indoors.coldest().orElseThrow().fRsi().orElseThrow())
        .isCloseTo(0.947963, within(1e-6));
    assertThat(result.warnings()).isEmpty();
    assertThat(result.assumptions())
        .anyMatch(a -> a.what().equals("width of wall") && a.value().startsWith("400 mm"))
        .anyMatch(a -> a.what().equals("cut-off planes of the module"));
  }

  /** ISO 6946 by hand: RT 4.123460, U 0.242515. */
  @Test
  void layered_wall_b() {
    Result result =
        layered(
                room("indoors", 20),
                outdoors(-5),
                new double[] {13, 0.40},
                new double[] {100, 0.15},
                new double[] {100, 0.034},
                new double[] {50, 0.05 / 0.18},
                new double[] {102.5, 0.77})
            .solve(1e-3);
    assertThat(result.transmittances().get(0).resistanceM2KPerW().value())
        .isCloseTo(4.123460, within(1e-6));
    assertThat(result.transmittances().get(0).valueWPerM2K().value())
        .isCloseTo(0.242515, within(1e-6));
  }

  /** One half module, stud half at the left. */
  private static DrawnDetail timberWall(
      Space inside, Space outside, double pitch, double stud, double depth, double[]... layers) {
    double boards = 0;
    for (double[] layer : layers) {
      boards += layer[0];
    }
    double half = pitch / 2;
    DrawnDetail drawn =
        new DrawnDetail().box(inside, 0, -300, half, 0).box(outside, 0, boards, half, boards + 300);
    double y = 0;
    for (double[] layer : layers) {
      drawn.box(material("λ " + layer[1], layer[1]), 0, y, half, y + layer[0]);
      if (layer[0] == depth) {
        drawn.box(material("stud", layer[2]), 0, y, stud / 2, y + depth);
      }
      y += layer[0];
    }
    return drawn
        .symmetry("middle of the stud", 0, 0, 0, boards)
        .symmetry("middle of the bay", half, 0, half, boards)
        .want(u());
  }

  /** ISO 6946 limits R''T 4.971391 and R'T 5.227378; computed U 0.197013, R 5.075808. */
  @Test
  void timber_stud_wall_lies_between_the_two_limits() {
    Result result =
        timberWall(
                room("indoors", 1),
                outdoors(0),
                600,
                45,
                140,
                new double[] {12.5, 0.25},
                new double[] {140, 0.035, 0.13},
                new double[] {11, 0.130001},
                new double[] {60, 0.045},
                new double[] {10, 1.0})
            .point("stud", 0, 0, FilmSet.HEAT_LOSS)
            .point("bay", 300, 0, FilmSet.HEAT_LOSS)
            .solve(1e-4);
    double r = result.transmittances().get(0).resistanceM2KPerW().value();
    assertThat(r).isBetween(4.971391, 5.227378);
    assertThat(r).isCloseTo(5.075808, within(2e-4 * 5.075808));
    assertThat(result.transmittances().get(0).valueWPerM2K().value())
        .isCloseTo(0.197013, within(2e-4 * 0.197013));
    assertThat(result.points().get(0).temperatureC()).isCloseTo(0.951867, within(2e-4));
    assertThat(result.points().get(1).temperatureC()).isCloseTo(0.977197, within(2e-4));
  }

  /** Clear walls of 1.5 in wood studs, computed, with their ISO 6946 limits; h·ft²·°F/Btu. */
  @Test
  void wood_stud_walls_in_inches() {
    double wood = 0.115382;
    double gypsum = 0.160969;
    double[][] walls = {
      {16, 3.5, 13, 13.2306, 13.0221, 13.3677},
      {24, 3.5, 13, 13.7861, 13.6239, 13.8850},
      {16, 5.5, 19, 18.5331, 18.3542, 18.6719}
    };
    for (double[] wall : walls) {
      double depth = wall[1] * INCH;
      double cavity = depth / 1000 / (wall[2] * R_IP);
      Result result =
          timberWall(
                  space("indoors", 1, Exposure.INSIDE, 0.68 * R_IP),
                  space("outdoors", 0, Exposure.OUTSIDE, 0.25 * R_IP),
                  wall[0] * INCH,
                  1.5 * INCH,
                  depth,
                  new double[] {0.625 * INCH, gypsum},
                  new double[] {depth, cavity, wood},
                  new double[] {0.625 * INCH, gypsum})
              .solve(1e-4);
      double r = result.transmittances().get(0).resistanceM2KPerW().value() / R_IP;
      assertThat(r).isBetween(wall[4], wall[5]);
      assertThat(r).isCloseTo(wall[3], within(5e-4 * wall[3]));
      // one film in both sets: solved once
      assertThat(result.surface()).containsSame(result.heatLoss());
    }
  }

  /** R-13 between 0.043 in steel studs at 16 in: computed 8.5644 h·ft²·°F/Btu. */
  @Test
  void steel_stud_wall() {
    double half = 8 * INCH;
    double board = 0.625 * INCH;
    double depth = 3.5 * INCH;
    double flange = 1.625 * INCH;
    double lip = 0.5 * INCH;
    double t = 0.043 * INCH;
    double w = -flange / 2;
    double top = 2 * board + depth;
    coldseam.solver.detail.Material steel = material("steel", 50);
    Result result =
        new DrawnDetail()
            .box(space("indoors", 1, Exposure.INSIDE, 0.68 * R_IP), -half, -300, half, 0)
            .box(space("outdoors", 0, Exposure.OUTSIDE, 0.25 * R_IP), -half, top, half, top + 300)
            .box(material("gypsum", board / 1000 / (0.56 * R_IP)), -half, 0, half, top)
            .box(material("batt", depth / 1000 / (13 * R_IP)), -half, board, half, board + depth)
            .box(steel, w, board, w + t, board + depth)
            .box(steel, w, board, w + flange, board + t)
            .box(steel, w, board + depth - t, w + flange, board + depth)
            .box(steel, w + flange - t, board, w + flange, board + lip)
            .box(steel, w + flange - t, board + depth - lip, w + flange, board + depth)
            .want(u())
            .solve(1e-3);
    double r = result.transmittances().get(0).resistanceM2KPerW().value() / R_IP;
    assertThat(r).isCloseTo(8.5644, within(0.002 * 8.5644));
    assertThat(result.transmittances().get(0).widthM()).isCloseTo(0.4064, within(1e-9));
  }

  /** Exact: q = 10 W/m² into a wall from an insulated face leaves through the film outdoors. */
  @Test
  void a_prescribed_flow_warms_the_wall_by_its_resistance() {
    Result result =
        new DrawnDetail()
            .box(material("brick", 0.5), 0, 0, 400, 200)
            .facing("outside", "outdoors", 0, 200, 400, 200)
            .know(outdoors(-5))
            .stretch("heated", new EdgeCondition.HeatFlow(10), 0, 0, 400, 0)
            .point("heated face", 200, 0, FilmSet.HEAT_LOSS)
            .solve(1e-3);
    assertThat(result.points().get(0).temperatureC())
        .isCloseTo(-5 + 10 * (0.2 / 0.5 + 0.04), within(1e-7));
    assertThat(result.spaces().get(0).heatFlowWPerM()).isCloseTo(-4, within(1e-9));
    assertThat(result.stretches())
        .extracting(Result.StretchResult::name, Result.StretchResult::space)
        .containsExactly(
            org.assertj.core.groups.Tuple.tuple("outside", "outdoors"),
            org.assertj.core.groups.Tuple.tuple("heated", ""));
    assertThat(result.stretches().get(1).heatFlowWPerM()).isCloseTo(4, within(1e-9));
    assertThat(result.stretches().get(0).heatFlowWPerM()).isCloseTo(-4, within(1e-9));
    assertThat(result.stretches().get(0).lengthM()).isCloseTo(0.4, within(1e-9));
    assertThat(Math.abs(result.balance().relative())).isLessThan(1e-9);
    // no inside space, so no surface films and no factor
    assertThat(result.surface()).isEmpty();
    assertThat(result.spaces().get(0).coldest().orElseThrow().filmSet())
        .isEqualTo(FilmSet.HEAT_LOSS);
    assertThat(result.spaces().get(0).coldest().orElseThrow().fRsi()).isEmpty();
  }

  /**
   * ISO 10211 validation case 1 (exact series): temperatures are finite, the heat flow between the
   * two fixed temperatures is not.
   */
  @Test
  void fixed_temperatures_that_meet_give_temperatures_and_an_infinite_flow() {
    Result result =
        new DrawnDetail()
            .box(material("solid", 1), 0, 0, 200, 400)
            .know(space("hot", 20, Exposure.INSIDE, 0))
            .know(space("cold", 0, Exposure.OUTSIDE, 0))
            .facing("top", "hot", 0, 400, 200, 400)
            .facing("sides", "cold", 0, 400, 0, 0, 200, 0)
            .symmetry("axis", 200, 0, 200, 400)
            .want(
                new Wanted.Transmittance(
                    "wall", List.of("hot"), List.of("cold"), OptionalDouble.of(1)))
            .point("row 1 column 1", 50, 350, FilmSet.HEAT_LOSS)
            .point("centre", 200, 200, FilmSet.SURFACE)
            .solve(1e-3);
    assertThat(result.points().get(0).temperatureC()).isCloseTo(9.6582, within(0.02));
    assertThat(result.points().get(1).temperatureC()).isCloseTo(5, within(0.02));
    assertThat(result.couplings().get(0).valueWPerMK().value()).isInfinite();
    assertThat(result.couplings().get(0).valueWPerMK().certified()).isFalse();
    assertThat(result.spaces().get(0).heatFlowWPerM()).isEqualTo(Double.POSITIVE_INFINITY);
    assertThat(result.spaces().get(1).heatFlowWPerM()).isEqualTo(Double.NEGATIVE_INFINITY);
    assertThat(result.transmittances().get(0).valueWPerM2K().value()).isInfinite();
    assertThat(result.transmittances().get(0).resistanceM2KPerW().value()).isZero();
    assertThat(result.transmittances().get(0).resistanceM2KPerW().halfWidth()).isInfinite();
    assertThat(result.balance().relative()).isNaN();
    assertThat(result.spaces().get(0).coldest().orElseThrow().fRsi()).isEmpty();
    assertThat(result.spaces().get(0).coldest().orElseThrow().temperatureC()).isEqualTo(20);
  }

  /** Exact: temperature falls linearly in each layer; the surface profile is level. */
  @Test
  void profiles_run_across_the_wall_and_along_its_surface() {
    Result result =
        layered(room("indoors", 20), outdoors(0), new double[] {200, 0.5})
            .want(
                new Wanted.Profile(
                    "across", new Point(0.1, 0), new Point(0.1, 0.2), 5, FilmSet.HEAT_LOSS))
            .want(
                new Wanted.Profile(
                    "beyond", new Point(0.1, 0.1), new Point(0.1, 0.3), 3, FilmSet.HEAT_LOSS))
            .want(new Wanted.SurfaceProfile("face", "indoors", FilmSet.SURFACE))
            .solve(1e-3);
    double q = 20 / (0.13 + 0.2 / 0.5 + 0.04);
    List<Result.Sample> across = result.profiles().get(0).samples();
    for (int i = 0; i < 5; i++) {
      assertThat(across.get(i).distanceM()).isCloseTo(0.05 * i, within(1e-12));
      assertThat(across.get(i).temperatureC())
          .isCloseTo(20 - q * (0.13 + 0.05 * i / 0.5), within(1e-7));
    }
    assertThat(result.profiles().get(1).samples().get(2).temperatureC()).isNaN();
    assertThat(result.profiles().get(1).samples().get(1).temperatureC()).isNotNaN();
    List<Result.Sample> face = result.profiles().get(2).samples();
    assertThat(face.get(face.size() - 1).distanceM()).isCloseTo(0.4, within(1e-9));
    double surface = 20 - 20 / (0.25 + 0.2 / 0.5 + 0.04) * 0.25;
    assertThat(face).allSatisfy(s -> assertThat(s.temperatureC()).isCloseTo(surface, within(1e-7)));
    for (int i = 1; i < face.size(); i++) {
      assertThat(face.get(i).at().distance(face.get(i - 1).at()))
          .isCloseTo(face.get(i).distanceM() - face.get(i - 1).distanceM(), within(1e-9));
    }
  }

  @Test
  void runs_of_surface_that_do_not_join_are_kept_apart_in_a_profile() {
    Result result =
        layered(room("indoors", 20), outdoors(0), new double[] {200, 0.5})
            .stretch("shut", new EdgeCondition.CutOff(false), 100, 0, 200, 0)
            .want(new Wanted.SurfaceProfile("face", "indoors", FilmSet.SURFACE))
            .solve(1e-3);
    List<Result.Sample> face = result.profiles().get(0).samples();
    assertThat(face).filteredOn(s -> Double.isNaN(s.temperatureC())).hasSize(1);
    assertThat(face.get(face.size() - 1).distanceM()).isCloseTo(0.3, within(1e-9));
  }

  @Test
  void what_cannot_be_worked_out_is_refused_with_its_reason() {
    DrawnDetail outside =
        layered(room("indoors", 20), outdoors(0), new double[] {200, 0.5})
            .point("air", 200, -50, FilmSet.HEAT_LOSS)
            .want(new Wanted.SurfaceProfile("face", "attic", FilmSet.SURFACE));
    assertThat(catchThrowableOfType(DetailException.class, outside::inspect).faults())
        .extracting(f -> f.part() + " " + f.name() + ": " + f.message())
        .containsExactly(
            "point air: lies outside the conducting section, 50 mm from its outline",
            "profile face: names 'attic', which is not one of the spaces");
    DrawnDetail threePlanes =
        layered(room("indoors", 20), outdoors(0), new double[] {200, 0.5})
            .box(room("indoors", 20), 0, 600, 400, 700)
            .box(material("other", 0.5), 0, 700, 400, 800)
            .box(outdoors(0), 0, 800, 400, 900);
    assertThat(catchThrowableOfType(DetailException.class, threePlanes::inspect).faults())
        .singleElement()
        .matches(f -> f.message().contains("state its width: 4 cut-off planes"));
    Space nothing = room("indoors", 20);
    DrawnDetail empty = new DrawnDetail().box(nothing, 0, 0, 1, 1);
    assertThat(catchThrowableOfType(DetailException.class, empty::inspect).faults()).isNotEmpty();
    assertThat(
            catchThrowableOfType(DetailException.class, () -> new DrawnDetail().inspect()).faults())
        .singleElement()
        .matches(f -> f.message().contains("area"));
  }

  @Test
  void doubtful_drawing_is_told_with_place_size_and_names() {
    DrawnDetail drawn =
        layered(room("indoors", 20), outdoors(0), new double[] {200, 0.5})
            .facing("face", "indoors", FilmRule.uniform(0.1, "typed"), 100, 0, 600, 0);
    assertThat(drawn.inspect().warnings())
        .anyMatch(w -> w.contains("'face'") && w.contains("200 mm of its 500 mm"));
    DrawnDetail gap =
        new DrawnDetail()
            .box(room("indoors", 20), 0, -300, 400, 0)
            .box(outdoors(0), 0, 200, 400, 500)
            .box(material("left", 0.5), 0, 0, 200, 200)
            .box(material("right", 0.6), 200.05, 0, 400, 200);
    assertThat(gap.inspect().warnings())
        .anyMatch(
            w ->
                w.matches("gap of 0[.]0(5|4999) mm .*")
                    && w.contains("'left' and 'right'")
                    && w.contains("(200, 100) mm"));
  }

  /**
   * Exact: indoors, wall, a first floating space, a conductance, a second floating space, wall,
   * outdoors; one after the other, so that temperatures divide like resistances.
   */
  @Test
  void two_floating_spaces_in_a_row_divide_the_difference_like_resistances() {
    Space first = DrawnDetail.floating(room("first", 0), 0.7, "second");
    Space second = DrawnDetail.floating(room("second", 0), 0, "");
    Result result =
        new DrawnDetail()
            .box(room("indoors", 20), 0, -200, 400, 0)
            .box(material("brick", 0.5), 0, 0, 400, 200)
            .box(first, 0, 200, 400, 400)
            .box(second, 0, 600, 400, 800)
            .box(material("timber", 0.13), 0, 800, 400, 900)
            .box(outdoors(0), 0, 900, 400, 1100)
            .want(new Wanted.Transmittance("all", IN, OUT, OptionalDouble.of(0.4)))
            .solve(1e-3);
    double r1 = (0.13 + 0.2 / 0.5 + 0.13) / 0.4;
    double r2 = 1 / 0.7;
    double r3 = (0.13 + 0.1 / 0.13 + 0.04) / 0.4;
    double flow = 20 / (r1 + r2 + r3);
    assertThat(temperature(result, "first")).isCloseTo(20 - flow * r1, within(1e-7));
    assertThat(temperature(result, "second")).isCloseTo(flow * r3, within(1e-7));
    assertThat(result.transmittances().get(0).valueWPerM2K().value())
        .isCloseTo(flow / 20 / 0.4, within(1e-9));
    assertThat(Math.abs(result.balance().relative())).isLessThan(1e-9);
  }

  private static double temperature(Result result, String name) {
    return result.spaces().stream()
        .filter(s -> s.name().equals(name))
        .mapToDouble(Result.SpaceResult::temperatureC)
        .findFirst()
        .orElseThrow();
  }
}
