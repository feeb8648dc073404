package coldseam.mesh.partition;

import java.util.Arrays;

/** Numbers unordered pairs of whole numbers in the order they are first met. */
final class PairIndex {
  private static final long FREE = -1;
  private long[] keys;
  private int[] numbers;
  private int count;

  PairIndex(int expected) {
    int size = Integer.highestOneBit(Math.max(16, expected)) * 4;
    keys = new long[size];
    numbers = new int[size];
    Arrays.fill(keys, FREE);
  }

  int count() {
    return count;
  }

  /** The number of the pair; equal to the former {@link #count()} if the pair is new. */
  int add(int a, int b) {
    if (2 * count >= keys.length) {
      grow();
    }
    long key = key(a, b);
    int slot = slot(key);
    if (keys[slot] == FREE) {
      keys[slot] = key;
      numbers[slot] = count++;
    }
    return numbers[slot];
  }

  boolean contains(int a, int b) {
    return keys[slot(key(a, b))] != FREE;
  }

  private static long key(int a, int b) {
    return ((long) Math.min(a, b) << 32) | Math.max(a, b);
  }

  private int slot(long key) {
    long mixed = key * 0x9E3779B97F4A7C15L;
    int slot = (int) (mixed >>> 33) & (keys.length - 1);
    while (keys[slot] != FREE && keys[slot] != key) {
      slot = (slot + 1) & (keys.length - 1);
    }
    return slot;
  }

  private void grow() {
    long[] oldKeys = keys;
    int[] oldNumbers = numbers;
    keys = new long[2 * oldKeys.length];
    numbers = new int[keys.length];
    Arrays.fill(keys, FREE);
    for (int i = 0; i < oldKeys.length; i++) {
      if (oldKeys[i] != FREE) {
        int slot = slot(oldKeys[i]);
        keys[slot] = oldKeys[i];
        numbers[slot] = oldNumbers[i];
      }
    }
  }
}
