package coldseam.cases.drawing;

/** A straight or curved piece of an outline, from where the piece before it ended. */
sealed interface Segment {
  /**
   * Adds chords after the point where the segment begins.
   *
   * @param at where the outline is placed
   * @param deviation how far a chord may be from the curve, placed; infinite for a rough outline
   * @param into receives the ends of the chords, placed
   */
  void chords(Affine at, double deviation, Corner into);

  /** Receives a corner. */
  @FunctionalInterface
  interface Corner {
    void add(double x, double y);
  }

  /**
   * Widens limits a little, so that turning a drawing does not change how many chords there are.
   */
  double TIE = 1 + 1e-9;

  /** How many chords a number that came out of a formula means. */
  static int count(double wanted, int least) {
    double whole = Math.ceil(wanted / TIE);
    return (int) Math.max(least, Math.min(Limits.MOST_CHORDS, whole));
  }

  /**
   * A straight line.
   *
   * @param x of its end
   * @param y of its end
   */
  record Straight(double x, double y) implements Segment {
    @Override
    public void chords(Affine at, double deviation, Corner into) {
      into.add(at.x(x, y), at.y(x, y));
    }
  }

  /**
   * An arc of an ellipse, c + u cos t + v sin t, in equal steps of t: the deviation of a chord over
   * a step s is at most (1 − cos(s/2)) times the longer half axis.
   *
   * @param cx centre
   * @param cy centre
   * @param ux first half axis, or any conjugate one
   * @param uy see above
   * @param vx the other
   * @param vy see above
   * @param from t at the beginning, radians
   * @param to t at the end
   */
  record Arc(
      double cx, double cy, double ux, double uy, double vx, double vy, double from, double to)
      implements Segment {
    /** A circular arc; the angle runs counter-clockwise if {@code to} is more than {@code from}. */
    static Arc circle(double cx, double cy, double radius, double from, double to) {
      return new Arc(cx, cy, radius, 0, 0, radius, from, to);
    }

    double x(double t) {
      return cx + ux * Math.cos(t) + vx * Math.sin(t);
    }

    double y(double t) {
      return cy + uy * Math.cos(t) + vy * Math.sin(t);
    }

    @Override
    public void chords(Affine at, double deviation, Corner into) {
      double px = at.a() * ux + at.c() * uy;
      double py = at.b() * ux + at.d() * uy;
      double qx = at.a() * vx + at.c() * vy;
      double qy = at.b() * vx + at.d() * vy;
      double radius = longerHalfAxis(px, py, qx, qy);
      double sweep = Math.abs(to - from);
      double flat = Math.max(-1, 1 - deviation / Math.max(radius, Double.MIN_NORMAL));
      double step = Math.min(Math.PI / 4, Math.max(1e-6, 2 * Math.acos(flat)));
      int n = count(sweep / step, 1);
      for (int i = 1; i <= n; i++) {
        double t = from + (to - from) * i / n;
        into.add(at.x(x(t), y(t)), at.y(x(t), y(t)));
      }
    }

    /** The largest stretch of the matrix with columns p and q. */
    private static double longerHalfAxis(double px, double py, double qx, double qy) {
      double sum = px * px + py * py + qx * qx + qy * qy;
      double det = px * qy - py * qx;
      return Math.sqrt((sum + Math.sqrt(Math.max(0, sum * sum - 4 * det * det))) / 2);
    }
  }

  /**
   * A cubic Bézier curve. Over n equal steps a chord deviates by at most max|p''| / (8 n²).
   *
   * @param x0 beginning
   * @param y0 beginning
   * @param x1 first control point
   * @param y1 see above
   * @param x2 second control point
   * @param y2 see above
   * @param x3 end
   * @param y3 end
   */
  record Cubic(
      double x0, double y0, double x1, double y1, double x2, double y2, double x3, double y3)
      implements Segment {
    /** A quadratic curve, which is a cubic one. */
    static Cubic quadratic(double x0, double y0, double x1, double y1, double x2, double y2) {
      return new Cubic(
          x0,
          y0,
          x0 + (x1 - x0) * 2 / 3,
          y0 + (y1 - y0) * 2 / 3,
          x2 + (x1 - x2) * 2 / 3,
          y2 + (y1 - y2) * 2 / 3,
          x2,
          y2);
    }

    @Override
    public void chords(Affine at, double deviation, Corner into) {
      double ax = x0 - 2 * x1 + x2;
      double ay = y0 - 2 * y1 + y2;
      double bx = x1 - 2 * x2 + x3;
      double by = y1 - 2 * y2 + y3;
      double bend =
          6
              * Math.max(
                  Math.hypot(at.a() * ax + at.c() * ay, at.b() * ax + at.d() * ay),
                  Math.hypot(at.a() * bx + at.c() * by, at.b() * bx + at.d() * by));
      int n = count(Math.sqrt(bend / (8 * deviation)), 4);
      for (int i = 1; i <= n; i++) {
        double t = (double) i / n;
        double s = 1 - t;
        double x = s * s * s * x0 + 3 * s * s * t * x1 + 3 * s * t * t * x2 + t * t * t * x3;
        double y = s * s * s * y0 + 3 * s * s * t * y1 + 3 * s * t * t * y2 + t * t * t * y3;
        into.add(at.x(x, y), at.y(x, y));
      }
    }
  }

  /**
   * A spline. The chords of each span are doubled until their middles lie within a quarter of the
   * deviation of the curve.
   *
   * @param spline the curve
   */
  record Splined(Spline spline) implements Segment {
    /** Fewest chords in a span. */
    private static final int FEWEST = 4;

    private static final int MOST = 1024;

    @Override
    public void chords(Affine at, double deviation, Corner into) {
      for (double[] span : spline.spans()) {
        int n = FEWEST;
        while (n < MOST && deviates(at, span, n) > deviation / 4) {
          n *= 2;
        }
        for (int i = 1; i <= n; i++) {
          double[] p = spline.point(span[0] + (span[1] - span[0]) * i / n);
          into.add(at.x(p[0], p[1]), at.y(p[0], p[1]));
        }
      }
    }

    private double deviates(Affine at, double[] span, int n) {
      double most = 0;
      double[] last = spline.point(span[0]);
      for (int i = 1; i <= n; i++) {
        double step = (span[1] - span[0]) / n;
        double[] next = spline.point(span[0] + step * i);
        double[] middle = spline.point(span[0] + step * (i - 0.5));
        double dx = middle[0] - (last[0] + next[0]) / 2;
        double dy = middle[1] - (last[1] + next[1]) / 2;
        most = Math.max(most, Math.hypot(at.a() * dx + at.c() * dy, at.b() * dx + at.d() * dy));
        last = next;
      }
      return most;
    }
  }
}
