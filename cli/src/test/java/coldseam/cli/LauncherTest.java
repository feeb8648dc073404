package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The packaged program, started by its launcher from a copy of itself. Runs after packaging, in
 * {@code mvn verify}.
 */
class LauncherTest {
  private static final Path JAVA_HOME = Path.of(System.getProperty("java.home"));

  @TempDir Path dir;
  private Path home;

  @BeforeEach
  void copy_the_program() throws IOException {
    assumeTrue(FileSystems.getDefault().supportedFileAttributeViews().contains("posix"));
    home = dir.resolve("a folder, ψ");
    copy(Root.folder().resolve("cli/target/lib"), home.resolve("cli/target/lib"));
    copy(Root.folder().resolve("cases/demo"), home.resolve("cases/demo"));
    Files.copy(Root.folder().resolve("cli/coldseam"), home.resolve("cli/coldseam"));
    executable(home.resolve("cli/coldseam"));
    assertThat(home.resolve("cli/target/lib/coldseam.jar")).as("packaged before").exists();
  }

  private static void copy(Path from, Path to) throws IOException {
    Files.createDirectories(to);
    try (Stream<Path> files = Files.list(from)) {
      for (Path file : files.filter(Files::isRegularFile).toList()) {
        Files.copy(file, to.resolve(file.getFileName()));
      }
    }
  }

