package coldseam.solver.result;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.conduction.Solution;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.detail.FilmSet;
import java.util.ArrayList;
import java.util.List;

/**
 * One solution with the temperatures of its spaces: the field, its trace on the outline, and the
 * unit fields.
 */
final class FieldSet {
  private final FilmSet filmSet;
  private final Solution solution;
  private final TemperatureField field;
  private final SurfaceTrace trace;
  private final List<TemperatureField> units = new ArrayList<>();

  /**
   * Makes the fields.
   *
   * @param filmSet the set the results are called after (equal sets are solved once)
   * @param solution the solution
   * @param temperaturesC temperature of every space
   */
  FieldSet(FilmSet filmSet, Solution solution, double[] temperaturesC) {
    this.filmSet = filmSet;
    this.solution = solution;
    field = solution.temperatures(temperaturesC);
    trace = new SurfaceTrace(solution.mesh());
  }

  private FieldSet(FieldSet other, double[] temperaturesC) {
    filmSet = other.filmSet;
    solution = other.solution;
    field = solution.temperatures(temperaturesC);
    trace = other.trace;
  }

  /** The same solution with other temperatures of its spaces. */
  FieldSet with(double[] temperaturesC) {
    return new FieldSet(this, temperaturesC);
  }

  FilmSet filmSet() {
    return filmSet;
  }

  Solution solution() {
    return solution;
  }

  TemperatureField field() {
    return field;
  }

  SurfaceTrace trace() {
    return trace;
  }

  /** Unit field of a space, made when first asked for. */
  TemperatureField unit(int space) {
    if (units.isEmpty()) {
      for (int k = 0; k < solution.conditions().spaceCount(); k++) {
        units.add(new TemperatureField(solution.mesh(), solution.unitField(k)));
      }
    }
    return units.get(space);
  }

  /**
   * A field at a point of the drawing; a point on the outline, or off it by no more than drawing
   * and resolving displace, takes the value on the outline.
   *
   * @return NaN outside the section
   */
  double at(TemperatureField of, Point point) {
    double inside = of.at(point);
    if (!Double.isNaN(inside)) {
      return inside;
    }
    SurfaceTrace.Place place = trace.nearest(point);
    double reach = Resolution.STANDARD.closeM() + solution.partition().largestDisplacementM();
    return trace.point(place).distance(point) <= reach
        ? place.side().at(of, place.s())
        : Double.NaN;
  }
}
