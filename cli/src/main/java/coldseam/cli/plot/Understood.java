package coldseam.cli.plot;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Space;
import java.awt.geom.Ellipse2D;
import java.awt.geom.Path2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The section as it was understood, before anything is solved: every fill with its number, and
 * every place to look at circled, with the number of a list in words.
 */
public final class Understood {
  /** Of places to look at so many are circled; the list in words has all. */
  private static final int MOST_CIRCLED = 200;

  private static final double CIRCLE = 17;

  /**
   * A place to look at.
   *
   * @param where in the section, m
   * @param text what is there
   */
  public record Mark(Point where, String text) {}

  /** A connected region on the sheet. */
  private record Region(int label, List<Polyline> rings, double areaM2) {}

  private final String title;
  private final String subtitle;
  private final Partition partition;
  private final List<Fill> fills;
  private final List<Mark> marks;
  private final List<MaterialLook> looks;
  private Box bounds = Box.EMPTY;

  private Understood(
      String title, String subtitle, Partition partition, List<Fill> fills, List<Mark> marks) {
    this.title = title;
    this.subtitle = subtitle;
    this.partition = partition;
    this.fills = fills;
    this.marks = marks;
    looks = MaterialLook.of(fills);
    for (int v = 0; v < partition.vertexCount(); v++) {
      bounds = bounds.with(partition.x(v), partition.y(v));
    }
  }

  /**
   * Draws the section.
   *
   * @param title of the case
   * @param subtitle what the picture shows
   * @param partition the resolved section; labels are indices of the fills
   * @param fills what fills it; numbered from 1 in this order
   * @param marks places to look at; numbered on from the fills
   * @return an SVG document
   */
  public static String svg(
      String title, String subtitle, Partition partition, List<Fill> fills, List<Mark> marks) {
    return new Understood(title, subtitle, partition, fills, marks).svg();
  }

  private String svg() {
    Page page =
        Page.of(
            new Page.Content(
                title,
                subtitle,
                "NOT SOLVED",
                bounds,
                new Page.Gutters(40, 40, 40, 40),
                Optional.empty(),
                key()));
    SvgCanvas canvas = SvgCanvas.blank("understood");
    page.drawGround(canvas);
    paint(canvas, page.panel());
    page.drawWords(canvas);
    return canvas.document(page.width(), page.height(), title + ": " + subtitle, told());
  }

  private String told() {
    StringBuilder out = new StringBuilder("The section as understood. ");
    for (int i = 0; i < fills.size(); i++) {
      out.append(i + 1).append(' ').append(fills.get(i).name()).append(". ");
    }
    for (int i = 0; i < marks.size(); i++) {
      out.append(fills.size() + 1 + i).append(' ').append(marks.get(i).text()).append(". ");
    }
    return out.toString().strip();
  }

  private Key key() {
    Key key = new Key();
    key.heading("What fills the section");
    for (int label = 0; label < fills.size(); label++) {
      MaterialLook look = looks.get(label);
      String name = label + 1 + "  " + fills.get(label).name();
      key.sample((canvas, box) -> SectionView.swatch(canvas, box, look), name, "");
    }
    key.heading(marks.isEmpty() ? "Nothing to look at was found" : "To look at");
    for (int i = 0; i < Math.min(marks.size(), MOST_CIRCLED); i++) {
      String number = String.valueOf(fills.size() + 1 + i);
      key.sample(
          (canvas, box) -> number(canvas, number, box.midX(), box.midY()), marks.get(i).text(), "");
    }
    if (marks.size() > MOST_CIRCLED) {
      key.note("and " + (marks.size() - MOST_CIRCLED) + " more, not circled");
    }
    return key;
  }

  private void paint(Canvas canvas, Panel panel) {
    List<Region> regions = regions(panel);
    Ground ground = new Ground(panel.frame());
    canvas.layer("fills");
    for (int label = 0; label < fills.size(); label++) {
      fill(canvas, regions, label);
    }
    for (int i = 0; i < regions.size(); i++) {
      ground.paint(regions.get(i).rings(), i, true);
    }
    canvas.layer("edges");
    Path2D edges = new Path2D.Double();
    for (int e = 0; e < partition.edgeCount(); e++) {
      int a = partition.edgeStart(e);
      int b = partition.edgeEnd(e);
      Polyline.of(
              panel.x(partition.x(a)),
              panel.y(partition.y(a)),
              panel.x(partition.x(b)),
              panel.y(partition.y(b)))
          .appendTo(edges);
    }
    canvas.stroke(edges, Palette.INK, Pen.FINE);
    canvas.layer("numbers");
    for (int label = 0; label < fills.size(); label++) {
      fillNumber(canvas, ground, regions, label);
    }
    canvas.layer("to-look-at");
    circles(canvas, panel, ground);
  }

