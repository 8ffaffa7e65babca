package railwalk.cli;

import java.lang.reflect.InvocationTargetException;

/** Whether a person is watching the program run. */
final class Terminal {
  private Terminal() {}

  /**
   * Returns whether input and output are a terminal. Java releases from 22 on hand out a console in
   * any case and have a method of their own to ask, which 17 lacks.
   */
  @SuppressWarnings("SystemConsoleNull") // asked for by its later name below
  static boolean isWatched() {
    java.io.Console console = System.console();
    if (console == null) {
      return false;
    }
    try {
      Object answer = java.io.Console.class.getMethod("isTerminal").invoke(console);
      return Boolean.TRUE.equals(answer);
    } catch (NoSuchMethodException olderJava) {
      return true;
    } catch (IllegalAccessException | InvocationTargetException refused) {
      return false;
    }
  }
}
