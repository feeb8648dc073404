package coldseam.cli.plot;

/**
 * An upright rectangle, of the drawing in metres or of the sheet in points.
 *
 * @param x0 least x
 * @param y0 least y
 * @param x1 greatest x
 * @param y1 greatest y
 */
record Box(double x0, double y0, double x1, double y1) {
  static final Box EMPTY =
      new Box(
          Double.POSITIVE_INFINITY,
          Double.POSITIVE_INFINITY,
          Double.NEGATIVE_INFINITY,
          Double.NEGATIVE_INFINITY);

  static Box around(double x, double y, double width, double height) {
    return new Box(x - width / 2, y - height / 2, x + width / 2, y + height / 2);
  }

  double width() {
    return x1 - x0;
  }

  double height() {
    return y1 - y0;
  }

  double midX() {
    return (x0 + x1) / 2;
  }

  double midY() {
    return (y0 + y1) / 2;
  }

  Box with(double x, double y) {
    return new Box(Math.min(x0, x), Math.min(y0, y), Math.max(x1, x), Math.max(y1, y));
  }

  Box with(Box other) {
    return new Box(
        Math.min(x0, other.x0),
        Math.min(y0, other.y0),
        Math.max(x1, other.x1),
        Math.max(y1, other.y1));
  }

  Box grown(double by) {
    return new Box(x0 - by, y0 - by, x1 + by, y1 + by);
  }

  boolean contains(double x, double y) {
    return x >= x0 && x <= x1 && y >= y0 && y <= y1;
  }

  boolean contains(Box other) {
    return other.x0 >= x0 && other.x1 <= x1 && other.y0 >= y0 && other.y1 <= y1;
  }

  boolean meets(Box other) {
    return x0 < other.x1 && other.x0 < x1 && y0 < other.y1 && other.y0 < y1;
  }
}
