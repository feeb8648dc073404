package coldseam.cases.building;

import coldseam.cases.CaseException;
import coldseam.cases.OpenFile;
import java.nio.file.Path;

/** Reads building files. */
public final class BuildingFile {
  static final String KIND = "building";

  private BuildingFile() {}

  /**
   * Whether a file describes a building: a line begins with {@code building:}.
   *
   * @param file the file
   * @return false also if it cannot be read
   */
  public static boolean is(Path file) {
    return OpenFile.is(file, KIND);
  }

  /**
   * Reads a building and every case it takes a ψ from.
   *
   * @param file the file
   * @return the building
   * @throws CaseException with every problem found, in line order
   */
  public static Building read(Path file) throws CaseException {
    return new BuildingReader(OpenFile.open(file, KIND)).read();
  }
}
