package coldseam.cli.plot;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Geometry;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.VentilatedAir;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/** What of a detail every plot draws, in the local coordinates of its partition, m. */
final class DrawnSection {
  /** Share of the extent below which a corner of a line is none. */
  private static final double STRAIGHT = 1e-7;

  /**
   * A connected region of one fill.
   *
   * @param label index of the fill
   * @param rings outer ring first
   * @param widthM area over half the perimeter: how thick a sheet is
   */
  record Face(int label, List<Polyline> rings, double widthM) {}

  /**
   * A piece of surface under one condition, the solid to its left.
   *
   * @param kind film, fixed temperature, given flow, or the rim of a hollow
   * @param space index of the space it faces, −1 for none
   * @param heatLossRs film for heat flow, m²·K/W
   * @param surfaceRs film for surface temperatures, m²·K/W; NaN if not solved
   * @param flowWPerM2 given flow into the section
   * @param line the surface
   */
  record Surface(
      Conditions.Kind kind,
      int space,
      double heatLossRs,
      double surfaceRs,
      double flowWPerM2,
      Polyline line) {}

  /**
   * A straight cut-off plane, the solid to its left.
   *
   * @param symmetry whether it is a plane of symmetry
   * @param line from end to end
   * @param layers the pieces of it by fill, in order
   */
  record CutOff(boolean symmetry, Polyline line, List<Layer> layers) {}

  /**
   * A piece of a cut-off plane in one fill.
   *
   * @param label index of the fill
   * @param fromM distance from the start of the plane
   * @param toM distance from the start of the plane
   */
  record Layer(int label, double fromM, double toM) {}

  private final Result result;
  private final Partition partition;
  private final Conditions conditions;
  private final List<Fill> fills;
  private final List<Face> faces = new ArrayList<>();
  private final List<Surface> surfaces = new ArrayList<>();
  private final List<CutOff> cutOffs = new ArrayList<>();
  private final List<Polyline> joints = new ArrayList<>();
  private Box bounds = Box.EMPTY;
  private Optional<Polyline> axis = Optional.empty();

  private DrawnSection(Result result) {
    this.result = result;
    Solution solution = result.heatLoss();
    partition = solution.partition();
    conditions = solution.conditions();
    fills = result.detail().fills();
  }

  static DrawnSection of(Result result) {
    DrawnSection section = new DrawnSection(result);
    section.collectFaces();
    section.collectSurfaces();
    section.collectCutOffs();
    section.collectJoints();
    if (result.detail().geometry() == Geometry.AXISYMMETRIC) {
      double x = -section.partition.origin().x();
      section.axis = Optional.of(Polyline.of(x, section.bounds.y0(), x, section.bounds.y1()));
    }
    return section;
  }

  private void collectFaces() {
    for (int face = 0; face < partition.faceCount(); face++) {
      List<Polyline> rings = new ArrayList<>();
      double perimeter = 0;
      for (int[] vertices : partition.faceRings(face)) {
        Polyline.Builder ring = new Polyline.Builder();
        for (int v : vertices) {
          ring.add(partition.x(v), partition.y(v));
        }
        Polyline closed = ring.closed();
        perimeter += closed.length();
        rings.add(closed);
      }
      int label = partition.faceLabel(face);
      faces.add(new Face(label, rings, 2 * partition.faceArea(face) / perimeter));
      if (solid(label)) {
        bounds = bounds.with(rings.get(0).bounds());
      }
    }
  }

  /** The conditions with the films for surface temperatures, if those were solved. */
  private Optional<Conditions> otherConditions() {
    return result.surface().isPresent() && result.surface().get().partition() == partition
        ? Optional.of(result.surface().get().conditions())
        : Optional.empty();
  }

  /** Edges joined with the solid to their left. */
  private abstract class SolidOnLeft implements EdgeChains.Rule {
    @Override
    public boolean asDrawn(int edge) {
      return solidOnLeft(edge);
    }
  }

  private final class OneSurface extends SolidOnLeft {
    private final Optional<Conditions> other;

    private OneSurface(Optional<Conditions> other) {
      this.other = other;
    }

    @Override
    public boolean included(int edge) {
      return isSurface(conditions.kind(edge));
    }

