package coldseam.mesh.partition;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Places of a face that are no wider than a given width. A throat is a straight cut from a corner
 * where the face turns by more than half a circle to the nearest point of another part of its rim.
 * Cutting there takes a face apart into chambers and the gaps between and beside them.
 *
 * <p>A gap is a piece whose smallest circumscribing rectangle is no wider than the width. Cuts
 * across one straight gap are dissolved; so are cuts that take off a nook shallower than its mouth,
 * and cuts that part nothing. Corners that merely run to a point are never cut off.
 */
public final class Throats {
  /** By what part of it a throat may be wider and still count. */
  static final double TIE = 1e-6;

  /** Sine of the turn from which on a corner counts as one. */
  private static final double TURN = 1e-6;

  /** Cosine up to which the rim at either end of a cut may lean towards it. */
  private static final double LEAN = 0.5;

  private final FaceRim rim;
  private final double widthM;
  private final List<Cut> cuts = new ArrayList<>();

  /**
   * A straight cut.
   *
   * @param corner where it starts
   * @param edge the rim's edge it ends on
   * @param along where on the edge, 0 at its start to 1 at its end
   * @param x x of its end, m
   * @param y y of its end, m
   * @param lengthM its length, m
   */
  record Cut(int corner, int edge, double along, double x, double y, double lengthM) {}

  private Throats(FaceRim rim, double widthM) {
    this.rim = rim;
    this.widthM = widthM;
  }

  /**
   * Takes a face apart at its throats.
   *
   * @param partition the partition
   * @param face a face of it
   * @param widthM throats up to this width are cut, m
   * @return the pieces as closed rings in the coordinates of the drawing, m: the outer ring of each
   *     first, then its holes. They cover the face exactly, touch along the cuts, and are in an
   *     order that depends on the face only; one piece where there is no throat
   */
  public static List<List<List<Point>>> pieces(Partition partition, int face, double widthM) {
    FaceRim rim = new FaceRim(partition, face);
    Throats throats = new Throats(rim, widthM);
    throats.find();
    FacePieces pieces = new FacePieces(rim, throats.cuts, widthM * (1 + TIE));
    return pieces.rings(partition.origin());
  }

  private void find() {
    List<Cut> candidates = new ArrayList<>();
    for (int corner = 0; corner < rim.size(); corner++) {
      if (rim.turn(corner) < -TURN) {
        candidatesFrom(corner, candidates);
      }
    }
    candidates.sort(Comparator.comparingDouble(Cut::lengthM));
    for (Cut cut : candidates) {
      if (clearOfOthers(cut)) {
        cuts.add(cut);
      }
    }
  }

  private void candidatesFrom(int corner, List<Cut> candidates) {
    double x = rim.x(corner);
    double y = rim.y(corner);
    for (int edge = 0; edge < rim.size(); edge++) {
      int from = edge;
      int to = rim.next(edge);
      if (rim.vertex(from) == rim.vertex(corner) || rim.vertex(to) == rim.vertex(corner)) {
        continue;
      }
      double dx = rim.x(to) - rim.x(from);
      double dy = rim.y(to) - rim.y(from);
      double length = Math.hypot(dx, dy);
      double along = ((x - rim.x(from)) * dx + (y - rim.y(from)) * dy) / (length * length);
      double end = Resolution.STANDARD.closeM() / length;
      if (along <= end || along >= 1 - end) {
        // the nearer end of the edge; each vertex is tried by the edge that starts there
        if (along <= end) {
          candidate(corner, edge, 0, candidates);
        }
      } else {
        candidate(corner, edge, along, candidates);
      }
    }
  }

  private void candidate(int corner, int edge, double along, List<Cut> candidates) {
    int next = rim.next(edge);
    double x = rim.x(edge) + along * (rim.x(next) - rim.x(edge));
    double y = rim.y(edge) + along * (rim.y(next) - rim.y(edge));
    double dx = x - rim.x(corner);
    double dy = y - rim.y(corner);
    double length = Math.hypot(dx, dy);
    if (length > widthM * (1 + TIE)
        || length <= Resolution.STANDARD.closeM()
        || !rim.opensTowards(corner, dx, dy)
        || leans(corner, dx / length, dy / length, LEAN)) {
      return;
    }
    boolean meets =
        along == 0
            ? rim.opensTowards(edge, -dx, -dy) && !leans(edge, -dx / length, -dy / length, TURN)
            : rim.left(edge, rim.x(corner), rim.y(corner)) > 0;
    Cut cut = new Cut(corner, edge, along, x, y, length);
    if (meets && clearOfRim(cut)) {
      candidates.add(cut);
    }
  }

  /** Whether the rim at a corner runs towards a direction by more than a cosine. */
  private boolean leans(int corner, double ux, double uy, double cosine) {
    return rim.cosineToNext(corner, ux, uy) > cosine
        || rim.cosineToPrevious(corner, ux, uy) > cosine;
  }

  private boolean clearOfRim(Cut cut) {
    double x = rim.x(cut.corner);
    double y = rim.y(cut.corner);
    int own = rim.vertex(cut.corner);
    int target = cut.along == 0 ? rim.vertex(cut.edge) : -1;
    for (int edge = 0; edge < rim.size(); edge++) {
      int a = rim.vertex(edge);
      int b = rim.vertex(rim.next(edge));
      boolean joined = edge == cut.edge && cut.along > 0;
      if (joined || a == own || b == own || a == target || b == target) {
        continue;
      }
      if (Segments.meet(
          x, y, cut.x, cut.y, rim.x(edge), rim.y(edge), rim.endX(edge), rim.endY(edge))) {
        return false;
      }
    }
    return true;
  }

  private boolean clearOfOthers(Cut cut) {
    double x = rim.x(cut.corner);
    double y = rim.y(cut.corner);
    for (Cut other : cuts) {
      double ox = rim.x(other.corner);
      double oy = rim.y(other.corner);
      boolean sameStart = near(x, y, ox, oy) || near(x, y, other.x, other.y);
      boolean sameEnd = near(cut.x, cut.y, ox, oy) || near(cut.x, cut.y, other.x, other.y);
      if (sameStart && sameEnd) {
        return false;
      }
      if (!sameStart && !sameEnd && Segments.meet(x, y, cut.x, cut.y, ox, oy, other.x, other.y)) {
        return false;
      }
    }
    return true;
  }

  static boolean near(double ax, double ay, double bx, double by) {
    return Math.hypot(bx - ax, by - ay) <= Resolution.STANDARD.closeM();
  }
}
