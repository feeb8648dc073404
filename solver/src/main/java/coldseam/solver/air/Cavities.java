package coldseam.solver.air;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.RadiationForm;
import coldseam.solver.conduction.Conduction;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Temperatures;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;

/**
 * The air cavities of a detail and the conductivities they have at present. Immutable; {@link
 * #settled} gives the same cavities with conductivities that agree with the temperature field.
 */
public final class Cavities {
  /** The fixed point is given up after so many solutions. */
  public static final int MOST_PASSES = 12;

  /** Relative change of a conductivity that counts as none, at most. */
  public static final double TOLERANCE = 1e-3;

  /** Part of the relative accuracy asked of L2D that a conductivity may still change. */
  private static final double PART_OF_ACCURACY = 0.5;

  private final LaidAir laid;
  private final List<Shape> shapes;
  private final Settling settling;
  private final Map<String, Integer> numbers;
  private final Map<Integer, Enclosure> enclosures;
  private final Settled state;
  private final boolean found;

  private Cavities(
      LaidAir laid,
      List<Shape> shapes,
      Map<String, Integer> numbers,
      Map<Integer, Enclosure> enclosures,
      Settled state) {
    this.laid = laid;
    this.shapes = shapes;
    this.numbers = numbers;
    this.enclosures = enclosures;
    this.state = state;
    settling = new Settling(laid.groups(), shapes, laid.detail().view());
    boolean any = false;
    for (LaidAir.Group group : laid.groups()) {
      any |= group.pieces().get(0).fill().temperatures() == Temperatures.FOUND && !group.well();
    }
    found = any;
  }

  /**
   * Finds the cavities of a detail.
   *
   * @param detail the detail as drawn
   * @return its cavities; empty if no air is laid
   * @throws coldseam.solver.detail.DetailException if a cavity that something is stated for is not
   *     there
   */
  public static Optional<Cavities> of(Detail detail) {
    boolean any = false;
    for (Area area : detail.areas()) {
      any |= area.fill() instanceof AirCavity;
    }
    if (!any) {
      return Optional.empty();
    }
    LaidAir laid = new LaidAir(detail);
    Axes section = Axes.of(laid.partition());
    List<Shape> shapes = new ArrayList<>();
    Map<String, Integer> numbers = new HashMap<>();
    Map<Integer, Enclosure> enclosures = new HashMap<>();
    for (int c = 0; c < laid.groups().size(); c++) {
      LaidAir.Group group = laid.groups().get(c);
      shapes.add(new Shape(group.pieces(), List.of(c), laid.rims(), section));
      numbers.put(group.name(), c);
      if (radiates(group)) {
        enclosures.put(c, Enclosure.of(group, c, laid.rims()));
      }
    }
    Cavities cavities =
        new Cavities(laid, shapes, numbers, enclosures, Settled.begin(laid.groups().size()));
    return Optional.of(cavities.with(cavities.undirected()));
  }

  /** Whether radiation in a cavity is worked out face by face. */
  private static boolean radiates(LaidAir.Group group) {
    Piece piece = group.pieces().get(0);
    return !group.well()
        && piece.fill().form(group.classed().rule()) == RadiationForm.RADIOSITY
        && piece.settings().conductivityWPerMK().isEmpty();
  }

  private Cavities with(Settled other) {
    return new Cavities(laid, shapes, numbers, enclosures, other);
  }

  /** Before any heat flow is known: the mean of both directions. */
  private Settled undirected() {
    int n = shapes.size();
    Settled begin = Settled.begin(n);
    for (int c = 0; c < n; c++) {
      double product = 1;
      for (int axis = 0; axis < 2; axis++) {
        product *= settling.conductivity(c, axis, true, Double.NaN, Double.NaN, Double.NaN);
      }
      begin.conductivityWPerMK()[c] = Math.sqrt(product);
    }
    return begin;
  }

  /** The detail with every cavity as a material or a part of its space. */
  public Detail detail() {
    return with(laid.detail());
  }

  /** The partition of {@link #detail}. */
  public Partition partition() {
    return laid.partition();
  }

  /**
   * A detail with the present conductivities, and with all that was derived among its assumptions.
   *
   * @param other the detail of these cavities, with things added to it
   * @return the detail
   */
  public Detail in(Detail other) {
    Detail with = with(other);
    List<Assumption> assumptions = new ArrayList<>(with.assumptions());
    assumptions.addAll(new CavityAssumptions(cavities(), laid, shapes).list());
    return with.with(with.areas(), assumptions);
  }

  private Detail with(Detail other) {
    Map<String, Material> materials = materials();
    List<Area> areas = new ArrayList<>(other.areas().size());
    for (Area area : other.areas()) {
      Material material = materials.get(area.fill().name());
      areas.add(
          material == null
              ? area
              : new Area(area.name(), material, area.rings(), area.glazing(), area.role()));
    }
    return other.with(areas, other.assumptions());
  }

  /** Conditions with the present conductivities. */
  public Conditions in(Conditions conditions) {
    return conditions.with(materials());
  }

  private Map<String, Material> materials() {
    Map<String, Material> materials = new HashMap<>();
    for (int c = 0; c < shapes.size(); c++) {
      LaidAir.Group group = laid.groups().get(c);
      if (!group.well()) {
        double conductivity = state.conductivityWPerMK()[c];
        materials.put(
            group.name(),
            new Material(
                group.name(),
                conductivity,
                conductivity,
                0,
                0,
                OptionalDouble.empty(),
                OptionalDouble.of(1),
                CavityAssumptions.source(group)));
      }
    }
    return materials;
  }

