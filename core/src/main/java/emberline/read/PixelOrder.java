package emberline.read;

import emberline.spectrum.Finding;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.function.IntFunction;
import java.util.stream.IntStream;

/**
 * Puts pixels in order of wavelength, or says why that cannot be done.
 *
 * <p>Rising wavelengths stay, falling ones are turned round. Wavelengths that go neither way, and
 * two equal ones, are refused, with one exception: a spectrum of at least 100 pixels joined from
 * orders that overlap a little. There the wavelength steps back at a few joints, and the grid is
 * regular on either side of each. Two equal wavelengths count as a joint only where the pixel
 * spacing changes at them (the end of one order meets the start of the next) or where the grid is
 * irregular beside them (the overlap of two orders, sorted by wavelength); in an even grid they are
 * a mistake. A last wavelength repeated three times or more is padding and is cut.
 */
final class PixelOrder {

    private static final int LEAST_PIXELS_FOR_JOINTS = 100;
    private static final int LEAST_PIXELS_PER_ORDER = 20;
    private static final double REGULAR = 0.3;
    private static final double SPACING_CHANGE = 0.05;
    private static final int NEIGHBOURHOOD = 5;

    private final String name;
    private final double[] wavelengths;
    private final double[] fluxes;
    private final IntFunction<String> place;
    private final List<Finding> findings;

    /**
     * Prepares the ordering.
     *
     * @param wavelengths wavelengths in the order of the file (micron); NaN or, at the ends, zero
     *     in padding
     * @param fluxes fluxes in the same order
     * @param place names a pixel
     * @param findings receives what is found
     */
    PixelOrder(
            String name,
            double[] wavelengths,
            double[] fluxes,
            IntFunction<String> place,
            List<Finding> findings) {
        this.name = name;
        this.wavelengths = wavelengths;
        this.fluxes = fluxes;
        this.place = place;
        this.findings = findings;
    }

    /** The indices of the pixels to keep, in the order of strictly rising wavelength. */
    int[] rising() throws UnreadableSpectrumException {
        int[] kept = withoutPadding();
        if (kept.length < 2) {
            throw new UnreadableSpectrumException(
                    name,
                    kept.length == 1 ? "one pixel only" : "no pixel with a wavelength",
                    "at least two pixels",
                    "Check that the whole spectrum was written.");
        }
        int down = 0;
        int flat = 0;
        for (int i = 1; i < kept.length; i++) {
            double step = wavelengths[kept[i]] - wavelengths[kept[i - 1]];
            down += step < 0 ? 1 : 0;
            flat += step == 0 ? 1 : 0;
        }
        if (down > (kept.length - 1 - flat) / 2) {
            kept = reversed(kept);
            down = kept.length - 1 - flat - down;
            findings.add(
                    Finding.note(
                            "wavelengths-reversed",
                            "Wavelengths run downwards in the file; the pixels were turned"
                                    + " round."));
        }
        return down + flat == 0 ? kept : joined(kept);
    }

    private int[] withoutPadding() throws UnreadableSpectrumException {
        int first = 0;
        int last = wavelengths.length - 1;
        while (first <= last && isPadding(wavelengths[first])) {
            first++;
        }
        while (last >= first && isPadding(wavelengths[last])) {
            last--;
        }
        int[] kept = new int[last - first + 1];
        int n = 0;
        for (int i = first; i <= last; i++) {
            if (Double.isNaN(wavelengths[i])) {
                continue;
            }
            if (!(wavelengths[i] > 0) || Double.isInfinite(wavelengths[i])) {
                throw new UnreadableSpectrumException(
                        at(i),
                        "wavelength " + wavelengths[i],
                        "a positive, finite wavelength",
                        "Correct or remove this pixel.");
            }
            kept[n++] = i;
        }
        if (n < wavelengths.length) {
            findings.add(
                    Finding.note(
                            "pixels-without-wavelength",
                            (wavelengths.length - n)
                                    + " of "
                                    + wavelengths.length
                                    + " pixels have no wavelength and were left out."));
        }
        return n == kept.length ? kept : Arrays.copyOf(kept, n);
    }

    private static boolean isPadding(double wavelength) {
        return Double.isNaN(wavelength) || wavelength == 0;
    }

    private static int[] reversed(int[] pixels) {
        int[] turned = new int[pixels.length];
        for (int i = 0; i < pixels.length; i++) {
            turned[i] = pixels[pixels.length - 1 - i];
        }
        return turned;
    }

