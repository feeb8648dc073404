package coldseam.solver.result;

import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * Moisture checks of surfaces (ISO 13788:2012). Months are combinations of the unit fields with the
 * films for surface temperatures: the spaces outdoors take the temperature of the month, floating
 * spaces follow, all others keep that of the case.
 */
final class MoistureChecks {
  private static final String STANDARD = "ISO 13788, monthly procedure";

  private final Detail detail;
  private final Optional<Wanted.Moisture> wanted;
  private final List<Integer> judged = new ArrayList<>();
  private final List<Integer> outside = new ArrayList<>();
  private final List<Fault> faults = new ArrayList<>();

  MoistureChecks(Detail detail) {
    this.detail = detail;
    Wanted.Moisture found = null;
    for (Wanted any : detail.wanted()) {
      if (any instanceof Wanted.Moisture moisture) {
        found = moisture;
      }
    }
    wanted = Optional.ofNullable(found);
    if (found != null) {
      judge(found);
      for (int i = 0; i < detail.spaces().size(); i++) {
        Space space = detail.spaces().get(i);
        boolean named = found.outside().contains(space.name());
        boolean first = found.outside().isEmpty() && space.exposure() == Exposure.OUTSIDE;
        if ((named || first) && space.floating().isEmpty()) {
          outside.add(i);
        }
      }
      if (outside.isEmpty()) {
        fault("nothing is outdoors; name the space with `outside`");
      }
    }
  }

  private void judge(Wanted.Moisture moisture) {
    boolean given = moisture.humidity().isPresent() || moisture.excessPa().isPresent();
    for (int i = 0; i < detail.spaces().size(); i++) {
      Space space = detail.spaces().get(i);
      boolean known = given || space.relativeHumidity().isPresent();
      boolean inside = space.exposure() == Exposure.INSIDE;
      if (moisture.spaces().contains(space.name()) && !known) {
        fault("the humidity of `" + space.name() + "` is not known; type it with the space");
      } else if (moisture.spaces().contains(space.name())
          || (moisture.spaces().isEmpty() && inside && known && space.floating().isEmpty())) {
        judged.add(i);
      }
    }
    if (judged.isEmpty() && faults.isEmpty()) {
      fault("the humidity of no inside space is known; give it a `humidity`, or a class");
    }
  }

  private void fault(String message) {
    faults.add(new Fault("moisture", "", message, Optional.empty()));
  }

  boolean any() {
    return wanted.isPresent();
  }

  List<Fault> faults() {
    return faults;
  }

  List<Assumption> assumptions() {
    List<Assumption> all = new ArrayList<>();
    if (wanted.isEmpty()) {
      return all;
    }
    Wanted.Moisture moisture = wanted.get();
    if (moisture.atSurface() == MoistureLimits.MOULD) {
      all.add(
          new Assumption(
              "humidity at a surface from which mould may grow", "80 %", "ISO 13788, 5.3"));
    }
    if (moisture.months().isEmpty()) {
      return all;
    }
    if (moisture.excessPa().isPresent()) {
      all.add(
          new Assumption(
              "vapour pressure indoors",
              "outdoors + "
                  + Wording.figure(MoistureLimits.EXCESS_MARGIN)
                  + " × "
                  + Wording.figure(moisture.excessPa().getAsDouble())
                  + " Pa up to 0 °C outdoors, falling to none at 20 °C ("
                  + moisture.excessSource()
                  + ")",
              STANDARD));
    } else {
      all.add(
          new Assumption(
              "humidity indoors",
              "as typed + 5 % relative humidity in every month (margin of the procedure)",
              STANDARD));
    }
    for (int i = 0; i < detail.spaces().size(); i++) {
      Space space = detail.spaces().get(i);
      if (!judged.contains(i) && !outside.contains(i) && space.floating().isEmpty()) {
        all.add(
            new Assumption(
                "temperature of " + space.name() + " in every month",
                Wording.figure(space.temperatureC()) + " °C, as in the case",
                "by convention of this tool"));
      }
    }
    return all;
  }

  /**
   * Checks every space.
   *
   * @param couplings of the heat-loss solution, for floating spaces
   * @param surface the fields with the films for surface temperatures
   */
  List<SpaceMoisture> evaluate(Couplings couplings, FieldSet surface) {
    List<SpaceMoisture> all = new ArrayList<>();
    if (wanted.isEmpty()) {
      return all;
    }
    List<FieldSet> fields = new ArrayList<>();
    List<double[]> temperatures = new ArrayList<>();
    for (Wanted.Moisture.Month month : months()) {
      double[] stated = new double[detail.spaces().size()];
      for (int i = 0; i < stated.length; i++) {
        boolean monthly = outside.contains(i) && !Double.isNaN(month.temperatureC());
        stated[i] = monthly ? month.temperatureC() : detail.spaces().get(i).temperatureC();
      }
      double[] actual = couplings.temperatures(stated);
      temperatures.add(actual);
      fields.add(surface.with(actual));
    }
    for (int space : judged) {
      all.add(check(space, fields, temperatures));
    }
    return all;
  }

