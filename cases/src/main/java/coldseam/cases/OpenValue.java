package coldseam.cases;

import coldseam.solver.detail.Bracket;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** What stands at one place of an {@link OpenFile}: a text, a list or a mapping. */
public final class OpenValue {
  private final Pass pass;
  private final Node node;

  /**
   * A name of the user's own and what it means.
   *
   * @param name the name
   * @param key where the name stands
   * @param value what it means
   */
  public record Named(String name, OpenValue key, OpenValue value) {}

  OpenValue(Pass pass, Node node) {
    this.pass = pass;
    this.node = node;
  }

  /** Whether it is a mapping. */
  public boolean mapping() {
    return node instanceof Node.Mapping;
  }

  /** Whether it is a list. */
  public boolean list() {
    return node instanceof Node.Sequence;
  }

  /** What stands here, in words for a message. */
  public String described() {
    return Node.describe(node);
  }

  /**
   * Opens a mapping.
   *
   * @param what how messages call it
   * @param known the keys it may have
   * @return its keys; none if it is no mapping, which was reported
   */
  public OpenKeys keys(String what, List<String> known) {
    return new OpenKeys(pass, new Fields(pass.problems(), what, node, known));
  }

  /**
   * Opens a mapping of names of the user's own.
   *
   * @param what how messages call it
   * @return names with what they mean; none if it is no mapping, which was reported
   */
  public List<Named> named(String what) {
    return wrapped(Fields.named(pass.problems(), what, node));
  }

  /**
   * Opens a mapping of names whose meanings have keys themselves; a forgotten name is reported.
   *
   * @param what how messages call it, in backticks
   * @param known the keys that each may have
   * @param one how messages call one of them
   * @param example a name for an example
   * @return names with what they mean
   */
  public List<Named> named(String what, List<String> known, String one, String example) {
    return wrapped(Fields.named(pass.problems(), what, node, known, one, example));
  }

  private List<Named> wrapped(List<Node.Entry> entries) {
    List<Named> all = new ArrayList<>();
    for (Node.Entry entry : entries) {
      all.add(
          new Named(
              entry.key().text().strip(),
              new OpenValue(pass, entry.key()),
              new OpenValue(pass, entry.value())));
    }
    return all;
  }

  /**
   * Opens a list.
   *
   * @param what how messages call it
   * @param right what would be right
   * @return its items; none if it is no list or empty, which was reported
   */
  public List<OpenValue> items(String what, String right) {
    if (!(node instanceof Node.Sequence list) || list.items().isEmpty()) {
      wrong(what + " is a list, not " + Quantities.counted(node), right);
      return List.of();
    }
    List<OpenValue> items = new ArrayList<>();
    for (Node item : list.items()) {
      items.add(new OpenValue(pass, item));
    }
    return items;
  }

  /**
   * A number.
   *
   * @param what how messages call it
   * @param place what may stand there
   * @return the number, NaN if a mistake was reported
   */
  public double number(String what, Place place) {
    return pass.quantities().read(node, what, place);
  }

  /**
   * A number, or {@code [lower, upper]}.
   *
   * @param what how messages call it
   * @param place what may stand there
   * @return both ends, or empty if a mistake was reported
   */
  public Optional<Bracket> bracket(String what, Place place) {
    if (!list()) {
      double one = number(what, place);
      return Double.isNaN(one) ? Optional.empty() : Optional.of(Bracket.of(one));
    }
    Optional<double[]> ends = pass.quantities().pair(node, what, place);
    if (ends.isPresent() && ends.get()[0] > ends.get()[1]) {
      wrong(what + " runs downwards", "write `[lower, upper]`");
      return Optional.empty();
    }
    return ends.map(pair -> new Bracket(pair[0], pair[1]));
  }

  /**
   * A text.
   *
   * @param what how messages call it
   * @return the text without white space around it, or empty if a mistake was reported
   */
  public Optional<String> text(String what) {
    return Fields.text(pass.problems(), what, node);
  }

  /**
   * Reports a mistake here.
   *
   * @param wrong what is wrong
   * @param right what would be right
   */
  public void wrong(String wrong, String right) {
    pass.problems().add(node, wrong, right);
  }

  /**
   * A mistake here that shows only later, when cases are solved.
   *
   * @param wrong what is wrong
   * @param right what would be right
   * @return it
   */
  public CaseException mistake(String wrong, String right) {
    return new CaseException(
        List.of(
            new Problem(
                pass.file().toString(), node.line(), node.column(), wrong, Optional.of(right))));
  }
}
