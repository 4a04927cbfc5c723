package steelyard.variants.model;

/** A value for each variable. */
@FunctionalInterface
public interface Assignment {
  int value(int variable);

  /** The value of {@code view}. */
  default int value(View view) {
    return view.isConstant() ? view.offset() : view.apply(value(view.variable()));
  }

  /** The value of row {@code i} of {@code views}. */
  default int value(Views views, int i) {
    return views.isConstant(i)
        ? views.offset(i)
        : views.sign(i) * value(views.variable(i)) + views.offset(i);
  }

  default boolean holds(Atom atom) {
    return atom.holds(atom.isConstant() ? 0 : value(atom.variable()));
  }
}
