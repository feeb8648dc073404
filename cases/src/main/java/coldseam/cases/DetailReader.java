package coldseam.cases;

import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Stretch;
import coldseam.solver.detail.View;
import coldseam.solver.detail.Wanted;
import coldseam.solver.ground.GroundSection;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Reads what a detail is made of, for the base case or for one variant of it. */
final class DetailReader {
  private final Fields top;
  private final Pass pass;
  private final Problems problems;
  private final OtherCases others;
  private final Optional<Variant> variant;
  private final Changes changes;
  private Accuracy accuracy = Accuracy.STANDARD;
  private Geometry geometry = Geometry.PLANE;
  private List<Expectation> expectations = List.of();

  DetailReader(Fields top, Pass pass, OtherCases others, Optional<Variant> variant) {
    this(top, pass, others, variant, Changes.NONE);
  }

  DetailReader(
      Fields top, Pass pass, OtherCases others, Optional<Variant> variant, Changes changes) {
    this.top = top;
    this.pass = pass;
    this.problems = pass.problems();
    this.others = others;
    this.variant = variant;
    this.changes = changes;
  }

  Accuracy accuracy() {
    return accuracy;
  }

  List<Expectation> expectations() {
    return expectations;
  }

  /**
   * Reads everything.
   *
   * @param title the title of the case
   * @param variants names of the variants
   * @return the detail, or empty if a mistake was reported
   */
  Optional<Detail> read(String title, List<String> variants) {
    View view = view();
    MaterialReader materials = new MaterialReader(pass);
    Node typed = top.nodeOrNull("materials");
    if (typed != null) {
      materials.read(typed);
    }
    if (variant.isPresent() && variant.get().materials().isPresent()) {
      materials.read(variant.get().materials().get());
    }
    SpaceReader spaces = new SpaceReader(pass);
    Optional<Node> spacesNode =
        top.require("spaces", "add `spaces:` with `indoors` and `outdoors`, say");
    if (spacesNode.isPresent()) {
      spaces.read(spacesNode.get(), materials.materials());
    }
    CavityReader cavities = new CavityReader(pass, spaces);
    Node air = top.nodeOrNull("cavities");
    if (air != null) {
      cavities.read(air, materials.materials());
    }
    Fills fills = new Fills(pass, materials, spaces, cavities);
    if (variant.isPresent()) {
      variant.get().replaceFills(fills);
    }
    for (Map.Entry<String, String> change : changes.fills().entrySet()) {
      fills.replace(change.getKey(), Rereading.typed(change.getValue()));
    }
    Node drawn = top.nodeOrNull("drawings");
    DrawingsReader drawings = drawn == null ? null : new DrawingsReader(pass);
    if (drawn != null) {
      drawings.read(drawn);
    }
    List<Area> areas = section(fills, drawings, spacesNode.isPresent());
    if (variant.isPresent()) {
      variant.get().reportNotReplaced(problems, fills);
    }
    for (String old : changes.fills().keySet()) {
      if (fills.notReplaced().contains(old)) {
        problems.add(
            Rereading.typed(old),
            "no shape has the name or the fill `" + Node.shortened(old) + "`",
            Problems.suggestion(old, fills.replaceable()));
      }
    }
    Optional<FramingReader.Framing> framing = Optional.empty();
    Node framingNode = top.nodeOrNull("framing");
    if (framingNode != null) {
      framing = new FramingReader(pass, spaces).read(top.keyNode("framing"), framingNode, areas);
      if (framing.isPresent() && framing.get().clip().isPresent()) {
        areas = framing.get().clip().get().of(areas);
      }
    }
    Optional<GroundReader.Ground> ground = Optional.empty();
    Node groundNode = top.nodeOrNull("ground");
    if (groundNode != null) {
      ground = ground(groundNode, view, geometry, spaces, fills);
      if (ground.isPresent() && Double.isFinite(GroundReader.top(areas))) {
        areas = GroundReader.laid(ground.get(), areas);
      }
    }
    Node uncoveredNode = top.nodeOrNull("uncovered");
    Optional<AirCavity> uncovered =
        uncoveredNode == null ? Optional.empty() : cavities.uncovered(uncoveredNode);
    StretchReader stretches = new StretchReader(pass, spaces);
    Node node = top.nodeOrNull("stretches");
    if (node != null) {
      stretches.read(node, areas, materials.materials());
    }
    FlankReader flanks = new FlankReader(pass);
    node = top.nodeOrNull("flanks");
    if (node != null) {
      flanks.read(node, areas);
    }
    ResultsReader results = new ResultsReader(pass, spaces);
    List<Wanted> wanted = wanted(spaces, results, new PsiReader(pass, spaces, flanks, others));
    List<String> psi = psiNames(ground, spaces);
    List<Stretch> modulePlanes = framing(framing, areas, results, wanted);
    node = top.nodeOrNull("moisture");
    if (node != null) {
      Optional<Wanted> moisture =
          new MoistureReader(pass, spaces).read(top.keyNode("moisture"), node);
      if (moisture.isPresent()) {
        wanted.add(moisture.get());
      }
    }
    node = top.nodeOrNull("require");
    if (node != null) {
      RequireReader.Names names =
          new RequireReader.Names(
              spaces.spaces().keySet(), psi, results.transmittances(), top.has("moisture"));
      wanted.addAll(new RequireReader(pass).read(top.keyNode("require"), node, names));
    }
    node = top.nodeOrNull("accuracy");
    if (node != null) {
      accuracy = new AccuracyReader(pass, geometry).read(node);
    }
    node = top.nodeOrNull("expect");
    if (node != null) {
      List<String> named = new ArrayList<>(stretches.names());
      if (ground.isPresent()) {
        named.add(GroundSection.FLOOR_SURFACE);
      }
      expect(node, spaces, named, psi, results, variants);
    }
    if (!problems.none()) {
      return Optional.empty();
    }
    Detail detail =
        new Detail(
            title,
            geometry,
            view,
            uncovered.isPresent() ? Uncovered.under(areas, uncovered.get()) : areas,
            spaces.good(),
            with(stretches.stretches(), modulePlanes),
            flanks.flanks(),
            wanted,
            pass.assumptions());
    return ground.isEmpty()
        ? Optional.of(detail)
        : new GroundWork(pass, ground.get(), areas).complete(detail);
  }

