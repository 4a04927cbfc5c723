package steelyard.variants.model;

import java.util.Objects;

/**
 * A named variable of a model, as whoever writes the model holds it.
 *
 * @param name unique within the model
 * @param id dense, from 0, in order of declaration
 */
public record IntVar(String name, int id) implements Term, Viewable {

  public IntVar {
    Objects.requireNonNull(name, "name");
    if (id < 0) {
      throw new IllegalArgumentException("variable ids start at 0, was " + id);
    }
  }

  @Override
  public View view() {
    return View.of(id);
  }

  /** This plus {@code delta}, for a constraint's scope. */
  public View shifted(int delta) {
    return view().shifted(delta);
  }

  @Override
  public String toString() {
    return name;
  }
}
