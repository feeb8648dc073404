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
    return read(file, List.of());
  }

  /**
   * Reads a case and checks all of it, variants included.
   *
   * @param file the file
   * @param drawings drawings outside of the case's folder that it may take shapes from
   * @return the case
   * @throws CaseException with every problem found, in line order
   */
  public static Case read(Path file, List<Path> drawings) throws CaseException {
    List<Path> chain = List.of(CaseReader.normalised(file));
    return new CaseReader(file, chain, new HashMap<>(), new OpenedDrawings(drawings)).read();
  }
}
