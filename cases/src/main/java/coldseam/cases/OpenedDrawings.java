package coldseam.cases;

import coldseam.cases.drawing.Drawing;
import coldseam.cases.drawing.DrawingException;
import coldseam.cases.drawing.DrawnShapes;
import coldseam.cases.drawing.Placement;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;

/** The drawings that cases take shapes from, each read once. May be shared by threads. */
final class OpenedDrawings {
  private final Set<Path> named = new HashSet<>();
  private final Set<Path> wanted = new HashSet<>();
  private final Map<Asked, Drawing> drawings = new HashMap<>();
  private final Map<Placed, DrawnShapes> shapes = new HashMap<>();

  /** A file and how fine its curves are to be. */
  private record Asked(Path file, OptionalDouble deviation) {}

  /** A drawing put in place. */
  private record Placed(Asked asked, List<String> without, Placement placement) {}

  /**
   * Starts with none open.
   *
   * @param named drawings that may be read wherever they are, the user having named them
   */
  OpenedDrawings(List<Path> named) {
    for (Path file : named) {
      this.named.add(CaseReader.normalised(file));
    }
  }

  /** Whether a file may be read for a case: it lies in the case's folder, or the user named it. */
  boolean mayBeRead(Path file, Path folder) {
    Path real = CaseReader.normalised(file);
    return real.startsWith(CaseReader.normalised(folder)) || named.contains(real);
  }

  /** Every file that was to be read, whether it could be or not. */
  synchronized Set<Path> asked() {
    return Set.copyOf(wanted);
  }

  /** Every file that was read. */
  synchronized Set<Path> files() {
    Set<Path> files = new HashSet<>();
    for (Asked asked : drawings.keySet()) {
      files.add(asked.file());
    }
    return files;
  }

  synchronized Drawing drawing(Path file, OptionalDouble deviation) throws DrawingException {
    Asked asked = new Asked(CaseReader.normalised(file), deviation);
    wanted.add(asked.file());
    Drawing known = drawings.get(asked);
    if (known == null) {
      known = Drawing.read(file, deviation);
      drawings.put(asked, known);
    }
    return known;
  }

  synchronized DrawnShapes shapes(
      Path file, OptionalDouble deviation, List<String> without, Placement placement)
      throws DrawingException {
    Asked asked = new Asked(CaseReader.normalised(file), deviation);
    Placed placed = new Placed(asked, without, placement);
    DrawnShapes known = shapes.get(placed);
    if (known == null) {
      known = DrawnShapes.of(drawing(file, deviation).without(without), placement);
      shapes.put(placed, known);
    }
    return known;
  }
}
