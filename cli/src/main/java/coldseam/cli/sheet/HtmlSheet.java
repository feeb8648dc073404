package coldseam.cli.sheet;

import coldseam.cases.TitleBlock;
import coldseam.cli.text.Digits;
import coldseam.cli.text.HtmlText;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Table;
import coldseam.solver.Solver;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.Base64;
import java.util.List;
import java.util.Optional;

/**
 * The sheet for the file: one page with everything on it, nothing fetched from elsewhere. It says
 * what the card says, in the same words, with the pictures, the title block and where it comes
 * from.
 */
final class HtmlSheet {
  private static final String NO_DATE = "not known";

  private final Subject subject;
  private final Result result;
  private final Solver.Inspection inspection;
  private final Provenance provenance;
  private final HtmlText text = new HtmlText();
  private final Ink ink = text.ink();

  HtmlSheet(Subject subject, Result result, Solver.Inspection inspection, Provenance provenance) {
    this.subject = subject;
    this.result = result;
    this.inspection = solved(inspection, result);
    this.provenance = provenance;
  }

  /**
   * What was understood, with the conductivities of cavities as they were found in solving. Where
   * the surface temperatures were not asked for, or were solved on a section of their own, it stays
   * as it was before.
   */
  private static Solver.Inspection solved(Solver.Inspection before, Result result) {
    if (result.surface().isEmpty()
        || result.surface().get().partition() != result.heatLoss().partition()) {
      return before;
    }
    return new Solver.Inspection(
        result.detail(),
        result.heatLoss().partition(),
        result.heatLoss().conditions(),
        result.surface().get().conditions(),
        before.flanks(),
        before.assumptions(),
        before.warnings());
  }

  /**
   * The page for a browser, with a script for what stands under the pointer.
   *
   * @param pictures the plots as SVG elements, in order
   * @param soundings what stands under each place of them, as a JSON object
   * @return the page
   */
  String forScreen(List<Picture> pictures, String soundings) {
    String style = resource("sheet.css");
    String script = resource("sheet.js");
    // Nothing may be fetched; of scripts and styles only these very ones count.
    String policy =
        "default-src 'none'; base-uri 'none'; form-action 'none'; script-src '"
            + hash(script)
            + "'; style-src '"
            + hash(style)
            + "'";
    StringBuilder page = new StringBuilder("<!DOCTYPE html>\n");
    page.append("<html xmlns=\"http://www.w3.org/1999/xhtml\" lang=\"en\">\n<head>\n");
    page.append("<meta charset=\"UTF-8\"/>\n");
    page.append("<meta http-equiv=\"Content-Security-Policy\" content=\"");
    page.append(HtmlText.escaped(policy)).append("\"/>\n");
    page.append("<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\"/>\n");
    page.append("<meta name=\"color-scheme\" content=\"light dark\"/>\n");
    head(page);
    page.append("<style>").append(style).append("</style>\n</head>\n");
    body(page, pictures);
    page.append("<script type=\"application/json\" id=\"soundings\">");
    page.append(inScript(soundings)).append("</script>\n");
    page.append("<script>").append(script).append("</script>\n");
    return page.append("</body>\n</html>\n").toString();
  }

  /** The page for paper, without a script. */
  String forPaper(List<Picture> pictures) {
    StringBuilder page = new StringBuilder("<html lang=\"en\">\n<head>\n");
    head(page);
    page.append("<style>").append(resource("paper.css"));
    page.append("@page { size: ").append(subject.unit().equals("in") ? "Letter" : "A4");
    page.append("; @bottom-left { font-family: sheet; font-size: 7pt; color: #5a626a; content: \"");
    page.append(runningTitle()).append("\" } }\n");
    page.append("</style>\n</head>\n");
    body(page, pictures);
    return page.append("</body>\n</html>\n").toString();
  }

  /** Title, number and revision as a text of a style sheet that stands in an element. */
  private String runningTitle() {
    StringBuilder words = new StringBuilder(subject.title());
    if (provenance.block().number().isPresent()) {
      words.append(" · ").append(provenance.block().number().get());
    }
    if (provenance.block().revision().isPresent()) {
      words.append(" · revision ").append(provenance.block().revision().get());
    }
    StringBuilder quoted = new StringBuilder();
    for (int i = 0; i < words.length(); i++) {
      char c = words.charAt(i);
      if (c == '"' || c == '\\') {
        quoted.append('\\');
      }
      quoted.append(c < ' ' ? ' ' : c);
    }
    return HtmlText.escaped(quoted.toString().replace("\\\"", "\u201d"));
  }

  private void head(StringBuilder page) {
    String variant = subject.variant().isEmpty() ? "" : ", variant " + subject.variant().get();
    page.append("<title>").append(HtmlText.escaped(subject.title() + variant)).append("</title>\n");
    page.append("<meta name=\"description\" content=\"");
    page.append(HtmlText.escaped(Words.SAFETY)).append("\"/>\n");
    page.append("<meta name=\"generator\" content=\"Coldseam ");
    page.append(HtmlText.escaped(subject.version())).append("\"/>\n");
    Optional<String> author = provenance.block().author();
    if (author.isPresent()) {
      page.append("<meta name=\"author\" content=\"");
      page.append(HtmlText.escaped(author.get())).append("\"/>\n");
    }
  }

