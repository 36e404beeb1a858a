package emberline.reports.paint;

import emberline.reports.chart.Tone;
import java.awt.Color;

/**
 * Colours, line widths and font sizes of charts. The colours are told apart by colour-blind readers
 * and, since they differ in lightness, in grey print.
 *
 * @param ink text, axes and outlines
 * @param quiet titles of axes, captions
 * @param rule thin lines that divide
 * @param accent the result
 * @param labelSizePoint font size of labels and ticks (point)
 * @param hairlinePoint width of axes and thin lines (point)
 */
public record Theme(
        Color ink,
        Color quiet,
        Color rule,
        Color accent,
        float labelSizePoint,
        float hairlinePoint) {

    private static final Theme PRINT =
            new Theme(
                    new Color(0x1B2330),
                    new Color(0x586273),
                    new Color(0xC4CAD3),
                    new Color(0xB4420F),
                    6.6f,
                    0.5f);

    /**
     * The theme of printed reports.
     *
     * @return the theme
     */
    public static Theme print() {
        return PRINT;
    }

    /**
     * The colour of a mark.
     *
     * @param tone what the mark means
     * @return its colour, opaque
     */
    public Color colour(Tone tone) {
        return switch (tone) {
            case SPECTRUM -> new Color(0x14233F);
            case PIXELS -> new Color(0xC3CBD8);
            case STANDARD -> new Color(0xC2571A);
            case SIGMA -> new Color(0xBFD0E6);
            case TELLURIC_OPAQUE -> new Color(0x7C8591);
            case TELLURIC_STRONG -> new Color(0xA2AAB5);
            case TELLURIC_WET -> new Color(0xC6CCD4);
            case TELLURIC_WEAK -> new Color(0xEBEEF2);
            case GAP -> new Color(0xB3BAC4);
            case BAND -> new Color(0x4A5568);
            case LINE -> new Color(0x0B5C8E);
            case USED -> new Color(0x0B5C8E);
            case SHOWN -> new Color(0x949DAA);
            case RESULT -> accent;
            case RESULT_68 -> new Color(0xE3A27E);
            case RESULT_95 -> new Color(0xF8EADF);
            case FIELD -> new Color(0xF2F5F9);
            case INTERMEDIATE -> new Color(0xD3E2F0);
            case VERY_LOW -> new Color(0xA3C6E2);
            case LOCUS_FIELD -> new Color(0x3C4654);
            case LOCUS_VERY_LOW -> new Color(0x123E63);
            case TOWARDS -> new Color(0x0B5C8E);
            case AGAINST -> new Color(0xDDA15E);
            case SET_ASIDE -> new Color(0xFFFFFF);
            case LIMIT -> new Color(0xD9DEE5);
            case WORDS -> quiet;
            case GUIDE -> rule;
        };
    }
}
