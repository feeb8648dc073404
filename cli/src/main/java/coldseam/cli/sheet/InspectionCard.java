package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.cli.text.Ink;
import coldseam.cli.text.Manuscript;
import coldseam.cli.text.Table;
import coldseam.solver.Solver;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Wanted;
import java.util.List;
import java.util.Locale;

/** What is understood of a case, for the terminal: nothing is solved. */
final class InspectionCard {
  private final Subject subject;
  private final Solver.Inspection inspection;
  private final Detail detail;
  private final Ink ink;
  private final Units units;
  private final Manuscript text;

  InspectionCard(Subject subject, Solver.Inspection inspection, Ink ink, Manuscript text) {
    this.subject = subject;
    this.inspection = inspection;
    this.detail = inspection.detail();
    this.ink = ink;
    this.units = Units.of(subject);
    this.text = text;
  }

  void write() {
    TextCard.title(text, subject);
    given();
    TextCard.flanks(text, inspection.flanks(), ink);
    wanted();
    TextCard.assumptions(text, inspection.assumptions(), List.of());
    TextCard.warnings(text, inspection.warnings());
  }

  /** Materials, spaces and outline. */
  void given() {
    fills();
    spaces();
    outline();
  }

  private void fills() {
    text.heading("Materials", "λ in W/(m·K); area of the section");
    Table table =
        new Table("lrrl", 2, TextCard.PAGE).named("material", "λ, W/(m·K)", "area", "source");
    List<Fill> fills = detail.fills();
    for (int label = 0; label < fills.size(); label++) {
      double area = inspection.partition().labelArea(label);
      if (fills.get(label) instanceof Material material) {
        table.row(
            material.name(),
            conductivity(material),
            Digits.fixed(area, 4) + " m²",
            ink.faint(material.source()));
      } else if (fills.get(label) instanceof Hollow hollow) {
        table.row(hollow.name(), "none", Digits.fixed(area, 4) + " m²", ink.faint("hollow"));
      }
    }
    text.table(table);
  }

  static String conductivity(Material material) {
    String along = Digits.shortest(material.conductivityWPerMK(), 6);
    if (material.isotropic()) {
      return along;
    }
    return along
        + " | "
        + Digits.shortest(material.crossConductivityWPerMK(), 6)
        + " at "
        + Digits.shortest(Math.toDegrees(material.angleRad()), 2)
        + "°";
  }

  private void spaces() {
    text.heading("Spaces", "");
    Table table =
        new Table("lrll", 2, TextCard.PAGE).named("space", "temperature", "exposure", "humidity");
    for (Space space : detail.spaces()) {
      table.row(
          space.name(),
          temperature(space),
          space.exposure().name().toLowerCase(Locale.ROOT),
          ink.faint(
              space.relativeHumidity().isPresent()
                  ? Digits.shortest(space.relativeHumidity().getAsDouble() * 100, 1)
                      + " % relative humidity"
                  : ""));
    }
    text.table(table);
  }

  private String temperature(Space space) {
    if (space.floating().isPresent()) {
      Space.Floating floating = space.floating().get();
      return floating.conductanceWPerMK() == 0
          ? "floats"
          : "floats, "
              + Digits.shortest(floating.conductanceWPerMK(), 4)
              + " W/(m·K) to "
              + floating.to();
    }
    String si = Digits.shortest(space.temperatureC(), 2) + " °C";
    return units.customary()
        ? si + " = " + Digits.fixed(Units.fahrenheit(space.temperatureC()), 1) + " °F"
        : si;
  }

  private void outline() {
    text.heading("Outline", "lengths in " + units.unitInWords() + "; Rs in m²·K/W");
    Table table =
        new Table("lrl", 2, TextCard.PAGE).named("outline", "length, " + units.unit(), "films");
    for (OutlinePart part : OutlinePart.of(inspection, detail)) {
      table.row(part.name(), units.length(part.lengthM()), ink.faint(part.films()));
    }
    for (OutlinePart part : OutlinePart.stretches(inspection, detail)) {
      table.row("stretch " + part.name(), units.length(part.lengthM()), "");
    }
    text.table(table);
  }

  /** What is asked for. */
  void wanted() {
    text.heading("Wanted", "beside couplings, heat flows and coldest surfaces");
    Table table = new Table("ll", 2, TextCard.PAGE).named("quantity", "how");
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Psi psi) {
        table.row(
            "ψ " + psi.name(),
            Words.between(psi.warm(), psi.cold())
                + ", "
                + Words.name(psi.dimensions())
                + " dimensions");
      } else if (wanted instanceof Wanted.Chi chi) {
        table.row("χ " + chi.name(), Words.between(chi.warm(), chi.cold()));
      } else if (wanted instanceof Wanted.Transmittance u) {
        String width =
            u.widthM().isPresent()
                ? ", over " + units.length(u.widthM().getAsDouble()) + " " + units.unit()
                : "";
        table.row("U " + u.of(), Words.between(u.warm(), u.cold()) + width);
      } else if (wanted instanceof Wanted.Frame frame) {
        table.row("U frame", Words.between(frame.warm(), frame.cold()) + ", with a panel");
        if (frame.panelRun().isPresent()) {
          table.row("ψ glass edge", Words.between(frame.warm(), frame.cold()) + ", as drawn");
        }
      } else if (wanted instanceof Wanted.Temperature point) {
        table.row(
            "point " + point.name(),
            "at "
                + units.place(point.at())
                + " "
                + units.unit()
                + ", "
                + TextCard.films(point.filmSet()));
      } else if (wanted instanceof Wanted.Profile profile) {
        table.row(
            "profile " + profile.name(),
            profile.points() + " points, " + TextCard.films(profile.filmSet()));
      } else if (wanted instanceof Wanted.SurfaceProfile profile) {
        table.row(
            "profile " + profile.name(),
            "surface of " + profile.space() + ", " + TextCard.films(profile.filmSet()));
      }
    }
    if (table.isEmpty()) {
      text.paragraph("nothing else");
    }
    text.table(table);
  }
}
