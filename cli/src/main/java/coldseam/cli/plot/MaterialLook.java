package coldseam.cli.plot;

import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/**
 * The tone and the hatch of a material. Both follow from what it is, by its conductivity or, for
 * ground, timber, glass and air, by its name; materials of one kind in one detail get different
 * hatches, so that they can be told apart without colour.
 *
 * @param hatch the kind of hatch
 * @param tone of the area
 * @param line of the hatch
 * @param turn of the hatch, radians; relative to the longest side of a face for layers' hatches
 * @param pitch between two hatch lines, points
 */
record MaterialLook(Hatch hatch, Colour tone, Colour line, double turn, double pitch) {
  private static final List<String> GROUND =
      List.of("soil", "ground", "earth", "clay", "silt", "sand", "gravel", "hardcore", "fill");
  private static final List<String> TIMBER =
      List.of(
          "wood", "timber", "plywood", "spruce", "pine", "oak", "osb", "rafter", "joist", "plank");
  private static final List<String> AIR =
      List.of("air", "gas", "cavity", "void", "argon", "krypton");
  private static final List<String> GLASS = List.of("glass", "pane");

  private static final double INSULATION_BELOW = 0.065;
  private static final double BOARD_BELOW = 0.26;
  private static final double MASONRY_BELOW = 0.9;
  private static final double METAL_FROM = 8;

  /** What kinds of material a drawing tells apart. */
  private enum Kind {
    INSULATION(Hatch.ZIGZAG, 0, 9, 0xFBF2CF, 0xF5EAB9, 0xF9F3E1, 0xEFE5C8),
    TIMBER(Hatch.GRAIN, 0, 6, 0xEBD8BB, 0xE0C8A2, 0xF1E4CE, 0xD9BF98),
    BOARD(Hatch.DOTS, Math.PI / 6, 8, 0xEEE6DA, 0xE4DACB, 0xF3EEE6, 0xDCD2C3),
    MASONRY(Hatch.LINES, Math.PI / 4, 8, 0xECCFBF, 0xE3C0AE, 0xF1DCD0, 0xDBB5A2),
    MINERAL(Hatch.DASHES, Math.PI / 4, 11, 0xDAD9D4, 0xCBCAC4, 0xE5E4E0, 0xC0BFB9),
    GROUND(Hatch.TUFTS, 0, 26, 0xDDD4C2, 0xD2C8B3, 0xE6DFD1, 0xC8BDA6),
    METAL(Hatch.LINES, Math.PI / 4, 3, 0x8A97A6, 0x74818F, 0xA2ADB9, 0x66727F),
    GLASS(Hatch.GLINTS, Math.PI / 4, 18, 0xD3E4E4, 0xC5DADA, 0xE0ECEC, 0xB8D0D0),
    AIR(Hatch.NONE, 0, 10, 0xF2F6F8, 0xEAF0F3, 0xF6F9FA, 0xE2EAEE),
    HOLLOW(Hatch.CROSSED, 0, 10, 0xFFFFFF, 0xFFFFFF, 0xFFFFFF, 0xFFFFFF);

    private final Hatch hatch;
    private final double turn;
    private final double pitch;
    private final int[] tones;

    Kind(Hatch hatch, double turn, double pitch, int... tones) {
      this.hatch = hatch;
      this.turn = turn;
      this.pitch = pitch;
      this.tones = tones;
    }

    /** The look of the n-th material of this kind in a detail. */
    MaterialLook look(int n) {
      Colour tone = new Colour(tones[n % tones.length]);
      double turned = turn + (turn == 0 ? 0 : (n % 2) * Math.PI / 2);
      double wider = pitch * (1 + 0.45 * (n / 2)) * (turn == 0 ? 1 + 0.3 * (n % 2) : 1);
      Hatch kind = this == MASONRY && n >= 2 ? Hatch.PAIRS : hatch;
      return new MaterialLook(kind, tone, Palette.mix(tone, Palette.INK, 0.42), turned, wider);
    }
  }

  /**
   * One look a fill, in the order of the fills; spaces have that of air.
   *
   * @param fills the fills of a detail
   */
  static List<MaterialLook> of(List<Fill> fills) {
    Map<Kind, Integer> seen = new EnumMap<>(Kind.class);
    List<MaterialLook> looks = new ArrayList<>(fills.size());
    for (Fill fill : fills) {
      Kind kind = kind(fill);
      int n = seen.getOrDefault(kind, 0);
      seen.put(kind, n + 1);
      looks.add(kind.look(n));
    }
    return looks;
  }

  private static Kind kind(Fill fill) {
    if (fill instanceof Hollow) {
      return Kind.HOLLOW;
    }
    if (!(fill instanceof Material)) {
      return Kind.AIR;
    }
    Material material = (Material) fill;
    double lambda = Math.max(material.conductivityWPerMK(), material.crossConductivityWPerMK());
    String name = material.name().toLowerCase(Locale.ROOT);
    if (lambda >= METAL_FROM) {
      return Kind.METAL;
    }
    if (lambda == 0) {
      return Kind.HOLLOW;
    }
    if (names(name, AIR, false)) {
      return Kind.AIR;
    }
    if (lambda < INSULATION_BELOW) {
      return Kind.INSULATION;
    }
    if (names(name, GROUND, false)) {
      return Kind.GROUND;
    }
    if (names(name, GLASS, false) && lambda >= 0.5) {
      return Kind.GLASS;
    }
    if (names(name, TIMBER, true)) {
      return Kind.TIMBER;
    }
    return lambda < BOARD_BELOW ? Kind.BOARD : lambda < MASONRY_BELOW ? Kind.MASONRY : Kind.MINERAL;
  }

  /** Whether one of some words stands in a name, or also ends a word of it, as in "softwood". */
  private static boolean names(String name, List<String> words, boolean endings) {
    for (String word : words) {
      int at = name.indexOf(word);
      while (at >= 0) {
        int end = at + word.length();
        end += end < name.length() && name.charAt(end) == 's' ? 1 : 0;
        boolean whole = at == 0 || !Character.isLetter(name.charAt(at - 1));
        boolean ends = end == name.length() || !Character.isLetter(name.charAt(end));
        if (ends && (whole || endings)) {
          return true;
        }
        at = name.indexOf(word, at + 1);
      }
    }
    return false;
  }
}