    @Override
    public boolean together(int edge, int next) {
      return sameSurface(edge, next) && sameSurfaceFilm(other, edge, next);
    }
  }

  private void collectSurfaces() {
    Optional<Conditions> other = otherConditions();
    for (EdgeChains.Chain chain : EdgeChains.of(partition, new OneSurface(other))) {
      int edge = chain.firstEdge();
      surfaces.add(
          new Surface(
              conditions.kind(edge),
              conditions.space(edge),
              conditions.filmM2KPerW(edge),
              other.isEmpty() ? Double.NaN : other.get().filmM2KPerW(edge),
              conditions.flowWPerM2(edge),
              Simplification.of(chain.line(), STRAIGHT * extentM())));
    }
  }

  private static boolean isSurface(Conditions.Kind kind) {
    return switch (kind) {
      case FILM, FIXED, FLOW, HOLLOW -> true;
      case NONE, CUT_OFF, AXIS -> false;
    };
  }

  private boolean sameSurface(int a, int b) {
    return conditions.kind(a) == conditions.kind(b)
        && conditions.space(a) == conditions.space(b)
        && conditions.filmM2KPerW(a) == conditions.filmM2KPerW(b)
        && conditions.flowWPerM2(a) == conditions.flowWPerM2(b);
  }

  private static boolean sameSurfaceFilm(Optional<Conditions> other, int a, int b) {
    return other.isEmpty() || other.get().filmM2KPerW(a) == other.get().filmM2KPerW(b);
  }

  private final class OnePlane extends SolidOnLeft {
    @Override
    public boolean included(int edge) {
      return conditions.kind(edge) == Conditions.Kind.CUT_OFF;
    }

    @Override
    public boolean together(int edge, int next) {
      return conditions.symmetry(edge) == conditions.symmetry(next) && parallel(edge, next);
    }
  }

  private void collectCutOffs() {
    for (EdgeChains.Chain chain : EdgeChains.of(partition, new OnePlane())) {
      List<Layer> layers = new ArrayList<>();
      double at = 0;
      for (int edge : chain.edges()) {
        int label = solidOnLeft(edge) ? partition.leftLabel(edge) : partition.rightLabel(edge);
        double to = at + partition.edgeLength(edge);
        int last = layers.size() - 1;
        if (last >= 0 && layers.get(last).label() == label) {
          layers.set(last, new Layer(label, layers.get(last).fromM(), to));
        } else {
          layers.add(new Layer(label, at, to));
        }
        at = to;
      }
      Polyline line = chain.line();
      int end = line.closed() ? 0 : line.size() - 1;
      cutOffs.add(
          new CutOff(
              conditions.symmetry(chain.firstEdge()),
              Polyline.of(line.x(0), line.y(0), line.x(end), line.y(end)),
              layers));
    }
  }

  private boolean parallel(int a, int b) {
    double ax = partition.x(partition.edgeEnd(a)) - partition.x(partition.edgeStart(a));
    double ay = partition.y(partition.edgeEnd(a)) - partition.y(partition.edgeStart(a));
    double bx = partition.x(partition.edgeEnd(b)) - partition.x(partition.edgeStart(b));
    double by = partition.y(partition.edgeEnd(b)) - partition.y(partition.edgeStart(b));
    return Math.abs(ax * by - ay * bx) <= 1e-6 * Math.hypot(ax, ay) * Math.hypot(bx, by);
  }

  private void collectJoints() {
    for (int e = 0; e < partition.edgeCount(); e++) {
      int left = partition.leftLabel(e);
      int right = partition.rightLabel(e);
      if (left != right && solid(left) && solid(right)) {
        joints.add(
            Polyline.of(
                partition.x(partition.edgeStart(e)),
                partition.y(partition.edgeStart(e)),
                partition.x(partition.edgeEnd(e)),
                partition.y(partition.edgeEnd(e))));
      }
    }
  }

  private boolean solidOnLeft(int edge) {
    int label = partition.leftLabel(edge);
    return label != Partition.NONE && conditions.conducts(label);
  }

