package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The faces of merged edges and the rings round each: outer ring counter-clockwise, holes
 * clockwise, each ring passing any vertex once. Enclosed ground that nothing covers is gathered the
 * same way as {@link #holes()}.
 */
final class FaceRings {
  private static final int NONE = Partition.NONE;

  /**
   * A face, or uncovered enclosed ground.
   *
   * @param label its label, or NONE
   * @param rings outer ring, then holes
   * @param loops the loops round it, the outer one first
   */
  record Face(int label, List<int[]> rings, List<Integer> loops) {}

  private final Boundaries edges;
  private final HalfEdges halves;
  private final int[] labels;
  private final int[] positionOnPath;
  private final List<Face> all = new ArrayList<>();
  private final int[] faceOfLoop;
  private final int[] holeOfLoop;
  private final List<Face> faces = new ArrayList<>();
  private final List<Face> holes = new ArrayList<>();

  /**
   * Gathers faces.
   *
   * @param edges merged edges
   * @param halves their half-edges
   * @param loopLabels labels of the loops of the linework first labelled, as the edges know them
   */
  FaceRings(Boundaries edges, HalfEdges halves, int[] loopLabels) {
    this.edges = edges;
    this.halves = halves;
    this.labels = new int[halves.loopCount];
    this.positionOnPath = new int[edges.vertexCount];
    this.faceOfLoop = new int[halves.loopCount];
    Arrays.fill(positionOnPath, -1);
    Arrays.fill(faceOfLoop, NONE);
    this.holeOfLoop = new int[halves.loopCount];
    Arrays.fill(holeOfLoop, NONE);
    for (int h = 0; h < halves.loop.length; h++) {
      int loop = (h & 1) == 0 ? edges.leftLoop[h >> 1] : edges.rightLoop[h >> 1];
      labels[halves.loop[h]] = loopLabels[loop];
    }
    List<List<int[]>> outside = new ArrayList<>();
    List<Integer> outsideLoops = new ArrayList<>();
    gather(outside, outsideLoops);
    placeHoles(outside, outsideLoops);
    number();
  }

  /** The faces with a label. */
  List<Face> faces() {
    return faces;
  }

  /** Enclosed ground without a label. */
  List<Face> holes() {
    return holes;
  }

  /** Index of the face to the left of a half-edge, or NONE. */
  int faceOf(int half) {
    return faceOfLoop[halves.loop[half]];
  }

  /** The enclosed uncovered ground to the left of a half-edge as an index, or NONE. */
  int holeOf(int half) {
    return holeOfLoop[halves.loop[half]];
  }

  /** Area of a face, m². */
  double area(Face face) {
    double area = 0;
    for (int loop : face.loops) {
      area += halves.loopArea[loop];
    }
    return area;
  }

  private void gather(List<List<int[]>> outside, List<Integer> outsideLoops) {
    for (int l = 0; l < halves.loopCount; l++) {
      List<int[]> rings = rings(l);
      int outer = -1;
      for (int r = 0; r < rings.size(); r++) {
        if (ringArea(rings.get(r)) > 0) {
          outer = r;
        }
      }
      if (outer < 0) {
        outside.add(rings);
        outsideLoops.add(l);
      } else {
        rings.add(0, rings.remove(outer));
        List<Integer> loops = new ArrayList<>(1);
        loops.add(l);
        all.add(new Face(labels[l], rings, loops));
      }
    }
  }

  /** The simple rings that a loop falls into at the vertices it passes more than once. */
  private List<int[]> rings(int loop) {
    List<int[]> rings = new ArrayList<>(1);
    int[] path = new int[16];
    int n = 0;
    int first = halves.loopStart[loop];
    int h = first;
    do {
      int v = halves.from(h);
      if (positionOnPath[v] >= 0) {
        n = cutRing(path, positionOnPath[v], n, rings);
      }
      if (n == path.length) {
        path = Arrays.copyOf(path, 2 * n);
      }
      positionOnPath[v] = n;
      path[n++] = v;
      h = halves.next[h];
    } while (h != first);
    cutRing(path, 0, n, rings);
    return rings;
  }

  private int cutRing(int[] path, int from, int to, List<int[]> rings) {
    int[] ring = Arrays.copyOfRange(path, from, to);
    for (int v : ring) {
      positionOnPath[v] = -1;
    }
    rings.add(ring);
    return from;
  }

  private double ringArea(int[] ring) {
    double ox = edges.x[ring[0]];
    double oy = edges.y[ring[0]];
    double twice = 0;
    for (int i = 1; i < ring.length; i++) {
      int a = ring[i];
      int b = ring[(i + 1) % ring.length];
      twice += (edges.x[a] - ox) * (edges.y[b] - oy) - (edges.x[b] - ox) * (edges.y[a] - oy);
    }
    return twice / 2;
  }

  private void placeHoles(List<List<int[]>> outside, List<Integer> outsideLoops) {
    double[][] boxes = new double[all.size()][];
    double[] areas = new double[all.size()];
    for (int f = 0; f < boxes.length; f++) {
      boxes[f] = box(all.get(f).rings.get(0));
      areas[f] = ringArea(all.get(f).rings.get(0));
    }
    for (int i = 0; i < outside.size(); i++) {
      int loop = outsideLoops.get(i);
      int v = outside.get(i).get(0)[0];
      int best = -1;
      for (int f = 0; f < boxes.length; f++) {
        Face face = all.get(f);
        if (face.label == labels[loop]
            && (best < 0 || areas[f] < areas[best])
            && inBox(boxes[f], edges.x[v], edges.y[v])
            && isInside(face.rings.get(0), edges.x[v], edges.y[v])) {
          best = f;
        }
      }
      if (best >= 0) {
        all.get(best).rings.addAll(outside.get(i));
        all.get(best).loops.add(loop);
      } else if (labels[loop] != NONE) {
        throw new IllegalStateException(
            "a hole at local (" + edges.x[v] + ", " + edges.y[v] + ") lies in no face");
      }
    }
  }

  private double[] box(int[] ring) {
    double[] box = {
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    for (int v : ring) {
      box[0] = Math.min(box[0], edges.x[v]);
      box[1] = Math.min(box[1], edges.y[v]);
      box[2] = Math.max(box[2], edges.x[v]);
      box[3] = Math.max(box[3], edges.y[v]);
    }
    return box;
  }

  private static boolean inBox(double[] box, double px, double py) {
    return px > box[0] && py > box[1] && px < box[2] && py < box[3];
  }

  private boolean isInside(int[] ring, double px, double py) {
    boolean inside = false;
    for (int i = 0; i < ring.length; i++) {
      int a = ring[i];
      int b = ring[(i + 1) % ring.length];
      double ay = edges.y[a];
      double by = edges.y[b];
      if ((ay > py) != (by > py)) {
        double ax = edges.x[a];
        double bx = edges.x[b];
        double side = (bx - ax) * (py - ay) - (by - ay) * (px - ax);
        inside ^= by > ay ? side < 0 : side > 0;
      }
    }
    return inside;
  }

  private void number() {
    for (Face face : all) {
      List<Face> kind = face.label == NONE ? holes : faces;
      int[] ofLoop = face.label == NONE ? holeOfLoop : faceOfLoop;
      for (int loop : face.loops) {
        ofLoop[loop] = kind.size();
      }
      kind.add(face);
    }
  }
}
