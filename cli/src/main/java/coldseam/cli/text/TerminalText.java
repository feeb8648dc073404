package coldseam.cli.text;

import java.util.Collection;

/** Sets a manuscript as lines for a terminal. */
public final class TerminalText implements Manuscript {
  private static final int INDENT = 2;

  private final Ink ink;
  private final int page;
  private final StringBuilder text = new StringBuilder();

  /**
   * Nothing yet.
   *
   * @param ink colours, or none
   * @param page columns of the page
   */
  public TerminalText(Ink ink, int page) {
    this.ink = ink;
    this.page = page;
  }

  @Override
  public void title(String title, String below) {
    text.append(ink.strong(title)).append('\n').append(ink.faint(below)).append('\n');
  }

  @Override
  public void heading(String name, String note) {
    text.append('\n').append(ink.strong(name));
    if (!note.isEmpty()) {
      text.append("  ").append(ink.faint(note));
    }
    text.append('\n');
  }

  @Override
  public void alertHeading(String name) {
    text.append('\n').append(ink.alert(name)).append('\n');
  }

  @Override
  public void table(Table table) {
    text.append(table.text());
  }

  @Override
  public void paragraph(String words) {
    text.append("  ").append(Table.wrapped(words, page - INDENT, "  ")).append('\n');
  }

  @Override
  public void note(String words) {
    for (String line : Table.wrapped(words, page - INDENT, "").split("\n")) {
      text.append("  ").append(ink.faint(line)).append('\n');
    }
  }

  @Override
  public void alerts(String heading, Collection<String> lines) {
    text.append("  ").append(ink.alert(heading)).append('\n');
    alerts(lines, "    ");
  }

  @Override
  public void alerts(Collection<String> lines) {
    alerts(lines, "  ");
  }

  private void alerts(Collection<String> lines, String indent) {
    for (String line : lines) {
      text.append(indent)
          .append("! ")
          .append(Table.wrapped(line, page - indent.length() - 2, indent + "  "))
          .append('\n');
    }
  }

  @Override
  public void sourced(String source, Collection<String> lines) {
    text.append("  ").append(ink.faint(source)).append('\n');
    for (String line : lines) {
      text.append("    ").append(Table.wrapped(line, page - 4, "      ")).append('\n');
    }
  }

  @Override
  public void foot(String... lines) {
    text.append('\n');
    for (String line : lines) {
      text.append(ink.faint(Table.wrapped(line, page, ""))).append('\n');
    }
  }

  /** The lines, each ended by a line feed. */
  public String text() {
    return text.toString();
  }
}
