package emberline.place.reddening;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.place.Placer;
import emberline.prepare.ExtinctionLaw;
import emberline.prepare.PreparedSpectrum;
import emberline.spectrum.Spectrum;
import java.util.List;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Real dwarfs of published type, reddened by a known extinction (Fitzpatrick 1999, R_V 3.1), are
 * found with their type and that extinction. Spectra and types: public libraries named in the
 * manifest beside them.
 */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class ReddeningFitterTest {

    private static final FeatureCatalogue CATALOGUE = FeatureCatalogue.standard();
    private static final Measurer MEASURER = new Measurer(CATALOGUE, Measuring.withDefaults());
    private final Placer placer = new Placer(CATALOGUE);

    @ParameterizedTest
    @CsvSource({
        "M9V_LHS2924.fits, 9, 0",
        "M9V_LHS2924.fits, 9, 4",
        "M6V_Gl406.fits, 6, 9",
        "M8V_Gl752B.fits, 8, 2"
    })
    void typeAndExtinctionAreFoundTogether(String file, double type, double avMag)
            throws Exception {
        PreparedSpectrum clean = SharedSpectra.ofLibrary(file);
        ReddeningFit fit = placer.fitReddening(av -> measured(clean, avMag - av), 0).orElseThrow();
        assertTrue(
                fit.lo95Mag() - 0.5 <= avMag && avMag <= fit.hi95Mag() + 0.5,
                "A_V " + avMag + " but " + fit.lo95Mag() + " to " + fit.hi95Mag());
        assertEquals(type, fit.posterior().estimate().typeNumber(), 1.2);
    }

    /** Measures a spectrum behind an extinction; a negative one takes extinction out. */
    private static Measurements measured(PreparedSpectrum clean, double avMag) {
        ExtinctionLaw law = ExtinctionLaw.fitzpatrick1999(ExtinctionLaw.DIFFUSE_RV);
        Spectrum spectrum = clean.spectrum();
        double[] wavelengths = new double[spectrum.size()];
        double[] flux = new double[spectrum.size()];
        double[] sigma = new double[spectrum.size()];
        for (int i = 0; i < wavelengths.length; i++) {
            wavelengths[i] = spectrum.wavelengthMicron(i);
            double factor = Math.pow(10, -0.4 * avMag * law.relativeTo(wavelengths[i]));
            flux[i] = spectrum.flux(i) * factor;
            sigma[i] = spectrum.fluxSigma(i) * factor;
        }
        return MEASURER.measure(
                new PreparedSpectrum(
                        Spectrum.of(wavelengths, flux, sigma),
                        clean.resolvingPower(),
                        clean.noise(),
                        List.of()));
    }
}
