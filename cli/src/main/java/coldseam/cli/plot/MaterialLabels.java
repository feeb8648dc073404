package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.awt.geom.Path2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/**
 * Fills the faces with tone and hatch, and names each material: in its face if there is room, else
 * by its number of the key, in the face or beside it with a leader.
 */
final class MaterialLabels {
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
      for (List<Polyline> rings : faces(label)) {
        all.addAll(rings);
        look.hatch().append(rings, look, hatch);
      }
      if (!all.isEmpty()) {
        canvas.fill(Polyline.path(all), look.tone());
      }
      if (hatch.getCurrentPoint() != null) {
        canvas.stroke(hatch, look.line(), Pen.HAIR);
      }
    }
  }

  /** The rings of each face of a fill that is seen, on the sheet. */
  private List<List<Polyline>> faces(int label) {
    List<List<Polyline>> seen = new ArrayList<>();
    for (DrawnSection.Face face : section.faces()) {
      if (face.label() == label) {
        List<Polyline> rings = new ArrayList<>();
        for (Polyline ring : face.rings()) {
          Clip.ring(ring.on(panel), panel.frame()).ifPresent(rings::add);
        }
        if (!rings.isEmpty()) {
          seen.add(rings);
        }
      }
    }
    return seen;
  }

  /**
   * Names the materials.
   *
   * @param canvas what it is drawn on
   * @param ground what is taken
   * @param open owners of squares that a number may lie on
   * @param elsewhere a part of the frame whose small faces are named in the zoom
   */
  void names(Canvas canvas, Ground ground, IntPredicate open, Optional<Box> elsewhere) {
    canvas.layer(panel.name() + "-material-names");
    List<Integer> without = new ArrayList<>();
    for (int label = 0; label < looks.size(); label++) {
      if (section.solid(label) && !direct(canvas, ground, label)) {
        without.add(label);
      }
    }
    for (int label : without) {
      ring(canvas, ground, label, open, elsewhere);
    }
  }

  private boolean direct(Canvas canvas, Ground ground, int label) {
    String name = section.fills().get(label).name();
    double width = TextWidths.of(name, Lettering.LABEL) + 4;
    double height = Lettering.LABEL.size() * 1.05;
    IntPredicate own = owner -> owner == label;
    Optional<Box> flat = ground.within(own, width, height);
    Optional<Box> place = flat.isPresent() ? flat : ground.within(own, height, width);
    place.ifPresent(
        box -> {
          ground.take(box);
          canvas.fill(
              new Rectangle2D.Double(box.x0(), box.y0(), box.width(), box.height()),
              looks.get(label).tone());
          double drop = Lettering.LABEL.size() * TextWidths.CAPITAL / 2;
          double turn = flat.isPresent() ? 0 : -Math.PI / 2;
          canvas.text(
              name,
              box.midX() - Math.sin(turn) * drop,
              box.midY() + Math.cos(turn) * drop,
              Lettering.LABEL.in(ink(label)),
              Anchor.MIDDLE,
              turn);
        });
    return place.isPresent();
  }

  /** Paper on dark tones, ink on light ones. */
  private java.awt.Color ink(int label) {
    return Palette.luminance(looks.get(label).tone()) < 0.25 ? Palette.PAPER : Palette.INK;
  }

  private void ring(
      Canvas canvas, Ground ground, int label, IntPredicate open, Optional<Box> elsewhere) {
    String number = String.valueOf(number(section, label));
    Optional<Box> inside = ground.within(o -> o == label, Plates.RING + 1, Plates.RING + 1);
    if (inside.isPresent()) {
      ground.take(inside.get());
      Plates.ring(canvas, number, inside.get().midX(), inside.get().midY());
      return;
    }
    Optional<double[]> target = target(label, elsewhere);
    if (target.isEmpty()) {
      return;
    }
    double x = target.get()[0];
    double y = target.get()[1];
    double size = Plates.RING + 2;
    Optional<Box> place = ground.near(x, y, size, size, 16, 70, open);
    if (place.isEmpty()) {
      place = ground.near(x, y, size, size, 12, 200, owner -> true);
    }
    place.ifPresent(
        box -> {
          ground.take(box);
          ground.take(Polyline.of(box.midX(), box.midY(), x, y));
          Plates.leader(canvas, box, x, y);
          Plates.ring(canvas, number, box.midX(), box.midY());
        });
  }

  /** A point in a face of a fill: inside the middle of its longest side seen. */
  private Optional<double[]> target(int label, Optional<Box> elsewhere) {
    double longest = 0;
    double[] found = null;
    for (List<Polyline> rings : faces(label)) {
      Polyline ring = rings.get(0);
      if (elsewhere.isPresent() && elsewhere.get().contains(ring.bounds())) {
        continue;
      }
      for (int i = 0; i < ring.size(); i++) {
        double dx = ring.x(ring.after(i)) - ring.x(i);
        double dy = ring.y(ring.after(i)) - ring.y(i);
        double length = Math.hypot(dx, dy);
        if (length > longest) {
          longest = length;
          double width = 2 * Math.abs(ring.area()) / ring.length();
          double inward = Math.min(5, width / 2) * Math.signum(ring.area()) / length;
          found =
              new double[] {
                ring.x(i) + 0.5 * dx - inward * dy, ring.y(i) + 0.5 * dy + inward * dx
              };
        }
      }
    }
    return Optional.ofNullable(found);
  }
}
