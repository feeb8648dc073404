package coldseam.mesh.triangulation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.mesh.partition.Partition;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Thin parts cost few triangles. Without ladders Ruppert's rule alone takes at least two triangles
 * for each thickness of length: 24,000 in a sheet of 0.1 mm by 1.2 m.
 */
class LadderTest {
  private static final int SHEET = 5;

  @ParameterizedTest
  @ValueSource(doubles = {0, 17, 90, 133})
  void aFoilRightThroughAWall(double degrees) {
    Mesh mesh = check(wall(degrees).strip(SHEET, 0.1, 80, 0, 80, 1200), 80);
    assertThat(areaOf(mesh, SHEET)).isCloseTo(1.2e-4, within(1e-9 * 1.2e-4));
  }

  /** Vertices on the two sides of a foil pair up, so that its triangles are right-angled. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 17, 90, 133})
  void rungsAreSquareToTheFoil(double degrees) {
    Drawing drawing = wall(degrees).strip(SHEET, 0.1, 80, 0, 80, 1200);
    Mesh mesh = check(drawing.box(3, 80.05, 333, 300, 555).box(4, -20, 700, 79.95, 711), 300);
    int count = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (mesh.label(t) == SHEET) {
        double hypotenuse = mesh.sideLength(mesh.side(t, 0));
        double one = mesh.sideLength(mesh.side(t, 1));
        double other = mesh.sideLength(mesh.side(t, 2));
        assertThat((one * one + other * other) / (hypotenuse * hypotenuse))
            .isCloseTo(1, within(1e-9));
        assertThat(Math.min(one, other)).isCloseTo(1e-4, within(1e-12));
        count++;
      }
    }
    assertThat(count).isGreaterThan(10);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17, 90, 133})
  void aFoilThatEndsWithinAWall(double degrees) {
    Drawing tall = Drawing.turned(degrees);
    tall.box(0, 0, 0, 12.5, 2400).box(1, 12.5, 0, 152.5, 2400).box(2, 152.5, 0, 164.5, 2400);
    Mesh mesh = check(tall.strip(SHEET, 0.1, 80, 600, 80, 1800), 400);
    assertThat(areaOf(mesh, SHEET)).isCloseTo(1.2e-4, within(1e-9 * 1.2e-4));
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 30})
  void aFoilAt17DegreesAcrossAllLayers(double degrees) {
    double rise = 400 * Math.tan(Math.toRadians(17));
    check(wall(degrees).strip(SHEET, 0.1, -200, 400, 400, 400 + 1.5 * rise), 200);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void bentFlashing(double degrees) {
    Drawing drawing = wall(degrees);
    check(drawing.strip(SHEET, 1.5, -30, 550, -30, 600, 100, 600, 100, 900), 250);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void aZShapedSheetWithObliqueBends(double degrees) {
    Drawing drawing = wall(degrees);
    check(drawing.strip(SHEET, 1.5, 20, 100, 20, 600, 145, 660, 145, 1100), 400);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void aSheetThatBranches(double degrees) {
    Drawing drawing = wall(degrees).box(SHEET, 0, 599.5, 164.5, 600.5);
    check(drawing.box(SHEET, 99.5, 300, 100.5, 600), 300);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void aSheetBentToAnArcOfManyPieces(double degrees) {
    double[] line = new double[48];
    line[0] = 100;
    line[1] = 100;
    for (int i = 0; i < 22; i++) {
      double angle = Math.PI / 2 * i / 21;
      line[2 * i + 2] = 40 + 60 * Math.cos(angle);
      line[2 * i + 3] = 600 + 60 * Math.sin(angle);
    }
    line[46] = -200;
    line[47] = 660;
    check(wall(degrees).strip(SHEET, 1, line), 500);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void aPipeWithAWallOfOneMillimetre(double degrees) {
    Drawing drawing = Drawing.turned(degrees).box(0, -300, -300, 300, 300);
    drawing.disc(1, 0, 0, 100, 64).disc(SHEET, 0, 0, 51, 64);
    check(drawing.disc(RandomDrawing.SPACE, 0, 0, 50, 64), 800);
  }

  /** A C profile of 1.0922 mm (0.043 in) with lips, in a wall of 3.5 in between boards. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void aSteelStud(double degrees) {
    double half = 1.0922 / 2;
    double low = 12.7 + half;
    double high = 101.6 - half;
    Drawing drawing = Drawing.turned(degrees).box(0, 0, 0, 406.4, 12.7);
    drawing.box(1, 0, 12.7, 406.4, 101.6).box(2, 0, 101.6, 406.4, 117.5);
    double[] line = {220, 25, 220, low, 180, low, 180, high, 220, high, 220, 90};
    check(drawing.strip(SHEET, 1.0922, line), 150);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void aThinGapThatOpensIntoACavity(double degrees) {
    Drawing drawing = Drawing.turned(degrees).box(0, 0, 0, 100, 1000).box(1, 102, 0, 200, 1000);
    drawing.box(SHEET, 100, 0, 102, 400).box(SHEET, 100, 600, 102, 1000);
    check(drawing.box(SHEET, 100, 400, 150, 600), 250);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void aLayerThatTapersToNothing(double degrees) {
    Drawing drawing = Drawing.turned(degrees).box(0, 0, -200, 4000, 0);
    check(drawing.polygon(SHEET, 0, 0, 4000, 0, 4000, 80), 100);
  }

  /** Two trapezoid sheets on top of each other, vertices of the one near none of the other's. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void sheetsOnSheets(double degrees) {
    Drawing drawing = wall(degrees).box(SHEET, 80, 0, 80.1, 1200);
    drawing.box(6, 80.1, 50, 81.6, 1150).box(7, 81.6, 0, 82.6, 777);
    check(drawing, 450);
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 17})
  void aBarThatInterruptsAThinGap(double degrees) {
    Drawing drawing = wall(degrees).box(SHEET, 80, 0, 82, 1200);
    check(drawing.disc(6, 81, 600.3, 0.8, 12).disc(7, 81, 200, 3, 12), 600);
  }

  private static Drawing wall(double degrees) {
    return Drawing.turned(degrees)
        .box(0, 0, 0, 12.5, 1200)
        .box(1, 12.5, 0, 152.5, 1200)
        .box(2, 152.5, 0, 164.5, 1200);
  }

  /** Makes the mesh, which checks itself against the drawing, and counts. */
  private static Mesh check(Drawing drawing, int mostTriangles) {
    Partition partition = drawing.partition();
    Mesh mesh = Triangulator.triangulate(partition, l -> l != RandomDrawing.SPACE, SizeField.NONE);
    assertThat(mesh.triangleCount()).isLessThan(mostTriangles);
    double drawn = partition.labelArea(SHEET);
    assertThat(drawn).isPositive();
    assertThat(areaOf(mesh, SHEET)).isCloseTo(drawn, within(1e-9 * drawn));
    return mesh;
  }

  private static double areaOf(Mesh mesh, int label) {
    double sum = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      sum += mesh.label(t) == label ? mesh.area(t) : 0;
    }
    return sum;
  }
}
