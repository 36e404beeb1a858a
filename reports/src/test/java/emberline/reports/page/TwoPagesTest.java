package emberline.reports.page;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.Purpose;
import emberline.judge.Aim;
import emberline.judge.FollowUp;
import emberline.judge.Judgement;
import emberline.judge.Ledger;
import emberline.judge.LedgerEntry;
import emberline.judge.NextStep;
import emberline.judge.Piece;
import emberline.measure.FeatureMeasurement;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measuring;
import emberline.place.Placement;
import emberline.place.RelationEstimate.Use;
import emberline.place.calibrated.Contribution;
import emberline.read.CandidateListReader;
import emberline.read.ListedCandidate;
import emberline.read.UnreadableListException;
import emberline.reports.Samples;
import emberline.reports.Samples.Bands;
import emberline.spectrum.Finding;
import emberline.spectrum.Spectrum;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.SurveySettings;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/** Whatever an object brings, its report has two pages, and what led to the answer stands there. */
class TwoPagesTest {

    private static final Path LIST =
            Path.of(System.getProperty("emberline.root", ".."))
                    .resolve("demo-objects/survey/candidates.csv");

    private static final Chain CHAIN =
            new Chain(Samples.CATALOGUE, Measuring.withDefaults(), SurveySettings.withDefaults());

    private static final Map<String, String> CELLS =
            Map.of(
                    "known_type", "L3",
                    "ra_deg", "58.84",
                    "dec_deg", "-11.56",
                    "parallax_mas", "109.6",
                    "parallax_mas_err", "0.7",
                    "j_mag", "14.05",
                    "h_mag", "12.53",
                    "k_mag", "11.52",
                    "w1_mag", "10.53",
                    "w2_mag", "9.94");

    private static ObjectResult wide(String name, int spectra) {
        List<Spectrum> all = new ArrayList<>();
        for (int i = 0; i < spectra; i++) {
            all.add(
                    i % 2 == 0
                            ? Samples.spectrum(0.56, 1.0, 3000, Bands.L_DWARF, 60, i)
                            : Samples.spectrum(0.8, 2.45, 5000, Bands.L_DWARF, 60, i));
        }
        return Samples.judged(Samples.object(name, CELLS, all, 2500));
    }

    private static long measured(ObjectResult object) {
        return object.best().orElseThrow().all().stream()
                .filter(m -> m.result() instanceof Measured)
                .count();
    }

    /** Twelve next steps, a piece of every kind in the ledger with long notes. */
    private static ObjectResult crowded(ObjectResult object) {
        Judgement made = Samples.judged(Samples.lDwarf()).judgement().orElseThrow();
        List<NextStep> steps = new ArrayList<>();
        for (int i = 0; i < 12; i++) {
            steps.add(
                    new NextStep(
                            FollowUp.LITHIUM,
                            "observation number " + i + " with a long name that takes its room",
                            Aim.SUBSTELLAR,
                            0.3 - i * 0.01,
                            0.4,
                            OptionalDouble.of(2000),
                            OptionalDouble.of(40),
                            "an hour or more on a large telescope; faint in the red optical"));
        }
        Ledger ledger = made.substellarLedger();
        List<LedgerEntry> entries = new ArrayList<>();
        for (Piece piece : Piece.values()) {
            entries.add(
                    new LedgerEntry(
                            piece,
                            piece.label(),
                            -5.5,
                            1.2,
                            "a note on this evidence that is as long as notes become, with what it"
                                    + " rests on and by how much it would count if added last"));
        }
        Ledger full =
                new Ledger(
                        ledger.claim(),
                        ledger.priorLog10Odds(),
                        entries,
                        ledger.priorLog10Odds() - 5.5 * entries.size(),
                        List.of("a piece that was left out, with the reason why it was"));
        return object.withJudgement(
                new Judgement(
                        made.limits(),
                        made.massMsun(),
                        made.age(),
                        made.properties(),
                        full,
                        made.youngLedger(),
                        made.grids(),
                        steps,
                        made.priority(),
                        made.plane(),
                        made.findings()));
    }

    private static ObjectResult withFindings(ObjectResult object, int findings) {
        List<Finding> more = new ArrayList<>();
        String three = "a finding that takes up three lines of a column of the page, ".repeat(3);
        for (int i = 0; i < findings; i++) {
            String text = i + " " + three.strip();
            more.add(
                    switch (i % 3) {
                        case 0 -> Finding.note("note-" + i, text);
                        case 1 -> Finding.caution("caution-" + i, text);
                        default -> Finding.warning("warning-" + i, text);
                    });
        }
        return object.withFindings(more);
    }

