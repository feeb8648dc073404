package coldseam.solver.algebra;

import coldseam.solver.conduction.UniformBalcony;
import java.util.Arrays;
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

/** Order and factor of the balcony's matrix, row by row and front by front. */
@State(Scope.Benchmark)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 7, time = 1)
@Fork(value = 1, jvmArgsAppend = "-Xmx2600m")
public class FactorBench {
  /** About how many unknowns. */
  @Param({"3000", "10000", "30000", "100000"})
  private int unknowns;

  private int[] nodes;
  private double[][] centres;
  private ElementSum.Entries entries;
  private boolean[] free;

  /** For the harness. */
  public FactorBench() {}

  /** Makes the mesh and what its triangles conduct. */
  @Setup
  public void mesh() {
    UniformBalcony balcony = UniformBalcony.of(unknowns);
    nodes = balcony.nodes();
    centres = balcony.centres();
    entries = balcony.conduction();
    free = new boolean[Arrays.stream(nodes).max().orElseThrow() + 1];
    Arrays.fill(free, true);
  }

  /**
   * By geometric order, row by row.
   *
   * @return entries of the factor
   */
  @Benchmark
  public long rowByRow() {
    int[] place = FillReducingOrder.geometric(free, free.length, nodes, 6, centres[0], centres[1]);
    return UpLookingCholesky.of(matrix(place)).factorEntries();
  }

  /**
   * By nested dissection, front by front.
   *
   * @return entries of the factor
   */
  @Benchmark
  public long frontByFront() {
    int[] place = FillReducingOrder.dissected(free, free.length, nodes, 6, centres[0], centres[1]);
    SparseSymmetric matrix = matrix(place);
    return MultifrontalCholesky.factor(EliminationPlan.inOrder(matrix), matrix).factorEntries();
  }

  private SparseSymmetric matrix(int[] place) {
    int[] member = Arrays.stream(nodes).map(node -> place[node]).toArray();
    return ElementSum.of(free.length, 6, member, entries, new EntryList());
  }
}
