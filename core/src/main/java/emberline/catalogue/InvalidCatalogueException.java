package emberline.catalogue;

import java.io.IOException;

/** Says that a table of the catalogue cannot be used: where, what was found, what to do. */
public final class InvalidCatalogueException extends IOException {

    private static final long serialVersionUID = 1L;

    /**
     * Makes the message from its four parts.
     *
     * @param where file, line and column
     * @param found what stands there
     * @param expected what should stand there
     * @param advice what the writer of the table can do; a sentence
     */
    public InvalidCatalogueException(String where, String found, String expected, String advice) {
        super(where + ": " + found + "; expected " + expected + ". " + advice);
    }

    /**
     * Makes the message from three parts, where one clause says both what was found and what was
     * expected.
     *
     * @param where file, line and column
     * @param problem what was found and what was expected
     * @param advice what the writer of the table can do; a sentence
     */
    InvalidCatalogueException(String where, String problem, String advice) {
        super(where + ": " + problem + ". " + advice);
    }
}
