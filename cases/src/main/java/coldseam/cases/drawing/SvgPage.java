package coldseam.cases.drawing;

import java.util.Optional;

/**
 * The page of an SVG document: how user units become units of the drawing, y upwards.
 *
 * @param toDrawing from user units to units of the drawing
 * @param unit millimetres on paper, where the page has a size on paper; else nothing is known
 * @param viewWidth what 100 % of a horizontal length are, user units
 * @param viewHeight what 100 % of a vertical length are, user units
 */
record SvgPage(Affine toDrawing, Optional<DrawingUnit> unit, double viewWidth, double viewHeight) {
  static SvgPage of(SvgElement root) throws DrawingException {
    double width = paperMm(root, "width");
    double height = paperMm(root, "height");
    double[] box = box(root);
    if (Double.isNaN(width) && Double.isNaN(height)) {
      double w = box == null ? SvgLength.of(root, "width", 100, 100) : box[2];
      double h = box == null ? SvgLength.of(root, "height", 100, 100) : box[3];
      double bottom = box == null ? h : box[1] + box[3];
      Affine flip = new Affine(1, 0, 0, -1, 0, bottom);
      return new SvgPage(flip, Optional.empty(), w, h);
    }
    if (box == null) {
      double mm = 25.4 / SvgLength.PER_INCH;
      double h = Double.isNaN(height) ? 0 : height;
      return new SvgPage(
          new Affine(mm, 0, 0, -mm, 0, h), Optional.of(DrawingUnit.MM), width / mm, h / mm);
    }
    double w = Double.isNaN(width) ? height * box[2] / box[3] : width;
    double h = Double.isNaN(height) ? width * box[3] / box[2] : height;
    Affine onPaper = viewBox(root, w, h);
    Affine flip = new Affine(1, 0, 0, -1, 0, h);
    return new SvgPage(flip.after(onPaper), Optional.of(DrawingUnit.MM), box[2], box[3]);
  }

  /** A side of the page in mm; NaN if it has no size on paper. */
  private static double paperMm(SvgElement root, String key) throws DrawingException {
    String text = root.attribute(key).strip();
    int digits = text.length();
    while (digits > 0 && Character.isLetter(text.charAt(digits - 1))) {
      digits--;
    }
    double mm = SvgLength.millimetres(text.substring(digits));
    if (Double.isNaN(mm)) {
      return Double.NaN;
    }
    double size = SvgLength.of(root, key, 0, 0) * 25.4 / SvgLength.PER_INCH;
    return size > 0 ? size : Double.NaN;
  }

  private static double[] box(SvgElement element) throws DrawingException {
    if (!element.has("viewBox")) {
      return null;
    }
    SvgScanner in = new SvgScanner("`viewBox`", element.attribute("viewBox"), element.line());
    double[] box = {in.number(), in.number(), in.number(), in.number()};
    if (!(box[2] > 0 && box[3] > 0)) {
      throw new DrawingException(
          element.line(), "a `viewBox` without size", "its third and fourth number are positive");
    }
    return box;
  }

  /** How the view box of an element is fitted into a frame; SVG 1.1, 7.8. */
  static Affine viewBox(SvgElement element, double width, double height) throws DrawingException {
    double[] box = box(element);
    if (box == null) {
      return Affine.IDENTITY;
    }
    double sx = width / box[2];
    double sy = height / box[3];
    String fit = element.attribute("preserveAspectRatio").strip();
    if (!fit.startsWith("none")) {
      double s = fit.endsWith("slice") ? Math.max(sx, sy) : Math.min(sx, sy);
      double dx = width - box[2] * s;
      double dy = height - box[3] * s;
      double ax = fit.startsWith("xMin") ? 0 : fit.startsWith("xMax") ? dx : dx / 2;
      double ay = fit.contains("YMin") ? 0 : fit.contains("YMax") ? dy : dy / 2;
      return new Affine(s, 0, 0, s, ax - s * box[0], ay - s * box[1]);
    }
    return new Affine(sx, 0, 0, sy, -sx * box[0], -sy * box[1]);
  }
}
