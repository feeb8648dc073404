package coldseam.cli.plot;

import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Exposure;
import java.awt.geom.Path2D;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.IntPredicate;

/** Fringes that tell films, fixed temperatures and given flows along the surfaces, with values. */
final class SurfaceMarks {
  private static final double PITCH = 8;
  private static final double LENGTH = 5;
  private static final double SLANT = 3;

  private final DrawnSection section;
  private final Panel panel;

  SurfaceMarks(DrawnSection section, Panel panel) {
    this.section = section;
    this.panel = panel;
  }

  /** Draws the fringes: upright inside, slanted outside, none but a bar at a fixed temperature. */
  void fringes(Canvas canvas) {
    canvas.layer(panel.name() + "-films");
    Path2D inside = new Path2D.Double();
    Path2D outside = new Path2D.Double();
    Path2D bars = new Path2D.Double();
    Path2D arrows = new Path2D.Double();
    for (DrawnSection.Surface surface : section.surfaces()) {
      for (Polyline line : Clip.line(surface.line().on(panel), panel.frame())) {
        switch (surface.kind()) {
          case FILM -> {
            boolean warm = exposure(surface) == Exposure.INSIDE;
            fringe(line, warm ? 0 : SLANT, PITCH, warm ? inside : outside);
          }
          case FIXED -> bar(line, bars);
          case FLOW -> arrows(line, arrows);
          default -> {
            continue;
          }
        }
      }
    }
    canvas.stroke(inside, Palette.INSIDE, Pen.FINE);
    canvas.stroke(outside, Palette.OUTSIDE, Pen.FINE);
    canvas.stroke(bars, Palette.INK, new Pen(2.2f));
    canvas.stroke(arrows, Palette.INK, Pen.FINE);
  }

  private Exposure exposure(DrawnSection.Surface surface) {
    return section.detail().spaces().get(surface.space()).exposure();
  }

  /** Samples for the key. */
  static void sample(Canvas canvas, Box box, boolean inside) {
    Polyline line = Polyline.of(box.x0(), box.y1() - 4, box.x1(), box.y1() - 4);
    Polyline back = Polyline.of(box.x1(), box.y1() - 4, box.x0(), box.y1() - 4);
    canvas.stroke(Polyline.path(List.of(line)), Palette.INK, Pen.HEAVY);
    Path2D path = new Path2D.Double();
    fringe(back, inside ? 0 : SLANT, PITCH * 0.7, path);
    canvas.stroke(path, inside ? Palette.INSIDE : Palette.OUTSIDE, Pen.FINE);
  }

  private static void fringe(Polyline line, double slant, double pitch, Path2D path) {
    double length = line.length();
    int n = (int) Math.max(1, Math.round(length / pitch));
    for (int i = 0; i < n; i++) {
      double[] at = line.at((i + 0.5) * length / n);
      double along = slant;
      path.moveTo(at[0], at[1]);
      path.lineTo(at[0] + LENGTH * at[2] + along * at[3], at[1] + LENGTH * at[3] - along * at[2]);
    }
  }

  private static void bar(Polyline line, Path2D path) {
    for (int i = 0; i < line.pieces(); i++) {
      int j = line.after(i);
      double dx = line.x(j) - line.x(i);
      double dy = line.y(j) - line.y(i);
      double length = Math.hypot(dx, dy);
      if (length > 0) {
        double nx = -dy / length * 3.6;
        double ny = dx / length * 3.6;
        path.moveTo(line.x(i) + nx, line.y(i) + ny);
        path.lineTo(line.x(j) + nx, line.y(j) + ny);
      }
    }
  }

  private static void arrows(Polyline line, Path2D path) {
    double length = line.length();
    int n = (int) Math.max(1, Math.round(length / 14));
    for (int i = 0; i < n; i++) {
      double[] at = line.at((i + 0.5) * length / n);
      double tx = at[3];
      double ty = -at[2];
      path.moveTo(at[0] + 9 * at[2], at[1] + 9 * at[3]);
      path.lineTo(at[0] + at[2], at[1] + at[3]);
      path.moveTo(at[0] + 4 * at[2] + 2.2 * tx, at[1] + 4 * at[3] + 2.2 * ty);
      path.lineTo(at[0] + at[2], at[1] + at[3]);
      path.lineTo(at[0] + 4 * at[2] - 2.2 * tx, at[1] + 4 * at[3] - 2.2 * ty);
    }
  }

