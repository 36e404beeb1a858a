package emberline.prepare;

import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * The signal-to-noise of a spectrum in one band: the median of flux over one-sigma noise of the
 * good pixels there, per pixel.
 *
 * @param range the band
 * @param coverage share of the band that good pixels cover, 0 to 1
 * @param medianSignalToNoise median of flux over sigma, at least 0: a median below zero is no
 *     signal
 */
public record BandSignal(Range range, double coverage, double medianSignalToNoise) {

    /** Fewest good pixels with which a median is given. */
    private static final int FEWEST_PIXELS = 3;

    /** Least share of a band that makes it count as observed. */
    private static final double LEAST_COVERAGE = 0.2;

    /** A band, in the order in which it is preferred where two are covered equally well. */
    public enum Range {
        /** 1.17 to 1.33 micron. */
        J("J", 1.17, 1.33),
        /** 1.50 to 1.78 micron. */
        H("H", 1.50, 1.78),
        /** 2.03 to 2.35 micron. */
        K("K", 2.03, 2.35),
        /** 0.97 to 1.10 micron. */
        Y("Y", 0.97, 1.10),
        /** 0.70 to 0.90 micron. */
        OPTICAL("the optical", 0.70, 0.90),
        /** All pixels, where no other band is covered. */
        WHOLE("the whole spectrum", 0, Double.POSITIVE_INFINITY);

        private final String words;
        private final double lowMicron;
        private final double highMicron;

        Range(String words, double lowMicron, double highMicron) {
            this.words = words;
            this.lowMicron = lowMicron;
            this.highMicron = highMicron;
        }

        /**
         * The band in words, to stand after "in".
         *
         * @return for instance {@code J} or {@code the optical}
         */
        public String words() {
            return words;
        }

        /**
         * The middle of the band.
         *
         * @return wavelength (micron); infinite for {@link #WHOLE}
         */
        public double middleMicron() {
            return (lowMicron + highMicron) / 2;
        }
    }

    /**
     * The signal in every band of which at least a fifth is covered.
     *
     * @param spectrum a spectrum
     * @return one value a band in the order of {@link Range}, {@link Range#WHOLE} last; pixels with
     *     a sigma of zero do not count
     */
    public static List<BandSignal> of(Spectrum spectrum) {
        List<BandSignal> signals = new ArrayList<>();
        for (Range range : Range.values()) {
            in(spectrum, range)
                    .filter(signal -> signal.coverage() >= LEAST_COVERAGE)
                    .ifPresent(signals::add);
        }
        return List.copyOf(signals);
    }

    /**
     * The signal in the band that is covered best, to a hundredth; where several are, the first in
     * the order of {@link Range}.
     *
     * @param spectrum a spectrum
     * @return the signal; empty where no good pixel has a sigma above zero
     */
    public static Optional<BandSignal> best(Spectrum spectrum) {
        return best(of(spectrum));
    }

    /**
     * The signal in the band that is covered best, of those that are known.
     *
     * @param signals what {@link #of} gave
     * @return the signal; empty where there is none
     */
    public static Optional<BandSignal> best(List<BandSignal> signals) {
        BandSignal best = null;
        for (BandSignal signal : signals) {
            boolean better =
                    best == null
                            || (signal.range != Range.WHOLE
                                    && Math.round(100 * signal.coverage)
                                            > Math.round(100 * best.coverage));
            if (better) {
                best = signal;
            }
        }
        return Optional.ofNullable(best);
    }

    /** The good pixels with a sigma above zero in a band. */
    static int[] pixels(Spectrum spectrum, Range range) {
        int first = spectrum.firstAtOrAbove(range.lowMicron);
        int end = Math.min(spectrum.firstAtOrAbove(range.highMicron), spectrum.size());
        return IntStream.range(first, Math.max(first, end))
                .filter(i -> spectrum.isGood(i) && spectrum.fluxSigma(i) > 0)
                .toArray();
    }

    private static Optional<BandSignal> in(Spectrum spectrum, Range range) {
        int first = spectrum.firstAtOrAbove(range.lowMicron);
        int end = Math.min(spectrum.firstAtOrAbove(range.highMicron), spectrum.size());
        double[] ratios = new double[Math.max(0, end - first)];
        int count = 0;
        double covered = 0;
        for (int i = first; i < end; i++) {
            if (spectrum.isGood(i) && spectrum.fluxSigma(i) > 0) {
                ratios[count++] = spectrum.flux(i) / spectrum.fluxSigma(i);
                covered += spectrum.highEdgeMicron(i) - spectrum.lowEdgeMicron(i);
            }
        }
        if (count < FEWEST_PIXELS) {
            return Optional.empty();
        }
        double[] sorted = Arrays.copyOf(ratios, count);
        Arrays.sort(sorted);
        double median =
                count % 2 == 1
                        ? sorted[count / 2]
                        : (sorted[count / 2 - 1] + sorted[count / 2]) / 2;
        if (!Double.isFinite(median)) {
            return Optional.empty();
        }
        double width = range.highMicron - range.lowMicron;
        double coverage = range == Range.WHOLE ? 1 : Math.min(1, covered / width);
        return Optional.of(new BandSignal(range, coverage, Math.max(0, median)));
    }
}
