package coldseam.solver.window;

/**
 * One thing for each side of a window, seen from inside.
 *
 * @param top at the head
 * @param bottom at the sill
 * @param left on the left
 * @param right on the right
 * @param <T> what it is
 */
public record Sides<T>(T top, T bottom, T left, T right) {
  /**
   * The same all round.
   *
   * @param one what it is
   * @param <T> its type
   * @return the four
   */
  public static <T> Sides<T> all(T one) {
    return new Sides<>(one, one, one, one);
  }
}