  /** Whether a label's fill is drawn as something solid or hollow, not as open air. */
  boolean solid(int label) {
    return label != Partition.NONE
        && !(fills.get(label) instanceof Space)
        && !(fills.get(label) instanceof VentilatedAir);
  }

  /** Whether heat is conducted in a fill. */
  boolean conducts(int label) {
    return conditions.conducts(label);
  }

  Detail detail() {
    return result.detail();
  }

  List<Fill> fills() {
    return fills;
  }

  List<Face> faces() {
    return faces;
  }

  /**
   * The faces of a fill, the largest first.
   *
   * @param label index of the fill
   * @return indices in {@link #faces()}
   */
  List<Integer> largestFirst(int label) {
    List<Integer> found = new ArrayList<>();
    for (int face = 0; face < faces.size(); face++) {
      if (faces.get(face).label() == label) {
        found.add(face);
      }
    }
    found.sort(new LargestFirst());
    return found;
  }

  private final class LargestFirst implements Comparator<Integer> {
    @Override
    public int compare(Integer a, Integer b) {
      return Double.compare(partition.faceArea(b), partition.faceArea(a));
    }
  }

  /** The box around a face on the sheet. */
  Box bounds(int face, Panel panel) {
    return panel.on(faces.get(face).rings().get(0).bounds());
  }

  List<Surface> surfaces() {
    return surfaces;
  }

  /** The axis that the section is turned about, as far as the section goes. */
  Optional<Polyline> axis() {
    return axis;
  }

  List<CutOff> cutOffs() {
    return cutOffs;
  }

  /** Edges between two materials. */
  List<Polyline> joints() {
    return joints;
  }

  private final class OneStretch extends SolidOnLeft {
    private final int stretch;

    private OneStretch(int stretch) {
      this.stretch = stretch;
    }

    @Override
    public boolean included(int edge) {
      return conditions.stretches(edge).contains(stretch);
    }

    @Override
    public boolean together(int edge, int next) {
      return true;
    }
  }

  /** The edges that a stretch lies on, joined to lines with the solid to their left. */
  List<Polyline> stretch(int index) {
    List<Polyline> lines = new ArrayList<>();
    for (EdgeChains.Chain chain : EdgeChains.of(partition, new OneStretch(index))) {
      lines.add(Simplification.of(chain.line(), STRAIGHT * extentM()));
    }
    return lines;
  }

  /** The box around everything but open air, m. */
  Box bounds() {
    return bounds;
  }

  /** The longer side of {@link #bounds()}, m. */
  double extentM() {
    return Math.max(bounds.width(), bounds.height());
  }

  /** A place of the drawing in local coordinates. */
  double localX(Point point) {
    return point.x() - partition.origin().x();
  }

  /** A place of the drawing in local coordinates. */
  double localY(Point point) {
    return point.y() - partition.origin().y();
  }

  /**
   * Index of the fill at a label that is the space of an index, or −1 if the space is not laid.
   *
   * @param space index of a space
   */
  int labelOfSpace(int space) {
    String name = detail().spaces().get(space).name();
    for (int label = 0; label < fills.size(); label++) {
      if (fills.get(label).name().equals(name)) {
        return label;
      }
    }
    return -1;
  }

  Partition partition() {
    return partition;
  }

  /**
   * Vertices that are ends of edges of the solid and lie on no cut-off plane, planes of symmetry
   * excepted.
   */
  List<double[]> innerCorners() {
    boolean[] inner = new boolean[partition.vertexCount()];
    boolean[] cut = new boolean[partition.vertexCount()];
    for (int e = 0; e < partition.edgeCount(); e++) {
      boolean drawn = solid(partition.leftLabel(e)) || solid(partition.rightLabel(e));
      boolean onCut = conditions.kind(e) == Conditions.Kind.CUT_OFF && !conditions.symmetry(e);
      for (int v : new int[] {partition.edgeStart(e), partition.edgeEnd(e)}) {
        inner[v] |= drawn;
        cut[v] |= onCut;
      }
    }
    List<double[]> corners = new ArrayList<>();
    for (int v = 0; v < inner.length; v++) {
      if (inner[v] && !cut[v]) {
        corners.add(new double[] {partition.x(v), partition.y(v)});
      }
    }
    return corners;
  }
}
