package coldseam.mesh.triangulation;

import coldseam.mesh.partition.Partition;
import java.util.function.IntPredicate;

/**
 * Makes a coarse, graded, constrained Delaunay mesh of a partition: no angle under 20° but where
 * the drawing itself has a smaller one, and but in ladders, the right-angled triangles that fill
 * faces thinner than about 1/20 of their length.
 */
public final class Triangulator {
  private Triangulator() {}

  /**
   * Triangulates the faces whose label is accepted.
   *
   * @param partition the faces
   * @param meshed accepts the labels to be filled with triangles (others, and uncovered ground, are
   *     left open)
   * @param size the longest side wanted at each place
   * @return the mesh, with the longest side of each triangle as its side 0
   * @throws IllegalArgumentException if no face is accepted
   */
  public static Mesh triangulate(Partition partition, IntPredicate meshed, SizeField size) {
    return triangulate(Linework.of(partition), meshed, size);
  }

  static Mesh triangulate(Linework lines, IntPredicate meshed, SizeField size) {
    boolean[] wanted = new boolean[lines.faceLabel.length];
    boolean any = false;
    for (int f = 0; f < wanted.length; f++) {
      wanted[f] = meshed.test(lines.faceLabel[f]);
      any |= wanted[f];
    }
    if (!any) {
      throw new IllegalArgumentException("no face of the partition is to be meshed");
    }
    Linework ordered = lines.alongCurve();
    ConstrainedDelaunay plane = new ConstrainedDelaunay(ordered);
    Faces.fill(plane, ordered);
    Ladders ladders = new Ladders(plane, ordered);
    ladders.build(LadderSearch.search(plane, wanted));
    new DelaunayRefinement(plane, ordered, ladders, wanted, size).run();
    ladders.takeLongerDiagonals();
    Mesh mesh = MeshAssembly.assemble(plane, ordered, wanted);
    MeshCheck.require(mesh, ordered, wanted);
    return mesh;
  }
}