  private Optional<GroundReader.Ground> ground(
      Node node, View view, Geometry geometry, SpaceReader spaces, Fills fills) {
    Node key = top.keyNode("ground");
    if (geometry != Geometry.PLANE) {
      problems.add(key, "a body of revolution has no ground", "leave `geometry` or `ground` away");
    }
    if (!view.equals(View.UPRIGHT)) {
      problems.add(
          key, "the ground lies below", "draw a vertical view with up as up: leave `up` away");
    }
    return new GroundReader(pass, spaces).read(key, node, fills);
  }

  /** Adds what a framing asks for; the planes at the ends of its module are given back. */
  private List<Stretch> framing(
      Optional<FramingReader.Framing> framing,
      List<Area> areas,
      ResultsReader results,
      List<Wanted> wanted) {
    if (framing.isEmpty()) {
      return List.of();
    }
    String of = framing.get().of();
    if (results.transmittances().contains(of)) {
      problems.add(
          top.keyNode("framing"),
          "there is a U of `" + Node.shortened(of) + "` already",
          "leave that one away, or call this one otherwise by `of`");
    }
    results.transmittances().add(of);
    wanted.addAll(framing.get().wanted());
    return framing.get().clip().isEmpty() ? List.of() : framing.get().clip().get().planes(areas);
  }

  private static List<Stretch> with(List<Stretch> stretches, List<Stretch> more) {
    if (more.isEmpty()) {
      return stretches;
    }
    List<Stretch> all = new ArrayList<>(stretches);
    all.addAll(more);
    return all;
  }

  private void frame(Node node, SpaceReader spaces, ResultsReader results, List<Wanted> wanted) {
    Node key = top.keyNode("frame");
    if (results.transmittances().contains(Wanted.Frame.NAME)) {
      problems.add(key, "there is a U of `frame` already", "call the other one otherwise");
    }
    Optional<Wanted> frame = new FrameReader(pass, spaces).read(key, node);
    if (frame.isPresent()) {
      wanted.add(frame.get());
      results.transmittances().add(Wanted.Frame.NAME);
    }
  }

