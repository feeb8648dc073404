package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.noding.MCIndexNoder;
import org.locationtech.jts.noding.NodedSegmentString;
import org.locationtech.jts.noding.SegmentString;

/**
 * Splits segments wherever they cross or touch, and wherever a vertex comes within the joining
 * length of them. Nothing is rounded to a grid: a 0.1 mm sheet at an angle keeps its thickness to
 * the last digit. Segments that fall onto each other become one edge; areas met an even number of
 * times on it cancel.
 */
final class Noding {
  private final double snapM;

  /** For each segment where its pieces begin; one more entry than segments. */
  private int[] pieceOffset;

  /** Start vertex of each piece, along its segment. */
  private int[] pieceStart;

  private double largestBendM;

  Noding(double snapM) {
    this.snapM = snapM;
  }

  /** How far any segment was bent by the last call, at most, m. */
  double largestBendM() {
    return largestBendM;
  }

  /** Index of the first piece of a segment of the last call. */
  int pieceOffset(int segment) {
    return pieceOffset[segment];
  }

  /** Start vertex of a piece of the last call. */
  int pieceStart(int piece) {
    return pieceStart[piece];
  }

  /**
   * Splits segments.
   *
   * @param x x of the vertices, no two within the joining length, m
   * @param y y of the vertices, m
   * @param start start vertex of each segment
   * @param end end vertex of each segment, different from its start
   * @param areas areas that change across each segment
   * @return the noded linework; its vertices are numbered anew
   */
  Linework node(double[] x, double[] y, int[] start, int[] end, int[][] areas) {
    Crossings crossings = new Crossings(snapM, x, y);
    List<SegmentString> strings = new ArrayList<>(start.length);
    for (int s = 0; s < start.length; s++) {
      Coordinate[] ends = {
        crossings.coordinate(x[start[s]], y[start[s]]), crossings.coordinate(x[end[s]], y[end[s]])
      };
      strings.add(new NodedSegmentString(ends, s));
    }
    MCIndexNoder noder = new MCIndexNoder(crossings, 2 * snapM);
    noder.computeNodes(strings);
    return collect(noder, crossings.points(), start, end, areas);
  }

  private Linework collect(
      MCIndexNoder noder, PointIndex points, int[] start, int[] end, int[][] areas) {
    PairIndex pairs = new PairIndex(2 * start.length);
    int capacity = 2 * start.length + 16;
    int[] edgeStart = new int[capacity];
    int[] edgeEnd = new int[capacity];
    int[][] edgeAreas = new int[capacity][];
    pieceOffset = new int[start.length + 1];
    pieceStart = new int[capacity];
    largestBendM = 0;
    int pieces = 0;
    int segment = -1;
    for (Object noded : noder.getNodedSubstrings()) {
      SegmentString string = (SegmentString) noded;
      int s = (Integer) string.getData();
      while (segment < s) {
        pieceOffset[++segment] = pieces;
      }
      int a = points.add(string.getCoordinate(0).x, string.getCoordinate(0).y);
      for (int i = 1; i < string.size(); i++) {
        Coordinate c = string.getCoordinate(i);
        int b = points.add(c.x, c.y);
        if (a == b) {
          continue;
        }
        bend(points, b, start[s], end[s]);
        if (pieces == pieceStart.length) {
          pieceStart = Arrays.copyOf(pieceStart, 2 * pieces);
        }
        pieceStart[pieces++] = a;
        int known = pairs.count();
        int edge = pairs.add(a, b);
        if (edge == known) {
          if (edge == edgeStart.length) {
            edgeStart = Arrays.copyOf(edgeStart, 2 * edge);
            edgeEnd = Arrays.copyOf(edgeEnd, 2 * edge);
            edgeAreas = Arrays.copyOf(edgeAreas, 2 * edge);
          }
          edgeStart[edge] = a;
          edgeEnd[edge] = b;
          edgeAreas[edge] = areas[s];
        } else {
          edgeAreas[edge] = Linework.symmetricDifference(edgeAreas[edge], areas[s]);
        }
        a = b;
      }
    }
    while (segment < start.length) {
      pieceOffset[++segment] = pieces;
    }
    return withoutCancelled(points, pairs.count(), edgeStart, edgeEnd, edgeAreas);
  }

  private void bend(PointIndex points, int v, int a, int b) {
    double bend =
        Segments.distance(
            points.x(v), points.y(v), points.x(a), points.y(a), points.x(b), points.y(b));
    if (bend > largestBendM) {
      largestBendM = bend;
    }
  }

  private static Linework withoutCancelled(
      PointIndex points, int count, int[] start, int[] end, int[][] areas) {
    int kept = 0;
    for (int e = 0; e < count; e++) {
      if (areas[e].length > 0) {
        start[kept] = start[e];
        end[kept] = end[e];
        areas[kept++] = areas[e];
      }
    }
    return new Linework(
        points.xs(),
        points.ys(),
        Arrays.copyOf(start, kept),
        Arrays.copyOf(end, kept),
        Arrays.copyOf(areas, kept));
  }
}
