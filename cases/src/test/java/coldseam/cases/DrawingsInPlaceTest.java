package coldseam.cases;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cases.drawing.Dxf;
import coldseam.mesh.partition.Partition;
import coldseam.mesh.plane.Resolution;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Certificate;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.detail.Assumption;
import coldseam.solver.detail.Detail;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Cases that take shapes from drawings. */
class DrawingsInPlaceTest {
  private static final String HEAD =
      """
      coldseam: 1
      title: Drawn
      drawings:
        detail: {file: detail.dxf, tolerance: 0.5, deviation: 0.1}
      materials: {brick: {conductivity: 0.5}, wool: {conductivity: 0.04}, slab: {conductivity: 2}}
      spaces:
        indoors: {temperature: 20, exposure: inside, film: 0.13}
        outdoors: {temperature: -5, exposure: outside, film: 0.04}
      section:
      """;

  private static final String BY_LAYER =
      HEAD
          + """
            - {fill: indoors, drawing: detail, layer: ROOM}
            - {fill: outdoors, drawing: detail, layer: OPEN AIR}
            - {fill: brick, drawing: detail, layer: BRICK}
            - {fill: wool, drawing: detail, look: ANSI37}
            - {fill: slab, drawing: detail, layer: slab}
          """;

  private static final String BY_POINTS =
      HEAD
          + """
            - {fill: indoors, around: [-300, 100]}
            - {fill: indoors, around: [-300, 700]}
            - {fill: outdoors, around: [500, 500]}
            - {fill: brick, drawing: detail, layer: BRICK}
            - {fill: wool, drawing: detail, look: ANSI37}
            - {fill: slab, drawing: detail, at: [[-300, 400], [100, 400], [270, 400]]}
          """;

  @TempDir private Path folder;

  @BeforeEach
  void draw() throws IOException {
    write(edge(new Dxf().units(4)));
  }

  private void write(Dxf dxf) throws IOException {
    Files.writeString(folder.resolve("detail.dxf"), dxf.text());
  }

  /** A slab edge with a rounded nose: loose lines with gaps, a hatch, rooms as outlines. */
  private static Dxf edge(Dxf dxf) {
    return dxf.line("BRICK", 0, 0, 239.8, 0)
        .line("BRICK", 240, 0.2, 240, 1000)
        .line("BRICK", 240, 1000.1, 0, 1000)
        .line("BRICK", 0, 999.7, 0, 0)
        .entity("HATCH", "INSULATION")
        .group(2, "ANSI37")
        .group(91, 1)
        .group(92, 7)
        .group(72, 0)
        .group(73, 1)
        .group(93, 4)
        .group(10, 240.3)
        .group(20, 0)
        .group(10, 400)
        .group(20, 0)
        .group(10, 400)
        .group(20, 1000)
        .group(10, 240.3)
        .group(20, 1000)
        .group(97, 0)
        .line("SLAB", -600, 300, 200, 300)
        .line("SLAB", 200.2, 500, -600, 500)
        .line("SLAB", -600, 500, -600, 300.3)
        .entity("ARC", "SLAB")
        .group(10, 200)
        .group(20, 400)
        .group(40, 100)
        .group(50, -90)
        .group(51, 90)
        .polyline("ROOM", true, -600, 0, 0, 0, 0, 300, -600, 300)
        .polyline("ROOM", true, -600, 500, 0, 500, 0, 1000, -600, 1000)
        .polyline("OPEN AIR", true, 400, 0, 600, 0, 600, 1000, 400, 1000);
  }

  private Detail detail(String text) {
    try {
      return Written.read(folder, text).detail(Optional.empty());
    } catch (CaseException e) {
      throw new AssertionError(e.problems().toString(), e);
    }
  }

  private static double[] areasMm2(Detail detail) {
    Partition partition = Partition.of(detail.labelledAreas(), List.of(), Resolution.STANDARD);
    double[] areas = new double[detail.fills().size()];
    for (int label = 0; label < areas.length; label++) {
      areas[label] = partition.labelArea(label) * 1e6;
    }
    return areas;
  }

