package coldseam.cases;

import coldseam.cases.WindowDraft.DraftBars;
import coldseam.cases.WindowDraft.DraftDivider;
import coldseam.cases.WindowDraft.DraftInfill;
import coldseam.cases.WindowDraft.DraftProfile;
import coldseam.solver.result.Result;
import coldseam.solver.window.Sides;
import coldseam.solver.window.Window;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads one window file. */
final class WindowReader {
  private static final String WINDOW = "window";
  private static final List<String> KEYS =
      List.of("coldseam", "title", "note", "unit", "values", WINDOW);
  private static final List<String> WINDOW_KEYS =
      List.of(
          "width",
          "height",
          "profiles",
          "glazings",
          "frame",
          "mullions",
          "transoms",
          "glazing",
          "bars",
          "installed");
  private static final List<String> SIDES = List.of("top", "bottom", "left", "right");
  private static final List<String> DIVIDER_KEYS = List.of("profile", "at");
  private static final List<String> BAR_KEYS = List.of("psi", "length", "upright", "level");

  private final Path file;
  private final Problems problems;
  private Pass pass;
  private WindowFigures figures;

  WindowReader(Path file) {
    this.file = file;
    this.problems = new Problems(file.toString());
  }

  WindowCase read() throws CaseException {
    Optional<Node> root = YamlTree.read(FileText.read(file), problems);
    if (root.isEmpty()) {
      throw new CaseException(problems.inOrder());
    }
    Fields top = new Fields(problems, "a window file", root.get(), KEYS);
    Heading heading = new Heading(problems, top, "window");
    heading.checkVersion();
    String title = heading.title();
    heading.note();
    LengthUnit unit = heading.unit();
    NamedValues named = new NamedValues(problems, unit);
    for (Node.Entry entry : heading.values()) {
      named.put(entry.key().text(), entry.value());
    }
    named.workOutAll();
    OpenedDrawings drawings = new OpenedDrawings(List.of());
    pass = new Pass(file, problems, new Quantities(problems, named, unit), drawings);
    if (!top.has("unit")) {
      pass.assume("unit of bare lengths", unit.name(), "by convention of this tool");
    }
    OtherCases others = new OtherCases(pass, List.of(CaseReader.normalised(file)), new HashMap<>());
    figures = new WindowFigures(pass, others);
    Optional<Node> node = top.require(WINDOW, "add `window:` with its sizes and profiles");
    Optional<WindowDraft> draft = node.isEmpty() ? Optional.empty() : draft(node.get());
    if (!problems.none() || draft.isEmpty()) {
      throw new CaseException(problems.inOrder());
    }
    conventions(draft.get());
    WindowCase read =
        new WindowCase(
            file,
            title,
            unit,
            top.keyNode(WINDOW),
            draft.get(),
            figures.parts(),
            pass.assumptions());
    if (figures.parts().isEmpty()) {
      // Nothing is missing: mistakes of the sizes show now, not when it is solved.
      Window window = read.window(List.<Result>of());
      read.transmittance(window);
    }
    return read;
  }

  private void conventions(WindowDraft draft) {
    String source = "ISO 10077-1, geometrical characteristics (from memory)";
    pass.assume(
        "areas and perimeters",
        "frame by the larger of its two projected widths, glass what is left, its perimeter the"
            + " larger of the two sides",
        source);
    pass.assume("corners of the frame", "mitred, each profile half of a corner", source);
    if (!draft.mullions().isEmpty() && !draft.transoms().isEmpty()) {
      pass.assume("where they cross", "mullions run through", "by convention of this tool");
    }
  }

  private Optional<WindowDraft> draft(Node node) {
    int before = problems.count();
    Fields fields = new Fields(problems, "`window`", node, WINDOW_KEYS);
    double width = size(fields, "width");
    double height = size(fields, "height");
    Map<String, DraftInfill> infills = new LinkedHashMap<>();
    Optional<Node> glazings = fields.require("glazings", "add `glazings: {double: {U_g: 1.1}}`");
    if (glazings.isPresent()) {
      for (Node.Entry entry : Fields.named(problems, "`glazings`", glazings.get())) {
        figures.infill(entry).ifPresent(infill -> infills.put(entry.key().text(), infill));
      }
    }
    Map<String, DraftProfile> profiles = new LinkedHashMap<>();
    Optional<Node> profileNode =
        fields.require(
            "profiles", "add `profiles: {sash: {U_f: 1.3, width: 110 mm, psi_g: 0.08}}`");
    if (profileNode.isPresent()) {
      for (Node.Entry entry : Fields.named(problems, "`profiles`", profileNode.get())) {
        figures
            .profile(entry, infills.keySet())
            .ifPresent(profile -> profiles.put(entry.key().text(), profile));
      }
    }
    if (problems.count() > before) {
      // Names that were not understood would be reported again wherever they are used.
      return Optional.empty();
    }
    Optional<Sides<String>> frame = frame(fields, profiles.keySet());
    List<DraftDivider> mullions = dividers(fields, "mullions", profiles.keySet(), width);
    List<DraftDivider> transoms = dividers(fields, "transoms", profiles.keySet(), height);
    List<List<String>> panes =
        panes(fields, infills.keySet(), transoms.size() + 1, mullions.size() + 1);
    List<DraftBars> bars = bars(fields);
    Optional<Sides<WindowFigure>> installation = installation(fields);
    if (problems.count() > before || frame.isEmpty()) {
      return Optional.empty();
    }
    return Optional.of(
        new WindowDraft(
            width,
            height,
            profiles,
            infills,
            frame.get(),
            mullions,
            transoms,
            panes,
            bars,
            installation));
  }

