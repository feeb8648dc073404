package coldseam.solver.algebra;

import java.util.Arrays;

/**
 * A set of elements that is being dissected, with numbers of its own for the unknowns they hold.
 * The unknowns still to be numbered ({@code interior} of them) come first, those already numbered
 * in a separator further up follow (the halo).
 *
 * @param start where each element begins in {@code member}, and the end of the last
 * @param member unknowns of the elements, by their numbers in this set
 * @param x x of each element's centre, or null if there are no coordinates
 * @param y y of each element's centre, or null
 * @param unknown for every unknown of this set its number outside
 * @param interior how many unknowns are still to be numbered
 */
record ElementSet(int[] start, int[] member, double[] x, double[] y, int[] unknown, int interior) {
  int elements() {
    return start.length - 1;
  }

  /** For each interior unknown the elements that hold it: where they begin, then which. */
  int[][] elementsOfUnknowns() {
    int[] from = new int[interior + 1];
    int end = start[elements()];
    for (int p = 0; p < end; p++) {
      if (member[p] < interior) {
        from[member[p] + 1]++;
      }
    }
    for (int u = 0; u < interior; u++) {
      from[u + 1] += from[u];
    }
    int[] fill = from.clone();
    int[] holder = new int[from[interior]];
    for (int e = 0; e < elements(); e++) {
      for (int p = start[e]; p < start[e + 1]; p++) {
        if (member[p] < interior) {
          holder[fill[member[p]]++] = e;
        }
      }
    }
    return new int[][] {from, holder};
  }

  /** The elements of one side; unknowns marked as shared join its halo. */
  ElementSet side(boolean[] right, boolean side, boolean[] shared) {
    int count = 0;
    int members = 0;
    for (int e = 0; e < elements(); e++) {
      if (right[e] == side) {
        count++;
        members += start[e + 1] - start[e];
      }
    }
    int[] newStart = new int[count + 1];
    int[] newMember = new int[members];
    double[] newX = x == null ? null : new double[count];
    double[] newY = y == null ? null : new double[count];
    int[] number = new int[unknown.length];
    Arrays.fill(number, Integer.MIN_VALUE);
    int[] outside = new int[unknown.length];
    int inner = 0;
    int halo = 0;
    int element = 0;
    int used = 0;
    for (int e = 0; e < elements(); e++) {
      if (right[e] != side) {
        continue;
      }
      if (x != null) {
        newX[element] = x[e];
        newY[element] = y[e];
      }
      for (int p = start[e]; p < start[e + 1]; p++) {
        int u = member[p];
        if (number[u] == Integer.MIN_VALUE) {
          if (u < interior && !shared[u]) {
            outside[inner] = unknown[u];
            number[u] = inner++;
          } else {
            halo++;
            outside[unknown.length - halo] = unknown[u];
            number[u] = -halo;
          }
        }
        newMember[used++] = number[u];
      }
      newStart[++element] = used;
    }
    return new ElementSet(
        newStart, haloLast(newMember, inner), newX, newY, joined(outside, inner, halo), inner);
  }

  private static int[] haloLast(int[] member, int inner) {
    for (int p = 0; p < member.length; p++) {
      if (member[p] < 0) {
        member[p] = inner - 1 - member[p];
      }
    }
    return member;
  }

  private static int[] joined(int[] outside, int inner, int halo) {
    int[] unknown = Arrays.copyOf(outside, inner + halo);
    for (int h = 0; h < halo; h++) {
      unknown[inner + h] = outside[outside.length - 1 - h];
    }
    return unknown;
  }
}
