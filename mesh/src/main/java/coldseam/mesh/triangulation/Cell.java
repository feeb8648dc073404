package coldseam.mesh.triangulation;

/**
 * A piece of a thin part by its corners in turn: a to b lies on one side of the part, c to d on the
 * other; b-c and d-a are its rungs. Where the part tapers to a point, b is c or d is a.
 */
record Cell(int a, int b, int c, int d) {
  /** The same cell seen from its other side. */
  Cell turned() {
    return new Cell(c, d, a, b);
  }

  boolean isTriangle() {
    return b == c || d == a;
  }

  /** Area over the mean length of the two sides, m. */
  double width(Triangulation plane) {
    double twiceArea =
        (plane.x[c] - plane.x[a]) * (plane.y[d] - plane.y[b])
            - (plane.y[c] - plane.y[a]) * (plane.x[d] - plane.x[b]);
    return twiceArea / (plane.distance(a, b) + plane.distance(c, d));
  }

  /** The shorter of the two sides, m. */
  double length(Triangulation plane) {
    return Math.min(plane.distance(a, b), plane.distance(c, d));
  }

  /** Whether the corners turn left all round. */
  boolean isConvex(Triangulation plane) {
    return (b == c || plane.orientation(a, b, c) > 0 && plane.orientation(b, c, d) > 0)
        && (d == a || plane.orientation(c, d, a) > 0 && plane.orientation(d, a, b) > 0);
  }
}