  private List<Wanted> wanted(SpaceReader spaces, ResultsReader results, PsiReader psi) {
    List<Wanted> wanted = new ArrayList<>();
    Node node = top.nodeOrNull("psi");
    if (node != null) {
      wanted.addAll(psi.read(node));
    }
    node = top.nodeOrNull("chi");
    if (node != null) {
      if (geometry == Geometry.PLANE) {
        problems.add(
            top.keyNode("chi"),
            "a χ is of a body of revolution, and this is a plane section",
            "add `geometry: axisymmetric`, or ask for `psi`");
      }
      wanted.addAll(new ChiReader(pass, spaces, others).read(node));
    }
    node = top.nodeOrNull("U");
    if (node != null) {
      wanted.addAll(results.transmittances(node));
    }
    node = top.nodeOrNull("frame");
    if (node != null) {
      frame(node, spaces, results, wanted);
    }
    node = top.nodeOrNull("points");
    if (node != null) {
      wanted.addAll(results.points(node));
    }
    node = top.nodeOrNull("profiles");
    if (node != null) {
      wanted.addAll(results.profiles(node));
    }
    return wanted;
  }

  private List<Area> section(Fills fills, DrawingsReader drawings, boolean haveSpaces) {
    Optional<Node> node = top.require("section", "add `section:` with the shapes in order");
    if (node.isEmpty()) {
      return List.of();
    }
    pass.place("section", "", top.keyNode("section"));
    List<Area> areas = new SectionReader(pass, fills, drawings).read(node.get());
    if (problems.none() && haveSpaces) {
      boolean conducts = false;
      for (Area area : areas) {
        conducts |= Sides.conducts(area.fill());
      }
      if (!conducts) {
        problems.add(
            top.keyNode("section"),
            "nothing in the section conducts heat",
            "lay one material at least");
      }
    }
    return areas;
  }

  private View view() {
    Optional<String> word = top.word("view", List.of("vertical", "plan"));
    boolean plan = word.orElse("vertical").equals("plan");
    if (!top.has("view") && !top.has("frame")) {
      pass.assume("view", "vertical section", "by convention of this tool");
    }
    Optional<String> body = top.word("geometry", List.of("plane", "axisymmetric"));
    if (body.isPresent() && body.get().equals("axisymmetric")) {
      geometry = Geometry.AXISYMMETRIC;
    }
    Optional<Node> up = top.get("up");
    if (up.isEmpty()) {
      return plan ? View.PLAN : View.UPRIGHT;
    }
    if (plan) {
      problems.add(top.keyNode("up"), "a plan has no `up`", "leave `up` away, or `view: plan`");
      return View.PLAN;
    }
    Optional<double[]> vector = pass.quantities().pair(up.get(), "`up`", Place.DIRECTION);
    if (vector.isEmpty()) {
      return View.UPRIGHT;
    }
    double x = vector.get()[0];
    double y = vector.get()[1];
    if (!(Math.hypot(x, y) > 1e-9)) {
      problems.add(up.get(), "`up` points nowhere", "write `[0, 1]` if up is up on the sheet");
      return View.UPRIGHT;
    }
    return View.up(x, y);
  }

  /** The keys of a mapping of the case. */
  private List<String> names(String part) {
    List<String> names = new ArrayList<>();
    if (top.get(part).orElse(null) instanceof Node.Mapping mapping) {
      for (Node.Entry entry : mapping.entries()) {
        names.add(entry.key().text());
      }
    }
    return names;
  }

  private void expect(
      Node node,
      SpaceReader spaces,
      List<String> stretches,
      List<String> psi,
      ResultsReader results,
      List<String> variants) {
    List<String> floating = new ArrayList<>();
    for (Space space : spaces.good()) {
      if (space.floating().isPresent()) {
        floating.add(space.name());
      }
    }
    ExpectationReader.Names names =
        new ExpectationReader.Names(
            spaces.spaces().keySet(),
            floating,
            stretches,
            psi,
            names("chi"),
            results.transmittances(),
            results.points(),
            variants,
            geometry);
    expectations = new ExpectationReader(pass, names).read(node);
  }

  private List<String> psiNames(Optional<GroundReader.Ground> ground, SpaceReader spaces) {
    List<String> psi = names("psi");
    if (ground.isPresent()) {
      psi.addAll(GroundWork.names(ground.get(), spaces.spaces().size()));
    }
    if (top.has("frame")) {
      psi.add(Wanted.Frame.GLASS_EDGE);
    }
    return psi;
  }
}
