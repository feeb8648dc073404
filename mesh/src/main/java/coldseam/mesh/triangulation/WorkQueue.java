package coldseam.mesh.triangulation;

import java.util.Arrays;

/**
 * Triangles to be bettered, those of the shortest side first; equal ones in the order in which they
 * came. A triangle is remembered with its corners, since it may have changed when its turn comes.
 */
final class WorkQueue {
  private double[] keys = new double[64];

  /** Four numbers an entry: triangle and corners. */
  private int[] entries = new int[256];

  private int[] heap = new int[64];
  private int heapSize;
  private int made;
  private int current;

  void add(double key, int triangle, int a, int b, int c) {
    if (made == keys.length) {
      keys = Arrays.copyOf(keys, 2 * made);
      entries = Arrays.copyOf(entries, 8 * made);
    }
    if (heapSize == heap.length) {
      heap = Arrays.copyOf(heap, 2 * heapSize);
    }
    int entry = made++;
    keys[entry] = key;
    entries[4 * entry] = triangle;
    entries[4 * entry + 1] = a;
    entries[4 * entry + 2] = b;
    entries[4 * entry + 3] = c;
    int at = heapSize++;
    while (at > 0 && before(entry, heap[(at - 1) / 2])) {
      heap[at] = heap[(at - 1) / 2];
      at = (at - 1) / 2;
    }
    heap[at] = entry;
  }

  /** Takes the next entry; false if there is none. */
  boolean poll() {
    if (heapSize == 0) {
      return false;
    }
    current = heap[0];
    int last = heap[--heapSize];
    int at = 0;
    while (true) {
      int child = 2 * at + 1;
      if (child >= heapSize) {
        break;
      }
      if (child + 1 < heapSize && before(heap[child + 1], heap[child])) {
        child++;
      }
      if (!before(heap[child], last)) {
        break;
      }
      heap[at] = heap[child];
      at = child;
    }
    heap[at] = last;
    return true;
  }

  int triangle() {
    return entries[4 * current];
  }

  int corner(int k) {
    return entries[4 * current + 1 + k];
  }

  private boolean before(int entry, int other) {
    return keys[entry] < keys[other] || keys[entry] == keys[other] && entry < other;
  }
}
