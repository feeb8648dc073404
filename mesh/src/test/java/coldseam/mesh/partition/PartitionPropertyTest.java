package coldseam.mesh.partition;

import static coldseam.mesh.partition.Drawings.laid;
import static coldseam.mesh.partition.Drawings.mirrored;
import static coldseam.mesh.partition.Drawings.turned;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.plane.Point;
import coldseam.mesh.plane.Resolution;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Geometry;
import org.locationtech.jts.geom.GeometryFactory;
import org.locationtech.jts.operation.overlayng.OverlayNG;
import org.locationtech.jts.operation.overlayng.OverlayNGRobust;

class PartitionPropertyTest {
  private static final int LABELS = 5;
  private static final GeometryFactory FACTORY = new GeometryFactory();

  private static Partition of(List<LabelledArea> areas) {
    return Partition.of(areas, List.of(), Resolution.STANDARD);
  }

  /** Area per label by laying one shape after the other with the overlay of JTS. */
  private static double[] overlayAreas(List<LabelledArea> areas) {
    double[] seen = new double[LABELS];
    Geometry over = FACTORY.createPolygon();
    for (int i = areas.size() - 1; i >= 0; i--) {
      Geometry shape = evenOdd(areas.get(i));
      seen[areas.get(i).label()] += overlay(shape, over, OverlayNG.DIFFERENCE).getArea();
      over = overlay(over, shape, OverlayNG.UNION);
    }
    return seen;
  }

  /** The even-odd interior of a ring as the symmetric difference of the triangles of a fan. */
  private static Geometry evenOdd(LabelledArea area) {
    Geometry shape = FACTORY.createPolygon();
    for (List<Point> ring : area.rings()) {
      Coordinate first = coordinate(ring.get(0));
      for (int i = 1; i + 1 < ring.size(); i++) {
        Coordinate a = coordinate(ring.get(i));
        Coordinate b = coordinate(ring.get(i + 1));
        Geometry triangle =
            FACTORY.createPolygon(new Coordinate[] {first, a, b, new Coordinate(first)});
        if (triangle.getArea() > 1e-14) {
          shape = overlay(shape, triangle, OverlayNG.SYMDIFFERENCE);
        }
      }
    }
    return shape;
  }

  private static Geometry overlay(Geometry a, Geometry b, int operation) {
    Geometry result = OverlayNGRobust.overlay(a, b, operation);
    List<Geometry> faces = new ArrayList<>();
    for (int i = 0; i < result.getNumGeometries(); i++) {
      if (result.getGeometryN(i).getDimension() == 2) {
        faces.add(result.getGeometryN(i));
      }
    }
    return FACTORY.buildGeometry(faces);
  }

  private static Coordinate coordinate(Point p) {
    return new Coordinate(p.x(), p.y());
  }

  @Test
  void areas_per_label_are_those_of_one_overlay_after_the_other() {
    for (int seed = 0; seed < 300; seed++) {
      List<LabelledArea> areas = RandomDrawings.areas(new Random(seed), 12);
      double[] expected = overlayAreas(areas);
      Partition partition = of(areas);
      Audit.check(partition);
      for (int label = 0; label < LABELS; label++) {
        assertThat(partition.labelArea(label))
            .as("seed %d label %d", seed, label)
            .isCloseTo(expected[label], within(1e-12));
      }
    }
  }

