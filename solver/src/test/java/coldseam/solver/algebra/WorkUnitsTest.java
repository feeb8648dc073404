package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.concurrent.ForkJoinPool;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.atomic.AtomicIntegerArray;
import org.junit.jupiter.api.Test;

class WorkUnitsTest {
  private static EliminationPlan large() {
    QuadraticLaplacian problem =
        new QuadraticLaplacian(QuadraticLaplacian.square(90, 90), (x, y) -> 1.0);
    return EliminationPlan.of(problem.matrix, problem.order());
  }

  @Test
  void a_large_system_is_shared_out_and_a_small_one_is_not() {
    QuadraticLaplacian small =
        new QuadraticLaplacian(QuadraticLaplacian.square(12, 12), (x, y) -> 1.0);
    assertThat(EliminationPlan.of(small.matrix, small.order()).units().count()).isEqualTo(1);
    assertThat(large().units().count()).isBetween(8, 400);
  }

  @Test
  void units_are_runs_of_fronts_whose_parents_are_inside_or_in_the_unit_above() {
    EliminationPlan plan = large();
    WorkUnits units = plan.units();
    Fronts fronts = plan.fronts();
    assertThat(units.start()[0]).isZero();
    assertThat(units.start()[units.count()]).isEqualTo(fronts.count());
    for (int u = 0; u < units.count(); u++) {
      int end = units.start()[u + 1];
      for (int f = units.start()[u]; f < end; f++) {
        int parent = fronts.parent()[f];
        if (parent >= end) {
          int above = units.parent()[u];
          assertThat(parent).isBetween(units.start()[above], units.start()[above + 1] - 1);
        } else if (parent < 0) {
          assertThat(units.parent()[u]).isEqualTo(-1);
        }
      }
    }
  }

  @Test
  void every_unit_is_done_once_after_those_below_it_or_before() {
    WorkUnits units = large().units();
    ForkJoinPool pool = new ForkJoinPool(4);
    try {
      for (boolean upwards : new boolean[] {true, false}) {
        AtomicInteger clock = new AtomicInteger();
        AtomicIntegerArray done = new AtomicIntegerArray(units.count());
        pool.submit(
                () -> {
                  if (upwards) {
                    units.upwards(u -> done.addAndGet(u, clock.incrementAndGet()));
                  } else {
                    units.downwards(u -> done.addAndGet(u, clock.incrementAndGet()));
                  }
                })
            .join();
        assertThat(clock.get()).isEqualTo(units.count());
        for (int u = 0; u < units.count(); u++) {
          if (units.parent()[u] >= 0) {
            assertThat(done.get(u) < done.get(units.parent()[u])).isEqualTo(upwards);
          }
        }
      }
    } finally {
      pool.shutdown();
    }
  }
}
