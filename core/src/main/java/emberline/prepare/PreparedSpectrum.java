package emberline.prepare;

import emberline.spectrum.Finding;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.List;

/**
 * A spectrum that is ready to be measured: in vacuum, in the rest frame as far as it is known, its
 * noise known.
 *
 * @param spectrum the spectrum
 * @param resolvingPower its resolving power and how that is known
 * @param noise how the noise is known and how it is shared between neighbours
 * @param findings what was assumed or changed on the way, reading included
 */
public record PreparedSpectrum(
        Spectrum spectrum,
        ResolvingPower resolvingPower,
        NoiseModel noise,
        List<Finding> findings) {

    /** Copies the list. */
    public PreparedSpectrum {
        findings = List.copyOf(findings);
    }

    /**
     * This spectrum with one more finding.
     *
     * @param finding what was found
     * @return a new value
     */
    public PreparedSpectrum with(Finding finding) {
        List<Finding> more = new ArrayList<>(findings);
        more.add(finding);
        return new PreparedSpectrum(spectrum, resolvingPower, noise, more);
    }

    /**
     * The same with other fluxes.
     *
     * @param other a spectrum on the same pixels, its noise known in the same way
     * @return a new value
     */
    public PreparedSpectrum with(Spectrum other) {
        return new PreparedSpectrum(other, resolvingPower, noise, findings);
    }
}
