package steelyard.harness.process;

import java.util.concurrent.atomic.AtomicReference;

/**
 * The one switch by which a person ends everything that runs: first asked to stop, then at once.
 * Every {@link Watch} looks at it; it never goes back.
 */
public final class StopSwitch {
  enum Position {
    RUN,
    STOP,
    KILL
  }

  private final AtomicReference<Position> position = new AtomicReference<>(Position.RUN);

  /** Asks all children to stop; those that do not within their grace are killed. */
  public void stop() {
    position.compareAndSet(Position.RUN, Position.STOP);
  }

  /** Kills all children at their next look. */
  public void kill() {
    position.set(Position.KILL);
  }

  /** Whether anyone has asked: nothing new is started then. */
  public boolean stopping() {
    return position.get() != Position.RUN;
  }

  Position position() {
    return position.get();
  }
}
