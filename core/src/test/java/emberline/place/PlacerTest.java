package emberline.place;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.prepare.NoiseModel;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Finding;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;

class PlacerTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();

    private static Measurements flat(double low, double high) {
        int size = (int) ((high - low) / 2e-3);
        double[] wavelengths = new double[size];
        double[] flux = new double[size];
        double[] noise = new double[size];
        Arrays.fill(flux, 1);
        Arrays.fill(noise, 0.01);
        for (int i = 0; i < size; i++) {
            wavelengths[i] = low + i * 2e-3;
        }
        return new Measurer(CATALOGUE, Measuring.withDefaults())
                .measure(
                        new PreparedSpectrum(
                                Spectrum.of(wavelengths, flux, noise),
                                new ResolvingPower(120, Basis.GIVEN),
                                NoiseModel.INDEPENDENT,
                                List.of()));
    }

    private static List<String> codes(Placement placement) {
        return placement.findings().stream().map(Finding::code).toList();
    }

    /** Every ratio of a constant is 1, which is within the range of some relations. */
    @Test
    void aSpectrumWithoutBandsIsSaidToHaveNone() {
        Placement placement = new Placer(CATALOGUE).place(flat(0.8, 2.4), 1);
        assertTrue(placement.published().type().isPresent());
        assertTrue(placement.type().isEmpty());
        assertTrue(placement.typeReason().startsWith("kind: "), placement.typeReason());
        assertTrue(codes(placement).contains("no-bands"), codes(placement).toString());
        assertTrue(codes(placement).contains("not-a-late-dwarf"), codes(placement).toString());
    }

    @Test
    void tooLittleToSayThatThereAreNoBands() {
        Placement placement = new Placer(CATALOGUE).place(flat(1.45, 1.8), 1);
        assertTrue(!codes(placement).contains("no-bands"), codes(placement).toString());
    }

    /** LHS 2924, an M9 of a public library: see the manifest beside its spectrum. */
    @Test
    void aLateDwarfGetsTypeAndVerdicts() throws Exception {
        PreparedSpectrum dwarf = SharedSpectra.ofLibrary("M9V_LHS2924.fits");
        Measurements measured = new Measurer(CATALOGUE, Measuring.withDefaults()).measure(dwarf);
        Placer placer = new Placer(CATALOGUE);
        Placement placement = placer.place(measured, 1);
        assertEquals(9, placement.type().orElseThrow().typeNumber(), 1);
        assertEquals("", placement.typeReason());
        assertTrue(placement.gravity().gravityClass().isPresent(), "gravity is judged");
        assertTrue(placement.pair().reason().contains("outside L7 to T4"), "pairs are later");
        assertEquals(5, placement.kin().size());
        assertTrue(placement.reddening().isEmpty());
        Placement other = placer.place(flat(0.8, 2.4), 1);
        assertTrue(other.pair().reason().endsWith("no type"), other.pair().reason());
        assertTrue(other.gravity().reason().startsWith("no type"), other.gravity().reason());
    }

    @Test
    void theSameSeedGivesTheSamePlacement() {
        Placer placer = new Placer(CATALOGUE);
        Measurements flat = flat(0.8, 2.4);
        assertEquals(
                placer.place(flat, 5).gravity().pVeryLowGravity(),
                placer.place(flat, 5).gravity().pVeryLowGravity());
    }
}
