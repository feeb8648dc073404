package coldseam.mesh.partition;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;

class PartitionCheckTest {
  private static String faultIn(double[] x, double[] y, int[] start, int[] end, int[][] areas) {
    Linework linework = new Linework(x, y, start, end, areas);
    HalfEdges halves = new HalfEdges(x, y, start, end);
    return PartitionCheck.faultIn(linework, halves, new FaceBuilder(linework, halves));
  }

  @Test
  void a_square_is_sound() {
    double[] x = {0, 1, 1, 0};
    double[] y = {0, 0, 1, 1};
    int[][] areas = {{0}, {0}, {0}, {0}};
    assertThat(faultIn(x, y, new int[] {0, 1, 2, 3}, new int[] {1, 2, 3, 0}, areas)).isNull();
  }

  @Test
  void a_free_end_is_found() {
    double[] x = {0, 1, 1, 0, 0.5};
    double[] y = {0, 0, 1, 1, 0.5};
    int[][] areas = {{0}, {0}, {0}, {0}, {0}};
    assertThat(faultIn(x, y, new int[] {0, 1, 2, 3, 0}, new int[] {1, 2, 3, 0, 4}, areas))
        .contains("ends freely")
        .contains("0.5");
  }

  @Test
  void sides_that_contradict_their_areas_are_found() {
    double[] x = {0, 1, 1, 0};
    double[] y = {0, 0, 1, 1};
    int[][] areas = {{0}, {0}, {0, 1}, {0}};
    assertThat(faultIn(x, y, new int[] {0, 1, 2, 3}, new int[] {1, 2, 3, 0}, areas))
        .contains("contradict");
  }

  /** A square and the two diagonals of it, which cross without a vertex. */
  @Test
  void edges_that_cross_without_a_vertex_are_found() {
    double[] x = {0, 1, 1, 0};
    double[] y = {0, 0, 1, 1};
    int[] start = {0, 1, 2, 3, 0, 1};
    int[] end = {1, 2, 3, 0, 2, 3};
    int[][] areas = {{0}, {1}, {2}, {3}, {4}, {5}};
    assertThat(faultIn(x, y, start, end, areas)).isNotNull();
  }

  @Test
  void an_area_that_does_not_add_up_is_refused() {
    double[] drawn = {1, Double.NaN};
    double[] allowance = {1e-9, 1e-9};
    PartitionCheck.areas(drawn, new double[] {1, 7}, allowance);
    assertThatThrownBy(() -> PartitionCheck.areas(drawn, new double[] {1.1, 7}, allowance))
        .isInstanceOf(IllegalStateException.class)
        .hasMessageContaining("area 0 measures 1.0");
  }
}
