package steelyard.adapters;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.List;
import java.util.ServiceLoader;
import java.util.Set;
import java.util.stream.Stream;
import steelyard.variants.family.Answers;
import steelyard.variants.family.Check;
import steelyard.variants.family.Family;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.Variant;
import steelyard.variants.model.Model;
import steelyard.variants.model.Role;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.ModelBuilder;
import steelyard.variants.model.judge.Evaluator.Judgement;

/** An instance of the family {@code workshop}, of those that are shipped. */
record Shop<I>(Family<I> family, I instance) {
  private static final Path INSTANCES = Path.of("../variants/src/main/share/instances/workshop");

  static Shop<?> of(String instance) {
    for (Family<?> family : ServiceLoader.load(Family.class)) {
      if (family.name().equals("workshop")) {
        return read(family, new InstanceSource(instance, INSTANCES.resolve(instance)));
      }
    }
    throw new AssertionError("no family 'workshop'");
  }

  private static <I> Shop<I> read(Family<I> family, InstanceSource source) {
    try {
      return new Shop<>(family, family.read(source));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** The names of plain and of each amendment with what it requires. */
  Stream<String> variants() {
    Stream<Variant> amended =
        family.amendments().stream()
            .map(a -> Stream.concat(a.requires().stream(), Stream.of(a.name())).toList())
            .map(names -> Variant.of(family, names));
    return Stream.concat(Stream.of(Variant.PLAIN), amended).map(Variant::name);
  }

  /** The model of a variant by name, such as {@code plain+no-overlap}. */
  Model variant(String name) {
    List<String> parts = List.of(name.split("\\+", -1));
    assertThat(parts.get(0)).isEqualTo(Variant.PLAIN.name());
    return Variant.of(family, parts.subList(1, parts.size())).build(family, instance);
  }

  /** The plain model of plans that are done within so many minutes. */
  Model within(int minutes) {
    ModelBuilder builder = new ModelBuilder();
    family.plain(instance, builder.plain());
    Change change = builder.amend("deadline", new Role.Dominance(), Set.of());
    change.group("deadline").post(change.variable("makespan").le(minutes));
    return builder.build();
  }

  /** Fails unless the family's checker finds nothing wrong and the same objective. */
  void assertRight(Model model, Judgement judgement) {
    Check check = family.check(instance, Answers.of(model, judgement));
    assertThat(check).isEqualTo(new Check(List.of(), judgement.objective()));
  }
}
