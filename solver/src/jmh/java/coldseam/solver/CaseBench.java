package coldseam.solver;

import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Detail;
import coldseam.solver.result.Result;
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

/** The whole balcony to the accuracy that holds unless another is asked for. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 7, time = 1)
@Fork(value = 1, jvmArgsAppend = "-Xmx2600m")
public class CaseBench {
  private final Detail detail = BalconyDetail.drawn();

  /** For the harness. */
  public CaseBench() {}

  /**
   * Solves.
   *
   * @return the result
   */
  @Benchmark
  public Result solve() {
    return Solver.solve(detail, Accuracy.STANDARD, Progress.SILENT);
  }
}
