package coldseam.solver;

import static coldseam.solver.DrawnDetail.material;
import static coldseam.solver.DrawnDetail.outdoors;
import static coldseam.solver.DrawnDetail.room;
import static coldseam.solver.DrawnDetail.space;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Random;
import org.junit.jupiter.api.Test;

/**
 * Framed walls beside the two resistance limits of ISO 6946, by hand and by elements of high degree
 * on graded meshes ("computed").
 */
class FramingTest {
  private static final double R_IP = 0.1761102;
  private static final double INCH = 25.4;
  private static final long SEED = 6946;

  private static Wanted.Framing framing(
      boolean alongY, String layer, Optional<Wanted.Framing.Fractions> fractions) {
    return new Wanted.Framing("wall", alongY, layer, fractions, Optional.empty());
  }

  private static Wanted.Transmittance u(double width) {
    return new Wanted.Transmittance(
        "wall", List.of("indoors"), List.of("outdoors"), OptionalDouble.of(width / 1000));
  }

  private static DrawnDetail timber() {
    return new DrawnDetail()
        .box(room("indoors", 20), -300, -300, 300, 0)
        .box(outdoors(-5), -300, 233.5, 300, 500)
        .box(material("gypsum", 0.25), -300, 0, 300, 12.5)
        .box(material("wool", 0.035), -300, 12.5, 300, 152.5)
        .box(material("timber", 0.13), -22.5, 12.5, 22.5, 152.5)
        .box(material("board", 0.13), -300, 152.5, 300, 163.5)
        .box(material("wood fibre", 0.045), -300, 163.5, 300, 223.5)
        .box(material("render", 1.0), -300, 223.5, 300, 233.5)
        .want(u(600));
  }

  /** ISO 6946 by hand: R_a 5.647949, R_b 2.724872, R'T 5.227378, R''T 4.971391, RT 5.099384. */
  @Test
  void a_timber_wall_beside_its_limits() {
    Result result = timber().want(framing(false, "wool", Optional.empty())).solve(1e-4);
    Result.Framing framing = result.framings().get(0);
    assertThat(framing.besideR()).isCloseTo(5.647949, within(5.1e-7));
    assertThat(framing.framingR()).isCloseTo(2.724872, within(5.1e-7));
    assertThat(framing.parallelR()).isCloseTo(5.227378, within(5.1e-7));
    assertThat(framing.isothermalR()).isCloseTo(4.971391, within(5.1e-7));
    assertThat(framing.meanR().getAsDouble()).isCloseTo(5.099384, within(1e-6));
    assertThat(framing.meanError()).isCloseTo(0.02510, within(5e-6));
    assertThat(framing.framedShare()).isCloseTo(0.075, within(1e-9));
    assertThat(framing.resistance().value()).isCloseTo(5.075808, within(2e-4 * 5.075808));
    assertThat(framing.lostShare()).isCloseTo(1 - 5.075808 / 5.647949, within(2e-4));
    assertThat(framing.films()).isCloseTo(0.17, within(1e-12));
    assertThat(framing.layerR().getAsDouble()).isCloseTo(4, within(1e-9));
    assertThat(framing.effectiveR().getAsDouble())
        .isCloseTo(5.075808 - 1.647949, within(2e-4 * 5.075808));
    assertThat(framing.framingWPerMK()).isCloseTo((0.197013 - 1 / 5.647949) * 0.6, within(3e-5));
    assertThat(framing.metal()).isFalse();
  }

