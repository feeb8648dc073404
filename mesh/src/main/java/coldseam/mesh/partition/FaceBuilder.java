package coldseam.mesh.partition;

import java.util.Arrays;

/**
 * Gives every loop of noded linework the area laid last over its face: walks the loops from outside
 * inwards and toggles, at each edge crossed, the areas that change there.
 */
final class FaceBuilder {
  /** No area. */
  static final int NONE = Partition.NONE;

  private static final int[] NO_AREAS = {};
  private final Linework linework;
  private final HalfEdges halves;
  private final int[] component;
  private int componentCount;

  /** For each loop the areas over its face, ascending. */
  private final int[][] members;

  FaceBuilder(Linework linework, HalfEdges halves) {
    this.linework = linework;
    this.halves = halves;
    this.component = new int[halves.loopCount];
    this.members = new int[halves.loopCount][];
    findComponents();
    int[] lowest = leftmostVertices();
    for (int c = 0; c < componentCount; c++) {
      spread(outerLoop(lowest[c]), areasOver(lowest[c], c));
    }
  }

  /** The areas over the face of a loop, ascending. */
  int[] members(int loop) {
    return members[loop];
  }

  /** The area laid last over the face of a loop, or NONE. */
  int top(int loop) {
    int[] over = members[loop];
    return over.length == 0 ? NONE : over[over.length - 1];
  }

  int componentCount() {
    return componentCount;
  }

  /** An edge whose two sides contradict its areas, or −1. */
  int inconsistentEdge() {
    for (int e = 0; e < linework.edgeCount; e++) {
      int[] left = members[halves.loop[2 * e]];
      int[] right = members[halves.loop[2 * e + 1]];
      if (!Arrays.equals(Linework.symmetricDifference(left, right), linework.areas[e])) {
        return e;
      }
    }
    return -1;
  }

  private void findComponents() {
    Arrays.fill(component, -1);
    int[] stack = new int[halves.loopCount];
    for (int seed = 0; seed < halves.loopCount; seed++) {
      if (component[seed] >= 0) {
        continue;
      }
      int top = 0;
      stack[top++] = seed;
      component[seed] = componentCount;
      while (top > 0) {
        int first = halves.loopStart[stack[--top]];
        int h = first;
        do {
          // Loops that share a vertex only are linked through the loops between them.
          int other = halves.loop[h ^ 1];
          if (component[other] < 0) {
            component[other] = componentCount;
            stack[top++] = other;
          }
          h = halves.next[h];
        } while (h != first);
      }
      componentCount++;
    }
  }

  private int[] leftmostVertices() {
    int[] leftmost = new int[componentCount];
    Arrays.fill(leftmost, -1);
    for (int h = 0; h < halves.next.length; h++) {
      int c = component[halves.loop[h]];
      int v = halves.from(h);
      int best = leftmost[c];
      if (best < 0
          || linework.x[v] < linework.x[best]
          || (linework.x[v] == linework.x[best] && linework.y[v] < linework.y[best])) {
        leftmost[c] = v;
      }
    }
    return leftmost;
  }

  /** The loop to the left of the leftmost vertex: its half-edge nearest to straight up. */
  private int outerLoop(int leftmost) {
    int best = -1;
    for (int i = halves.offset[leftmost]; i < halves.offset[leftmost + 1]; i++) {
      int h = halves.around[i];
      if (best < 0 || steeper(h, best)) {
        best = h;
      }
    }
    return halves.loop[best];
  }

  private boolean steeper(int g, int h) {
    int v = halves.from(g);
    double gx = linework.x[halves.to(g)] - linework.x[v];
    double gy = linework.y[halves.to(g)] - linework.y[v];
    double hx = linework.x[halves.to(h)] - linework.x[v];
    double hy = linework.y[halves.to(h)] - linework.y[v];
    return hx * gy - hy * gx > 0;
  }

  /**
   * The areas over the ground just left of a component: those whose outlines, in other components,
   * a ray to the left meets an odd number of times.
   */
  private int[] areasOver(int vertex, int c) {
    int[] over = NO_AREAS;
    if (componentCount == 1) {
      return over;
    }
    double px = linework.x[vertex];
    double py = linework.y[vertex];
    for (int e = 0; e < linework.edgeCount; e++) {
      int a = linework.start[e];
      int b = linework.end[e];
      double ay = linework.y[a];
      double by = linework.y[b];
      if ((ay > py) == (by > py) || component[halves.loop[2 * e]] == c) {
        continue;
      }
      double ax = linework.x[a];
      double bx = linework.x[b];
      double side = (bx - ax) * (py - ay) - (by - ay) * (px - ax);
      if ((by > ay) ? side < 0 : side > 0) {
        over = Linework.symmetricDifference(over, linework.areas[e]);
      }
    }
    return over;
  }

  private void spread(int outer, int[] over) {
    int[] stack = new int[halves.loopCount];
    int top = 0;
    stack[top++] = outer;
    members[outer] = over;
    while (top > 0) {
      int l = stack[--top];
      int first = halves.loopStart[l];
      int h = first;
      do {
        int other = halves.loop[h ^ 1];
        if (members[other] == null) {
          members[other] = Linework.symmetricDifference(members[l], linework.areas[h >> 1]);
          stack[top++] = other;
        }
        h = halves.next[h];
      } while (h != first);
    }
  }
}
