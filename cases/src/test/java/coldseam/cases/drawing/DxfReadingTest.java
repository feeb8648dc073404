package coldseam.cases.drawing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** DXF entities against their areas by elementary geometry; group codes *from memory*. */
class DxfReadingTest {
  @TempDir private Path folder;

  private Drawing read(Dxf dxf) throws DrawingException {
    return read(dxf.text());
  }

  private Drawing read(String text) throws DrawingException {
    try {
      Path file = folder.resolve("drawing.dxf");
      Files.writeString(file, text);
      return Drawing.read(file, OptionalDouble.of(1e-4));
    } catch (IOException e) {
      throw new AssertionError(e);
    }
  }

  private static Placement plain() {
    return new Placement(1, new Point(0, 0), 1e-6);
  }

  private List<Double> areas(Dxf dxf) throws DrawingException {
    return DrawnShapes.of(read(dxf), plain()).all().stream()
        .map(DrawnShapes.Shape::areaM2)
        .toList();
  }

  private void fails(String text, int line, String wrong) {
    assertThatThrownBy(() -> read(text))
        .isInstanceOfSatisfying(
            DrawingException.class,
            e -> {
              assertThat(e.wrong()).contains(wrong);
              assertThat(e.line()).isEqualTo(line);
            });
  }

  @Test
  void closed_polylines_have_their_area() throws DrawingException {
    assertThat(areas(new Dxf().polyline("W", true, 0, 0, 30, 0, 30, 40, 0, 40)))
        .containsExactly(1200.0);
  }

  @Test
  void a_bulge_of_one_is_a_half_circle() throws DrawingException {
    // A square of side 2 with half a disc outside and half a disc cut out: 4 + π/2 − π/2.
    Dxf dxf =
        new Dxf()
            .entity("LWPOLYLINE", "W")
            .group(90, 4)
            .group(70, 1)
            .group(10, 0)
            .group(20, 0)
            .group(10, 2)
            .group(20, 0)
            .group(42, 1)
            .group(10, 2)
            .group(20, 2)
            .group(10, 0)
            .group(20, 2);
    assertThat(areas(dxf).get(0)).isCloseTo(4 + Math.PI / 2, within(4e-4));
    dxf.group(42, -1);
    assertThat(areas(dxf).get(0)).isCloseTo(4, within(8e-4));
  }

  @Test
  void old_polylines_have_bulges_too() throws DrawingException {
    Dxf dxf =
        new Dxf()
            .entity("POLYLINE", "W")
            .group(66, 1)
            .group(70, 1)
            .entity("VERTEX", "W")
            .group(10, 0)
            .group(20, 0)
            .group(42, 1)
            .entity("VERTEX", "W")
            .group(10, 2)
            .group(20, 0)
            .group(42, 1)
            .entity("SEQEND", "W");
    assertThat(areas(dxf).get(0)).isCloseTo(Math.PI, within(8e-4));
  }

  @Test
  void circles_and_ellipses_deviate_no_more_than_asked() throws DrawingException {
    Dxf dxf =
        new Dxf()
            .entity("CIRCLE", "W")
            .group(10, 5)
            .group(20, 5)
            .group(40, 2)
            .entity("ELLIPSE", "W")
            .group(10, 20)
            .group(20, 0)
            .group(11, 3)
            .group(21, 4)
            .group(40, 0.5);
    Drawing drawing = read(dxf);
    for (Point p : drawing.pieces().get(0).rings().get(0)) {
      assertThat(Math.hypot(p.x() - 5, p.y() - 5)).isCloseTo(2, within(1e-12));
    }
    List<Point> ring = drawing.pieces().get(0).rings().get(0);
    double chord = ring.get(0).distance(ring.get(1));
    assertThat(2 - Math.sqrt(4 - chord * chord / 4)).isBetween(1e-5, 1e-4);
    List<Double> areas = areas(dxf);
    assertThat(areas.get(0)).isCloseTo(4 * Math.PI, within(2e-3));
    assertThat(areas.get(1)).isCloseTo(Math.PI * 5 * 2.5, within(4e-3));
  }

