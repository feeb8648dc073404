package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;

import coldseam.cli.plot.Plots.Kind;
import java.awt.Color;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javax.imageio.ImageIO;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.rendering.ImageType;
import org.apache.pdfbox.rendering.PDFRenderer;
import org.apache.pdfbox.text.PDFTextStripper;
import org.apache.pdfbox.text.TextPosition;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Plots in a PDF are those that are written as pixels and as SVG. */
class PdfDocumentTest {
  private static final int TILES = 24;

  private static Plots balcony() {
    Solved solved = Solved.shipped("balcony.yaml");
    return Plots.of(solved.result(), solved.caption());
  }

  /** One plot alone on a page of its own size. */
  private static byte[] alone(Plots plots, Kind kind) {
    Page page = plots.view(kind).page();
    String size = page.width() + "pt " + page.height() + "pt";
    return PdfDocument.of(
        "<html lang=\"en\"><head><title>One</title><style>@page{size:"
            + size
            + ";margin:0} html{font-family:sheet} body{margin:0}</style></head><body>"
            + PdfDocument.element(plots, kind, page.width(), page.height())
            + "</body></html>",
        plots,
        "test");
  }

  /** Mean colours of tiles: text is set in another face, everything else must agree. */
  private static double[][] tiles(BufferedImage image) {
    double[][] sums = new double[TILES * TILES][4];
    for (int y = 0; y < image.getHeight(); y++) {
      for (int x = 0; x < image.getWidth(); x++) {
        int tile = y * TILES / image.getHeight() * TILES + x * TILES / image.getWidth();
        Color colour = new Color(image.getRGB(x, y));
        sums[tile][0] += colour.getRed();
        sums[tile][1] += colour.getGreen();
        sums[tile][2] += colour.getBlue();
        sums[tile][3]++;
      }
    }
    for (double[] sum : sums) {
      for (int k = 0; k < 3; k++) {
        sum[k] /= sum[3];
      }
    }
    return sums;
  }

  @ParameterizedTest
  @EnumSource(
      value = Kind.class,
      names = {"SECTION", "TEMPERATURE", "HEAT_FLOW", "SHARES"})
  void look_like_their_pixels(Kind kind) throws Exception {
    Plots plots = balcony();
    BufferedImage pixels = ImageIO.read(new ByteArrayInputStream(plots.png(kind)));
    BufferedImage printed;
    try (PDDocument document = Loader.loadPDF(alone(plots, kind))) {
      assertThat(document.getNumberOfPages()).isEqualTo(1);
      printed = new PDFRenderer(document).renderImage(0, 2, ImageType.RGB);
    }
    double[][] expected = tiles(pixels);
    double[][] found = tiles(printed);
    double worst = 0;
    double all = 0;
    double spread = 0;
    for (int i = 0; i < found.length; i++) {
      double off = 0;
      for (int k = 0; k < 3; k++) {
        off += Math.abs(found[i][k] - expected[i][k]) / 3;
        spread = Math.max(spread, 255 - expected[i][k]);
      }
      worst = Math.max(worst, off);
      all += off / found.length;
    }
    assertThat(spread).as("the plot is no blank sheet").isGreaterThan(30);
    assertThat(all).as("mean difference of 255").isLessThan(2);
    assertThat(worst).as("largest difference of a tile").isLessThan(45);
  }

  /** Every text of the SVG, turned ones too, can be selected in the PDF. */
  @ParameterizedTest
  @EnumSource(
      value = Kind.class,
      names = {"SECTION", "TEMPERATURE", "HEAT_FLOW", "SHARES"})
  void keep_their_text(Kind kind) throws IOException {
    Plots plots = balcony();
    String text;
    try (PDDocument document = Loader.loadPDF(alone(plots, kind))) {
      text = letters(new PDFTextStripper().getText(document));
    }
    Set<String> missing = new TreeSet<>();
    int checked = 0;
    for (String piece : plots.svg(kind).split("</text>")) {
      int start = piece.lastIndexOf("<text ");
      if (start < 0 || piece.startsWith("</svg>", Math.max(0, piece.length() - 7))) {
        continue;
      }
      boolean turned = piece.indexOf("rotate(", start) > 0;
      String said = piece.substring(piece.indexOf('>', start) + 1);
      for (String word : letters(said).split("\\s+")) {
        checked++;
        // Of turned text a reader may put the letters in another order.
        if (!text.contains(word) && !(turned && word.length() > 3)) {
          missing.add(word);
        }
      }
    }
    assertThat(checked).isGreaterThan(10);
    assertThat(missing).isEmpty();
  }

  private static String letters(String text) {
    return text.replace("&lt;", "<")
        .replace("&gt;", ">")
        .replace("&amp;", "&")
        .replace('\u00a0', ' ');
  }

  /** Places and letters of text that reads upwards. */
  private static final class Upwards extends PDFTextStripper {
    private final List<String> letters = new ArrayList<>();

    @Override
    protected void processTextPosition(TextPosition text) {
      if (text.getDir() == 90 && !text.getUnicode().isBlank()) {
        letters.add(text.getUnicode() + Math.round(text.getTextMatrix().getTranslateX()));
      }
    }
  }

  /** Turned a quarter to the left, on the line and with the letters that the SVG has. */
  @Test
  void turned_text_is_where_the_svg_has_it() throws IOException {
    Plots plots = balcony();
    List<String> expected = new ArrayList<>();
    Matcher turned =
        Pattern.compile("<text x=\"([0-9.]+)\"[^>]*rotate\\(-90 [^>]*>([^<]*)</text>")
            .matcher(plots.svg(Kind.SECTION));
    while (turned.find()) {
      for (char letter : letters(turned.group(2)).toCharArray()) {
        if (letter != ' ') {
          expected.add("" + letter + Math.round(Double.parseDouble(turned.group(1))));
        }
      }
    }
    Upwards found = new Upwards();
    try (PDDocument document = Loader.loadPDF(alone(plots, Kind.SECTION))) {
      found.getText(document);
    }
    assertThat(expected).hasSizeGreaterThan(100);
    assertThat(found.letters).containsExactlyInAnyOrderElementsOf(expected);
  }

  @Test
  void says_what_a_reader_is_told_who_cannot_see_it() {
    String element = PdfDocument.element(balcony(), Kind.TEMPERATURE, 500, 600);
    assertThat(element).contains("alt=\"", "coldest surface").doesNotContain("\n");
  }
}
