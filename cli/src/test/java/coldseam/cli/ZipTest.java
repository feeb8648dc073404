package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.FileSystem;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.jar.Attributes;
import java.util.jar.JarFile;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What is handed out, unpacked and run without Maven. Runs after packaging, in {@code verify}. */
class ZipTest {
  @TempDir static Path dir;
  private static Path home;

  @BeforeAll
  static void unpack() throws IOException {
    Path zip = Root.folder().resolve("cli/target/coldseam-" + Main.VERSION + ".zip");
    assumeTrue(Files.exists(zip), "skipped: there is no zip, which mvn package makes");
    assumeTrue(
        FileSystems.getDefault().supportedFileAttributeViews().contains("posix"),
        "skipped: the launcher tried here is that for POSIX systems");
    home = dir.resolve("unpacked here, ψ").resolve("coldseam-" + Main.VERSION);
    unpack(zip, home.getParent());
  }

  private static void unpack(Path zip, Path to) throws IOException {
    try (FileSystem packed =
            FileSystems.newFileSystem(zip, Map.of("enablePosixFileAttributes", true));
        Stream<Path> entries = Files.walk(packed.getPath("/"))) {
      for (Path entry : entries.toList()) {
        Path file = to.resolve(packed.getPath("/").relativize(entry).toString());
        if (Files.isDirectory(entry)) {
          Files.createDirectories(file);
        } else {
          Files.copy(entry, file);
          Files.setPosixFilePermissions(file, Files.getPosixFilePermissions(entry));
        }
      }
    }
  }

  /**
   * Runs the launcher with no program on the path but those of the shell, and a Maven that fails.
   */
  private static Ran launch(Path program, Map<String, String> environment, String... args)
      throws Exception {
    Path tools = Files.createDirectories(dir.resolve("tools"));
    Files.writeString(
        tools.resolve("mvn"), "#!/bin/sh\necho called > '" + dir + "/maven'\nexit 1\n");
    assertThat(tools.resolve("mvn").toFile().setExecutable(true)).isTrue();
    List<String> command = new ArrayList<>(List.of(program.toString()));
    command.addAll(List.of(args));
    Path out = Files.createTempFile(dir, "out", "");
    Path err = Files.createTempFile(dir, "err", "");
    ProcessBuilder builder =
        new ProcessBuilder(command)
            .directory(dir.toFile())
            .redirectOutput(out.toFile())
            .redirectError(err.toFile());
    builder.environment().put("PATH", tools + ":/usr/bin:/bin");
    builder.environment().put("JAVA_HOME", System.getProperty("java.home"));
    builder.environment().remove("COLDSEAM_JAVA_OPTIONS");
    builder.environment().putAll(environment);
    Process process = builder.start();
    assertThat(process.waitFor(5, TimeUnit.MINUTES)).as("it ends").isTrue();
    assertThat(dir.resolve("maven")).doesNotExist();
    return new Ran(process.exitValue(), Files.readString(out), Files.readString(err));
  }

  @Test
  void it_solves_and_proves_and_calls_itself_by_its_name() throws Exception {
    Path link = Files.createSymbolicLink(dir.resolve("coldseam"), home.resolve("bin/coldseam"));
    assertThat(launch(link, Map.of(), "--version"))
        .isEqualTo(new Ran(0, Main.version() + "\n", ""));
    assertThat(home.resolve("launch/classes.jsa")).isNotEmptyFile();
    // Sharing is demanded: Java ends with an error if the archive does not fit the program.
    Map<String, String> shared = Map.of("COLDSEAM_JAVA_OPTIONS", "-Xshare:on");
    String demo = home.resolve("cases/demo/balcony.yaml").toString();
    Ran solved = launch(link, shared, "solve", demo, "--json");
    assertThat(solved.code()).as(solved.err()).isZero();
    assertThat(solved.out()).contains("\"certified\":true", "\"psi\":[{");
    Ran proved = launch(link, shared, "prove", "10211", "--quiet");
    assertThat(proved.code()).as(proved.err()).isZero();
    assertThat(proved.out()).contains("cases");
    for (String[] typed : new String[][] {{"--help"}, {"solve", "--help"}, {"check", "-h"}}) {
      Ran help = launch(link, shared, typed);
      assertThat(help.out()).contains("  coldseam ");
      assertThat(help.out() + help.err()).doesNotContain("cli/coldseam");
    }
    Ran wrong = launch(link, shared, "solv");
    assertThat(wrong.code()).isEqualTo(2);
    assertThat(wrong.err()).contains("coldseam --help says more").doesNotContain("cli/coldseam");
    Ran unknown = launch(link, shared, "check", "--quiet", unknownMaterial());
    assertThat(unknown.err()).contains("see `coldseam materials`").doesNotContain("cli/coldseam");
  }