  private List<Region> regions(Panel panel) {
    List<Region> regions = new ArrayList<>();
    for (int face = 0; face < partition.faceCount(); face++) {
      List<Polyline> rings = new ArrayList<>();
      for (int[] vertices : partition.faceRings(face)) {
        Polyline.Builder ring = new Polyline.Builder();
        for (int v : vertices) {
          ring.add(panel.x(partition.x(v)), panel.y(partition.y(v)));
        }
        rings.add(ring.closed());
      }
      regions.add(new Region(partition.faceLabel(face), rings, partition.faceArea(face)));
    }
    return regions;
  }

  private void fill(Canvas canvas, List<Region> regions, int label) {
    List<Polyline> all = new ArrayList<>();
    Path2D hatch = new Path2D.Double();
    MaterialLook look = looks.get(label);
    for (Region region : regions) {
      if (region.label() == label) {
        all.addAll(region.rings());
        if (!(fills.get(label) instanceof Space)) {
          look.hatch().append(region.rings(), region.rings().get(0), look, hatch);
        }
      }
    }
    if (!all.isEmpty()) {
      canvas.fill(Polyline.path(all), look.tone());
    }
    if (hatch.getCurrentPoint() != null) {
      canvas.stroke(hatch, look.line(), Pen.HAIR);
    }
  }

  private void fillNumber(Canvas canvas, Ground ground, List<Region> regions, int label) {
    int largest = -1;
    for (int i = 0; i < regions.size(); i++) {
      boolean larger = largest < 0 || regions.get(i).areaM2() > regions.get(largest).areaM2();
      if (regions.get(i).label() == label && larger) {
        largest = i;
      }
    }
    if (largest < 0) {
      return;
    }
    String number = String.valueOf(label + 1);
    Polyline outer = regions.get(largest).rings().get(0);
    double size = Plates.RING + 1;
    Optional<Box> inside = ground.within(largest, outer.bounds(), size, size);
    if (inside.isPresent()) {
      ground.take(inside.get());
      Plates.ring(canvas, number, inside.get().midX(), inside.get().midY());
      return;
    }
    double[] target = outer.at(outer.length() * 0.4);
    Optional<Box> beside = ground.near(target[0], target[1], size, size, 10, 120, Ground.ANYWHERE);
    if (beside.isPresent()) {
      Box box = beside.get();
      ground.take(box);
      Plates.leader(canvas, box, target[0], target[1]);
      Plates.ring(canvas, number, box.midX(), box.midY());
    }
  }

  private void circles(Canvas canvas, Panel panel, Ground ground) {
    int circled = Math.min(marks.size(), MOST_CIRCLED);
    for (int i = 0; i < circled; i++) {
      double x = x(panel, i);
      double y = y(panel, i);
      Ellipse2D circle = new Ellipse2D.Double(x - CIRCLE / 2, y - CIRCLE / 2, CIRCLE, CIRCLE);
      canvas.stroke(circle, Palette.PAPER, new Pen(3.4f));
      canvas.stroke(circle, Palette.REFERENCE, new Pen(1.6f));
    }
    for (int i = 0; i < circled; i++) {
      String number = String.valueOf(fills.size() + 1 + i);
      double width = TextWidths.of(number, Lettering.SMALL_STRONG) + 6;
      double x = x(panel, i);
      double y = y(panel, i);
      Optional<Box> place = ground.near(x, y, width, 13, CIRCLE / 2, 110, Ground.ANYWHERE);
      Box box = place.orElse(Box.around(x, y, width, 13));
      ground.take(box);
      number(canvas, number, box.midX(), box.midY());
    }
  }

  private double x(Panel panel, int mark) {
    return panel.x(marks.get(mark).where().x() - partition.origin().x());
  }

  private double y(Panel panel, int mark) {
    return panel.y(marks.get(mark).where().y() - partition.origin().y());
  }

  private static void number(Canvas canvas, String number, double x, double y) {
    double width = TextWidths.of(number, Lettering.SMALL_STRONG) + 6;
    Plates.plate(canvas, Box.around(x, y, width, 13));
    canvas.text(
        number,
        x,
        y + Lettering.SMALL.size() * TextWidths.CAPITAL / 2,
        Lettering.SMALL_STRONG.in(Palette.REFERENCE),
        Canvas.Anchor.MIDDLE);
  }
}
