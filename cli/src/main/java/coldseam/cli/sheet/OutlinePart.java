package coldseam.cli.sheet;

import coldseam.cli.text.Digits;
import coldseam.mesh.partition.Partition;
import coldseam.solver.Solver;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import java.util.ArrayList;
import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * A part of the outline of the conducting section on which the same holds.
 *
 * @param name the space it faces, "cut-off planes", …, or the name of a stretch
 * @param lengthM developed length, m
 * @param films the surface resistances of both sets, in words; empty where there is no film
 */
record OutlinePart(String name, double lengthM, String films) {

  /** The outline by what holds on it: by name in the order first met. */
  static List<OutlinePart> of(Solver.Inspection inspection, Detail detail) {
    Partition partition = inspection.partition();
    Conditions heatLoss = inspection.heatLoss();
    Conditions surface = inspection.surface();
    Map<String, OutlinePart> parts = new LinkedHashMap<>();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      String name;
      String films = "";
      switch (heatLoss.kind(edge)) {
        case FILM -> {
          name = "facing " + detail.spaces().get(heatLoss.space(edge)).name();
          films =
              "Rs "
                  + Digits.shortest(heatLoss.filmM2KPerW(edge), 4)
                  + " for heat loss, "
                  + (surface.kind(edge) == Conditions.Kind.FILM
                      ? Digits.shortest(surface.filmM2KPerW(edge), 4)
                      : "none")
                  + " for surface temperatures";
        }
        case FIXED -> {
          name = "at the temperature of " + detail.spaces().get(heatLoss.space(edge)).name();
          films = "fixed";
        }
        case FLOW -> {
          name = "with a heat flow given";
          films = Digits.shortest(heatLoss.flowWPerM2(edge), 4) + " W/m² into the detail";
        }
        case CUT_OFF -> name = heatLoss.symmetry(edge) ? "planes of symmetry" : "cut-off planes";
        case HOLLOW -> name = "rims of hollows";
        default -> {
          continue;
        }
      }
      double length = partition.edgeLength(edge);
      String key = name + '\n' + films;
      OutlinePart known = parts.get(key);
      double sum = known == null ? length : known.lengthM + length;
      parts.put(key, new OutlinePart(name, sum, films));
    }
    return byName(parts.values());
  }

  /** Parts of one name side by side, where the first of them stands. */
  private static List<OutlinePart> byName(Collection<OutlinePart> parts) {
    Set<String> names = new LinkedHashSet<>();
    for (OutlinePart part : parts) {
      names.add(part.name);
    }
    List<OutlinePart> sorted = new ArrayList<>();
    for (String name : names) {
      for (OutlinePart part : parts) {
        if (part.name.equals(name)) {
          sorted.add(part);
        }
      }
    }
    return sorted;
  }

  /** The named stretches with their lengths. */
  static List<OutlinePart> stretches(Solver.Inspection inspection, Detail detail) {
    double[] lengths = new double[detail.stretches().size()];
    for (int edge = 0; edge < inspection.partition().edgeCount(); edge++) {
      for (int stretch : inspection.heatLoss().stretches(edge)) {
        lengths[stretch] += inspection.partition().edgeLength(edge);
      }
    }
    List<OutlinePart> parts = new ArrayList<>();
    for (int i = 0; i < lengths.length; i++) {
      parts.add(new OutlinePart(detail.stretches().get(i).name(), lengths[i], ""));
    }
    return parts;
  }
}
