package coldseam.mesh.triangulation;

import java.util.Random;

/**
 * Drawings of a seed: a wall with boxes, layers and sheets right through or part of the way, bent
 * sheets, round bars and wedges on it, some of them spaces; upright, or turned, or far off.
 */
final class RandomDrawing {
  /** The label of spaces, which are not meshed. */
  static final int SPACE = 99;

  private final Random random;
  private final double width;
  private final double height;
  private final Drawing drawing;

  private RandomDrawing(long seed) {
    random = new Random(seed);
    int turn = random.nextInt(4);
    double degrees = turn == 0 ? 0 : turn == 1 ? 90 : 360 * random.nextDouble();
    double far = random.nextInt(3) == 0 ? 1e4 : 0;
    drawing =
        Drawing.turnedAndShifted(degrees, far * random.nextDouble(), far * random.nextDouble());
    width = 200 + 3000 * random.nextDouble();
    height = 200 + 3000 * random.nextDouble();
  }

  static Drawing of(long seed) {
    RandomDrawing made = new RandomDrawing(seed);
    made.drawing.box(0, 0, 0, made.width, made.height);
    int shapes = 1 + made.random.nextInt(12);
    for (int i = 0; i < shapes; i++) {
      int label = made.random.nextInt(12) == 0 ? SPACE : made.random.nextInt(6);
      made.lay(label);
    }
    return made.drawing;
  }

  private void lay(int label) {
    double x = place(width);
    double y = place(height);
    switch (random.nextInt(6)) {
      case 0, 1 -> drawing.box(label, x, y, x + 1 + place(width), y + 1 + place(height));
      case 2 -> layLayer(label, x, y);
      case 3 -> laySheet(label, x, y);
      case 4 -> drawing.disc(label, x, y, 5 + 100 * random.nextDouble(), 8 + random.nextInt(50));
      default ->
          drawing.polygon(
              label,
              x,
              y,
              x + width * random.nextDouble(),
              y + 0.1 * height * (random.nextDouble() - 0.2),
              x + width * (random.nextDouble() - 0.5),
              y + height * random.nextDouble());
    }
  }

  private void layLayer(int label, double x, double y) {
    double thickness = thickness();
    double part = random.nextBoolean() ? 1 : random.nextDouble();
    if (random.nextBoolean()) {
      drawing.box(label, x, 0, x + thickness, height * part);
    } else {
      drawing.box(label, 0, y, width * part, y + thickness);
    }
  }

  private void laySheet(int label, double fromX, double fromY) {
    double[] line = new double[2 * (2 + random.nextInt(4))];
    double x = fromX;
    double y = fromY;
    double angle = random.nextInt(2) * 6 * random.nextDouble();
    for (int i = 0; i < line.length; i += 2) {
      line[i] = x;
      line[i + 1] = y;
      double length = 60 + 0.5 * width * random.nextDouble();
      x += length * Math.cos(angle);
      y += length * Math.sin(angle);
      angle +=
          random.nextBoolean()
              ? Math.PI / 2 * (random.nextInt(3) - 1)
              : 1.8 * (random.nextDouble() - 0.5);
    }
    drawing.strip(label, thickness(), line);
  }

  /** 0.1 mm to 10 mm. */
  private double thickness() {
    return Math.pow(10, -1 + 2 * random.nextDouble());
  }

  /** Half of the places lie on a grid of 50 mm, so that sides meet. */
  private double place(double size) {
    double value = size * random.nextDouble();
    return random.nextBoolean() ? 50 * Math.floor(value / 50) : value;
  }
}
