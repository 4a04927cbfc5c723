package steelyard.adapters.sat.encoding;

import java.io.IOException;
import java.io.UncheckedIOException;
import steelyard.adapters.spi.Sizes;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Variables;

/**
 * A formula as text in the format of the second DIMACS challenge (1993): comments, the exact counts
 * of variables and clauses, a line for each clause. The comments say which literals stand for which
 * variable and which clauses for which posting.
 */
public final class DimacsText {
  private final Appendable to;

  private DimacsText(Appendable to) {
    this.to = to;
  }

  /**
   * Writes a formula, encoding it once more.
   *
   * @param encoded an encoder that has encoded it
   * @param sizes of the formula
   */
  public static void write(Model model, ModelEncoder encoded, Sizes sizes, Appendable to)
      throws IOException {
    DimacsText text = new DimacsText(to);
    text.variables(model, encoded.integers());
    text.postings(model, encoded.clausesBeforePostings(), sizes.byPosting());
    to.append("p cnf " + sizes.totals().get("variables") + " " + sizes.totals().get("clauses"));
    to.append('\n');
    try {
      encoded.into(text::clause, Limits.NONE).encode();
    } catch (UncheckedIOException e) {
      throw e.getCause();
    }
  }

  private void variables(Model model, Integers integers) throws IOException {
    Variables variables = model.variables();
    for (int v = 0; v < variables.size(); v++) {
      if (integers.has(v) && integers.size(v) > 1) {
        comment("variable " + variables.name(v) + " in " + integers.domain(v) + order(v, integers));
        String equalities = equalities(v, integers);
        if (!equalities.isEmpty()) {
          comment("  " + equalities);
        }
      }
    }
  }

  /** Where the order literals of a variable lie: the first is true from its second value on. */
  private static String order(int variable, Integers integers) {
    int last = integers.size(variable) - 1;
    return ": "
        + integers.order(variable, 1)
        + " says >= "
        + integers.valueAt(variable, 1)
        + (last == 1
            ? ""
            : " .. "
                + integers.order(variable, last)
                + " says >= "
                + integers.valueAt(variable, last));
  }

  private static String equalities(int variable, Integers integers) {
    StringBuilder text = new StringBuilder();
    for (int p = 0; p < integers.size(variable); p++) {
      int literal = integers.equality(variable, p);
      if (literal != 0) {
        text.append(text.isEmpty() ? "" : ", ");
        text.append(literal).append(" says = ").append(integers.valueAt(variable, p));
      }
    }
    return text.toString();
  }

  private void postings(Model model, long before, Longs byPosting) throws IOException {
    long at = before;
    comment("clauses 1.." + at + ": domains");
    for (Posting posting : model.lowered()) {
      long count = byPosting.get(posting.id());
      if (count > 0) {
        comment("clauses " + (at + 1) + ".." + (at + count) + ": " + posting.origin());
        at += count;
      }
    }
  }

  private void comment(String text) throws IOException {
    to.append("c ").append(text.replaceAll("\\R", " ")).append('\n');
  }

  private void clause(int[] literals, int size) {
    try {
      for (int i = 0; i < size; i++) {
        to.append(Integer.toString(literals[i])).append(' ');
      }
      to.append("0\n");
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
