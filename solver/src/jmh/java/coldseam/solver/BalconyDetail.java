package coldseam.solver;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Exposure;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.View;
import coldseam.solver.detail.Wanted;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * The section that all benchmarks use: a concrete balcony slab through an insulated masonry wall,
 * the same as in {@code cases/demo/balcony.yaml} and {@code solver/src/jmh/sh/balcony.idp}.
 */
public final class BalconyDetail {
  private static final double SLAB = 0.2;
  private static final double[] LAYERS = {0.015, 0.240, 0.160, 0.010};
  private static final double OUTER = 0.425;

  private final List<Area> areas = new ArrayList<>();

  private BalconyDetail() {}

  /**
   * Draws it.
   *
   * @return the detail, ψ by internal, overall internal and external dimensions wanted
   */
  public static Detail drawn() {
    return new BalconyDetail().draw();
  }

  private Detail draw() {
    Space indoors = Space.of("indoors", 20, Exposure.INSIDE);
    Space outdoors = Space.of("outdoors", -5, Exposure.OUTSIDE);
    Material concrete = Material.of("concrete", 2.3);
    box(indoors, -1.5, -1.5, 0, 1.6);
    box(outdoors, OUTER, -1.5, OUTER + 1.9, 1.6);
    Material[] wall = {
      Material.of("plaster", 0.57),
      Material.of("brickwork", 0.50),
      Material.of("wall insulation", 0.035),
      Material.of("render", 1.0)
    };
    double x = 0;
    for (int i = 0; i < wall.length; i++) {
      box(wall[i], x, -1.5, x + LAYERS[i], 1.6);
      x += LAYERS[i];
    }
    box(concrete, -1.5, -SLAB, OUTER + 1.4, 0);
    box(Material.of("impact insulation", 0.040), -1.5, 0, 0, 0.03);
    box(Material.of("screed", 1.35), -1.5, 0.03, 0, 0.08);
    return new Detail(
        "Balcony slab through an insulated wall",
        Geometry.PLANE,
        View.UPRIGHT,
        areas,
        List.of(indoors, outdoors),
        List.of(),
        List.of(),
        List.of(
            psi("internal", DimensionSystem.INTERNAL),
            psi("overall internal", DimensionSystem.OVERALL_INTERNAL),
            psi("external", DimensionSystem.EXTERNAL)),
        List.of());
  }

  private static Wanted psi(String name, DimensionSystem dimensions) {
    return new Wanted.Psi(
        name, "junction", List.of("indoors"), List.of("outdoors"), Map.of(), dimensions, List.of());
  }

  private void box(Fill fill, double left, double bottom, double right, double top) {
    List<Point> ring =
        List.of(
            new Point(left, bottom),
            new Point(right, bottom),
            new Point(right, top),
            new Point(left, top));
    areas.add(new Area("area " + areas.size(), fill, List.of(ring), false));
  }
}
