package coldseam.solver.algebra;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

class LayoutTest {
  private static final EliminationPlan PLAN = plan();

  private static EliminationPlan plan() {
    QuadraticLaplacian problem =
        new QuadraticLaplacian(QuadraticLaplacian.square(90, 90), (x, y) -> 1.0);
    return EliminationPlan.of(problem.matrix, problem.order());
  }

  @Test
  void trapezia_of_a_unit_stand_one_after_the_other() {
    Fronts fronts = PLAN.fronts();
    for (int u = 0; u < PLAN.units().count(); u++) {
      int next = 0;
      for (int f = PLAN.units().start()[u]; f < PLAN.units().start()[u + 1]; f++) {
        assertThat(PLAN.layout().trapezium()[f]).isEqualTo(next);
        next += fronts.width(f) * (fronts.width(f) + fronts.rows(f));
      }
      assertThat(PLAN.layout().storage()[u]).isEqualTo(next);
    }
  }

  /** Goes through the fronts of each unit and keeps a list of the updates that wait. */
  @Test
  void updates_that_wait_at_the_same_time_do_not_overlap() {
    Fronts fronts = PLAN.fronts();
    Layout layout = PLAN.layout();
    for (int u = 0; u < PLAN.units().count(); u++) {
      int first = PLAN.units().start()[u];
      int last = PLAN.units().start()[u + 1];
      boolean[][] taken = {new boolean[layout.evenPile()[u]], new boolean[layout.oddPile()[u]]};
      for (int f = first; f < last; f++) {
        if (fronts.parent()[f] >= 0 && fronts.parent()[f] < last) {
          boolean[] pile = taken[layout.odd()[f] ? 1 : 0];
          boolean free = true;
          for (int p = 0; p < DenseUpdate.triangle(fronts.rows(f)); p++) {
            free &= !pile[layout.update()[f] + p];
            pile[layout.update()[f] + p] = true;
          }
          assertThat(free).as("front %d", f).isTrue();
        }
        for (int c = fronts.firstChild()[f]; c >= 0; c = fronts.sibling()[c]) {
          if (c >= first) {
            int from = layout.update()[c];
            Arrays.fill(
                taken[layout.odd()[c] ? 1 : 0],
                from,
                from + DenseUpdate.triangle(fronts.rows(c)),
                false);
          }
        }
      }
    }
  }

  /** The updates of a balanced tree that wait at the same time are few. */
  @Test
  void piles_are_low_against_the_factor() {
    int piles = Arrays.stream(PLAN.layout().evenPile()).sum();
    piles += Arrays.stream(PLAN.layout().oddPile()).sum();
    assertThat(piles).isPositive().isLessThan(Arrays.stream(PLAN.layout().storage()).sum() / 4);
  }
}
