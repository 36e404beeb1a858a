package emberline.reports.chart;

/** What a mark means; a theme gives each its colour. */
public enum Tone {
    /** The spectrum. */
    SPECTRUM,
    /** Single pixels behind a binned spectrum. */
    PIXELS,
    /** A standard laid over the spectrum. */
    STANDARD,
    /** The one-sigma band of a spectrum. */
    SIGMA,
    /** Where the atmosphere hardly lets light through. */
    TELLURIC_OPAQUE,
    /** Deep telluric bands. */
    TELLURIC_STRONG,
    /** Telluric bands that are deep only in wet weather. */
    TELLURIC_WET,
    /** Shallow telluric bands. */
    TELLURIC_WEAK,
    /** No data. */
    GAP,
    /** A molecular band. */
    BAND,
    /** An atomic line. */
    LINE,
    /** An estimate that entered the result. */
    USED,
    /** An estimate that is shown for comparison. */
    SHOWN,
    /** The result, or this object. */
    RESULT,
    /** The 68% interval of the result. */
    RESULT_68,
    /** The 95% interval of the result. */
    RESULT_95,
    /** Field gravity. */
    FIELD,
    /** Intermediate gravity. */
    INTERMEDIATE,
    /** Very low gravity. */
    VERY_LOW,
    /** Where field gravity lies by calibration; a full line. */
    LOCUS_FIELD,
    /** Where very low gravity lies by calibration; a dashed line. */
    LOCUS_VERY_LOW,
    /** Evidence for a claim, or a pull to later types. */
    TOWARDS,
    /** Evidence against a claim, or a pull to earlier types. */
    AGAINST,
    /** What was set aside. */
    SET_ASIDE,
    /** A physical limit. */
    LIMIT,
    /** Words in a chart. */
    WORDS,
    /** A line that guides the eye. */
    GUIDE
}
