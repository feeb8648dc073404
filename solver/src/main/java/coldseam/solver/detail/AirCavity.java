package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.Emissivities;
import coldseam.solver.cavity.RadiationForm;
import coldseam.solver.cavity.Ventilation;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Air at rest, or nearly so, whose conductivity follows from its shape, its faces and the heat flow
 * through it. It stands for as many cavities as it is taken apart into; before a detail is solved
 * each of them becomes a {@link Material}, a {@link VentilatedAir} or part of a {@link Space}.
 *
 * @param name unique among the fills of a detail
 * @param settings what is stated for all of it
 * @param form how radiation is written; empty: as before 2017 in frames, as in 2017 in layers
 * @param temperatures where the temperatures in the formulas come from; found if the form is
 *     radiosity
 * @param throatM places up to this width part it, m
 * @param enclosedOnly whether an area of it counts only where other areas enclose it: laid first
 *     and over everything, it fills what is left uncovered inside the section
 * @param singles what is stated for single cavities
 */
public record AirCavity(
    String name,
    Settings settings,
    Optional<RadiationForm> form,
    Temperatures temperatures,
    double throatM,
    boolean enclosedOnly,
    List<Single> singles)
    implements Fill {
  /** Which standard's rule gives the conductivity. */
  public enum Rule {
    /** Cavities of frames: ISO 10077-2. */
    FRAME,
    /** Air layers and voids in building elements: ISO 6946. */
    LAYER
  }

  /** Where the temperatures in the formulas come from. */
  public enum Temperatures {
    /** The standard's fixed values: 10 K and 283 K in frames, up to 5 K and 10 °C in layers. */
    FIXED,
    /** The solution: the formulas and the temperatures are brought to agree. */
    FOUND
  }

  /**
   * Ventilation as stated.
   *
   * @param ventilation the class
   * @param openings area of the openings where the class follows from it, m² per metre of length
   *     (vertical layers) or per m² (horizontal ones)
   * @param space the space it is ventilated from; empty: the one it opens to, else the coldest
   */
  public record Exchange(
      Ventilation ventilation, OptionalDouble openings, Optional<String> space) {}

  /**
   * What is stated and not left to the tool.
   *
   * @param rule the rule
   * @param exchange the ventilation
   * @param emissivities of the two faces
   * @param direction vector in which heat flows
   * @param conductivityWPerMK λ, W/(m·K), in place of all formulas
   */
  public record Settings(
      Optional<Rule> rule,
      Optional<Exchange> exchange,
      Optional<Emissivities> emissivities,
      Optional<Point> direction,
      OptionalDouble conductivityWPerMK) {
    /** Nothing is stated. */
    public static final Settings NONE =
        new Settings(
            Optional.empty(),
            Optional.empty(),
            Optional.empty(),
            Optional.empty(),
            OptionalDouble.empty());

    /**
     * Checks the figures.
     *
     * @throws IllegalArgumentException if the conductivity is not more than 0 or the direction is 0
     */
    public Settings {
      if (conductivityWPerMK.isPresent()
          && !(conductivityWPerMK.getAsDouble() > 0
              && Double.isFinite(conductivityWPerMK.getAsDouble()))) {
        throw new IllegalArgumentException("the conductivity of a cavity is more than 0");
      }
      if (direction.isPresent() && !(Math.hypot(direction.get().x(), direction.get().y()) > 0)) {
        throw new IllegalArgumentException("a direction of heat flow is not 0");
      }
    }

    /** These settings where something is stated, others elsewhere. */
    public Settings over(Settings others) {
      return new Settings(
          rule.isPresent() ? rule : others.rule,
          exchange.isPresent() ? exchange : others.exchange,
          emissivities.isPresent() ? emissivities : others.emissivities,
          direction.isPresent() ? direction : others.direction,
          conductivityWPerMK.isPresent() ? conductivityWPerMK : others.conductivityWPerMK);
    }
  }

  /**
   * What is stated for one cavity.
   *
   * @param inside a point of it, m
   * @param settings what is stated
   */
  public record Single(Point inside, Settings settings) {}

  /** Checks the figures. */
  public AirCavity {
    singles = List.copyOf(singles);
    if (form.isPresent() && form.get() == RadiationForm.RADIOSITY) {
      // There is no radiosity without temperatures.
      temperatures = Temperatures.FOUND;
    }
    if (name.isEmpty()) {
      throw new IllegalArgumentException("an air cavity needs a name");
    }
    if (!(throatM >= 0) || !Double.isFinite(throatM)) {
      throw new IllegalArgumentException(name + ": the width of a throat is 0 or more");
    }
  }

  /** How radiation is written where a rule holds. */
  public RadiationForm form(Rule rule) {
    return form.orElse(rule == Rule.FRAME ? RadiationForm.PRODUCT : RadiationForm.SERIES);
  }

  /**
   * Air of which nothing is stated.
   *
   * @param name the name
   * @return the fill
   */
  public static AirCavity of(String name) {
    return new AirCavity(
        name,
        Settings.NONE,
        Optional.empty(),
        Temperatures.FIXED,
        Ventilation.UNVENTILATED_SLIT_M,
        false,
        List.of());
  }
}
