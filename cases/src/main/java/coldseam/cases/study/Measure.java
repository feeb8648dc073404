package coldseam.cases.study;

import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Geometry;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;

/**
 * A number of a result as studies compare it: with two ends between which it lies. Two numbers
 * differ only where these do not overlap.
 *
 * @param kind what it is
 * @param of whose: the name of a ψ or U, a space, or two spaces
 * @param value the number
 * @param lower lower end
 * @param upper upper end
 * @param knowledge what the ends are
 */
public record Measure(
    Kind kind, String of, double value, double lower, double upper, Knowledge knowledge) {
  /** The margin of a surface temperature, which has no bounds, K. */
  public static final double MARGIN_K = 0.01;

  /** What a number is. */
  public enum Kind {
    /** L2D, W/(m·K). */
    L2D("L2D", "L2D", "W/(m·K)", "W_per_mK"),
    /** ψ, W/(m·K). */
    PSI("psi", "ψ", "W/(m·K)", "W_per_mK"),
    /** U, W/(m²·K). */
    U("U", "U", "W/(m²·K)", "W_per_m2K"),
    /** χ, W/K. */
    CHI("chi", "χ", "W/K", "W_per_K"),
    /** L3D of a body of revolution, W/K. */
    L3D("L3D", "L3D", "W/K", "W_per_K"),
    /** Coldest surface temperature, °C. */
    COLDEST("coldest", "coldest surface", "°C", "C"),
    /** Temperature factor. */
    F_RSI("fRsi", "f_Rsi", "", "");

    private final String word;
    private final String symbol;
    private final String unit;
    private final String unitInNames;

    Kind(String word, String symbol, String unit, String unitInNames) {
      this.word = word;
      this.symbol = symbol;
      this.unit = unit;
      this.unitInNames = unitInNames;
    }

    /** How it is typed, and written in names of columns. */
    public String word() {
      return word;
    }

    /** How it is written for people. */
    public String symbol() {
      return symbol;
    }

    /** Its unit for people; empty if it has none. */
    public String unit() {
      return unit;
    }

    /** Its unit in names of columns and members; empty if it has none. */
    public String unitInNames() {
      return unitInNames;
    }

    /** Whether a greater number is better: warmer surfaces, less heat. */
    public boolean greaterIsBetter() {
      return this == COLDEST || this == F_RSI;
    }
  }

  /** What is known of a number. */
  public enum Knowledge {
    /** The ends are proved. */
    CERTIFIED,
    /** An estimate; the ends are a margin on either side: 0.01 K, more if its error may be. */
    ESTIMATE,
    /** Nothing is proved, though it could be: the ends are infinite. */
    OPEN
  }

  /**
   * Every number of a result that studies look at, in the order ψ, χ, U, L2D or L3D, surfaces.
   *
   * @param result the result
   * @return the numbers, finite ones only
   */
  public static List<Measure> all(Result result) {
    List<Measure> all = new ArrayList<>();
    for (Result.LinearTransmittance psi : result.psi()) {
      add(all, Kind.PSI, psi.name(), psi.valueWPerMK());
    }
    for (Result.PointTransmittance chi : result.chi()) {
      add(all, Kind.CHI, chi.name(), chi.valueWPerK());
    }
    for (Result.EffectiveTransmittance u : result.transmittances()) {
      add(all, Kind.U, u.of(), u.valueWPerM2K());
    }
    for (Result.Coupling coupling : result.couplings()) {
      Kind kind = result.detail().geometry() == Geometry.AXISYMMETRIC ? Kind.L3D : Kind.L2D;
      add(all, kind, coupling.from() + " – " + coupling.to(), coupling.valueWPerMK());
    }
    for (Result.SpaceResult space : result.spaces()) {
      if (space.coldest().isPresent() && space.coldest().get().fRsi().isPresent()) {
        surface(all, space, result);
      }
    }
    return all;
  }

  private static void add(List<Measure> all, Kind kind, String of, Quantity quantity) {
    if (!Double.isFinite(quantity.value())) {
      return;
    }
    if (quantity.certificate() instanceof Certificate.Certified proved) {
      all.add(
          new Measure(
              kind, of, quantity.value(), proved.lower(), proved.upper(), Knowledge.CERTIFIED));
    } else {
      all.add(
          new Measure(
              kind,
              of,
              quantity.value(),
              Double.NEGATIVE_INFINITY,
              Double.POSITIVE_INFINITY,
              Knowledge.OPEN));
    }
  }

  private static void surface(List<Measure> all, Result.SpaceResult space, Result result) {
    Result.SurfacePoint point = space.coldest().get();
    double margin = Math.max(MARGIN_K, point.estimatedErrorK());
    double temperature = point.temperatureC();
    all.add(
        new Measure(
            Kind.COLDEST,
            space.name(),
            temperature,
            temperature - margin,
            temperature + margin,
            Knowledge.ESTIMATE));
    double reference = Double.NaN;
    for (Result.SpaceResult other : result.spaces()) {
      if (space.referenceSpace().isPresent() && other.name().equals(space.referenceSpace().get())) {
        reference = other.temperatureC();
      }
    }
    double f = point.fRsi().getAsDouble();
    double part = margin / Math.abs(space.temperatureC() - reference);
    if (Double.isFinite(part)) {
      all.add(new Measure(Kind.F_RSI, space.name(), f, f - part, f + part, Knowledge.ESTIMATE));
    }
  }

  /** What it is called where it is typed: {@code psi.external}. */
  public String typedName() {
    return kind.word() + "." + of;
  }

  /** What it is called: {@code ψ external}. */
  public String name() {
    return kind.symbol() + " " + of;
  }

  /** Whether it is surely less than another. */
  public boolean surelyLess(Measure other) {
    return upper < other.lower;
  }
}
