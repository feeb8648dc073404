package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import java.util.BitSet;
import java.util.List;
import java.util.Map;

/** What happens on every edge of the outline of the conducting section, for one film set. */
public final class Conditions {
  /** The kinds of edge. */
  public enum Kind {
    /** Not on the outline of the conducting section: inside it, or away from it. */
    NONE,
    /** Heat flows through a film to a space: (θ − θ_space)/Rs. */
    FILM,
    /** The surface has the temperature of a space. */
    FIXED,
    /** A given heat flow enters. */
    FLOW,
    /** A cut-off plane: nothing covers the other side, no heat crosses. */
    CUT_OFF,
    /** The rim of an area that conducts nothing: no heat crosses. */
    HOLLOW,
    /** The axis of a body of revolution: there is no surface. */
    AXIS
  }

  private final FilmSet filmSet;
  private final Geometry geometry;
  private final Partition partition;
  private final Material[] materials;
  private final Kind[] kinds;
  private final int[] spaces;
  private final double[] films;
  private final double[] flows;
  private final Area.Role[] roles;
  private final BitSet glazing;
  private final BitSet symmetry;
  private final int spaceCount;
  private final int stretchCount;
  private final List<CutOffPlane> cutOffPlanes;
  private final List<Assumption> assumptions;

  Conditions(OutlineReading reading) {
    filmSet = reading.filmSet();
    geometry = reading.detail().geometry();
    partition = reading.partition();
    materials = reading.materials();
    kinds = reading.kinds();
    spaces = reading.spaces();
    films = reading.films();
    flows = reading.flows();
    roles = reading.roles();
    glazing = reading.glazing();
    symmetry = reading.symmetry();
    spaceCount = reading.detail().spaces().size();
    stretchCount = reading.detail().stretches().size();
    cutOffPlanes = List.copyOf(reading.cutOffPlanes());
    assumptions = List.copyOf(reading.assumptions());
  }

  private Conditions(Conditions other, Material[] materials) {
    filmSet = other.filmSet;
    geometry = other.geometry;
    partition = other.partition;
    this.materials = materials;
    kinds = other.kinds;
    spaces = other.spaces;
    films = other.films;
    flows = other.flows;
    roles = other.roles;
    glazing = other.glazing;
    symmetry = other.symmetry;
    spaceCount = other.spaceCount;
    stretchCount = other.stretchCount;
    cutOffPlanes = other.cutOffPlanes;
    assumptions = other.assumptions;
  }

  /**
   * The same conditions with other conductivities.
   *
   * @param byName materials in place of those of the same name
   * @return the conditions
   */
  public Conditions with(Map<String, Material> byName) {
    Material[] replaced = materials.clone();
    for (int label = 0; label < replaced.length; label++) {
      if (replaced[label] != null) {
        replaced[label] = byName.getOrDefault(replaced[label].name(), replaced[label]);
      }
    }
    return new Conditions(this, replaced);
  }

  /**
   * Works out the condition of every edge.
   *
   * @param detail the detail
   * @param partition its areas and stretches; a stretch's index is its line label
   * @param filmSet which films
   * @return the conditions
   * @throws DetailException if a space faces nothing, a stretch lies on no outline, a part of the
   *     section touches no film and no fixed temperature, or nothing conducts; all such faults
   *     together
   * @throws IllegalArgumentException if the partition is not one of this detail
   */
  public static Conditions of(Detail detail, Partition partition, FilmSet filmSet) {
    OutlineReading reading = new OutlineReading(detail, partition, filmSet);
    List<Fault> faults = new DetailCheck(reading).faults();
    if (!faults.isEmpty()) {
      throw new DetailException(faults);
    }
    return new Conditions(reading);
  }

  /** The film set. */
  public FilmSet filmSet() {
    return filmSet;
  }

  /** What the section stands for. */
  public Geometry geometry() {
    return geometry;
  }

  /** The kind of a partition edge. */
  public Kind kind(int partitionEdge) {
    return kinds[partitionEdge];
  }

  /** Index of the space that a FILM or FIXED edge faces, else −1. */
  public int space(int partitionEdge) {
    return spaces[partitionEdge];
  }

  /** Rs of a FILM edge, m²·K/W; 0 on other edges. */
  public double filmM2KPerW(int partitionEdge) {
    return films[partitionEdge];
  }

  /** Heat flow into the detail on a FLOW edge, W/m²; 0 on other edges. */
  public double flowWPerM2(int partitionEdge) {
    return flows[partitionEdge];
  }

  /** Indices of the stretches on an edge, ascending. */
  public List<Integer> stretches(int partitionEdge) {
    List<Integer> lines = partition.linesOn(partitionEdge);
    int count = lines.size();
    while (count > 0 && lines.get(count - 1) >= stretchCount) {
      count--;
    }
    return lines.subList(0, count);
  }

  /** What the area on the conducting side of an outline edge is to a frame. */
  public Area.Role role(int partitionEdge) {
    return roles[partitionEdge];
  }

  /** Whether an edge counts as glazing or frame. */
  public boolean glazing(int partitionEdge) {
    return glazing.get(partitionEdge);
  }

  /** Whether a cut-off edge is marked as a plane of symmetry. */
  public boolean symmetry(int partitionEdge) {
    return symmetry.get(partitionEdge);
  }

  /** Whether triangles with this label conduct: the label's fill is a material with λ &gt; 0. */
  public boolean conducts(int label) {
    return label != Partition.NONE && materials[label] != null;
  }

  /**
   * The material of a label that conducts.
   *
   * @param label the label
   * @return its material
   * @throws IllegalArgumentException if the label does not conduct
   */
  public Material material(int label) {
    if (!conducts(label)) {
      throw new IllegalArgumentException("label " + label + " does not conduct");
    }
    return materials[label];
  }

  /** How many spaces the detail has. */
  public int spaceCount() {
    return spaceCount;
  }

  /** The straight runs of cut-off edges, in the order of their lowest edge. */
  public List<CutOffPlane> cutOffPlanes() {
    return cutOffPlanes;
  }

  /** What was chosen: films by direction, cut-off planes. */
  public List<Assumption> assumptions() {
    return assumptions;
  }
}
