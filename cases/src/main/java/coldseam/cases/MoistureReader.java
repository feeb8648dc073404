package coldseam.cases;

import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.MoistureLimits;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Reads {@code moisture}: the check of surfaces by ISO 13788. */
final class MoistureReader {
  static final List<String> KEYS =
      List.of("spaces", "outside", "climate", "class", "excess", "humidity", "criterion");
  static final List<String> CRITERIA = List.of("mould", "condensation");
  static final List<String> MONTH_KEYS = List.of("temperature", "humidity");

  private final Pass pass;
  private final Problems problems;
  private final SpaceReader spaces;

  MoistureReader(Pass pass, SpaceReader spaces) {
    this.pass = pass;
    this.problems = pass.problems();
    this.spaces = spaces;
  }

  /**
   * Reads the check.
   *
   * @param key its key, for its place
   * @param node the mapping
   * @return the check, or empty if a mistake was reported
   */
  Optional<Wanted> read(Node key, Node node) {
    pass.place("moisture", "", key);
    int before = problems.count();
    Fields fields = new Fields(problems, "`moisture`", node, KEYS);
    List<String> judged = names(fields, "spaces");
    List<String> outside = names(fields, "outside");
    List<Wanted.Moisture.Month> months = months(fields);
    fields.refuseBoth("class", "excess", "a class is an excess; keep one of them");
    fields.refuseBoth("class", "humidity", "indoor air follows from one of them");
    fields.refuseBoth("excess", "humidity", "indoor air follows from one of them");
    OptionalDouble humidity = OptionalDouble.empty();
    if (fields.has("humidity")) {
      humidity = number(fields, "humidity", Place.HUMIDITY);
    }
    OptionalDouble excess = OptionalDouble.empty();
    String source = "";
    for (String kind : List.of("class", "excess")) {
      if (fields.has(kind) && !fields.has("climate")) {
        problems.add(
            fields.keyNode(kind),
            "`" + kind + "` counts on top of the air outdoors, month by month",
            "add a `climate`, or type the `humidity` indoors");
      }
    }
    if (fields.has("class")) {
      OptionalDouble typed = number(fields, "class", Place.COUNT);
      excess = typed.isPresent() ? ofClass(fields, typed.getAsDouble()) : typed;
      source = "humidity class " + Math.round(typed.orElse(0)) + ", upper limit";
    } else if (fields.has("excess")) {
      excess = number(fields, "excess", Place.PRESSURE);
      source = "typed in the case";
    }
    checkInside(fields, judged);
    Optional<String> criterion = fields.word("criterion", CRITERIA);
    if (problems.count() > before) {
      return Optional.empty();
    }
    return Optional.of(
        new Wanted.Moisture(
            judged,
            outside,
            months,
            humidity,
            excess,
            source,
            criterion.orElse("mould").equals("mould")
                ? MoistureLimits.MOULD
                : MoistureLimits.CONDENSATION));
  }

  private OptionalDouble number(Fields fields, String key, Place place) {
    return OptionalDouble.of(
        pass.quantities().read(fields.get(key).get(), "`" + key + "` of `moisture`", place));
  }

  private OptionalDouble ofClass(Fields fields, double typed) {
    if (Double.isNaN(typed)) {
      return OptionalDouble.empty();
    }
    if (typed > 4) {
      problems.add(
          fields.get("class").get(),
          typed == 5 ? "humidity class 5 has no upper limit" : "humidity classes are 1 to 5",
          "give 1 to 4, or the `excess` of the use, in Pa");
      return OptionalDouble.empty();
    }
    return OptionalDouble.of(MoistureLimits.classPa((int) typed));
  }

  private void checkInside(Fields fields, List<String> judged) {
    for (String name : judged) {
      Optional<Space> space = spaces.spaces().get(name);
      if (space.isPresent() && space.get().exposure() != Exposure.INSIDE) {
        problems.add(
            fields.get("spaces").get(),
            "`" + Node.shortened(name) + "` is outside",
            "surfaces of inside spaces are judged");
      }
    }
  }

  /** One name of a space or a list of them. */
  private List<String> names(Fields fields, String key) {
    List<String> names = new ArrayList<>();
    Optional<Node> node = fields.get(key);
    if (node.isEmpty()) {
      return names;
    }
    List<Node> items =
        node.get() instanceof Node.Sequence list ? list.items() : List.of(node.get());
    if (items.isEmpty()) {
      problems.add(node.get(), "`" + key + "` is an empty list", "name one space at least");
    }
    for (Node item : items) {
      Optional<String> name = Fields.text(problems, "`" + key + "` of `moisture`", item);
      if (name.isEmpty()) {
        continue;
      }
      if (!spaces.spaces().containsKey(name.get())) {
        spaces.reportUnknown(item, name.get());
      } else if (names.contains(name.get())) {
        problems.add(item, "`" + name.get() + "` is named twice", "name it once");
      } else {
        names.add(name.get());
      }
    }
    return names;
  }

  private List<Wanted.Moisture.Month> months(Fields fields) {
    List<Wanted.Moisture.Month> months = new ArrayList<>();
    if (!fields.has("climate")) {
      return months;
    }
    Node node = fields.get("climate").get();
    boolean needed = fields.has("class") || fields.has("excess");
    for (Node.Entry entry : Fields.named(problems, "`climate`", node)) {
      months.add(month(entry, needed));
    }
    if (months.isEmpty() && node instanceof Node.Mapping) {
      problems.add(node, "`climate` has no month", "write `January: [-1, 85 %]`, one a line");
    }
    return months;
  }

  private Wanted.Moisture.Month month(Node.Entry entry, boolean needed) {
    String what = "`" + Node.shortened(entry.key().text()) + "`";
    Node temperature = entry.value();
    Node humidity = null;
    if (entry.value() instanceof Node.Mapping) {
      Fields fields = new Fields(problems, what, entry.value(), MONTH_KEYS);
      temperature = fields.require("temperature", "add `temperature: -1`, in °C").orElse(null);
      humidity = fields.nodeOrNull("humidity");
    } else if (entry.value() instanceof Node.Sequence pair) {
      if (pair.items().size() != 2) {
        problems.add(
            pair,
            what + " is a temperature and a humidity, not " + Quantities.counted(pair),
            "write `[-1, 85 %]`");
        return new Wanted.Moisture.Month(entry.key().text(), Double.NaN, Double.NaN);
      }
      temperature = pair.items().get(0);
      humidity = pair.items().get(1);
    }
    if (needed && humidity == null) {
      problems.add(
          entry.value(),
          what + " has no humidity, on which the air indoors depends",
          "write `[-1, 85 %]`");
    }
    return new Wanted.Moisture.Month(
        entry.key().text(),
        temperature == null
            ? Double.NaN
            : pass.quantities().read(temperature, "temperature of " + what, Place.TEMPERATURE),
        humidity == null
            ? Double.NaN
            : pass.quantities().read(humidity, "humidity of " + what, Place.HUMIDITY));
  }
}
