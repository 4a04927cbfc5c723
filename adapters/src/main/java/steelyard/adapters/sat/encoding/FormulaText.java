package steelyard.adapters.sat.encoding;

import java.io.IOException;
import java.util.Collections;
import java.util.SortedSet;
import java.util.TreeSet;
import steelyard.adapters.spi.Printable;
import steelyard.adapters.spi.Sizes;
import steelyard.variants.model.Model;

/** Writes a model's formula in open formats, encoding it once more. */
public final class FormulaText implements Printable {
  private static final String DIMACS = "dimacs";

  private final Model model;
  private final ModelEncoder encoded;
  private final Sizes sizes;

  /**
   * The text of one formula.
   *
   * @param encoded an encoder that has encoded it
   * @param sizes of the formula
   */
  public FormulaText(Model model, ModelEncoder encoded, Sizes sizes) {
    this.model = model;
    this.encoded = encoded;
    this.sizes = sizes;
  }

  @Override
  public SortedSet<String> formats() {
    return Collections.unmodifiableSortedSet(new TreeSet<>(Collections.singleton(DIMACS)));
  }

  @Override
  public void print(String format, Appendable to) throws IOException {
    if (!format.equals(DIMACS)) {
      throw new IllegalArgumentException("a formula is written as dimacs, not '" + format + "'");
    }
    DimacsText.write(model, encoded, sizes, to);
  }
}
