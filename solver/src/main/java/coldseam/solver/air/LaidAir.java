package coldseam.solver.air;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.partition.Throats;
import coldseam.mesh.plane.Point;
import coldseam.solver.cavity.Ventilation;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.AirCavity.Rule;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.FilmRule;
import coldseam.solver.detail.Material;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.VentilatedAir;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * A detail whose air is laid piece by piece: closed and slightly ventilated pieces as materials,
 * well ventilated ones as parts of their space.
 */
final class LaidAir {
  /** Conductivity of still air, until a cavity has its own, W/(m·K). */
  private static final double STILL_W_PER_MK = 0.025;

  /** Width at a bend of a layer over its thickness, up to which it is cut there. */
  private static final double BEND = 1.2;

  private static final FilmRule STILL_AIR =
      new FilmRule(
          0.10,
          0.13,
          0.17,
          Double.NaN,
          "ISO 6946, well ventilated air layer: Rsi on the construction behind it");

  /**
   * One cavity.
   *
   * @param name name of the fill it becomes
   * @param pieces the pieces it consists of
   * @param classed how it is taken
   */
  record Group(String name, List<Piece> pieces, Piece.Classed classed) {
    boolean well() {
      return classed.well();
    }
  }

  private final Detail drawn;
  private List<Piece> pieces;
  private List<Piece.Classed> classed;

  /** The piece that each piece was cut from where openings are wide, or itself. */
  private int[] parent;

  /** The class of each piece that is a leg of a layer, or null. */
  private Piece.Classed[] inherited;

  private Detail detail;
  private Partition partition;
  private Rims rims;
  private List<Group> groups;

  LaidAir(Detail drawn) {
    this.drawn = drawn;
    pieces = AirPieces.of(drawn);
    parent = new int[pieces.size()];
    for (int p = 0; p < parent.length; p++) {
      parent[p] = p;
    }
    inherited = new Piece.Classed[pieces.size()];
    layPieces();
    cutAgain();
    groups = grouped();
    boolean same = groups.size() == pieces.size();
    for (Group group : groups) {
      same &= !group.well();
    }
    if (!same) {
      layGroups();
    }
  }

  Detail detail() {
    return detail;
  }

  Partition partition() {
    return partition;
  }

  Rims rims() {
    return rims;
  }

  List<Group> groups() {
    return groups;
  }

  /** Every piece a material of its own, so that what it borders on can be seen. */
  private void layPieces() {
    List<Area> areas = others();
    List<String> names = names(pieces.size());
    for (int p = 0; p < names.size(); p++) {
      areas.add(area(pieces.get(p), Material.of(names.get(p), STILL_W_PER_MK)));
    }
    lay(areas, names);
    classed = Ventilations.of(detail, rims, pieces, inherited);
  }

  private List<Area> others() {
    List<Area> areas = new ArrayList<>();
    for (Area area : drawn.areas()) {
      if (!(area.fill() instanceof AirCavity)) {
        areas.add(area);
      }
    }
    return areas;
  }

  private static Area area(Piece piece, Fill fill) {
    Area source = piece.source();
    return new Area(fill.name(), fill, piece.rings(), source.glazing(), source.role());
  }

  private void lay(List<Area> areas, List<String> names) {
    detail = drawn.with(areas, drawn.assumptions());
    partition = AirPieces.partition(detail);
    rims = new Rims(detail, partition, Rims.pieceOfLabel(detail, names), names.size());
  }

  /** "cavity 1", "cavity 2", … or, if a fill is called so, "air cavity 1", … */
  private List<String> names(int count) {
    Set<String> taken = new HashSet<>();
    for (Fill fill : drawn.fills()) {
      taken.add(fill.name());
    }
    for (Space space : drawn.spaces()) {
      taken.add(space.name());
    }
    String stem = "cavity ";
    while (true) {
      List<String> names = new ArrayList<>(count);
      for (int i = 1; i <= count; i++) {
        names.add(stem + i);
      }
      boolean free = true;
      for (String name : names) {
        free &= !taken.contains(name);
      }
      if (free) {
        return names;
      }
      stem = "air " + stem;
    }
  }

