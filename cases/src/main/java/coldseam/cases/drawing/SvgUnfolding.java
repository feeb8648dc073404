package coldseam.cases.drawing;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Walks an SVG document and puts its shapes in place, references to shapes included. */
final class SvgUnfolding {
  /** Elements that hold what is only drawn where it is referred to, or nothing drawn. */
  private static final List<String> SILENT =
      List.of(
          "defs",
          "symbol",
          "clipPath",
          "mask",
          "marker",
          "pattern",
          "linearGradient",
          "filter",
          "radialGradient",
          "metadata",
          "title",
          "desc",
          "style",
          "");

  private final SvgTree tree;
  private final SvgPage page;
  private final SvgStyles styles;
  private final Tracing into;
  private final LeftOuts leftOut;
  private final SvgShapes shapes;
  private final Deque<SvgElement> used = new ArrayDeque<>();

  SvgUnfolding(SvgTree tree, SvgPage page, Tracing into, LeftOuts leftOut) {
    this.tree = tree;
    this.page = page;
    this.into = into;
    this.leftOut = leftOut;
    this.styles = new SvgStyles(leftOut);
    this.shapes = new SvgShapes(page.viewWidth(), page.viewHeight());
  }

  void all() throws DrawingException {
    sheets(tree.root());
    SvgPaint paint = SvgPaint.START.with(styles.of(tree.root()));
    for (SvgElement child : tree.root().children()) {
      place(child, page.toDrawing(), paint);
    }
  }

  private void sheets(SvgElement element) {
    for (SvgElement child : element.children()) {
      if (child.name().equals("style")) {
        styles.add(child.text().toString(), child.line());
      }
      sheets(child);
    }
  }

  private void place(SvgElement e, Affine at, SvgPaint inherited) throws DrawingException {
    into.count(e.line(), e.attribute("d").length() / 64 + e.attribute("points").length() / 64);
    if (SILENT.contains(e.name())) {
      return;
    }
    Map<String, String> says = styles.of(e);
    SvgPaint paint = layered(e, inherited.with(says));
    if (says.getOrDefault("display", "").equals("none") || SvgPaint.zero(says, "opacity")) {
      leftOut.add(e.name(), paint.layer(), "it is hidden", e.line());
      return;
    }
    if (says.containsKey("clip-path") && !says.get("clip-path").equals("none")) {
      leftOut.add("clipping", paint.layer(), "shapes are taken whole", e.line(), true);
    }
    Affine here = at.after(SvgTransform.read(e.attribute("transform"), e.line()));
    switch (e.name()) {
      case "g", "a", "switch" -> {
        for (SvgElement child : e.children()) {
          place(child, here, paint);
        }
      }
      case "svg" -> nested(e, here, paint);
      case "use" -> use(e, here, paint);
      default -> {
        if (SvgShapes.KNOWN.contains(e.name())) {
          shape(e, here, paint);
        } else {
          other(e, paint);
        }
      }
    }
  }

  /** Layers as the editor has them, else the nearest group with a name, else a class of its own. */
  private static SvgPaint layered(SvgElement e, SvgPaint paint) {
    if (!e.name().equals("g") && !e.name().equals("svg")) {
      return paint;
    }
    String label = e.attribute("inkscape:label");
    boolean layer = e.attribute("inkscape:groupmode").equals("layer");
    String name = (label.isEmpty() ? decoded(e.attribute("id")) : label).strip();
    if (layer) {
      return paint.on(name, true);
    }
    return paint.fixed() || name.isEmpty() ? paint : paint.on(name, false);
  }

  /** Some editors write a blank in an id as {@code _x20_}. */
  private static String decoded(String id) {
    StringBuilder out = new StringBuilder();
    int at = 0;
    while (at < id.length()) {
      int end = id.startsWith("_x", at) ? id.indexOf('_', at + 2) : -1;
      int c = end > at + 2 && end <= at + 8 ? hex(id, at + 2, end) : -1;
      if (c >= 32) {
        out.append((char) c);
        at = end + 1;
      } else {
        out.append(id.charAt(at++));
      }
    }
    return out.toString();
  }

