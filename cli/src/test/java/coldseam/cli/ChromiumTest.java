package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Base64;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** The sheet in a real browser. Skipped, with a word on what to install, where there is none. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
@Timeout(value = 5, unit = TimeUnit.MINUTES)
class ChromiumTest {
  private static final String MISSING =
      "SKIPPED: the sheet was not opened in a browser, since none of chromium, chromium-browser and"
          + " google-chrome is on the PATH; install the package chromium to run ChromiumTest";

  /** R of {@link Cases#WALL}: 0.13 + 0.2/0.5 + 0.04 m²·K/W, computed by hand. */
  private static final double RESISTANCE = 0.57;

  private Chromium browser;
  private Path sheet;

  @BeforeAll
  void open(@TempDir Path folder) throws IOException, InterruptedException {
    Optional<Path> installed = Chromium.installed();
    if (installed.isEmpty()) {
      System.err.println(MISSING);
    }
    assumeTrue(installed.isPresent(), MISSING);
    Cases.write(folder, "wall.yaml", Cases.WALL);
    assertThat(Ran.in(folder, "solve", "wall.yaml", "--sheet", "--no-plots").code()).isZero();
    sheet = folder.resolve("wall.coldseam/sheet.html");
    Path profile = folder.resolve("profile");
    assertThat(profile.toFile().mkdir()).isTrue();
    browser = Chromium.start(installed.get(), profile);
    browser.open(sheet.toUri());
  }

  @AfterAll
  void close() {
    if (browser != null) {
      browser.close();
    }
  }

  @Test
  void opens_without_an_error_and_asks_for_nothing_else() throws Exception {
    browser.forget();
    browser.open(sheet.toUri());
    assertThat(browser.told("Log.entryAdded")).isEmpty();
    assertThat(browser.told("Runtime.exceptionThrown")).isEmpty();
    assertThat(browser.told("Runtime.consoleAPICalled")).isEmpty();
    List<String> asked = new ArrayList<>();
    for (JsonNode request : browser.told("Network.requestWillBeSent")) {
      asked.add(request.get("request").get("url").textValue());
    }
    assertThat(asked).isNotEmpty().containsOnly(sheet.toUri().toString());
    // What the page asked for would be told, and its policy refuses it.
    browser.wait("fetch('http://127.0.0.1:9/').catch(function () {})");
    assertThat(browser.told("Log.entryAdded").toString()).contains("Content Security Policy");
  }

  /** Where a place of the drawing, mm, lies in the window: by the plot's own table. */
  private double[] inWindow(String plot, double x, double y) throws Exception {
    JsonNode at =
        browser.value(
            "(function () {"
                + "var all = JSON.parse(document.getElementById('soundings').textContent);"
                + "var f = all.plots.find(function (p) { return p.id === '"
                + plot
                + "'; }).frames[0];"
                + "var svg = document.querySelector('#figure-"
                + plot
                + " svg');"
                + "svg.scrollIntoView({block: 'center'});"
                + "var p = new DOMPoint(f.box[0] + ("
                + x
                + " - f.x) / f.perPoint, f.box[1] + (f.y - "
                + y
                + ") / f.perPoint).matrixTransform(svg.getScreenCTM());"
                + "return [p.x, p.y];"
                + "})()");
    return new double[] {at.get(0).doubleValue(), at.get(1).doubleValue()};
  }

  private String hover(String plot, double x, double y) throws Exception {
    // The page may still be scrolling when the pointer is placed.
    for (int attempt = 0; attempt < 20; attempt++) {
      double[] at = inWindow(plot, x, y);
      browser.call("Input.dispatchMouseEvent", "type", "mouseMoved", "x", at[0], "y", at[1]);
      double[] after = inWindow(plot, x, y);
      if (Math.hypot(after[0] - at[0], after[1] - at[1]) < 0.5
          && !sounding(plot).contains("outside")) {
        break;
      }
      Thread.sleep(50);
    }
    return sounding(plot);
  }

  private String sounding(String plot) throws Exception {
    return browser
        .value("document.getElementById('" + plot + "-sounding').textContent")
        .textValue();
  }

