package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Conditions.Kind;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;

/**
 * Places the reduced film at the inner corners of a frame (ISO 10077-2): where two inside surfaces
 * meet at 120° or less, measured in the room, the film is 0.20 m²·K/W over the height d of the
 * protrusion, the one of the two surfaces that runs more across the frame, and over the same length
 * beside it, at most 30 mm (see {@link CornerRule}). A first partition tells the outline; the zones
 * become lines of the final one.
 */
public final class CornerZones {
  /** Longest reach from a corner, m: ISO 10077-2. */
  private static final double LONGEST_M = 0.030;

  /** Surfaces that meet at a wider angle do not see enough of each other; cosine of the turn. */
  private static final double LEAST_TURN_COSINE = 0.5 + 1e-6;

  /** Part of a length that is rounding. */
  private static final double ROUNDING = 1e-9;

  /** A surface goes on round bends as long as it runs within 45° of where it began. */
  private static final double SAME_SURFACE_COSINE = Math.sqrt(0.5) - 1e-6;

  private final Detail detail;
  private final CornerRule rule;
  private final OutlineReading reading;
  private final Partition partition;
  private final int[] leaving;
  private final int[] arriving;
  private final double[] across;
  private final List<CornerZone> zones = new ArrayList<>();
  private final List<Assumption> assumptions = new ArrayList<>();

  /** A surface from a corner on: its points, the corner first, its length and how far it rises. */
  private record Surface(List<Point> points, double lengthM, double heightM, double steepness) {}

