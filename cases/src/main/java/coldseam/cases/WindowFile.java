package coldseam.cases;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
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
    String text;
    try {
      if (!Files.isRegularFile(file) || Files.size(file) > FileText.MOST_BYTES) {
        return false;
      }
      text = new String(Files.readAllBytes(file), StandardCharsets.UTF_8);
    } catch (IOException e) {
      return false;
    }
    int at = text.indexOf(KEY);
    while (at > 0 && text.charAt(at - 1) != '\n') {
      at = text.indexOf(KEY, at + 1);
    }
    return at >= 0;
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
