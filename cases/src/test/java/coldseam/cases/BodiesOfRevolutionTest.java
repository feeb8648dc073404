package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.Solver;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code geometry: axisymmetric} and {@code chi} as they reach the solver. */
class BodiesOfRevolutionTest {
  private static final String ROUND =
      Written.WALL
          .replace("section:", "geometry: axisymmetric\nview: plan\nsection:")
          .replace("[-100, 0, 0, 1000]", "[0, -100, 500, 0]")
          .replace("[240, 0, 340, 1000]", "[0, 240, 500, 340]")
          .replace("[0, 0, 240, 1000]", "[0, 0, 500, 240]");

  @TempDir private Path folder;

  @Test
  void chi_and_what_it_takes_off() throws CaseException {
    Case read =
        Written.read(
            folder,
            ROUND
                + """
                chi:
                  rod: {between: [indoors, outdoors]}
                  b:
                    between: [indoors, outdoors]
                    of: fixing
                    subtract:
                      - {part: wall, U: [0.2, 0.21], radius: 500}
                      - {part: joint, psi: 0.03, length: 2 m}
                accuracy: {chi: 0.1 %, L3D: 0.01}
                expect:
                  - {L3D: [indoors, outdoors], value: 1.2, within: 0.1 %, source: s, status: seen}
                  - {chi: rod, value: 0.01 W/K, within: 1 %, source: s, status: seen}
                """);
    Detail detail = read.detail(Optional.empty());
    assertThat(detail.geometry()).isEqualTo(Geometry.AXISYMMETRIC);
    Wanted.Chi rod = (Wanted.Chi) detail.wanted().get(0);
    assertThat(rod.of()).isEqualTo("rod");
    assertThat(rod.subtractions()).isEmpty();
    Wanted.Chi other = (Wanted.Chi) detail.wanted().get(1);
    assertThat(other.of()).isEqualTo("fixing");
    assertThat(other.subtractions())
        .containsExactly(
            new Subtraction.OfArea("wall", new Bracket(0.2, 0.21), Math.PI * 0.25),
            new Subtraction.OfLine("joint", Bracket.of(0.03), 2));
    assertThat(read.accuracy().pointRelative()).isCloseTo(1e-3, within(1e-18));
    assertThat(read.accuracy().pointWPerK()).isZero();
    assertThat(read.accuracy().couplingWPerMK()).isEqualTo(0.01);
    assertThat(read.accuracy().couplingRelative()).isInfinite();
    assertThat(read.expectations())
        .extracting(Expectation::quantity)
        .containsExactly(Expectation.Quantity.L3D, Expectation.Quantity.CHI);
    Accuracy absolute = Written.read(folder, ROUND + "accuracy: {chi: 0.002 W/K}\n").accuracy();
    assertThat(absolute.pointRelative()).isZero();
    assertThat(absolute.pointWPerK()).isEqualTo(0.002);
  }

  private List<String> problems(String text) {
    return Written.problems(folder, text);
  }

  @Test
  void mistakes_say_what_would_be_right() {
    assertThat(problems(Written.WALL + "chi:\n  rod: {between: [indoors, outdoors]}\n"))
        .containsExactly(
            "12:1: a χ is of a body of revolution, and this is a plane section; add"
                + " `geometry: axisymmetric`, or ask for `psi`");
    assertThat(problems(ROUND + "accuracy: {psi: 0.001}\n"))
        .singleElement()
        .asString()
        .startsWith("14:12: `accuracy` has no key `psi`");
    assertThat(
            problems(ROUND + "chi:\n  rod: {between: [indoors, outdoors], dimensions: internal}\n"))
        .singleElement()
        .asString()
        .contains("has no key `dimensions`");
    String subtract = "chi:\n  rod: {between: [indoors, outdoors], subtract: [%s]}\n";
    assertThat(problems(ROUND + String.format(subtract, "{part: a, U: 1, psi: 2}")))
        .singleElement()
        .asString()
        .contains("a surface and a line at once");
    assertThat(problems(ROUND + String.format(subtract, "{part: a, U: 1}")))
        .singleElement()
        .asString()
        .contains("has no `radius`");
    assertThat(problems(ROUND + String.format(subtract, "{part: a, U: 1, radius: -2}")))
        .singleElement()
        .asString()
        .contains("`radius` of the part");
    assertThat(
            problems(
                ROUND
                    + "expect:\n  - {L2D: [indoors, outdoors], value: 1, within: 1 %, source: s,"
                    + " status: seen}\n"))
        .containsExactly("15:11: a body of revolution has no L2D; expect `L3D`");
  }

  /** What only the solver finds is put in its place in the file. */
  @Test
  void a_shape_across_the_axis_is_found_in_the_file() throws CaseException {
    Case read =
        Written.read(
            folder,
            ROUND
                + "  - {fill: masonry, box: [-20, 50, 40, 90]}\n"
                + "psi:\n"
                + "  p: {between: [indoors, outdoors], dimensions: internal}\n");
    Detail detail = read.detail(Optional.empty());
    DetailException e = catchThrowableOfType(DetailException.class, () -> Solver.inspect(detail));
    String file = folder.resolve("case.yaml") + ":";
    assertThat(e.faults().stream().map(f -> read.locate(f).text().replace(file, "")).toList())
        .containsExactly(
            "14:5: section[4] (masonry) reaches across the axis at (-20, 50) mm; x is the radius, 0"
                + " or more",
            "16:3: ψ `p`: is of a metre of a prism, not of a body of revolution; ask for `chi`");
  }
}
