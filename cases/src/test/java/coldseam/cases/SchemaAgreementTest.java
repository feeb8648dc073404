package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;

import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The published schema and the reader agree. */
class SchemaAgreementTest {
  private static final long SEED = 20250315;

  private static Schema schema;

  @TempDir private Path folder;

  static List<Path> samples() {
    return SpoiledCasesTest.samples();
  }

  @BeforeAll
  static void load() throws IOException {
    try (var in = CaseFile.class.getResourceAsStream("/case.schema.json")) {
      String text = new String(in.readAllBytes(), StandardCharsets.UTF_8);
      schema =
          SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
              .getSchema(text, InputFormat.JSON);
    }
  }

  @Test
  void the_schema_is_itself_valid() throws IOException {
    try (var in = CaseFile.class.getResourceAsStream("/case.schema.json")) {
      Schema meta =
          SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
              .getSchema(
                  com.networknt.schema.SchemaLocation.of(
                      "https://json-schema.org/draft/2020-12/schema"));
      String text = new String(in.readAllBytes(), StandardCharsets.UTF_8);
      assertThat(meta.validate(text, InputFormat.JSON)).isEmpty();
    }
  }

  @ParameterizedTest
  @MethodSource("samples")
  void both_accept_what_is_right(Path file) throws Exception {
    assertThat(refusals(Files.readString(file))).isEmpty();
    assertThat(CaseFile.read(file).title()).isNotBlank();
  }

  @ParameterizedTest
  @MethodSource("samples")
  void what_the_schema_refuses_the_reader_refuses(Path file) throws IOException {
    Node root = YamlTree.read(Files.readString(file), new Problems("")).orElseThrow();
    List<String> disagreements = new ArrayList<>();
    int refused = 0;
    for (String text : Spoiled.some(root, SEED, SpoiledCasesTest.share(file))) {
      List<String> bySchema = refusals(text);
      List<String> byReader = Written.problems(folder, text);
      refused += bySchema.isEmpty() ? 0 : 1;
      if (!bySchema.isEmpty() && byReader.isEmpty()) {
        disagreements.add("only the schema refuses: " + bySchema + "\n" + text);
      }
      for (String problem : byReader) {
        // What both can express: words out of place, missing keys, nothing where something is due.
        boolean structural =
            problem.contains("has no key `")
                || problem.contains("has no value;")
                || problem.contains("needs keys with values");
        if (structural && bySchema.isEmpty()) {
          disagreements.add("only the reader refuses: " + problem + "\n" + text);
        }
      }
    }
    assertThat(disagreements).isEmpty();
    assertThat(refused).isGreaterThan(20);
  }

  @ParameterizedTest
  @MethodSource("samples")
  void a_missing_required_key_is_refused_by_both(Path file) throws IOException {
    String text = Files.readString(file);
    for (String key : List.of("coldseam", "title", "spaces", "section")) {
      Node.Mapping root = (Node.Mapping) YamlTree.read(text, new Problems("")).orElseThrow();
      List<Node.Entry> without = new ArrayList<>(root.entries());
      assertThat(without.removeIf(e -> e.key().text().equals(key))).isTrue();
      String spoiled = Yaml.written(new Node.Mapping(without, 1, 1));
      assertThat(refusals(spoiled)).isNotEmpty();
      assertThat(Written.problems(folder, spoiled)).anyMatch(p -> p.contains("`" + key + "`"));
    }
  }

  /** Texts in quotes are texts, and what excludes each other is refused together. */
  @Test
  void both_refuse_what_only_looks_right() throws IOException {
    String text = Files.readString(SpoiledCasesTest.EVERYTHING);
    String[][] changes = {
      {"coldseam: 1", "coldseam: \"1\""},
      {"loft: {floats: true,", "loft: {floats: \"true\","},
      {"loft: {floats: true,", "loft: {floats: false,"},
      {"keep: true", "keep: \"true\""},
      {"keep: true", "keep: yes"},
      {"side: top, adiabatic: true", "side: top, adiabatic: \"false\""},
      {"side: top, adiabatic: true", "side: top, adiabatic: false, flow: 3"},
      {"side: top, adiabatic: true", "side: top, along: [[0, 0], [1, 1]], adiabatic: true"},
      {"{conductivity: 0.50,", "{conductivity: 0.50, resistance: R-13,"},
      {"{resistance: R-13, thickness", "{from: EPS, thickness"},
      {"{U: 0.3, length: 500}", "{U: 0.3}"},
      {"{surface-of: indoors,", "{surface-of: indoors, points: 3,"},
      {"cut: [100, 0]", "cut: left side"},
      {"unit: mm", "unit: km"},
      {"{psi: external, value", "{psi: external, U: wall, value"},
    };
    for (String[] change : changes) {
      assertThat(text).contains(change[0]);
      String spoiled = text.replace(change[0], change[1]);
      assertThat(refusals(spoiled)).as("schema: " + change[1]).isNotEmpty();
      assertThat(Written.problems(folder, spoiled)).as("reader: " + change[1]).isNotEmpty();
    }
  }

  private static List<String> refusals(String text) {
    Optional<Node> root = YamlTree.read(text, new Problems(""));
    if (root.isEmpty()) {
      return List.of();
    }
    return schema.validate(Yaml.json(root.get())).stream().map(Object::toString).toList();
  }
}
