package steelyard.adapters.sat.encoding;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;
import java.util.function.IntConsumer;
import java.util.stream.IntStream;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Variables;
import steelyard.variants.model.View;

/**
 * Bounds that hold in every solution, found before encoding because the order encoding pays for
 * each value: bounds propagation of posted linear relations, maxima and literals to a fixpoint, or
 * until it has taken long enough.
 *
 * <p>Source: Harvey &amp; Schimpf (2002), "Bounds Consistency Techniques for Long Linear
 * Constraints", TRICS.
 */
final class RootBounds {
  /** Slowly converging cycles, such as x &lt; y &lt; x, are cut off; what was found holds. */
  private static final int VISITS_PER_RULE = 50;

  private final Variables variables;
  private final int[] low;
  private final int[] high;
  private final List<Rule> rules = new ArrayList<>();

  /** By variable, from {@code startAt}: the rules that mention it. */
  private int[] mentioning = {};

  private final int[] startAt;
  private final ArrayDeque<Integer> open = new ArrayDeque<>();
  private final BitSet isOpen = new BitSet();
  private boolean failed;

  private RootBounds(Variables variables) {
    this.variables = variables;
    int size = variables.size();
    this.low = IntStream.range(0, size).map(v -> variables.domain(v).min()).toArray();
    this.high = IntStream.range(0, size).map(v -> variables.domain(v).max()).toArray();
    this.startAt = new int[size + 1];
  }

  /** The domains of the model's variables within the bounds; empty if it has no solution. */
  static Optional<List<Domain>> domains(Model model) {
    RootBounds bounds = new RootBounds(model.variables());
    for (Posting posting : model.lowered()) {
      posting.definitions().forEach(definition -> bounds.learn(definition.constraint()));
      posting.asserted().forEach(bounds::learn);
    }
    bounds.propagate();
    return bounds.failed
        ? Optional.empty()
        : Optional.of(
            IntStream.range(0, bounds.low.length)
                .mapToObj(v -> within(model.variables().domain(v), bounds.low[v], bounds.high[v]))
                .toList());
  }

  /** What can be derived from some bounds when others have changed. */
  private interface Rule {
    void apply();

    void forEachVariable(IntConsumer each);
  }

  private void learn(Constraint constraint) {
    if (constraint instanceof Linear linear) {
      if (linear.op() == Comparison.LE || linear.op() == Comparison.EQ) {
        rules.add(new AtMost(linear.sum(), 1, linear.bound()));
      }
      if (linear.op() == Comparison.GE || linear.op() == Comparison.EQ) {
        rules.add(new AtMost(linear.sum(), -1, -linear.bound()));
      }
    } else if (constraint instanceof Maximum maximum) {
      rules.add(new Peak(maximum));
    } else if (constraint instanceof Clause clause && clause.atoms().size() == 1) {
      learn(clause.atoms().get(0));
    } else if (constraint instanceof Conditional conditional
        && conditional.when().equals(Atom.TRUE)
        && conditional.mode() != Conditional.Mode.ONLY_IF) {
      learn(conditional.then());
    }
  }

  private void learn(Atom atom) {
    if (atom.isConstant()) {
      failed |= atom.equals(Atom.FALSE);
      return;
    }
    if (atom.op() == Atom.Op.GE || atom.op() == Atom.Op.EQ) {
      raise(atom.variable(), atom.value());
    }
    if (atom.op() == Atom.Op.LE || atom.op() == Atom.Op.EQ) {
      lower(atom.variable(), atom.value());
    }
  }

  private void propagate() {
    index();
    for (int r = 0; r < rules.size(); r++) {
      wake(r);
    }
    long visits = (long) VISITS_PER_RULE * rules.size();
    while (!open.isEmpty() && !failed && visits-- > 0) {
      int rule = open.remove();
      isOpen.clear(rule);
      rules.get(rule).apply();
    }
  }

  private void index() {
    rules.forEach(rule -> rule.forEachVariable(v -> startAt[v + 1]++));
    for (int v = 0; v < low.length; v++) {
      startAt[v + 1] += startAt[v];
    }
    mentioning = new int[startAt[low.length]];
    int[] next = Arrays.copyOf(startAt, low.length);
    for (int r = 0; r < rules.size(); r++) {
      int rule = r;
      rules.get(r).forEachVariable(v -> mentioning[next[v]++] = rule);
    }
  }

