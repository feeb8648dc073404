package coldseam.cli.exchange;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.Solution;
import coldseam.solver.detail.Conditions;
import coldseam.solver.detail.FilmSet;
import coldseam.solver.detail.Material;
import coldseam.solver.result.Result;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * The temperature field of a result as an unstructured grid of VTK (format XML, {@code .vtu}; The
 * VTK User's Guide, 11th edition, "VTK file formats"), which general-purpose viewers show.
 *
 * <p>Cells are quadratic triangles (cell type 22), so that nothing is lost: the field of the file
 * is the field that was solved, at every point. Both film sets stand on one mesh, that of the set
 * solved last, which is a refinement of the other's.
 */
public final class FieldFile {
  /** Cell type of VTK: three corners, then the middles of sides 0–1, 1–2 and 2–0. */
  private static final int QUADRATIC_TRIANGLE = 22;

  private static final int NODES = 6;

  private final Result result;
  private final Mesh mesh;

  private FieldFile(Result result) {
    this.result = result;
    mesh = result.surface().orElse(result.heatLoss()).mesh();
  }

  /**
   * Writes the file. Points are in metres, in the coordinates of the drawing. Point data: {@code
   * temperature_heatLoss_C} and, where it was solved, {@code temperature_surface_C}, °C. Cell data:
   * {@code heatFlux_heatLoss_W_per_m2} and {@code heatFlux_surface_W_per_m2}, mean density of heat
   * flow in the triangle, W/m²; {@code material}, a number from 0. Field data: {@code material
   * NAME}, the number of each material.
   *
   * @param title of the case
   * @param result the result
   * @param version of the program
   * @return an XML document
   */
  public static String vtu(String title, Result result, String version) {
    return new FieldFile(result).text(title, version);
  }

  private String text(String title, String version) {
    int points = mesh.vertexCount() + mesh.sideCount();
    Materials materials = new Materials(mesh, result.heatLoss().conditions());
    VtkXml xml = new VtkXml();
    xml.comment(title + ". Written by coldseam " + version + ". " + STANDING)
        .open("VTKFile", "type", "UnstructuredGrid", "version", "1.0")
        .attributes("byte_order", "LittleEndian", "header_type", "UInt64")
        .open("UnstructuredGrid")
        .open("FieldData");
    for (int id = 0; id < materials.names().size(); id++) {
      xml.integers("material " + materials.names().get(id), new int[] {id});
    }
    xml.close()
        .open("Piece", "NumberOfPoints", Integer.toString(points))
        .attributes("NumberOfCells", Integer.toString(mesh.triangleCount()))
        .open("PointData", "Scalars", temperature(FilmSet.HEAT_LOSS))
        .doubles(temperature(FilmSet.HEAT_LOSS), 1, field(result.heatLoss()).nodal());
    if (result.surface().isPresent()) {
      xml.doubles(temperature(FilmSet.SURFACE), 1, field(result.surface().get()).nodal());
    }
    xml.close().open("CellData", "Scalars", "material", "Vectors", flux(FilmSet.HEAT_LOSS));
    xml.integers("material", materials.ids());
    xml.doubles(flux(FilmSet.HEAT_LOSS), 3, field(result.heatLoss()).fluxes());
    if (result.surface().isPresent()) {
      xml.doubles(flux(FilmSet.SURFACE), 3, field(result.surface().get()).fluxes());
    }
    return xml.close()
        .open("Points")
        .doubles("points", 3, places())
        .close()
        .open("Cells")
        .integers("connectivity", connectivity())
        .integers("offsets", offsets())
        .bytes("types", types())
        .close()
        .document();
  }

  /** What the file says of itself. */
  private static final String STANDING =
      "Temperatures are estimates, calculated under the assumptions listed with the result; local"
          + " codes and a licensed professional decide.";

  private static String temperature(FilmSet set) {
    return "temperature_" + name(set) + "_C";
  }

  private static String flux(FilmSet set) {
    return "heatFlux_" + name(set) + "_W_per_m2";
  }

  private static String name(FilmSet set) {
    return set == FilmSet.HEAT_LOSS ? "heatLoss" : "surface";
  }

  private FieldOnMesh field(Solution solution) {
    double[] temperatures = new double[result.spaces().size()];
    for (int i = 0; i < temperatures.length; i++) {
      temperatures[i] = result.spaces().get(i).temperatureC();
    }
    return new FieldOnMesh(solution, temperatures, mesh);
  }

  private double[] places() {
    int corners = mesh.vertexCount();
    double[] places = new double[3 * (corners + mesh.sideCount())];
    for (int v = 0; v < corners; v++) {
      places[3 * v] = mesh.origin().x() + mesh.x(v);
      places[3 * v + 1] = mesh.origin().y() + mesh.y(v);
    }
    for (int s = 0; s < mesh.sideCount(); s++) {
      int a = mesh.sideStart(s);
      int b = mesh.sideEnd(s);
      places[3 * (corners + s)] = mesh.origin().x() + (mesh.x(a) + mesh.x(b)) / 2;
      places[3 * (corners + s) + 1] = mesh.origin().y() + (mesh.y(a) + mesh.y(b)) / 2;
    }
    return places;
  }

  private int[] connectivity() {
    int[] nodes = new int[NODES * mesh.triangleCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        nodes[NODES * t + k] = mesh.vertex(t, k);
        // Side k lies opposite corner k: that from 0 to 1 is side 2.
        nodes[NODES * t + 3 + k] = mesh.vertexCount() + mesh.side(t, (k + 2) % 3);
      }
    }
    return nodes;
  }

  private int[] offsets() {
    int[] ends = new int[mesh.triangleCount()];
    for (int t = 0; t < ends.length; t++) {
      ends[t] = NODES * (t + 1);
    }
    return ends;
  }

  private byte[] types() {
    byte[] types = new byte[mesh.triangleCount()];
    Arrays.fill(types, (byte) QUADRATIC_TRIANGLE);
    return types;
  }

  /** The materials of a mesh, numbered as they are first met among the fills. */
  private static final class Materials {
    private final List<String> names = new ArrayList<>();
    private final int[] ids;

    Materials(Mesh mesh, Conditions conditions) {
      int most = 0;
      for (int t = 0; t < mesh.triangleCount(); t++) {
        most = Math.max(most, mesh.label(t));
      }
      boolean[] met = new boolean[most + 1];
      for (int t = 0; t < mesh.triangleCount(); t++) {
        met[mesh.label(t)] = true;
      }
      int[] numbers = new int[most + 1];
      for (int label = 0; label <= most; label++) {
        if (met[label]) {
          numbers[label] = names.size();
          Material material = conditions.material(label);
          names.add(material.name());
        }
      }
      ids = new int[mesh.triangleCount()];
      for (int t = 0; t < ids.length; t++) {
        ids[t] = numbers[mesh.label(t)];
      }
    }

    List<String> names() {
      return names;
    }

    int[] ids() {
      return ids;
    }
  }
}
