package sojourn.cli;

/** Entry point. */
public final class Main {
    private Main() {}

    /** Runs the shell. */
    public static void main(String[] args) {
        System.out.println("sojourn");
    }
}
