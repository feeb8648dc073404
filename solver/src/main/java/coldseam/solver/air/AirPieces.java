package coldseam.solver.air;

import coldseam.mesh.partition.Partition;
import coldseam.mesh.partition.Throats;
import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.detail.AirCavity;
import coldseam.solver.detail.Area;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import coldseam.solver.detail.Fill;
import coldseam.solver.detail.Wording;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/** Finds the connected areas of air in a drawing and cuts them at throats. */
final class AirPieces {
  /** Part of itself by which the area of a piece may change when it is cut. */
  private static final double AREA_KEPT = 1e-9;

  /** From left to right and upwards, by the lower left corner of the box round a piece. */
  static final Comparator<Piece> LEFT_TO_RIGHT =
      Comparator.comparingDouble((Piece p) -> rounded(left(p)))
          .thenComparingDouble(p -> rounded(bottom(p)));

  private final Detail detail;
  private final List<Fill> fills;
  private final Partition partition;

  private AirPieces(Detail detail) {
    this.detail = detail;
    fills = detail.fills();
    partition = partition(detail);
  }

  /** The pieces of a detail, from left to right and upwards. */
  static List<Piece> of(Detail detail) {
    AirPieces finder = new AirPieces(detail);
    List<Piece> pieces = finder.find();
    finder.checkSingles(pieces);
    return pieces;
  }

  /** Areas and stretches of a detail laid into a partition; a drawing that has none is a fault. */
  static Partition partition(Detail detail) {
    try {
      return Partition.of(detail.labelledAreas(), detail.labelledLines(), Resolution.STANDARD);
    } catch (IllegalArgumentException e) {
      throw new DetailException(
          List.of(new Fault("section", "", e.getMessage(), Optional.empty())));
    }
  }

  private List<Piece> find() {
    BitSet open = openFaces();
    List<Piece> pieces = new ArrayList<>();
    for (int face = 0; face < partition.faceCount(); face++) {
      if (fills.get(partition.faceLabel(face)) instanceof AirCavity air
          && !(air.enclosedOnly() && open.get(face))) {
        List<List<List<Point>>> cut = Throats.pieces(partition, face, air.throatM());
        double sum = 0;
        for (List<List<Point>> rings : cut) {
          Piece piece = piece(air, rings);
          sum += piece.areaM2();
          pieces.add(piece);
        }
        double area = partition.faceArea(face);
        if (!(Math.abs(sum - area) <= AREA_KEPT * area)) {
          throw new IllegalStateException("cutting changed an area of " + area + " to " + sum);
        }
      }
    }
    pieces.sort(LEFT_TO_RIGHT);
    return pieces;
  }

  /** Faces beyond which nothing is laid. */
  private BitSet openFaces() {
    BitSet open = new BitSet();
    for (int edge = 0; edge < partition.edgeCount(); edge++) {
      int left = partition.leftFace(edge);
      int right = partition.rightFace(edge);
      if (left == Partition.NONE) {
        open.set(right);
      } else if (right == Partition.NONE) {
        open.set(left);
      }
    }
    return open;
  }

  private Piece piece(AirCavity air, List<List<Point>> rings) {
    Piece piece = new Piece(source(air, rings), air, rings, air.settings());
    AirCavity.Settings settings = air.settings();
    for (AirCavity.Single single : air.singles()) {
      if (piece.covers(single.inside())) {
        settings = single.settings().over(settings);
      }
    }
    return new Piece(piece.source(), air, rings, settings);
  }

  /** The topmost area of the fill over the piece. */
  private Area source(AirCavity air, List<List<Point>> rings) {
    Point inside = new Piece(null, air, rings, air.settings()).inside();
    Area source = null;
    for (Area area : detail.areas()) {
      if (area.fill().name().equals(air.name())
          && (source == null || Piece.covers(area.rings(), inside))) {
        source = area;
      }
    }
    return source;
  }

  private void checkSingles(List<Piece> pieces) {
    List<Fault> faults = new ArrayList<>();
    for (Fill fill : fills) {
      if (fill instanceof AirCavity air) {
        for (AirCavity.Single single : air.singles()) {
          if (!anyCovers(pieces, single)) {
            faults.add(
                new Fault(
                    "cavity",
                    air.name(),
                    "no cavity laid as '"
                        + air.name()
                        + "' contains the point "
                        + Wording.place(single.inside())
                        + "; give a point well inside one",
                    Optional.of(single.inside())));
          }
        }
      }
    }
    if (!faults.isEmpty()) {
      throw new DetailException(faults);
    }
  }

  private static boolean anyCovers(List<Piece> pieces, AirCavity.Single single) {
    for (Piece piece : pieces) {
      if (piece.fill().singles().contains(single) && piece.covers(single.inside())) {
        return true;
      }
    }
    return false;
  }

  private static double rounded(double metres) {
    return Math.rint(metres / Resolution.STANDARD.closeM());
  }

  private static double left(Piece piece) {
    double least = Double.POSITIVE_INFINITY;
    for (Point p : piece.rings().get(0)) {
      least = Math.min(least, p.x());
    }
    return least;
  }

  private static double bottom(Piece piece) {
    double least = Double.POSITIVE_INFINITY;
    for (Point p : piece.rings().get(0)) {
      least = Math.min(least, p.y());
    }
    return least;
  }
}
