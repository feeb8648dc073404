package coldseam.solver.conduction;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * The bounds of L2D on a uniform mesh of the balcony, against the temperatures alone. The ratio of
 * the two is what the proof costs in wall time.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 7, time = 1)
@Fork(value = 1, jvmArgsAppend = "-Xmx2600m")
public class CertifyBench {
  /** About how many unknowns the temperatures have. */
  @Param({"3000", "10000", "100000"})
  private int unknowns;

  private UniformBalcony balcony;

  /** For the harness. */
  public CertifyBench() {}

  /** Makes the mesh. */
  @Setup
  public void mesh() {
    balcony = UniformBalcony.of(unknowns);
  }

  /**
   * Solves for the temperatures alone.
   *
   * @return L2D, not bounded from below
   */
  @Benchmark
  public double temperatures() {
    Discretisation d = new Discretisation(balcony.mesh, balcony.conditions);
    return ConductanceMatrix.of(d, Assembly.unitFields(d)).a[0][0];
  }

  /**
   * Solves for temperatures and stream functions side by side and takes the bounds.
   *
   * @return the gap between them
   */
  @Benchmark
  public double bothSides() {
    return SolveAndCertify.certify(balcony).gap[0][0];
  }
}
