package coldseam.cases.drawing;

import coldseam.mesh.partition.LabelledArea;
import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The ground that no shape of a section covers: of the box around all shapes, widened on a side
 * where a point lies beyond it to hold the point and half as much again, each connected region.
 */
public final class OpenRegions {
  private static final int COVERED = 0;
  private static final int OPEN = 1;

  private final Partition partition;

  private OpenRegions(Partition partition) {
    this.partition = partition;
  }

  /**
   * Finds the regions.
   *
   * @param shapes what covers the ground, each as closed rings by the even-odd rule, m
   * @param points places that are to lie in the box
   * @return the regions, or empty if nothing is drawn
   */
  public static Optional<OpenRegions> of(List<List<List<Point>>> shapes, List<Point> points) {
    double[] box = {
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    List<LabelledArea> laid = new ArrayList<>();
    for (List<List<Point>> shape : shapes) {
      laid.add(new LabelledArea(COVERED, shape));
      for (List<Point> ring : shape) {
        for (Point p : ring) {
          box[0] = Math.min(box[0], p.x());
          box[1] = Math.min(box[1], p.y());
          box[2] = Math.max(box[2], p.x());
          box[3] = Math.max(box[3], p.y());
        }
      }
    }
    if (!(box[2] > box[0] && box[3] > box[1])) {
      return Optional.empty();
    }
    double[] wide = box.clone();
    for (Point p : points) {
      wide[0] = Math.min(wide[0], box[0] - 1.5 * Math.max(0, box[0] - p.x()));
      wide[1] = Math.min(wide[1], box[1] - 1.5 * Math.max(0, box[1] - p.y()));
      wide[2] = Math.max(wide[2], box[2] + 1.5 * Math.max(0, p.x() - box[2]));
      wide[3] = Math.max(wide[3], box[3] + 1.5 * Math.max(0, p.y() - box[3]));
    }
    List<Point> frame =
        List.of(
            new Point(wide[0], wide[1]),
            new Point(wide[2], wide[1]),
            new Point(wide[2], wide[3]),
            new Point(wide[0], wide[3]));
    laid.add(0, new LabelledArea(OPEN, List.of(frame)));
    try {
      return Optional.of(new OpenRegions(Partition.of(laid, List.of(), Resolution.STANDARD)));
    } catch (IllegalArgumentException e) {
      return Optional.empty();
    }
  }

  /** Numbers of all regions. */
  public List<Integer> all() {
    List<Integer> open = new ArrayList<>();
    for (int face = 0; face < partition.faceCount(); face++) {
      if (partition.faceLabel(face) == OPEN) {
        open.add(face);
      }
    }
    return open;
  }

  /** The number of the region that holds a point, or −1. */
  public int at(Point p) {
    double x = p.x() - partition.origin().x();
    double y = p.y() - partition.origin().y();
    for (int face : all()) {
      boolean inside = false;
      for (int[] ring : partition.faceRings(face)) {
        for (int i = 0; i < ring.length; i++) {
          int a = ring[i];
          int b = ring[(i + 1) % ring.length];
          boolean across = partition.y(a) > y != partition.y(b) > y;
          if (across) {
            double t = (y - partition.y(a)) / (partition.y(b) - partition.y(a));
            inside ^= x < partition.x(a) + t * (partition.x(b) - partition.x(a));
          }
        }
      }
      if (inside) {
        return face;
      }
    }
    return -1;
  }

  /** The rings of a region, m. */
  public List<List<Point>> rings(int region) {
    List<List<Point>> rings = new ArrayList<>();
    Point o = partition.origin();
    for (int[] ring : partition.faceRings(region)) {
      List<Point> points = new ArrayList<>(ring.length);
      for (int v : ring) {
        points.add(new Point(o.x() + partition.x(v), o.y() + partition.y(v)));
      }
      rings.add(points);
    }
    return rings;
  }
}
