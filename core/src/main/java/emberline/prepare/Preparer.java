package emberline.prepare;

import emberline.read.Observation;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.AirToVacuum;
import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.ResolvingPower.Basis;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Prepares an observation for measuring: wavelengths in vacuum and at rest, noise and resolving
 * power known. Every assumption becomes a finding.
 */
public final class Preparer {

    /** The speed of light (km/s), exact by definition of the metre. */
    public static final double SPEED_OF_LIGHT_KMS = 299_792.458;

    /** Pixels that a resolution element is taken to span where nothing else is known. */
    private static final double PIXELS_PER_ELEMENT = 2;

    /** How far a resolving power may exceed what the sampling allows: one pixel an element. */
    private static final double MOST_BEYOND_SAMPLING = 2;

    /** A preparer; it has no settings of its own. */
    public Preparer() {}

    /**
     * Prepares an observation.
     *
     * @param observation what the file holds
     * @param stated what the observer states about it
     * @return the prepared spectrum with all findings, those of reading first
     * @throws UnreadableSpectrumException if fewer than two pixels lie where wavelengths in air and
     *     extinction are known; its message says what to do
     */
    public PreparedSpectrum prepare(Observation observation, Preparing stated)
            throws UnreadableSpectrumException {
        List<Finding> findings = new ArrayList<>(observation.findings());
        double[] wavelengths = wavelengths(observation, stated, findings);
        int size = observation.size();
        int cut = size - wavelengths.length;
        double[] flux = Arrays.copyOfRange(observation.fluxes(), cut, size);
        NoiseCheck.Settled noise =
                NoiseCheck.settle(
                        observation.fluxSigmas().map(s -> Arrays.copyOfRange(s, cut, size)), flux);
        findings.addAll(noise.findings());
        Spectrum seen = Spectrum.of(wavelengths, flux, noise.sigma());
        Spectrum spectrum = stated.extinction().map(e -> without(e, seen, findings)).orElse(seen);
        ResolvingPower resolvingPower = resolvingPower(observation, stated, spectrum, findings);
        return new PreparedSpectrum(spectrum, resolvingPower, noise.model(), findings);
    }

    /**
     * The wavelengths in vacuum and at rest, without those at the short end that cannot be
     * converted.
     */
    private static double[] wavelengths(
            Observation observation, Preparing stated, List<Finding> findings)
            throws UnreadableSpectrumException {
        double[] wavelengths = observation.wavelengthsMicron();
        if (medium(observation, stated, findings) == Medium.AIR) {
            wavelengths =
                    cutBelow(
                            AirToVacuum.SHORTEST_MICRON,
                            "the refractive index of air",
                            wavelengths,
                            observation,
                            findings);
            for (int i = 0; i < wavelengths.length; i++) {
                wavelengths[i] = AirToVacuum.vacuumMicron(wavelengths[i]);
            }
        }
        if (stated.radialVelocityKms().isPresent()) {
            toRest(wavelengths, stated.radialVelocityKms().getAsDouble(), findings);
        }
        if (stated.extinction().isPresent()) {
            wavelengths =
                    cutBelow(
                            ExtinctionLaw.SHORTEST_MICRON,
                            "the extinction law",
                            wavelengths,
                            observation,
                            findings);
        }
        return wavelengths;
    }

    private static double[] cutBelow(
            double limitMicron,
            String law,
            double[] wavelengths,
            Observation observation,
            List<Finding> findings)
            throws UnreadableSpectrumException {
        int cut = 0;
        while (cut < wavelengths.length && wavelengths[cut] < limitMicron) {
            cut++;
        }
        int left = wavelengths.length - cut;
        if (left < 2) {
            throw new UnreadableSpectrumException(
                    observation.source(),
                    left + " of " + wavelengths.length + " pixels from " + limitMicron + " micron",
                    "at least two pixels where " + law + " is known",
                    "Check the unit of the wavelengths, or state no air wavelengths and no"
                            + " extinction.");
        }
        if (cut > 0) {
            findings.add(
                    Finding.note(
                            "pixels-cut",
                            cut
                                    + (cut == 1 ? " pixel" : " pixels")
                                    + " below "
                                    + limitMicron
                                    + " micron, where "
                                    + law
                                    + " is not known, cut off"));
        }
        return Arrays.copyOfRange(wavelengths, cut, wavelengths.length);
    }

