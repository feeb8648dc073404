package coldseam.solver.detail;

import coldseam.mesh.partition.Defect;
import java.util.ArrayList;
import java.util.List;

/** Says in a sentence what is doubtful in a drawing. */
public final class DefectWords {
  private DefectWords() {}

  /**
   * The sentence of a defect.
   *
   * @param defect anything but a stretch off the outline, which is spoken of with its name
   * @param fillNames what fills the areas, by label
   * @return a sentence without a full stop, with place and size
   */
  public static String of(Defect defect, List<String> fillNames) {
    String fills = fills(defect.labels(), fillNames);
    String at = " at " + Wording.place(defect.where());
    String size = Wording.length(defect.sizeM());
    return switch (defect.kind()) {
      case CLOSED_GAP -> "gap of " + size + " between " + fills + at + ": closed";
      case GAP -> "gap of " + size + " between " + fills + at + ": left open, no heat crosses it";
      case SLIVER -> "sliver " + size + " thin of " + fills + at + ": is it meant?";
      case UNCOVERED ->
          "place enclosed by "
              + fills
              + at
              + " that nothing covers, mean width "
              + size
              + ": no heat crosses it";
      case SELF_CROSSING ->
          "outline of " + fills + " crosses itself" + at + ": filled by the even-odd rule";
      case ZERO_AREA -> "shape of " + fills + at + " has no area: left out";
      case HIDDEN -> "shape of " + fills + at + " is covered by later ones: nothing of it is left";
      case LINE_OFF_EDGE -> throw new IllegalStateException("stretches are checked on their own");
    };
  }

  private static String fills(List<Integer> labels, List<String> fillNames) {
    List<String> names = new ArrayList<>();
    for (int label : labels) {
      if (label >= 0 && label < fillNames.size()) {
        names.add("'" + fillNames.get(label) + "'");
      }
    }
    int last = names.size() - 1;
    return last < 1
        ? String.join("", names)
        : String.join(", ", names.subList(0, last)) + " and " + names.get(last);
  }
}
