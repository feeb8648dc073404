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
 * Solving and certifying the uniformly refined balcony, from ten thousand unknowns to a million.
 */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.SingleShotTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 3)
@Measurement(iterations = 5)
@Fork(value = 1, jvmArgsAppend = "-Xmx2600m")
public class GrowthBench {
  /** About how many unknowns the temperatures have. */
  @Param({"10000", "30000", "100000", "300000", "1000000"})
  private int unknowns;

  private UniformBalcony balcony;

  /** For the harness. */
  public GrowthBench() {}

  /** Makes the mesh. */
  @Setup
  public void mesh() {
    balcony = UniformBalcony.of(unknowns);
  }

  /**
   * Solves and certifies.
   *
   * @return the gap between the bounds
   */
  @Benchmark
  public double solveAndCertify() {
    return SolveAndCertify.certify(balcony).gap[0][0];
  }
}
