package coldseam.solver.air;

import coldseam.solver.cavity.AirLayer;
import coldseam.solver.cavity.RadiationForm;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.AirCavity.Temperatures;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;

/** What was derived about cavities, in words. */
final class CavityAssumptions {
  private final List<Cavity> cavities;
  private final LaidAir laid;
  private final List<Shape> shapes;

  CavityAssumptions(List<Cavity> cavities, LaidAir laid, List<Shape> shapes) {
    this.cavities = cavities;
    this.laid = laid;
    this.shapes = shapes;
  }

  /** Clause and form behind the conductivity of a cavity. */
  static String source(LaidAir.Group group) {
    AirCavity fill = group.pieces().get(0).fill();
    if (group.pieces().get(0).settings().conductivityWPerMK().isPresent()) {
      return "stated in the case";
    }
    String temperatures =
        fill.temperatures() == Temperatures.FIXED
            ? ", fixed temperatures"
            : ", temperatures from the solution";
    if (fill.form(group.classed().rule()) == RadiationForm.RADIOSITY) {
      return "cavities: " + RadiationForm.RADIOSITY.words() + temperatures;
    }
    return group.classed().rule() == Rule.FRAME
        ? "cavities: " + fill.form(Rule.FRAME).words() + temperatures
        : "air layers: ISO 6946, R from thickness, emissivity and direction" + temperatures;
  }

  List<Assumption> list() {
    List<Assumption> lines = new ArrayList<>();
    for (int c = 0; c < cavities.size(); c++) {
      lines.add(of(c));
    }
    TreeSet<String> unknown = new TreeSet<>();
    TreeSet<String> throats = new TreeSet<>();
    boolean proposedFrame = false;
    boolean proposedLayer = false;
    boolean radiating = false;
    for (int c = 0; c < cavities.size(); c++) {
      Piece.Classed classed = laid.groups().get(c).classed();
      AirCavity fill = laid.groups().get(c).pieces().get(0).fill();
      throats.add("'" + fill.name() + "' at " + Wording.length(fill.throatM()) + " or less");
      if (!laid.groups().get(c).well()) {
        if (laid.groups().get(c).pieces().get(0).settings().emissivities().isEmpty()) {
          unknown.addAll(shapes.get(c).unknown());
        }
      }
      radiating |=
          !laid.groups().get(c).well() && fill.form(classed.rule()) == RadiationForm.RADIOSITY;
      proposedFrame |= !classed.ruleStated() && classed.rule() == Rule.FRAME;
      proposedLayer |= !classed.ruleStated() && classed.rule() == Rule.LAYER;
    }
    if (!unknown.isEmpty()) {
      lines.add(
          new Assumption(
              "emissivity of " + String.join(", ", unknown) + " in cavities",
              Wording.figure(Limits.EMISSIVITY) + ", none is stated",
              "ISO 10077-2 and ISO 6946, unless a lower one of a metallic surface is secured"));
    }
    if (!throats.isEmpty()) {
      lines.add(
          new Assumption(
              "throats that part air",
              String.join("; ", throats),
              "ISO 10077-2, cavities joined by 2 mm or less count as separate"));
    }
    if (radiating) {
      lines.add(
          new Assumption(
              "radiation between the faces of cavities",
              "face by face, then counted as the conductivity that dissipates as much in the same"
                  + " temperatures; not certified is the exchange itself, which with the radiation"
                  + " coefficients found lets no more heat through; mouths, throats and cut-off"
                  + " planes reflect",
              "ISO 10077-2:2017 allows radiosity (from memory); the way it is counted is this"
                  + " tool's"));
    }
    if (proposedFrame) {
      lines.add(
          new Assumption(
              "rule for cavities",
              "frame (ISO 10077-2): no side is longer than "
                  + Wording.length(Limits.LONGEST_IN_FRAME_M),
              "by convention of this tool"));
    }
    if (proposedLayer) {
      lines.add(
          new Assumption(
              "rule for air layers",
              "layer (ISO 6946): a side is longer than "
                  + Wording.length(Limits.LONGEST_IN_FRAME_M),
              "by convention of this tool"));
    }
    return lines;
  }

  private Assumption of(int c) {
    Cavity cavity = cavities.get(c);
    Piece.Classed classed = laid.groups().get(c).classed();
    StringBuilder value = new StringBuilder();
    value.append(cavity.ventilation().words());
    if (cavity.ventilation() == Ventilation.WELL_VENTILATED) {
      value.append(": part of ").append(cavity.space().orElse(""));
    }
    if (classed.ventilationStated()) {
      value.append(" as stated");
    } else if (cavity.slitM() > 0) {
      value.append(" (slit ").append(Wording.length(cavity.slitM())).append(')');
    } else if (cavity.ventilation() == Ventilation.UNVENTILATED) {
      value.append(" (closed)");
    }
    if (cavity.counted().isPresent()) {
      counted(value, cavity.rule(), cavity.counted().get());
    }
    String source =
        cavity.counted().isPresent()
            ? source(laid.groups().get(c))
            : cavity.rule() == Rule.FRAME
                ? "ISO 10077-2, well ventilated cavities"
                : "ISO 6946, well ventilated air layers";
    return new Assumption(
        cavity.name() + " at " + Wording.place(cavity.at()), value.toString(), source);
  }

  private static void counted(StringBuilder value, Rule rule, Cavity.Counted as) {
    if (!as.stated()) {
      value
          .append(", d ")
          .append(Wording.length(as.box().depthM()))
          .append(" in the direction of heat flow, b ")
          .append(Wording.length(as.box().widthM()))
          .append(", ε ")
          .append(Wording.figure(as.emissivities().first()))
          .append(" and ")
          .append(Wording.figure(as.emissivities().second()));
    }
    if (rule == Rule.LAYER && !as.stated()) {
      if (as.box().depthM() > AirLayer.THICKEST_M * (1 + Limits.TIE)) {
        value
            .append(", with the resistance of ")
            .append(Wording.length(AirLayer.THICKEST_M))
            .append(", the thickest that ISO 6946 knows");
      }
      if (as.form().isPresent()) {
        value.append(", a small or divided void (").append(as.form().get()).append(')');
      }
    }
    if (as.differenceK().isPresent()) {
      value
          .append(", ")
          .append(Wording.figure(as.differenceK().getAsDouble()))
          .append(" K at ")
          .append(Wording.figure(as.meanC().getAsDouble()))
          .append(" °C");
    }
    value.append(": λ ").append(Wording.figure(as.conductivityWPerMK())).append(" W/(m·K)");
  }
}