  /** Keeps a strip along the surfaces clear of labels. */
  void keepClear(Ground ground) {
    for (DrawnSection.Surface surface : section.surfaces()) {
      for (Polyline line : Clip.line(surface.line().on(panel), panel.frame())) {
        double length = line.length();
        int n = (int) Math.max(1, Math.round(length / 3));
        for (int i = 0; i < n; i++) {
          double[] at = line.at((i + 0.5) * length / n);
          ground.keepClear(Box.around(at[0] + 3 * at[2], at[1] + 3 * at[3], 3, 3));
        }
      }
    }
  }

  /** Writes the value of each film, fixed temperature or flow once, near its longest surface. */
  void values(Canvas canvas, Ground ground, SpaceLabels labels, Figures figures) {
    canvas.layer(panel.name() + "-film-values");
    Set<String> said = new HashSet<>();
    List<DrawnSection.Surface> surfaces = new ArrayList<>(section.surfaces());
    surfaces.sort(new LongestFirst());
    for (DrawnSection.Surface surface : surfaces) {
      String text = value(surface, figures);
      if (text.isEmpty()) {
        continue;
      }
      for (Polyline line : Clip.line(surface.line().on(panel), panel.frame())) {
        if (said.contains(surface.space() + text) || line.length() < 12) {
          continue;
        }
        if (value(canvas, ground, labels, line, text, ink(surface))) {
          said.add(surface.space() + text);
        }
      }
    }
  }

  private static final class LongestFirst implements Comparator<DrawnSection.Surface> {
    @Override
    public int compare(DrawnSection.Surface a, DrawnSection.Surface b) {
      return Double.compare(b.line().length(), a.line().length());
    }
  }

  /** Writes a value beside its surface, or with a leader where there is more room. */
  private boolean value(
      Canvas canvas, Ground ground, SpaceLabels labels, Polyline line, String text, Colour ink) {
    Lettering lettering = Lettering.SMALL.in(ink);
    double width = TextWidths.of(text, lettering) + 2;
    double height = lettering.size() * 1.15;
    IntPredicate open = SectionLines.open(section);
    double[] at = line.at(line.length() / 2);
    double x = at[0] + LENGTH * at[2];
    double y = at[1] + LENGTH * at[3];
    Optional<Box> place = labels.beside(line, width, height, open);
    if (place.isEmpty()) {
      place = ground.near(x, y, width, height, 8, 150, open);
      if (place.isPresent()) {
        Plates.leader(canvas, place.get(), x, y);
      }
    }
    if (place.isPresent()) {
      ground.take(place.get());
      Plates.unplated(canvas, List.of(text), place.get(), lettering, lettering);
    }
    return place.isPresent();
  }

  private Colour ink(DrawnSection.Surface surface) {
    if (surface.space() < 0) {
      return Palette.INK;
    }
    return exposure(surface) == Exposure.INSIDE ? Palette.INSIDE : Palette.OUTSIDE;
  }

  /** "Rs 0.13 | 0.25": what holds for heat loss, then for surface temperatures. */
  private static String value(DrawnSection.Surface surface, Figures figures) {
    if (surface.kind() == Conditions.Kind.FIXED) {
      return "fixed temperature";
    }
    if (surface.kind() == Conditions.Kind.FLOW) {
      return Figures.round(figures.scaledDensity(surface.flowWPerM2()))
          + " "
          + figures.densityUnit();
    }
    if (surface.kind() != Conditions.Kind.FILM) {
      return "";
    }
    String heatLoss = figures.film(surface.heatLossRs());
    return Double.isNaN(surface.surfaceRs()) || surface.surfaceRs() == surface.heatLossRs()
        ? "Rs " + heatLoss
        : "Rs " + heatLoss + " | " + figures.film(surface.surfaceRs());
  }
}
