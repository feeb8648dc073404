package coldseam.cli;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * A folder with the output of one solve. It is written whole or not at all: everything is laid down
 * beside it first and then moved in place. It replaces what an earlier solve wrote, told by a list
 * it leaves there, and nothing else.
 */
final class OutputFolder {
  /** The list of what was written. */
  static final String LIST = ".coldseam-output";

  /** Writes one file; exchanged in tests to fail. */
  @FunctionalInterface
  interface FileWriter {
    /**
     * Writes a new file.
     *
     * @param file where
     * @param bytes what
     * @throws IOException if it cannot be written
     */
    void write(Path file, byte[] bytes) throws IOException;
  }

  private static final class OnDisk implements FileWriter {
    @Override
    public void write(Path file, byte[] bytes) throws IOException {
      Files.write(file, bytes);
    }
  }

  private final Path folder;
  private final String shown;
  private final FileWriter writer;

  /**
   * A folder that need not exist.
   *
   * @param folder where
   * @param shown how messages call it
   */
  OutputFolder(Path folder, String shown) {
    this(folder, shown, new OnDisk());
  }

  OutputFolder(Path folder, String shown, FileWriter writer) {
    this.folder = folder.toAbsolutePath().normalize();
    this.shown = shown;
    this.writer = writer;
  }

  /** How messages call it. */
  String shown() {
    return shown;
  }

  /**
   * Checks, before any work is done, that files of these names can be written without replacing
   * somebody else's.
   *
   * @param names names of the files
   * @throws UsageException if something is in the way
   * @throws IOException if the folder cannot be read
   */
  void check(Collection<String> names) throws UsageException, IOException {
    for (Path part = folder; part != null; part = part.getParent()) {
      if (Files.isDirectory(part)) {
        if (!Files.isWritable(part)) {
          throw blocked("there is no permission to write in " + part);
        }
        break;
      }
      if (Files.exists(part, LinkOption.NOFOLLOW_LINKS)) {
        throw blocked(part.getFileName() + " is a file, not a folder");
      }
    }
    Set<String> own = listed();
    for (String name : names) {
      if (!own.contains(name) && Files.exists(folder.resolve(name), LinkOption.NOFOLLOW_LINKS)) {
        throw blocked("it holds a " + name + " that was not written by coldseam");
      }
    }
  }

  private UsageException blocked(String why) {
    return new UsageException(
        "solve", shown + " cannot take the output: " + why + "; choose another with --out FOLDER");
  }

  /**
   * Writes files. One that is there already with the same content is left alone, with its date.
   *
   * @param files name and content of each
   * @throws UsageException if something came in the way
   * @throws IOException if a file cannot be written; nothing is changed then
   */
  void write(Map<String, byte[]> files) throws UsageException, IOException {
    check(files.keySet());
    List<Path> made = new ArrayList<>();
    try (Staged staged = new Staged()) {
      makeParents(folder.getParent(), made);
      Staged.sweep(folder);
      boolean fresh = Files.notExists(folder);
      Path stage = Files.createDirectory(staged.take(Staged.beside(folder)));
      List<String> changed = new ArrayList<>();
      for (Map.Entry<String, byte[]> file : files.entrySet()) {
        if (fresh || !holds(folder.resolve(file.getKey()), file.getValue())) {
          writer.write(stage.resolve(file.getKey()), file.getValue());
          changed.add(file.getKey());
        }
      }
      if (fresh) {
        writer.write(stage.resolve(LIST), list(files.keySet()));
        staged.move(stage, folder);
      } else {
        replace(stage, files.keySet(), changed);
      }
      made.clear();
    } finally {
      for (int i = made.size() - 1; i >= 0; i--) {
        Files.deleteIfExists(made.get(i));
      }
    }
  }

  /** Whether a file has this content already. */
  private static boolean holds(Path file, byte[] content) throws IOException {
    return Files.isRegularFile(file)
        && Files.size(file) == content.length
        && Arrays.equals(Files.readAllBytes(file), content);
  }

  /** Moves what changed into the folder; the list names everything old and new until the end. */
  private void replace(Path stage, Set<String> names, List<String> changed) throws IOException {
    Set<String> before = listed();
    boolean sameNames = before.equals(names);
    if (!sameNames) {
      Set<String> both = new LinkedHashSet<>(before);
      both.addAll(names);
      writer.write(stage.resolve(LIST), list(both));
      writer.write(stage.resolve("last"), list(names));
      moveOver(stage.resolve(LIST), folder.resolve(LIST));
    }
    for (String name : changed) {
      moveOver(stage.resolve(name), folder.resolve(name));
    }
    if (sameNames) {
      return;
    }
    for (String name : before) {
      if (!names.contains(name)) {
        Files.deleteIfExists(folder.resolve(name));
      }
    }
    moveOver(stage.resolve("last"), folder.resolve(LIST));
  }

  private static void moveOver(Path from, Path to) throws IOException {
    Files.move(from, to, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
  }

  private static void makeParents(Path parent, List<Path> made) throws IOException {
    if (parent != null && Files.notExists(parent)) {
      makeParents(parent.getParent(), made);
      Files.createDirectory(parent);
      made.add(parent);
    }
  }

  private static byte[] list(Collection<String> names) {
    String head = "# Written by coldseam, replaced by the next solve:\n";
    return (head + String.join("\n", names) + "\n").getBytes(StandardCharsets.UTF_8);
  }

  /** Names of the files that an earlier solve wrote; plain names only, whatever the list says. */
  private Set<String> listed() throws IOException {
    Set<String> names = new LinkedHashSet<>();
    Path list = folder.resolve(LIST);
    if (Files.isRegularFile(list)) {
      for (String line : Files.readString(list).split("\n")) {
        boolean plain = !line.contains("/") && !line.contains("\\") && !line.startsWith(".");
        if (!line.startsWith("#") && !line.isBlank() && plain) {
          names.add(line.strip());
        }
      }
    }
    return names;
  }
}