  private void body(StringBuilder page, List<Picture> pictures) {
    text.element("<header>\n");
    TextCard.title(text, subject);
    titleBlock();
    text.element("<p class=\"safety\">" + HtmlText.escaped(Words.SAFETY) + "</p>\n");
    text.element("</header>\n<main>\n");
    TextCard card = new TextCard(subject, result, ink, text);
    InspectionCard given = new InspectionCard(subject, inspection, ink, text);
    question(given);
    figure(pictures, "section");
    given.given();
    card.results();
    if (!pictures.isEmpty()) {
      text.heading("Pictures", "");
    }
    for (Picture picture : pictures) {
      if (!picture.id().equals("section")) {
        text.figure("figure-" + picture.id(), picture.markup(), picture.caption());
      }
    }
    card.basis();
    checks();
    provenance();
    text.end();
    text.element("</main>\n<footer>\n");
    text.foot(Words.SAFETY, "Coldseam " + subject.version());
    text.element("</footer>\n");
    page.append("<body>\n").append(text.text());
  }

  private void figure(List<Picture> pictures, String id) {
    for (Picture picture : pictures) {
      if (picture.id().equals(id)) {
        text.figure("figure-" + id, picture.markup(), picture.caption());
      }
    }
  }

  /** What is not typed stays a line to fill in. */
  private void titleBlock() {
    TitleBlock block = provenance.block();
    text.element("<dl class=\"block\">\n");
    entry("Project", block.project());
    entry("Detail no.", block.number());
    entry("Revision", block.revision());
    entry("Date", Optional.of(date()));
    entry("By", block.author());
    entry("Checked by", block.checkedBy());
    text.element("</dl>\n");
  }

  private void entry(String name, Optional<String> value) {
    text.element("<div><dt>" + name + "</dt>");
    text.element(
        value.isPresent()
            ? "<dd>" + HtmlText.escaped(value.get()) + "</dd></div>\n"
            : "<dd class=\"open\"><span class=\"unseen\">not filled in</span></dd></div>\n");
  }

  private String date() {
    return provenance.block().date().orElse(provenance.fileDate() + " (case file)");
  }

  private void question(InspectionCard given) {
    Optional<String> question = provenance.block().question();
    if (question.isPresent()) {
      text.heading("Question", "");
      text.paragraph(question.get());
    }
    given.wanted();
    text.note(accuracy());
  }

  private String accuracy() {
    Accuracy asked = subject.accuracy();
    boolean round = Counted.of(result) == Counted.WHOLE;
    String couplings =
        (round ? "L3D the smaller of " : "L2D the smaller of ")
            + Digits.shortest(100 * asked.couplingRelative(), 4)
            + " % and "
            + Digits.shortest(asked.couplingWPerMK(), 6);
    String rest =
        round
            ? " W/K; χ the larger of "
                + Digits.shortest(100 * asked.pointRelative(), 4)
                + " % and "
                + Digits.shortest(asked.pointWPerK(), 6)
                + " W/K"
            : " W/(m·K); ψ "
                + Digits.shortest(asked.psiWPerMK(), 6)
                + " W/(m·K); U "
                + Digits.shortest(100 * asked.transmittanceRelative(), 4)
                + " %";
    return "Accuracy asked for, half-widths: " + couplings + rest;
  }

  private void checks() {
    text.heading("Model checks", "");
    if (result.warnings().isEmpty()) {
      text.paragraph("No warnings.");
    } else {
      text.alerts("Warnings", result.warnings());
    }
    List<String> missed = new Reached(subject.accuracy()).inWords(result);
    if (missed.isEmpty()) {
      text.paragraph("The accuracy asked for was reached.");
    } else {
      text.alerts("Accuracy not reached", missed);
    }
    text.note(TextCard.size(result));
  }

  private void provenance() {
    text.heading("Where this sheet comes from", "SHA-256 of each file read");
    Table files = new Table("ll", 2, TextCard.PAGE).named("file", "SHA-256");
    for (Provenance.Source source : provenance.sources()) {
      files.row(source.file(), source.sha256());
    }
    text.table(files);
    String variant = subject.variant().isEmpty() ? "" : ", variant " + subject.variant().get();
    String typed =
        provenance.block().date().isPresent()
            ? "Date as typed in the case; the case file was last changed on "
            : "No date is typed in the case; its file was last changed on ";
    String changed = provenance.fileDate().isEmpty() ? NO_DATE : provenance.fileDate();
    text.note(
        "Coldseam " + subject.version() + ", " + subject.file() + variant + ". " + typed + changed);
  }

  /** A JSON object as it may stand in a script element: the characters of markup escaped. */
  private static String inScript(String json) {
    return json.replace("&", "\\u0026").replace("<", "\\u003c").replace(">", "\\u003e");
  }

  private static String hash(String content) {
    try {
      byte[] digest =
          MessageDigest.getInstance("SHA-256").digest(content.getBytes(StandardCharsets.UTF_8));
      return "sha256-" + Base64.getEncoder().encodeToString(digest);
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java has SHA-256", e);
    }
  }

  private static String resource(String name) {
    try (InputStream in = HtmlSheet.class.getResourceAsStream(name)) {
      // As HTML reads line ends, so that hashes agree whatever they are here.
      return new String(in.readAllBytes(), StandardCharsets.UTF_8).replace("\r\n", "\n");
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
