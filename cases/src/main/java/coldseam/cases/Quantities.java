package coldseam.cases;

import coldseam.mesh.plane.Point;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Reads the numbers of a case into SI, °C and degrees, and checks that each may stand there. */
final class Quantities {
  private final Problems problems;
  private final NamedValues values;
  private final LengthUnit unit;

  Quantities(Problems problems, NamedValues values, LengthUnit unit) {
    this.problems = problems;
    this.values = values;
    this.unit = unit;
  }

  LengthUnit unit() {
    return unit;
  }

  /** Whether a text is the name of a value. */
  boolean named(String text) {
    return values.has(text);
  }

  /**
   * Reads a number in the unit of its place or in a unit written out.
   *
   * @param node where it stands
   * @param what how messages call it, e.g. "`thickness`"
   * @param place what may stand there
   * @return the number in SI, °C or degrees; NaN if a mistake was reported
   */
  double read(Node node, String what, Place place) {
    Value value = values.evaluated(node, what);
    if (value.unknown()) {
      return Double.NaN;
    }
    if (!place.takes(value.dimension())) {
      String given = value.dimension().inWords();
      problems.add(node, what + " cannot be " + given, "it is " + place.wanted());
      return Double.NaN;
    }
    double number = value.number();
    if (value.dimension().bare() && place.dimension().same(Dimension.LENGTH)) {
      number *= unit.metres();
    }
    return inRange(node, what, place, number);
  }

  private double inRange(Node node, String what, Place place, double number) {
    if (!(number >= place.least() && number <= place.most())) {
      String is = number < 0 && place.least() >= 0 ? " is negative: " : " is out of range: ";
      problems.add(node, what + is + typed(node, number, place), "it is " + place.wanted());
      return Double.NaN;
    }
    if (place == Place.COUNT && number != Math.rint(number)) {
      problems.add(
          node, what + " is not whole: " + typed(node, number, place), "it is " + place.wanted());
      return Double.NaN;
    }
    return number;
  }

  /** What was typed, with what it comes to if it is an expression. */
  private String typed(Node node, double number, Place place) {
    String text = node instanceof Node.Scalar scalar ? scalar.text().strip() : "";
    if (!calculated(text)) {
      return text;
    }
    boolean length = place.dimension().same(Dimension.LENGTH);
    double shown = length ? number / unit.metres() : number;
    String in = length ? unit.name() : place.unit();
    return "`"
        + Node.shortened(text)
        + "` comes to "
        + Figures.of(shown)
        + (in.isEmpty() ? "" : " " + in);
  }

  /** Whether a text is more than a number with its unit. */
  private boolean calculated(String text) {
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      boolean sign = c == '-' && i > 0 && text.charAt(i - 1) != 'R';
      if (c == '+' || c == '*' || c == '^' || c == '(' || sign) {
        return true;
      }
      if (Character.isLetter(c) && values.named(text, i)) {
        return true;
      }
    }
    return false;
  }

  /**
   * Reads a number whose dimension decides what it means.
   *
   * @param node where it stands
   * @param what how messages call it
   * @return the value, {@link Value#UNKNOWN} if a mistake was reported
   */
  Value value(Node node, String what) {
    return values.evaluated(node, what);
  }

  /**
   * Reads {@code [x, y]}.
   *
   * @param node where it stands
   * @param what how messages call it
   * @return the point, or empty if a mistake was reported
   */
  Optional<Point> point(Node node, String what) {
    Optional<double[]> pair = pair(node, what, Place.COORDINATE);
    return pair.isEmpty() ? Optional.empty() : Optional.of(new Point(pair.get()[0], pair.get()[1]));
  }

  /**
   * Reads two numbers of one kind.
   *
   * @param node where they stand
   * @param what how messages call them
   * @param place what may stand there
   * @return the two, or empty if a mistake was reported
   */
  Optional<double[]> pair(Node node, String what, Place place) {
    if (!(node instanceof Node.Sequence sequence) || sequence.items().size() != 2) {
      problems.add(
          node, what + " is two numbers, not " + counted(node), "write `[x, y]`, e.g. `[0, 240]`");
      return Optional.empty();
    }
    double x = read(sequence.items().get(0), what + ", first number", place);
    double y = read(sequence.items().get(1), what + ", second number", place);
    return Double.isNaN(x) || Double.isNaN(y) ? Optional.empty() : Optional.of(new double[] {x, y});
  }

  /**
   * Reads {@code [[x, y], …]}; a point that equals the one before it is left out.
   *
   * @param node where it stands
   * @param what how messages call it
   * @param least how many points at least
   * @return the points, or empty if a mistake was reported
   */
  Optional<List<Point>> line(Node node, String what, int least) {
    if (!(node instanceof Node.Sequence sequence)) {
      problems.add(
          node,
          what + " is a list of points, not " + Node.describe(node),
          "write `[[x, y], [x, y], …]`");
      return Optional.empty();
    }
    List<Point> points = new ArrayList<>();
    boolean good = true;
    for (int i = 0; i < sequence.items().size(); i++) {
      Optional<Point> point = point(sequence.items().get(i), what + ", point " + (i + 1));
      good &= point.isPresent();
      boolean repeated =
          point.isPresent()
              && !points.isEmpty()
              && Outlines.same(points.get(points.size() - 1), point.get());
      if (point.isPresent() && !repeated) {
        points.add(point.get());
      }
    }
    if (good && points.size() < least) {
      problems.add(
          node,
          what + " has " + points.size() + (points.size() == 1 ? " point" : " different points"),
          "it needs " + least + " or more");
      return Optional.empty();
    }
    return good ? Optional.of(points) : Optional.empty();
  }

  static String counted(Node node) {
    if (node instanceof Node.Sequence sequence) {
      return "a list of " + sequence.items().size();
    }
    return Node.describe(node);
  }
}
