package steelyard.adapters.cpsat;

import com.google.ortools.sat.CpModelProto;
import com.google.ortools.sat.CpSolverResponse;
import com.google.ortools.sat.SatParameters;
import com.google.ortools.sat.SolutionCallback;
import com.google.ortools.sat.SolveWrapper;
import java.util.concurrent.atomic.AtomicReference;
import steelyard.adapters.spi.Deadline;

/** One run of the library. */
final class LibraryCall {
  /** Hears what happens, one call at a time, on any thread. */
  interface Listener {
    /** A solution; {@code at} can be asked during the call only. */
    void solution(SolutionCallback at);

    /** A line of the log. */
    void line(String line);
  }

  private final SolveWrapper solver = new SolveWrapper();
  private final AtomicReference<Throwable> failure = new AtomicReference<>();
  private final Listener listener;

  LibraryCall(Listener listener) {
    this.listener = listener;
  }

  /** Makes {@link #run} return soon; has no effect after it has. */
  void stop() {
    solver.stopSearch();
  }

  /**
   * Runs the library on {@code model} and rethrows what the listener threw: an exception that
   * crossed the native frames would end the process.
   */
  CpSolverResponse run(CpModelProto model, SatParameters parameters, Deadline deadline) {
    SolutionCallback callback = new Solutions();
    solver.setParameters(parameters);
    solver.addSolutionCallback(callback);
    if (parameters.getLogSearchProgress()) {
      solver.addLogCallback(text -> guarded(() -> text.lines().forEach(listener::line)));
    }
    deadline.onStop(this::stop);
    try {
      CpSolverResponse response = solver.solve(model);
      rethrow();
      // A response of nothing but defaults is no bytes long, and then the wrapper gives null.
      return response == null ? CpSolverResponse.getDefaultInstance() : response;
    } finally {
      deadline.onStop(() -> {});
      solver.clearSolutionCallback(callback);
    }
  }

  private final class Solutions extends SolutionCallback {
    @Override
    public void onSolutionCallback() {
      guarded(() -> listener.solution(this));
    }
  }

  private synchronized void guarded(Runnable action) {
    if (failure.get() != null) {
      return;
    }
    try {
      action.run();
    } catch (Throwable e) {
      failure.set(e);
      stop();
    }
  }

  /** Also makes what the listener did on other threads visible to this one. */
  private synchronized void rethrow() {
    Throwable thrown = failure.get();
    if (thrown instanceof Error error) {
      throw error;
    }
    if (thrown instanceof RuntimeException exception) {
      throw exception;
    }
  }
}
