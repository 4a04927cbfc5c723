package steelyard.harness.worker;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicLong;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Programs;
import steelyard.harness.process.Launch;
import steelyard.harness.process.SubProcess;

/** The solver programs of one run, in the worker's folder and session. */
final class RunPrograms implements Programs {
  private final SubProcess starter = new SubProcess();
  private final AtomicLong calls = new AtomicLong();

  /** Programs that do not outlive the lifeline. */
  RunPrograms(Lifeline lifeline) {
    lifeline.beforeHalt(starter::endAll);
  }

  @Override
  public Path folder() {
    return Path.of("").toAbsolutePath();
  }

  @Override
  public Optional<Path> find(String program) {
    return SubProcess.find(program);
  }

  @Override
  public Ended run(Call call, Deadline deadline) throws IOException {
    String name = "call-" + ProcessHandle.current().pid() + "-" + calls.incrementAndGet();
    Launch launch =
        Launch.of(name, name, call.command(), folder()).writing(call.output(), call.errors());
    SubProcess.Ended ended = starter.run(launch, deadline::stopAsked, call.mostOutputBytes());
    return new Ended(Ended.How.valueOf(ended.end().name()), ended.code(), ended.lastWords());
  }
}
