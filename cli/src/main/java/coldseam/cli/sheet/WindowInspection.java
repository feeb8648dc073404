package coldseam.cli.sheet;

import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.solver.detail.Assumption;
import java.util.List;

/**
 * What is understood of a window file: which cases are solved for it, and what is assumed.
 *
 * @param subject title, file and units of the window file
 * @param cases file and variant of each case
 * @param assumptions everything chosen for the user
 */
record WindowInspection(Subject subject, List<String> cases, List<Assumption> assumptions) {
  String text(Ink ink) {
    StringBuilder text = new StringBuilder();
    TextCard.title(text, subject, ink);
    if (!cases.isEmpty()) {
      TextCard.heading(text, ink, "Cases that are solved for it", "");
      for (String one : cases) {
        text.append("  ").append(one).append('\n');
      }
    }
    TextCard.assumptions(text, assumptions, List.of(), ink);
    return text.toString();
  }

  String json() {
    Json json = Json.onOneLine().object();
    JsonResults.head(json, subject);
    json.member("valid", true).member("cases", cases);
    JsonResults.assumptions(json, assumptions);
    return json.endObject().text();
  }
}
