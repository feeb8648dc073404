package coldseam.mesh.triangulation;

import java.util.Arrays;

/**
 * How a mesh hangs together: its components, the loops of its outline, and cuts between loops.
 *
 * <p>Half-sides are numbered 3t + k for side k of triangle t; a half-side runs from corner k+1 to
 * corner k+2 with the triangle to its left. Since every vertex has one fan, two triangles are of
 * one component exactly if a chain of shared sides joins them, and each vertex of the outline lies
 * on one loop.
 */
public final class Topology {
  private final Mesh mesh;
  private final int[] component;
  private int components;
  private final int[] loopOfHalfSide;
  private int[][] loops = new int[4][];
  private int loopCount;

  private Topology(Mesh mesh) {
    this.mesh = mesh;
    component = new int[mesh.triangleCount()];
    loopOfHalfSide = new int[3 * mesh.triangleCount()];
    findComponents();
    findLoops();
  }

  /**
   * Works out the topology of a mesh.
   *
   * @param mesh the mesh
   * @return its components and loops
   */
  public static Topology of(Mesh mesh) {
    return new Topology(mesh);
  }

  /** How many components there are. */
  public int componentCount() {
    return components;
  }

  /** The component of a triangle, from 0. */
  public int component(int triangle) {
    return component[triangle];
  }

  /** How many loops the outline has, all components together. */
  public int loopCount() {
    return loopCount;
  }

  /**
   * A loop of the outline.
   *
   * @param loop its number
   * @return its half-sides in the order walked with the meshed region to the left; a fresh array
   */
  public int[] loop(int loop) {
    return loops[loop].clone();
  }

  /** The component a loop bounds. */
  public int loopComponent(int loop) {
    return component[loops[loop][0] / 3];
  }

  /** The loop a half-side lies on, or {@link Mesh#NONE} inside the mesh. */
  public int loopOf(int halfSide) {
    return loopOfHalfSide[halfSide];
  }

  /**
   * A shortest path of sides between two loops of one component. A function that jumps across it by
   * a constant, and whose derivatives do not, is single-valued elsewhere.
   *
   * @param from a loop
   * @param to another loop of the same component
   * @return vertices in the order walked, the first on {@code from}, the last on {@code to}
   * @throws IllegalArgumentException if no path joins the loops
   */
  public int[] cut(int from, int to) {
    int[] previous = new int[mesh.vertexCount()];
    Arrays.fill(previous, -2);
    int[][] adjacent = adjacency();
    boolean[] target = new boolean[mesh.vertexCount()];
    for (int h : loops[to]) {
      target[start(h)] = true;
    }
    int[] queue = new int[mesh.vertexCount()];
    int tail = 0;
    for (int h : loops[from]) {
      queue[tail++] = start(h);
      previous[start(h)] = -1;
    }
    for (int head = 0; head < tail; head++) {
      int v = queue[head];
      if (target[v]) {
        return walkBack(previous, v);
      }
      for (int i = adjacent[0][v]; i < adjacent[0][v + 1]; i++) {
        int w = adjacent[1][i];
        if (previous[w] == -2) {
          previous[w] = v;
          queue[tail++] = w;
        }
      }
    }
    throw new IllegalArgumentException("no path joins the two loops");
  }

  private static int[] walkBack(int[] previous, int end) {
    int length = 0;
    for (int v = end; v >= 0; v = previous[v]) {
      length++;
    }
    int[] path = new int[length];
    for (int v = end; v >= 0; v = previous[v]) {
      path[--length] = v;
    }
    return path;
  }

  /** Neighbouring vertices in compressed rows: starts, then entries. */
  private int[][] adjacency() {
    int[] starts = new int[mesh.vertexCount() + 1];
    for (int s = 0; s < mesh.sideCount(); s++) {
      starts[mesh.sideStart(s) + 1]++;
      starts[mesh.sideEnd(s) + 1]++;
    }
    for (int v = 0; v < mesh.vertexCount(); v++) {
      starts[v + 1] += starts[v];
    }
    int[] fill = Arrays.copyOf(starts, mesh.vertexCount());
    int[] entries = new int[starts[mesh.vertexCount()]];
    for (int s = 0; s < mesh.sideCount(); s++) {
      int a = mesh.sideStart(s);
      int b = mesh.sideEnd(s);
      entries[fill[a]++] = b;
      entries[fill[b]++] = a;
    }
    return new int[][] {starts, entries};
  }

  private void findComponents() {
    Arrays.fill(component, -1);
    int[] stack = new int[mesh.triangleCount()];
    for (int seed = 0; seed < component.length; seed++) {
      if (component[seed] >= 0) {
        continue;
      }
      int depth = 0;
      stack[depth++] = seed;
      component[seed] = components;
      while (depth > 0) {
        int t = stack[--depth];
        for (int k = 0; k < 3; k++) {
          int n = mesh.neighbour(t, k);
          if (n != Mesh.NONE && component[n] < 0) {
            component[n] = components;
            stack[depth++] = n;
          }
        }
      }
      components++;
    }
  }

  private void findLoops() {
    Arrays.fill(loopOfHalfSide, Mesh.NONE);
    int[] outgoing = new int[mesh.vertexCount()];
    Arrays.fill(outgoing, -1);
    for (int h = 0; h < loopOfHalfSide.length; h++) {
      if (onOutline(h)) {
        outgoing[start(h)] = h;
      }
    }
    int[] walked = new int[16];
    for (int seed = 0; seed < loopOfHalfSide.length; seed++) {
      if (!onOutline(seed) || loopOfHalfSide[seed] != Mesh.NONE) {
        continue;
      }
      int length = 0;
      for (int h = seed; loopOfHalfSide[h] == Mesh.NONE; h = outgoing[end(h)]) {
        loopOfHalfSide[h] = loopCount;
        if (length == walked.length) {
          walked = Arrays.copyOf(walked, 2 * length);
        }
        walked[length++] = h;
      }
      if (loopCount == loops.length) {
        loops = Arrays.copyOf(loops, 2 * loopCount);
      }
      loops[loopCount++] = Arrays.copyOf(walked, length);
    }
  }

  private boolean onOutline(int halfSide) {
    return mesh.neighbour(halfSide / 3, halfSide % 3) == Mesh.NONE;
  }

  private int start(int halfSide) {
    return mesh.vertex(halfSide / 3, (halfSide % 3 + 1) % 3);
  }

  private int end(int halfSide) {
    return mesh.vertex(halfSide / 3, (halfSide % 3 + 2) % 3);
  }
}
