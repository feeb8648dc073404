package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.Conditions.Kind;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;

/**
 * Reads what each edge of a partition faces: first what is laid on its far side, then what the
 * stretches on it say, the last one counting; then the films by the direction of heat flow.
 */
final class OutlineReading {
  private final Detail detail;
  private final Partition partition;
  private final FilmSet filmSet;
  private final List<Fill> fills;
  private final Material[] materials;
  private final Kind[] kinds;
  private final int[] spaces;
  private final FilmRule[] rules;
  private final double[] films;
  private final double[] flows;
  private final Area.Role[] roles;
  private final BitSet glazing = new BitSet();
  private final BitSet symmetry = new BitSet();
  private final BitSet stated = new BitSet();
  private final BitSet ownFilm = new BitSet();
  private final List<Fault> faults = new ArrayList<>();
  private final List<CutOffPlane> cutOffPlanes;
  private final List<Assumption> assumptions = new ArrayList<>();

  OutlineReading(Detail detail, Partition partition, FilmSet filmSet) {
    this.detail = detail;
    this.partition = partition;
    this.filmSet = filmSet;
    fills = detail.fills();
    for (Fill fill : fills) {
      if (fill instanceof AirCavity) {
        throw new IllegalArgumentException(fill.name() + " has not been taken apart yet");
      }
    }
    materials = conductingMaterials(fills);
    int edges = partition.edgeCount();
    kinds = new Kind[edges];
    spaces = new int[edges];
    rules = new FilmRule[edges];
    films = new double[edges];
    flows = new double[edges];
    roles = new Area.Role[edges];
    AreaLookup areas = new AreaLookup(detail, partition);
    for (int edge = 0; edge < edges; edge++) {
      kinds[edge] = Kind.NONE;
      spaces[edge] = -1;
      roles[edge] = Area.Role.OTHER;
      if (outline(edge)) {
        readFarSide(edge);
        readStretches(edge);
        Area area = areas.onEdge(edge, conductsLeft(edge));
        if (area != null) {
          roles[edge] = area.role();
          if (area.glazing()) {
            glazing.set(edge);
          }
        }
      }
    }
    assumptions.addAll(new FilmChoice(this).choose());
    cutOffPlanes = new CutOffPlanes(this).find();
    assumptions.addAll(new OutlineAssumptions(this).list());
  }

  private static Material[] conductingMaterials(List<Fill> fills) {
    Material[] conducting = new Material[fills.size()];
    for (int label = 0; label < conducting.length; label++) {
      if (fills.get(label) instanceof Material material && material.conductivityWPerMK() > 0) {
        conducting[label] = material;
      }
    }
    return conducting;
  }

  private void readFarSide(int edge) {
    int label = conductsLeft(edge) ? partition.rightLabel(edge) : partition.leftLabel(edge);
    if (label == Partition.NONE) {
      kinds[edge] = onAxis(edge) ? Kind.AXIS : Kind.CUT_OFF;
    } else if (fills.get(label) instanceof Space space) {
      int index = detail.spaceIndex(space.name());
      if (index < 0) {
        throw new IllegalArgumentException(space.name() + " is laid but not among the spaces");
      }
      face(edge, index, space.films(filmSet));
    } else if (fills.get(label) instanceof VentilatedAir air) {
      face(edge, detail.spaceIndex(air.space()), air.film());
    } else {
      kinds[edge] = Kind.HOLLOW;
    }
  }

  /** Whether an edge lies on the axis of a body of revolution. */
  private boolean onAxis(int edge) {
    return detail.geometry() == Geometry.AXISYMMETRIC
        && onAxis(partition.x(partition.edgeStart(edge)))
        && onAxis(partition.x(partition.edgeEnd(edge)));
  }

  private boolean onAxis(double localX) {
    return Math.abs(partition.origin().x() + localX) <= Resolution.STANDARD.snapM();
  }

  private void readStretches(int edge) {
    boolean zone = false;
    for (int index : partition.linesOn(edge)) {
      if (index >= detail.stretches().size()) {
        zone = true;
        continue;
      }
      Stretch stretch = detail.stretches().get(index);
      if (stretch.glazing()) {
        glazing.set(edge);
      }
      if (stretch.condition().isPresent() && kinds[edge] == Kind.AXIS) {
        onAxis(stretch, stretch.condition().get());
      } else if (stretch.condition().isPresent()) {
        apply(edge, stretch, stretch.condition().get());
      }
    }
    if (zone && reducible(edge)) {
      rules[edge] = FilmRule.ISO_10077_2_REDUCED;
    }
  }

