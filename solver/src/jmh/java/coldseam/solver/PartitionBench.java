package coldseam.solver;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.Detail;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** The areas of the balcony made into faces that share their edges. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 7, time = 1)
@Fork(value = 1, jvmArgsAppend = "-Xmx2600m")
public class PartitionBench {
  private final Detail detail = BalconyDetail.drawn();

  /** For the harness. */
  public PartitionBench() {}

  /**
   * Makes the partition.
   *
   * @return the partition
   */
  @Benchmark
  public Partition partition() {
    return Partition.of(detail.labelledAreas(), detail.labelledLines(), Resolution.STANDARD);
  }
}
