package coldseam.solver.ground;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.EdgeCondition;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Hollow;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Stretch;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Where a floor's edge lies in its block of soil (ISO 10211:2017, 5.2.4 and table 1; *from
 * memory*): half the floor's width B' to a plane of symmetry, and soil to 2.5 B' beyond the outer
 * face of the wall and 2.5 B' below the ground. Up is up on the sheet; lengths in m.
 *
 * @param innerX inner face of the outer wall
 * @param outerX its outer face; on which side of the inner one it lies says where outdoors is
 * @param floorY surface of the floor
 * @param groundY surface of the ground outdoors
 * @param widthM B'
 */
public record GroundSection(
    double innerX, double outerX, double floorY, double groundY, double widthM) {
  /** How far the soil reaches, in widths of the floor. */
  public static final double REACH = 2.5;

  /** Width of a floor of which none is known, m. */
  public static final double STANDARD_WIDTH_M = 8;

  /** Name of the stretch of the floor's surface. */
  public static final String FLOOR_SURFACE = "floor surface";

  /** Name of the stretch along the plane of symmetry above a void. */
  public static final String MIDDLE = "middle of the floor";

  /** Name of the stretch along the plane of symmetry and the ends of the ground. */
  public static final String ENDS = "ends of the ground";

  /** How far from the plane of symmetry the floor is read, as a part of B'. */
  private static final double READING = 1e-4;

  /** Thickness of the wall, m. */
  public double wallM() {
    return Math.abs(outerX - innerX);
  }

  private double outward() {
    return Math.signum(outerX - innerX);
  }

  /** Half the width of the floor, m. */
  public double halfM() {
    return widthM / 2;
  }

  /** The plane of symmetry. */
  public double symmetryX() {
    return innerX - outward() * halfM();
  }

  /** Where the soil ends outdoors. */
  public double farX() {
    return outerX + outward() * REACH * widthM;
  }

  /** Where the soil ends below. */
  public double bottomY() {
    return groundY - REACH * widthM;
  }

  /** Depth of the floor's surface below the ground, m; negative above it. */
  public double depthM() {
    return groundY - floorY;
  }

  /**
   * What is laid under the section: the soil, and outdoors over it.
   *
   * @param soil the soil
   * @param outdoors the space outdoors
   * @param topY where the section ends above
   * @return two areas
   */
  public List<Area> under(Fill soil, Space outdoors, double topY) {
    return List.of(
        box("ground (" + soil.name() + ")", soil, symmetryX(), bottomY(), farX(), groundY),
        box("ground (" + outdoors.name() + ")", outdoors, outerX, groundY, farX(), topY));
  }

  private static Area box(String name, Fill fill, double x0, double y0, double x1, double y1) {
    return new Area(
        name,
        fill,
        List.of(
            List.of(new Point(x0, y0), new Point(x1, y0), new Point(x1, y1), new Point(x0, y1))),
        false);
  }

  /**
   * Where the block ends, no heat crossing, and the surface of the floor.
   *
   * @param floor the floor as read
   * @return stretches
   */
  public List<Stretch> stretches(Floor floor) {
    Optional<EdgeCondition> symmetry = Optional.of(new EdgeCondition.CutOff(true));
    Point surface = new Point(symmetryX(), floorY);
    Point under = new Point(symmetryX(), floor.bottomY());
    boolean parted = floor.below() instanceof Space;
    List<Stretch> all = new ArrayList<>();
    all.add(
        new Stretch(
            ENDS,
            List.of(
                parted ? new Point(symmetryX(), floor.soilY()) : surface,
                new Point(symmetryX(), bottomY()),
                new Point(farX(), bottomY()),
                new Point(farX(), groundY)),
            symmetry,
            false));
    if (parted) {
      all.add(new Stretch(MIDDLE, List.of(surface, under), symmetry, false));
    }
    all.add(
        new Stretch(
            FLOOR_SURFACE, List.of(surface, new Point(innerX, floorY)), Optional.empty(), false));
    return all;
  }

  /** Lowest x and y, highest x and y. */
  private static double[] bounds(Area area) {
    double[] box = {
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    for (List<Point> ring : area.rings()) {
      for (Point point : ring) {
        box[0] = Math.min(box[0], point.x());
        box[1] = Math.min(box[1], point.y());
        box[2] = Math.max(box[2], point.x());
        box[3] = Math.max(box[3], point.y());
      }
    }
    return box;
  }

  /**
   * The floor as it is met at the plane of symmetry.
   *
   * @param layers of solids from the surface down to the soil or a space, in words
   * @param resistanceM2KPerW Σ d/λ of them
   * @param bottomY where they end
   * @param below what is met under them: the soil or a space; null if nothing is
   * @param soilY where the soil begins
   */
  public record Floor(
      List<String> layers, double resistanceM2KPerW, double bottomY, Fill below, double soilY) {
    /** Copies the list. */
    public Floor {
      layers = List.copyOf(layers);
    }
  }

  /**
   * Reads the floor at the plane of symmetry.
   *
   * @param areas everything laid, in order
   * @param soil the soil
   * @return the floor; its resistance is infinite where something between does not conduct
   */
  public Floor floor(List<Area> areas, Fill soil) {
    double x = symmetryX() + outward() * READING * widthM;
    return read(areas, soil, new Point(x, floorY), new Point(x, bottomY()));
  }

  /**
   * Reads the wall below the ground, half-way down.
   *
   * @param areas everything laid, in order
   * @param soil the soil
   * @return Σ d/λ from the inner face to the soil, m²·K/W
   */
  public double basementWall(List<Area> areas, Fill soil) {
    double y = (floorY + groundY) / 2;
    return read(areas, soil, new Point(innerX, y), new Point(farX(), y)).resistanceM2KPerW();
  }

  private static Floor read(List<Area> areas, Fill soil, Point from, Point to) {
    double length = from.distance(to);
    double dx = (to.x() - from.x()) / length;
    double dy = (to.y() - from.y()) / length;
    List<String> words = new ArrayList<>();
    double resistance = 0;
    double depth = 0;
    double bottom = Double.NaN;
    boolean through = false;
    Fill below = null;
    for (LayerProbe.Piece piece : LayerProbe.pieces(areas, from, to)) {
      boolean ends = piece.fill() == null || piece.fill() instanceof Space;
      boolean ground = piece.fill() != null && piece.fill().name().equals(soil.name());
      if (!through && (ends || ground)) {
        through = true;
        below = piece.fill();
        bottom = from.y() + dy * depth;
      } else if (!through) {
        resistance += piece.resistance(dx, dy);
        words.add(piece.fill().name() + " " + Wording.length(piece.lengthM()));
      }
      if (ground) {
        return new Floor(words, resistance, bottom, below, from.y() + dy * depth);
      }
      depth += piece.lengthM();
    }
    double end = from.y() + dy * depth;
    return new Floor(words, resistance, through ? bottom : end, below, end);
  }

  /**
   * The same section without the wall (ISO 10211:2017, clause 12, wall/floor junctions, second way;
   * *from memory*): the floor with its insulation stays, every other solid below the ground is
   * soil, and no heat crosses where the wall stood on the ground or against the floor's edge.
   *
   * @param with the section with the wall
   * @param soil the soil
   * @param floor the floor as read
   * @param indoors the space over the floor
   * @param outdoors the space outdoors
   * @param topY where the section ends above
   * @return a detail of which only L2D is wanted
   */
  public Detail withoutWall(
      Detail with, Material soil, Floor floor, Space indoors, Space outdoors, double topY) {
    List<Area> areas = new ArrayList<>();
    double low = bottomY();
    boolean beside = false;
    boolean under = false;
    for (Area area : with.areas()) {
      double[] box = bounds(area);
      boolean ofFloor =
          !(area.fill() instanceof Space)
              && !area.fill().name().equals(soil.name())
              && Math.max(box[0], Math.min(symmetryX(), innerX))
                  < Math.min(box[2], Math.max(symmetryX(), innerX))
              && Math.max(box[1], floor.bottomY()) < Math.min(box[3], floorY);
      if (ofFloor) {
        areas.add(area);
        beside |= outward() > 0 ? box[2] > innerX : box[0] < innerX;
        under |= box[1] < floor.bottomY();
      }
    }
    if (!(beside && under)) {
      areas.add(0, box("soil", soil, symmetryX(), low, farX(), groundY));
    }
    if (under) {
      areas.add(box("soil under the floor", soil, symmetryX(), low, innerX, floor.bottomY()));
    }
    if (beside) {
      areas.add(box("soil beside the floor", soil, innerX, low, farX(), groundY));
      areas.add(box("the wall taken away", new Hollow("nothing"), innerX, groundY, outerX, topY));
    }
    areas.add(box("room over the floor", indoors, symmetryX(), floorY, innerX, topY));
    areas.add(box("outdoors over the ground", outdoors, outerX, groundY, farX(), topY));
    return new Detail(
        with.title(),
        with.geometry(),
        with.view(),
        areas,
        List.of(indoors, outdoors),
        stretches(floor).subList(0, 1),
        List.of(),
        List.of(),
        List.of());
  }
}
