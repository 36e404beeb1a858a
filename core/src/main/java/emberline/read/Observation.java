package emberline.read;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import emberline.spectrum.ResolvingPower;
import java.util.List;
import java.util.Optional;

/**
 * What a file holds, before any preparation: wavelengths in micron but still in the medium of the
 * file, flux density per unit wavelength on any scale, its noise if the file has one, and what was
 * found on the way. A value: nothing can change it, arrays are copied in and out.
 */
public final class Observation {

    /** Code of the finding that the resolving power was taken from the header. */
    public static final String RESOLVING_POWER_FROM_HEADER = "resolving-power-from-header";

    private final String source;
    private final String format;
    private final String sha256;
    private final double[] wavelengthsMicron;
    private final double[] fluxes;
    private final Optional<double[]> fluxSigmas;
    private final Optional<Medium> medium;
    private final Optional<ResolvingPower> resolvingPower;
    private final List<Finding> findings;

    private Observation(Origin origin, Pixels pixels, Stated stated, List<Finding> findings) {
        this.source = origin.source();
        this.format = origin.format();
        this.sha256 = origin.sha256();
        this.wavelengthsMicron = pixels.wavelengths();
        this.fluxes = pixels.fluxes();
        this.fluxSigmas = pixels.sigmas();
        this.medium = stated.medium();
        this.resolvingPower = stated.resolvingPower();
        this.findings = List.copyOf(findings);
    }

    /**
     * Where an observation comes from.
     *
     * @param source file name as shown to the observer
     * @param format the format in words
     * @param sha256 hexadecimal SHA-256 checksum of the bytes on disk
     */
    public record Origin(String source, String format, String sha256) {}

    /**
     * What a file states beside its pixels.
     *
     * @param medium the medium of its wavelengths, empty where it says nothing
     * @param resolvingPower its resolving power, empty where it says nothing
     */
    public record Stated(Optional<Medium> medium, Optional<ResolvingPower> resolvingPower) {}

    /**
     * Makes an observation from parallel arrays, which are copied.
     *
     * @param origin where it comes from
     * @param wavelengthsMicron pixel centres (micron, medium of the file), finite, positive,
     *     strictly increasing, at least two
     * @param fluxes flux per unit wavelength on any scale, as many as pixels; NaN where bad
     * @param fluxSigmas one-sigma noise on the scale of the flux, as many as pixels; NaN where
     *     unknown; empty where the file has none
     * @param stated medium and resolving power as the file states them
     * @param findings what was found on the way
     * @return the observation
     * @throws IllegalArgumentException if lengths differ, there are fewer than two pixels or the
     *     wavelengths do not increase
     */
    public static Observation of(
            Origin origin,
            double[] wavelengthsMicron,
            double[] fluxes,
            Optional<double[]> fluxSigmas,
            Stated stated,
            List<Finding> findings) {
        Pixels pixels = Pixels.checked(wavelengthsMicron, fluxes, fluxSigmas);
        return new Observation(origin, pixels, stated, findings);
    }

    /**
     * The file name as shown to the observer.
     *
     * @return the name without its folder
     */
    public String source() {
        return source;
    }

    /**
     * The format in words.
     *
     * @return for instance {@code FITS image, 3 rows of 1982} or {@code ECSV table, 3 columns}
     */
    public String format() {
        return format;
    }

    /**
     * The checksum of the file as it lies on disk, packed or not.
     *
     * @return SHA-256 in hexadecimal
     */
    public String sha256() {
        return sha256;
    }

    /**
     * The number of pixels, bad ones included.
     *
     * @return at least two
     */
    public int size() {
        return wavelengthsMicron.length;
    }

    /**
     * A copy of the pixel centres.
     *
     * @return wavelengths (micron, medium of the file), strictly increasing
     */
    public double[] wavelengthsMicron() {
        return wavelengthsMicron.clone();
    }

    /**
     * A copy of the fluxes.
     *
     * @return flux per unit wavelength on any scale; NaN where bad or masked
     */
    public double[] fluxes() {
        return fluxes.clone();
    }

    /**
     * A copy of the noise.
     *
     * @return one-sigma noise on the scale of the flux, NaN where unknown or bad; empty where the
     *     file has none
     */
    public Optional<double[]> fluxSigmas() {
        return fluxSigmas.map(double[]::clone);
    }

    /**
     * The medium of the wavelengths as the file states it.
     *
     * @return air or vacuum, or empty where the file says nothing
     */
    public Optional<Medium> medium() {
        return medium;
    }

    /**
     * The resolving power as the file states it.
     *
     * @return resolving power with basis HEADER, or empty where the file says nothing
     */
    public Optional<ResolvingPower> resolvingPower() {
        return resolvingPower;
    }

    /**
     * What was found on the way: assumptions made, pixels left out.
     *
     * @return the findings in the order they were made
     */
    public List<Finding> findings() {
        return findings;
    }

    @Override
    public String toString() {
        return source + " (" + format + "), " + size() + " pixels";
    }

    /** Checked copies of the arrays. */
    private static final class Pixels {
        private final double[] wavelengths;
        private final double[] fluxes;
        private final Optional<double[]> sigmas;

        private Pixels(double[] wavelengths, double[] fluxes, Optional<double[]> sigmas) {
            this.wavelengths = wavelengths;
            this.fluxes = fluxes;
            this.sigmas = sigmas;
        }

        static Pixels checked(double[] wavelengths, double[] fluxes, Optional<double[]> sigmas) {
            int size = wavelengths.length;
            int sigmaSize = sigmas.isPresent() ? sigmas.get().length : size;
            if (size < 2 || fluxes.length != size || sigmaSize != size) {
                throw new IllegalArgumentException(
                        "observation of "
                                + size
                                + " wavelengths, "
                                + fluxes.length
                                + " fluxes and "
                                + sigmaSize
                                + " sigmas: expected equal lengths and at least two pixels");
            }
            double before = 0;
            for (int i = 0; i < size; i++) {
                if (!(wavelengths[i] > before) || Double.isInfinite(wavelengths[i])) {
                    throw new IllegalArgumentException(
                            "wavelength "
                                    + wavelengths[i]
                                    + " micron of pixel "
                                    + i
                                    + " follows "
                                    + before
                                    + ": expected finite, positive, increasing wavelengths");
                }
                before = wavelengths[i];
            }
            return new Pixels(wavelengths.clone(), fluxes.clone(), sigmas.map(double[]::clone));
        }

        double[] wavelengths() {
            return wavelengths;
        }

        double[] fluxes() {
            return fluxes;
        }

        Optional<double[]> sigmas() {
            return sigmas;
        }
    }
}
