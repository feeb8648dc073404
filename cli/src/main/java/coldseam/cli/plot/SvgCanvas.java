package coldseam.cli.plot;

import java.awt.Shape;
import java.awt.geom.PathIterator;

/**
 * Writes SVG as it is drawn, element after element: text stays text, anchored where it was put, so
 * that any sans-serif face fits. Nothing of it is kept but the text itself, since a tree of
 * elements takes longer to build than a detail to solve.
 */
final class SvgCanvas extends Canvas {
  static final String SVG = "http://www.w3.org/2000/svg";

  private final String name;
  private final StringBuilder out = new StringBuilder(1 << 16);
  private String layer = "ground";
  private boolean open;

  private SvgCanvas(String name) {
    this.name = name;
  }

  /**
   * An empty drawing.
   *
   * @param name begins every id, so that several drawings can stand in one document
   */
  static SvgCanvas blank(String name) {
    return new SvgCanvas(name);
  }

  @Override
  void layer(String id) {
    closeLayer();
    layer = id;
  }

  /** A layer begins with the first thing drawn in it. */
  private void openLayer() {
    if (!open) {
      out.append("<g id=\"").append(name).append('-').append(layer).append("\">\n");
      open = true;
    }
  }

  private void closeLayer() {
    if (open) {
      out.append("</g>\n");
      open = false;
    }
  }

  @Override
  void fill(Shape shape, Colour colour) {
    if (path(shape)) {
      colour(" fill", colour);
      out.append("/>\n");
    }
  }

  @Override
  void stroke(Shape shape, Colour colour, Pen pen) {
    if (path(shape)) {
      out.append(" fill=\"none\"");
      colour(" stroke", colour);
      out.append(" stroke-width=\"");
      PathText.number(pen.width(), out);
      if (pen.dashes().length > 0) {
        out.append("\" stroke-dasharray=\"");
        for (int i = 0; i < pen.dashes().length; i++) {
          PathText.number(pen.dashes()[i], i == 0 ? out : out.append(' '));
        }
      }
      out.append("\"/>\n");
    }
  }

  /** Begins a path, unless the shape is empty. */
  private boolean path(Shape shape) {
    PathIterator pieces = shape.getPathIterator(null);
    if (pieces.isDone()) {
      return false;
    }
    openLayer();
    out.append("<path");
    if (pieces.getWindingRule() == PathIterator.WIND_EVEN_ODD) {
      out.append(" fill-rule=\"evenodd\"");
    }
    out.append(" d=\"");
    PathText.of(pieces, out);
    out.append('"');
    return true;
  }

  private void colour(String attribute, Colour colour) {
    out.append(attribute).append("=\"#");
    for (int shift = 20; shift >= 0; shift -= 4) {
      out.append(Character.forDigit(colour.rgb() >> shift & 0xF, 16));
    }
    out.append('"');
  }

  @Override
  void text(String text, double x, double y, Lettering lettering, Anchor anchor, double turn) {
    if (text.isEmpty()) {
      return;
    }
    openLayer();
    out.append("<text x=\"");
    PathText.number(x, out);
    out.append("\" y=\"");
    PathText.number(y, out);
    out.append("\" font-size=\"");
    PathText.number(lettering.size(), out);
    out.append('"');
    if (lettering.bold()) {
      out.append(" font-weight=\"bold\"");
    }
    colour(" fill", lettering.ink());
    if (anchor != Anchor.START) {
      out.append(" text-anchor=\"").append(anchor == Anchor.MIDDLE ? "middle" : "end").append('"');
    }
    if (turn != 0) {
      out.append(" transform=\"rotate(");
      PathText.number(Math.toDegrees(turn), out);
      out.append(' ');
      PathText.number(x, out);
      out.append(' ');
      PathText.number(y, out);
      out.append(")\"");
    }
    out.append('>');
    escape(text);
    out.append("</text>\n");
  }

  /**
   * Ends the drawing.
   *
   * @param width of the sheet, points
   * @param height of the sheet, points
   * @param title what a reader who cannot see the plot is told first
   * @param description what it shows, in a few sentences
   * @return the whole document as text: no document type, nothing from elsewhere
   */
  String document(double width, double height, String title, String description) {
    closeLayer();
    String drawn = out.toString();
    out.setLength(0);
    int w = (int) width;
    int h = (int) height;
    out.append("<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n<svg xmlns=\"").append(SVG);
    out.append("\" width=\"").append(w).append("\" height=\"").append(h);
    out.append("\" viewBox=\"0 0 ").append(w).append(' ').append(h);
    out.append("\" font-family=\"sans-serif\" role=\"img\" aria-labelledby=\"");
    out.append(name).append("-title ").append(name).append("-desc\">\n");
    told("title", title);
    told("desc", description);
    return out.append(drawn).append("</svg>\n").toString();
  }

  private void told(String element, String text) {
    out.append('<').append(element).append(" id=\"").append(name).append('-').append(element);
    out.append("\">");
    escape(text);
    out.append("</").append(element).append(">\n");
  }

  private void escape(String text) {
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      switch (c) {
        case '<' -> out.append("&lt;");
        case '>' -> out.append("&gt;");
        case '&' -> out.append("&amp;");
        case '"' -> out.append("&quot;");
        default -> {
          if (c >= ' ' || c == '\n' || c == '\t') {
            out.append(c);
          }
        }
      }
    }
  }
}
