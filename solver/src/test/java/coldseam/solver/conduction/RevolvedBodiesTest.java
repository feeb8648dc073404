package coldseam.solver.conduction;

import static coldseam.solver.conduction.Sketch.material;
import static coldseam.solver.conduction.Sketch.space;
import static org.assertj.core.api.Assertions.assertThat;

import coldseam.solver.detail.Space;
import org.junit.jupiter.api.Test;

class RevolvedBodiesTest {
  @Test
  void probe() {
    Space one = space("one", 1, 0);
    Space air = space("air", 0, 0.02);
    Sketch sketch =
        new Sketch()
            .revolved()
            .accuracy(1e-5)
            .know(one)
            .know(air)
            .box(material("rod", 15), 0, 0, 0.05, 0.2)
            .facing(one, 0, 0, 0.05, 0)
            .facing(air, 0.05, 0, 0.05, 0.2);
    FieldSolution s = (FieldSolution) sketch.solve();
    for (AdaptiveLoop.Proved p : s.proved()) {
      System.out.println(
          p.unknowns()
              + " "
              + p.lo()[0][0]
              + " "
              + p.up()[0][0]
              + " "
              + p.gap()[0][0]
              + " "
              + (p.up()[0][0] - p.lo()[0][0] - p.gap()[0][0]));
    }
    Space in = space("in", 1, 0.13);
    Space out = space("out", 0, 0.04);
    sketch =
        new Sketch()
            .revolved()
            .accuracy(1e-5)
            .know(in)
            .know(out)
            .box(material("wall", 0.04), 0, 0, 0.5, 0.2)
            .box(material("rod", 50), 0, 0, 0.01, 0.2)
            .facing(in, 0, 0, 0.5, 0)
            .facing(out, 0, 0.2, 0.5, 0.2);
    s = (FieldSolution) sketch.solve();
    for (AdaptiveLoop.Proved p : s.proved()) {
      System.out.println(
          p.unknowns()
              + " "
              + p.lo()[0][0]
              + " "
              + p.up()[0][0]
              + " "
              + p.gap()[0][0]
              + " "
              + (p.up()[0][0] - p.lo()[0][0] - p.gap()[0][0]));
    }
    assertThat(s.passes()).isPositive();
  }
}
