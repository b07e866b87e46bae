package org.flexbound.sparse;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.PriorityQueue;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.concurrent.locks.Condition;
import java.util.concurrent.locks.ReentrantLock;
import java.util.function.IntConsumer;

/**
 * Threads that work through a forest of tasks, children before parents, and help each other with the loops inside large tasks. What a task
 * or a unit of a loop computes does not depend on who runs it, so results are the same for any number of threads.
 */
final class Crew {
  /** A task, run by one thread, which may hand out loops through its crew. */
  interface Task {
    void run(int task, int worker);
  }

  /** A loop that several threads may work on. */
  private static final class Loop {
    final int units;
    final LoopBody body;
    final AtomicInteger next = new AtomicInteger();
    int helpers;

    Loop(int units, LoopBody body) {
      this.units = units;
      this.body = body;
    }
  }

  /** One unit of a loop. */
  interface LoopBody {
    void run(int unit, int worker);
  }

  private static final Loop NO_LOOP = new Loop(0, (unit, worker) -> {});

  private final int threads;
  private final ReentrantLock lock = new ReentrantLock();
  private final Condition changed = lock.newCondition();
  private final PriorityQueue<Integer> ready = new PriorityQueue<>();
  private final List<Loop> loops = new ArrayList<>();
  private int remaining;
  /** The first failure of a thread, if any. */
  private final List<Throwable> failures = new ArrayList<>();

  Crew(int threads) {
    this.threads = threads;
  }

  int threads() {
    return threads;
  }

  /**
   * Runs all tasks.
   *
   * @param parents parent of every task, -1 for none; a task runs when all its children are done
   */
  void run(int[] parents, Task task) {
    int[] pending = new int[parents.length];
    for (int p : parents) {
      if (p >= 0) {
        pending[p]++;
      }
    }
    for (int t = 0; t < parents.length; t++) {
      if (pending[t] == 0) {
        ready.add(t);
      }
    }
    remaining = parents.length;
    Thread[] others = new Thread[threads - 1];
    for (int w = 1; w < threads; w++) {
      int worker = w;
      others[w - 1] = new Thread(() -> work(worker, parents, pending, task), "factor-" + w);
      others[w - 1].setDaemon(true);
      others[w - 1].start();
    }
    work(0, parents, pending, task);
    boolean interrupted = false;
    for (Thread other : others) {
      for (;;) {
        try {
          other.join();
          break;
        } catch (InterruptedException e) {
          interrupted = true;
        }
      }
    }
    if (interrupted) {
      Thread.currentThread().interrupt();
    }
    for (Throwable failure : failures) {
      if (failure instanceof Error e) {
        throw e;
      }
      throw (RuntimeException) failure;
    }
  }

  private void work(int worker, int[] parents, int[] pending, Task task) {
    for (;;) {
      int chosen = -1;
      Loop loop = NO_LOOP;
      lock.lock();
      try {
        while (remaining > 0 && failures.isEmpty() && ready.isEmpty() && loops.isEmpty()) {
          changed.awaitUninterruptibly();
        }
        if (remaining == 0 || !failures.isEmpty()) {
          return;
        }
        if (ready.isEmpty()) {
          loop = loops.get(0);
          loop.helpers++;
        } else {
          chosen = ready.remove();
        }
      } finally {
        lock.unlock();
      }
      try {
        if (chosen >= 0) {
          task.run(chosen, worker);
          finished(chosen, parents, pending);
        } else {
          drain(loop, worker);
        }
      } catch (RuntimeException | Error e) {
        lock.lock();
        try {
          failures.add(e);
          changed.signalAll();
        } finally {
          lock.unlock();
        }
        return;
      }
    }
  }

  private void finished(int task, int[] parents, int[] pending) {
    lock.lock();
    try {
      remaining--;
      int parent = parents[task];
      if (parent >= 0 && --pending[parent] == 0) {
        ready.add(parent);
      }
      changed.signalAll();
    } finally {
      lock.unlock();
    }
  }

  private void drain(Loop loop, int worker) {
    try {
      for (int u = loop.next.getAndIncrement(); u < loop.units; u = loop.next.getAndIncrement()) {
        loop.body.run(u, worker);
      }
    } finally {
      lock.lock();
      try {
        loops.remove(loop);
        loop.helpers--;
        changed.signalAll();
      } finally {
        lock.unlock();
      }
    }
  }

  /** Runs the units of a loop, with the help of threads that have no task; returns when all are done. */
  void loop(int units, int worker, LoopBody body) {
    if (threads == 1 || units < 2) {
      for (int u = 0; u < units; u++) {
        body.run(u, worker);
      }
      return;
    }
    Loop loop = new Loop(units, body);
    lock.lock();
    try {
      loop.helpers++;
      loops.add(loop);
      changed.signalAll();
    } finally {
      lock.unlock();
    }
    drain(loop, worker);
    lock.lock();
    try {
      while (loop.helpers > 0) {
        changed.awaitUninterruptibly();
      }
      if (!failures.isEmpty()) {
        throw new IllegalStateException("another thread failed");
      }
    } finally {
      lock.unlock();
    }
  }

  /** Runs independent units on several threads. */
  static void each(int threads, int units, IntConsumer body) {
    int[] none = new int[units];
    Arrays.fill(none, -1);
    new Crew(Math.max(1, Math.min(threads, units))).run(none, (t, w) -> body.accept(t));
  }
}
