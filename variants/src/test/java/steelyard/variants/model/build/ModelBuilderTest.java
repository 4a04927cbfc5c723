package steelyard.variants.model.build;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Set;
import java.util.function.Consumer;
import org.junit.jupiter.api.Test;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Branching;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Product;
import steelyard.variants.model.Role;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.judge.Evaluator;

class ModelBuilderTest {

  private static Model amended(Role role, Consumer<Change> amendment) {
    ModelBuilder builder = new ModelBuilder();
    Draft plain = builder.plain();
    IntVar x = plain.integer("x", 0, 9);
    IntVar y = plain.integer("y", 0, 9);
    plain.group("order").post(x.lt(y));
    plain.minimize(y);
    plain.branch(Views.of(x), Branching.VariableOrder.INPUT, Branching.ValueOrder.MIN);
    amendment.accept(builder.amend("tight", role, Set.of()));
    return builder.build();
  }

  @Test
  void judges_from_the_decisions_alone() {
    Model model =
        ModelBuilder.of(
            draft -> {
              IntVar x = draft.integer("x", 0, 9);
              IntVar twice = draft.define("twice", x.times(2));
              draft.group("cap").post(twice.le(7));
              draft.maximize(twice.plus(1));
            });
    Evaluator evaluator = new Evaluator(model);
    assertThat(evaluator.judge(new int[] {3}).isValid()).isTrue();
    assertThat(evaluator.judge(new int[] {3}).objective()).hasValue(7);
    assertThat(evaluator.judge(new int[] {4}).violations())
        .singleElement()
        .satisfies(v -> assertThat(v.describe()).contains("cap[0]", "twice=8"));
    assertThat(evaluator.judge(new int[] {10}).violations())
        .singleElement()
        .satisfies(v -> assertThat(v.describe()).contains("outside the domain: {x=10}"));
  }

  @Test
  void leaves_out_definitions_that_nothing_uses() {
    Model model =
        ModelBuilder.of(
            draft -> {
              IntVar x = draft.integer("x", 0, 9);
              IntVar used = draft.define("used", x.times(2));
              draft.define("unused", used.times(2));
              draft.group("cap").post(used.le(7));
            });
    assertThat(model.lowered())
        .extracting(p -> p.origin().toString())
        .containsExactly("definitions[0]", "cap[0]");
  }

  @Test
  void refuses_what_a_role_may_not_do() {
    assertThatThrownBy(() -> amended(new Role.Implied(), c -> c.integer("z", 0, 1)))
        .hasMessage("tight: an amendment of role implied may not add the decision variable 'z'");
    assertThatThrownBy(() -> amended(new Role.Dominance(), c -> c.withdraw("order")))
        .hasMessage("tight: an amendment of role dominance may not withdraw 'order'");
    assertThatThrownBy(
            () -> amended(new Role.Search(), c -> c.group("g").post(c.variable("x").le(3))))
        .hasMessage("tight: an amendment of role search may not post into 'g'");
    assertThatThrownBy(
            () ->
                amended(
                    new Role.Symmetry(List.of(Permutation.swap("x", "y"))),
                    c -> c.minimize(c.variable("x"))))
        .hasMessage("tight: an amendment of role symmetry may not set the objective");
    assertThatThrownBy(() -> amended(new Role.Reformulation(), c -> c.withdraw("oder")))
        .hasMessageContaining("no group 'oder'");
    assertThatThrownBy(() -> amended(new Role.Search(), c -> c.variable("w")))
        .hasMessage("tight: the model has no variable 'w'");
  }

  @Test
  void keeps_withdrawn_postings_for_the_audit_but_does_not_lower_them() {
    Model model =
        amended(
            new Role.Reformulation(),
            c -> {
              c.withdraw("order");
              c.group("order").post(c.variable("x").plus(1).le(c.variable("y")));
            });
    assertThat(model.postings())
        .extracting(Posting::duty)
        .containsExactly(Posting.Duty.WITHDRAWN, Posting.Duty.ASSERTED);
    assertThat(model.lowered())
        .extracting(p -> p.origin().toString())
        .containsExactly("tight/order[0]");
  }

  @Test
  void a_search_amendment_replaces_the_branching_and_changes_no_model() {
    Model before = amended(new Role.Search(), c -> {});
    Model after =
        amended(
            new Role.Search(),
            c ->
                c.branch(
                    Views.of(c.variable("y")),
                    Branching.VariableOrder.SMALLEST_DOMAIN,
                    Branching.ValueOrder.MAX));
    assertThat(after.branching().phases()).hasSize(1);
    assertThat(after.asBuilt()).isEqualTo(before.asBuilt());
    assertThat(after.canonical()).isEqualTo(before.canonical());
    assertThat(after.search()).isNotEqualTo(before.search());
  }

