package coldseam.cli.plot;

import coldseam.solver.detail.Conditions;
import java.awt.geom.Path2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/** The lines of the section that every plot has: outline, joints, thin sheets, cut-off planes. */
final class SectionLines {
  /** Faces thinner than this on the sheet are drawn as lines, points. */
  private static final double SHEET = 1.6;

  private static final double SYMMETRY_TICK = 5;
  private static final double BEYOND = 7;
  private static final double BEYOND_AXIS = 12;

  private final DrawnSection section;
  private final Panel panel;

  SectionLines(DrawnSection section, Panel panel) {
    this.section = section;
    this.panel = panel;
  }

  /** Joints between materials, and sheets too thin to show otherwise. */
  void joints(Canvas canvas, Colour colour, Pen pen) {
    canvas.layer(name("joints"));
    List<Polyline> lines = new ArrayList<>();
    for (Polyline joint : section.joints()) {
      lines.addAll(Clip.line(joint.on(panel), panel.frame()));
    }
    canvas.stroke(Polyline.path(lines), colour, pen);
    List<Polyline> sheets = new ArrayList<>();
    for (DrawnSection.Face face : section.faces()) {
      if (section.solid(face.label()) && face.widthM() * panel.pointsPerM() < SHEET) {
        for (Polyline ring : face.rings()) {
          sheets.addAll(Clip.line(ring.on(panel), panel.frame()));
        }
      }
    }
    if (!sheets.isEmpty()) {
      canvas.stroke(Polyline.path(sheets), Palette.INK, Pen.MEDIUM);
    }
  }

  /** The outline: surfaces heavy, cut-off planes dash-dotted, two ticks on planes of symmetry. */
  void outline(Canvas canvas) {
    canvas.layer(name("outline"));
    List<Polyline> surfaces = new ArrayList<>();
    List<Polyline> hollows = new ArrayList<>();
    for (DrawnSection.Surface surface : section.surfaces()) {
      boolean hollow = surface.kind() == Conditions.Kind.HOLLOW;
      (hollow ? hollows : surfaces).addAll(Clip.line(surface.line().on(panel), panel.frame()));
    }
    canvas.stroke(Polyline.path(surfaces), Palette.INK, Pen.HEAVY);
    if (!hollows.isEmpty()) {
      canvas.stroke(Polyline.path(hollows), Palette.INK, Pen.MEDIUM);
    }
    Path2D planes = new Path2D.Double();
    Path2D ticks = new Path2D.Double();
    for (DrawnSection.CutOff cutOff : section.cutOffs()) {
      plane(cutOff, planes, ticks);
    }
    canvas.layer(name("cut-off-planes"));
    canvas.stroke(planes, Palette.INK, Pen.CUT_OFF);
    canvas.stroke(ticks, Palette.INK, Pen.MEDIUM);
    if (section.axis().isPresent()) {
      Path2D axis = new Path2D.Double();
      append(longer(section.axis().get().on(panel), BEYOND_AXIS), axis);
      canvas.layer(name("axis"));
      canvas.stroke(axis, Palette.INK, Pen.AXIS);
    }
  }

  /** A line that reaches beyond both ends. */
  private static Polyline longer(Polyline line, double by) {
    double dx = line.x(1) - line.x(0);
    double dy = line.y(1) - line.y(0);
    double part = by / Math.hypot(dx, dy);
    return Polyline.of(
        line.x(0) - part * dx, line.y(0) - part * dy, line.x(1) + part * dx, line.y(1) + part * dy);
  }

  private void plane(DrawnSection.CutOff cutOff, Path2D planes, Path2D ticks) {
    Polyline line = cutOff.line().on(panel);
    double dx = line.x(1) - line.x(0);
    double dy = line.y(1) - line.y(0);
    double length = Math.hypot(dx, dy);
    if (length == 0) {
      return;
    }
    double ux = dx / length;
    double uy = dy / length;
    append(longer(line, BEYOND), planes);
    if (cutOff.symmetry()) {
      for (int end = 0; end < 2; end++) {
        for (double back : new double[] {1.5, 4.5}) {
          double sign = end == 0 ? -1 : 1;
          double x = line.x(end) + sign * back * ux;
          double y = line.y(end) + sign * back * uy;
          Polyline tick =
              Polyline.of(
                  x - SYMMETRY_TICK * uy,
                  y + SYMMETRY_TICK * ux,
                  x + SYMMETRY_TICK * uy,
                  y - SYMMETRY_TICK * ux);
          append(tick, ticks);
        }
      }
    }
  }

  /** Appends what is seen of a line. */
  private void append(Polyline line, Path2D path) {
    for (Polyline part : Clip.line(line, panel.frame())) {
      part.appendTo(path);
    }
  }

  /** Keeps labels off the ends of the cut-off planes, which reach beyond the section. */
  void keepClear(Ground ground) {
    for (DrawnSection.CutOff cutOff : section.cutOffs()) {
      Polyline line = cutOff.line().on(panel);
      for (int end = 0; end < 2; end++) {
        ground.keepClear(Box.around(line.x(end), line.y(end), BEYOND, BEYOND));
      }
    }
  }

  private String name(String what) {
    return panel.name() + "-" + what;
  }

  /** A map of the frame, each square owned by the face of the section that it lies in. */
  static Ground ground(DrawnSection section, Panel panel) {
    Ground ground = new Ground(panel.frame());
    for (boolean solid : new boolean[] {false, true}) {
      for (int face = 0; face < section.faces().size(); face++) {
        if (section.solid(section.faces().get(face).label()) == solid) {
          List<Polyline> rings = new ArrayList<>();
          for (Polyline ring : section.faces().get(face).rings()) {
            Optional<Polyline> seen = Clip.ring(ring.on(panel), panel.frame().grown(8));
            if (seen.isPresent()) {
              rings.add(seen.get());
            }
          }
          ground.paint(rings, face, solid);
        }
      }
    }
    return ground;
  }

  /** Accepts the squares of a {@link #ground} where nothing or a space is laid. */
  static IntPredicate open(DrawnSection section) {
    return new Open(section);
  }

  private record Open(DrawnSection section) implements IntPredicate {
    @Override
    public boolean test(int owner) {
      return owner == Ground.OPEN
          || owner >= 0 && !section.solid(section.faces().get(owner).label());
    }
  }
}
