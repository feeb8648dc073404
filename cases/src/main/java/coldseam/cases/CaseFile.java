package coldseam.cases;

import java.nio.file.Path;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

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
    return reader(file, new HashMap<>(), new OpenedDrawings(drawings)).read();
  }

  private static CaseReader reader(
      Path file, Map<Path, Optional<Case>> others, OpenedDrawings opened) {
    return new CaseReader(file, List.of(CaseReader.normalised(file)), others, opened);
  }

  /**
   * What came of reading a case, for whoever will read it again when a file changes.
   *
   * @param read the case, empty if there are problems
   * @param problems every problem found, in line order
   * @param files every file that it was or would have been read from: the case, other cases it
   *     names, drawings; some of them may not exist
   */
  public record Attempt(Optional<Case> read, List<Problem> problems, Set<Path> files) {
    /** Copies the lists. */
    public Attempt {
      problems = List.copyOf(problems);
      files = Set.copyOf(files);
    }
  }

  /**
   * Reads a case and checks all of it, variants included, whether it can be read or not.
   *
   * @param file the file
   * @param drawings drawings outside of the case's folder that it may take shapes from
   * @return the case or its problems
   */
  public static Attempt attempt(Path file, List<Path> drawings) {
    Map<Path, Optional<Case>> others = new HashMap<>();
    OpenedDrawings opened = new OpenedDrawings(drawings);
    Optional<Case> read = Optional.empty();
    List<Problem> problems = List.of();
    try {
      read = Optional.of(reader(file, others, opened).read());
    } catch (CaseException mistakes) {
      problems = mistakes.problems();
    }
    Set<Path> files = new HashSet<>(opened.asked());
    files.addAll(others.keySet());
    files.add(file);
    return new Attempt(read, problems, files);
  }
}
