package coldseam.cases.study;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.OverlappingFileLockException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A file with one line for each finished point of a sweep. Lines are appended whole, in one write
 * each; what a killed run left of a line is found and dropped when the file is next opened. Lines
 * of another study are dropped then, too: the case has changed since.
 */
public final class LineFile implements AutoCloseable {
  private final FileChannel channel;

  private LineFile(FileChannel channel) {
    this.channel = channel;
  }

  /**
   * Finished points found in files of lines.
   *
   * @param sweep the sweep
   * @param key of the study
   * @param files files of lines; those that do not exist hold none
   * @return line by index of the point, in the order found
   * @throws IOException if a file cannot be read
   */
  public static Map<Integer, Lines.Line> finished(Sweep sweep, String key, List<Path> files)
      throws IOException {
    Map<Map<String, String>, Integer> wanted = new HashMap<>();
    for (Point point : sweep.points()) {
      wanted.put(Lines.canonical(point.settings()), point.index());
    }
    Map<Integer, Lines.Line> found = new LinkedHashMap<>();
    for (Path file : files) {
      if (!Files.isRegularFile(file)) {
        continue;
      }
      for (String text : whole(file)) {
        Optional<Lines.Line> line = text.contains(key) ? Lines.read(text) : Optional.empty();
        if (line.isPresent() && line.get().study().equals(key)) {
          Integer index = wanted.get(line.get().settings());
          if (index != null) {
            found.putIfAbsent(index, line.get());
          }
        }
      }
    }
    return found;
  }

  /** Lines that end with a line feed. */
  private static List<String> whole(Path file) throws IOException {
    String text = Files.readString(file, StandardCharsets.UTF_8);
    List<String> lines = new ArrayList<>();
    int from = 0;
    for (int end = text.indexOf('\n'); end >= 0; end = text.indexOf('\n', from)) {
      lines.add(text.substring(from, end));
      from = end + 1;
    }
    return lines;
  }

  /**
   * Whether a file is one of ours: it holds nothing, or a whole line of a sweep, or no more than
   * the beginning of one.
   *
   * @param file an existing file
   * @return whether it may be replaced
   * @throws IOException if it cannot be read
   */
  public static boolean ours(Path file) throws IOException {
    byte[] bytes = Files.readAllBytes(file);
    String text = new String(bytes, StandardCharsets.UTF_8);
    int end = text.indexOf('\n');
    if (end >= 0) {
      return Lines.read(text.substring(0, end)).isPresent();
    }
    return text.isEmpty() || text.startsWith(START) || START.startsWith(text);
  }

  /** What every line begins with. */
  public static final String START = "{\"coldseam\":";

  /**
   * Opens a file to append to it. Holds it against other runs until it is closed, where the file
   * system can.
   *
   * @param file where; made if it is not there
   * @param keep lines that stay, without line feeds; everything else in the file goes
   * @return the open file, or empty if another run holds it
   * @throws IOException if it cannot be written
   */
  public static Optional<LineFile> open(Path file, List<String> keep) throws IOException {
    StringBuilder text = new StringBuilder();
    for (String line : keep) {
      text.append(line).append('\n');
    }
    byte[] wanted = text.toString().getBytes(StandardCharsets.UTF_8);
    Optional<LineFile> opened = locked(file);
    if (opened.isEmpty()) {
      return opened;
    }
    byte[] there = Files.readAllBytes(file);
    if (there.length >= wanted.length
        && Arrays.equals(there, 0, wanted.length, wanted, 0, wanted.length)) {
      opened.get().channel.truncate(wanted.length);
      opened.get().channel.position(wanted.length);
      return opened;
    }
    opened.get().close();
    Path fresh = file.resolveSibling("." + file.getFileName() + ".fresh");
    Files.write(fresh, wanted);
    Files.move(fresh, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    opened = locked(file);
    if (opened.isPresent()) {
      opened.get().channel.position(wanted.length);
    }
    return opened;
  }

  private static Optional<LineFile> locked(Path file) throws IOException {
    FileChannel channel =
        FileChannel.open(file, StandardOpenOption.CREATE, StandardOpenOption.WRITE);
    boolean free = false;
    try {
      free = channel.tryLock() != null;
    } catch (OverlappingFileLockException e) {
      free = false;
    } finally {
      if (!free) {
        channel.close();
      }
    }
    return free ? Optional.of(new LineFile(channel)) : Optional.empty();
  }

  /**
   * Appends a line, whole.
   *
   * @param line without line feed
   * @throws IOException if it cannot be written
   */
  public void append(String line) throws IOException {
    ByteBuffer bytes = ByteBuffer.wrap((line + "\n").getBytes(StandardCharsets.UTF_8));
    while (bytes.hasRemaining()) {
      channel.write(bytes);
    }
  }

  @Override
  public void close() throws IOException {
    channel.close();
  }
}
