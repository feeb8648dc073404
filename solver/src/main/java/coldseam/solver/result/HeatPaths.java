package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Conditions.Kind;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Space;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;

/**
 * Which spaces the material joins: the conducting faces that meet, be it in a point, make a part,
 * and heat flows between the spaces that one part faces, and on through floating spaces.
 */
final class HeatPaths {
  private final Detail detail;
  private final Outline outline;
  private final Partition partition;
  private final int[] part;
  private final Map<Integer, BitSet> faced = new TreeMap<>();
  private final BitSet heated = new BitSet();

  HeatPaths(Detail detail, Outline outline) {
    this.detail = detail;
    this.outline = outline;
    partition = outline.partition();
    part = singles(partition.faceCount());
    joinMeetingFaces();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      int space = outline.conditions().space(edge);
      if (space >= 0) {
        facedBy(conductingPart(edge)).set(space);
      }
      if (outline.conditions().kind(edge) == Kind.FLOW
          && outline.conditions().flowWPerM2(edge) != 0) {
        heated.set(conductingPart(edge));
      }
    }
  }

  private BitSet facedBy(int root) {
    BitSet spaces = faced.get(root);
    if (spaces == null) {
      spaces = new BitSet();
      faced.put(root, spaces);
    }
    return spaces;
  }

  private void joinMeetingFaces() {
    int[] faceAt = new int[partition.vertexCount()];
    Arrays.fill(faceAt, Partition.NONE);
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      if (conducts(partition.leftLabel(edge))) {
        joinAtEnds(edge, partition.leftFace(edge), faceAt);
      }
      if (conducts(partition.rightLabel(edge))) {
        joinAtEnds(edge, partition.rightFace(edge), faceAt);
      }
    }
  }

  private void joinAtEnds(int edge, int face, int[] faceAt) {
    for (int vertex : new int[] {partition.edgeStart(edge), partition.edgeEnd(edge)}) {
      if (faceAt[vertex] == Partition.NONE) {
        faceAt[vertex] = face;
      }
      join(part, faceAt[vertex], face);
    }
  }

  List<String> warnings() {
    List<String> warnings = unjoinedSpaces();
    warnings.addAll(detachedParts());
    return warnings;
  }

  /** Pairs of spaces that no part of the section joins, not by way of a floating space either. */
  private List<String> unjoinedSpaces() {
    int[] floating = Couplings.floating(detail);
    int[] chain = chainedByFloating(floating);
    BitSet fixed = new BitSet();
    for (BitSet spaces : faced.values()) {
      fixed.or(spaces);
    }
    for (int f : floating) {
      fixed.clear(f);
    }
    List<String> warnings = new ArrayList<>();
    for (int a = fixed.nextSetBit(0); a >= 0; a = fixed.nextSetBit(a + 1)) {
      for (int b = fixed.nextSetBit(a + 1); b >= 0; b = fixed.nextSetBit(b + 1)) {
        if (root(chain, a) != root(chain, b) && !onePartFaces(a, b)) {
          warnings.add(
              "no heat path joins "
                  + name(a)
                  + " and "
                  + name(b)
                  + ": no connected material faces both; L2D between them is 0");
        }
      }
    }
    return warnings;
  }

  /** Spaces joined by way of floating ones: of each chain all have one root. */
  private int[] chainedByFloating(int[] floating) {
    int[] chain = singles(detail.spaces().size());
    for (int f : floating) {
      for (BitSet spaces : faced.values()) {
        if (spaces.get(f)) {
          for (int space = spaces.nextSetBit(0); space >= 0; space = spaces.nextSetBit(space + 1)) {
            join(chain, f, space);
          }
        }
      }
      Space.Floating own = detail.spaces().get(f).floating().orElseThrow();
      if (own.conductanceWPerMK() > 0) {
        join(chain, f, detail.spaceIndex(own.to()));
      }
    }
    return chain;
  }

  private boolean onePartFaces(int a, int b) {
    for (BitSet spaces : faced.values()) {
      if (spaces.get(a) && spaces.get(b)) {
        return true;
      }
    }
    return false;
  }

  /** Parts that face one space alone while there are others, alike ones together. */
  private List<String> detachedParts() {
    if (faced.size() < 2) {
      return List.of();
    }
    Map<String, List<Integer>> alike = new LinkedHashMap<>();
    for (Map.Entry<Integer, BitSet> entry : faced.entrySet()) {
      int root = entry.getKey();
      BitSet spaces = entry.getValue();
      if (spaces.cardinality() == 1 && !heated.get(root)) {
        String key = materials(root) + "\n" + spaces.nextSetBit(0);
        List<Integer> parts = alike.get(key);
        if (parts == null) {
          parts = new ArrayList<>();
          alike.put(key, parts);
        }
        parts.add(root);
      }
    }
    List<String> warnings = new ArrayList<>();
    for (List<Integer> parts : alike.values()) {
      int first = parts.get(0);
      int more = parts.size() - 1;
      warnings.add(
          materials(first)
              + " at "
              + Wording.place(corner(first))
              + (more > 0 ? " and " + more + " more like it" : "")
              + ": detached from the rest and facing "
              + name(faced.get(first).nextSetBit(0))
              + " alone; no heat flows through it");
    }
    return warnings;
  }

  /** The materials of a part in words, in alphabetical order. */
  private String materials(int root) {
    Set<String> names = new TreeSet<>();
    for (int face = 0; face < partition.faceCount(); face++) {
      int label = partition.faceLabel(face);
      if (conducts(label) && root(part, face) == root) {
        names.add("'" + outline.conditions().material(label).name() + "'");
      }
    }
    return String.join(", ", names);
  }

  private String name(int space) {
    return "'" + detail.spaces().get(space).name() + "'";
  }

  private boolean conducts(int label) {
    return outline.conditions().conducts(label);
  }

  private int conductingPart(int edge) {
    boolean left = conducts(partition.leftLabel(edge));
    return root(part, left ? partition.leftFace(edge) : partition.rightFace(edge));
  }

  /** Of the corners of a face the one farthest left, the lowest of several. */
  private Point corner(int face) {
    int[] ring = partition.faceRings(face).get(0);
    Point first = outline.point(ring[0]);
    for (int vertex : ring) {
      Point point = outline.point(vertex);
      if (Outline.LEFT_TO_RIGHT.compare(point, first) < 0) {
        first = point;
      }
    }
    return first;
  }

  private static int[] singles(int size) {
    int[] set = new int[size];
    for (int i = 0; i < size; i++) {
      set[i] = i;
    }
    return set;
  }

  private static void join(int[] set, int one, int other) {
    int a = root(set, one);
    int b = root(set, other);
    set[Math.max(a, b)] = Math.min(a, b);
  }

  private static int root(int[] set, int member) {
    int root = member;
    while (set[root] != root) {
      set[root] = set[set[root]];
      root = set[root];
    }
    return root;
  }
}
