package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * The table's form is that of proc(5) and fstab(5): six fields, blanks in names as {@code \040}.
 */
class MountsTest {

  private static final Mounts MOUNTS =
      Mounts.parse(
          """
          /dev/vda / ext4 rw,relatime 0 0
          proc /proc proc rw 0 0
          store:/home /home nfs4 rw,vers=4.2 0 0
          /dev/vdb /home/kiln/local ext4 rw 0 0
          //office/share /mnt/tile\\040works cifs rw 0 0
          /dev/vdc /data xfs rw 0 0
          store:/data /data nfs rw 0 0
          """);

  @Test
  void tells_the_type_of_a_shared_file_system() {
    assertThat(MOUNTS.shared(Path.of("/home/kiln/ledger.db"))).contains("nfs4");
    assertThat(MOUNTS.shared(Path.of("/mnt/tile works/ledger.db"))).contains("cifs");
  }

  @Test
  void says_nothing_of_a_local_one_also_below_a_shared_one() {
    assertThat(MOUNTS.shared(Path.of("/var/ledger.db"))).isEmpty();
    assertThat(MOUNTS.shared(Path.of("/home/kiln/local/ledger.db"))).isEmpty();
    assertThat(MOUNTS.shared(Path.of("/homestead/ledger.db"))).isEmpty();
  }

  @Test
  void takes_the_later_given_two_mounts_on_one_point() {
    assertThat(MOUNTS.shared(Path.of("/data/ledger.db"))).contains("nfs");
  }

  @Test
  void passes_over_lines_that_are_none() {
    assertThat(Mounts.parse("\nodd\n").entries()).isEmpty();
    assertThat(new Mounts(List.of()).shared(Path.of("/ledger.db"))).isEmpty();
  }
}
