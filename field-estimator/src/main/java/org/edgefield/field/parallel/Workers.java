package org.edgefield.field.parallel;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.IntFunction;

/**
 * A fixed crew of threads that works through numbered blocks. Which thread takes a block is left to
 * chance, so a block must write only what belongs to it; results then do not depend on the number
 * of threads.
 */
public final class Workers implements AutoCloseable {
  private final int count;
  private final ExecutorService service;

  /**
   * Starts the crew.
   *
   * @param count number of threads, at least 1; with 1 all work is done by the caller
   */
  public Workers(int count) {
    if (count < 1) {
      throw new IllegalArgumentException("at least one thread is needed, got " + count);
    }
    this.count = count;
    this.service =
        count == 1
            ? null
            : Executors.newFixedThreadPool(
                count - 1,
                task -> {
                  Thread thread = new Thread(task, "edgefield-worker");
                  thread.setDaemon(true);
                  return thread;
                });
  }

  /** Number of threads. */
  public int count() {
    return count;
  }

  /** Work on one block. */
  @FunctionalInterface
  public interface Task {
    /** Does the block with this number. */
    void run(int block);
  }

  /**
   * Runs all blocks and returns when the last has ended.
   *
   * @param blocks number of blocks
   * @param taskOfWorker makes the task of worker 0 .. count-1, with scratch memory of its own
   */
  public void run(int blocks, IntFunction<Task> taskOfWorker) {
    int crew = Math.min(count, blocks);
    if (crew <= 1) {
      if (blocks > 0) {
        Task task = taskOfWorker.apply(0);
        for (int b = 0; b < blocks; b++) {
          task.run(b);
        }
      }
      return;
    }
    AtomicInteger next = new AtomicInteger();
    List<Future<?>> others = new ArrayList<>(crew - 1);
    for (int w = 1; w < crew; w++) {
      int worker = w;
      others.add(service.submit(() -> drain(next, blocks, taskOfWorker.apply(worker))));
    }
    RuntimeException fault = null;
    try {
      drain(next, blocks, taskOfWorker.apply(0));
    } catch (RuntimeException e) {
      next.set(blocks);
      fault = e;
    }
    fault = await(others, fault);
    if (fault != null) {
      throw fault;
    }
  }

  private static RuntimeException await(List<Future<?>> others, RuntimeException first) {
    RuntimeException fault = first;
    for (Future<?> other : others) {
      try {
        other.get();
      } catch (ExecutionException e) {
        if (e.getCause() instanceof Error error) {
          throw error;
        }
        if (fault == null) {
          fault =
              e.getCause() instanceof RuntimeException r
                  ? r
                  : new IllegalStateException(e.getCause());
        }
      } catch (InterruptedException e) {
        Thread.currentThread().interrupt();
        throw new java.util.concurrent.CancellationException("interrupted");
      }
    }
    return fault;
  }

  private static void drain(AtomicInteger next, int blocks, Task task) {
    for (int b = next.getAndIncrement(); b < blocks; b = next.getAndIncrement()) {
      task.run(b);
    }
  }

  @Override
  public void close() {
    if (service != null) {
      service.shutdown();
    }
  }
}
