package coldseam.solver;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.EdgeCondition;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Flank;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Stretch;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.View;
import coldseam.solver.detail.Wanted;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;

/** A detail put together shape by shape, in mm. */
public final class DrawnDetail {
  private final List<Area> areas = new ArrayList<>();
  private final List<Space> spaces = new ArrayList<>();
  private final List<Stretch> stretches = new ArrayList<>();
  private final List<Flank> flanks = new ArrayList<>();
  private final List<Wanted> wanted = new ArrayList<>();
  private UnaryOperator<Point> move = UnaryOperator.identity();
  private View view = View.PLAN;
  private Geometry geometry = Geometry.PLANE;

  /** Moves every point laid after this, m to m. */
  public DrawnDetail moved(UnaryOperator<Point> by) {
    move = by;
    return this;
  }

  /** Turns the section about x = 0. */
  public DrawnDetail revolved() {
    geometry = Geometry.AXISYMMETRIC;
    return this;
  }

  public DrawnDetail view(View of) {
    view = of;
    return this;
  }

  public static Material material(String name, double conductivityWPerMK) {
    return Material.of(name, conductivityWPerMK);
  }

  /** A room with the standard's films. */
  public static Space room(String name, double temperatureC) {
    return Space.of(name, temperatureC, Exposure.INSIDE);
  }

  /** Outdoors with the standard's films. */
  public static Space outdoors(double temperatureC) {
    return Space.of("outdoors", temperatureC, Exposure.OUTSIDE);
  }

  /** A space with one film in both sets, m²·K/W; 0 fixes the temperature. */
  public static Space space(String name, double temperatureC, Exposure exposure, double film) {
    return space(name, temperatureC, exposure, film, film);
  }

  /** A space with one film in each set, m²·K/W. */
  public static Space space(
      String name, double temperatureC, Exposure exposure, double heatLoss, double surface) {
    return new Space(
        name,
        temperatureC,
        OptionalDouble.empty(),
        exposure,
        FilmRule.uniform(heatLoss, "typed in the test"),
        FilmRule.uniform(surface, "typed in the test"),
        Optional.empty());
  }

  /** A space that floats. */
  public static Space floating(Space like, double conductanceWPerMK, String to) {
    return new Space(
        like.name(),
        Double.NaN,
        OptionalDouble.empty(),
        like.exposure(),
        like.heatLoss(),
        like.surface(),
        Optional.of(new Space.Floating(conductanceWPerMK, to)));
  }

  /** Declares a space that is not laid. */
  public DrawnDetail know(Space space) {
    if (!spaces.contains(space)) {
      spaces.add(space);
    }
    return this;
  }

  public DrawnDetail box(Fill fill, double x0, double y0, double x1, double y1) {
    return polygon(fill, x0, y0, x1, y0, x1, y1, x0, y1);
  }

  public DrawnDetail polygon(Fill fill, double... xy) {
    return area(fill, false, xy);
  }

  public DrawnDetail glazing(Fill fill, double... xy) {
    return area(fill, true, xy);
  }

  /** A piece of the glazing, or the panel, of a frame. */
  public DrawnDetail infill(Area.Role role, Fill fill, double... xy) {
    areas.add(new Area("area " + areas.size(), fill, List.of(points(xy)), false, role));
    return this;
  }

  private DrawnDetail area(Fill fill, boolean glazing, double... xy) {
    if (fill instanceof Space space) {
      know(space);
    }
    areas.add(new Area("area " + areas.size(), fill, List.of(points(xy)), glazing));
    return this;
  }

  /** A stretch that faces a space through its film. */
  public DrawnDetail facing(String name, String space, double... xy) {
    return stretch(name, new EdgeCondition.Faces(space, Optional.empty(), Optional.empty()), xy);
  }

  /** A stretch with a film of its own in both sets. */
  public DrawnDetail facing(String name, String space, FilmRule film, double... xy) {
    return stretch(name, new EdgeCondition.Faces(space, Optional.of(film), Optional.of(film)), xy);
  }

  public DrawnDetail symmetry(String name, double... xy) {
    return stretch(name, new EdgeCondition.CutOff(true), xy);
  }

  public DrawnDetail stretch(String name, EdgeCondition condition, double... xy) {
    stretches.add(new Stretch(name, points(xy), Optional.of(condition), false));
    return this;
  }

  /** A stretch that only reports. */
  public DrawnDetail along(String name, boolean glazing, double... xy) {
    stretches.add(new Stretch(name, points(xy), Optional.empty(), glazing));
    return this;
  }

  public DrawnDetail flank(
      String name, Point cut, Optional<Bracket> u, Map<DimensionSystem, Double> lengths) {
    flanks.add(new Flank(name, Optional.of(cut).map(move), u, lengths));
    return this;
  }

  /** A flank typed altogether. */
  public DrawnDetail typedFlank(String name, double u, DimensionSystem system, double lengthM) {
    flanks.add(
        new Flank(name, Optional.empty(), Optional.of(Bracket.of(u)), Map.of(system, lengthM)));
    return this;
  }

  public DrawnDetail psi(
      String name, List<String> warm, List<String> cold, DimensionSystem system) {
    return want(new Wanted.Psi(name, "junction", warm, cold, Map.of(), system, List.of()));
  }

  public DrawnDetail psi(
      String name,
      List<String> warm,
      List<String> cold,
      Map<String, Double> weights,
      DimensionSystem system,
      Subtraction... subtractions) {
    return want(
        new Wanted.Psi(name, "junction", warm, cold, weights, system, List.of(subtractions)));
  }

  public DrawnDetail point(String name, double x, double y, FilmSet films) {
    return want(new Wanted.Temperature(name, points(x, y).get(0), films));
  }

  public DrawnDetail want(Wanted one) {
    wanted.add(one);
    return this;
  }

  public List<Point> points(double... xy) {
    List<Point> points = new ArrayList<>();
    for (int i = 0; i < xy.length; i += 2) {
      points.add(move.apply(new Point(xy[i] / 1000, xy[i + 1] / 1000)));
    }
    return points;
  }

  public Detail detail() {
    return new Detail("test", geometry, view, areas, spaces, stretches, flanks, wanted, List.of());
  }

  public Partition partition() {
    return Partition.of(detail().labelledAreas(), detail().labelledLines(), Resolution.STANDARD);
  }

  public Conditions conditions(FilmSet films) {
    return Conditions.of(detail(), partition(), films);
  }

  public Solver.Inspection inspect() {
    return Solver.inspect(detail());
  }

  /** Solves with a relative accuracy of L2D and U, and that of ψ in proportion. */
  public Result solve(double relative) {
    return Solver.solve(
        detail(),
        new Accuracy(relative, relative / 2, relative / 2, relative, 2_000_000),
        Progress.SILENT);
  }
}
