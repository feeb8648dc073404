package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.result.Result;
import java.util.List;

/** How each χ comes about, on the card and as data. */
record PointSection(Result result) {
  private static final int MOST_DECIMALS = 5;

  void write(Manuscript text, Ink ink) {
    for (Result.PointTransmittance chi : result.chi()) {
      text.heading("χ " + chi.name() + " = L3D less what is counted elsewhere", "W/K");
      int decimals =
          Math.max(0, Math.min(MOST_DECIMALS, Digits.decimals(chi.valueWPerK().halfWidth()) + 1));
      Table table = new Table("lrl", 2, TextCard.PAGE).named("term", "W/K", "from");
      table.row(
          "L3D " + Words.between(chi.warm(), chi.cold()),
          Digits.fixed(chi.couplingWPerK().value(), decimals),
          "");
      for (Result.PointTerm term : chi.subtracted()) {
        table.row(
            "less " + term.name(),
            Digits.fixed(-term.valueWPerK().mid(), decimals),
            ink.faint(derivation(term)));
      }
      Digits.Figure value = TextCard.figure(chi.valueWPerK(), 1, decimals);
      table.row("χ", ink.strong(value.value()), ink.faint("± " + value.halfWidth()));
      text.table(table);
    }
  }

  private static String derivation(Result.PointTerm term) {
    if (term.areaM2().isPresent()) {
      return "U "
          + Digits.fixed(term.uWPerM2K().orElseThrow().mid(), 4)
          + " × "
          + Digits.fixed(term.areaM2().getAsDouble(), 4)
          + " m²";
    }
    if (term.lengthM().isPresent()) {
      return Digits.fixed(term.psiWPerMK().orElseThrow().mid(), 4)
          + " W/(m·K) × "
          + Digits.fixed(term.lengthM().getAsDouble(), 4)
          + " m";
    }
    return term.derivation();
  }

  /** The array {@code chi}. */
  void write(Json json) {
    json.array("chi");
    for (Result.PointTransmittance chi : result.chi()) {
      json.object()
          .member("name", chi.name())
          .member("of", chi.of())
          .member("between", List.of(Words.spaces(chi.warm()), Words.spaces(chi.cold())))
          .member("filmSet", Words.name(FilmSet.HEAT_LOSS));
      JsonResults.quantity(json, chi.valueWPerK(), "W_per_K");
      JsonResults.tolerance(json, chi.tolerance(), "W_per_K");
      json.object("coupling");
      JsonResults.quantity(json, chi.couplingWPerK(), "W_per_K");
      json.endObject();
      json.array("subtracted");
      for (Result.PointTerm term : chi.subtracted()) {
        subtracted(json, term);
      }
      json.endArray();
      json.array("sensitivities");
      for (Result.Sensitivity sensitivity : chi.sensitivities()) {
        json.object()
            .member("of", sensitivity.of())
            .member("film", sensitivity.film())
            .member("changePer10Percent_W_per_K", ShareSection.RISE * sensitivity.slope())
            .endObject();
      }
      json.endArray().endObject();
    }
    json.endArray();
  }

  private static void subtracted(Json json, Result.PointTerm term) {
    json.object().member("name", term.name());
    if (term.uWPerM2K().isPresent()) {
      JsonResults.bracket(json, "U", "W_per_m2K", term.uWPerM2K().get());
    }
    if (term.areaM2().isPresent()) {
      json.member("area_m2", term.areaM2().getAsDouble());
    }
    if (term.psiWPerMK().isPresent()) {
      JsonResults.bracket(json, "psi", "W_per_mK", term.psiWPerMK().get());
    }
    if (term.lengthM().isPresent()) {
      json.member("length_m", term.lengthM().getAsDouble());
    }
    JsonResults.bracket(json, "value", "W_per_K", term.valueWPerK());
    json.member("derivation", term.derivation()).endObject();
  }
}
