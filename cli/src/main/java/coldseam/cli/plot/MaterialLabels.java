package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/**
 * Fills the faces with tone and hatch, and names each material: in its largest face with room, else
 * by its number of the key, in the face or beside it with a leader.
 */
final class MaterialLabels {
  private static final double[] ALONG = {0.5, 0.35, 0.65, 0.2, 0.8, 0.08, 0.92};
  private static final double DARK = 0.25;

  private final DrawnSection section;
  private final Panel panel;
  private final List<MaterialLook> looks;

  MaterialLabels(DrawnSection section, Panel panel, List<MaterialLook> looks) {
    this.section = section;
    this.panel = panel;
    this.looks = looks;
  }

  /** Number of a fill in the key, from 1. */
  static int number(DrawnSection section, int label) {
    int number = 0;
    for (int i = 0; i <= label; i++) {
      number += section.solid(i) ? 1 : 0;
    }
    return number;
  }

  void fills(Canvas canvas) {
    canvas.layer(panel.name() + "-materials");
    for (int label = 0; label < looks.size(); label++) {
      if (!section.solid(label)) {
        continue;
      }
      List<Polyline> all = new ArrayList<>();
      Path2D hatch = new Path2D.Double();
      MaterialLook look = looks.get(label);
      for (int face : section.largestFirst(label)) {
        List<Polyline> rings = seen(face);
        all.addAll(rings);
        Polyline whole = section.faces().get(face).rings().get(0).on(panel);
        look.hatch().append(rings, whole, look, hatch);
      }
      if (!all.isEmpty()) {
        canvas.fill(Polyline.path(all), look.tone());
      }
      if (hatch.getCurrentPoint() != null) {
        canvas.stroke(hatch, look.line(), Pen.HAIR);
      }
    }
  }

  /** The rings of a face as far as they are seen, on the sheet. */
  private List<Polyline> seen(int face) {
    List<Polyline> rings = new ArrayList<>();
    for (Polyline ring : section.faces().get(face).rings()) {
      Optional<Polyline> seen = Clip.ring(ring.on(panel), panel.frame());
      if (seen.isPresent()) {
        rings.add(seen.get());
      }
    }
    return rings;
  }

  /**
   * Names the materials.
   *
   * @param canvas what it is drawn on
   * @param ground what is taken
   * @param elsewhere a part of the frame whose small faces are named in the zoom
   */
  void names(Canvas canvas, Ground ground, Optional<Box> elsewhere) {
    canvas.layer(panel.name() + "-material-names");
    List<Integer> without = new ArrayList<>();
    for (int label = 0; label < looks.size(); label++) {
      if (section.solid(label) && !direct(canvas, ground, label)) {
        without.add(label);
      }
    }
    for (int label : without) {
      if (!ringInside(canvas, ground, label)) {
        ringBeside(canvas, ground, label, elsewhere);
      }
    }
  }

  private boolean direct(Canvas canvas, Ground ground, int label) {
    String name = section.fills().get(label).name();
    double width = TextWidths.of(name, Lettering.LABEL) + 4;
    double height = Lettering.LABEL.size() * 1.05;
    for (int face : section.largestFirst(label)) {
      Box bounds = section.bounds(face, panel);
      Optional<Box> flat = ground.within(face, bounds, width, height);
      Optional<Box> place = flat.isPresent() ? flat : ground.within(face, bounds, height, width);
      if (place.isPresent()) {
        ground.take(place.get());
        write(canvas, name, place.get(), flat.isPresent() ? 0 : -Math.PI / 2, looks.get(label));
        return true;
      }
    }
    return false;
  }

  private static void write(Canvas canvas, String name, Box box, double turn, MaterialLook look) {
    canvas.fill(new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height()), look.tone());
    double drop = Lettering.LABEL.size() * TextWidths.CAPITAL / 2;
    Colour ink = Palette.luminance(look.tone()) < DARK ? Palette.PAPER : Palette.INK;
    canvas.text(
        name,
        box.midX() - Math.sin(turn) * drop,
        box.midY() + Math.cos(turn) * drop,
        Lettering.LABEL.in(ink),
        Anchor.MIDDLE,
        turn);
  }

  private boolean ringInside(Canvas canvas, Ground ground, int label) {
    for (int face : section.largestFirst(label)) {
      Optional<Box> inside =
          ground.within(face, section.bounds(face, panel), Plates.RING + 1, Plates.RING + 1);
      if (inside.isPresent()) {
        ground.take(inside.get());
        ring(canvas, label, inside.get());
        return true;
      }
    }
    return false;
  }

  private void ring(Canvas canvas, int label, Box box) {
    Plates.ring(canvas, String.valueOf(number(section, label)), box.midX(), box.midY());
  }

  private void ringBeside(Canvas canvas, Ground ground, int label, Optional<Box> elsewhere) {
    List<double[]> targets = new ArrayList<>();
    for (int face : section.largestFirst(label)) {
      List<Polyline> rings = seen(face);
      if (!rings.isEmpty()
          && (elsewhere.isEmpty() || !elsewhere.get().contains(rings.get(0).bounds()))) {
        targets(rings.get(0), targets);
        break;
      }
    }
    double size = Plates.RING + 2;
    IntPredicate open = SectionLines.open(section);
    for (IntPredicate accepted : List.of(open, Ground.ANYWHERE)) {
      for (double[] target : targets) {
        Optional<Box> place = ground.near(target[0], target[1], size, size, 10, 90, accepted);
        if (place.isPresent()) {
          Box box = place.get();
          ground.take(box);
          ground.take(Polyline.of(box.midX(), box.midY(), target[0], target[1]));
          Plates.leader(canvas, box, target[0], target[1]);
          ring(canvas, label, box);
          return;
        }
      }
    }
  }

  /** Points just inside the longest side of a face, the middle first. */
  private static void targets(Polyline ring, List<double[]> targets) {
    int longest = 0;
    double most = 0;
    for (int i = 0; i < ring.size(); i++) {
      int j = ring.after(i);
      double length = Math.hypot(ring.x(j) - ring.x(i), ring.y(j) - ring.y(i));
      if (length > most) {
        most = length;
        longest = i;
      }
    }
    if (most == 0) {
      return;
    }
    int j = ring.after(longest);
    double dx = ring.x(j) - ring.x(longest);
    double dy = ring.y(j) - ring.y(longest);
    double width = 2 * Math.abs(ring.area()) / ring.length();
    double inward = Math.min(5, width / 2) * Math.signum(ring.area()) / most;
    for (double part : ALONG) {
      targets.add(
          new double[] {
            ring.x(longest) + part * dx - inward * dy, ring.y(longest) + part * dy + inward * dx
          });
    }
  }
}