  private void wake(int rule) {
    if (!isOpen.get(rule)) {
      isOpen.set(rule);
      open.add(rule);
    }
  }

  private void wakeAll(int variable) {
    failed |= low[variable] > high[variable];
    if (mentioning.length > 0) {
      for (int k = startAt[variable]; k < startAt[variable + 1]; k++) {
        wake(mentioning[k]);
      }
    }
  }

  private void raise(int variable, long value) {
    if (value > low[variable]) {
      Domain domain = variables.domain(variable);
      low[variable] = value > domain.max() ? domain.max() + 1 : ceiling(domain, (int) value);
      wakeAll(variable);
    }
  }

  private void lower(int variable, long value) {
    if (value < high[variable]) {
      Domain domain = variables.domain(variable);
      high[variable] = value < domain.min() ? domain.min() - 1 : floor(domain, (int) value);
      wakeAll(variable);
    }
  }

  private void raise(View view, long value) {
    if (view.isConstant()) {
      failed |= view.offset() < value;
    } else if (view.sign() > 0) {
      raise(view.variable(), value - view.offset());
    } else {
      lower(view.variable(), view.offset() - value);
    }
  }

  private long min(View view) {
    return switch (view.sign()) {
      case 1 -> low[view.variable()] + (long) view.offset();
      case -1 -> view.offset() - (long) high[view.variable()];
      default -> view.offset();
    };
  }

  private long max(View view) {
    return -min(view.negated());
  }

  private static int ceiling(Domain domain, int value) {
    for (int r = 0; r < domain.ranges(); r++) {
      if (value <= domain.to(r)) {
        return Math.max(value, domain.from(r));
      }
    }
    throw new IllegalArgumentException(value + " is above " + domain);
  }

  private static int floor(Domain domain, int value) {
    for (int r = domain.ranges() - 1; r >= 0; r--) {
      if (value >= domain.from(r)) {
        return Math.min(value, domain.to(r));
      }
    }
    throw new IllegalArgumentException(value + " is below " + domain);
  }

  private static Domain within(Domain domain, int low, int high) {
    if (low == domain.min() && high == domain.max()) {
      return domain;
    }
    return Domain.ofRanges(
        IntStream.range(0, domain.ranges())
            .filter(r -> domain.to(r) >= low && domain.from(r) <= high)
            .flatMap(r -> IntStream.of(Math.max(low, domain.from(r)), Math.min(high, domain.to(r))))
            .toArray());
  }

  /** {@code Σ sign·a·x ≤ bound}: a term may exceed its minimum by at most the slack. */
  private final class AtMost implements Rule {
    private final LinearSum sum;
    private final int sign;
    private final long bound;

    AtMost(LinearSum sum, int sign, long bound) {
      this.sum = sum;
      this.sign = sign;
      this.bound = bound;
    }

    @Override
    public void forEachVariable(IntConsumer each) {
      sum.variables().stream().forEach(each);
    }

    @Override
    public void apply() {
      long slack = bound;
      for (int i = 0; i < sum.size(); i++) {
        long a = sign * sum.coefficient(i);
        slack -= a * (a > 0 ? low[sum.variable(i)] : high[sum.variable(i)]);
      }
      if (slack < 0) {
        failed = true;
        return;
      }
      for (int i = 0; i < sum.size(); i++) {
        long a = sign * sum.coefficient(i);
        int x = sum.variable(i);
        if (a > 0) {
          lower(x, low[x] + slack / a);
        } else {
          raise(x, high[x] + slack / a);
        }
      }
    }
  }

  private final class Peak implements Rule {
    private final View result;
    private final List<View> terms;

    Peak(Maximum maximum) {
      this.result = maximum.result();
      this.terms = maximum.terms().stream().toList();
    }

    @Override
    public void forEachVariable(IntConsumer each) {
      terms.stream().filter(t -> !t.isConstant()).forEach(t -> each.accept(t.variable()));
      if (!result.isConstant()) {
        each.accept(result.variable());
      }
    }

    @Override
    public void apply() {
      long highest = Long.MIN_VALUE;
      for (View term : terms) {
        raise(result, min(term));
        raise(term.negated(), -max(result));
        highest = Math.max(highest, max(term));
      }
      raise(result.negated(), -highest);
    }
  }
}
