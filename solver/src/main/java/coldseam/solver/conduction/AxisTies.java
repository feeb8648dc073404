package coldseam.solver.conduction;

import coldseam.mesh.triangulation.Mesh;
import java.util.Arrays;
import java.util.BitSet;

/**
 * What holds of a stream function S beside the axis of a body of revolution. No heat flows along a
 * line of no thickness: with the flux curl S/2πr, not only is S one value S₀ along the axis but
 * also ∂S/∂r is 0 there. So along each side that leaves the axis S − S₀ goes with the square of the
 * distance, and the middle of the side has S₀ + ¼(far − S₀).
 */
final class AxisTies {
  private final BitSet middles = new BitSet();

  /** Middle, end on the axis and far end of each side that leaves the axis, one after the other. */
  private int[] ties = new int[48];

  private int count;

  /**
   * Finds the sides.
   *
   * @param mesh the mesh
   * @param nodes nodes of the stream function, all triangles
   */
  AxisTies(Mesh mesh, int[] nodes) {
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int a = (k + 1) % 3;
        int b = (k + 2) % 3;
        boolean aOnAxis = Circumference.at(mesh, mesh.vertex(t, a)) == 0;
        boolean bOnAxis = Circumference.at(mesh, mesh.vertex(t, b)) == 0;
        int at = QuadraticElement.NODES * t;
        if (aOnAxis != bOnAxis && !middles.get(nodes[at + 3 + k])) {
          tie(nodes[at + 3 + k], nodes[at + (aOnAxis ? a : b)], nodes[at + (aOnAxis ? b : a)]);
        }
      }
    }
  }

  private void tie(int middle, int onAxis, int far) {
    if (count + 3 > ties.length) {
      ties = Arrays.copyOf(ties, 2 * ties.length);
    }
    middles.set(middle);
    ties[count++] = middle;
    ties[count++] = onAxis;
    ties[count++] = far;
  }

  /** Whether a node's value follows from those of two others. */
  boolean tied(int node) {
    return middles.get(node);
  }

  /** Sets the tied values. */
  void follow(double[] stream) {
    for (int i = 0; i < count; i += 3) {
      double onAxis = stream[ties[i + 1]];
      stream[ties[i]] = onAxis + (stream[ties[i + 2]] - onAxis) / 4;
    }
  }
}
