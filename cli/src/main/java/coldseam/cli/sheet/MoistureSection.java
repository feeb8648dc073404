package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.result.MoistureLimits;
import coldseam.solver.result.Result;
import coldseam.solver.result.SpaceMoisture;
import coldseam.solver.result.Verdict;

/** The moisture check of surfaces, as rows of the card and as data. */
record MoistureSection(Result result, Units units, Ink ink) {
  /** Stands beside every moisture check. */
  static final String SCOPE =
      "Surfaces only: condensation inside the construction is not assessed. Temperatures and"
          + " f_Rsi are estimates. A verdict holds for the climate, humidity and films stated, not"
          + " for furniture, curtains, leaks or wet building materials; mould can harm health.";

  private static final double MM = 1000;

  void write(Manuscript text) {
    for (SpaceMoisture space : result.moisture()) {
      text.heading(
          "Moisture at the surfaces of " + space.space(),
          "ISO 13788; films for surface temperatures; air " + space.humidity());
      text.table(months(space));
      verdict(text, space, "mould", MoistureLimits.MOULD);
      verdict(text, space, "condensation", MoistureLimits.CONDENSATION);
      surface(text, space);
      text.note(SCOPE);
    }
  }

  private Table months(SpaceMoisture space) {
    Table table = new Table("lrrrrrrrrl", 2, TextCard.PAGE);
    table.head("", "θe", "dew point", "mould", "f_Rsi", "f_Rsi", "θsi", "φsi", "margin", "");
    table.head("", "°C", "°C", "below °C", "needed", "found", "°C", "%", "K", "");
    for (int m = 0; m < space.months().size(); m++) {
      SpaceMoisture.Month month = space.months().get(m);
      boolean governs = space.critical().isPresent() && space.critical().getAsInt() == m;
      String name = month.name().isEmpty() ? "as stated" : month.name();
      table.row(
          governs ? ink.strong(name) : name,
          Digits.fixed(month.outsideC(), 1),
          Digits.fixed(month.dewPointC(), 2),
          Digits.fixed(month.mouldC(), 2),
          month.counts() ? Digits.fixed(month.required(space.atSurface()), 3) : "none",
          month.counts() ? Digits.fixed(month.fRsi(), 3) : "",
          Digits.fixed(month.surfaceC(), 2),
          Digits.fixed(100 * month.surfaceHumidity(), 0),
          month.counts() ? Digits.signed(Digits.fixed(month.marginK(space.atSurface()), 2)) : "",
          governs ? ink.faint("governs") : month.counts() ? "" : ink.faint("outdoors not colder"));
    }
    return table;
  }

  private void verdict(Manuscript text, SpaceMoisture space, String what, double atSurface) {
    if (space.critical().isEmpty()) {
      return;
    }
    Verdict verdict = space.verdict(atSurface);
    SpaceMoisture.Month month = space.months().get(worst(space, atSurface));
    String words =
        switch (verdict) {
          case MET -> ink.good("no " + what);
          case UNDECIDED -> ink.alert(what + ": too near its limit to tell");
          case NOT_MET -> ink.alert(what + " to be expected");
        };
    text.paragraph(
        words
            + ": coldest point "
            + Digits.signed(Digits.fixed(month.marginK(atSurface), 2))
            + " K from the limit"
            + (month.name().isEmpty() ? "" : " in " + month.name())
            + (space.atSurface() == atSurface ? "; this criterion governs" : ""));
    if (space.onGlazing() && atSurface == MoistureLimits.MOULD) {
      text.note(
          "The coldest point lies on glazing or a frame, which the standard judges by condensation"
              + " alone.");
    }
  }

  /** The month with the least margin. */
  private static int worst(SpaceMoisture space, double atSurface) {
    int worst = space.critical().getAsInt();
    for (int m = 0; m < space.months().size(); m++) {
      SpaceMoisture.Month month = space.months().get(m);
      if (month.counts()
          && month.marginK(atSurface) < space.months().get(worst).marginK(atSurface)) {
        worst = m;
      }
    }
    return worst;
  }

  private void surface(Manuscript text, SpaceMoisture space) {
    if (space.surface().isEmpty()) {
      return;
    }
    SpaceMoisture.Surface surface = space.surface().get();
    SpaceMoisture.Month month = space.months().get(space.critical().getAsInt());
    text.note(
        "Of "
            + units.length(surface.lengthM())
            + " "
            + units.unit()
            + " of surface"
            + (month.name().isEmpty() ? "" : " in " + month.name())
            + ", "
            + units.length(surface.belowMouldM())
            + " lie below the limit for mould and "
            + units.length(surface.belowDewPointM())
            + " below the dew point; temperatures along it are in --json and result.csv.");
  }

  /** One entry a space and month; the one that governs has the surface too. */
  void write(Json json) {
    json.array("moisture");
    for (SpaceMoisture space : result.moisture()) {
      for (int m = 0; m < space.months().size(); m++) {
        SpaceMoisture.Month month = space.months().get(m);
        boolean governs = space.critical().isPresent() && space.critical().getAsInt() == m;
        json.object().member("space", space.space());
        if (month.name().isEmpty()) {
          json.nothing("month");
        } else {
          json.member("month", month.name());
        }
        month(json, space, month);
        json.member("governs", governs);
        if (governs && space.surface().isPresent()) {
          surface(json, space.surface().get());
        }
        json.endObject();
      }
    }
    json.endArray();
    if (!result.moisture().isEmpty()) {
      json.member("moistureNote", SCOPE);
    }
  }

  private static void month(Json json, SpaceMoisture space, SpaceMoisture.Month month) {
    json.member("filmSet", Words.name(FilmSet.SURFACE))
        .member("outdoors_C", month.outsideC())
        .member("indoors_C", month.insideC())
        .member("humidity", space.humidity())
        .member("vapourPressure_Pa", month.vapourPa())
        .member("dewPoint_C", month.dewPointC())
        .member("mouldLimit_C", month.mouldC())
        .member("criterion", space.atSurface())
        .member("counts", month.counts())
        .member("requiredFRsi", month.required(space.atSurface()))
        .member("requiredFRsiMould", month.requiredForMould())
        .member("requiredFRsiCondensation", month.requiredForCondensation())
        .member("temperature_C", month.surfaceC())
        .member("estimatedError_K", month.errorK())
        .member("fRsi", month.fRsi())
        .member("margin_K", month.marginK(space.atSurface()))
        .member("marginMould_K", month.marginK(MoistureLimits.MOULD))
        .member("marginCondensation_K", month.marginK(MoistureLimits.CONDENSATION))
        .member("surfaceHumidity", month.surfaceHumidity())
        .member("mould", word(space.verdict(MoistureLimits.MOULD)))
        .member("condensation", word(space.verdict(MoistureLimits.CONDENSATION)))
        .member("certified", false);
  }

  /** A verdict on all months together, as data. */
  private static String word(Verdict verdict) {
    return switch (verdict) {
      case MET -> "none";
      case UNDECIDED -> "too near to tell";
      case NOT_MET -> "expected";
    };
  }

  private static void surface(Json json, SpaceMoisture.Surface surface) {
    json.object("surface")
        .member("length_mm", surface.lengthM() * MM)
        .member("belowMouldLimit_mm", surface.belowMouldM() * MM)
        .member("belowDewPoint_mm", surface.belowDewPointM() * MM)
        .array("points");
    for (Result.Sample sample : surface.samples()) {
      JsonResults.sample(json, sample);
    }
    json.endArray().endObject();
  }
}
