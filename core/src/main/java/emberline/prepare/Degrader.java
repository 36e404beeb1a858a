package emberline.prepare;

import emberline.read.Observation;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.Finding;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.IntStream;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.sampling.distribution.ZigguratSampler;
import org.apache.commons.rng.simple.RandomSource;

/**
 * Makes an observation worse, as if a lesser instrument or a shorter exposure had taken it: first
 * the wavelengths are cut, then the resolution is lowered, then noise is added. Nothing is ever
 * improved. It works on what was read, so that noise and quality are judged as for any spectrum.
 */
public final class Degrader {

    private static final int BISECTIONS = 40;

    /** A degrader; it has no settings of its own. */
    public Degrader() {}

    /**
     * A degraded observation with what is now to be stated about it.
     *
     * @param observation what the lesser instrument would have seen
     * @param stated the statements about it: the resolving power is the lowered one
     */
    public record Degraded(Observation observation, Preparing stated) {}

    /**
     * Degrades an observation.
     *
     * @param observation what was read
     * @param stated what the observer states about it
     * @param how by how much; {@link Degrading#none} returns the observation itself
     * @param seed start of the random noise; the same seed gives the same pixels
     * @return the degraded observation, with a finding for each step
     * @throws UnreadableSpectrumException if fewer than two pixels are left
     */
    public Degraded degrade(Observation observation, Preparing stated, Degrading how, long seed)
            throws UnreadableSpectrumException {
        Degraded degraded = new Degraded(observation, stated);
        if (how.band().isPresent()) {
            degraded = new Degraded(cut(observation, how.band().get()), stated);
        }
        if (how.resolvingPower().isPresent()) {
            degraded = smoothed(degraded, how.resolvingPower().getAsDouble());
        }
        if (how.signalToNoise().isPresent()) {
            double target = how.signalToNoise().getAsDouble();
            degraded =
                    new Degraded(noisier(degraded.observation(), target, seed), degraded.stated());
        }
        return degraded;
    }

    private static Observation cut(Observation observation, ObservedBand band)
            throws UnreadableSpectrumException {
        double[] wavelengths = observation.wavelengthsMicron();
        int[] kept =
                IntStream.range(0, wavelengths.length)
                        .filter(i -> band.contains(wavelengths[i]))
                        .toArray();
        if (kept.length < 2) {
            throw new UnreadableSpectrumException(
                    observation.source(),
                    kept.length + " pixels in the band " + band.word(),
                    "at least two to keep this band alone",
                    "Keep another band, or leave this object out.");
        }
        Finding finding =
                Finding.note(
                        "degraded-band",
                        "only the " + kept.length + " pixels of the band " + band.word() + " kept");
        return with(
                observation,
                at(wavelengths, kept),
                at(observation.fluxes(), kept),
                observation.fluxSigmas().map(sigma -> at(sigma, kept)),
                finding);
    }

    private static double[] at(double[] values, int[] places) {
        return IntStream.of(places).mapToDouble(i -> values[i]).toArray();
    }

    private static Degraded smoothed(Degraded before, double power)
            throws UnreadableSpectrumException {
        Observation observation = before.observation();
        double[] wavelengths = observation.wavelengthsMicron();
        double[] flux = observation.fluxes();
        Optional<double[]> sigma = observation.fluxSigmas();
        Spectrum grid = Spectrum.of(wavelengths, flux, new double[flux.length]);
        double own = ownPower(before, grid);
        if (own <= power) {
            Finding kept =
                    Finding.note(
                            "degraded-not",
                            String.format(
                                    Locale.ROOT,
                                    "a resolving power of %.0f is no finer than the %.0f asked for"
                                            + " and was left",
                                    own,
                                    power));
            return new Degraded(with(observation, wavelengths, flux, sigma, kept), before.stated());
        }
        CoarserGrid coarser = CoarserGrid.of(grid, own, power);
        if (coarser.size() < 2) {
            throw new UnreadableSpectrumException(
                    observation.source(),
                    coarser.size() + " pixels at a resolving power of " + power,
                    "at least two",
                    "Degrade to a finer resolution, or leave this object out.");
        }
        Finding finding =
                Finding.note(
                        "degraded-resolution",
                        String.format(
                                Locale.ROOT,
                                "smoothed from a resolving power of %.0f to %.0f, two pixels a"
                                        + " resolution element",
                                own,
                                power));
        return new Degraded(
                with(
                        observation,
                        coarser.wavelengthsMicron(),
                        coarser.means(flux),
                        sigma.map(s -> coarser.sigmas(flux, s)),
                        finding),
                before.stated().withResolvingPower(power));
    }

