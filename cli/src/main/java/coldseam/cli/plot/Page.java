package coldseam.cli.plot;

import coldseam.cli.plot.Canvas.Anchor;
import java.awt.geom.Line2D;
import java.awt.geom.Rectangle2D;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A sheet laid out: title and state of certification on top, the drawing, a zoom below or beside
 * it, the key beside and below, the safety words at the foot. Its shape follows the drawing's.
 */
final class Page {
  static final double WIDTH = 960;
  static final double MARGIN = 28;
  static final double INNER = WIDTH - 2 * MARGIN;
  static final double GAP = 18;
  private static final double KEY_WIDTH = 238;
  private static final double BESIDE = INNER - KEY_WIDTH - GAP;
  private static final double HIGHEST = 640;
  private static final double LOWEST = 190;
  private static final double ZOOM_HEIGHT = 400;

  /** Free strip around the section that a zoom may show, points. */
  private static final double ZOOM_AIR = 84;

  /** Drawings wider than this, over their height, run over the whole sheet. */
  private static final double WIDE = 2.1;

  /** Drawings narrower than this leave room for a zoom beside them. */
  private static final double NARROW = 0.55;

  /** A zoom less than so many times larger is left out. */
  private static final double LEAST_ZOOM = 2.5;

  private static final int FOOT_COLUMNS = 3;
  static final Lettering FOOT = new Lettering(9.5f, false, Palette.SECOND_INK);
  static final String SAFETY =
      "Calculated under the stated assumptions. Local codes and a licensed professional decide."
          + " Thermal changes to loadbearing or fire-separating parts need their approval.";

  /**
   * Free strips around the drawing in its frame, points.
   *
   * @param left of it
   * @param right of it
   * @param top above it
   * @param bottom below it
   */
  record Gutters(double left, double right, double top, double bottom) {}

  /**
   * What is laid out.
   *
   * @param title of the case
   * @param subtitle what is shown
   * @param state of certification, in a few words
   * @param section the box of the drawing, m
   * @param gutters free strips around it
   * @param zoom the box of a part to be shown larger, if any, m
   * @param key the key
   */
  record Content(
      String title,
      String subtitle,
      String state,
      Box section,
      Gutters gutters,
      Optional<Box> zoom,
      Key key) {}

  private final Content content;
  private final List<String> titleLines;
  private final List<String> subtitleLines;
  private final List<Key.Column> columns = new ArrayList<>();
  private final Panel panel;
  private final Optional<Panel> zoom;
  private final double height;

  private Page(Content content) {
    this.content = content;
    double stamp = TextWidths.of(content.state(), Lettering.SMALL_STRONG) + 24;
    titleLines = Wrapping.of(content.title(), INNER - stamp - GAP, Lettering.TITLE);
    subtitleLines = Wrapping.of(content.subtitle(), INNER, Lettering.SUBTITLE);
    double top =
        MARGIN
            + titleLines.size() * Lettering.TITLE.lineHeight()
            + subtitleLines.size() * Lettering.SUBTITLE.lineHeight()
            + 14;
    Box section = content.section();
    double aspect = section.width() / section.height();
    boolean wide = aspect > WIDE;
    boolean narrow = aspect < NARROW && content.zoom().isPresent();
    double width = wide ? INNER : narrow ? BESIDE * 0.45 : BESIDE;
    panel = fitted(section, content.gutters(), MARGIN, top, width);
    double bottom = panel.frame().y1();
    boolean keyFits = !wide && content.key().height(KEY_WIDTH) <= bottom - top;
    double zoomRight = MARGIN + (keyFits && !narrow ? INNER : BESIDE);
    Box zoomFrame =
        narrow
            ? new Box(panel.frame().x1() + GAP, top, zoomRight, bottom)
            : new Box(MARGIN, bottom + GAP, zoomRight, bottom + GAP + ZOOM_HEIGHT);
    zoom = zoom(content.zoom(), zoomFrame);
    if (zoom.isPresent()) {
      bottom = zoomFrame.y1();
    }
    double keyTop = wide ? panel.frame().y1() + GAP : top;
    bottom = layKey(keyTop, bottom, !wide || zoom.isPresent());
    height = Math.ceil(bottom + 16 + footLines().size() * FOOT.lineHeight() + 14);
  }

  /** The frame of the part shown larger, if it is worth it. */
  private Optional<Panel> zoom(Optional<Box> part, Box frame) {
    if (part.isEmpty()) {
      return Optional.empty();
    }
    Panel larger = filling(part.get(), frame);
    return larger.pointsPerM() >= LEAST_ZOOM * panel.pointsPerM()
        ? Optional.of(larger)
        : Optional.empty();
  }

