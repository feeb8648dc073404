package coldseam.cases.drawing;

import java.util.List;

/** Outlines of the basic shapes; SVG 1.1, 9. */
final class SvgShapes {
  static final List<String> KNOWN =
      List.of("path", "rect", "circle", "ellipse", "line", "polyline", "polygon");

  private final double width;
  private final double height;

  /**
   * Prepares.
   *
   * @param width what 100 % of a horizontal length are
   * @param height what 100 % of a vertical length are
   */
  SvgShapes(double width, double height) {
    this.width = width;
    this.height = height;
  }

  List<Outline> of(SvgElement e) throws DrawingException {
    return switch (e.name()) {
      case "path" -> SvgPathData.read(e.attribute("d"), e.line());
      case "rect" -> rect(e);
      case "circle" -> {
        double r = SvgLength.of(e, "r", 0, Math.sqrt((width * width + height * height) / 2));
        yield oval(e, r, r);
      }
      case "ellipse" -> oval(e, SvgLength.of(e, "rx", 0, width), SvgLength.of(e, "ry", 0, height));
      case "line" -> List.of(new Outline(x(e, "x1"), y(e, "y1")).line(x(e, "x2"), y(e, "y2")));
      case "polyline" -> points(e, false);
      default -> points(e, true);
    };
  }

  private double x(SvgElement e, String key) throws DrawingException {
    return SvgLength.of(e, key, 0, width);
  }

  private double y(SvgElement e, String key) throws DrawingException {
    return SvgLength.of(e, key, 0, height);
  }

  private List<Outline> oval(SvgElement e, double rx, double ry) throws DrawingException {
    if (!(rx > 0 && ry > 0)) {
      return List.of();
    }
    double cx = x(e, "cx");
    double cy = y(e, "cy");
    Segment.Arc arc = new Segment.Arc(cx, cy, rx, 0, 0, ry, 0, 2 * Math.PI);
    return List.of(new Outline(cx + rx, cy).add(arc).close());
  }

  private List<Outline> rect(SvgElement e) throws DrawingException {
    double x = x(e, "x");
    double y = y(e, "y");
    double w = SvgLength.of(e, "width", 0, width);
    double h = SvgLength.of(e, "height", 0, height);
    if (!(w > 0 && h > 0)) {
      return List.of();
    }
    double givenX = SvgLength.of(e, "rx", -1, width);
    double givenY = SvgLength.of(e, "ry", -1, height);
    double rx = Math.min(w / 2, Math.max(0, givenX < 0 ? givenY : givenX));
    double ry = Math.min(h / 2, Math.max(0, givenY < 0 ? givenX : givenY));
    if (rx == 0 || ry == 0) {
      return List.of(new Outline(x, y).line(x + w, y).line(x + w, y + h).line(x, y + h).close());
    }
    double quarter = Math.PI / 2;
    Outline out = new Outline(x + rx, y).line(x + w - rx, y);
    out.add(new Segment.Arc(x + w - rx, y + ry, rx, 0, 0, ry, -quarter, 0));
    out.line(x + w, y + h - ry);
    out.add(new Segment.Arc(x + w - rx, y + h - ry, rx, 0, 0, ry, 0, quarter));
    out.line(x + rx, y + h);
    out.add(new Segment.Arc(x + rx, y + h - ry, rx, 0, 0, ry, quarter, 2 * quarter));
    out.line(x, y + ry);
    out.add(new Segment.Arc(x + rx, y + ry, rx, 0, 0, ry, 2 * quarter, 3 * quarter));
    return List.of(out.close());
  }

  private static List<Outline> points(SvgElement e, boolean closed) throws DrawingException {
    SvgScanner in = new SvgScanner("`points`", e.attribute("points"), e.line());
    if (in.done()) {
      return List.of();
    }
    Outline out = new Outline(in.number(), in.number());
    while (!in.done()) {
      out.line(in.number(), in.number());
    }
    return out.empty() ? List.of() : List.of(closed ? out.close() : out);
  }
}
