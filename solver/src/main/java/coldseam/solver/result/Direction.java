package coldseam.solver.result;

/**
 * A unit vector.
 *
 * @param x x component
 * @param y y component
 */
record Direction(double x, double y) {
  static Direction of(double x, double y) {
    double length = Math.hypot(x, y);
    return new Direction(x / length, y / length);
  }

  double dot(double vx, double vy) {
    return x * vx + y * vy;
  }

  double dot(Direction other) {
    return dot(other.x, other.y);
  }

  double cross(double vx, double vy) {
    return x * vy - y * vx;
  }

  double cross(Direction other) {
    return cross(other.x, other.y);
  }

  Direction reversed() {
    return new Direction(-x, -y);
  }
}
