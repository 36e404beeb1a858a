package emberline.read;

import emberline.spectrum.Candidate;
import emberline.spectrum.Finding;
import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * The magnitudes that the row of a list holds: {@code y_mag, j_mag, h_mag, k_mag, w1_mag, w2_mag}
 * with {@code _err}, Vega; J, H and K in the system that {@code mag_system} names (2MASS or MKO,
 * 2MASS where it is missing), Y always in MKO.
 *
 * @param magnitudes by band; those that cannot be used are left out
 * @param withoutError bands listed without an error, for which {@link #ASSUMED_ERROR_MAG} is taken
 * @param systemAssumed whether J, H or K is there and the list does not state their system
 * @param findings what could not be used, and why
 */
public record CandidatePhotometry(
        Map<MagnitudeBand, Magnitude> magnitudes,
        List<MagnitudeBand> withoutError,
        boolean systemAssumed,
        List<Finding> findings) {

    /** Error of a magnitude that is listed without one (mag); an assumption. */
    public static final double ASSUMED_ERROR_MAG = 0.1;

    private static final List<String> LETTERS = List.of("y", "j", "h", "k", "w1", "w2");
    private static final String ASSUMED_SYSTEM = "2MASS";

    /** Magnitudes outside this range are no measurement but stand for none, such as 99. */
    private static final double BRIGHTEST = -10;

    private static final double FAINTEST = 35;

    /** Copies the collections. */
    public CandidatePhotometry {
        magnitudes = Map.copyOf(magnitudes);
        withoutError = List.copyOf(withoutError);
        findings = List.copyOf(findings);
    }

    /**
     * The magnitudes of a candidate.
     *
     * @param candidate the row of the list
     * @return its magnitudes, perhaps none
     */
    public static CandidatePhotometry of(Candidate candidate) {
        Optional<String> stated = candidate.text("mag_system");
        Map<MagnitudeBand, Magnitude> magnitudes = new EnumMap<>(MagnitudeBand.class);
        List<MagnitudeBand> withoutError = new ArrayList<>();
        List<Finding> findings = new ArrayList<>();
        boolean assumed = false;
        boolean refused = false;
        for (String letter : LETTERS) {
            OptionalDouble mag = candidate.number(letter + "_mag");
            if (mag.isEmpty()) {
                continue;
            }
            Optional<MagnitudeBand> band = MagnitudeBand.of(letter, stated.orElse(ASSUMED_SYSTEM));
            if (band.isEmpty()) {
                refused = true;
                continue;
            }
            OptionalDouble error = candidate.number(letter + "_mag_err");
            if (mag.getAsDouble() < BRIGHTEST
                    || mag.getAsDouble() > FAINTEST
                    || error.orElse(0) < 0) {
                findings.add(unusable(letter, mag.getAsDouble(), error));
                continue;
            }
            if (error.isEmpty()) {
                withoutError.add(band.get());
            }
            magnitudes.put(
                    band.get(), new Magnitude(mag.getAsDouble(), error.orElse(ASSUMED_ERROR_MAG)));
            assumed |= stated.isEmpty() && band.get().name().endsWith(ASSUMED_SYSTEM);
        }
        if (refused) {
            findings.add(
                    Finding.caution(
                            "mag-system-unusable",
                            "column mag_system: expected 2MASS or MKO but was '"
                                    + stated.orElseThrow()
                                    + "'; J, H and K were not used"));
        }
        return new CandidatePhotometry(magnitudes, withoutError, assumed, findings);
    }

    private static Finding unusable(String letter, double mag, OptionalDouble error) {
        return Finding.caution(
                "magnitude-unusable",
                "column "
                        + letter
                        + "_mag: "
                        + mag
                        + (error.isPresent() ? " with the error " + error.getAsDouble() : "")
                        + " was not used: expected a magnitude between -10 and 35 with no negative"
                        + " error; leave the cell empty where there is none");
    }
}
