package coldseam.cases.library;

import coldseam.cases.words.Spelling;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;

/** The material library. */
public final class Library {
  private Library() {}

  /** The table, read when first asked for. */
  private static final class Table {
    private static final String RESOURCE = "materials.tsv";
    private static final int FIELDS = 12;
    private static final List<Entry> ENTRIES = List.copyOf(read());
    private static final Map<String, Entry> BY_NAME = byName();

    private Table() {}

    private static List<Entry> read() {
      String text;
      try (InputStream in = Library.class.getResourceAsStream(RESOURCE)) {
        text = new String(in.readAllBytes(), StandardCharsets.UTF_8);
      } catch (IOException e) {
        throw new UncheckedIOException(e);
      }
      List<Entry> entries = new ArrayList<>();
      int from = 0;
      while (from < text.length()) {
        int end = text.indexOf('\n', from);
        end = end < 0 ? text.length() : end;
        if (end > from && text.charAt(from) != '#') {
          entries.add(entry(split(text.substring(from, end), '\t')));
        }
        from = end + 1;
      }
      entries.sort((a, b) -> a.name().compareToIgnoreCase(b.name()));
      return entries;
    }

    private static Entry entry(List<String> fields) {
      if (fields.size() != FIELDS) {
        throw new IllegalStateException("a line of " + RESOURCE + " has not twelve fields");
      }
      return new Entry(
          fields.get(0),
          fields.get(1).isEmpty() ? List.of() : split(fields.get(1), '|'),
          Double.parseDouble(fields.get(2)),
          number(fields.get(3)),
          number(fields.get(4)),
          number(fields.get(5)),
          number(fields.get(6)),
          new Entry.Conversion(number(fields.get(7)), number(fields.get(8)), number(fields.get(9))),
          fields.get(10),
          fields.get(11));
    }

    private static OptionalDouble number(String field) {
      if (field.isEmpty()) {
        return OptionalDouble.empty();
      }
      return OptionalDouble.of(
          field.equals("inf") ? Double.POSITIVE_INFINITY : Double.parseDouble(field));
    }

    private static List<String> split(String line, char at) {
      List<String> parts = new ArrayList<>();
      int from = 0;
      for (int i = line.indexOf(at); i >= 0; i = line.indexOf(at, from)) {
        parts.add(line.substring(from, i));
        from = i + 1;
      }
      parts.add(line.substring(from));
      return parts;
    }

    private static Map<String, Entry> byName() {
      Map<String, Entry> map = new HashMap<>();
      for (Entry entry : ENTRIES) {
        map.putIfAbsent(folded(entry.name()), entry);
      }
      for (Entry entry : ENTRIES) {
        for (String other : entry.otherNames()) {
          map.putIfAbsent(folded(other), entry);
        }
      }
      return map;
    }
  }

  /** Lower case, letters, digits, points and percent signs only. */
  private static String folded(String name) {
    StringBuilder out = new StringBuilder(name.length());
    for (int i = 0; i < name.length(); i++) {
      char c = name.charAt(i);
      if (Character.isLetterOrDigit(c) || c == '.' || c == '%') {
        out.append(Character.toLowerCase(c));
      }
    }
    return out.toString();
  }

  /** Every entry, by name. */
  public static List<Entry> all() {
    return Table.ENTRIES;
  }

  /**
   * Finds an entry by its name or one of its other names, ignoring case, white space and
   * punctuation.
   *
   * @param name the name
   * @return the entry
   */
  public static Optional<Entry> find(String name) {
    return Optional.ofNullable(Table.BY_NAME.get(folded(name)));
  }

  /**
   * Entries in whose names every word occurs.
   *
   * @param words words in any order
   * @return matches, by name
   */
  public static List<Entry> search(List<String> words) {
    List<Entry> matches = new ArrayList<>();
    for (Entry entry : all()) {
      StringBuilder names = new StringBuilder(folded(entry.name()));
      for (String other : entry.otherNames()) {
        names.append('|').append(folded(other));
      }
      boolean every = true;
      for (String word : words) {
        every &= names.indexOf(folded(word)) >= 0;
      }
      if (every) {
        matches.add(entry);
      }
    }
    return matches;
  }

  /**
   * The names most like a misspelt one.
   *
   * @param name the name
   * @return up to three, best first
   */
  public static List<String> nearest(String name) {
    Set<String> names = new LinkedHashSet<>();
    for (Entry entry : all()) {
      names.add(entry.name());
    }
    for (Entry entry : all()) {
      names.addAll(entry.otherNames());
    }
    return Spelling.nearest(name, names, 3);
  }
}