  @Test
  void lines_and_arcs_of_a_layer_close_to_a_face() throws DrawingException {
    Dxf dxf =
        new Dxf()
            .line("W", 0, 0, 2, 0)
            .line("W", 0, 2, 0, 0)
            .entity("ARC", "W")
            .group(10, 0)
            .group(20, 0)
            .group(40, 2)
            .group(50, 0)
            .group(51, 90);
    assertThat(areas(dxf)).hasSize(1);
    assertThat(areas(dxf).get(0)).isCloseTo(Math.PI, within(4e-4));
  }

  @Test
  void a_rational_spline_draws_a_quarter_circle_exactly() throws DrawingException {
    // Piegl and Tiller, The NURBS Book, 7.3 *from memory*: weights 1, √½, 1.
    Dxf dxf =
        new Dxf()
            .line("W", 0, 0, 1, 0)
            .line("W", 0, 1, 0, 0)
            .entity("SPLINE", "W")
            .group(71, 2)
            .group(40, 0)
            .group(40, 0)
            .group(40, 0)
            .group(40, 1)
            .group(40, 1)
            .group(40, 1)
            .group(41, 1)
            .group(41, Math.sqrt(0.5))
            .group(41, 1)
            .group(10, 1)
            .group(20, 0)
            .group(10, 1)
            .group(20, 1)
            .group(10, 0)
            .group(20, 1);
    List<Point> chords = read(dxf).pieces().get(2).rings().get(0);
    assertThat(chords).hasSizeGreaterThan(8);
    for (Point p : chords) {
      assertThat(Math.hypot(p.x(), p.y())).isCloseTo(1, within(1e-12));
    }
    assertThat(areas(dxf).get(0)).isCloseTo(Math.PI / 4, within(2e-4));
  }

  @Test
  void a_hatch_has_islands_and_edges_of_every_kind() throws DrawingException {
    Dxf dxf =
        new Dxf()
            .entity("HATCH", "H")
            .group(2, "ANSI31")
            .group(70, 0)
            .group(91, 2)
            .group(92, 3)
            .group(72, 0)
            .group(73, 1)
            .group(93, 4)
            .group(10, 0)
            .group(20, 0)
            .group(10, 10)
            .group(20, 0)
            .group(10, 10)
            .group(20, 10)
            .group(10, 0)
            .group(20, 10)
            .group(97, 0)
            // The island: a half disc of radius 2, its arc drawn clockwise.
            .group(92, 16)
            .group(93, 2)
            .group(72, 1)
            .group(10, 7)
            .group(20, 5)
            .group(11, 3)
            .group(21, 5)
            .group(72, 2)
            .group(10, 5)
            .group(20, 5)
            .group(40, 2)
            .group(50, 180)
            .group(51, 360)
            .group(73, 0)
            .group(97, 0)
            .group(75, 0)
            .group(76, 1);
    DrawnShapes shapes = DrawnShapes.of(read(dxf), plain());
    assertThat(shapes.looks()).containsExactly("ANSI31");
    assertThat(shapes.all()).hasSize(1);
    assertThat(shapes.all().get(0).areaM2()).isCloseTo(100 - 2 * Math.PI, within(1e-3));
    List<Point> island = shapes.all().get(0).rings().get(1);
    assertThat(island).allSatisfy(p -> assertThat(p.y()).isGreaterThan(5 - 1e-9));
  }

