package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.google.ortools.sat.ConstraintProto;
import com.google.ortools.sat.CpModelProto;
import com.google.ortools.sat.IntegerVariableProto;
import com.google.protobuf.TextFormat;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import steelyard.adapters.spi.Facet;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Printable;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Sizes;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.SolveRequest;
import steelyard.variants.model.Atom;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Table;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.ModelBuilder;

/** What a model becomes, and what is refused. */
class LoweringTest {
  private static final Domain DIGIT = Domain.between(0, 9);

  @Test
  void sharesOneLiteral_amongAtomsThatMeanTheSame() {
    Domain holes = Domain.of(0, 1, 5, 9);
    Clause one = Clause.of(Atom.atLeast(0, 2), Atom.isNot(0, 9), Atom.is(1, 3));
    Clause two = Clause.of(Atom.atMost(0, 4), Atom.is(0, 9), Atom.isNot(1, 3));
    CpModelProto message = message(List.of(holes, DIGIT), List.of(one, two));
    assertThat(message.getVariablesCount()).isEqualTo(2 + 3);
    assertThat(message.getConstraintsCount()).isEqualTo(2 + 3 * 2);
  }

  @Test
  void makesNoLiteral_forABoolean() {
    Clause clause = Clause.of(Atom.is(0, 1), Atom.atMost(1, 0), Atom.isNot(2, 1));
    CpModelProto message =
        message(List.of(Domain.BOOLEAN, Domain.BOOLEAN, Domain.BOOLEAN), List.of(clause));
    assertThat(message.getVariablesCount()).isEqualTo(3);
    assertThat(message.getConstraints(0).getBoolOr().getLiteralsList()).containsExactly(0, -2, -3);
  }

  @Test
  void boundsAVariableUnderALiteral_withoutOneOfItsOwn() {
    Clause clause = Clause.of(Atom.is(0, 0), Atom.atLeast(1, 4));
    CpModelProto message = message(List.of(Domain.BOOLEAN, DIGIT), List.of(clause));
    assertThat(message.getVariablesCount()).isEqualTo(2);
    ConstraintProto only = message.getConstraints(0);
    assertThat(only.getEnforcementLiteralList()).containsExactly(0);
    assertThat(only.getLinear().getDomainList()).containsExactly(4L, Long.MAX_VALUE);
  }

  @Test
  void writesShortRowsOut_whenTheyAreFew() {
    Table table =
        new Table(
            Views.ofVariables(0, 1),
            Tuples.of(2, new int[] {Tuples.ANY, 3}, new int[] {4, 5}),
            Table.Polarity.ALLOWED);
    CpModelProto message = message(List.of(DIGIT, DIGIT), List.of(table));
    assertThat(message.getConstraints(0).getTable().getValuesCount()).isEqualTo(2 * (10 + 1));
  }

  @Test
  void decomposesShortRows_whenTheyAreMany() {
    Domain large = Domain.between(0, 1_000_000_000);
    Table table =
        new Table(
            Views.ofVariables(0, 1),
            Tuples.of(2, new int[] {Tuples.ANY, 3}, new int[] {4, 5}),
            Table.Polarity.ALLOWED);
    Instance instance = lower(List.of(large, DIGIT), List.of(table));
    assertThat(instance.message().getConstraintsList()).noneMatch(ConstraintProto::hasTable);
    assertThat(instance.sizes().how().get("table")).isEqualTo("literal per row (Bacchus 2007)");
  }

  @Test
  void decomposesEntriesThatAreVariables_whichTheLibraryGetsWrong() {
    Model same =
        ModelBuilder.of(
            draft -> {
              IntVar entry = draft.integer("entry", -3, 3);
              IntVar index = draft.integer("index", 0, 1);
              IntVar result = draft.integer("result", -9, 9);
              draft
                  .group("choice")
                  .post(new Element(Views.of(entry, entry), index.view(), result.view()));
              draft.group("shift").post(result.eq(entry.plus(2)));
            });
    assertThat(Solving.solve(same, new Goal.Satisfy()).heard().solutions).isEmpty();
  }

