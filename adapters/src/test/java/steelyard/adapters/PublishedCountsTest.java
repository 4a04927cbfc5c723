package steelyard.adapters;

import static org.assertj.core.api.Assertions.assertThat;
import static steelyard.adapters.Backends.onEach;
import static steelyard.adapters.Backends.row;

import java.util.List;
import java.util.function.BiConsumer;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.spi.Backend;
import steelyard.variants.model.AllDifferentExcept;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Count;
import steelyard.variants.model.DistinctValues;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.Lexicographic.Ties;
import steelyard.variants.model.Model;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.NoOverlap2D.Box;
import steelyard.variants.model.Precedence;
import steelyard.variants.model.Regular;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Subcircuit;
import steelyard.variants.model.Task;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.ModelBuilder;

/**
 * Published numbers of solutions, one kind of relation at a time, counted by every backend. The
 * sequences are those of the On-Line Encyclopedia of Integer Sequences, by their numbers; numbers
 * and values from memory.
 */
class PublishedCountsTest {
  private static final long SECONDS = 60;

  private static void assertCounts(Backend backend, Model model, int count) {
    assertThat(Backends.solutions(backend, model, SECONDS)).hasSize(count);
  }

  /** A model of {@code size} variables x0, x1, ... with the values of {@code domain}. */
  private static Model over(int size, Domain domain, BiConsumer<Draft, List<IntVar>> write) {
    return ModelBuilder.of(
        draft ->
            write.accept(
                draft,
                IntStream.range(0, size).mapToObj(i -> draft.integer("x" + i, domain)).toList()));
  }

  private static Model over(int size, Domain domain, Relation relation) {
    return over(size, domain, (draft, row) -> draft.group("all").post(relation));
  }

  /** The variables x0, x1, ... of such a model. */
  private static Views first(int size) {
    return Views.ofVariables(IntStream.range(0, size).toArray());
  }

  static Stream<Arguments> partialPermutations() {
    return onEach(row(1, 2), row(2, 7), row(3, 34), row(4, 209));
  }

  /** A002720: partial permutations of n elements. */
  @ParameterizedTest
  @MethodSource("partialPermutations")
  void counts_partial_permutations(Backend backend, int n, int count) {
    Relation relation = AllDifferentExcept.of(first(n), 0);
    assertCounts(backend, over(n, Domain.between(0, n), relation), count);
  }

  static Stream<Arguments> sparseWords() {
    return onEach(row(1, 2), row(2, 3), row(3, 5), row(4, 8), row(5, 13), row(9, 89));
  }

  /** A000045, the Fibonacci numbers: words of n bits without two ones in a row. */
  @ParameterizedTest
  @MethodSource("sparseWords")
  void counts_words_without_two_ones_in_a_row(Backend backend, int n, int count) {
    Automaton sparse =
        Automaton.of(
            2, Ints.of(0, 1), new int[] {0, 0, 0}, new int[] {0, 1, 1}, new int[] {1, 0, 0});
    assertCounts(backend, over(n, Domain.between(-1, 2), new Regular(first(n), sparse)), count);
  }

  static Stream<Arguments> binomials() {
    return onEach(row(4, 2, 6), row(5, 0, 1), row(6, 3, 20), row(7, 5, 21));
  }

  /** A007318, Pascal's triangle: words of n bits, k of them ones. */
  @ParameterizedTest
  @MethodSource("binomials")
  void counts_words_of_so_many_ones(Backend backend, int n, int k, int count) {
    Relation relation = new Count(first(n), Ints.of(1), Comparison.EQ, View.constant(k));
    assertCounts(backend, over(n, Domain.BOOLEAN, relation), count);
  }

  static Stream<Arguments> surjections() {
    return onEach(row(3, 3, 6), row(4, 2, 14), row(4, 3, 36), row(5, 2, 30), row(5, 3, 150));
  }

