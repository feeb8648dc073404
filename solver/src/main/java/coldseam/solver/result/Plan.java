package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.air.Cavity;
import coldseam.solver.conduction.Conduction;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * Everything that is settled about the results of one detail before it is solved: flanks with U and
 * lengths, what each ψ subtracts, module widths, which film sets are needed, what is assumed and
 * what looks doubtful. With the solutions it makes the {@link Result}.
 */
public final class Plan {
  /** Relative difference of a typed U from the drawn layers above which a warning is given. */
  private static final double TYPED_U_DIFFERS = 1e-3;

  private final Detail detail;
  private final Partition partition;
  private final Conditions heatLoss;
  private final Conditions surface;
  private final List<PlacedFlank> flanks;
  private final FlankLengths lengths;
  private final LinearTransmittances psi;
  private final EffectiveTransmittances transmittances;
  private final FrameTransmittances frames;
  private final PointTransmittances points;
  private final CutOffChecks cutOffs;
  private final Framings framings;
  private final MoistureChecks moisture;
  private final Requirements requirements;
  private final boolean module;
  private final List<Assumption> assumptions;
  private final List<String> warnings;

  private Plan(
      Detail detail,
      Partition partition,
      Conditions heatLoss,
      Conditions surface,
      Map<Subtraction.OfDetail, Plan> others,
      boolean provisional) {
    this.detail = detail;
    this.partition = partition;
    this.heatLoss = heatLoss;
    this.surface = surface;
    Outline outline = new Outline(partition, heatLoss);
    FlankFinder finder = new FlankFinder(detail, outline);
    boolean plane = detail.geometry() == Geometry.PLANE;
    flanks = plane ? finder.flanks() : List.of();
    lengths = new FlankLengths(outline, flanks, provisional);
    PsiPlanner planner = new PsiPlanner(detail, outline, flanks, lengths);
    psi = new LinearTransmittances(planner.plans(), detail, heatLoss);
    transmittances = new EffectiveTransmittances(detail, outline);
    frames = new FrameTransmittances(detail, outline, flanks, others);
    points = new PointTransmittances(detail, outline, plane ? List.of() : finder.flanks());
    SectionChecks section = new SectionChecks(detail, outline);
    cutOffs = new CutOffChecks(outline);
    framings = new Framings(detail, partition, heatLoss);
    moisture = new MoistureChecks(detail);
    requirements = new Requirements(detail);
    module = transmittances.any() && !psi.any();
    List<Fault> faults = new ArrayList<>(finder.faults());
    faults.addAll(planner.faults());
    faults.addAll(transmittances.faults());
    faults.addAll(frames.faults());
    faults.addAll(points.faults());
    faults.addAll(section.faults());
    faults.addAll(framings.faults());
    faults.addAll(moisture.faults());
    for (Map.Entry<Subtraction.OfDetail, Plan> other : others.entrySet()) {
      faults.addAll(other.getValue().sides(other.getKey()));
    }
    if (!faults.isEmpty()) {
      throw new DetailException(faults);
    }
    assumptions = collectAssumptions(planner.assumptions(), others);
    warnings = new ArrayList<>(section.warnings());
    warnings.addAll(new HeatPaths(detail, outline).warnings());
    warnings.addAll(new SpaceChecks(detail, outline).warnings());
    warnings.addAll(planner.warnings());
    warnings.addAll(transmittances.warnings());
    warnings.addAll(frames.warnings());
    if (!module && !frames.any()) {
      warnings.addAll(cutOffs.distances());
    }
    for (PlacedFlank flank : flanks) {
      warnOfFlank(flank);
    }
    for (Map.Entry<Subtraction.OfDetail, Plan> other : others.entrySet()) {
      for (String warning : other.getValue().warnings) {
        warnings.add("in '" + other.getKey().name() + "': " + warning);
      }
    }
  }

  /**
   * Settles what can be settled.
   *
   * @param detail the detail
   * @param partition its partition
   * @param heatLoss conditions with the films for heat loss
   * @param surface conditions with the films for surface temperatures
   * @param others the plan of every detail that a ψ subtracts, and of the frame with its panel
   * @param provisional whether conductivities of cavities are still to be found: nothing that hangs
   *     on them is held against the detail
   * @return the plan
   * @throws DetailException if a flank has no U, a length or width that is needed cannot be
   *     derived, or a wanted result names what is not there; all such faults together
   */
  public static Plan of(
      Detail detail,
      Partition partition,
      Conditions heatLoss,
      Conditions surface,
      Map<Subtraction.OfDetail, Plan> others,
      boolean provisional) {
    return new Plan(detail, partition, heatLoss, surface, others, provisional);
  }

  /** The detail as it is solved. */
  public Detail detail() {
    return detail;
  }

