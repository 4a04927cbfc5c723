package steelyard.variants.model.sample;

import java.lang.reflect.RecordComponent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/** Writes a sketch as the Java expression that makes it, for a test that keeps a found fault. */
public final class JavaText {
  private JavaText() {}

  /** A test method around the sketch. */
  public static String test(Sketch sketch, String name) {
    return """
        @Test
        void %s() {
          assertAgreed(
              %s);
        }
        """
        .formatted(name, of(sketch));
  }

  static String of(Object value) {
    if (value instanceof Optional<?> it) {
      return it.map(inner -> "Optional.of(" + of(inner) + ")").orElse("Optional.empty()");
    } else if (value instanceof List<?> it) {
      return it.stream().map(JavaText::of).collect(Collectors.joining(", ", "List.of(", ")"));
    } else if (value instanceof Enum<?> it) {
      return nested(it.getDeclaringClass()) + "." + it.name();
    } else if (value instanceof String it) {
      return '"' + it + '"';
    } else if (value instanceof Long it) {
      return it + "L";
    } else if (value instanceof Record it) {
      return shortened(it);
    }
    return flat(value);
  }

  private static String shortened(Record it) {
    if (it instanceof IntVar variable) {
      return "new IntVar(\"" + variable.name() + "\", " + variable.id() + ")";
    } else if (it instanceof Atom atom && atom.isConstant()) {
      return atom.equals(Atom.TRUE) ? "Atom.TRUE" : "Atom.FALSE";
    } else if (it instanceof View view && view.isConstant()) {
      return "View.constant(" + view.offset() + ")";
    } else if (it instanceof Tasks tasks) {
      return "Tasks.of(" + of(tasks.asList()) + ")";
    }
    List<String> parts = new ArrayList<>();
    for (RecordComponent component : it.getClass().getRecordComponents()) {
      parts.add(of(read(component, it)));
    }
    return "new " + nested(it.getClass()) + "(" + String.join(", ", parts) + ")";
  }

  private static Object read(RecordComponent component, Record record) {
    try {
      return component.getAccessor().invoke(record);
    } catch (ReflectiveOperationException e) {
      throw new IllegalStateException("the parts of a record can be read", e);
    }
  }

  private static String nested(Class<?> type) {
    return type.getEnclosingClass() == null
        ? type.getSimpleName()
        : nested(type.getEnclosingClass()) + "." + type.getSimpleName();
  }

  /** The value classes that keep numbers flat. */
  private static String flat(Object value) {
    if (value instanceof Views it) {
      return "Views.of(" + of(it.stream().toList()) + ")";
    } else if (value instanceof Atoms it) {
      return "Atoms.of(" + of(it.stream().toList()) + ")";
    } else if (value instanceof Ints it) {
      return "Ints.of(" + joined(it.stream().mapToObj(Integer::toString).toList()) + ")";
    } else if (value instanceof Longs it) {
      return "Longs.of(" + joined(it.stream().mapToObj(each -> each + "L").toList()) + ")";
    } else if (value instanceof Tuples it) {
      return "Tuples.of(" + it.arity() + ", List.of(" + joined(rows(it)) + "))";
    } else if (value instanceof Domain it) {
      return "Domain.ofRanges("
          + joined(
              IntStream.range(0, it.ranges()).mapToObj(r -> it.from(r) + ", " + it.to(r)).toList())
          + ")";
    }
    return value.toString();
  }

  private static List<String> rows(Tuples tuples) {
    return IntStream.range(0, tuples.size())
        .mapToObj(
            r ->
                IntStream.range(0, tuples.arity())
                    .map(c -> tuples.get(r, c))
                    .mapToObj(v -> v == Tuples.ANY ? "Tuples.ANY" : Integer.toString(v))
                    .collect(Collectors.joining(", ", "new int[] {", "}")))
        .toList();
  }

  private static String joined(List<String> parts) {
    return String.join(", ", parts);
  }
}
