package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** Counts what is left out, by kind and layer. */
final class LeftOuts {
  /** Kinds beyond this many are counted together. */
  private static final int MOST_KINDS = 200;

  private final Map<String, LeftOut> found = new LinkedHashMap<>();

  void add(String what, String layer, String why, int line) {
    add(what, layer, why, line, false);
  }

  void add(String what, String layer, String why, int line, boolean serious) {
    boolean many = found.size() >= MOST_KINDS;
    String shownWhat = many && !serious ? "other things" : what;
    String shownLayer = many ? "" : layer;
    String key = shownWhat + '\n' + shownLayer + '\n' + why;
    LeftOut known = found.get(key);
    int count = known == null ? 1 : known.count() + 1;
    int first = known == null ? line : known.line();
    found.put(key, new LeftOut(shownWhat, shownLayer, why, count, first, serious));
  }

  List<LeftOut> all() {
    return new ArrayList<>(found.values());
  }
}
