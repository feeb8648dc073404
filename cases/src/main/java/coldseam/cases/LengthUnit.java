package coldseam.cases;

import java.util.List;

/**
 * The unit of every bare length of a case.
 *
 * @param name as written in the case
 * @param metres metres per unit
 */
record LengthUnit(String name, double metres) {
  static final LengthUnit MM = new LengthUnit("mm", 0.001);
  static final List<LengthUnit> ALL =
      List.of(MM, new LengthUnit("cm", 0.01), new LengthUnit("m", 1), new LengthUnit("in", 0.0254));
  static final List<String> NAMES = List.of("mm", "cm", "m", "in");

  /** The unit of one of {@link #NAMES}. */
  static LengthUnit named(String name) {
    return ALL.get(NAMES.indexOf(name));
  }
}
