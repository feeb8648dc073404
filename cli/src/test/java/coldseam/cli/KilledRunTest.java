package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;

/** A run that is killed while it writes leaves a whole output or none. */
@Timeout(value = 5, unit = TimeUnit.MINUTES)
class KilledRunTest {
  @TempDir Path dir;

  private Process started() throws IOException {
    return new ProcessBuilder(
            ProcessHandle.current().info().command().orElseThrow(),
            "-Djava.awt.headless=true",
            "-cp",
            System.getProperty("java.class.path"),
            "coldseam.cli.Main",
            "solve",
            "wall.yaml",
            "--variants",
            "--png")
        .directory(dir.toFile())
        .redirectOutput(ProcessBuilder.Redirect.DISCARD)
        .redirectError(ProcessBuilder.Redirect.DISCARD)
        .start();
  }

  private List<String> names(Path folder) throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.map(file -> file.getFileName().toString()).sorted().toList();
    }
  }

  private static boolean staged(String name) {
    return name.startsWith(".wall.coldseam-");
  }

  /** Waits until something is laid down beside the case; false if the run ends before. */
  private boolean writing(Process run) throws IOException, InterruptedException {
    while (run.isAlive()) {
      if (names(dir).stream().anyMatch(KilledRunTest::staged)) {
        return true;
      }
      Thread.sleep(1);
    }
    return false;
  }

  private void whole() throws IOException {
    for (String name : names(dir)) {
      assertThat(name)
          .satisfiesAnyOf(
              n -> assertThat(n).isIn("wall.yaml", "wall.coldseam"),
              n -> assertThat(staged(n)).isTrue());
    }
    Path out = dir.resolve("wall.coldseam");
    if (Files.exists(out)) {
      for (String line : Files.readAllLines(out.resolve(OutputFolder.LIST))) {
        if (!line.startsWith("#")) {
          assertThat(out.resolve(line)).isNotEmptyFile();
        }
      }
      assertThat(Files.readString(out.resolve("result.json")).strip()).endsWith("}");
    }
  }

  @Test
  void killed_while_it_writes() throws Exception {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    for (int i = 0; i < 3; i++) {
      Process run = started();
      writing(run);
      run.destroyForcibly();
      assertThat(run.waitFor(1, TimeUnit.MINUTES)).isTrue();
      whole();
    }
  }

  @Test
  void told_to_end_while_it_writes() throws Exception {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Process run = started();
    writing(run);
    run.destroy();
    assertThat(run.waitFor(1, TimeUnit.MINUTES)).isTrue();
    whole();
    assertThat(names(dir)).noneMatch(KilledRunTest::staged);
  }

  @Test
  void what_a_killed_run_left_goes_with_a_later_one() throws IOException {
    Cases.write(dir, "wall.yaml", Cases.WALL);
    Path left = Files.createDirectory(Staged.beside(dir.resolve("wall.coldseam")));
    Files.writeString(left.resolve("result.json"), "{");
    Path fresh = Files.createDirectory(Staged.beside(dir.resolve("wall.coldseam")));
    Path users = Files.createDirectory(dir.resolve(".wall.coldseam-mine"));
    FileTime old = FileTime.fromMillis(System.currentTimeMillis() - 7_200_000);
    Files.setLastModifiedTime(left, old);
    Files.setLastModifiedTime(users, old);
    assertThat(Ran.in(dir, "solve", "wall.yaml", "--no-plots").code()).isZero();
    assertThat(left).doesNotExist();
    assertThat(fresh).exists();
    assertThat(users).exists();
  }
}
