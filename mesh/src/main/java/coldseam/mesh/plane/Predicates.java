package coldseam.mesh.plane;

/** Orientation and in-circle tests with the exact sign. */
public final class Predicates {
  private Predicates() {}
}