  /** The months; a single climate is one without a name or a temperature of its own. */
  private List<Wanted.Moisture.Month> months() {
    List<Wanted.Moisture.Month> months = wanted.get().months();
    return months.isEmpty()
        ? List.of(new Wanted.Moisture.Month("", Double.NaN, Double.NaN))
        : months;
  }

  private SpaceMoisture check(int space, List<FieldSet> fields, List<double[]> temperatures) {
    Wanted.Moisture moisture = wanted.get();
    List<SpaceMoisture.Month> months = new ArrayList<>();
    List<SurfaceTemperatures.Extreme> coldest = new ArrayList<>();
    int critical = -1;
    for (int m = 0; m < fields.size(); m++) {
      SurfaceTemperatures surfaces =
          new SurfaceTemperatures(detail, temperatures.get(m), fields.get(m));
      SurfaceTemperatures.Extreme extreme = surfaces.extreme(space, true).orElseThrow();
      coldest.add(extreme);
      SpaceMoisture.Month month =
          month(months().get(m), space, temperatures.get(m), extreme, surfaces.errorK());
      months.add(month);
      double most =
          critical < 0
              ? Double.NEGATIVE_INFINITY
              : months.get(critical).required(moisture.atSurface());
      critical = month.counts() && month.required(moisture.atSurface()) > most ? m : critical;
    }
    Optional<SpaceMoisture.Surface> developed =
        critical < 0
            ? Optional.empty()
            : Optional.of(surface(fields.get(critical), space, months.get(critical)));
    int shown = Math.max(0, critical);
    return new SpaceMoisture(
        detail.spaces().get(space).name(),
        temperatures.get(shown)[space],
        humidity(space),
        moisture.atSurface(),
        months,
        critical < 0 ? OptionalInt.empty() : OptionalInt.of(critical),
        developed,
        fields
            .get(shown)
            .solution()
            .conditions()
            .glazing(coldest.get(shown).place().side().edge()));
  }

  private SpaceMoisture.Month month(
      Wanted.Moisture.Month climate,
      int space,
      double[] temperatures,
      SurfaceTemperatures.Extreme coldest,
      double errorK) {
    double inside = temperatures[space];
    double out = Double.POSITIVE_INFINITY;
    for (int i : outside) {
      out = Math.min(out, temperatures[i]);
    }
    double vapour = vapourPa(climate, space, inside);
    double dewPoint = MoistureLimits.criticalC(vapour, MoistureLimits.CONDENSATION);
    double mould = MoistureLimits.criticalC(vapour, MoistureLimits.MOULD);
    boolean counts = out < inside;
    return new SpaceMoisture.Month(
        climate.name(),
        out,
        inside,
        counts,
        vapour,
        dewPoint,
        mould,
        counts ? MoistureLimits.requiredFactor(mould, inside, out) : Double.NaN,
        counts ? MoistureLimits.requiredFactor(dewPoint, inside, out) : Double.NaN,
        coldest.temperatureC(),
        counts ? MoistureLimits.requiredFactor(coldest.temperatureC(), inside, out) : Double.NaN,
        errorK);
  }

  private double vapourPa(Wanted.Moisture.Month climate, int space, double inside) {
    Wanted.Moisture moisture = wanted.get();
    if (moisture.excessPa().isPresent()) {
      return climate.humidity() * MoistureLimits.saturationPa(climate.temperatureC())
          + MoistureLimits.EXCESS_MARGIN
              * MoistureLimits.excessPa(moisture.excessPa().getAsDouble(), climate.temperatureC());
    }
    double margin = moisture.months().isEmpty() ? 0 : MoistureLimits.MONTHLY_MARGIN;
    return Math.min(1, typed(space) + margin) * MoistureLimits.saturationPa(inside);
  }

  private double typed(int space) {
    return wanted.get().humidity().isPresent()
        ? wanted.get().humidity().getAsDouble()
        : detail.spaces().get(space).relativeHumidity().getAsDouble();
  }

  private String humidity(int space) {
    Wanted.Moisture moisture = wanted.get();
    if (moisture.excessPa().isPresent()) {
      return moisture.excessSource() + ", × " + Wording.figure(MoistureLimits.EXCESS_MARGIN);
    }
    return Wording.figure(100 * typed(space))
        + " %"
        + (moisture.months().isEmpty() ? " as typed" : " + 5 % margin of the monthly procedure");
  }

  private SpaceMoisture.Surface surface(FieldSet fields, int space, SpaceMoisture.Month month) {
    double length = 0;
    double mould = 0;
    double dew = 0;
    for (List<SurfaceTrace.Side> run : Profiles.runs(fields, space)) {
      for (SurfaceTrace.Side side : run) {
        double own = fields.trace().lengthM(side);
        length += own;
        mould += own * side.partBelow(fields.field(), month.mouldC());
        dew += own * side.partBelow(fields.field(), month.dewPointC());
      }
    }
    return new SpaceMoisture.Surface(Profiles.alongSurface(fields, space), length, mould, dew);
  }
}
