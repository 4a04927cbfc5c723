package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatExceptionOfType;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.variants.family.InstanceException;

class CampaignReaderTest {
  /** The campaign made by hand; line 1 is its title, line 2 a comment. */
  private static final List<String> LINES =
      CampaignText.of(Campaigns.byHand(), "by hand").lines().toList();

  @TempDir private Path folder;

  @Test
  void reads_what_is_written() {
    assertThat(read(LINES)).isEqualTo(Campaigns.byHand());
  }

  @Test
  void skips_comments_and_blanks_and_takes_lines_in_any_order_of_keywords() {
    List<String> lines = new ArrayList<>(List.of("# first", "", LINES.get(0)));
    List<String> second = LINES.stream().filter(line -> line.startsWith("second")).toList();
    lines.addAll(second);
    LINES.stream()
        .skip(1)
        .filter(line -> !second.contains(line))
        .forEach(line -> lines.add("  " + line.replace(" ", "\t ") + "  "));
    assertThat(read(lines)).isEqualTo(Campaigns.byHand());
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          kiln-campaign 1 | kiln-campaign 2 | text:1: 'kiln-campaign 2' where the file must begin with 'kiln-campaign 1'
          gas 3 step | gas 3 stop | text:3: works 100: no field 'stop'; a works has days, crew, gas, step
          works 100 days 9 | works 100 | text:3: works 100: the field 'days' is missing; a works has days, crew, gas, step
          works 100 | works x | text:3: works x: its number 'x' must be a whole number from 0 to 100000
          crew 1 | crew 0 | text:3: works 100: crew '0' must be a whole number from 1 to 100000
          crew 1 | crew -1 | text:3: works 100: crew '-1' must be a whole number from 1 to 100000
          crew 1 | crew 1 crew 2 | text:3: 'crew' comes twice; remove one of them
          step 1 | step | text:3: 'step' stands alone at the end; a line is a keyword, a name, then words and values in pairs
          heat 2 fire | heat 3 fire | text:5: heat 3: number 2 must come here; they count from 1
          to 3,0 | to 3 | text:7: change 2: to must be 2 numbers between commas, and are 1
          to 3,0 | to 3, | text:7: change 2: to '' must be a whole number from 0 to 100000
          kind fuming | kind smoky | text:9: glaze copper: no kind 'smoky'; there is plain, fuming, pale
          glaze copper | glaze clear | text:9: glaze clear: there is one of that name already; give it another
          glaze copper | glaze c_u | text:9: glaze c_u: a name is a letter, then up to 11 letters, digits or hyphens
          copper with white | copper with blue | text:11: spoils copper: no glaze 'blue'; there is clear, copper, white
          copper with white | copper with copper | text:11: spoils copper: these must be two; name another
          hottest 2 set 1 | hottest 3 set 1 | text:12: kiln A: hottest '3' must be a whole number from 1 to 2
          hottest 2 set 1 | hottest 2 set 3 | text:12: kiln A: set '3' must be a whole number from 1 to 2
          shelves 4 wide 2 | shelves 4 wide 5 | text:12: kiln A: wide '5' must be a whole number from 0 to 4
          fuel 5,7 | fuel 5,7,9 | text:12: kiln A: fuel must be 2 numbers between commas, and are 3
          repair B | repair C | text:14: repair C: no kiln 'C'; there is A, B
          until 3 | until 2 | text:14: repair B: until '2' must be a whole number from 3 to 9
          format large | format huge | text:15: lot L1: no format 'huge'; there is small, large
          heats 1-2 | heats 2-1 | text:16: lot L2: heats '1' must be a whole number from 2 to 2
          heats 1-2 | heats 1 | text:16: lot L2: heats '1' must be a span such as 1-2
          glaze white dry | glaze pink dry | text:17: lot L3: no glaze 'pink'; there is clear, copper, white
          lot L3 shelves 1 | lot L3 shelves 5 | text:17: lot L3: no kiln is hot enough and has the shelves for it
          latest 6 | latest 10 | text:15: lot L1: latest '10' must be a whole number from 0 to 9
          after L1 | after L9 | text:18: second L2: no lot 'L9'; there is L1, L2, L3
          second L2 | third L2 | text:18: third L2: no such keyword; a line begins with one of [works, heat, change, glaze, spoils, kiln, repair, lot, together, second]
          """)
  void says_where_and_what_to_do_whenGiven(String text, String instead, String message) {
    List<String> lines = LINES.stream().map(line -> replaced(line, text, instead)).toList();
    assertThat(lines).isNotEqualTo(LINES);
    assertThatExceptionOfType(InstanceException.class)
        .isThrownBy(() -> read(lines))
        .withMessage(message);
  }

  private static String replaced(String line, String text, String instead) {
    return line.contains(text) ? line.replace(text, instead) : line;
  }

  @ParameterizedTest
  @CsvSource({"works", "heat", "change", "glaze", "kiln", "lot"})
  void says_what_is_missing_whenGiven_no(String keyword) {
    List<String> lines =
        LINES.stream()
            .filter(line -> !line.startsWith(keyword + " ") && !line.startsWith("second"))
            .toList();
    assertThatExceptionOfType(InstanceException.class)
        .isThrownBy(() -> read(lines))
        .withMessageStartingWith("text:" + lines.size() + ": ")
        .withMessageContaining("'" + keyword + " ...'; add it");
  }

  @Test
  void says_so_whenGiven_nothing() {
    assertThatExceptionOfType(InstanceException.class)
        .isThrownBy(() -> read(List.of()))
        .withMessage("text:1: nothing here; begin with 'kiln-campaign 1'");
  }

  @Test
  void says_so_whenGiven_two_works_a_row_of_changes_too_few_or_repairs_that_overlap() {
    assertThatExceptionOfType(InstanceException.class)
        .isThrownBy(() -> read(with(3, LINES.get(2))))
        .withMessage("text:4: works 100: there is one already, in line 3");
    assertThatExceptionOfType(InstanceException.class)
        .isThrownBy(() -> read(LINES.stream().filter(l -> !l.startsWith("change 2")).toList()))
        .withMessage(
            "text:6: change 1: there are 2 heats; give each one line of what changes cost");
    assertThatExceptionOfType(InstanceException.class)
        .isThrownBy(() -> read(with(14, "repair B from 2 until 4")))
        .withMessage("text:15: repair B: from '2' must be a whole number from 3 to 8");
  }

  private static List<String> with(int at, String line) {
    List<String> lines = new ArrayList<>(LINES);
    lines.add(at, line);
    return lines;
  }

  /** Whatever a slip of the hand leaves, the reader reads it or says in one line what is wrong. */
  @Test
  void never_fails_in_any_other_way_whenGiven_slips() {
    SplittableRandom random = new SplittableRandom(5);
    int refused = 0;
    for (int i = 0; i < 2000; i++) {
      List<String> lines = new ArrayList<>(LINES);
      int line = random.nextInt(lines.size());
      List<String> words = new ArrayList<>(List.of(lines.get(line).split(" ", -1)));
      int word = random.nextInt(words.size());
      switch (random.nextInt(5)) {
        case 0 -> words.remove(word);
        case 1 -> words.add(word, words.get(random.nextInt(words.size())));
        case 2 -> words.set(word, "99999999999");
        case 3 -> words.set(word, "é,-");
        default -> words.clear();
      }
      lines.set(line, String.join(" ", words));
      try {
        read(lines);
      } catch (InstanceException e) {
        refused++;
        assertThat(e.getMessage()).startsWith("text:").hasLineCount(1);
      }
    }
    assertThat(refused).isGreaterThan(1000);
  }

  private Campaign read(List<String> lines) {
    return Campaigns.read(folder, lines.toArray(String[]::new));
  }
}
