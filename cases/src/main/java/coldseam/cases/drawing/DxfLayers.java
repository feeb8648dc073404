package coldseam.cases.drawing;

import java.util.HashMap;
import java.util.Locale;
import java.util.Map;

/** Which layers are shown, by name; names differ by more than case. */
final class DxfLayers {
  private final Map<String, String> hidden = new HashMap<>();

  private static String key(String layer) {
    return layer.toLowerCase(Locale.ROOT);
  }

  /** Reads one entry of the table of layers. */
  void add(DxfEntity layer) throws DrawingException {
    String name = layer.text(2, "");
    boolean frozen = (layer.whole(70, 0) & 1) != 0;
    boolean off = layer.whole(62, 7) < 0;
    boolean printed = layer.whole(290, 1) != 0;
    if (frozen || off) {
      hidden.put(key(name), frozen ? "the layer is frozen" : "the layer is off");
    } else if (!printed) {
      hidden.put(key(name), "the layer is not printed");
    }
  }

  /** Why nothing on a layer counts; empty if it does. */
  String whyHidden(String layer) {
    String why = hidden.get(key(layer));
    if (why == null && key(layer).equals("defpoints")) {
      why = "points of dimensions";
    }
    return why == null ? "" : why;
  }

  /** Whether a layer is frozen, which hides blocks put on it as a whole. */
  boolean frozen(String layer) {
    return whyHidden(layer).equals("the layer is frozen");
  }
}
