package coldseam.cli;

import coldseam.cases.study.Axis;
import coldseam.cases.study.LineFile;
import coldseam.cases.study.Lines;
import coldseam.cases.study.Shard;
import coldseam.cases.study.Sweep;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The folder of a sweep: a file of lines that grows while points are solved, one a shard, and chart
 * and table that are written when every point is there.
 */
final class SweepFiles {
  static final String LINES = "sweep.jsonl";
  static final String TABLE = "sweep.csv";
  static final String CHART = "sweep.svg";
  private static final String COMMAND = "sweep";

  private final Path folder;
  private final String shown;
  private final Shard shard;

  /**
   * A folder that need not exist.
   *
   * @param folder where
   * @param shown how messages call it
   * @param shard which part of the sweep is run
   */
  SweepFiles(Path folder, String shown, Shard shard) {
    this.folder = folder;
    this.shown = shown;
    this.shard = shard;
  }

  /** Where the lines go of a sweep: beside the case, in a folder called after what is set. */
  static Path usual(Path caseFile, Sweep sweep) {
    String file = caseFile.getFileName().toString();
    int dot = file.lastIndexOf('.');
    StringBuilder name = new StringBuilder();
    for (Axis axis : sweep.axes()) {
      name.append(name.isEmpty() ? "" : "+").append(SolveCommand.fileName(axis.name()));
    }
    if (sweep.variant().isPresent()) {
      name.append('@').append(SolveCommand.fileName(sweep.variant().get()));
    }
    return caseFile
        .resolveSibling((dot < 0 ? file : file.substring(0, dot)) + ".sweep")
        .resolve(name.toString());
  }

  String shown() {
    return shown;
  }

  /** The name of the file of lines of this run. */
  String linesName() {
    return shard.whole() ? LINES : "shard-" + shard.number() + "-of-" + shard.of() + ".jsonl";
  }

  private OutputFolder output() {
    return new OutputFolder(folder, shown);
  }

  /**
   * Checks, before anything is solved, that nothing of somebody else's would be replaced.
   *
   * @throws UsageException if something is in the way
   * @throws IOException if the folder cannot be read
   */
  void check() throws UsageException, IOException {
    output().check(shard.whole() ? List.of(TABLE, CHART) : List.of());
    for (Path file : lineFiles()) {
      if (Files.exists(file) && !(Files.isRegularFile(file) && LineFile.ours(file))) {
        throw new UsageException(
            COMMAND,
            shown
                + " holds a "
                + file.getFileName()
                + " that was not written by coldseam; choose another folder with --out FOLDER");
      }
    }
  }

  /** The file of this run; beside it those of shards, whose lines a whole sweep takes over. */
  private List<Path> lineFiles() throws IOException {
    List<Path> files = new ArrayList<>(List.of(folder.resolve(linesName())));
    if (shard.whole() && Files.isDirectory(folder)) {
      try (Stream<Path> entries = Files.list(folder)) {
        entries
            .filter(
                file ->
                    file.getFileName().toString().startsWith("shard-")
                        && file.getFileName().toString().endsWith(".jsonl"))
            .sorted()
            .forEach(files::add);
      }
    }
    return files;
  }

  /**
   * What was solved before.
   *
   * @param sweep the sweep
   * @param key of the study
   * @return line by index of the point
   * @throws IOException if a file cannot be read
   */
  Map<Integer, Lines.Line> finished(Sweep sweep, String key) throws IOException {
    return LineFile.finished(sweep, key, lineFiles());
  }

  /**
   * Opens the file of lines.
   *
   * @param kept lines solved before
   * @return the file
   * @throws UsageException if another run writes it
   * @throws IOException if it cannot be written
   */
  LineFile open(List<Lines.Line> kept) throws UsageException, IOException {
    Files.createDirectories(folder);
    List<String> texts = new ArrayList<>();
    for (Lines.Line line : kept) {
      texts.add(line.text());
    }
    Optional<LineFile> file = LineFile.open(folder.resolve(linesName()), texts);
    if (file.isEmpty()) {
      throw new UsageException(
          COMMAND, "another sweep is writing " + shown + "/" + linesName() + "; let it end first");
    }
    return file.get();
  }

  /**
   * Writes table and chart.
   *
   * @param csv the table
   * @param svg the chart
   * @throws UsageException if something came in the way
   * @throws IOException if they cannot be written
   */
  void write(String csv, String svg) throws UsageException, IOException {
    Map<String, byte[]> files = new LinkedHashMap<>();
    files.put(TABLE, csv.getBytes(StandardCharsets.UTF_8));
    files.put(CHART, svg.getBytes(StandardCharsets.UTF_8));
    output().write(files);
  }
}
