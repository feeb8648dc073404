package coldseam.cli.text;

import java.util.ArrayList;
import java.util.List;

/**
 * Rows of text set in columns as wide as their widest cell. The last column takes what it needs and
 * breaks at words where the page ends.
 */
public final class Table {
  private static final String GAP = "  ";

  private final String columns;
  private final String indent;
  private final int page;
  private final List<String[]> rows = new ArrayList<>();
  private String[] names = {};
  private int heads;

  /**
   * An empty table.
   *
   * @param columns one letter a column: {@code l} set left, {@code r} set right
   * @param indent spaces before the first column
   * @param page columns of the page
   */
  public Table(String columns, int indent, int page) {
    this.columns = columns;
    this.indent = " ".repeat(indent);
    this.page = page;
  }

  /**
   * Adds a row.
   *
   * @param cells one a column; missing ones at the end are empty
   * @return this table
   */
  public Table row(String... cells) {
    rows.add(cells.clone());
    return this;
  }

  /**
   * Adds a row that names the columns; it stands before all others.
   *
   * @param cells one a column; missing ones at the end are empty
   * @return this table
   */
  public Table head(String... cells) {
    rows.add(heads, cells.clone());
    heads++;
    return this;
  }

  /**
   * Names the columns where there is no row for it: on a page, not on a terminal, where the words
   * in the cells say enough.
   *
   * @param columnNames one a column
   * @return this table
   */
  public Table named(String... columnNames) {
    names = columnNames.clone();
    return this;
  }

  /** The rows that name the columns, then all others. */
  List<String[]> rows() {
    return rows;
  }

  /** How many rows name the columns. */
  int heads() {
    return heads;
  }

  /** Names of the columns where no row has them. */
  String[] names() {
    return names;
  }

  /** Whether a column is set right. */
  boolean right(int column) {
    return columns.charAt(column) == 'r';
  }

  /** Count of columns. */
  int columns() {
    return columns.length();
  }

  /** Whether there is no row. */
  public boolean isEmpty() {
    return rows.isEmpty();
  }

  /** The rows as lines, each ended by a line feed, without trailing blanks. */
  public String text() {
    int[] widths = new int[columns.length()];
    for (String[] row : rows) {
      for (int c = 0; c < row.length; c++) {
        widths[c] = Math.max(widths[c], Ink.width(row[c]));
      }
    }
    StringBuilder text = new StringBuilder();
    for (String[] row : rows) {
      line(text, row, widths);
    }
    return text.toString();
  }

  private void line(StringBuilder text, String[] row, int[] widths) {
    StringBuilder line = new StringBuilder(indent);
    for (int c = 0; c < row.length; c++) {
      if (widths[c] == 0) {
        continue;
      }
      if (line.length() > indent.length()) {
        line.append(GAP);
      }
      String blanks = " ".repeat(widths[c] - Ink.width(row[c]));
      if (c == columns.length() - 1 && columns.charAt(c) == 'l') {
        int hang = Ink.width(line.toString());
        line.append(wrapped(row[c], page - hang, " ".repeat(hang)));
      } else {
        line.append(columns.charAt(c) == 'r' ? blanks + row[c] : row[c] + blanks);
      }
    }
    text.append(line.toString().stripTrailing()).append('\n');
  }

  /**
   * Breaks a text at blanks.
   *
   * @param text the text
   * @param width columns of a line; a longer word stands alone
   * @param hang what every line but the first starts with
   * @return the lines, joined by line feeds
   */
  public static String wrapped(String text, int width, String hang) {
    if (Ink.width(text) <= width) {
      return text;
    }
    StringBuilder all = new StringBuilder();
    int used = 0;
    for (String word : text.split(" ")) {
      int length = Ink.width(word);
      if (used > 0 && used + 1 + length > Math.max(width, 20)) {
        all.append('\n').append(hang);
        used = 0;
      } else if (used > 0) {
        all.append(' ');
        used++;
      }
      all.append(word);
      used += length;
    }
    return all.toString();
  }
}
