package coldseam.cli.plot;

/**
 * A frame on the sheet through which a window of the drawing is seen, both directions at one scale,
 * y of the drawing upwards.
 *
 * @param name what its layers are called after: {@link #WHOLE} or {@link #ZOOM}
 * @param frame on the sheet, points
 * @param pointsPerM the scale
 * @param centreX local x of the drawing in the middle of the frame, m
 * @param centreY local y there, m
 */
record Panel(String name, Box frame, double pointsPerM, double centreX, double centreY) {
  static final String WHOLE = "whole";
  static final String ZOOM = "zoom";

  double x(double localX) {
    return frame.midX() + (localX - centreX) * pointsPerM;
  }

  double y(double localY) {
    return frame.midY() - (localY - centreY) * pointsPerM;
  }

  double localX(double x) {
    return centreX + (x - frame.midX()) / pointsPerM;
  }

  double localY(double y) {
    return centreY - (y - frame.midY()) / pointsPerM;
  }

  /** What of the drawing is seen, m. */
  Box window() {
    return new Box(localX(frame.x0()), localY(frame.y1()), localX(frame.x1()), localY(frame.y0()));
  }

  /** A box of the drawing on the sheet. */
  Box on(Box local) {
    return new Box(x(local.x0()), y(local.y1()), x(local.x1()), y(local.y0()));
  }
}
