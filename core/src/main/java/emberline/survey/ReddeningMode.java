package emberline.survey;

import java.util.Locale;

/** Whether extinction is fitted together with the type. */
public enum ReddeningMode {
    /** Never: the spectra are taken as they are, or as freed of a stated extinction. */
    NEVER,
    /** Where the kind of object or its colours call for it. */
    CALLED_FOR,
    /** For every object. */
    ALWAYS;

    /**
     * The word for records.
     *
     * @return lower-case words
     */
    public String word() {
        return name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }
}
