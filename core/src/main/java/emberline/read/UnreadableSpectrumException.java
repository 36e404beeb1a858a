package emberline.read;

import java.io.IOException;

/**
 * Says why a file cannot be read as a spectrum: where, what was found there, what was expected, and
 * what to do about it.
 */
public final class UnreadableSpectrumException extends IOException {

    private static final long serialVersionUID = 1L;

    private static final int LONGEST = 500;

    /**
     * Makes the exception; its message reads "where: found; expected X. Advice."
     *
     * @param where file name, with line, row, pixel or HDU where there is one
     * @param found what stands there
     * @param expected what should stand there
     * @param advice what the observer can do, a full sentence
     */
    public UnreadableSpectrumException(String where, String found, String expected, String advice) {
        super(where + ": " + shortened(found) + "; expected " + expected + ". " + advice);
    }

    /** What was found, cut where a file would make a message of any length. */
    static String shortened(String found) {
        return found.length() > LONGEST ? found.substring(0, LONGEST) + "..." : found;
    }
}
