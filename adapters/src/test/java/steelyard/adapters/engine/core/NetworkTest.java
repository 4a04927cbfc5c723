package steelyard.adapters.engine.core;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;

class NetworkTest {
  private static final int BILLION = 1_000_000_000;

  private final Store store = new Store();
  private final Network network = new Network(store);

  @Test
  void propagatesUnitClauses_alongAChain() {
    int[] b = new int[50];
    for (int i = 0; i < b.length; i++) {
      b[i] = store.variable(0, 1);
    }
    for (int i = 1; i < b.length; i++) {
      network.clause(i, Atom.le(b[i - 1], 0), Atom.ge(b[i], 1));
    }
    assertThat(network.propagate()).isTrue();
    store.push();
    assertThat(network.propagate(Atom.ge(b[0], 1))).isTrue();
    assertThat(store.min(b[49])).isEqualTo(1);
    store.popTo(0);
    assertThat(network.propagate(Atom.le(b[49], 0))).isTrue();
    assertThat(store.max(b[0])).isZero();
  }

  @Test
  void countsPropagationsAndConflictsByTag() {
    int x = store.variable(0, 9);
    int y = store.variable(0, 9);
    network.difference(4, x, 1, y, Atom.TRUE);
    network.clause(6, Atom.ge(x, 9), Atom.le(y, 5));
    assertThat(network.propagate()).isTrue();
    assertThat(store.max(x)).isEqualTo(4);
    store.push();
    assertThat(network.propagate(Atom.ge(x, 4))).isTrue();
    assertThat(network.propagationsByTag()).hasSize(7);
    assertThat(network.propagationsByTag()[4]).isPositive();
    assertThat(network.failuresByTag()).containsOnly(0);
    assertThat(network.propagate(Atom.le(x, 3))).isFalse();
    assertThat(network.failuresByTag()).containsOnly(0);
  }

  @Test
  void blamesTheConstraintThatFails() {
    int x = store.variable(0, 9);
    int y = store.variable(0, 9);
    int flag = store.variable(0, 1);
    network.difference(2, x, 1, y, Atom.ge(flag, 1));
    network.difference(3, y, 1, x, Atom.ge(flag, 1));
    assertThat(network.propagate()).isTrue();
    long before = network.weight(x);
    store.push();
    assertThat(network.propagate(Atom.ge(flag, 1))).isFalse();
    assertThat(network.failuresByTag()[2] + network.failuresByTag()[3]).isEqualTo(1);
    assertThat(network.weight(x)).isEqualTo(before + 1);
  }

  @Test
  void provesAPositiveCycleWithoutWalkingTheDomains() {
    int x = store.variable(-BILLION, BILLION);
    int y = store.variable(-BILLION, BILLION);
    int z = store.variable(-BILLION, BILLION);
    network.difference(0, x, 1, y, Atom.TRUE);
    network.difference(0, y, -3, z, Atom.TRUE);
    network.difference(0, z, 3, x, Atom.TRUE);
    assertThat(network.propagate()).isFalse();
    assertThat(network.propagations()).isLessThan(100_000);
  }

  @Test
  void provesAPositiveCycleUnderAConditionOnly() {
    int x = store.variable(0, BILLION);
    int y = store.variable(0, BILLION);
    int flag = store.variable(0, 1);
    network.difference(0, x, 1, y, Atom.TRUE);
    network.difference(0, y, 0, x, Atom.ge(flag, 1));
    assertThat(network.propagate()).isTrue();
    store.push();
    assertThat(network.propagate(Atom.ge(flag, 1))).isFalse();
    assertThat(network.propagations()).isLessThan(100_000);
    store.popTo(0);
    assertThat(network.propagate(Atom.le(flag, 0))).isTrue();
  }

  @Test
  void takesACycleOfLengthZeroForWhatItIs() {
    int x = store.variable(0, BILLION);
    int y = store.variable(5, BILLION);
    network.difference(0, x, 7, y, Atom.TRUE);
    network.difference(0, y, -7, x, Atom.TRUE);
    assertThat(network.propagate()).isTrue();
    assertThat(store.max(x)).isEqualTo(BILLION - 7);
    assertThat(store.min(y)).isEqualTo(7);
  }

  @Test
  void stopsWithinASlowFixpoint_whenAsked() {
    int x = store.variable(0, BILLION);
    int y = store.variable(0, BILLION);
    network.post(new Above(x, y), 0);
    network.post(new Above(y, x), 1);
    long[] asked = {0};
    network.stopWhen(() -> ++asked[0] > 100);
    assertThat(network.propagate()).isFalse();
    assertThat(network.stopped()).isTrue();
    assertThat(network.propagations()).isLessThan(100_000);
  }

  @Test
  void goesOnAfterAStopAsIfNothingHadHappened() {
    int x = store.variable(0, 5000);
    int y = store.variable(0, 5000);
    network.post(new Above(x, y), 0);
    network.post(new Above(y, x), 1);
    boolean[] ask = {true};
    network.stopWhen(() -> ask[0]);
    assertThat(network.propagate()).isFalse();
    assertThat(network.stopped()).isTrue();
    ask[0] = false;
    assertThat(network.propagate()).isFalse();
    assertThat(network.stopped()).isFalse();
    assertThat(network.failuresByTag()[0] + network.failuresByTag()[1]).isEqualTo(1);
  }

  @Test
  void refusesConstraintsAndVariablesOnceItRuns() {
    int x = store.variable(0, 5);
    assertThat(network.propagate()).isTrue();
    assertThatThrownBy(() -> network.post(new Above(x, x), 0))
        .isInstanceOf(IllegalStateException.class);
    assertThatThrownBy(() -> network.difference(0, x, 1, Store.ZERO, Atom.TRUE))
        .isInstanceOf(IllegalStateException.class);
    assertThatThrownBy(() -> store.variable(0, 1)).isInstanceOf(IllegalStateException.class);
    store.push();
    assertThatThrownBy(() -> network.clause(0, Atom.ge(x, 1)))
        .isInstanceOf(IllegalStateException.class);
  }

  @Test
  void takesClausesAtTheRootLater() {
    int x = store.variable(0, 9);
    int y = store.variable(0, 9);
    assertThat(network.propagate()).isTrue();
    network.clause(0, Atom.le(x, 2), Atom.ge(y, 8));
    assertThat(network.propagate()).isTrue();
    store.push();
    assertThat(network.propagate(Atom.ge(x, 3))).isTrue();
    assertThat(store.min(y)).isEqualTo(8);
    store.popTo(0);
    network.clause(0, Atom.FALSE);
    assertThat(network.propagate()).isFalse();
  }

  /** y ≥ x + 1 as a propagator, so that two of them climb one by one. */
  private record Above(int x, int y) implements Propagator {
    @Override
    public int cost() {
      return CONSTANT;
    }

    @Override
    public void attach(Wiring wiring) {
      wiring.onMin(x);
    }

    @Override
    public boolean propagate(Store s) {
      return s.setMin(y, s.min(x) + 1, 0);
    }
  }
}
