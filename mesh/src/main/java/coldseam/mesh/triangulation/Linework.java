package coldseam.mesh.triangulation;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import java.util.Arrays;

/**
 * What the triangulation needs of a partition, as plain arrays: vertices, straight edges that meet
 * only at vertices, and the face on either hand of each edge.
 */
final class Linework {
  final Point origin;
  final double[] x;
  final double[] y;
  final int[] start;
  final int[] end;
  final int[] leftFace;
  final int[] rightFace;
  final int[] faceLabel;
  final double minX;
  final double maxX;
  final double minY;
  final double maxY;

  Linework(
      Point origin,
      double[] x,
      double[] y,
      int[] start,
      int[] end,
      int[] leftFace,
      int[] rightFace,
      int[] faceLabel) {
    this.origin = origin;
    this.x = x;
    this.y = y;
    this.start = start;
    this.end = end;
    this.leftFace = leftFace;
    this.rightFace = rightFace;
    this.faceLabel = faceLabel;
    double left = Double.POSITIVE_INFINITY;
    double right = Double.NEGATIVE_INFINITY;
    double bottom = Double.POSITIVE_INFINITY;
    double top = Double.NEGATIVE_INFINITY;
    for (int v = 0; v < x.length; v++) {
      left = Math.min(left, x[v]);
      right = Math.max(right, x[v]);
      bottom = Math.min(bottom, y[v]);
      top = Math.max(top, y[v]);
    }
    minX = left;
    maxX = right;
    minY = bottom;
    maxY = top;
  }

  /** The larger of width and height of all vertices, m. */
  double extent() {
    return Math.max(maxX - minX, maxY - minY);
  }

  /** The same lines, vertices numbered along a space-filling curve. */
  Linework alongCurve() {
    long[] keys = new long[x.length];
    double scale = 65535 / extent();
    for (int v = 0; v < keys.length; v++) {
      int column = (int) ((x[v] - minX) * scale);
      int row = (int) ((y[v] - minY) * scale);
      keys[v] = SpaceFillingCurve.index(column, row) << 31 | v;
    }
    Arrays.sort(keys);
    double[] orderedX = new double[x.length];
    double[] orderedY = new double[x.length];
    int[] place = new int[x.length];
    for (int i = 0; i < keys.length; i++) {
      int v = (int) (keys[i] & 0x7fffffff);
      orderedX[i] = x[v];
      orderedY[i] = y[v];
      place[v] = i;
    }
    int[] orderedStart = new int[start.length];
    int[] orderedEnd = new int[end.length];
    for (int e = 0; e < start.length; e++) {
      orderedStart[e] = place[start[e]];
      orderedEnd[e] = place[end[e]];
    }
    return new Linework(
        origin, orderedX, orderedY, orderedStart, orderedEnd, leftFace, rightFace, faceLabel);
  }

  static Linework of(Partition partition) {
    double[] x = new double[partition.vertexCount()];
    double[] y = new double[x.length];
    for (int v = 0; v < x.length; v++) {
      x[v] = partition.x(v);
      y[v] = partition.y(v);
    }
    int[] start = new int[partition.edgeCount()];
    int[] end = new int[start.length];
    int[] leftFace = new int[start.length];
    int[] rightFace = new int[start.length];
    for (int e = 0; e < start.length; e++) {
      start[e] = partition.edgeStart(e);
      end[e] = partition.edgeEnd(e);
      leftFace[e] = partition.leftFace(e);
      rightFace[e] = partition.rightFace(e);
    }
    int[] faceLabel = new int[partition.faceCount()];
    for (int f = 0; f < faceLabel.length; f++) {
      faceLabel[f] = partition.faceLabel(f);
    }
    return new Linework(partition.origin(), x, y, start, end, leftFace, rightFace, faceLabel);
  }
}