    private static double ownPower(Degraded before, Spectrum grid) {
        return before.stated()
                .resolvingPower()
                .orElseGet(
                        () ->
                                before.observation()
                                        .resolvingPower()
                                        .map(ResolvingPower::value)
                                        .orElseGet(() -> Preparer.samplingPower(grid)));
    }

    /**
     * Adds noise of one height to all pixels, as the sky gives it, so high that the median
     * signal-to-noise in the band that is covered best comes down to the target.
     */
    private static Observation noisier(Observation observation, double target, long seed) {
        double[] wavelengths = observation.wavelengthsMicron();
        double[] flux = observation.fluxes();
        double[] own = observation.fluxSigmas().orElseGet(() -> PixelScatter.sigma(flux));
        Spectrum spectrum = Spectrum.of(wavelengths, flux, own);
        Optional<BandSignal> best = BandSignal.best(spectrum);
        if (best.isEmpty() || !(best.get().medianSignalToNoise() > target)) {
            Finding kept =
                    Finding.note(
                            "degraded-not",
                            String.format(
                                    Locale.ROOT,
                                    "the median signal-to-noise is not known to exceed the %.1f"
                                            + " asked for; no noise was added",
                                    target));
            return with(observation, wavelengths, flux, observation.fluxSigmas(), kept);
        }
        double added = addedSigma(spectrum, best.get().range(), target);
        UniformRandomProvider random = RandomSource.XO_RO_SHI_RO_128_PP.create(seed);
        ZigguratSampler.NormalizedGaussian normal = ZigguratSampler.NormalizedGaussian.of(random);
        double[] noisy = new double[flux.length];
        for (int i = 0; i < flux.length; i++) {
            noisy[i] = flux[i] + added * normal.sample();
        }
        Finding finding =
                Finding.note(
                        "degraded-noise",
                        String.format(
                                Locale.ROOT,
                                "noise was added down to a median signal-to-noise of %.1f a pixel",
                                target));
        return with(
                observation,
                wavelengths,
                noisy,
                observation.fluxSigmas().map(sigma -> quadratic(sigma, added)),
                finding);
    }

    /** The noise that brings the median of a band down to the target. */
    private static double addedSigma(Spectrum spectrum, BandSignal.Range range, double target) {
        int[] pixels = BandSignal.pixels(spectrum, range);
        double low = 0;
        double high =
                IntStream.of(pixels).mapToDouble(i -> Math.abs(spectrum.flux(i))).max().orElse(1);
        while (median(spectrum, pixels, high) > target) {
            high *= 2;
        }
        for (int k = 0; k < BISECTIONS; k++) {
            double middle = (low + high) / 2;
            if (median(spectrum, pixels, middle) > target) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return (low + high) / 2;
    }

    private static double median(Spectrum spectrum, int[] pixels, double added) {
        double[] ratios =
                IntStream.of(pixels)
                        .mapToDouble(
                                i -> spectrum.flux(i) / Math.hypot(spectrum.fluxSigma(i), added))
                        .sorted()
                        .toArray();
        int middle = ratios.length / 2;
        return ratios.length % 2 == 1 ? ratios[middle] : (ratios[middle - 1] + ratios[middle]) / 2;
    }

    private static double[] quadratic(double[] sigma, double added) {
        double[] sum = new double[sigma.length];
        for (int i = 0; i < sum.length; i++) {
            // a pixel without a positive sigma is bad, and stays so
            sum[i] = sigma[i] > 0 ? Math.hypot(sigma[i], added) : sigma[i];
        }
        return sum;
    }

    private static Observation with(
            Observation from,
            double[] wavelengths,
            double[] fluxes,
            Optional<double[]> sigmas,
            Finding finding) {
        List<Finding> findings = new ArrayList<>(from.findings());
        findings.add(finding);
        return Observation.of(
                new Observation.Origin(from.source(), from.format(), from.sha256()),
                wavelengths,
                fluxes,
                sigmas,
                new Observation.Stated(from.medium(), from.resolvingPower()),
                findings);
    }
}
