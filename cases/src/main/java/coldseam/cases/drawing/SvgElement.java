package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * One element of an SVG document.
 *
 * @param name without its prefix; empty if it is of another vocabulary than SVG
 * @param attributes by name without prefix, but {@code inkscape:label} and the like with theirs
 * @param text the text directly in it, of style sheets only
 * @param children in order
 * @param line where its tag ends in the file
 */
record SvgElement(
    String name,
    Map<String, String> attributes,
    StringBuilder text,
    List<SvgElement> children,
    int line) {
  SvgElement(String name, Map<String, String> attributes, int line) {
    this(name, Map.copyOf(attributes), new StringBuilder(), new ArrayList<>(), line);
  }

  String attribute(String key) {
    return attributes.getOrDefault(key, "");
  }

  boolean has(String key) {
    return attributes.containsKey(key);
  }
}
