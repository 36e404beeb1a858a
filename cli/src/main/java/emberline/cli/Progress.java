package emberline.cli;

import java.io.Console;
import java.io.PrintWriter;
import java.util.Locale;

/**
 * The progress of a run on standard error: one line that is written over where a terminal shows it,
 * nothing otherwise.
 */
final class Progress {

    private static final long REDRAW_NANOS = 200_000_000L;

    private final PrintWriter err;
    private final boolean terminal;
    private final long total;
    private final long start = System.nanoTime();
    private long done;
    private long drawn;

    /**
     * The progress of a run that starts now.
     *
     * @param err where it is written
     * @param terminal whether a person watches
     * @param total number of objects
     */
    Progress(PrintWriter err, boolean terminal, long total) {
        this.err = err;
        this.terminal = terminal;
        this.total = total;
    }

    /** Whether a person watches at a terminal, as far as this can be told. */
    @SuppressWarnings("SystemConsoleNull") // from JDK 22 on the console itself is asked below
    static boolean isTerminal() {
        Console console = System.console();
        if (console == null) {
            return false;
        }
        try {
            return (boolean) Console.class.getMethod("isTerminal").invoke(console);
        } catch (ReflectiveOperationException e) {
            return true; // before JDK 22 there is a console at a terminal only
        }
    }

    /** Another object is done. */
    void step() {
        done++;
        long now = System.nanoTime();
        if (terminal && (now - drawn > REDRAW_NANOS || done == total)) {
            drawn = now;
            err.print("\r" + line(seconds(now)) + "   ");
            err.flush();
        }
    }

    private double seconds(long now) {
        return Math.max(1e-9, (now - start) * 1e-9);
    }

    private String line(double seconds) {
        double rate = done / seconds;
        long left = Math.round((total - done) / rate);
        return String.format(
                Locale.ROOT,
                "%d of %d objects, %.1f a second, %d:%02d left",
                done,
                total,
                rate,
                left / 60,
                left % 60);
    }

    /** Writes a line of its own, without spoiling the progress line. */
    void say(String text) {
        if (terminal) {
            err.print("\r" + " ".repeat(70) + "\r");
        }
        err.println(text);
    }

    /** Ends the progress line and sums up. */
    void finish(String summary) {
        if (terminal) {
            err.println();
        }
        err.println(
                String.format(Locale.ROOT, "%s in %.1f s", summary, seconds(System.nanoTime())));
    }
}
