package coldseam.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.BasicFileAttributes;
import java.nio.file.attribute.FileTime;
import java.time.Instant;
import java.util.HashMap;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.TimeUnit;

/**
 * Files that are looked at again and again. Asking for date and size of a few files ten times a
 * second costs next to nothing and works on every file system, where notices of the system come
 * seconds late on some and never on others.
 */
final class WatchedFiles {
  /**
   * What a file is told by: it is another after it was written to, or replaced.
   *
   * @param modifiedNanos when it was last written to
   * @param size in bytes
   * @param key of the file system, {@code null} where it has none
   */
  private record Mark(long modifiedNanos, long size, Object key) {
    static final Mark MISSING = new Mark(0, -1, null);

    static long nanos(FileTime time) {
      return time.to(TimeUnit.NANOSECONDS);
    }

    static Mark of(Path file) {
      try {
        BasicFileAttributes now = Files.readAttributes(file, BasicFileAttributes.class);
        return new Mark(nanos(now.lastModifiedTime()), now.size(), now.fileKey());
      } catch (IOException e) {
        return MISSING;
      }
    }
  }

  private Map<Path, Mark> taken = new HashMap<>();
  private Map<Path, Mark> seen = new HashMap<>();

  /**
   * Watches these files instead of those before. Of files new to it, what is there now is taken,
   * unless it was written after it may have been read.
   *
   * @param files the files; they need not exist
   * @param readAfter when reading them began
   */
  void watch(Set<Path> files, Instant readAfter) {
    long read = Mark.nanos(FileTime.from(readAfter));
    Map<Path, Mark> nowTaken = new HashMap<>();
    Map<Path, Mark> nowSeen = new HashMap<>();
    for (Path file : files) {
      Mark mark = Mark.of(file);
      Mark asRead = mark.modifiedNanos >= read ? Mark.MISSING : mark;
      nowTaken.put(file, taken.getOrDefault(file, asRead));
      nowSeen.put(file, seen.getOrDefault(file, mark));
    }
    taken = nowTaken;
    seen = nowSeen;
  }

  /** Whether a file is no longer as it was taken, and all have kept still between two looks. */
  boolean changed() {
    Map<Path, Mark> now = new HashMap<>();
    for (Path file : seen.keySet()) {
      now.put(file, Mark.of(file));
    }
    boolean still = now.equals(seen);
    seen = now;
    return still && !now.equals(taken);
  }

  /** Takes the files as they were seen last. */
  void take() {
    taken = new HashMap<>(seen);
  }
}
