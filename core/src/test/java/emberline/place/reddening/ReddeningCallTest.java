package emberline.place.reddening;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.SharedSpectra;
import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.place.Placement;
import emberline.prepare.ExtinctionLaw;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import emberline.spectrum.Spectrum;
import emberline.survey.Chain;
import emberline.survey.ObjectResult;
import emberline.survey.ReddeningMode;
import emberline.survey.SurveySettings;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Extinction is fitted where it is called for. Real dwarfs are seen through a known extinction
 * (Fitzpatrick 1999, R_V 3.1).
 */
class ReddeningCallTest {

    private static final String M9 = "originals/irtf_library/M9V_LHS2924.fits";
    private static final String M8 = "originals/irtf_library/M8V_Gl752B.fits";

    @TempDir private Path folder;

    private static Chain chain(ReddeningMode mode) {
        return new Chain(
                FeatureCatalogue.standard(),
                Measuring.withDefaults(),
                SurveySettings.withDefaults().withReddening(mode));
    }

    private Candidate reddened(String file, double avMag)
            throws IOException, UnreadableSpectrumException {
        Spectrum spectrum =
                new Preparer()
                        .prepare(
                                new SpectrumReader().read(SharedSpectra.folder().resolve(file)),
                                Preparing.withDefaults().withResolvingPower(2000))
                        .spectrum();
        ExtinctionLaw law = ExtinctionLaw.fitzpatrick1999(ExtinctionLaw.DIFFUSE_RV);
        StringBuilder text = new StringBuilder("wavelength_micron,flux,sigma\n");
        for (int i = 0; i < spectrum.size(); i++) {
            double micron = spectrum.wavelengthMicron(i);
            double factor = Math.pow(10, -0.4 * avMag * law.relativeTo(micron));
            if (spectrum.isGood(i)) {
                text.append(
                        String.format(
                                Locale.ROOT,
                                "%.7f,%.7e,%.7e%n",
                                micron,
                                factor * spectrum.flux(i),
                                factor * spectrum.fluxSigma(i)));
            }
        }
        Files.writeString(folder.resolve("reddened.csv"), text);
        return new Candidate(
                "reddened",
                1,
                List.of("reddened.csv"),
                Map.of("medium", "vacuum", "resolution", "2000"));
    }

    private static boolean has(ObjectResult result, String code) {
        return result.findings().stream().map(Finding::code).anyMatch(code::equals);
    }

    private static double type(ObjectResult result) {
        return result.placement().flatMap(Placement::type).orElseThrow().typeNumber();
    }

    @Test
    void aLateDwarfBehindDustGetsItsTypeAndItsExtinction() throws Exception {
        Candidate dusty = reddened(M9, 8);
        ObjectResult result = chain(ReddeningMode.CALLED_FOR).run(dusty, folder);
        ReddeningFit fit = result.placement().flatMap(Placement::reddening).orElseThrow();
        assertTrue(fit.lo95Mag() - 0.5 <= 8 && 8 <= fit.hi95Mag() + 0.5, fit.toString());
        assertTrue(fit.logGain() > 15, fit.toString());
        assertEquals(9, type(result), 1.2);
        assertTrue(has(result, "reddening-fitted"), result.findings().toString());
        ObjectResult never = chain(ReddeningMode.NEVER).run(dusty, folder);
        assertTrue(never.placement().flatMap(Placement::reddening).isEmpty());
    }

    @Test
    void aDwarfWithoutDustIsLeftAsItIs() throws Exception {
        Candidate clean = reddened(M8, 0);
        ObjectResult result = chain(ReddeningMode.CALLED_FOR).run(clean, folder);
        assertTrue(result.placement().flatMap(Placement::reddening).isEmpty());
        assertFalse(has(result, "reddening-not-believed"), "not even tried");
        ObjectResult never = chain(ReddeningMode.NEVER).run(clean, folder);
        assertEquals(type(never), type(result));
    }

    /** An early star is tried, and no extinction makes it a late dwarf. */
    @Test
    void anEarlyStarGetsNoType() throws Exception {
        Candidate star = reddened("originals/irtf_library/G2V_HD76151.fits", 4);
        ObjectResult result = chain(ReddeningMode.CALLED_FOR).run(star, folder);
        assertTrue(result.placement().flatMap(Placement::type).isEmpty());
        assertTrue(has(result, "reddening-not-believed"), result.findings().toString());
    }
}
