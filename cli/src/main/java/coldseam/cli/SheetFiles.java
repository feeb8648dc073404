package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cli.plot.PdfDocument;
import coldseam.cli.plot.Plots;
import coldseam.cli.sheet.Picture;
import coldseam.cli.sheet.Provenance;
import coldseam.cli.sheet.Sheet;
import coldseam.cli.sheet.Subject;
import coldseam.solver.Solver;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.LocalDate;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;

/** The sheet for the file, as a page for a browser and as PDF. */
record SheetFiles(Subject subject, Provenance provenance) {
  static final String PAGE = "sheet.html";
  static final String PDF = "sheet.pdf";

  /** Room for a plot within the margins of a page, points: A4, or Letter, which is less tall. */
  private static final double PLOT_WIDTH = 510;

  private static final double PLOT_HEIGHT = 620;

  /** Room for the section, which follows the title block and the question. */
  private static final double SECTION_HEIGHT = 470;

  /** The plots that show values under a pointer. */
  private static final List<Plots.Kind> SOUNDED =
      List.of(Plots.Kind.SECTION, Plots.Kind.TEMPERATURE, Plots.Kind.HEAT_FLOW);

  /**
   * Prepares, right after a case was read: what it was read from is hashed as it is now.
   *
   * @param from the case
   * @param subject what is asked
   * @param here how files are named
   * @return the sheet, not yet written
   * @throws IOException if a file cannot be read again
   */
  static SheetFiles of(Case from, Subject subject, Surroundings here) throws IOException {
    List<Provenance.Source> sources = new ArrayList<>();
    for (Path file : from.files()) {
      Path found = here.cwd().resolve(file);
      sources.add(new Provenance.Source(here.shown(found), sha256(Files.readAllBytes(found))));
    }
    Path file = here.cwd().resolve(from.file());
    String changed =
        LocalDate.ofInstant(Files.getLastModifiedTime(file).toInstant(), ZoneId.systemDefault())
            .toString();
    return new SheetFiles(subject, new Provenance(from.titleBlock(), changed, sources));
  }

  private static String sha256(byte[] content) {
    try {
      return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(content));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java has SHA-256", e);
    }
  }

  /**
   * The page for a browser.
   *
   * @param result the result
   * @param inspection what was understood of the case
   * @param plots plots of the result
   * @param drawn the plots as SVG
   * @return the page
   */
  String page(
      Result result, Solver.Inspection inspection, Plots plots, Map<Plots.Kind, String> drawn) {
    List<Picture> pictures = new ArrayList<>();
    for (Map.Entry<Plots.Kind, String> svg : drawn.entrySet()) {
      Plots.Kind kind = svg.getKey();
      String element = svg.getValue().substring(svg.getValue().indexOf("<svg"));
      String markup = "<div class=\"plot\">" + element + "</div>";
      pictures.add(new Picture(kind.stem(), caption(kind), markup));
    }
    return Sheet.page(subject, result, inspection, provenance, pictures, plots.soundings(SOUNDED));
  }

  /**
   * The sheet as PDF: A4, or Letter for a case drawn in inches.
   *
   * @param result the result
   * @param inspection what was understood of the case
   * @param plots plots of the result
   * @param kinds which of them
   * @return the bytes of the file
   */
  byte[] pdf(Result result, Solver.Inspection inspection, Plots plots, List<Plots.Kind> kinds) {
    List<Picture> pictures = new ArrayList<>();
    for (Plots.Kind kind : kinds) {
      String element =
          PdfDocument.element(
              plots, kind, PLOT_WIDTH, kind == Plots.Kind.SECTION ? SECTION_HEIGHT : PLOT_HEIGHT);
      pictures.add(new Picture(kind.stem(), caption(kind), element));
    }
    String html = Sheet.paper(subject, result, inspection, provenance, pictures);
    return PdfDocument.of(html, plots, "Coldseam " + subject.version());
  }

  private static String caption(Plots.Kind kind) {
    return switch (kind) {
      case SECTION -> "The section: materials, spaces with films, dimensions, reference lengths";
      case TEMPERATURE -> "Temperature: isotherms and coldest points; estimates";
      case HEAT_FLOW -> "Heat flow: every tube carries the same heat";
      case SHARES -> "What the numbers hang on";
      case MESH -> "The mesh";
    };
  }
}
