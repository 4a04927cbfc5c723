package steelyard.adapters.cpsat;

import java.util.List;
import java.util.Optional;
import steelyard.adapters.spi.SolveRequest;

/** The units of work that the library can be limited by. Names no type of the library. */
final class WorkUnits {
  /** The library's own deterministic clock, which has nothing to do with seconds but the name. */
  static final String DETERMINISTIC_SECONDS = "deterministic-seconds";

  static final String CONFLICTS = "conflicts";

  private WorkUnits() {}

  static List<String> all() {
    return List.of(DETERMINISTIC_SECONDS, CONFLICTS);
  }

  /** Why the request's work limit cannot be kept, if so. */
  static Optional<String> refusal(SolveRequest request) {
    return request
        .deadline()
        .work()
        .flatMap(
            work -> {
              if (!all().contains(work.unit())) {
                return Optional.of(
                    "cpsat cannot limit work in '" + work.unit() + "'; it knows " + all());
              }
              return work.unit().equals(CONFLICTS) && request.threads() > 1
                  ? Optional.of(
                      "cpsat counts the conflicts of one thread only: limit "
                          + request.threads()
                          + " threads in "
                          + DETERMINISTIC_SECONDS)
                  : Optional.empty();
            });
  }
}
