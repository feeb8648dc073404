package coldseam.solver.result;

import coldseam.solver.detail.Area;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * The lengths of a frame (ISO 10077-2): the glazings or panels it holds, at the cut-off planes
 * where they end, how much of each is seen, and the projected width b_f of the frame, the larger of
 * that seen from inside and that seen from outside. Lengths of glazings are taken on the side where
 * the frame is wider, so that they add up with b_f to the width of the section.
 */
final class FramePlan {
  /** Least visible length of glazing or panel, m: ISO 10077-2. */
  private static final double LEAST_VISIBLE_M = 0.190;

  /** Rounding allowed on that length, and by which lengths add up, relative. */
  private static final double ROUNDING = 1e-6;

  private static final double LENGTHS_DIFFER = 1e-3;

  /** Sine of the angle up to which two glazings lie in one plane. */
  private static final double PARALLEL_SINE = 1e-3;

  /**
   * A glazing or panel.
   *
   * @param flank its layers at the cut-off plane where it ends
   * @param role glazing or panel
   * @param visible the length that counts
   */
  record Infill(PlacedFlank flank, Area.Role role, Result.Length visible) {
    String name() {
      return flank.name();
    }

    double visibleM() {
      return visible.valueM();
    }

    String derivation() {
      return visible.derivation();
    }
  }

  private final Detail detail;
  private final Outline outline;
  private final FrameOutline lines;
  private final Wanted.Frame wanted;
  private final List<Fault> faults = new ArrayList<>();
  private final List<String> warnings = new ArrayList<>();
  private final List<Assumption> assumptions = new ArrayList<>();
  private final List<Infill> infills = new ArrayList<>();
  private int[] warm;
  private int[] cold;
  private int[] floating;
  private double widthM = Double.NaN;
  private Result.Length width;
  private double innerM;
  private double outerM;
  private double wholeM;

  private FramePlan(Detail detail, Outline outline, List<PlacedFlank> flanks, Wanted.Frame wanted) {
    this.detail = detail;
    this.outline = outline;
    lines = new FrameOutline(outline);
    this.wanted = wanted;
    SpaceGroups groups = new SpaceGroups(detail, "frame", "");
    warm = groups.indices(wanted.warm());
    cold = groups.indices(wanted.cold());
    groups.checkApart(warm, cold);
    faults.addAll(groups.faults());
    if (!faults.isEmpty()) {
      return;
    }
    floating = Couplings.floatingBeside(detail, warm, cold);
    List<PlacedFlank> held = held(flanks);
    if (held.isEmpty()) {
      faults.add(
          fault(
              "no glazing or panel ends at a cut-off plane between its two sides; mark the shapes of"
                  + " the glazing by `part: glazing`, or the panel by `part: panel`, and let them"
                  + " end where the drawing ends"));
      return;
    }
    measure(held);
  }

  /** The frame of a detail, if it asks for one. */
  static Optional<FramePlan> of(Detail detail, Outline outline, List<PlacedFlank> flanks) {
    Optional<Wanted.Frame> frame = wanted(detail);
    return frame.isPresent()
        ? Optional.of(new FramePlan(detail, outline, flanks, frame.get()))
        : Optional.empty();
  }

  /** The frame that a detail asks for. */
  static Optional<Wanted.Frame> wanted(Detail detail) {
    for (Wanted any : detail.wanted()) {
      if (any instanceof Wanted.Frame frame) {
        return Optional.of(frame);
      }
    }
    return Optional.empty();
  }

  private static Fault fault(String message) {
    return new Fault("frame", "", message, Optional.empty());
  }

  /** Glazings and panels that separate the two sides, from left to right, then upwards. */
  private List<PlacedFlank> held(List<PlacedFlank> flanks) {
    List<PlacedFlank> held = new ArrayList<>();
    for (PlacedFlank flank : flanks) {
      if (flank.plane().isPresent()
          && Couplings.contains(warm, flank.warm())
          && Couplings.contains(cold, flank.cold())
          && FrameOutline.role(outline, flank.plane().get()) != Area.Role.OTHER) {
        held.add(flank);
      }
    }
    held.sort(
        Comparator.comparing(
            flank -> outline.point(flank.plane().orElseThrow().first()), Outline.LEFT_TO_RIGHT));
    return held;
  }

  private void measure(List<PlacedFlank> held) {
    for (PlacedFlank flank : held) {
      if (flank.uWPerM2K().isEmpty()) {
        faults.add(
            fault(
                "the "
                    + flank.name()
                    + " is not layered at "
                    + flank.placeWords(outline)
                    + " ("
                    + flank.reading().reason()
                    + ")"));
      }
    }
    if (!wanted.visibleM().isEmpty() && wanted.visibleM().size() != held.size()) {
      faults.add(
          fault(
              wanted.visibleM().size()
                  + " visible lengths are stated, but it holds "
                  + held.size()
                  + " glazings or panels"));
    }
    Direction axis = lines.axis(held.get(0));
    boolean typed = wanted.widthM().isPresent() && !wanted.visibleM().isEmpty();
    for (PlacedFlank flank : held) {
      if (!typed && Math.abs(axis.cross(lines.axis(flank))) > PARALLEL_SINE) {
        faults.add(
            fault(
                "its glazings do not lie in one plane; state `width` and `visible` of the frame"));
      }
    }
    if (!faults.isEmpty()) {
      return;
    }
    double inner = lines.extent(warm, axis);
    double outer = lines.extent(cold, axis);
    wholeM = Math.max(inner, outer);
    innerM = inner;
    outerM = outer;
    for (PlacedFlank flank : held) {
      innerM -= lines.visible(flank.warmEnd().orElseThrow());
      outerM -= lines.visible(flank.coldEnd().orElseThrow());
    }
    widthM = wanted.widthM().orElse(Math.max(innerM, outerM));
    if (!(widthM > 0)) {
      faults.add(fault("its projected width is " + Wording.length(widthM) + "; state its `width`"));
      return;
    }
    placeLengths(held, axis);
    warnings.addAll(UnmarkedGlazing.warnings(detail.areas()));
    describe();
  }

