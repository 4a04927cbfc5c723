package steelyard.harness.sweep;

import java.nio.file.Path;
import java.util.Optional;
import steelyard.harness.sweep.text.Field;
import steelyard.harness.sweep.text.Mistakes;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.harness.sweep.text.Utf8;

/**
 * Reads the YAML file that describes one sweep.
 *
 * <p>The shortest file names a sweep, a family, its variants and the backends; the rest has
 * defaults:
 *
 * <pre>
 * name: mould-shop-formulations
 * family: workshop
 * variants: {one-at-a-time: all}
 * backends: [sat, cpsat]
 * </pre>
 *
 * <table>
 * <caption>Keys</caption>
 * <tr><td>name</td><td>letters, digits, dot, dash, underscore; needed</td></tr>
 * <tr><td>notes</td><td>the person's own words</td></tr>
 * <tr><td>family</td><td>one family's name; or
 *     {@code families}: a list of entries that have family, variants, instances, in-service and
 *     pairs of their own</td></tr>
 * <tr><td>family-jars</td><td>jars with families of your own: a path, a list, or by alias, {@code
 *     {old: a.jar, new: b.jar}}, after which {@code plain@old} is a variant</td></tr>
 * <tr><td>variants</td><td>names such as {@code plain} and {@code plain+a+b};
 *     {@code {all-subsets-of: [a, b]}}, {@code {one-at-a-time: [a, b]}}, with {@code all} for the
 *     whole list, and {@code onto: plain+c} for what they are added to; or a list of all
 *     these</td></tr>
 * <tr><td>backends</td><td>a list of names, or entries with {@code name}, {@code backend},
 *     {@code options}, {@code threads}, and {@code settings}: options by setting name</td></tr>
 * <tr><td>instances</td><td>names and patterns with * and ? among the family's own; or selections
 *     {@code {folder: , set: , class: , names: }}; all that the family ships by default</td></tr>
 * <tr><td>seeds</td><td>a count or a list; seed 0 by default</td></tr>
 * <tr><td>limits</td><td>{@code wall} (60 s), {@code memory} (2 GB), {@code threads} (1), and
 *     {@code work}: an amount for each backend, {@code {cpsat: 5 deterministic-seconds}}, under
 *     which wall is the safety net (600 s); {@code build} (60 s): reading an instance and building
 *     its model</td></tr>
 * <tr><td>in-service</td><td>{@code VARIANT on NAME}; plain on the first backend by
 *     default</td></tr>
 * <tr><td>pairs</td><td>lists of before and after; each against the one in service by
 *     default</td></tr>
 * <tr><td>tie-margin</td><td>{@code 5 %}, or {@code {share: 5 %, time: 50 ms}}, which is the
 *     default</td></tr>
 * <tr><td>penalty</td><td>what a run without an answer counts as, in limits; 2 by
 *     default</td></tr>
 * <tr><td>cores</td><td>how many the runs may hold at a time; by default those of one run</td></tr>
 * <tr><td>block-size</td><td>runs in a block at most; 8 by default</td></tr>
 * </table>
 *
 * <p>Anchors, aliases and tags of YAML are refused, and so is a file of more than 1 MB.
 */
public final class SweepFile {

  private static final int LARGEST = 1_000_000;

  private SweepFile() {}

  /** The sweep that a file describes, on backends as the catalogue describes them. */
  public static Sweep read(Path file, Catalogue catalogue) {
    return read(file, catalogue, Builds.DESCRIBED);
  }

  /**
   * The jars with families that a file names.
   *
   * @param file relative paths in it start from its folder
   * @throws SweepProblem if it cannot be read, or a jar is not there
   */
  public static FamilyJars familyJars(Path file) {
    String shown = file.toString();
    Mistakes mistakes = new Mistakes();
    Field root = Field.ofYaml(shown, Utf8.read(file, shown, LARGEST), mistakes);
    Optional<Field> jars =
        root.hasKeys()
            ? Optional.ofNullable(root.entries().get(SweepReader.FAMILY_JARS))
            : Optional.empty();
    FamilyJars read =
        jars.map(field -> FamilyJars.read(field, file.toAbsolutePath().getParent()))
            .orElse(FamilyJars.none());
    mistakes.throwIfAny();
    return read;
  }

  /**
   * The sweep that a file describes. Reads also the instances that it names.
   *
   * @param file relative paths in it start from its folder
   * @param builds which build of a backend runs
   * @throws SweepProblem with every mistake in the file, if there is any
   */
  public static Sweep read(Path file, Catalogue catalogue, Builds builds) {
    String shown = file.toString();
    Mistakes mistakes = new Mistakes();
    String text = Utf8.read(file, shown, LARGEST);
    Field root = Field.ofYaml(shown, text, mistakes);
    Path folder = file.toAbsolutePath().getParent();
    return new SweepReader(catalogue, builds, folder, text, mistakes).read(root);
  }
}