  /**
   * The limits are of the wall, not of the sheet it is drawn on: turned by 90° they are the same.
   */
  @Test
  void a_wall_may_run_along_y() {
    Result result =
        new DrawnDetail()
            .moved(p -> new Point(-p.y(), p.x()))
            .box(room("indoors", 20), -300, -300, 300, 0)
            .box(outdoors(-5), -300, 140, 300, 400)
            .box(material("wool", 0.035), -300, 0, 300, 140)
            .polygon(material("timber", 0.13), -30, 0, 10, 0, 30, 140, -10, 140)
            .want(u(600))
            .want(framing(true, "", Optional.empty()))
            .solve(1e-3);
    Result lying =
        new DrawnDetail()
            .box(room("indoors", 20), -300, -300, 300, 0)
            .box(outdoors(-5), -300, 140, 300, 400)
            .box(material("wool", 0.035), -300, 0, 300, 140)
            .polygon(material("timber", 0.13), -30, 0, 10, 0, 30, 140, -10, 140)
            .want(u(600))
            .want(framing(false, "", Optional.empty()))
            .solve(1e-3);
    Result.Framing turned = result.framings().get(0);
    Result.Framing flat = lying.framings().get(0);
    assertThat(turned.parallelR()).isCloseTo(flat.parallelR(), within(1e-9));
    assertThat(turned.isothermalR()).isCloseTo(flat.isothermalR(), within(1e-9));
    // planes of one temperature: 40 mm of timber in 600 mm at every depth
    assertThat(flat.isothermalR())
        .isCloseTo(0.17 + 0.14 / ((560 * 0.035 + 40 * 0.13) / 600), within(1e-9));
    // parallel paths: the share of timber runs from 0 to 1 and back along the slanted sides, small
    // steps
    double sum = 0;
    int steps = 600_000;
    for (int i = 0; i < steps; i++) {
      double x = -300 + 600 * (i + 0.5) / steps;
      double first = Math.max(0, Math.min(140, (x - 10) * 7));
      double last = Math.max(0, Math.min(140, (x + 30) * 7));
      double wood = Math.max(0, last - first) / 1000;
      sum += 1 / (0.17 + wood / 0.13 + (0.14 - wood) / 0.035) / steps;
    }
    assertThat(flat.parallelR()).isCloseTo(1 / sum, within(1e-7));
    assertThat(
            catchThrowableOfType(
                    DetailException.class,
                    () ->
                        new DrawnDetail()
                            .box(room("indoors", 20), -300, -300, 300, 0)
                            .box(outdoors(-5), -300, 140, 300, 400)
                            .box(material("wool", 0.035), -300, 0, 300, 140)
                            .want(u(600))
                            .want(framing(true, "", Optional.empty()))
                            .inspect())
                .faults()
                .get(0)
                .message())
        .contains("`along`");
  }

  /**
   * Parallel paths of a wood wall at 16 in by hand: 75 % cavity, 21 % studs, 4 % headers, wood R
   * 1.25 an inch, the rest 2.05: R-13 U 0.0887 Btu/(h·ft²·°F), which is the tabled value of ASHRAE
   * 90.1 (0.089, *from memory*); R-18 in 5.5 in 0.75/20.05 + 0.25/8.925.
   */
  @Test
  void fractions_of_a_whole_wall() {
    double[][] walls = {{3.5, 13, 0.0887}, {5.5, 18, 0.75 / 20.05 + 0.25 / 8.925}};
    for (double[] wall : walls) {
      double depth = wall[0] * INCH;
      double board = 10;
      DrawnDetail drawn =
          new DrawnDetail()
              .box(space("indoors", 20, Exposure.INSIDE, 0.68 * R_IP), -203.2, -300, 203.2, 0)
              .box(
                  space("outdoors", -5, Exposure.OUTSIDE, 0.17 * R_IP),
                  -203.2,
                  board + depth,
                  203.2,
                  500)
              .box(material("boards", 0.01 / (1.20 * R_IP)), -203.2, 0, 203.2, board)
              .box(
                  material("batt", depth / 1000 / (wall[1] * R_IP)),
                  -203.2,
                  board,
                  203.2,
                  board + depth)
              .box(
                  material("wood", 0.0254 / (1.25 * R_IP)),
                  -0.75 * INCH,
                  board,
                  0.75 * INCH,
                  board + depth)
              .want(u(406.4))
              .want(
                  framing(
                      false, "batt", Optional.of(new Wanted.Framing.Fractions(0.75, 0.21, 0.04))));
      Result.Framing framing = drawn.solve(1e-3).framings().get(0);
      assertThat(framing.wholeWPerM2K().getAsDouble() * R_IP).isCloseTo(wall[2], within(5.1e-5));
      assertThat(framing.wholeSolvedWPerM2K().getAsDouble())
          .isGreaterThan(framing.wholeWPerM2K().getAsDouble())
          .isCloseTo(framing.wholeWPerM2K().getAsDouble(), within(0.02));
    }
  }

