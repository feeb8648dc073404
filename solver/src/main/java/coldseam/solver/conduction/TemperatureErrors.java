package coldseam.solver.conduction;

import coldseam.solver.detail.Conditions;
import java.util.BitSet;

/**
 * What the temperatures of a pass may still be off by, over what they may, as far as it matters.
 * Where temperatures are wanted everywhere each triangle counts by the largest error seen in it.
 * Where only the coldest and warmest surface points are wanted, it counts in full beside them and
 * where a surface may turn out to be colder or warmer still; elsewhere by what is felt of it there.
 * The error felt at distance r of a triangle of size h is that seen in it times how badly it
 * resolves a point source there, which falls with (h/r)³ in a smooth field and with (h/r)^α at a
 * singular corner (Becker and Rannacher 2001); more cautious powers are taken.
 */
final class TemperatureErrors {
  /** Temperature error that may be left, in parts of the temperature difference: 0.01 K in 25. */
  static final double MAY = 4e-4;

  /** The part of it that may be left beside the coldest and warmest points. */
  private static final double PART_AT_EXTREMES = 0.5;

  /** What is felt of an error nearby. */
  private static final double PART_FELT = 0.25;

  private static final double POWER_FELT = 2;
  private static final double POWER_FELT_FROM_CORNERS = 0.5;

  /** How many times the error seen a surface may be colder or warmer. */
  private static final double MARGIN = 2;

  /** Temperatures in triangles smaller than this part of the section are left alone. */
  private static final double SMALLEST = 1e-6;

  private final Discretisation d;
  private final Corners corners;
  private final SurfaceExtremes extremes;

  /** By triangle the square of the error over what it may be. */
  final double[] excess;

  /** The largest error over what it may be. */
  final double worst;

  /**
   * Estimates.
   *
   * @param d the discretisation
   * @param corners the corners of the drawing
   * @param fields the unit fields
   * @param amplitude errors seen in each triangle of each field; null for a field that does not
   *     count
   * @param temperaturesC temperature of every space, °C
   * @param everywhere whether all temperatures are wanted
   */
  TemperatureErrors(
      Discretisation d,
      Corners corners,
      double[][] fields,
      double[][] amplitude,
      double[] temperaturesC,
      boolean everywhere) {
    this.d = d;
    this.corners = corners;
    double[] nodalC = FieldSolution.nodal(d, fields, temperaturesC);
    extremes = new SurfaceExtremes(d, nodalC);
    double[] over = over(fields, amplitude);
    BitSet near = extremes.triangles(d);
    BitSet full = everywhere ? all() : contenders(nodalC, over, MAY * span(temperaturesC));
    double smallest = SMALLEST * SMALLEST * d.extentSquared;
    excess = new double[over.length];
    double largest = 0;
    for (int t = 0; t < over.length; t++) {
      if (over[t] > 0 && d.mesh.area(t) > smallest) {
        double counts = near.get(t) ? 1 / PART_AT_EXTREMES : full.get(t) ? 1 : felt(t);
        largest = Math.max(largest, counts * over[t]);
        excess[t] = counts * over[t] * counts * over[t];
      }
    }
    worst = largest;
  }

  /** Errors seen over what they may be, the worst of all fields. */
  private double[] over(double[][] fields, double[][] amplitude) {
    double[] over = new double[d.mesh.triangleCount()];
    for (int f = 0; f < amplitude.length; f++) {
      if (amplitude[f] == null) {
        continue;
      }
      double may = MAY * (f < d.spaces ? 1 : largest(fields[f]));
      for (int t = 0; t < over.length && may > 0; t++) {
        over[t] = Math.max(over[t], amplitude[f][t] / may);
      }
    }
    return over;
  }

  private static double largest(double[] values) {
    double largest = 0;
    for (double v : values) {
      largest = Math.max(largest, Math.abs(v));
    }
    return largest;
  }

  private BitSet all() {
    BitSet all = new BitSet(d.mesh.triangleCount());
    all.set(0, d.mesh.triangleCount());
    return all;
  }

  /** Triangles with a surface that may hold the coldest or warmest point, by the error seen. */
  private BitSet contenders(double[] nodalC, double[] over, double mayK) {
    BitSet contenders = new BitSet(over.length);
    for (int s = 0; s < d.outline.count; s++) {
      int t = d.outline.triangle[s];
      if (d.outline.kind[s] == Conditions.Kind.FILM
          && extremes.mayBeExceeded(d, nodalC, s, MARGIN * over[t] * mayK)) {
        contenders.set(t);
      }
    }
    return contenders;
  }

  /** The part of a triangle's error that is felt at the nearest extreme point. */
  private double felt(int t) {
    double ratio = Corners.longestSide(d.mesh, t) / extremes.distance(d, t);
    double power = corners.in(d.mesh, t) < 0 ? POWER_FELT : POWER_FELT_FROM_CORNERS;
    return PART_FELT * Math.pow(Math.min(1, ratio), power);
  }

  private static double span(double[] temperaturesC) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (double temperature : temperaturesC) {
      low = Math.min(low, temperature);
      high = Math.max(high, temperature);
    }
    return high > low ? high - low : 0;
  }

  /**
   * How far the coldest and warmest points must be expected to move yet, over what they may: what
   * they moved since the pass before, in proportion to the errors seen then and now.
   *
   * @param before the pass before
   * @param temperaturesC temperature of every space, °C
   */
  double expectedToMove(TemperatureErrors before, double[] temperaturesC) {
    double span = span(temperaturesC);
    if (!(span > 0) || !(before.worst > 0)) {
      return 0;
    }
    return extremes.change(before.extremes) / (MAY * span) * Math.min(1, worst / before.worst);
  }

  /** Counts the triangles beside the coldest and warmest points as off by more than they may. */
  void distrustExtremes(double over) {
    BitSet near = extremes.triangles(d);
    for (int t = near.nextSetBit(0); t >= 0; t = near.nextSetBit(t + 1)) {
      excess[t] = Math.max(excess[t], over);
    }
  }
}
