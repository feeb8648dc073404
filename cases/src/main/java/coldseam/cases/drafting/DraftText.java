package coldseam.cases.drafting;

import coldseam.cases.Doubt;
import coldseam.cases.drafting.DraftedFill.Kind;
import coldseam.cases.drawing.Drawing;
import coldseam.cases.drawing.DrawingUnit;
import coldseam.cases.drawing.LeftOut;
import coldseam.cases.words.Undecided;
import coldseam.mesh.plane.Point;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Writes a draft as a case file. */
final class DraftText {
  private static final int PAGE = 100;

  private static final List<String> SPECIAL =
      List.of("true", "false", "null", "yes", "no", "on", "off", "y", "n");

  private final String file;
  private final String picture;
  private final Draft.Scaling scaling;
  private final Drawing drawing;
  private final DraftPlan plan;
  private final List<String> aids;
  private final List<Doubt> doubts;
  private final List<String> warnings;
  private final StringBuilder out = new StringBuilder();

  DraftText(
      String file,
      String picture,
      Draft.Scaling scaling,
      Drawing drawing,
      DraftPlan plan,
      List<String> aids,
      List<Doubt> doubts,
      List<String> warnings) {
    this.file = file;
    this.picture = picture;
    this.scaling = scaling;
    this.drawing = drawing;
    this.plan = plan;
    this.aids = aids;
    this.doubts = doubts;
    this.warnings = warnings;
  }

  String text() {
    head();
    drawings();
    materials();
    spaces();
    section();
    psi();
    lists();
    return out.toString();
  }

  private void comment(String indent, String words) {
    StringBuilder line = new StringBuilder(indent + "#");
    for (String word : plain(words).split(" ")) {
      if (line.length() + 1 + word.length() > PAGE && line.length() > indent.length() + 2) {
        out.append(line).append('\n');
        line = new StringBuilder(indent + "#");
      }
      line.append(' ').append(word);
    }
    out.append(line).append('\n');
  }

  /** A text without what would end a comment. */
  private static String plain(String words) {
    StringBuilder plain = new StringBuilder();
    for (int i = 0; i < words.length(); i++) {
      char c = words.charAt(i);
      plain.append(Character.isISOControl(c) || c == '\u2028' || c == '\u2029' ? ' ' : c);
    }
    return plain.toString().strip();
  }

  private void head() {
    String mark = Undecided.mark("");
    comment(
        "",
        "Drafted from "
            + file
            + ". Every "
            + mark
            + " is to be replaced: materials, spaces, how lengths are measured, and whatever else the"
            + " drawing does not tell."
            + " `cli/coldseam check` lists what is left; "
            + picture
            + " shows what was understood, numbered as below.");
    for (String warning : warnings) {
      comment("", "Warning: " + warning + ".");
    }
    out.append("coldseam: 1\n");
    out.append("title: ").append(quoted(stem())).append('\n');
    out.append("unit: ").append(scaling.unit().map(DrawingUnit::symbol).orElse(unitMark()));
    out.append('\n');
    out.append("view: vertical                       # or: plan\n\n");
  }

  /** The name of the drawing without its folder and what it ends in. */
  private String stem() {
    int slash = Math.max(file.lastIndexOf('/'), file.lastIndexOf('\\'));
    int dot = file.indexOf('.', slash + 1);
    return file.substring(slash + 1, dot > slash + 1 ? dot : file.length());
  }

  private static String unitMark() {
    return Undecided.mark("mm, cm, m or in, as the drawing");
  }

  private void drawings() {
    out.append("drawings:\n  ")
        .append(quoted(stem()))
        .append(":\n    file: ")
        .append(quoted(file))
        .append('\n');
    if (scaling.drawnUnit().isEmpty()) {
      out.append("    unit: ").append(Undecided.mark("mm, cm, m, in or ft; the file names none"));
      out.append('\n');
    } else {
      out.append("    unit: ").append(scaling.drawnUnit().get().symbol());
      out.append(scaling.stated() ? "   # as the file says" : "   # as typed").append('\n');
    }
    if (drawing.onPaper()) {
      out.append("    scale: 1   # 10 if the page shows it 1:10\n");
    }
    if (scaling.originM().x() != 0 || scaling.originM().y() != 0) {
      out.append("    origin: ").append(point(scaling.originM())).append('\n');
    }
    out.append("    tolerance: ").append(number(scaling.toleranceM()));
    out.append("   # corners this near are one\n");
    double deviation = scaling.deviation() * scaling.metresPerUnit();
    out.append("    deviation: ").append(number(deviation)).append("   # of chords from curves\n");
    if (!aids.isEmpty()) {
      List<String> names = new ArrayList<>();
      aids.forEach(aid -> names.add(quoted(aid)));
      out.append("    without: [").append(String.join(", ", names));
      out.append("]   # drawing aids, by their names\n");
    }
    out.append('\n');
  }

  private void materials() {
    out.append("materials:\n");
    boolean any = false;
    for (DraftedFill fill : plan.fills()) {
      if (named(fill)) {
        any = true;
        out.append("  ").append(quoted(fill.name())).append(": ");
        List<String> like =
            MaterialGuess.of(LayerNames.general(fill.layer()) ? fill.name() : fill.layer());
        String hint =
            like.isEmpty()
                ? "a name of the library or {conductivity: …}"
                : "such as " + String.join(" or ", like);
        out.append(quoted(Undecided.mark(hint))).append('\n');
      }
    }
    if (!any) {
      out.setLength(out.length() - "materials:\n".length());
    } else {
      out.append('\n');
    }
  }

