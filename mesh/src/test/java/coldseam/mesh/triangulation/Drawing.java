package coldseam.mesh.triangulation;

import coldseam.mesh.partition.LabelledArea;
import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.List;

/** A test drawing: shapes in millimetres laid in order, turned and shifted as a whole. */
final class Drawing {
  private final double cos;
  private final double sin;
  private final double shiftXM;
  private final double shiftYM;
  private final List<LabelledArea> areas = new ArrayList<>();

  private Drawing(double degrees, double shiftXM, double shiftYM) {
    cos = Math.cos(Math.toRadians(degrees));
    sin = Math.sin(Math.toRadians(degrees));
    this.shiftXM = shiftXM;
    this.shiftYM = shiftYM;
  }

  static Drawing upright() {
    return new Drawing(0, 0, 0);
  }

  static Drawing turned(double degrees) {
    return new Drawing(degrees, 0, 0);
  }

  static Drawing turnedAndShifted(double degrees, double shiftXM, double shiftYM) {
    return new Drawing(degrees, shiftXM, shiftYM);
  }

  Drawing box(int label, double left, double bottom, double right, double top) {
    return polygon(label, left, bottom, right, bottom, right, top, left, top);
  }

  /** x, y, x, y, … */
  Drawing polygon(int label, double... corners) {
    areas.add(new LabelledArea(label, List.of(points(corners))));
    return this;
  }

  private List<Point> points(double... corners) {
    List<Point> points = new ArrayList<>();
    for (int i = 0; i < corners.length; i += 2) {
      double x = corners[i] / 1000;
      double y = corners[i + 1] / 1000;
      points.add(new Point(cos * x - sin * y + shiftXM, sin * x + cos * y + shiftYM));
    }
    return points;
  }

  /** A sheet of constant thickness along x, y, x, y, …, mitred at the bends. */
  Drawing strip(int label, double thickness, double... line) {
    int points = line.length / 2;
    double[] outline = new double[2 * line.length];
    for (int i = 0; i < points; i++) {
      double[] before = normal(line, Math.max(0, i - 1));
      double[] after = normal(line, Math.min(points - 2, i));
      double scale = 0.5 * thickness / (1 + before[0] * after[0] + before[1] * after[1]);
      double dx = scale * (before[0] + after[0]);
      double dy = scale * (before[1] + after[1]);
      int back = 2 * points - 1 - i;
      outline[2 * i] = line[2 * i] + dx;
      outline[2 * i + 1] = line[2 * i + 1] + dy;
      outline[2 * back] = line[2 * i] - dx;
      outline[2 * back + 1] = line[2 * i + 1] - dy;
    }
    return polygon(label, outline);
  }

  /** A regular polygon with corners on a circle. */
  Drawing disc(int label, double x, double y, double radius, int corners) {
    double[] ring = new double[2 * corners];
    for (int i = 0; i < corners; i++) {
      double angle = 2 * Math.PI * i / corners;
      ring[2 * i] = x + radius * Math.cos(angle);
      ring[2 * i + 1] = y + radius * Math.sin(angle);
    }
    return polygon(label, ring);
  }

  Partition partition() {
    return Partition.of(areas, List.of(), Resolution.STANDARD);
  }

  private static double[] normal(double[] line, int piece) {
    double dx = line[2 * piece + 2] - line[2 * piece];
    double dy = line[2 * piece + 3] - line[2 * piece + 1];
    double length = Math.hypot(dx, dy);
    return new double[] {-dy / length, dx / length};
  }
}
