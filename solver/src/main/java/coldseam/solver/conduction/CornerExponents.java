package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Material;
import java.util.Arrays;

/**
 * How singular the temperature may be at each vertex of the drawing: near it the temperature runs
 * like r^α with the least α of the sectors around it (Kellogg 1975; Grisvard 1985). In a sector of
 * conductivity λ the field r^α f(φ) and its flow across the rays, r^(α−1) α p(φ), turn into each
 * other: from ray to ray (f, p) becomes (f cos αω + p/λ sin αω, p cos αω − λ f sin αω). Around a
 * vertex inside the section the pair has to come back to itself; on the outline p is 0, or f where
 * a temperature is fixed. A film lets through what p = 0 does not, which is less by one power of r:
 * where two materials meet under a film that gives r log r, taken for α = 1. An orthotropic
 * material is turned into an isotropic one of √det λ by scaling the plane; what that does to the
 * rays themselves is left out. This steers refinement and has no part in any bound.
 */
final class CornerExponents {
  /** Of a vertex where nothing is singular that quadratic elements would not see. */
  static final double REGULAR = 2;

  /** Stands for r log r. */
  private static final double LOGARITHMIC = 1;

  /** Where the search begins: below the least α of conductors that touch in a point. */
  private static final double LEAST = 1.0 / 1024;

  private static final double STEP = 1.0 / 16;
  private static final double PRECISION = 1e-4;

  /** At α = 1 fields are linear in each sector: nothing singular. */
  private static final double LINEAR = 1e-2;

  private final Mesh mesh;
  private final Conditions conditions;

  // the sectors of the present vertex, counter-clockwise, one conductivity in each
  private double[] angle = new double[16];
  private double[] conductivity = new double[16];
  private int sectors;
  private boolean closed;
  private boolean fixedFirst;
  private boolean fixedLast;
  private boolean film;

  // the product of the sectors' matrices
  private double ff;
  private double fp;
  private double pf;
  private double pp;

  private CornerExponents(Mesh mesh, Conditions conditions) {
    this.mesh = mesh;
    this.conditions = conditions;
  }

  /**
   * Works them out.
   *
   * @param mesh the coarsest mesh; later ones keep its vertices' numbers
   * @param conditions materials and what holds on the outline
   * @return α of each vertex where edges of the partition meet, {@link #REGULAR} at most; NaN
   *     elsewhere
   */
  static double[] of(Mesh mesh, Conditions conditions) {
    return new CornerExponents(mesh, conditions).all();
  }

