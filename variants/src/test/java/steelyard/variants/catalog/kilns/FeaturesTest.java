package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class FeaturesTest {
  /** Three lots of five shelves; four firings, two of four shelves and two of three. */
  @Test
  void count_and_measure_the_campaign() {
    assertThat(Features.of(Campaigns.byHand()))
        .containsEntry("lots", 3.0)
        .containsEntry("kilns", 2.0)
        .containsEntry("firings", 4.0)
        .containsEntry("days", 9.0)
        .containsEntry("heats", 2.0)
        .containsEntry("shelf-fill", 5.0 / 14)
        .containsEntry("large-share", 1.0 / 3)
        .containsEntry("spoiling-share", 1.0 / 3)
        .containsEntry("tied-share", 2.0 / 3)
        .containsEntry("like-lots", 0.0)
        .containsEntry("like-kilns", 0.0)
        .containsEntry("due-slack", (0 + 1 + 1) / 3.0 / 9);
  }
}
