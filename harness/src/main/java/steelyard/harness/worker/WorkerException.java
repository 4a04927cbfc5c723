package steelyard.harness.worker;

/** What keeps a worker from its task, in one line, with whose fault it is. */
final class WorkerException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  private final Event.Failure.Kind kind;

  WorkerException(Event.Failure.Kind kind, String message) {
    super(message);
    this.kind = kind;
  }

  WorkerException(Event.Failure.Kind kind, String message, Throwable cause) {
    super(message, cause);
    this.kind = kind;
  }

  Event.Failure failure() {
    return new Event.Failure(kind, getMessage());
  }
}
