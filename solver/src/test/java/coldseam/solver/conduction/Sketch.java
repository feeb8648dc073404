package coldseam.solver.conduction;

import coldseam.mesh.partition.LabelledLine;
import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.EdgeCondition;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Stretch;
import coldseam.solver.detail.View;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.UnaryOperator;

/** A detail put together shape by shape in metres; plan view, films as typed. */
final class Sketch {
  private final List<Area> areas = new ArrayList<>();
  private final List<Space> spaces = new ArrayList<>();
  private final List<Stretch> stretches = new ArrayList<>();
  private UnaryOperator<Point> move = UnaryOperator.identity();
  private Accuracy accuracy = Accuracy.STANDARD;
  private boolean surfaceTemperatures;
  private Geometry geometry = Geometry.PLANE;

  /** Turns the section about x = 0. */
  Sketch revolved() {
    geometry = Geometry.AXISYMMETRIC;
    return this;
  }

  /** Moves every point laid after this. */
  Sketch moved(UnaryOperator<Point> by) {
    move = by;
    return this;
  }

  Sketch accuracy(Accuracy wanted) {
    accuracy = wanted;
    return this;
  }

  /** Relative accuracy of L2D alone. */
  Sketch accuracy(double relative) {
    return accuracy(new Accuracy(relative, 1e9, 1e9, 1e9, 2_000_000));
  }

  Sketch surfaceTemperatures() {
    surfaceTemperatures = true;
    return this;
  }

  /** A space with one film, m²·K/W; 0 fixes the temperature. */
  static Space space(String name, double temperatureC, double filmM2KPerW) {
    FilmRule film = FilmRule.uniform(filmM2KPerW, "stated in the test");
    return new Space(
        name, temperatureC, OptionalDouble.empty(), Exposure.INSIDE, film, film, Optional.empty());
  }

  static Material material(String name, double conductivityWPerMK) {
    return Material.of(name, conductivityWPerMK);
  }

  static Material orthotropic(String name, double first, double second, double angleRad) {
    return new Material(
        name,
        first,
        second,
        angleRad,
        0,
        OptionalDouble.empty(),
        OptionalDouble.empty(),
        "stated in the test");
  }

  Sketch box(Fill fill, double x0, double y0, double x1, double y1) {
    return polygon(fill, x0, y0, x1, y0, x1, y1, x0, y1);
  }

  Sketch polygon(Fill fill, double... xy) {
    return area(fill, List.of(points(xy)));
  }

  /** A regular polygon with a corner on the ray of angle 0. */
  Sketch disc(Fill fill, double x, double y, double radius, int corners) {
    double[] xy = new double[2 * corners];
    for (int i = 0; i < corners; i++) {
      xy[2 * i] = x + radius * Math.cos(2 * Math.PI * i / corners);
      xy[2 * i + 1] = y + radius * Math.sin(2 * Math.PI * i / corners);
    }
    return polygon(fill, xy);
  }

  private Sketch area(Fill fill, List<List<Point>> rings) {
    if (fill instanceof Space space) {
      know(space);
    }
    areas.add(new Area("area " + areas.size(), fill, rings, false));
    return this;
  }

  Sketch know(Space space) {
    if (!spaces.contains(space)) {
      spaces.add(space);
    }
    return this;
  }

  /** A stretch that faces a space through its film. */
  Sketch facing(Space space, double... xy) {
    know(space);
    return stretch(
        Optional.of(new EdgeCondition.Faces(space.name(), Optional.empty(), Optional.empty())), xy);
  }

  Sketch flow(double densityWPerM2, double... xy) {
    return stretch(Optional.of(new EdgeCondition.HeatFlow(densityWPerM2)), xy);
  }

  /** A stretch that only reports. */
  Sketch along(double... xy) {
    return stretch(Optional.empty(), xy);
  }

  private Sketch stretch(Optional<EdgeCondition> condition, double... xy) {
    stretches.add(new Stretch("stretch " + stretches.size(), points(xy), condition, false));
    return this;
  }

  private List<Point> points(double... xy) {
    List<Point> points = new ArrayList<>();
    for (int i = 0; i < xy.length; i += 2) {
      points.add(move.apply(new Point(xy[i], xy[i + 1])));
    }
    return points;
  }

  Detail detail() {
    return new Detail(
        "test", geometry, View.PLAN, areas, spaces, stretches, List.of(), List.of(), List.of());
  }

  Partition partition() {
    List<LabelledLine> lines = new ArrayList<>();
    for (int i = 0; i < stretches.size(); i++) {
      lines.add(new LabelledLine(i, stretches.get(i).along()));
    }
    return Partition.of(detail().labelledAreas(), lines, Resolution.STANDARD);
  }

  Conduction.Goal goal() {
    return new Conduction.Goal(
        accuracy,
        false,
        false,
        surfaceTemperatures ? Conduction.Temperatures.EVERYWHERE : Conduction.Temperatures.NONE,
        temperaturesC());
  }

  double[] temperaturesC() {
    return spaces.stream().mapToDouble(Space::temperatureC).toArray();
  }

  Solution solve() {
    return solve(Progress.SILENT);
  }

  Solution solve(Progress progress) {
    Partition partition = partition();
    Conditions conditions = Conditions.of(detail(), partition, FilmSet.HEAT_LOSS);
    return Conduction.solve(partition, conditions, goal(), progress);
  }
}
