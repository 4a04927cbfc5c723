package steelyard.harness.sweep.text;

import java.math.BigDecimal;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Reads numbers with a unit, as people write them: {@code 10s}, {@code 1.5 h}, {@code 2 GB}, {@code
 * 5 %}, {@code 100000 conflicts}.
 *
 * <p>Every method throws {@link IllegalArgumentException} with what is wrong and what is allowed.
 * Sizes follow IEC 80000-13: kB, MB, GB are powers of 1000, KiB, MiB, GiB powers of 1024.
 */
public final class Quantities {

  private static final Pattern NUMBER_UNIT =
      Pattern.compile("(-?[0-9]{1,15}(?:\\.[0-9]{1,9})?)\\s*(\\S*)");

  private static final BigDecimal HUNDRED = BigDecimal.valueOf(100);
  private static final BigDecimal WEEK = BigDecimal.valueOf(7 * 24 * 3600);

  private static final Map<String, BigDecimal> SECONDS =
      Map.of(
          "ms",
          new BigDecimal("0.001"),
          "s",
          BigDecimal.ONE,
          "min",
          BigDecimal.valueOf(60),
          "h",
          BigDecimal.valueOf(3600));
  private static final List<String> TIME_UNITS = List.of("ms", "s", "min", "h");

  private static final Map<String, BigDecimal> BYTES =
      Map.of(
          "kB", BigDecimal.valueOf(1000L),
          "MB", BigDecimal.valueOf(1000_000L),
          "GB", BigDecimal.valueOf(1000_000_000L),
          "KiB", BigDecimal.valueOf(1L << 10),
          "MiB", BigDecimal.valueOf(1L << 20),
          "GiB", BigDecimal.valueOf(1L << 30));
  private static final List<String> SIZE_UNITS = List.of("kB", "MB", "GB", "KiB", "MiB", "GiB");

  /** A number and the unit it stands in. */
  public record Measured(BigDecimal amount, String unit) {}

  private Quantities() {}

  /** A duration in seconds, positive, at most a week. */
  public static double seconds(String text) {
    Measured time = measured(text, "a duration", TIME_UNITS, "10 s");
    BigDecimal seconds = time.amount().multiply(SECONDS.get(time.unit()));
    if (seconds.signum() <= 0) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is no time at all");
    }
    if (seconds.compareTo(WEEK) > 0) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is longer than a week");
    }
    return seconds.doubleValue();
  }

  /** A size in bytes, at least 1 MB and at most 2^50; a part of a byte is dropped. */
  public static long bytes(String text) {
    Measured size = measured(text, "a size", SIZE_UNITS, "2 GB");
    BigDecimal bytes = size.amount().multiply(BYTES.get(size.unit()));
    if (bytes.compareTo(BYTES.get("MB")) < 0) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is less than 1 MB");
    }
    if (bytes.compareTo(BigDecimal.valueOf(1L << 50)) > 0) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is more than any machine has");
    }
    return bytes.longValue();
  }

  /** A share from a percentage: 0.05 for {@code 5%}; at least 0, at most 1. */
  public static double share(String text) {
    BigDecimal percent = measured(text, "a share", List.of("%"), "5 %").amount();
    if (percent.signum() < 0 || percent.compareTo(HUNDRED) > 0) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is not in 0 % .. 100 %");
    }
    return percent.divide(HUNDRED).doubleValue();
  }

  /**
   * A positive amount of one of these units.
   *
   * @param units at least one
   */
  public static Measured amount(String text, List<String> units) {
    Measured work = measured(text, "an amount of work", units, "1000 " + units.get(0));
    if (work.amount().signum() <= 0) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is no work at all");
    }
    return work;
  }

  private static Measured measured(String text, String what, List<String> units, String example) {
    Matcher matcher = NUMBER_UNIT.matcher(text.strip());
    String allowed = "; write a number and a unit (" + String.join(", ", units) + "): " + example;
    if (!matcher.matches()) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " is not " + what + allowed);
    }
    String unit = matcher.group(2);
    if (unit.isEmpty()) {
      throw new IllegalArgumentException(Phrases.quoted(text) + " has no unit" + allowed);
    }
    if (!units.contains(unit)) {
      throw new IllegalArgumentException(Phrases.unknown("unit", unit, units) + allowed);
    }
    return new Measured(new BigDecimal(matcher.group(1)), unit);
  }
}
