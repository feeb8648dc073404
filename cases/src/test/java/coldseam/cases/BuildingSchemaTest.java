package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;

import coldseam.cases.building.BuildingFile;
import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaLocation;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The published schema of buildings and the reader agree; spoiled files are refused in words. */
class BuildingSchemaTest {
  private static final long SEED = 20250402;

  /** Every key of a design at least once, nothing taken from cases. */
  private static final String DESIGN =
      """
      coldseam: 1
      title: Everything of a design
      note: A sample for tests
      values:
        perimeter: 38
      materials:
        board: {from: EPS, tolerance: 10 %}
        brick: {conductivity: 0.5}
      building:
        dimensions: external
        elements:
          wall: {area: 142, layers: [[brick, 240 mm], [board, 0.16]]}
          roof: {area: 86 m2, layers: [[board, 200 mm]], heat-flow: up}
          gable: {area: 12, layers: [[board, 200 mm]], films: [0.13, 0.10]}
          wall to the garage: {area: 18, U: [0.5, 0.7], to: garage}
        windows:
          south: {area: 21, U: 1.25}
          porch: {area: 2, U: 1.5, to: porch}
        ground:
          floor: {area: 80, U: 0.21}
          slab: {area: 82, slab: {perimeter: perimeter, wall: 0.36, resistance: 2.5, ground: clay}}
          cellar: {area: 20, slab: {perimeter: 9, wall: 0.3, layers: [[board, 0.1]], ground: 2.0}}
        unheated:
          garage: {outside: 43, air: 3}
          porch: {temperature: 8}
          loft: {b: 80 %}
        junctions:
          eaves: {length: 37, psi: -0.03, dimensions: external}
          edge: {length: perimeter, psi: [0.1, 0.14], dimensions: external, to: loft}
        points:
          fixings: {number: 4, chi: 0.02, to: garage}
        air: {volume: 232, change: 0.45, recovery: 80 %, leakage: {n50: 2, shielding: heavy}}
        climate:
          inside: 20
          annual-mean: 9.4
          months:
            January: {outside: 1.2, days: 31}
            February: {outside: 2.5, days: 28}
        gains: {sun: [120, 200], people: 350}
        utilisation: {floor-area: 165, class: medium, method: monthly, a0: 1, tau0: 15}
        store: 12
        heating: {fuel: gas, unit: m3, heating-value: {gross: 10.9}, efficiency: {gross: 0.88}}
      """;

  /** The other ways to say things. */
  private static final String METERED =
      """
      coldseam: 1
      title: Everything of a metered building
      building:
        elements:
          wall: {area: 142, U: 0.24}
        air: {flow: 120, volume: 200, leakage: 0.05}
        climate: {inside: 20, degree-days: 3350, base: 20, days: 212}
        gains: {sun: 100}
        meters:
          electricity: 2450
          photovoltaics: 1310
          exported: 690
          fuels:
            gas: {used: 905, unit: m3, heating-value: {net: 9.8}, efficiency: {net: 97 %}}
          heat: 100
          heat-pump: {electricity: 700, performance: 3}
          drain: 640
      """;

  private static final String PUMP =
      """
      coldseam: 1
      title: The rest
      building:
        elements:
          wall: {area: 142, U: 0.24}
        air: {volume: 200, leakage: {n50: 1.5, e: 0.05}}
        climate: {inside: 20, outside: 4, days: 200}
        gains: {people: 1000}
        utilisation: 0.95
        heating: {performance: 3.2}
      """;

  private static Schema schema;

  @TempDir private Path folder;

  static List<String> samples() {
    return List.of(DESIGN, METERED, PUMP);
  }

  private static String text() throws IOException {
    try (InputStream in = CaseFile.class.getResourceAsStream("/building.schema.json")) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    }
  }

  @BeforeAll
  static void load() throws IOException {
    schema =
        SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
            .getSchema(text(), InputFormat.JSON);
  }

  @Test
  void the_schema_is_itself_valid() throws IOException {
    Schema meta =
        SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
            .getSchema(SchemaLocation.of("https://json-schema.org/draft/2020-12/schema"));
    assertThat(meta.validate(text(), InputFormat.JSON)).isEmpty();
  }

  private static List<String> refusals(String text) {
    Optional<Node> root = YamlTree.read(text, new Problems(""));
    List<String> refusals = new ArrayList<>();
    if (root.isPresent()) {
      schema.validate(Yaml.json(root.get())).forEach(r -> refusals.add(r.toString()));
    }
    return refusals;
  }

  private List<Problem> problems(String text) {
    try {
      Path file = folder.resolve("building.yaml");
      Files.writeString(file, text);
      BuildingFile.read(file).account(List.of());
      return List.of();
    } catch (CaseException e) {
      return e.problems();
    } catch (IOException | RuntimeException e) {
      return fail("not refused in words: " + e + "\n" + text, e);
    }
  }

  @Test
  void the_shipped_buildings_are_in_order() throws IOException, CaseException {
    int found = 0;
    try (Stream<Path> files = Files.list(Path.of("demo"))) {
      for (Path file : files.filter(f -> f.toString().endsWith(".yaml")).toList()) {
        if (BuildingFile.is(file)) {
          assertThat(refusals(Files.readString(file))).as(file.toString()).isEmpty();
          assertThat(BuildingFile.read(file).title()).isNotBlank();
          found++;
        }
      }
    }
    assertThat(found).isGreaterThanOrEqualTo(2);
  }

  @ParameterizedTest
  @MethodSource("samples")
  void both_accept_what_is_right(String text) {
    assertThat(refusals(text)).isEmpty();
    assertThat(problems(text)).isEmpty();
  }

  @ParameterizedTest
  @MethodSource("samples")
  void what_the_schema_refuses_the_reader_refuses(String sample) {
    Node root = YamlTree.read(sample, new Problems("")).orElseThrow();
    List<String> disagreements = new ArrayList<>();
    int refused = 0;
    for (String text : Spoiled.some(root, SEED, sample.equals(DESIGN) ? 4 : 1)) {
      boolean bySchema = !refusals(text).isEmpty();
      List<Problem> byReader = problems(text);
      refused += bySchema ? 1 : 0;
      if (bySchema && byReader.isEmpty()) {
        disagreements.add("only the schema refuses: " + refusals(text) + "\n" + text);
      }
      for (Problem problem : byReader) {
        assertThat(problem.line()).as(problem.text()).isPositive();
        assertThat(problem.wrong()).isNotBlank().doesNotContain("null").doesNotContain("coldseam.");
        boolean structural =
            problem.wrong().contains("has no key `")
                || problem.wrong().endsWith("has no value")
                || problem.wrong().contains("needs keys with values");
        if (structural && !bySchema) {
          disagreements.add("only the reader refuses: " + problem.text() + "\n" + text);
        }
      }
    }
    assertThat(disagreements).isEmpty();
    assertThat(refused).isGreaterThan(50);
  }

  @ParameterizedTest
  @MethodSource("samples")
  void cut_after_every_line(String text) {
    int refused = 0;
    for (int end = text.indexOf('\n'); end >= 0; end = text.indexOf('\n', end + 1)) {
      refused += problems(text.substring(0, end + 1)).isEmpty() ? 0 : 1;
      refused += problems(text.substring(0, Math.max(1, end - 3))).isEmpty() ? 0 : 1;
    }
    assertThat(refused).isGreaterThan(10);
  }
}
