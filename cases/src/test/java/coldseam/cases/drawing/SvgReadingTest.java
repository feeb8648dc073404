package coldseam.cases.drawing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalDouble;
import java.util.zip.GZIPOutputStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** SVG shapes against their areas by elementary geometry; clauses of SVG 1.1 *from memory*. */
class SvgReadingTest {
  private static final String HEAD =
      "<svg xmlns='http://www.w3.org/2000/svg' xmlns:xlink='http://www.w3.org/1999/xlink'"
          + " xmlns:inkscape='http://www.inkscape.org/namespaces/inkscape'"
          + " width='100mm' height='100mm' viewBox='0 0 100 100'>\n";

  @TempDir private Path folder;

  private Drawing document(String text) throws DrawingException {
    return document(text.getBytes(StandardCharsets.UTF_8));
  }

  private Drawing document(byte[] bytes) throws DrawingException {
    try {
      Path file = folder.resolve("drawing.svg");
      Files.write(file, bytes);
      return Drawing.read(file, OptionalDouble.of(1e-4));
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  private Drawing read(String inside) throws DrawingException {
    return document(HEAD + inside + "</svg>");
  }

  private List<DrawnShapes.Shape> shapes(String inside) throws DrawingException {
    return DrawnShapes.of(read(inside), new Placement(1, new Point(0, 0), 1e-6)).all();
  }

  private double area(String inside) throws DrawingException {
    return shapes(inside).stream().mapToDouble(DrawnShapes.Shape::areaM2).sum();
  }

  private void fails(String inside, int line, String wrong) {
    assertThatThrownBy(() -> read(inside))
        .isInstanceOfSatisfying(
            DrawingException.class,
            e -> {
              assertThat(e.wrong()).contains(wrong);
              assertThat(e.line()).isEqualTo(line);
            });
  }

  @Test
  void basic_shapes_have_their_area() throws DrawingException {
    assertThat(area("<rect x='1' y='2' width='30' height='40'/>")).isCloseTo(1200, within(1e-9));
    assertThat(area("<rect width='30' height='40' rx='5'/>"))
        .isCloseTo(1200 - (4 - Math.PI) * 25, within(1e-2));
    assertThat(area("<circle cx='9' cy='9' r='7'/>")).isCloseTo(49 * Math.PI, within(5e-3));
    assertThat(area("<ellipse cx='9' cy='9' rx='7' ry='3'/>"))
        .isCloseTo(21 * Math.PI, within(5e-3));
    assertThat(area("<polygon points='0,0 10,0 10,5'/>")).isCloseTo(25, within(1e-9));
    assertThat(area("<polyline points='0 0,10-0,10,5'/>")).isCloseTo(25, within(1e-9));
  }

  @Test
  void paths_have_every_command() throws DrawingException {
    assertThat(area("<path d='M1 1h10v5H1z'/>")).isCloseTo(50, within(1e-9));
    assertThat(area("<path d='m1,1 10,0 0,5-10,0z m20 0 5 0 0 5-5 0z'/>"))
        .isCloseTo(75, within(1e-9));
    // A full circle of two arcs with the flags written together.
    assertThat(area("<path d='M2 5a3 3 0 1110 0a3 3 0 11-10 0Z'/>"))
        .isCloseTo(25 * Math.PI, within(5e-3));
    // Under a parabola: a quadratic curve with its control point at twice the height, 2/3 b h.
    assertThat(area("<path d='M0 0Q5 12 10 0Z'/>")).isCloseTo(2.0 / 3 * 10 * 6, within(2e-3));
    assertThat(area("<path d='M0 0Q5 12 10 0T20 0Z'/>")).isCloseTo(4.0 / 3 * 10 * 6, within(4e-3));
    // A straight line as a cubic curve, and its smooth continuation.
    assertThat(area("<path d='M0 0C1 0 2 0 3 0S5 0 6 0V2H0Z'/>")).isCloseTo(12, within(1e-9));
  }

  @Test
  void an_arc_passes_where_the_standard_says() throws DrawingException {
    // SVG 1.1, 8.3.8: of the two large and small arcs of radius 5 over a chord of 6, heights 1 and
    // 9.
    double[] heights = {1, 9, -1, -9};
    String[] flags = {"0 1", "1 1", "0 0", "1 0"};
    for (int i = 0; i < 4; i++) {
      List<Point> ring =
          read("<path d='M0 0A5 5 0 " + flags[i] + " 6 0'/>").pieces().get(0).rings().get(0);
      double most = 0;
      for (Point p : ring) {
        double up = p.y() - 100;
        most = Math.abs(up) > Math.abs(most) ? up : most;
      }
      assertThat(most).as(flags[i]).isCloseTo(heights[i], within(2e-4));
    }
  }

  @Test
  void holes_follow_the_fill_rule() throws DrawingException {
    String sameWay = "M0 0H10V10H0ZM2 2H8V8H2Z";
    String otherWay = "M0 0H10V10H0ZM2 2V8H8V2Z";
    assertThat(area("<path fill-rule='evenodd' d='" + sameWay + "'/>")).isCloseTo(64, within(1e-9));
    assertThat(area("<path d='" + otherWay + "'/>")).isCloseTo(64, within(1e-9));
    assertThat(area("<path d='" + sameWay + "'/>")).isCloseTo(100, within(1e-9));
  }

  @Test
  void transforms_are_nested_and_in_order() throws DrawingException {
    String rect = "<rect width='2' height='1'/>";
    List<Point> ring =
        read("<g transform='translate(10, 20) rotate(90)'><g transform='scale(3 -1)'>"
                + rect
                + "</g></g>")
            .pieces()
            .get(0)
            .rings()
            .get(0);
    // (2, 1) → (6, −1) → (1, 6) → (11, 26), seen upwards (11, 74).
    assertThat(ring).contains(new Point(10, 80), new Point(11, 74));
    assertThat(area("<g transform='skewX(30) matrix(2 0 0 2 5 5)'>" + rect + "</g>"))
        .isCloseTo(8, within(1e-9));
    assertThat(area("<g transform='rotate(17 5 5)'>" + rect + "</g>")).isCloseTo(2, within(1e-9));
  }

  @Test
  void what_is_used_is_drawn_where_it_is_used() throws DrawingException {
    Drawing drawing =
        read(
            "<defs><g id='brick'><rect width='4' height='2'/></g>"
                + "<symbol id='s' viewBox='0 0 10 10'><rect width='10' height='5'/></symbol></defs>"
                + "<use href='#brick' x='1' y='1'/><use xlink:href='#brick' transform='scale(2)'/>"
                + "<use href='#s' width='20' height='20'/>");
    assertThat(drawing.pieces()).hasSize(3);
    assertThat(drawing.pieces().get(0).rings().get(0)).contains(new Point(1, 99), new Point(5, 97));
    assertThat(drawing.pieces().get(1).rings().get(0)).contains(new Point(8, 96));
    assertThat(drawing.pieces().get(2).rings().get(0)).contains(new Point(20, 90));
  }

  @Test
  void layers_and_looks_come_from_groups_classes_and_styles() throws DrawingException {
    Drawing drawing =
        read(
            "<style>/* x */ .wall, .slab{fill:#C66;stroke:none} rect.slab{fill:rgb(0,128,255)}"
                + " @import url(http://example.invalid/a.css); .gone{display:none}</style>"
                + "<g inkscape:groupmode='layer' inkscape:label='Masonry' id='g1'>"
                + "<g id='inner'><rect class='wall' width='1' height='1'/></g></g>"
                + "<g id='Layer_x20_2' fill='#00f'><rect width='1' height='1'/>"
                + "<rect class='gone' width='1' height='1'/>"
                + "<path d='M0 0H5' style='fill:none;stroke:red'/></g>"
                + "<rect width='1' height='1' style='fill: url(#hatch)'/>"
                + "<rect width='1' height='1' fill='none'/>");
    List<Piece> pieces = drawing.pieces();
    assertThat(pieces).hasSize(4);
    assertThat(pieces.get(0).layer()).isEqualTo("Masonry");
    assertThat(pieces.get(0).look()).isEqualTo("wall");
    assertThat(pieces.get(1).layer()).isEqualTo("Layer 2");
    assertThat(pieces.get(1).look()).isEqualTo("#0000ff");
    assertThat(pieces.get(2).filled()).isFalse();
    assertThat(pieces.get(3).look()).isEqualTo("hatch");
    assertThat(drawing.leftOut().stream().map(LeftOut::text).toList())
        .anyMatch(t -> t.contains("it is hidden"))
        .anyMatch(t -> t.contains("neither fill nor stroke"))
        .anyMatch(t -> t.contains("a rule of a style sheet: nothing is fetched"));
  }

  @Test
  void pages_have_units_or_not() throws DrawingException {
    String rect = "<rect width='10' height='10'/></svg>";
    String open = "<svg xmlns='http://www.w3.org/2000/svg' ";
    Drawing none = document(open + "viewBox='0 0 50 20'>" + rect);
    assertThat(none.unit()).isEmpty();
    assertThat(none.pieces().get(0).rings().get(0)).contains(new Point(0, 20), new Point(10, 10));
    assertThat(document(open + "width='300' height='200'>" + rect).unit()).isEmpty();
    Drawing scaled = document(open + "width='20cm' height='100mm' viewBox='0 0 20 10'>" + rect);
    assertThat(scaled.unit()).contains(DrawingUnit.MM);
    assertThat(scaled.pieces().get(0).rings().get(0))
        .contains(new Point(0, 100), new Point(100, 0));
    Drawing pixels = document(open + "width='96mm' height='96mm'>" + rect);
    double x = pixels.pieces().get(0).rings().get(0).get(1).x();
    assertThat(x).isCloseTo(10 * 25.4 / 96, within(1e-12));
  }

  @Test
  void packed_files_are_unpacked() throws Exception {
    ByteArrayOutputStream packed = new ByteArrayOutputStream();
    try (GZIPOutputStream out = new GZIPOutputStream(packed)) {
      out.write((HEAD + "<rect width='3' height='3'/></svg>").getBytes(StandardCharsets.UTF_8));
    }
    assertThat(document(packed.toByteArray()).pieces()).hasSize(1);
    byte[] cut = java.util.Arrays.copyOf(packed.toByteArray(), packed.size() / 2);
    assertThatThrownBy(() -> document(cut)).hasMessageContaining("packed file is damaged");
  }

  @Test
  void a_packed_bomb_is_refused() throws Exception {
    ByteArrayOutputStream packed = new ByteArrayOutputStream();
    try (GZIPOutputStream out = new GZIPOutputStream(packed)) {
      byte[] blanks = new byte[1 << 20];
      java.util.Arrays.fill(blanks, (byte) ' ');
      for (int i = 0; i < 70; i++) {
        out.write(blanks);
      }
    }
    assertThatThrownBy(() -> document(packed.toByteArray())).hasMessageContaining("larger than 64");
  }

  @Test
  void scripts_words_and_foreign_things_are_left_out_and_listed() throws DrawingException {
    Drawing drawing =
        read(
            "<script>document.x()</script><text>brick</text><image href='http://example.invalid/'/>"
                + "<use href='http://example.invalid/other.svg#a'/><use href='#nothing'/>"
                + "<foreignObject/><rect width='1' height='1' onclick='x()'/>");
    assertThat(drawing.pieces()).hasSize(1);
    assertThat(drawing.leftOut().stream().map(LeftOut::text).toList())
        .anyMatch(t -> t.startsWith("`script`: scripts are never run (line 2)"))
        .anyMatch(t -> t.startsWith("`text`"))
        .anyMatch(t -> t.startsWith("`image`"))
        .anyMatch(t -> t.startsWith("a reference to `http://example.invalid/other.svg#a`"))
        .anyMatch(t -> t.contains("nothing has that id"));
  }

  @Test
  void entities_of_the_file_are_expanded_and_others_never_fetched() throws Exception {
    Path secret = folder.resolve("secret.txt");
    Files.writeString(secret, "<rect width='7' height='7'/>");
    String dtd =
        "<!DOCTYPE svg PUBLIC '-//W3C//DTD SVG 1.1//EN' 'http://example.invalid/svg11.dtd' [\n"
            + "<!ENTITY ns 'http://www.w3.org/2000/svg'>\n<!ENTITY side '12'>\n"
            + "<!ENTITY far SYSTEM '"
            + secret.toUri()
            + "'>\n]>\n";
    Drawing drawing =
        document(
            dtd
                + "<svg xmlns='&ns;' viewBox='0 0 9 9'><rect width='&side;' height='1'/>&far;</svg>");
    assertThat(drawing.pieces()).hasSize(1);
    assertThat(drawing.pieces().get(0).rings().get(0)).contains(new Point(12, 9));
    assertThat(drawing.leftOut().stream().map(LeftOut::text).toList())
        .anyMatch(t -> t.contains("nothing is fetched"));
  }

  @Test
  void bombs_of_entities_are_refused_with_a_line() {
    StringBuilder dtd = new StringBuilder("<!DOCTYPE svg [\n<!ENTITY a0 'xxxxxxxxxx'>\n");
    for (int i = 1; i < 12; i++) {
      dtd.append("<!ENTITY a" + i + " '" + ("&a" + (i - 1) + ";").repeat(10) + "'>\n");
    }
    String text = dtd + "]>\n<svg xmlns='http://www.w3.org/2000/svg'>&a11;</svg>";
    assertThatThrownBy(() -> document(text))
        .isInstanceOfSatisfying(
            DrawingException.class,
            e -> {
              assertThat(e.wrong()).contains("expand beyond all measure");
              assertThat(e.line()).isGreaterThan(0);
            });
  }

  @Test
  void bombs_and_circles_of_uses_are_refused_with_the_line() {
    fails("<g id='a'><use href='#b'/></g>\n<g id='b'><use href='#a'/></g>", 2, "is used in itself");
    StringBuilder bomb = new StringBuilder("<defs><g id='u0'><rect width='1' height='1'/></g>");
    for (int i = 1; i < 12; i++) {
      bomb.append("<g id='u" + i + "'>" + ("<use href='#u" + (i - 1) + "'/>").repeat(10) + "</g>");
    }
    fails(bomb + "</defs><use href='#u11'/>", 2, "unfolds into more than");
  }

  @Test
  void mistakes_are_told_with_the_line() {
    fails("<rect width='1' height='1'>", 2, "no well-formed XML");
    fails("\n<path d='M0 0L5'/>", 3, "a number is due in the data of this path, character 7");
    fails("<path d='L5 5'/>", 2, "`M` first of all");
    fails("<path d='M0 0 X 5'/>", 2, "one of the commands");
    fails("<rect width='1,5' height='1'/>", 2, "a decimal comma: `width` is `1,5`");
    fails("<rect width='5em' height='1'/>", 2, "is in `em`");
    fails("<g transform='turn(5)'/>", 2, "`matrix`, `translate`");
    fails("<g transform='rotate(5 6)'/>", 2, "another count of numbers");
    fails("<rect width='1e308' height='1'/>", 2, "a number within range");
    fails("<g transform='scale(1e200)'><rect width='1e9' height='1'/></g>", 2, "beyond anything");
    assertThatThrownBy(() -> document("<html/>")).hasMessageContaining("no SVG document");
    assertThatThrownBy(() -> document("")).hasMessageContaining("empty");
  }

  /** By mark of byte order, by name, or UTF-8; XML 1.0, appendix F. */
  @Test
  void encodings_are_known_by_mark_or_name() throws Exception {
    String body =
        "<svg xmlns='http://www.w3.org/2000/svg'><g id='Wärme'><rect width='1' height='1'/></g></svg>";
    String latin = "<?xml version='1.0' encoding='ISO-8859-1'?>" + body;
    for (byte[] bytes :
        List.of(
            body.getBytes(StandardCharsets.UTF_8),
            ("\uFEFF" + body).getBytes(StandardCharsets.UTF_8),
            ("\uFEFF" + body).getBytes(StandardCharsets.UTF_16LE),
            ("\uFEFF" + body).getBytes(StandardCharsets.UTF_16BE),
            body.getBytes(StandardCharsets.UTF_16LE),
            latin.getBytes(StandardCharsets.ISO_8859_1))) {
      Path file = Files.write(folder.resolve("encoded.svg"), bytes);
      Drawing drawing = Drawing.read(file, OptionalDouble.empty());
      assertThat(drawing.pieces()).extracting(Piece::layer).containsExactly("Wärme");
    }
  }

  @Test
  void what_is_not_in_the_encoding_is_told_with_its_line() throws Exception {
    String head = "<svg xmlns='http://www.w3.org/2000/svg'>\n<g id='W";
    byte[] latin = (head + "ärme'/></svg>").getBytes(StandardCharsets.ISO_8859_1);
    Path file = Files.write(folder.resolve("latin.svg"), latin);
    assertThatThrownBy(() -> Drawing.read(file, OptionalDouble.empty()))
        .isInstanceOfSatisfying(
            DrawingException.class,
            e -> {
              assertThat(e.wrong()).isEqualTo("a character here is not in the encoding UTF-8");
              assertThat(e.line()).isEqualTo(2);
            });
    Files.writeString(file, "<?xml version='1.0' encoding='klingon'?><svg/>");
    assertThatThrownBy(() -> Drawing.read(file, OptionalDouble.empty()))
        .hasMessageContaining("`klingon` is no encoding known here");
    Files.writeString(file, "<?xml version='1.0' encoding=?><svg/>");
    assertThatThrownBy(() -> Drawing.read(file, OptionalDouble.empty()))
        .hasMessageContaining("is no encoding known here");
  }

  @Test
  void names_hold_nothing_that_a_terminal_acts_on() throws DrawingException {
    Drawing drawing = read("<g id='a&#x9b;31m&#x202e;b'><rect width='1' height='1'/></g>");
    assertThat(drawing.pieces().get(0).layer()).isEqualTo("a\uFFFD31m\uFFFDb");
  }
}
