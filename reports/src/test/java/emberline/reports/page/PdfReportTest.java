package emberline.reports.page;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import emberline.reports.RealSpectra;
import emberline.reports.Samples;
import emberline.reports.Samples.Bands;
import emberline.spectrum.Finding;
import emberline.survey.ObjectResult;
import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.apache.pdfbox.Loader;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.PDPage;
import org.apache.pdfbox.pdmodel.PDResources;
import org.apache.pdfbox.pdmodel.font.PDFont;
import org.apache.pdfbox.pdmodel.graphics.form.PDFormXObject;
import org.apache.pdfbox.pdmodel.interactive.action.PDActionGoTo;
import org.apache.pdfbox.pdmodel.interactive.annotation.PDAnnotation;
import org.apache.pdfbox.pdmodel.interactive.annotation.PDAnnotationLink;
import org.apache.pdfbox.pdmodel.interactive.documentnavigation.destination.PDPageDestination;
import org.apache.pdfbox.text.PDFTextStripper;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.verapdf.core.EncryptedPdfException;
import org.verapdf.core.ModelParsingException;
import org.verapdf.core.ValidationException;
import org.verapdf.gf.foundry.VeraGreenfieldFoundryProvider;
import org.verapdf.pdfa.Foundries;
import org.verapdf.pdfa.PDFAParser;
import org.verapdf.pdfa.PDFAValidator;
import org.verapdf.pdfa.flavours.PDFAFlavour;
import org.verapdf.pdfa.results.ValidationResult;

class PdfReportTest {

    private static final PdfReport A4 =
            new PdfReport(ReportSettings.of("0.1.0", 7), Samples.CATALOGUE);

    private static final String LONG_NAME =
            "Ember field 7, object 1234 of the second epoch, with a name that goes on over more"
                    + " than three lines <b>and</b> \u03b1\u03b2 \u4e2d\u6587 "
                    + "without_any_blank_in_its_last_word".repeat(4);

    static Collection<ObjectResult> objects() {
        var clean = Samples.spectrum(0.8, 2.45, 600, Bands.L_DWARF, 60, 9);
        return List.of(
                Samples.lDwarf(),
                Samples.judged(Samples.lDwarf()),
                Samples.judged(Samples.tDwarf()),
                Samples.judged(
                        Samples.object(
                                "R 40", Samples.spectrum(0.8, 2.4, 90, Bands.T_DWARF, 15, 9), 40)),
                Samples.judged(
                        Samples.object(
                                "Optical",
                                Samples.spectrum(0.55, 0.92, 2500, Bands.L_DWARF, 40, 9),
                                1500)),
                Samples.judged(
                        Samples.object(
                                "Lines\nof\nthree",
                                Map.of(
                                        "age",
                                        "120+-8Myr",
                                        "lithium",
                                        "yes",
                                        "parallax_mas",
                                        "40",
                                        "parallax_mas_err",
                                        "1",
                                        "h_mag",
                                        "12.5",
                                        "pmra_masyr",
                                        "200",
                                        "pmdec_masyr",
                                        "-600"),
                                List.of(
                                        Samples.spectrum(0.6, 1.35, 5000, Bands.L_DWARF, 60, 9),
                                        clean),
                                2500)),
                Samples.object(
                        LONG_NAME, Samples.spectrum(0.8, 2.45, 600, Bands.L_DWARF, 3, 9), 120),
                Samples.object(
                        "Gaps", Samples.withGap(Samples.withGap(clean, 1.34, 1.45), 1.8, 2.0), 120),
                Samples.object("Short", Samples.spectrum(2.0, 2.1, 40, Bands.L_DWARF, 60, 9), 120),
                Samples.object("Two", Samples.spectrum(2.0, 2.01, 2, Bands.L_DWARF, 60, 9), 120),
                Samples.object(
                        "Noisy", Samples.spectrum(0.6, 2.45, 4000, Bands.L_DWARF, 3, 9), 1800),
                Samples.object(
                        "Pair",
                        Map.of("j_mag", "14.05", "ra_deg", "58.84", "dec_deg", "-11.56"),
                        List.of(Samples.spectrum(0.8, 1.35, 500, Bands.L_DWARF, 60, 9), clean),
                        750));
    }

    @ParameterizedTest
    @MethodSource("objects")
    void noTextOverlapsAnotherOrLeavesThePage(ObjectResult object) throws IOException {
        PageLayout.assertTwoPagesWellSet(pdf(A4, object), Paper.A4);
    }

    @ParameterizedTest
    @EnumSource(Paper.class)
    void bothPapersHoldTheSameContent(Paper paper) throws IOException {
        ReportSettings settings = ReportSettings.of("0.1.0", 7).withPaper(paper);
        byte[] pdf = pdf(new PdfReport(settings, Samples.CATALOGUE), Samples.lDwarf());
        PageLayout.assertTwoPagesWellSet(pdf, paper);
        assertTrue(PdfText.all(pdf).contains("What this cannot tell"));
    }

