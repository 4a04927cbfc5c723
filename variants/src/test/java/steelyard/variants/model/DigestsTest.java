package steelyard.variants.model;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.function.IntBinaryOperator;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.ModelBuilder;

class DigestsTest {

  private static void write(Draft draft, boolean reversed) {
    List<String> names = reversed ? List.of("c", "b", "a") : List.of("a", "b", "c");
    names.forEach(name -> draft.integer(name, 0, 5));
    ModelParts parts = new ModelParts(draft, reversed);
    if (reversed) {
      parts.cap();
      parts.different();
    } else {
      parts.different();
      parts.cap();
    }
    draft.minimize(Term.sum(parts.all()));
  }

  /** The same two groups, in either order and with rows in either order. */
  private record ModelParts(Draft draft, boolean reversed) {
    IntVar of(String name) {
      return new IntVar(name, reversed ? 'c' - name.charAt(0) : name.charAt(0) - 'a');
    }

    List<IntVar> all() {
      return reversed ? List.of(of("c"), of("a"), of("b")) : List.of(of("a"), of("b"), of("c"));
    }

    void different() {
      draft.group("different").post(new AllDifferent(Views.of(all())));
    }

    void cap() {
      IntVar first = reversed ? of("b") : of("a");
      IntVar second = reversed ? of("a") : of("b");
      draft.group("cap").post(first.plus(second).le(3));
    }
  }

  @Test
  void the_canonical_digest_is_free_of_order_but_not_the_one_as_built() {
    Model model = ModelBuilder.of(draft -> write(draft, false));
    Model turned = ModelBuilder.of(draft -> write(draft, true));
    assertThat(turned.asBuilt()).isNotEqualTo(model.asBuilt());
    assertThat(turned.canonical()).isEqualTo(model.canonical());
    assertThat(turned.groups()).isEqualTo(model.groups());
  }

  @Test
  void a_shuffle_keeps_the_canonical_digest_and_changes_the_one_as_built() {
    Model model = ModelBuilder.of(draft -> write(draft, false));
    int n = model.variables().size();
    Rewriting reversal =
        new Rewriting() {
          @Override
          public int variable(int old) {
            return n - 1 - old;
          }

          @Override
          public int[] rows(int size, IntBinaryOperator byContent) {
            return IntStream.range(0, size).map(i -> size - 1 - i).toArray();
          }
        };
    int[] backwards =
        IntStream.range(0, model.postings().size())
            .map(i -> model.postings().size() - 1 - i)
            .toArray();
    Model shuffled = model.rewrite(reversal, backwards);
    assertThat(shuffled.canonical()).isEqualTo(model.canonical());
    assertThat(shuffled.groups()).isEqualTo(model.groups());
    assertThat(shuffled.asBuilt()).isNotEqualTo(model.asBuilt());
    assertThat(shuffled.lowered()).hasSameSizeAs(model.lowered());
  }

  @Test
  void every_part_of_a_model_enters_the_digests() {
    Model model = ModelBuilder.of(draft -> write(draft, false));
    Model wider =
        ModelBuilder.of(
            draft -> {
              write(draft, false);
              draft.integer("d", 0, 1);
            });
    Model other =
        ModelBuilder.of(
            draft -> {
              write(draft, false);
              draft.maximize(new IntVar("a", 0));
            });
    assertThat(List.of(model.canonical(), wider.canonical(), other.canonical()))
        .doesNotHaveDuplicates();
    assertThat(List.of(model.asBuilt(), wider.asBuilt(), other.asBuilt())).doesNotHaveDuplicates();
  }

  @Test
  void names_and_groups_do_not_enter_the_digest_as_built() {
    Model one = ModelBuilder.of(d -> d.group("g").post(d.integer("x", 0, 3).ne(2)));
    Model two = ModelBuilder.of(d -> d.group("h").post(d.integer("y", 0, 3).ne(2)));
    assertThat(one.asBuilt()).isEqualTo(two.asBuilt());
    assertThat(one.canonical()).isNotEqualTo(two.canonical());
  }
}
