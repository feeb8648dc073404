package coldseam.cli.plot;

import coldseam.mesh.triangulation.Mesh;

/** A quantity that is quadratic, or made from quadratics, in each triangle of a mesh. */
interface Nodal {
  Mesh mesh();

  /** How many values there are at corners; more than vertices where values jump at a vertex. */
  int cornerValues();

  /** Which of the values belongs to a corner of a triangle; equal where the values are shared. */
  int cornerValue(int triangle, int k);

  /** The value at a corner of a triangle. */
  double atCorner(int triangle, int k);

  /** The value in the middle of side k of a triangle, which lies opposite corner k. */
  double atMiddle(int triangle, int k);

  /** The value inside a triangle; on a side the same from both triangles that share its corners. */
  double in(int triangle, double[] barycentric);
}
