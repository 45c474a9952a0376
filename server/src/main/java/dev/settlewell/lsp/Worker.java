package dev.settlewell.lsp;

import java.util.concurrent.CompletableFuture;
import java.util.concurrent.PriorityBlockingQueue;
import java.util.concurrent.ThreadPoolExecutor;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicLong;
import java.util.function.Consumer;
import java.util.function.Function;
import org.eclipse.lsp4j.jsonrpc.CancelChecker;
import org.eclipse.lsp4j.jsonrpc.CompletableFutures;

/**
 * The one thread that computes. What a person waits for goes first, then the findings of what was
 * just typed, then sheets nobody looks at; within a rank the order is that of asking.
 */
final class Worker implements AutoCloseable {
  /** How soon a task is wanted. */
  enum Rank {
    REQUEST,
    EDIT,
    BACKGROUND
  }

  private record Task(Rank rank, long number, Runnable work) implements Runnable, Comparable<Task> {
    @Override
    public void run() {
      work.run();
    }

    @Override
    public int compareTo(Task other) {
      int byRank = rank.compareTo(other.rank);
      return byRank != 0 ? byRank : Long.compare(number, other.number);
    }
  }

  private static final long STACK_BYTES = 8L << 20;

  private final AtomicLong numbers = new AtomicLong();
  private final ThreadPoolExecutor executor;
  private final Consumer<Throwable> onFault;

  /**
   * @param onFault told of what a posted task throws; what a request throws goes to its answer
   */
  Worker(Consumer<Throwable> onFault) {
    this.onFault = onFault;
    this.executor =
        new ThreadPoolExecutor(
            1, 1, 0, TimeUnit.SECONDS, new PriorityBlockingQueue<>(), Worker::thread);
  }

  private static Thread thread(Runnable work) {
    Thread thread = new Thread(null, work, "worker", STACK_BYTES);
    thread.setDaemon(true);
    return thread;
  }

  /** Runs it as a request; one that is cancelled before its turn is not run at all. */
  <R> CompletableFuture<R> submit(Function<CancelChecker, R> request) {
    return CompletableFutures.computeAsync(
        work -> executor.execute(new Task(Rank.REQUEST, numbers.getAndIncrement(), work)),
        cancel -> {
          cancel.checkCanceled();
          return request.apply(cancel);
        });
  }

  void post(Rank rank, Runnable work) {
    Runnable guarded =
        () -> {
          try {
            work.run();
          } catch (RuntimeException | StackOverflowError | OutOfMemoryError fault) {
            onFault.accept(fault);
          }
        };
    if (!executor.isShutdown()) {
      executor.execute(new Task(rank, numbers.getAndIncrement(), guarded));
    }
  }

  /** Ends what is queued, but waits no longer than a person would. */
  @Override
  public void close() {
    executor.shutdown();
    try {
      if (!executor.awaitTermination(2, TimeUnit.SECONDS)) {
        executor.shutdownNow();
      }
    } catch (InterruptedException e) {
      executor.shutdownNow();
      Thread.currentThread().interrupt();
    }
  }
}
