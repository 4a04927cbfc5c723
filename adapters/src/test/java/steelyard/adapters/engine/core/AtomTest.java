package steelyard.adapters.engine.core;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;

class AtomTest {
  @Test
  void speaksOfTheHandleItWasMadeFor() {
    for (int h : new int[] {2, 3, 1_000_000, 1_000_001}) {
      for (int k : new int[] {-2_000_000_000, -1, 0, 7, 2_000_000_000}) {
        assertThat(Atom.handle(Atom.ge(h, k))).isEqualTo(h);
        assertThat(Atom.value(Atom.ge(h, k))).isEqualTo(k);
        assertThat(Atom.variable(Atom.ge(h, k))).isEqualTo(h >> 1);
        assertThat(Atom.handle(Atom.le(h, k))).isEqualTo(h ^ 1);
        assertThat(Atom.value(Atom.le(h, k))).isEqualTo(-k);
        assertThat(Atom.variable(Atom.eq(h, k))).isEqualTo(h >> 1);
        assertThat(Atom.eq(h, k)).isEqualTo(Atom.eq(h ^ 1, -k));
        assertThat(Atom.ne(h, k)).isEqualTo(Atom.ne(h ^ 1, -k));
      }
    }
  }

  @Test
  void isItsOwnDoubleNegation() {
    LongStream.of(Atom.ge(5, -3), Atom.le(4, 9), Atom.eq(4, 0), Atom.ne(5, 2), Atom.TRUE)
        .forEach(atom -> assertThat(Atom.not(Atom.not(atom))).isEqualTo(atom));
    assertThat(Atom.not(Atom.ge(4, 3))).isEqualTo(Atom.le(4, 2));
    assertThat(Atom.not(Atom.eq(4, 3))).isEqualTo(Atom.ne(4, 3));
  }

  @Test
  void agreesWithTheDomain_whateverIsLeftOfIt() {
    for (int min = -3; min <= 3; min++) {
      for (int max = min; max <= 3; max++) {
        Store s = new Store();
        int x = s.variable(min, max);
        for (int h = x; h <= x + 1; h++) {
          for (int k = -4; k <= 4; k++) {
            expectTruth(s, h, k);
          }
        }
      }
    }
  }

  private static void expectTruth(Store s, int h, int k) {
    int ge = s.min(h) >= k ? 1 : s.max(h) < k ? -1 : 0;
    int le = s.max(h) <= k ? 1 : s.min(h) > k ? -1 : 0;
    int eq = !s.has(h, k) ? -1 : s.fixed(h) ? 1 : 0;
    assertThat(s.truth(Atom.ge(h, k))).isEqualTo(ge);
    assertThat(s.truth(Atom.le(h, k))).isEqualTo(le);
    assertThat(s.truth(Atom.eq(h, k))).isEqualTo(eq);
    assertThat(s.truth(Atom.ne(h, k))).isEqualTo(-eq);
    assertThat(s.truth(Atom.not(Atom.ge(h, k)))).isEqualTo(-ge);
  }

  @Test
  void showsInWords() {
    assertThat(Atom.show(Atom.ge(6, 5))).isEqualTo("[x3 ≥ 5]");
    assertThat(Atom.show(Atom.le(6, 7))).isEqualTo("[-x3 ≥ -7]");
    assertThat(Atom.show(Atom.ne(6, 7))).isEqualTo("[x3 ≠ 7]");
  }
}
