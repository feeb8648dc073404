package coldseam.cases.drawing;

import java.util.Optional;

/** A unit that drawings are drawn in. */
public enum DrawingUnit {
  /** Millimetre. */
  MM("mm", 0.001, 4),
  /** Centimetre. */
  CM("cm", 0.01, 5),
  /** Metre. */
  M("m", 1, 6),
  /** Inch. */
  IN("in", 0.0254, 1),
  /** Foot. */
  FT("ft", 0.3048, 2);

  private final String symbol;
  private final double metres;
  private final int dxfCode;

  DrawingUnit(String symbol, double metres, int dxfCode) {
    this.symbol = symbol;
    this.metres = metres;
    this.dxfCode = dxfCode;
  }

  /** As it is written in a case. */
  public String symbol() {
    return symbol;
  }

  /** Metres per unit. */
  public double metres() {
    return metres;
  }

  static Optional<DrawingUnit> byDxfCode(int code) {
    for (DrawingUnit unit : values()) {
      if (unit.dxfCode == code) {
        return Optional.of(unit);
      }
    }
    return Optional.empty();
  }

  /** The symbols of all, for a message. */
  static String names() {
    return "mm, cm, m, in, ft";
  }
}
