package coldseam.mesh.partition;

import java.util.List;
import java.util.TreeSet;

/** Labels without repeats; NONE is not one. */
final class LabelSet {
  private final TreeSet<Integer> labels = new TreeSet<>();

  void add(int label) {
    if (label != Partition.NONE) {
      labels.add(label);
    }
  }

  List<Integer> ascending() {
    return List.copyOf(labels);
  }
}
