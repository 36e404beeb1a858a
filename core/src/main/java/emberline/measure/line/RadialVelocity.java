package emberline.measure.line;

import emberline.measure.Measurement;
import java.util.List;
import java.util.OptionalDouble;

/**
 * The radial velocity of an object from the centres of its lines, positive away from us, in the
 * frame in which the spectrum was prepared: where a velocity was taken out beforehand, this is what
 * is left. No correction for the motion of the Earth is made.
 *
 * @param kms the velocity with its error (km/s) from the noise and from the scatter of the lines,
 *     or the reason why there is none
 * @param scaleSigmaKms the error (km/s) of the wavelength scale as good spectrographs have it,
 *     which all lines share and which {@code kms} leaves out
 * @param used the lines that were combined, at least three where there is a velocity
 * @param setAside the lines in reach of the spectrum that were not, with reasons
 */
public record RadialVelocity(
        Measurement kms,
        double scaleSigmaKms,
        List<LineVelocity> used,
        List<LineSetAside> setAside) {

    /** Copies the lists. */
    public RadialVelocity {
        used = List.copyOf(used);
        setAside = List.copyOf(setAside);
    }

    /**
     * The whole error: from noise, scatter and wavelength scale.
     *
     * @return one sigma (km/s), or empty where there is no velocity
     */
    public OptionalDouble totalSigmaKms() {
        return kms.fold(
                v -> OptionalDouble.of(Math.hypot(v.oneSigma(), scaleSigmaKms)),
                why -> OptionalDouble.empty());
    }

    /**
     * The velocity, where it is told from zero by three of its total errors.
     *
     * @return velocity (km/s), or empty where it was not measured or is not told from zero
     */
    public OptionalDouble significantKms() {
        if (kms instanceof Measurement.Measured measured
                && Math.abs(measured.value()) > 3 * totalSigmaKms().orElseThrow()) {
            return OptionalDouble.of(measured.value());
        }
        return OptionalDouble.empty();
    }
}
