package pallets;

import static steelyard.variants.family.Amendments.implied;
import static steelyard.variants.family.Amendments.reformulation;
import static steelyard.variants.family.Amendments.search;

import java.io.IOException;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalLong;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import steelyard.variants.family.Amendment;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;
import steelyard.variants.family.Family;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Branching;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Term;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Draft;

/** Pallets of tiles onto trucks, as few trucks as can carry them. */
public final class PalletFamily implements Family<Delivery> {
  private static final String WEIGHT = "what a truck may carry";

  @Override
  public String name() {
    return "pallets";
  }

  @Override
  public String summary() {
    return "which truck takes each pallet, with as few trucks as can carry them";
  }

  @Override
  public Delivery read(InstanceSource source) throws IOException {
    return Delivery.read(source);
  }

  /** The model that is in service and known to be right. */
  @Override
  public void plain(Delivery delivery, Draft draft) {
    List<IntVar> truck =
        all(delivery.pallets(), p -> draft.integer(truck(p), 0, delivery.trucks() - 1));
    List<IntVar> used = all(delivery.trucks(), t -> draft.bool(used(t)));
    for (int t = 0; t < delivery.trucks(); t++) {
      int here = t;
      List<Term> on = truck.stream().map(it -> Term.truth(it.eq(here))).toList();
      Term load = Term.scalar(on, weights(delivery));
      draft.group(WEIGHT).post(load.le(used.get(t).times(delivery.capacity())));
    }
    draft.minimize(Term.sum(used));
  }

  /** The changes to weigh. Each claims a role, and the tool holds it to that. */
  @Override
  public List<Amendment<Delivery>> amendments() {
    return List.of(
        reformulation(
            "packing", "one bin-packing constraint instead of a sum per truck", this::packing),
        implied("enough-trucks", "the trucks in use can carry all the weight", this::enough),
        new TwinsInOrder(),
        search("heaviest-first", "decide the heaviest pallet first", this::heaviestFirst));
  }

  private void packing(Delivery delivery, Change change) {
    change.withdraw(WEIGHT);
    List<IntVar> loads =
        all(delivery.trucks(), t -> change.integer("load[" + t + "]", 0, delivery.capacity()));
    change
        .group("each pallet weighs on its truck")
        .post(
            new BinPacking(
                Views.of(trucks(delivery, change)),
                Longs.of(weights(delivery)),
                Views.of(loads)));
    for (int t = 0; t < delivery.trucks(); t++) {
      Term most = change.variable(used(t)).times(delivery.capacity());
      change.group("no load on a truck that stays").post(loads.get(t).le(most));
    }
  }

  private void enough(Delivery delivery, Change change) {
    long needed = (delivery.totalWeight() + delivery.capacity() - 1) / delivery.capacity();
    List<IntVar> used = all(delivery.trucks(), t -> change.variable(used(t)));
    change.group("enough trucks").post(Term.sum(used).ge(needed));
  }

  private void heaviestFirst(Delivery delivery, Change change) {
    List<IntVar> heaviest =
        IntStream.range(0, delivery.pallets())
            .boxed()
            .sorted(Comparator.comparing(p -> -delivery.weights().get(p)))
            .map(p -> change.variable(truck(p)))
            .toList();
    change.branch(
        Views.of(heaviest), Branching.VariableOrder.INPUT, Branching.ValueOrder.MIN);
  }

  /** Written without a look at the model: this is what answers are held against. */
  @Override
  public Check check(Delivery delivery, Answer answer) {
    long[] loads = loads(delivery, answer);
    List<String> problems = new ArrayList<>();
    int used = 0;
    for (int t = 0; t < delivery.trucks(); t++) {
      used += answer.value(used(t));
      if (loads[t] > 0 && answer.value(used(t)) == 0) {
        problems.add("truck " + t + " stays and carries " + loads[t] + " kg");
      }
      if (loads[t] > delivery.capacity()) {
        problems.add("truck " + t + " carries " + loads[t] + " kg of " + delivery.capacity());
      }
    }
    return new Check(problems, OptionalLong.of(used));
  }

  @Override
  public String show(Delivery delivery, Answer answer) {
    long[] loads = loads(delivery, answer);
    StringBuilder text = new StringBuilder();
    for (int t = 0; t < delivery.trucks(); t++) {
      if (loads[t] > 0) {
        text.append("truck ").append(t).append(": ").append(loads[t]).append(" kg, pallets");
        for (int p = 0; p < delivery.pallets(); p++) {
          text.append(answer.value(truck(p)) == t ? " " + p : "");
        }
        text.append('\n');
      }
    }
    return text.append("Axle loads and securing: as local rules and the haulier say.\n").toString();
  }

  private static long[] loads(Delivery delivery, Answer answer) {
    long[] loads = new long[delivery.trucks()];
    for (int p = 0; p < delivery.pallets(); p++) {
      loads[answer.value(truck(p))] += delivery.weights().get(p);
    }
    return loads;
  }

  static List<IntVar> trucks(Delivery delivery, Change change) {
    return all(delivery.pallets(), p -> change.variable(truck(p)));
  }

  private static long[] weights(Delivery delivery) {
    return delivery.weights().stream().mapToLong(Integer::longValue).toArray();
  }

  private static List<IntVar> all(int count, IntFunction<IntVar> each) {
    return IntStream.range(0, count).mapToObj(each).toList();
  }

  static String truck(int pallet) {
    return "truck[" + pallet + "]";
  }

  private static String used(int truck) {
    return "used[" + truck + "]";
  }
}
