package steelyard.harness.worker;

import java.io.BufferedReader;
import java.io.FileDescriptor;
import java.io.FileInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.nio.charset.StandardCharsets;
import java.util.concurrent.BlockingQueue;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.locks.LockSupport;

/**
 * The pipe on standard input that the harness holds. A line {@code stop} asks the worker to end;
 * the pipe's end says that the harness is gone, and the worker halts at once. Other lines are
 * requests to a worker that serves.
 */
final class Lifeline {
  private static final int HARNESS_GONE = 70;
  private static final String STOP = "stop";

  private final BlockingQueue<String> requests = new LinkedBlockingQueue<>();
  private volatile boolean stopAsked;
  private volatile Thread waiting;
  private volatile Runnable lastDeed = () -> {};

  /** Takes over standard input: whoever reads {@link System#in} from now on reads nothing. */
  static Lifeline take() {
    Lifeline lifeline = new Lifeline();
    InputStream pipe = new FileInputStream(FileDescriptor.in);
    System.setIn(InputStream.nullInputStream());
    Thread thread = new Thread(() -> lifeline.follow(pipe), "lifeline");
    thread.setDaemon(true);
    thread.start();
    return lifeline;
  }

  private void follow(InputStream pipe) {
    try (BufferedReader reader =
        new BufferedReader(new InputStreamReader(pipe, StandardCharsets.UTF_8))) {
      for (String line = reader.readLine(); line != null; line = reader.readLine()) {
        if (line.equals(STOP)) {
          stopAsked = true;
          Thread waiter = waiting;
          if (waiter != null) {
            LockSupport.unpark(waiter);
          }
        }
        requests.add(line);
      }
    } catch (IOException e) {
      halt();
    }
    halt();
  }

  private void halt() {
    try {
      lastDeed.run();
    } finally {
      Runtime.getRuntime().halt(HARNESS_GONE);
    }
  }

  /** What is done when the harness is gone, before this process halts. */
  void beforeHalt(Runnable deed) {
    lastDeed = deed;
  }

  boolean stopAsked() {
    return stopAsked;
  }

  /** The thread to wake when a stop is asked. */
  void wakeOnStop(Thread thread) {
    waiting = thread;
  }

  /** The next request; waits for it. */
  String nextRequest() throws InterruptedException {
    return requests.take();
  }
}
