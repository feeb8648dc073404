package coldseam.mesh.partition;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class GapClosingTest {
  private static final double SNAP = 1e-8;
  private static final double CLOSE = 1e-6;

  /** Two squares side by side, the smaller right one not noded with the left one. */
  private static Linework squares(double gap) {
    double[] x = {0, 1, 1, 0, 1 + gap, 2, 2, 1 + gap};
    double[] y = {0, 0, 1, 1, 0.2, 0.2, 0.8, 0.8};
    int[] start = {0, 1, 2, 3, 4, 5, 6, 7};
    int[] end = {1, 2, 3, 0, 5, 6, 7, 4};
    int[][] areas = {{0}, {0}, {0}, {0}, {1}, {1}, {1}, {1}};
    return new Linework(x, y, start, end, areas);
  }

  private static GapClosing closing(Linework linework, int... labels) {
    HalfEdges halves = new HalfEdges(linework.x, linework.y, linework.start, linework.end);
    FaceBuilder faces = new FaceBuilder(linework, halves);
    return new GapClosing(linework, halves, faces, labels, SNAP, CLOSE);
  }

  @Test
  void vertices_left_within_the_joining_length_of_an_edge_are_moved_onto_it_unlisted() {
    Linework linework = squares(5e-9);
    double[] x = linework.x.clone();
    double[] y = linework.y.clone();
    ClosedGaps closed = new ClosedGaps(CLOSE);
    GapClosing closing = closing(linework, 0, 1);
    assertThat(closing.close(x, y, closed)).isTrue();
    assertThat(x[4]).isCloseTo(1, within(1e-15));
    assertThat(x[7]).isCloseTo(1, within(1e-15));
    assertThat(y).isEqualTo(linework.y);
    assertThat(closed.gaps()).isEmpty();
    assertThat(closing.largestMoveM()).isCloseTo(5e-9, within(1e-15));
  }

  @Test
  void wider_gaps_are_listed() {
    Linework linework = squares(5e-7);
    ClosedGaps closed = new ClosedGaps(CLOSE);
    assertThat(closing(linework, 0, 1).close(linework.x.clone(), linework.y.clone(), closed))
        .isTrue();
    assertThat(closed.gaps()).hasSize(1);
    assertThat(closed.gaps().get(0).labels()).containsExactly(0, 1);
  }

  @Test
  void gaps_wider_than_the_closing_length_stay() {
    Linework linework = squares(1.1e-6);
    double[] x = linework.x.clone();
    ClosedGaps closed = new ClosedGaps(CLOSE);
    assertThat(closing(linework, 0, 1).close(x, linework.y.clone(), closed)).isFalse();
    assertThat(x).isEqualTo(linework.x);
  }
}