  private double size(Fields fields, String key) {
    Optional<Node> node = fields.require(key, "add `" + key + ": …`, the overall " + key);
    return node.isEmpty()
        ? Double.NaN
        : pass.quantities().read(node.get(), "`" + key + "` of `window`", Place.SIZE);
  }

  private Optional<Sides<String>> frame(Fields fields, Collection<String> profiles) {
    Optional<Node> node = fields.get("frame");
    if (node.isEmpty()) {
      if (profiles.size() == 1) {
        return Optional.of(Sides.all(profiles.iterator().next()));
      }
      if (!fields.reported("frame")) {
        problems.add(
            fields.node(),
            "`window` does not say which profile is its frame",
            "add `frame: NAME`, or `frame: {top: …, bottom: …, left: …, right: …}`");
      }
      return Optional.empty();
    }
    if (node.get() instanceof Node.Scalar) {
      Optional<String> one = name(node.get(), "profile", profiles);
      return one.isEmpty() ? Optional.empty() : Optional.of(Sides.all(one.get()));
    }
    Fields sides = new Fields(problems, "`frame`", node.get(), SIDES);
    List<String> names = new ArrayList<>();
    for (String side : SIDES) {
      Optional<Node> value = sides.require(side, "add `" + side + ": PROFILE`");
      if (value.isPresent()) {
        name(value.get(), "profile", profiles).ifPresent(names::add);
      }
    }
    return names.size() < SIDES.size()
        ? Optional.empty()
        : Optional.of(new Sides<>(names.get(0), names.get(1), names.get(2), names.get(3)));
  }

  /** A name that must be one of those given. */
  private Optional<String> name(Node node, String what, Collection<String> known) {
    Optional<String> typed = Fields.text(problems, "the name of a " + what, node);
    if (typed.isPresent() && !known.contains(typed.get())) {
      problems.add(
          node,
          "`" + Node.shortened(typed.get()) + "` is no " + what + " of this window",
          Problems.suggestion(typed.get(), known));
      return Optional.empty();
    }
    return typed;
  }

  private List<DraftDivider> dividers(
      Fields fields, String key, Collection<String> profiles, double whole) {
    List<DraftDivider> dividers = new ArrayList<>();
    for (Node item : list(fields, key)) {
      String what = "an entry of `" + key + "`";
      Fields one = new Fields(problems, what, item, DIVIDER_KEYS);
      Optional<Node> profile = one.require("profile", "add `profile: NAME`");
      Optional<Node> at =
          one.require(
              "at",
              "add `at: …`, the distance of its middle from the "
                  + (key.equals("mullions") ? "left" : "upper")
                  + " edge of the window");
      if (profile.isEmpty() || at.isEmpty()) {
        continue;
      }
      Optional<String> name = name(profile.get(), "profile", profiles);
      double centre = pass.quantities().read(at.get(), "`at`", Place.SIZE);
      if (name.isEmpty() || Double.isNaN(centre)) {
        continue;
      }
      double last = dividers.isEmpty() ? 0 : dividers.get(dividers.size() - 1).centreM();
      if (centre >= whole) {
        problems.add(at.get(), "`at` lies outside the window", "it is less than its size");
      } else if (centre <= last) {
        problems.add(at.get(), "`" + key + "` are not in order", "list them from the edge on");
      } else {
        dividers.add(new DraftDivider(name.get(), centre));
      }
    }
    return dividers;
  }

  private List<Node> list(Fields fields, String key) {
    Optional<Node> node = fields.get(key);
    if (node.isEmpty()) {
      return List.of();
    }
    if (node.get() instanceof Node.Sequence list) {
      return list.items();
    }
    problems.add(
        node.get(),
        "`" + key + "` is a list, not " + Node.describe(node.get()),
        "write `[{profile: NAME, at: …}]`");
    return List.of();
  }

