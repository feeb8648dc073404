package coldseam.cli.plot;

import java.awt.geom.PathIterator;

/**
 * Writes a path as SVG path data in hundredths of a point: every step relative to the point before
 * as it was written, so that rounding does not add up.
 */
final class PathText {
  private static final int PARTS = 100;

  private final StringBuilder out;
  private long x;
  private long y;
  private long startX;
  private long startY;
  private char last;

  private PathText(StringBuilder out) {
    this.out = out;
  }

  /** Writes path data behind what is there. */
  static void of(PathIterator path, StringBuilder out) {
    PathText text = new PathText(out);
    double[] c = new double[6];
    for (; !path.isDone(); path.next()) {
      switch (path.currentSegment(c)) {
        case PathIterator.SEG_MOVETO -> text.move(c[0], c[1]);
        case PathIterator.SEG_LINETO -> text.line(c[0], c[1]);
        case PathIterator.SEG_QUADTO -> text.curve('q', c, 2);
        case PathIterator.SEG_CUBICTO -> text.curve('c', c, 3);
        default -> text.close();
      }
    }
  }

  private void move(double toX, double toY) {
    x = Math.round(toX * PARTS);
    y = Math.round(toY * PARTS);
    startX = x;
    startY = y;
    last = 0;
    command('M');
    number(x);
    number(y);
  }

  private void line(double toX, double toY) {
    long dx = Math.round(toX * PARTS) - x;
    long dy = Math.round(toY * PARTS) - y;
    if (dy == 0) {
      command('h');
      number(dx);
    } else if (dx == 0) {
      command('v');
      number(dy);
    } else {
      command('l');
      number(dx);
      number(dy);
    }
    x += dx;
    y += dy;
  }

  private void curve(char letter, double[] c, int points) {
    command(letter);
    long endX = x;
    long endY = y;
    for (int i = 0; i < points; i++) {
      endX = Math.round(c[2 * i] * PARTS);
      endY = Math.round(c[2 * i + 1] * PARTS);
      number(endX - x);
      number(endY - y);
    }
    x = endX;
    y = endY;
  }

  private void close() {
    out.append('z');
    last = 0;
    x = startX;
    y = startY;
  }

  /** Writes the letter of a command, which is not repeated. */
  private void command(char letter) {
    if (letter != last) {
      out.append(letter);
      last = letter;
    }
  }

  private void number(long hundredths) {
    char before = out.charAt(out.length() - 1);
    if (hundredths >= 0 && before >= '0' && before <= '9') {
      out.append(' ');
    }
    write(hundredths, out);
  }

  /** Writes a number in hundredths. */
  static void number(double value, StringBuilder out) {
    write(Math.round(value * PARTS), out);
  }

  private static void write(long hundredths, StringBuilder out) {
    if (hundredths < 0) {
      out.append('-');
    }
    long size = Math.abs(hundredths);
    long whole = size / PARTS;
    long rest = size % PARTS;
    if (whole > 0 || rest == 0) {
      out.append(whole);
    }
    if (rest > 0) {
      out.append('.').append(rest / 10);
      if (rest % 10 > 0) {
        out.append(rest % 10);
      }
    }
  }
}
