package coldseam.cli.text;

import java.util.Collection;

/**
 * Sets a manuscript as HTML: a section with a heading for each part, tables with headed rows and
 * columns. What it writes is well-formed XML too.
 */
public final class HtmlText implements Manuscript {
  private static final char ESCAPE = '\u001b';

  private final StringBuilder out = new StringBuilder();
  private int headings;
  private boolean open;

  /** The ink that words for this manuscript carry. */
  public Ink ink() {
    return Ink.TERMINAL;
  }

  @Override
  public void title(String title, String below) {
    out.append("<h1>").append(inked(title)).append("</h1>\n");
    out.append("<p class=\"below\">").append(inked(below)).append("</p>\n");
  }

  @Override
  public void heading(String name, String note) {
    begin(name, "");
    if (!note.isEmpty()) {
      out.append("<p class=\"under\">").append(inked(note)).append("</p>\n");
    }
  }

  @Override
  public void alertHeading(String name) {
    begin(name, " class=\"attention\"");
  }

  private void begin(String name, String attributes) {
    end();
    headings++;
    String id = "part-" + headings;
    out.append("<section aria-labelledby=\"").append(id).append('"').append(attributes);
    out.append(">\n<h2 id=\"").append(id).append("\">").append(inked(name)).append("</h2>\n");
    open = true;
  }

  /** Ends the part begun last. */
  public void end() {
    if (open) {
      out.append("</section>\n");
      open = false;
    }
  }

  @Override
  public void table(Table table) {
    if (table.isEmpty()) {
      return;
    }
    boolean[] used = new boolean[table.columns()];
    for (String[] row : table.rows()) {
      for (int c = 0; c < row.length; c++) {
        used[c] |= Ink.width(row[c]) > 0;
      }
    }
    // A table wider than a narrow window is moved in its own frame, by keys too.
    out.append("<div class=\"wide\" tabindex=\"0\" role=\"group\" aria-labelledby=\"part-");
    out.append(headings).append("\"><table aria-labelledby=\"part-").append(headings);
    out.append("\">\n");
    if (table.heads() > 0 || table.names().length > 0) {
      out.append("<thead>\n");
      for (int r = 0; r < table.heads(); r++) {
        head(table, table.rows().get(r), used);
      }
      if (table.heads() == 0) {
        head(table, table.names(), used);
      }
      out.append("</thead>\n");
    }
    out.append("<tbody>\n");
    for (String[] row : table.rows().subList(table.heads(), table.rows().size())) {
      row(table, row, used);
    }
    out.append("</tbody></table></div>\n");
  }

  private void head(Table table, String[] cells, boolean[] used) {
    out.append("<tr>");
    for (int c = 0; c < used.length; c++) {
      if (used[c]) {
        String cell = c < cells.length ? inked(cells[c]) : "";
        cell(table, c, cell.isEmpty() ? "td" : "th", cell.isEmpty() ? "" : " scope=\"col\"", cell);
      }
    }
    out.append("</tr>\n");
  }

  private void row(Table table, String[] cells, boolean[] used) {
    out.append("<tr>");
    for (int c = 0; c < used.length; c++) {
      if (used[c]) {
        String cell = c < cells.length ? inked(cells[c]) : "";
        boolean names = c == 0 && !cell.isEmpty();
        cell(table, c, names ? "th" : "td", names ? " scope=\"row\"" : "", cell);
      }
    }
    out.append("</tr>\n");
  }

  private void cell(Table table, int column, String element, String attributes, String content) {
    out.append('<').append(element).append(attributes);
    if (table.right(column)) {
      out.append(" class=\"r\"");
    }
    out.append('>').append(content).append("</").append(element).append('>');
  }

  @Override
  public void paragraph(String words) {
    out.append("<p>").append(inked(words)).append("</p>\n");
  }

  @Override
  public void note(String words) {
    out.append("<p class=\"note\">").append(inked(words)).append("</p>\n");
  }

  @Override
  public void alerts(String heading, Collection<String> lines) {
    out.append("<p><strong class=\"alert\">").append(inked(heading)).append("</strong></p>\n");
    alerts(lines);
  }

  @Override
  public void alerts(Collection<String> lines) {
    list("alerts", lines);
  }

  @Override
  public void sourced(String source, Collection<String> lines) {
    out.append("<h3>").append(inked(source)).append("</h3>\n");
    list("sourced", lines);
  }

  private void list(String of, Collection<String> lines) {
    out.append("<ul class=\"").append(of).append("\">\n");
    for (String line : lines) {
      out.append("<li>").append(inked(line)).append("</li>\n");
    }
    out.append("</ul>\n");
  }

  @Override
  public void foot(String... lines) {
    end();
    for (String line : lines) {
      out.append("<p class=\"foot\">").append(inked(line)).append("</p>\n");
    }
  }

  /**
   * Sets a picture.
   *
   * @param id of the figure, unique on the page
   * @param markup the picture as an element
   * @param caption what it shows
   */
  public void figure(String id, String markup, String caption) {
    out.append("<figure id=\"").append(escaped(id)).append("\">\n").append(markup);
    out.append("\n<figcaption>").append(inked(caption)).append("</figcaption></figure>\n");
  }

  /** Sets an element as it is. */
  public void element(String markup) {
    out.append(markup);
  }

  /** What was set so far. */
  public String text() {
    return out.toString();
  }

  /** Words with their ink as elements. */
  private static String inked(String words) {
    StringBuilder html = new StringBuilder();
    String close = "";
    int from = 0;
    for (int at = words.indexOf(ESCAPE); at >= 0; at = words.indexOf(ESCAPE, from)) {
      html.append(escaped(words.substring(from, at))).append(close);
      int end = words.indexOf('m', at);
      String element = element(words.substring(at + 2, end), html);
      close = element.isEmpty() ? "" : "</" + element + ">";
      from = end + 1;
    }
    return html.append(escaped(words.substring(from))).append(close).toString();
  }

  /** Begins the element of an ink; empty where an ink ends. */
  private static String element(String code, StringBuilder html) {
    switch (code) {
      case "1" -> {
        html.append("<strong>");
        return "strong";
      }
      case "0" -> {
        return "";
      }
      default -> {
        String of = code.equals("2") ? "faint" : code.equals("32") ? "good" : "alert";
        html.append("<span class=\"").append(of).append("\">");
        return "span";
      }
    }
  }

  /**
   * Words with the characters escaped that mean something in HTML; control characters, which no
   * page may have, are left out.
   */
  public static String escaped(String words) {
    StringBuilder html = new StringBuilder(words.length() + 16);
    for (int i = 0; i < words.length(); i++) {
      char c = words.charAt(i);
      switch (c) {
        case '&' -> html.append("&amp;");
        case '<' -> html.append("&lt;");
        case '>' -> html.append("&gt;");
        case '"' -> html.append("&quot;");
        default -> {
          if (c >= ' ' && (c < '\u007f' || c > '\u009f') && c < '\ufffe' || c == '\n') {
            html.append(c);
          }
        }
      }
    }
    return html.toString();
  }
}
