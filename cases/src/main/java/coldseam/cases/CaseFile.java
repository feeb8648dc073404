package coldseam.cases;

import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;

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
    return new CaseReader(file, List.of(CaseReader.normalised(file)), new HashMap<>()).read();
  }
}
