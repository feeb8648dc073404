package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cases.building.BuildingFile;
import coldseam.cli.sheet.Sheet;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Buildings from the command line: card, data, tables, figure, refusals. */
class LedgersTest {
  private static final ObjectMapper JACKSON = new ObjectMapper();
  private static final String SAFETY = "Local codes and a licensed professional decide";

  private static final String SOLVED =
      """
      coldseam: 1
      title: Solved
      building:
        dimensions: internal
        elements:
          wall: {area: 100, U: 0.25}
        junctions:
          corner: {length: 40, case: corner.yaml, psi: internal}
        climate: {inside: 20, outside: 5, days: 200}
      """;

  private static Schema schema;

  @TempDir Path dir;

  @BeforeAll
  static void load() throws IOException {
    try (InputStream text = Sheet.class.getResourceAsStream("/ledger.schema.json")) {
      schema =
          SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12)
              .getSchema(new String(text.readAllBytes(), StandardCharsets.UTF_8));
    }
  }

  private static JsonNode data(String text) throws IOException {
    assertThat(schema.validate(text, InputFormat.JSON)).isEmpty();
    return JACKSON.readTree(text);
  }

  private static String demo(String name) {
    return Root.folder().resolve("cases/demo").resolve(name).toString();
  }

  private static double number(JsonNode json, String path) {
    JsonNode found = json.at(path);
    assertThat(found.isNumber()).as(path).isTrue();
    return found.doubleValue();
  }

  @Test
  void ledgers_of_shipped_buildings_fit_the_schema_and_close() throws IOException {
    int found = 0;
    try (Stream<Path> files = Files.list(Root.folder().resolve("cases/demo"))) {
      for (Path file :
          files.filter(f -> f.toString().endsWith(".yaml") && BuildingFile.is(f)).toList()) {
        Ran ran = Ran.in(dir, "ledger", file.toString(), "--json");
        assertThat(ran.code()).as("%s: %s", file, ran.err()).isZero();
        assertThat(ran.err()).isEmpty();
        JsonNode json = data(ran.out());
        double in = 0;
        double out = 0;
        for (JsonNode entry : json.get("account")) {
          double value = entry.get("value_kWh").doubleValue();
          in += Math.max(0, value);
          out += Math.min(0, value);
        }
        assertThat(in + out).as("sum of %s", file).isCloseTo(0, within(1e-9 * in));
        assertThat(json.get("note").textValue()).contains(SAFETY);
        found++;
      }
    }
    assertThat(found).isGreaterThanOrEqualTo(3);
    try (Stream<Path> left = Files.list(dir)) {
      assertThat(left).isEmpty();
    }
  }

  /** The worked house (<em>computed</em> by hand, see {@code WorkedHouseTest}). */
  @Test
  void the_house_as_designed() throws IOException {
    Ran ran = Ran.in(dir, "ledger", demo("house.yaml"), "--out", "out", "--png");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out())
        .containsPattern("heat needed +7567\\.4 +kWh")
        .containsPattern("to buy +8599\\.3 +kWh +natural gas, 88 % efficiency, gross: 788\\.93 m³")
        .containsPattern("H_T, transmission +108\\.754 +W/K")
        .containsPattern("junctions and points in it +8\\.684 +W/K +7\\.98 % of H_T")
        .containsPattern("mean ΔU of junctions and points +0\\.02473 +W/\\(m²·K\\).+351\\.1 m²")
        .containsPattern("eaves +37 +m +−0\\.03 +W/\\(m·K\\) +−1\\.110 W/K +−1\\.0 %")
        .containsPattern("plane elements and windows +−6226\\.2")
        .containsPattern("junctions and points +−698\\.1")
        .containsPattern("by way of garage +−434\\.1")
        .containsPattern("floor, to the ground +−928\\.7")
        .containsPattern("air change +−2797\\.6")
        .containsPattern("sum +0\\.0")
        .contains("7680 kWh")
        .contains(SAFETY)
        .contains("Written to out/: ledger.json, ledger.csv, schedule.csv, ledger.svg, ledger.png");
    JsonNode json = data(Files.readString(dir.resolve("out/ledger.json")));
    assertThat(number(json, "/outcome/need/value_kWh")).isCloseTo(7567.383, within(0.0005));
    assertThat(number(json, "/outcome/bought/units")).isCloseTo(788.93, within(0.005));
    assertThat(number(json, "/outcome/gains/steps/0/factor")).isCloseTo(0.996425, within(5e-7));
    assertThat(number(json, "/junctions/meanDeltaU/value_W_per_m2K"))
        .isCloseTo(0.02473, within(5e-6));
    assertThat(Files.readString(dir.resolve("out/ledger.svg"))).contains(SAFETY);
    assertThat(Files.size(dir.resolve("out/ledger.png"))).isGreaterThan(10_000);
  }

  @Test
  void the_house_by_its_meters() throws IOException {
    Ran ran = Ran.in(dir, "ledger", demo("house-metered.yaml"), "--out", "out");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out())
        .containsPattern("came in +17154\\.5 +kWh")
        .containsPattern("went out, as far as known +−13598\\.5 +kWh")
        .containsPattern("not explained by the data +−3556\\.0 +kWh")
        .contains("20.7 % of what came in: leaves by ways that the data does not explain")
        .doesNotContain("error");
    JsonNode json = data(Files.readString(dir.resolve("out/ledger.json")));
    assertThat(number(json, "/outcome/remainder/value_kWh")).isCloseTo(-3555.996, within(0.0005));
    assertThat(number(json, "/outcome/share")).isCloseTo(0.207, within(5e-4));
  }

  /** Every row has as many fields as the heading; items add up to the sum. */
  @Test
  void tables_for_a_spreadsheet() throws IOException {
    assertThat(Ran.in(dir, "ledger", demo("house.yaml"), "--out", "out", "--quiet").out())
        .isEmpty();
    List<String[]> account = rows("out/ledger.csv");
    double sum = 0;
    for (String[] row : account.subList(1, account.size() - 2)) {
      sum += Double.parseDouble(row[4]);
    }
    assertThat(account.get(0)[4]).isEqualTo("value_kWh");
    assertThat(account.get(account.size() - 2)[2]).isEqualTo("sum");
    assertThat(sum).isCloseTo(0, within(1e-8));
    assertThat(account.get(account.size() - 1)[3]).contains(SAFETY);
    List<String[]> schedule = rows("out/schedule.csv");
    List<String> head = List.of(schedule.get(0));
    int h = head.indexOf("value_W_per_K");
    double transmission = 0;
    for (String[] row : schedule) {
      boolean counts = List.of("element", "window", "ground", "junction", "point").contains(row[1]);
      transmission += counts ? Double.parseDouble(row[h]) : 0;
      if (row[2].equals("transmission")) {
        assertThat(Double.parseDouble(row[h])).isCloseTo(108.754, within(1e-9));
        assertThat(Double.parseDouble(row[head.indexOf("area_m2")])).isCloseTo(351.1, within(1e-9));
      }
    }
    assertThat(transmission).isCloseTo(108.754, within(1e-9));
  }

  /** Fields of a table whose quoted fields hold commas. */
  private List<String[]> rows(String file) throws IOException {
    List<String[]> rows = new ArrayList<>();
    for (String line : Files.readAllLines(dir.resolve(file))) {
      rows.add(line.split(",(?=(?:[^\"]*\"[^\"]*\")*[^\"]*$)", -1));
    }
    assertThat(rows).allMatch(row -> row.length == rows.get(0).length);
    return rows;
  }

  /** H of the junction is 40 m times what the case gives by itself, interval and all. */
  @Test
  void a_psi_that_is_solved() throws IOException {
    Cases.write(dir, "corner.yaml", Cases.CORNER);
    Cases.write(dir, "building.yaml", SOLVED);
    JsonNode psi =
        JACKSON.readTree(Ran.in(dir, "solve", "corner.yaml", "--json").out()).at("/psi/0");
    JsonNode json = data(Ran.in(dir, "ledger", "building.yaml", "--json").out());
    JsonNode corner = json.at("/schedule/1/H");
    for (String end : List.of("value", "lower", "upper")) {
      assertThat(corner.get(end + "_W_per_K").doubleValue())
          .isCloseTo(40 * psi.get(end + "_W_per_mK").doubleValue(), within(1e-9));
    }
    assertThat(json.at("/schedule/1/source").textValue()).isEqualTo("corner.yaml: internal");
    assertThat(json.at("/cases/0/reached").booleanValue()).isTrue();
  }

  @Test
  void accuracy_that_is_not_reached_ends_with_3() throws IOException {
    Cases.write(dir, "corner.yaml", Cases.CORNER);
    Cases.write(dir, "building.yaml", SOLVED);
    Ran ran =
        Ran.in(
            dir,
            "ledger",
            "building.yaml",
            "--json",
            "--accuracy",
            "psi=0.0000001",
            "--most-unknowns",
            "300");
    assertThat(ran.code()).isEqualTo(ExitCode.ACCURACY);
    assertThat(ran.err()).contains("building.yaml: the accuracy asked for was not reached");
    assertThat(data(ran.out()).at("/cases/0/reached").booleanValue()).isFalse();
    Ran wrong = Ran.in(dir, "ledger", "building.yaml", "--accuracy", "phi=1");
    assertThat(wrong.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(wrong.err()).startsWith("coldseam ledger: ");
  }

  private void refused(String text, String... words) throws IOException {
    Cases.write(dir, "building.yaml", text);
    Ran ran = Ran.in(dir, "ledger", "building.yaml");
    assertThat(ran.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(ran.out()).isEmpty();
    assertThat(ran.err()).contains(words).doesNotContain("\tat ").doesNotContain("Exception");
    assertThat(dir.resolve("building.coldseam")).doesNotExist();
  }

  @Test
  void mistakes_end_with_2_and_their_place() throws IOException {
    String house = Files.readString(Path.of(demo("house.yaml")));
    refused(
        SOLVED, "building.yaml:8:32: the case `corner.yaml` cannot be read: there is no such file");
    refused(
        house.replace("psi: 0.12, dimensions: external", "psi: 0.12"),
        "building.yaml:25:16: junction `slab edge` has no `dimensions`; a ψ means nothing without");
    refused(
        house.replace("psi: 0.48, dimensions: external", "psi: 0.48, dimensions: internal"),
        "building.yaml:26:51: the ψ of junction `balcony` is by internal dimensions");
    refused(
        house.replace("outside: 4.2, days: 212", "degree-days: 2400, base: 15.5, days: 212"),
        "building.yaml:37:3: degree-days to a base of 15.5 °C, below the inside temperature");
    refused(
        house.replace("{gross: 88 %}", "{net: 97 %}"),
        "building.yaml:47:5: the heating value of `natural gas` is gross, the efficiency net");
  }

  @Test
  void other_commands_tell_buildings_apart() throws IOException {
    Files.copy(Path.of(demo("house.yaml")), dir.resolve("house.yaml"));
    Cases.write(
        dir,
        "wall.yaml",
        Cases.WALL
            + "expect:\n  - {U: wall, value: 1.754386, within: 0.001, source: by hand,"
            + " status: computed}\n");
    Ran prove = Ran.in(dir, "prove", ".");
    assertThat(prove.code()).as(prove.err()).isZero();
    assertThat(prove.out()).contains("1 cases, 1 passed");
    assertThat(Ran.in(dir, "prove", "house.yaml").err())
        .contains("house.yaml is a building, which expects nothing");
    Ran solve = Ran.in(dir, "solve", "house.yaml", "wall.yaml");
    assertThat(solve.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(solve.err()).contains("did you mean: cli/coldseam ledger house.yaml");
    Ran check = Ran.in(dir, "check", "house.yaml");
    assertThat(check.code()).isZero();
    assertThat(check.out()).contains("sum of losses: H_T = Σ A U + Σ l ψ + Σ χ");
    assertThat(Ran.in(dir, "check", "house.yaml", "--variant", "x").code())
        .isEqualTo(ExitCode.BAD_INPUT);
    Ran ledger = Ran.in(dir, "ledger", "wall.yaml");
    assertThat(ledger.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(ledger.err()).contains("a building file has no key `spaces`");
  }

  @Test
  void several_buildings_each_with_a_folder() throws IOException {
    Ran ran =
        Ran.in(
            dir,
            "ledger",
            demo("house.yaml"),
            demo("house-metered.yaml"),
            "--out",
            "out",
            "--no-plots",
            "--json");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out().lines()).hasSize(2);
    try (Stream<Path> files = Files.list(dir.resolve("out/house-metered"))) {
      assertThat(files.map(f -> f.getFileName().toString()).filter(n -> !n.startsWith(".")))
          .containsExactlyInAnyOrder("ledger.json", "ledger.csv", "schedule.csv");
    }
  }
}
