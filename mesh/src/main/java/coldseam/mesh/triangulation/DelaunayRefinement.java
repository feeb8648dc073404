package coldseam.mesh.triangulation;

import coldseam.mesh.plane.Predicates;
import java.util.Arrays;

/**
 * Refines a constrained Delaunay triangulation until no triangle has an angle under 20° or a side
 * longer than wanted: a vertex at the centre of a bad triangle's circle, or nearer where that
 * suffices (off-centres, Üngör 2004), shortest bad triangles first; a kept edge that such a vertex
 * cannot see past, or whose diametral circle it would lie in, is split instead (Ruppert 1995).
 * Edges that meet under less than 60° are split on circles around their common vertex, and a
 * triangle between two points of such a circle is let be (Miller, Pav and Walkington 2003), so that
 * the process ends on any drawing.
 */
final class DelaunayRefinement {
  /** The least angle, degrees; Ruppert's process ends for anything under 20.7. */
  static final double LEAST_ANGLE_DEGREES = 20;

  /** No side is made shorter than this part of the extent of the drawing. */
  private static final double SHORTEST = 1e-9;

  private static final double COS_SQUARED = square(Math.cos(Math.toRadians(LEAST_ANGLE_DEGREES)));

  /** Height over base of the tallest triangle wanted, a little less than the limit. */
  private static final double TALLEST = 0.475 / Math.tan(Math.toRadians(LEAST_ANGLE_DEGREES / 2));

  /**
   * Ends the search for good angles, should ladders and sharp corners ever keep it from ending by
   * itself: the mesh is sound after any step. Random drawings take some ten steps a triangle.
   */
  private static final int MOST_STEPS_A_TRIANGLE = 200;

  private static final int MOST_STEPS_AT_LEAST = 20_000;

  private final ConstrainedDelaunay plane;
  private final Ladders ladders;
  private final boolean[] meshed;
  private final SizeField size;
  private final double extent;
  private final SharpCorners sharp;
  private final WorkQueue queue = new WorkQueue();

  private int[] stamp;
  private int stamps;
  private int stepsLeft;
  private int[] cavity = new int[64];

  /**
   * Prepares.
   *
   * @param plane the triangulation, faces filled in
   * @param lines the drawing
   * @param ladders the thin parts, made already
   * @param meshed for each face whether it is wanted
   * @param size the longest sides wanted
   */
  DelaunayRefinement(
      ConstrainedDelaunay plane,
      Linework lines,
      Ladders ladders,
      boolean[] meshed,
      SizeField size) {
    this.plane = plane;
    this.ladders = ladders;
    this.meshed = meshed;
    this.size = size;
    extent = lines.extent();
    stamp = new int[plane.face.length];
    boolean[] refined = new boolean[plane.triangleCount];
    for (int t = 0; t < refined.length; t++) {
      refined[t] = isMeshed(t) && !ladders.isLadder(t);
    }
    sharp = new SharpCorners(plane, lines, refined);
  }

  /** Refines until nothing bad is left that can be bettered. */
  void run() {
    run(MOST_STEPS_A_TRIANGLE * plane.triangleCount + MOST_STEPS_AT_LEAST);
  }

  /** Refines; after so many steps for the sake of angles only sizes are looked at. */
  void run(int mostSteps) {
    stepsLeft = mostSteps;
    for (int t = 0; t < plane.triangleCount; t++) {
      consider(t);
    }
    plane.touchedCount = 0;
    while (queue.poll()) {
      int t = queue.triangle();
      if (isUnchanged(t) && (isTooLarge(t) || stepsLeft-- > 0)) {
        boolean acted = improve(t);
        for (int i = 0; i < plane.touchedCount; i++) {
          consider(plane.touched[i]);
        }
        plane.touchedCount = 0;
        if (acted) {
          consider(t);
        }
      }
    }
  }

  /** Whether a triangle still has the corners with which it was queued. */
  private boolean isUnchanged(int t) {
    return plane.corner[3 * t] == queue.corner(0)
        && plane.corner[3 * t + 1] == queue.corner(1)
        && plane.corner[3 * t + 2] == queue.corner(2);
  }

