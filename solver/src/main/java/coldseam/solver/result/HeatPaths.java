package coldseam.solver.result;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Conditions.Kind;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
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
        faced.computeIfAbsent(conductingPart(edge), p -> new BitSet()).set(space);
      }
      if (outline.conditions().kind(edge) == Kind.FLOW
          && outline.conditions().flowWPerM2(edge) != 0) {
        heated.set(conductingPart(edge));
      }
    }
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
    int[] chain = singles(detail.spaces().size());
    BitSet touching = new BitSet();
    for (BitSet spaces : faced.values()) {
      touching.or(spaces);
      for (int f : floating) {
        if (spaces.get(f)) {
          spaces.stream().forEach(space -> join(chain, f, space));
        }
      }
    }
    for (int f : floating) {
      touching.clear(f);
      detail.spaces().get(f).floating().stream()
          .filter(own -> own.conductanceWPerMK() > 0)
          .forEach(own -> join(chain, f, detail.spaceIndex(own.to())));
    }
    List<String> warnings = new ArrayList<>();
    int[] fixed = touching.stream().toArray();
    for (int i = 0; i < fixed.length; i++) {
      for (int j = i + 1; j < fixed.length; j++) {
        int a = fixed[i];
        int b = fixed[j];
        boolean joined = root(chain, a) == root(chain, b);
        if (!joined && faced.values().stream().noneMatch(s -> s.get(a) && s.get(b))) {
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

  /** Parts that face one space alone while there are others, alike ones together. */
  private List<String> detachedParts() {
    if (faced.size() < 2) {
      return List.of();
    }
    Map<Integer, TreeSet<String>> materials = new TreeMap<>();
    for (int face = 0; face < partition.faceCount(); face++) {
      if (conducts(partition.faceLabel(face))) {
        materials
            .computeIfAbsent(root(part, face), p -> new TreeSet<>())
            .add("'" + detail.fills().get(partition.faceLabel(face)).name() + "'");
      }
    }
    Map<String, List<Integer>> alike = new LinkedHashMap<>();
    faced.forEach(
        (root, spaces) -> {
          if (spaces.cardinality() == 1 && !heated.get(root)) {
            String words = String.join(", ", materials.get(root));
            alike
                .computeIfAbsent(words + "\n" + spaces.nextSetBit(0), k -> new ArrayList<>())
                .add(root);
          }
        });
    List<String> warnings = new ArrayList<>();
    for (List<Integer> parts : alike.values()) {
      int first = parts.get(0);
      int more = parts.size() - 1;
      warnings.add(
          String.join(", ", materials.get(first))
              + " at "
              + Wording.place(corner(first))
              + (more > 0 ? " and " + more + " more like it" : "")
              + ": detached from the rest and facing "
              + name(faced.get(first).nextSetBit(0))
              + " alone; no heat flows through it");
    }
    return warnings;
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
    return Arrays.stream(partition.faceRings(face).get(0))
        .mapToObj(outline::point)
        .min(Outline.LEFT_TO_RIGHT)
        .orElseThrow();
  }

  private static int[] singles(int size) {
    int[] set = new int[size];
    Arrays.setAll(set, i -> i);
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
