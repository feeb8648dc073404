package coldseam.solver.detail;

import java.util.List;
import java.util.OptionalDouble;

/** One term that a ψ takes off L2D, or a χ off L3D. */
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
   * A surface that a χ takes off, U·A.
   *
   * @param name what it is
   * @param uWPerM2K U, W/(m²·K)
   * @param areaM2 its area, m²
   */
  record OfArea(String name, Bracket uWPerM2K, double areaM2) implements Subtraction {}

  /**
   * A linear bridge or a pipe that a χ takes off, ψ·l.
   *
   * @param name what it is
   * @param psiWPerMK ψ, or the conductance of a metre, W/(m·K)
   * @param lengthM its length, m
   */
  record OfLine(String name, Bracket psiWPerMK, double lengthM) implements Subtraction {}

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
