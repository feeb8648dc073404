package coldseam.solver.result;

import coldseam.solver.air.Cavity;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The result with slightly ventilated air layers, between those with the layers unventilated and
 * well ventilated: the total resistances 1/L2D and 1/U are interpolated (ISO 6946:2017, extended
 * here to two dimensions). Both being monotone in L2D, intervals are carried from end to end.
 */
public final class Interpolation {
  private static final String SOURCE =
      "ISO 6946:2017, total resistance interpolated; in two dimensions by extension of this tool";

  /** Part of what all couplings of a space come to that may be lost by taking them one by one. */
  private static final double LOST = 0.02;

  private final Result unventilated;
  private final Result well;
  private final double share;

  private Interpolation(Result unventilated, Result well, double wellShare) {
    this.unventilated = unventilated;
    this.well = well;
    share = wellShare;
  }

  /**
   * Interpolates.
   *
   * @param unventilated the result with the layers unventilated
   * @param well the result with the layers well ventilated
   * @param wellShare how much counts as well ventilated, 0 to 1
   * @param layers names of the layers
   * @param openings where their openings come from, in words
   * @return couplings, U and ψ interpolated; everything else of the well ventilated detail
   * @throws DetailException if a ψ takes off something that only one of the two has, or if heat
   *     passes to another space once the layers are well ventilated, so that there is no one total
   *     resistance
   */
  public static Result between(
      Result unventilated, Result well, double wellShare, List<String> layers, String openings) {
    return new Interpolation(unventilated, well, wellShare).result(layers, openings);
  }

  private Result result(List<String> layers, String openings) {
    checkSameWay(layers);
    List<Result.Coupling> couplings = new ArrayList<>();
    for (Result.Coupling one : well.couplings()) {
      couplings.add(coupling(one));
    }
    List<Result.EffectiveTransmittance> transmittances = new ArrayList<>();
    for (int i = 0; i < well.transmittances().size(); i++) {
      transmittances.add(transmittance(i));
    }
    List<Result.LinearTransmittance> psi = new ArrayList<>();
    for (int i = 0; i < well.psi().size(); i++) {
      psi.add(psi(unventilated.psi().get(i), well.psi().get(i)));
    }
    List<Assumption> assumptions = new ArrayList<>();
    for (Assumption line : well.assumptions()) {
      if (!ofLayer(line, layers)) {
        assumptions.add(ofFlank(line));
      }
    }
    assumptions.add(
        new Assumption(
            "slightly ventilated air layers",
            String.join(", ", layers)
                + ": "
                + Wording.figure(100 * share)
                + " % of the way from unventilated to well ventilated, "
                + openings,
            SOURCE));
    List<String> warnings = new ArrayList<>(well.warnings());
    warnings.add(
        "air layers are slightly ventilated: L2D, U, ψ and U of flanks lie between those with the"
            + " layers unventilated and well ventilated; temperatures, heat flows and shares are those with"
            + " the layers well ventilated");
    Map<String, Double> times = new LinkedHashMap<>(unventilated.timesMs());
    for (Map.Entry<String, Double> stage : well.timesMs().entrySet()) {
      times.merge(stage.getKey(), stage.getValue(), Double::sum);
    }
    return new Result(
        well.detail(),
        couplings,
        psi,
        transmittances,
        well.chi(),
        well.frame(),
        well.spaces(),
        well.stretches(),
        well.points(),
        well.profiles(),
        well.shares(),
        well.weights(),
        flanks(),
        cavities(layers),
        well.framings(),
        well.floorEdge(),
        well.moisture(),
        new Requirements(well.detail())
            .evaluate(well.spaces(), psi, transmittances, well.moisture()),
        assumptions,
        warnings,
        well.balance(),
        Math.max(well.largestDisplacementM(), unventilated.largestDisplacementM()),
        well.heatLoss(),
        well.surface(),
        well.triangles(),
        well.unknowns(),
        times);
  }

