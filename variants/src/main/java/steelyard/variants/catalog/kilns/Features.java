package steelyard.variants.catalog.kilns;

import java.util.SortedMap;
import java.util.TreeMap;

/** Numbers that say what is particular about a campaign. */
final class Features {
  private Features() {}

  static SortedMap<String, Double> of(Campaign campaign) {
    SortedMap<String, Double> features = new TreeMap<>();
    int lots = campaign.lots().size();
    features.put("lots", (double) lots);
    features.put("kilns", (double) campaign.kilns().size());
    features.put("firings", (double) campaign.firings().size());
    features.put("days", (double) campaign.works().days());
    features.put("heats", (double) campaign.heats().size());
    features.put("shelf-fill", shelfFill(campaign));
    features.put("large-share", share(campaign.lots().stream().filter(Lot::large).count(), lots));
    features.put(
        "spoiling-share",
        share(campaign.spoilingLots().size(), Math.max(1, lots * (lots - 1L) / 2)));
    features.put("like-lots", (double) LikeLots.alike(campaign).size());
    features.put("like-kilns", (double) LikeKilns.alike(campaign).size());
    features.put("tied-share", share(campaign.lotNumbers().filter(campaign::isTied).count(), lots));
    features.put("due-slack", dueSlack(campaign));
    return features;
  }

  private static double share(long part, long all) {
    return part / (double) all;
  }

  /** Shelves that the lots fill, of all that all firings have. */
  private static double shelfFill(Campaign campaign) {
    long demand = campaign.lots().stream().mapToLong(Lot::shelves).sum();
    long supply =
        campaign.kilns().stream().mapToLong(kiln -> (long) kiln.shelves() * kiln.firings()).sum();
    return share(demand, supply);
  }

  /** Mean days that a lot could wait and still be out when it is due, in days of the campaign. */
  private static double dueSlack(Campaign campaign) {
    double days =
        campaign.lots().stream()
            .mapToInt(lot -> lot.due() - lot.dry() - campaign.heat(lot.coolest()).days())
            .average()
            .orElseThrow();
    return days / campaign.works().days();
  }
}
