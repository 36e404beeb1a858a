package emberline.place.photometric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.PublishedRows;
import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import emberline.place.calibrated.TypePriors;
import emberline.place.kind.ObjectKind;
import emberline.read.CandidatePhotometry;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;

/** Types from colours: recovery, intervals, alternatives, and what is refused. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class PhotometricWitnessTest {

    private final PhotometricWitness witness = new PhotometricWitness(TypePriors.FLAT.load());

    private static CandidatePhotometry listed(String... cells) {
        Map<String, String> map = new LinkedHashMap<>();
        map.put("name", "A");
        for (int i = 0; i < cells.length; i += 2) {
            map.put(cells[i], cells[i + 1]);
        }
        return CandidatePhotometry.of(new Candidate("A", 1, List.of(), map));
    }

    private static List<String> codes(PhotometricType type) {
        return type.findings().stream().map(Finding::code).toList();
    }

    /** Magnitudes whose colours are those of the templates at a type. */
    private static CandidatePhotometry atType(
            double typeNumber, GravityClass gravity, String system, double avMag, Random noise) {
        ColourTemplates templates = ColourTemplates.standard();
        int point = ColourTemplates.point(typeNumber);
        List<TemplateColour> steps =
                system.equals("MKO")
                        ? List.of(
                                TemplateColour.J_H_MKO,
                                TemplateColour.H_K_MKO,
                                TemplateColour.K_MKO_W1,
                                TemplateColour.W1_W2)
                        : List.of(
                                TemplateColour.J_H_2MASS,
                                TemplateColour.H_K_2MASS,
                                TemplateColour.K_2MASS_W1,
                                TemplateColour.W1_W2);
        String[] columns = {"j_mag", "h_mag", "k_mag", "w1_mag", "w2_mag"};
        String[] extinction = {"a-j", "a-h", "a-k", "a-w1", "a-w2"};
        double error = 0.03;
        double rho = templates.correlation(point);
        double shared = noise == null ? 0 : noise.nextGaussian();
        double mag = 16;
        Map<String, String> cells = new LinkedHashMap<>();
        cells.put("name", "A");
        cells.put("mag_system", system);
        for (int b = 0; b < columns.length; b++) {
            double seen = mag + avMag * ColourSettings.standard().of(extinction[b]);
            if (noise != null) {
                seen += error * noise.nextGaussian();
            }
            cells.put(columns[b], String.format(Locale.ROOT, "%.4f", seen));
            cells.put(columns[b] + "_err", "0.03");
            if (b < steps.size()) {
                double scatter =
                        noise == null
                                ? 0
                                : templates.scatter(steps.get(b), point)
                                        * (Math.sqrt(rho) * shared
                                                + Math.sqrt(1 - rho) * noise.nextGaussian());
                mag -= templates.median(steps.get(b), gravity, point) + scatter;
            }
        }
        return CandidatePhotometry.of(new Candidate("A", 1, List.of(), cells));
    }

    @Test
    void printedTemplatesOfAnotherPaperAreFoundAtTheirType() throws Exception {
        double square = 0;
        double sum = 0;
        int count = 0;
        for (NamedCsvRecord row : PublishedRows.of("template-colours.csv")) {
            double type = Double.parseDouble(row.getField("type_number"));
            double mag = 16;
            Map<String, String> cells = new LinkedHashMap<>();
            cells.put("mag_system", "MKO");
            String[] bands = {"y_mag", "j_mag", "h_mag", "k_mag", "w1_mag", "w2_mag"};
            String[] colours = {"y_j", "j_h", "h_k", "k_w1", "w1_w2"};
            for (int b = 0; b < bands.length; b++) {
                cells.put(bands[b], Double.toString(mag));
                cells.put(bands[b] + "_err", "0.05");
                mag -= b < colours.length ? Double.parseDouble(row.getField(colours[b])) : 0;
            }
            PhotometricType found =
                    witness.witness(
                            CandidatePhotometry.of(new Candidate("A", 1, List.of(), cells)));
            TypeEstimate estimate = found.type().orElseThrow();
            double off = estimate.typeNumber() - type;
            square += off * off;
            sum += off;
            count++;
        }
        assertEquals(24, count);
        // 0.35 and -0.01 subclass, as found
        assertTrue(Math.sqrt(square / count) < 0.5);
        assertEquals(0, sum / count, 0.2);
    }

    @Test
    @Tag("slow")
    void intervalsHoldTheirShareOfSimulatedObjects() {
        Random random = new Random(7);
        for (String system : List.of("MKO", "2MASS")) {
            int inside68 = 0;
            int inside95 = 0;
            int count = 600;
            List<double[]> off = new ArrayList<>();
            for (int i = 0; i < count; i++) {
                double type = 6 + 20 * random.nextDouble();
                TypeEstimate found =
                        witness.witness(atType(type, GravityClass.FLD_G, system, 0, random))
                                .posterior()
                                .orElseThrow()
                                .estimate();
                inside68 += found.lo68() <= type && type <= found.hi68() ? 1 : 0;
                inside95 += found.lo95() <= type && type <= found.hi95() ? 1 : 0;
                off.add(new double[] {type, found.typeNumber() - type});
            }
            assertEquals(0.68, (double) inside68 / count, 0.06);
            assertEquals(0.95, (double) inside95 / count, 0.03);
            // found: MKO 1.1, 1.3, 1.0, 2MASS 1.0, 1.7, 0.8 subclass
            assertTrue(rms(off, 6, 10) < 1.5 && rms(off, 10, 20) < 2.2 && rms(off, 20, 26) < 1.5);
        }
    }

    private static double rms(List<double[]> off, double from, double to) {
        return Math.sqrt(
                off.stream()
                        .filter(o -> o[0] >= from && o[0] < to)
                        .mapToDouble(o -> o[1] * o[1])
                        .average()
                        .orElseThrow());
    }

    @Test
    void aRedYoungDwarfIsNotTakenForALaterOne() {
        PhotometricType found = witness.witness(atType(13, GravityClass.VL_G, "2MASS", 0, null));
        double young = found.posterior().orElseThrow().probability(GravityClass.VL_G);
        PhotometricType field = witness.witness(atType(13, GravityClass.FLD_G, "2MASS", 0, null));
        double old = field.posterior().orElseThrow().probability(GravityClass.VL_G);
        assertTrue(young > 0.1 && young > 2 * old, young + " against " + old);
        TypeEstimate type = found.type().orElseThrow();
        assertTrue(type.lo95() < 13 && type.hi95() > 13, type.toString());
    }

    @Test
    void dustIsFound() {
        PhotometricType found = witness.witness(atType(8, GravityClass.FLD_G, "2MASS", 6, null));
        assertTrue(found.pReddened() > 0.5, "p " + found.pReddened());
        assertEquals(6, found.avMag(), 1);
    }

    @Test
    void giantsGetNoType() {
        PhotometricType found =
                witness.witness(
                        listed(
                                "mag_system",
                                "2MASS",
                                "j_mag",
                                "10",
                                "j_mag_err",
                                "0.02",
                                "h_mag",
                                "9.12",
                                "h_mag_err",
                                "0.02",
                                "k_mag",
                                "8.84",
                                "k_mag_err",
                                "0.02"));
        assertEquals(ObjectKind.GIANT, found.kind().kind().orElseThrow());
        assertTrue(found.type().isEmpty());
        assertTrue(found.reason().startsWith("kind by colours: giant"), found.reason());
        assertTrue(codes(found).contains("not-a-late-dwarf"));
    }

    @Test
    void bandsMayBeMissing() {
        PhotometricType two =
                witness.witness(
                        listed(
                                "w1_mag",
                                "14",
                                "w1_mag_err",
                                "0.03",
                                "w2_mag",
                                "12.4",
                                "w2_mag_err",
                                "0.05"));
        assertEquals(List.of("W1-W2"), two.colours());
        assertEquals(25, two.type().orElseThrow().typeNumber(), 1);
        assertTrue(two.reducedChiSquare().isEmpty());
        assertTrue(codes(two).contains("one-colour"));
        assertTrue(codes(two).contains("quasar-not-excluded"));
        PhotometricType without =
                witness.witness(
                        listed(
                                "mag_system",
                                "MKO",
                                "j_mag",
                                "16",
                                "k_mag",
                                "14.4",
                                "w1_mag",
                                "13.8"));
        assertEquals(List.of("J-K", "K-W1"), without.colours());
        assertTrue(codes(without).contains("magnitude-error-assumed"));
        assertTrue(codes(without).contains("kind-not-judged"));
        PhotometricType one = witness.witness(listed("j_mag", "16"));
        assertTrue(one.posterior().isEmpty());
        assertTrue(one.reason().contains("two magnitudes"), one.reason());
    }

    @Test
    void unknownSystemsAndImpossibleMagnitudesAreRefused() {
        CandidatePhotometry odd =
                listed(
                        "mag_system",
                        "AB",
                        "j_mag",
                        "16",
                        "h_mag",
                        "15",
                        "w1_mag",
                        "14",
                        "w2_mag",
                        "13.7");
        assertEquals(List.of("W1-W2"), witness.witness(odd).colours());
        assertTrue(codes(witness.witness(odd)).contains("mag-system-unusable"));
        CandidatePhotometry none =
                listed("j_mag", "99.99", "h_mag", "15", "k_mag", "14", "k_mag_err", "-1");
        assertEquals(1, none.magnitudes().size());
        assertEquals(2, none.findings().size());
    }

    @Test
    void coloursOfAnotherTypeAreAFinding() {
        CandidatePhotometry late = atType(26, GravityClass.FLD_G, "MKO", 0, null);
        assertTrue(witness.disagreement(late, TypeEstimate.normal(26.5, 0.5), 0).isEmpty());
        Finding finding = witness.disagreement(late, TypeEstimate.normal(12, 0.5), 0).orElseThrow();
        assertEquals("colours-unlike-type", finding.code());
        assertTrue(finding.text().contains("L2"), finding.text());
        CandidatePhotometry reddened = atType(12, GravityClass.FLD_G, "2MASS", 8, null);
        assertFalse(witness.disagreement(reddened, TypeEstimate.normal(12, 0.5), 0).isEmpty());
        assertTrue(witness.disagreement(reddened, TypeEstimate.normal(12, 0.5), 8).isEmpty());
    }

    @Test
    void aPlainFieldDwarfIsRemarkedOnByNothing() {
        PhotometricType found = witness.witness(atType(15, GravityClass.FLD_G, "2MASS", 0, null));
        assertEquals(List.of(), codes(found));
        assertEquals(3, found.freedom(), "four colours, one type");
        assertTrue(found.chiSquare() < 1, "made of the templates: " + found.chiSquare());
        assertEquals(found.chiSquare() / 3, found.reducedChiSquare().orElseThrow(), 1e-12);
        assertEquals("JHK W1 W2 colours", found.kind().coverage());
    }

    @Test
    void whatTheObserverShouldKnowIsSaid() {
        PhotometricType early = witness.witness(atType(5, GravityClass.FLD_G, "2MASS", 0, null));
        assertTrue(codes(early).contains("type-at-edge"), codes(early).toString());
        PhotometricType dusty = witness.witness(atType(8, GravityClass.FLD_G, "2MASS", 6, null));
        assertTrue(codes(dusty).contains("colours-reddened"), codes(dusty).toString());
        PhotometricType odd =
                witness.witness(
                        listed(
                                "mag_system",
                                "MKO",
                                "j_mag",
                                "16",
                                "j_mag_err",
                                "0.03",
                                "h_mag",
                                "13",
                                "h_mag_err",
                                "0.03",
                                "k_mag",
                                "16",
                                "k_mag_err",
                                "0.03"));
        assertTrue(codes(odd).contains("colours-unlike-templates"), codes(odd).toString());
    }

    /** Active galaxies have W1-W2 of 0.8 and more; a colour well below excludes them. */
    @Test
    void aBlueMidInfraredColourExcludesAQuasar() {
        PhotometricType found =
                witness.witness(
                        listed(
                                "w1_mag",
                                "14",
                                "w1_mag_err",
                                "0.03",
                                "w2_mag",
                                "13.7",
                                "w2_mag_err",
                                "0.03"));
        assertTrue(codes(found).contains("one-colour"));
        assertFalse(codes(found).contains("quasar-not-excluded"), codes(found).toString());
        double limit = ColourSettings.standard().of("quasar-w1-w2");
        String near = String.format(Locale.ROOT, "%.3f", 14 - limit + 0.04);
        PhotometricType within =
                witness.witness(
                        listed(
                                "w1_mag",
                                "14",
                                "w1_mag_err",
                                "0.03",
                                "w2_mag",
                                near,
                                "w2_mag_err",
                                "0.03"));
        assertTrue(
                codes(within).contains("quasar-not-excluded"), "0.04 off with an error of 0.042");
        PhotometricType sharper =
                witness.witness(
                        listed(
                                "w1_mag",
                                "14",
                                "w1_mag_err",
                                "0.02",
                                "w2_mag",
                                near,
                                "w2_mag_err",
                                "0.02"));
        assertFalse(codes(sharper).contains("quasar-not-excluded"), "0.04 off with 0.028");
    }

    /** The entropy of the kind in bits, and by how many halvings a spectrum narrows the type. */
    @Test
    void theGainIsCountedInBits() {
        for (double type : new double[] {6, 9, 17}) {
            PhotometricType found =
                    witness.witness(atType(type, GravityClass.FLD_G, "2MASS", 0, null));
            double bits = 0;
            for (double p : found.kind().probabilities().values()) {
                bits -= p > 0 ? p * Math.log(p) / Math.log(2) : 0;
            }
            double sigma = found.posterior().orElseThrow().estimate().sigmaSubclass();
            double narrower = sigma / ColourSettings.standard().of("spectrum-sigma");
            double dwarf = found.kind().probability(ObjectKind.LATE_DWARF).orElseThrow();
            assertTrue(narrower > 1, "colours alone are worse than a spectrum: " + narrower);
            assertEquals(
                    bits + dwarf * Math.log(narrower) / Math.log(2),
                    found.spectrumGainBits(),
                    1e-9);
        }
    }

    @Test
    void chiSquareIsSharedByItsFreedom() {
        PhotometricType found = witness.witness(atType(12, GravityClass.FLD_G, "MKO", 0, null));
        PhotometricType other =
                new PhotometricType(
                        found.colours(),
                        found.posterior(),
                        "",
                        found.kind(),
                        6,
                        3,
                        0,
                        0,
                        0,
                        List.of());
        assertEquals(2, other.reducedChiSquare().orElseThrow());
        assertTrue(PhotometricType.allowsType(0.4));
        assertFalse(PhotometricType.allowsType(0.399));
    }

    /** There are no colours of dwarfs before M5, so such a type is not contradicted. */
    @Test
    void earlyTypesAreNotContradicted() {
        CandidatePhotometry late = atType(26, GravityClass.FLD_G, "MKO", 0, null);
        assertTrue(witness.disagreement(late, TypeEstimate.normal(3, 0.5), 0).isEmpty());
        assertTrue(witness.disagreement(late, TypeEstimate.normal(5, 0.5), 0).isPresent());
        CandidatePhotometry none = listed("j_mag", "16");
        assertTrue(witness.disagreement(none, TypeEstimate.normal(12, 0.5), 0).isEmpty());
    }
}
