package coldseam.cases;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * What a study changes in a case, on top of a variant: as if it were one more variant.
 *
 * @param values name of a named value, and the number or expression that replaces it
 * @param fills name of a fill or of a shape, and the material or space that replaces it
 */
public record Changes(Map<String, String> values, Map<String, String> fills) {
  /** Changes nothing. */
  public static final Changes NONE = new Changes(Map.of(), Map.of());

  /** Copies the maps; their order is kept. */
  public Changes {
    values = Collections.unmodifiableMap(new LinkedHashMap<>(values));
    fills = Collections.unmodifiableMap(new LinkedHashMap<>(fills));
  }

  /** In words, as on a command line: {@code insulation = 200, slab = timber}. */
  public String inWords() {
    StringBuilder words = new StringBuilder();
    for (Map<String, String> part : List.of(values, fills)) {
      for (Map.Entry<String, String> change : part.entrySet()) {
        words.append(words.isEmpty() ? "" : ", ");
        words.append(change.getKey()).append(" = ").append(change.getValue());
      }
    }
    return words.toString();
  }
}
