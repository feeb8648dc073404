package coldseam.cli.sheet;

import coldseam.cli.text.Json;
import coldseam.solver.Solver;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import java.util.List;
import java.util.Locale;

/** What is understood of a case, as one JSON object. */
record JsonInspection(Subject subject, Solver.Inspection inspection, Detail detail) {
  JsonInspection(Subject subject, Solver.Inspection inspection) {
    this(subject, inspection, inspection.detail());
  }

  String text() {
    Json json = Json.onOneLine().object();
    JsonResults.head(json, subject);
    json.member("valid", true);
    materials(json);
    spaces(json);
    json.array("outline");
    for (OutlinePart part : OutlinePart.of(inspection, detail)) {
      json.object()
          .member("what", part.name())
          .member("length_m", part.lengthM())
          .member("films", part.films())
          .endObject();
    }
    json.endArray().array("stretches");
    for (OutlinePart part : OutlinePart.stretches(inspection, detail)) {
      json.object().member("name", part.name()).member("length_m", part.lengthM()).endObject();
    }
    json.endArray();
    JsonResults.flanks(json, inspection.flanks());
    JsonResults.assumptions(json, inspection.assumptions());
    json.member("warnings", inspection.warnings());
    json.member("largestDisplacement_mm", inspection.partition().largestDisplacementM() * 1000);
    return json.endObject().text();
  }

  private void materials(Json json) {
    json.array("materials");
    List<Fill> fills = detail.fills();
    for (int label = 0; label < fills.size(); label++) {
      if (fills.get(label) instanceof Material material) {
        json.object()
            .member("name", material.name())
            .member("conductivity_W_per_mK", material.conductivityWPerMK());
        if (!material.isotropic()) {
          json.member("crossConductivity_W_per_mK", material.crossConductivityWPerMK())
              .member("angle_deg", Math.toDegrees(material.angleRad()));
        }
        json.member("area_m2", inspection.partition().labelArea(label))
            .member("source", material.source())
            .endObject();
      }
    }
    json.endArray();
  }

  private void spaces(Json json) {
    json.array("spaces");
    for (Space space : detail.spaces()) {
      json.object()
          .member("name", space.name())
          .member("temperature_C", space.floating().isPresent() ? Double.NaN : space.temperatureC())
          .member("floats", space.floating().isPresent())
          .member("exposure", space.exposure().name().toLowerCase(Locale.ROOT))
          .endObject();
    }
    json.endArray();
  }
}
