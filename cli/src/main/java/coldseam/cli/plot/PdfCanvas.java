package coldseam.cli.plot;

import com.openhtmltopdf.css.constants.IdentValue;
import com.openhtmltopdf.css.parser.FSRGBColor;
import com.openhtmltopdf.css.style.CalculatedStyle;
import com.openhtmltopdf.css.value.FontSpecification;
import com.openhtmltopdf.pdfboxout.PdfBoxFastOutputDevice;
import com.openhtmltopdf.render.FSFont;
import com.openhtmltopdf.render.PageBox;
import com.openhtmltopdf.render.RenderingContext;
import java.awt.BasicStroke;
import java.awt.Shape;
import java.awt.geom.AffineTransform;
import java.awt.geom.Point2D;

/**
 * Draws on a page of a PDF: lines stay lines, and text stays text in the font of the document. It
 * asks nothing of the fonts of the machine.
 */
final class PdfCanvas extends Canvas {
  private final PdfBoxFastOutputDevice device;
  private final RenderingContext context;
  private final AffineTransform onPage;
  private final double scale;

  /**
   * A place on a page.
   *
   * @param device the page
   * @param context of the document
   * @param x of the upper left corner, in the dots of the device
   * @param y of the upper left corner, dots
   * @param scale dots in a point of the plot
   */
  PdfCanvas(
      PdfBoxFastOutputDevice device, RenderingContext context, double x, double y, double scale) {
    this.device = device;
    this.context = context;
    this.scale = scale;
    onPage = new AffineTransform(scale, 0, 0, scale, x, y);
  }

  @Override
  void layer(String id) {
    // A page of a PDF has one layer.
  }

  @Override
  void fill(Shape shape, Colour colour) {
    device.setColor(paint(colour));
    device.fill(onPage.createTransformedShape(shape));
  }

  @Override
  void stroke(Shape shape, Colour colour, Pen pen) {
    device.setColor(paint(colour));
    device.setStroke(stroke(pen));
    device.draw(onPage.createTransformedShape(shape));
  }

  private BasicStroke stroke(Pen pen) {
    BasicStroke drawn = pen.stroke();
    float[] dashes = drawn.getDashArray();
    if (dashes != null) {
      for (int i = 0; i < dashes.length; i++) {
        dashes[i] *= (float) scale;
      }
    }
    return new BasicStroke(
        (float) (drawn.getLineWidth() * scale),
        drawn.getEndCap(),
        drawn.getLineJoin(),
        drawn.getMiterLimit(),
        dashes,
        0);
  }

  private static FSRGBColor paint(Colour colour) {
    return new FSRGBColor(colour.red(), colour.green(), colour.blue());
  }

  @Override
  void text(String text, double x, double y, Lettering lettering, Anchor anchor, double turn) {
    if (text.isEmpty()) {
      return;
    }
    FSFont font = font(lettering);
    double width = context.getTextRenderer().getWidth(context.getFontContext(), font, text);
    double before = anchor == Anchor.START ? 0 : anchor == Anchor.MIDDLE ? width / 2 : width;
    Point2D at = onPage.transform(new Point2D.Double(x, y), null);
    device.setFont(font);
    device.setFontSpecification(wanted(lettering));
    device.setColor(paint(lettering.ink()));
    if (turn == 0) {
      device.drawString(text, (float) (at.getX() - before), (float) at.getY(), null);
      return;
    }
    device.pushTransformLayer(turned(turn, at));
    device.drawString(text, (float) (at.getX() - before), (float) at.getY(), null);
    device.popTransformLayer();
  }

  /** A turn about a place, in the coordinates of PDF: y upwards from the foot of the page. */
  private AffineTransform turned(double turn, Point2D at) {
    PageBox page = context.getPage();
    double left = page.getMarginBorderPadding(context, CalculatedStyle.LEFT);
    double top = page.getMarginBorderPadding(context, CalculatedStyle.TOP) - page.getPaintingTop();
    double pointsPerDot = device.getDeviceLength(1);
    double up = device.normalizeY((float) ((at.getY() + top) * pointsPerDot)) / pointsPerDot;
    return AffineTransform.getRotateInstance(-turn, at.getX() + left, up);
  }

  private FSFont font(Lettering lettering) {
    return device
        .getSharedContext()
        .getFontResolver()
        .resolveFont(device.getSharedContext(), wanted(lettering));
  }

  private FontSpecification wanted(Lettering lettering) {
    FontSpecification wanted = new FontSpecification();
    wanted.families = new String[] {PdfDocument.FAMILY};
    wanted.size = (float) (lettering.size() * scale);
    wanted.fontWeight = lettering.bold() ? IdentValue.BOLD : IdentValue.NORMAL;
    wanted.fontStyle = IdentValue.NORMAL;
    wanted.variant = IdentValue.NORMAL;
    return wanted;
  }
}
