package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** One result asked for, beside what is always given (couplings, flows, coldest surfaces). */
public sealed interface Wanted {
  /**
   * A linear transmittance ψ = Σ b·L2D − what is subtracted (ISO 10211:2017, clause 12).
   *
   * @param name unique among the ψ of a detail
   * @param of the junction, or "glass edge"
   * @param warm spaces on the warm side
   * @param cold spaces on the cold side
   * @param weights b for spaces between, by name: the coupling from the warm side to that space,
   *     and flanks to it, count b times
   * @param dimensions how lengths are measured
   * @param subtractions what is taken off; empty: every flank that separates the two sides
   */
  record Psi(
      String name,
      String of,
      List<String> warm,
      List<String> cold,
      Map<String, Double> weights,
      DimensionSystem dimensions,
      List<Subtraction> subtractions)
      implements Wanted {
    /** Copies the lists. */
    public Psi {
      warm = List.copyOf(warm);
      cold = List.copyOf(cold);
      weights = Map.copyOf(weights);
      subtractions = List.copyOf(subtractions);
    }
  }

  /**
   * An effective U over a module width: U = L2D / width.
   *
   * @param of "wall", "roof", "floor", …
   * @param warm spaces on the warm side
   * @param cold spaces on the cold side
   * @param widthM module width, m; empty: the distance between the two cut-off planes
   */
  record Transmittance(String of, List<String> warm, List<String> cold, OptionalDouble widthM)
      implements Wanted {
    /** Copies the lists. */
    public Transmittance {
      warm = List.copyOf(warm);
      cold = List.copyOf(cold);
    }
  }

  /**
   * A frame (ISO 10077-2): its U_f with an insulating panel in place of the glazing and, if the
   * glazing is drawn, the ψ of the glass edge. Areas carry their {@link Area.Role}.
   *
   * @param warm spaces on the warm side
   * @param cold spaces on the cold side
   * @param panelWPerMK conductivity of the panel that takes the place of a drawn glazing, W/(m·K)
   * @param widthM projected width b_f of the frame, m; empty: from the drawing
   * @param visibleM visible lengths of panels or glazings, from left to right, m; empty: from the
   *     drawing
   * @param corners where the film is reduced
   * @param panelRun the same detail with the panel in place of the glazing; {@link FrameDetail}
   *     makes it
   */
  record Frame(
      List<String> warm,
      List<String> cold,
      double panelWPerMK,
      OptionalDouble widthM,
      List<Double> visibleM,
      CornerRule corners,
      Optional<Subtraction.OfDetail> panelRun)
      implements Wanted {
    /** Conductivity of the insulating panel, ISO 10077-2, W/(m·K). */
    public static final double PANEL_W_PER_MK = 0.035;

    /** Name of its U. */
    public static final String NAME = "frame";

    /** Name of the ψ of its glass edge. */
    public static final String GLASS_EDGE = "glass edge";

    /** Copies the lists. */
    public Frame {
      warm = List.copyOf(warm);
      cold = List.copyOf(cold);
      visibleM = List.copyOf(visibleM);
    }
  }

  /**
   * The temperature at a point.
   *
   * @param name unique among the points
   * @param at the point, m
   * @param filmSet which films
   */
  record Temperature(String name, Point at, FilmSet filmSet) implements Wanted {}

  /**
   * Temperatures along a straight line.
   *
   * @param name unique among the profiles
   * @param from start, m
   * @param to end, m
   * @param points how many, 2 or more, both ends included
   * @param filmSet which films
   */
  record Profile(String name, Point from, Point to, int points, FilmSet filmSet)
      implements Wanted {}

  /**
   * Temperatures along the developed surface that faces a space.
   *
   * @param name unique among the profiles
   * @param space the space
   * @param filmSet which films
   */
  record SurfaceProfile(String name, String space, FilmSet filmSet) implements Wanted {}
}
