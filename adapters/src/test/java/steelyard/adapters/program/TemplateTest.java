package steelyard.adapters.program;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;

class TemplateTest {
  private static final Path FILE = Path.of("/a run/$1.cnf");

  @Test
  void fills_in_placeholders_wordByWord() {
    Template template =
        Template.of("  solver --seed={seed}  -t {seconds} \"-j {threads}\" {cnf} {cnf}.x ");
    assertThat(template.program()).isEqualTo("solver");
    assertThat(template.solving(FILE, 7, 12, 2))
        .containsExactly(
            "solver", "--seed=7", "-t", "12", "-j 2", "/a run/$1.cnf", "/a run/$1.cnf.x");
  }

  @Test
  void keeps_seeds_small_andAtLeastASecond() {
    List<String> line = Template.of("s {seed} {seconds}").solving(FILE, Long.MAX_VALUE, -3, 1);
    assertThat(line).containsExactly("s", Long.toString(Long.MAX_VALUE % 1_000_000_000), "1");
    assertThat(Template.of("s {seed}").solving(FILE, -1, 0, 1)).containsExactly("s", "999999999");
  }

  @Test
  void names_what_it_does_not_know() {
    Template template = Template.of("s {cnf} {sede} {}");
    assertThat(template.unknown(List.of("cnf", "seed"))).hasValue("sede");
    assertThat(template.unknown(List.of("cnf", "sede"))).hasValue("");
    assertThat(template.unknown(List.of("cnf", "sede", ""))).isEmpty();
    assertThat(template.has("cnf")).isTrue();
    assertThat(template.has("seed")).isFalse();
  }
}
