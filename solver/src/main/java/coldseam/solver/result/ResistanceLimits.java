package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Conditions.Kind;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * The two resistance limits of a flat module (ISO 6946:2017, 6.7.2), integrated exactly over any
 * polygons: heat in parallel paths straight through (an admissible flux, so no resistance is
 * higher), and planes parallel to the faces at one temperature each (an admissible temperature, so
 * none is lower). Both with the films of the conditions.
 *
 * @param parallelM2KPerW R'T, the upper limit
 * @param isothermalM2KPerW R''T, the lower limit
 * @param highestM2KPerW the highest resistance of a straight path: beside all framing
 * @param lowestM2KPerW the lowest one: through the framing
 * @param framedShare part of the width where a path resists less than the highest
 * @param filmsM2KPerW mean of the films of both faces
 * @param layerM2KPerW resistance of one fill on the path of the highest
 * @param widthM width of the module
 * @param metal whether metal lies beside anything else in a plane parallel to the faces
 */
record ResistanceLimits(
    double parallelM2KPerW,
    double isothermalM2KPerW,
    double highestM2KPerW,
    double lowestM2KPerW,
    double framedShare,
    double filmsM2KPerW,
    double layerM2KPerW,
    double widthM,
    boolean metal) {
  /** Materials that conduct more than this are metals, W/(m·K). */
  static final double METAL_W_PER_MK = 10;

  /** Coordinates nearer than this part of the extent are the same. */
  private static final double SAME = 1e-9;

  /** Relative difference of path resistances that are one. */
  private static final double EQUAL = 1e-6;

  /**
   * Works them out.
   *
   * @param partition the section
   * @param conditions films and materials
   * @param alongY whether the faces run along y, else along x
   * @param layer name of the fill whose resistance is wanted; empty for none
   * @return empty where the faces are not two parallel planes in that direction
   */
  static Optional<ResistanceLimits> of(
      Partition partition, Conditions conditions, boolean alongY, String layer) {
    Lines lines = new Lines(partition, conditions, alongY);
    return lines.flat() ? Optional.of(lines.limits(layer)) : Optional.empty();
  }

  /** The section in coordinates along the faces (t) and through them (n), n to the left of t. */
  private static final class Lines {
    private final Partition partition;
    private final Conditions conditions;
    private final boolean alongY;
    private double tLow = Double.POSITIVE_INFINITY;
    private double tHigh = Double.NEGATIVE_INFINITY;
    private double nLow = Double.POSITIVE_INFINITY;
    private double nHigh = Double.NEGATIVE_INFINITY;

    Lines(Partition partition, Conditions conditions, boolean alongY) {
      this.partition = partition;
      this.conditions = conditions;
      this.alongY = alongY;
      for (int edge = 0; edge < partition.edgeCount(); edge++) {
        if (touches(edge)) {
          for (int v : new int[] {partition.edgeStart(edge), partition.edgeEnd(edge)}) {
            tLow = Math.min(tLow, t(v));
            tHigh = Math.max(tHigh, t(v));
            nLow = Math.min(nLow, n(v));
            nHigh = Math.max(nHigh, n(v));
          }
        }
      }
    }

    private boolean touches(int edge) {
      return conditions.conducts(partition.leftLabel(edge))
          || conditions.conducts(partition.rightLabel(edge));
    }

    private double t(int vertex) {
      return alongY ? partition.y(vertex) : partition.x(vertex);
    }

    private double n(int vertex) {
      return alongY ? -partition.x(vertex) : partition.y(vertex);
    }

    /** Whether every surface lies in one of two planes. */
    boolean flat() {
      double same = SAME * (nHigh - nLow + tHigh - tLow);
      for (int edge = 0; edge < partition.edgeCount(); edge++) {
        Kind kind = conditions.kind(edge);
        if (kind != Kind.FILM && kind != Kind.FIXED) {
          continue;
        }
        double a = n(partition.edgeStart(edge));
        double b = n(partition.edgeEnd(edge));
        boolean low = Math.abs(a - nLow) <= same && Math.abs(b - nLow) <= same;
        boolean high = Math.abs(a - nHigh) <= same && Math.abs(b - nHigh) <= same;
        if (!low && !high) {
          return false;
        }
      }
      return tHigh > tLow && nHigh > nLow;
    }

    ResistanceLimits limits(String layer) {
      double width = tHigh - tLow;
      double conductance = 0;
      double highest = 0;
      double lowest = Double.POSITIVE_INFINITY;
      double ofLayer = 0;
      List<double[]> paths = new ArrayList<>();
      double[] low = new double[2];
      double[] cuts = cuts(false);
      for (int i = 1; i < cuts.length; i++) {
        Column column = column(cuts[i - 1], cuts[i], layer);
        double part = cuts[i] - cuts[i - 1];
        conductance += part * meanInverse(column.from(), column.to());
        low[0] += part / column.lowFilm();
        low[1] += part / column.highFilm();
        double most = Math.max(column.from(), column.to());
        if (Double.isFinite(most) && most > highest * (1 + EQUAL)) {
          highest = most;
          ofLayer = column.layer();
        }
        lowest = Math.min(lowest, Math.min(column.from(), column.to()));
        paths.add(new double[] {part, (column.from() + column.to()) / 2});
      }
      double framed = 0;
      for (double[] path : paths) {
        framed += path[1] < highest * (1 - EQUAL) ? path[0] / width : 0;
      }
      double films = width / low[0] + width / low[1];
      double through = films;
      boolean metal = false;
      double[] rows = cuts(true);
      for (int i = 1; i < rows.length; i++) {
        Row row = row(rows[i - 1], rows[i]);
        through += (rows[i] - rows[i - 1]) * width * meanInverse(row.from(), row.to());
        metal |= row.metal();
      }
      return new ResistanceLimits(
          width / conductance, through, highest, lowest, framed, films, ofLayer, width, metal);
    }

    /** Mean of 1/f where f runs straight from one value to another. */
    private static double meanInverse(double from, double to) {
      if (Double.isInfinite(from) || Double.isInfinite(to)) {
        return 0;
      }
      double ratio = to / from - 1;
      return Math.abs(ratio) < 1e-6 ? 2 / (from + to) : Math.log1p(ratio) / (to - from);
    }

    private double[] cuts(boolean through) {
      double[] all = new double[partition.vertexCount()];
      int count = 0;
      double low = through ? nLow : tLow;
      double high = through ? nHigh : tHigh;
      for (int v = 0; v < all.length; v++) {
        double at = through ? n(v) : t(v);
        if (at >= low && at <= high) {
          all[count++] = at;
        }
      }
      double[] sorted = Arrays.copyOf(all, count);
      Arrays.sort(sorted);
      int kept = 0;
      for (double at : sorted) {
        if (kept == 0 || at - sorted[kept - 1] > SAME * (high - low)) {
          sorted[kept++] = at;
        }
      }
      return Arrays.copyOf(sorted, kept);
    }

    /** An edge that crosses a strip: where it enters and leaves it, and what lies beyond it. */
    private record Crossing(int edge, double from, double to, int beyond) {}

    /** Edges across a strip, in order; beyond is the label on the side of rising coordinate. */
    private List<Crossing> crossings(double from, double to, boolean through) {
      double middle = (from + to) / 2;
      List<Crossing> crossings = new ArrayList<>();
      for (int edge = 0; edge < partition.edgeCount(); edge++) {
        int a = partition.edgeStart(edge);
        int b = partition.edgeEnd(edge);
        double atA = through ? n(a) : t(a);
        double atB = through ? n(b) : t(b);
        if ((atA > middle) == (atB > middle) || !touches(edge)) {
          continue;
        }
        double otherA = through ? t(a) : n(a);
        double otherB = through ? t(b) : n(b);
        double slope = (otherB - otherA) / (atB - atA);
        // rising t has rising n on its left; rising n has rising t on its right
        boolean left = (atB > atA) != through;
        crossings.add(
            new Crossing(
                edge,
                otherA + slope * (from - atA),
                otherA + slope * (to - atA),
                left ? partition.leftLabel(edge) : partition.rightLabel(edge)));
      }
      crossings.sort((p, q) -> Double.compare(p.from() + p.to(), q.from() + q.to()));
      return crossings;
    }

    /** A strip of straight paths: resistance at both its ends, films included. */
    private record Column(double from, double to, double lowFilm, double highFilm, double layer) {}

    private Column column(double from, double to, String layer) {
      List<Crossing> crossings = crossings(from, to, false);
      double first = 0;
      double last = 0;
      double ofLayer = 0;
      for (int i = 0; i + 1 < crossings.size(); i++) {
        int label = crossings.get(i).beyond();
        double atFrom = crossings.get(i + 1).from() - crossings.get(i).from();
        double atTo = crossings.get(i + 1).to() - crossings.get(i).to();
        double resistivity =
            conditions.conducts(label)
                ? resistivity(conditions.material(label))
                : Double.POSITIVE_INFINITY;
        first += atFrom * resistivity;
        last += atTo * resistivity;
        if (conditions.conducts(label) && conditions.material(label).name().equals(layer)) {
          ofLayer += (atFrom + atTo) / 2 * resistivity;
        }
      }
      double low = crossings.isEmpty() ? Double.POSITIVE_INFINITY : film(crossings.get(0));
      double high =
          crossings.isEmpty()
              ? Double.POSITIVE_INFINITY
              : film(crossings.get(crossings.size() - 1));
      return new Column(first + low + high, last + low + high, low, high, ofLayer);
    }

    private double film(Crossing crossing) {
      return switch (conditions.kind(crossing.edge())) {
        case FILM -> conditions.filmM2KPerW(crossing.edge());
        case FIXED -> 0;
        default -> Double.POSITIVE_INFINITY;
      };
    }

    /** A strip parallel to the faces: Σ λ·width at both its ends. */
    private record Row(double from, double to, boolean metal) {}

    private Row row(double from, double to) {
      List<Crossing> crossings = crossings(from, to, true);
      double first = 0;
      double last = 0;
      boolean metal = false;
      boolean other = false;
      for (int i = 0; i + 1 < crossings.size(); i++) {
        int label = crossings.get(i).beyond();
        if (!conditions.conducts(label)) {
          continue;
        }
        double conductivity = conductivity(conditions.material(label));
        first += (crossings.get(i + 1).from() - crossings.get(i).from()) * conductivity;
        last += (crossings.get(i + 1).to() - crossings.get(i).to()) * conductivity;
        metal |= conductivity > METAL_W_PER_MK;
        other |= conductivity <= METAL_W_PER_MK;
      }
      return new Row(first, last, metal && other);
    }

    /** n·Λ⁻¹·n, m·K/W: what a flux straight through meets. */
    private double resistivity(Material material) {
      double[] squares = squares(material);
      return squares[0] / material.conductivityWPerMK()
          + squares[1] / material.crossConductivityWPerMK();
    }

    /** n·Λ·n, W/(m·K): what a gradient straight through drives. */
    private double conductivity(Material material) {
      double[] squares = squares(material);
      return squares[0] * material.conductivityWPerMK()
          + squares[1] * material.crossConductivityWPerMK();
    }

    /** Squares of the direction's parts along and across the material's first axis. */
    private double[] squares(Material material) {
      double cosine = Math.cos(material.angleRad());
      double sine = Math.sin(material.angleRad());
      double along = alongY ? -cosine : sine;
      double across = alongY ? sine : cosine;
      return new double[] {along * along, across * across};
    }
  }
}