  private static int hex(String text, int from, int to) {
    int c = 0;
    for (int i = from; i < to; i++) {
      int digit = Character.digit(text.charAt(i), 16);
      if (digit < 0) {
        return -1;
      }
      c = 16 * c + digit;
    }
    return c > Character.MAX_VALUE ? -1 : c;
  }

  private void shape(SvgElement e, Affine at, SvgPaint paint) throws DrawingException {
    if (!paint.visible()) {
      leftOut.add(e.name(), paint.layer(), "it is hidden", e.line());
      return;
    }
    List<Outline> outlines = shapes.of(e);
    String own = e.attribute("class").strip();
    int blank = own.indexOf(' ');
    String look = own.isEmpty() ? paint.fill() : blank < 0 ? own : own.substring(0, blank);
    if (paint.filled() && !e.name().equals("line")) {
      if (paint.evenOdd() || e.name().equals("rect") || outlines.isEmpty()) {
        into.filled(outlines, at, paint.layer(), look, e.line());
      } else {
        into.wound(outlines, at, paint.layer(), look, e.line());
      }
    } else if (paint.stroked()) {
      into.lines(outlines, at, paint.layer(), e.line());
    } else {
      leftOut.add(e.name(), paint.layer(), "it has neither fill nor stroke", e.line());
    }
  }

  private void other(SvgElement e, SvgPaint paint) {
    String why =
        switch (e.name()) {
          case "text", "tspan", "textPath" -> "words are no outlines";
          case "image" -> "pictures are not traced, and nothing is fetched";
          case "script" -> "scripts are never run";
          case "foreignObject" -> "it is no SVG";
          default -> "it is no outline";
        };
    leftOut.add("`" + DxfGroups.shortened(e.name()) + "`", paint.layer(), why, e.line());
  }

  private void nested(SvgElement e, Affine at, SvgPaint paint) throws DrawingException {
    double x = SvgLength.of(e, "x", 0, page.viewWidth());
    double y = SvgLength.of(e, "y", 0, page.viewHeight());
    double w = SvgLength.of(e, "width", page.viewWidth(), page.viewWidth());
    double h = SvgLength.of(e, "height", page.viewHeight(), page.viewHeight());
    Affine here = at.after(Affine.shift(x, y)).after(SvgPage.viewBox(e, w, h));
    for (SvgElement child : e.children()) {
      place(child, here, paint);
    }
  }

  private void use(SvgElement e, Affine at, SvgPaint paint) throws DrawingException {
    String href = e.attribute("href").strip();
    if (!href.startsWith("#")) {
      leftOut.add(
          "a reference to `" + DxfGroups.shortened(href) + "`",
          paint.layer(),
          "nothing is fetched",
          e.line(),
          true);
      return;
    }
    Optional<SvgElement> target = tree.byId(href.substring(1));
    if (target.isEmpty()) {
      leftOut.add(
          "a reference to `" + DxfGroups.shortened(href) + "`",
          paint.layer(),
          "nothing has that id",
          e.line(),
          true);
      return;
    }
    boolean circle = false;
    for (SvgElement open : used) {
      circle |= open == target.get();
    }
    if (circle || used.size() >= Limits.DEEPEST) {
      throw new DrawingException(
          e.line(),
          circle
              ? "`" + DxfGroups.shortened(href) + "` is used in itself"
              : "references to references, more than " + Limits.DEEPEST + " deep",
          "take this `use` out of it");
    }
    used.push(target.get());
    double x = SvgLength.of(e, "x", 0, page.viewWidth());
    double y = SvgLength.of(e, "y", 0, page.viewHeight());
    Affine here = at.after(Affine.shift(x, y));
    if (target.get().name().equals("symbol")) {
      double w = SvgLength.of(e, "width", page.viewWidth(), page.viewWidth());
      double h = SvgLength.of(e, "height", page.viewHeight(), page.viewHeight());
      Affine inside = here.after(SvgPage.viewBox(target.get(), w, h));
      SvgPaint own = paint.with(styles.of(target.get()));
      for (SvgElement child : target.get().children()) {
        place(child, inside, own);
      }
    } else {
      place(target.get(), here, paint);
    }
    used.pop();
  }
}