  /**
   * The relative change of a conductivity that counts as none.
   *
   * @param couplingRelative accuracy asked of L2D, relative to it
   */
  public static double tolerance(double couplingRelative) {
    return Math.min(TOLERANCE, PART_OF_ACCURACY * couplingRelative);
  }

  /**
   * The cavities with conductivities that agree with the temperatures on the mesh of a solution, as
   * far as {@link #MOST_PASSES} solutions lead.
   *
   * @param near a solution, its mesh is kept
   * @param conditions what holds on the edges
   * @param tolerance relative change of a conductivity that counts as none
   * @param temperaturesC temperatures of the spaces, from a solution
   * @return the cavities
   */
  public Cavities settledNear(
      Solution near,
      Conditions conditions,
      double tolerance,
      Function<Solution, double[]> temperaturesC) {
    Cavities now = this;
    do {
      Solution solution = Conduction.solveOnMeshOf(near, now.in(conditions));
      now = now.after(solution, tolerance, temperaturesC);
      // one is left for the solution that is proved
    } while (!now.settled() && now.passes() < MOST_PASSES - 1);
    return now;
  }

  /**
   * Whether a solution still agrees with the conductivities it was made with.
   *
   * @param solution solved with the present conductivities
   * @param tolerance relative change of a conductivity that counts as none
   * @param temperaturesC temperatures of the spaces, from a solution
   * @return these cavities with the temperatures of the solution; unless they are {@link
   *     #settled()}, with the conductivities to try next
   */
  public Cavities after(
      Solution solution, double tolerance, Function<Solution, double[]> temperaturesC) {
    Settled next = settling.step(state, readings(solution, temperaturesC), tolerance);
    return with(next.settled() ? next.keeping(state.conductivityWPerMK()) : next);
  }

  /** What was found out after a solution, with the conductivities that it was made with. */
  public Cavities as(Cavities solved) {
    return with(state.keeping(solved.state.conductivityWPerMK()));
  }

  /** The same cavities with passes counted from 0. */
  public Cavities restarted() {
    return with(state.restarted());
  }

  /** Why nothing is proved while the conductivities have not settled. */
  public String unsettled() {
    return "the conductivities of cavities did not settle in "
        + state.passes()
        + " passes: one still changes by "
        + Wording.figure(100 * state.change())
        + " %";
  }

  private Readings readings(Solution solution, Function<Solution, double[]> temperaturesC) {
    double[] temperatures = temperaturesC.apply(solution);
    boolean alike = true;
    for (double temperature : temperatures) {
      alike &= temperature == temperatures[0];
    }
    if (alike) {
      // no heat flows: take the way it would flow from the first space
      temperatures[0] += 1;
    }
    return new Readings(
        solution.temperatures(temperatures), solution.conditions(), numbers, enclosures);
  }

  /** Whether the conductivities agree with the temperatures. */
  public boolean settled() {
    return state.settled();
  }

  /** Whether any conductivity follows from the temperatures. */
  public boolean found() {
    return found;
  }

  /** Solutions looked at so far. */
  public int passes() {
    return state.passes();
  }

  /**
   * The slightly ventilated air layers among the cavities.
   *
   * @param detail the detail as drawn, to be solved with the layers unventilated and well
   *     ventilated
   * @throws coldseam.solver.detail.DetailException if two of them have different openings
   */
  public Optional<SlightLayers> slightLayers(Detail detail) {
    return SlightLayers.of(detail, laid.groups(), shapes);
  }

  /** Every cavity, from left to right. */
  public List<Cavity> cavities() {
    List<Cavity> all = new ArrayList<>();
    for (int c = 0; c < shapes.size(); c++) {
      LaidAir.Group group = laid.groups().get(c);
      Piece.Classed classed = group.classed();
      all.add(
          new Cavity(
              group.name(),
              group.pieces().get(0).fill().name(),
              shapes.get(c).inside(),
              shapes.get(c).areaM2(),
              classed.rule(),
              classed.ventilation(),
              classed.slitM(),
              classed.space(),
              group.well() ? Optional.empty() : Optional.of(counted(c))));
    }
    return List.copyOf(all);
  }

  private Cavity.Counted counted(int c) {
    Shape shape = shapes.get(c);
    AirCavity fill = laid.groups().get(c).pieces().get(0).fill();
    int axis = Math.max(0, state.axis()[c]);
    int sign = state.forward()[c] ? 1 : -1;
    boolean temperatures = fill.temperatures() == Temperatures.FOUND && state.passes() > 0;
    return new Cavity.Counted(
        shape.box(axis),
        new Point(sign * shape.axes().x(axis), sign * shape.axes().y(axis)),
        settling.emissivities(c, axis),
        state.conductivityWPerMK()[c],
        settling.form(c, axis),
        fill.temperatures(),
        laid.groups().get(c).pieces().get(0).settings().conductivityWPerMK().isPresent(),
        temperatures ? OptionalDouble.of(state.differenceK()[c]) : OptionalDouble.empty(),
        temperatures ? OptionalDouble.of(state.meanC()[c]) : OptionalDouble.empty(),
        state.passes(),
        state.settled());
  }
}
