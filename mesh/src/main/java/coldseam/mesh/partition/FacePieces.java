package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;

/** What a face falls into when it is cut, after needless cuts are dissolved. */
final class FacePieces {
  private static final int NONE = -1;

  private final FaceRim rim;
  private final List<Throats.Cut> cuts;
  private final double gapM;

  // of the present cuts
  private double[] x;
  private double[] y;
  private HalfEdges halves;
  private int rimEdges;

  /** The piece to the left of each loop, or NONE. */
  private int[] pieceOfLoop;

  private List<List<Integer>> loopsOfPiece;

  /**
   * Cuts a face.
   *
   * @param rim the face
   * @param cuts no two of them cross
   * @param gapM pieces no wider than this are gaps, m
   */
  FacePieces(FaceRim rim, List<Throats.Cut> cuts, double gapM) {
    this.rim = rim;
    this.cuts = new ArrayList<>(cuts);
    this.gapM = gapM;
    trace();
    while (!this.cuts.isEmpty()) {
      int needless = needless();
      if (needless == NONE) {
        break;
      }
      this.cuts.remove(needless);
      trace();
    }
  }

  private void trace() {
    List<double[]> points = new ArrayList<>();
    int[] node = new int[rim.size()];
    int[] nodeOfVertex = new int[1 + maxVertex()];
    Arrays.fill(nodeOfVertex, NONE);
    for (int c = 0; c < rim.size(); c++) {
      int v = rim.vertex(c);
      if (nodeOfVertex[v] == NONE) {
        nodeOfVertex[v] = points.size();
        points.add(new double[] {rim.x(c), rim.y(c)});
      }
      node[c] = nodeOfVertex[v];
    }
    int[] ends = new int[cuts.size()];
    List<int[]> edges = new ArrayList<>();
    for (int e = 0; e < rim.size(); e++) {
      rimEdge(e, node, points, ends, edges);
    }
    rimEdges = edges.size();
    for (int c = 0; c < ends.length; c++) {
      edges.add(new int[] {node[cuts.get(c).corner()], ends[c]});
    }
    x = new double[points.size()];
    y = new double[points.size()];
    for (int n = 0; n < x.length; n++) {
      x[n] = points.get(n)[0];
      y[n] = points.get(n)[1];
    }
    int[] start = new int[edges.size()];
    int[] end = new int[edges.size()];
    for (int e = 0; e < start.length; e++) {
      start[e] = edges.get(e)[0];
      end[e] = edges.get(e)[1];
    }
    halves = new HalfEdges(x, y, start, end);
    gatherPieces();
  }

  private int maxVertex() {
    int max = 0;
    for (int c = 0; c < rim.size(); c++) {
      max = Math.max(max, rim.vertex(c));
    }
    return max;
  }

  /** An edge of the rim with the ends of cuts on it put in, each once. */
  private void rimEdge(int edge, int[] node, List<double[]> points, int[] ends, List<int[]> edges) {
    List<Integer> on = new ArrayList<>();
    for (int c = 0; c < cuts.size(); c++) {
      if (cuts.get(c).edge() == edge) {
        if (cuts.get(c).along() == 0) {
          ends[c] = node[edge];
        } else {
          on.add(c);
        }
      }
    }
    on.sort(Comparator.comparingDouble(c -> cuts.get(c).along()));
    int from = node[edge];
    for (int c : on) {
      Throats.Cut cut = cuts.get(c);
      double[] last = points.get(from);
      boolean there = from != node[edge] && Throats.near(last[0], last[1], cut.x(), cut.y());
      if (!there) {
        points.add(new double[] {cut.x(), cut.y()});
        edges.add(new int[] {from, points.size() - 1});
        from = points.size() - 1;
      }
      ends[c] = from;
    }
    edges.add(new int[] {from, node[rim.next(edge)]});
  }

  /** Whether the face lies to the left of a half-edge. */
  private boolean inside(int half) {
    return half % 2 == 0 || half / 2 >= rimEdges;
  }

  private void gatherPieces() {
    pieceOfLoop = new int[halves.loopCount];
    Arrays.fill(pieceOfLoop, NONE);
    loopsOfPiece = new ArrayList<>();
    for (int l = 0; l < halves.loopCount; l++) {
      if (inside(halves.loopStart[l]) && halves.loopArea[l] > 0) {
        pieceOfLoop[l] = loopsOfPiece.size();
        List<Integer> loops = new ArrayList<>(1);
        loops.add(l);
        loopsOfPiece.add(loops);
      }
    }
    for (int l = 0; l < halves.loopCount; l++) {
      if (inside(halves.loopStart[l]) && pieceOfLoop[l] == NONE) {
        int piece = around(l);
        pieceOfLoop[l] = piece;
        loopsOfPiece.get(piece).add(l);
      }
    }
  }

