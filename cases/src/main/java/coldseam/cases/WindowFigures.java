package coldseam.cases;

import coldseam.cases.WindowDraft.DraftInfill;
import coldseam.cases.WindowDraft.DraftProfile;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;

/** Reads the figures of a window: typed, or taken from cases that are solved for it. */
final class WindowFigures {
  private static final String CASE = "case";
  private static final String VARIANT = "variant";
  private static final List<String> PROFILE_KEYS = List.of("U_f", "width", "psi_g", CASE, VARIANT);
  private static final List<String> INFILL_KEYS = List.of("U_g", "U_p", CASE, VARIANT);
  private static final List<String> WIDTH_KEYS = List.of("inside", "outside");
  private static final List<String> PSI_KEYS = List.of(CASE, VARIANT, "psi");

  private final Pass pass;
  private final Problems problems;
  private final OtherCases others;
  private final List<WindowCase.Part> parts = new ArrayList<>();

  WindowFigures(Pass pass, OtherCases others) {
    this.pass = pass;
    this.problems = pass.problems();
    this.others = others;
  }

  /** The cases that figures are taken from, each once. */
  List<WindowCase.Part> parts() {
    return parts;
  }

  /** A case with its place among the parts. */
  private record Source(int part, String words, Detail detail) {}

  /**
   * Reads a profile.
   *
   * @param entry its name and what it is
   * @param infills names of the glazings
   * @return the profile, or empty if a mistake was reported
   */
  Optional<DraftProfile> profile(Node.Entry entry, Collection<String> infills) {
    int before = problems.count();
    String what = "profile `" + Node.shortened(entry.key().text()) + "`";
    Fields fields = new Fields(problems, what, entry.value(), PROFILE_KEYS);
    Map<String, WindowFigure> edges = new LinkedHashMap<>();
    Optional<WindowFigure> edge = edges(fields, what, infills, edges);
    if (fields.has(CASE)) {
      return profileOfCase(fields, what, edge, edges, before);
    }
    refuseVariant(fields);
    Optional<Node> u = fields.require("U_f", "add `U_f: …`, or `case: FILE` of a frame");
    Optional<Bracket> typed =
        u.isEmpty() ? Optional.empty() : FlankReader.bracket(pass, u.get(), "`U_f` of " + what);
    Optional<Node> width = fields.require("width", "add `width: …`, the projected width");
    double[] widths = width.isEmpty() ? new double[2] : widths(width.get(), what);
    if (edge.isEmpty() && edges.isEmpty() && !fields.reported("psi_g") && !fields.has("psi_g")) {
      problems.add(entry.key(), what + " has no `psi_g`", "add `psi_g: …`, ψ of the glass edge");
    }
    if (problems.count() > before || typed.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new DraftProfile(
            OptionalInt.empty(),
            widths[0],
            widths[1],
            new WindowFigure.Typed(typed.get()),
            edge,
            edges));
  }

  private Optional<DraftProfile> profileOfCase(
      Fields fields,
      String what,
      Optional<WindowFigure> typedEdge,
      Map<String, WindowFigure> edges,
      int before) {
    fields.refuseBoth(CASE, "U_f", "it is a result of the case");
    fields.refuseBoth(CASE, "width", "it is a result of the case");
    Optional<Source> source = source(fields);
    if (source.isEmpty()) {
      return Optional.empty();
    }
    Optional<WindowFigure> edge = typedEdge;
    if (!asksForFrame(source.get().detail())) {
      problems.add(
          fields.get(CASE).get(),
          "the case `" + source.get().words() + "` asks for no frame",
          "give it `frame: {between: [warm, cold]}`");
    } else if (edge.isEmpty() && glazed(source.get().detail())) {
      edge = figure(source.get(), WindowFigure.Kind.GLASS_EDGE, "");
    } else if (edge.isEmpty() && edges.isEmpty() && problems.count() == before) {
      problems.add(
          fields.get(CASE).get(),
          "the case `" + source.get().words() + "` draws no glazing, so that ψ_g is not known",
          "mark its glazing by `part: glazing`, or add `psi_g: …` here");
    }
    if (problems.count() > before) {
      return Optional.empty();
    }
    pass.assume(
        "U_f and width of "
            + what
            + (typedEdge.isEmpty() && edge.isPresent() ? ", and its ψ_g" : ""),
        "results of a case",
        "case " + source.get().words());
    return Optional.of(
        new DraftProfile(
            OptionalInt.of(source.get().part()),
            0,
            0,
            new WindowFigure.OfCase(source.get().part(), WindowFigure.Kind.FRAME, ""),
            edge,
            edges));
  }

