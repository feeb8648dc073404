package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.detail.Conditions;
import java.util.Arrays;

/**
 * The vertices where different edges of the partition meet, and how singular a field may be there.
 * Vertices keep their numbers when the mesh is refined, so what is known of the coarsest mesh holds
 * for all.
 */
final class Corners {
  /** Length over height from which on a triangle is too slender to see the corner it touches. */
  private static final double SLENDER = 3.5;

  /** Triangles longer than so many of the shortest sides at a corner see it from far away. */
  private static final double FAR = 3;

  /** Exponent of the edge of a sheet, which is what the end of a thin part is from far away. */
  private static final double SLIT = 0.5;

  /** From the coarsest mesh, NaN where there is no corner. */
  private final double[] exponents;

  private final double[] shortestSides;

  private Corners(double[] exponents, double[] shortestSides) {
    this.exponents = exponents;
    this.shortestSides = shortestSides;
  }

  /**
   * Finds them.
   *
   * @param coarsest the coarsest mesh
   * @param conditions materials and what holds on the outline
   */
  static Corners of(Mesh coarsest, Conditions conditions) {
    double[] shortest = new double[coarsest.vertexCount()];
    Arrays.fill(shortest, Double.POSITIVE_INFINITY);
    for (int s = 0; s < coarsest.sideCount(); s++) {
      int a = coarsest.sideStart(s);
      int b = coarsest.sideEnd(s);
      double length = coarsest.sideLength(s);
      shortest[a] = Math.min(shortest[a], length);
      shortest[b] = Math.min(shortest[b], length);
    }
    return new Corners(CornerExponents.of(coarsest, conditions), shortest);
  }

  /**
   * The most singular corner of the drawing among those of a triangle.
   *
   * @param mesh the coarsest mesh or one refined from it
   * @param t a triangle
   * @return 0, 1 or 2; −1 if fields are regular at all three
   */
  int in(Mesh mesh, int t) {
    int corner = -1;
    double least = CornerExponents.REGULAR;
    for (int k = 0; k < 3; k++) {
      int v = mesh.vertex(t, k);
      if (v < exponents.length && !Double.isNaN(exponents[v])) {
        double own = exponent(mesh, t, k);
        if (own < least) {
          least = own;
          corner = k;
        }
      }
    }
    return corner;
  }

  /**
   * The α of r^α for the field in a triangle that touches a corner. A triangle longer than a thin
   * part that ends there is wide sees the edge of a sheet; so does a slender one.
   *
   * @param mesh the mesh
   * @param t the triangle
   * @param k which of its vertices is the corner
   */
  double exponent(Mesh mesh, int t, int k) {
    int v = mesh.vertex(t, k);
    boolean far = longestSide(mesh, t) > FAR * shortestSides[v] || slenderness(mesh, t) > SLENDER;
    return far ? Math.min(exponents[v], SLIT) : exponents[v];
  }

  /** Length over height of a triangle. */
  static double slenderness(Mesh mesh, int t) {
    double longest = longestSide(mesh, t);
    return longest * longest / (2 * mesh.area(t));
  }

  /** The longest side of a triangle, m. */
  static double longestSide(Mesh mesh, int t) {
    return Math.max(
        mesh.sideLength(mesh.side(t, 0)),
        Math.max(mesh.sideLength(mesh.side(t, 1)), mesh.sideLength(mesh.side(t, 2))));
  }

  /** The angle of a triangle at one of its vertices, rad. */
  static double angle(Mesh mesh, int t, int k) {
    int v = mesh.vertex(t, k);
    int a = mesh.vertex(t, (k + 1) % 3);
    int b = mesh.vertex(t, (k + 2) % 3);
    double ax = mesh.x(a) - mesh.x(v);
    double ay = mesh.y(a) - mesh.y(v);
    double bx = mesh.x(b) - mesh.x(v);
    double by = mesh.y(b) - mesh.y(v);
    return Math.atan2(ax * by - ay * bx, ax * bx + ay * by);
  }
}
