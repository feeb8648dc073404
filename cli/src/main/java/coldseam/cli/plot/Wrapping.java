package coldseam.cli.plot;

import java.util.ArrayList;
import java.util.List;

/** Breaks text into lines between words, or within a word that is too long for a line. */
final class Wrapping {
  private Wrapping() {}

  static List<String> of(String text, double width, Lettering lettering) {
    List<String> lines = new ArrayList<>();
    StringBuilder line = new StringBuilder();
    for (String word : text.split(" ")) {
      String rest = word;
      String joined = line.isEmpty() ? rest : line + " " + rest;
      if (TextWidths.of(joined, lettering) <= width) {
        line.setLength(0);
        line.append(joined);
        continue;
      }
      if (!line.isEmpty()) {
        lines.add(line.toString());
      }
      int fit = fitting(rest, width, lettering);
      while (fit < rest.length()) {
        lines.add(rest.substring(0, fit));
        rest = rest.substring(fit);
        fit = fitting(rest, width, lettering);
      }
      line.setLength(0);
      line.append(rest);
    }
    lines.add(line.toString());
    return lines;
  }

  /** How many characters fit into a width, one at least. */
  private static int fitting(String word, double width, Lettering lettering) {
    int fit = word.length();
    while (fit > 1 && TextWidths.of(word.substring(0, fit), lettering) > width) {
      fit--;
    }
    return fit;
  }
}
