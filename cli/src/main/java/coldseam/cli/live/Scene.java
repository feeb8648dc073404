package coldseam.cli.live;

import coldseam.cli.text.Json;
import java.util.List;
import java.util.Map;

/**
 * What the page shows at a time.
 *
 * @param state what came of the last save
 * @param title of the case, as far as it is known
 * @param file the case file as the user would name it
 * @param told how it went, in a few words
 * @param pictures SVG documents by name, in the order shown; none unless solved
 * @param card the result in words; empty unless solved
 * @param remarks sentences about the result that must not be missed
 * @param mistakes what is wrong; none if solved
 */
public record Scene(
    State state,
    String title,
    String file,
    String told,
    Map<String, String> pictures,
    String card,
    List<String> remarks,
    List<Mistake> mistakes) {
  /** What may have come of a save. */
  public enum State {
    /** It is being solved; the page goes on showing what it has. */
    SOLVING("solving"),
    /** It was solved. */
    SOLVED("solved"),
    /** The case is at fault, or the program is. */
    FAULTY("faulty");

    private final String word;

    State(String word) {
      this.word = word;
    }
  }

  /**
   * Something wrong.
   *
   * @param place file, line and column; empty if there is none
   * @param wrong what is wrong
   * @param right what would be right; empty if that cannot be said
   * @param line the line meant, as it stands in the file; empty if there is none
   */
  public record Mistake(String place, String wrong, String right, String line) {}

  /** Copies lists. */
  public Scene {
    remarks = List.copyOf(remarks);
    mistakes = List.copyOf(mistakes);
  }

  /** As data for the page, on one line. Pictures are named only. */
  String json(int number) {
    Json json =
        Json.onOneLine()
            .object()
            .member("number", number)
            .member("state", state.word)
            .member("title", title)
            .member("file", file)
            .member("told", told)
            .member("pictures", List.copyOf(pictures.keySet()))
            .member("card", card)
            .member("remarks", remarks)
            .array("mistakes");
    for (Mistake mistake : mistakes) {
      json.object()
          .member("place", mistake.place)
          .member("wrong", mistake.wrong)
          .member("right", mistake.right)
          .member("line", mistake.line)
          .endObject();
    }
    return json.endArray().endObject().text();
  }
}
