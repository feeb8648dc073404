package coldseam.solver.result;

import coldseam.solver.conduction.Dissipation;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Wording;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;

/**
 * A material or a film as conductances of several details have it in common.
 *
 * @param name of the material, or "film indoors 0.13"
 * @param film whether it is a film
 * @param conductivityWPerMK first conductivity of a material; 0 for a film
 * @param crossConductivityWPerMK second conductivity; 0 for a film
 * @param relativeTolerance of the conductivity; 0 for a film
 */
record Part(
    String name,
    boolean film,
    double conductivityWPerMK,
    double crossConductivityWPerMK,
    double relativeTolerance) {
  private static final int FILM_DIGITS = 4;

  static Part of(Material material) {
    return new Part(
        material.name(),
        false,
        material.conductivityWPerMK(),
        material.crossConductivityWPerMK(),
        material.relativeTolerance());
  }

  static Part film(String space, double resistanceM2KPerW) {
    double figure =
        new BigDecimal(resistanceM2KPerW).round(new MathContext(FILM_DIGITS)).doubleValue();
    return new Part("film " + space + " " + Wording.figure(figure), true, 0, 0, 0);
  }

  /** The parts of a solution. */
  static List<Part> of(Detail detail, Dissipation dissipation) {
    List<Part> parts = new ArrayList<>();
    for (Dissipation.Part part : dissipation.parts()) {
      if (part instanceof Dissipation.Part.Solid solid) {
        parts.add(of(solid.material()));
      } else if (part instanceof Dissipation.Part.Film film) {
        parts.add(film(detail.spaces().get(film.space()).name(), film.resistanceM2KPerW()));
      }
    }
    return parts;
  }

  /** The same under another name. */
  Part called(String other) {
    return new Part(other, film, conductivityWPerMK, crossConductivityWPerMK, relativeTolerance);
  }

  /** Whether it is the same material or film, so that one factor holds for both. */
  boolean same(Part other) {
    return film == other.film
        && conductivityWPerMK == other.conductivityWPerMK
        && crossConductivityWPerMK == other.crossConductivityWPerMK
        && relativeTolerance == other.relativeTolerance
        && name.equals(other.name);
  }
}