  /**
   * Puts the key beside the frames, and what does not fit there below; or all beside them, if that
   * makes a shorter sheet.
   *
   * @return where the sheet's drawings and key end
   */
  private double layKey(double top, double bottom, boolean besides) {
    Key key = content.key();
    double beside = besides ? Math.max(0, bottom - top) : 0;
    double footWidth = (INNER - (FOOT_COLUMNS - 1) * GAP) / FOOT_COLUMNS;
    double rest = key.restHeight(KEY_WIDTH, beside, footWidth, FOOT_COLUMNS);
    double whole = key.height(KEY_WIDTH);
    if (besides && rest > 0 && top + whole <= bottom + GAP + rest) {
      beside = whole;
      rest = 0;
    }
    columns.add(new Key.Column(MARGIN + BESIDE + GAP, top, KEY_WIDTH, beside));
    double end = Math.max(bottom, top + (rest > 0 ? 0 : beside));
    if (rest > 0) {
      for (int c = 0; c < FOOT_COLUMNS; c++) {
        columns.add(new Key.Column(MARGIN + c * (footWidth + GAP), end + GAP, footWidth, rest));
      }
      end += GAP + rest;
    }
    return end;
  }

  static Page of(Content content) {
    return new Page(content);
  }

  private static Panel fitted(Box section, Gutters gutters, double x, double y, double width) {
    double across = gutters.left() + gutters.right();
    double down = gutters.top() + gutters.bottom();
    double scale =
        Math.min((width - across) / section.width(), (HIGHEST - down) / section.height());
    double height = Math.max(LOWEST, section.height() * scale + down);
    double spare = (width - across - section.width() * scale) / 2;
    double spareDown = (height - down - section.height() * scale) / 2;
    Box frame = new Box(x, y, x + width, y + height);
    double shiftX = gutters.left() + spare + section.width() * scale / 2 - width / 2;
    double shiftY = gutters.top() + spareDown + section.height() * scale / 2 - height / 2;
    return new Panel(
        Panel.WHOLE,
        frame,
        scale,
        section.midX() - shiftX / scale,
        section.midY() + shiftY / scale);
  }

  /** A part filling a frame, moved so that nothing is seen that the whole does not show. */
  private Panel filling(Box part, Box frame) {
    double scale = Math.min(frame.width() / part.width(), frame.height() / part.height());
    Box whole = content.section().grown(ZOOM_AIR / scale);
    return new Panel(
        Panel.ZOOM,
        frame,
        scale,
        kept(part.midX(), frame.width() / scale, whole.x0(), whole.x1()),
        kept(part.midY(), frame.height() / scale, whole.y0(), whole.y1()));
  }

  private static double kept(double middle, double size, double least, double most) {
    return size >= most - least
        ? (least + most) / 2
        : Math.max(least + size / 2, Math.min(most - size / 2, middle));
  }

  private static List<String> footLines() {
    return Wrapping.of(SAFETY, INNER - 70, FOOT);
  }

  double width() {
    return WIDTH;
  }

  double height() {
    return height;
  }

  /** The frame of the whole drawing. */
  Panel panel() {
    return panel;
  }

  /** The frame of the part shown larger. */
  Optional<Panel> zoom() {
    return zoom;
  }

  void drawGround(Canvas canvas) {
    canvas.layer("sheet");
    canvas.fill(new Rectangle2D.Double(0, 0, WIDTH, height), Palette.PAPER);
  }

  void drawWords(Canvas canvas) {
    canvas.layer("heading");
    double y = MARGIN;
    for (String line : titleLines) {
      canvas.text(line, MARGIN, y + Lettering.TITLE.size() * 0.85, Lettering.TITLE);
      y += Lettering.TITLE.lineHeight();
    }
    for (String line : subtitleLines) {
      canvas.text(line, MARGIN, y + Lettering.SUBTITLE.size() * 0.85, Lettering.SUBTITLE);
      y += Lettering.SUBTITLE.lineHeight();
    }
    stamp(canvas);
    canvas.layer("key");
    content.key().draw(canvas, columns);
    canvas.layer("foot");
    List<String> lines = footLines();
    double foot = height - 14 - lines.size() * FOOT.lineHeight();
    canvas.stroke(
        new Line2D.Double(MARGIN, foot - 4, WIDTH - MARGIN, foot - 4), Palette.RULE, Pen.HAIR);
    double base = foot + FOOT.size();
    canvas.text("Coldseam", WIDTH - MARGIN, base, FOOT, Anchor.END);
    for (String line : lines) {
      canvas.text(line, MARGIN, base, FOOT);
      base += FOOT.lineHeight();
    }
  }

  private void stamp(Canvas canvas) {
    double width = TextWidths.of(content.state(), Lettering.SMALL_STRONG) + 18;
    Rectangle2D box = new Rectangle2D.Double(WIDTH - MARGIN - width, MARGIN, width, 20);
    canvas.stroke(box, Palette.INK, Pen.MEDIUM);
    canvas.text(
        content.state(),
        box.getCenterX(),
        box.getCenterY() + Lettering.SMALL.size() * TextWidths.CAPITAL / 2,
        Lettering.SMALL_STRONG,
        Anchor.MIDDLE);
  }
}