  /**
   * What the couplings of each space come to has to lie between that unventilated and well
   * ventilated. It does where heat takes the same way in both; where it passes to one space in the
   * one and to another in the other, every single resistance goes with the larger and heat is lost.
   */
  private void checkSameWay(List<String> layers) {
    for (Result.SpaceResult space : well.spaces()) {
      double one = 0;
      double other = 0;
      double sum = 0;
      for (Result.Coupling of : well.couplings()) {
        if (of.from().equals(space.name()) || of.to().equals(space.name())) {
          double with = of.valueWPerMK().value();
          double without = unventilated(of).value();
          one += without;
          other += with;
          sum += harmonic(without, with);
        }
      }
      if (sum < (1 - LOST) * harmonic(one, other)) {
        throw new DetailException(
            List.of(
                new Fault(
                    "cavity",
                    "",
                    "the slightly ventilated air layers ("
                        + String.join(", ", layers)
                        + ") lead heat from '"
                        + space.name()
                        + "' to another space than it passes to with them unventilated, so that"
                        + " there is no one total resistance to interpolate; state `unventilated`"
                        + " or `well`, or the space beyond the layer as `to`",
                    Optional.empty())));
      }
    }
  }

  private Quantity unventilated(Result.Coupling of) {
    for (Result.Coupling other : unventilated.couplings()) {
      if (other.from().equals(of.from()) && other.to().equals(of.to())) {
        return other.valueWPerMK();
      }
    }
    throw new IllegalStateException("no coupling of " + of.from() + " and " + of.to());
  }

  private Result.Coupling coupling(Result.Coupling of) {
    return new Result.Coupling(
        of.from(), of.to(), between(unventilated(of), of.valueWPerMK()), Optional.empty());
  }

  private Result.EffectiveTransmittance transmittance(int i) {
    Result.EffectiveTransmittance one = unventilated.transmittances().get(i);
    Result.EffectiveTransmittance other = well.transmittances().get(i);
    Quantity u = between(one.valueWPerM2K(), other.valueWPerM2K());
    return new Result.EffectiveTransmittance(
        other.of(), other.warm(), other.cold(), u, inverse(u), other.widthM(), Optional.empty());
  }

  /** Lengths are those with the layers unventilated: they belong to the building. */
  private Result.LinearTransmittance psi(
      Result.LinearTransmittance one, Result.LinearTransmittance other) {
    Quantity coupling = between(one.couplingWPerMK(), other.couplingWPerMK());
    List<Result.Subtracted> subtracted = new ArrayList<>();
    double taken = 0;
    double least = 0;
    double most = 0;
    for (Result.Subtracted term : one.subtracted()) {
      Result.Subtracted between = between(one.name(), term, other.subtracted());
      subtracted.add(between);
      taken += between.valueWPerMK().mid();
      least += between.valueWPerMK().lower();
      most += between.valueWPerMK().upper();
    }
    double value = coupling.value() - taken;
    Certificate certificate;
    if (coupling.certificate() instanceof Certificate.Certified proved) {
      certificate = new Certificate.Certified(proved.lower() - most, proved.upper() - least);
    } else {
      String reason = ((Certificate.NotCertified) coupling.certificate()).reason();
      certificate = new Certificate.NotCertified(reason, coupling.halfWidth() + (most - least) / 2);
    }
    return new Result.LinearTransmittance(
        one.name(),
        one.of(),
        one.warm(),
        one.cold(),
        one.dimensions(),
        coupling,
        new Quantity(value, certificate),
        subtracted,
        List.of(),
        List.of(),
        Optional.empty());
  }

  /** Flanks by U between the two, with layers and lengths as they are unventilated. */
  private List<Result.FlankResult> flanks() {
    List<Result.FlankResult> all = new ArrayList<>();
    for (Result.FlankResult of : well.flanks()) {
      Result.FlankResult flank = of;
      for (Result.FlankResult one : unventilated.flanks()) {
        if (one.name().equals(of.name())) {
          flank =
              new Result.FlankResult(
                  one.name(),
                  between(one.uWPerM2K(), of.uWPerM2K()),
                  one.warm(),
                  one.cold(),
                  one.cutStart(),
                  one.cutEnd(),
                  one.layers(),
                  one.lengthM());
        }
      }
      all.add(flank);
    }
    return all;
  }

