package coldseam.cases.study;

import coldseam.cases.Case;
import coldseam.cases.words.Spelling;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * What one option {@code --set} varies.
 *
 * @param name of a named value, or of a fill or shape
 * @param fill whether it is a fill that is replaced
 * @param settings what it becomes, one after the other, as they would be written in the case
 * @param unit the unit written after every setting; empty if there is none or they differ
 */
public record Axis(String name, boolean fill, List<String> settings, String unit) {
  /** More steps along one axis are refused. */
  private static final int MOST_STEPS = 100_000;

  /** Digits of a step: enough for any length, few enough to hide binary fractions. */
  private static final MathContext DIGITS = new MathContext(12);

  /** Copies the list. */
  public Axis {
    settings = List.copyOf(settings);
  }

  /**
   * Reads {@code name=from..to/n} (n numbers, both ends included) or {@code name=A,B,C} (numbers,
   * expressions, or materials if the name is that of a fill or shape; a semicolon parts names that
   * have commas).
   *
   * @param typed as typed
   * @param from the case it is about
   * @param variant of it, empty for the base case
   * @return the axis
   * @throws StudyException if it cannot be understood or the case has no such value
   */
  public static Axis read(String typed, Case from, Optional<String> variant) throws StudyException {
    int equals = typed.indexOf('=');
    if (equals <= 0 || typed.substring(0, equals).isBlank()) {
      throw new StudyException(
          "\""
              + typed
              + "\" sets nothing; write NAME=FROM..TO/N, e.g. --set insulation=100..200/5");
    }
    String name = typed.substring(0, equals).strip();
    String right = typed.substring(equals + 1).strip();
    Set<String> values = from.values(variant).keySet();
    if (right.contains("..")) {
      requireValue(name, values);
      return steps(name, right);
    }
    return list(name, right, values);
  }

  static void requireValue(String name, Set<String> values) throws StudyException {
    if (values.contains(name)) {
      return;
    }
    String there =
        values.isEmpty()
            ? "give the case `values` that can be set"
            : Spelling.nearest(name, values)
                .map(near -> "did you mean \"" + near + "\"?")
                .orElse("there are " + String.join(", ", values));
    throw new StudyException("the case has no value \"" + name + "\" to set; " + there);
  }

  private static Axis steps(String name, String right) throws StudyException {
    int slash = right.lastIndexOf('/');
    int count = -1;
    if (slash >= 0) {
      try {
        count = Integer.parseInt(right.substring(slash + 1).strip());
      } catch (NumberFormatException e) {
        count = -1;
      }
    }
    if (count < 0) {
      throw new StudyException(
          "\""
              + right
              + "\" does not say how many; write "
              + name
              + "=FROM..TO/N, both ends counted");
    }
    if (count < 2 || count > MOST_STEPS) {
      throw new StudyException(
          "from one end to the other there are 2 to " + MOST_STEPS + " steps, not " + count);
    }
    Range range = Range.read(name, right.substring(0, slash));
    if (range.from().compareTo(range.to()) == 0) {
      throw new StudyException("\"" + right + "\" begins where it ends; give two different ends");
    }
    List<String> settings = new ArrayList<>();
    for (int i = 0; i < count; i++) {
      BigDecimal part =
          range
              .to()
              .subtract(range.from())
              .multiply(BigDecimal.valueOf(i))
              .divide(BigDecimal.valueOf(count - 1), DIGITS);
      settings.add(range.written(i == count - 1 ? range.to() : range.from().add(part, DIGITS)));
    }
    return new Axis(name, false, settings, range.unit());
  }

  private static Axis list(String name, String right, Set<String> values) throws StudyException {
    Set<String> settings = new LinkedHashSet<>();
    for (String part : right.split(right.contains(";") ? ";" : ",", -1)) {
      if (part.isBlank()) {
        throw new StudyException(
            "\""
                + name
                + "="
                + right
                + "\" has nothing where a setting is due; write "
                + name
                + "=A,B,C");
      }
      if (!settings.add(part.strip())) {
        throw new StudyException("\"" + part.strip() + "\" is listed twice for " + name);
      }
    }
    return new Axis(name, !values.contains(name), new ArrayList<>(settings), "");
  }

  /** Whether every setting is a number, in one unit. */
  public boolean numeric() {
    if (fill) {
      return false;
    }
    for (String setting : settings) {
      if (number(setting).isEmpty()) {
        return false;
      }
    }
    return true;
  }

  /**
   * The number that a setting is.
   *
   * @param setting one of {@link #settings}
   * @return the number without the unit, or empty if it is no number
   */
  public Optional<BigDecimal> number(String setting) {
    boolean suffixed = !unit.isEmpty() && setting.endsWith(" " + unit);
    String number = suffixed ? setting.substring(0, setting.length() - unit.length() - 1) : setting;
    return Range.number(number);
  }
}