  /** The axis has no surface; that no heat crosses it goes without saying. */
  private void onAxis(Stretch stretch, EdgeCondition condition) {
    if (!(condition instanceof EdgeCondition.CutOff)) {
      add(
          new Fault(
              "stretch",
              stretch.name(),
              "runs along the axis, where a body of revolution has no surface; end it at the axis",
              Optional.of(stretch.along().get(0))));
    }
  }

  private void add(Fault fault) {
    if (!faults.contains(fault)) {
      faults.add(fault);
    }
  }

  /**
   * Whether the film of an edge is the standard's inside one for heat loss, which gives way to the
   * reduced one at inner corners of frames; a film typed on a stretch does not.
   */
  boolean reducible(int edge) {
    return filmSet == FilmSet.HEAT_LOSS
        && kinds[edge] == Kind.FILM
        && !ownFilm.get(edge)
        && FilmRule.ISO_6946_INSIDE.equals(rules[edge]);
  }

  private void apply(int edge, Stretch stretch, EdgeCondition condition) {
    spaces[edge] = -1;
    rules[edge] = null;
    flows[edge] = 0;
    symmetry.clear(edge);
    ownFilm.clear(edge);
    stated.set(edge);
    if (condition instanceof EdgeCondition.HeatFlow flow) {
      kinds[edge] = Kind.FLOW;
      flows[edge] = flow.densityWPerM2();
    } else if (condition instanceof EdgeCondition.CutOff cutOff) {
      kinds[edge] = Kind.CUT_OFF;
      symmetry.set(edge, cutOff.symmetry());
    } else if (condition instanceof EdgeCondition.Faces faces) {
      int index = detail.spaceIndex(faces.space());
      if (index < 0) {
        kinds[edge] = Kind.CUT_OFF;
        unknownSpace(stretch, faces);
        return;
      }
      Optional<FilmRule> own = filmSet == FilmSet.HEAT_LOSS ? faces.heatLoss() : faces.surface();
      ownFilm.set(edge, own.isPresent());
      face(edge, index, own.orElse(detail.spaces().get(index).films(filmSet)));
    }
  }

  private void unknownSpace(Stretch stretch, EdgeCondition.Faces faces) {
    add(
        new Fault(
            "stretch",
            stretch.name(),
            "faces '" + faces.space() + "', which is not one of the spaces",
            Optional.of(stretch.along().get(0))));
  }

  private void face(int edge, int space, FilmRule rule) {
    kinds[edge] = rule.fixedTemperature() ? Kind.FIXED : Kind.FILM;
    spaces[edge] = space;
    rules[edge] = rule;
  }

  private boolean conducts(int label) {
    return label != Partition.NONE && materials[label] != null;
  }

  /** Whether exactly one side of an edge conducts. */
  boolean outline(int edge) {
    return conducts(partition.leftLabel(edge)) != conducts(partition.rightLabel(edge));
  }

  /** Whether both sides of an edge conduct. */
  boolean inside(int edge) {
    return conducts(partition.leftLabel(edge)) && conducts(partition.rightLabel(edge));
  }

  /** Whether the left side of an edge conducts. */
  boolean conductsLeft(int edge) {
    return conducts(partition.leftLabel(edge));
  }

  Detail detail() {
    return detail;
  }

  Partition partition() {
    return partition;
  }

  FilmSet filmSet() {
    return filmSet;
  }

  List<Fill> fills() {
    return fills;
  }

  Material[] materials() {
    return materials;
  }

  Kind[] kinds() {
    return kinds;
  }

  int[] spaces() {
    return spaces;
  }

  FilmRule rule(int edge) {
    return rules[edge];
  }

  double[] films() {
    return films;
  }

  double[] flows() {
    return flows;
  }

  Area.Role[] roles() {
    return roles;
  }

  BitSet glazing() {
    return glazing;
  }

  BitSet symmetry() {
    return symmetry;
  }

  /** Edges whose condition a stretch states. */
  BitSet stated() {
    return stated;
  }

  List<Fault> faults() {
    return faults;
  }

  List<CutOffPlane> cutOffPlanes() {
    return cutOffPlanes;
  }

  List<Assumption> assumptions() {
    return assumptions;
  }
}
