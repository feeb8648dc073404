package coldseam.cli.plot;

import coldseam.cases.Case;
import coldseam.cases.CaseException;
import coldseam.cases.CaseFile;
import coldseam.cases.building.BuildingFile;
import coldseam.solver.Solver;
import coldseam.solver.conduction.Progress;
import coldseam.solver.detail.Accuracy;
import coldseam.solver.result.Result;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;
import java.util.stream.Stream;

/**
 * A case, solved.
 *
 * @param name of the file
 * @param result of the base case
 * @param caption for its plots
 */
record Solved(String name, Result result, Plots.Caption caption) {
  private static final Map<Path, Solved> SOLVED = new ConcurrentHashMap<>();

  /** Every case file that ships with the program. */
  static List<Solved> shipped() {
    Path folder = Path.of("").toAbsolutePath();
    while (!Files.isDirectory(folder.resolve("cases/demo"))) {
      folder = folder.getParent();
    }
    List<Path> files;
    try (Stream<Path> demo = Files.list(folder.resolve("cases/demo"));
        Stream<Path> published = Files.list(folder.resolve("cases/published"))) {
      files =
          Stream.concat(demo, published)
              .filter(file -> file.toString().endsWith(".yaml") && !BuildingFile.is(file))
              .sorted()
              .toList();
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
    if (files.size() < 9) {
      throw new IllegalStateException("cases are missing: " + files);
    }
    return files.stream().map(Solved::of).toList();
  }

  static Solved shipped(String name) {
    return shipped().stream().filter(s -> s.name().equals(name)).findFirst().orElseThrow();
  }

  private static Solved of(Path file) {
    return SOLVED.computeIfAbsent(file, f -> of(f, Optional.empty()));
  }

  static Solved of(Path file, Optional<Accuracy> accuracy) {
    try {
      Case read = CaseFile.read(file);
      Result result =
          Solver.solve(
              read.detail(Optional.empty()), accuracy.orElse(read.accuracy()), Progress.SILENT);
      return new Solved(
          file.getFileName().toString(),
          result,
          new Plots.Caption(Optional.empty(), read.unit(), read.metresPerUnit()));
    } catch (CaseException e) {
      throw new IllegalStateException(e);
    }
  }

  /** A case written in a test. */
  static Solved of(Path folder, String yaml) {
    try {
      return of(Files.writeString(folder.resolve("case.yaml"), yaml), Optional.empty());
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
  }

  String svg(Plots.Kind kind) {
    return Plots.of(result, caption).svg(kind);
  }

  @Override
  public String toString() {
    return name;
  }
}
