package coldseam.cli.sheet;

import coldseam.cli.text.Json;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.window.WindowTransmittance;
import coldseam.solver.window.WindowTransmittance.Term;
import java.util.List;

/** A window as one JSON object, and as comma-separated values with the same names. */
record WindowData(WindowSubject of) {
  private static final String PER_M2K = "W_per_m2K";
  private static final String PER_MK = "W_per_mK";

  String json(boolean indented) {
    Json json = indented ? Json.indented() : Json.onOneLine();
    json.object();
    JsonResults.head(json, of.subject());
    WindowTransmittance result = of.transmittance();
    boolean certified = result.uWPerM2K().certified();
    if (result.installedWPerM2K().isPresent()) {
      certified &= result.installedWPerM2K().get().certified();
    }
    json.object("accuracy").member("certified", certified).member("reached", reached()).endObject();
    json.array("U");
    transmittance(json, "window", result.uWPerM2K());
    if (result.installedWPerM2K().isPresent()) {
      transmittance(json, "window installed", result.installedWPerM2K().get());
    }
    json.endArray();
    json.object("window")
        .member("width_m", of.window().widthM())
        .member("height_m", of.window().heightM())
        .member("area_m2", result.areaM2());
    terms(json, "terms", result.terms());
    terms(json, "installation", result.installation());
    json.endObject();
    json.array("cases");
    for (WindowSubject.Part part : of.parts()) {
      json.object()
          .member("name", part.name())
          .member("reached", part.reached())
          .member("unknowns", part.unknowns())
          .endObject();
    }
    json.endArray();
    JsonResults.assumptions(json, of.assumptions());
    json.member("warnings", of.warnings());
    json.member("note", Words.SAFETY);
    return json.endObject().text();
  }

  private boolean reached() {
    for (WindowSubject.Part part : of.parts()) {
      if (!part.reached()) {
        return false;
      }
    }
    return true;
  }

  private static void transmittance(Json json, String name, Quantity quantity) {
    json.object().member("of", name);
    JsonResults.quantity(json, quantity, PER_M2K);
    json.endObject();
  }

  private static void terms(Json json, String name, List<Term> terms) {
    json.array(name);
    for (Term term : terms) {
      json.object()
          .member("kind", WindowWords.name(term.kind()))
          .member("name", term.name())
          .member(term.area() ? "area_m2" : "length_m", term.amount());
      json.object(term.area() ? "U" : "psi");
      JsonResults.quantity(json, term.coefficient(), term.area() ? PER_M2K : PER_MK);
      json.endObject().member("value_W_per_K", term.valueWPerK()).endObject();
    }
    json.endArray();
  }

  String csv() {
    StringBuilder text =
        new StringBuilder(
            "file,quantity,name,certified,value_W_per_m2K,lower_W_per_m2K,upper_W_per_m2K,"
                + "estimatedHalfWidth_W_per_m2K,value_W_per_mK,lower_W_per_mK,upper_W_per_mK,"
                + "estimatedHalfWidth_W_per_mK,area_m2,length_m,value_W_per_K\n");
    WindowTransmittance result = of.transmittance();
    row(text, "U", "window", result.uWPerM2K(), true)
        .append(result.areaM2())
        .append(",,")
        .append(result.areaM2() * result.uWPerM2K().value())
        .append('\n');
    if (result.installedWPerM2K().isPresent()) {
      Quantity installed = result.installedWPerM2K().get();
      row(text, "U", "window installed", installed, true)
          .append(result.areaM2())
          .append(",,")
          .append(result.areaM2() * installed.value())
          .append('\n');
    }
    for (List<Term> terms : List.of(result.terms(), result.installation())) {
      for (Term term : terms) {
        row(text, WindowWords.name(term.kind()), term.name(), term.coefficient(), term.area())
            .append(term.area() ? term.amount() + "," : "," + term.amount())
            .append(',')
            .append(term.valueWPerK())
            .append('\n');
      }
    }
    return text.toString();
  }

  private StringBuilder row(
      StringBuilder text, String quantity, String name, Quantity number, boolean area) {
    text.append(quoted(of.subject().file()))
        .append(',')
        .append(quantity)
        .append(',')
        .append(quoted(name))
        .append(',')
        .append(number.certified())
        .append(area ? "," : ",,,,,")
        .append(number.value())
        .append(',');
    if (number.certificate() instanceof Certificate.Certified proved) {
      text.append(proved.lower()).append(',').append(proved.upper()).append(",,");
    } else {
      text.append(",,").append(number.halfWidth()).append(',');
    }
    return text.append(area ? ",,,," : "");
  }

  /** RFC 4180: a field with a comma or a quote stands in quotes. */
  private static String quoted(String field) {
    boolean plain = field.indexOf(',') < 0 && field.indexOf('"') < 0;
    return plain ? field : '"' + field.replace("\"", "\"\"") + '"';
  }
}
