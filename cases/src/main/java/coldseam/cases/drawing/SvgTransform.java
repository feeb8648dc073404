package coldseam.cases.drawing;

import java.util.ArrayList;
import java.util.List;

/** Reads the attribute {@code transform}; SVG 1.1, 7.6. */
final class SvgTransform {
  private SvgTransform() {}

  static Affine read(String text, int line) throws DrawingException {
    SvgScanner in = new SvgScanner("`transform`", text, line);
    Affine all = Affine.IDENTITY;
    in.skipComma();
    while (!in.done()) {
      String word = in.word();
      in.skipBlank();
      if (in.peek() != '(') {
        throw in.wrong("`(`");
      }
      in.take();
      List<Double> numbers = new ArrayList<>();
      in.skipBlank();
      while (in.peek() != ')') {
        numbers.add(in.number());
        if (numbers.size() > 6) {
          throw in.wrong("`)`");
        }
      }
      in.take();
      all = all.after(one(word, numbers, in));
      in.skipComma();
    }
    return all;
  }

  private static Affine one(String word, List<Double> n, SvgScanner in) throws DrawingException {
    int count = n.size();
    switch (word) {
      case "matrix" -> {
        if (count == 6) {
          return new Affine(n.get(0), n.get(1), n.get(2), n.get(3), n.get(4), n.get(5));
        }
      }
      case "translate" -> {
        if (count == 1 || count == 2) {
          return Affine.shift(n.get(0), count == 2 ? n.get(1) : 0);
        }
      }
      case "scale" -> {
        if (count == 1 || count == 2) {
          return Affine.scale(n.get(0), n.get(count - 1));
        }
      }
      case "rotate" -> {
        if (count == 1) {
          return Affine.turn(n.get(0));
        }
        if (count == 3) {
          return Affine.shift(n.get(1), n.get(2))
              .after(Affine.turn(n.get(0)))
              .after(Affine.shift(-n.get(1), -n.get(2)));
        }
      }
      case "skewX" -> {
        if (count == 1) {
          return new Affine(1, 0, Math.tan(Math.toRadians(n.get(0))), 1, 0, 0);
        }
      }
      case "skewY" -> {
        if (count == 1) {
          return new Affine(1, Math.tan(Math.toRadians(n.get(0))), 0, 1, 0, 0);
        }
      }
      default -> throw in.wrong("`matrix`, `translate`, `scale`, `rotate`, `skewX` or `skewY`");
    }
    throw in.wrong("another count of numbers than " + count + " of `" + word + "`");
  }
}
