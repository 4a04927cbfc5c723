package steelyard.variants.family;

import java.io.IOException;
import java.util.List;
import steelyard.variants.model.build.Draft;

/**
 * One problem: how to read its instances, its plain model, the changes to weigh, an independent
 * checker. Found through {@link java.util.ServiceLoader}; the class has a public constructor
 * without parameters and keeps no state.
 *
 * @param <I> what an instance is in memory
 */
public interface Family<I> {
  /** The family's name in sweep files: lower case, digits and hyphens. */
  String name();

  /** What is decided, in one sentence. */
  String summary();

  /**
   * Reads an instance.
   *
   * @throws InstanceException if the file does not hold an instance; says where and what to do
   * @throws IOException if it cannot be read
   */
  I read(InstanceSource source) throws IOException;

  /**
   * Writes the plain model: the one that is known to be right. Two calls on equal instances write
   * the same model, in the same order.
   */
  void plain(I instance, Draft draft);

  /** Every amendment, in the order in which they apply. */
  List<Amendment<I>> amendments();

  /**
   * Checks an answer in plain code that shares nothing with the model.
   *
   * @return what is wrong, in the family's own words, and the objective that the answer has
   */
  Check check(I instance, Answer answer);

  /**
   * The answer as whoever asked for it reads it: lines of at most 80 columns.
   *
   * @param answer one that was checked
   */
  String show(I instance, Answer answer);
}
