package coldseam.cases;

import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmRule;
import java.util.List;
import java.util.Optional;

/** Reads a film: a standard's by name, numbers, numbers by direction, or one for each set. */
final class FilmReader {
  static final List<String> WORDS = List.of("iso", "ashrae", "fixed");
  private static final List<String> DIRECTIONS = List.of("up", "horizontal", "down");
  private static final List<String> SETS = List.of("heat-loss", "surface");

  /** Below this, but not 0, a resistance is a slip; surfaces held at a temperature are `fixed`. */
  private static final double LEAST_FILM_M2K_PER_W = 1e-6;

  private static final String TYPED = "typed in the case";

  /** 1 h·ft²·°F/Btu in m²·K/W: (0.3048 m)² · 3600 s · 5/9 K over 1055.05585262 J. */
  private static final double CUSTOMARY = 0.3048 * 0.3048 * 3600 * (5.0 / 9) / 1055.05585262;

  /** ASHRAE Handbook Fundamentals 2021, chapter 26, table 10: still air, emissivity 0.90. */
  static final FilmRule ASHRAE_INSIDE =
      new FilmRule(
          0.61 * CUSTOMARY,
          0.68 * CUSTOMARY,
          0.92 * CUSTOMARY,
          Double.NaN,
          "ASHRAE Fundamentals 2021, ch. 26, table 10, still air, emissivity 0.90");

  /** The same table: moving air, 15 mph, winter. */
  static final FilmRule ASHRAE_OUTSIDE =
      new FilmRule(
          0.17 * CUSTOMARY,
          0.17 * CUSTOMARY,
          0.17 * CUSTOMARY,
          Double.NaN,
          "ASHRAE Fundamentals 2021, ch. 26, table 10, moving air, 15 mph");

  private final Pass pass;
  private final Problems problems;

  FilmReader(Pass pass) {
    this.pass = pass;
    this.problems = pass.problems();
  }

  /**
   * The films of both sets.
   *
   * @param heatLoss for heat flow, empty if nothing is said
   * @param surface for surface temperatures, empty if nothing is said
   */
  record Films(Optional<FilmRule> heatLoss, Optional<FilmRule> surface) {
    /** Nothing said. */
    static final Films NONE = new Films(Optional.empty(), Optional.empty());

    static Films both(FilmRule rule) {
      return new Films(Optional.of(rule), Optional.of(rule));
    }
  }

  /**
   * Reads a film.
   *
   * @param node where it stands
   * @param what whose film, e.g. "space `indoors`"
   * @param exposure inside or outside, if known; without it a standard's film is a mistake
   * @return the films; empty ones if a mistake was reported
   */
  Films read(Node node, String what, Optional<Exposure> exposure) {
    if (node instanceof Node.Mapping mapping && hasAny(mapping, SETS)) {
      Fields sets = new Fields(problems, "`film` of " + what, node, SETS);
      Optional<FilmRule> heatLoss = Optional.empty();
      Optional<FilmRule> surface = Optional.empty();
      if (sets.has("heat-loss")) {
        heatLoss = ofOneSet(sets.get("heat-loss").get(), what, exposure).heatLoss();
      }
      if (sets.has("surface")) {
        surface = ofOneSet(sets.get("surface").get(), what, exposure).surface();
      }
      return new Films(heatLoss, surface);
    }
    return ofOneSet(node, what, exposure);
  }

  private static boolean hasAny(Node.Mapping mapping, List<String> keys) {
    for (Node.Entry entry : mapping.entries()) {
      if (keys.contains(entry.key().text())) {
        return true;
      }
    }
    return false;
  }

  private Films ofOneSet(Node node, String what, Optional<Exposure> exposure) {
    if (node instanceof Node.Mapping) {
      return byDirection(node, what);
    }
    if (!(node instanceof Node.Scalar scalar)) {
      problems.add(
          node,
          "`film` of " + what + " is a word or a number, not " + Node.describe(node),
          "write `iso`, `ashrae`, `fixed`, a resistance, or `{up: …, horizontal: …, down: …}`");
      return Films.NONE;
    }
    String text = scalar.text().strip();
    if (text.equals("fixed")) {
      return Films.both(FilmRule.FIXED_TEMPERATURE);
    }
    if (WORDS.contains(text)) {
      return standard(node, text, what, exposure);
    }
    if (isWord(text) && !pass.quantities().named(text)) {
      problems.add(
          node,
          "`" + Node.shortened(text) + "` is no film",
          Problems.suggestion(text, WORDS) + " or a resistance in m2 K/W");
      return Films.NONE;
    }
    double film = resistance(node, "`film` of " + what);
    return Double.isNaN(film) ? Films.NONE : Films.both(FilmRule.uniform(film, TYPED));
  }

  private static boolean isWord(String text) {
    for (int i = 0; i < text.length(); i++) {
      if (!Character.isLetter(text.charAt(i))) {
        return false;
      }
    }
    return !text.isEmpty();
  }

  private Films standard(Node node, String name, String what, Optional<Exposure> exposure) {
    if (exposure.isEmpty()) {
      problems.add(
          node,
          "the films `" + name + "` of " + what + " depend on its exposure, which is not given",
          "add `exposure: inside` or `exposure: outside`, or type the resistances");
      return Films.NONE;
    }
    boolean inside = exposure.get() == Exposure.INSIDE;
    if (name.equals("ashrae")) {
      return Films.both(inside ? ASHRAE_INSIDE : ASHRAE_OUTSIDE);
    }
    return iso(exposure.get());
  }

  /** The films of ISO 6946 and ISO 13788. */
  static Films iso(Exposure exposure) {
    boolean inside = exposure == Exposure.INSIDE;
    return new Films(
        Optional.of(inside ? FilmRule.ISO_6946_INSIDE : FilmRule.ISO_6946_OUTSIDE),
        Optional.of(inside ? FilmRule.ISO_13788_INSIDE : FilmRule.ISO_13788_OUTSIDE));
  }

  private Films byDirection(Node node, String what) {
    Fields fields = new Fields(problems, "`film` of " + what, node, DIRECTIONS);
    double[] film = new double[3];
    boolean good = true;
    int zeros = 0;
    for (int i = 0; i < 3; i++) {
      String key = DIRECTIONS.get(i);
      Optional<Node> value = fields.require(key, "give `up`, `horizontal` and `down`");
      film[i] =
          value.isEmpty() ? Double.NaN : resistance(value.get(), "`" + key + "` film of " + what);
      good &= !Double.isNaN(film[i]);
      zeros += film[i] == 0 ? 1 : 0;
    }
    if (good && zeros != 0 && zeros != 3) {
      problems.add(
          node, "`film` of " + what + " is 0 in some directions only", "make all 0, or none");
      good = false;
    }
    return good
        ? Films.both(new FilmRule(film[0], film[1], film[2], Double.NaN, TYPED))
        : Films.NONE;
  }

  private double resistance(Node node, String what) {
    double film = pass.quantities().read(node, what, Place.FILM);
    if (film > 0 && film < LEAST_FILM_M2K_PER_W) {
      problems.add(
          node,
          what + " is below anything known: " + Figures.of(film) + " m2 K/W",
          "write `fixed` if the surface has the temperature of the space");
      return Double.NaN;
    }
    return film;
  }
}
