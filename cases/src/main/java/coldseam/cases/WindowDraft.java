package coldseam.cases;

import coldseam.solver.conduction.Quantity;
import coldseam.solver.result.Result;
import coldseam.solver.window.Bars;
import coldseam.solver.window.Divider;
import coldseam.solver.window.Infill;
import coldseam.solver.window.Profile;
import coldseam.solver.window.Sides;
import coldseam.solver.window.Window;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;

/**
 * A window as read, before the cases it takes figures from are solved.
 *
 * @param widthM overall width, m
 * @param heightM overall height, m
 * @param profiles by name
 * @param infills by name
 * @param frame names of profiles
 * @param mullions profile and place
 * @param transoms profile and place
 * @param panes names of glazings
 * @param bars glazing bars
 * @param installation ψ by side
 */
record WindowDraft(
    double widthM,
    double heightM,
    Map<String, DraftProfile> profiles,
    Map<String, DraftInfill> infills,
    Sides<String> frame,
    List<DraftDivider> mullions,
    List<DraftDivider> transoms,
    List<List<String>> panes,
    List<DraftBars> bars,
    Optional<Sides<WindowFigure>> installation) {
  /**
   * A profile; widths come from its case if there is one.
   *
   * @param part place of its case
   */
  record DraftProfile(
      OptionalInt part,
      double insideM,
      double outsideM,
      WindowFigure u,
      Optional<WindowFigure> edge,
      Map<String, WindowFigure> edges) {}

  record DraftInfill(boolean opaque, WindowFigure u) {}

  record DraftDivider(String profile, double centreM) {}

  record DraftBars(String name, WindowFigure psi, OptionalDouble lengthM, int upright, int level) {}

  /** A figure that a case's result does not have. */
  static final class MissingFigure extends RuntimeException {
    private static final long serialVersionUID = 1L;

    MissingFigure(String message) {
      super(message);
    }
  }

  /**
   * Puts the figures in.
   *
   * @param results of the cases
   * @return the window
   * @throws MissingFigure if a result lacks one
   */
  Window window(List<Result> results) {
    Map<String, Profile> known = new HashMap<>();
    for (Map.Entry<String, DraftProfile> entry : profiles.entrySet()) {
      known.put(entry.getKey(), profile(entry.getKey(), entry.getValue(), results));
    }
    Map<String, Infill> filled = new HashMap<>();
    for (Map.Entry<String, DraftInfill> entry : infills.entrySet()) {
      DraftInfill infill = entry.getValue();
      Quantity u = figure(infill.u(), results, "U of `" + entry.getKey() + "`");
      filled.put(entry.getKey(), new Infill(entry.getKey(), infill.opaque(), u));
    }
    List<List<Infill>> rows = new ArrayList<>();
    for (List<String> row : panes) {
      List<Infill> one = new ArrayList<>();
      for (String name : row) {
        one.add(filled.get(name));
      }
      rows.add(one);
    }
    List<Bars> kinds = new ArrayList<>();
    for (DraftBars bar : bars) {
      Quantity psi = figure(bar.psi(), results, "ψ of bars `" + bar.name() + "`");
      kinds.add(new Bars(bar.name(), psi, bar.lengthM(), bar.upright(), bar.level()));
    }
    return new Window(
        widthM,
        heightM,
        new Sides<>(
            known.get(frame.top()),
            known.get(frame.bottom()),
            known.get(frame.left()),
            known.get(frame.right())),
        dividers(mullions, known),
        dividers(transoms, known),
        rows,
        kinds,
        installed(results));
  }

  /**
   * Says where a ψ_g from a case was solved with another glazing than the window has.
   *
   * @param results of the cases
   * @return sentences
   */
  List<String> warnings(List<Result> results) {
    List<String> warnings = new ArrayList<>();
    for (Map.Entry<String, DraftProfile> entry : profiles.entrySet()) {
      Optional<WindowFigure> edge = entry.getValue().edge();
      if (edge.isEmpty() || !(edge.get() instanceof WindowFigure.OfCase of)) {
        continue;
      }
      Optional<Quantity> solved =
          new WindowFigure.OfCase(of.part(), WindowFigure.Kind.GLAZING, "").of(results);
      for (Map.Entry<String, DraftInfill> infill : infills.entrySet()) {
        Optional<Quantity> used = infill.getValue().u().of(results);
        if (solved.isEmpty()
            || used.isEmpty()
            || entry.getValue().edges().containsKey(infill.getKey())
            || !apart(solved.get().value(), used.get().value())) {
          continue;
        }
        warnings.add(
            "the psi_g of profile `"
                + entry.getKey()
                + "` was solved with a glazing of U "
                + Figures.of(solved.get().value())
                + " W/(m²·K), but `"
                + infill.getKey()
                + "` has "
                + Figures.of(used.get().value())
                + ": a psi_g belongs to its own glazing and spacer");
      }
    }
    return warnings;
  }

  /** U are stated to two digits after the point: half of the last one is the same glazing. */
  private static boolean apart(double one, double other) {
    return Math.abs(one - other) > 0.01 * Math.max(Math.abs(one), Math.abs(other));
  }

  private static List<Divider> dividers(List<DraftDivider> drafts, Map<String, Profile> known) {
    List<Divider> dividers = new ArrayList<>();
    for (DraftDivider draft : drafts) {
      dividers.add(new Divider(known.get(draft.profile()), draft.centreM()));
    }
    return dividers;
  }

  private static Profile profile(String name, DraftProfile draft, List<Result> results) {
    double inside = draft.insideM();
    double outside = draft.outsideM();
    if (draft.part().isPresent()) {
      Optional<Result.Frame> frame = results.get(draft.part().getAsInt()).frame();
      if (frame.isEmpty()) {
        throw new MissingFigure("the case of profile `" + name + "` gives no frame");
      }
      inside = frame.get().innerM();
      outside = frame.get().outerM();
      double width = frame.get().width().valueM();
      if (Math.abs(width - Math.max(inside, outside)) > 1e-9 * width) {
        // Typed in the case: that width is what U_f refers to.
        inside = width;
        outside = width;
      }
    }
    Map<String, Quantity> edges = new HashMap<>();
    for (Map.Entry<String, WindowFigure> edge : draft.edges().entrySet()) {
      edges.put(edge.getKey(), figure(edge.getValue(), results, "ψ of the edge of `" + name + "`"));
    }
    Optional<Quantity> edge = Optional.empty();
    if (draft.edge().isPresent()) {
      edge = Optional.of(figure(draft.edge().get(), results, "ψ of the edge of `" + name + "`"));
    }
    Quantity u = figure(draft.u(), results, "U_f of `" + name + "`");
    return new Profile(name, inside, outside, u, edge, edges);
  }

  private Optional<Sides<Quantity>> installed(List<Result> results) {
    if (installation.isEmpty()) {
      return Optional.empty();
    }
    Sides<WindowFigure> psi = installation.get();
    String what = "ψ of the installation";
    return Optional.of(
        new Sides<>(
            figure(psi.top(), results, what),
            figure(psi.bottom(), results, what),
            figure(psi.left(), results, what),
            figure(psi.right(), results, what)));
  }

  private static Quantity figure(WindowFigure figure, List<Result> results, String what) {
    Optional<Quantity> found = figure.of(results);
    if (found.isEmpty()) {
      throw new MissingFigure(what + " does not come out of its case");
    }
    return found.get();
  }
}
