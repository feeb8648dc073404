package coldseam.cli.plot;

import coldseam.mesh.triangulation.Mesh;
import coldseam.solver.conduction.TemperatureField;

/**
 * Temperatures, continuous everywhere.
 *
 * @param field the field, °C
 */
record NodalTemperature(TemperatureField field) implements Nodal {
  @Override
  public Mesh mesh() {
    return field.mesh();
  }

  @Override
  public int cornerValues() {
    return field.mesh().vertexCount();
  }

  @Override
  public int cornerValue(int triangle, int k) {
    return field.mesh().vertex(triangle, k);
  }

  @Override
  public double atCorner(int triangle, int k) {
    return field.atNode(field.mesh().vertex(triangle, k));
  }

  @Override
  public double atMiddle(int triangle, int k) {
    return field.atNode(field.mesh().vertexCount() + field.mesh().side(triangle, k));
  }

  @Override
  public double in(int triangle, double[] l) {
    return field.in(triangle, l[0], l[1], l[2]);
  }
}
