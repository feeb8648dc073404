package coldseam.cli;

import java.io.IOException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.FileTime;
import java.util.ArrayList;
import java.util.List;

/**
 * Files or folders laid down beside their place, to be moved there when they are whole. What is
 * still there when the program is told to end goes with it; what a run left that was killed goes
 * with a later one.
 */
final class Staged implements AutoCloseable {
  /** What is older was left behind; no run takes so long between laying down and moving. */
  private static final long LEFT_BEHIND_MS = 3_600_000;

  private final List<Path> laid = new ArrayList<>();
  private final Thread atEnd = new AtEnd();

  private final class AtEnd extends Thread {
    @Override
    public void run() {
      deleteQuietly();
    }
  }

  /** Begins; {@link #close} ends it. */
  Staged() {
    Runtime.getRuntime().addShutdownHook(atEnd);
  }

  /**
   * A name beside a place that no other run uses: of this moment.
   *
   * @param place what will be replaced
   */
  static Path beside(Path place) {
    return place.resolveSibling(
        prefix(place)
            + Long.toString(System.currentTimeMillis(), Character.MAX_RADIX)
            + "-"
            + Long.toString(System.nanoTime() & Long.MAX_VALUE, Character.MAX_RADIX));
  }

  private static String prefix(Path place) {
    return "." + place.getFileName() + "-";
  }

  /**
   * Takes charge of a file or folder.
   *
   * @param path it need not exist yet
   * @return the same
   */
  synchronized Path take(Path path) {
    laid.add(path);
    return path;
  }

  /**
   * Moves a whole folder to its place, never while it is being deleted because the run ends.
   *
   * @param from what was taken charge of
   * @param to where nothing is yet
   * @throws IOException if it cannot be moved, or has been deleted
   */
  synchronized void move(Path from, Path to) throws IOException {
    Files.move(from, to, StandardCopyOption.ATOMIC_MOVE);
    laid.remove(from);
  }

  /** Lets go of what has been moved to its place. */
  synchronized void moved(Path path) {
    laid.remove(path);
  }

  /**
   * Deletes what runs that were killed left beside a place.
   *
   * @param place where they were to write
   */
  static void sweep(Path place) {
    Path folder = place.toAbsolutePath().getParent();
    if (folder == null || !Files.isDirectory(folder)) {
      return;
    }
    long now = System.currentTimeMillis();
    try (DirectoryStream<Path> entries = Files.newDirectoryStream(folder)) {
      for (Path entry : entries) {
        if (ours(entry.getFileName().toString(), prefix(place))) {
          FileTime time = Files.getLastModifiedTime(entry, LinkOption.NOFOLLOW_LINKS);
          if (now - time.toMillis() > LEFT_BEHIND_MS) {
            delete(entry);
          }
        }
      }
    } catch (IOException e) {
      // it stays for another run
      return;
    }
  }

  /** The prefix, a time and a number in letters and digits, with a hyphen between. */
  private static boolean ours(String name, String prefix) {
    int hyphen = name.indexOf('-', prefix.length());
    if (!name.startsWith(prefix) || hyphen != prefix.length() + 8) {
      return false;
    }
    for (int i = prefix.length(); i < name.length(); i++) {
      char c = name.charAt(i);
      if (i != hyphen && (c < '0' || c > '9') && (c < 'a' || c > 'z')) {
        return false;
      }
    }
    return name.length() > hyphen + 1;
  }

  /** Deletes a file, or a folder with all that is in it. */
  static void delete(Path path) throws IOException {
    if (Files.isDirectory(path, LinkOption.NOFOLLOW_LINKS)) {
      try (DirectoryStream<Path> entries = Files.newDirectoryStream(path)) {
        for (Path entry : entries) {
          delete(entry);
        }
      }
    }
    Files.deleteIfExists(path);
  }

  private synchronized void deleteQuietly() {
    for (Path path : laid) {
      try {
        delete(path);
      } catch (IOException e) {
        // nobody is left to be told; a later run sweeps it away
        continue;
      }
    }
  }

  /**
   * Deletes what has not been moved.
   *
   * @throws IOException if something cannot be deleted
   */
  @Override
  public void close() throws IOException {
    try {
      Runtime.getRuntime().removeShutdownHook(atEnd);
    } catch (IllegalStateException e) {
      // the program is ending: the hook does it
      return;
    }
    synchronized (this) {
      for (Path path : laid) {
        delete(path);
      }
      laid.clear();
    }
  }
}