  /** The lengths with the lines to draw them on, all in one line beside the frame. */
  private void placeLengths(List<PlacedFlank> held, Direction axis) {
    boolean inside = innerM >= outerM;
    PlacedFlank first = held.get(0);
    Direction away = outline.direction(end(first, !inside).vertex(), end(first, inside).vertex());
    double level = lines.level(inside ? warm : cold, away);
    String seen = "seen from " + (inside ? "inside" : "outside");
    for (int i = 0; i < held.size(); i++) {
      FlankEnd end = end(held.get(i), inside);
      Area.Role role = FrameOutline.role(outline, held.get(i).plane().orElseThrow());
      double cut = lines.along(axis, end.vertex());
      double edge = cut - axis.dot(lines.axis(held.get(i))) * lines.visible(end);
      Result.Length length =
          wanted.visibleM().isEmpty()
              ? new Result.Length(
                  lines.visible(end),
                  Optional.of(lines.at(axis, edge, away, level)),
                  Optional.of(lines.at(axis, cut, away, level)),
                  "visible length " + seen)
              : stated(wanted.visibleM().get(i), "visible length stated");
      infills.add(new Infill(held.get(i), role, length));
      if (i == 0 && wanted.widthM().isEmpty()) {
        width =
            new Result.Length(
                widthM,
                Optional.of(lines.at(axis, edge - widthM, away, level)),
                Optional.of(lines.at(axis, edge, away, level)),
                "projected width " + seen);
      }
    }
    if (width == null) {
      width = stated(widthM, "projected width stated");
    }
  }

  private static Result.Length stated(double valueM, String words) {
    return new Result.Length(valueM, Optional.empty(), Optional.empty(), words);
  }

  private static FlankEnd end(PlacedFlank flank, boolean inside) {
    return (inside ? flank.warmEnd() : flank.coldEnd()).orElseThrow();
  }

  private void describe() {
    if (wanted.widthM().isEmpty()) {
      assumptions.add(
          new Assumption(
              "projected width b_f of the frame",
              Wording.length(widthM)
                  + ", the larger of "
                  + Wording.length(innerM)
                  + " seen from inside and "
                  + Wording.length(outerM)
                  + " from outside",
              "ISO 10077-2, lengths"));
    }
    double sum = widthM;
    for (Infill infill : infills) {
      sum += infill.visibleM();
      if (wanted.visibleM().isEmpty()) {
        assumptions.add(
            new Assumption(
                "visible length of the " + infill.name(),
                Wording.length(infill.visibleM()) + ", " + infill.derivation(),
                "ISO 10077-2, lengths"));
      }
      if (infill.visibleM() < LEAST_VISIBLE_M * (1 - ROUNDING)) {
        warnings.add(
            "the "
                + infill.name()
                + " is seen over "
                + Wording.length(infill.visibleM())
                + "; ISO 10077-2 asks for "
                + Wording.length(LEAST_VISIBLE_M)
                + " at least");
      }
    }
    if (Math.abs(sum - wholeM) > LENGTHS_DIFFER * wholeM) {
      warnings.add(
          "width of the frame and visible lengths add up to "
              + Wording.length(sum)
              + ", but the section is "
              + Wording.length(wholeM)
              + " wide");
    }
  }

  Wanted.Frame wanted() {
    return wanted;
  }

  Detail detail() {
    return detail;
  }

  List<Fault> faults() {
    return faults;
  }

  List<String> warnings() {
    return warnings;
  }

  List<Assumption> assumptions() {
    return assumptions;
  }

  List<Infill> infills() {
    return infills;
  }

  int[] warm() {
    return warm;
  }

  int[] cold() {
    return cold;
  }

  int[] floating() {
    return floating;
  }

  /** b_f with the line it is measured along. */
  Result.Length width() {
    return width;
  }

  /** b_f, m. */
  double widthM() {
    return widthM;
  }

  /** Projected width from inside as drawn, m. */
  double innerM() {
    return innerM;
  }

  /** Projected width from outside as drawn, m. */
  double outerM() {
    return outerM;
  }

  /** How U of a glazing or panel depends on materials and films. */
  Optional<ByPart> byPart(Infill infill) {
    return infill.flank().byPart(detail, outline.conditions());
  }

  /** Σ U b of glazings and panels, W/(m·K). */
  double takenOffWPerMK() {
    double sum = 0;
    for (Infill infill : infills) {
      sum += infill.flank().uWPerM2K().orElseThrow().mid() * infill.visibleM();
    }
    return sum;
  }
}
