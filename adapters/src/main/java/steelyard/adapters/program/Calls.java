package steelyard.adapters.program;

import java.io.IOException;
import java.nio.file.Path;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.concurrent.TimeUnit;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Programs;
import steelyard.adapters.spi.SolveRequest;

/**
 * Calls a solver program on a formula, each time in a fresh process. No answer is taken on trust: a
 * model is checked against the file that the program read, clause by clause.
 */
final class Calls {
  static final String COUNTER = "calls";

  /** What a solver may print beside its model. */
  private static final long MOST_WORDS_BYTES = 32L << 20;

  /** A literal of a model takes so much at most: sign, ten digits, a blank. */
  private static final long BYTES_PER_LITERAL = 12;

  private final Template command;
  private final SolveRequest request;
  private final SortedMap<String, Long> counters = new TreeMap<>();
  private long callsLeft;

  Calls(Template command, SolveRequest request) {
    this.command = command;
    this.request = request;
    this.callsLeft =
        request.deadline().work().map(w -> (long) Math.ceil(w.amount())).orElse(Long.MAX_VALUE);
    counters.put(COUNTER, 0L);
  }

  /** What all calls together counted. */
  SortedMap<String, Long> counters() {
    return counters;
  }

  /** Asks for a model of the formula. */
  Answer ask(CnfFile formula) {
    Deadline deadline = request.deadline();
    if (deadline.stopAsked()) {
      return new Answer.Stopped();
    }
    if (callsLeft == 0) {
      return new Answer.OutOfWork();
    }
    callsLeft--;
    try {
      formula.complete();
      Answer answer = call(formula, deadline);
      return answer instanceof Answer.Nothing nothing
          ? new Answer.Nothing(command.program() + ": " + nothing.reason())
          : answer;
    } catch (IOException e) {
      return new Answer.Nothing(command.program() + ": " + e.getMessage());
    }
  }

  private Answer call(CnfFile formula, Deadline deadline) throws IOException {
    Path output = formula.path().resolveSibling("answer.out");
    long secondsLeft = ceiling(deadline.nanosLeft());
    Programs.Ended ended =
        request
            .programs()
            .run(
                new Programs.Call(
                    command.solving(formula.path(), request.seed(), secondsLeft, request.threads()),
                    output,
                    formula.path().resolveSibling("answer.err"),
                    MOST_WORDS_BYTES + BYTES_PER_LITERAL * formula.variables()),
                deadline);
    AnswerText text = AnswerText.read(output, formula.variables());
    counters.merge(COUNTER, 1L, Long::sum);
    text.counters().forEach((name, count) -> counters.merge(name, count, Long::sum));
    Answer answer = text.answer(ended);
    return answer instanceof Answer.Model model ? checked(model, formula) : answer;
  }

  private static long ceiling(long nanos) {
    return Math.floorDiv(nanos - 1, TimeUnit.SECONDS.toNanos(1)) + 1;
  }

  private static Answer checked(Answer.Model model, CnfFile formula) throws IOException {
    OptionalLong wrong = formula.firstFalse(model.assignment());
    return wrong.isPresent()
        ? new Answer.Nothing("its model does not satisfy clause " + wrong.getAsLong())
        : model;
  }
}
