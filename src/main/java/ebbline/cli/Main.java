package ebbline.cli;

/** The program's entry: the only line that touches the process. */
public final class Main {
  private Main() {}

  public static void main(String[] args) {
    System.exit(Ebbline.run(args, System.out, System.err));
  }
}
