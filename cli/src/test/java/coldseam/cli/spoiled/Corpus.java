package coldseam.cli.spoiled;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;

/**
 * What is spoiled: every case, window file, building and drawing that ships, the demo drawings as
 * they stand in a case, and what has been found to break something. All of it is copied to a folder
 * of its own, so that cases find the cases and drawings they name.
 */
final class Corpus {
  private static final List<String> SHIPPED = List.of("awkward", "demo", "published", "windows");

  private final Path root;
  private final List<Path> cases = new ArrayList<>();
  private final List<Path> drawings = new ArrayList<>();
  private final List<Path> hosts = new ArrayList<>();
  private final List<Path> found = new ArrayList<>();

  /**
   * One spoiled file in its place, and what to do with it.
   *
   * @param file the file
   * @param bytes what is in it
   * @param commands command lines to run one after the other in its folder, while they end with 0
   */
  record Input(Path file, byte[] bytes, List<List<String>> commands) {}

  /**
   * Copies the corpus.
   *
   * @param repository the folder of the program
   * @param root an empty folder
   */
  Corpus(Path repository, Path root) throws IOException {
    this.root = root;
    for (String folder : SHIPPED) {
      copy(repository.resolve("cases").resolve(folder), root.resolve(folder));
    }
    Path own = repository.resolve("cli/src/test/resources/spoiled");
    copy(own, root.resolve("own"));
    for (Path file : files(root)) {
      String name = file.getFileName().toString();
      if (file.getParent().endsWith("found")) {
        found.add(file);
        continue;
      }
      if (name.startsWith("in-place-")) {
        Path drawing = root.resolve("demo/drawings").resolve(drawingOf(file));
        Files.copy(drawing, file.resolveSibling(drawing.getFileName()));
        hosts.add(file);
      }
      if (name.endsWith(".yaml")) {
        cases.add(file);
      } else if (name.endsWith(".svg") || name.endsWith(".dxf")) {
        drawings.add(file);
      }
    }
  }

  /** {@code in-place-sill-svg.yaml} takes its shapes from {@code sill.svg}. */
  private static String drawingOf(Path host) {
    String stem = host.getFileName().toString().replace("in-place-", "").replace(".yaml", "");
    int dash = stem.lastIndexOf('-');
    return stem.substring(0, dash) + "." + stem.substring(dash + 1);
  }

  private static void copy(Path from, Path to) throws IOException {
    for (Path file : files(from)) {
      Path target = to.resolve(from.relativize(file).toString());
      Files.createDirectories(target.getParent());
      Files.copy(file, target);
    }
  }

  private static List<Path> files(Path folder) throws IOException {
    try (Stream<Path> walk = Files.walk(folder)) {
      return walk.filter(Files::isRegularFile)
          .filter(file -> !file.toString().contains(".coldseam"))
          .sorted()
          .toList();
    }
  }

  /** Every file, by name from the root. */
  List<Path> all() throws IOException {
    return files(root);
  }

  /** What broke something once, as it was; the part of a name after {@code --} is a drawing's. */
  List<Input> foundBefore() throws IOException {
    List<Input> inputs = new ArrayList<>();
    for (Path file : found) {
      String name = file.getFileName().toString();
      byte[] bytes = Files.readAllBytes(file);
      int mark = name.indexOf("--");
      if (mark >= 0) {
        for (Path host : hosts) {
          if (name.substring(mark + 2).equals(drawingOf(host))) {
            Path drawing = host.resolveSibling(drawingOf(host));
            inputs.add(new Input(drawing, bytes, List.of(solve(host.getFileName().toString()))));
          }
        }
      } else if (name.endsWith(".yaml")) {
        Path place = root.resolve("demo/spoiled.yaml");
        Path inPlace = root.resolve("own/spoiled.yaml");
        boolean drawn = text(bytes).contains("drawings:");
        inputs.add(
            new Input(
                drawn ? inPlace : place, bytes, List.of(solve("spoiled.yaml", "--variants"))));
      } else {
        Path place = root.resolve("demo/drawings/spoiled" + name.substring(name.lastIndexOf('.')));
        inputs.add(
            new Input(place, bytes, List.of(List.of("draft", place.getFileName().toString()))));
      }
    }
    return inputs;
  }

  /**
   * The spoiled input of a number.
   *
   * @param number the same number makes the same input
   */
  Input input(long number) throws IOException {
    // numbers that follow each other make generators that begin alike
    Random random = new Random(number * 0x9E3779B97F4A7C15L);
    return random.nextInt(10) < 5 ? drawing(random) : ofCase(random);
  }

  private Input ofCase(Random random) throws IOException {
    Path seed = cases.get(random.nextInt(cases.size()));
    Path other = cases.get(random.nextInt(cases.size()));
    byte[] bytes = Files.readAllBytes(seed);
    byte[] spoiled =
        random.nextInt(5) == 0
            ? SpoiledText.of(bytes, random)
            : SpoiledYaml.of(text(bytes), Files.readString(other), random)
                .getBytes(StandardCharsets.UTF_8);
    Path file = seed.resolveSibling("spoiled.yaml");
    if (text(bytes).contains("\nbuilding:")) {
      List<String> ledger = new ArrayList<>(solve("spoiled.yaml"));
      ledger.set(0, "ledger");
      return new Input(
          file, spoiled, List.of(random.nextBoolean() ? ledger : List.of("check", "spoiled.yaml")));
    }
    List<String> command =
        switch (random.nextInt(6)) {
          case 0, 1 -> List.of("check", "spoiled.yaml");
          case 2 -> List.of("check", "spoiled.yaml", "--json");
          case 3 -> solve("spoiled.yaml", "--variants");
          case 4 -> solve("spoiled.yaml", "--json");
          default -> solve("spoiled.yaml");
        };
    return new Input(file, spoiled, List.of(command));
  }

  private static List<String> solve(String file, String... more) {
    List<String> command = new ArrayList<>(List.of("solve", file, "--most-unknowns", "4000"));
    command.addAll(List.of(more));
    return command;
  }

  private Input drawing(Random random) throws IOException {
    boolean inPlace = random.nextInt(3) == 0;
    if (inPlace) {
      Path host = hosts.get(random.nextInt(hosts.size()));
      Path seed = host.resolveSibling(drawingOf(host));
      return new Input(
          seed, spoiled(seed, random), List.of(solve(host.getFileName().toString(), "--json")));
    }
    Path seed = drawings.get(random.nextInt(drawings.size()));
    String name = seed.getFileName().toString();
    Path file = seed.resolveSibling("spoiled" + name.substring(name.lastIndexOf('.')));
    List<List<String>> commands =
        List.of(
            List.of("draft", file.getFileName().toString(), "--out", "drafted.yaml"),
            List.of("check", "drafted.yaml"));
    return new Input(file, spoiled(seed, random), commands);
  }

  private static byte[] spoiled(Path seed, Random random) throws IOException {
    byte[] bytes = Files.readAllBytes(seed);
    if (random.nextInt(5) == 0) {
      return SpoiledText.of(bytes, random);
    }
    boolean svg = seed.toString().endsWith(".svg");
    String text = text(bytes);
    return (svg ? SpoiledSvg.of(text, random) : SpoiledDxf.of(text, random))
        .getBytes(StandardCharsets.UTF_8);
  }

  private static String text(byte[] bytes) {
    return new String(bytes, StandardCharsets.UTF_8);
  }
}
