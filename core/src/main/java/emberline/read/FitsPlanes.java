package emberline.read;

import emberline.spectrum.Finding;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * The noise that lies beside a flux in a FITS image: in a further plane of the same image whose
 * name says so, or in an image extension of the same length.
 */
final class FitsPlanes {

    private static final String[] NAME_KEYS = {"BANDID", "ARRAY", "ROW", "PLANE", "NAME", "LABEL"};

    private final Optional<double[]> noise;
    private final ColumnRoles.NoiseKind noiseKind;
    private final List<Finding> findings;

    private FitsPlanes(
            Optional<double[]> noise, ColumnRoles.NoiseKind noiseKind, List<Finding> findings) {
        this.noise = noise;
        this.noiseKind = noiseKind;
        this.findings = List.copyOf(findings);
    }

    static FitsPlanes of(FitsUnit unit, List<FitsUnit> units, FitsImage image, int planes)
            throws UnreadableSpectrumException {
        List<Finding> findings = new ArrayList<>();
        for (int plane = 1; plane < planes; plane++) {
            Optional<ColumnRoles.NoiseKind> kind = noiseKind(name(unit, plane, planes));
            if (kind.isPresent()) {
                findings.add(
                        Finding.note(
                                "planes-not-used",
                                "Of "
                                        + planes
                                        + " planes the first was taken as flux and plane "
                                        + (plane + 1)
                                        + " ("
                                        + name(unit, plane, planes)
                                        + ") as its noise."));
                return new FitsPlanes(Optional.of(image.row(plane)), kind.get(), findings);
            }
        }
        if (planes > 1) {
            findings.add(
                    Finding.caution(
                            "planes-not-used",
                            "Of "
                                    + planes
                                    + " planes the first was taken as flux; no other is named as"
                                    + " its noise, so they were not used."));
        }
        return planes == 1 ? beside(unit, units, image, findings) : none(findings);
    }

    Optional<double[]> noise() {
        return noise;
    }

    ColumnRoles.NoiseKind noiseKind() {
        return noiseKind;
    }

    List<Finding> findings() {
        return findings;
    }

    private static FitsPlanes none(List<Finding> findings) {
        return new FitsPlanes(Optional.empty(), ColumnRoles.NoiseKind.SIGMA, findings);
    }

    private static FitsPlanes beside(
            FitsUnit unit, List<FitsUnit> units, FitsImage image, List<Finding> findings)
            throws UnreadableSpectrumException {
        for (FitsUnit other : units) {
            Optional<ColumnRoles.NoiseKind> kind =
                    other.text("EXTNAME").flatMap(FitsPlanes::noiseKind);
            boolean fits =
                    other.index() > unit.index()
                            && other.isImage()
                            && Arrays.equals(other.axes(), image.axes());
            if (kind.isPresent() && fits) {
                findings.add(
                        Finding.note(
                                "noise-from-extension",
                                "The noise was taken from "
                                        + other.place()
                                        + " ("
                                        + other.text("EXTNAME").orElse("")
                                        + ")."));
                return new FitsPlanes(
                        Optional.of(FitsImage.of(other).row(0)), kind.get(), findings);
            }
        }
        return none(findings);
    }

    /** The name of a plane (counted from 0), numbered from 1 in the header. */
    private static String name(FitsUnit unit, int plane, int planes) {
        for (String key : NAME_KEYS) {
            boolean fromZero = unit.text(key + "0").isPresent();
            Optional<String> name = unit.text(key + (fromZero ? plane : plane + 1));
            if (name.isPresent() && planes > 1) {
                return name.get();
            }
        }
        return "";
    }

    /** Whether a name is that of a noise. */
    static boolean namesNoise(String name) {
        return noiseKind(name).isPresent();
    }

    private static Optional<ColumnRoles.NoiseKind> noiseKind(String name) {
        String lower = name.toLowerCase(Locale.ROOT);
        if (lower.contains("ivar") || lower.contains("inverse var") || lower.contains("invvar")) {
            return Optional.of(ColumnRoles.NoiseKind.INVERSE_VARIANCE);
        }
        if (lower.contains("variance") || lower.matches("var|stat")) {
            return Optional.of(ColumnRoles.NoiseKind.VARIANCE);
        }
        return lower.contains("sigma")
                        || lower.contains("error")
                        || lower.contains("uncert")
                        || lower.matches("err|errs|noise|unc|std|stddev")
                ? Optional.of(ColumnRoles.NoiseKind.SIGMA)
                : Optional.empty();
    }
}