  /** A019538: mappings of n elements onto k. */
  @ParameterizedTest
  @MethodSource("surjections")
  void counts_words_in_which_every_letter_stands(Backend backend, int n, int k, int count) {
    Relation relation = new DistinctValues(first(n), Comparison.GE, View.constant(k));
    assertCounts(backend, over(n, Domain.between(1, k), relation), count);
  }

  static Stream<Arguments> divisors() {
    return onEach(row(1, 1), row(12, 6), row(36, 9), row(60, 12), row(97, 2));
  }

  /** A000005: divisors of n. */
  @ParameterizedTest
  @MethodSource("divisors")
  void counts_divisors_as_products_and_as_remainders(Backend backend, int n, int count) {
    Domain candidates = Domain.between(1, n);
    Model products =
        over(2, candidates, (draft, x) -> draft.group("n").post(x.get(0).times(x.get(1)).eq(n)));
    assertCounts(backend, products, count);
    Model remainders =
        over(
            1,
            Domain.between(-1, n),
            (draft, x) ->
                draft
                    .group("n")
                    .post(Term.constant(n).remainder(x.get(0)).eq(0).and(x.get(0).ge(0))));
    assertCounts(backend, remainders, count);
  }

  static Stream<Arguments> triples() {
    return onEach(row(5, 1), row(13, 3), row(17, 5), row(20, 6));
  }

  /** A156685: right triangles with whole sides, the longest of at most n. */
  @ParameterizedTest
  @MethodSource("triples")
  void counts_right_triangles_with_whole_sides(Backend backend, int n, int count) {
    Model model =
        over(
            3,
            Domain.between(1, n),
            (draft, x) -> {
              Term a = x.get(0).times(x.get(0));
              Term b = x.get(1).times(x.get(1));
              draft.group("right").post(a.plus(b).eq(x.get(2).times(x.get(2))));
              draft.group("order").post(x.get(0).lt(x.get(1)));
            });
    assertCounts(backend, model, count);
  }

  /** A005188: the numbers of three digits that are the sum of the cubes of their digits. */
  @ParameterizedTest
  @MethodSource("backends")
  void finds_the_numbers_that_are_the_cubes_of_their_digits(Backend backend) {
    Model model =
        over(
            1,
            Domain.between(100, 999),
            (draft, x) -> {
              Term number = x.get(0);
              Term sum =
                  Stream.of(
                          number.dividedBy(100),
                          number.dividedBy(10).remainder(10),
                          number.remainder(10))
                      .map(digit -> digit.times(digit).times(digit))
                      .reduce(Term::plus)
                      .orElseThrow();
              draft.group("cubes").post(sum.eq(number));
            });
    assertThat(Backends.solutions(backend, model, SECONDS))
        .extracting(solution -> solution.complete().get(0))
        .containsExactlyInAnyOrder(153, 370, 371, 407);
  }

  static Stream<Arguments> backends() {
    return onEach(row());
  }

  static Stream<Arguments> necklaces() {
    return onEach(row(2, 3, 1), row(3, 4, 2), row(4, 6, 3), row(5, 8, 6), row(6, 14, 9));
  }

  /** A000031 and A001037: words of n bits that are least among their rotations, and alone so. */
  @ParameterizedTest
  @MethodSource("necklaces")
  void counts_words_that_are_least_of_their_rotations(
      Backend backend, int n, int necklaces, int lyndonWords) {
    assertCounts(backend, rotations(n, Ties.ALLOWED), necklaces);
    assertCounts(backend, rotations(n, Ties.FORBIDDEN), lyndonWords);
  }

  private static Model rotations(int n, Ties ties) {
    return over(
        n,
        Domain.BOOLEAN,
        (draft, row) -> {
          for (int turn = 1; turn < n; turn++) {
            int by = turn;
            List<IntVar> turned =
                IntStream.range(0, n).mapToObj(i -> row.get((i + by) % n)).toList();
            draft.group("least").post(new Lexicographic(Views.of(row), Views.of(turned), ties));
          }
        });
  }

  static Stream<Arguments> involutions() {
    return onEach(row(1, 1), row(2, 2), row(3, 4), row(4, 10), row(5, 26), row(6, 76));
  }

