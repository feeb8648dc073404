package coldseam.mesh.triangulation;

/**
 * Two sides h and g of one face that run against each other, the face to the left of both, measured
 * along the direction between the two; "first" is towards the start of h.
 */
final class SidePair {
  /** Vertices on the two sides are joined if they are offset by this many widths at most. */
  private static final double LONGEST_OFFSET = 4;

  /** Sides pair up if the angle between them has at least this cosine (about 11°). */
  private static final double NEARLY_PARALLEL = 0.98;

  /**
   * An end of a rung: a vertex, or a point on a partition edge.
   *
   * @param vertex the vertex of the triangulation, or NONE
   * @param edge the partition edge, if no vertex
   * @param x local x, m
   * @param y local y, m
   */
  record End(int vertex, int edge, double x, double y) {}

  private final ConstrainedDelaunay plane;
  private final int h;
  private final int g;
  private final double ux;
  private final double uy;
  private final double startH;
  private final double endH;
  private final double startG;
  private final double endG;
  private final boolean joinedFirst;
  private final boolean joinedLast;

  SidePair(ConstrainedDelaunay plane, int h, int g) {
    this.plane = plane;
    this.h = h;
    this.g = g;
    double lengthH = plane.length(h);
    double lengthG = plane.length(g);
    double dx = dx(plane, h) / lengthH - dx(plane, g) / lengthG;
    double dy = dy(plane, h) / lengthH - dy(plane, g) / lengthG;
    double norm = Math.hypot(dx, dy);
    ux = dx / norm;
    uy = dy / norm;
    startH = along(plane.start(h));
    endH = along(plane.end(h));
    startG = along(plane.start(g));
    endG = along(plane.end(g));
    joinedFirst = Math.abs(startH - endG) <= LONGEST_OFFSET * across(plane.start(h), plane.end(g));
    joinedLast = Math.abs(endH - startG) <= LONGEST_OFFSET * across(plane.end(h), plane.start(g));
  }

  int h() {
    return h;
  }

  int g() {
    return g;
  }

  /** Whether the rung at the first end joins two vertices. */
  boolean joinedFirst() {
    return joinedFirst;
  }

  /** Whether the rung at the last end joins two vertices. */
  boolean joinedLast() {
    return joinedLast;
  }

  /** Whether two sides run against each other nearly in parallel. */
  static boolean runsAgainst(ConstrainedDelaunay plane, int h, int g) {
    double dot = dx(plane, h) * dx(plane, g) + dy(plane, h) * dy(plane, g);
    return -dot >= NEARLY_PARALLEL * plane.length(h) * plane.length(g);
  }

  double length() {
    return Math.min(endH, startG) - Math.max(startH, endG);
  }

  /** The larger distance of the sides at the two ends of the pair. */
  double width() {
    double first = Math.max(startH, endG);
    double last = Math.min(endH, startG);
    return Math.max(offset(first), offset(last));
  }

  /** The place on h, in parts of its length, at a part of the way from first to last. */
  double partOfH(double part) {
    double first = Math.max(startH, endG);
    double last = Math.min(endH, startG);
    return (first + part * (last - first) - startH) / (endH - startH);
  }

  boolean endsOnH() {
    return joinedLast || endH <= startG;
  }

  boolean endsOnG() {
    return joinedLast || endH > startG;
  }

  End firstOnH() {
    return joinedFirst || startH >= endG ? vertex(plane.start(h)) : foot(h, endG);
  }

  End firstOnG() {
    return joinedFirst || startH < endG ? vertex(plane.end(g)) : foot(g, startH);
  }

  End lastOnH() {
    return endsOnH() ? vertex(plane.end(h)) : foot(h, startG);
  }

  End lastOnG() {
    return endsOnG() ? vertex(plane.start(g)) : foot(g, endH);
  }

  private End vertex(int v) {
    return new End(v, Triangulation.NONE, plane.x[v], plane.y[v]);
  }

  /** The point of a side at a place along the pair. */
  private End foot(int side, double at) {
    int a = plane.start(side);
    int b = plane.end(side);
    double part = (at - along(a)) / (along(b) - along(a));
    return new End(
        Triangulation.NONE,
        plane.kept[side],
        plane.x[a] + part * (plane.x[b] - plane.x[a]),
        plane.y[a] + part * (plane.y[b] - plane.y[a]));
  }

  /** Distance of the sides at a place along the pair. */
  private double offset(double at) {
    return level(g, at) - level(h, at);
  }

  private double level(int side, double at) {
    int a = plane.start(side);
    int b = plane.end(side);
    double part = (at - along(a)) / (along(b) - along(a));
    return level(a) + part * (level(b) - level(a));
  }

  private double along(int v) {
    return ux * (plane.x[v] - originX()) + uy * (plane.y[v] - originY());
  }

  private double level(int v) {
    return ux * (plane.y[v] - originY()) - uy * (plane.x[v] - originX());
  }

  private double across(int a, int b) {
    return Math.abs(level(b) - level(a));
  }

  private double originX() {
    return plane.x[plane.start(h)];
  }

  private double originY() {
    return plane.y[plane.start(h)];
  }

  private static double dx(ConstrainedDelaunay plane, int h) {
    return plane.x[plane.end(h)] - plane.x[plane.start(h)];
  }

  private static double dy(ConstrainedDelaunay plane, int h) {
    return plane.y[plane.end(h)] - plane.y[plane.start(h)];
  }
}
