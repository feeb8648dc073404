package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.List;

/** Reads the data of a path into subpaths; SVG 1.1, 8.3, arcs by its appendix F.6. */
final class SvgPathData {
  private final SvgScanner in;
  private final List<Outline> subpaths = new ArrayList<>();
  private Outline current;
  private double x;
  private double y;
  private double startX;
  private double startY;
  private char before;
  private double controlX;
  private double controlY;

  private SvgPathData(String data, int line) {
    in = new SvgScanner("the data of this path", data, line);
  }

  static List<Outline> read(String data, int line) throws DrawingException {
    SvgPathData path = new SvgPathData(data, line);
    path.all();
    return path.subpaths;
  }

  private void all() throws DrawingException {
    char command = '\0';
    while (!in.done()) {
      char c = in.peek();
      if (Character.isLetter(c)) {
        command = in.take();
        if (before == '\0' && command != 'M' && command != 'm') {
          throw in.wrong("`M` first of all");
        }
      } else if (command == '\0' || command == 'Z' || command == 'z' || !in.startsNumber()) {
        throw in.wrong("a command");
      }
      one(command);
      before = Character.toUpperCase(command);
      if (command == 'M') {
        command = 'L';
      } else if (command == 'm') {
        command = 'l';
      }
    }
  }

  private void one(char command) throws DrawingException {
    double ox = Character.isLowerCase(command) ? x : 0;
    double oy = Character.isLowerCase(command) ? y : 0;
    switch (Character.toUpperCase(command)) {
      case 'M' -> {
        x = ox + in.number();
        y = oy + in.number();
        startX = x;
        startY = y;
        current = null;
      }
      case 'L' -> straight(ox + in.number(), oy + in.number());
      case 'H' -> straight(ox + in.number(), y);
      case 'V' -> straight(x, oy + in.number());
      case 'C' ->
          cubic(
              ox + in.number(),
              oy + in.number(),
              ox + in.number(),
              oy + in.number(),
              ox + in.number(),
              oy + in.number());
      case 'S' -> {
        boolean smooth = before == 'C' || before == 'S';
        double x1 = smooth ? 2 * x - controlX : x;
        double y1 = smooth ? 2 * y - controlY : y;
        cubic(x1, y1, ox + in.number(), oy + in.number(), ox + in.number(), oy + in.number());
      }
      case 'Q' -> quadratic(ox + in.number(), oy + in.number(), ox + in.number(), oy + in.number());
      case 'T' -> {
        boolean smooth = before == 'Q' || before == 'T';
        double x1 = smooth ? 2 * x - controlX : x;
        double y1 = smooth ? 2 * y - controlY : y;
        quadratic(x1, y1, ox + in.number(), oy + in.number());
      }
      case 'A' -> {
        double rx = Math.abs(in.number());
        double ry = Math.abs(in.number());
        double turn = in.number();
        boolean large = in.flag();
        boolean sweep = in.flag();
        arc(rx, ry, turn, large, sweep, ox + in.number(), oy + in.number());
      }
      case 'Z' -> {
        if (current != null) {
          current.close();
        }
        current = null;
        x = startX;
        y = startY;
      }
      default -> throw in.wrong("one of the commands M L H V C S Q T A Z");
    }
  }

  private Outline drawing() {
    if (current == null) {
      current = new Outline(x, y);
      subpaths.add(current);
      startX = x;
      startY = y;
    }
    return current;
  }

  private void to(double toX, double toY) {
    x = toX;
    y = toY;
  }

  private void straight(double toX, double toY) {
    drawing().line(toX, toY);
    to(toX, toY);
  }

  private void cubic(double x1, double y1, double x2, double y2, double toX, double toY) {
    drawing().add(new Segment.Cubic(x, y, x1, y1, x2, y2, toX, toY));
    controlX = x2;
    controlY = y2;
    to(toX, toY);
  }

  private void quadratic(double x1, double y1, double toX, double toY) {
    drawing().add(Segment.Cubic.quadratic(x, y, x1, y1, toX, toY));
    controlX = x1;
    controlY = y1;
    to(toX, toY);
  }

  private void arc(
      double radiusX,
      double radiusY,
      double turnDegrees,
      boolean large,
      boolean sweep,
      double toX,
      double toY) {
    if (radiusX == 0 || radiusY == 0) {
      straight(toX, toY);
      return;
    }
    if (x == toX && y == toY) {
      return;
    }
    double cos = Math.cos(Math.toRadians(turnDegrees));
    double sin = Math.sin(Math.toRadians(turnDegrees));
    double px = (cos * (x - toX) + sin * (y - toY)) / 2;
    double py = (-sin * (x - toX) + cos * (y - toY)) / 2;
    double reach = Math.hypot(px / radiusX, py / radiusY);
    double rx = radiusX * Math.max(1, reach);
    double ry = radiusY * Math.max(1, reach);
    double under = reach >= 1 ? 0 : Math.sqrt(1 / (reach * reach) - 1);
    double sign = large == sweep ? -1 : 1;
    double qx = sign * under * rx * py / ry;
    double qy = -sign * under * ry * px / rx;
    double cx = cos * qx - sin * qy + (x + toX) / 2;
    double cy = sin * qx + cos * qy + (y + toY) / 2;
    double from = Math.atan2((py - qy) / ry, (px - qx) / rx);
    double to = Math.atan2((-py - qy) / ry, (-px - qx) / rx);
    if (sweep && to < from) {
      to += 2 * Math.PI;
    } else if (!sweep && to > from) {
      to -= 2 * Math.PI;
    }
    drawing().add(new Segment.Arc(cx, cy, rx * cos, rx * sin, -ry * sin, ry * cos, from, to));
    // The end as written, not as it comes out of sine and cosine.
    current.line(toX, toY);
    to(toX, toY);
  }
}
