package emberline.demo;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Writes plain text, CSV or ECSV. */
final class TextFile implements SpectrumFile {

    private final String separator;
    private final boolean enhanced;

    TextFile(String separator, boolean enhanced) {
        this.separator = separator;
        this.enhanced = enhanced;
    }

    @Override
    public byte[] bytes(ObservedSpectrum spectrum, Exposure exposure) {
        FileColumns columns = FileColumns.of(spectrum, exposure);
        double[] wavelength = columns.wavelength();
        double[] flux = columns.flux();
        double[] sigma = columns.sigma();
        StringBuilder text = new StringBuilder();
        head(exposure).forEach(line -> text.append(line).append('\n'));
        int digits =
                switch (exposure.wavelengthUnit()) {
                    case MICRON -> 6;
                    case NANOMETRE -> 3;
                    case ANGSTROM -> 2;
                };
        for (int i = 0; i < wavelength.length; i++) {
            text.append(String.format(Locale.ROOT, "%." + digits + "f", wavelength[i]));
            text.append(separator).append(number(flux[i]));
            if (exposure.withSigma()) {
                text.append(separator).append(number(sigma[i]));
            }
            text.append('\n');
        }
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }

    private static String number(double value) {
        return String.format(Locale.ROOT, "%.4e", value);
    }

    private List<String> head(Exposure exposure) {
        if (enhanced) {
            return enhancedHead(exposure);
        }
        List<String> lines = new ArrayList<>();
        String wave = "wavelength_" + exposure.wavelengthUnit().word();
        if (separator.equals(",")) {
            lines.add(wave + ",flux" + (exposure.withSigma() ? ",sigma" : ""));
            return lines;
        }
        lines.add("# " + exposure.object() + ", an invented object");
        lines.add(
                "# wavelength in "
                        + exposure.wavelengthUnit().word()
                        + (exposure.air() ? " (air)" : " (vacuum)"));
        if (!exposure.fluxUnit().plain().isEmpty()) {
            lines.add("# flux in " + exposure.fluxUnit().plain());
        }
        lines.add("# " + wave + " flux" + (exposure.withSigma() ? " sigma" : ""));
        return lines;
    }

    private static List<String> enhancedHead(Exposure exposure) {
        String flux = exposure.fluxUnit().formal();
        return List.of(
                "# %ECSV 1.0",
                "# ---",
                "# datatype:",
                "# - {name: wavelength, unit: "
                        + exposure.wavelengthUnit().symbol()
                        + ", datatype: float64}",
                "# - {name: flux, unit: " + flux + ", datatype: float64}",
                "# - {name: sigma, unit: " + flux + ", datatype: float64}",
                "# meta: !!omap",
                "# - {OBJECT: " + exposure.object() + "}",
                "# - {MEDIUM: " + (exposure.air() ? "air" : "vacuum") + "}",
                "# schema: astropy-2.0",
                "wavelength flux sigma");
    }
}
