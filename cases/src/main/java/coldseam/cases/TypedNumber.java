package coldseam.cases;

import java.util.OptionalDouble;

/** Numbers with units as a case spells them, typed elsewhere than in a case. */
public final class TypedNumber {
  private TypedNumber() {}

  /**
   * Reads a number, or arithmetic on numbers; bare, it counts in the unit.
   *
   * @param typed as typed, e.g. {@code 0.06 Btu/(h ft F)}
   * @param unit {@code W/(m·K)}, {@code W/(m²·K)}, {@code W/K}, {@code °C}, or empty for a plain
   *     number
   * @return the number in that unit, or empty if it cannot be read or is of another kind
   */
  public static OptionalDouble in(String typed, String unit) {
    Dimension wanted =
        switch (unit) {
          case "W/(m·K)" -> Dimension.CONDUCTIVITY;
          case "W/(m²·K)" -> Dimension.TRANSMITTANCE;
          case "W/K" -> Dimension.CONDUCTANCE;
          case "°C" -> Dimension.TEMPERATURE;
          case "" -> Dimension.BARE;
          default -> throw new IllegalArgumentException("no unit of a result: " + unit);
        };
    Problems problems = new Problems("");
    NamedValues none = new NamedValues(problems, LengthUnit.MM);
    Value value = none.evaluated(Rereading.typed(typed), "this");
    boolean fits = value.dimension().bare() || value.dimension().same(wanted);
    return value.unknown() || !fits ? OptionalDouble.empty() : OptionalDouble.of(value.number());
  }
}
