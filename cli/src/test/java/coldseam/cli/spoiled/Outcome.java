package coldseam.cli.spoiled;

import coldseam.cli.Main;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/** One spoiled input through the program, and everything that is wrong with how that ended. */
final class Outcome {
  /** Exit codes for bad input and for what the program owes an explanation for. */
  private static final int BAD_INPUT = 2;

  private static final Set<Integer> CODES = Set.of(0, 1, 2, 3);

  private static final Pattern TRACE =
      Pattern.compile("\tat |Exception|StackOverflow|OutOfMemory|a defect of the program|java\\.");

  private static final Pattern PLACED =
      Pattern.compile("^[^:]+:\\d+(:\\d+)?: .+|.*\\(-?[\\d.E-]+, -?[\\d.E-]+\\) mm.*");

  /** What concerns a file as a whole has no line. */
  private static final Pattern WHOLE_FILE =
      Pattern.compile(
          "^[^:]+: (this is not a text file|this file is empty|this drawing is larger|"
              + "this is a DWG file|this is a binary DXF file|this packed file is damaged|"
              + "there is no such file|there is no outline in this drawing|"
              + "no lines of this drawing enclose anything).*"
              + "|.*spoiled.yaml is (a building; did you mean|no building).*");

  private static final ObjectMapper MAPPER = new ObjectMapper();

  private final List<String> faults = new ArrayList<>();
  private final StringBuilder told = new StringBuilder();
  private int code;

  private Outcome() {}

  /**
   * Runs an input and takes away what it left.
   *
   * @param input the input
   * @param repository the folder of the program
   */
  static Outcome of(Corpus.Input input, Path repository) throws IOException {
    Outcome outcome = new Outcome();
    Path folder = input.file().getParent();
    byte[] before = Files.exists(input.file()) ? Files.readAllBytes(input.file()) : null;
    Set<String> clean = names(folder);
    clean.add(input.file().getFileName().toString());
    try {
      Files.write(input.file(), input.bytes());
      for (List<String> command : input.commands()) {
        outcome.run(command, folder, repository, clean);
        if (outcome.code != 0) {
          break;
        }
      }
      if (!Arrays.equals(Files.readAllBytes(input.file()), input.bytes())) {
        outcome.faults.add("the input was changed");
      }
    } finally {
      outcome.tidy(folder, clean);
      if (before == null) {
        Files.deleteIfExists(input.file());
      } else {
        Files.write(input.file(), before);
      }
    }
    return outcome;
  }

  int code() {
    return code;
  }

  List<String> faults() {
    return faults;
  }

  /** What was typed and printed. */
  String told() {
    return told.toString();
  }

  private void run(List<String> command, Path folder, Path repository, Set<String> clean)
      throws IOException {
    Set<String> before = names(folder);
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    try (PrintStream outStream = new PrintStream(out, true, StandardCharsets.UTF_8);
        PrintStream errStream = new PrintStream(err, true, StandardCharsets.UTF_8)) {
      code =
          Main.run(
              command.toArray(new String[0]),
              outStream,
              errStream,
              folder,
              Map.of("COLDSEAM_TRACE", "1"),
              repository);
    }
    String printed = out.toString(StandardCharsets.UTF_8);
    String messages = err.toString(StandardCharsets.UTF_8);
    told.append(String.join(" ", command)).append(" -> ").append(code).append('\n');
    told.append(messages);
    if (!CODES.contains(code)) {
      faults.add("exit code " + code);
    }
    if (TRACE.matcher(messages).find() || TRACE.matcher(printed).find()) {
      faults.add("a trace");
    }
    boolean json = command.contains("--json");
    for (String line : json ? printed.split("\n") : new String[0]) {
      try {
        MAPPER.readTree(line);
      } catch (IOException e) {
        faults.add("no JSON: " + e.getMessage());
      }
    }
    if (code == BAD_INPUT) {
      if (!names(folder).equals(before)) {
        faults.add("left " + names(folder));
      }
      boolean told = command.get(0).equals("check") && json;
      if (!printed.isEmpty() && !told && !command.get(0).equals("check")) {
        faults.add("output before a refusal");
      }
      messages.lines().filter(line -> !told).forEach(this::placed);
      if (messages.isBlank() && !told) {
        faults.add("no message");
      }
    }
    for (String name : names(folder)) {
      if (!clean.contains(name) && name.startsWith(".")) {
        faults.add("left " + name);
      }
    }
  }

  private void placed(String line) {
    boolean summary =
        line.endsWith(" mistakes")
            || line.startsWith("warning: ")
            || line.endsWith(" --help says more");
    if (!summary && !PLACED.matcher(line).matches() && !WHOLE_FILE.matcher(line).matches()) {
      faults.add("no place: " + line);
    }
  }

  private static Set<String> names(Path folder) throws IOException {
    Set<String> names = new TreeSet<>();
    try (Stream<Path> files = Files.list(folder)) {
      files.forEach(file -> names.add(file.getFileName().toString()));
    }
    return names;
  }

  private void tidy(Path folder, Set<String> clean) throws IOException {
    for (String name : names(folder)) {
      if (!clean.contains(name)) {
        delete(folder.resolve(name));
      }
    }
  }

  private static void delete(Path path) throws IOException {
    if (Files.isDirectory(path)) {
      for (String name : names(path)) {
        delete(path.resolve(name));
      }
    }
    Files.delete(path);
  }
}
