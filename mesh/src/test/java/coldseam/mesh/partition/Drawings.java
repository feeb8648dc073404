package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.function.UnaryOperator;

/** Shapes to draw with, and ways to lay the same drawing elsewhere. */
final class Drawings {
  private Drawings() {}

  static LabelledArea box(int label, double left, double low, double right, double high) {
    return polygon(label, left, low, right, low, right, high, left, high);
  }

  static LabelledArea polygon(int label, double... xy) {
    return new LabelledArea(label, List.of(points(xy)));
  }

  static LabelledLine line(int label, double... xy) {
    return new LabelledLine(label, points(xy));
  }

  static List<Point> points(double... xy) {
    List<Point> points = new ArrayList<>();
    for (int i = 0; i < xy.length; i += 2) {
      points.add(new Point(xy[i], xy[i + 1]));
    }
    return points;
  }

  /** Turned about the origin, then shifted. */
  static UnaryOperator<Point> turned(double degrees, double dx, double dy) {
    double c = Math.cos(Math.toRadians(degrees));
    double s = Math.sin(Math.toRadians(degrees));
    return p -> new Point(dx + c * p.x() - s * p.y(), dy + s * p.x() + c * p.y());
  }

  static UnaryOperator<Point> mirrored() {
    return p -> new Point(-p.x(), p.y());
  }

  static List<LabelledArea> laid(List<LabelledArea> areas, UnaryOperator<Point> move) {
    List<LabelledArea> moved = new ArrayList<>();
    for (LabelledArea area : areas) {
      List<List<Point>> rings = new ArrayList<>();
      for (List<Point> ring : area.rings()) {
        rings.add(ring.stream().map(move).toList());
      }
      moved.add(new LabelledArea(area.label(), rings));
    }
    return moved;
  }

  /** The faces of a partition as areas, in coordinates local to it. */
  static List<LabelledArea> faces(Partition partition) {
    List<LabelledArea> faces = new ArrayList<>();
    for (int f = 0; f < partition.faceCount(); f++) {
      List<List<Point>> rings = new ArrayList<>();
      for (int[] ring : partition.faceRings(f)) {
        List<Point> corners = new ArrayList<>();
        for (int v : ring) {
          corners.add(new Point(partition.x(v), partition.y(v)));
        }
        rings.add(corners);
      }
      faces.add(new LabelledArea(partition.faceLabel(f), rings));
    }
    return faces;
  }
}