  @Test
  void says_where_a_sum_can_overflow() {
    assertThatThrownBy(
            () ->
                ModelBuilder.of(
                    draft -> {
                      IntVar x = draft.integer("x", 0, Domain.LIMIT);
                      draft.group("huge").post(x.times(1L << 40).le(5));
                    }))
        .hasMessageStartingWith("plain/huge: a sum or product can pass 2^62 - 1");
    assertThatThrownBy(
            () -> ModelBuilder.of(draft -> draft.define("y", Term.constant(2_000_000_000L))))
        .hasMessageContaining("plain/y:")
        .hasMessageContaining("keep the sum inside a comparison");
  }

  @Test
  void says_where_a_product_is_too_large() {
    assertThatThrownBy(
            () ->
                ModelBuilder.of(
                    draft -> {
                      IntVar x = draft.integer("x", -40_000, 0);
                      draft.group("square").post(x.times(x).ge(5));
                    }))
        .hasMessage(
            "plain/square: x * x ranges over 0..1600000000, beyond what a variable can take (10^9"
                + " in magnitude); use smaller domains");
    assertThatThrownBy(
            () ->
                ModelBuilder.of(
                    draft -> {
                      IntVar x = draft.integer("x", 0, Domain.LIMIT);
                      draft.group("area").post(new Product(x.shifted(1), x.view(), x.view()));
                    }))
        .hasMessage("plain/area: a factor can pass 10^9 in magnitude: 1..1000000001");
    assertThatThrownBy(
            () ->
                ModelBuilder.of(
                    draft -> {
                      IntVar x = draft.integer("x", 0, Domain.LIMIT);
                      draft
                          .group("load")
                          .post(
                              new Knapsack(
                                  Views.of(x, x),
                                  Longs.of(3_000_000_000L, 3_000_000_000L),
                                  View.constant(1),
                                  Longs.of(1, 1),
                                  View.constant(1)));
                    }))
        .hasMessageStartingWith("plain/load: a sum or product can pass 2^62 - 1");
  }

  @Test
  void defines_quotients_and_remainders_of_divisors_that_are_never_0() {
    Model model =
        ModelBuilder.of(
            draft -> {
              IntVar x = draft.integer("x", -9, 9);
              IntVar y = draft.integer("y", Domain.of(-3, -1, 2));
              IntVar q = draft.define("q", x.dividedBy(y));
              IntVar r = draft.define("r", x.remainder(y));
              draft.group("least").post(q.times(y).plus(r).eq(x).and(q.ge(-4)));
            });
    Evaluator evaluator = new Evaluator(model);
    assertThat(evaluator.judge(new int[] {-9, 2}).complete().stream().limit(4))
        .containsExactly(-9, 2, -4, -1);
    assertThat(evaluator.judge(new int[] {-9, 2}).isValid()).isTrue();
    assertThat(evaluator.judge(new int[] {-9, -3}).complete().stream().limit(4))
        .containsExactly(-9, -3, 3, 0);
    assertThat(evaluator.judge(new int[] {9, -1}).isValid()).isFalse();
  }

  @Test
  void refuses_partial_definitions_and_relations_without_meaning() {
    assertThatThrownBy(
            () ->
                ModelBuilder.of(
                    draft -> {
                      IntVar i = draft.integer("i", 0, 3);
                      draft.define("entry", Term.at(List.of(i, i, i), i));
                    }))
        .hasMessageContaining("plain/entry:")
        .hasMessageContaining("a definition must be total");
    assertThatThrownBy(
            () ->
                ModelBuilder.of(
                    draft -> {
                      IntVar i = draft.integer("i", 0, 3);
                      draft.define("share", Term.constant(7).dividedBy(i));
                    }))
        .hasMessageContaining("plain/share:")
        .hasMessageContaining("a definition must be total");
    assertThatThrownBy(
            () ->
                ModelBuilder.of(
                    draft -> {
                      IntVar d = draft.integer("d", -1, 3);
                      draft
                          .group("shelf")
                          .post(
                              new Cumulative(
                                  Tasks.of(Task.fixed(d, 2)), Views.of(d), View.constant(1)));
                    }))
        .hasMessage("plain/shelf: a demand of cumulative can be negative: number 0");
    assertThatThrownBy(
            () ->
                ModelBuilder.of(
                    draft -> draft.group("g").post(AllDifferent.of(new IntVar("ghost", 7)))))
        .hasMessage("plain/g: variable 7 is not of this model");
    assertThatThrownBy(
            () ->
                ModelBuilder.of(
                    draft -> {
                      draft.bool("b");
                      draft.bool("b");
                    }))
        .hasMessage("plain/b: the name 'b' is taken by another variable");
  }
}
