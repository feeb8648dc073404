package coldseam.solver.result;

import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fault;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Looks up the spaces a wanted result names. */
final class SpaceGroups {
  private final Detail detail;
  private final String part;
  private final String name;
  private final List<Fault> faults = new ArrayList<>();

  SpaceGroups(Detail detail, String part, String name) {
    this.detail = detail;
    this.part = part;
    this.name = name;
  }

  int[] indices(List<String> names) {
    int[] indices = new int[names.size()];
    int count = 0;
    for (String space : names) {
      int index = index(space);
      if (index >= 0 && !Couplings.contains(Arrays.copyOf(indices, count), index)) {
        indices[count++] = index;
      }
    }
    return Arrays.copyOf(indices, count);
  }

  private int index(String space) {
    int index = detail.spaceIndex(space);
    if (index < 0) {
      faults.add(
          new Fault(
              part,
              name,
              "names '" + space + "', which is not one of the spaces",
              Optional.empty()));
    }
    return index;
  }

  void checkApart(int[] warm, int[] cold) {
    if (!faults.isEmpty()) {
      return;
    }
    if (warm.length == 0 || cold.length == 0) {
      faults.add(new Fault(part, name, "needs a space on each side", Optional.empty()));
    }
    for (int space : warm) {
      if (Couplings.contains(cold, space)) {
        faults.add(
            new Fault(
                part,
                name,
                "has '" + detail.spaces().get(space).name() + "' on both sides",
                Optional.empty()));
      }
    }
  }

  List<Fault> faults() {
    return faults;
  }
}
