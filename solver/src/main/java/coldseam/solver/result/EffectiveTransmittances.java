package coldseam.solver.result;

import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.CutOffPlane;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** U = L2D / width over a module, and R = 1/U. */
final class EffectiveTransmittances {
  /** Relative difference of a typed width from the drawn one above which a warning is given. */
  private static final double TYPED_WIDTH_DIFFERS = 1e-3;

  private final Detail detail;
  private final Outline outline;
  private final List<Fault> faults = new ArrayList<>();
  private final List<Assumption> assumptions = new ArrayList<>();
  private final List<Plan> plans = new ArrayList<>();
  private final List<String> warnings = new ArrayList<>();

  private record Plan(
      Wanted.Transmittance wanted, int[] warm, int[] cold, int[] floating, double widthM) {}

  /** Cut-off planes in one line that together run from a warm surface to a cold one. */
  private record Side(Direction run, int warmVertex, int coldVertex) {}

  EffectiveTransmittances(Detail detail, Outline outline) {
    this.detail = detail;
    this.outline = outline;
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Transmittance transmittance) {
        plan(transmittance);
      }
    }
  }

  List<Fault> faults() {
    return faults;
  }

  List<Assumption> assumptions() {
    return assumptions;
  }

  List<String> warnings() {
    return warnings;
  }

  boolean any() {
    return !plans.isEmpty();
  }

  private void plan(Wanted.Transmittance wanted) {
    SpaceGroups groups = new SpaceGroups(detail, "U", wanted.of());
    int[] warm = groups.indices(wanted.warm());
    int[] cold = groups.indices(wanted.cold());
    groups.checkApart(warm, cold);
    faults.addAll(groups.faults());
    if (!groups.faults().isEmpty()) {
      return;
    }
    double width;
    if (wanted.widthM().isPresent()) {
      width = wanted.widthM().getAsDouble();
      if (!(width > 0) || !Double.isFinite(width)) {
        faults.add(new Fault("U", wanted.of(), "its width must be more than 0", Optional.empty()));
        return;
      }
      warnOfWidth(wanted.of(), width, sides(warm, cold));
    } else {
      Optional<Double> found = width(wanted, warm, cold);
      if (found.isEmpty()) {
        return;
      }
      width = found.get();
    }
    int[] floating = Couplings.floatingBeside(detail, warm, cold);
    plans.add(new Plan(wanted, warm, cold, floating, width));
  }

  private Optional<Double> width(Wanted.Transmittance wanted, int[] warm, int[] cold) {
    List<Side> sides = sides(warm, cold);
    if (sides.size() != 2) {
      faults.add(
          new Fault(
              "U",
              wanted.of(),
              "state its width: "
                  + sides.size()
                  + " cut-off planes run from one side to the other, not two",
              Optional.empty()));
      return Optional.empty();
    }
    Side a = sides.get(0);
    Side b = sides.get(1);
    if (!parallel(a, b)) {
      faults.add(
          new Fault(
              "U",
              wanted.of(),
              "state its width: the two cut-off planes are not parallel",
              Optional.of(outline.point(a.warmVertex()))));
      return Optional.empty();
    }
    double warmWidth = outline.distance(a.warmVertex(), b.warmVertex());
    assumptions.add(
        new Assumption(
            "width of " + wanted.of(),
            Wording.length(warmWidth) + " between the two cut-off planes, along the face",
            "by convention of this tool"));
    return Optional.of(warmWidth);
  }

  private boolean parallel(Side a, Side b) {
    double warmWidth = outline.distance(a.warmVertex(), b.warmVertex());
    double coldWidth = outline.distance(a.coldVertex(), b.coldVertex());
    return Math.abs(a.run().cross(b.run())) <= FlankLayers.PARALLEL_SINE
        && a.run().dot(b.run()) < 0
        && Math.abs(warmWidth - coldWidth) <= FlankLayers.PARALLEL_SINE * warmWidth;
  }

  private void warnOfWidth(String of, double typed, List<Side> sides) {
    if (sides.size() != 2 || !parallel(sides.get(0), sides.get(1))) {
      return;
    }
    double drawn = outline.distance(sides.get(0).warmVertex(), sides.get(1).warmVertex());
    if (Math.abs(typed - drawn) > TYPED_WIDTH_DIFFERS * drawn) {
      warnings.add(
          "U of "
              + of
              + ": its typed width "
              + Wording.length(typed)
              + " differs from the "
              + Wording.length(drawn)
              + " between the two cut-off planes");
    }
  }

  private List<Side> sides(int[] warm, int[] cold) {
    List<CutOffPlane> planes = outline.conditions().cutOffPlanes();
    List<Side> sides = new ArrayList<>();
    boolean[] used = new boolean[planes.size()];
    for (int i = 0; i < planes.size(); i++) {
      if (used[i]) {
        continue;
      }
      Direction run = outline.direction(planes.get(i).first(), planes.get(i).last());
      List<Integer> warmEnds = new ArrayList<>();
      List<Integer> coldEnds = new ArrayList<>();
      for (int j = i; j < planes.size(); j++) {
        if (!used[j] && inLine(run, planes.get(i), planes.get(j))) {
          used[j] = true;
          addEnds(planes.get(j), warm, warmEnds);
          addEnds(planes.get(j), cold, coldEnds);
        }
      }
      for (int k = 0; k < Math.min(warmEnds.size(), coldEnds.size()); k++) {
        sides.add(new Side(run, warmEnds.get(k), coldEnds.get(k)));
      }
    }
    return sides;
  }

  /** Adds the ends of a plane at which the outline goes on facing one of the spaces. */
  private void addEnds(CutOffPlane plane, int[] spaces, List<Integer> ends) {
    if (Couplings.contains(spaces, space(outline.previous(plane.edges().get(0))))) {
      ends.add(plane.first());
    }
    int lastEdge = plane.edges().get(plane.edges().size() - 1);
    if (Couplings.contains(spaces, space(outline.next(lastEdge)))) {
      ends.add(plane.last());
    }
  }

  private int space(int edge) {
    return edge < 0 ? -1 : outline.conditions().space(edge);
  }

  private boolean inLine(Direction run, CutOffPlane a, CutOffPlane b) {
    double reach = outline.distance(a.first(), b.last());
    return run.dot(outline.direction(b.first(), b.last())) > 0
        && Math.abs(outline.across(run, a.first(), b.first())) <= Outline.offset(reach)
        && Math.abs(outline.across(run, a.first(), b.last())) <= Outline.offset(reach);
  }

  List<Result.EffectiveTransmittance> evaluate(Couplings couplings) {
    List<Result.EffectiveTransmittance> all = new ArrayList<>();
    for (Plan plan : plans) {
      Quantity coupling = couplings.between(plan.warm(), plan.cold(), plan.floating());
      Quantity u = new Total().add(1 / plan.widthM(), coupling).quantity();
      all.add(
          new Result.EffectiveTransmittance(
              plan.wanted().of(),
              plan.wanted().warm(),
              plan.wanted().cold(),
              u,
              Total.inverse(u),
              plan.widthM(),
              Combination.tolerance(
                  1 / plan.widthM(),
                  couplings.byPart(plan.warm(), plan.cold(), Map.of(), plan.floating()),
                  u)));
    }
    return all;
  }
}
