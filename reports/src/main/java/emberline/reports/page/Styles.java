package emberline.reports.page;

import emberline.reports.chart.Tone;
import emberline.reports.paint.Face;
import emberline.reports.paint.Theme;

/**
 * The styles of a report.
 *
 * @param name the name of the object
 * @param headline the type of the object
 * @param subhead what stands below the type
 * @param finding the finding in a sentence
 * @param heading headings of sections
 * @param body running text
 * @param small captions and footers
 * @param table cells of tables
 * @param tableStrong cells that matter
 * @param note remarks in tables
 * @param warning warnings
 */
record Styles(
        Style name,
        Style headline,
        Style subhead,
        Style finding,
        Style heading,
        Style body,
        Style small,
        Style table,
        Style tableStrong,
        Style note,
        Style warning) {

    static Styles of(Theme theme) {
        return new Styles(
                new Style(Face.SERIF_BOLD, 17.5f, 20, theme.ink()),
                new Style(Face.SERIF_BOLD, 21, 24, theme.accent()),
                new Style(Face.SANS, 8.6f, 11, theme.ink()),
                new Style(Face.SERIF, 9.4f, 12.6f, theme.ink()),
                new Style(Face.SANS_BOLD, 7.8f, 11, theme.ink()),
                new Style(Face.SERIF, 7.4f, 9.8f, theme.ink()),
                new Style(Face.SANS, 6.5f, 8.2f, theme.quiet()),
                new Style(Face.SANS, 6.6f, 8.4f, theme.ink()),
                new Style(Face.SANS_BOLD, 6.6f, 8.4f, theme.colour(Tone.USED)),
                new Style(Face.SANS_ITALIC, 6.5f, 8.2f, theme.quiet()),
                new Style(Face.SANS, 7.2f, 9.4f, theme.accent()));
    }
}