  /** Every flank that has a U, named or found, in the order named, then found. */
  public List<Result.FlankResult> flanks() {
    List<Result.FlankResult> results = new ArrayList<>();
    Outline outline = new Outline(partition, heatLoss);
    for (PlacedFlank flank : flanks) {
      Optional<Bracket> u = flank.uWPerM2K();
      if (u.isPresent()) {
        results.add(
            new Result.FlankResult(
                flank.name(),
                u.get(),
                name(flank.warm()),
                name(flank.cold()),
                place(outline, flank.warmEnd()),
                place(outline, flank.coldEnd()),
                flank.layerWords(),
                lengths.known(flank)));
      }
    }
    return results;
  }

  private static Optional<Point> place(Outline outline, Optional<FlankEnd> end) {
    return end.isEmpty() ? Optional.empty() : Optional.of(outline.point(end.get().vertex()));
  }

  private String name(int space) {
    return space < 0 ? "" : detail.spaces().get(space).name();
  }

  /** Everything chosen for the user. */
  public List<Assumption> assumptions() {
    return List.copyOf(assumptions);
  }

  /** Warnings that need no solution. */
  public List<String> warnings() {
    return List.copyOf(warnings);
  }

  /** Whether a ψ is wanted. */
  public boolean psiWanted() {
    return psi.any() || frames.glazed();
  }

  /** Whether a U is wanted. */
  public boolean transmittanceWanted() {
    return transmittances.any() || (frames.any() && !frames.glazed());
  }

  /** Whether a χ is wanted. */
  public boolean pointWanted() {
    return points.any();
  }

  /**
   * What is taken off L2D before the relative accuracy of a U counts: Σ U b of the panels of a
   * frame, W/(m·K); before that of a χ counts: what the χ takes off, W/K; 0 for any other U.
   */
  public double takenOffWPerMK() {
    return frames.any() && transmittanceWanted()
        ? frames.plan().get().takenOffWPerMK()
        : points.takenOffWPerK();
  }

  /** The lengths of the frame asked for, if one is. */
  Optional<FramePlan> framePlan() {
    return frames.plan();
  }

  /**
   * Whether the films for surface temperatures are needed: an inside space touches the section, or
   * a point or profile asks for them.
   */
  public boolean surfaceNeeded() {
    return facesInside() || asksFor(FilmSet.SURFACE);
  }

  private boolean facesInside() {
    BitSet faced = Couplings.faced(partition.edgeCount(), heatLoss);
    for (int i = faced.nextSetBit(0); i >= 0; i = faced.nextSetBit(i + 1)) {
      if (detail.spaces().get(i).exposure() == Exposure.INSIDE) {
        return true;
      }
    }
    return false;
  }

  /**
   * The temperatures wanted of the solution with the films for heat loss.
   *
   * @param shared whether it serves for surface temperatures too
   */
  public Conduction.Temperatures heatLossTemperatures(boolean shared) {
    if (asksFor(FilmSet.HEAT_LOSS) || shared && asksFor(FilmSet.SURFACE)) {
      return Conduction.Temperatures.EVERYWHERE;
    }
    return shared ? Conduction.Temperatures.SURFACE : Conduction.Temperatures.NONE;
  }

  /** The temperatures wanted of the solution with the films for surface temperatures. */
  public Conduction.Temperatures surfaceTemperatures() {
    return asksFor(FilmSet.SURFACE)
        ? Conduction.Temperatures.EVERYWHERE
        : Conduction.Temperatures.SURFACE;
  }

  private boolean asksFor(FilmSet set) {
    for (Wanted wanted : detail.wanted()) {
      if (asksFor(wanted, set)) {
        return true;
      }
    }
    return false;
  }

  private static boolean asksFor(Wanted wanted, FilmSet set) {
    return (wanted instanceof Wanted.Temperature point && point.filmSet() == set)
        || (wanted instanceof Wanted.Profile line && line.filmSet() == set)
        || (wanted instanceof Wanted.SurfaceProfile face && face.filmSet() == set)
        || (wanted instanceof Wanted.Moisture && set == FilmSet.SURFACE);
  }