  /**
   * Steel studs: effective R of cavity and stud, h·ft²·°F/Btu, computed 6.51, 5.91 and 8.42; by
   * parallel paths of the web alone 12.75, 10.82, 18.49; by isothermal planes of web and flanges,
   * lips left away, 2.85, 2.74, 4.44, and with the lips less. The tabled values of ASHRAE 90.1
   * (6.0, 5.5, 7.1, *from memory*) lie below what an ideal section gives.
   */
  @Test
  void steel_studs_give_no_mean_of_the_limits() {
    double[][] walls = {
      {3.5, 13, 6.51, 12.75, 2.85, 6.0},
      {3.5, 11, 5.91, 10.82, 2.74, 5.5},
      {5.5, 19, 8.42, 18.49, 4.44, 7.1}
    };
    for (double[] wall : walls) {
      double half = 8 * INCH;
      double board = 0.625 * INCH;
      double depth = wall[0] * INCH;
      double flange = 1.625 * INCH;
      double lip = 0.5 * INCH;
      double t = 0.043 * INCH;
      double w = -flange / 2;
      double top = 2 * board + depth;
      Material steel = material("steel", 50);
      DrawnDetail drawn =
          new DrawnDetail()
              .box(space("indoors", 1, Exposure.INSIDE, 0.68 * R_IP), -half, -300, half, 0)
              .box(space("outdoors", 0, Exposure.OUTSIDE, 0.25 * R_IP), -half, top, half, top + 300)
              .box(material("gypsum", board / 1000 / (0.56 * R_IP)), -half, 0, half, top)
              .box(
                  material("batt", depth / 1000 / (wall[1] * R_IP)),
                  -half,
                  board,
                  half,
                  board + depth)
              .box(steel, w, board, w + t, board + depth)
              .box(steel, w, board, w + flange, board + t)
              .box(steel, w, board + depth - t, w + flange, board + depth);
      double open =
          drawn
              .want(u(16 * INCH))
              .want(framing(false, "batt", Optional.empty()))
              .solve(0.02)
              .framings()
              .get(0)
              .isothermalR();
      assertThat(open / R_IP - 2.05).isCloseTo(wall[4], within(0.01));
      Result result =
          drawn
              .box(steel, w + flange - t, board, w + flange, board + lip)
              .box(steel, w + flange - t, board + depth - lip, w + flange, board + depth)
              .solve(1e-3);
      Result.Framing framing = result.framings().get(0);
      assertThat(framing.metal()).isTrue();
      assertThat(framing.meanR()).isEmpty();
      double rest = 2.05;
      assertThat(framing.resistance().value() / R_IP - rest).isCloseTo(wall[2], within(0.02));
      assertThat(framing.effectiveR().getAsDouble() / R_IP).isCloseTo(wall[2], within(0.02));
      // flanges and lips shorten the straight paths a little more than the web alone
      assertThat(framing.parallelR() / R_IP - rest)
          .isLessThanOrEqualTo(wall[3])
          .isCloseTo(wall[3], within(0.05 * wall[3]));
      assertThat(framing.isothermalR()).isLessThan(open);
      assertThat(wall[5]).isLessThan(framing.effectiveR().getAsDouble() / R_IP);
    }
  }

  @Test
  void fractions_of_steel_framing_are_refused() {
    DrawnDetail drawn =
        new DrawnDetail()
            .box(room("indoors", 20), -300, -300, 300, 0)
            .box(outdoors(-5), -300, 100, 300, 400)
            .box(material("wool", 0.035), -300, 0, 300, 100)
            .box(material("steel", 50), -1, 0, 1, 100)
            .want(u(600))
            .want(framing(false, "", Optional.of(new Wanted.Framing.Fractions(0.75, 0.21, 0.04))));
    assertThat(
            catchThrowableOfType(DetailException.class, drawn::inspect).faults().get(0).message())
        .contains("metal");
  }

