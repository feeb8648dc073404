package coldseam.cli;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.CaseFile;
import coldseam.cases.Changes;
import coldseam.cases.Problem;
import coldseam.solver.detail.Detail;
import coldseam.solver.detail.DetailException;
import coldseam.solver.detail.Fault;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The cases that a command was given. */
final class CaseList {
  private CaseList() {}

  /** Something done with a detail that may find it at fault. */
  @FunctionalInterface
  interface Work<T> {
    /**
     * Does it.
     *
     * @param detail the detail
     * @return the outcome
     */
    T on(Detail detail);
  }

  /**
   * Reads cases; every mistake in every file is found before anything else is done.
   *
   * @param names files as typed
   * @param command the command they were typed after
   * @param here where relative names start from
   * @return the cases, in order
   * @throws CaseException with the mistakes of all files
   * @throws UsageException if a name is none
   */
  static List<Case> read(List<String> names, String command, Surroundings here)
      throws CaseException, UsageException {
    return read(names, List.of(), command, here);
  }

  /**
   * Reads cases that may take shapes from drawings outside of their folders.
   *
   * @param names files as typed
   * @param drawings the drawings, as typed
   * @param command the command they were typed after
   * @param here where relative names start from
   * @return the cases, in order
   * @throws CaseException with the mistakes of all files
   * @throws UsageException if a name is none
   */
  static List<Case> read(
      List<String> names, List<String> drawings, String command, Surroundings here)
      throws CaseException, UsageException {
    List<Path> named = new ArrayList<>();
    for (String drawing : drawings) {
      named.add(here.cwd().resolve(path(drawing, command)));
    }
    List<Case> cases = new ArrayList<>();
    List<Problem> problems = new ArrayList<>();
    for (String name : names) {
      try {
        cases.add(CaseFile.read(here.cwd().resolve(path(name, command)), named));
      } catch (CaseException mistakes) {
        problems.addAll(mistakes.problems());
      }
    }
    if (!problems.isEmpty()) {
      throw new CaseException(problems);
    }
    return cases;
  }

  /**
   * A typed name as a path.
   *
   * @param name as typed
   * @param command the command it was typed after
   * @return the path
   * @throws UsageException if it is none
   */
  static Path path(String name, String command) throws UsageException {
    try {
      return Path.of(name);
    } catch (InvalidPathException e) {
      throw new UsageException(command, "\"" + name + "\" is no name of a file: " + e.getReason());
    }
  }

  /**
   * The variant meant.
   *
   * @param from the case
   * @param name as typed
   * @param command the command it was typed after
   * @return its name
   * @throws UsageException if the case has no such variant
   */
  static Optional<String> variant(Case from, String name, String command) throws UsageException {
    if (from.variants().contains(name)) {
      return Optional.of(name);
    }
    String there =
        from.variants().isEmpty()
            ? "it has none"
            : Nearest.of(name, from.variants())
                .map(near -> "did you mean \"" + near + "\"?")
                .orElse("there are " + String.join(", ", from.variants()));
    throw new UsageException(
        command, from.file().getFileName() + " has no variant \"" + name + "\"; " + there);
  }

  /**
   * Works on a detail of a case; what is at fault in it is told by its place in the file.
   *
   * @param from the case
   * @param variant the variant, empty for the base case
   * @param work what to do
   * @param <T> what comes out
   * @return the outcome
   * @throws CaseException if the detail is at fault
   */
  static <T> T work(Case from, Optional<String> variant, Work<T> work) throws CaseException {
    return work(from, variant, Changes.NONE, work);
  }

  /**
   * Works on a detail of a changed case; what is at fault in it is told by its place in the file.
   *
   * @param from the case
   * @param variant the variant, empty for the base case
   * @param changes what is changed in it
   * @param work what to do
   * @param <T> what comes out
   * @return the outcome
   * @throws CaseException if the changes make no valid case, or the detail is at fault
   */
  static <T> T work(Case from, Optional<String> variant, Changes changes, Work<T> work)
      throws CaseException {
    try {
      return work.on(from.detail(variant, changes));
    } catch (DetailException e) {
      String with = changes == Changes.NONE ? "" : "with " + changes.inWords() + ": ";
      List<Problem> problems = new ArrayList<>();
      for (Fault fault : e.faults()) {
        Problem at = from.locate(fault);
        String wrong = with + at.wrong();
        problems.add(new Problem(at.file(), at.line(), at.column(), wrong, at.right()));
      }
      throw new CaseException(problems);
    }
  }
}
