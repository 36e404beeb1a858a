package emberline.survey;

import java.util.Locale;

/** How far an object came through the chain. */
public enum Status {
    /** Read, measured and placed. */
    MEASURED,
    /** Read and measured, but some spectra failed or no type could be given. */
    PARTIAL,
    /** No spectrum is listed; placed by its colours alone. */
    PHOTOMETRIC,
    /** Nothing could be measured; the reason says why. */
    FAILED;

    /**
     * The word used in all outputs.
     *
     * @return lower-case word
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT);
    }
}