    @Test
    void aFullPageStillHoldsTogether() throws IOException {
        Map<String, String> cells =
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
        ObjectResult full =
                Samples.object(
                        LONG_NAME,
                        cells,
                        List.of(
                                Samples.spectrum(0.6, 1.35, 500, Bands.L_DWARF, 60, 9),
                                Samples.spectrum(0.8, 2.45, 600, Bands.L_DWARF, 60, 9)),
                        750);
        List<Finding> findings = new ArrayList<>(full.findings());
        String long3 = "a warning that needs more than two lines of the page, ".repeat(6);
        findings.add(Finding.warning("one", long3));
        findings.add(Finding.warning("two", long3));
        ObjectResult warned =
                new ObjectResult(
                        full.candidate(),
                        full.status(),
                        full.reason(),
                        full.spectra(),
                        full.best(),
                        full.placement(),
                        findings);
        warned = Samples.judged(warned);
        ReportSettings letter = ReportSettings.of("0.1.0", 7).withPaper(Paper.LETTER);
        PageLayout.assertTwoPagesWellSet(
                pdf(new PdfReport(letter, Samples.CATALOGUE), warned), Paper.LETTER);
    }

    @Test
    void realSpectraAreSetWithoutOverlap() throws IOException {
        assumeTrue(
                RealSpectra.present(),
                "no folder shared/spectra beside the project: real spectra are not tried");
        var rows = RealSpectra.rows();
        for (String name :
                List.of(
                        "2MASS J2011-5048",
                        "HD 70138",
                        "SIMP J1615+1340 (2)",
                        "SDSS composite of 5 stars",
                        "SIMP J1339+1523",
                        "WISE J235402.77+024015.0",
                        "2MASS J01415823-4633574")) {
            ObjectResult object = Samples.judged(RealSpectra.object(rows.get(name)));
            PageLayout.assertTwoPagesWellSet(pdf(A4, object), Paper.A4);
            ReportSettings letter = ReportSettings.of("0.1.0", 7).withPaper(Paper.LETTER);
            PageLayout.assertTwoPagesWellSet(
                    pdf(new PdfReport(letter, Samples.CATALOGUE), object), Paper.LETTER);
        }
    }

    @Test
    void textIsReadInOrder() throws IOException {
        ObjectResult object = Samples.judged(Samples.lDwarf());
        String text = PdfText.all(pdf(A4, object)).replaceAll("\\s+", " ");
        int before = -1;
        for (String piece :
                List.of(
                        "Ember 12",
                        FindingSentence.of(object),
                        "Wavelength (µm, vacuum)",
                        "Type",
                        "Spectral type",
                        "Which features pulled it",
                        "Gravity by published scores",
                        "Evidence, step by step",
                        "Odds of mass below 0.072 solar masses",
                        "Mass and age",
                        "burns hydrogen",
                        "burns deuterium",
                        "Key numbers",
                        "What this cannot tell",
                        "Features behind type and gravity",
                        "FeH_z",
                        "Type relations",
                        "Judgement",
                        "Odds of a substellar mass",
                        "All together",
                        "Nearest reference objects",
                        "Findings",
                        "What it was found from",
                        "Spectra and program",
                        "Not measured",
                        "Sources")) {
            int at = text.indexOf(piece, before + 1);
            assertTrue(at > before, piece + " not after what goes before it in: " + text);
            before = at;
        }
        assertTrue(text.contains("H\u2082O"), "subscripts are lost");
    }

    @Test
    void allFontsAreEmbedded() throws IOException {
        try (PDDocument document = Loader.loadPDF(pdf(A4, Samples.lDwarf()))) {
            Set<String> fonts = new HashSet<>();
            for (PDPage page : document.getPages()) {
                checkFonts(page.getResources(), fonts);
            }
            assertTrue(fonts.size() >= 4, fonts.toString());
        }
    }

    private static void checkFonts(PDResources resources, Set<String> seen) throws IOException {
        for (COSName name : resources.getFontNames()) {
            PDFont font = resources.getFont(name);
            assertTrue(font.isEmbedded(), font.getName());
            assertTrue(font.getName().contains("DejaVu"), font.getName());
            seen.add(font.getName());
        }
        for (COSName name : resources.getXObjectNames()) {
            if (resources.getXObject(name) instanceof PDFormXObject form
                    && form.getResources() != null) {
                checkFonts(form.getResources(), seen);
            }
        }
    }

