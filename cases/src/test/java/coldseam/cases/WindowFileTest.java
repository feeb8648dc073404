package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.fail;
import static org.assertj.core.api.Assertions.within;

import coldseam.solver.conduction.Quantity;
import coldseam.solver.window.WindowTransmittance;
import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Window files: what they mean, what is wrong with them, and that the schema agrees. */
class WindowFileTest {
  private static final long SEED = 77;

  private static final String PLAIN =
      """
      coldseam: 1
      title: Test
      window:
        width: 1230
        height: 1480
        profiles:
          sash: {U_f: 1.36, width: 110, psi_g: 0.08}
        glazings:
          double: {U_g: 1.1}
      """;

  /** Every key of the format at least once, nothing taken from cases. */
  private static final String EVERYTHING =
      """
      coldseam: 1
      title: Everything
      note: A sample for tests
      unit: mm
      values:
        post: 700
      window:
        width: 1.6 m
        height: 1480
        profiles:
          sash: {U_f: 1.36, width: 110, psi_g: 0.08}
          sill: {U_f: [1.5, 1.7], width: {inside: 120, outside: 105}, psi_g: [0.06, 0.07]}
          bar: {U_f: 1.4, width: 118, psi_g: {triple: 0.06, panel: 0.02}}
        glazings:
          triple: {U_g: 0.7}
          panel: {U_p: [0.8, 0.9]}
        frame: {top: sash, bottom: sill, left: sash, right: sash}
        mullions: [{profile: bar, at: post}]
        transoms: [{profile: bar, at: 950}]
        glazing: [[triple, triple], [panel, triple]]
        bars:
          inlaid: {psi: 0.01, upright: 1, level: 2}
          stuck on: {psi: 0.02, length: 2 m}
        installed: {top: 0.02, bottom: [0.04, 0.05], left: -0.01, right: 0.025}
      """;

  @TempDir private Path folder;

