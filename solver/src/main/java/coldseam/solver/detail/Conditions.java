package coldseam.solver.detail;

import coldseam.mesh.partition.Partition;
import java.util.List;

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
    HOLLOW
  }

  private Conditions() {}

  /**
   * Works out the condition of every edge.
   *
   * @param detail the detail
   * @param partition its areas and stretches; a stretch's index is its line label
   * @param filmSet which films
   * @return the conditions
   * @throws DetailException if a space faces nothing, a stretch lies on no outline, or a part of
   *     the section touches no space
   */
  public static Conditions of(Detail detail, Partition partition, FilmSet filmSet) {
    throw new UnsupportedOperationException();
  }

  /** The film set. */
  public FilmSet filmSet() {
    throw new UnsupportedOperationException();
  }

  /** The kind of a partition edge. */
  public Kind kind(int partitionEdge) {
    throw new UnsupportedOperationException();
  }

  /** Index of the space that a FILM or FIXED edge faces, else −1. */
  public int space(int partitionEdge) {
    throw new UnsupportedOperationException();
  }

  /** Rs of a FILM edge, m²·K/W; 0 on other edges. */
  public double filmM2KPerW(int partitionEdge) {
    throw new UnsupportedOperationException();
  }

  /** Heat flow into the detail on a FLOW edge, W/m²; 0 on other edges. */
  public double flowWPerM2(int partitionEdge) {
    throw new UnsupportedOperationException();
  }

  /** Indices of the stretches on an edge, ascending. */
  public List<Integer> stretches(int partitionEdge) {
    throw new UnsupportedOperationException();
  }

  /** Whether an edge counts as glazing or frame. */
  public boolean glazing(int partitionEdge) {
    throw new UnsupportedOperationException();
  }

  /** Whether a cut-off edge is marked as a plane of symmetry. */
  public boolean symmetry(int partitionEdge) {
    throw new UnsupportedOperationException();
  }

  /** Whether triangles with this label conduct: the label's fill is a material with λ &gt; 0. */
  public boolean conducts(int label) {
    throw new UnsupportedOperationException();
  }

  /** The material of a label that conducts. */
  public Material material(int label) {
    throw new UnsupportedOperationException();
  }

  /** How many spaces the detail has. */
  public int spaceCount() {
    throw new UnsupportedOperationException();
  }

  /** What was chosen: films by direction, cut-off planes. */
  public List<Assumption> assumptions() {
    throw new UnsupportedOperationException();
  }
}
