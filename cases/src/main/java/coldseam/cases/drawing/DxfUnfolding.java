package coldseam.cases.drawing;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Puts the entities of a DXF file in place, blocks in blocks included. */
final class DxfUnfolding {
  private static final List<String> WORDS =
      List.of("TEXT", "MTEXT", "ATTRIB", "ATTDEF", "RTEXT", "ARCALIGNEDTEXT");
  private static final List<String> MEASURES =
      List.of("DIMENSION", "LEADER", "MULTILEADER", "MLEADER", "TOLERANCE", "ARC_DIMENSION");
  private static final List<String> GUIDES = List.of("XLINE", "RAY", "POINT");

  private final DxfReader from;
  private final Tracing into;
  private final LeftOuts leftOut;
  private final Deque<String> open = new ArrayDeque<>();

  DxfUnfolding(DxfReader from, Tracing into, LeftOuts leftOut) {
    this.from = from;
    this.into = into;
    this.leftOut = leftOut;
  }

  /** Puts everything in place. */
  void all() throws DrawingException {
    for (DxfEntity entity : from.entities()) {
      place(entity, Affine.IDENTITY, "");
    }
  }

  private void place(DxfEntity entity, Affine at, String layerOfInsert) throws DrawingException {
    into.count(entity.line(), entity.groups().size());
    String own = entity.layer();
    String layer = own.equals("0") && !layerOfInsert.isEmpty() ? layerOfInsert : own;
    String why = whyLeftOut(entity, layer);
    if (!why.isEmpty()) {
      leftOut.add(entity.type(), layer, why, entity.line());
      return;
    }
    if (entity.type().equals("INSERT")) {
      insert(entity, at, layer);
      return;
    }
    if (!DxfShapes.KNOWN.contains(entity.type())) {
      unknown(entity, layer);
      return;
    }
    Optional<Affine> plane = plane(entity, at);
    Optional<DxfShapes.Shape> shape = plane.isEmpty() ? Optional.empty() : DxfShapes.of(entity);
    if (shape.isEmpty()) {
      leftOut.add(entity.type(), layer, "it is not drawn flat on the sheet", entity.line(), true);
    } else if (shape.get().filled()) {
      into.filled(shape.get().outlines(), plane.get(), layer, shape.get().look(), entity.line());
    } else {
      into.lines(shape.get().outlines(), plane.get(), layer, entity.line());
      widths(entity, layer);
    }
  }

  private String whyLeftOut(DxfEntity entity, String layer) throws DrawingException {
    if (WORDS.contains(entity.type())) {
      return "words are no outlines";
    }
    if (MEASURES.contains(entity.type())) {
      return "dimensions are no outlines";
    }
    if (GUIDES.contains(entity.type())) {
      return "construction lines and points are no outlines";
    }
    if (entity.onPaper() || entity.type().equals("VIEWPORT")) {
      return "it is drawn on the paper, not in the drawing";
    }
    if (entity.invisible()) {
      return "it is invisible";
    }
    // A block is hidden as a whole by a frozen layer only; what is in it has layers of its own.
    boolean insert = entity.type().equals("INSERT");
    if (insert) {
      return from.layers().frozen(layer) ? "the layer is frozen" : "";
    }
    return from.layers().whyHidden(layer);
  }

  private void unknown(DxfEntity entity, String layer) throws DrawingException {
    String type = entity.type();
    if (type.endsWith("_PROXY_ENTITY")) {
      String of = from.className(entity.whole(91, -1));
      leftOut.add(
          "proxy of " + of,
          layer,
          "the program that draws it is not at hand; explode it where it was drawn",
          entity.line(),
          true);
    } else if (type.startsWith("AEC_") || type.equals("MLINE") || type.equals("REGION")) {
      leftOut.add(type, layer, "it has no outline of its own; explode it", entity.line(), true);
    } else {
      leftOut.add(type, layer, "it is no outline", entity.line());
    }
  }

  private void widths(DxfEntity entity, String layer) throws DrawingException {
    boolean polyline = entity.type().equals("LWPOLYLINE") || entity.type().equals("POLYLINE");
    if (polyline && (entity.number(43, 0) > 0 || entity.number(40, 0) > 0)) {
      leftOut.add(
          "width of a " + entity.type(),
          layer,
          "a line has no thickness here; lay a strip along it",
          entity.line(),
          true);
    }
  }

  /**
   * The entity's own plane: the sheet, or the sheet seen from behind, which mirrors x. Lines,
   * ellipses and splines are written in the coordinates of the sheet whatever their plane.
   */
  private static Optional<Affine> plane(DxfEntity entity, Affine at) throws DrawingException {
    double x = entity.number(210, 0);
    double y = entity.number(220, 0);
    double z = entity.number(230, 1);
    double tilt = Math.hypot(x, y) / Math.max(Math.hypot(Math.hypot(x, y), z), 1e-300);
    boolean inSheet = List.of("LINE", "ELLIPSE", "SPLINE").contains(entity.type());
    if (inSheet) {
      return Optional.of(at);
    }
    if (!(tilt < 1e-9)) {
      return Optional.empty();
    }
    return Optional.of(z < 0 ? at.after(Affine.scale(-1, 1)) : at);
  }

  private void insert(DxfEntity entity, Affine at, String layer) throws DrawingException {
    String name = entity.text(2, "");
    Optional<DxfReader.DxfBlock> block = from.block(name);
    if (block.isEmpty()) {
      leftOut.add("INSERT", layer, "there is no block `" + name + "`", entity.line(), true);
      return;
    }
    if (block.get().reference()) {
      leftOut.add(
          "reference `" + name + "`", layer, "other files are not read", entity.line(), true);
      return;
    }
    if (open.contains(name.toLowerCase(Locale.ROOT))) {
      throw new DrawingException(
          entity.line(),
          "the block `" + name + "` is put into itself",
          "take this insert out of the block");
    }
    if (open.size() >= Limits.DEEPEST) {
      throw new DrawingException(
          entity.line(), "blocks in blocks, more than " + Limits.DEEPEST + " deep", "explode some");
    }
    Optional<Affine> plane = plane(entity, at);
    if (plane.isEmpty()) {
      leftOut.add("INSERT", layer, "it is not drawn flat on the sheet", entity.line(), true);
      return;
    }
    open.push(name.toLowerCase(Locale.ROOT));
    copies(entity, block.get(), plane.get(), layer);
    open.pop();
  }

  private void copies(DxfEntity entity, DxfReader.DxfBlock block, Affine plane, String layer)
      throws DrawingException {
    int columns = copiesIn(entity, 70);
    int rows = copiesIn(entity, 71);
    double across = entity.number(44, 0);
    double down = entity.number(45, 0);
    Affine turned =
        plane
            .after(Affine.shift(entity.number(10, 0), entity.number(20, 0)))
            .after(Affine.turn(entity.number(50, 0)));
    Affine inside =
        Affine.scale(entity.number(41, 1), entity.number(42, 1))
            .after(Affine.shift(-block.x(), -block.y()));
    for (int row = 0; row < rows; row++) {
      for (int column = 0; column < columns; column++) {
        into.count(entity.line(), 0);
        Affine place = turned.after(Affine.shift(column * across, row * down)).after(inside);
        for (DxfEntity part : block.entities()) {
          place(part, place, layer);
        }
      }
    }
  }

  private static int copiesIn(DxfEntity entity, int code) throws DrawingException {
    int n = entity.whole(code, 1);
    if (n > Limits.MOST_ITEMS) {
      throw new DrawingException(
          entity.first(code).line(), "an insert of " + n + " copies", "insert fewer");
    }
    return Math.max(1, n);
  }
}