  /** The temperature in a plain wall is linear: 20 − 25 (0.13 + x/0.5)/0.57 °C, x in m. */
  @Test
  void hovering_shows_temperature_flow_and_material() throws Exception {
    Pattern said =
        Pattern.compile(
            "\\((−?-?[0-9.]+), ([0-9.]+)\\) mm: (-?[0-9.]+) °C, ([0-9.]+) W/m² (.), brick");
    for (String plot : List.of("section", "temperature", "heat-flow")) {
      for (double x : new double[] {20, 100, 180}) {
        Matcher words = said.matcher(hover(plot, x, 500));
        assertThat(words.matches()).as(sounding(plot)).isTrue();
        double at = Double.parseDouble(words.group(1));
        assertThat(at).isCloseTo(x, within(8.0));
        double celsius = 20 - 25 * (0.13 + at / 1000 / 0.5) / RESISTANCE;
        // A tenth printed, and half a millimetre of place as printed: 25 K/0.57/0.5 a metre.
        assertThat(Double.parseDouble(words.group(3))).isCloseTo(celsius, within(0.15));
        assertThat(Double.parseDouble(words.group(4))).isCloseTo(25 / RESISTANCE, within(1.0));
        assertThat(words.group(5)).isEqualTo("→");
      }
    }
    assertThat(hover("section", -60, 500)).endsWith("outside the section");
  }

  @Test
  void arrow_keys_move_a_mark_and_read_it() throws Exception {
    browser.value("document.querySelector('#figure-temperature .plot').focus()");
    press("ArrowRight");
    String first = sounding("temperature");
    assertThat(first).contains("brick");
    press("ArrowRight");
    String second = sounding("temperature");
    assertThat(celsius(second)).isLessThan(celsius(first));
    press("ArrowLeft");
    assertThat(sounding("temperature")).isEqualTo(first);
    String mark = "#figure-temperature svg > path[visibility='visible']";
    assertThat(browser.value("document.querySelectorAll(\"" + mark + "\").length").intValue())
        .isEqualTo(1);
    browser.value("document.activeElement.blur()");
    assertThat(browser.value("document.querySelectorAll(\"" + mark + "\").length").intValue())
        .isZero();
  }

  private void press(String key) throws Exception {
    browser.call("Input.dispatchKeyEvent", "type", "keyDown", "key", key, "code", key);
    browser.call("Input.dispatchKeyEvent", "type", "keyUp", "key", key, "code", key);
  }

  private static double celsius(String sounding) {
    return Double.parseDouble(sounding.replaceFirst(".*: (-?[0-9.]+) °C.*", "$1"));
  }

  /** WCAG 2.1, 1.4.3: text has at least 4.5 times the luminance of its ground, or a part of it. */
  @Test
  void every_text_reads_in_light_and_in_dark() throws Exception {
    List<Double> grounds = new ArrayList<>();
    for (String scheme : List.of("light", "dark")) {
      browser.call(
          "Emulation.setEmulatedMedia",
          "features",
          List.of(java.util.Map.of("name", "prefers-color-scheme", "value", scheme)));
      double ground = luminance("body", "backgroundColor");
      grounds.add(ground);
      for (String part :
          List.of(
              "h1", "h2", "h3", "th", "td", ".below", ".note", ".faint", ".foot", ".sounding")) {
        double ink = luminance(part, "color");
        double ratio = (Math.max(ink, ground) + 0.05) / (Math.min(ink, ground) + 0.05);
        assertThat(ratio).as(part + " in " + scheme).isGreaterThan(4.5);
      }
    }
    assertThat(grounds.get(0)).isGreaterThan(0.9);
    assertThat(grounds.get(1)).isLessThan(0.1);
    // The plots keep their paper, on which their scales are made.
    assertThat(luminance(".plot", "backgroundColor")).isGreaterThan(0.9);
    browser.call("Emulation.setEmulatedMedia", "features", List.of());
  }

