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
   * @return the noded linework; the vertices given keep their numbers, crossings follow
   */
  Linework node(double[] x, double[] y, int[] start, int[] end, int[][] areas) {
    Crossings crossings = new Crossings(snapM, x, y);
    List<SegmentString> strings = new ArrayList<>(start.length);
    for (int s = 0; s < start.length; s++) {
      Coordinate[] ends = {crossings.coordinate(start[s]), crossings.coordinate(end[s])};
      strings.add(new NodedSegmentString(ends, s));
    }
    MCIndexNoder noder = new MCIndexNoder(crossings, 2 * snapM);
    noder.computeNodes(strings);
    return collect(noder, crossings.points(), start, end, areas);
  }

  private Linework collect(
      MCIndexNoder noder, PointIndex points, int[] start, int[] end, int[][] areas) {
    Edges edges = new Edges(2 * start.length + 16);
    pieceOffset = new int[start.length + 1];
    pieceStart = new int[2 * start.length + 16];
    largestBendM = 0;
    int pieces = 0;
    int segment = -1;
    for (Object noded : noder.getNodedSubstrings()) {
      SegmentString string = (SegmentString) noded;
      int s = (Integer) string.getData();
      while (segment < s) {
        pieceOffset[++segment] = pieces;
      }
      int a = number(points, string.getCoordinate(0));
      int b = number(points, string.getCoordinate(string.size() - 1));
      if (a != b) {
        bend(points, b, start[s], end[s]);
        if (pieces == pieceStart.length) {
          pieceStart = Arrays.copyOf(pieceStart, 2 * pieces);
        }
        pieceStart[pieces++] = a;
        edges.add(a, b, areas[s]);
      }
    }
    while (segment < start.length) {
      pieceOffset[++segment] = pieces;
    }
    return edges.withoutCancelled(points);
  }

  private static int number(PointIndex points, Coordinate c) {
    return points.add(c.x, c.y);
  }

  private void bend(PointIndex points, int v, int a, int b) {
    double bend =
        Segments.distance(
            points.x(v), points.y(v), points.x(a), points.y(a), points.x(b), points.y(b));
    if (bend > largestBendM) {
      largestBendM = bend;
    }
  }

  /** Unique edges, each with the areas met on it an odd number of times so far. */
  private static final class Edges {
    private final PairIndex pairs;
    private int[] start;
    private int[] end;
    private int[][] areas;

    Edges(int expected) {
      pairs = new PairIndex(expected);
      start = new int[expected];
      end = new int[expected];
      areas = new int[expected][];
    }

    void add(int a, int b, int[] changing) {
      int known = pairs.count();
      int edge = pairs.add(a, b);
      if (edge < known) {
        areas[edge] = Linework.symmetricDifference(areas[edge], changing);
        return;
      }
      if (edge == start.length) {
        start = Arrays.copyOf(start, 2 * edge);
        end = Arrays.copyOf(end, 2 * edge);
        areas = Arrays.copyOf(areas, 2 * edge);
      }
      start[edge] = a;
      end[edge] = b;
      areas[edge] = changing;
    }

    Linework withoutCancelled(PointIndex points) {
      int kept = 0;
      for (int e = 0; e < pairs.count(); e++) {
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
}
