package emberline.prepare;

import emberline.prepare.BandSignal.Range;
import emberline.spectrum.Finding;
import emberline.spectrum.Finding.Severity;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

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
        /**
         * At least two bands with a signal-to-noise of 30 a resolution element, the noise stated by
         * the file and believed, and no warning.
         */
        GOOD,
        /**
         * At least one band with a signal-to-noise of 10: a type, gravity with doubt. Also the most
         * a spectrum gets whose noise was estimated or scaled, or that has a warning.
         */
        USABLE,
        /** A best signal-to-noise of 3 to 10, or no band covered by 70%: a rough type at best. */
        POOR,
        /** A best signal-to-noise below 3, or none known. */
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
        List<Strength> strengths =
                (covered.isEmpty() ? bands : covered)
                        .stream()
                                .map(band -> new Strength(band.range(), perElement(band, prepared)))
                                .toList();
        Optional<Strength> best =
                strengths.stream().max(Comparator.comparingDouble(Strength::perElement));
        if (best.isEmpty()) {
            return new Quality(Grade.UNUSABLE, "no pixels with a known noise", bands);
        }
        Grade grade = grade(strengths, best.get(), covered.isEmpty());
        String reason =
                best.get().words()
                        + (covered.isEmpty()
                                ? ", no band is covered by more than 70%"
                                : ", "
                                        + covered.size()
                                        + (covered.size() == 1 ? " band" : " bands")
                                        + " covered");
        List<String> doubts = doubts(prepared);
        if (doubts.isEmpty() || grade == Grade.UNUSABLE) {
            return new Quality(grade, reason, bands);
        }
        return new Quality(
                grade == Grade.GOOD ? Grade.USABLE : grade,
                reason + ", but " + String.join(" and ", doubts),
                bands);
    }

    /** The signal-to-noise of a band a resolution element. */
    private record Strength(Range range, double perElement) {

        String words() {
            return String.format(
                    Locale.ROOT,
                    "signal-to-noise %.0f a resolution element in %s",
                    perElement,
                    range.words());
        }
    }

    private static Grade grade(List<Strength> strengths, Strength best, boolean nothingCovered) {
        if (!(best.perElement() >= POOR_SIGNAL)) {
            return Grade.UNUSABLE;
        }
        if (nothingCovered || best.perElement() < USABLE_SIGNAL) {
            return Grade.POOR;
        }
        long good = strengths.stream().filter(s -> s.perElement() >= GOOD_SIGNAL).count();
        return good >= 2 ? Grade.GOOD : Grade.USABLE;
    }

    /** What keeps a spectrum from being good whatever its signal, in words. */
    private static List<String> doubts(PreparedSpectrum prepared) {
        List<String> doubts = new ArrayList<>();
        if (prepared.noise().estimated()) {
            doubts.add("the noise is estimated from the scatter of the pixels");
        }
        if (prepared.noise().scale() > 1) {
            doubts.add("the stated noise was too small and was scaled up");
        }
        prepared.findings().stream()
                .filter(finding -> finding.severity() == Severity.WARNING)
                .map(Finding::code)
                .distinct()
                .forEach(code -> doubts.add("there is a warning (" + code + ")"));
        return doubts;
    }

    /** Signal-to-noise of a band a resolution element, with shared noise counted once. */
    private static double perElement(BandSignal band, PreparedSpectrum prepared) {
        Spectrum spectrum = prepared.spectrum();
        double middle =
                band.range() == Range.WHOLE
                        ? spectrum.wavelengthMicron(spectrum.size() / 2)
                        : band.range().middleMicron();
        int pixel = Math.min(spectrum.firstAtOrAbove(middle), spectrum.size() - 1);
        double element = middle / prepared.resolvingPower().value();
        double pixels = Math.max(1, element / spectrum.localSpacingMicron(pixel));
        double sharing = 1 + 2 * (prepared.noise().lag1() + prepared.noise().lag2());
        return band.medianSignalToNoise() * Math.sqrt(Math.max(1, pixels / sharing));
    }
}