  @Test
  void turned_shifted_and_mirrored_drawings_give_the_same_faces() {
    List<UnaryOperator<Point>> moves =
        List.of(turned(17, 0, 0), turned(0, 1e4, -1e4), mirrored(), turned(211, 3, 0.1));
    for (int seed = 0; seed < 300; seed++) {
      List<LabelledArea> areas = RandomDrawings.areas(new Random(seed), 12);
      Partition partition = of(areas);
      double[][] faces = labelsAndAreas(partition);
      for (int m = 0; m < moves.size(); m++) {
        Partition moved = of(laid(areas, moves.get(m)));
        String what = "seed " + seed + " move " + m;
        // At 1e4 m coordinates are rounded to 2e-12 m, times the size of the drawing.
        double allowance = m == 1 ? 4e-12 : 1e-15;
        assertThat(moved.faceCount()).as(what).isEqualTo(partition.faceCount());
        assertThat(moved.edgeCount()).as(what).isEqualTo(partition.edgeCount());
        assertThat(moved.vertexCount()).as(what).isEqualTo(partition.vertexCount());
        double[][] movedFaces = labelsAndAreas(moved);
        for (int f = 0; f < faces.length; f++) {
          assertThat(movedFaces[f][0]).as(what).isEqualTo(faces[f][0]);
          assertThat(movedFaces[f][1])
              .as(what)
              .isCloseTo(faces[f][1], within(1e-9 * faces[f][1] + allowance));
        }
      }
    }
  }

  private static double[][] labelsAndAreas(Partition partition) {
    double[][] faces = new double[partition.faceCount()][];
    for (int f = 0; f < faces.length; f++) {
      faces[f] = new double[] {partition.faceLabel(f), partition.faceArea(f)};
    }
    Arrays.sort(
        faces, (a, b) -> a[0] != b[0] ? Double.compare(a[0], b[0]) : Double.compare(a[1], b[1]));
    return faces;
  }

  @Test
  void the_partition_of_the_faces_is_the_same_partition() {
    for (int seed = 0; seed < 300; seed++) {
      List<LabelledArea> areas = RandomDrawings.areas(new Random(seed), 12);
      Partition partition = of(laid(areas, turned(17, 0, 0)));
      List<LabelledArea> faces = Drawings.faces(partition);
      Partition again = of(faces);
      assertThat(again.vertexCount()).as("seed %d", seed).isEqualTo(partition.vertexCount());
      assertThat(again.edgeCount()).as("seed %d", seed).isEqualTo(partition.edgeCount());
      assertThat(labelsAndAreas(again).length).as("seed %d", seed).isEqualTo(faces.size());
      assertThat(again.largestDisplacementM()).as("seed %d", seed).isLessThan(1e-14);
    }
  }

  @Test
  void the_order_of_corners_and_their_number_do_not_matter() {
    for (int seed = 0; seed < 100; seed++) {
      Random random = new Random(seed);
      List<LabelledArea> areas = RandomDrawings.areas(random, 12);
      List<LabelledArea> rewritten = new ArrayList<>();
      for (LabelledArea area : areas) {
        rewritten.add(new LabelledArea(area.label(), List.of(rewritten(area, random))));
      }
      double[][] faces = labelsAndAreas(of(areas));
      double[][] same = labelsAndAreas(of(rewritten));
      assertThat(same.length).as("seed %d", seed).isEqualTo(faces.length);
      for (int f = 0; f < faces.length; f++) {
        assertThat(same[f][0]).isEqualTo(faces[f][0]);
        assertThat(same[f][1]).isCloseTo(faces[f][1], within(1e-12));
      }
    }
  }

  /** The same ring from another corner, perhaps backwards, with corners added on its sides. */
  private static List<Point> rewritten(LabelledArea area, Random random) {
    List<Point> ring = area.rings().get(0);
    List<Point> other = new ArrayList<>();
    int n = ring.size();
    int first = random.nextInt(n);
    int step = random.nextBoolean() ? 1 : n - 1;
    for (int i = 0; i < n; i++) {
      Point a = ring.get((first + i * step) % n);
      Point b = ring.get((first + (i + 1) * step) % n);
      other.add(a);
      double t = 0.1 + 0.8 * random.nextDouble();
      if (random.nextBoolean()) {
        other.add(new Point(a.x() + t * (b.x() - a.x()), a.y() + t * (b.y() - a.y())));
      }
    }
    return other;
  }

