package coldseam.cli.plot;

import com.openhtmltopdf.extend.FSObjectDrawer;
import com.openhtmltopdf.extend.FSObjectDrawerFactory;
import com.openhtmltopdf.extend.OutputDevice;
import com.openhtmltopdf.outputdevice.helper.BaseRendererBuilder.FontStyle;
import com.openhtmltopdf.outputdevice.helper.ExternalResourceControlPriority;
import com.openhtmltopdf.pdfboxout.PDFontSupplier;
import com.openhtmltopdf.pdfboxout.PdfBoxFastOutputDevice;
import com.openhtmltopdf.pdfboxout.PdfRendererBuilder;
import com.openhtmltopdf.render.RenderingContext;
import com.openhtmltopdf.util.XRLog;
import java.awt.Shape;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Map;
import java.util.logging.Level;
import org.apache.fontbox.FontBoxFont;
import org.apache.fontbox.ttf.TTFParser;
import org.apache.fontbox.ttf.TrueTypeFont;
import org.apache.pdfbox.io.RandomAccessReadBuffer;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.font.CIDFontMapping;
import org.apache.pdfbox.pdmodel.font.FontMapper;
import org.apache.pdfbox.pdmodel.font.FontMappers;
import org.apache.pdfbox.pdmodel.font.FontMapping;
import org.apache.pdfbox.pdmodel.font.PDCIDSystemInfo;
import org.apache.pdfbox.pdmodel.font.PDFontDescriptor;
import org.apache.pdfbox.pdmodel.font.PDType0Font;
import org.w3c.dom.Element;

/**
 * Sets a page of well-formed HTML as PDF, plots drawn in as lines and text. The font comes with the
 * program and is embedded; nothing is read from the machine or from elsewhere. Headings, tables and
 * figures are tagged for screen readers.
 */
public final class PdfDocument {
  /** What style sheets call the font. */
  static final String FAMILY = "sheet";

  private static final String FONTS = "/net/sf/jasperreports/fonts/dejavu/";
  private static final String PLOT = "application/x-coldseam-plot";

  private PdfDocument() {}

  /**
   * The element that stands for a plot on such a page.
   *
   * @param plots the plots
   * @param kind which of them
   * @param widthPt room there is, points
   * @param heightPt room there is, points
   * @return an element, for the text given to {@link #of}
   */
  public static String element(Plots plots, Plots.Kind kind, double widthPt, double heightPt) {
    View view = plots.view(kind);
    Page page = view.page();
    double scale = Math.min(widthPt / page.width(), heightPt / page.height());
    StringBuilder element = new StringBuilder("<object type=\"").append(PLOT);
    element.append("\" data=\"").append(kind.stem()).append("\" style=\"display:block;width:");
    PathText.number(page.width() * scale, element);
    element.append("pt;height:");
    PathText.number(page.height() * scale, element);
    element.append("pt\" alt=\"");
    String told = view.title() + ". " + view.told();
    for (int i = 0; i < told.length(); i++) {
      char c = told.charAt(i);
      switch (c) {
        case '&' -> element.append("&amp;");
        case '<' -> element.append("&lt;");
        case '"' -> element.append("&quot;");
        default -> element.append(c < ' ' ? ' ' : c);
      }
    }
    return element.append("\"></object>").toString();
  }

  /**
   * Sets a page.
   *
   * @param html well-formed HTML
   * @param plots the plots that its elements stand for
   * @param producer the program, for the properties of the document
   * @return the bytes of the file
   */
  public static byte[] of(String html, Plots plots, String producer) {
    for (String logger : XRLog.listRegisteredLoggers()) {
      XRLog.setLevel(logger, Level.OFF);
    }
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    try (PDDocument document = new PDDocument();
        TrueTypeFont plain = face("DejaVuSansCondensed.ttf");
        TrueTypeFont bold = face("DejaVuSansCondensed-Bold.ttf")) {
      FontMappers.set(new OneFace(plain));
      PdfRendererBuilder builder = new PdfRendererBuilder();
      builder.useFastMode();
      builder.usePDDocument(document);
      builder.usePdfUaAccessibility(true);
      builder.withProducer(producer);
      builder.useFont(embedded(document, plain), FAMILY, 400, FontStyle.NORMAL, true);
      builder.useFont(embedded(document, bold), FAMILY, 700, FontStyle.NORMAL, true);
      for (ExternalResourceControlPriority when : ExternalResourceControlPriority.values()) {
        builder.useExternalResourceAccessControl((uri, type) -> false, when);
      }
      builder.useObjectDrawerFactory(new PlotDrawers(plots));
      builder.withHtmlContent(html, null);
      builder.toStream(out);
      builder.run();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return out.toByteArray();
  }

  private static PDFontSupplier embedded(PDDocument document, TrueTypeFont face)
      throws IOException {
    return new PDFontSupplier(PDType0Font.load(document, face, true));
  }

  /** A face of the program, without ligatures: they are not found by who searches for a word. */
  private static TrueTypeFont face(String file) throws IOException {
    try (InputStream in = PdfDocument.class.getResourceAsStream(FONTS + file)) {
      TrueTypeFont face = new TTFParser().parse(new RandomAccessReadBuffer(in));
      face.setEnableGsub(false);
      return face;
    }
  }

  /**
   * Answers for every font of the machine with one of ours: the library asks for a font that forms
   * might need, and would otherwise look through all of the machine for it and keep a list in the
   * user's home.
   */
  private record OneFace(TrueTypeFont face) implements FontMapper {
    @Override
    public FontMapping<TrueTypeFont> getTrueTypeFont(String name, PDFontDescriptor descriptor) {
      return new FontMapping<>(face, true);
    }

    @Override
    public FontMapping<FontBoxFont> getFontBoxFont(String name, PDFontDescriptor descriptor) {
      return new FontMapping<>(face, true);
    }

    @Override
    public CIDFontMapping getCIDFont(
        String name, PDFontDescriptor descriptor, PDCIDSystemInfo system) {
      return new CIDFontMapping(null, face, true);
    }
  }

  private record PlotDrawers(Plots plots) implements FSObjectDrawerFactory {
    @Override
    public FSObjectDrawer createDrawer(Element element) {
      return isReplacedObject(element) ? new PlotDrawer(plots) : null;
    }

    @Override
    public boolean isReplacedObject(Element element) {
      return element.getAttribute("type").equals(PLOT);
    }
  }

  private record PlotDrawer(Plots plots) implements FSObjectDrawer {
    @Override
    public Map<Shape, String> drawObject(
        Element element,
        double x,
        double y,
        double width,
        double height,
        OutputDevice device,
        RenderingContext context,
        int dotsPerPixel) {
      for (Plots.Kind kind : Plots.Kind.values()) {
        if (kind.stem().equals(element.getAttribute("data"))) {
          View view = plots.view(kind);
          Page page = view.page();
          double scale = width / page.width();
          view.draw(new PdfCanvas((PdfBoxFastOutputDevice) device, context, x, y, scale), page);
        }
      }
      return null;
    }
  }
}
