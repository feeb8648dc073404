package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** The key of a plot: headings, samples with words, rows of figures; flows into columns. */
final class Key {
  static final double SAMPLE = 34;

  private static final double ROW_GAP = 3;
  private static final double HEADING_GAP = 11;

  /** Blocks of so many rows or fewer are not divided. */
  private static final int SHORT_BLOCK = 7;

  /** Draws the sample of a row into a box. */
  @FunctionalInterface
  interface Sample {
    void draw(Canvas canvas, Box box);
  }

  /** A line across the box. */
  record Line(Pen pen) implements Sample {
    @Override
    public void draw(Canvas canvas, Box box) {
      Polyline across = Polyline.of(box.x0(), box.midY(), box.x1(), box.midY());
      canvas.stroke(Polyline.path(List.of(across)), Palette.INK, pen);
    }
  }

  /**
   * One row.
   *
   * @param heading whether it heads the rows after it
   * @param sample what stands before the words, or null
   * @param words of the row
   * @param value at the right end, or empty
   * @param height of the sample at least, points
   */
  private record Row(boolean heading, Sample sample, String words, String value, double height) {}

  /**
   * A column to flow into.
   *
   * @param x left
   * @param y top
   * @param width points
   * @param height points
   */
  record Column(double x, double y, double width, double height) {}

  private final List<Row> rows = new ArrayList<>();
  private final Map<Double, double[]> heights = new HashMap<>();

  void heading(String words) {
    rows.add(new Row(true, null, words, "", 0));
  }

  void row(String words, String value) {
    rows.add(new Row(false, null, words, value, 0));
  }

  void note(String words) {
    row(words, "");
  }

  void sample(Sample sample, String words, String value) {
    rows.add(new Row(false, sample, words, value, 17));
  }

  void tall(Sample sample, double height) {
    rows.add(new Row(false, sample, "", "", height));
  }

  /** How high the rows are in columns of a width, all under each other. */
  double height(double width) {
    double sum = 0;
    for (double height : heights(width)) {
      sum += height;
    }
    return sum;
  }

  /** How many rows, from one on, fit into a height; a heading never ends a column. */
  private int fitting(int from, double width, double height) {
    double[] heights = heights(width);
    double sum = 0;
    int fit = from;
    for (int i = from; i < rows.size(); i++) {
      sum += heights[i] - (i == from && rows.get(i).heading() ? HEADING_GAP : 0);
      if (sum > height) {
        break;
      }
      if (divisible(from, i + 1)) {
        fit = i + 1;
      }
    }
    return fit;
  }

  /**
   * Whether a column may end before a row: short blocks stay whole, long ones lose no single row.
   */
  private boolean divisible(int from, int end) {
    if (end == rows.size() || rows.get(end).heading()) {
      return true;
    }
    int first = end;
    while (first > 0 && !rows.get(first).heading()) {
      first--;
    }
    int last = end;
    while (last < rows.size() && !rows.get(last).heading()) {
      last++;
    }
    boolean whole = last - first - 1 <= SHORT_BLOCK && first >= from;
    return !whole && end - Math.max(first, from) > 2 && last - end > 1;
  }

  /** The least height at which what does not fit into a first column fills some more. */
  double restHeight(double firstWidth, double firstHeight, double width, int columns) {
    int from = fitting(0, firstWidth, firstHeight);
    double height = 0;
    for (int i = from; i < rows.size(); i++) {
      height = Math.max(height, heights(width)[i]);
    }
    while (!fits(from, width, height, columns)) {
      height += 4;
    }
    return height;
  }

  private boolean fits(int from, double width, double height, int columns) {
    int at = from;
    for (int c = 0; c < columns && at < rows.size(); c++) {
      at = fitting(at, width, height);
    }
    return at == rows.size();
  }

  void draw(Canvas canvas, List<Column> columns) {
    int at = 0;
    for (Column column : columns) {
      int end = fitting(at, column.width(), column.height());
      double y = column.y();
      for (int i = at; i < end; i++) {
        Row row = rows.get(i);
        if (i == at && row.heading()) {
          y -= HEADING_GAP;
        }
        draw(canvas, row, column.x(), y, column.width());
        y += heights(column.width())[i];
      }
      at = end;
    }
  }

  private static Lettering lettering(Row row) {
    return row.heading() ? Lettering.HEADING : Lettering.SMALL;
  }

  private static double wordsWidth(Row row, double width) {
    double value = row.value().isEmpty() ? 0 : TextWidths.of(row.value(), Lettering.SMALL) + 8;
    return width - (row.sample() == null ? 0 : SAMPLE) - value;
  }

  /** Heights of all rows in a column of a width. */
  private double[] heights(double width) {
    double[] known = heights.get(width);
    if (known == null) {
      known = new double[rows.size()];
      for (int i = 0; i < known.length; i++) {
        known[i] = height(rows.get(i), width);
      }
      heights.put(width, known);
    }
    return known;
  }

  private static double height(Row row, double width) {
    if (row.words().isEmpty() && row.value().isEmpty()) {
      return row.height() + ROW_GAP;
    }
    Lettering lettering = lettering(row);
    int lines = Wrapping.of(row.words(), wordsWidth(row, width), lettering).size();
    double text = lines * lettering.lineHeight();
    return Math.max(text, row.height()) + ROW_GAP + (row.heading() ? HEADING_GAP + 1 : 0);
  }

  private static void draw(Canvas canvas, Row row, double x, double y, double width) {
    double height = height(row, width) - ROW_GAP;
    if (row.heading()) {
      double base = y + HEADING_GAP + Lettering.HEADING.size();
      for (String line : Wrapping.of(row.words(), width, Lettering.HEADING)) {
        canvas.text(line, x, base, Lettering.HEADING);
        base += Lettering.HEADING.lineHeight();
      }
      return;
    }
    double left = x;
    if (row.sample() != null) {
      boolean alone = row.words().isEmpty();
      row.sample().draw(canvas, new Box(x, y, alone ? x + width : x + SAMPLE - 8, y + height));
      left += SAMPLE;
    }
    List<String> lines = Wrapping.of(row.words(), wordsWidth(row, width), Lettering.SMALL);
    double step = Lettering.SMALL.lineHeight();
    double base =
        y
            + (height - lines.size() * step) / 2
            + (step + Lettering.SMALL.size() * TextWidths.CAPITAL) / 2;
    if (!row.value().isEmpty()) {
      canvas.text(row.value(), x + width, base, Lettering.SMALL, Anchor.END);
    }
    for (String line : lines) {
      canvas.text(line, left, base, Lettering.SMALL);
      base += step;
    }
  }
}