  /** Whether both film sets say the same on every edge, so that one solution serves for both. */
  public boolean sameFilms() {
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (heatLoss.kind(edge) != surface.kind(edge)
          || heatLoss.space(edge) != surface.space(edge)
          || heatLoss.filmM2KPerW(edge) != surface.filmM2KPerW(edge)
          || heatLoss.flowWPerM2(edge) != surface.flowWPerM2(edge)) {
        return false;
      }
    }
    return true;
  }

  /**
   * Temperatures to start from: those stated, and the mean of the stated ones for floating spaces.
   */
  public double[] statedTemperatures() {
    double mean = detail.meanStatedTemperatureC();
    double[] temperatures = new double[detail.spaces().size()];
    for (int i = 0; i < temperatures.length; i++) {
      Space space = detail.spaces().get(i);
      temperatures[i] = space.floating().isEmpty() ? space.temperatureC() : mean;
    }
    return temperatures;
  }

  /**
   * Temperature of every space, of floating ones as they follow from the heat-loss solution.
   *
   * @param heatLossSolution the solution with the films for heat loss
   * @return °C, in the order of the spaces
   */
  public double[] temperatures(Solution heatLossSolution) {
    return new Couplings(detail, heatLossSolution).temperatures();
  }

  /**
   * L2D of two groups of spaces with floating ones eliminated.
   *
   * @param heatLossSolution the solution with the films for heat loss
   * @param warm names on one side
   * @param cold names on the other
   * @return W/(m·K)
   */
  public OtherCoupling coupling(Solution heatLossSolution, List<String> warm, List<String> cold) {
    int[] one = indices(warm);
    int[] other = indices(cold);
    int[] floating = Couplings.floatingBeside(detail, one, other);
    Couplings couplings = new Couplings(detail, heatLossSolution);
    return new OtherCoupling(
        couplings.between(one, other, floating), couplings.byPart(one, other, Map.of(), floating));
  }

  private int[] indices(List<String> names) {
    int[] indices = new int[names.size()];
    for (int i = 0; i < indices.length; i++) {
      indices[i] = detail.spaceIndex(names.get(i));
    }
    return indices;
  }

  /** Faults in the sides between which another detail's L2D is asked of this one. */
  private List<Fault> sides(Subtraction.OfDetail asked) {
    SpaceGroups groups = new SpaceGroups(detail, "psi", asked.name());
    groups.checkApart(groups.indices(asked.warm()), groups.indices(asked.cold()));
    return groups.faults();
  }

  /**
   * Makes the result.
   *
   * @param heatLossSolution the solution with the films for heat loss
   * @param surfaceSolution the one for surface temperatures; the same one if {@link #sameFilms()};
   *     empty if not {@link #surfaceNeeded()}
   * @param others L2D of each detail that a ψ subtracts
   * @param cavities every air cavity
   * @param doubts warnings that come of the solutions
   * @param timesMs milliseconds by stage, in the order run; asked for last
   * @return the result
   */
  public Result result(
      Solution heatLossSolution,
      Optional<Solution> surfaceSolution,
      Map<Subtraction.OfDetail, OtherCoupling> others,
      List<Cavity> cavities,
      List<String> doubts,
      Supplier<Map<String, Double>> timesMs) {
    Couplings couplings = new Couplings(detail, heatLossSolution);
    double[] temperatures = couplings.temperatures();
    FieldSet lossFields = new FieldSet(FilmSet.HEAT_LOSS, heatLossSolution, temperatures);
    Optional<FieldSet> surfaceFields =
        surfaceSolution.isEmpty()
            ? Optional.empty()
            : Optional.of(new FieldSet(FilmSet.SURFACE, surfaceSolution.get(), temperatures));
    FieldSet coldestFields = surfaceFields.orElse(lossFields);
    FieldSets sets = new FieldSets(lossFields, surfaceFields);
    SurfaceTemperatures surfaces = new SurfaceTemperatures(detail, temperatures, coldestFields);
    Balances balances = new Balances(detail, heatLossSolution, temperatures);
    Profiles profiles = new Profiles(detail, sets);
    List<String> allWarnings = new ArrayList<>(warnings);
    allWarnings.addAll(doubts);
    if (!module && !frames.any()) {
      allWarnings.addAll(cutOffs.profiles(lossFields, temperatures));
    }
    List<Result.LinearTransmittance> allPsi = new ArrayList<>(psi.evaluate(couplings, others));
    List<Result.EffectiveTransmittance> allU = new ArrayList<>(transmittances.evaluate(couplings));
    Optional<FrameTransmittances.Outcome> frame = frames.evaluate(couplings, others);
    if (frame.isPresent()) {
      allU.add(frame.get().transmittance());
      allPsi.addAll(frame.get().glassEdge());
    }
    List<Result.SpaceResult> spaces = surfaces.spaces(balances);
    List<SpaceMoisture> checked = moisture.evaluate(couplings, coldestFields);
    List<Result.Required> required = requirements.evaluate(spaces, allPsi, allU, checked);
    List<Fault> unanswered = Requirements.unanswered(required, requirements.wanted());
    if (!unanswered.isEmpty()) {
      throw new DetailException(unanswered);
    }
    return new Result(
        detail,
        couplings.pairs(),
        List.copyOf(allPsi),
        List.copyOf(allU),
        points.evaluate(couplings, others),
        frame.isPresent() ? Optional.of(frame.get().account()) : Optional.empty(),
        spaces,
        balances.stretches(),
        profiles.points(),
        profiles.profiles(),
        Sharing.of(detail, heatLossSolution, temperatures),
        Weights.of(detail, surfaces, coldestFields, sets),
        flanks(),
        cavities,
        framings.evaluate(allU),
        FloorEdges.evaluate(detail, temperatures, balances.stretches(), couplings),
        checked,
        required,
        assumptions(),
        List.copyOf(allWarnings),
        balances.balance(),
        partition.largestDisplacementM(),
        heatLossSolution,
        surfaceSolution,
        heatLossSolution.mesh().triangleCount(),
        heatLossSolution.unknowns(),
        timesMs.get());
  }

  private List<Assumption> collectAssumptions(
      List<Assumption> ofPsi, Map<Subtraction.OfDetail, Plan> others) {
    List<Assumption> all = new ArrayList<>(detail.assumptions());
    all.addAll(heatLoss.assumptions());
    if (surfaceNeeded()) {
      all.addAll(surface.assumptions());
    }
    for (PlacedFlank flank : flanks) {
      if (!flank.typedU() && flank.uWPerM2K().isPresent()) {
        all.add(
            new Assumption(
                Result.FlankResult.assumption(flank.name()),
                Wording.figure(flank.uWPerM2K().get().mid())
                    + " W/(m²·K): "
                    + String.join(", ", flank.layerWords()),
                "ISO 6946, layers met at the cut-off plane with the films there"));
      }
    }
    all.addAll(ofPsi);
    all.addAll(points.assumptions());
    for (Map.Entry<Subtraction.OfDetail, Plan> other : others.entrySet()) {
      List<Assumption> known = frames.glazed() ? all : List.of();
      all.addAll(other.getValue().heatLossAssumptions(other.getKey().name(), known));
    }
    all.addAll(transmittances.assumptions());
    all.addAll(frames.assumptions());
    all.addAll(moisture.assumptions());
    if (module && cutOffs.any()) {
      all.add(
          new Assumption(
              "cut-off planes of the module",
              "taken as planes of symmetry",
              "by convention of this tool"));
    }
    if (Couplings.floating(detail).length > 0) {
      all.add(
          new Assumption(
              "temperature of floating spaces",
              "from the balance with the films for heat loss, used for surface temperatures too",
              "by convention of this tool"));
    }
    return withoutRepeats(all);
  }

  /** Each line once, where it stands first. */
  private static List<Assumption> withoutRepeats(List<Assumption> all) {
    Map<String, Assumption> once = new LinkedHashMap<>();
    for (Assumption line : all) {
      once.putIfAbsent(String.join("\n", line.what(), line.value(), line.source()), line);
    }
    return new ArrayList<>(once.values());
  }

  /** What was assumed for the L2D that another detail subtracts, beside what is known. */
  private List<Assumption> heatLossAssumptions(String name, List<Assumption> known) {
    List<Assumption> own = new ArrayList<>(detail.assumptions());
    own.addAll(heatLoss.assumptions());
    own.removeAll(known);
    List<Assumption> named = new ArrayList<>();
    for (Assumption line : own) {
      named.add(new Assumption("in '" + name + "': " + line.what(), line.value(), line.source()));
    }
    return named;
  }

  private void warnOfFlank(PlacedFlank flank) {
    String name = "flank '" + flank.name() + "': ";
    if (flank.typedU() && flank.drawnUWPerM2K().isPresent()) {
      Bracket typed = flank.uWPerM2K().orElseThrow();
      double drawn = flank.drawnUWPerM2K().getAsDouble();
      if (drawn < typed.lower() - TYPED_U_DIFFERS * drawn
          || drawn > typed.upper() + TYPED_U_DIFFERS * drawn) {
        List<String> shifts = psi.shifts(flank);
        warnings.add(
            name
                + "its typed U "
                + Wording.figure(typed.mid())
                + " differs from the "
                + Wording.figure(drawn)
                + " W/(m²·K) of the drawn layers"
                + (shifts.isEmpty() ? "" : "; this shifts " + String.join(", ", shifts)));
      }
    }
    if (flank.typedU() || flank.reading().layers().isEmpty()) {
      return;
    }
    if (flank.reading().layers().get().oblique()) {
      warnings.add(
          name
              + "its cut-off plane is not square to the layers; thicknesses for U are measured"
              + " square to the layers");
    }
    if (flank.reading().layers().get().obliqueConductivity()) {
      warnings.add(
          name
              + "a conductivity lies oblique to the layers; U takes the conductivity across them,"
              + " and the cut-off plane disturbs the flow");
    }
  }
}
