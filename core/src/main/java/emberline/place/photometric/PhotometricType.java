package emberline.place.photometric;

import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.place.kind.KindVerdict;
import emberline.spectrum.Finding;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What the colours of an object say.
 *
 * @param colours the colours that were used, from blue to red, e.g. {@code J-H}
 * @param posterior probability of type and gravity class if it is a late dwarf of M5 to Y1; empty
 *     where there are fewer than two magnitudes
 * @param reason why there is no type; empty where there is one
 * @param kind late dwarf, giant, earlier star or reddened star, as far as J, H and Ks of 2MASS tell
 * @param chiSquare chi-square of the most probable template
 * @param freedom colours less the fitted type and, where it is fitted, extinction; not negative
 * @param pReddened probability that a late dwarf is seen through dust, 0 to 1
 * @param avMag median extinction in V of a late dwarf if it is behind dust (mag)
 * @param spectrumGainBits what a spectrum is expected to tell beyond the colours (bit)
 * @param findings what the observer should know
 */
public record PhotometricType(
        List<String> colours,
        Optional<TypePosterior> posterior,
        String reason,
        KindVerdict kind,
        double chiSquare,
        int freedom,
        double pReddened,
        double avMag,
        double spectrumGainBits,
        List<Finding> findings) {

    /** A late dwarf less probable than this gets no type, as with a spectrum. */
    private static final double LEAST = 0.4;

    /** Copies the lists. */
    public PhotometricType {
        colours = List.copyOf(colours);
        findings = List.copyOf(findings);
    }

    /**
     * No statement.
     *
     * @param reason why
     * @param findings what the observer should know
     * @return a result without posterior
     */
    static PhotometricType none(String reason, List<Finding> findings) {
        return new PhotometricType(
                List.of(),
                Optional.empty(),
                reason,
                KindVerdict.notJudged(reason),
                0,
                0,
                0,
                0,
                0,
                findings);
    }

    /** Whether the kind allows a type. */
    static boolean allowsType(double pLateDwarf) {
        return pLateDwarf >= LEAST;
    }

    /**
     * The type in numbers.
     *
     * @return the estimate; empty where {@link #reason} says why
     */
    public Optional<TypeEstimate> type() {
        return reason.isEmpty() ? posterior.map(TypePosterior::estimate) : Optional.empty();
    }

    /**
     * Chi-square by degrees of freedom.
     *
     * @return reduced chi-square; empty where no freedom is left
     */
    public OptionalDouble reducedChiSquare() {
        return freedom > 0 ? OptionalDouble.of(chiSquare / freedom) : OptionalDouble.empty();
    }
}