  private static Optional<WindowFigure> figure(Source source, WindowFigure.Kind kind, String name) {
    return Optional.of(new WindowFigure.OfCase(source.part(), kind, name));
  }

  /** One ψ_g for every glazing, or one by name. */
  private Optional<WindowFigure> edges(
      Fields fields, String what, Collection<String> infills, Map<String, WindowFigure> edges) {
    Optional<Node> node = fields.get("psi_g");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    if (!(node.get() instanceof Node.Mapping)) {
      return psi(node.get(), "`psi_g` of " + what);
    }
    Fields byName = new Fields(problems, "`psi_g` of " + what, node.get(), List.copyOf(infills));
    for (String infill : infills) {
      if (byName.has(infill)) {
        psi(byName.get(infill).get(), "`psi_g` with `" + infill + "`")
            .ifPresent(psi -> edges.put(infill, psi));
      }
    }
    return Optional.empty();
  }

  private double[] widths(Node node, String what) {
    if (node instanceof Node.Scalar) {
      double one = pass.quantities().read(node, "`width` of " + what, Place.SIZE);
      return new double[] {one, one};
    }
    Fields fields = new Fields(problems, "`width` of " + what, node, WIDTH_KEYS);
    double[] widths = new double[2];
    for (int i = 0; i < widths.length; i++) {
      Optional<Node> value = fields.require(WIDTH_KEYS.get(i), "give both, or one `width: …`");
      widths[i] =
          value.isEmpty()
              ? Double.NaN
              : pass.quantities()
                  .read(value.get(), "`" + WIDTH_KEYS.get(i) + "` width of " + what, Place.SIZE);
    }
    return widths;
  }

  /**
   * Reads a glazing or a panel.
   *
   * @param entry its name and what it is
   * @return the glazing, or empty if a mistake was reported
   */
  Optional<DraftInfill> infill(Node.Entry entry) {
    int before = problems.count();
    String what = "glazing `" + Node.shortened(entry.key().text()) + "`";
    Fields fields = new Fields(problems, what, entry.value(), INFILL_KEYS);
    fields.refuseBoth("U_g", "U_p", "it is glass or a panel");
    if (fields.has(CASE)) {
      fields.refuseBoth(CASE, "U_g", "it is a result of the case");
      fields.refuseBoth(CASE, "U_p", "it is a result of the case");
      Optional<Source> source = source(fields);
      if (source.isPresent()
          && !(asksForFrame(source.get().detail()) && glazed(source.get().detail()))) {
        problems.add(
            fields.get(CASE).get(),
            "the case `" + source.get().words() + "` draws no glazing of a frame",
            "mark its glazing by `part: glazing`, or type `U_g: …`");
      }
      if (source.isEmpty() || problems.count() > before) {
        return Optional.empty();
      }
      pass.assume("U_g of " + what, "as drawn in a case", "case " + source.get().words());
      return Optional.of(
          new DraftInfill(
              false, figure(source.get(), WindowFigure.Kind.GLAZING, "").orElseThrow()));
    }
    refuseVariant(fields);
    boolean opaque = fields.has("U_p");
    Optional<Node> u =
        opaque
            ? fields.get("U_p")
            : fields.require("U_g", "add `U_g: …`, or `U_p: …` if it is a panel");
    Optional<Bracket> typed =
        u.isEmpty()
            ? Optional.empty()
            : FlankReader.bracket(pass, u.get(), "`" + (opaque ? "U_p" : "U_g") + "` of " + what);
    return typed.isEmpty() || problems.count() > before
        ? Optional.empty()
        : Optional.of(new DraftInfill(opaque, new WindowFigure.Typed(typed.get())));
  }

