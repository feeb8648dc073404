package coldseam.cases;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.regex.Pattern;

/** Trees written as text again, and as the schema sees them. */
final class Yaml {
  private static final Pattern WORD =
      Pattern.compile("[\\p{L}\\p{N}_.+*/()%^-]+( [\\p{L}\\p{N}_.+*/()%^-]+)*");
  private static final Pattern INTEGER = Pattern.compile("[-+]?[0-9]+");
  private static final Pattern FLOAT =
      Pattern.compile("[-+]?(\\.[0-9]+|[0-9]+(\\.[0-9]*)?)([eE][-+]?[0-9]+)?");

  private Yaml() {}

  /** A tree in flow style, every value in a line of its own. */
  static String written(Node node) {
    StringBuilder out = new StringBuilder();
    write(node, out);
    return out.append('\n').toString();
  }

  private static void write(Node node, StringBuilder out) {
    if (node instanceof Node.Scalar scalar) {
      out.append(quoted(scalar));
    } else if (node instanceof Node.Sequence sequence) {
      out.append("[");
      for (Node item : sequence.items()) {
        write(item, out);
        out.append(",\n ");
      }
      out.append("]");
    } else if (node instanceof Node.Mapping mapping) {
      out.append("{");
      for (Node.Entry entry : mapping.entries()) {
        write(entry.key(), out);
        out.append(": ");
        write(entry.value(), out);
        out.append(",\n ");
      }
      out.append("}");
    }
  }

  private static String quoted(Node.Scalar scalar) {
    boolean plain = scalar.style() == Node.Style.PLAIN;
    if (plain
        && (scalar.empty() || WORD.matcher(scalar.text()).matches())
        && !scalar.text().startsWith("%")) {
      return scalar.text().isEmpty() || scalar.text().startsWith("-") && scalar.text().length() == 1
          ? "~"
          : scalar.text();
    }
    return "\""
        + scalar.text().replace("\\", "\\\\").replace("\"", "\\\"").replace("\n", "\\n")
        + "\"";
  }

  /** A tree by the core schema of YAML 1.2. */
  static JsonNode json(Node node) {
    JsonNodeFactory make = JsonNodeFactory.instance;
    if (node instanceof Node.Sequence sequence) {
      ArrayNode array = make.arrayNode();
      sequence.items().forEach(item -> array.add(json(item)));
      return array;
    }
    if (node instanceof Node.Mapping mapping) {
      ObjectNode object = make.objectNode();
      mapping.entries().forEach(e -> object.set(e.key().text(), json(e.value())));
      return object;
    }
    Node.Scalar scalar = (Node.Scalar) node;
    String text = scalar.text();
    if (scalar.style() != Node.Style.PLAIN) {
      return make.textNode(text);
    }
    if (scalar.empty()) {
      return make.nullNode();
    }
    if (text.equalsIgnoreCase("true") || text.equalsIgnoreCase("false")) {
      return make.booleanNode(Boolean.parseBoolean(text));
    }
    if (INTEGER.matcher(text).matches() && text.length() < 18) {
      return make.numberNode(Long.parseLong(text));
    }
    if (FLOAT.matcher(text).matches()) {
      double number = Double.parseDouble(text);
      return number == Math.rint(number) && Math.abs(number) < 1e15
          ? make.numberNode((long) number)
          : make.numberNode(number);
    }
    // JSON has no infinity and no NaN; the reader must refuse both.
    return make.textNode(text);
  }
}
