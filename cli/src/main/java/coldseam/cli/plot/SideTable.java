package coldseam.cli.plot;

import java.util.Arrays;

/** Numbers the sides of triangles from 0, each by its two vertices in either order. */
final class SideTable {
  private static final long FREE = -1;
  private static final long SPREAD = 0x9E3779B97F4A7C15L;

  private long[] keys;
  private int[] ids;
  private int mask;
  private int size;

  SideTable(int expected) {
    int capacity = Integer.highestOneBit(Math.max(8, expected)) * 4;
    keys = new long[capacity];
    Arrays.fill(keys, FREE);
    ids = new int[capacity];
    mask = capacity - 1;
  }

  int size() {
    return size;
  }

  /** The number of a side, a new one if it was not seen before. */
  int id(int a, int b) {
    long key = (long) Math.min(a, b) << 32 | Math.max(a, b);
    int slot = slot(key);
    if (keys[slot] == FREE) {
      if (2 * size >= keys.length) {
        grow();
        slot = slot(key);
      }
      keys[slot] = key;
      ids[slot] = size++;
    }
    return ids[slot];
  }

  private int slot(long key) {
    int slot = (int) (key * SPREAD >>> 33) & mask;
    while (keys[slot] != FREE && keys[slot] != key) {
      slot = slot + 1 & mask;
    }
    return slot;
  }

  private void grow() {
    long[] oldKeys = keys;
    int[] oldIds = ids;
    keys = new long[2 * oldKeys.length];
    Arrays.fill(keys, FREE);
    ids = new int[keys.length];
    mask = keys.length - 1;
    for (int i = 0; i < oldKeys.length; i++) {
      if (oldKeys[i] != FREE) {
        int slot = slot(oldKeys[i]);
        keys[slot] = oldKeys[i];
        ids[slot] = oldIds[i];
      }
    }
  }
}
