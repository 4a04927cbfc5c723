package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Implied constraints from sets of lots of which no two can share a firing. */
final class Conflicts {
  private final Campaign campaign;

  private Conflicts(Campaign campaign) {
    this.campaign = campaign;
  }

  /**
   * Of lots that pairwise cannot share a firing of a kiln, each firing holds at most one. Two
   * cannot where their glazes spoil each other, where no heat matures both, where the kiln has not
   * the shelves for both, and where one is the second fire of the other.
   */
  static void cliques(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    Conflicts conflicts = new Conflicts(campaign);
    Group group = change.group("at most one of lots that exclude each other");
    for (int kiln = 0; kiln < campaign.kilns().size(); kiln++) {
      Set<List<Integer>> cliques = conflicts.cliquesIn(campaign.kilns().get(kiln));
      for (Firing firing : board.firingsOf(kiln)) {
        for (List<Integer> clique : cliques) {
          group.post(Term.sum(clique.stream().map(lot -> board.in(lot, firing)).toList()).le(1));
        }
      }
    }
  }

  /** Cliques of three lots or more, one grown from each lot where that is possible. */
  private Set<List<Integer>> cliquesIn(Kiln kiln) {
    List<Integer> lots =
        campaign
            .lotNumbers()
            .filter(lot -> campaign.takes(kiln, campaign.lot(lot)))
            .boxed()
            .toList();
    List<Integer> byDegree =
        lots.stream()
            .sorted(
                Comparator.comparingLong(
                    (Integer lot) -> -lots.stream().filter(m -> excludes(lot, m, kiln)).count()))
            .toList();
    Set<List<Integer>> cliques = new LinkedHashSet<>();
    for (int first : lots) {
      List<Integer> clique = new ArrayList<>(List.of(first));
      for (int lot : byDegree) {
        if (clique.stream().allMatch(member -> excludes(lot, member, kiln))) {
          clique.add(lot);
        }
      }
      if (clique.size() > 2) {
        cliques.add(clique.stream().sorted().toList());
      }
    }
    return cliques;
  }

  /** Whether no firing of the kiln can hold both. */
  private boolean excludes(int one, int other, Kiln kiln) {
    Lot a = campaign.lot(one);
    Lot b = campaign.lot(other);
    boolean isTooMuch =
        a.shelves() + b.shelves() > kiln.shelves()
            || (a.large() && b.large() && a.shelves() + b.shelves() > kiln.wide());
    boolean isNoHeat =
        Math.max(a.coolest(), b.coolest())
            > Math.min(kiln.hottest(), Math.min(a.hottest(), b.hottest()));
    return one != other
        && (isTooMuch || isNoHeat || campaign.areSpoilers(a, b) || areFirstAndSecond(one, other));
  }

  private boolean areFirstAndSecond(int one, int other) {
    return campaign.seconds().stream()
        .anyMatch(s -> new Pair(s.first(), s.second()).isOf(one, other));
  }
}
