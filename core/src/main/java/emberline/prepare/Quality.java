package emberline.prepare;

import emberline.prepare.BandSignal.Range;
import emberline.spectrum.Finding.Severity;
import emberline.spectrum.ResolvingPower;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;

/**
 * Is the spectrum good enough? One grade in words, with its reason and what it rests on.
 *
 * @param grade the grade
 * @param reason why, in one sentence
 * @param bands signal and coverage by band
 */
public record Quality(Grade grade, String reason, List<BandSignal> bands) {

    /** Share of a band that must be covered for the band to count. */
    private static final double COVERED = 0.7;

    private static final double GOOD_SIGNAL = 30;
    private static final double USABLE_SIGNAL = 10;
    private static final double POOR_SIGNAL = 3;

    /** How good a spectrum is for placing an object. */
    public enum Grade {
        /** At least two bands with a signal-to-noise of 30 a resolution element. */
        GOOD,
        /** At least one band with a signal-to-noise of 10: a type, gravity with doubt. */
        USABLE,
        /** A signal-to-noise of 3 to 10, or noise not known: a rough type at best. */
        POOR,
        /** No band with a signal. */
        UNUSABLE;

        /**
         * The word used in all outputs.
         *
         * @return lower-case word
         */
        public String word() {
            return name().toLowerCase(Locale.ROOT);
        }
    }

    /** Copies the list. */
    public Quality {
        bands = List.copyOf(bands);
    }

    /**
     * Grades a spectrum.
     *
     * @param prepared a prepared spectrum
     * @return its quality
     */
    public static Quality of(PreparedSpectrum prepared) {
        List<BandSignal> bands = BandSignal.of(prepared.spectrum());
        List<BandSignal> covered =
                bands.stream()
                        .filter(band -> band.range() != Range.WHOLE)
                        .filter(band -> band.coverage() >= COVERED)
                        .toList();
        if (covered.isEmpty()) {
            return new Quality(Grade.POOR, "no band is covered by more than 70%", bands);
        }
        List<Double> signals = new ArrayList<>();
        for (BandSignal band : covered) {
            signals.add(perElement(band, prepared));
        }
        double best = signals.stream().max(Comparator.naturalOrder()).orElseThrow();
        String strongest = covered.get(signals.indexOf(best)).range().words();
        String signal =
                String.format(
                        Locale.ROOT,
                        "signal-to-noise %.0f a resolution element in %s",
                        best,
                        strongest);
        long good = signals.stream().filter(s -> s >= GOOD_SIGNAL).count();
        Grade grade =
                best < POOR_SIGNAL
                        ? Grade.UNUSABLE
                        : best < USABLE_SIGNAL ? Grade.POOR : good >= 2 ? Grade.GOOD : Grade.USABLE;
        boolean doubted =
                prepared.findings().stream().anyMatch(f -> f.severity() == Severity.WARNING)
                        || prepared.noise().estimated();
        if (grade == Grade.GOOD && doubted) {
            return new Quality(
                    Grade.USABLE, signal + ", but the noise is not known or in doubt", bands);
        }
        return new Quality(grade, signal + ", " + covered.size() + " bands covered", bands);
    }

    /** Signal-to-noise of a band a resolution element, with shared noise counted once. */
    private static double perElement(BandSignal band, PreparedSpectrum prepared) {
        double middle = band.range().middleMicron();
        ResolvingPower resolvingPower = prepared.resolvingPower();
        int pixel =
                Math.min(
                        prepared.spectrum().firstAtOrAbove(middle), prepared.spectrum().size() - 1);
        double pixels =
                Math.max(
                        1,
                        middle
                                / resolvingPower.value()
                                / prepared.spectrum().localSpacingMicron(pixel));
        double sharing = 1 + 2 * (prepared.noise().lag1() + prepared.noise().lag2());
        return band.medianSignalToNoise() * Math.sqrt(Math.max(1, pixels / sharing));
    }
}