  private boolean isMeshed(int t) {
    int face = plane.face[t];
    return face >= 0 && meshed[face];
  }

  /** Queues a triangle if it is bad and may be bettered. */
  private void consider(int t) {
    if (!isMeshed(t)) {
      return;
    }
    int shortest = shortestSide(t);
    double length = plane.length(shortest);
    boolean thin =
        stepsLeft > 0 && !ladders.isLadder(t) && isThin(t, shortest) && !sharp.excuses(shortest);
    if (thin || isTooLarge(t)) {
      queue.add(length, t, plane.corner[3 * t], plane.corner[3 * t + 1], plane.corner[3 * t + 2]);
    }
  }

  private int shortestSide(int t) {
    double a = plane.length(3 * t);
    double b = plane.length(3 * t + 1);
    double c = plane.length(3 * t + 2);
    return a <= b && a <= c ? 3 * t : b <= c ? 3 * t + 1 : 3 * t + 2;
  }

  /** Whether the angle opposite the shortest side is too small. */
  private boolean isThin(int t, int shortest) {
    int v = plane.apex(shortest);
    int a = plane.start(shortest);
    int b = plane.end(shortest);
    double ax = plane.x[a] - plane.x[v];
    double ay = plane.y[a] - plane.y[v];
    double bx = plane.x[b] - plane.x[v];
    double by = plane.y[b] - plane.y[v];
    double dot = ax * bx + ay * by;
    return dot * dot > COS_SQUARED * (ax * ax + ay * ay) * (bx * bx + by * by);
  }

  private boolean isTooLarge(int t) {
    if (size == SizeField.NONE) {
      return false;
    }
    int a = plane.corner[3 * t];
    int b = plane.corner[3 * t + 1];
    int c = plane.corner[3 * t + 2];
    double limit =
        size.longestSideM(
            (plane.x[a] + plane.x[b] + plane.x[c]) / 3, (plane.y[a] + plane.y[b] + plane.y[c]) / 3);
    double longest =
        Math.max(plane.length(3 * t), Math.max(plane.length(3 * t + 1), plane.length(3 * t + 2)));
    return longest > limit && longest > 4 * SHORTEST * extent;
  }

  /** Puts one vertex to better a triangle; false if that is not possible. */
  private boolean improve(int t) {
    if (ladders.isLadder(t)) {
      return isTooLarge(t) && split(partitionSide(t));
    }
    int shortest = shortestSide(t);
    int a = plane.start(shortest);
    int b = plane.end(shortest);
    int c = plane.apex(shortest);
    // The circle's centre, from the middle of the shortest side along its normal.
    double dx = plane.x[b] - plane.x[a];
    double dy = plane.y[b] - plane.y[a];
    double ux = plane.x[c] - plane.x[a];
    double uy = plane.y[c] - plane.y[a];
    double twiceArea = dx * uy - dy * ux;
    double rise = 0.5 * (ux * (ux - dx) + uy * (uy - dy)) / twiceArea;
    if (isThin(t, shortest) && !(rise < TALLEST)) {
      rise = TALLEST;
    }
    double px = 0.5 * (plane.x[a] + plane.x[b]) - rise * dy;
    double py = 0.5 * (plane.y[a] + plane.y[b]) + rise * dx;
    int place = walk(t, px, py);
    int encroached = place < 0 ? ~place : encroachedBy(place, px, py);
    if (encroached != Triangulation.NONE) {
      return split(encroached);
    }
    return place(place, px, py);
  }

  /** The side of a triangle in a ladder that lies on a partition edge. */
  private int partitionSide(int t) {
    int longest = Triangulation.NONE;
    for (int h = 3 * t; h < 3 * t + 3; h++) {
      boolean longer = longest == Triangulation.NONE || plane.length(h) > plane.length(longest);
      if (plane.kept[h] >= 0 && longer) {
        longest = h;
      }
    }
    return longest;
  }