  private CornerZones(Detail detail, Partition partition, Wanted.Frame frame) {
    this.detail = detail;
    this.partition = partition;
    rule = frame.corners();
    reading = new OutlineReading(detail, partition, FilmSet.HEAT_LOSS);
    leaving = new int[partition.vertexCount()];
    arriving = new int[partition.vertexCount()];
    Arrays.fill(leaving, -1);
    Arrays.fill(arriving, -1);
    across = acrossFrame();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (onWarmSide(edge, frame)) {
        // Where two parts of the section touch, a surface ends.
        leaving[start(edge)] = leaving[start(edge)] == -1 ? edge : -2;
        arriving[end(edge)] = arriving[end(edge)] == -1 ? edge : -2;
      }
    }
  }

  /**
   * The detail with its corner zones; one that asks for no frame, or whose frame wants none, stays
   * as it is.
   *
   * @param detail the detail, made ready by {@link FrameDetail}
   * @param partition its partition
   * @return the detail to be partitioned again, or the same one if it has no inner corner
   */
  public static Detail placed(Detail detail, Partition partition) {
    for (Wanted wanted : detail.wanted()) {
      if (wanted instanceof Wanted.Frame frame && frame.corners() != CornerRule.NONE) {
        CornerZones all = new CornerZones(detail, partition, frame);
        all.find();
        return all.zones.isEmpty() ? detail : all.detailWithZones();
      }
    }
    return detail;
  }

  private Detail detailWithZones() {
    List<Assumption> lines = new ArrayList<>(detail.assumptions());
    lines.addAll(assumptions);
    return new Detail(
        detail.title(),
        detail.geometry(),
        detail.view(),
        detail.areas(),
        detail.spaces(),
        detail.stretches(),
        detail.flanks(),
        detail.wanted(),
        lines,
        zones);
  }

  private boolean onWarmSide(int edge, Wanted.Frame frame) {
    return reading.kinds()[edge] == Kind.FILM
        && reading.reducible(edge)
        && frame.warm().contains(detail.spaces().get(reading.spaces()[edge]).name());
  }

  /** The direction across the frame: that of the end of its glazing or panel; {0, 0} if none. */
  private double[] acrossFrame() {
    for (CutOffPlane plane : reading.cutOffPlanes()) {
      if (reading.roles()[plane.edges().get(0)] != Area.Role.OTHER) {
        double dx = partition.x(plane.last()) - partition.x(plane.first());
        double dy = partition.y(plane.last()) - partition.y(plane.first());
        double length = Math.hypot(dx, dy);
        return new double[] {dx / length, dy / length};
      }
    }
    return new double[] {0, 0};
  }

  private void find() {
    for (int vertex = 0; vertex < partition.vertexCount(); vertex++) {
      if (leaving[vertex] >= 0 && arriving[vertex] >= 0 && innerCorner(vertex)) {
        place(vertex, surface(vertex, false), surface(vertex, true));
      }
    }
  }

  /** Walked with the section on the left, the outline turns right by 60° or more. */
  private boolean innerCorner(int vertex) {
    double[] in = direction(arriving[vertex], true);
    double[] out = direction(leaving[vertex], true);
    return in[0] * out[1] - in[1] * out[0] < 0
        && in[0] * out[0] + in[1] * out[1] <= LEAST_TURN_COSINE;
  }

  private Surface surface(int corner, boolean forward) {
    int edge = forward ? leaving[corner] : arriving[corner];
    double[] first = direction(edge, forward);
    List<Point> points = new ArrayList<>(List.of(point(corner)));
    double length = 0;
    double height = 0;
    int guard = partition.edgeCount();
    while (edge >= 0 && guard-- > 0) {
      double[] run = direction(edge, forward);
      if (run[0] * first[0] + run[1] * first[1] < SAME_SURFACE_COSINE) {
        break;
      }
      int at = forward ? end(edge) : start(edge);
      points.add(point(at));
      length += partition.edgeLength(edge);
      height =
          (partition.x(at) - partition.x(corner)) * first[0]
              + (partition.y(at) - partition.y(corner)) * first[1];
      edge = forward ? leaving[at] : arriving[at];
    }
    double steepness =
        across[0] == 0 && across[1] == 0
            ? -length
            : Math.abs(first[0] * across[0] + first[1] * across[1]);
    return new Surface(points, length, height, steepness);
  }

  private void place(int corner, Surface before, Surface after) {
    boolean firstProjects = before.steepness() >= after.steepness();
    Surface projecting = firstProjects ? before : after;
    Surface beside = firstProjects ? after : before;
    double reach = Math.min(projecting.heightM(), LONGEST_M);
    double up = rule == CornerRule.WHOLE ? projecting.lengthM() : reach;
    List<Point> line = new ArrayList<>(part(projecting, up));
    Collections.reverse(line);
    List<Point> flat = part(beside, reach);
    line.addAll(flat.subList(1, flat.size()));
    zones.add(new CornerZone(line));
    boolean whole = rule == CornerRule.WHOLE;
    assumptions.add(
        new Assumption(
            "reduced film at the inner corner " + Wording.place(point(corner)),
            Wording.figure(FilmRule.ISO_10077_2_REDUCED.horizontalM2KPerW())
                + " m²·K/W over "
                + Wording.length(Math.min(up, projecting.lengthM()))
                + " of the protrusion and "
                + Wording.length(Math.min(reach, beside.lengthM()))
                + " beside it",
            whole
                ? "ISO 10077-2, films for heat loss, over the whole protrusion (corners: whole)"
                : "ISO 10077-2, films for heat loss, over at most 30 mm (corners: limited)"));
  }

  /** The points of a surface up to a length from the corner. */
  private static List<Point> part(Surface surface, double lengthM) {
    List<Point> part = new ArrayList<>(List.of(surface.points().get(0)));
    double left = lengthM;
    for (int i = 1; i < surface.points().size() && left > ROUNDING * lengthM; i++) {
      Point from = surface.points().get(i - 1);
      Point to = surface.points().get(i);
      double length = from.distance(to);
      double share = Math.min(1, left / length);
      part.add(
          share == 1
              ? to
              : new Point(
                  from.x() + share * (to.x() - from.x()), from.y() + share * (to.y() - from.y())));
      left -= length;
    }
    return part;
  }

  private double[] direction(int edge, boolean forward) {
    int from = forward ? start(edge) : end(edge);
    int to = forward ? end(edge) : start(edge);
    double dx = partition.x(to) - partition.x(from);
    double dy = partition.y(to) - partition.y(from);
    double length = Math.hypot(dx, dy);
    return new double[] {dx / length, dy / length};
  }

  private Point point(int vertex) {
    return new Point(
        partition.origin().x() + partition.x(vertex), partition.origin().y() + partition.y(vertex));
  }

  private int start(int edge) {
    return reading.conductsLeft(edge) ? partition.edgeStart(edge) : partition.edgeEnd(edge);
  }

  private int end(int edge) {
    return reading.conductsLeft(edge) ? partition.edgeEnd(edge) : partition.edgeStart(edge);
  }
}
