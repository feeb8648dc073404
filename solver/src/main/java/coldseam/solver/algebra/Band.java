package coldseam.solver.algebra;

/**
 * The elements near a cut, with numbers of their own for the unknowns they hold and may share.
 *
 * @param element the elements, by their numbers in the set
 * @param right which of them are on the second side
 * @param start where each begins in {@code member}, and the end of the last
 * @param member unknowns of the elements
 * @param from where the elements of each unknown begin in {@code holder}, and the end of the last
 * @param holder the elements of the unknowns
 * @param fixedLeft 1 for unknowns that elements outside the band hold on the first side, else 0
 * @param fixedRight the same for the second side
 */
record Band(
    int[] element,
    boolean[] right,
    int[] start,
    int[] member,
    int[] from,
    int[] holder,
    int[] fixedLeft,
    int[] fixedRight) {

  /**
   * Takes bins on either side of the cut until there are enough elements.
   *
   * @param set the elements
   * @param bins the bins that were cut
   * @param cut the last bin of the first side
   * @param right the elements of the second side
   * @param wanted how many elements
   */
  static Band of(ElementSet set, Bisection.Bins bins, int cut, boolean[] right, int wanted) {
    int n = set.elements();
    int[] inBin = new int[Long.SIZE];
    for (int e = 0; e < n; e++) {
      inBin[bins.ofElement(e)]++;
    }
    int first = cut;
    int last = cut + 1;
    int count = inBin[first] + inBin[last];
    while (count < wanted && count < n) {
      if (first > 0) {
        count += inBin[--first];
      }
      if (last < Long.SIZE - 1) {
        count += inBin[++last];
      }
    }
    int[] element = new int[count];
    boolean[] side = new boolean[count];
    int taken = 0;
    for (int e = 0; e < n; e++) {
      int b = bins.ofElement(e);
      if (b >= first && b <= last) {
        element[taken] = e;
        side[taken++] = right[e];
      }
    }
    return of(set, element, side, bins, (1L << first) - 1, last == Long.SIZE - 1 ? 0 : -2L << last);
  }

  private static Band of(
      ElementSet set,
      int[] element,
      boolean[] right,
      Bisection.Bins bins,
      long before,
      long after) {
    int[] start = new int[element.length + 1];
    int[] number = new int[set.interior()];
    int[] from = new int[set.interior() + 1];
    int met = 0;
    int used = 0;
    for (int i = 0; i < element.length; i++) {
      for (int p = set.start()[element[i]]; p < set.start()[element[i] + 1]; p++) {
        int u = set.member()[p];
        if (u < set.interior()) {
          if (number[u] == 0) {
            number[u] = ++met;
          }
          from[number[u]]++;
          used++;
        }
      }
      start[i + 1] = used;
    }
    for (int u = 0; u < met; u++) {
      from[u + 1] += from[u];
    }
    int[] member = new int[used];
    int[] holder = new int[used];
    int[] fill = new int[met];
    int[] fixedLeft = new int[met];
    int[] fixedRight = new int[met];
    used = 0;
    for (int i = 0; i < element.length; i++) {
      for (int p = set.start()[element[i]]; p < set.start()[element[i] + 1]; p++) {
        int outside = set.member()[p];
        if (outside < set.interior()) {
          int u = number[outside] - 1;
          member[used++] = u;
          holder[from[u] + fill[u]++] = i;
          fixedLeft[u] = (bins.ofUnknown(outside) & before) != 0 ? 1 : 0;
          fixedRight[u] = (bins.ofUnknown(outside) & after) != 0 ? 1 : 0;
        }
      }
    }
    return new Band(element, right, start, member, from, holder, fixedLeft, fixedRight);
  }
}
