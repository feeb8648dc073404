package coldseam.solver.result;

import coldseam.mesh.plane.Point;
import coldseam.solver.detail.Bracket;
import coldseam.solver.detail.CutOffPlane;
import coldseam.solver.detail.DimensionSystem;
import coldseam.solver.detail.Wording;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Reference lengths of flanks from the drawing (ISO 13789; ISO 14683: internal, overall internal,
 * external dimensions).
 *
 * <p>A length runs along the inner (or outer) face of a flank from its cut-off plane to where the
 * face turns away. Where two flanks have faces in one line, what lies between their ends (a slab, a
 * partition) is halved in overall internal and external dimensions; a face that runs through from
 * one plane to another is shared. Sharing asks for equal U, so that only the sum matters. Whatever
 * cannot be derived without doubt has a reason instead of a length.
 */
final class FlankLengths {
  /**
   * Relative difference up to which two U count as equal: that of one construction of which
   * conductivities were found at either end.
   */
  static final double EQUAL_U = 1e-3;

  private final Outline outline;
  private final List<PlacedFlank> flanks;
  private final boolean provisional;
  private final Map<String, Faces> faces = new HashMap<>();
  private final Map<String, Map<DimensionSystem, Outcome>> outcomes = new HashMap<>();

  /** A length, or why there is none. */
  record Outcome(Optional<Result.Length> length, String reason) {
    static Outcome of(Result.Length length) {
      return new Outcome(Optional.of(length), "");
    }

    static Outcome none(String reason) {
      return new Outcome(Optional.empty(), reason);
    }
  }

  private record Faces(Face inner, Face outer) {}

  /** The straight face of a flank on one side and where the outline beyond it leads. */
  private record Face(FaceWalk walk, FaceEnd end, boolean inner) {
    String side() {
      return inner ? "inner" : "outer";
    }
  }

  private record Partner(PlacedFlank flank, Face face, double gapM) {}

  /**
   * Derives the lengths.
   *
   * @param provisional whether conductivities are still to be found, so that no U can be compared
   */
  FlankLengths(Outline outline, List<PlacedFlank> flanks, boolean provisional) {
    this.outline = outline;
    this.flanks = flanks;
    this.provisional = provisional;
    for (PlacedFlank flank : flanks) {
      if (flank.plane().isPresent()
          && flank.inner().isPresent()
          && flank.outer().isPresent()
          && flank.inner().get().space() >= 0
          && flank.outer().get().space() >= 0) {
        faces.put(
            flank.name(),
            new Faces(face(flank.inner().get(), true), face(flank.outer().get(), false)));
      }
    }
    for (PlacedFlank flank : flanks) {
      outcomes.put(flank.name(), derive(flank));
    }
  }

  /** The length of a flank in one system, or why it has none. */
  Outcome of(PlacedFlank flank, DimensionSystem system) {
    return outcomes.get(flank.name()).get(system);
  }

  /** All lengths of a flank that are known. */
  Map<DimensionSystem, Result.Length> known(PlacedFlank flank) {
    Map<DimensionSystem, Result.Length> known = new EnumMap<>(DimensionSystem.class);
    for (Map.Entry<DimensionSystem, Outcome> outcome : outcomes.get(flank.name()).entrySet()) {
      if (outcome.getValue().length().isPresent()) {
        known.put(outcome.getKey(), outcome.getValue().length().get());
      }
    }
    return known;
  }

  private Map<DimensionSystem, Outcome> derive(PlacedFlank flank) {
    Map<DimensionSystem, Outcome> derived = new EnumMap<>(DimensionSystem.class);
    for (DimensionSystem system : DimensionSystem.values()) {
      Double typed = flank.typedLengths().get(system);
      if (typed != null) {
        derived.put(
            system,
            Outcome.of(
                new Result.Length(
                    typed, Optional.empty(), Optional.empty(), "length typed in the case")));
      } else if (!faces.containsKey(flank.name())) {
        derived.put(
            system, Outcome.none("its cut-off plane does not end at a surface on both sides"));
      } else {
        derived.put(system, derive(flank, system));
      }
    }
    return derived;
  }

  private Outcome derive(PlacedFlank flank, DimensionSystem system) {
    Faces of = faces.get(flank.name());
    return switch (system) {
      case INTERNAL -> own(flank, of.inner());
      case OVERALL_INTERNAL -> withGap(flank, of.inner());
      case EXTERNAL -> withGap(flank, of.outer());
    };
  }

  private Face face(FlankEnd end, boolean inner) {
    FaceWalk walk = outline.walk(end.face(), end.forward());
    return new Face(walk, outline.follow(walk), inner);
  }

