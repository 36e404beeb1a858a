package emberline.read;

import java.io.IOException;

/**
 * Says why a file cannot be read as a candidate list: where, what was found there, what was
 * expected, and what to do about it.
 */
public final class UnreadableListException extends IOException {

    private static final long serialVersionUID = 1L;

    /**
     * Makes the exception; its message reads "where: found; expected X. Advice."
     *
     * @param where file name, with line or row where there is one
     * @param found what stands there
     * @param expected what should stand there
     * @param advice what the observer can do, a full sentence
     */
    public UnreadableListException(String where, String found, String expected, String advice) {
        super(where + ": " + found + "; expected " + expected + ". " + advice);
    }

    /**
     * Makes the exception.
     *
     * @param message says where, what was found, what was expected and what to do
     */
    public UnreadableListException(String message) {
        super(message);
    }

    /** Passes on what is wrong with the file as such. */
    UnreadableListException(UnreadableSpectrumException cause) {
        super(cause.getMessage(), cause);
    }
}
