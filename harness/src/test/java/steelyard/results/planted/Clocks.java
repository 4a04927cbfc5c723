package steelyard.results.planted;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.databind.ObjectMapper;
import gg.jte.TemplateEngine;
import me.tongfei.progressbar.ProgressBar;
import org.flywaydb.core.Flyway;
import org.jdbi.v3.core.Jdbi;
import org.knowm.xchart.XYChart;
import oshi.SystemInfo;
import picocli.CommandLine;

/** Reads the time of day, writes to standard output, starts a process, and uses every library. */
public final class Clocks {
  static final Class<?>[] LIBRARIES = {
    JsonFactory.class,
    ObjectMapper.class,
    TemplateEngine.class,
    ProgressBar.class,
    Flyway.class,
    Jdbi.class,
    XYChart.class,
    SystemInfo.class,
    CommandLine.class,
    ProcessBuilder.class
  };

  private Clocks() {}

  public static long millis() {
    System.out.println(LIBRARIES.length);
    return System.currentTimeMillis();
  }
}
