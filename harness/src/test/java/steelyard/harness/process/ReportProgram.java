package steelyard.harness.process;

import java.util.List;

/** Says on standard output what a JVM was started with, a line each. */
final class ReportProgram {
  private ReportProgram() {}

  public static void main(String[] args) {
    for (String name :
        List.of("java.io.tmpdir", "file.encoding", "java.library.path", "java.class.path")) {
      say(name, System.getProperty(name));
    }
    say("heap", Long.toString(Runtime.getRuntime().totalMemory()));
    say("processors", Integer.toString(Runtime.getRuntime().availableProcessors()));
    for (String arg : args) {
      say("argument", arg);
    }
    if (args.length > 0 && args[0].equals("fill")) {
      say("filled", Integer.toString(new byte[1 << 20][1 << 20].length));
    }
    if (args.length > 1 && args[0].equals("load")) {
      System.loadLibrary(args[1]);
      say("loaded", args[1]);
    }
  }

  private static void say(String name, String value) {
    System.out.println(name + "=" + value);
  }
}