    @Test
    void theDocumentSaysWhatItIs() throws IOException {
        byte[] pdf = pdf(A4, Samples.lDwarf());
        try (PDDocument document = Loader.loadPDF(pdf)) {
            assertEquals("Ember 12: spectral report", document.getDocumentInformation().getTitle());
            assertEquals("en-GB", document.getDocumentCatalog().getLanguage());
            assertEquals(1, document.getDocumentCatalog().getOutputIntents().size());
            assertEquals(
                    "Finding",
                    document.getDocumentCatalog().getDocumentOutline().getFirstChild().getTitle());
            String xmp =
                    new String(
                            document.getDocumentCatalog().getMetadata().toByteArray(),
                            StandardCharsets.UTF_8);
            assertTrue(xmp.contains("pdfaid:part"), xmp);
            assertEquals(2, document.getNumberOfPages());
        }
    }

    @Test
    void theSameResultGivesTheSameBytesOnAnyThread()
            throws IOException, InterruptedException, ExecutionException {
        ObjectResult object = Samples.lDwarf();
        byte[] expected =
                pdf(new PdfReport(ReportSettings.of("0.1.0", 7), Samples.CATALOGUE), object);
        ExecutorService threads = Executors.newFixedThreadPool(3);
        try {
            List<Future<byte[]>> made = new ArrayList<>();
            for (int i = 0; i < 6; i++) {
                made.add(threads.submit(() -> pdf(A4, object)));
            }
            for (Future<byte[]> each : made) {
                assertArrayEquals(expected, each.get());
            }
        } finally {
            threads.shutdownNow();
        }
    }

    @Test
    void reportsAreArchivable()
            throws IOException, ModelParsingException, ValidationException, EncryptedPdfException {
        VeraGreenfieldFoundryProvider.initialise();
        ByteArrayOutputStream bound = new ByteArrayOutputStream();
        A4.bind(List.of(Samples.lDwarf(), Samples.judged(Samples.tDwarf())), bound);
        for (byte[] pdf : List.of(pdf(A4, Samples.judged(Samples.lDwarf())), bound.toByteArray())) {
            try (PDFAParser parser =
                            Foundries.defaultInstance()
                                    .createParser(
                                            new ByteArrayInputStream(pdf), PDFAFlavour.PDFA_2_B);
                    PDFAValidator validator =
                            Foundries.defaultInstance()
                                    .createValidator(PDFAFlavour.PDFA_2_B, false)) {
                ValidationResult result = validator.validate(parser);
                assertTrue(result.isCompliant(), result.getTestAssertions().toString());
                assertTrue(result.getTotalAssertions() > 1000);
            }
        }
    }

    @Test
    void boundReportsHaveContentsWithLinksAndPageNumbers() throws IOException {
        List<ObjectResult> objects = new ArrayList<>();
        for (int i = 0; i < 56; i++) {
            objects.add(
                    Samples.object(
                            "Bound " + i, Samples.spectrum(2, 2.1, 40, Bands.L_DWARF, 60, i), 120));
        }
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        A4.bind(objects, bytes);
        PageLayout.assertWellSet(bytes.toByteArray(), Paper.A4);
        try (PDDocument document = Loader.loadPDF(bytes.toByteArray())) {
            PDFTextStripper stripper = new PDFTextStripper();
            int seen = 0;
            for (int contents = 0; contents < 2; contents++) {
                stripper.setStartPage(contents + 1);
                stripper.setEndPage(contents + 1);
                String text = stripper.getText(document);
                for (PDAnnotation annotation : document.getPage(contents).getAnnotations()) {
                    PDActionGoTo action =
                            (PDActionGoTo) ((PDAnnotationLink) annotation).getAction();
                    PDPage target = ((PDPageDestination) action.getDestination()).getPage();
                    int number = document.getPages().indexOf(target) + 1;
                    assertTrue(
                            text.contains("Bound " + seen) && text.contains(" " + number),
                            number + " in " + text);
                    stripper.setStartPage(number);
                    stripper.setEndPage(number);
                    assertTrue(stripper.getText(document).startsWith("Bound " + seen));
                    seen++;
                }
            }
            assertEquals(objects.size(), seen);
            var outline = document.getDocumentCatalog().getDocumentOutline();
            assertEquals("Contents", outline.getFirstChild().getTitle());
            assertEquals("Bound 0", outline.getFirstChild().getNextSibling().getTitle());
            assertEquals(
                    "Finding", outline.getFirstChild().getNextSibling().getFirstChild().getTitle());
        }
        assertThrows(
                IllegalArgumentException.class,
                () -> A4.bind(List.of(), new ByteArrayOutputStream()));
    }

    @Test
    void aFailedObjectHasNoReport() {
        ObjectResult failed = Samples.failed("x", "no such file");
        assertFalse(PdfReport.canReport(failed));
        assertThrows(IllegalArgumentException.class, () -> pdf(A4, failed));
    }

    private static byte[] pdf(PdfReport report, ObjectResult object) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        report.write(object, bytes);
        return bytes.toByteArray();
    }
}
