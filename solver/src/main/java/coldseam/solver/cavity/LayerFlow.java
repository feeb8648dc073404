package coldseam.solver.cavity;

/**
 * Direction of the heat flow through an air layer (ISO 6946).
 *
 * @param kind upward, horizontal, downward or inclined
 * @param angleDeg of an inclined layer with heat flowing upwards: the angle between the layer and
 *     the horizontal, 0 to 90°
 */
public record LayerFlow(Kind kind, double angleDeg) {
  /** The three directions of the tables, and one between two of them. */
  public enum Kind {
    /** A horizontal layer, heat flows upwards. */
    UP,
    /** A vertical layer. */
    HORIZONTAL,
    /** A horizontal layer, heat flows downwards. */
    DOWN,
    /** Between horizontal with heat upwards and vertical. */
    INCLINED
  }

  /** Upwards through a horizontal layer. */
  public static final LayerFlow UP = new LayerFlow(Kind.UP, 0);

  /** Through a vertical layer, or in a direction not known. */
  public static final LayerFlow HORIZONTAL = new LayerFlow(Kind.HORIZONTAL, 90);

  /** Downwards through a horizontal layer. */
  public static final LayerFlow DOWN = new LayerFlow(Kind.DOWN, 0);

  /**
   * Checks the angle.
   *
   * @throws IllegalArgumentException unless it lies between 0 and 90°
   */
  public LayerFlow {
    if (!(angleDeg >= 0 && angleDeg <= 90)) {
      throw new IllegalArgumentException("an air layer is inclined by 0 to 90 degrees");
    }
  }

  /**
   * Upwards through an inclined layer.
   *
   * @param angleDeg angle between the layer and the horizontal, 0 to 90°
   * @return the direction
   */
  public static LayerFlow inclined(double angleDeg) {
    return new LayerFlow(Kind.INCLINED, angleDeg);
  }
}
