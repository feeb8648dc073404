package coldseam.cli.sheet;

import coldseam.cases.study.Measure;
import coldseam.cases.study.Measure.Knowledge;
import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Table;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The points of a sweep as a table: for the terminal, and as comma-separated values. */
public final class StudyTable {
  private static final int PAGE = 92;

  /**
   * One row.
   *
   * @param settings what was set, by name
   * @param measures what came out
   */
  public record Row(Map<String, String> settings, List<Measure> measures) {}

  private final List<String> names;
  private final List<Row> rows;
  private final Map<String, Measure> columns = new LinkedHashMap<>();

  /**
   * A table.
   *
   * @param names what is set, in the order of its columns
   * @param rows the rows
   */
  public StudyTable(List<String> names, List<Row> rows) {
    this.names = List.copyOf(names);
    this.rows = List.copyOf(rows);
    for (Row row : rows) {
      for (Measure measure : row.measures()) {
        columns.putIfAbsent(measure.typedName(), measure);
      }
    }
  }

  private static Measure find(Row row, String column) {
    for (Measure measure : row.measures()) {
      if (measure.typedName().equals(column)) {
        return measure;
      }
    }
    return null;
  }

  /**
   * For the terminal: every number to the digits that hold, and below each column how far its
   * numbers may be off.
   *
   * @param ink colours, or none
   * @return lines, each ended by a line feed
   */
  public String text(Ink ink) {
    Table table = new Table("l".repeat(names.size()) + "r".repeat(columns.size()), 2, PAGE);
    List<String> symbols = new ArrayList<>(names);
    List<String> subjects = new ArrayList<>(blanks());
    List<String> units = new ArrayList<>(blanks());
    List<String> widths = new ArrayList<>(blanks());
    for (Map.Entry<String, Measure> column : columns.entrySet()) {
      Measure first = column.getValue();
      symbols.add(first.kind().symbol());
      subjects.add(first.of());
      units.add(first.kind().unit());
      widths.add(ink.faint(width(column.getKey())));
    }
    table.row(inked(symbols, ink)).row(inked(subjects, ink)).row(faint(units, ink));
    for (Row row : rows) {
      List<String> cells = new ArrayList<>();
      for (String name : names) {
        cells.add(row.settings().getOrDefault(name, ""));
      }
      for (String column : columns.keySet()) {
        cells.add(cell(find(row, column)));
      }
      table.row(cells.toArray(new String[0]));
    }
    if (!widths.isEmpty()) {
      widths.set(0, ink.faint("at most"));
    }
    return table.row(widths.toArray(new String[0])).text();
  }

  private List<String> blanks() {
    return names.stream().map(name -> "").toList();
  }

  private static String[] inked(List<String> cells, Ink ink) {
    return cells.stream().map(ink::strong).toArray(String[]::new);
  }

  private static String[] faint(List<String> cells, Ink ink) {
    return cells.stream().map(ink::faint).toArray(String[]::new);
  }

  /** A number to the digits that hold. */
  static String cell(Measure measure) {
    if (measure == null) {
      return "–";
    }
    if (measure.knowledge() == Knowledge.OPEN) {
      return "not certified";
    }
    return Digits.between(measure.value(), measure.lower(), measure.upper(), 6).value();
  }

  private String width(String column) {
    double most = 0;
    boolean estimate = false;
    for (Row row : rows) {
      Measure measure = find(row, column);
      if (measure != null && measure.knowledge() != Knowledge.OPEN) {
        Digits.Figure figure = Digits.between(measure.value(), measure.lower(), measure.upper(), 6);
        most = Math.max(most, Double.parseDouble(figure.halfWidth()));
        estimate |= measure.knowledge() == Knowledge.ESTIMATE;
      }
    }
    return (estimate ? "est. ± " : "± ") + Digits.shortest(most, 6);
  }

  /** As comma-separated values (RFC 4180, UTF-8): a heading, then one row a point. */
  public String csv() {
    StringBuilder text = new StringBuilder();
    List<String> heads = new ArrayList<>(names);
    for (Map.Entry<String, Measure> column : columns.entrySet()) {
      heads.addAll(heads(column.getKey(), column.getValue().kind()));
    }
    line(text, heads);
    for (Row row : rows) {
      List<String> cells = new ArrayList<>();
      for (String name : names) {
        cells.add(row.settings().getOrDefault(name, ""));
      }
      for (Map.Entry<String, Measure> column : columns.entrySet()) {
        cells.addAll(cells(find(row, column.getKey()), column.getValue().kind()));
      }
      line(text, cells);
    }
    return text.toString();
  }

  private static List<String> heads(String name, Measure.Kind kind) {
    return switch (kind) {
      case COLDEST -> List.of(name + ".temperature_C", name + ".margin_K");
      case F_RSI -> List.of(name, name + ".margin");
      default ->
          List.of(
              name + ".value_" + kind.unitInNames(),
              name + ".lower_" + kind.unitInNames(),
              name + ".upper_" + kind.unitInNames());
    };
  }

  private static List<String> cells(Measure measure, Measure.Kind kind) {
    if (measure == null) {
      return kind.greaterIsBetter() ? List.of("", "") : List.of("", "", "");
    }
    if (kind.greaterIsBetter()) {
      return List.of(number(measure.value()), number(measure.value() - measure.lower()));
    }
    return List.of(number(measure.value()), number(measure.lower()), number(measure.upper()));
  }

  static String number(double value) {
    return Double.isFinite(value) ? Double.toString(value) : "";
  }

  static void line(StringBuilder text, List<String> cells) {
    for (int i = 0; i < cells.size(); i++) {
      String cell = cells.get(i);
      boolean quoted = false;
      for (int at = 0; at < cell.length(); at++) {
        quoted |= ",\"\n\r".indexOf(cell.charAt(at)) >= 0;
      }
      text.append(i == 0 ? "" : ",");
      text.append(quoted ? '"' + cell.replace("\"", "\"\"") + '"' : cell);
    }
    text.append('\n');
  }
}
