package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/** The rules of the style sheets in a document: by element, class and id. */
final class SvgStyles {
  /** What is read of all that styles can say. */
  private static final List<String> READ =
      List.of(
          "fill",
          "stroke",
          "display",
          "visibility",
          "opacity",
          "fill-opacity",
          "stroke-opacity",
          "fill-rule",
          "clip-path");

  private static final List<String> STYLED =
      List.of(
          "*",
          "svg",
          "g",
          "a",
          "use",
          "symbol",
          "path",
          "rect",
          "circle",
          "ellipse",
          "line",
          "polyline",
          "polygon");

  private static final String NOT_PLAIN = "only rules by element, class or id are read";

  /** By selector, each property with the value that counts. */
  private final Map<String, Map<String, Said>> rules = new HashMap<>();

  private final LeftOuts leftOut;
  private int order;

  /** A value, with how much it counts and when it was said. */
  private record Said(String value, int weight, int order) {}

  SvgStyles(LeftOuts leftOut) {
    this.leftOut = leftOut;
  }

  /** Takes in a style sheet. */
  void add(String sheet, int line) {
    String css = withoutComments(sheet);
    int at = 0;
    while (at < css.length()) {
      int brace = css.indexOf('{', at);
      int semicolon = css.indexOf(';', at);
      boolean statement =
          semicolon >= 0
              && (brace < 0 || semicolon < brace)
              && css.substring(at, semicolon).strip().startsWith("@");
      if (statement) {
        leftOut.add("a rule of a style sheet", "", "nothing is fetched", line);
        at = semicolon + 1;
        continue;
      }
      if (brace < 0) {
        return;
      }
      String selectors = css.substring(at, brace).strip();
      int end = css.indexOf('}', brace);
      end = end < 0 ? css.length() : end;
      if (selectors.startsWith("@")) {
        leftOut.add("a rule of a style sheet", "", NOT_PLAIN, line);
        end = pastBlock(css, brace);
      } else {
        Map<String, String> declarations = declarations(css.substring(brace + 1, end));
        for (String selector : selectors.split(",")) {
          rule(selector.strip(), declarations, line);
        }
      }
      at = end + 1;
    }
  }

  private static int pastBlock(String css, int brace) {
    int depth = 0;
    for (int i = brace; i < css.length(); i++) {
      depth += css.charAt(i) == '{' ? 1 : css.charAt(i) == '}' ? -1 : 0;
      if (depth == 0) {
        return i;
      }
    }
    return css.length();
  }

  private static String withoutComments(String css) {
    StringBuilder out = new StringBuilder();
    int at = 0;
    while (at < css.length()) {
      int begin = css.indexOf("/*", at);
      if (begin < 0) {
        return out.append(css, at, css.length()).toString();
      }
      out.append(css, at, begin);
      int end = css.indexOf("*/", begin + 2);
      at = end < 0 ? css.length() : end + 2;
    }
    return out.toString();
  }

  private void rule(String selector, Map<String, String> declarations, int line) {
    int mark = Math.max(selector.indexOf('.'), selector.indexOf('#'));
    String element = mark < 0 ? selector : selector.substring(0, mark);
    boolean plain = element.isEmpty() && mark >= 0 || STYLED.contains(element);
    for (int i = mark + 1; i < selector.length() && plain; i++) {
      char c = selector.charAt(i);
      plain = c == '-' || c == '_' || c == '*' || Character.isLetterOrDigit(c) || c > 127;
    }
    if (!plain) {
      leftOut.add("a rule of a style sheet", "", NOT_PLAIN, line);
      return;
    }
    int weight =
        (mark < 0 ? 0 : selector.charAt(mark) == '.' ? 10 : 100)
            + (element.isEmpty() || element.equals("*") ? 0 : 1);
    Map<String, Said> known = rules.computeIfAbsent(selector, k -> new HashMap<>());
    declarations.forEach((key, value) -> known.put(key, new Said(value, weight, order)));
    order++;
  }

  /** Splits {@code name: value; …}. */
  static Map<String, String> declarations(String text) {
    Map<String, String> found = new HashMap<>();
    for (String declaration : text.split(";")) {
      int colon = declaration.indexOf(':');
      if (colon > 0) {
        String value = declaration.substring(colon + 1).replace("!important", "").strip();
        String key = declaration.substring(0, colon).strip().toLowerCase(Locale.ROOT);
        if (READ.contains(key)) {
          found.put(key, value);
        }
      }
    }
    return found;
  }

  /** Everything said of an element itself: attributes, then rules, then its own style. */
  Map<String, String> of(SvgElement element) {
    Map<String, String> all = new HashMap<>();
    for (String key : READ) {
      if (element.has(key)) {
        all.put(key, element.attribute(key));
      }
    }
    Map<String, Said> said = new HashMap<>();
    for (String selector : selectors(element)) {
      rules
          .getOrDefault(selector, Map.of())
          .forEach((key, value) -> said.merge(key, value, SvgStyles::stronger));
    }
    said.forEach((key, value) -> all.put(key, value.value()));
    all.putAll(declarations(element.attribute("style")));
    return all;
  }

  private static Said stronger(Said a, Said b) {
    boolean first = a.weight() != b.weight() ? a.weight() > b.weight() : a.order() > b.order();
    return first ? a : b;
  }

  /** The selectors that may speak of an element. */
  private static List<String> selectors(SvgElement element) {
    List<String> selectors = new ArrayList<>(List.of("*", element.name()));
    List<String> marks = new ArrayList<>();
    for (String name : element.attribute("class").split("\\s+", 33)) {
      marks.add("." + name);
    }
    marks.add("#" + element.attribute("id"));
    for (String mark : marks) {
      if (mark.length() > 1) {
        selectors.addAll(List.of(mark, element.name() + mark, "*" + mark));
      }
    }
    return selectors;
  }
}