  @Test
  void blocks_are_placed_nested_turned_scaled_and_in_rows() throws DrawingException {
    Dxf dxf =
        new Dxf()
            .block("unit", 1, 1)
            .polyline("0", true, 1, 1, 2, 1, 2, 2, 1, 2)
            .endBlock()
            .block("pair", 0, 0)
            .insert("unit", "0", 0, 0)
            .insert("unit", "0", 5, 0)
            .group(41, 2)
            .endBlock()
            .insert("pair", "BRICK", 100, 50)
            .group(42, -3)
            .group(50, 90)
            .group(70, 2)
            .group(44, 20)
            .group(71, 3)
            .group(45, 30);
    Drawing drawing = read(dxf);
    assertThat(drawing.pieces()).hasSize(12);
    assertThat(drawing.pieces()).allSatisfy(p -> assertThat(p.layer()).isEqualTo("BRICK"));
    // Columns go along the turned x, so upwards; rows to the left. Mirrored, y goes to the right.
    List<Point> first = drawing.pieces().get(0).rings().get(0);
    assertThat(first).contains(new Point(100, 50), new Point(103, 51));
    List<Point> last = drawing.pieces().get(11).rings().get(0);
    assertThat(last).contains(new Point(40, 75), new Point(43, 77));
    List<Double> areas = areas(dxf);
    assertThat(areas).hasSize(12);
    assertThat(areas.stream().mapToDouble(a -> a).sum()).isCloseTo(6 * (3 + 6), within(1e-9));
  }

  @Test
  void what_is_seen_from_behind_is_mirrored() throws DrawingException {
    Dxf dxf =
        new Dxf()
            .entity("ARC", "W")
            .group(10, -5)
            .group(20, 0)
            .group(40, 1)
            .group(50, 0)
            .group(51, 90)
            .group(230, -1);
    List<Point> arc = read(dxf).pieces().get(0).rings().get(0);
    assertThat(arc.get(0)).isEqualTo(new Point(4, 0));
    assertThat(arc.get(arc.size() - 1).x()).isCloseTo(5, within(1e-12));
  }

  @Test
  void hidden_layers_words_and_dimensions_are_left_out_and_listed() throws DrawingException {
    Dxf dxf =
        new Dxf()
            .layer("OFF", 0, -3)
            .layer("COLD", 1, 7)
            .line("OFF", 0, 0, 1, 0)
            .line("COLD", 0, 0, 1, 0)
            .line("DEFPOINTS", 0, 0, 1, 0)
            .line("W", 0, 0, 1, 0)
            .entity("TEXT", "T")
            .group(1, "brick")
            .entity("TEXT", "T")
            .entity("DIMENSION", "D")
            .entity("XLINE", "W")
            .entity("LINE", "W")
            .group(67, 1)
            .group(10, 0)
            .group(20, 0)
            .group(11, 0)
            .group(21, 0);
    Drawing drawing = read(dxf);
    assertThat(drawing.pieces()).hasSize(1);
    assertThat(drawing.leftOut().stream().map(LeftOut::text).toList())
        .anyMatch(t -> t.startsWith("LINE on layer `OFF`: the layer is off (line "))
        .anyMatch(t -> t.contains("`COLD`: the layer is frozen"))
        .anyMatch(t -> t.contains("`DEFPOINTS`"))
        .anyMatch(t -> t.startsWith("2 × TEXT on layer `T`: words are no outlines"))
        .anyMatch(t -> t.contains("DIMENSION"))
        .anyMatch(t -> t.contains("XLINE"))
        .anyMatch(t -> t.contains("drawn on the paper"));
  }

  @Test
  void proxies_are_named_and_serious() throws DrawingException {
    Dxf dxf =
        new Dxf()
            .oneClass("EXAMPLE_WALL")
            .entity("ACAD_PROXY_ENTITY", "A")
            .group(90, 498)
            .group(91, 500)
            .line("W", 0, 0, 1, 0);
    LeftOut proxy = read(dxf).leftOut().get(0);
    assertThat(proxy.what()).isEqualTo("proxy of EXAMPLE_WALL");
    assertThat(proxy.serious()).isTrue();
  }

