package coldseam.cli.plot;

import coldseam.cli.plot.Plots.Caption;
import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The triangles of the heat-loss solution, for whoever works on the solver. */
final class MeshView extends View {
  private final Mesh mesh;

  MeshView(Result result, Caption caption, DrawnSection section) {
    super(result, caption, section);
    mesh = result.heatLoss().mesh();
  }

  @Override
  String shown() {
    return "Mesh · " + films(result().heatLoss().filmSet());
  }

  @Override
  String told() {
    return mesh.triangleCount() + " triangles, " + result().heatLoss().unknowns() + " unknowns.";
  }

  @Override
  Page.Gutters gutters() {
    return new Page.Gutters(20, 20, 30, 40);
  }

  @Override
  void paint(Canvas canvas, Panel panel, Optional<Panel> zoom) {
    canvas.layer(panel.name() + "-triangles");
    List<Polyline> sides = new ArrayList<>();
    Box window = panel.window();
    for (int s = 0; s < mesh.sideCount(); s++) {
      int a = mesh.sideStart(s);
      int b = mesh.sideEnd(s);
      Polyline side = Polyline.of(mesh.x(a), mesh.y(a), mesh.x(b), mesh.y(b));
      if (side.bounds().grown(1e-12).meets(window)) {
        sides.addAll(Clip.line(side.on(panel), panel.frame()));
      }
    }
    canvas.stroke(Polyline.path(sides), Palette.SECOND_INK, Pen.HAIR);
    SectionLines lines = new SectionLines(section(), panel);
    lines.joints(canvas, Palette.INK, Pen.FINE);
    lines.outline(canvas);
    frame(canvas, panel, SectionLines.ground(section(), panel), zoom);
  }

  @Override
  Key key() {
    Key key = new Key();
    key.heading("Mesh");
    key.row("triangles", String.valueOf(mesh.triangleCount()));
    key.row("vertices", String.valueOf(mesh.vertexCount()));
    key.row("unknowns", String.valueOf(result().heatLoss().unknowns()));
    key.row("passes", String.valueOf(result().heatLoss().passes()));
    return key;
  }
}
