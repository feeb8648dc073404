package coldseam.cases.drawing;

import java.util.Locale;
import java.util.Map;

/**
 * What an element inherits and passes on.
 *
 * @param fill colour, pattern or {@code none}
 * @param stroke colour or {@code none}
 * @param evenOdd the rule that says what is inside
 * @param visible whether it is seen
 * @param layer the name of the layer it is on
 * @param fixed whether that name is of a layer that the editor calls so
 */
record SvgPaint(
    String fill, String stroke, boolean evenOdd, boolean visible, String layer, boolean fixed) {
  static final SvgPaint START = new SvgPaint("#000000", "none", false, true, "", false);

  /** The same with what an element says itself. */
  SvgPaint with(Map<String, String> says) {
    String rule = says.getOrDefault("fill-rule", "inherit");
    String seen = says.getOrDefault("visibility", "inherit");
    String ownFill = paint(says.getOrDefault("fill", "inherit"), fill);
    String ownStroke = paint(says.getOrDefault("stroke", "inherit"), stroke);
    return new SvgPaint(
        zero(says, "fill-opacity") ? "none" : ownFill,
        zero(says, "stroke-opacity") ? "none" : ownStroke,
        rule.equals("inherit") ? evenOdd : rule.equals("evenodd"),
        seen.equals("inherit") ? visible : seen.equals("visible"),
        layer,
        fixed);
  }

  SvgPaint on(String named, boolean editorLayer) {
    return new SvgPaint(fill, stroke, evenOdd, visible, named, editorLayer);
  }

  static boolean zero(Map<String, String> says, String key) {
    String value = says.getOrDefault(key, "");
    return value.equals("0") || value.equals("0.0") || value.equals("0%");
  }

  boolean filled() {
    return !fill.equals("none") && !fill.equals("transparent");
  }

  boolean stroked() {
    return !stroke.equals("none") && !stroke.equals("transparent");
  }

  private static String paint(String value, String inherited) {
    String v = value.strip();
    if (v.isEmpty() || v.equals("inherit")) {
      return inherited;
    }
    if (v.startsWith("url(")) {
      int from = v.indexOf('#');
      int to = v.indexOf(')');
      return from > 0 && to > from
          ? v.substring(from + 1, to).replace("\"", "").replace("'", "")
          : v;
    }
    String lower = v.toLowerCase(Locale.ROOT);
    if (lower.length() == 4 && lower.startsWith("#")) {
      StringBuilder full = new StringBuilder("#");
      for (int i = 1; i < 4; i++) {
        full.append(lower.charAt(i)).append(lower.charAt(i));
      }
      return full.toString();
    }
    return lower.startsWith("rgb(") ? hex(lower) : lower;
  }

  private static String hex(String rgb) {
    int end = rgb.indexOf(')');
    String[] parts = rgb.substring(4, end < 0 ? rgb.length() : end).split(",");
    if (parts.length != 3) {
      return rgb;
    }
    StringBuilder out = new StringBuilder("#");
    for (String part : parts) {
      try {
        String p = part.strip();
        double value =
            p.endsWith("%")
                ? Double.parseDouble(p.substring(0, p.length() - 1)) * 2.55
                : Double.parseDouble(p);
        int whole = (int) Math.max(0, Math.min(255, Math.round(value)));
        out.append(Character.forDigit(whole / 16, 16)).append(Character.forDigit(whole % 16, 16));
      } catch (NumberFormatException e) {
        return rgb;
      }
    }
    return out.toString();
  }
}
