package coldseam.cases;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads the results asked for beside ψ: {@code U}, {@code points}, {@code profiles}. */
final class ResultsReader {
  static final List<String> U_KEYS = List.of("of", "between", "width");
  static final List<String> POINT_KEYS = List.of("at", "films");
  static final List<String> LINE_KEYS = List.of("from", "to", "points", "films", "surface-of");
  static final List<String> FILM_SETS = List.of("heat-loss", "surface");

  private static final int POINTS_OF_PROFILE = 21;

  private final Pass pass;
  private final Problems problems;
  private final Quantities quantities;
  private final SpaceReader spaces;
  private final List<String> transmittances = new ArrayList<>();
  private final List<String> points = new ArrayList<>();

  ResultsReader(Pass pass, SpaceReader spaces) {
    this.pass = pass;
    this.problems = pass.problems();
    this.quantities = pass.quantities();
    this.spaces = spaces;
  }

  /** What each U is of. */
  List<String> transmittances() {
    return transmittances;
  }

  /** Names of the points. */
  List<String> points() {
    return points;
  }

  /** Reads {@code U}: one, or a list. */
  List<Wanted> transmittances(Node node) {
    List<Wanted> wanted = new ArrayList<>();
    List<Node> items = node instanceof Node.Sequence list ? list.items() : List.of(node);
    if (items.isEmpty()) {
      problems.add(
          node, "`U` is an empty list", "write `{of: wall, between: [indoors, outdoors]}`");
    }
    for (Node item : items) {
      Fields fields = new Fields(problems, "`U`", item, U_KEYS);
      Optional<Node> ofNode = fields.require("of", "add `of: wall`, `roof`, `floor` or the like");
      Optional<Node> betweenNode = fields.require("between", "add `between: [indoors, outdoors]`");
      Optional<String> of =
          ofNode.isEmpty() ? Optional.empty() : Fields.text(problems, "`of`", ofNode.get());
      if (of.isPresent() && transmittances.contains(of.get())) {
        problems.add(
            ofNode.get(), "there is a U of `" + of.get() + "` already", "choose another name");
      }
      of.ifPresent(transmittances::add);
      OptionalDouble width = OptionalDouble.empty();
      boolean good = of.isPresent();
      if (fields.has("width")) {
        double typed = quantities.read(fields.get("width").get(), "`width` of `U`", Place.SIZE);
        good &= !Double.isNaN(typed);
        width = OptionalDouble.of(typed);
      }
      Optional<PairReader.Sides> sides =
          betweenNode.isEmpty()
              ? Optional.empty()
              : new PairReader(problems, spaces.spaces())
                  .read(betweenNode.get(), "`between` of `U`");
      if (good && sides.isPresent()) {
        pass.place("U", of.get(), item);
        wanted.add(
            new Wanted.Transmittance(of.get(), sides.get().warm(), sides.get().cold(), width));
      }
    }
    return wanted;
  }

  /** Reads {@code points}. */
  List<Wanted> points(Node node) {
    List<Wanted> wanted = new ArrayList<>();
    for (Node.Entry entry : Fields.named(problems, "`points`", node)) {
      String name = entry.key().text();
      points.add(name);
      pass.place("point", name, entry.key());
      String what = "point `" + Node.shortened(name) + "`";
      FilmSet set = FilmSet.HEAT_LOSS;
      Optional<Point> at;
      if (entry.value() instanceof Node.Mapping) {
        Fields fields = new Fields(problems, what, entry.value(), POINT_KEYS);
        set = filmSet(fields);
        Optional<Node> place = fields.require("at", "add `at: [x, y]`");
        at = place.isEmpty() ? Optional.empty() : quantities.point(place.get(), what);
      } else {
        at = quantities.point(entry.value(), what);
      }
      if (at.isPresent()) {
        wanted.add(new Wanted.Temperature(name, at.get(), set));
      }
    }
    return wanted;
  }

  private static FilmSet filmSet(Fields fields) {
    Optional<String> word = fields.word("films", FILM_SETS);
    return word.isPresent() && word.get().equals("surface") ? FilmSet.SURFACE : FilmSet.HEAT_LOSS;
  }

  /** Reads {@code profiles}. */
  List<Wanted> profiles(Node node) {
    List<Wanted> wanted = new ArrayList<>();
    for (Node.Entry entry : Fields.named(problems, "`profiles`", node)) {
      String name = entry.key().text();
      pass.place("profile", name, entry.key());
      Fields fields =
          new Fields(problems, "profile `" + Node.shortened(name) + "`", entry.value(), LINE_KEYS);
      Optional<Wanted> profile =
          fields.has("surface-of") ? surfaceProfile(name, fields) : lineProfile(name, fields);
      if (profile.isPresent()) {
        wanted.add(profile.get());
      }
    }
    return wanted;
  }

  private Optional<Wanted> surfaceProfile(String name, Fields fields) {
    FilmSet set = filmSet(fields);
    for (String key : List.of("from", "to", "points")) {
      if (fields.refuseBoth("surface-of", key, "a surface gives its own line and points")) {
        return Optional.empty();
      }
    }
    Node node = fields.get("surface-of").get();
    Optional<String> space = Fields.text(problems, "`surface-of`", node);
    if (space.isEmpty()) {
      return Optional.empty();
    }
    if (!spaces.spaces().containsKey(space.get())) {
      spaces.reportUnknown(node, space.get());
      return Optional.empty();
    }
    return Optional.of(new Wanted.SurfaceProfile(name, space.get(), set));
  }

  private Optional<Wanted> lineProfile(String name, Fields fields) {
    FilmSet set = filmSet(fields);
    String right = "give `from: [x, y]` and `to: [x, y]`, or `surface-of: ` and a space";
    Optional<Node> fromNode = fields.require("from", right);
    Optional<Node> toNode = fields.require("to", right);
    Optional<Point> from = point(fromNode, "`from` of " + fields.what());
    Optional<Point> to = point(toNode, "`to` of " + fields.what());
    double count = POINTS_OF_PROFILE;
    if (fields.has("points")) {
      Node node = fields.get("points").get();
      count = quantities.read(node, "`points` of " + fields.what(), Place.COUNT);
      if (count < 2) {
        problems.add(node, "a profile has 2 points or more", "give 2 or more");
        return Optional.empty();
      }
    }
    if (from.isEmpty() || to.isEmpty() || Double.isNaN(count)) {
      return Optional.empty();
    }
    if (from.get().distance(to.get()) < Place.SIZE.least()) {
      problems.add(toNode.get(), fields.what() + " has no length", "give two different points");
      return Optional.empty();
    }
    return Optional.of(new Wanted.Profile(name, from.get(), to.get(), (int) count, set));
  }

  private Optional<Point> point(Optional<Node> node, String what) {
    return node.isEmpty() ? Optional.empty() : quantities.point(node.get(), what);
  }
}
