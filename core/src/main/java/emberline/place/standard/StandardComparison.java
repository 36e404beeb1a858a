package emberline.place.standard;

import emberline.place.TypeEstimate;
import emberline.place.standard.StandardVerdict.RangeResult;
import emberline.prepare.PreparedSpectrum;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.IntPredicate;
import java.util.function.Predicate;

/**
 * Compares objects with standard spectra by weighted chi-square with a free scale: over each range
 * alone, and over all together; and the best sum of two standards with the best single one. Make
 * one for a run: the standards are prepared once. Safe for use by several threads.
 */
public final class StandardComparison {

    private static final int BEST = 5;

    private final StandardLibrary library;
    private final List<String> checksums;

    /**
     * A comparison.
     *
     * @param standards what to compare with; of any resolving power, wavelength range and scale
     * @throws IllegalArgumentException if there are none
     */
    public StandardComparison(List<Standard> standards) {
        if (standards.isEmpty()) {
            throw new IllegalArgumentException("no standards: expected at least one");
        }
        this.library = new StandardLibrary(standards);
        this.checksums = standards.stream().map(Standard::sha256).toList();
    }

    /**
     * The checksums of the spectra that are compared with.
     *
     * @return hexadecimal, in the order of the standards
     */
    public List<String> checksums() {
        return checksums;
    }

    /**
     * Compares an object.
     *
     * @param spectra its spectra, at least one; each range is taken from the first spectrum that
     *     covers it, ranges are compared together where one spectrum covers them
     * @param isSelf tells standards that are the object itself, which are left out
     * @return the verdict, or why there is none
     */
    public StandardVerdict compare(List<PreparedSpectrum> spectra, Predicate<Standard> isSelf) {
        double power =
                spectra.stream().mapToDouble(s -> s.resolvingPower().value()).min().orElseThrow();
        StandardLibrary.Level level = library.level(power);
        IntPredicate allowed = k -> !isSelf.test(level.standard(k));
        List<Binned> objects = spectra.stream().map(level.grid()::of).toList();
        Map<Range, RangeResult> byRange = new EnumMap<>(Range.class);
        Binned leading = objects.get(0);
        for (Binned object : objects) {
            for (Range range : object.covered()) {
                if (!byRange.containsKey(range)) {
                    inRange(level, object, range, allowed)
                            .ifPresent(result -> byRange.put(range, result));
                }
            }
            leading =
                    object.good(object.covered()) > leading.good(leading.covered())
                            ? object
                            : leading;
        }
        List<Range> ranges = StandardLibrary.common(level, leading, allowed);
        if (ranges.isEmpty()) {
            return StandardVerdict.none(
                    leading.covered().isEmpty()
                            ? "none of the ranges 0.70-0.95 micron, Y, J, H, K is covered well"
                                    + " enough"
                            : "no standard covers a range that the object covers");
        }
        List<StandardMatch> matches = singles(level, leading, ranges, allowed);
        Optional<TypeEstimate> type = StandardType.of(matches);
        if (type.isEmpty()) {
            return StandardVerdict.none("no standard fits with a positive scale");
        }
        return new StandardVerdict(
                type,
                "",
                ranges,
                objects.indexOf(leading),
                matches.size(),
                best(matches),
                byRange,
                pair(level, leading, ranges, allowed));
    }

    private static Optional<RangeResult> inRange(
            StandardLibrary.Level level, Binned object, Range range, IntPredicate allowed) {
        List<StandardMatch> matches = singles(level, object, List.of(range), allowed);
        return StandardType.of(matches)
                .map(type -> new RangeResult(type, matches.size(), best(matches)));
    }

    private static List<StandardMatch> singles(
            StandardLibrary.Level level,
            Binned object,
            Collection<Range> ranges,
            IntPredicate allowed) {
        ScaleFit.Target target = new ScaleFit.Target(object, ranges);
        List<StandardMatch> matches = new ArrayList<>();
        for (int k : level.covering(ranges, allowed)) {
            level.single(target, k).ifPresent(matches::add);
        }
        matches.sort(Comparator.comparingDouble(StandardMatch::reducedChiSquare));
        return matches;
    }

    /** The best of each object. */
    private static List<StandardMatch> best(List<StandardMatch> matches) {
        Set<String> groups = new HashSet<>();
        return matches.stream().filter(m -> groups.add(m.first().group())).limit(BEST).toList();
    }

    private static Optional<PairFit> pair(
            StandardLibrary.Level level, Binned object, List<Range> ranges, IntPredicate allowed) {
        return new PairSearch(level, ranges)
                .fit(object, allowed)
                .map(fit -> fit.withFalseAlarms(level.pFalseAlarm(ranges, fit.ratio())));
    }
}