  /** Joined corners move by up to 0.3 mm, along edges of up to 1000 mm. */
  @Test
  void layers_hatches_and_faces_become_areas() {
    double nose = Math.PI * 100 * 100 / 2;
    double inBrick = 200 * 200 + nose - beyond(40);
    for (String text : List.of(BY_LAYER, BY_POINTS)) {
      Detail detail = detail(text);
      double[] areas = areasMm2(detail);
      List<String> names = detail.fills().stream().map(f -> f.name()).toList();
      assertThat(areas[names.indexOf("slab")]).isCloseTo(800 * 200 + nose, within(100.0));
      assertThat(areas[names.indexOf("wool")]).isCloseTo(160 * 1000 - beyond(40), within(250.0));
      assertThat(areas[names.indexOf("brick")]).isCloseTo(240 * 1000 - inBrick, within(350.0));
    }
  }

  /** The part of a disc of radius 100 more than a distance from its middle, mm². */
  private static double beyond(double d) {
    return 100 * 100 * Math.acos(d / 100) - d * Math.sqrt(100 * 100 - d * d);
  }

  @Test
  void what_was_done_with_a_drawing_is_assumed_and_marked() throws CaseException {
    Case read = Written.read(folder, BY_LAYER);
    List<String> assumed = new ArrayList<>();
    for (Assumption a : read.detail(Optional.empty()).assumptions()) {
      assumed.add(a.what() + " | " + a.value() + " | " + a.source());
    }
    assertThat(assumed)
        .anyMatch(a -> a.startsWith("corners joined in drawing detail | ") && a.contains("0.5 mm"))
        .anyMatch(a -> a.startsWith("curves in drawing detail | chords | at most 0.1 mm"))
        .anyMatch(a -> a.startsWith("unit of drawing detail | mm"));
    assertThat(read.doubts(Optional.empty()))
        .anyMatch(d -> d.text().contains("0.3 mm apart on layer `SLAB`"));
  }

  /** The requirement: far away, turned and mirrored, the same areas and the same L2D. */
  @Test
  void a_drawing_moved_turned_and_mirrored_gives_the_same() throws IOException {
    Detail here = detail(BY_LAYER);
    write(
        edge(new Dxf().units(4).block("ALL", 0, 0))
            .endBlock()
            .insert("ALL", "0", 1e7, 1e7)
            .group(41, -1)
            .group(50, 17));
    Detail there = detail(BY_LAYER);
    double[] areas = areasMm2(here);
    double[] farAreas = areasMm2(there);
    for (int label = 0; label < areas.length; label++) {
      assertThat(farAreas[label]).isCloseTo(areas[label], within(1e-9 * areas[label]));
    }
    Accuracy fine = new Accuracy(1e-6, 1, 0.001, 0.002, 2_000_000);
    Result one = Solver.solve(here, fine, Progress.SILENT);
    Result other = Solver.solve(there, fine, Progress.SILENT);
    Certificate.Certified a = certified(one);
    Certificate.Certified b = certified(other);
    assertThat(a.upper() - a.lower()).isLessThan(2e-6 * a.upper());
    assertThat(b.upper() - b.lower()).isLessThan(2e-6 * b.upper());
    assertThat(Math.max(a.lower(), b.lower())).isLessThanOrEqualTo(Math.min(a.upper(), b.upper()));
  }

  private static Certificate.Certified certified(Result result) {
    return (Certificate.Certified) result.couplings().get(0).valueWPerMK().certificate();
  }

  /** The architect sends a new version: thicker insulation, the same case. */
  @Test
  void a_new_version_of_the_drawing_runs_under_the_same_case() throws IOException {
    Result before = Solver.solve(detail(BY_POINTS), Accuracy.STANDARD, Progress.SILENT);
    String drawn = Files.readString(folder.resolve("detail.dxf"));
    Files.writeString(folder.resolve("detail.dxf"), drawn.replace("\n400.0\n", "\n460.0\n"));
    Result after = Solver.solve(detail(BY_POINTS), Accuracy.STANDARD, Progress.SILENT);
    double l2d = after.couplings().get(0).valueWPerMK().value();
    assertThat(l2d).isLessThan(0.9 * before.couplings().get(0).valueWPerMK().value());
  }

