package steelyard.variants.model;

import java.util.Objects;

/**
 * Item i lies in bin {@code bins[i]}, counted from 0, and {@code loads[b]} is the sum of the sizes
 * of the items in bin b; false where an item's bin is outside {@code loads}.
 *
 * @param sizes one per item, each at least 0
 */
public record BinPacking(Views bins, Longs sizes, Views loads) implements Relation {

  public BinPacking {
    Objects.requireNonNull(bins, "bins");
    Objects.requireNonNull(sizes, "sizes");
    Objects.requireNonNull(loads, "loads");
    if (bins.size() != sizes.size()) {
      throw new IllegalArgumentException(bins.size() + " items with " + sizes.size() + " sizes");
    }
    if (sizes.stream().anyMatch(size -> size < 0)) {
      throw new IllegalArgumentException("an item of negative size");
    }
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.binPacking(this);
  }

  @Override
  public BinPacking rewrite(Rewriting rewriting) {
    Views mapped = bins.mapped(rewriting);
    int[] order =
        rewriting.rows(
            mapped.size(),
            (i, j) -> {
              int byBin = mapped.compareRows(i, j);
              return byBin != 0 ? byBin : Long.compare(sizes.get(i), sizes.get(j));
            });
    return new BinPacking(mapped.permuted(order), sizes.permuted(order), loads.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "bin-packing";
  }
}
