package coldseam.mesh.closing;

import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.locationtech.jts.geom.Coordinate;

/** Numbers places so that those within the resolution of each other are one. */
final class Places {
  static final double SNAP_M = Resolution.STANDARD.snapM();

  private static final double CELL_M = 2 * SNAP_M;

  private final List<Coordinate> places = new ArrayList<>();
  private final Map<Long, List<Integer>> cells = new HashMap<>();

  int count() {
    return places.size();
  }

  Coordinate at(int number) {
    return places.get(number);
  }

  /** The number of the nearest place within the resolution, or a new one. */
  int number(double x, double y) {
    long left = (long) Math.floor((x - SNAP_M) / CELL_M);
    long right = (long) Math.floor((x + SNAP_M) / CELL_M);
    long bottom = (long) Math.floor((y - SNAP_M) / CELL_M);
    long top = (long) Math.floor((y + SNAP_M) / CELL_M);
    int nearest = -1;
    double distance = SNAP_M;
    for (long i = left; i <= right; i++) {
      for (long j = bottom; j <= top; j++) {
        for (int known : cells.getOrDefault(key(i, j), List.of())) {
          double d = Math.hypot(places.get(known).x - x, places.get(known).y - y);
          if (d < distance || d == distance && nearest < 0) {
            distance = d;
            nearest = known;
          }
        }
      }
    }
    if (nearest >= 0) {
      return nearest;
    }
    places.add(new Coordinate(x, y));
    long home = key((long) Math.floor(x / CELL_M), (long) Math.floor(y / CELL_M));
    cells.computeIfAbsent(home, k -> new ArrayList<>(1)).add(places.size() - 1);
    return places.size() - 1;
  }

  /** One number for a cell; cells that share it by chance are only looked through together. */
  static long key(long i, long j) {
    return i * 0x9E3779B97F4A7C15L ^ Long.rotateLeft(j * 0xC2B2AE3D27D4EB4FL, 31);
  }
}