  /**
   * Corners shaken by anything from a thousandth of the joining length to a hundred closing
   * lengths: whatever is closed or kept, the faces stay sound and areas change by no more than the
   * displacement explains.
   */
  @Test
  void untidy_drawings_give_sound_faces() {
    double[] shakes = {0, 0, 1e-11, 1e-9, 5e-9, 2e-8, 1e-7, 5e-7, 9e-7, 1.1e-6, 1e-5, 1e-4};
    for (int seed = 0; seed < 300; seed++) {
      Random random = new Random(seed);
      UnaryOperator<Point> shake =
          p ->
              new Point(
                  p.x() + shakes[random.nextInt(shakes.length)] * (random.nextBoolean() ? 1 : -1),
                  p.y() + shakes[random.nextInt(shakes.length)] * (random.nextBoolean() ? 1 : -1));
      List<LabelledArea> areas = laid(RandomDrawings.areas(random, 12), shake);
      double[] expected = overlayAreas(areas);
      Partition partition = of(laid(areas, turned(17, 0, 0)));
      Audit.check(partition);
      assertThat(partition.largestDisplacementM()).isLessThan(1e-5);
      double perimeter = 0;
      for (LabelledArea area : areas) {
        perimeter += perimeter(area);
      }
      for (int label = 0; label < LABELS; label++) {
        assertThat(partition.labelArea(label))
            .as("seed %d label %d", seed, label)
            .isCloseTo(
                expected[label], within(1e-12 + perimeter * partition.largestDisplacementM()));
      }
    }
  }

  private static double perimeter(LabelledArea area) {
    double sum = 0;
    for (List<Point> ring : area.rings()) {
      for (int i = 0; i < ring.size(); i++) {
        sum += ring.get(i).distance(ring.get((i + 1) % ring.size()));
      }
    }
    return sum;
  }

  /**
   * 2,000 shapes at 17 degrees far from the origin: a wall of bricks with gaps of 0 and 1e-6 mm
   * between them, sheets of 0.1 mm through them and blocks of 20 m under them.
   */
  @Test
  void two_thousand_shapes_make_one_clean_partition() {
    Random random = new Random(2000);
    List<LabelledArea> areas = new ArrayList<>();
    areas.add(Drawings.box(0, -20, -20, 20, 20));
    areas.add(Drawings.box(1, -20, -20, 0, 0));
    double drawn = 0;
    for (int row = 0; row < 40; row++) {
      for (int column = 0; column < 50; column++) {
        double gap = random.nextBoolean() ? 0 : 1e-9;
        double left = column * 0.24 + (row % 2) * 0.12;
        double low = row * 0.071;
        areas.add(Drawings.box(2 + random.nextInt(40), left, low, left + 0.24 - gap, low + 0.071));
        drawn += 0.24 * 0.071;
      }
    }
    for (int i = 0; i < 40; i++) {
      double x = 0.05 + i * 0.3;
      areas.add(Drawings.box(50, x, -1, x + 1e-4, 4));
      areas.add(Drawings.box(51, -1, 0.02 + i * 0.071, 13, 0.0201 + i * 0.071));
    }
    Partition partition = of(laid(areas, turned(17, 1e4, 0)));
    assertThat(partition.faceCount()).isGreaterThan(5000);
    assertThat(partition.defects()).isEmpty();
    assertThat(partition.largestDisplacementM()).isLessThan(2.1e-9);
    double sheets = 40 * 14 * 1e-4 + 40 * (5 - 40 * 1e-4) * 1e-4;
    assertThat(partition.labelArea(50) + partition.labelArea(51)).isCloseTo(sheets, within(1e-8));
    double sum = 0;
    for (int f = 0; f < partition.faceCount(); f++) {
      sum += partition.faceArea(f);
    }
    assertThat(sum).isCloseTo(1600, within(1e-7));
    assertThat(drawn).isGreaterThan(30);
  }
}
