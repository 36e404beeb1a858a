package emberline.read;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Wavelengths along the first axis of a FITS image from its keywords: CRVAL1, CDELT1 or CD1_1, and
 * CRPIX1 after the FITS standard (Greisen et al. 2006, A&amp;A 446, 747: CTYPE1 of WAVE is vacuum,
 * of AWAV air, and a suffix -LOG stands for the natural logarithm); DC-FLAG = 1 or a CTYPE1 with
 * LOG10 or LOG for decimal logarithms; COEFF0 and COEFF1 for decimal logarithms of angstrom.
 */
final class FitsWavelengths {

    private static final Pattern WAT_UNITS = Pattern.compile("(?i).*units=(\\w+).*");

    private final double[] written;
    private final WavelengthUnit.Scale scale;
    private final Optional<String> unit;
    private final Optional<Medium> medium;
    private final List<Finding> findings;

    private FitsWavelengths(
            double[] written,
            WavelengthUnit.Scale scale,
            Optional<String> unit,
            Optional<Medium> medium,
            List<Finding> findings) {
        this.written = written;
        this.scale = scale;
        this.unit = unit;
        this.medium = medium;
        this.findings = List.copyOf(findings);
    }

    static FitsWavelengths of(FitsUnit unit, int length) throws UnreadableSpectrumException {
        Optional<Double> coeff0 = unit.number("COEFF0");
        Optional<Double> coeff1 = unit.number("COEFF1");
        if (coeff0.isPresent() && coeff1.isPresent()) {
            return new FitsWavelengths(
                    line(length, coeff0.get(), coeff1.get(), 1),
                    WavelengthUnit.Scale.LOG10,
                    Optional.of("angstrom"),
                    Optional.empty(),
                    List.of());
        }
        return byAxisKeywords(unit, length);
    }

    double[] written() {
        return written;
    }

    WavelengthUnit.Scale scale() {
        return scale;
    }

    Optional<String> unit() {
        return unit;
    }

    Optional<Medium> medium() {
        return medium;
    }

    List<Finding> findings() {
        return findings;
    }

    private static FitsWavelengths byAxisKeywords(FitsUnit unit, int length)
            throws UnreadableSpectrumException {
        Optional<Double> start = unit.number("CRVAL1");
        Optional<Double> step =
                unit.number("CDELT1").filter(s -> s != 0).or(() -> unit.number("CD1_1"));
        String type = unit.text("CTYPE1").orElse("").toUpperCase(Locale.ROOT);
        boolean spectral = !type.matches("RA-.*|DEC-.*|.LON.*|.LAT.*|PIXEL.*|FREQ.*|ENER.*|V.*");
        if (start.isEmpty() || step.isEmpty() || step.get() == 0 || !spectral) {
            throw new UnreadableSpectrumException(
                    unit.where(),
                    spectral
                            ? "an image without wavelength keywords"
                            : "an image whose first axis is " + type,
                    "CRVAL1 and CDELT1 (or CD1_1) for wavelengths, or a row of wavelengths before"
                            + " the flux",
                    "Add the keywords, or write wavelength, flux and sigma as rows.");
        }
        List<Finding> findings = new ArrayList<>();
        Optional<Double> pixel = unit.number("CRPIX1");
        if (pixel.isEmpty()) {
            findings.add(
                    Finding.caution(
                            "reference-pixel-assumed",
                            "The header has no CRPIX1; CRVAL1 was taken as the wavelength of the"
                                    + " first pixel."));
        }
        double reference = pixel.orElse(1.0);
        Optional<Medium> medium = Optional.empty();
        if (type.startsWith("AWAV")) {
            medium = Optional.of(Medium.AIR);
        } else if (type.startsWith("WAVE")) {
            medium = Optional.of(Medium.VACUUM);
        }
        double[] line = line(length, start.get(), step.get(), reference);
        if (type.matches("A?WAVE?-LOG") && start.get() > 20) {
            return new FitsWavelengths(
                    standardLogarithm(length, start.get(), step.get(), reference),
                    WavelengthUnit.Scale.LINEAR,
                    axisUnit(unit),
                    medium,
                    findings);
        }
        WavelengthUnit.Scale scale = scale(unit, type);
        return new FitsWavelengths(line, scale, axisUnit(unit), medium, findings);
    }

    private static WavelengthUnit.Scale scale(FitsUnit unit, String type) {
        Optional<WavelengthUnit.Scale> byUnit =
                unit.text("CUNIT1")
                        .flatMap(WavelengthUnit::parseWritten)
                        .map(WavelengthUnit.Written::scale)
                        .filter(scale -> scale != WavelengthUnit.Scale.LINEAR);
        if (byUnit.isPresent()) {
            return byUnit.get();
        }
        if (type.matches("LN.*|LOGE.*|NATURAL.*")) {
            return WavelengthUnit.Scale.LN;
        }
        boolean logarithm =
                unit.number("DC-FLAG").orElse(0.0) == 1 || type.matches("LOG.*|.*-LOG.*|.*LOG10.*");
        return logarithm ? WavelengthUnit.Scale.LOG10 : WavelengthUnit.Scale.LINEAR;
    }

    private static Optional<String> axisUnit(FitsUnit unit) {
        Optional<String> stated = unit.text("CUNIT1").or(() -> unit.text("XUNITS"));
        if (stated.isPresent()) {
            return stated;
        }
        Matcher matcher = WAT_UNITS.matcher(unit.text("WAT1_001").orElse(""));
        return matcher.matches()
                ? Optional.of(matcher.group(1))
                        .filter(text -> WavelengthUnit.parse(text).isPresent())
                : Optional.empty();
    }

    private static double[] line(int length, double start, double step, double reference) {
        double[] line = new double[length];
        for (int i = 0; i < length; i++) {
            line[i] = start + (i + 1 - reference) * step;
        }
        return line;
    }

    /** The FITS standard's logarithmic axis: start times exp(step (pixel - reference) / start). */
    private static double[] standardLogarithm(
            int length, double start, double step, double reference) {
        double[] line = new double[length];
        for (int i = 0; i < length; i++) {
            line[i] = start * Math.exp((i + 1 - reference) * step / start);
        }
        return line;
    }
}
