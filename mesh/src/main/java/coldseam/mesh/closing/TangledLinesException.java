package coldseam.mesh.closing;

/** Lines cross each other, or crowd together, so often that no drawing is meant by them. */
public final class TangledLinesException extends Exception {
  private static final long serialVersionUID = 1L;

  /**
   * Says what there is too much of.
   *
   * @param message what was counted, and how many
   */
  TangledLinesException(String message) {
    super(message);
  }
}
