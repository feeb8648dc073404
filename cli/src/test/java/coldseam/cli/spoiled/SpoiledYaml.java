package coldseam.cli.spoiled;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.snakeyaml.engine.v2.api.DumpSettings;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Compose;
import org.snakeyaml.engine.v2.api.lowlevel.Present;
import org.snakeyaml.engine.v2.api.lowlevel.Serialize;
import org.snakeyaml.engine.v2.common.FlowStyle;
import org.snakeyaml.engine.v2.common.ScalarStyle;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.SequenceNode;
import org.snakeyaml.engine.v2.nodes.Tag;

/** A YAML text spoiled as a tree: values, keys and whole branches. */
final class SpoiledYaml {
  private final Random random;
  private final List<Node> nodes = new ArrayList<>();

  private SpoiledYaml(Random random) {
    this.random = random;
  }

  /**
   * Spoils a text in one to four places.
   *
   * @param text the text
   * @param other another text, which branches are taken from
   * @param random decides
   */
  static String of(String text, String other, Random random) {
    Node root = tree(text).orElseThrow();
    SpoiledYaml spoiled = new SpoiledYaml(random);
    int changes = 1 + (random.nextInt(3) == 0 ? random.nextInt(4) : 0);
    for (int i = 0; i < changes; i++) {
      spoiled.nodes.clear();
      spoiled.collect(root);
      List<Node> strange = new ArrayList<>();
      if (random.nextInt(4) == 0) {
        SpoiledYaml collector = new SpoiledYaml(random);
        tree(other).ifPresent(collector::collect);
        strange = collector.nodes;
      }
      spoiled.one(strange.isEmpty() ? spoiled.nodes : strange);
    }
    return written(root);
  }

  private static Optional<Node> tree(String text) {
    return new Compose(LoadSettings.builder().build()).composeString(text);
  }

  private static String written(Node root) {
    DumpSettings settings = DumpSettings.builder().setWidth(4000).build();
    return new Present(settings)
        .emitToString(new Serialize(settings).serializeOne(root).iterator());
  }

  private void collect(Node node) {
    nodes.add(node);
    if (node instanceof SequenceNode sequence) {
      sequence.getValue().forEach(this::collect);
    } else if (node instanceof MappingNode mapping) {
      for (NodeTuple tuple : mapping.getValue()) {
        collect(tuple.getValueNode());
      }
    }
  }

  /** Changes one list or mapping in one place. */
  private void one(List<Node> donors) {
    for (int tries = 0; tries < 100; tries++) {
      Node node = nodes.get(random.nextInt(nodes.size()));
      if (node instanceof SequenceNode sequence && !sequence.getValue().isEmpty()) {
        items(sequence, donors);
        return;
      }
      if (node instanceof MappingNode mapping && !mapping.getValue().isEmpty()) {
        entries(mapping, donors);
        return;
      }
    }
  }

  private void items(SequenceNode sequence, List<Node> donors) {
    List<Node> items = sequence.getValue();
    int at = random.nextInt(items.size());
    Node item = items.get(at);
    switch (random.nextInt(9)) {
      case 0 -> items.remove(at);
      case 1 -> items.add(random.nextInt(items.size() + 1), copy(item));
      case 2 -> items.set(at, items.set(random.nextInt(items.size()), item));
      case 3 -> {
        for (int i = random.nextInt(200); i >= 0 && items.size() < 2000; i--) {
          items.add(at, copy(item));
        }
      }
      default -> items.set(at, changed(item, donors));
    }
  }

  private void entries(MappingNode mapping, List<Node> donors) {
    List<NodeTuple> entries = mapping.getValue();
    int at = random.nextInt(entries.size());
    NodeTuple entry = entries.get(at);
    NodeTuple other = entries.get(random.nextInt(entries.size()));
    switch (random.nextInt(8)) {
      case 0 -> entries.remove(at);
      case 1 -> entries.add(random.nextInt(entries.size() + 1), entry);
      case 2 -> entries.set(at, new NodeTuple(renamed(entry.getKeyNode()), entry.getValueNode()));
      case 3 -> entries.set(at, new NodeTuple(entry.getKeyNode(), copy(other.getValueNode())));
      default ->
          entries.set(at, new NodeTuple(entry.getKeyNode(), changed(entry.getValueNode(), donors)));
    }
  }

  private Node renamed(Node key) {
    String text = key instanceof ScalarNode scalar ? scalar.getValue() : "x";
    if (text.isEmpty() || random.nextInt(4) == 0) {
      return scalar(Nonsense.word(random));
    }
    int at = random.nextInt(text.length());
    return switch (random.nextInt(3)) {
      case 0 -> scalar(text.substring(0, at) + text.substring(at + 1));
      case 1 -> scalar(text.substring(0, at) + "q" + text.substring(at));
      default -> scalar(text + " " + text);
    };
  }

  private Node changed(Node node, List<Node> donors) {
    switch (random.nextInt(12)) {
      case 0 -> {
        return list(new ArrayList<>(List.of(node)));
      }
      case 1 -> {
        return list(new ArrayList<>());
      }
      case 2 -> {
        Node deep = node;
        for (int i = random.nextInt(random.nextInt(5) == 0 ? 300 : 5); i >= 0; i--) {
          deep = list(new ArrayList<>(List.of(deep)));
        }
        return deep;
      }
      case 3, 4 -> {
        return copy(donors.get(random.nextInt(donors.size())));
      }
      default -> {
        return node instanceof ScalarNode scalar
            ? scalar(Nonsense.instead(random, scalar.getValue()))
            : inside(node);
      }
    }
  }

  /** Changes one value somewhere in a branch. */
  private Node inside(Node node) {
    Node copy = copy(node);
    SpoiledYaml branch = new SpoiledYaml(random);
    branch.collect(copy);
    branch.nodes.removeIf(n -> n instanceof ScalarNode);
    if (!branch.nodes.isEmpty()) {
      branch.one(branch.nodes);
    }
    return copy;
  }

  private static Node list(List<Node> items) {
    return new SequenceNode(Tag.SEQ, items, FlowStyle.FLOW);
  }

  private static Node scalar(String text) {
    return new ScalarNode(Tag.STR, text, ScalarStyle.PLAIN);
  }

  /** A branch without shared nodes, which would be written as aliases. */
  private static Node copy(Node node) {
    if (node instanceof SequenceNode sequence) {
      List<Node> items = new ArrayList<>();
      sequence.getValue().forEach(item -> items.add(copy(item)));
      return new SequenceNode(sequence.getTag(), items, sequence.getFlowStyle());
    }
    if (node instanceof MappingNode mapping) {
      List<NodeTuple> entries = new ArrayList<>();
      for (NodeTuple tuple : mapping.getValue()) {
        entries.add(new NodeTuple(copy(tuple.getKeyNode()), copy(tuple.getValueNode())));
      }
      return new MappingNode(mapping.getTag(), entries, mapping.getFlowStyle());
    }
    ScalarNode scalar = (ScalarNode) node;
    return new ScalarNode(scalar.getTag(), scalar.getValue(), scalar.getScalarStyle());
  }
}
