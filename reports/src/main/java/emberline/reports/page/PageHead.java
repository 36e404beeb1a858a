package emberline.reports.page;

import emberline.place.GravityVerdict;
import emberline.place.Placement;
import emberline.place.TypeEstimate;
import emberline.place.kind.ObjectKind;
import emberline.spectrum.Finding;
import emberline.spectrum.Finding.Severity;
import emberline.survey.ObjectResult;
import java.io.IOException;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** The top of the first page: name, type, the finding in a sentence, warnings. */
final class PageHead {

    private static final float HEADLINE_WIDTH = 165;
    private static final float GUTTER = 18;
    private static final int MOST_WARNINGS = 2;

    private final ReportDocument document;
    private final Styles styles;
    private final float width;

    PageHead(ReportDocument document, float width) {
        this.document = document;
        this.styles = document.styles();
        this.width = width;
    }

    /** Name and type, the finding, warnings. Returns the place below them. */
    float write(Sheet sheet, ObjectResult result) throws IOException {
        Optional<TypeEstimate> type = result.placement().flatMap(Placement::type);
        List<String> name =
                document.lines()
                        .wrap(
                                styles.name(),
                                result.candidate().name(),
                                width - HEADLINE_WIDTH - GUTTER,
                                3);
        float y = FirstPage.TOP + 14;
        float right = FirstPage.MARGIN + width;
        float baseline = y;
        for (String line : name) {
            sheet.text(styles.name(), FirstPage.MARGIN, baseline, line);
            baseline += styles.name().leadingPoint();
        }
        String headline = type.map(FindingSentence::withError).orElse(withoutType(result));
        sheet.textRight(narrowed(headline), right, y + 1, headline);
        String gravity =
                type.isEmpty()
                        ? "no spectral type, gravity not judged"
                        : gravityWords(result.placement().orElseThrow().gravity())
                                + result.judgement()
                                        .map(j -> "   " + j.decision().word())
                                        .orElse("");
        sheet.textRight(styles.subhead(), right, y + 14.5f, gravity);
        float below = Math.max(baseline - styles.name().leadingPoint() + 7, y + 19);
        sheet.rule(FirstPage.MARGIN, right, below, document.theme().ink(), 0.7f);
        float at = below + 14;
        for (String line :
                document.lines().wrap(styles.finding(), FindingSentence.of(result), width)) {
            sheet.text(styles.finding(), FirstPage.MARGIN, at, line);
            at += styles.finding().leadingPoint();
        }
        return warnings(sheet, result, at);
    }

    /** The kind of an object that is no late dwarf. */
    private static String withoutType(ObjectResult result) {
        return result.placement()
                .flatMap(p -> p.kind().kind())
                .filter(kind -> kind != ObjectKind.LATE_DWARF)
                .map(ObjectKind::label)
                .orElse("no type");
    }

    /** The style of the headline, smaller where the words are long. */
    private Style narrowed(String headline) {
        Style style = styles.headline();
        float wide = document.lines().width(style, headline);
        float size = style.sizePoint() * Math.min(1, HEADLINE_WIDTH / wide);
        return new Style(style.face(), size, style.leadingPoint(), style.colour());
    }

    private float warnings(Sheet sheet, ObjectResult result, float from) throws IOException {
        float y = from;
        List<Finding> warnings =
                result.findings().stream()
                        .filter(f -> f.severity() == Severity.WARNING)
                        .limit(MOST_WARNINGS)
                        .toList();
        for (Finding warning : warnings) {
            String text = "Warning: " + PrintedText.sentence(warning.text());
            for (String line : document.lines().wrap(styles.warning(), text, width, 2)) {
                sheet.text(styles.warning(), FirstPage.MARGIN, y, line);
                y += styles.warning().leadingPoint();
            }
        }
        return y - 3;
    }

    private static String gravityWords(GravityVerdict verdict) {
        OptionalDouble share = verdict.pOfClass();
        return verdict.gravityClass()
                .map(
                        g ->
                                g.label()
                                        + (share.isPresent()
                                                ? "   P "
                                                        + FindingSentence.probability(
                                                                share.getAsDouble())
                                                : ""))
                .orElse("gravity not judged");
    }
}