  /** The smallest piece whose outer loop encloses another loop. */
  private int around(int loop) {
    int v = halves.from(halves.loopStart[loop]);
    int best = NONE;
    double least = Double.POSITIVE_INFINITY;
    for (int p = 0; p < loopsOfPiece.size(); p++) {
      int outer = loopsOfPiece.get(p).get(0);
      if (halves.loopArea[outer] < least && encloses(outer, x[v], y[v])) {
        best = p;
        least = halves.loopArea[outer];
      }
    }
    if (best == NONE) {
      throw new IllegalStateException(
          "a hole at local (" + x[v] + ", " + y[v] + ") lies in no piece of the face");
    }
    return best;
  }

  private boolean encloses(int loop, double px, double py) {
    boolean within = false;
    int first = halves.loopStart[loop];
    int h = first;
    do {
      double ay = y[halves.from(h)];
      double by = y[halves.to(h)];
      if ((ay > py) != (by > py)) {
        double ax = x[halves.from(h)];
        double side = (x[halves.to(h)] - ax) * (py - ay) - (by - ay) * (px - ax);
        within ^= by > ay ? side < 0 : side > 0;
      }
      h = halves.next[h];
    } while (h != first);
    return within;
  }

  private int pieceLeftOf(int cut) {
    return pieceOfLoop[halves.loop[2 * (rimEdges + cut)]];
  }

  private int pieceRightOf(int cut) {
    return pieceOfLoop[halves.loop[2 * (rimEdges + cut) + 1]];
  }

  /** The longest cut that parts nothing worth parting, or NONE. */
  private int needless() {
    double[] longest = new double[loopsOfPiece.size()];
    for (int c = 0; c < cuts.size(); c++) {
      longest[pieceLeftOf(c)] = Math.max(longest[pieceLeftOf(c)], cuts.get(c).lengthM());
      longest[pieceRightOf(c)] = Math.max(longest[pieceRightOf(c)], cuts.get(c).lengthM());
    }
    for (int c = cuts.size() - 1; c >= 0; c--) {
      int left = pieceLeftOf(c);
      int right = pieceRightOf(c);
      if (left == right
          || shallow(left, longest[left], c)
          || shallow(right, longest[right], c)
          || oneGap(left, right)) {
        return c;
      }
    }
    return NONE;
  }

  /** Whether a piece is a nook no deeper than its longest cut, which this one is. */
  private boolean shallow(int piece, double longest, int cut) {
    return cuts.get(cut).lengthM() == longest && area(piece) < longest * longest;
  }

  private double area(int piece) {
    double area = 0;
    for (int loop : loopsOfPiece.get(piece)) {
      area += halves.loopArea[loop];
    }
    return area;
  }

  private boolean oneGap(int left, int right) {
    return width(left) <= gapM && width(right) <= gapM && width(left, right) <= gapM;
  }

  /** Short side of the smallest rectangle round some pieces, along one of their edges, m. */
  private double width(int... pieces) {
    double least = Double.POSITIVE_INFINITY;
    double width = Double.POSITIVE_INFINITY;
    for (int piece : pieces) {
      int first = halves.loopStart[loopsOfPiece.get(piece).get(0)];
      int h = first;
      do {
        double dx = x[halves.to(h)] - x[halves.from(h)];
        double dy = y[halves.to(h)] - y[halves.from(h)];
        double length = Math.hypot(dx, dy);
        double along = extent(dx / length, dy / length, pieces);
        double across = extent(-dy / length, dx / length, pieces);
        if (along * across < least) {
          least = along * across;
          width = Math.min(along, across);
        }
        h = halves.next[h];
      } while (h != first);
    }
    return width;
  }

  private double extent(double ux, double uy, int... pieces) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int piece : pieces) {
      int first = halves.loopStart[loopsOfPiece.get(piece).get(0)];
      int h = first;
      do {
        double at = x[halves.from(h)] * ux + y[halves.from(h)] * uy;
        low = Math.min(low, at);
        high = Math.max(high, at);
        h = halves.next[h];
      } while (h != first);
    }
    return high - low;
  }

  /** The rings of every piece, outer ring first. */
  List<List<List<Point>>> rings(Point origin) {
    List<List<List<Point>>> pieces = new ArrayList<>(loopsOfPiece.size());
    for (List<Integer> loops : loopsOfPiece) {
      List<List<Point>> rings = new ArrayList<>(loops.size());
      for (int loop : loops) {
        List<Point> ring = new ArrayList<>();
        int first = halves.loopStart[loop];
        int h = first;
        do {
          int v = halves.from(h);
          ring.add(new Point(origin.x() + x[v], origin.y() + y[v]));
          h = halves.next[h];
        } while (h != first);
        rings.add(ring);
      }
      pieces.add(rings);
    }
    return pieces;
  }
}
