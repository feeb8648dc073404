package coldseam.cli.plot;

import java.awt.Color;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.Shape;
import java.awt.geom.AffineTransform;
import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.concurrent.Callable;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import javax.imageio.ImageIO;

/** Draws pixels, two a point. */
final class PngCanvas extends Canvas {
  private static final double PIXELS_PER_POINT = 2;

  private final Graphics2D graphics;
  private final BufferedImage image;

  private PngCanvas(Graphics2D graphics, BufferedImage image) {
    this.graphics = graphics;
    this.image = image;
  }

  static PngCanvas blank(double width, double height) throws NoFontException {
    BufferedImage image =
        new BufferedImage(
            (int) Math.ceil(width * PIXELS_PER_POINT),
            (int) Math.ceil(height * PIXELS_PER_POINT),
            BufferedImage.TYPE_INT_RGB);
    Graphics2D graphics = image.createGraphics();
    graphics.scale(PIXELS_PER_POINT, PIXELS_PER_POINT);
    graphics.setRenderingHint(RenderingHints.KEY_ANTIALIASING, RenderingHints.VALUE_ANTIALIAS_ON);
    graphics.setRenderingHint(
        RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
    graphics.setRenderingHint(
        RenderingHints.KEY_FRACTIONALMETRICS, RenderingHints.VALUE_FRACTIONALMETRICS_ON);
    graphics.setRenderingHint(RenderingHints.KEY_STROKE_CONTROL, RenderingHints.VALUE_STROKE_PURE);
    probe(graphics);
    return new PngCanvas(graphics, image);
  }

  /**
   * Asks for the width of a letter. A machine without fonts fails at it in ways that differ from
   * one Java to the next, errors among them; a task turns all of them into one.
   */
  private static void probe(Graphics2D graphics) throws NoFontException {
    FutureTask<Integer> width = new FutureTask<>(new LetterWidth(graphics));
    width.run();
    try {
      if (width.get() <= 0) {
        throw new NoFontException(null);
      }
    } catch (ExecutionException e) {
      throw new NoFontException(e.getCause());
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new NoFontException(e);
    }
  }

  private record LetterWidth(Graphics2D graphics) implements Callable<Integer> {
    @Override
    public Integer call() {
      return graphics.getFontMetrics(Lettering.LABEL.font()).stringWidth("m");
    }
  }

  @Override
  void layer(String id) {
    // Pixels have no layers.
  }

  @Override
  void fill(Shape shape, Colour colour) {
    graphics.setPaint(new Color(colour.rgb()));
    graphics.fill(shape);
  }

  @Override
  void stroke(Shape shape, Colour colour, Pen pen) {
    graphics.setPaint(new Color(colour.rgb()));
    graphics.setStroke(pen.stroke());
    graphics.draw(shape);
  }

  @Override
  void text(String text, double x, double y, Lettering lettering, Anchor anchor, double turn) {
    if (text.isEmpty()) {
      return;
    }
    graphics.setFont(lettering.font());
    graphics.setPaint(new Color(lettering.ink().rgb()));
    AffineTransform saved = graphics.getTransform();
    graphics.rotate(turn, x, y);
    double before = beforeAnchor(text, lettering, anchor);
    graphics.drawString(text, (float) (x - before), (float) y);
    graphics.setTransform(saved);
  }

  /** How far to the right of its start the anchor of a text lies. */
  private double beforeAnchor(String text, Lettering lettering, Anchor anchor) {
    if (anchor == Anchor.START) {
      return 0;
    }
    double width =
        lettering.font().getStringBounds(text, graphics.getFontRenderContext()).getWidth();
    return anchor == Anchor.MIDDLE ? width / 2 : width;
  }

  byte[] bytes() {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    try {
      if (!ImageIO.write(image, "png", out)) {
        throw new IllegalStateException("this Java cannot write PNG files");
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return out.toByteArray();
  }
}
