package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.orthotropic;
import static coldseam.solver.conduction.Sketch.space;

import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Space;
import java.util.Random;

/**
 * Random details: three spaces, one of them in two stretches, holes with films, hollows, rotated
 * tensors, films that differ edge by edge, a fixed temperature, a given flow. Some cannot be solved
 * and are refused by the conditions.
 */
final class RandomDetails {
  private RandomDetails() {}

  static Sketch sketch(Random random) {
    Space a = space("a", 20, 0.05 + 0.2 * random.nextDouble());
    Space b = space("b", -5, random.nextInt(4) == 0 ? 0 : 0.04);
    Space c = space("c", 8, 0.1);
    Sketch sketch = new Sketch().know(a).know(b).know(c);
    sketch.box(fill(random, 0), 0, 0, 1, 0.6);
    for (int i = 1; i < 2 + random.nextInt(4); i++) {
      box(sketch, fill(random, i), random, 0, 0, 1, 0.6);
    }
    if (random.nextInt(2) == 0) {
      box(sketch, c, random, 0.1, 0.1, 0.9, 0.5);
    }
    if (random.nextInt(3) == 0) {
      box(sketch, new Hollow("hollow"), random, 0.1, 0.1, 0.9, 0.5);
    }
    double cut = 0.2 + 0.6 * random.nextDouble();
    sketch.facing(a, 0, 0, 0, 0.6).facing(b, 1, 0, 1, 0.6);
    sketch.facing(a, 0, 0.6, cut / 2, 0.6).facing(a, cut / 2 + 0.1, 0.6, cut / 2 + 0.2, 0.6);
    if (random.nextInt(2) == 0) {
      sketch.facing(c, cut / 2, 0, cut, 0);
    }
    if (random.nextInt(3) == 0) {
      sketch.flow(10 * random.nextDouble() - 3, 0.85, 0, 0.95, 0);
    }
    return sketch;
  }

  /**
   * The same turned about x = 0: holes and hollows off the axis and on it, so that there are
   * several stretches of axis, materials that meet the axis in a corner, flows that begin there.
   */
  static Sketch revolved(Random random) {
    Space a = space("a", 20, 0.05 + 0.2 * random.nextDouble());
    Space b = space("b", -5, random.nextInt(4) == 0 ? 0 : 0.04);
    Space c = space("c", 8, random.nextInt(4) == 0 ? 0 : 0.1);
    Sketch sketch = new Sketch().revolved().know(a).know(b).know(c);
    if (random.nextInt(4) == 0) {
      double tip = 0.1 + 0.4 * random.nextDouble();
      sketch.polygon(fill(random, 0), 0, tip, 0.3, 0, 1, 0, 1, 0.6, 0.2, 0.6);
    } else {
      sketch.box(fill(random, 0), random.nextInt(4) == 0 ? 0.02 : 0, 0, 1, 0.6);
    }
    for (int i = 1; i < 2 + random.nextInt(4); i++) {
      box(sketch, fill(random, i), random, random.nextInt(2) == 0 ? -0.3 : 0, 0, 1, 0.6);
    }
    if (random.nextInt(3) == 0) {
      double tip = 0.1 + 0.4 * random.nextDouble();
      sketch.polygon(fill(random, 9), 0, tip, 0.3, tip - 0.1, 0.2, tip + 0.08);
    }
    if (random.nextInt(2) == 0) {
      box(sketch, c, random, random.nextInt(2) == 0 ? -0.3 : 0.1, 0.1, 0.9, 0.5);
    }
    if (random.nextInt(3) == 0) {
      double x0 = random.nextInt(2) == 0 ? -0.3 : 0.1;
      box(sketch, new Hollow("hollow"), random, x0, 0.1, 0.9, 0.5);
    }
    double cut = 0.3 + 0.6 * random.nextDouble();
    sketch.facing(b, 1, 0, 1, 0.6);
    sketch.facing(a, 0, 0.6, cut / 2, 0.6).facing(a, cut / 2 + 0.1, 0.6, cut / 2 + 0.2, 0.6);
    if (random.nextInt(2) == 0) {
      sketch.facing(c, cut / 2, 0, cut, 0);
    }
    if (random.nextInt(2) == 0) {
      sketch.flow(10 * random.nextDouble() - 3, random.nextInt(2) * 0.05, 0, 0.1, 0);
    }
    return sketch;
  }

  private static void box(
      Sketch sketch, Fill fill, Random random, double x0, double y0, double x1, double y1) {
    double left = x0 + (x1 - x0) * 0.8 * random.nextDouble();
    double low = y0 + (y1 - y0) * 0.8 * random.nextDouble();
    double right = left + (x1 - left) * (0.1 + 0.8 * random.nextDouble());
    double high = low + (y1 - low) * (0.1 + 0.8 * random.nextDouble());
    sketch.box(fill, Math.max(0, left), low, Math.max(right, 0.05), high);
  }

  private static Fill fill(Random random, int i) {
    double conductivity = Math.pow(10, 3 * random.nextDouble() - 1.5);
    return random.nextInt(3) == 0
        ? orthotropic("wood " + i, conductivity, conductivity / 3, random.nextDouble() * 3)
        : material("material " + i, conductivity);
  }
}
