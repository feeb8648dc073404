package coldseam.cases.study;

import coldseam.cases.Changes;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * One job of a sweep.
 *
 * @param index its place among all points of the sweep, from 0
 * @param settings what is set, by name, in the order of the axes
 * @param changes the same as changes of the case
 */
public record Point(int index, Map<String, String> settings, Changes changes) {
  /** Copies the map; its order is kept. */
  public Point {
    settings = Collections.unmodifiableMap(new LinkedHashMap<>(settings));
  }
}
