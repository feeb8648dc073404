package coldseam.cases;

import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The named values of a case, worked out when first asked for. */
final class NamedValues implements Unit.Names {
  /** Longer chains of values and brackets are refused. */
  static final int LONGEST_CHAIN = 100;

  /** Names of more words are refused. */
  private static final int MOST_WORDS = 8;

  private final Problems problems;
  private final LengthUnit unit;
  private final Map<String, Node> written = new LinkedHashMap<>();
  private final Map<String, Value> known = new HashMap<>();
  private final List<String> open = new ArrayList<>();
  private int depth;

  NamedValues(Problems problems, LengthUnit unit) {
    this.problems = problems;
    this.unit = unit;
  }

  /** Adds a value, or replaces one of that name. */
  void put(String name, Node value) {
    written.put(name, value);
  }

  boolean has(String name) {
    return written.containsKey(name);
  }

  /**
   * The longest name of a value that stands at a place; names may be of several words.
   *
   * @param text an expression
   * @param at where a word begins
   * @return the name, or an empty text if none stands there
   */
  String longestAt(String text, int at) {
    String longest = "";
    int end = at;
    for (int words = 0; words < MOST_WORDS; words++) {
      end = wordEnd(text, end);
      String name = text.substring(at, end);
      if (has(name)) {
        longest = name;
      }
      if (end + 1 >= text.length()
          || text.charAt(end) != ' '
          || wordEnd(text, end + 1) == end + 1) {
        return longest;
      }
      end++;
    }
    return longest;
  }

  /** Whether the name of a value stands at a place. */
  @Override
  public boolean named(String text, int at) {
    return !longestAt(text, at).isEmpty();
  }

  /** Index behind the word that begins at an index. */
  static int wordEnd(String text, int from) {
    int end = from;
    while (end < text.length()
        && (Character.isLetterOrDigit(text.charAt(end)) || text.charAt(end) == '_')) {
      end++;
    }
    return end;
  }

  /** Whether a value can have a name: words of letters and digits with single spaces between. */
  static boolean canBeNamed(String name) {
    if (Expression.FUNCTIONS.contains(name)
        || name.isEmpty()
        || !(Character.isLetter(name.charAt(0)) || name.charAt(0) == '_')) {
      return false;
    }
    int end = -1;
    for (int words = 0; words < MOST_WORDS; words++) {
      int from = end + 1;
      end = wordEnd(name, from);
      if (end == from) {
        return false;
      }
      if (end == name.length()) {
        return true;
      }
      if (name.charAt(end) != ' ') {
        return false;
      }
    }
    return false;
  }

  /** What is written where a value is given its number; shortened where that is no number. */
  String written(String name) {
    return written.get(name) instanceof Node.Scalar scalar ? scalar.text().strip() : "";
  }

  Collection<String> names() {
    return written.keySet();
  }

  /** Works out every value, so that every mistake in one is reported. */
  void workOutAll() {
    for (String name : written.keySet()) {
      of(name);
    }
  }

  /**
   * The value of a name that {@link #has} knows.
   *
   * @param name the name
   * @return the value, {@link Value#UNKNOWN} if it has a mistake
   */
  Value of(String name) {
    Value value = known.get(name);
    if (value == null) {
      value = workedOut(name);
      known.put(name, value);
    }
    return value;
  }

  private Value workedOut(String name) {
    Node node = written.get(name);
    int first = open.indexOf(name);
    if (first >= 0) {
      StringBuilder circle = new StringBuilder();
      for (String link : open.subList(first, open.size())) {
        circle.append('`').append(link).append("` needs ");
      }
      problems.add(
          written.get(open.get(first)),
          "values refer to each other in a circle: " + circle + "`" + name + "`",
          "give one of them a number");
      return Value.UNKNOWN;
    }
    if (depth >= LONGEST_CHAIN) {
      problems.add(node, "values refer to each other over too many steps", "write them shorter");
      return Value.UNKNOWN;
    }
    open.add(name);
    depth++;
    Value value = evaluated(node, "value `" + name + "`");
    depth--;
    open.remove(open.size() - 1);
    return value;
  }

  /**
   * Evaluates a number or an expression.
   *
   * @param node where it stands
   * @param what how messages call it
   * @return the value, {@link Value#UNKNOWN} if it has a mistake, which has been reported
   */
  Value evaluated(Node node, String what) {
    if (!(node instanceof Node.Scalar scalar)) {
      problems.add(node, what + " is a number, not " + Node.describe(node), "write one number");
      return Value.UNKNOWN;
    }
    String text = scalar.text().strip();
    if (PlainNumber.is(text)) {
      double number = Double.parseDouble(text);
      return finite(scalar, what, Value.bare(number));
    }
    if (text.isEmpty()) {
      problems.add(node, what + " is a number, not nothing", "write one number");
      return Value.UNKNOWN;
    }
    int depthBefore = depth;
    try {
      return finite(scalar, what, new Expression(text, this, unit).value());
    } catch (Mistake mistake) {
      int column = scalar.column();
      if (scalar.style() != Node.Style.BLOCK) {
        int quote = scalar.style() == Node.Style.QUOTED ? 1 : 0;
        int blanks = scalar.text().indexOf(text);
        column += mistake.index() + quote + blanks;
      }
      problems.add(scalar.line(), column, what + ": " + mistake.getMessage(), mistake.right());
      return Value.UNKNOWN;
    } finally {
      depth = depthBefore;
    }
  }

  /**
   * Goes one step deeper into brackets or values.
   *
   * @param index where in the expression
   * @throws Mistake if that is too deep
   */
  void deeper(int index) throws Mistake {
    depth++;
    if (depth > LONGEST_CHAIN) {
      throw new Mistake("this is nested too deeply", "write it in several values", index);
    }
  }

  void shallower() {
    depth--;
  }

  private Value finite(Node.Scalar scalar, String what, Value value) {
    if (value.unknown() || !Double.isInfinite(value.number())) {
      return value;
    }
    problems.add(
        scalar, what + " is too large to be counted: " + Node.describe(scalar), "write a number");
    return Value.UNKNOWN;
  }
}
