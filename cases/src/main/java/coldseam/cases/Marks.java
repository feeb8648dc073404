package coldseam.cases;

import coldseam.cases.words.Undecided;
import java.util.Optional;

/** Reports what a drafted case leaves to be decided, and keeps its consequences quiet. */
final class Marks {
  private final Problems problems;

  private Marks(Problems problems) {
    this.problems = problems;
  }

  /** Reports every mark in a file. */
  static void report(Node root, Problems problems) {
    new Marks(problems).look(root, null);
  }

  private void look(Node node, Node.Scalar key) {
    if (node instanceof Node.Mapping mapping) {
      for (Node.Entry entry : mapping.entries()) {
        look(entry.value(), entry.key());
      }
    } else if (node instanceof Node.Sequence sequence) {
      for (Node item : sequence.items()) {
        look(item, key);
      }
    } else if (node instanceof Node.Scalar scalar) {
      Optional<String> hint = Undecided.hint(scalar.text());
      if (hint.isPresent()) {
        String called = key == null ? "this" : "`" + Node.shortened(key.text()) + "`";
        problems.undecided(scalar, called + " is still to be decided", hint.get());
      }
    }
  }
}
