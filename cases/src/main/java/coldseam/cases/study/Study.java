package coldseam.cases.study;

import coldseam.cases.CaseException;
import coldseam.cases.Problem;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.concurrent.atomic.AtomicInteger;

/** Runs many independent jobs on several processors, each job on one. */
public final class Study {
  private Study() {}

  /**
   * What a job does. Called from several threads.
   *
   * @param <T> a job
   * @param <R> what comes out
   */
  @FunctionalInterface
  public interface Work<T, R> {
    /**
     * Does it.
     *
     * @param job the job
     * @return the outcome
     * @throws CaseException if the case at this job is at fault: the others go on
     */
    R of(T job) throws CaseException;
  }

  /**
   * Told of each job that is done, one at a time.
   *
   * @param <T> a job
   * @param <R> what came out
   */
  @FunctionalInterface
  public interface Sink<T, R> {
    /**
     * Takes an outcome.
     *
     * @param job the job
     * @param outcome what came out
     * @throws IOException if it cannot be kept: everything ends
     */
    void done(T job, R outcome) throws IOException;
  }

  /**
   * Runs jobs; they are begun in their order and end in any.
   *
   * @param jobs the jobs
   * @param threads how many run at a time
   * @param work what each does
   * @param sink told of each outcome
   * @param <T> a job
   * @param <R> what comes out
   * @return what was at fault with jobs that could not be done
   * @throws IOException if the sink could not keep an outcome
   */
  public static <T, R> List<Problem> run(
      List<T> jobs, int threads, Work<T, R> work, Sink<T, R> sink) throws IOException {
    Share<T, R> share = new Share<>(jobs, work, sink);
    List<FutureTask<Void>> tasks = new ArrayList<>();
    for (int i = 0; i < Math.min(Math.max(1, threads), jobs.size()); i++) {
      tasks.add(new FutureTask<>(share));
    }
    for (FutureTask<Void> task : tasks.subList(Math.min(1, tasks.size()), tasks.size())) {
      Thread thread = new Thread(task, "study");
      thread.setDaemon(true);
      thread.start();
    }
    if (!tasks.isEmpty()) {
      tasks.get(0).run();
    }
    for (FutureTask<Void> task : tasks) {
      await(task);
    }
    return share.problems;
  }

  private static void await(FutureTask<Void> task) throws IOException {
    try {
      task.get();
    } catch (ExecutionException e) {
      if (e.getCause() instanceof IOException io) {
        throw io;
      }
      if (e.getCause() instanceof OutOfMemoryError memory) {
        throw memory;
      }
      throw new IllegalStateException("a job of the study failed", e.getCause());
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new CancellationException("the study was interrupted");
    }
  }

  /** What the threads share; each runs this until no job is left. */
  private static final class Share<T, R> implements Callable<Void> {
    private final List<T> jobs;
    private final Work<T, R> work;
    private final Sink<T, R> sink;
    private final AtomicInteger next = new AtomicInteger();
    private final AtomicBoolean stopped = new AtomicBoolean();
    private final List<Problem> problems = new ArrayList<>();

    Share(List<T> jobs, Work<T, R> work, Sink<T, R> sink) {
      this.jobs = jobs;
      this.work = work;
      this.sink = sink;
    }

    @Override
    public Void call() throws IOException {
      boolean ended = false;
      try {
        for (int i = next.getAndIncrement();
            i < jobs.size() && !stopped.get();
            i = next.getAndIncrement()) {
          one(jobs.get(i));
        }
        ended = true;
      } finally {
        if (!ended) {
          stopped.set(true);
        }
      }
      return null;
    }

    private void one(T job) throws IOException {
      R outcome;
      try {
        outcome = work.of(job);
      } catch (CaseException e) {
        synchronized (this) {
          problems.addAll(e.problems());
        }
        return;
      }
      synchronized (this) {
        if (!stopped.get()) {
          sink.done(job, outcome);
        }
      }
    }
  }
}