  /** A typed ψ, one number or {@code [lower, upper]}. */
  Optional<WindowFigure> psi(Node node, String what) {
    if (node instanceof Node.Sequence) {
      Optional<double[]> ends = pass.quantities().pair(node, what, Place.LINEAR_TRANSMITTANCE);
      if (ends.isPresent() && ends.get()[0] > ends.get()[1]) {
        problems.add(node, what + " runs downwards", "write `[lower, upper]`");
        return Optional.empty();
      }
      return ends.isEmpty()
          ? Optional.empty()
          : Optional.of(new WindowFigure.Typed(new Bracket(ends.get()[0], ends.get()[1])));
    }
    double one = pass.quantities().read(node, what, Place.LINEAR_TRANSMITTANCE);
    return Double.isNaN(one)
        ? Optional.empty()
        : Optional.of(new WindowFigure.Typed(Bracket.of(one)));
  }

  /** ψ of the joint with the wall: typed, or {@code {case: FILE, psi: NAME}}. */
  Optional<WindowFigure> installed(Node node, String what) {
    if (!(node instanceof Node.Mapping)) {
      return psi(node, what);
    }
    Fields fields = new Fields(problems, what, node, PSI_KEYS);
    fields.require(CASE, "write `{case: FILE, psi: NAME}`, or a number");
    Optional<Node> named = fields.require("psi", "add `psi: NAME`, the name of a ψ of the case");
    Optional<Source> source = fields.has(CASE) ? source(fields) : Optional.empty();
    if (source.isEmpty() || named.isEmpty()) {
      return Optional.empty();
    }
    Optional<String> name = Fields.text(problems, "`psi`", named.get());
    if (name.isEmpty()) {
      return Optional.empty();
    }
    List<String> known = new ArrayList<>();
    for (Wanted wanted : source.get().detail().wanted()) {
      if (wanted instanceof Wanted.Psi psi) {
        known.add(psi.name());
      }
    }
    if (!known.contains(name.get())) {
      problems.add(
          named.get(),
          "the case `" + source.get().words() + "` has no ψ `" + Node.shortened(name.get()) + "`",
          known.isEmpty()
              ? "give it `psi: {NAME: {between: [warm, cold], dimensions: …}}`"
              : Problems.suggestion(name.get(), known));
      return Optional.empty();
    }
    pass.assume(
        "ψ of the installation, " + what,
        "ψ `" + name.get() + "` of a case",
        "case " + source.get().words());
    return figure(source.get(), WindowFigure.Kind.PSI, name.get());
  }

  private void refuseVariant(Fields fields) {
    if (fields.has(VARIANT)) {
      problems.add(
          fields.keyNode(VARIANT),
          fields.what() + " has a `variant` but no `case`",
          "add `case: FILE`, or leave it away");
    }
  }

  private Optional<Source> source(Fields fields) {
    Node node = fields.get(CASE).get();
    Optional<OtherCases.Named> named = others.named(node, fields.get(VARIANT));
    if (named.isEmpty()) {
      return Optional.empty();
    }
    OtherCases.Named found = named.get();
    Detail detail;
    try {
      detail = found.detail();
    } catch (CaseException e) {
      problems.add(node, "its case cannot be read: " + e.getMessage(), "mend that case first");
      return Optional.empty();
    }
    int part = -1;
    for (int i = 0; i < parts.size(); i++) {
      WindowCase.Part known = parts.get(i);
      if (known.from() == found.read() && known.variant().equals(found.variant())) {
        part = i;
      }
    }
    if (part < 0) {
      part = parts.size();
      parts.add(new WindowCase.Part(found.words(), found.read(), found.variant()));
    }
    return Optional.of(new Source(part, found.words(), detail));
  }

  private static boolean asksForFrame(Detail detail) {
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Frame) {
        return true;
      }
    }
    return false;
  }

  private static boolean glazed(Detail detail) {
    for (Area area : detail.areas()) {
      if (area.role() == Area.Role.GLAZING) {
        return true;
      }
    }
    return false;
  }
}