  /** The face alone: to where it turns away, or half of it when it runs through. */
  private Outcome own(PlacedFlank flank, Face face) {
    Optional<PlacedFlank> through = runsThroughTo(flank, face);
    if (through.isPresent()) {
      return shared(flank, face, through.get());
    }
    Optional<String> doubt = doubt(flank, face);
    if (doubt.isPresent()) {
      return Outcome.none(doubt.get());
    }
    return Outcome.of(
        length(
            face,
            face.walk().lengthM(),
            "along the " + face.side() + " face from the cut-off plane to " + endWords(face)));
  }

  /** The face with half the gap to the flank whose face lies in line with it. */
  private Outcome withGap(PlacedFlank flank, Face face) {
    Outcome alone = own(flank, face);
    if (runsThroughTo(flank, face).isPresent()) {
      return alone;
    }
    Optional<Partner> partner = inLine(flank, face);
    if (partner.isPresent() && partner.get().gapM() > tolerance(face)) {
      return halfGap(flank, face, partner.get());
    }
    Optional<PlacedFlank> beside = partnerByOutline(flank, face);
    if (beside.isPresent() && alone.length().isPresent()) {
      Face other = faceOf(beside.get(), face.inner());
      double gap = gap(face, other);
      if (partner.isEmpty() && opposite(face, other) && Math.abs(gap) > tolerance(face)) {
        return Outcome.none(
            "its "
                + face.side()
                + " face and that of '"
                + beside.get().name()
                + "' are parallel but not in line, with "
                + Wording.length(Math.abs(gap))
                + " between their ends");
      }
    }
    return alone;
  }

  private Outcome halfGap(PlacedFlank flank, Face face, Partner partner) {
    if (!equalU(flank, partner.flank())) {
      return Outcome.none(
          "the "
              + Wording.length(partner.gapM())
              + " between its "
              + face.side()
              + " face and that of '"
              + partner.flank().name()
              + "' cannot be shared, their U differ");
    }
    return Outcome.of(
        length(
            face,
            face.walk().lengthM() + partner.gapM() / 2,
            "along the "
                + face.side()
                + " face from the cut-off plane to where it turns away, and half of the "
                + Wording.length(partner.gapM())
                + " to the face of '"
                + partner.flank().name()
                + "'"));
  }

  private Outcome shared(PlacedFlank flank, Face face, PlacedFlank other) {
    double whole = face.walk().lengthM();
    String through = face.side() + " face, which runs through to '" + other.name() + "'";
    if (!equalU(flank, other)) {
      return Outcome.none(
          "its "
              + face.side()
              + " face runs through to '"
              + other.name()
              + "', whose U differs, so that the "
              + Wording.length(whole)
              + " cannot be shared");
    }
    Faces own = faces.get(flank.name());
    Face opposite = face.inner() ? own.outer() : own.inner();
    Optional<Partner> facing = inLine(flank, opposite);
    if (facing.isPresent()
        && facing.get().flank().name().equals(other.name())
        && facing.get().gapM() > tolerance(face)) {
      double part =
          outline.along(face.walk().direction(), face.walk().from(), opposite.walk().to())
              + facing.get().gapM() / 2;
      return Outcome.of(
          length(
              face,
              part,
              "along the "
                  + through
                  + ", as far as the middle of the "
                  + Wording.length(facing.get().gapM())
                  + " between the faces opposite"));
    }
    return Outcome.of(
        length(face, whole / 2, "half of the " + through + " (" + Wording.length(whole) + ")"));
  }

  private Result.Length length(Face face, double valueM, String derivation) {
    FaceWalk walk = face.walk();
    Point from = outline.point(walk.from());
    Point to =
        new Point(
            from.x() + valueM * walk.direction().x(), from.y() + valueM * walk.direction().y());
    return new Result.Length(valueM, Optional.of(from), Optional.of(to), derivation);
  }

  private String endWords(Face face) {
    int stop = face.walk().stop();
    Optional<CutOffPlane> plane = planeOf(stop);
    if (plane.isPresent()) {
      return plane.get().symmetry() ? "the plane of symmetry" : "the cut-off plane opposite";
    }
    if (stop >= 0 && outline.conditions().space(stop) != face.walk().space()) {
      return "where it faces another space";
    }
    return "where it turns away";
  }

  /** The flank at whose cut-off plane a straight face ends. */
  private Optional<PlacedFlank> runsThroughTo(PlacedFlank flank, Face face) {
    return otherFlankAt(face.walk().stop(), flank);
  }

