package coldseam.cli.plot;

import java.awt.BasicStroke;

/**
 * How a line is drawn.
 *
 * @param width points
 * @param dashes lengths of dashes and gaps, points; none for a full line
 */
record Pen(float width, float... dashes) {
  static final Pen HAIR = new Pen(0.5f);
  static final Pen FINE = new Pen(0.7f);
  static final Pen MEDIUM = new Pen(1.1f);
  static final Pen HEAVY = new Pen(1.7f);
  static final Pen AXIS = new Pen(0.7f, 18, 3, 3, 3);
  static final Pen CUT_OFF = new Pen(1.2f, 11, 3, 2.5f, 3);

  private static final float MITER = 4;

  BasicStroke stroke() {
    return new BasicStroke(
        width,
        BasicStroke.CAP_BUTT,
        BasicStroke.JOIN_MITER,
        MITER,
        dashes.length == 0 ? null : dashes,
        0);
  }
}