  /** A000085: permutations that are their own inverse. */
  @ParameterizedTest
  @MethodSource("involutions")
  void counts_permutations_that_are_their_own_inverse(Backend backend, int n, int count) {
    assertCounts(backend, over(n, Domain.between(0, n), new Inverse(first(n), first(n))), count);
  }

  static Stream<Arguments> rounds() {
    return onEach(row(1, 1), row(2, 1), row(3, 2), row(4, 6), row(5, 24), row(6, 120));
  }

  /** A000142: there are (n-1)! round tours of n nodes. */
  @ParameterizedTest
  @MethodSource("rounds")
  void counts_round_tours(Backend backend, int n, int count) {
    assertCounts(backend, over(n, Domain.between(-1, n), new Circuit(first(n))), count);
  }

  /** A066037: the cube's 8 corners have 6 tours along its edges, each in two directions. */
  @ParameterizedTest
  @MethodSource("backends")
  void counts_tours_along_the_edges_of_a_cube(Backend backend) {
    Model model =
        ModelBuilder.of(
            draft -> {
              List<IntVar> next =
                  IntStream.range(0, 8)
                      .mapToObj(i -> draft.integer("x" + i, Domain.of(i ^ 1, i ^ 2, i ^ 4)))
                      .toList();
              draft.group("tour").post(new Circuit(Views.of(next)));
            });
    assertCounts(backend, model, 12);
  }

  static Stream<Arguments> cycles() {
    return onEach(row(1, 0), row(2, 1), row(3, 5), row(4, 20), row(5, 84));
  }

  /** A006231: cycles of at least two of n nodes. The tour of no node comes on top. */
  @ParameterizedTest
  @MethodSource("cycles")
  void counts_tours_of_some_nodes(Backend backend, int n, int count) {
    assertCounts(backend, over(n, Domain.between(0, n), new Subcircuit(first(n))), count + 1);
  }

  static Stream<Arguments> partitions() {
    return onEach(row(1, 1), row(2, 2), row(3, 5), row(4, 15), row(5, 52));
  }

  /** A000110, the Bell numbers: ways to part n elements, parts numbered as they come up. */
  @ParameterizedTest
  @MethodSource("partitions")
  void counts_partitions_by_parts_that_come_in_order(Backend backend, int n, int count) {
    Relation relation = new Precedence(first(n), Ints.of(IntStream.range(0, n).toArray()));
    assertCounts(backend, over(n, Domain.between(0, n - 1), relation), count);
  }

  static Stream<Arguments> floors() {
    return onEach(
        row(2, 1, 1), row(2, 2, 2), row(2, 3, 3), row(2, 4, 5), row(2, 5, 8), row(4, 4, 36));
  }

  /** A000045 and A004003: ways to cover a floor with tiles of 1 by 2, which may be turned. */
  @ParameterizedTest
  @MethodSource("floors")
  void counts_floors_of_tiles_of_one_by_two(Backend backend, int height, int width, int count) {
    Model model =
        ModelBuilder.of(
            draft -> {
              int tiles = height * width / 2;
              Box[] boxes = new Box[tiles];
              Term before = Term.constant(-1);
              for (int i = 0; i < tiles; i++) {
                IntVar x = draft.integer("x" + i, 0, width - 1);
                IntVar y = draft.integer("y" + i, 0, height - 1);
                IntVar length = draft.integer("length" + i, 1, 2);
                View other = length.view().negated().shifted(3);
                Task across = draft.task("across" + i, x, length);
                Task up = draft.task("up" + i, y, other);
                boxes[i] = new Box(across, up);
                draft.group("inside").post(across.end().le(width).and(up.end().le(height)));
                Term cell = y.times(width).plus(x);
                draft.group("in order").post(before.lt(cell));
                before = cell;
              }
              draft.group("apart").post(NoOverlap2D.of(boxes));
            });
    assertCounts(backend, model, count);
  }
}
