package emberline.reports.page;

import emberline.prepare.NoiseModel;
import emberline.reports.attach.Digits;
import emberline.spectrum.ResolvingPower;
import emberline.spectrum.Spectrum;
import emberline.survey.SpectrumResult;
import java.util.Locale;

/** Where a spectrum comes from and how its noise and resolving power are known, in words. */
final class ProvenanceText {

    private static final int SHORT_CHECKSUM = 16;
    private static final int LONGEST_PATH = 44;

    private ProvenanceText() {}

    static String basis(ResolvingPower.Basis basis) {
        return switch (basis) {
            case GIVEN -> "as given";
            case HEADER -> "from the header";
            case SAMPLING -> "from the sampling";
        };
    }

    static String noise(NoiseModel noise) {
        StringBuilder text =
                new StringBuilder(
                        noise.estimated()
                                ? "noise estimated from the pixel scatter"
                                : "noise from the file");
        if (noise.scale() != 1) {
            text.append(", scaled by ").append(Digits.fixed(noise.scale(), 2));
        }
        if (noise.lag1() != 0 || noise.lag2() != 0) {
            text.append("; neighbouring pixels correlate by ")
                    .append(Digits.fixed(noise.lag1(), 2))
                    .append(", next but one by ")
                    .append(Digits.fixed(noise.lag2(), 2));
        } else {
            text.append("; pixels taken as independent");
        }
        return text.toString();
    }

    static String checksum(String sha256) {
        return sha256.length() <= SHORT_CHECKSUM ? sha256 : sha256.substring(0, SHORT_CHECKSUM);
    }

    /** The end of a long path: the checksum tells which file it was. */
    private static String shortened(String path) {
        if (path.length() <= LONGEST_PATH) {
            return path;
        }
        String end = path.substring(path.length() - LONGEST_PATH + 1);
        int slash = end.indexOf('/');
        boolean whole = slash >= 0 && slash < end.length() - 1;
        return "\u2026" + (whole ? end.substring(slash) : end);
    }

    static String of(SpectrumResult result) {
        Spectrum spectrum = result.prepared().spectrum();
        return String.format(
                Locale.ROOT,
                "%s: %s; SHA-256 begins %s; %.4f to %.4f µm, %d pixels; resolving power %s, %s; %s.",
                shortened(result.path()),
                result.format(),
                checksum(result.sha256()),
                spectrum.wavelengthMicron(0),
                spectrum.wavelengthMicron(spectrum.size() - 1),
                spectrum.size(),
                Digits.significant(result.prepared().resolvingPower().value()),
                basis(result.prepared().resolvingPower().basis()),
                noise(result.prepared().noise()));
    }
}
