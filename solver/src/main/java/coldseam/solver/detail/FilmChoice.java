package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import coldseam.solver.detail.Conditions.Kind;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;

/**
 * Chooses the film of every edge by the direction of heat flow through it (ISO 6946: horizontal
 * within 30° of the horizontal). With n the outward normal, heat flows along −n from the warmest
 * space and along +n to the coldest; at other spaces the direction cannot be decided and the
 * horizontal value is taken.
 */
final class FilmChoice {
  /** Sine of the angle up to which heat flow counts as horizontal, with room for rounding. */
  private static final double HORIZONTAL_SINE = 0.5 + 1e-6;

  private enum Direction {
    ANY(""),
    GLAZING(" on glazing and frames"),
    UP(" upward"),
    HORIZONTAL(" horizontal"),
    DOWN(" downward"),
    UNDECIDED(" horizontal");

    private final String words;

    Direction(String words) {
      this.words = words;
    }
  }

  /** Films from one source at one space: what was chosen. */
  private record Group(int space, String source, Set<String> words) {}

  private final OutlineReading reading;
  private final Detail detail;
  private final Partition partition;
  private final double warmest;
  private final double coldest;

  FilmChoice(OutlineReading reading) {
    this.reading = reading;
    detail = reading.detail();
    partition = reading.partition();
    double high = Double.NEGATIVE_INFINITY;
    double low = Double.POSITIVE_INFINITY;
    for (int space : reading.spaces()) {
      if (space >= 0 && detail.spaces().get(space).floating().isEmpty()) {
        high = Math.max(high, detail.spaces().get(space).temperatureC());
        low = Math.min(low, detail.spaces().get(space).temperatureC());
      }
    }
    warmest = high;
    coldest = low;
  }

  /** Sets the resistance of every film edge and says what was chosen. */
  List<Assumption> choose() {
    Map<String, Group> used = new LinkedHashMap<>();
    Map<Integer, Map<Double, Double>> undecided = new TreeMap<>();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      FilmRule rule = reading.rule(edge);
      if (rule == null) {
        continue;
      }
      int space = reading.spaces()[edge];
      String words = "surface at the temperature of the space";
      if (reading.kinds()[edge] == Kind.FILM) {
        Direction direction = direction(edge, rule);
        double film = resistance(rule, direction);
        reading.films()[edge] = film;
        words = Wording.figure(film) + " m²·K/W" + direction.words;
        if (direction == Direction.UNDECIDED) {
          addUndecided(undecided, space, film, partition.edgeLength(edge));
        }
      }
      String key = space + " " + rule.source();
      Group group = used.get(key);
      if (group == null) {
        group = new Group(space, rule.source(), new TreeSet<>());
        used.put(key, group);
      }
      group.words().add(words);
    }
    return assumptions(used, undecided);
  }

  private static void addUndecided(
      Map<Integer, Map<Double, Double>> undecided, int space, double film, double lengthM) {
    Map<Double, Double> lengthByFilm = undecided.get(space);
    if (lengthByFilm == null) {
      lengthByFilm = new TreeMap<>();
      undecided.put(space, lengthByFilm);
    }
    lengthByFilm.put(film, lengthByFilm.getOrDefault(film, 0.0) + lengthM);
  }

  private List<Assumption> assumptions(
      Map<String, Group> used, Map<Integer, Map<Double, Double>> undecided) {
    List<Assumption> lines = new ArrayList<>();
    String set = reading.filmSet() == FilmSet.HEAT_LOSS ? "heat loss" : "surface temperature";
    for (Group group : used.values()) {
      lines.add(
          new Assumption(
              "film at " + detail.spaces().get(group.space()).name() + ", " + set,
              String.join("; ", group.words()),
              group.source()));
    }
    for (Map.Entry<Integer, Map<Double, Double>> films : undecided.entrySet()) {
      String space = detail.spaces().get(films.getKey()).name();
      for (Map.Entry<Double, Double> film : films.getValue().entrySet()) {
        lines.add(
            new Assumption(
                "direction of heat flow at " + space + ", " + set,
                "cannot be decided over "
                    + Wording.length(film.getValue())
                    + ": "
                    + Wording.figure(film.getKey())
                    + " m²·K/W as for horizontal flow",
                "ISO 6946, horizontal value where the direction is not known"));
      }
    }
    return lines;
  }

  private Direction direction(int edge, FilmRule rule) {
    if (reading.glazing().get(edge) && !Double.isNaN(rule.glazingM2KPerW())) {
      return rule.glazingM2KPerW() == rule.horizontalM2KPerW() && sameInEveryDirection(rule)
          ? Direction.ANY
          : Direction.GLAZING;
    }
    if (sameInEveryDirection(rule)) {
      return Direction.ANY;
    }
    double rise = rise(edge);
    if (detail.view().horizontalFlow() || Math.abs(rise) <= HORIZONTAL_SINE) {
      return Direction.HORIZONTAL;
    }
    Space space = detail.spaces().get(reading.spaces()[edge]);
    double temperature = space.temperatureC();
    if (space.floating().isPresent()
        || warmest == coldest
        || (temperature != warmest && temperature != coldest)) {
      return Direction.UNDECIDED;
    }
    return (rise > 0) == (temperature == coldest) ? Direction.UP : Direction.DOWN;
  }

  private static boolean sameInEveryDirection(FilmRule rule) {
    return rule.upM2KPerW() == rule.horizontalM2KPerW()
        && rule.downM2KPerW() == rule.horizontalM2KPerW();
  }

  /** Upward part of the unit normal that points out of the conducting section. */
  private double rise(int edge) {
    int a = partition.edgeStart(edge);
    int b = partition.edgeEnd(edge);
    double dx = partition.x(b) - partition.x(a);
    double dy = partition.y(b) - partition.y(a);
    View view = detail.view();
    double outward = (dy * view.upX() - dx * view.upY()) / Math.hypot(dx, dy);
    return reading.conductsLeft(edge) ? outward : -outward;
  }

  private static double resistance(FilmRule rule, Direction direction) {
    return switch (direction) {
      case UP -> rule.upM2KPerW();
      case DOWN -> rule.downM2KPerW();
      case GLAZING -> rule.glazingM2KPerW();
      case ANY, HORIZONTAL, UNDECIDED -> rule.horizontalM2KPerW();
    };
  }
}
