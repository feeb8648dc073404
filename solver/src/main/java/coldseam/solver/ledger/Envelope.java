package coldseam.solver.ledger;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Everything heat passes on its way out by difference of temperature (ISO 13789, <em>from
 * memory</em>): H_D = Σ A U + Σ l ψ + Σ χ, H_U = b H_iu, H_g, H_V.
 *
 * @param parts in the order of the schedule
 */
public record Envelope(List<Part> parts) {
  /** What a part is. */
  public enum Kind {
    /** A plane element. */
    ELEMENT,
    /** A window or a door. */
    WINDOW,
    /** A junction, by its length and ψ. */
    JUNCTION,
    /** A point bridge, by its number and χ. */
    POINT,
    /** A plane element on the ground. */
    GROUND,
    /** Air that is changed on purpose. */
    AIR,
    /** Air that leaks. */
    LEAKAGE
  }

  /**
   * One part.
   *
   * @param kind what it is
   * @param name its name
   * @param amount area in m², length in m, number, or air in m³/h
   * @param coefficient U, ψ, χ, or ρc in W·h/(m³·K)
   * @param room the unheated room it leads to; empty if it leads outdoors or into the ground
   * @param b what of a difference to outdoors acts on it, 1 unless it leads to a room
   * @param source where the coefficient comes from, in words; empty if typed
   */
  public record Part(
      Kind kind,
      String name,
      double amount,
      Uncertain coefficient,
      String room,
      Uncertain b,
      String source) {
    /**
     * Checks the amount.
     *
     * @throws IllegalArgumentException unless the amount is finite and not negative
     */
    public Part {
      if (!(amount >= 0) || !Double.isFinite(amount)) {
        throw new IllegalArgumentException("an amount is 0 or more");
      }
    }

    /** H of the part, W/K. */
    public Uncertain conductanceWPerK() {
      Uncertain whole = coefficient.times(amount);
      return room.isEmpty() ? whole : whole.times(b);
    }

    /** Whether its amount is an area of the envelope. */
    public boolean plane() {
      return kind == Kind.ELEMENT || kind == Kind.WINDOW || kind == Kind.GROUND;
    }

    /** Whether it is counted by length or by number. */
    public boolean bridge() {
      return kind == Kind.JUNCTION || kind == Kind.POINT;
    }

    /** Whether heat leaves with air. */
    public boolean air() {
      return kind == Kind.AIR || kind == Kind.LEAKAGE;
    }

    /** Whether the ground's temperature drives it. */
    public boolean ground() {
      return kind == Kind.GROUND;
    }
  }

  /** Copies the list. */
  public Envelope {
    parts = List.copyOf(parts);
  }

  /** H_T: everything but air, W/K. */
  public Uncertain transmissionWPerK() {
    return planeWPerK().plus(bridgesWPerK());
  }

  /** Σ l ψ + Σ χ, those to unheated rooms by their b, W/K. */
  public Uncertain bridgesWPerK() {
    Uncertain sum = Uncertain.ZERO;
    for (Part part : parts) {
      sum = part.bridge() ? sum.plus(part.conductanceWPerK()) : sum;
    }
    return sum;
  }

  private Uncertain planeWPerK() {
    Uncertain sum = Uncertain.ZERO;
    for (Part part : parts) {
      sum = part.plane() ? sum.plus(part.conductanceWPerK()) : sum;
    }
    return sum;
  }

  /** H_V with leakage, W/K. */
  public Uncertain airWPerK() {
    Uncertain sum = Uncertain.ZERO;
    for (Part part : parts) {
      sum = part.air() ? sum.plus(part.conductanceWPerK()) : sum;
    }
    return sum;
  }

  /**
   * What part of H_T junctions and points are.
   *
   * @return part of 1; 0 for an envelope that loses nothing
   */
  public Uncertain bridgeShare() {
    Uncertain bridges = bridgesWPerK();
    Uncertain plane = planeWPerK();
    double[] stated = ends(bridges.lower(), bridges.upper(), plane.lower(), plane.upper());
    double[] widest =
        ends(
            bridges.widestLower(), bridges.widestUpper(), plane.widestLower(), plane.widestUpper());
    return new Uncertain(
        share(bridges.value(), plane.value()),
        stated[0],
        stated[1],
        widest[0],
        widest[1],
        bridges.plus(plane).doubt());
  }

  private static double share(double bridges, double plane) {
    return bridges + plane > 0 ? bridges / (bridges + plane) : 0;
  }

  /** The share rises with the bridges, and rises or falls with the rest by the bridges' sign. */
  private static double[] ends(double least, double most, double leastPlane, double mostPlane) {
    return new double[] {
      Math.min(share(least, leastPlane), share(least, mostPlane)),
      Math.max(share(most, leastPlane), share(most, mostPlane))
    };
  }

  /** Area of the envelope, m². */
  public double areaM2() {
    double sum = 0;
    for (Part part : parts) {
      sum += part.plane() ? part.amount() : 0;
    }
    return sum;
  }

  /**
   * What junctions and points amount to when they are spread over the envelope, W/(m²·K).
   *
   * @return the mean ΔU; 0 without area
   */
  public Uncertain meanDeltaUWPerM2K() {
    double area = areaM2();
    return area > 0 ? bridgesWPerK().times(1 / area) : Uncertain.ZERO;
  }

  /** The parts that lead to each unheated room, rooms in the order they first come up. */
  public Map<String, List<Part>> rooms() {
    Map<String, List<Part>> rooms = new LinkedHashMap<>();
    for (Part part : parts) {
      if (!part.room().isEmpty()) {
        rooms.computeIfAbsent(part.room(), name -> new ArrayList<>()).add(part);
      }
    }
    return rooms;
  }
}