  @Test
  void countsByPosting() {
    Clause clause = Clause.of(Atom.is(0, 3), Atom.is(1, 3), Atom.is(0, 5));
    BinPacking packing =
        new BinPacking(Views.ofVariables(0, 1), Longs.of(2, 3), Views.ofConstants(2, 3));
    Sizes sizes = lower(List.of(DIGIT, DIGIT), List.of(clause, packing)).sizes();
    assertThat(sizes.unit()).isEqualTo("constraints");
    assertThat(sizes.byPosting().get(0)).isEqualTo(1 + 3 * 2);
    assertThat(sizes.byPosting().stream().sum()).isEqualTo(sizes.totals().get("constraints"));
    assertThat(sizes.totals()).containsKeys("variables", "terms", "bytes");
    assertThat(sizes.how()).containsEntry("clause", "native").containsKey("bin-packing");
  }

  @Test
  void fitsSizesBeyondEveryLoad_withoutOverflow() {
    BinPacking packing =
        new BinPacking(
            Views.ofVariables(0, 1),
            Longs.of(Long.MAX_VALUE, Long.MAX_VALUE),
            Views.of(View.of(0), View.constant(1)));
    Model model = Solving.flat(List.of(DIGIT, DIGIT), List.of(packing), Optional.empty());
    assertThat(Solving.solve(model, new Goal.Satisfy()).heard().solutions).isEmpty();
  }

  @Test
  void printsNames() throws IOException {
    Model model =
        ModelBuilder.of(
            draft -> {
              IntVar x = draft.integer("lots fired", 0, 9);
              draft.group("kiln").post(x.ge(3));
              draft.maximize(x);
            });
    StringBuilder text = new StringBuilder();
    Printable printable = printable(model);
    printable.print(printable.formats().first(), text);
    CpModelProto read = TextFormat.parse(text, CpModelProto.class);
    assertThat(read.getVariablesList())
        .extracting(IntegerVariableProto::getName)
        .containsExactly("lots fired");
    assertThat(read.getConstraints(0).getName()).isEqualTo("kiln[0]");
    assertThat(read.getObjective().getCoeffsList()).containsExactly(-1L);
  }

  @Test
  void printsNoOtherFormat() {
    Printable printable = printable(JobShop.model(JobShop.FT06));
    assertThat(printable.formats()).containsExactly("cpsat-proto-text");
    assertThatThrownBy(() -> printable.print("dimacs", new StringBuilder()))
        .isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void hasNoOtherAbility() {
    interface Flying extends Facet {}
    try (Lowering lowering = (Lowering) backendLowers(JobShop.model(JobShop.FT06), plain())) {
      assertThat(lowering.facet(Flying.class)).isEmpty();
    }
  }

  @Test
  void refusesAnUnknownUnitOfWork() {
    SolveRequest request = Solving.request(Map.of(), 1, Limit.work("nodes", 10));
    assertThat(refusal(request)).contains("'nodes'", "conflicts", "deterministic-seconds");
  }

  @Test
  void refusesConflicts_whenThereAreThreads() {
    SolveRequest request = Solving.request(Map.of(), 2, Limit.work(WorkUnits.CONFLICTS, 10));
    assertThat(refusal(request)).contains("2 threads", "deterministic-seconds");
  }

  @Test
  void passesOnWhatTheLibraryRefuses() {
    Task task = Task.fixed(View.of(0), 2);
    Cumulative negative =
        new Cumulative(Tasks.of(task), Views.of(View.of(0).shifted(-5)), View.constant(3));
    Model model = Solving.flat(List.of(DIGIT), List.of(negative), Optional.empty());
    Solving.Solved solved = Solving.solve(model, new Goal.Satisfy());
    assertThat(solved.outcome().ended()).isEqualTo(Why.REFUSED);
    assertThat(solved.outcome().reason()).contains("demand");
  }

  private static String refusal(SolveRequest request) {
    Lowered lowered = backendLowers(JobShop.model(JobShop.FT06), request);
    assertThat(lowered).isInstanceOf(Refusal.class);
    return ((Refusal) lowered).reason();
  }

  private static Lowered backendLowers(Model model, SolveRequest request) {
    return Solving.BACKEND.lower(model, request, new Recording());
  }

  private static Printable printable(Model model) {
    return ((Lowering) backendLowers(model, plain())).facet(Printable.class).orElseThrow();
  }

  private static SolveRequest plain() {
    return Solving.request(Map.of(), 1, Limit.none());
  }

  private static CpModelProto message(List<Domain> domains, List<Constraint> constraints) {
    return lower(domains, constraints).message();
  }

  private static Instance lower(List<Domain> domains, List<Constraint> constraints) {
    Model model = Solving.flat(domains, constraints, Optional.empty());
    return new ModelLowering(model, plain()).lower();
  }
}
