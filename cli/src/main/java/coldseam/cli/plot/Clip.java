package coldseam.cli.plot;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Cuts lines and rings off at a box, so that nothing outside is written (rings: Sutherland and
 * Hodgman 1974; straight pieces: Liang and Barsky 1984).
 */
final class Clip {
  private Clip() {}

  /**
   * The part of a ring inside; pieces that fall apart stay joined along the box, as fills allow.
   */
  static Optional<Polyline> ring(Polyline ring, Box box) {
    if (box.contains(ring.bounds())) {
      return Optional.of(ring);
    }
    Polyline cut = ring;
    for (int side = 0; side < 4 && cut.size() > 0; side++) {
      cut = against(cut, box, side);
    }
    return cut.size() < 3 ? Optional.empty() : Optional.of(cut);
  }

  static List<Polyline> rings(List<Polyline> rings, Box box) {
    List<Polyline> inside = new ArrayList<>(rings.size());
    for (Polyline ring : rings) {
      Optional<Polyline> seen = ring(ring, box);
      if (seen.isPresent()) {
        inside.add(seen.get());
      }
    }
    return inside;
  }

  private static Polyline against(Polyline ring, Box box, int side) {
    Polyline.Builder out = new Polyline.Builder();
    for (int i = 0; i < ring.size(); i++) {
      int j = ring.after(i);
      double here = inside(ring.x(i), ring.y(i), box, side);
      double there = inside(ring.x(j), ring.y(j), box, side);
      if (here >= 0) {
        out.add(ring.x(i), ring.y(i));
      }
      if (here >= 0 != there >= 0) {
        double t = here / (here - there);
        out.add(ring.x(i) + t * (ring.x(j) - ring.x(i)), ring.y(i) + t * (ring.y(j) - ring.y(i)));
      }
    }
    return out.closed();
  }

  private static double inside(double x, double y, Box box, int side) {
    return switch (side) {
      case 0 -> x - box.x0();
      case 1 -> box.x1() - x;
      case 2 -> y - box.y0();
      default -> box.y1() - y;
    };
  }

  /** The parts of a line inside, in order; the line itself if it lies inside altogether. */
  static List<Polyline> line(Polyline line, Box box) {
    if (box.contains(line.bounds())) {
      return List.of(line);
    }
    List<Polyline> parts = new ArrayList<>();
    Polyline.Builder part = null;
    for (int i = 0; i < line.pieces(); i++) {
      int j = line.after(i);
      double[] t = span(line.x(i), line.y(i), line.x(j), line.y(j), box);
      if (t == null) {
        part = finish(part, parts);
        continue;
      }
      double dx = line.x(j) - line.x(i);
      double dy = line.y(j) - line.y(i);
      if (part == null || t[0] > 0) {
        finish(part, parts);
        part = new Polyline.Builder().add(line.x(i) + t[0] * dx, line.y(i) + t[0] * dy);
      }
      part.add(line.x(i) + t[1] * dx, line.y(i) + t[1] * dy);
      if (t[1] < 1) {
        part = finish(part, parts);
      }
    }
    finish(part, parts);
    return parts;
  }

  static List<Polyline> lines(List<Polyline> lines, Box box) {
    List<Polyline> inside = new ArrayList<>(lines.size());
    for (Polyline line : lines) {
      inside.addAll(line(line, box));
    }
    return inside;
  }

  private static Polyline.Builder finish(Polyline.Builder part, List<Polyline> parts) {
    if (part != null && part.size() > 1) {
      parts.add(part.open());
    }
    return null;
  }

  /** Where a straight piece enters and leaves the box, 0 to 1, or null if it passes by. */
  private static double[] span(double ax, double ay, double bx, double by, Box box) {
    double[] p = {ax - bx, bx - ax, ay - by, by - ay};
    double[] q = {ax - box.x0(), box.x1() - ax, ay - box.y0(), box.y1() - ay};
    double from = 0;
    double to = 1;
    for (int side = 0; side < 4; side++) {
      if (p[side] == 0) {
        if (q[side] < 0) {
          return null;
        }
      } else if (p[side] < 0) {
        from = Math.max(from, q[side] / p[side]);
      } else {
        to = Math.min(to, q[side] / p[side]);
      }
    }
    return from < to ? new double[] {from, to} : null;
  }
}
