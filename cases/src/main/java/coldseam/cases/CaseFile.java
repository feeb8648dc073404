package coldseam.cases;

import java.nio.file.Path;

/** Reads case files. */
public final class CaseFile {
  private CaseFile() {}

  /**
   * Reads a case and checks all of it, variants included.
   *
   * @param file the file
   * @return the case
   * @throws CaseException with every problem found, in line order; also if the file does not exist,
   *     is a folder, is not text or is too large
   */
  public static Case read(Path file) throws CaseException {
    throw new UnsupportedOperationException();
  }
}
