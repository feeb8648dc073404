package coldseam.mesh.partition;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/**
 * Drawings of overlapping shapes as builders make them: many edges on one grid line, sheets of a
 * tenth of a millimetre, and polygons that may cross themselves.
 */
final class RandomDrawings {
  private RandomDrawings() {}

  /** A few shapes with up to five labels. */
  static List<LabelledArea> areas(Random random, int atMost) {
    List<LabelledArea> areas = new ArrayList<>();
    int count = 2 + random.nextInt(atMost);
    for (int i = 0; i < count; i++) {
      areas.add(random.nextInt(3) == 0 ? polygon(random) : box(random));
    }
    return areas;
  }

  private static LabelledArea box(Random random) {
    double x = random.nextInt(8) * 0.1;
    double y = random.nextInt(8) * 0.1;
    double width = (1 + random.nextInt(4)) * 0.1;
    double height = (1 + random.nextInt(4)) * 0.1;
    int sheet = random.nextInt(6);
    width = sheet == 0 ? 1e-4 : width;
    height = sheet == 1 ? 1e-4 : height;
    return Drawings.box(random.nextInt(5), x, y, x + width, y + height);
  }

  private static LabelledArea polygon(Random random) {
    double[] xy = new double[2 * (3 + random.nextInt(4))];
    do {
      for (int i = 0; i < xy.length; i++) {
        xy[i] = random.nextInt(9) * 0.1;
      }
    } while (Math.abs(area(xy)) < 1e-6);
    return Drawings.polygon(random.nextInt(5), xy);
  }

  private static double area(double[] xy) {
    double twice = 0;
    for (int i = 0; i < xy.length; i += 2) {
      int j = (i + 2) % xy.length;
      twice += xy[i] * xy[j + 1] - xy[j] * xy[i + 1];
    }
    return twice / 2;
  }
}