  private void refused(String old, String by, String... expected) {
    for (String text : List.of(BY_LAYER, BY_POINTS)) {
      if (text.contains(old)) {
        assertThat(Written.problems(folder, text.replace(old, by)))
            .as(by)
            .hasSize(1)
            .allSatisfy(p -> assertThat(p).contains(expected));
        return;
      }
    }
    throw new AssertionError(old + " stands nowhere");
  }

  @Test
  void mistakes_are_told_in_the_words_of_the_case() throws IOException {
    refused("layer: slab", "layer: SLAP", "14:42", "nothing of layer `SLAP`", "`SLAB`");
    refused("look: ANSI37", "look: ANSI31", "nothing of look `ANSI31`", "ANSI37");
    refused("drawing: detail, layer: ROOM", "drawing: plan, layer: ROOM", "no drawing `plan`");
    refused(", layer: ROOM", "", "does not say what to take");
    refused("layer: ROOM", "layer: ROOM, at: [1, 1]", "has both `at` and `layer`");
    refused("[100, 400]", "[-900, 400]", "no lines of the drawing enclose");
    refused("file: detail.dxf", "file: detial.dxf", "4:18", "there is no such file");
    refused("file: detail.dxf", "file: ../detail.dxf", "outside of the folder", "--drawing");
    refused("around: [500, 500]", "around: [300, 800]", "a shape covers it");
    refused("around: [-300, 700]", "around: [500, 700]", "is the same as that of section[2]");
    refused("tolerance: 0.5", "tolerance: 0.5, unit: km", "`unit` is `mm`");
    assertThat(Written.problems(folder, BY_LAYER.replace("tolerance: 0.5", "tolerance: 0.05")))
        .hasSize(2)
        .allSatisfy(p -> assertThat(p).contains("nothing drawn there encloses an area"));
    write(edge(new Dxf()));
    refused("tolerance: 0.5", "tolerance: 0.5", "does not say in which unit");
  }

  @Test
  void a_damaged_drawing_is_told_with_its_line() throws IOException {
    String drawn = Files.readString(folder.resolve("detail.dxf"));
    Files.writeString(folder.resolve("detail.dxf"), drawn.replace("239.8", "239,8"));
    refused("tolerance: 0.5", "tolerance: 0.5", "4:18", "line 24: a decimal comma: `239,8`");
  }

  @Test
  void a_drawing_elsewhere_is_read_if_the_user_names_it() throws Exception {
    Path elsewhere = Files.createDirectory(folder.resolve("elsewhere"));
    Path inside = Files.createDirectory(folder.resolve("inside"));
    Files.move(folder.resolve("detail.dxf"), elsewhere.resolve("detail.dxf"));
    String text = BY_LAYER.replace("detail.dxf", "../elsewhere/detail.dxf");
    assertThat(Written.problems(inside, text)).hasSize(1);
    Path file = inside.resolve("case.yaml");
    List<Path> named = List.of(elsewhere.resolve("detail.dxf"));
    assertThat(CaseFile.read(file, named).detail(Optional.empty()).areas()).isNotEmpty();
    Files.createSymbolicLink(inside.resolve("link.dxf"), elsewhere.resolve("detail.dxf"));
    assertThat(Written.problems(inside, BY_LAYER.replace("detail.dxf", "link.dxf")))
        .anyMatch(p -> p.contains("outside of the folder"));
  }

  @Test
  void what_is_undecided_is_a_mistake_and_its_consequences_are_quiet() {
    String text =
        BY_LAYER
            .replace("file: detail.dxf", "file: detail.dxf, unit: TODO mm or m")
            .replace("wool: {conductivity: 0.04}", "wool: TODO like mineral wool?")
            .replace("fill: brick", "fill: TODO")
            .replace("temperature: 20", "temperature: TODO");
    assertThat(Written.problems(folder, text))
        .containsExactly(
            "4:36: `unit` is still to be decided; mm or m",
            "5:47: `wool` is still to be decided; like mineral wool?",
            "7:26: `temperature` is still to be decided; write what it is",
            "12:12: `fill` is still to be decided; write what it is");
  }
}
