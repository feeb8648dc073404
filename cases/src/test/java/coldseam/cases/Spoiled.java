package coldseam.cases;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/** Cases spoiled in one place each: one change of structure or of a value. */
final class Spoiled {
  private static final List<String> SCALARS =
      List.of(
          "",
          "~",
          "true",
          "nonsense",
          "-1",
          "0",
          "1e308",
          "-1e308",
          ".nan",
          "-.inf",
          "9^9^9",
          "1/0",
          "sqrt(-1)",
          "12 mm",
          "0.04 W/(m K)",
          "68 F",
          "R-13",
          "5 %",
          "((((",
          "1'-4 5/8\"",
          "tan(90)",
          "2,5",
          "0x10",
          "a b c",
          "1e-300",
          "ψ",
          "5/0 in",
          "3 km");

  private final Random random;
  private final List<String> texts = new ArrayList<>();

  private Spoiled(long seed) {
    this.random = new Random(seed);
  }

  /**
   * Spoils a case in every place in several ways.
   *
   * @param root the case
   * @param seed of the choice between ways
   * @param everyNth of all changes only each n-th is taken, beginning at a place the seed decides
   * @return texts, each with one change
   */
  static List<String> some(Node root, long seed, int everyNth) {
    List<String> all = all(root, seed);
    List<String> some = new ArrayList<>();
    for (int i = (int) (seed % everyNth); i < all.size(); i += everyNth) {
      some.add(all.get(i));
    }
    return some;
  }

  private static List<String> all(Node root, long seed) {
    Spoiled spoiled = new Spoiled(seed);
    spoiled.spoil(
        root,
        new Rebuild() {
          @Override
          public Node with(Node changed) {
            return changed;
          }
        });
    return spoiled.texts;
  }

  /** Puts a changed node back into the whole. */
  private interface Rebuild {
    Node with(Node changed);
  }

  private void add(Rebuild whole, Node changed) {
    texts.add(Yaml.written(whole.with(changed)));
  }

  private void spoil(Node node, Rebuild whole) {
    add(whole, scalar(SCALARS.get(random.nextInt(SCALARS.size()))));
    switch (random.nextInt(3)) {
      case 0 -> add(whole, new Node.Sequence(List.of(node), 1, 1));
      case 1 -> add(whole, new Node.Sequence(List.of(), 1, 1));
      default -> add(whole, new Node.Mapping(List.of(new Node.Entry(scalar("x"), node)), 1, 1));
    }
    if (node instanceof Node.Scalar) {
      for (int i = 0; i < 3; i++) {
        add(whole, scalar(SCALARS.get(random.nextInt(SCALARS.size()))));
      }
    } else if (node instanceof Node.Sequence sequence) {
      spoilItems(sequence, whole);
    } else if (node instanceof Node.Mapping mapping) {
      spoilEntries(mapping, whole);
    }
  }

  private void spoilItems(Node.Sequence sequence, Rebuild whole) {
    for (int i = 0; i < sequence.items().size(); i++) {
      int at = i;
      List<Node> without = new ArrayList<>(sequence.items());
      Node item = without.remove(at);
      add(whole, new Node.Sequence(without, 1, 1));
      List<Node> twice = new ArrayList<>(sequence.items());
      twice.add(at, item);
      add(whole, new Node.Sequence(twice, 1, 1));
      spoil(
          item,
          changed -> {
            List<Node> items = new ArrayList<>(sequence.items());
            items.set(at, changed);
            return whole.with(new Node.Sequence(items, 1, 1));
          });
    }
  }

  private void spoilEntries(Node.Mapping mapping, Rebuild whole) {
    for (int i = 0; i < mapping.entries().size(); i++) {
      int at = i;
      Node.Entry entry = mapping.entries().get(at);
      List<Node.Entry> without = new ArrayList<>(mapping.entries());
      without.remove(at);
      add(whole, new Node.Mapping(without, 1, 1));
      List<Node.Entry> twice = new ArrayList<>(mapping.entries());
      twice.add(entry);
      add(whole, new Node.Mapping(twice, 1, 1));
      List<Node.Entry> renamed = new ArrayList<>(mapping.entries());
      renamed.set(at, new Node.Entry(scalar(misspelt(entry.key().text())), entry.value()));
      add(whole, new Node.Mapping(renamed, 1, 1));
      spoil(
          entry.value(),
          changed -> {
            List<Node.Entry> entries = new ArrayList<>(mapping.entries());
            entries.set(at, new Node.Entry(entry.key(), changed));
            return whole.with(new Node.Mapping(entries, 1, 1));
          });
    }
  }

  private String misspelt(String key) {
    int at = random.nextInt(key.length());
    return switch (random.nextInt(3)) {
      case 0 -> key.substring(0, at) + key.substring(at + 1);
      case 1 -> key.substring(0, at) + "q" + key.substring(at);
      default -> key + " " + key;
    };
  }

  private static Node.Scalar scalar(String text) {
    return new Node.Scalar(text, Node.Style.PLAIN, 1, 1);
  }
}
