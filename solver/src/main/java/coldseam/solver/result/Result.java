package coldseam.solver.result;

import coldseam.mesh.plane.Point;
import coldseam.solver.air.Cavity;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Quantity;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Everything wanted of one detail. Heat flow is positive from a space into the detail. Of a body of
 * revolution all of it counts, not a metre: couplings are in W/K and heat flows in W.
 *
 * @param detail what was solved
 * @param couplings coupling coefficients between all pairs of spaces
 * @param psi linear transmittances in the order asked
 * @param transmittances effective U in the order asked
 * @param chi point transmittances in the order asked
 * @param frame how U_f, the last of the U, came about, if a frame is asked for
 * @param spaces one entry a space, in the detail's order
 * @param stretches one entry a named stretch, in the detail's order
 * @param points temperatures at named points
 * @param profiles temperatures along lines and surfaces
 * @param shares what the heat flow hangs on, largest share first; none where it is 0 or infinite
 * @param weights temperature weighting factors of the coldest point of each space and of the named
 *     points; empty for fewer than three spaces
 * @param flanks every flank, named or found
 * @param cavities every air cavity as it was found and given a conductivity; the bounds of all
 *     numbers hold for these conductivities
 * @param framings framed walls beside their two resistance limits
 * @param floorEdge the edge of a floor next to the ground, if one is asked for
 * @param moisture moisture checks of surfaces, one entry a space judged; empty if none is asked for
 * @param requirements what the case requires of its results, in the order written
 * @param assumptions everything chosen for the user
 * @param warnings sentences, each with its figures
 * @param balance in = out
 * @param largestDisplacementM how far resolving the section moved any point, m
 * @param heatLoss the fields with the films for heat loss
 * @param surface the fields with the films for surface temperatures; empty if no surface
 *     temperature is finite or wanted
 * @param triangles triangles of the final heat-loss mesh
 * @param unknowns unknowns of the temperature problem on it
 * @param timesMs milliseconds by stage, in the order run
 */