  private WindowCase read(String text) throws CaseException {
    Path file = folder.resolve("window.yaml");
    try {
      Files.writeString(file, text);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return WindowFile.read(file);
  }

  private List<String> problems(String text) {
    try {
      read(text);
      return List.of();
    } catch (CaseException e) {
      List<String> problems = new ArrayList<>();
      for (Problem problem : e.problems()) {
        problems.add(problem.text().replace(folder.resolve("window.yaml") + ":", ""));
      }
      return problems;
    }
  }

  private static WindowTransmittance transmittance(WindowCase window) throws CaseException {
    return window.transmittance(window.window(List.of()));
  }

  /** ISO 10077-1: 1.23 x 1.48 m, b_f 0.11, U_f 1.36, U_g 1.1, ψ_g 0.08: 1.377757, by hand. */
  @Test
  void a_plain_window() throws CaseException {
    WindowCase window = read(PLAIN);
    assertThat(window.parts()).isEmpty();
    assertThat(transmittance(window).uWPerM2K().value()).isCloseTo(1.377757, within(0.5e-6));
    assertThat(window.assumptions())
        .anyMatch(a -> a.what().equals("corners of the frame") && a.source().contains("10077-1"));
  }

  @Test
  void sizes_may_be_written_in_inches() throws CaseException {
    WindowCase window =
        read(
            PLAIN
                .replace("1230", "48 7/16 in")
                .replace("1480", "4'-10 1/4\"")
                .replace("110", "4.331 in"));
    // 48.4375 in = 1.230313 m, 58.25 in = 1.479550 m, 4.331 in = 0.110007 m.
    assertThat(transmittance(window).areaM2()).isCloseTo(1.230313 * 1.479550, within(1e-5));
    assertThat(transmittance(window).uWPerM2K().value()).isCloseTo(1.3778, within(1e-4));
  }

  @Test
  void typed_intervals_are_carried() throws CaseException {
    WindowTransmittance all = transmittance(read(EVERYTHING));
    Quantity u = all.uWPerM2K();
    assertThat(u.certified()).isTrue();
    // Half-widths: sill 0.1 over 0.120 · (1.6 − 0.11) m², panel 0.05 over (0.7 − 0.11 − 0.059) ·
    // (1.48 − 0.95 − 0.059 − 0.12) m², ψ of the sill 0.005 over both its panes (seen from outside,
    // where they are larger: the widths of sash and bar are the same, 1.6 − 0.22 − 0.118 m).
    double half = 0.1 * 0.12 * 1.49 + 0.05 * 0.531 * 0.351 + 0.005 * 1.262;
    assertThat(u.halfWidth()).isCloseTo(half / (1.6 * 1.48), within(1e-12));
    Quantity installed = all.installedWPerM2K().orElseThrow();
    assertThat(installed.value() - u.value())
        .isCloseTo((1.6 * 0.065 + 1.48 * 0.015) / (1.6 * 1.48), within(1e-12));
  }

  @Test
  void figures_of_a_frame_case() throws CaseException, IOException {
    Files.writeString(folder.resolve("frame.yaml"), FRAME);
    WindowCase window =
        read(
            PLAIN
                .replace("{U_f: 1.36, width: 110, psi_g: 0.08}", "{case: frame.yaml}")
                .replace("{U_g: 1.1}", "{case: frame.yaml}"));
    assertThat(window.parts()).hasSize(1);
    assertThat(window.parts().get(0).name()).isEqualTo("frame.yaml");
    assertThat(window.assumptions())
        .anyMatch(
            a ->
                a.what().equals("U_f and width of profile `sash`, and its ψ_g")
                    && a.source().equals("case frame.yaml"));
  }

  private static final String FRAME =
      """
      coldseam: 1
      title: Frame
      materials:
        wood: {conductivity: 0.13}
        glass: {conductivity: 1.0}
      spaces:
        indoors: {temperature: 20, exposure: inside}
        outdoors: {temperature: 0, exposure: outside}
      section:
        - {fill: indoors, box: [0, 18, 290, 120]}
        - {fill: outdoors, box: [0, -40, 290, 18]}
        - {fill: wood, box: [0, 0, 100, 80]}
        - stack: {face: [[90, 46], [290, 46]], towards: down}
          layers: [[glass, 4], [gap, 20], [glass, 4]]
          glazing: {U: 1.3, spacer: {height: 8, conductivity: 0.4}}
      frame: {between: [indoors, outdoors]}
      """;

  @Test
  void mistakes_are_told_by_their_place() throws IOException {
    assertThat(problems(PLAIN.replace("U_f", "Uf")))
        .containsExactly("7:12: profile `sash` has no key `Uf`; did you mean `U_f`?");
    assertThat(problems(PLAIN.replace(", psi_g: 0.08", "")))
        .containsExactly("7:5: profile `sash` has no `psi_g`; add `psi_g: …`, ψ of the glass edge");
    assertThat(problems(PLAIN + "  frame: sesh\n"))
        .containsExactly("10:10: `sesh` is no profile of this window; did you mean `sash`?");
    assertThat(problems(PLAIN + "  mullions: [{profile: sash, at: 1300}]\n"))
        .containsExactly("10:34: `at` lies outside the window; it is less than its size");
    assertThat(problems(PLAIN + "  glazing: [[double, double]]\n"))
        .containsExactly(
            "10:13: a row of `glazing` has 2 panes; mullions make 1;"
                + " name one glazing for each pane, from left to right");
    assertThat(problems(PLAIN.replace("width: 1230", "width: 215")))
        .containsExactly("3:1: the profiles leave no glass in column 1");
    assertThat(problems(PLAIN + "  bars: {inlaid: {psi: 0.01}}\n"))
        .hasSize(1)
        .allMatch(p -> p.startsWith("10:18: bars `inlaid` have no length; add `length: …`"));
    assertThat(problems(PLAIN.replace("{U_g: 1.1}", "{case: nowhere.yaml}")))
        .hasSize(1)
        .allMatch(p -> p.contains("cannot be read") && p.contains("there is no such file"));
    Files.writeString(folder.resolve("wall.yaml"), Written.WALL);
    assertThat(problems(PLAIN.replace("{U_f: 1.36, width: 110,", "{case: wall.yaml,")))
        .containsExactly(
            "7:18: the case `wall.yaml` asks for no frame;"
                + " give it `frame: {between: [warm, cold]}`");
    assertThat(problems(PLAIN + "  installed: {case: wall.yaml, psi: joint}\n"))
        .hasSize(1)
        .allMatch(p -> p.startsWith("10:37: the case `wall.yaml` has no ψ `joint`"));
    assertThat(problems(PLAIN.replace("psi_g: 0.08", "psi_g: {triple: 0.08}")))
        .hasSize(1)
        .allMatch(p -> p.contains("has no key `triple`; known are `double`"));
  }

  @Test
  void a_window_file_is_told_from_a_case() throws IOException {
    Path file = folder.resolve("any.yaml");
    Files.writeString(file, PLAIN);
    assertThat(WindowFile.is(file)).isTrue();
    Files.writeString(file, Written.WALL.replace("title: Test", "title: \"window: none\""));
    assertThat(WindowFile.is(file)).isFalse();
    assertThat(WindowFile.is(folder.resolve("none.yaml"))).isFalse();
    assertThat(WindowFile.is(folder)).isFalse();
  }

  @Test
  void the_shipped_windows_are_in_order() throws IOException, CaseException {
    try (var files = Files.list(Path.of("windows"))) {
      List<Path> windows = files.filter(f -> f.toString().endsWith(".yaml")).sorted().toList();
      assertThat(windows).isNotEmpty();
      for (Path window : windows) {
        assertThat(WindowFile.is(window)).isTrue();
        assertThat(WindowFile.read(window).title()).isNotBlank();
        assertThat(refusals(Files.readString(window))).isEmpty();
      }
    }
  }

  private static Schema schema;

  @BeforeAll
  static void load() throws IOException {
    try (InputStream in = CaseFile.class.getResourceAsStream("/window.schema.json")) {
      String text = new String(in.readAllBytes(), StandardCharsets.UTF_8);
      schema =
          SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
              .getSchema(text, InputFormat.JSON);
    }
  }

  /** What the schema refuses; nothing of a text that is no YAML at all. */
  private static List<String> refusals(String text) {
    Optional<Node> root = YamlTree.read(text, new Problems(""));
    List<String> refusals = new ArrayList<>();
    if (root.isPresent()) {
      schema.validate(Yaml.json(root.get())).forEach(r -> refusals.add(r.toString()));
    }
    return refusals;
  }

  @Test
  void schema_and_reader_agree() throws IOException {
    assertThat(refusals(PLAIN)).isEmpty();
    assertThat(refusals(EVERYTHING)).isEmpty();
    Node root = YamlTree.read(EVERYTHING, new Problems("")).orElseThrow();
    List<String> disagreements = new ArrayList<>();
    int refused = 0;
    for (String text : Spoiled.some(root, SEED, 1)) {
      boolean bySchema = !refusals(text).isEmpty();
      List<String> byReader = spoiledProblems(text);
      refused += bySchema ? 1 : 0;
      if (bySchema && byReader.isEmpty()) {
        disagreements.add("only the schema refuses:\n" + text);
      }
      for (String problem : byReader) {
        boolean structural =
            problem.contains("has no key `")
                || problem.contains("has no value;")
                || problem.contains("needs keys with values");
        // The names under psi_g are the user's own: only the reader can know them.
        if (structural && !bySchema && !problem.contains("`psi_g` of")) {
          disagreements.add("only the reader refuses: " + problem + "\n" + text);
        }
      }
    }
    assertThat(disagreements).isEmpty();
    assertThat(refused).isGreaterThan(100);
  }

  private List<String> spoiledProblems(String text) {
    try {
      return problems(text);
    } catch (RuntimeException e) {
      return fail("not refused in words: " + e + "\n" + text, e);
    }
  }
}
