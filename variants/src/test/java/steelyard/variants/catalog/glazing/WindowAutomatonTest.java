package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import steelyard.variants.model.Automaton;

class WindowAutomatonTest {
  /** A state for each row of q - 1 bits with at most p ones: 1 + 4 + 6 for 2 in 5. */
  @Test
  void has_a_state_for_each_window_but_its_last_entry() {
    assertThat(WindowAutomaton.of(new Treatment(1, 2, 0)).map(Automaton::states)).hasValue(2);
    assertThat(WindowAutomaton.of(new Treatment(2, 5, 0)).map(Automaton::states)).hasValue(11);
    assertThat(WindowAutomaton.of(new Treatment(1, 63, 0)).map(Automaton::states)).hasValue(63);
  }

  @Test
  void is_none_whenGiven_too_many_states_or_too_long_a_window() {
    assertThat(WindowAutomaton.of(new Treatment(10, 20, 0))).isEmpty();
    assertThat(WindowAutomaton.of(new Treatment(1, 64, 0))).isEmpty();
  }
}
