package coldseam.solver.air;

import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Space;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Which rule holds for each piece of air and how it is ventilated: as stated, else by its size and
 * its openings. A piece that well ventilated air opens into counts as open to that air's space.
 */
final class Ventilations {
  private static final int NONE = -1;

  private final Detail detail;
  private final Rims rims;
  private final List<Piece> pieces;
  private final int[] space;
  private final Piece.Classed[] inherited;
  private final Piece.Classed[] classed;

  private Ventilations(Detail detail, Rims rims, List<Piece> pieces, Piece.Classed[] inherited) {
    this.inherited = inherited;
    this.detail = detail;
    this.rims = rims;
    this.pieces = pieces;
    space = new int[pieces.size()];
    classed = new Piece.Classed[pieces.size()];
  }

  /**
   * Classes pieces.
   *
   * @param detail a detail in which every piece is a fill of its own
   * @param rims their rims
   * @param pieces the pieces
   * @param inherited the class of each piece that is not to be found anew, else null
   * @return one class a piece
   */
  static List<Piece.Classed> of(
      Detail detail, Rims rims, List<Piece> pieces, Piece.Classed[] inherited) {
    Ventilations ventilations = new Ventilations(detail, rims, pieces, inherited);
    ventilations.classAll();
    return List.of(ventilations.classed);
  }

  private void classAll() {
    Arrays.fill(space, NONE);
    boolean changed = true;
    while (changed) {
      changed = false;
      for (int p = 0; p < pieces.size(); p++) {
        if (space[p] != NONE) {
          continue;
        }
        classed[p] = inherited[p] == null ? classOf(p) : inherited[p];
        if (classed[p].well()) {
          space[p] = detail.spaceIndex(classed[p].space().orElseThrow());
          changed = true;
        }
      }
    }
  }

  private Piece.Classed classOf(int p) {
    AirCavity.Settings settings = pieces.get(p).settings();
    double longest = longestSide(pieces.get(p).rings().get(0));
    Rule rule =
        settings
            .rule()
            .orElse(
                longest > Limits.LONGEST_IN_FRAME_M * (1 + Limits.TIE) ? Rule.LAYER : Rule.FRAME);
    Rims.Opening widest = new Rims.Opening(NONE, 0);
    double sum = 0;
    for (Rims.Opening opening : rims.openings(p, space)) {
      sum += opening.widthM();
      if (opening.widthM() > widest.widthM() * (1 + Limits.TIE)) {
        widest = opening;
      }
    }
    OptionalDouble openings = OptionalDouble.empty();
    Ventilation ventilation;
    Optional<AirCavity.Exchange> stated = settings.exchange();
    if (stated.isPresent()) {
      ventilation = stated.get().ventilation();
      openings = stated.get().openings();
    } else if (rule == Rule.FRAME) {
      ventilation = Ventilation.ofSlit(widest.widthM());
    } else {
      openings = OptionalDouble.of(sum);
      ventilation = Ventilation.ofOpenings(sum);
    }
    Optional<String> to = stated.flatMap(AirCavity.Exchange::space);
    if (to.isEmpty() && widest.space() != NONE) {
      to = Optional.of(detail.spaces().get(widest.space()).name());
    }
    if (to.isEmpty() && ventilation != Ventilation.UNVENTILATED) {
      to = Optional.of(coldest(pieces.get(p)));
    }
    return new Piece.Classed(
        rule,
        settings.rule().isPresent(),
        ventilation,
        stated.isPresent(),
        widest.widthM(),
        openings,
        to);
  }

  private String coldest(Piece piece) {
    Space coldest = null;
    for (Space one : detail.spaces()) {
      if (one.floating().isEmpty()
          && (coldest == null || one.temperatureC() < coldest.temperatureC())) {
        coldest = one;
      }
    }
    if (coldest == null) {
      throw new DetailException(
          List.of(
              new Fault(
                  "cavity",
                  piece.fill().name(),
                  "is ventilated, but no space has a stated temperature; say which it is"
                      + " ventilated from",
                  Optional.empty())));
    }
    return coldest.name();
  }

  private static double longestSide(List<Point> ring) {
    double longest = 0;
    Axes axes = Axes.of(ring);
    for (int axis = 0; axis < 2; axis++) {
      longest = Math.max(longest, axes.extent(ring, axis));
    }
    return longest;
  }
}
