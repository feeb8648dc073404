package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Json;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.mesh.plane.Point;
import coldseam.solver.air.Cavity;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.AirCavity.Temperatures;
import java.util.ArrayList;
import java.util.List;

/** The air cavities of a result: a table on the card, an array in the data. */
final class CavitySection {
  private static final double MM = 1000;

  /** Largest sine at which a direction still counts as along the sheet's axes. */
  private static final double ALONG = 1e-6;

  private final List<Cavity> cavities;

  CavitySection(List<Cavity> cavities) {
    this.cavities = cavities;
  }

  void write(Manuscript text, Units units, Ink ink) {
    if (cavities.isEmpty()) {
      return;
    }
    text.heading(
        "Air cavities",
        "heat flows along d; d, b and places in " + units.unit() + ", λ in W/(m·K)");
    Table table = new Table("lllrrlll", 2, TextCard.PAGE);
    table.head("", "at", "", "d", "b", "flow", "ε", "λ");
    int passes = 0;
    boolean settled = true;
    for (Cavity cavity : cavities) {
      String at = "(" + units.length(cavity.at().x()) + ", " + units.length(cavity.at().y()) + ")";
      if (cavity.counted().isEmpty()) {
        String part = "part of " + cavity.space().orElse("");
        table.row(cavity.name(), at, words(cavity), "", "", "", "", part);
        continue;
      }
      Cavity.Counted as = cavity.counted().get();
      passes = Math.max(passes, as.passes());
      settled &= as.settled();
      table.row(
          cavity.name(),
          at,
          words(cavity),
          units.length(as.box().depthM()),
          units.length(as.box().widthM()),
          direction(as.direction()),
          as.stated()
              ? ""
              : Digits.shortest(as.emissivities().first(), 2)
                  + " "
                  + Digits.shortest(as.emissivities().second(), 2),
          Digits.significant(as.conductivityWPerMK(), 4) + note(as));
    }
    text.table(table);
    if (passes == 0) {
      return;
    }
    String counted = passes + (passes == 1 ? " pass" : " passes");
    String note =
        settled
            ? "Settled in " + counted + "; every ± holds for these conductivities"
            : "Not settled in " + counted + ": nothing is certified";
    text.note(note);
  }

  private static String note(Cavity.Counted as) {
    if (as.stated()) {
      return " stated";
    }
    return as.differenceK().isEmpty()
        ? ""
        : " at "
            + Digits.fixed(as.differenceK().getAsDouble(), 1)
            + " K, "
            + Digits.fixed(as.meanC().getAsDouble(), 1)
            + " °C";
  }

  private static String words(Cavity cavity) {
    return (cavity.rule() == Rule.LAYER ? "layer, " : "") + cavity.ventilation().words();
  }

  /** An arrow as seen on the sheet, or degrees counter-clockwise from the x axis. */
  private static String direction(Point unit) {
    if (Math.abs(unit.y()) < ALONG) {
      return unit.x() > 0 ? "→" : "←";
    }
    if (Math.abs(unit.x()) < ALONG) {
      return unit.y() > 0 ? "↑" : "↓";
    }
    return Digits.fixed(Math.toDegrees(Math.atan2(unit.y(), unit.x())), 0) + "°";
  }

  /** Names of the cavities. */
  List<String> names() {
    List<String> names = new ArrayList<>(cavities.size());
    for (Cavity cavity : cavities) {
      names.add(cavity.name());
    }
    return names;
  }

  void write(Json json) {
    json.array("cavities");
    for (Cavity cavity : cavities) {
      json.object()
          .member("name", cavity.name())
          .member("fill", cavity.fill())
          .numbers("at_mm", JsonResults.mm(cavity.at().x()), JsonResults.mm(cavity.at().y()))
          .member("area_mm2", cavity.areaM2() * MM * MM)
          .member("rule", cavity.rule() == Rule.FRAME ? "frame" : "layer")
          .member("ventilation", cavity.ventilation().words())
          .member("slit_mm", JsonResults.mm(cavity.slitM()));
      if (cavity.space().isPresent()) {
        json.member("space", cavity.space().get());
      } else {
        json.nothing("space");
      }
      if (cavity.counted().isPresent()) {
        counted(json, cavity.counted().get());
      }
      json.endObject();
    }
    json.endArray();
  }

  private static void counted(Json json, Cavity.Counted as) {
    json.member("d_mm", JsonResults.mm(as.box().depthM()))
        .member("b_mm", JsonResults.mm(as.box().widthM()))
        .numbers("direction", as.direction().x(), as.direction().y())
        .numbers("emissivities", as.emissivities().first(), as.emissivities().second())
        .member("conductivity_W_per_mK", as.conductivityWPerMK())
        .member("stated", as.stated());
    if (as.form().isPresent()) {
      json.member("form", as.form().get());
    } else {
      json.nothing("form");
    }
    json.member("temperatures", as.temperatures() == Temperatures.FIXED ? "fixed" : "found");
    if (as.differenceK().isPresent()) {
      json.member("difference_K", as.differenceK().getAsDouble())
          .member("mean_C", as.meanC().getAsDouble());
    } else {
      json.nothing("difference_K").nothing("mean_C");
    }
    json.member("passes", as.passes()).member("settled", as.settled());
  }
}