  private static void executable(Path file) throws IOException {
    Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("rwxr-xr-x"));
  }

  private static Path script(Path file, String body) throws IOException {
    Files.createDirectories(file.getParent());
    Files.writeString(file, "#!/bin/sh\n" + body);
    executable(file);
    return file;
  }

  /** A process that was started, with the files its streams go to. */
  private record Started(Process process, Path out, Path err) {
    Ran end() throws IOException, InterruptedException {
      assertThat(process.waitFor(5, TimeUnit.MINUTES)).as("it ends").isTrue();
      return new Ran(process.exitValue(), Files.readString(out), Files.readString(err));
    }
  }

  private Started start(Map<String, String> environment, String... command) throws IOException {
    Path out = Files.createTempFile(dir, "out", "");
    Path err = Files.createTempFile(dir, "err", "");
    ProcessBuilder builder =
        new ProcessBuilder(command)
            .directory(dir.toFile())
            .redirectOutput(out.toFile())
            .redirectError(err.toFile());
    builder.environment().put("JAVA_HOME", JAVA_HOME.toString());
    builder.environment().remove("COLDSEAM_JAVA_OPTIONS");
    builder.environment().putAll(environment);
    return new Started(builder.start(), out, err);
  }

  private Ran launch(Map<String, String> environment, String... args) throws Exception {
    List<String> command = new ArrayList<>(List.of(home.resolve("cli/coldseam").toString()));
    command.addAll(List.of(args));
    return start(environment, command.toArray(new String[0])).end();
  }

  @Test
  void it_starts_from_anywhere_and_makes_its_archive_once() throws Exception {
    Path link = Files.createSymbolicLink(dir.resolve("seam"), home.resolve("cli/coldseam"));
    Ran first = start(Map.of(), link.toString(), "--version").end();
    assertThat(first).isEqualTo(new Ran(0, Main.version() + "\n", ""));
    Path archive = home.resolve("cli/target/launch/classes.jsa");
    assertThat(archive).isNotEmptyFile();
    Object made = Files.getLastModifiedTime(archive);

    Cases.write(dir, "wällchen.yaml", Cases.WALL);
    // Sharing is demanded here: Java ends with an error if the archive does not fit the program.
    Ran second =
        start(
                Map.of("COLDSEAM_JAVA_OPTIONS", "-Xshare:on", "LC_ALL", "C"),
                link.toString(),
                "solve",
                "wällchen.yaml",
                "--json")
            .end();
    assertThat(second.code()).as(second.err()).isZero();
    assertThat(second.out()).contains("\"case\":\"Plain wall\"").contains("wällchen.yaml");
    assertThat(Files.getLastModifiedTime(archive)).isEqualTo(made);
    assertThat(home.resolve("cli/target/launch.lock")).doesNotExist();
  }

  @Test
  void two_first_starts_at_once_both_work() throws Exception {
    String program = home.resolve("cli/coldseam").toString();
    Started one = start(Map.of(), program, "--version");
    Started other = start(Map.of(), program, "--version");
    assertThat(one.end()).isEqualTo(new Ran(0, Main.version() + "\n", ""));
    assertThat(other.end()).isEqualTo(new Ran(0, Main.version() + "\n", ""));
    try (Stream<Path> files = Files.list(home.resolve("cli/target/launch"))) {
      assertThat(files.map(file -> file.getFileName().toString()))
          .containsExactlyInAnyOrder("classes.jsa", "java");
    }
  }

  @Test
  void without_a_place_for_the_archive_it_starts_all_the_same() throws Exception {
    Files.writeString(home.resolve("cli/target/launch"), "in the way");
    assertThat(launch(Map.of(), "--version").code()).isZero();
    Files.delete(home.resolve("cli/target/launch"));
    Files.createDirectory(home.resolve("cli/target/launch"));
    Files.writeString(home.resolve("cli/target/launch/classes.jsa"), "no archive");
    Files.writeString(home.resolve("cli/target/launch/java"), JAVA_HOME + "/bin/java\n");
    assertThat(launch(Map.of(), "--version")).isEqualTo(new Ran(0, Main.version() + "\n", ""));
  }

  @Test
  void an_old_or_missing_java_is_told() throws Exception {
    Path old =
        script(dir.resolve("old/bin/java"), "echo 'openjdk version \"11.0.2\" 2019-01-15' >&2\n");
    Ran ran = launch(Map.of("JAVA_HOME", old.getParent().getParent().toString()), "--version");
    assertThat(ran.code()).isEqualTo(2);
    assertThat(ran.err()).contains("needs Java 17 or newer").contains("is version 11.0.2");
    Ran none = launch(Map.of("JAVA_HOME", dir.toString()), "--version");
    assertThat(none.code()).isEqualTo(2);
    assertThat(none.err()).contains("there is no bin/java in it");
  }

  @Test
  void it_builds_when_there_is_no_build_or_a_source_is_newer_and_only_then() throws Exception {
    Path kept = dir.resolve("kept");
    Files.move(home.resolve("cli/target/lib"), kept);
    Path count = dir.resolve("count");
    Path tools =
        script(
                dir.resolve("tools/mvn"),
                "echo built >> '%s'\nsleep 1\nmkdir -p cli/target\ncp -r '%s' cli/target/lib\n"
                    .formatted(count, kept))
            .getParent();
    Map<String, String> path = Map.of("PATH", tools + ":" + System.getenv("PATH"));
    String program = home.resolve("cli/coldseam").toString();
    Started one = start(path, program, "--version");
    Started other = start(path, program, "--version");
    Ran first = one.end();
    Ran second = other.end();
    assertThat(first.code()).as(first.err()).isZero();
    assertThat(second.code()).as(second.err()).isZero();
    assertThat(first.err() + second.err()).isEqualTo("coldseam: building, once …\n");
    assertThat(count).hasContent("built\n");

    Path source = home.resolve("solver/src/main/java/Newer.java");
    Files.createDirectories(source.getParent());
    Files.writeString(source, "class Newer {}");
    assertThat(launch(path, "--version").err()).isEqualTo("coldseam: building, once …\n");
    assertThat(launch(path, "--version").err()).isEmpty();
    assertThat(count).hasContent("built\nbuilt\n");
  }

  @Test
  void a_build_that_fails_is_shown() throws Exception {
    Files.move(home.resolve("cli/target/lib"), dir.resolve("gone"));
    Path tools = script(dir.resolve("tools/mvn"), "echo it broke\nexit 1\n").getParent();
    Ran ran = launch(Map.of("PATH", tools + ":" + System.getenv("PATH")), "--version");
    assertThat(ran.code()).isEqualTo(70);
    assertThat(ran.err()).contains("it broke").contains("the build failed").contains("build.log");
    assertThat(home.resolve("cli/target/launch.lock")).doesNotExist();
  }
}
