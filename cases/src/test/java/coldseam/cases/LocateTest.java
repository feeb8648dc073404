package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import coldseam.solver.Solver;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What only the solver can find is put in its place in the file all the same. */
class LocateTest {
  @TempDir private Path folder;

  private List<String> located(String text) throws CaseException {
    Case read = Written.read(folder, text);
    Detail detail = read.detail(Optional.empty());
    DetailException e = catchThrowableOfType(DetailException.class, () -> Solver.inspect(detail));
    assertThat(e).isNotNull();
    String file = folder.resolve("case.yaml") + ":";
    return e.faults().stream().map(f -> read.locate(f).text().replace(file, "")).toList();
  }

  @Test
  void a_space_that_touches_nothing() throws CaseException {
    String loft = "  loft: {temperature: 5, exposure: inside}\n  outdoors: {";
    assertThat(located(Written.WALL.replace("  outdoors: {", loft)))
        .singleElement()
        .asString()
        .startsWith("7:3: space `loft`: touches no material; lay it where it meets the section");
  }

  @Test
  void a_stretch_on_no_outline() throws CaseException {
    assertThat(located(Written.WALL + "stretches:\n  far: {along: [[900, 0], [900, 100]]}\n"))
        .singleElement()
        .asString()
        .startsWith("13:3: stretch `far`: none of its ");
  }

  @Test
  void a_part_of_the_section_without_a_way_to_any_space() throws CaseException {
    assertThat(located(Written.WALL + "  - {fill: steel, box: [900, 0, 910, 10]}\n"))
        .singleElement()
        .asString()
        .startsWith("12:5: a part of the section around ")
        .contains("touches no space");
  }

  @Test
  void a_part_of_several_materials_is_where_its_first_one_is_laid() throws CaseException {
    assertThat(
            located(
                Written.WALL
                    + "  - {fill: steel, box: [900, 0, 910, 10]}\n"
                    + "  - {fill: copper, box: [910, 0, 920, 10]}\n"))
        .singleElement()
        .asString()
        .matches("1[23]:5: a part of the section around (?s).*");
  }

  @Test
  void faults_without_a_place_are_of_the_file() throws CaseException {
    Case read = Written.read(folder, Written.WALL);
    Problem section = read.locate(new Fault("section", "", "is odd; mend it", Optional.empty()));
    assertThat(section.line()).isEqualTo(8);
    assertThat(section.wrong()).isEqualTo("is odd");
    assertThat(section.right()).contains("mend it");
    Problem unknown = read.locate(new Fault("moon", "full", "shines", Optional.empty()));
    assertThat(unknown.text()).endsWith("case.yaml: moon `full`: shines");
  }
}
