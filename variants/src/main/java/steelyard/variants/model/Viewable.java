package steelyard.variants.model;

/** What can stand in a constraint's scope: a variable, a view of one, a constant. */
public sealed interface Viewable permits View, IntVar {
  View view();
}