  /** Whether an entry has a material of its own name to be decided on. */
  private static boolean named(DraftedFill fill) {
    boolean drawn = fill.kind() == Kind.LAYER || fill.kind() == Kind.FACES;
    return drawn && LayerNames.space(fill.name()).isEmpty();
  }

  private void spaces() {
    out.append("spaces:\n");
    out.append("  indoors: {temperature: ").append(Undecided.mark("20 perhaps"));
    out.append(", humidity: 50 %, exposure: inside}\n");
    out.append("  outdoors: {temperature: ").append(Undecided.mark("-5 perhaps"));
    out.append(", exposure: outside}\n\n");
  }

  private void section() {
    out.append("section:   # a later shape over the earlier; numbers as in the picture\n");
    int number = 1;
    for (DraftedFill fill : plan.fills()) {
      out.append("  # ").append(number++).append(": ");
      out.append(about(fill)).append('\n');
      out.append("  - {fill: ").append(fillOf(fill));
      switch (fill.kind()) {
        case LAYER -> {
          out.append(", drawing: ").append(quoted(stem()));
          if (!fill.layer().isEmpty()) {
            out.append(", layer: ").append(quoted(fill.layer()));
          }
          if (!fill.look().isEmpty()) {
            out.append(", look: ").append(quoted(fill.look()));
          }
        }
        case FACES, GAPS -> {
          out.append(", drawing: ").append(quoted(stem())).append(", at: ");
          List<String> points = new ArrayList<>();
          fill.points().forEach(p -> points.add(point(p)));
          out.append(points.size() == 1 ? points.get(0) : "[" + String.join(", ", points) + "]");
        }
        default -> out.append(", around: ").append(point(fill.points().get(0)));
      }
      out.append("}\n");
    }
    out.append('\n');
  }

  private String about(DraftedFill fill) {
    String area = figure(fill.areaM2() * 1e4) + " cm²";
    int n = fill.shapes().size();
    return switch (fill.kind()) {
      case LAYER -> (n == 1 ? "one shape, " : n + " shapes, ") + area;
      case FACES -> "a face between lines of layer " + plain(fill.layer()) + ", " + area;
      case GAPS -> "a face between lines that nothing else fills, " + area;
      default -> "open, " + area + "; where the drawing is cut, nothing lies beyond";
    };
  }

  private static String fillOf(DraftedFill fill) {
    return switch (fill.kind()) {
      case LAYER, FACES -> {
        String space = LayerNames.space(fill.name());
        yield space.isEmpty() ? quoted(fill.name()) : space;
      }
      case GAPS -> quoted(Undecided.mark("a name of the library, hollow, indoors or outdoors"));
      default -> Undecided.mark("indoors or outdoors");
    };
  }

  private void psi() {
    out.append("psi:\n  junction:\n    between: [indoors, outdoors]\n    dimensions: ");
    out.append(
        Undecided.mark("external, internal or overall-internal, as your calculation has it"));
    out.append('\n');
  }

  private void lists() {
    int number = plan.fills().size() + 1;
    if (!doubts.isEmpty()) {
      out.append('\n');
      comment("", "To look at, numbered as in the picture:");
      for (Doubt doubt : doubts) {
        comment("", number++ + ": " + doubt.text());
      }
    }
    if (plan.passedOver() > 0) {
      out.append('\n');
      comment(
          "",
          plan.passedOver() + " outlines are not taken: what they enclose is hatched or filled");
    }
    if (!drawing.leftOut().isEmpty()) {
      out.append('\n');
      comment("", "Left out of the drawing:");
      for (LeftOut left : drawing.leftOut()) {
        comment("", left.text());
      }
    }
  }

  private String point(Point p) {
    return "[" + number(p.x()) + ", " + number(p.y()) + "]";
  }

  /** A length in the unit of the case. */
  private String number(double metres) {
    BigDecimal value = new BigDecimal(metres / scaling.metresPerCaseUnit());
    BigDecimal rounded = value.round(new MathContext(10));
    return rounded.signum() == 0 ? "0" : rounded.stripTrailingZeros().toPlainString();
  }

  private static String figure(double value) {
    return new BigDecimal(value).round(new MathContext(4)).stripTrailingZeros().toPlainString();
  }

  /** A text as YAML, in quotes where it needs them. */
  static String quoted(String text) {
    boolean plain = !text.isEmpty() && Character.isLetter(text.charAt(0));
    for (int i = 0; i < text.length() && plain; i++) {
      char c = text.charAt(i);
      plain = Character.isLetterOrDigit(c) || " _-./".indexOf(c) >= 0;
    }
    if (plain && text.equals(text.strip()) && !SPECIAL.contains(text.toLowerCase(Locale.ROOT))) {
      return text;
    }
    StringBuilder quoted = new StringBuilder("\"");
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      if (c == '"' || c == '\\') {
        quoted.append('\\').append(c);
      } else if (c < 32 || c >= 127 && c < 160 || c == '\u2028' || c == '\u2029' || c == '\uFEFF') {
        String hex = Integer.toHexString(c);
        quoted.append("\\u").append("0000", 0, 4 - hex.length()).append(hex);
      } else {
        quoted.append(c);
      }
    }
    return quoted.append('"').toString();
  }
}