  private double[] all() {
    int[] corner = new int[mesh.vertexCount()];
    Arrays.fill(corner, Mesh.NONE);
    int[] edge = new int[mesh.vertexCount()];
    Arrays.fill(edge, Mesh.NONE);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int own = mesh.partitionEdge(t, k);
        for (int end = 1; own != Mesh.NONE && end <= 2; end++) {
          int v = mesh.vertex(t, (k + end) % 3);
          if (edge[v] == Mesh.NONE) {
            edge[v] = own;
          } else if (edge[v] != own) {
            corner[v] = 3 * t + (k + end) % 3;
          }
        }
      }
    }
    double[] exponents = new double[corner.length];
    for (int v = 0; v < corner.length; v++) {
      exponents[v] = Double.NaN;
      if (corner[v] != Mesh.NONE) {
        collect(corner[v]);
        exponents[v] = film && sectors > 1 ? Math.min(LOGARITHMIC, least()) : least();
      }
    }
    return exponents;
  }

  /** Collects the sectors around a vertex, given a corner of a triangle there. */
  private void collect(int corner) {
    int first = corner;
    closed = false;
    for (int c = before(corner); c != Mesh.NONE; c = before(c)) {
      if (c == corner) {
        closed = true;
        break;
      }
      first = c;
    }
    first = closed ? corner : first;
    int firstSide = (first % 3 + 2) % 3;
    fixedFirst = !closed && is(Conditions.Kind.FIXED, first / 3, firstSide);
    sectors = 0;
    int c = first;
    int last = first;
    do {
      add(c / 3, c % 3);
      last = c;
      c = after(c);
    } while (c != Mesh.NONE && c != first);
    int lastSide = (last % 3 + 1) % 3;
    fixedLast = !closed && is(Conditions.Kind.FIXED, last / 3, lastSide);
    film =
        !closed
            && (is(Conditions.Kind.FILM, first / 3, firstSide)
                || is(Conditions.Kind.FILM, last / 3, lastSide));
  }

  /** The same vertex's corner in the next triangle clockwise, or NONE. */
  private int before(int corner) {
    return across(corner, (corner % 3 + 2) % 3);
  }

  /** The same vertex's corner in the next triangle counter-clockwise, or NONE. */
  private int after(int corner) {
    return across(corner, (corner % 3 + 1) % 3);
  }

  private int across(int corner, int side) {
    int t = mesh.neighbour(corner / 3, side);
    if (t == Mesh.NONE) {
      return Mesh.NONE;
    }
    int v = mesh.vertex(corner / 3, corner % 3);
    return mesh.vertex(t, 0) == v ? 3 * t : mesh.vertex(t, 1) == v ? 3 * t + 1 : 3 * t + 2;
  }

  private boolean is(Conditions.Kind kind, int t, int side) {
    int edge = mesh.partitionEdge(t, side);
    return edge != Mesh.NONE && conditions.kind(edge) == kind;
  }

  private void add(int t, int k) {
    Material material = conditions.material(mesh.label(t));
    double along = Math.sqrt(material.conductivityWPerMK());
    double across = Math.sqrt(material.crossConductivityWPerMK());
    double c = Math.cos(material.angleRad());
    double s = Math.sin(material.angleRad());
    int v = mesh.vertex(t, k);
    int a = mesh.vertex(t, (k + 1) % 3);
    int b = mesh.vertex(t, (k + 2) % 3);
    double ax = mesh.x(a) - mesh.x(v);
    double ay = mesh.y(a) - mesh.y(v);
    double bx = mesh.x(b) - mesh.x(v);
    double by = mesh.y(b) - mesh.y(v);
    double au = (c * ax + s * ay) / along;
    double av = (c * ay - s * ax) / across;
    double bu = (c * bx + s * by) / along;
    double bv = (c * by - s * bx) / across;
    double omega = Math.atan2(au * bv - av * bu, au * bu + av * bv);
    double root = along * across;
    if (sectors > 0 && conductivity[sectors - 1] == root) {
      angle[sectors - 1] += omega;
      return;
    }
    if (sectors == angle.length) {
      angle = Arrays.copyOf(angle, 2 * sectors);
      conductivity = Arrays.copyOf(conductivity, 2 * sectors);
    }
    angle[sectors] = omega;
    conductivity[sectors++] = root;
  }

  /** The least α at which a field exists, but for the linear one. */
  private double least() {
    if (closed && sectors == 1) {
      return REGULAR;
    }
    double low = LEAST;
    double before = condition(low);
    for (double high = 0.5 * STEP; high < REGULAR; high += STEP) {
      double value = condition(high);
      if (value > 0 != before > 0) {
        double root = bisect(low, high, before > 0);
        if (Math.abs(root - 1) > LINEAR) {
          return root;
        }
      }
      low = high;
      before = value;
    }
    return REGULAR;
  }

  private double bisect(double from, double to, boolean positiveBelow) {
    double low = from;
    double high = to;
    while (high - low > PRECISION) {
      double middle = 0.5 * (low + high);
      if (condition(middle) > 0 == positiveBelow) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return 0.5 * (low + high);
  }

  /** Zero where a field of exponent α exists. */
  private double condition(double exponent) {
    multiply(exponent);
    if (closed) {
      return 2 - ff - pp;
    }
    return fixedFirst ? fixedLast ? fp : pp : fixedLast ? ff : pf;
  }

  private void multiply(double exponent) {
    ff = 1;
    fp = 0;
    pf = 0;
    pp = 1;
    for (int i = 0; i < sectors; i++) {
      double c = Math.cos(exponent * angle[i]);
      double s = Math.sin(exponent * angle[i]);
      double up = s / conductivity[i];
      double down = -s * conductivity[i];
      double nextFf = c * ff + up * pf;
      double nextFp = c * fp + up * pp;
      pf = down * ff + c * pf;
      pp = down * fp + c * pp;
      ff = nextFf;
      fp = nextFp;
    }
  }
}
