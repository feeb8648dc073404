package coldseam.mesh.partition;

import java.util.List;

/**
 * The rings round one face as one list of corners. Corner c is also the edge that starts there and
 * runs to {@link #next}; the face lies to its left. A vertex that two rings pass is two corners.
 */
final class FaceRim {
  private final int[] vertex;
  private final int[] next;
  private final int[] previous;
  private final double[] x;
  private final double[] y;

  FaceRim(Partition partition, int face) {
    List<int[]> rings = partition.faceRings(face);
    int size = 0;
    for (int[] ring : rings) {
      size += ring.length;
    }
    vertex = new int[size];
    next = new int[size];
    previous = new int[size];
    x = new double[size];
    y = new double[size];
    int first = 0;
    for (int[] ring : rings) {
      for (int i = 0; i < ring.length; i++) {
        vertex[first + i] = ring[i];
        x[first + i] = partition.x(ring[i]);
        y[first + i] = partition.y(ring[i]);
        next[first + i] = first + (i + 1) % ring.length;
        previous[first + i] = first + (i + ring.length - 1) % ring.length;
      }
      first += ring.length;
    }
  }

  int size() {
    return vertex.length;
  }

  /** The partition's vertex at a corner. */
  int vertex(int corner) {
    return vertex[corner];
  }

  int next(int corner) {
    return next[corner];
  }

  double x(int corner) {
    return x[corner];
  }

  double y(int corner) {
    return y[corner];
  }

  double endX(int edge) {
    return x[next[edge]];
  }

  double endY(int edge) {
    return y[next[edge]];
  }

  /** Sine of the turn to the left at a corner. */
  double turn(int corner) {
    double inX = x[corner] - x[previous[corner]];
    double inY = y[corner] - y[previous[corner]];
    double outX = x[next[corner]] - x[corner];
    double outY = y[next[corner]] - y[corner];
    return (inX * outY - inY * outX) / (Math.hypot(inX, inY) * Math.hypot(outX, outY));
  }

  /** How far a point lies to the left of an edge, in parts of its length squared. */
  double left(int edge, double px, double py) {
    double dx = x[next[edge]] - x[edge];
    double dy = y[next[edge]] - y[edge];
    return (dx * (py - y[edge]) - dy * (px - x[edge])) / (dx * dx + dy * dy);
  }

  /** Whether a direction leads from a corner into the face. */
  boolean opensTowards(int corner, double dx, double dy) {
    double ax = x[next[corner]] - x[corner];
    double ay = y[next[corner]] - y[corner];
    double bx = x[previous[corner]] - x[corner];
    double by = y[previous[corner]] - y[corner];
    boolean leftOfNext = ax * dy - ay * dx > 0;
    boolean rightOfPrevious = dx * by - dy * bx > 0;
    return ax * by - ay * bx > 0 ? leftOfNext && rightOfPrevious : leftOfNext || rightOfPrevious;
  }

  /** Cosine between a unit vector and the edge that leaves a corner. */
  double cosineToNext(int corner, double ux, double uy) {
    return cosine(corner, next[corner], ux, uy);
  }

  /** Cosine between a unit vector and the way back along the edge that arrives at a corner. */
  double cosineToPrevious(int corner, double ux, double uy) {
    return cosine(corner, previous[corner], ux, uy);
  }

  private double cosine(int from, int to, double ux, double uy) {
    double dx = x[to] - x[from];
    double dy = y[to] - y[from];
    return (dx * ux + dy * uy) / Math.hypot(dx, dy);
  }
}