  /** Layers alone: both limits are the sum of the layers, and corrections count by R1/RT. */
  @Test
  void layers_alone_with_corrections() {
    Wanted.Framing.Corrections ask =
        new Wanted.Framing.Corrections(
            1,
            4,
            50,
            Math.PI / 4 * 0.005 * 0.005,
            0.14,
            0.14,
            0,
            0,
            Optional.of(Wanted.Framing.Taper.RECTANGLE),
            2.0);
    Result result =
        new DrawnDetail()
            .box(room("indoors", 20), 0, -300, 400, 0)
            .box(outdoors(-5), 0, 403, 400, 700)
            .box(material("plaster", 0.57), 0, 0, 400, 15)
            .box(material("brick", 0.50), 0, 15, 400, 255)
            .box(material("EPS", 0.035), 0, 255, 400, 395)
            .box(material("render", 1.0), 0, 395, 400, 403)
            .want(u(400))
            .want(new Wanted.Framing("wall", false, "EPS", Optional.empty(), Optional.of(ask)))
            .solve(1e-4);
    Result.Framing framing = result.framings().get(0);
    assertThat(framing.parallelR()).isCloseTo(4.684316, within(5.1e-7));
    assertThat(framing.isothermalR()).isCloseTo(4.684316, within(5.1e-7));
    assertThat(framing.framedShare()).isZero();
    Result.Corrected corrected = framing.corrected().orElseThrow();
    double square = 4 / 4.684316 * (4 / 4.684316);
    assertThat(corrected.voids()).isCloseTo(0.01 * square, within(1e-7));
    assertThat(corrected.fasteners())
        .isCloseTo(0.8 * 50 * ask.fastenerM2() * 4 / 0.14 * square, within(1e-7));
    assertThat(corrected.u())
        .isCloseTo(0.213478 + corrected.voids() + corrected.fasteners(), within(1e-6));
    assertThat(corrected.negligible()).isFalse();
    assertThat(corrected.tapered().getAsDouble())
        .isCloseTo(Math.log(1 + 2 / 4.684316) / 2, within(1e-6));
  }

  /** Both limits are theorems: the certified interval of R lies between them on any wall. */
  @Test
  void the_limits_hold_on_random_stud_walls() {
    Random random = new Random(SEED);
    for (int wall = 0; wall < 200; wall++) {
      Result result = randomWall(random).solve(0.02);
      Result.Framing framing = result.framings().get(0);
      Certificate.Certified proved = (Certificate.Certified) framing.resistance().certificate();
      double slack = 1e-9 * framing.parallelR();
      assertThat(proved.lower())
          .as("wall %d", wall)
          .isLessThanOrEqualTo(framing.parallelR() + slack);
      assertThat(proved.upper())
          .as("wall %d", wall)
          .isGreaterThanOrEqualTo(framing.isothermalR() - slack);
      assertThat(framing.resistance().value())
          .as("wall %d", wall)
          .isBetween(
              framing.isothermalR() - framing.resistance().halfWidth(),
              framing.parallelR() + framing.resistance().halfWidth());
      assertThat(framing.besideR()).isGreaterThanOrEqualTo(framing.parallelR() - slack);
    }
  }

  /** One to three rows of studs of timber or steel, boards on both sides. */
  private static DrawnDetail randomWall(Random random) {
    double half = 150 + random.nextInt(200);
    int rows = 1 + random.nextInt(3);
    boolean steel = random.nextInt(4) == 0;
    DrawnDetail drawn = new DrawnDetail();
    double y = 10 + random.nextInt(20);
    drawn.box(material("inner board", 0.1 + random.nextDouble()), -half, 0, half, y);
    for (int row = 0; row < rows; row++) {
      double depth = 40 + random.nextInt(120);
      drawn.box(
          material("wool " + row, 0.03 + 0.02 * random.nextDouble()), -half, y, half, y + depth);
      double width = steel ? 1 + random.nextInt(3) : 30 + random.nextInt(60);
      double at = (random.nextDouble() - 0.5) * (2 * half - width);
      drawn.box(
          material(steel ? "steel" : "timber", steel ? 50 : 0.13),
          at - width / 2,
          y,
          at + width / 2,
          y + depth * (random.nextBoolean() ? 1 : 0.6));
      y += depth;
    }
    double out = y + 8 + random.nextInt(30);
    return drawn
        .box(material("outer board", 0.05 + random.nextDouble()), -half, y, half, out)
        .box(room("indoors", 20), -half, -300, half, 0)
        .box(outdoors(-5), -half, out, half, out + 300)
        .want(u(2 * half))
        .want(framing(false, "", Optional.empty()));
  }
}