public record Result(
    Detail detail,
    List<Coupling> couplings,
    List<LinearTransmittance> psi,
    List<EffectiveTransmittance> transmittances,
    List<PointTransmittance> chi,
    Optional<Frame> frame,
    List<SpaceResult> spaces,
    List<StretchResult> stretches,
    List<PointResult> points,
    List<ProfileResult> profiles,
    Shares shares,
    List<Weight> weights,
    List<FlankResult> flanks,
    List<Cavity> cavities,
    List<Framing> framings,
    Optional<FloorEdge> floorEdge,
    List<SpaceMoisture> moisture,
    List<Required> requirements,
    List<Assumption> assumptions,
    List<String> warnings,
    Balance balance,
    double largestDisplacementM,
    Solution heatLoss,
    Optional<Solution> surface,
    int triangles,
    int unknowns,
    Map<String, Double> timesMs) {
  /** The ψ of which it is known what they hang on; of interpolated ones it is not. */
  public List<LinearTransmittance> psiWithSensitivities() {
    List<LinearTransmittance> known = new ArrayList<>(psi.size());
    for (LinearTransmittance one : psi) {
      if (!one.sensitivities().isEmpty()) {
        known.add(one);
      }
    }
    return known;
  }

  /**
   * L2D of a pair.
   *
   * @param from a space
   * @param to another
   * @param valueWPerMK W/(m·K)
   * @param tolerance what the tolerances of conductivities add; empty if none is stated
   */
  public record Coupling(
      String from, String to, Quantity valueWPerMK, Optional<Tolerance> tolerance) {}

  /**
   * What tolerances of conductivities add to a number, each conductivity anywhere within its own.
   *
   * @param halfWidth what value ± its own half-width has to be widened by, same unit
   * @param certificate an interval that is proved for every combination of conductivities; or,
   *     where nothing is proved, the worst case to first order, Σ|∂|·tolerance
   */
  public record Tolerance(double halfWidth, Certificate certificate) {}

  /**
   * How a number follows a conductivity or the conductance of a film.
   *
   * @param of name of the material, or "film indoors 0.13"
   * @param film whether it is a film
   * @param slope change of the number over relative change of the conductivity, or of 1/Rs, to
   *     first order, unit of the number
   */
  public record Sensitivity(String of, boolean film, double slope) {}

  /**
   * Shares. They say what the number hangs on, not where the heat passes: that is the heat flow
   * through each stretch.
   *
   * @param referTo the number they are shares of, in words
   * @param parts largest first; they add up to 1
   */
  public record Shares(String referTo, List<Share> parts) {}

  /**
   * Relative change of a heat flow over relative change of one conductivity or film conductance.
   *
   * @param of name of the material, or "film indoors 0.13"
   * @param space the space that a film faces; empty for a material
   * @param share part of 1
   * @param relativeTolerance of the conductivity, 0 if none is stated
   */
  public record Share(String of, String space, double share, double relativeTolerance) {
    /** Whether it is a film. */
    public boolean film() {
      return !space.isEmpty();
    }
  }

  /**
   * One term taken off L2D.
   *
   * @param name the flank or part
   * @param uWPerM2K its U, W/(m²·K); empty when another detail's L2D is taken off
   * @param lengthM its length, m
   * @param weight b, mostly 1
   * @param valueWPerMK what is taken off, W/(m·K)
   * @param derivation where U and length come from, in words
   */
  public record Subtracted(
      String name,
      Optional<Bracket> uWPerM2K,
      OptionalDouble lengthM,
      double weight,
      Bracket valueWPerMK,
      String derivation) {}

  /**
   * ψ.
   *
   * @param name its name in the case
   * @param of the junction or "glass edge"
   * @param warm spaces on the warm side
   * @param cold spaces on the cold side
   * @param dimensions how lengths are measured; empty for the glass edge of a frame, whose lengths
   *     are the projected width of the frame and visible lengths
   * @param couplingWPerMK the (weighted) L2D it starts from
   * @param valueWPerMK ψ, W/(m·K)
   * @param subtracted what was taken off
   * @param parts each pair's part of the L2D, when spaces were merged: name "warm – cold"
   * @param sensitivities ∂ψ of every material and film, flanks and other details included
   * @param tolerance what the tolerances of conductivities add; empty if none is stated
   */
  public record LinearTransmittance(
      String name,
      String of,
      List<String> warm,
      List<String> cold,
      Optional<DimensionSystem> dimensions,
      Quantity couplingWPerMK,
      Quantity valueWPerMK,
      List<Subtracted> subtracted,
      List<Coupling> parts,
      List<Sensitivity> sensitivities,
      Optional<Tolerance> tolerance) {}

  /**
   * One term taken off L3D: a surface U·A, a line ψ·l, or another detail's L3D.
   *
   * @param name the undisturbed construction or part
   * @param uWPerM2K U of a surface, W/(m²·K)
   * @param areaM2 its area, m²; less than 0 where it is missing
   * @param psiWPerMK conductance of a metre of a line, W/(m·K)
   * @param lengthM its length, m
   * @param valueWPerK what is taken off, W/K
   * @param derivation where it comes from, in words
   */
  public record PointTerm(
      String name,
      Optional<Bracket> uWPerM2K,
      OptionalDouble areaM2,
      Optional<Bracket> psiWPerMK,
      OptionalDouble lengthM,
      Bracket valueWPerK,
      String derivation) {
    /** The same with another worth, W/K. */
    PointTerm worth(Bracket otherWPerK) {
      return new PointTerm(name, uWPerM2K, areaM2, psiWPerMK, lengthM, otherWPerK, derivation);
    }
  }

  /**
   * χ.
   *
   * @param name its name in the case
   * @param of what it is of
   * @param warm spaces on the warm side
   * @param cold spaces on the cold side
   * @param couplingWPerK the L3D it starts from
   * @param valueWPerK χ, W/K
   * @param subtracted what was taken off
   * @param sensitivities ∂χ of every material and film, what is taken off included
   * @param tolerance what the tolerances of conductivities add; empty if none is stated
   */
  public record PointTransmittance(
      String name,
      String of,
      List<String> warm,
      List<String> cold,
      Quantity couplingWPerK,
      Quantity valueWPerK,
      List<PointTerm> subtracted,
      List<Sensitivity> sensitivities,
      Optional<Tolerance> tolerance) {}

  /**
   * Effective U.
   *
   * @param of what it is of
   * @param warm spaces on the warm side
   * @param cold spaces on the cold side
   * @param valueWPerM2K U, W/(m²·K)
   * @param resistanceM2KPerW total resistance 1/U, films included, m²·K/W
   * @param widthM module width, m
   * @param tolerance what the tolerances of conductivities add to U; empty if none is stated
   */
  public record EffectiveTransmittance(
      String of,
      List<String> warm,
      List<String> cold,
      Quantity valueWPerM2K,
      Quantity resistanceM2KPerW,
      double widthM,
      Optional<Tolerance> tolerance) {}

  /**
   * How U_f of a frame came about (ISO 10077-2).
   *
   * @param width projected width b_f that U_f refers to
   * @param visible visible length of each glazing or panel, from left to right
   * @param innerM projected width seen from inside as drawn, m
   * @param outerM projected width seen from outside as drawn, m
   * @param couplingWPerMK L2D of the run with the insulating panel
   * @param panels what was taken off for panels
   * @param lossWPerMK what is left, U_f·b_f
   * @param glazedCouplingWPerMK L2D of the run with the glazing; empty if the panel itself is drawn
   */
  public record Frame(
      Length width,
      List<Length> visible,
      double innerM,
      double outerM,
      Quantity couplingWPerMK,
      List<Subtracted> panels,
      Quantity lossWPerMK,
      Optional<Quantity> glazedCouplingWPerMK) {
    /** Copies the list. */
    public Frame {
      visible = List.copyOf(visible);
      panels = List.copyOf(panels);
    }
  }

  /**
   * A point of a surface; an estimate, never certified.
   *
   * @param filmSet films it was computed with
   * @param temperatureC °C
   * @param at the place, in the coordinates of the drawing, m
   * @param filmM2KPerW local Rs, m²·K/W
   * @param fRsi temperature factor relative to the coldest space; empty where it has no meaning
   * @param estimatedErrorK a guess at the error, K
   */
  public record SurfacePoint(
      FilmSet filmSet,
      double temperatureC,
      Point at,
      double filmM2KPerW,
      OptionalDouble fRsi,
      double estimatedErrorK) {}

  /**
   * What concerns one space.
   *
   * @param name its name
   * @param temperatureC °C, a result if it floats
   * @param floating whether the temperature is a result
   * @param heatFlowWPerM into the detail, W/m; infinite where two fixed temperatures meet
   * @param coldest its coldest surface point, if it faces anything
   * @param warmest its warmest surface point
   * @param referenceSpace the space f_Rsi is relative to, if any
   */
  public record SpaceResult(
      String name,
      double temperatureC,
      boolean floating,
      double heatFlowWPerM,
      Optional<SurfacePoint> coldest,
      Optional<SurfacePoint> warmest,
      Optional<String> referenceSpace) {}

  /**
   * What concerns one stretch.
   *
   * @param name its name
   * @param space the space it faces, empty on cut-offs and prescribed flows
   * @param heatFlowWPerM into the detail, W/m
   * @param lengthM developed length, m
   */
  public record StretchResult(String name, String space, double heatFlowWPerM, double lengthM) {}

  /**
   * A temperature at a point.
   *
   * @param name its name
   * @param filmSet films it was computed with
   * @param at the place, m
   * @param temperatureC °C
   */
  public record PointResult(String name, FilmSet filmSet, Point at, double temperatureC) {}

  /**
   * Temperatures along a line or a surface.
   *
   * @param name its name
   * @param filmSet films they were computed with
   * @param samples in order
   */
  public record ProfileResult(String name, FilmSet filmSet, List<Sample> samples) {}

  /**
   * One temperature of a profile.
   *
   * @param distanceM developed distance from the start, m
   * @param at the place, m
   * @param temperatureC °C, NaN outside the conducting section
   */
  public record Sample(double distanceM, Point at, double temperatureC) {}

  /**
   * A temperature weighting factor: θ(point) = Σ g_k θ_k (ISO 10211).
   *
   * @param point name of the point, or "coldest of SPACE"
   * @param filmSet films it was computed with
   * @param space the space
   * @param g the factor
   */
  public record Weight(String point, FilmSet filmSet, String space, double g) {}

  /**
   * A flank.
   *
   * @param name its name, or one given by the solver
   * @param uWPerM2K U between its two spaces, W/(m²·K)
   * @param warm the warmer space it separates
   * @param cold the colder space
   * @param cutStart one end of its cut-off plane, m; empty if typed altogether
   * @param cutEnd the other end, m
   * @param layers what was met at the plane, warm to cold, in words with thickness in mm
   * @param lengthM lengths by dimension system where known, m
   */
  public record FlankResult(
      String name,
      Bracket uWPerM2K,
      String warm,
      String cold,
      Optional<Point> cutStart,
      Optional<Point> cutEnd,
      List<String> layers,
      Map<DimensionSystem, Length> lengthM) {
    /** What the assumption on the U of a flank is called. */
    static String assumption(String name) {
      return "U of flank '" + name + "'";
    }
  }

  /**
   * A reference length and the line it was measured along.
   *
   * @param valueM m
   * @param from one end for drawing, m; empty when typed
   * @param to the other end, m
   * @param derivation how it was found, in words
   */
  public record Length(
      double valueM, Optional<Point> from, Optional<Point> to, String derivation) {}

  /**
   * The balance of heat; both figures NaN where a flow is infinite.
   *
   * @param sumWPerM sum of all flows into the detail, W/m
   * @param relative the same over half the sum of their absolute values
   */
  public record Balance(double sumWPerM, double relative) {}

  /**
   * A requirement of the case and what came of it. An interval decides it where there is one, the
   * estimated error of a surface temperature where there is none.
   *
   * @param kind what it is about
   * @param name the space, ψ or U
   * @param value what was found; NaN for moisture
   * @param error what it is uncertain by; 0 for moisture
   * @param limit at least this f_Rsi, at most this ψ or U; NaN for moisture
   * @param verdict whether it is met
   */
  public record Required(
      Wanted.Requirement.Kind kind,
      String name,
      double value,
      double error,
      double limit,
      Verdict verdict) {}

  /**
   * The edge of a floor next to the ground.
   *
   * @param of what its ψ rest on
   * @param factorWPerMK slab-edge F-factor: heat flow into the surface of the half floor for each
   *     metre of edge and kelvin between indoors and outdoors, W/(m·K); empty if it is not asked
   *     for or has no meaning
   * @param errorWPerMK estimated error of it
   */
  public record FloorEdge(Wanted.FloorEdge of, OptionalDouble factorWPerMK, double errorWPerMK) {}

  /**
   * A framed wall beside its two resistance limits (ISO 6946); R in m²·K/W, films included unless
   * said otherwise.
   *
   * @param wanted what was asked for
   * @param resistance R of the module as solved, with what is known of it
   * @param films mean of both films together
   * @param parallelR R by parallel paths: no resistance is higher
   * @param isothermalR R by isothermal planes: none is lower
   * @param besideR R beside all framing
   * @param framingR R straight through the framing
   * @param framedShare part of the width that framing takes
   * @param metal whether metal bridges a layer
   * @param meanR mean of the two limits; empty where ISO 6946 does not allow it
   * @param meanError its greatest relative error
   * @param framingWPerMK what the framing of one module adds, for each metre: (U − 1/R
   *     beside)·width
   * @param layerR R of the layer asked for, beside the framing
   * @param effectiveR what is left of it: R less everything else beside the framing
   * @param wholeWPerM2K U of the whole wall by parallel paths of its fractions
   * @param wholeSolvedWPerM2K U as solved, with what framing beyond that drawn adds straight
   *     through
   * @param corrected U with corrections
   */
  public record Framing(
      Wanted.Framing wanted,
      Quantity resistance,
      double films,
      double parallelR,
      double isothermalR,
      double besideR,
      double framingR,
      double framedShare,
      boolean metal,
      OptionalDouble meanR,
      double meanError,
      double framingWPerMK,
      OptionalDouble layerR,
      OptionalDouble effectiveR,
      OptionalDouble wholeWPerM2K,
      OptionalDouble wholeSolvedWPerM2K,
      Optional<Corrected> corrected) {
    /** Part of the resistance beside the framing that is lost by it, 0 to 1. */
    public double lostShare() {
      return 1 - resistance.value() / besideR;
    }
  }

  /**
   * Corrections of ISO 6946 to a U; W/(m²·K).
   *
   * @param voids ΔU_g
   * @param fasteners ΔU_f
   * @param rain ΔU_r
   * @param uncorrected U without them
   * @param tapered U of the part with a tapered layer, not corrected
   */
  public record Corrected(
      double voids, double fasteners, double rain, double uncorrected, OptionalDouble tapered) {
    /** Whether all of it together may be left out. */
    public boolean negligible() {
      return voids + fasteners + rain < TransmittanceRules.NEGLIGIBLE * uncorrected;
    }

    /** U with all corrections. */
    public double u() {
      return uncorrected + voids + fasteners + rain;
    }
  }
}