  /** Ctrl-C sends the signal INT to what the launcher has become. */
  @Test
  void watch_ends_at_ctrl_c_without_a_word() throws Exception {
    Path out = Files.createTempFile(dir, "out", "");
    Path err = Files.createTempFile(dir, "err", "");
    ProcessBuilder builder =
        new ProcessBuilder(
                home.resolve("bin/coldseam").toString(),
                "watch",
                home.resolve("cases/demo/balcony.yaml").toString())
            .redirectOutput(out.toFile())
            .redirectError(err.toFile());
    builder.environment().put("JAVA_HOME", System.getProperty("java.home"));
    Process process = builder.start();
    try {
      long end = System.nanoTime() + TimeUnit.MINUTES.toNanos(2);
      while (!Files.readString(out).contains("solved in")) {
        assertThat(process.isAlive() && System.nanoTime() < end).as(Files.readString(err)).isTrue();
        Thread.sleep(20);
      }
      String pid = Long.toString(process.pid());
      assertThat(new ProcessBuilder("kill", "-INT", pid).start().waitFor()).isZero();
      assertThat(process.waitFor(30, TimeUnit.SECONDS)).as("it ends").isTrue();
      assertThat(process.exitValue()).isEqualTo(128 + 2);
      assertThat(err).isEmptyFile();
    } finally {
      process.destroyForcibly();
    }
  }

  private static String unknownMaterial() throws IOException {
    String text = Cases.WALL.replace("brick: {conductivity: 0.5}", "brick: stuff of nobody");
    return Cases.write(dir, "unknown.yaml", text).toString();
  }

  @Test
  void where_its_folder_cannot_be_written_the_archive_is_in_the_cache() throws Exception {
    Path other = dir.resolve("other");
    unpack(Root.folder().resolve("cli/target/coldseam-" + Main.VERSION + ".zip"), other);
    Path program = other.resolve(home.getFileName()).resolve("bin/coldseam");
    // A file in the way hinders an administrator too, whom permissions do not.
    Files.writeString(program.resolveSibling("../launch"), "in the way");
    Path cache = dir.resolve("cache");
    Map<String, String> environment = Map.of("XDG_CACHE_HOME", cache.toString());
    assertThat(launch(program, environment, "--version").code()).isZero();
    Path archive =
        Path.of(cache + "/coldseam" + program.getParent().getParent().toRealPath())
            .resolve("classes.jsa");
    assertThat(archive).isNotEmptyFile();
    Object made = Files.getLastModifiedTime(archive);
    assertThat(launch(program, environment, "--version").code()).isZero();
    assertThat(Files.getLastModifiedTime(archive)).isEqualTo(made);
  }

  @Test
  void it_holds_what_the_program_needs_and_no_more() throws Exception {
    List<String> named = new ArrayList<>(List.of("coldseam.jar"));
    try (JarFile jar = new JarFile(home.resolve("lib/coldseam.jar").toFile())) {
      Attributes main = jar.getManifest().getMainAttributes();
      named.addAll(Arrays.asList(main.getValue(Attributes.Name.CLASS_PATH).split(" ")));
      assertThat(jar.getEntry("coldseam/LICENSE")).isNotNull();
    }
    String notice = Files.readString(home.resolve("NOTICE"));
    try (Stream<Path> jars = Files.list(home.resolve("lib"))) {
      List<String> there = jars.map(jar -> jar.getFileName().toString()).toList();
      assertThat(there).containsExactlyInAnyOrderElementsOf(named);
      for (String jar : there) {
        String name = jar.replaceFirst("-\\d.*", "");
        if (!name.startsWith("coldseam")) {
          assertThat(notice).as("licence of %s", name).contains(name + ": ");
        }
      }
    }
    assertThat(home.resolve("LICENSE")).content().contains("Apache License");
    for (String line : notice.lines().filter(l -> l.contains("licenses/")).toList()) {
      for (String word : line.split("[(), ;]+")) {
        if (word.startsWith("licenses/")) {
          assertThat(home.resolve(word)).isNotEmptyFile();
        }
      }
    }
    for (String schema : List.of("case", "window", "result", "window-result")) {
      assertThat(home.resolve("schema/" + schema + ".schema.json")).isNotEmptyFile();
    }
    assertThat(home.resolve("bin/coldseam.cmd")).content().contains("\r\n");
    try (Stream<Path> files = Files.walk(home.resolve("cases"))) {
      List<String> cases = files.map(file -> home.relativize(file).toString()).toList();
      assertThat(cases).contains("cases/README.md", "cases/published/iso-10211-case-1.yaml");
      assertThat(cases)
          .noneMatch(f -> f.contains(".coldseam") || f.contains("/target") || f.contains("/src"));
    }
  }

  @Test
  void manual_and_completions_are_those_the_program_writes() throws Exception {
    assertThat(home.resolve("share/man/man1/coldseam.1"))
        .hasContent(Ran.in(dir, "--man").out().stripTrailing());
    assertThat(home.resolve("share/bash-completion/completions/coldseam"))
        .hasContent(Ran.in(dir, "--completion", "bash").out().stripTrailing());
    assertThat(home.resolve("share/zsh/site-functions/_coldseam"))
        .hasContent(Ran.in(dir, "--completion", "zsh").out().stripTrailing());
  }
}
