package coldseam.solver.result;

import coldseam.solver.conduction.Dissipation;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Material;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Shares of materials and films: λ ∂L2D/∂λ over L2D is what is dissipated in a material over all
 * that is dissipated, per unit of temperature difference. With more than two temperatures they are
 * shares of θᵀAθ, which for two temperatures ΔT apart is L2D·ΔT².
 */
final class Sharing {
  /** Less than this times the best conductivity and ΔT² is rounding: no heat flows. */
  private static final double ROUNDING = 1e-12;

  private static final Result.Shares NONE = new Result.Shares("", List.of());

  private static final class LargestFirst implements Comparator<Result.Share> {
    @Override
    public int compare(Result.Share a, Result.Share b) {
      return Double.compare(b.share(), a.share());
    }
  }

  private Sharing() {}

  /**
   * Works the shares out.
   *
   * @param detail what was solved
   * @param solution its solution with the films for heat loss
   * @param temperaturesC of every space, °C; two spaces need no difference
   * @return none where no heat flows, or infinitely much
   */
  static Result.Shares of(Detail detail, Solution solution, double[] temperaturesC) {
    int spaces = temperaturesC.length;
    double[] x = spaces == 2 ? new double[] {1, 0} : temperaturesC;
    for (int i = 0; i < spaces; i++) {
      for (int j = 0; j < spaces; j++) {
        if (x[i] != x[j] && !Double.isFinite(solution.matrix(i, j))) {
          return NONE;
        }
      }
    }
    Dissipation dissipation = solution.dissipation();
    List<Part> parts = Part.of(detail, dissipation);
    double[] energies = new double[parts.size()];
    double all = 0;
    for (int p = 0; p < energies.length; p++) {
      energies[p] = dissipation.dissipated(p, x, x);
      all += energies[p];
    }
    if (!(all > ROUNDING * scale(detail, x))) {
      return NONE;
    }
    List<Result.Share> shares = new ArrayList<>();
    for (int p = 0; p < energies.length; p++) {
      Part part = parts.get(p);
      shares.add(
          new Result.Share(
              part.name(),
              space(detail, dissipation.parts().get(p)),
              energies[p] / all,
              part.relativeTolerance()));
    }
    shares.sort(new LargestFirst());
    return new Result.Shares(words(detail, x), List.copyOf(shares));
  }

  /** The best conductivity times the square of the largest difference. */
  private static double scale(Detail detail, double[] x) {
    double best = 0;
    for (Area area : detail.areas()) {
      if (area.fill() instanceof Material material) {
        best = Math.max(best, material.conductivityWPerMK());
        best = Math.max(best, material.crossConductivityWPerMK());
      }
    }
    double highest = x[0];
    double lowest = x[0];
    for (double value : x) {
      highest = Math.max(highest, value);
      lowest = Math.min(lowest, value);
    }
    return best * (highest - lowest) * (highest - lowest);
  }

  private static String space(Detail detail, Dissipation.Part part) {
    return part instanceof Dissipation.Part.Film film
        ? detail.spaces().get(film.space()).name()
        : "";
  }

  private static String words(Detail detail, double[] x) {
    List<String> high = new ArrayList<>();
    List<String> low = new ArrayList<>();
    double highest = x[0];
    double lowest = x[0];
    for (double value : x) {
      highest = Math.max(highest, value);
      lowest = Math.min(lowest, value);
    }
    for (int i = 0; i < x.length; i++) {
      if (x[i] == highest) {
        high.add(detail.spaces().get(i).name());
      } else if (x[i] == lowest) {
        low.add(detail.spaces().get(i).name());
      }
    }
    return high.size() + low.size() == x.length
        ? (detail.geometry() == Geometry.PLANE ? "L2D " : "L3D ")
            + String.join(" + ", high)
            + " – "
            + String.join(" + ", low)
        : "θᵀAθ, the heat flows of all spaces times their temperatures";
  }
}
