package coldseam.solver.ledger;

/**
 * One item of a ledger.
 *
 * @param kind what it is
 * @param name its name, unique within its kind
 * @param energyKWh kWh; in positive, out negative
 */
public record Entry(Kind kind, String name, Uncertain energyKWh) {
  /** What an item is. */
  public enum Kind {
    /** Heat out through a plane element. */
    ELEMENT,
    /** Heat out through a window or a door; sun that comes in is a gain. */
    WINDOW,
    /** Heat out through a junction. */
    JUNCTION,
    /** Heat out through point bridges. */
    POINT,
    /** Heat out by way of an unheated room. */
    ROOM,
    /** Heat out into the ground. */
    GROUND,
    /** Heat out with air that is changed. */
    AIR,
    /** Heat out with air that leaks. */
    LEAKAGE,
    /** Sun, people, appliances: in. */
    GAIN,
    /** Gains that were not used: out. */
    UNUSED_GAIN,
    /** Electricity from the grid: in. */
    ELECTRICITY,
    /** Electricity made on the building: in. */
    PHOTOVOLTAICS,
    /** Electricity given away: out. */
    EXPORT,
    /** Fuel by its heating value: in. */
    FUEL,
    /** Heat lost by the flue: out. */
    FLUE,
    /** Heat bought as such: in. */
    HEAT,
    /** Heat that a heat pump takes from outside: in. */
    AMBIENT,
    /** Warm water down the drain: out. */
    DRAIN,
    /** What the building holds more at the end than at the beginning: out; less: in. */
    STORE,
    /** What the data does not explain. */
    REMAINDER
  }

  /**
   * Whether the item is one of those that come in. A junction of negative ψ does not: it lessens
   * what goes out by the plane elements beside it.
   *
   * @return by its kind; by its sign for a change of store and what is not explained
   */
  public boolean in() {
    return switch (kind) {
      case GAIN, ELECTRICITY, PHOTOVOLTAICS, FUEL, HEAT, AMBIENT -> true;
      case STORE, REMAINDER -> energyKWh.value() > 0;
      default -> false;
    };
  }

  /** Whether the item leaves through the envelope, by difference of temperature. */
  public boolean envelope() {
    return switch (kind) {
      case ELEMENT, WINDOW, JUNCTION, POINT, ROOM, GROUND, AIR, LEAKAGE -> true;
      default -> false;
    };
  }
}
