package coldseam.cli.sheet;

import coldseam.cases.study.Alternative;
import coldseam.cases.study.Comparison;
import coldseam.cases.study.Measure;
import coldseam.cases.study.Measure.Knowledge;
import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Table;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** A comparison as one table: for the terminal, as comma-separated values, and as JSON lines. */
public final class ComparisonSheet {
  private static final int PAGE = 92;
  private static final int MOST_DECIMALS = 6;

  /** Alternatives that stand beside each other on a terminal. */
  private static final int BESIDE = 3;

  private final Comparison comparison;
  private final List<String> files;

  /**
   * A sheet.
   *
   * @param comparison what is compared
   * @param files the case file of each alternative as the reader would name it
   */
  public ComparisonSheet(Comparison comparison, List<String> files) {
    this.comparison = comparison;
    this.files = List.copyOf(files);
  }

  /** A for the first alternative, B for the second, AA after Z. */
  public static String letter(int alternative) {
    String last = Character.toString('A' + alternative % 26);
    return alternative < 26 ? last : letter(alternative / 26 - 1) + last;
  }

  private Alternative alternative(int i) {
    return comparison.alternatives().get(i);
  }

  private List<String> differences(int i) {
    return alternative(i).differences(alternative(0));
  }

  /**
   * For the terminal.
   *
   * @param ink colours, or none
   * @return lines, each ended by a line feed
   */
  public String text(Ink ink) {
    int count = comparison.alternatives().size();
    Table names = new Table("lll", 2, PAGE);
    for (int i = 0; i < count; i++) {
      String differs = i == 0 ? "" : String.join("; ", differences(i));
      Optional<String> cost = alternative(i).cost();
      String said =
          differs
              + (differs.isEmpty() || cost.isEmpty() ? "" : "; ")
              + cost.map(typed -> "cost: " + typed).orElse("");
      names.row(ink.strong(letter(i)), alternative(i).name(), ink.faint(said));
    }
    StringBuilder text = new StringBuilder(names.text());
    for (int from = 0; from < count; from += BESIDE) {
      text.append('\n').append(block(from, Math.min(count, from + BESIDE), ink));
    }
    text.append('\n');
    text.append("(1) is the best by that number.");
    for (String note : comparison.notes()) {
      text.append('\n').append(Table.wrapped(note, PAGE, "  "));
    }
    return text.append('\n').append(ink.faint(Sheet.safety())).append('\n').toString();
  }

  private String block(int from, int to, Ink ink) {
    Table table = new Table("l" + "rl".repeat(to - from) + "l", 2, PAGE);
    List<String> head = new ArrayList<>(List.of(""));
    for (int i = from; i < to; i++) {
      head.add(ink.strong(letter(i)));
      head.add("");
    }
    table.row(head.toArray(new String[0]));
    for (Comparison.Row row : comparison.rows()) {
      List<String> cells = new ArrayList<>(List.of(name(row)));
      for (int i = from; i < to; i++) {
        cells.add(figure(row.measures().get(i)));
        cells.add(place(row.places().get(i), ink));
      }
      cells.add(ink.faint(row.kind().unit()));
      table.row(cells.toArray(new String[0]));
    }
    return table.text();
  }

  private static String name(Comparison.Row row) {
    return row.kind().symbol()
        + " "
        + row.of()
        + (row.kind().greaterIsBetter() ? " (estimate)" : "");
  }

  private static String figure(Optional<Measure> measure) {
    if (measure.isEmpty()) {
      return "–";
    }
    Measure m = measure.get();
    return m.knowledge() == Knowledge.OPEN
        ? "not certified"
        : Digits.between(m.value(), m.lower(), m.upper(), MOST_DECIMALS).text();
  }

  private static String place(Optional<Comparison.Place> place, Ink ink) {
    if (place.isEmpty()) {
      return "";
    }
    String text = "(" + place.get().rank() + (place.get().tied() ? "=)" : ")");
    return place.get().rank() == 1 ? ink.good(text) : text;
  }

