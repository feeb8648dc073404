package coldseam.cli.plot;

import coldseam.solver.detail.Conditions;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;

/** Writes the name of each space, and what else is said of it, where the space is. */
final class SpaceLabels {
  private static final double NARROW = 100;
  private static final double OFF = 7;
  private static final double FAR = 220;

  private final Canvas canvas;
  private final DrawnSection section;
  private final Panel panel;
  private final Ground ground;

  SpaceLabels(Canvas canvas, DrawnSection section, Panel panel, Ground ground) {
    this.canvas = canvas;
    this.section = section;
    this.panel = panel;
    this.ground = ground;
  }

  /**
   * Writes them.
   *
   * @param said the lines of each space, its name first
   */
  void write(List<List<String>> said) {
    canvas.layer(panel.name() + "-spaces");
    for (int space = 0; space < section.detail().spaces().size(); space++) {
      List<Polyline> seen = surfaces(section, panel, space);
      if (seen.isEmpty()) {
        continue;
      }
      List<String> lines = said.get(space);
      List<String> narrow = new ArrayList<>();
      for (String line : lines) {
        narrow.addAll(Wrapping.of(line, NARROW, Lettering.STRONG));
      }
      if (!write(space, seen, lines) && !write(space, seen, narrow)) {
        writeWithLeader(seen, narrow);
      }
    }
  }

  private boolean write(int space, List<Polyline> seen, List<String> lines) {
    Box size = Plates.size(lines, Lettering.STRONG);
    Optional<Box> place = place(space, seen, size.width(), size.height());
    if (place.isPresent()) {
      ground.take(place.get());
      Plates.unplated(canvas, lines, place.get(), Lettering.STRONG, Lettering.LABEL);
    }
    return place.isPresent();
  }

  private void writeWithLeader(List<Polyline> seen, List<String> lines) {
    Box size = Plates.size(lines, Lettering.STRONG);
    for (Polyline surface : seen) {
      double[] at = surface.at(surface.length() / 2);
      double x = at[0] + OFF * at[2];
      double y = at[1] + OFF * at[3];
      Optional<Box> place =
          ground.near(x, y, size.width(), size.height(), 10, FAR, SectionLines.open(section));
      if (place.isPresent()) {
        ground.take(place.get());
        Plates.leader(canvas, place.get(), x, y);
        Plates.unplated(canvas, lines, place.get(), Lettering.STRONG, Lettering.LABEL);
        return;
      }
    }
  }

  /** The surfaces of a space that are seen in a panel, on the sheet, the longest first. */
  static List<Polyline> surfaces(DrawnSection section, Panel panel, int space) {
    List<Polyline> seen = new ArrayList<>();
    for (DrawnSection.Surface surface : section.surfaces()) {
      boolean faces =
          surface.kind() == Conditions.Kind.FILM || surface.kind() == Conditions.Kind.FIXED;
      if (faces && surface.space() == space) {
        seen.addAll(Clip.line(surface.line().on(panel), panel.frame()));
      }
    }
    seen.sort(new LongestFirst());
    return seen;
  }

  private static final class LongestFirst implements Comparator<Polyline> {
    @Override
    public int compare(Polyline a, Polyline b) {
      return Double.compare(b.length(), a.length());
    }
  }

  private Optional<Box> place(int space, List<Polyline> seen, double width, double height) {
    int label = section.labelOfSpace(space);
    for (int face : section.largestFirst(label)) {
      Optional<Box> inside = ground.within(face, section.bounds(face, panel), width, height);
      if (inside.isPresent()) {
        return inside;
      }
    }
    for (Polyline surface : seen) {
      Optional<Box> beside = beside(surface, width, height, SectionLines.open(section));
      if (beside.isPresent()) {
        return beside;
      }
    }
    return Optional.empty();
  }

  /** Room on the open side of a surface, as near its middle as can be. */
  Optional<Box> beside(Polyline surface, double width, double height, IntPredicate accepted) {
    double length = surface.length();
    for (double away = 10; away < 90; away += 6) {
      for (double part : new double[] {0.5, 0.35, 0.65, 0.2, 0.8, 0.08, 0.92}) {
        double[] at = surface.at(part * length);
        double reach = away + Math.abs(at[2]) * width / 2 + Math.abs(at[3]) * height / 2;
        Box box = Box.around(at[0] + at[2] * reach, at[1] + at[3] * reach, width, height);
        if (ground.free(box, accepted)) {
          return Optional.of(box);
        }
      }
    }
    return Optional.empty();
  }
}
