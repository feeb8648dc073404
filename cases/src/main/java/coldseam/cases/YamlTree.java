package coldseam.cases;

import coldseam.cases.words.Invisible;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.Iterator;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Parse;
import org.snakeyaml.engine.v2.common.Anchor;
import org.snakeyaml.engine.v2.events.AliasEvent;
import org.snakeyaml.engine.v2.events.CollectionStartEvent;
import org.snakeyaml.engine.v2.events.Event;
import org.snakeyaml.engine.v2.events.NodeEvent;
import org.snakeyaml.engine.v2.events.ScalarEvent;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;

/**
 * Builds the tree of a YAML text from parse events, so that every node keeps its line and column,
 * and depth and size are bounded before anything is built.
 */
final class YamlTree {
  /** Deeper nesting than this is refused. */
  static final int DEEPEST = 40;

  /** More nodes than this, aliases counted as often as they are used, are refused. */
  static final int MOST_NODES = 400_000;

  private final Problems problems;
  private final Iterator<Event> events;
  private final Map<String, Node> anchors = new HashMap<>();
  private final Map<String, Integer> anchorSizes = new HashMap<>();
  private int nodes;

  private YamlTree(String text, Problems problems) {
    this.problems = problems;
    LoadSettings settings =
        LoadSettings.builder().setUseMarks(true).setCodePointLimit(FileText.MOST_BYTES).build();
    this.events = new Parse(settings).parseString(text).iterator();
  }

  /** Ends the reading; what is wrong has been reported. */
  private static final class Refused extends Exception {
    private static final long serialVersionUID = 1L;
  }

  /**
   * Reads a text.
   *
   * @param text the text
   * @param problems told what is wrong with it
   * @return the tree; empty if the text is not YAML, in which case that has been reported
   */
  static Optional<Node> read(String text, Problems problems) {
    Optional<Node> simple = SimpleYaml.read(text, DEEPEST, MOST_NODES);
    return simple.isPresent() ? simple : readByLibrary(text, problems);
  }

  /** The same for any YAML, slower to start. */
  static Optional<Node> readByLibrary(String text, Problems problems) {
    try {
      return Optional.of(new YamlTree(text, problems).document());
    } catch (Refused e) {
      return Optional.empty();
    } catch (MarkedYamlEngineException e) {
      Mark mark = e.getProblemMark().or(e::getContextMark).orElse(null);
      int line = mark == null ? 1 : mark.getLine() + 1;
      int column = mark == null ? 0 : mark.getColumn() + 1;
      problems.add(line, column, "this is not YAML: " + inWords(e.getProblem()), hint(e));
      return Optional.empty();
    } catch (YamlEngineException e) {
      problems.add(1, 0, "this is not YAML: " + inWords(e.getMessage()), "");
      return Optional.empty();
    }
  }

  private static String inWords(String problem) {
    return problem == null ? "it cannot be parsed" : Node.shortened(problem.strip());
  }

  private static String hint(MarkedYamlEngineException e) {
    String problem = e.getProblem() == null ? "" : e.getProblem();
    if (problem.contains("TAB") || problem.contains("\\t")) {
      return "indent with spaces, not tabs";
    }
    return "check indentation, brackets, quotes and the space after each colon";
  }

  private Node document() throws Refused {
    Event event = events.next();
    while (event.getEventId() != Event.ID.DocumentStart) {
      if (event.getEventId() == Event.ID.StreamEnd) {
        problems.add(1, 0, "this file has no content", "a case begins with `coldseam: 1`");
        throw new Refused();
      }
      event = events.next();
    }
    Node root = node(events.next(), 0);
    events.next();
    Event next = events.next();
    if (next.getEventId() != Event.ID.StreamEnd) {
      throw refuse(next, "a second document begins here", "a case is one document");
    }
    return root;
  }

  private Node node(Event event, int depth) throws Refused {
    if (depth > DEEPEST) {
      throw refuse(event, "this is nested too deeply", "at most " + DEEPEST + " levels are read");
    }
    count(event, 1);
    if (event instanceof AliasEvent alias) {
      return aliased(alias);
    }
    int before = nodes - 1;
    Node node;
    if (event instanceof ScalarEvent scalar) {
      if (scalar.getTag().isPresent()) {
        throw refuse(event, "tags such as `!!str` are not used here", "leave the tag away");
      }
      int invisible = Invisible.first(scalar.getValue());
      if (invisible >= 0) {
        String code = Integer.toHexString(0x10000 | scalar.getValue().charAt(invisible));
        throw refuse(
            event,
            "an invisible character stands here, U+" + code.substring(1).toUpperCase(Locale.ROOT),
            "leave it away");
      }
      node = scalar(scalar);
    } else {
      if (((CollectionStartEvent) event).getTag().isPresent()) {
        throw refuse(event, "tags such as `!!map` are not used here", "leave the tag away");
      }
      node =
          event.getEventId() == Event.ID.SequenceStart
              ? sequence(event, depth)
              : mapping(event, depth);
    }
    Optional<Anchor> anchor = ((NodeEvent) event).getAnchor();
    if (anchor.isPresent()) {
      anchors.put(anchor.get().getValue(), node);
      anchorSizes.put(anchor.get().getValue(), nodes - before);
    }
    return node;
  }

  private Node aliased(AliasEvent alias) throws Refused {
    String name = alias.getAlias().getValue();
    Node node = anchors.get(name);
    if (node == null) {
      throw refuse(
          alias,
          "`*" + Node.shortened(name) + "` refers to nothing written before it",
          "put `&" + Node.shortened(name) + "` before what is meant");
    }
    count(alias, anchorSizes.get(name));
    return node;
  }

  private Node sequence(Event start, int depth) throws Refused {
    List<Node> items = new ArrayList<>();
    for (Event e = events.next(); e.getEventId() != Event.ID.SequenceEnd; e = events.next()) {
      items.add(node(e, depth + 1));
    }
    return new Node.Sequence(List.copyOf(items), line(start), column(start));
  }

  private Node mapping(Event start, int depth) throws Refused {
    List<Node.Entry> entries = new ArrayList<>();
    for (Event e = events.next(); e.getEventId() != Event.ID.MappingEnd; e = events.next()) {
      if (!(node(e, depth + 1) instanceof Node.Scalar key)) {
        throw refuse(e, "a key must be a word", "write `key: value`");
      }
      entries.add(new Node.Entry(key, node(events.next(), depth + 1)));
    }
    return new Node.Mapping(List.copyOf(entries), line(start), column(start));
  }

  private static Node scalar(ScalarEvent event) {
    boolean oneLine =
        event.getStartMark().isPresent()
            && event.getEndMark().isPresent()
            && event.getStartMark().get().getLine() == event.getEndMark().get().getLine();
    Node.Style style =
        event.isPlain() ? Node.Style.PLAIN : oneLine ? Node.Style.QUOTED : Node.Style.BLOCK;
    return new Node.Scalar(event.getValue(), style, line(event), column(event));
  }

  private void count(Event event, int more) throws Refused {
    nodes += more;
    if (nodes > MOST_NODES) {
      throw refuse(event, "this file says too much", "at most " + MOST_NODES + " values are read");
    }
  }

  private Refused refuse(Event event, String wrong, String right) {
    problems.add(line(event), column(event), wrong, right);
    return new Refused();
  }

  private static int line(Event event) {
    return event.getStartMark().isPresent() ? event.getStartMark().get().getLine() + 1 : 1;
  }

  private static int column(Event event) {
    return event.getStartMark().isPresent() ? event.getStartMark().get().getColumn() + 1 : 1;
  }
}
