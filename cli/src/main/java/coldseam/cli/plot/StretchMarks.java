package coldseam.cli.plot;

import java.awt.geom.Path2D;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/** A line beside each named stretch, with its name and what else is said of it. */
final class StretchMarks {
  private static final double AWAY = 8;
  private static final double FOOT = 5.5;

  private final DrawnSection section;
  private final Panel panel;

  StretchMarks(DrawnSection section, Panel panel) {
    this.section = section;
    this.panel = panel;
  }

  /**
   * Draws them.
   *
   * @param canvas what it is drawn on
   * @param ground what is taken
   * @param labels finds room beside a line
   * @param open owners of squares that a name may lie on
   * @param said what is written beside each stretch
   */
  void draw(
      Canvas canvas, Ground ground, SpaceLabels labels, IntPredicate open, List<String> said) {
    canvas.layer(panel.name() + "-stretches");
    for (int i = 0; i < section.detail().stretches().size(); i++) {
      String text = said.get(i);
      boolean named = false;
      Path2D bracket = new Path2D.Double();
      for (Polyline whole : section.stretch(i)) {
        for (Polyline line : Clip.line(whole.on(panel), panel.frame())) {
          bracket(line, bracket);
          if (!named) {
            double width = TextWidths.of(text, Lettering.SMALL) + 2;
            Optional<Box> place = labels.beside(line, width, Lettering.SMALL.size() * 1.15, open);
            if (place.isPresent()) {
              ground.take(place.get());
              Plates.unplated(canvas, List.of(text), place.get(), Lettering.QUIET, Lettering.QUIET);
              named = true;
            }
          }
        }
      }
      canvas.stroke(bracket, Palette.SECOND_INK, Pen.FINE);
    }
  }

  private static boolean withLeader(
      Canvas canvas, Ground ground, Polyline line, IntPredicate open, String text) {
    Box size = Plates.size(List.of(text), Lettering.QUIET);
    for (double part : new double[] {0.5, 0.2, 0.8}) {
      double[] at = line.at(part * line.length());
      double x = at[0] + AWAY * at[2];
      double y = at[1] + AWAY * at[3];
      Optional<Box> place = ground.near(x, y, size.width(), size.height(), 8, 150, open);
      if (place.isPresent()) {
        ground.take(place.get());
        Plates.leader(canvas, place.get(), x, y);
        Plates.unplated(canvas, List.of(text), place.get(), Lettering.QUIET, Lettering.QUIET);
        return true;
      }
    }
    return false;
  }

  /** A line beside a stretch, with ends turned towards it. */
  private static void bracket(Polyline line, Path2D path) {
    double length = line.length();
    if (length < 4) {
      return;
    }
    double at = 0;
    double[] start = line.at(0.5);
    path.moveTo(start[0] + FOOT * start[2], start[1] + FOOT * start[3]);
    for (int i = 0; i < line.pieces(); i++) {
      int j = line.after(i);
      double piece = Math.hypot(line.x(j) - line.x(i), line.y(j) - line.y(i));
      double inset = Math.min(0.5, piece / 4);
      double[] from = line.at(at + inset);
      double[] to = line.at(at + piece - inset);
      path.lineTo(from[0] + AWAY * from[2], from[1] + AWAY * from[3]);
      path.lineTo(to[0] + AWAY * to[2], to[1] + AWAY * to[3]);
      at += piece;
    }
    double[] end = line.at(length - 0.5);
    path.lineTo(end[0] + FOOT * end[2], end[1] + FOOT * end[3]);
  }
}
