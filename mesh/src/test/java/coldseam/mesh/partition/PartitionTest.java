package coldseam.mesh.partition;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.List;
import org.junit.jupiter.api.Test;

class PartitionTest {
  @Test
  void a_later_area_covers_an_earlier_one() {
    Partition partition =
        Partition.of(
            List.of(box(4, 0, 0, 1, 1), box(5, 0.5, 0, 2, 1)), List.of(), Resolution.STANDARD);
    assertThat(partition.faceCount()).isEqualTo(2);
    assertThat(partition.labelArea(4)).isCloseTo(0.5, within(1e-15));
    assertThat(partition.labelArea(5)).isCloseTo(1.5, within(1e-15));
    assertThat(partition.defects()).isEmpty();
  }

  private static LabelledArea box(int label, double left, double low, double right, double high) {
    return new LabelledArea(
        label,
        List.of(
            List.of(
                new Point(left, low),
                new Point(right, low),
                new Point(right, high),
                new Point(left, high))));
  }
}
