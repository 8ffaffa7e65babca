package railwalk.cli;

/** The program's door. */
public final class Main {
  private Main() {}

  /** Runs the command line. */
  public static void main(String[] args) {
    System.exit(2);
  }
}
