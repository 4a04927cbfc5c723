package steelyard.adapters.engine.core;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.NavigableSet;
import java.util.Random;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class StoreTest {
  @ParameterizedTest
  @CsvSource({
    "-5, 9, false",
    "0, 200, false",
    "-100, 6000, false",
    "-5, 9, true",
    "0, 200, true",
    "-100, 6000, true"
  })
  void keepsTheDomainOfAPlainSet_throughRandomChangesAndReturns(
      int min, int max, boolean learning) {
    for (int seed = 0; seed < 10; seed++) {
      Random random = new Random(seed);
      Store s = new Store(learning);
      int x = s.variable(min, max);
      TreeSet<Integer> model = new TreeSet<>();
      for (int v = min; v <= max; v++) {
        model.add(v);
      }
      Deque<TreeSet<Integer>> levels = new ArrayDeque<>();
      for (int step = 0; step < 150; step++) {
        int choice = random.nextInt(10);
        if (choice == 0) {
          s.push();
          levels.push(new TreeSet<>(model));
        } else if (choice == 1 && !levels.isEmpty()) {
          s.popTo(s.level() - 1);
          model = levels.pop();
        } else if (!change(s, x, model, random)) {
          if (levels.isEmpty()) {
            break;
          }
          s.popTo(s.level() - 1);
          model = levels.pop();
        }
        expectSame(s, x, model);
      }
    }
  }

  /** One random change of both; false on conflict. */
  private static boolean change(Store s, int x, NavigableSet<Integer> model, Random random) {
    int h = x + random.nextInt(2);
    int sign = h == x ? 1 : -1;
    int near = random.nextInt(6) - 1;
    int low = sign * (sign > 0 ? model.first() : model.last());
    int inside = s.min(h) + random.nextInt(s.max(h) - s.min(h) + 1);
    switch (random.nextInt(8)) {
      case 0 -> {
        model.removeIf(v -> sign * v < low + near);
        return s.setMin(h, low + near, 0) && !model.isEmpty();
      }
      case 1 -> {
        if (random.nextInt(20) > 0) {
          return true;
        }
        boolean present = model.contains(sign * inside);
        model.removeIf(v -> v != sign * inside);
        assertThat(s.assign(h, inside, 0)).isEqualTo(present);
        return present;
      }
      case 2 -> {
        model.removeIf(v -> sign * v > s.max(h) - near);
        boolean kept = s.setMax(h, s.max(h) - near, 0);
        assertThat(kept).isEqualTo(!model.isEmpty());
        return kept;
      }
      default -> {
        model.remove(sign * inside);
        boolean kept = s.remove(h, inside, 0);
        assertThat(kept).isEqualTo(!model.isEmpty());
        return kept;
      }
    }
  }

  private static void expectSame(Store s, int x, NavigableSet<Integer> model) {
    assertThat(s.min(x)).isEqualTo(model.first());
    assertThat(s.max(x)).isEqualTo(model.last());
    assertThat(s.min(x + 1)).isEqualTo(-model.last());
    int step = 1 + (model.last() - model.first()) / 40;
    for (int v = model.first() - 1; v <= model.last() + 1; v += step) {
      assertThat(s.has(x, v)).isEqualTo(model.contains(v));
      assertThat(s.has(x + 1, -v)).isEqualTo(model.contains(v));
      if (v <= model.last()) {
        assertThat(s.next(x, v)).isEqualTo(model.ceiling(v));
      }
      if (v >= model.first()) {
        assertThat(s.next(x + 1, -v)).isEqualTo(-model.floor(v));
      }
    }
    if (s.size(x) != s.max(x) - s.min(x) + 1) {
      assertThat(s.size(x)).isEqualTo(model.size());
    }
  }

  @Test
  void countsTheValuesOfANarrowDomainExactly() {
    Store s = new Store();
    int x = s.variable(0, 4095);
    for (int v = 1; v < 4000; v += 2) {
      assertThat(s.remove(x, v, 0)).isTrue();
    }
    assertThat(s.size(x)).isEqualTo(4096 - 2000);
    assertThat(s.setMin(x, 1001, 0)).isTrue();
    assertThat(s.min(x)).isEqualTo(1002);
    assertThat(s.size(x)).isEqualTo(4096 - 1002 - 1499);
  }

  @Test
  void neverLosesAHoleOfAWideDomain() {
    Store s = new Store();
    int x = s.variable(-1_000_000_000, 1_000_000_000);
    s.push();
    for (int v = 0; v < 1000; v++) {
      assertThat(s.remove(x, 3 * v, 0)).isTrue();
    }
    assertThat(s.has(x, 2997)).isFalse();
    assertThat(s.setMin(x, 2997, 0)).isTrue();
    assertThat(s.min(x)).isEqualTo(2998);
    s.popTo(0);
    assertThat(s.has(x, 2997)).isTrue();
    assertThat(s.min(x)).isEqualTo(-1_000_000_000);
  }

  @Test
  void tellsBoundsAndHolesOfFormerTimes_whenLearning() {
    Store s = new Store(true);
    int x = s.variable(0, 20);
    int start = s.now();
    assertThat(s.remove(x, 5, 0)).isTrue();
    int pierced = s.now();
    assertThat(s.setMin(x, 5, 0)).isTrue();
    assertThat(s.min(x)).isEqualTo(6);
    int raised = s.now();
    assertThat(s.setMax(x, 9, 0)).isTrue();
    assertThat(s.minAt(x, start)).isZero();
    assertThat(s.minAt(x, raised)).isEqualTo(6);
    assertThat(s.maxAt(x, raised)).isEqualTo(20);
    assertThat(s.excludedAt(x, 5, start)).isFalse();
    assertThat(s.excludedAt(x, 5, pierced)).isTrue();
    assertThat(s.excludedAt(x, 3, pierced)).isFalse();
    assertThat(s.excludedAt(x + 1, -3, raised)).isTrue();
  }

  @Test
  void keepsNotesUntilTheirLevelIsLeft() {
    Store s = new Store(true);
    s.variable(0, 5);
    s.push();
    int note = s.note(1, 2, 3);
    int other = s.note(4, 5, 6);
    assertThat(s.noted(note, 2)).isEqualTo(3);
    assertThat(s.noted(other, 0)).isEqualTo(4);
    s.popTo(0);
    assertThat(s.note(7, 8, 9)).isEqualTo(note);
  }

  @Test
  void refusesDomainsThatAreEmptyOrTooLarge() {
    Store s = new Store();
    assertThatThrownBy(() -> s.variable(3, 2)).hasMessageContaining("3..2");
    assertThatThrownBy(() -> s.variable(0, 1_000_000_001)).hasMessageContaining("10^9");
  }

  @Test
  void refusesScopesWhoseValuesPassTheLimit() {
    Store s = new Store();
    int x = s.variable(0, 1_000_000_000);
    assertThatThrownBy(() -> Scope.of(s, new int[] {x}, new int[] {1}))
        .hasMessageContaining("row 0");
  }
}