    private static byte[] pdf(ObjectResult object, Paper paper) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        ReportSettings settings = ReportSettings.of("0.1.0", 7).withPaper(paper);
        new PdfReport(settings, Samples.CATALOGUE).write(object, bytes);
        return bytes.toByteArray();
    }

    private static String checked(ObjectResult object, Paper paper) throws IOException {
        byte[] pdf = pdf(object, paper);
        PageLayout.assertTwoPagesWellSet(pdf, paper);
        String text = PdfText.all(pdf).replaceAll("\\s+", " ");
        assertLeading(object, text);
        return text;
    }

    /** What carried type, gravity and judgement must stand in the report. */
    private static void assertLeading(ObjectResult object, String text) {
        Placement placement = object.placement().orElseThrow();
        for (Contribution one : placement.calibrated().contributions()) {
            String symbol = Samples.CATALOGUE.feature(one.feature()).orElseThrow().symbol();
            assertTrue(text.contains(symbol), symbol + " pulled the type and is not in: " + text);
        }
        placement.published().estimates().stream()
                .filter(e -> e.use() == Use.COMBINED)
                .map(e -> FindingSentence.withError(e.type().orElseThrow()))
                .forEach(type -> assertTrue(text.contains(type), type));
        placement.gravity().scores().stream()
                .filter(s -> s.score().isPresent())
                .map(s -> ": score " + s.score().getAsInt())
                .forEach(score -> assertTrue(text.contains(score), score));
        if (object.judgement().isPresent()) {
            Ledger ledger = object.judgement().get().substellarLedger();
            for (LedgerEntry entry : ledger.entries()) {
                String factor = "× " + PrintedText.power(entry.log10Factor());
                assertTrue(text.contains(factor), entry.label() + " " + factor);
            }
            assertTrue(text.contains("All together: "), text);
        }
        assertFalse(text.contains("No room for more"), text);
    }

    @ParameterizedTest
    @EnumSource(Paper.class)
    void manyFeaturesOfSeveralSpectraFindRoom(Paper paper) throws IOException {
        ObjectResult object = wide("Many features", 2);
        assertTrue(measured(object) >= 220, measured(object) + " features");
        String text = checked(object, paper);
        assertTrue(text.contains("emberline measure prints them"), "what is left out is not told");
    }

    @ParameterizedTest
    @EnumSource(Paper.class)
    void everythingAtItsMostFindsRoom(Paper paper) throws IOException {
        String name =
                "A name that goes on and on over more than three lines of the page ".repeat(4);
        ObjectResult object = withFindings(crowded(wide(name.strip(), 5)), 14);
        String text = checked(object, paper);
        assertTrue(text.contains("Told in the JSON of the object: "), "left-out notes");
        assertTrue(text.contains("more spectra, told in the JSON"), "left-out spectra");
    }

    /**
     * The object of the demo survey with most features, type, gravity, with all else at its most.
     */
    @ParameterizedTest
    @EnumSource(Paper.class)
    void aPlacedObjectWithEverythingFindsRoom(Paper paper)
            throws IOException, UnreadableListException {
        ListedCandidate row =
                new CandidateListReader()
                        .read(LIST).rows().stream()
                                .filter(r -> r.candidate().name().equals("Tamarisk-0515+0058"))
                                .findFirst()
                                .orElseThrow();
        ObjectResult object = CHAIN.run(row.candidate(), LIST.toAbsolutePath().getParent());
        assertTrue(measured(object) > 200, measured(object) + " features");
        checked(withFindings(crowded(object), 9), paper);
    }

    /** More than any object brings: cut, and said so, but two pages still. */
    @Test
    void whatNoObjectBringsIsCutAndSaidSo() throws IOException {
        ObjectResult object = crowded(wide("Too much", 2));
        Judgement made = object.judgement().orElseThrow();
        Ledger ledger = made.substellarLedger();
        List<LedgerEntry> entries = new ArrayList<>();
        for (int i = 0; i < 40; i++) {
            entries.addAll(ledger.entries());
        }
        Ledger endless = new Ledger(ledger.claim(), 0, entries, -5, List.of());
        Judgement judgement =
                new Judgement(
                        made.limits(),
                        made.massMsun(),
                        made.age(),
                        made.properties(),
                        endless,
                        made.youngLedger(),
                        made.grids(),
                        made.nextSteps(),
                        made.priority(),
                        made.plane(),
                        made.findings());
        byte[] pdf = pdf(object.withJudgement(judgement), Paper.A4);
        assertEquals(2, pages(pdf));
        assertTrue(PdfText.all(pdf).contains("No room for more: the JSON of the object"));
    }

    private static int pages(byte[] pdf) throws IOException {
        try (var document = org.apache.pdfbox.Loader.loadPDF(pdf)) {
            return document.getNumberOfPages();
        }
    }

    @Test
    void everyFeatureOfASmallObjectIsThere() throws IOException {
        ObjectResult object = Samples.judged(Samples.lDwarf());
        String text = checked(object, Paper.A4);
        for (FeatureMeasurement each : object.best().orElseThrow().all()) {
            if (each.result() instanceof Measured && each.feature().purpose() != Purpose.KIND) {
                assertTrue(text.contains(each.feature().symbol()), each.feature().symbol());
            }
        }
        assertFalse(text.contains("were measured and entered"), text);
    }

    @Test
    void everyObjectOfTheDemoSurveyHasTwoPages() throws IOException, UnreadableListException {
        int reports = 0;
        for (ListedCandidate row : new CandidateListReader().read(LIST).rows()) {
            ObjectResult result = CHAIN.run(row.candidate(), LIST.toAbsolutePath().getParent());
            if (PdfReport.canReport(result)) {
                checked(result, reports % 2 == 0 ? Paper.A4 : Paper.LETTER);
                reports++;
            }
        }
        assertEquals(43, reports, "reports");
    }
}
