package coldseam.cases;

import coldseam.cases.words.Spelling;
import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** The text of a file, or why there is none. */
final class FileText {
  /** Larger files are refused unread: a case of 2,000 shapes has about 0.2 MB. */
  static final int MOST_BYTES = 4_000_000;

  private FileText() {}

  /**
   * Reads a UTF-8 text.
   *
   * @param file the file
   * @return its text, a leading byte-order mark removed
   * @throws CaseException if there is no such file, or it is a folder, too large, empty or not text
   */
  static String read(Path file) throws CaseException {
    if (Files.isDirectory(file)) {
      throw wholeFile(file, "this is a folder, not a file", "name a case file in it");
    }
    if (!Files.exists(file)) {
      throw wholeFile(file, "there is no such file", nearby(file));
    }
    byte[] bytes;
    try (InputStream in = Files.newInputStream(file)) {
      bytes = in.readNBytes(MOST_BYTES + 1);
    } catch (IOException e) {
      throw wholeFile(file, "this file cannot be read", "check that it is a file you may read");
    }
    if (bytes.length > MOST_BYTES) {
      throw wholeFile(
          file,
          "this file is too large to be a case",
          "a case file has at most " + MOST_BYTES / 1_000_000 + " MB");
    }
    return decoded(file, bytes);
  }

  /**
   * Whether a line of a file begins with a key, which tells what kind of file it is.
   *
   * @param file the file
   * @param key the key with its colon
   * @return false also if it cannot be read
   */
  static boolean begins(Path file, String key) {
    String text;
    try {
      if (!Files.isRegularFile(file) || Files.size(file) > MOST_BYTES) {
        return false;
      }
      text = new String(Files.readAllBytes(file), StandardCharsets.UTF_8);
    } catch (IOException e) {
      return false;
    }
    int at = text.indexOf(key);
    while (at > 0 && text.charAt(at - 1) != '\n') {
      at = text.indexOf(key, at + 1);
    }
    return at >= 0;
  }

  private static String decoded(Path file, byte[] bytes) throws CaseException {
    CharsetDecoder decoder =
        StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    ByteBuffer in = ByteBuffer.wrap(bytes);
    String text;
    try {
      text = decoder.decode(in).toString();
    } catch (CharacterCodingException e) {
      int line = 1;
      for (int i = 0; i < in.position(); i++) {
        line += bytes[i] == '\n' ? 1 : 0;
      }
      boolean binary = hasControls(bytes);
      Problem problem =
          new Problem(
              file.toString(),
              binary ? 0 : line,
              0,
              binary ? "this is not a text file" : "a character here is not UTF-8",
              Optional.of(
                  binary
                      ? "a case is a YAML text; see cases/README.md"
                      : "save the file in the encoding UTF-8"));
      throw new CaseException(List.of(problem));
    }
    if (hasControls(bytes)) {
      throw wholeFile(
          file, "this is not a text file", "a case is a YAML text; see cases/README.md");
    }
    if (!text.isEmpty() && text.charAt(0) == '\uFEFF') {
      text = text.substring(1);
    }
    if (text.isBlank()) {
      throw wholeFile(file, "this file is empty", "a case begins with `coldseam: 1`");
    }
    return text;
  }

  private static boolean hasControls(byte[] bytes) {
    for (byte b : bytes) {
      if (b >= 0 && b < 32 && b != '\n' && b != '\r' && b != '\t') {
        return true;
      }
    }
    return false;
  }

  /** A file of nearly that name in the same folder, if there is one. */
  private static String nearby(Path file) {
    Path parent = file.toAbsolutePath().getParent();
    if (parent == null || !Files.isDirectory(parent) || file.getFileName() == null) {
      return "check the path";
    }
    List<String> names = new ArrayList<>();
    try (DirectoryStream<Path> entries = Files.newDirectoryStream(parent)) {
      for (Path entry : entries) {
        if (names.size() < 1000 && entry.getFileName() != null) {
          names.add(entry.getFileName().toString());
        }
      }
    } catch (IOException e) {
      return "check the path";
    }
    Optional<String> near = Spelling.nearest(file.getFileName().toString(), names);
    return near.isPresent() ? "did you mean `" + near.get() + "`?" : "check the path";
  }

  private static CaseException wholeFile(Path file, String wrong, String right) {
    return new CaseException(
        List.of(new Problem(file.toString(), 0, 0, wrong, Optional.of(right))));
  }
}
