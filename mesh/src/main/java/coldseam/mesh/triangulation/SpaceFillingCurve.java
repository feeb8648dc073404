package coldseam.mesh.triangulation;

/** Hilbert's curve over a square of 65536 by 65536 cells: near along the curve is near in plane. */
final class SpaceFillingCurve {
  private static final int LEVELS = 16;

  private SpaceFillingCurve() {}

  /** The place of a cell along the curve, as an unsigned number of 32 bits. */
  static long index(int column, int row) {
    int x = column;
    int y = row;
    long index = 0;
    for (int s = 1 << (LEVELS - 1); s > 0; s >>= 1) {
      int right = (x & s) != 0 ? 1 : 0;
      int upper = (y & s) != 0 ? 1 : 0;
      index = index << 2 | (3 * right ^ upper);
      if (upper == 0) {
        if (right == 1) {
          x = s - 1 - (x & (s - 1));
          y = s - 1 - (y & (s - 1));
        }
        int swap = x;
        x = y;
        y = swap;
      }
    }
    return index;
  }
}
