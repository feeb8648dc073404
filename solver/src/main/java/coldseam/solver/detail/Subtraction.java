package coldseam.solver.detail;

import java.util.List;
import java.util.OptionalDouble;

/** One term that a ψ takes off L2D. */
public sealed interface Subtraction {
  /**
   * A flank of the detail, U·l.
   *
   * @param flank its name
   * @param lengthM the length, if this ψ has its own, m
   */
  record OfFlank(String flank, OptionalDouble lengthM) implements Subtraction {}

  /**
   * A part known by its U and width: a frame, a panel, a ground floor.
   *
   * @param name what it is
   * @param uWPerM2K U, W/(m²·K)
   * @param lengthM width or length, m
   */
  record OfKnown(String name, Bracket uWPerM2K, double lengthM) implements Subtraction {}

  /**
   * The coupling coefficient of another detail, solved as well.
   *
   * @param name what it is
   * @param detail the other detail
   * @param warm its spaces on the warm side
   * @param cold its spaces on the cold side
   */
  record OfDetail(String name, Detail detail, List<String> warm, List<String> cold)
      implements Subtraction {}
}
