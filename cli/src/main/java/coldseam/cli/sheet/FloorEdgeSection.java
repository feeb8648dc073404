package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;

/** The edge of a floor next to the ground, as rows of the card and as data. */
record FloorEdgeSection(Result result, Units units, Ink ink) {
  void write(Manuscript text) {
    if (result.floorEdge().isEmpty()) {
      return;
    }
    Result.FloorEdge edge = result.floorEdge().get();
    Wanted.FloorEdge of = edge.of();
    text.heading("Ground", of.kind() + "; ISO 13370, whose U is no part of the certificate");
    Table table = new Table("lrll", 2, TextCard.PAGE).named("quantity", "value", "unit", "note");
    table.row("width of the floor B'", Digits.fixed(of.characteristicM(), 3), "m", "");
    table.row("conductivity of the ground", Digits.shortest(of.soilWPerMK(), 4), "W/(m·K)", "");
    table.row(
        "R of the floor",
        Digits.fixed(of.resistanceM2KPerW(), 4),
        "m²·K/W",
        ink.faint(String.join(", ", of.layers())));
    table.row("equivalent thickness", Digits.fixed(of.equivalentM(), 4), "m", "");
    if (!Double.isNaN(of.floorUWPerM2K())) {
      row(table, "U of the floor", of.floorUWPerM2K(), Units.U, "W/(m²·K)", Units.U_NAME);
    }
    if (of.wallUWPerM2K().isPresent()) {
      row(
          table,
          "U of walls below the ground",
          of.wallUWPerM2K().getAsDouble(),
          Units.U,
          "W/(m²·K)",
          Units.U_NAME);
    }
    if (edge.factorWPerMK().isPresent()) {
      double factor = edge.factorWPerMK().getAsDouble();
      Digits.Figure si = Digits.of(factor, edge.errorWPerMK(), 4);
      Digits.Figure us = Digits.of(factor * Units.PSI, edge.errorWPerMK() * Units.PSI, 4);
      table.row(
          "slab-edge F-factor",
          ink.strong(si.value()),
          "W/(m·K)",
          "= "
              + us.value()
              + " "
              + Units.PSI_NAME
              + ink.faint("; through the floor's surface, estimate"));
    }
    text.table(table);
  }

  private void row(
      Table table, String name, double value, double factor, String unit, String customary) {
    table.row(
        name,
        Digits.fixed(value, 4),
        unit,
        units.customary() ? "= " + Digits.fixed(value * factor, 4) + " " + customary : "");
  }

  void write(Json json) {
    if (result.floorEdge().isEmpty()) {
      return;
    }
    Result.FloorEdge edge = result.floorEdge().get();
    Wanted.FloorEdge of = edge.of();
    json.object("ground")
        .member("floor", of.kind())
        .member("characteristicDimension_m", of.characteristicM())
        .member("soilConductivity_W_per_mK", of.soilWPerMK())
        .member("wallThickness_m", of.wallM())
        .member("equivalentThickness_m", of.equivalentM())
        .member("floorResistance_m2K_per_W", of.resistanceM2KPerW())
        .member("layers", of.layers())
        .member("floorU_W_per_m2K", of.floorUWPerM2K());
    if (of.wallUWPerM2K().isPresent()) {
      json.member("wallU_W_per_m2K", of.wallUWPerM2K().getAsDouble());
    }
    if (edge.factorWPerMK().isPresent()) {
      json.member("factor_W_per_mK", edge.factorWPerMK().getAsDouble())
          .member("factor_Btu_per_hftF", edge.factorWPerMK().getAsDouble() * Units.PSI)
          .member("estimatedError_W_per_mK", edge.errorWPerMK());
    }
    json.endObject();
  }
}
