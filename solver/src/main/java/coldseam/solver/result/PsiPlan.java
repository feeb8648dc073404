package coldseam.solver.result;

import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.Subtraction;
import coldseam.solver.detail.Wanted;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What one ψ is made of, settled before anything is solved.
 *
 * @param wanted as asked for
 * @param warm indices of the spaces on the warm side
 * @param cold indices of the spaces on the cold side
 * @param weights b of spaces between, by index
 * @param floating floating spaces on neither side, which are eliminated
 * @param terms what is taken off
 */
record PsiPlan(
    Wanted.Psi wanted,
    int[] warm,
    int[] cold,
    Map<Integer, Double> weights,
    int[] floating,
    List<Term> terms) {
  /**
   * One term to be taken off.
   *
   * @param name the flank or part
   * @param flank the flank, if it is one
   * @param separation how it counts
   * @param uWPerM2K its U; empty when another detail's L2D is taken off
   * @param lengthM its length; NaN for another detail
   * @param other the other detail
   * @param derivation where U and length come from, in words
   */
  record Term(
      String name,
      Optional<PlacedFlank> flank,
      Separation separation,
      Optional<Bracket> uWPerM2K,
      double lengthM,
      Optional<Subtraction.OfDetail> other,
      String derivation) {
    boolean of(PlacedFlank placed) {
      return flank.isPresent() && flank.get().name().equals(placed.name());
    }
  }

  /**
   * How a flank counts in a ψ.
   *
   * @param weight b, 0 if it does not separate the two sides
   * @param floating the floating space whose balance gives b instead, or −1
   */
  record Separation(double weight, int floating) {
    static final Separation FULL = new Separation(1, -1);

    boolean none() {
      return weight == 0 && floating < 0;
    }
  }

  /**
   * How a flank counts: one with an unknown side where its known side, if any, is one of the two.
   */
  Separation separation(PlacedFlank flank) {
    if (flank.warm() < 0) {
      return Separation.FULL;
    }
    if (Couplings.contains(warm, flank.warm())) {
      return seenFromWarm(flank.cold());
    }
    if (Couplings.contains(warm, flank.cold())) {
      return seenFromWarm(flank.warm());
    }
    boolean known = flank.cold() < 0 && Couplings.contains(cold, flank.warm());
    return new Separation(known ? 1 : 0, -1);
  }

  private Separation seenFromWarm(int otherSpace) {
    if (otherSpace < 0 || Couplings.contains(cold, otherSpace)) {
      return Separation.FULL;
    }
    if (Couplings.contains(floating, otherSpace)) {
      return new Separation(0, otherSpace);
    }
    return new Separation(weights.getOrDefault(otherSpace, 0.0), -1);
  }
}