    private int[] joined(int[] pixels) throws UnreadableSpectrumException {
        int[] kept = withoutRepeatedEnd(pixels);
        double[] grid = new double[kept.length];
        for (int i = 0; i < kept.length; i++) {
            grid[i] = wavelengths[kept[i]];
        }
        int joints = 0;
        int before = 0;
        for (int i = 1; i < kept.length; i++) {
            if (!(grid[i] > grid[i - 1])) {
                joints++;
                if (!isJoint(grid, before, i) || joints * LEAST_PIXELS_PER_ORDER > kept.length) {
                    throw notRising(kept[i - 1], kept[i]);
                }
                before = i;
            }
        }
        if (joints == 0) {
            return kept;
        }
        int[] sorted =
                IntStream.of(kept)
                        .boxed()
                        .sorted(Comparator.comparingDouble(i -> wavelengths[i]))
                        .mapToInt(Integer::intValue)
                        .toArray();
        int[] distinct = withoutRepeats(sorted);
        findings.add(
                Finding.caution(
                        "orders-joined",
                        "Wavelengths do not rise at "
                                + joints
                                + (joints == 1 ? " place" : " places")
                                + ", as where overlapping orders are joined; pixels were sorted by"
                                + " wavelength and "
                                + (sorted.length - distinct.length)
                                + " at a repeated wavelength left out."));
        return distinct;
    }

    private int[] withoutRepeatedEnd(int[] kept) {
        int last = kept.length - 1;
        int first = last;
        while (first > 0 && wavelengths[kept[first - 1]] == wavelengths[kept[last]]) {
            first--;
        }
        int repeated = last - first + 1;
        if (kept.length < LEAST_PIXELS_FOR_JOINTS
                || repeated < 3
                || repeated * LEAST_PIXELS_PER_ORDER > 2 * kept.length) {
            return kept;
        }
        findings.add(
                Finding.caution(
                        "padding-cut",
                        "The last wavelength stands "
                                + repeated
                                + " times; only its first pixel was kept."));
        return Arrays.copyOf(kept, first + 1);
    }

    /** Whether the step that does not rise, to pixel i, can be the joint of two orders. */
    private static boolean isJoint(double[] grid, int startOfOrder, int i) {
        if (grid.length < LEAST_PIXELS_FOR_JOINTS || i < 3 || i + 2 >= grid.length) {
            return false;
        }
        boolean regular =
                alike(grid[i - 1] - grid[i - 2], grid[i - 2] - grid[i - 3], REGULAR)
                        && alike(grid[i + 1] - grid[i], grid[i + 2] - grid[i + 1], REGULAR);
        if (grid[i] == grid[i - 1]) {
            boolean change =
                    !alike(grid[i - 1] - grid[i - 2], grid[i + 1] - grid[i], SPACING_CHANGE);
            return (regular && change) || isIrregularAround(grid, i);
        }
        int overlap = 0;
        while (i - 1 - overlap >= startOfOrder && grid[i - 1 - overlap] >= grid[i]) {
            overlap++;
        }
        return regular && overlap * 2 < i - startOfOrder;
    }

    private static boolean alike(double step, double other, double within) {
        return step > 0 && other > 0 && Math.abs(step - other) <= within * Math.min(step, other);
    }

    /** Whether, on one side of a step at least, two of the next five steps stand out. */
    private static boolean isIrregularAround(double[] grid, int i) {
        return isIrregular(grid, i - NEIGHBOURHOOD, i - 1)
                || isIrregular(grid, i + 1, i + NEIGHBOURHOOD);
    }

    private static boolean isIrregular(double[] grid, int firstStep, int lastStep) {
        int from = Math.max(1, firstStep);
        int to = Math.min(grid.length - 1, lastStep);
        double[] steps = new double[Math.max(0, to - from + 1)];
        for (int k = from; k <= to; k++) {
            steps[k - from] = grid[k] - grid[k - 1];
        }
        double[] sorted = steps.clone();
        Arrays.sort(sorted);
        double middle = sorted.length == 0 ? 0 : sorted[sorted.length / 2];
        return Arrays.stream(steps).filter(s -> Math.abs(s - middle) > REGULAR * middle).count()
                >= 2;
    }

    /** Of pixels at one wavelength, the first whose flux is a number. */
    private int[] withoutRepeats(int[] sorted) {
        int[] distinct = new int[sorted.length];
        int n = 0;
        for (int pixel : sorted) {
            if (n == 0 || wavelengths[pixel] > wavelengths[distinct[n - 1]]) {
                distinct[n++] = pixel;
            } else if (Double.isNaN(fluxes[distinct[n - 1]])) {
                distinct[n - 1] = pixel;
            }
        }
        return Arrays.copyOf(distinct, n);
    }

    private UnreadableSpectrumException notRising(int one, int other) {
        int before = Math.min(one, other);
        int pixel = Math.max(one, other);
        float a = (float) wavelengths[before];
        float b = (float) wavelengths[pixel];
        if (wavelengths[before] == wavelengths[pixel]) {
            return new UnreadableSpectrumException(
                    at(pixel),
                    "wavelength " + b + " micron stands twice",
                    "every wavelength once",
                    "Remove or average one of the two, or split the file if it holds several"
                            + " spectra.");
        }
        return new UnreadableSpectrumException(
                at(pixel),
                "wavelength " + b + " micron follows " + a,
                "wavelengths that rise (or fall) all through",
                "Sort the rows by wavelength, or split the file if it holds several spectra.");
    }

    private String at(int pixel) {
        return name + ", " + place.apply(pixel);
    }
}
