package coldseam.solver.conduction;

import static coldseam.solver.DrawnDetail.material;
import static org.assertj.core.api.Assertions.assertThat;

import coldseam.mesh.plane.Point;
import coldseam.solver.DrawnDetail;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.FilmSet;
import org.junit.jupiter.api.Test;

/** Where the numbers fail, the thinnest place is to blame if there is one, else the program. */
class SliversTest {
  private static final IllegalStateException FAILURE = new IllegalStateException("lost");

  /** A block with a wedge left of it under another material; 0 for none. */
  private static RuntimeException blamed(double hairMm) {
    DrawnDetail drawn =
        new DrawnDetail()
            .moved(p -> new Point(p.x() + 3, p.y() - 2))
            .box(DrawnDetail.space("inside", 20, Exposure.INSIDE, 0.1), 0, -500, 1000, 0)
            .box(DrawnDetail.space("outside", 0, Exposure.OUTSIDE, 0.1), 0, 400, 1000, 900)
            .box(material("block", 0.2), 0, 0, 1000, 400)
            .polygon(material("over", 0.3), 0, hairMm, 1000, 0, 1000, 400, 0, 400);
    Conditions conditions = drawn.conditions(FilmSet.HEAT_LOSS);
    Solution coarse = Conduction.solveCoarsely(drawn.partition(), conditions);
    return Slivers.explained(new Discretisation(coarse.mesh(), conditions), conditions, FAILURE);
  }

  @Test
  void a_place_too_thin_is_told() {
    RuntimeException blamed = blamed(0.003);
    assertThat(blamed).isInstanceOf(DetailException.class);
    assertThat(((DetailException) blamed).faults())
        .singleElement()
        .satisfies(
            fault -> {
              assertThat(fault.message())
                  .matches(
                      "'block' is only 0\\.00\\d+ mm wide over a length of [\\d.]+ mm at"
                          + " \\([\\d.]+, -2000\\) mm, too thin to be computed with; .*");
              assertThat(fault.where().orElseThrow().x()).isBetween(3.0, 4.0);
              assertThat(fault.where().orElseThrow().y()).isBetween(-2.0, -2.0 + 3e-6);
            });
  }

  @Test
  void a_drawing_without_such_a_place_is_not_to_blame() {
    assertThat(blamed(0)).isSameAs(FAILURE);
    assertThat(blamed(5)).isSameAs(FAILURE);
  }
}
