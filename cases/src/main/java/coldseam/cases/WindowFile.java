package coldseam.cases;

import java.nio.file.Path;

/** Reads window files: the profiles and glazings of a whole window. */
public final class WindowFile {
  private static final String KEY = "window:";

  private WindowFile() {}

  /**
   * Whether a file describes a window: a line begins with {@code window:}.
   *
   * @param file the file
   * @return false also if it cannot be read
   */
  public static boolean is(Path file) {
    return FileText.begins(file, KEY);
  }

  /**
   * Reads a window and every case it takes figures from.
   *
   * @param file the file
   * @return the window
   * @throws CaseException with every problem found, in line order
   */
  public static WindowCase read(Path file) throws CaseException {
    return new WindowReader(file).read();
  }
}
