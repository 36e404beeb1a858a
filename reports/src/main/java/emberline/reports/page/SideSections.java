package emberline.reports.page;

import emberline.judge.Judgement;
import emberline.judge.LedgerEntry;
import emberline.place.Placement;
import emberline.place.kind.Kin;
import emberline.place.standard.StandardVerdict;
import emberline.reports.attach.JudgementText;
import emberline.reports.attach.StandardsText;
import emberline.reports.page.Flow.Cell;
import emberline.spectrum.Finding;
import emberline.survey.ObjectResult;
import java.util.List;
import java.util.Locale;

/** Sections of the detail pages that are not about single features: what else was looked at. */
final class SideSections {

    private static final int KIN = 5;
    private static final float LABEL_WIDTH = 58;

    private final ReportDocument document;
    private final Styles styles;

    SideSections(ReportDocument document) {
        this.document = document;
        this.styles = document.styles();
    }

    /** Writes the sections. */
    void write(Flow flow, ObjectResult result) {
        Placement placement = result.placement().orElseThrow();
        result.standards().ifPresent(verdict -> standards(flow, verdict));
        kin(flow, placement.kin());
        flow.heading("Metallicity class");
        for (String line : MetallicityText.of(placement.metallicity())) {
            flow.paragraph(styles.table(), line, 8);
        }
        result.judgement().ifPresent(judgement -> judgement(flow, judgement));
        findings(flow, result);
        given(flow, result);
    }

    private void standards(Flow flow, StandardVerdict verdict) {
        flow.heading("Comparison with standards");
        flow.paragraph(
                styles.note(),
                "The observer's own spectra of known type; reduced chi-square with a free scale, in"
                        + " bins of a resolution element, with 2% of scatter between like objects"
                        + " and 10% in the colours between ranges.",
                0);
        for (String line : StandardsText.lines(verdict)) {
            flow.paragraph(
                    styles.table(),
                    line.substring(0, 1).toUpperCase(Locale.ROOT) + line.substring(1) + ".",
                    8);
        }
    }

    private void kin(Flow flow, List<Kin> kin) {
        if (kin.isEmpty()) {
            return;
        }
        flow.heading("Nearest reference objects");
        flow.paragraph(
                styles.note(),
                "By root mean square difference of features in units of scatter and noise; about 1"
                        + " for twins. Types as published.",
                0);
        float end = flow.columnWidth();
        for (Kin one : kin.subList(0, Math.min(KIN, kin.size()))) {
            flow.row(
                    List.of(
                            new Cell(styles.table(), one.object(), 0, end - 20, false),
                            new Cell(styles.table(), KinText.distance(one), end, 20, true)));
            flow.indented(styles.note(), KinText.what(one) + "; " + one.source(), 8);
        }
    }

    private void judgement(Flow flow, Judgement judgement) {
        flow.heading("Judgement");
        for (String line : JudgementText.lines(judgement)) {
            if (!line.startsWith("log10 odds")) {
                flow.paragraph(styles.table(), line, 8);
            }
        }
        for (LedgerEntry entry : judgement.substellarLedger().entries()) {
            flow.paragraph(
                    styles.table(),
                    String.format(
                            Locale.ROOT,
                            "Evidence of the %s: odds of a substellar mass × %.3g; %s.",
                            entry.label(),
                            Math.pow(10, entry.log10Factor()),
                            entry.note()),
                    8);
        }
        for (String left : judgement.substellarLedger().notCounted()) {
            flow.paragraph(styles.table(), "Not counted: " + left + ".", 8);
        }
    }

    private void findings(Flow flow, ObjectResult result) {
        flow.heading("Findings");
        if (result.findings().isEmpty()) {
            flow.paragraph(styles.table(), "None.", 0);
        }
        for (Finding finding : result.findings()) {
            String word = finding.severity().name();
            String severity = word.charAt(0) + word.substring(1).toLowerCase(Locale.ROOT);
            Style style =
                    finding.severity() == Finding.Severity.WARNING
                            ? styles.table().in(document.theme().accent())
                            : styles.table();
            flow.paragraph(
                    style, severity + " (" + finding.code() + "): " + sentence(finding.text()), 8);
        }
    }

    private static String sentence(String text) {
        return text.endsWith(".") ? text : text + ".";
    }

    private void given(Flow flow, ObjectResult result) {
        flow.heading("What it was found from");
        float width = flow.columnWidth() - LABEL_WIDTH;
        for (KeyNumbers.Entry entry : KeyNumbers.given(result)) {
            List<String> values = document.lines().wrap(styles.table(), entry.value(), width, 4);
            String label = entry.label();
            for (String value : values) {
                flow.row(
                        List.of(
                                new Cell(
                                        styles.table().in(document.theme().quiet()),
                                        label,
                                        0,
                                        LABEL_WIDTH - 4,
                                        false),
                                new Cell(styles.table(), value, LABEL_WIDTH, width, false)));
                label = "";
            }
        }
    }
}
