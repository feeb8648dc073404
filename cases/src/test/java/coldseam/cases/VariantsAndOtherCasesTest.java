package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class VariantsAndOtherCasesTest {
  @TempDir private Path folder;

  private static final String PARAMETRIC =
      Written.HEAD
          + """
          values: {insulation: 100, wall: 240 + insulation}
          materials:
            masonry: {conductivity: 0.5}
            board: {conductivity: 0.04}
          spaces:
            indoors: {temperature: 20, exposure: inside}
            outdoors: {temperature: -5, exposure: outside}
          section:
            - {fill: masonry, box: [0, 0, 240, 1000]}
            - {fill: board, box: [240, 0, wall, 1000], name: outer}
            - {fill: board, box: [0, 1000, wall, 1100]}
          variants:
            thick: {values: {insulation: 200}}
            better: {materials: {board: {conductivity: 0.02}}}
            solid: {fills: {outer: masonry}}
            all wood: {fills: {board: softwood}}
          """;

  private static double lambda(Detail detail, int area) {
    return ((Material) detail.areas().get(area).fill()).conductivityWPerMK();
  }

  private static double right(Detail detail, int area) {
    return detail.areas().get(area).rings().get(0).get(1).x();
  }

  @Test
  void variants_change_what_they_name_and_nothing_else() throws CaseException {
    Case read = Written.read(folder, PARAMETRIC);
    assertThat(read.variants()).containsExactly("thick", "better", "solid", "all wood");
    Detail base = read.detail(Optional.empty());
    Detail thick = read.detail(Optional.of("thick"));
    assertThat(right(base, 1)).isCloseTo(0.34, within(1e-15));
    assertThat(right(thick, 1)).isCloseTo(0.44, within(1e-15));
    assertThat(lambda(thick, 1)).isEqualTo(0.04);
    Detail better = read.detail(Optional.of("better"));
    assertThat(lambda(better, 1)).isEqualTo(0.02);
    assertThat(lambda(better, 0)).isEqualTo(0.5);
    Detail solid = read.detail(Optional.of("solid"));
    assertThat(lambda(solid, 1)).isEqualTo(0.5);
    assertThat(lambda(solid, 2)).isEqualTo(0.04);
    Detail wood = read.detail(Optional.of("all wood"));
    assertThat(lambda(wood, 1)).isEqualTo(0.13);
    assertThat(lambda(wood, 2)).isEqualTo(0.13);
    assertThat(lambda(wood, 0)).isEqualTo(0.5);
  }

  @Test
  void an_unknown_variant_is_bad_input() throws CaseException {
    Case read = Written.read(folder, PARAMETRIC);
    CaseException e =
        catchThrowableOfType(CaseException.class, () -> read.detail(Optional.of("thik")));
    assertThat(e.problems().get(0).text())
        .endsWith("case.yaml: there is no variant `thik`; did you mean `thick`?");
  }

  @Test
  void a_psi_takes_off_another_case() throws CaseException, IOException {
    Files.writeString(folder.resolve("wall.yaml"), PARAMETRIC);
    Case read =
        Written.read(
            folder,
            Written.WALL
                + """
                psi:
                  p:
                    between: [indoors, outdoors]
                    dimensions: internal
                    subtract:
                      - {case: wall.yaml, variant: thick, between: [indoors, outdoors]}
                      - {case: wall.yaml, between: [indoors, outdoors]}
                """);
    Wanted.Psi psi = (Wanted.Psi) read.detail(Optional.empty()).wanted().get(0);
    Subtraction.OfDetail thick = (Subtraction.OfDetail) psi.subtractions().get(0);
    assertThat(thick.name()).isEqualTo("wall.yaml, thick");
    assertThat(right(thick.detail(), 1)).isCloseTo(0.44, within(1e-15));
    assertThat(thick.warm()).isEqualTo(List.of("indoors"));
    Subtraction.OfDetail base = (Subtraction.OfDetail) psi.subtractions().get(1);
    assertThat(right(base.detail(), 1)).isCloseTo(0.34, within(1e-15));
  }

  private String subtracting(String what) {
    return Written.WALL
        + "psi: {p: {between: [indoors, outdoors], dimensions: internal, subtract: ["
        + what
        + "]}}\n";
  }

  @Test
  void cases_that_need_each_other_are_refused() throws IOException {
    String back = "{case: case.yaml, between: [indoors, outdoors]}";
    Files.writeString(folder.resolve("other.yaml"), subtracting(back));
    assertThat(Written.problems(folder, subtracting(back.replace("case.yaml", "./other.yaml"))))
        .singleElement()
        .asString()
        .contains("12:81: the case `./other.yaml` cannot be read")
        .contains(
            "cases refer to each other in a circle: `case.yaml` needs `other.yaml` needs"
                + " `case.yaml`");
    assertThat(Written.problems(folder, subtracting(back)))
        .singleElement()
        .asString()
        .contains("`case.yaml` needs `case.yaml`");
  }

  @Test
  void mistakes_about_other_cases() throws IOException {
    Files.writeString(folder.resolve("wall.yaml"), PARAMETRIC);
    Files.writeString(folder.resolve("bad.yaml"), "coldseam: 1\ntitel: x\n");
    String between = "between: [indoors, outdoors]";
    assertThat(Written.problems(folder, subtracting("{case: nowhere.yaml, " + between + "}")))
        .singleElement()
        .asString()
        .contains("the case `nowhere.yaml` cannot be read: there is no such file");
    assertThat(Written.problems(folder, subtracting("{case: bad.yaml, " + between + "}")))
        .singleElement()
        .asString()
        .contains("cannot be read: line 1, a case has no `spaces`, and 2 more");
    assertThat(
            Written.problems(
                folder, subtracting("{case: wall.yaml, variant: thik, " + between + "}")))
        .singleElement()
        .asString()
        .contains("`wall.yaml` has no variant `thik`; did you mean `thick`?");
    assertThat(Written.problems(folder, subtracting("{case: wall.yaml, between: [indoors, loft]}")))
        .singleElement()
        .asString()
        .contains("`loft` is no space of this case");
    assertThat(Written.problems(folder, subtracting("{case: \"a\\0b\", " + between + "}")))
        .singleElement()
        .asString()
        .contains("an invisible character stands here, U+0000");
  }
}