  /** The triangle reached going straight from a triangle to a point, or ~h if side h bars it. */
  private int walk(int from, double px, double py) {
    int a = plane.corner[3 * from];
    int b = plane.corner[3 * from + 1];
    int c = plane.corner[3 * from + 2];
    double sx = (plane.x[a] + plane.x[b] + plane.x[c]) / 3;
    double sy = (plane.y[a] + plane.y[b] + plane.y[c]) / 3;
    int t = from;
    int h = 3 * t;
    for (int k = 0; k < 3; k++) {
      // The side that the ray from the centre leaves by.
      if (hand(sx, sy, px, py, plane.start(3 * t + k)) <= 0
          && hand(sx, sy, px, py, plane.end(3 * t + k)) > 0) {
        h = 3 * t + k;
      }
    }
    while (plane.orientation(plane.start(h), plane.end(h), px, py) < 0) {
      if (plane.kept[h] != Triangulation.NONE) {
        return ~h;
      }
      int entered = plane.twin[h];
      t = entered / 3;
      h =
          hand(sx, sy, px, py, plane.apex(entered)) > 0
              ? Triangulation.next(entered)
              : Triangulation.previous(entered);
    }
    return t;
  }

  private int hand(double sx, double sy, double px, double py, int v) {
    return Predicates.orientation(sx, sy, px, py, plane.x[v], plane.y[v]);
  }

  /** A kept side that sees a new point under a right angle or more, or NONE. */
  private int encroachedBy(int t, double px, double py) {
    if (stamp.length < plane.triangleCount) {
      stamp = Arrays.copyOf(stamp, 2 * plane.triangleCount);
    }
    stamps++;
    int count = 0;
    cavity[count++] = t;
    stamp[t] = stamps;
    for (int i = 0; i < count; i++) {
      for (int h = 3 * cavity[i]; h < 3 * cavity[i] + 3; h++) {
        if (plane.kept[h] != Triangulation.NONE) {
          if (seesUnderRightAngle(h, px, py)) {
            return h;
          }
          continue;
        }
        int other = plane.twin[h] / 3;
        if (stamp[other] != stamps && plane.circleContains(other, px, py)) {
          stamp[other] = stamps;
          if (count == cavity.length) {
            cavity = Arrays.copyOf(cavity, 2 * count);
          }
          cavity[count++] = other;
        }
      }
    }
    return Triangulation.NONE;
  }

  private boolean seesUnderRightAngle(int h, double px, double py) {
    int a = plane.start(h);
    int b = plane.end(h);
    return (plane.x[a] - px) * (plane.x[b] - px) + (plane.y[a] - py) * (plane.y[b] - py) <= 0;
  }

  private boolean place(int t, double px, double py) {
    int on = Triangulation.NONE;
    for (int h = 3 * t; h < 3 * t + 3; h++) {
      if (plane.orientation(plane.start(h), plane.end(h), px, py) == 0) {
        on = h;
      }
      if (Math.hypot(plane.x[plane.apex(h)] - px, plane.y[plane.apex(h)] - py)
          < SHORTEST * extent) {
        return false;
      }
    }
    if (on == Triangulation.NONE) {
      plane.insertInside(t, px, py);
    } else {
      plane.insertOn(on, px, py);
    }
    return true;
  }

  /** Splits a kept side in the middle, or on a circle around a sharp corner. */
  private boolean split(int h) {
    if (plane.kept[h] == Ladders.RUNG) {
      ladders.retreat(h);
      return true;
    }
    if (plane.length(h) < 2 * SHORTEST * extent) {
      return false;
    }
    int a = plane.start(h);
    int b = plane.end(h);
    double part = sharp.partToSplitAt(h);
    double px = plane.x[a] + part * (plane.x[b] - plane.x[a]);
    double py = plane.y[a] + part * (plane.y[b] - plane.y[a]);
    return ladders.split(h, px, py) != Triangulation.NONE;
  }

  private static double square(double value) {
    return value * value;
  }
}
