package coldseam.mesh.triangulation;

/** The longest triangle side wanted near a point. */
@FunctionalInterface
public interface SizeField {
  /** No wish: the drawing alone grades the mesh. */
  SizeField NONE =
      new SizeField() {
        @Override
        public double longestSideM(double x, double y) {
          return Double.POSITIVE_INFINITY;
        }
      };

  /**
   * The longest side wanted.
   *
   * @param x local x, m
   * @param y local y, m
   * @return the length, m, more than 0
   */
  double longestSideM(double x, double y);
}
