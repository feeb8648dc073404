package coldseam.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * Writes single files where there were none: all of them, each whole, or none. Everything is laid
 * down beside its place first.
 */
final class NewFiles {
  private final String command;
  private final boolean force;
  private final Surroundings here;

  /**
   * Prepares.
   *
   * @param command the command they are written for
   * @param force whether files that are there may be replaced
   * @param here how messages call files
   */
  NewFiles(String command, boolean force, Surroundings here) {
    this.command = command;
    this.force = force;
    this.here = here;
  }

  /**
   * Checks, before any work is done, that a file can be written.
   *
   * @param file where
   * @throws UsageException if it cannot
   */
  void check(Path file) throws UsageException {
    Path folder = file.toAbsolutePath().getParent();
    if (Files.isDirectory(file)) {
      throw new UsageException(command, here.shown(file) + " is a folder; name a file");
    }
    if (folder == null || !Files.isDirectory(folder)) {
      throw new UsageException(command, "there is no folder for " + here.shown(file));
    }
    if (!force && Files.exists(file, LinkOption.NOFOLLOW_LINKS)) {
      throw new UsageException(
          command,
          here.shown(file) + " is there already; choose another with --out FILE, or --force");
    }
  }

  /**
   * Writes files.
   *
   * @param files where, and what
   * @throws UsageException if one is in the way or cannot be written; none is written then
   */
  void write(Map<Path, byte[]> files) throws UsageException {
    List<Path> laid = new ArrayList<>();
    try (Staged staged = new Staged()) {
      for (Map.Entry<Path, byte[]> file : files.entrySet()) {
        check(file.getKey());
        Staged.sweep(file.getKey());
        Path beside = staged.take(Staged.beside(file.getKey().toAbsolutePath()));
        laid.add(beside);
        Files.write(beside, file.getValue(), StandardOpenOption.CREATE_NEW);
      }
      int i = 0;
      for (Path file : files.keySet()) {
        Files.move(
            laid.get(i), file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        staged.moved(laid.get(i));
        i++;
      }
    } catch (IOException e) {
      throw new UsageException(command, "cannot write: " + Failure.words(e));
    }
  }
}
