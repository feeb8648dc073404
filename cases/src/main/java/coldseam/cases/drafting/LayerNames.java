package coldseam.cases.drafting;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** What names of layers say. */
final class LayerNames {
  /** Words that name a layer of drawing aids, not of things built. */
  private static final List<String> AIDS =
      List.of(
          "axis",
          "axes",
          "grid",
          "grids",
          "guide",
          "guides",
          "construction",
          "constr",
          "aux",
          "auxiliary",
          "dim",
          "dims",
          "dimension",
          "dimensions",
          "text",
          "texts",
          "label",
          "labels",
          "anno",
          "annotation",
          "annotations",
          "note",
          "notes",
          "title",
          "border",
          "frame of sheet",
          "viewport",
          "legend",
          "section mark",
          "symbol",
          "symbols",
          "furniture",
          "leader");

  private LayerNames() {}

  /** Words that say of a layer how it is drawn, not what is drawn. */
  private static final List<String> GENERAL =
      List.of(
          "",
          "0",
          "hatch",
          "hatches",
          "hatching",
          "pattern",
          "patterns",
          "fill",
          "fills",
          "layer",
          "solid",
          "poche",
          "section",
          "cut",
          "lines",
          "line",
          "outline",
          "default");

  /** Whether a name says nothing of what is drawn. */
  static boolean general(String layer) {
    for (String word : words(layer)) {
      boolean number = Character.isDigit(word.charAt(0));
      if (!GENERAL.contains(word) && !number) {
        return false;
      }
    }
    return true;
  }

  /** The words of a name, small. */
  static List<String> words(String name) {
    List<String> words = new ArrayList<>();
    StringBuilder word = new StringBuilder();
    char before = ' ';
    for (int i = 0; i < name.length(); i++) {
      char c = name.charAt(i);
      boolean hump = Character.isUpperCase(c) && Character.isLowerCase(before);
      boolean kind = Character.isLetter(c) != Character.isLetter(before);
      if (word.length() > 0 && (hump || kind || !Character.isLetterOrDigit(c))) {
        words.add(word.toString().toLowerCase(Locale.ROOT));
        word.setLength(0);
      }
      if (Character.isLetterOrDigit(c)) {
        word.append(c);
      }
      before = c;
    }
    if (word.length() > 0) {
      words.add(word.toString().toLowerCase(Locale.ROOT));
    }
    return words;
  }

  /** Whether a layer is one of drawing aids by its name. */
  static boolean aid(String layer) {
    for (String word : words(layer)) {
      if (AIDS.contains(word)) {
        return true;
      }
    }
    return false;
  }

  /** The space that a layer is by its name, or empty. */
  static String space(String layer) {
    return switch (layer.strip().toLowerCase(Locale.ROOT)) {
      case "indoors", "inside", "interior" -> "indoors";
      case "outdoors", "outside", "exterior" -> "outdoors";
      default -> "";
    };
  }
}