  /** Relative luminance of a computed colour (WCAG 2.1). */
  private double luminance(String part, String property) throws Exception {
    String colour =
        browser
            .value("getComputedStyle(document.querySelector('" + part + "'))['" + property + "']")
            .textValue();
    Matcher rgb = Pattern.compile("rgb\\((\\d+), (\\d+), (\\d+)\\)").matcher(colour);
    assertThat(rgb.matches()).as(part + ": " + colour).isTrue();
    double[] weights = {0.2126, 0.7152, 0.0722};
    double sum = 0;
    for (int k = 0; k < 3; k++) {
      double c = Integer.parseInt(rgb.group(k + 1)) / 255.0;
      sum += weights[k] * (c <= 0.04045 ? c / 12.92 : Math.pow((c + 0.055) / 1.055, 2.4));
    }
    return sum;
  }

  /** A4 is 210 by 297 mm (ISO 216), Letter 8.5 by 11 in. */
  @Test
  void prints_on_a4_and_letter() throws Exception {
    for (double[] paper : new double[][] {{210 / 25.4, 297 / 25.4}, {8.5, 11}}) {
      JsonNode printed =
          browser.call(
              "Page.printToPDF",
              "paperWidth",
              paper[0],
              "paperHeight",
              paper[1],
              "printBackground",
              false,
              "preferCSSPageSize",
              false);
      byte[] pdf = Base64.getDecoder().decode(printed.get("data").textValue());
      try (PDDocument document = Loader.loadPDF(pdf)) {
        assertThat((double) document.getPage(0).getMediaBox().getWidth())
            .isCloseTo(paper[0] * 72, within(1.0));
        String text = new PDFTextStripper().getText(document).replaceAll("\\s+", " ");
        assertThat(text)
            .contains("Plain wall", "certified", "licensed professional", "SHA-256")
            .doesNotContain("Point at the section");
        assertThat(document.getNumberOfPages()).isBetween(2, 9);
      }
    }
  }

  @Test
  void nothing_is_wider_than_the_window() throws Exception {
    for (int width : new int[] {1000, 390}) {
      browser.call(
          "Emulation.setDeviceMetricsOverride",
          "width",
          width,
          "height",
          900,
          "deviceScaleFactor",
          1,
          "mobile",
          false);
      assertThat(browser.value("document.documentElement.scrollWidth").intValue())
          .isLessThanOrEqualTo(width);
    }
    browser.call("Emulation.clearDeviceMetricsOverride");
  }

  /** What a screen reader is given: names of headings, tables and pictures, regions of the page. */
  @Test
  void a_screen_reader_finds_its_way() throws Exception {
    List<String> roles = new ArrayList<>();
    List<String> nameless = new ArrayList<>();
    for (JsonNode node : browser.call("Accessibility.getFullAXTree").get("nodes")) {
      String role = node.path("role").path("value").asText();
      boolean ignored = node.path("ignored").asBoolean();
      if (ignored) {
        continue;
      }
      roles.add(role);
      boolean named = !node.path("name").path("value").asText().isBlank();
      boolean needs =
          List.of("heading", "table", "image", "region", "group", "columnheader", "rowheader")
              .contains(role);
      if (needs && !named) {
        nameless.add(node.toString());
      }
    }
    assertThat(nameless).isEmpty();
    assertThat(roles).contains("main", "heading", "table", "columnheader", "rowheader", "region");
    assertThat(roles.stream().filter(r -> r.equals("image") || r.equals("img")).count())
        .isGreaterThanOrEqualTo(4);
  }

  @Test
  void without_a_script_all_but_the_pointer_is_there() throws Exception {
    browser.call("Emulation.setScriptExecutionDisabled", "value", true);
    browser.open(sheet.toUri());
    assertThat(browser.value("document.querySelectorAll('.sounding').length").intValue()).isZero();
    assertThat(browser.value("document.querySelectorAll('svg').length").intValue()).isEqualTo(4);
    browser.call("Emulation.setScriptExecutionDisabled", "value", false);
    browser.open(sheet.toUri());
    assertThat(browser.value("document.querySelectorAll('.sounding').length").intValue())
        .isEqualTo(3);
  }
}
