package coldseam.cli.exchange;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import coldseam.cases.CaseFile;
import coldseam.mesh.plane.Point;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.conduction.Solution;
import coldseam.solver.conduction.TemperatureField;
import coldseam.solver.result.Result;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The file as a viewer understands it. Cell type 22 is the quadratic triangle: three corners, then
 * the middles of the sides 0–1, 1–2 and 2–0 (The VTK User's Guide, 11th edition, figure "quadratic
 * cell types").
 */
class FieldFileTest {
  /** A wall with an insulation that conducts better across the grain, and a slab through it. */
  private static final String SLAB =
      """
      coldseam: 1
      title: Slab "ψ" & <wall>
      view: vertical
      materials:
        concrete: {conductivity: 2}
        'wood & "glue"': {conductivity: [0.13, 0.3], angle: 30}
      spaces:
        indoors: {temperature: 20, exposure: inside}
        outdoors: {temperature: -5, exposure: outside}
      section:
        - {fill: indoors, box: [-1000, -1200, 0, 1200]}
        - {fill: outdoors, box: [200, -1200, 1200, 1200]}
        - {fill: 'wood & "glue"', box: [0, -1200, 200, 1200]}
        - {fill: concrete, box: [-1000, -90, 1200, 90]}
      """;

  /** 0.2 m of 0.5 W/(m·K) between films of 0.13 and 0.04: 25 K over 0.57 m²·K/W. */
  private static final String WALL =
      """
      coldseam: 1
      title: Wall
      view: plan
      materials:
        brick: {conductivity: 0.5}
      spaces:
        indoors: {temperature: 20, film: 0.13}
        outdoors: {temperature: -5, film: 0.04}
      section:
        - {fill: indoors, box: [900, 0, 1000, 1000]}
        - {fill: brick, box: [1000, 0, 1200, 1000]}
        - {fill: outdoors, box: [1200, 0, 1300, 1000]}
      """;

  @TempDir Path dir;

  private Result solve(String yaml) throws Exception {
    var read = CaseFile.read(Files.writeString(dir.resolve("case.yaml"), yaml));
    return Solver.solve(read.detail(Optional.empty()), read.accuracy(), Progress.SILENT);
  }

  @Test
  void a_plain_wall_has_its_straight_line_of_temperature_and_its_flux() throws Exception {
    ReadGrid grid = new ReadGrid(FieldFile.vtu("Wall", solve(WALL), "1"));
    double flux = 25 / 0.57;
    double[] points = grid.doubles("points");
    double[] temperatures = grid.doubles("temperature_heatLoss_C");
    assertThat(points).hasSize(3 * temperatures.length);
    for (int i = 0; i < temperatures.length; i++) {
      double depth = points[3 * i] - 1;
      assertThat(depth).isBetween(-1e-12, 0.2 + 1e-12);
      assertThat(points[3 * i + 1]).isBetween(-1e-12, 1 + 1e-12);
      assertThat(points[3 * i + 2]).isZero();
      assertThat(temperatures[i]).isCloseTo(20 - flux * (0.13 + depth / 0.5), within(1e-9));
    }
    double[] fluxes = grid.doubles("heatFlux_heatLoss_W_per_m2");
    assertThat(grid.components("heatFlux_heatLoss_W_per_m2")).isEqualTo(3);
    assertThat(fluxes).hasSize(3 * grid.count("NumberOfCells"));
    for (int t = 0; t < fluxes.length / 3; t++) {
      assertThat(fluxes[3 * t]).isCloseTo(flux, within(1e-8));
      assertThat(fluxes[3 * t + 1]).isCloseTo(0, within(1e-8));
      assertThat(fluxes[3 * t + 2]).isZero();
    }
  }

  @Test
  void it_is_a_grid_of_quadratic_triangles_with_named_materials() throws Exception {
    String text = FieldFile.vtu("Slab -- \"ψ\" & <wall>", solve(SLAB), "1.2");
    ReadGrid grid = new ReadGrid(text);
    assertThat(grid.root().getTagName()).isEqualTo("VTKFile");
    assertThat(grid.root().getAttribute("type")).isEqualTo("UnstructuredGrid");
    assertThat(grid.root().getAttribute("byte_order")).isEqualTo("LittleEndian");
    assertThat(grid.root().getAttribute("header_type")).isEqualTo("UInt64");
    int cells = grid.count("NumberOfCells");
    int points = grid.count("NumberOfPoints");
    assertThat(grid.doubles("points")).hasSize(3 * points);
    assertThat(grid.names("PointData"))
        .containsExactly("temperature_heatLoss_C", "temperature_surface_C");
    for (String name : grid.names("PointData")) {
      assertThat(grid.doubles(name)).hasSize(points);
    }
    assertThat(grid.names("CellData"))
        .containsExactly("material", "heatFlux_heatLoss_W_per_m2", "heatFlux_surface_W_per_m2");
    assertThat(grid.bytes("types")).hasSize(cells).containsOnly(22);
    int[] nodes = grid.integers("connectivity");
    assertThat(nodes).hasSize(6 * cells);
    assertThat(Arrays.stream(nodes).distinct().sorted()).hasSize(points);
    int[] offsets = grid.integers("offsets");
    for (int t = 0; t < cells; t++) {
      assertThat(offsets[t]).isEqualTo(6 * (t + 1));
    }
    assertThat(text)
        .contains("Slab - - &quot;ψ&quot; &amp; &lt;wall&gt;")
        .contains("coldseam 1.2", "estimates", "licensed professional");
    assertThat(grid.names("FieldData"))
        .containsExactly("material wood & \"glue\"", "material concrete");
    assertThat(grid.integers("material wood & \"glue\"")).containsExactly(0);
    assertThat(grid.integers("material concrete")).containsExactly(1);

    // Corners counter-clockwise, nodes 3 to 5 half-way between them, materials where drawn.
    double[] at = grid.doubles("points");
    int[] materials = grid.integers("material");
    for (int t = 0; t < cells; t++) {
      double twice = 0;
      double y = 0;
      double x = 0;
      for (int k = 0; k < 3; k++) {
        int a = nodes[6 * t + k];
        int b = nodes[6 * t + (k + 1) % 3];
        int middle = nodes[6 * t + 3 + k];
        twice += at[3 * a] * at[3 * b + 1] - at[3 * b] * at[3 * a + 1];
        assertThat(at[3 * middle]).isCloseTo((at[3 * a] + at[3 * b]) / 2, within(1e-12));
        assertThat(at[3 * middle + 1])
            .isCloseTo((at[3 * a + 1] + at[3 * b + 1]) / 2, within(1e-12));
        x += at[3 * a] / 3;
        y += at[3 * a + 1] / 3;
      }
      assertThat(twice).isPositive();
      assertThat(materials[t]).as("at %s, %s", x, y).isEqualTo(Math.abs(y) < 0.09 ? 1 : 0);
    }
  }

  /** Inside every triangle, by the shape functions of the quadratic triangle. */
  @Test
  void both_fields_are_those_solved_at_every_point() throws Exception {
    Result result = solve(SLAB);
    Solution surface = result.surface().orElseThrow();
    assertThat(surface.mesh().triangleCount())
        .as("one mesh is finer than the other, else this proves little")
        .isGreaterThan(result.heatLoss().mesh().triangleCount());
    ReadGrid grid = new ReadGrid(FieldFile.vtu("Slab", result, "1"));
    same(grid, "temperature_heatLoss_C", result.heatLoss());
    same(grid, "temperature_surface_C", surface);
  }

  private static void same(ReadGrid grid, String name, Solution solution) {
    TemperatureField field = solution.temperatures(new double[] {20, -5});
    double[] values = grid.doubles(name);
    double[] at = grid.doubles("points");
    int[] nodes = grid.integers("connectivity");
    Random random = new Random(8);
    for (int t = 0; t < nodes.length / 6; t++) {
      double r = random.nextDouble();
      double s = random.nextDouble() * (1 - r);
      double u = 1 - r - s;
      double[] shapes = {
        u * (2 * u - 1), r * (2 * r - 1), s * (2 * s - 1), 4 * u * r, 4 * r * s, 4 * s * u
      };
      double value = 0;
      double x = 0;
      double y = 0;
      for (int k = 0; k < 6; k++) {
        int node = nodes[6 * t + k];
        value += shapes[k] * values[node];
        x += shapes[k] * at[3 * node];
        y += shapes[k] * at[3 * node + 1];
      }
      assertThat(value).isCloseTo(field.at(new Point(x, y)), within(1e-8));
    }
  }

  /** q = −Λ grad θ with the gradient from the points of the file alone. */
  @Test
  void heat_is_turned_by_a_grain() throws Exception {
    Result result = solve(SLAB);
    ReadGrid grid = new ReadGrid(FieldFile.vtu("Slab", result, "1"));
    double[] fluxes = grid.doubles("heatFlux_surface_W_per_m2");
    int[] materials = grid.integers("material");
    int[] nodes = grid.integers("connectivity");
    double[] at = grid.doubles("points");
    double[] values = grid.doubles("temperature_surface_C");
    double cos = Math.sqrt(3) / 2;
    double sin = 0.5;
    int looked = 0;
    for (int t = 0; t < materials.length; t++) {
      if (materials[t] == 0) {
        double[] gradient = meanGradient(at, values, Arrays.copyOfRange(nodes, 6 * t, 6 * t + 6));
        double along = -0.13 * (gradient[0] * cos + gradient[1] * sin);
        double across = -0.3 * (gradient[1] * cos - gradient[0] * sin);
        assertThat(fluxes[3 * t]).isCloseTo(along * cos - across * sin, within(1e-6));
        assertThat(fluxes[3 * t + 1]).isCloseTo(along * sin + across * cos, within(1e-6));
        looked++;
      }
    }
    assertThat(looked).isPositive();
  }

  /** Gauss's theorem: the integral of the gradient is that of the value times the outer normal. */
  private static double[] meanGradient(double[] at, double[] values, int[] nodes) {
    double[] sum = new double[2];
    double area = 0;
    for (int k = 0; k < 3; k++) {
      int a = nodes[k];
      int b = nodes[(k + 1) % 3];
      double mean = (values[a] + values[b] + 4 * values[nodes[3 + k]]) / 6;
      sum[0] += mean * (at[3 * b + 1] - at[3 * a + 1]);
      sum[1] -= mean * (at[3 * b] - at[3 * a]);
      area += (at[3 * a] * at[3 * b + 1] - at[3 * b] * at[3 * a + 1]) / 2;
    }
    return new double[] {sum[0] / area, sum[1] / area};
  }
}