  /** The flank at whose cut-off plane the outline that faces the space ends. */
  private Optional<PlacedFlank> partnerByOutline(PlacedFlank flank, Face face) {
    Optional<PlacedFlank> other = otherFlankAt(face.end().stop(), flank);
    boolean partner =
        other.isPresent()
            && faces.containsKey(other.get().name())
            && faceOf(other.get(), face.inner()).walk().space() == face.walk().space();
    return partner ? other : Optional.empty();
  }

  /** The flank at whose cut-off plane an edge lies, if it is not the one given. */
  private Optional<PlacedFlank> otherFlankAt(int edge, PlacedFlank flank) {
    for (PlacedFlank candidate : flanks) {
      if (candidate.plane().isPresent() && candidate.plane().get().edges().contains(edge)) {
        return candidate.name().equals(flank.name()) ? Optional.empty() : Optional.of(candidate);
      }
    }
    return Optional.empty();
  }

  private Optional<CutOffPlane> planeOf(int edge) {
    for (CutOffPlane plane : outline.conditions().cutOffPlanes()) {
      if (plane.edges().contains(edge)) {
        return Optional.of(plane);
      }
    }
    return Optional.empty();
  }

  private Face faceOf(PlacedFlank flank, boolean inner) {
    Faces both = faces.get(flank.name());
    return inner ? both.inner() : both.outer();
  }

  /** The nearest flank whose face lies in line with this one and comes towards it. */
  private Optional<Partner> inLine(PlacedFlank flank, Face face) {
    Partner nearest = null;
    for (PlacedFlank other : flanks) {
      if (other.name().equals(flank.name()) || !faces.containsKey(other.name())) {
        continue;
      }
      Face facing = faceOf(other, face.inner());
      double gap = gap(face, facing);
      double reach = outline.distance(face.walk().from(), facing.walk().from());
      boolean inLine =
          opposite(face, facing)
              && Math.abs(
                      outline.across(
                          face.walk().direction(), face.walk().from(), facing.walk().from()))
                  <= Outline.offset(reach)
              && gap >= -tolerance(face);
      if (inLine && (nearest == null || gap < nearest.gapM())) {
        nearest = new Partner(other, facing, gap);
      }
    }
    return Optional.ofNullable(nearest);
  }

  /** From the end of one face to the end of another, along the first, m. */
  private double gap(Face face, Face other) {
    return outline.along(face.walk().direction(), face.walk().to(), other.walk().to());
  }

  private static boolean opposite(Face face, Face other) {
    return Math.abs(face.walk().direction().cross(other.walk().direction()))
            <= FlankLayers.PARALLEL_SINE
        && face.walk().direction().dot(other.walk().direction()) < 0;
  }

  private static double tolerance(Face face) {
    return Outline.offset(face.walk().lengthM());
  }

  private boolean equalU(PlacedFlank a, PlacedFlank b) {
    if (provisional) {
      return true;
    }
    Optional<Bracket> ua = a.uWPerM2K();
    Optional<Bracket> ub = b.uWPerM2K();
    return ua.isPresent()
        && ub.isPresent()
        && near(ua.get().lower(), ub.get().lower())
        && near(ua.get().upper(), ub.get().upper());
  }

  private static boolean near(double a, double b) {
    return Math.abs(a - b) <= EQUAL_U * Math.max(Math.abs(a), Math.abs(b));
  }

  /** Why the end of a face may not be the end of its element. */
  private Optional<String> doubt(PlacedFlank flank, Face face) {
    Optional<PlacedFlank> beside = partnerByOutline(flank, face);
    if (beside.isPresent()) {
      Face other = faceOf(beside.get(), face.inner());
      boolean parallel =
          Math.abs(face.walk().direction().cross(other.walk().direction()))
              <= FlankLayers.PARALLEL_SINE;
      if (!parallel && face.walk().to() != other.walk().to()) {
        return Optional.of(
            "its "
                + face.side()
                + " face and that of '"
                + beside.get().name()
                + "' do not meet in one corner");
      }
      return Optional.empty();
    }
    boolean turned = face.walk().to() != face.end().at();
    boolean goesOn =
        turned
            && Math.abs(face.walk().direction().cross(face.end().run()))
                <= FlankLayers.PARALLEL_SINE
            && face.walk().direction().dot(face.end().run()) > 0;
    if (goesOn) {
      return Optional.of(
          "its "
              + face.side()
              + " face turns away at "
              + Wording.place(outline.point(face.walk().to()))
              + " but goes on in the same direction from "
              + Wording.place(outline.point(face.end().runStart())));
    }
    return Optional.empty();
  }
}
