package coldseam.cli.sheet;

import coldseam.cli.text.Json;
import coldseam.cli.text.Manuscript;
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
  void write(Manuscript text) {
    TextCard.title(text, subject);
    if (!cases.isEmpty()) {
      text.heading("Cases that are solved for it", "");
      for (String one : cases) {
        text.paragraph(one);
      }
    }
    TextCard.assumptions(text, assumptions, List.of());
  }

  String json() {
    Json json = Json.onOneLine().object();
    JsonResults.head(json, subject);
    json.member("valid", true).member("cases", cases);
    JsonResults.assumptions(json, assumptions);
    return json.endObject().text();
  }
}
