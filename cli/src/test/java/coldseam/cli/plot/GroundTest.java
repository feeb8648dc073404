package coldseam.cli.plot;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Room for labels. */
class GroundTest {
  private static final Box FRAME = new Box(10, 20, 410, 320);

  private static Polyline ring(double x0, double y0, double x1, double y1) {
    return new Polyline.Builder().add(x0, y0).add(x1, y0).add(x1, y1).add(x0, y1).closed();
  }

  @Test
  void a_label_within_a_face_lies_within_it() {
    Ground ground = new Ground(FRAME);
    Polyline outer = ring(50, 60, 250, 260);
    Polyline hole = ring(100, 100, 240, 250);
    ground.paint(List.of(outer, hole), 3, true);
    Optional<Box> place = ground.within(3, outer.bounds(), 60, 20);
    assertThat(place).isPresent();
    assertThat(outer.bounds().contains(place.get())).isTrue();
    assertThat(hole.bounds().meets(place.get())).isFalse();
    assertThat(ground.within(3, outer.bounds(), 60, 60)).isEmpty();
    assertThat(ground.within(4, outer.bounds(), 10, 10)).isEmpty();
  }

  @Test
  void labels_never_overlap_whatever_comes() {
    Random random = new Random(5);
    for (int trial = 0; trial < 40; trial++) {
      Ground ground = new Ground(FRAME);
      List<Box> placed = new ArrayList<>();
      for (int i = 0; i < 60; i++) {
        double x = FRAME.x0() + random.nextDouble() * FRAME.width();
        double y = FRAME.y0() + random.nextDouble() * FRAME.height();
        double width = 10 + 60 * random.nextDouble();
        double height = 8 + 20 * random.nextDouble();
        Optional<Box> place = ground.near(x, y, width, height, 5, 80, owner -> true);
        place.ifPresent(
            box -> {
              assertThat(FRAME.contains(box)).isTrue();
              assertThat(placed).noneMatch(box::meets);
              ground.take(box);
              placed.add(box);
            });
      }
      assertThat(placed.size()).isGreaterThan(15);
    }
  }

  @Test
  void a_leader_crosses_nothing_written() {
    Ground ground = new Ground(FRAME);
    // A wall of writing around the point but for a gap to the left.
    ground.take(new Box(180, 100, 240, 112));
    ground.take(new Box(180, 188, 240, 200));
    ground.take(new Box(228, 100, 240, 200));
    Box box = ground.near(200, 150, 70, 14, 60, 120, owner -> true).orElseThrow();
    assertThat(box.x1()).isLessThan(200);
  }
}
