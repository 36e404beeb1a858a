package emberline.reports.paint;

import java.awt.BasicStroke;
import java.awt.Font;

/**
 * The fonts of charts at their sizes.
 *
 * @param label for labels and ticks
 * @param title for titles
 * @param hairline the thin stroke
 */
record ChartFonts(Font label, Font title, BasicStroke hairline) {

    static ChartFonts of(Theme theme, Font regular, Font bold) {
        return new ChartFonts(
                regular.deriveFont(theme.labelSizePoint()),
                bold.deriveFont(theme.labelSizePoint() + 0.4f),
                new BasicStroke(theme.hairlinePoint()));
    }
}
