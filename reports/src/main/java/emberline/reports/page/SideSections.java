package emberline.reports.page;

import emberline.judge.Judgement;
import emberline.judge.Ledger;
import emberline.judge.LedgerEntry;
import emberline.judge.NextStep;
import emberline.place.kind.Kin;
import emberline.place.metallicity.MetallicityVerdict;
import emberline.place.pair.PairCriterion;
import emberline.place.pair.PairVerdict;
import emberline.place.standard.StandardVerdict;
import emberline.reports.attach.Digits;
import emberline.reports.attach.JudgementText;
import emberline.reports.attach.StandardsText;
import emberline.reports.page.Line.Cell;
import emberline.spectrum.Finding;
import emberline.spectrum.Finding.Severity;
import emberline.survey.ObjectResult;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;

/** Sections of the second page that are not about single features: what else was looked at. */
final class SideSections {

    private static final float LABEL_WIDTH = 58;

    private final ReportDocument document;
    private final Styles styles;
    private final Fullness fullness;

    SideSections(ReportDocument document, Fullness fullness) {
        this.document = document;
        this.styles = document.styles();
        this.fullness = fullness;
    }

    void standards(Passage passage, StandardVerdict verdict) {
        passage.heading("Comparison with standards");
        if (fullness.remarks()) {
            passage.note(
                    "The observer's own spectra of known type; reduced chi-square with a free"
                            + " scale, in bins of a resolution element, with 2% of scatter between"
                            + " like objects and 10% in the colours between ranges.");
        }
        for (String line : StandardsText.lines(verdict)) {
            passage.item(PrintedText.sentence(line));
        }
    }

    void kin(Passage passage, List<Kin> kin) {
        if (kin.isEmpty()) {
            return;
        }
        passage.heading("Nearest reference objects");
        if (fullness.remarks()) {
            passage.note(
                    "By root mean square difference of features in units of scatter and noise;"
                            + " about 1 for twins. Types as published.");
        }
        float end = passage.width();
        for (Kin one : kin.subList(0, Math.min(fullness.kin(), kin.size()))) {
            Style quiet = styles.table().in(document.theme().quiet());
            String what = KinText.what(one) + "; " + one.source();
            float room = end - 22;
            float name = Math.min(room, document.lines().width(styles.table(), one.object()));
            float rest = room - name - 5;
            List<Cell> cells =
                    rest < 24
                            ? List.of(
                                    new Cell(styles.table(), one.object(), 0, room, false),
                                    new Cell(styles.table(), KinText.distance(one), end, 20, true))
                            : List.of(
                                    new Cell(styles.table(), one.object(), 0, name + 1, false),
                                    new Cell(quiet, what, name + 5, rest, false),
                                    new Cell(styles.table(), KinText.distance(one), end, 20, true));
            passage.row(cells);
        }
    }

    void metallicity(Passage passage, MetallicityVerdict verdict) {
        passage.heading("Metallicity class");
        List<String> lines = MetallicityText.of(verdict);
        boolean all = fullness.everyFeature();
        passage.item(lines.get(0));
        lines.subList(1, lines.size()).stream()
                .filter(line -> all || line.startsWith("zeta"))
                .filter(line -> fullness.remarks() || !line.contains(";"))
                .forEach(passage::item);
    }

    void pair(Passage passage, PairVerdict verdict) {
        if (verdict.criteriaJudged() == 0) {
            return;
        }
        String met =
                verdict.criteria().stream()
                        .filter(c -> c.met().orElse(false))
                        .map(SideSections::criterion)
                        .collect(Collectors.joining(", "));
        passage.heading("Unresolved pair");
        passage.item(
                verdict.criteriaMet()
                        + " of "
                        + verdict.criteriaJudged()
                        + " criteria met"
                        + (met.isEmpty() ? "" : " (" + met + ")")
                        + (verdict.pPair().isPresent()
                                ? "; P of enough of them within the noise "
                                        + Digits.fixed(verdict.pPair().getAsDouble(), 2)
                                : "")
                        + ".");
    }

    private static String criterion(PairCriterion criterion) {
        return "no. " + criterion.plane().number();
    }

