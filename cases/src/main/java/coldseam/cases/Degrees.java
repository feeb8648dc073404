package coldseam.cases;

/** Sine and cosine of angles in degrees, exact at right angles. */
final class Degrees {
  private Degrees() {}

  static double sin(double degrees) {
    double turn = degrees % 360;
    if (turn % 180 == 0) {
      return 0;
    }
    if (turn % 90 == 0) {
      return turn == 90 || turn == -270 ? 1 : -1;
    }
    return Math.abs(turn % 180) == 30 || Math.abs(turn % 180) == 150
        ? Math.copySign(0.5, Math.sin(Math.toRadians(turn)))
        : Math.sin(Math.toRadians(turn));
  }

  static double cos(double degrees) {
    double turn = Math.abs(degrees % 360);
    if (turn == 90 || turn == 270) {
      return 0;
    }
    if (turn % 180 == 0) {
      return turn == 180 ? -1 : 1;
    }
    return turn % 180 == 60 || turn % 180 == 120
        ? Math.copySign(0.5, Math.cos(Math.toRadians(turn)))
        : Math.cos(Math.toRadians(turn));
  }
}
