package coldseam.solver.detail;

import coldseam.mesh.plane.Point;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** One result asked for, beside what is always given (couplings, flows, coldest surfaces). */
public sealed interface Wanted {
  /** What it takes off, where it takes anything off. */
  default List<Subtraction> subtractions() {
    return List.of();
  }

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
   * A point transmittance χ = L3D − Σ U·A − Σ ψ·l of a body of revolution (ISO 10211:2017, clause
   * 12).
   *
   * @param name unique among the χ of a detail
   * @param of what it is of: "rod", "fixing", "pipe", …
   * @param warm spaces on the warm side
   * @param cold spaces on the cold side
   * @param subtractions what is taken off; empty: every undisturbed construction at a cut-off plane
   *     that separates the two sides
   */
  record Chi(
      String name, String of, List<String> warm, List<String> cold, List<Subtraction> subtractions)
      implements Wanted {
    /** Copies the lists. */
    public Chi {
      warm = List.copyOf(warm);
      cold = List.copyOf(cold);
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

  /**
   * A moisture check of surfaces (ISO 13788).
   *
   * @param spaces the spaces judged; empty: every inside space of known humidity
   * @param outside the spaces that take the temperature of each month; empty: every outside space
   * @param months empty: the temperatures of the case as the only climate
   * @param humidity of the air in place of that of each space, 0 to 1
   * @param excessPa excess of the vapour pressure indoors over that outdoors at 0 °C and below, Pa
   * @param excessSource where that comes from, in words
   * @param atSurface relative humidity at the surface that governs
   */
  record Moisture(
      List<String> spaces,
      List<String> outside,
      List<Month> months,
      OptionalDouble humidity,
      OptionalDouble excessPa,
      String excessSource,
      double atSurface)
      implements Wanted {
    /** Copies the lists. */
    public Moisture {
      spaces = List.copyOf(spaces);
      outside = List.copyOf(outside);
      months = List.copyOf(months);
    }

    /**
     * The climate of one month.
     *
     * @param name its name
     * @param temperatureC mean temperature outdoors, °C
     * @param humidity mean relative humidity outdoors, 0 to 1; NaN if it is not needed
     */
    public record Month(String name, double temperatureC, double humidity) {}
  }

  /**
   * A requirement that the result is to meet.
   *
   * @param kind what it is about
   * @param name of the space, ψ or U; empty for every inside space, and for moisture
   * @param limit at least this f_Rsi, at most this ψ or U, SI; without meaning for moisture
   */
  record Requirement(Kind kind, String name, double limit) implements Wanted {
    /** What a requirement is about. */
    public enum Kind {
      /** f_Rsi of the coldest point, at least. */
      F_RSI,
      /** ψ, at most. */
      PSI,
      /** U, at most. */
      U,
      /** The moisture check in every space it judges. */
      MOISTURE
    }
  }

  /**
   * The edge of a floor next to the ground (ISO 13370), with the figures that its ψ rest on.
   *
   * @param kind "slab on the ground", "suspended floor" or "cellar"
   * @param warm the space over the floor
   * @param cold the space outdoors
   * @param surface the stretch of the floor's surface
   * @param characteristicM B', m
   * @param soilWPerMK conductivity of the ground, W/(m·K)
   * @param wallM thickness of the wall, m
   * @param equivalentM equivalent thickness d_t (of what lies on the ground), m
   * @param resistanceM2KPerW R of the floor without films, m²·K/W
   * @param layers of the floor, in words
   * @param floorUWPerM2K U of the floor by the formulas, W/(m²·K)
   * @param wallUWPerM2K U of walls below the ground by the formulas, if there are any, W/(m²·K)
   * @param factor whether the slab-edge F-factor is wanted
   */
  record FloorEdge(
      String kind,
      String warm,
      String cold,
      String surface,
      double characteristicM,
      double soilWPerMK,
      double wallM,
      double equivalentM,
      double resistanceM2KPerW,
      List<String> layers,
      double floorUWPerM2K,
      OptionalDouble wallUWPerM2K,
      boolean factor)
      implements Wanted {
    /** Copies the list. */
    public FloorEdge {
      layers = List.copyOf(layers);
    }
  }

  /**
   * A framed wall, or layers alone, beside the two resistance limits of ISO 6946.
   *
   * @param of the U it belongs to
   * @param alongY whether its faces run along y, else along x
   * @param layer the fill whose share in R is wanted and that corrections refer to; empty for none
   * @param fractions of the area of the whole wall
   * @param corrections to U
   */
  record Framing(
      String of,
      boolean alongY,
      String layer,
      Optional<Fractions> fractions,
      Optional<Corrections> corrections)
      implements Wanted {
    /**
     * What the whole wall is made of; parts of 1.
     *
     * @param cavity insulation alone
     * @param studs studs
     * @param headers plates, headers and other framing
     */
    public record Fractions(double cavity, double studs, double headers) {}

    /** Shape of a part of a roof with a tapered layer. */
    public enum Taper {
      /** A rectangle. */
      RECTANGLE,
      /** A triangle, thickest at its apex. */
      THICKEST_AT_APEX,
      /** A triangle, thinnest at its apex. */
      THINNEST_AT_APEX
    }

    /**
     * Corrections of ISO 6946; 0 where there is none.
     *
     * @param voidLevel air voids, 0 to 2
     * @param fastenersPerM2 1/m²
     * @param fastenerWPerMK conductivity of a fastener
     * @param fastenerM2 its cross-section, m²
     * @param insulationM thickness of the insulation they pass, m
     * @param throughM length of a fastener in it, m
     * @param rainMmPerDay mean rain on an inverted roof, mm a day
     * @param rainFactor f·x
     * @param taper shape of a tapered layer on top of what is drawn
     * @param taperM2KPerW its R where it is thickest
     */
    public record Corrections(
        int voidLevel,
        double fastenersPerM2,
        double fastenerWPerMK,
        double fastenerM2,
        double insulationM,
        double throughM,
        double rainMmPerDay,
        double rainFactor,
        Optional<Taper> taper,
        double taperM2KPerW) {}
  }
}
