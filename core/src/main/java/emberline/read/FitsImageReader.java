package emberline.read;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import emberline.spectrum.ResolvingPower;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Reads a spectrum from a FITS image: an array of two to four rows (wavelength, flux, sigma) in
 * either orientation, or flux along the first axis with wavelength keywords, with further planes
 * beside it.
 */
final class FitsImageReader {

    private static final int MOST_ROWS = 4;
    static final int MOST_PLANES = 8;

    /** Share of steps that must go one way for a row to be taken as wavelengths. */
    private static final double MONOTONIC = 0.9;

    private final FitsUnit unit;
    private final List<FitsUnit> units;
    private final List<Finding> findings = new ArrayList<>();

    FitsImageReader(FitsUnit unit, List<FitsUnit> units) {
        this.unit = unit;
        this.units = units;
    }

    RawSpectrum read() throws UnreadableSpectrumException {
        FitsImage image = FitsImage.of(unit);
        int first = image.length(1);
        int second = image.length(2);
        boolean mayBeRows = image.axes().length <= 2 && !saysPlanes();
        if (mayBeRows && second >= 2 && second <= MOST_ROWS && first >= second) {
            if (isWavelengths(image.row(0))) {
                return rows(withoutOffset(image), second, first, true);
            }
        }
        if (mayBeRows && first >= 2 && first <= MOST_ROWS && second > 1) {
            if (isWavelengths(image.column(0))) {
                return rows(withoutOffset(image), first, second, false);
            }
        }
        return planes(image);
    }

    /** Whether the header says that the first row is a flux and the axis the wavelength. */
    private boolean saysPlanes() {
        String first = unit.text("ARRAY1").or(() -> unit.text("BANDID1")).orElse("");
        return first.toLowerCase(Locale.ROOT).matches("(flux|spec).*")
                || (unit.number("COEFF0").isPresent() && unit.number("COEFF1").isPresent());
    }

    private static boolean isWavelengths(double[] row) {
        int up = 0;
        int down = 0;
        int steps = 0;
        for (int i = 1; i < row.length; i++) {
            if (Double.isFinite(row[i]) && Double.isFinite(row[i - 1])) {
                steps++;
                up += row[i] > row[i - 1] ? 1 : 0;
                down += row[i] < row[i - 1] ? 1 : 0;
            }
            if (row[i] < 0) {
                return false;
            }
        }
        return steps > 0 && Math.max(up, down) >= MONOTONIC * steps;
    }

    /**
     * Takes off an integer offset that was left on all numbers: O_BZERO is the offset of the raw
     * integers, which some software added to the reduced rows once more.
     */
    private FitsImage withoutOffset(FitsImage image) {
        double offset = unit.number("O_BZERO").orElse(0.0);
        if (!(offset > 0) || !(image.smallest() > 0.99 * offset)) {
            return image;
        }
        findings.add(
                Finding.warning(
                        "integer-offset-removed",
                        "All numbers lie above the integer offset O_BZERO = "
                                + (long) offset
                                + " of the header; it was taken off."));
        return image.minus(offset);
    }

    private RawSpectrum rows(FitsImage image, int count, int length, boolean alongFirst) {
        double[][] rows = new double[count][];
        for (int i = 0; i < count; i++) {
            rows[i] = alongFirst ? image.row(i) : image.column(i);
        }
        if (count > 3) {
            findings.add(
                    Finding.note(
                            "rows-not-used",
                            "Rows were taken as wavelength, flux, sigma; the "
                                    + (count - 3)
                                    + " after them was not used."));
        }
        Optional<double[]> sigma = count > 2 ? Optional.of(rows[2]) : Optional.empty();
        Optional<String> fluxUnit = text("YUNITS", "FLUXUNIT", "BUNIT");
        RawSpectrum.Units written =
                new RawSpectrum.Units(
                        WavelengthUnit.Scale.LINEAR,
                        wavelengthUnitOfRows(),
                        fluxUnit,
                        ColumnRoles.NoiseKind.SIGMA,
                        Optional.empty());
        return spectrum(
                (alongFirst ? count + " rows of " : count + " columns of ") + length,
                new RawSpectrum.Samples(rows[0], rows[1], sigma, Optional.empty()),
                written,
                unit.medium());
    }

    /** XUNITS; CUNIT1 counts only where it is a unit of length, for it may be left from a cube. */
    private Optional<String> wavelengthUnitOfRows() {
        Optional<String> stated = text("XUNITS", "WAVEUNIT", "WUNIT", "WAT1UNIT");
        return stated.isPresent()
                ? stated
                : unit.text("CUNIT1")
                        .filter(text -> WavelengthUnit.parse(text).isPresent())
                        .filter(text -> !unit.text("CTYPE1").orElse("").startsWith("RA"));
    }

    private RawSpectrum planes(FitsImage image) throws UnreadableSpectrumException {
        int length = image.length(1);
        int[] axes = image.axes();
        int planes = 1;
        for (int i = 1; i < axes.length; i++) {
            planes *= axes[i];
        }
        boolean apertures = axes.length > 2 && axes[1] > 1;
        if (planes > MOST_PLANES || apertures) {
            throw new UnreadableSpectrumException(
                    unit.where(),
                    "an image of " + sizes(axes) + " numbers that holds several spectra",
                    "one spectrum: a row of fluxes with wavelength keywords, or two to four rows"
                            + " of wavelength, flux, sigma",
                    "Name one of them by its row, FILE#row=1, or sort the file as it is.");
        }
        FitsWavelengths axis = FitsWavelengths.of(unit, length);
        findings.addAll(axis.findings());
        FitsPlanes found = FitsPlanes.of(unit, units, image, planes);
        findings.addAll(found.findings());
        RawSpectrum.Units written =
                new RawSpectrum.Units(
                        axis.scale(),
                        axis.unit(),
                        text("BUNIT", "YUNITS", "FLUXUNIT"),
                        found.noiseKind(),
                        Optional.empty());
        return spectrum(
                planes == 1 ? length + " pixels" : planes + " planes of " + length,
                new RawSpectrum.Samples(
                        axis.written(), image.row(0), found.noise(), Optional.empty()),
                written,
                unit.medium().or(axis::medium));
    }

    private static String sizes(int[] axes) {
        StringBuilder text = new StringBuilder();
        for (int length : axes) {
            text.append(text.length() == 0 ? "" : " x ").append(length);
        }
        return text.toString();
    }

    private Optional<String> text(String... keys) {
        for (String key : keys) {
            Optional<String> text = unit.text(key);
            if (text.isPresent()) {
                return text;
            }
        }
        return Optional.empty();
    }

    private RawSpectrum spectrum(
            String shape,
            RawSpectrum.Samples samples,
            RawSpectrum.Units written,
            Optional<Medium> medium) {
        Optional<ResolvingPower> power = unit.resolvingPower(findings);
        if (power.isEmpty() && unit.index() > 0) {
            power = units.get(0).resolvingPower(findings);
        }
        String place = unit.isPlain() ? "pixel " : unit.place() + ", pixel ";
        return new RawSpectrum(
                "FITS image, " + shape,
                samples,
                written,
                medium.or(() -> units.get(0).medium()),
                power,
                findings,
                pixel -> String.format(Locale.ROOT, "%s%d", place, pixel + 1));
    }
}
