package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class OutputFolderTest {
  @TempDir Path dir;

  private static Map<String, byte[]> files(String... namesAndTexts) {
    Map<String, byte[]> files = new LinkedHashMap<>();
    for (int i = 0; i < namesAndTexts.length; i += 2) {
      files.put(namesAndTexts[i], namesAndTexts[i + 1].getBytes(StandardCharsets.UTF_8));
    }
    return files;
  }

  /** Every file below a folder with its text, our list left out; folders end in a slash. */
  private static Map<String, String> content(Path folder) throws IOException {
    Map<String, String> content = new TreeMap<>();
    try (Stream<Path> all = Files.walk(folder)) {
      for (Path path : all.toList()) {
        String name = folder.relativize(path).toString();
        if (Files.isDirectory(path)) {
          content.put(name + "/", "");
        } else if (!path.endsWith(OutputFolder.LIST)) {
          content.put(name, Files.readString(path));
        }
      }
    }
    return content;
  }

  private OutputFolder folder(Path at) {
    return new OutputFolder(at, at.toString());
  }

  @Test
  void a_new_folder_holds_what_was_written_and_is_readable_like_any_other() throws Exception {
    Path at = dir.resolve("a/b/out");
    folder(at).write(files("result.json", "1", "section.svg", "2"));
    assertThat(content(dir))
        .containsOnlyKeys(
            "/", "a/", "a/b/", "a/b/out/", "a/b/out/result.json", "a/b/out/section.svg");
    assertThat(Files.getPosixFilePermissions(at))
        .isEqualTo(Files.getPosixFilePermissions(Files.createDirectory(dir.resolve("usual"))));
  }

  @Test
  void earlier_output_is_replaced_and_nothing_else() throws Exception {
    Path at = dir.resolve("out");
    folder(at).write(files("result.json", "1", "section.png", "old plot"));
    Files.writeString(at.resolve("notes.txt"), "mine");
    Files.createDirectory(at.resolve("variant"));
    folder(at).write(files("result.json", "2"));
    assertThat(content(at))
        .isEqualTo(Map.of("/", "", "variant/", "", "notes.txt", "mine", "result.json", "2"));
    Files.writeString(at.resolve("section.png"), "mine too");
    assertThatThrownBy(() -> folder(at).write(files("result.json", "3", "section.png", "3")))
        .isInstanceOf(UsageException.class)
        .hasMessageContaining("section.png that was not written by coldseam");
    assertThat(content(at))
        .containsEntry("section.png", "mine too")
        .containsEntry("result.json", "2");
  }

  @Test
  void somebody_elses_file_is_found_before_any_work() throws Exception {
    Files.writeString(dir.resolve("result.csv"), "mine");
    assertThatThrownBy(() -> folder(dir).check(files("result.csv", "").keySet()))
        .isInstanceOf(UsageException.class)
        .hasMessageContaining("--out");
    folder(dir).check(files("result.json", "").keySet());
    Path file = Files.writeString(dir.resolve("file"), "mine");
    assertThatThrownBy(() -> folder(file.resolve("out")).check(files("a", "").keySet()))
        .isInstanceOf(UsageException.class)
        .hasMessageContaining("file is a file, not a folder");
  }

  @Test
  void a_list_that_was_tampered_with_reaches_no_other_folder() throws Exception {
    Path at = dir.resolve("out");
    folder(at).write(files("result.json", "1"));
    Path precious = Files.writeString(dir.resolve("precious"), "mine");
    Files.writeString(at.resolve(OutputFolder.LIST), "../precious\nresult.json\n");
    folder(at).write(files("result.json", "2"));
    assertThat(precious).hasContent("mine");
  }

  /** The k-th write fails, for every k: all is as before, whether there was a folder or not. */
  @Test
  void a_write_that_fails_leaves_everything_as_it_was() throws Exception {
    Map<String, byte[]> written = files("result.json", "new", "section.svg", "new", "a.csv", "new");
    Path old = dir.resolve("old");
    folder(old).write(files("result.json", "old", "section.svg", "old"));
    Map<String, String> before = content(dir);
    for (Path at : new Path[] {old, dir.resolve("fresh/out")}) {
      int failures = 0;
      for (int k = 1; ; k++) {
        AtomicInteger left = new AtomicInteger(k);
        OutputFolder.FileWriter failing =
            (file, bytes) -> {
              if (left.decrementAndGet() == 0) {
                throw new IOException("disk full");
              }
              Files.write(file, bytes);
            };
        try {
          new OutputFolder(at, "out", failing).write(written);
          break;
        } catch (IOException e) {
          failures++;
          assertThat(content(dir)).as("write %d into %s", k, at).isEqualTo(before);
        }
      }
      assertThat(failures).isGreaterThanOrEqualTo(4); // three files and at least one list
      assertThat(content(at)).hasSize(4).containsEntry("a.csv", "new");
      before = content(dir);
    }
  }
}