    void judgement(Passage passage, Judgement judgement) {
        passage.heading("Judgement");
        for (String line : JudgementText.lines(judgement)) {
            if (!line.startsWith("log10 odds")) {
                passage.whole(PrintedText.sentence(line));
            }
        }
        List<NextStep> steps = judgement.nextSteps();
        int last = Math.min(steps.size(), 1 + fullness.observations());
        if (last > 1) {
            passage.item(
                    steps.subList(1, last).stream()
                            .map(SideSections::step)
                            .collect(Collectors.joining("; ", "Weighed too: ", ".")));
        }
        ledger(passage, judgement.substellarLedger());
    }

    private static void ledger(Passage passage, Ledger ledger) {
        passage.subheading("Odds of a substellar mass, evidence by evidence");
        passage.whole("Prior: " + PrintedText.power(ledger.priorLog10Odds()) + " : 1.");
        for (LedgerEntry entry : ledger.entries()) {
            passage.item(
                    PrintedText.sentence(
                            (entry.label()
                                    + ": × "
                                    + PrintedText.power(entry.log10Factor())
                                    + "; "
                                    + entry.note())));
        }
        passage.whole("All together: " + PrintedText.power(ledger.finalLog10Odds()) + " : 1.");
        for (String left : ledger.notCounted()) {
            passage.item("Not counted: " + left + ".");
        }
    }

    private static String step(NextStep step) {
        return String.format(
                Locale.ROOT, "%s (%s, %.2f bit)", step.label(), step.aim().word(), step.gainBits());
    }

    void findings(Passage passage, ObjectResult result) {
        passage.heading("Findings");
        if (result.findings().isEmpty()) {
            passage.paragraph("None.");
        }
        List<Finding> inOrder =
                result.findings().stream()
                        .distinct()
                        .sorted(Comparator.comparing(Finding::severity).reversed())
                        .toList();
        List<Finding> told =
                inOrder.stream()
                        .filter(f -> fullness.remarks() || f.severity() != Severity.NOTE)
                        .limit(fullness.findings())
                        .toList();
        for (Finding finding : told) {
            String word = finding.severity().name();
            String severity = word.charAt(0) + word.substring(1).toLowerCase(Locale.ROOT);
            Style style =
                    finding.severity() == Severity.WARNING
                            ? styles.table().in(document.theme().accent())
                            : styles.table();
            passage.item(
                    style,
                    severity
                            + " ("
                            + finding.code()
                            + "): "
                            + PrintedText.sentence(finding.text()));
        }
        List<String> rest =
                inOrder.stream()
                        .filter(f -> !told.contains(f))
                        .map(Finding::code)
                        .distinct()
                        .toList();
        if (!rest.isEmpty()) {
            passage.item("Told in the JSON of the object: " + String.join(", ", rest) + ".");
        }
    }

    /** What was given: the numbers of the list, the spectra and how they were read. */
    void given(Passage passage, ObjectResult result, ReportSettings settings) {
        passage.heading("What it was found from");
        float width = passage.width() - LABEL_WIDTH;
        int most = Math.min(6, fullness.paragraphLines());
        for (KeyNumbers.Entry entry : KeyNumbers.given(result)) {
            String label = entry.label();
            for (String value : document.lines().wrap(styles.table(), entry.value(), width, most)) {
                Style quiet = styles.table().in(document.theme().quiet());
                passage.row(
                        List.of(
                                new Cell(quiet, label, 0, LABEL_WIDTH - 4, false),
                                new Cell(styles.table(), value, LABEL_WIDTH, width, false)));
                label = "";
            }
        }
        provenance(passage, result, settings);
    }

    /** Where the spectra come from and by what they were worked on. */
    private void provenance(Passage passage, ObjectResult result, ReportSettings settings) {
        passage.subheading("Spectra and program");
        int told = Math.min(fullness.spectra(), result.spectra().size());
        result.spectra().subList(0, told).forEach(s -> passage.item(ProvenanceText.of(s)));
        if (told < result.spectra().size()) {
            passage.item(
                    (result.spectra().size() - told)
                            + " more spectra, told in the JSON of the object.");
        }
        passage.item(
                "Emberline "
                        + settings.programVersion()
                        + ", seed "
                        + settings.seed()
                        + ". Wavelengths in vacuum. M0 = 0, L0 = 10, T0 = 20, Y0 = 30.");
    }
}