  /** The line on the U of a flank says between which two it lies; any other stays. */
  private Assumption ofFlank(Assumption line) {
    for (Result.FlankResult flank : flanks()) {
      if (!line.what().equals(Result.FlankResult.assumption(flank.name()))) {
        continue;
      }
      for (Assumption other : unventilated.assumptions()) {
        if (other.what().equals(line.what()) && !other.value().equals(line.value())) {
          return new Assumption(
              line.what(),
              Wording.figure(flank.uWPerM2K().mid())
                  + " W/(m²·K), between "
                  + other.value()
                  + " (unventilated) and "
                  + line.value()
                  + " (well ventilated)",
              line.source());
        }
      }
    }
    return line;
  }

  private Result.Subtracted between(
      String psi, Result.Subtracted term, List<Result.Subtracted> others) {
    for (Result.Subtracted other : others) {
      if (!other.name().equals(term.name())) {
        continue;
      }
      if (term.uWPerM2K().isEmpty() || other.uWPerM2K().isEmpty() || term.lengthM().isEmpty()) {
        return term;
      }
      Bracket u = between(term.uWPerM2K().get(), other.uWPerM2K().get());
      double factor = term.weight() * term.lengthM().getAsDouble();
      Bracket value =
          factor >= 0
              ? new Bracket(factor * u.lower(), factor * u.upper())
              : new Bracket(factor * u.upper(), factor * u.lower());
      return new Result.Subtracted(
          term.name(), Optional.of(u), term.lengthM(), term.weight(), value, term.derivation());
    }
    throw new DetailException(
        List.of(
            new Fault(
                "psi",
                psi,
                "takes off '"
                    + term.name()
                    + "', which is not there with the air layer well ventilated; type its U",
                Optional.empty())));
  }

  private Bracket between(Bracket one, Bracket other) {
    return new Bracket(harmonic(one.lower(), other.lower()), harmonic(one.upper(), other.upper()));
  }

  private Quantity between(Quantity one, Quantity other) {
    double value = harmonic(one.value(), other.value());
    if (one.certificate() instanceof Certificate.Certified a
        && other.certificate() instanceof Certificate.Certified b
        && a.lower() > 0
        && b.lower() > 0) {
      return new Quantity(
          value,
          new Certificate.Certified(
              harmonic(a.lower(), b.lower()), harmonic(a.upper(), b.upper())));
    }
    String reason = "one of the two numbers it lies between is not proved";
    return new Quantity(
        value, new Certificate.NotCertified(reason, Math.max(one.halfWidth(), other.halfWidth())));
  }

  /** The number of which the inverse lies between two inverses; 0 if one of them is 0. */
  private double harmonic(double one, double other) {
    return one > 0 && other > 0 ? 1 / ((1 - share) / one + share / other) : 0;
  }

  private static Quantity inverse(Quantity u) {
    if (u.certificate() instanceof Certificate.Certified proved && proved.lower() > 0) {
      return new Quantity(
          1 / u.value(), new Certificate.Certified(1 / proved.upper(), 1 / proved.lower()));
    }
    double relative = u.halfWidth() / u.value();
    return new Quantity(
        1 / u.value(),
        new Certificate.NotCertified(
            "one of the two numbers it lies between is not proved", relative / u.value()));
  }

  private static boolean ofLayer(Assumption line, List<String> layers) {
    for (String layer : layers) {
      if (line.what().startsWith(layer + " at (")) {
        return true;
      }
    }
    return false;
  }

  /** The cavities with the layers unventilated, which are called what they are. */
  private List<Cavity> cavities(List<String> layers) {
    List<Cavity> all = new ArrayList<>();
    for (Cavity cavity : unventilated.cavities()) {
      all.add(
          layers.contains(cavity.name())
              ? new Cavity(
                  cavity.name(),
                  cavity.fill(),
                  cavity.at(),
                  cavity.areaM2(),
                  cavity.rule(),
                  Ventilation.SLIGHTLY_VENTILATED,
                  cavity.slitM(),
                  cavity.space(),
                  cavity.counted())
              : cavity);
    }
    return all;
  }
}