    private static Medium medium(
            Observation observation, Preparing stated, List<Finding> findings) {
        Optional<Medium> file = observation.medium();
        if (stated.medium().isPresent()) {
            Medium medium = stated.medium().get();
            if (file.isPresent() && file.get() != medium) {
                findings.add(
                        Finding.caution(
                                "medium-conflict",
                                "the file says "
                                        + file.get().word()
                                        + ", the observer says "
                                        + medium.word()
                                        + "; the observer is followed"));
            }
            return medium;
        }
        if (file.isEmpty()) {
            findings.add(
                    Finding.caution(
                            "medium-assumed",
                            "neither the file nor the list says whether wavelengths are in air or"
                                    + " vacuum; vacuum is assumed (air would shift them by 1.9"
                                    + " Angstrom at 0.70 micron, 3.4 at 1.25, 6.0 at 2.2)"));
        }
        return file.orElse(Medium.VACUUM);
    }

    private static void toRest(double[] wavelengths, double velocity, List<Finding> findings) {
        double factor =
                Math.sqrt(
                        (1 - velocity / SPEED_OF_LIGHT_KMS) / (1 + velocity / SPEED_OF_LIGHT_KMS));
        for (int i = 0; i < wavelengths.length; i++) {
            wavelengths[i] *= factor;
        }
        findings.add(
                Finding.note(
                        "rest-frame",
                        String.format(
                                Locale.ROOT,
                                "shifted to rest by the stated radial velocity of %.1f km/s",
                                velocity)));
    }

    private static Spectrum without(
            Preparing.Extinction extinction, Spectrum seen, List<Finding> findings) {
        findings.add(
                Finding.note(
                        "dereddened",
                        String.format(
                                Locale.ROOT,
                                "an extinction of A_V = %.2f mag was taken out (Fitzpatrick 1999,"
                                        + " R_V = %.1f)",
                                extinction.avMag(),
                                extinction.rv())));
        return new Dereddening(seen, extinction.rv()).without(extinction.avMag());
    }

    private static ResolvingPower resolvingPower(
            Observation observation, Preparing stated, Spectrum spectrum, List<Finding> findings) {
        double sampled = samplingPower(spectrum);
        if (stated.resolvingPower().isPresent()) {
            findings.removeIf(
                    finding -> finding.code().equals(Observation.RESOLVING_POWER_FROM_HEADER));
            double value = stated.resolvingPower().getAsDouble();
            warnOfSampling(value, sampled, "stated", findings);
            return new ResolvingPower(value, Basis.GIVEN);
        }
        if (observation.resolvingPower().isPresent()) {
            ResolvingPower header = observation.resolvingPower().get();
            warnOfSampling(header.value(), sampled, "of the header", findings);
            return header;
        }
        findings.add(
                Finding.caution(
                        "resolution-estimated",
                        String.format(
                                Locale.ROOT,
                                "resolving power is not stated; %.0f was taken from the sampling"
                                        + " (two pixels a resolution element), an upper limit",
                                sampled)));
        return new ResolvingPower(sampled, Basis.SAMPLING);
    }

    private static void warnOfSampling(
            double value, double sampled, String whose, List<Finding> findings) {
        if (value > MOST_BEYOND_SAMPLING * sampled) {
            findings.add(
                    Finding.caution(
                            "resolution-beyond-sampling",
                            String.format(
                                    Locale.ROOT,
                                    "the resolving power %s is %.0f, but the pixels sample no more"
                                            + " than about %.0f (two pixels a resolution element):"
                                            + " check the list or the --resolution option, or"
                                            + " whether the spectrum was binned",
                                    whose,
                                    value,
                                    sampled)));
        }
    }

    /** The resolving power that the sampling allows: an upper limit. */
    static double samplingPower(Spectrum spectrum) {
        double[] perPixel = new double[spectrum.size()];
        for (int i = 0; i < perPixel.length; i++) {
            perPixel[i] = spectrum.wavelengthMicron(i) / spectrum.localSpacingMicron(i);
        }
        Arrays.sort(perPixel);
        return perPixel[perPixel.length / 2] / PIXELS_PER_ELEMENT;
    }
}
