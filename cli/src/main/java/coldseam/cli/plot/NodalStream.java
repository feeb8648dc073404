package coldseam.cli.plot;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.StreamFunction;

/**
 * Values of a stream function, continuous but where it jumps.
 *
 * @param function the function, W/m
 */
record NodalStream(StreamFunction function) implements Nodal {
  @Override
  public Mesh mesh() {
    return function.mesh();
  }

  @Override
  public int cornerValues() {
    return function.nodeCount();
  }

  @Override
  public int cornerValue(int triangle, int k) {
    return function.node(triangle, k);
  }

  @Override
  public double atCorner(int triangle, int k) {
    return function.value(triangle, k);
  }

  @Override
  public double atMiddle(int triangle, int k) {
    return function.value(triangle, 3 + k);
  }

  @Override
  public double in(int triangle, double[] l) {
    return function.in(triangle, l[0], l[1], l[2]);
  }
}
