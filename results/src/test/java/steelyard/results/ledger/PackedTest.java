package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

class PackedTest {

  private static final String FIRST = RunRecords.toJson(Sample.run("3fa2c9d1").record());
  private static final String SECOND =
      RunRecords.toJson(Sample.run("77b0c9d1").instance("week-08").record());

  @Test
  void unpacks_what_was_packed() throws IOException {
    for (String text : new String[] {"", "kiln", FIRST, "über ".repeat(100_000)}) {
      assertThat(Packed.unpack(Packed.pack(text, ""), "")).isEqualTo(text);
      assertThat(Packed.unpack(Packed.pack(text, FIRST), FIRST)).isEqualTo(text);
    }
  }

  @Test
  void takes_less_than_half_the_room_given_a_text_that_resembles_it() {
    assertThat(Packed.pack(SECOND, FIRST).length).isLessThan(Packed.pack(SECOND, "").length / 2);
  }

  @Test
  void says_so_given_damage_at_any_byte_a_cut_or_another_basis() {
    byte[] packed = Packed.pack(SECOND, FIRST);
    for (int i = 0; i < packed.length; i++) {
      byte[] damaged = packed.clone();
      damaged[i] ^= 0x10;
      assertThatThrownBy(() -> Packed.unpack(damaged, FIRST))
          .as("byte %d of %d", i, packed.length)
          .isInstanceOf(IOException.class);
    }
    byte[] cut = Arrays.copyOf(packed, packed.length - 1);
    assertThatThrownBy(() -> Packed.unpack(cut, FIRST)).isInstanceOf(IOException.class);
    assertThatThrownBy(() -> Packed.unpack(packed, SECOND)).isInstanceOf(IOException.class);
    assertThatThrownBy(() -> Packed.unpack(packed, "")).isInstanceOf(IOException.class);
  }
}