  @Test
  void units_come_from_the_header() throws DrawingException {
    Dxf plain = new Dxf().line("W", 0, 0, 1, 0);
    assertThat(read(plain).unit()).isEmpty();
    assertThat(read(plain.units(4)).unit()).contains(DrawingUnit.MM);
    assertThat(read(plain.units(1)).unit()).contains(DrawingUnit.IN);
    assertThat(read(plain.units(19)).unit()).isEmpty();
    assertThat(read(plain.units(19)).remarks().get(0)).contains("by number 19");
  }

  @Test
  void damaged_files_are_refused_with_the_line() {
    String good = new Dxf().line("W", 0, 0, 1, 0).text();
    fails("AutoCAD Binary DXF\r\n\u001a", 0, "binary DXF");
    fails("AC1015 and more", 0, "DWG");
    fails(good.replace("11\n1.0", "11\n1,5"), 14, "a decimal comma: `1,5`");
    fails(good.replace("11\n1.0", "11\nabc"), 14, "a number is due here");
    fails(good.replace("11\n1.0", "11\n1e308"), 14, "out of range");
    fails(good.replace("11\n1.0", "eleven\n1.0"), 13, "a group code is due");
    fails("nothing of the kind\n", 1, "a group code is due");
    String cut = good.substring(0, good.indexOf("ENDSEC", good.indexOf("ENTITIES")));
    fails(cut, 17, "the file ends here");
    fails(good.replace("21\n0.0", "29\n0.0"), 6, "this LINE has no group 21");
    fails("0\nSECTION\n2\n" + "x".repeat(20_000), 4, "longer than");
  }

  @Test
  void every_truncation_is_refused_with_a_line() {
    String good =
        new Dxf()
            .units(4)
            .layer("W", 0, 7)
            .block("b", 0, 0)
            .line("W", 0, 0, 1, 1)
            .endBlock()
            .insert("b", "W", 1, 1)
            .polyline("W", true, 0, 0, 1, 0, 1, 1)
            .text();
    String[] lines = good.split("\n");
    StringBuilder text = new StringBuilder();
    for (int i = 0; i + 1 < lines.length; i++) {
      text.append(lines[i]).append('\n');
      String cut = text.toString();
      assertThatThrownBy(() -> read(cut))
          .as("after line " + (i + 1))
          .isInstanceOfSatisfying(
              DrawingException.class, e -> assertThat(e.line()).isGreaterThan(0));
    }
  }

  @Test
  void blocks_in_themselves_and_bombs_of_blocks_are_refused() {
    Dxf cycle =
        new Dxf()
            .block("a", 0, 0)
            .insert("b", "0", 0, 0)
            .endBlock()
            .block("b", 0, 0)
            .insert("a", "0", 0, 0)
            .endBlock()
            .insert("a", "0", 0, 0);
    assertThatThrownBy(() -> read(cycle)).hasMessageContaining("`a` is put into itself");
    Dxf bomb = new Dxf().block("b0", 0, 0).line("0", 0, 0, 1, 1).endBlock();
    for (int i = 1; i < 12; i++) {
      bomb.block("b" + i, 0, 0);
      for (int k = 0; k < 10; k++) {
        bomb.insert("b" + (i - 1), "0", k, 0);
      }
      bomb.endBlock();
    }
    bomb.insert("b11", "0", 0, 0);
    assertThatThrownBy(() -> read(bomb)).hasMessageContaining("unfolds into more than");
    Dxf array = new Dxf().block("b", 0, 0).endBlock().insert("b", "0", 0, 0);
    array.group(70, 30_000).group(71, 30_000);
    assertThatThrownBy(() -> read(array)).hasMessageContaining("unfolds into more than");
  }

  @Test
  void a_million_corners_are_the_end() {
    StringBuilder text = new StringBuilder("0\nSECTION\n2\nENTITIES\n0\nLWPOLYLINE\n8\nW\n");
    for (int i = 0; i < 1_000_002; i++) {
      text.append("10\n").append(i).append("\n20\n").append(i % 2).append('\n');
    }
    assertThatThrownBy(() -> read(text + "0\nENDSEC\n0\nEOF\n"))
        .hasMessageContaining("more than 1000000 corners");
  }
}
