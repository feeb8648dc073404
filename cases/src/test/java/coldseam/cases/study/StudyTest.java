package coldseam.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import coldseam.cases.CaseException;
import coldseam.cases.Problem;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class StudyTest {
  private static final List<Integer> JOBS = IntStream.range(0, 100).boxed().toList();

  @Test
  void every_job_is_done_once() throws IOException {
    for (int threads : new int[] {1, 2, 7, 200}) {
      List<Integer> done = new ArrayList<>();
      List<Problem> problems =
          Study.run(
              JOBS,
              threads,
              job -> job * job,
              (job, square) -> {
                assertThat(square).isEqualTo(job * job);
                done.add(job);
              });
      assertThat(problems).isEmpty();
      assertThat(done).containsExactlyInAnyOrderElementsOf(JOBS);
    }
    assertThat(Study.run(List.<Integer>of(), 2, job -> job, (job, same) -> {})).isEmpty();
  }

  /** Each of two jobs waits for the other to begin. */
  @Test
  void jobs_run_at_the_same_time() throws IOException {
    CountDownLatch both = new CountDownLatch(2);
    Set<String> threads = ConcurrentHashMap.newKeySet();
    List<Boolean> met = new ArrayList<>();
    Study.run(
        List.of(1, 2),
        2,
        job -> {
          both.countDown();
          threads.add(Long.toString(Thread.currentThread().getId()));
          return awaited(both);
        },
        (job, inTime) -> met.add(inTime));
    assertThat(met).containsExactly(true, true);
    assertThat(threads).hasSize(2);
  }

  private static boolean awaited(CountDownLatch latch) {
    try {
      return latch.await(1, TimeUnit.MINUTES);
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      return false;
    }
  }

  @Test
  void a_case_at_fault_is_told_and_the_others_go_on() throws IOException {
    List<Integer> done = new ArrayList<>();
    List<Problem> problems =
        Study.run(
            JOBS,
            3,
            job -> {
              if (job % 10 == 7) {
                throw new CaseException(
                    List.of(new Problem("a", 0, 0, "job " + job, Optional.empty())));
              }
              return job;
            },
            (job, same) -> done.add(job));
    assertThat(problems).hasSize(10);
    assertThat(done).hasSize(90);
  }

  @Test
  void what_cannot_be_kept_ends_everything() {
    List<Integer> done = new ArrayList<>();
    assertThatThrownBy(
            () ->
                Study.run(
                    JOBS,
                    2,
                    job -> job,
                    (job, same) -> {
                      done.add(job);
                      if (done.size() == 5) {
                        throw new IOException("the disk is full");
                      }
                    }))
        .isInstanceOf(IOException.class)
        .hasMessage("the disk is full");
    assertThat(done).hasSize(5);
  }

  @Test
  void a_defect_ends_everything_with_its_cause() {
    assertThatThrownBy(
            () ->
                Study.run(
                    JOBS,
                    2,
                    job -> {
                      throw new IllegalStateException("broken");
                    },
                    (job, same) -> {}))
        .isInstanceOf(IllegalStateException.class)
        .hasRootCauseMessage("broken");
  }
}
