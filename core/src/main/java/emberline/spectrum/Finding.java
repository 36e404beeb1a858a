package emberline.spectrum;

/**
 * Something an observer should know about a spectrum or a result.
 *
 * @param severity how much it matters
 * @param code a short stable name in lower case with hyphens, e.g. {@code sigma-estimated}
 * @param text one sentence: what was found, what was done about it
 */
public record Finding(Severity severity, String code, String text) {

    /** How much a finding matters. */
    public enum Severity {
        /** For the record; no result is affected. */
        NOTE,
        /** A result rests on an assumption or is weaker for it. */
        CAUTION,
        /** A result may be wrong for it. */
        WARNING
    }

    /** Checks the code and the text. */
    public Finding {
        if (!code.matches("[a-z0-9]+(-[a-z0-9]+)*") || text.isBlank()) {
            throw new IllegalArgumentException(
                    "finding '" + code + "': expected a code such as sigma-estimated and a text");
        }
    }

    /**
     * A finding for the record.
     *
     * @param code stable name
     * @param text one sentence
     * @return the finding
     */
    public static Finding note(String code, String text) {
        return new Finding(Severity.NOTE, code, text);
    }

    /**
     * A finding on which a result rests.
     *
     * @param code stable name
     * @param text one sentence
     * @return the finding
     */
    public static Finding caution(String code, String text) {
        return new Finding(Severity.CAUTION, code, text);
    }

    /**
     * A finding for which a result may be wrong.
     *
     * @param code stable name
     * @param text one sentence
     * @return the finding
     */
    public static Finding warning(String code, String text) {
        return new Finding(Severity.WARNING, code, text);
    }
}
