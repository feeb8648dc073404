package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.cli.text.Digits;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.StringReader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.HexFormat;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import javax.xml.parsers.DocumentBuilderFactory;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NamedNodeMap;
import org.w3c.dom.NodeList;
import org.xml.sax.InputSource;

/** The sheet for the file, as a page and as PDF. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class SheetTest {
  private static final String SAFETY =
      "Local codes and a licensed professional decide; thermal changes to loadbearing or"
          + " fire-separating parts need their approval.";

  private static final String CASE =
      Cases.CORNER.replace("title: Corner", "title: Corner & <b>\"bold\"</b>")
          + """
          sheet:
            project: Mill Lane <4>
            number: D-07
            revision: B
            date: 2026-11-30
            author: A. Reed
            question: Is ψ less than 0.1?
          variants:
            thick: {materials: {brick: {conductivity: 0.25}}}
          """;

  private Path folder;
  private Path file;
  private String html;
  private Document page;
  private byte[] pdf;
  private String pdfText;
  private JsonNode json;

  @BeforeAll
  void solve(@TempDir Path given) throws Exception {
    folder = given;
    file = Cases.write(folder, "corner.yaml", CASE);
    Ran ran = Ran.in(folder, "solve", "corner.yaml", "--sheet", "--pdf", "--no-plots");
    assertThat(ran.err()).isEmpty();
    assertThat(ran.code()).isZero();
    assertThat(ran.out()).contains("result.csv, sheet.html, sheet.pdf");
    Path out = folder.resolve("corner.coldseam");
    html = Files.readString(out.resolve("sheet.html"));
    page =
        DocumentBuilderFactory.newInstance()
            .newDocumentBuilder()
            .parse(new InputSource(new StringReader(html)));
    pdf = Files.readAllBytes(out.resolve("sheet.pdf"));
    try (PDDocument document = Loader.loadPDF(pdf)) {
      pdfText = new PDFTextStripper().getText(document).replaceAll("\\s+", " ");
    }
    json = new ObjectMapper().readTree(out.resolve("result.json").toFile());
  }

  private List<Element> elements(String name) {
    NodeList found = page.getElementsByTagName(name);
    List<Element> all = new ArrayList<>();
    for (int i = 0; i < found.getLength(); i++) {
      all.add((Element) found.item(i));
    }
    return all;
  }

  private static String words(Element element) {
    return element.getTextContent().replaceAll("\\s+", " ").strip();
  }

  @Test
  void names_language_and_title() {
    assertThat(page.getDocumentElement().getAttribute("lang")).isEqualTo("en");
    assertThat(elements("title").get(0).getTextContent()).isEqualTo("Corner & <b>\"bold\"</b>");
    assertThat(elements("h1")).hasSize(1);
    assertThat(html).startsWith("<!DOCTYPE html>\n");
  }

  @Test
  void every_id_is_there_once_and_every_reference_leads_to_one() {
    Set<String> ids = new HashSet<>();
    List<String> references = new ArrayList<>();
    for (Element element : elements("*")) {
      String id = element.getAttribute("id");
      assertThat(id.isEmpty() || ids.add(id)).as(id).isTrue();
      for (String name : List.of("aria-labelledby", "aria-describedby")) {
        references.addAll(List.of(element.getAttribute(name).split(" ")));
      }
    }
    references.removeIf(String::isEmpty);
    assertThat(references).hasSizeGreaterThan(10);
    assertThat(ids).containsAll(references);
  }

  @Test
  void every_table_has_named_columns_and_rows() {
    assertThat(elements("table")).hasSizeGreaterThan(5);
    everyTableIsNamed(page);
  }

  /**
   * Frames, cavities, moisture, floating spaces and bodies of revolution have tables of their own.
   */
  @ParameterizedTest
  @ValueSource(strings = {"frame-pvc", "winter-check", "rod-through-wall", "cellar"})
  void sheets_of_every_kind_are_well_formed_with_named_tables(String name) throws Exception {
    String given = Root.folder().resolve("cases/demo/" + name + ".yaml").toString();
    Ran ran = Ran.in(folder, "solve", given, "--sheet", "--no-plots", "--quiet", "--out", name);
    assertThat(ran.err()).isEmpty();
    Document other =
        DocumentBuilderFactory.newInstance()
            .newDocumentBuilder()
            .parse(folder.resolve(name).resolve("sheet.html").toFile());
    everyTableIsNamed(other);
    assertThat(other.getElementsByTagName("svg").getLength()).isEqualTo(4);
    assertThat(other.getDocumentElement().getTextContent()).contains(SAFETY);
  }

  private static void everyTableIsNamed(Document of) {
    NodeList tables = of.getElementsByTagName("table");
    for (int t = 0; t < tables.getLength(); t++) {
      Element table = (Element) tables.item(t);
      Set<String> scopes = new TreeSet<>();
      NodeList heads = table.getElementsByTagName("th");
      for (int i = 0; i < heads.getLength(); i++) {
        scopes.add(((Element) heads.item(i)).getAttribute("scope"));
      }
      assertThat(scopes).as(words(table)).containsExactly("col", "row");
      Set<Integer> widths = new HashSet<>();
      NodeList rows = table.getElementsByTagName("tr");
      for (int i = 0; i < rows.getLength(); i++) {
        Element row = (Element) rows.item(i);
        widths.add(
            row.getElementsByTagName("th").getLength()
                + row.getElementsByTagName("td").getLength());
      }
      assertThat(widths).as(words(table)).hasSize(1);
    }
  }

  @Test
  void a_window_has_none_and_says_so() {
    String window = Root.folder().resolve("cases/windows/fixed-light.yaml").toString();
    Ran ran = Ran.in(folder, "solve", window, "--sheet", "--out", "window");
    assertThat(ran.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(ran.err()).contains("is a window, which has no sheet");
    assertThat(folder.resolve("window")).doesNotExist();
  }

  /** HTML living standard, 4.3.11: headings of a section rank below that of its parent. */
  @Test
  void headings_go_down_one_step_at_a_time() {
    int rank = 0;
    for (Element element : elements("*")) {
      if (element.getTagName().matches("h[1-6]")) {
        int next = element.getTagName().charAt(1) - '0';
        assertThat(next).as(words(element)).isLessThanOrEqualTo(rank + 1);
        rank = next;
      }
    }
    assertThat(rank).isPositive();
  }

  @Test
  void nothing_comes_from_elsewhere() {
    List<String> addresses = new ArrayList<>();
    for (Element element : elements("*")) {
      assertThat(element.getTagName())
          .isNotIn("link", "img", "iframe", "object", "embed", "base", "video", "audio", "image");
      NamedNodeMap attributes = element.getAttributes();
      for (int i = 0; i < attributes.getLength(); i++) {
        String name = attributes.item(i).getNodeName();
        String value = attributes.item(i).getNodeValue();
        assertThat(name).isNotIn("src", "href", "xlink:href", "srcset", "action", "ping", "style");
        assertThat(name).doesNotStartWith("on");
        if (value.contains("://") && !name.equals("xmlns")) {
          addresses.add(name + "=" + value);
        }
      }
    }
    assertThat(addresses).isEmpty();
    for (Element element : elements("style")) {
      assertThat(element.getTextContent()).doesNotContain("url(", "@import", "@font-face", "//");
    }
    String script = elements("script").get(1).getTextContent();
    // The one address is the name of SVG, which is fetched by nobody.
    assertThat(script.replace("http://www.w3.org/2000/svg", ""))
        .doesNotContain("http", "fetch(", "XMLHttpRequest", "import", "WebSocket", "eval(");
  }

  @Test
  void the_policy_allows_its_own_script_and_style_alone() throws Exception {
    String policy = "";
    for (Element meta : elements("meta")) {
      if (meta.getAttribute("http-equiv").equals("Content-Security-Policy")) {
        policy = meta.getAttribute("content");
      }
    }
    assertThat(policy)
        .contains("default-src 'none'")
        .contains("script-src '" + hash("<script>", "</script>") + "'")
        .contains("style-src '" + hash("<style>", "</style>") + "'");
  }

  /** As a browser does: of the text between the tags. */
  private String hash(String from, String to) throws Exception {
    int start = html.indexOf(from) + from.length();
    String content = html.substring(start, html.indexOf(to, start));
    byte[] digest =
        MessageDigest.getInstance("SHA-256").digest(content.getBytes(StandardCharsets.UTF_8));
    return "sha256-" + java.util.Base64.getEncoder().encodeToString(digest);
  }

  @Test
  void says_what_is_typed_and_leaves_the_rest_to_fill_in() {
    assertThat(words(elements("dl").get(0)))
        .contains("ProjectMill Lane <4>")
        .contains("Detail no.D-07")
        .contains("RevisionB")
        .contains("Date2026-11-30")
        .contains("ByA. Reed")
        .contains("Checked bynot filled in");
    assertThat(words(page.getDocumentElement())).contains("Is ψ less than 0.1?");
    assertThat(pdfText).contains("Mill Lane <4>", "D-07", "2026-11-30", "Is ψ less than 0.1?");
  }

  @Test
  void both_give_every_number_with_its_bounds_and_the_safety_words() {
    String all = words(elements("body").get(0));
    JsonNode psi = json.get("psi").get(0);
    Digits.Figure figure =
        Digits.between(
            psi.get("value_W_per_mK").doubleValue(),
            psi.get("lower_W_per_mK").doubleValue(),
            psi.get("upper_W_per_mK").doubleValue(),
            4);
    JsonNode coupling = json.get("coupling").get(0);
    Digits.Figure l2d =
        Digits.between(
            coupling.get("value_W_per_mK").doubleValue(),
            coupling.get("lower_W_per_mK").doubleValue(),
            coupling.get("upper_W_per_mK").doubleValue(),
            4);
    for (Digits.Figure one : List.of(figure, l2d)) {
      assertThat(all).contains(one.value() + "± " + one.halfWidth());
      assertThat(pdfText).contains(one.value() + " ± " + one.halfWidth());
    }
    assertThat(all).contains(SAFETY, "W/(m·K)certified");
    assertThat(pdfText).contains(SAFETY, "W/(m·K) certified", "ψ internal", "indoors – outdoors");
    for (JsonNode assumption : json.get("assumptions")) {
      assertThat(all).contains(assumption.get("source").textValue());
      assertThat(pdfText).contains(assumption.get("source").textValue().replaceAll("\\s+", " "));
    }
  }

  @Test
  void says_where_it_comes_from() throws Exception {
    String hash =
        HexFormat.of()
            .formatHex(MessageDigest.getInstance("SHA-256").digest(Files.readAllBytes(file)));
    assertThat(html).contains(hash);
    assertThat(pdfText).contains(hash).contains("Coldseam " + Main.VERSION);
  }

  /** A case that typed no date is given that of its file, which is said. */
  @Test
  void a_variant_has_a_sheet_of_its_own() throws IOException {
    Path other = Files.createDirectory(folder.resolve("other"));
    Cases.write(other, "corner.yaml", CASE.replace("  date: 2026-11-30\n", ""));
    Ran ran = Ran.in(other, "solve", "corner.yaml", "--variants", "--sheet", "--no-plots");
    assertThat(ran.code()).isZero();
    String text = Files.readString(other.resolve("corner.coldseam/thick/sheet.html"));
    assertThat(text).contains("corner.yaml, variant thick", "No date is typed in the case");
    assertThat(other.resolve("corner.coldseam/sheet.pdf")).doesNotExist();
    assertThat(other.resolve("corner.coldseam/section.svg")).doesNotExist();
  }

  @Test
  void without_a_folder_there_is_no_place_for_it() {
    Ran ran = Ran.in(folder, "solve", "corner.yaml", "--json", "--pdf");
    assertThat(ran.code()).isEqualTo(ExitCode.BAD_INPUT);
    assertThat(ran.err()).contains("--json writes no files unless --out says where");
  }

  @Test
  void the_pdf_embeds_its_fonts_draws_lines_and_is_tagged() throws IOException {
    try (PDDocument document = Loader.loadPDF(pdf)) {
      int fonts = 0;
      for (PDPage each : document.getPages()) {
        for (COSName name : each.getResources().getFontNames()) {
          PDFont font = each.getResources().getFont(name);
          assertThat(font.isEmbedded()).as(font.getName()).isTrue();
          fonts++;
        }
        for (COSName name : each.getResources().getXObjectNames()) {
          assertThat(each.getResources().isImageXObject(name)).isFalse();
        }
        assertThat(each.getMediaBox().getWidth()).isBetween(594f, 597f);
        assertThat(each.getMediaBox().getHeight()).isBetween(841f, 843f);
      }
      assertThat(fonts).isGreaterThan(1);
      assertThat(document.getDocumentCatalog().getLanguage()).isEqualTo("en");
      assertThat(document.getDocumentCatalog().getMarkInfo().isMarked()).isTrue();
      assertThat(document.getDocumentCatalog().getStructureTreeRoot()).isNotNull();
      assertThat(document.getDocumentInformation().getTitle()).startsWith("Corner & <b>");
    }
    // No ligature: who searches for "fire" finds it.
    assertThat(pdfText).doesNotContain("\ufb01", "\ufb02").contains("first");
  }

  @Test
  void a_case_in_inches_is_printed_on_letter() throws IOException {
    Path inches = Root.folder().resolve("cases/demo/steel-stud-inches.yaml");
    Ran ran = Ran.in(folder, "solve", inches.toString(), "--pdf", "--no-plots", "--out", "inches");
    assertThat(ran.err()).isEmpty();
    try (PDDocument document =
        Loader.loadPDF(Files.readAllBytes(folder.resolve("inches/sheet.pdf")))) {
      assertThat(document.getPage(0).getMediaBox().getWidth()).isBetween(611f, 613f);
      String text = new PDFTextStripper().getText(document);
      assertThat(text).contains("Btu/(h·ft²·°F)").contains("°F");
      for (char greek : "ψλθ".toCharArray()) {
        boolean onCard = ran.out().indexOf(greek) >= 0;
        assertThat(text.indexOf(greek) >= 0 || !onCard).as("" + greek).isTrue();
      }
    }
  }

  /** What stands on the card stands on the page, word for word. */
  @Test
  void the_sheet_says_what_the_card_says() {
    String card = Ran.in(folder, "solve", "corner.yaml", "--no-plots").out();
    Set<String> ofPage = new HashSet<>();
    for (Element element : elements("*")) {
      for (String word : element.getTextContent().split("[\\s,;:()]+")) {
        ofPage.add(word);
      }
    }
    List<String> missing = new ArrayList<>();
    for (String line : card.lines().toList()) {
      if (line.startsWith("Written to") || line.contains("triangles")) {
        continue;
      }
      for (String word : line.strip().split("[\\s,;:()]+")) {
        if (!word.isEmpty() && !word.equals("!") && !ofPage.contains(word)) {
          missing.add(word);
        }
      }
    }
    assertThat(missing).isEmpty();
  }
}
