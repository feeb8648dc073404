package coldseam.solver;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.triangulation.Mesh;
import coldseam.mesh.triangulation.Triangulator;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** Triangles for the balcony: the coarsest mesh, and small triangles everywhere. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 7, time = 1)
@Fork(value = 1, jvmArgsAppend = "-Xmx2600m")
public class TriangulateBench {
  private final Solver.Inspection balcony = Solver.inspect(BalconyDetail.drawn());

  /** Longest side wanted, mm; 10000 is more than the drawing allows anyway. */
  @Param({"10000", "50", "10"})
  private int sideMm;

  /** For the harness. */
  public TriangulateBench() {}

  /**
   * Makes the mesh.
   *
   * @return the mesh
   */
  @Benchmark
  public Mesh triangulate() {
    Partition partition = balcony.partition();
    return Triangulator.triangulate(
        partition, balcony.heatLoss()::conducts, (x, y) -> sideMm / 1000.0);
  }
}