  /** Cuts pieces once more where they are as narrow as {@link #widthToCut}. */
  private void cutAgain() {
    List<Piece> finer = new ArrayList<>();
    List<Integer> from = new ArrayList<>();
    int[] faceOfPiece = faces();
    for (int p = 0; p < pieces.size(); p++) {
      double width = widthToCut(p);
      if (width == 0) {
        finer.add(pieces.get(p));
        from.add(p);
        continue;
      }
      for (List<List<Point>> rings : Throats.pieces(partition, faceOfPiece[p], width)) {
        finer.add(pieces.get(p).with(rings));
        from.add(p);
      }
    }
    if (finer.size() == pieces.size()) {
      return;
    }
    pieces = new ArrayList<>(finer);
    pieces.sort(AirPieces.LEFT_TO_RIGHT);
    parent = new int[finer.size()];
    inherited = new Piece.Classed[finer.size()];
    for (int p = 0; p < parent.length; p++) {
      int before = from.get(finer.indexOf(pieces.get(p)));
      boolean leg = classed.get(before).rule() == Rule.LAYER;
      parent[p] = leg ? -1 - p : before;
      inherited[p] = leg ? classed.get(before) : null;
    }
    layPieces();
  }

  /**
   * The width down to which a piece is cut again, m; 0 for not at all.
   *
   * <p>A frame's air that is open to a space by a wide mouth belongs to that space only as far as
   * its narrowest part is wide as well; what lies behind a slit is a cavity that opens by that
   * slit. A layer that goes round corners is cut there into straight legs, each with its own
   * direction of heat flow.
   */
  private double widthToCut(int p) {
    Piece.Classed of = classed.get(p);
    if (of.rule() == Rule.LAYER) {
      return BEND * pieces.get(p).thicknessIfBentM();
    }
    return of.well() && !of.ventilationStated() ? Ventilation.SLIGHTLY_VENTILATED_SLIT_M : 0;
  }

  /** The face of each piece. */
  private int[] faces() {
    int[] face = new int[pieces.size()];
    List<Fill> fills = detail.fills();
    int first = detail.areas().size() - pieces.size();
    for (int f = 0; f < partition.faceCount(); f++) {
      for (int p = 0; p < face.length; p++) {
        if (detail.areas().get(first + p).fill() == fills.get(partition.faceLabel(f))) {
          face[p] = f;
        }
      }
    }
    return face;
  }

  /** Pieces of one parent that touch and are not well ventilated are one cavity. */
  private List<Group> grouped() {
    int[] root = new int[pieces.size()];
    for (int p = 0; p < root.length; p++) {
      root[p] = p;
    }
    for (int p = 0; p < root.length; p++) {
      for (int edge : rims.edges(p)) {
        int other = rims.farPiece(p, edge);
        if (other >= 0
            && parent[other] == parent[p]
            && !classed.get(p).well()
            && !classed.get(other).well()) {
          int a = root(root, p);
          int b = root(root, other);
          root[Math.max(a, b)] = Math.min(a, b);
        }
      }
    }
    List<List<Integer>> members = new ArrayList<>();
    int[] group = new int[root.length];
    for (int p = 0; p < root.length; p++) {
      int r = root(root, p);
      if (r == p) {
        group[p] = members.size();
        members.add(new ArrayList<>());
      } else {
        group[p] = group[r];
      }
      members.get(group[p]).add(p);
    }
    List<String> names = names(members.size());
    List<Group> all = new ArrayList<>();
    for (int g = 0; g < members.size(); g++) {
      List<Piece> parts = new ArrayList<>();
      Piece.Classed widest = classed.get(members.get(g).get(0));
      for (int p : members.get(g)) {
        parts.add(pieces.get(p));
        if (classed.get(p).slitM() > widest.slitM()) {
          widest = classed.get(p);
        }
      }
      all.add(new Group(names.get(g), parts, widest));
    }
    return all;
  }

  private static int root(int[] root, int of) {
    int at = of;
    while (root[at] != at) {
      at = root[at];
    }
    return at;
  }

  private void layGroups() {
    List<Area> areas = others();
    List<String> names = new ArrayList<>();
    for (Group group : groups) {
      Fill fill = fill(group);
      // air of a space is no cavity
      names.add(group.well() ? "" : fill.name());
      for (Piece piece : group.pieces()) {
        areas.add(area(piece, fill));
      }
    }
    lay(areas, names);
  }

  private Fill fill(Group group) {
    if (!group.well()) {
      return Material.of(group.name(), STILL_W_PER_MK);
    }
    String space = group.classed().space().orElseThrow();
    return group.classed().rule() == Rule.FRAME
        ? drawn.spaces().get(drawn.spaceIndex(space))
        : new VentilatedAir(group.name(), space, STILL_AIR);
  }
}
