package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.result.Result;

/** Framed walls beside their two resistance limits, as rows of the card and as data. */
record FramingSection(Result result, Units units, Ink ink) {
  private static final int R_DECIMALS = 3;
  private static final int U_DECIMALS = 4;

  void write(Manuscript text) {
    for (Result.Framing framing : result.framings()) {
      text.heading(
          "Framing of " + framing.wanted().of(),
          "R in m²·K/W, U in W/(m²·K), films included unless said");
      Table table =
          new Table("lrlll", 2, TextCard.PAGE)
              .named("quantity", "value", "unit", "customary", "note");
      resistances(table, framing);
      losses(table, framing);
      corrections(table, framing);
      text.table(table);
      if (framing.meanR().isEmpty()) {
        text.note(
            "No mean of the two limits is given: "
                + (framing.metal()
                    ? "metal bridges a layer (ISO 6946)."
                    : "they differ by more than half (ISO 6946)."));
      }
    }
  }

  private void resistances(Table table, Result.Framing framing) {
    double solved = framing.resistance().value();
    r(table, "R as solved", solved, ink.strong("in two dimensions"));
    r(table, "R without films", solved - framing.films(), "");
    r(table, "R by parallel paths", framing.parallelR(), "upper limit: R is never more");
    r(table, "R by isothermal planes", framing.isothermalR(), "lower limit: R is never less");
    if (framing.meanR().isPresent()) {
      r(
          table,
          "R, mean of the limits",
          framing.meanR().getAsDouble(),
          "ISO 6946, error at most " + Digits.fixed(100 * framing.meanError(), 1) + " %");
    }
    r(table, "R beside the framing", framing.besideR(), "straight through the insulation");
    if (framing.framedShare() > 0) {
      r(
          table,
          "R through the framing",
          framing.framingR(),
          "the least; framing takes "
              + Digits.fixed(100 * framing.framedShare(), 1)
              + " % of the width");
    }
  }

  private void losses(Table table, Result.Framing framing) {
    if (framing.framedShare() > 0) {
      table.row(
          "lost by the framing",
          Digits.fixed(100 * framing.lostShare(), 1),
          "%",
          "",
          "of R beside it");
      table.row(
          "added by one module",
          Digits.fixed(framing.framingWPerMK(), U_DECIMALS),
          "W/(m·K)",
          us(framing.framingWPerMK() * Units.PSI, U_DECIMALS, Units.PSI_NAME),
          "(U − 1/R beside) × spacing");
    }
    if (framing.layerR().isPresent()) {
      r(
          table,
          "R of " + framing.wanted().layer(),
          framing.layerR().getAsDouble(),
          "beside the framing");
      r(
          table,
          "what is left of it",
          framing.effectiveR().getAsDouble(),
          "effective, with the framing in it");
    }
    if (framing.wholeWPerM2K().isPresent()) {
      double paths = framing.wholeWPerM2K().getAsDouble();
      double solved = framing.wholeSolvedWPerM2K().getAsDouble();
      u(
          table,
          "U of the whole wall",
          solved,
          "clear wall as solved, other framing straight through");
      r(table, "R of the whole wall", 1 / solved, "");
      u(table, "U, fractions alone", paths, "parallel paths, a hand method");
      r(table, "R, fractions alone", 1 / paths, "");
    }
  }

  private void corrections(Table table, Result.Framing framing) {
    if (framing.corrected().isEmpty()) {
      return;
    }
    Result.Corrected corrected = framing.corrected().get();
    u(table, "ΔU of air voids", corrected.voids(), "ISO 6946");
    u(table, "ΔU of fasteners", corrected.fasteners(), "ISO 6946");
    u(table, "ΔU of rain", corrected.rain(), "ISO 6946, inverted roof");
    u(
        table,
        "U corrected",
        corrected.u(),
        corrected.negligible()
            ? "less than 3 % more: the standard lets it be left out"
            : "with all of them");
    if (corrected.tapered().isPresent()) {
      u(
          table,
          "U with the tapered layer",
          corrected.tapered().getAsDouble(),
          "ISO 6946, mean over its part of the roof; not corrected");
    }
  }

  private void r(Table table, String name, double value, String note) {
    table.row(
        name,
        Digits.fixed(value, R_DECIMALS),
        "m²·K/W",
        us(value * Units.R, R_DECIMALS, Units.R_NAME),
        note);
  }

  private void u(Table table, String name, double value, String note) {
    table.row(
        name,
        Digits.fixed(value, U_DECIMALS),
        "W/(m²·K)",
        us(value * Units.U, U_DECIMALS, Units.U_NAME),
        note);
  }

  private String us(double value, int decimals, String unit) {
    return units.customary() ? Digits.fixed(value, decimals) + " " + unit : "";
  }

  void write(Json json) {
    json.array("framing");
    for (Result.Framing framing : result.framings()) {
      json.object()
          .member("of", framing.wanted().of())
          .member("R_m2K_per_W", framing.resistance().value())
          .member("RWithoutFilms_m2K_per_W", framing.resistance().value() - framing.films())
          .member("parallelPaths_m2K_per_W", framing.parallelR())
          .member("isothermalPlanes_m2K_per_W", framing.isothermalR());
      if (framing.meanR().isPresent()) {
        json.member("mean_m2K_per_W", framing.meanR().getAsDouble())
            .member("meanError", framing.meanError());
      } else {
        json.nothing("mean_m2K_per_W").nothing("meanError");
      }
      json.member("metalBridges", framing.metal())
          .member("besideFraming_m2K_per_W", framing.besideR())
          .member("throughFraming_m2K_per_W", framing.framingR())
          .member("framedShare", framing.framedShare())
          .member("lostShare", framing.lostShare())
          .member("framing_W_per_mK", framing.framingWPerMK());
      if (framing.layerR().isPresent()) {
        json.member("layer", framing.wanted().layer())
            .member("layer_m2K_per_W", framing.layerR().getAsDouble())
            .member("effectiveLayer_m2K_per_W", framing.effectiveR().getAsDouble());
      }
      if (framing.wholeWPerM2K().isPresent()) {
        json.member("wholeWallU_W_per_m2K", framing.wholeSolvedWPerM2K().getAsDouble())
            .member("parallelPathsOfFractionsU_W_per_m2K", framing.wholeWPerM2K().getAsDouble());
      }
      if (framing.corrected().isPresent()) {
        Result.Corrected corrected = framing.corrected().get();
        json.object("corrected")
            .member("airVoids_W_per_m2K", corrected.voids())
            .member("fasteners_W_per_m2K", corrected.fasteners())
            .member("rain_W_per_m2K", corrected.rain())
            .member("U_W_per_m2K", corrected.u())
            .member("negligible", corrected.negligible());
        if (corrected.tapered().isPresent()) {
          json.member("taperedU_W_per_m2K", corrected.tapered().getAsDouble());
        }
        json.endObject();
      }
      json.endObject();
    }
    json.endArray();
  }
}
