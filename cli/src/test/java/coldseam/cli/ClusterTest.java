package coldseam.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.FileSystems;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.snakeyaml.engine.v2.api.Load;
import org.snakeyaml.engine.v2.api.LoadSettings;

/**
 * The shipped jobs for a batch queue and for a container cluster, run as these run them: with the
 * variables that the scheduler sets.
 */
class ClusterTest {
  private static final int SHARDS = 3;
  private static final int POINTS = 5;

  @TempDir Path dir;

  @BeforeEach
  void lay_out_a_working_folder() throws IOException {
    assumeTrue(FileSystems.getDefault().supportedFileAttributeViews().contains("posix"));
    Files.createDirectories(dir.resolve("cases/demo"));
    Files.copy(
        Root.folder().resolve("cases/demo/balcony.yaml"), dir.resolve("cases/demo/balcony.yaml"));
    // The program from its classes, since tests run before it is packaged.
    Path program = Files.createDirectories(dir.resolve("cli")).resolve("coldseam");
    Files.writeString(
        program,
        "#!/bin/sh\nexec '%s' -XX:TieredStopAtLevel=1 -cp '%s' coldseam.cli.Main \"$@\"\n"
            .formatted(
                Path.of(System.getProperty("java.home"), "bin", "java"),
                System.getProperty("java.class.path")));
    Files.setPosixFilePermissions(program, PosixFilePermissions.fromString("rwxr-xr-x"));
  }

  private void shell(Map<String, String> environment, List<String> command) throws Exception {
    Path out = Files.createTempFile(dir, "out", "");
    ProcessBuilder builder =
        new ProcessBuilder(command)
            .directory(dir.toFile())
            .redirectErrorStream(true)
            .redirectOutput(out.toFile());
    builder.environment().putAll(environment);
    Process process = builder.start();
    assertThat(process.waitFor(5, TimeUnit.MINUTES)).as("it ends").isTrue();
    assertThat(process.exitValue()).as(Files.readString(out)).isZero();
  }

  private void merged(String sweepOptions) throws Exception {
    shell(Map.of(), List.of("sh", "-c", "cat study/shard-*.jsonl > study/sweep.jsonl"));
    for (int k = 1; k <= SHARDS; k++) {
      Files.delete(dir.resolve("study/shard-" + k + "-of-" + SHARDS + ".jsonl"));
    }
    Ran ran =
        Ran.in(dir, "sweep", "cases/demo/balcony.yaml", "--set", sweepOptions, "--out", "study");
    assertThat(ran.code()).as(ran.err()).isZero();
    assertThat(ran.out()).contains(POINTS + " points: 0 solved, " + POINTS + " from before");
    assertThat(Files.readAllLines(dir.resolve("study/sweep.csv"))).hasSize(POINTS + 1);
    assertThat(dir.resolve("study/sweep.svg")).isNotEmptyFile();
  }

  @Test
  void an_array_job_of_a_batch_queue() throws Exception {
    String script = Root.folder().resolve("cases/cluster/array-job.sh").toString();
    for (int task = 1; task <= SHARDS; task++) {
      Map<String, String> environment = new LinkedHashMap<>();
      environment.put("SLURM_ARRAY_TASK_ID", Integer.toString(task));
      environment.put("SLURM_ARRAY_TASK_COUNT", Integer.toString(SHARDS));
      environment.put("SLURM_CPUS_PER_TASK", "1");
      environment.put("COLDSEAM_POINTS", Integer.toString(POINTS));
      shell(environment, List.of("sh", script));
    }
    merged("insulation=100..240/" + POINTS);
  }

  @Test
  void an_indexed_job_of_a_container_cluster() throws Exception {
    String text = Files.readString(Root.folder().resolve("cases/cluster/indexed-job.yaml"));
    Object job = new Load(LoadSettings.builder().build()).loadFromString(text);
    assertThat(at(job, "spec", "completionMode")).isEqualTo("Indexed");
    assertThat(at(job, "spec", "completions")).isEqualTo(at(job, "spec", "parallelism"));
    Object container = ((List<?>) at(job, "spec", "template", "spec", "containers")).get(0);
    List<String> command = new ArrayList<>();
    for (String part : List.of("command", "args")) {
      for (Object word : (List<?>) at(container, part)) {
        command.add(word.toString());
      }
    }
    Map<String, String> environment = new LinkedHashMap<>();
    for (Object variable : (List<?>) at(container, "env")) {
      environment.put(at(variable, "name").toString(), at(variable, "value").toString());
    }
    assertThat(environment)
        .containsEntry("COLDSEAM_SHARDS", at(job, "spec", "completions").toString());
    environment.put("COLDSEAM_SHARDS", Integer.toString(SHARDS));
    environment.put("COLDSEAM_POINTS", Integer.toString(POINTS));
    environment.put("COLDSEAM_STUDY", "study");
    for (int index = 0; index < SHARDS; index++) {
      environment.put("JOB_COMPLETION_INDEX", Integer.toString(index));
      shell(environment, command);
    }
    merged("insulation=100..240/" + POINTS);
  }

  private static Object at(Object node, String... path) {
    Object at = node;
    for (String key : path) {
      at = ((Map<?, ?>) at).get(key);
    }
    return at;
  }
}