  /**
   * The lines that stand under an alternative in the figure.
   *
   * @param i its index
   * @return one for each number, what it costs last
   */
  public List<String> lines(int i) {
    List<String> lines = new ArrayList<>();
    for (Comparison.Row row : comparison.rows()) {
      if (row.measures().get(i).isPresent()) {
        String unit = row.kind().unit().isEmpty() ? "" : "\u00a0" + row.kind().unit();
        String place = place(row.places().get(i), Ink.NONE);
        lines.add(
            row.kind().symbol()
                + " "
                + row.of()
                + " "
                + StudyTable.cell(row.measures().get(i).get())
                + unit
                + (place.isEmpty() ? "" : "\u00a0" + place));
      }
    }
    alternative(i).cost().ifPresent(cost -> lines.add("cost: " + cost));
    return lines;
  }

  /** As comma-separated values (RFC 4180): a heading, then one row an alternative and number. */
  public String csv() {
    StringBuilder text = new StringBuilder();
    text.append(
        "alternative,name,file,variant,differs,cost,quantity,of,unit,value,lower,upper,"
            + "certified,rank,tied\n");
    for (int i = 0; i < comparison.alternatives().size(); i++) {
      for (Comparison.Row row : comparison.rows()) {
        if (row.measures().get(i).isPresent()) {
          csv(text, i, row);
        }
      }
    }
    return text.toString();
  }

  private void csv(StringBuilder text, int i, Comparison.Row row) {
    Measure measure = row.measures().get(i).get();
    Optional<Comparison.Place> place = row.places().get(i);
    StudyTable.line(
        text,
        List.of(
            letter(i),
            alternative(i).name(),
            files.get(i),
            alternative(i).variant().orElse(""),
            String.join("; ", differences(i)),
            alternative(i).cost().orElse(""),
            row.kind().word(),
            row.of(),
            row.kind().unitInNames(),
            StudyTable.number(measure.value()),
            StudyTable.number(measure.lower()),
            StudyTable.number(measure.upper()),
            Boolean.toString(measure.knowledge() == Knowledge.CERTIFIED),
            place.map(p -> Integer.toString(p.rank())).orElse(""),
            place.map(p -> Boolean.toString(p.tied())).orElse("")));
  }

  /**
   * As data.
   *
   * @param version of the program
   * @return one JSON object a line, one an alternative, the last line with the notes
   */
  public List<String> json(String version) {
    List<String> lines = new ArrayList<>();
    for (int i = 0; i < comparison.alternatives().size(); i++) {
      lines.add(json(i, version));
    }
    Json json = Json.onOneLine().object().member("coldseam", version);
    json.member("alternatives", comparison.alternatives().size());
    lines.add(json.member("notes", comparison.notes()).endObject().text());
    return lines;
  }

  private String json(int i, String version) {
    Alternative alternative = alternative(i);
    Json json = Json.onOneLine().object().member("coldseam", version);
    json.member("alternative", letter(i)).member("name", alternative.name());
    json.member("case", alternative.from().title()).member("file", files.get(i));
    optional(json, "variant", alternative.variant());
    json.member("differs", differences(i));
    optional(json, "cost", alternative.cost());
    json.array("numbers");
    for (Comparison.Row row : comparison.rows()) {
      if (row.measures().get(i).isPresent()) {
        number(json, row, i);
      }
    }
    return json.endArray().endObject().text();
  }

  private static void number(Json json, Comparison.Row row, int i) {
    Measure measure = row.measures().get(i).get();
    json.object()
        .member("quantity", row.kind().word())
        .member("of", row.of())
        .member("unit", row.kind().unitInNames())
        .member("value", measure.value())
        .member("lower", measure.lower())
        .member("upper", measure.upper())
        .member("certified", measure.knowledge() == Knowledge.CERTIFIED);
    if (row.places().get(i).isPresent()) {
      json.member("rank", row.places().get(i).get().rank());
      json.member("tied", row.places().get(i).get().tied());
    } else {
      json.nothing("rank");
    }
    json.endObject();
  }

  private static void optional(Json json, String name, Optional<String> value) {
    if (value.isPresent()) {
      json.member(name, value.get());
    } else {
      json.nothing(name);
    }
  }
}
