package coldseam.solver.conduction;

import java.util.Locale;
import java.util.concurrent.CompletableFuture;

/**
 * Solves the uniformly refined balcony and certifies its L2D, and prints what it took: for
 * comparing with other programs in processes of their own, and for the growth with the number of
 * unknowns. The clock starts with the mesh in memory.
 *
 * <p>Arguments: numbers of unknowns, one after the other.
 */
public final class SolveAndCertify {
  private SolveAndCertify() {}

  /**
   * Runs.
   *
   * @param arguments numbers of unknowns
   */
  public static void main(String[] arguments) {
    for (String argument : arguments) {
      long start = System.nanoTime();
      UniformBalcony balcony = UniformBalcony.of(Integer.parseInt(argument));
      double meshS = (System.nanoTime() - start) / 1e9;
      start = System.nanoTime();
      long startCpu = cpu();
      TwoSidedBound bound = certify(balcony);
      if (!(bound.mismatch() <= bound.allowance)) {
        throw new IllegalStateException("the gap's two ways disagree by " + bound.mismatch());
      }
      double tookS = (System.nanoTime() - start) / 1e9;
      double cpuS = (cpu() - startCpu) / 1e9;
      System.out.printf(
          Locale.ROOT,
          "unknowns %d triangles %d mesh_s %.2f solve_and_certify_s %.2f processor_s %.2f"
              + " L2D_W_per_mK %.6f to %.6f%n",
          balcony.mesh.vertexCount() + balcony.mesh.sideCount(),
          balcony.mesh.triangleCount(),
          meshS,
          tookS,
          cpuS,
          bound.lo[0][0],
          bound.up[0][0]);
    }
  }

  private static long cpu() {
    return ProcessHandle.current()
        .info()
        .totalCpuDuration()
        .map(java.time.Duration::toNanos)
        .orElse(0L);
  }

  /** Both problems and the bounds, as each pass of the adaptive loop does it. */
  static TwoSidedBound certify(UniformBalcony balcony) {
    Discretisation d = new Discretisation(balcony.mesh, balcony.conditions);
    StreamSpace space = new StreamSpace(balcony.mesh, balcony.conditions);
    CompletableFuture<double[][]> streams =
        CompletableFuture.supplyAsync(() -> ConjugateProblem.streamFunctions(d, space));
    double[][] fields = Assembly.unitFields(d);
    return new TwoSidedBound(d, fields, space, streams.join());
  }
}
