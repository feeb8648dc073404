package coldseam.cases;

/**
 * A number met in a case.
 *
 * @param number in SI (°C, degrees, parts of 1) if the dimension has a unit, else as typed; NaN if
 *     it could not be made out and that was reported
 * @param dimension its dimension
 */
record Value(double number, Dimension dimension) {
  /** Could not be made out; reported where it was written. */
  static final Value UNKNOWN = new Value(Double.NaN, Dimension.BARE);

  static Value bare(double number) {
    return new Value(number, Dimension.BARE);
  }

  /** Whether its mistake was reported already. */
  boolean unknown() {
    return Double.isNaN(number);
  }
}