  private List<List<String>> panes(
      Fields fields, Collection<String> infills, int rows, int columns) {
    Optional<Node> node = fields.get("glazing");
    if (node.isEmpty() || node.get() instanceof Node.Scalar) {
      Optional<String> one = Optional.empty();
      if (node.isPresent()) {
        one = name(node.get(), "glazing", infills);
      } else if (infills.size() == 1) {
        one = Optional.of(infills.iterator().next());
      } else if (!fields.reported("glazing")) {
        problems.add(
            fields.node(),
            "`window` does not say which glazing is where",
            "add `glazing: NAME`, or rows from top to bottom, `glazing: [[NAME, NAME]]`");
      }
      List<List<String>> all = new ArrayList<>();
      for (int row = 0; row < rows && one.isPresent(); row++) {
        all.add(Collections.nCopies(columns, one.get()));
      }
      return all;
    }
    if (!(node.get() instanceof Node.Sequence list)) {
      problems.add(
          node.get(), "`glazing` is a name or a list of rows", "e.g. `[[double, double]]`");
      return List.of();
    }
    List<List<String>> all = new ArrayList<>();
    for (Node row : list.items()) {
      List<String> names = new ArrayList<>();
      List<Node> items = row instanceof Node.Sequence inner ? inner.items() : List.of(row);
      for (Node item : items) {
        name(item, "glazing", infills).ifPresent(names::add);
      }
      if (items.size() != columns) {
        problems.add(
            row,
            "a row of `glazing` has " + items.size() + " panes; mullions make " + columns,
            "name one glazing for each pane, from left to right");
      }
      all.add(names);
    }
    if (list.items().size() != rows) {
      problems.add(
          list,
          "`glazing` has " + list.items().size() + " rows; transoms make " + rows,
          "write one row for each, from top to bottom");
    }
    return all;
  }

  private List<DraftBars> bars(Fields fields) {
    List<DraftBars> bars = new ArrayList<>();
    if (!fields.has("bars")) {
      return bars;
    }
    Node node = fields.get("bars").get();
    for (Node.Entry entry :
        Fields.named(problems, "`bars`", node, BAR_KEYS, "a glazing bar", "inlaid")) {
      String name = entry.key().text();
      String what = "bars `" + Node.shortened(name) + "`";
      Fields one = new Fields(problems, what, entry.value(), BAR_KEYS);
      Optional<Node> psi = one.require("psi", "add `psi: …`, ψ_gb in W/(m K)");
      Optional<WindowFigure> figure =
          psi.isEmpty() ? Optional.empty() : figures.psi(psi.get(), "`psi` of " + what);
      OptionalDouble length = OptionalDouble.empty();
      if (one.has("length")) {
        Node value = one.get("length").get();
        length =
            OptionalDouble.of(pass.quantities().read(value, "`length` of " + what, Place.EXTENT));
      }
      int upright = count(one, "upright");
      int level = count(one, "level");
      one.refuseBoth("length", "upright", "give the length, or how many there are in a pane");
      one.refuseBoth("length", "level", "give the length, or how many there are in a pane");
      if (length.isEmpty() && upright + level == 0 && !one.reported("length")) {
        problems.add(
            one.node(),
            what + " have no length",
            "add `length: …`, or how many run through each pane: `upright: 1`, `level: 2`");
      }
      if (figure.isPresent()) {
        bars.add(new DraftBars(name, figure.get(), length, upright, level));
      }
    }
    return bars;
  }

  private int count(Fields fields, String key) {
    Optional<Node> node = fields.get(key);
    if (node.isEmpty()) {
      return 0;
    }
    double count =
        pass.quantities().read(node.get(), "`" + key + "` of " + fields.what(), Place.COUNT);
    return Double.isNaN(count) ? 0 : (int) count;
  }

  private Optional<Sides<WindowFigure>> installation(Fields fields) {
    Optional<Node> node = fields.get("installed");
    if (node.isEmpty()) {
      return Optional.empty();
    }
    boolean bySide = false;
    if (node.get() instanceof Node.Mapping mapping) {
      for (Node.Entry entry : mapping.entries()) {
        bySide |= SIDES.contains(entry.key().text());
      }
    }
    if (!bySide) {
      Optional<WindowFigure> one = figures.installed(node.get(), "`installed`");
      return one.isEmpty() ? Optional.empty() : Optional.of(Sides.all(one.get()));
    }
    Fields sides = new Fields(problems, "`installed`", node.get(), SIDES);
    List<WindowFigure> all = new ArrayList<>();
    for (String side : SIDES) {
      Optional<Node> value = sides.require(side, "add `" + side + ": …`, ψ in W/(m K)");
      if (value.isPresent()) {
        figures.installed(value.get(), "`" + side + "` of `installed`").ifPresent(all::add);
      }
    }
    return all.size() < SIDES.size()
        ? Optional.empty()
        : Optional.of(new Sides<>(all.get(0), all.get(1), all.get(2), all.get(3)));
  }
}
