package emberline.read;

import emberline.spectrum.Finding;
import emberline.spectrum.Medium;
import emberline.spectrum.ResolvingPower;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;

/** What a file says about itself in pairs of key and value: a FITS header, table parameters. */
interface Keywords {

    /** Keys under which the medium is stated in words. */
    List<String> MEDIUM_KEYS = List.of("WAVETYPE", "AIRORVAC", "MEDIUM", "WAVE_MEDIUM", "AIRVAC");

    /** Keys under which a resolving power is stated; a later one is looked at only if needed. */
    List<String> RESOLVING_POWER_KEYS =
            List.of(
                    "SPEC_RP",
                    "RESOLVING_POWER",
                    "RESPOWER",
                    "RESPOW",
                    "SPECRP",
                    "RESOLUTI",
                    "RESOLUTION",
                    "SPECRES",
                    "SPEC_RES",
                    "SXD_R",
                    "R_POWER",
                    "RPOWER",
                    "RP",
                    "RES",
                    "R",
                    "LXD_R");

    /** Keys that may well mean something else (a magnitude, a resolution in angstrom). */
    Set<String> VAGUE_KEYS = Set.of("RES", "R", "RESOLUTI", "RESOLUTION", "SPECRES", "SPEC_RES");

    /** Least and largest value taken for a resolving power. */
    double LEAST_RESOLVING_POWER = 10;

    /** Largest value taken for a resolving power. */
    double LARGEST_RESOLVING_POWER = 200_000;

    /** Least value of a vague key taken for a resolving power: no magnitude is as large. */
    double LEAST_VAGUE = 35;

    /** The value of a key as text, without blanks around it; empty where absent or blank. */
    Optional<String> text(String key);

    /** The comment beside a value; an empty text where there is none. */
    default String comment(String key) {
        return "";
    }

    /** The medium as stated by a keyword of its own. */
    default Optional<Medium> medium() {
        for (String key : MEDIUM_KEYS) {
            Optional<Medium> medium = text(key).flatMap(Medium::named);
            if (medium.isPresent()) {
                return medium;
            }
        }
        return text("VACUUM")
                .flatMap(Keywords::truth)
                .map(vacuum -> vacuum ? Medium.VACUUM : Medium.AIR);
    }

    /** The resolving power as stated; adds a note where one is found. */
    default Optional<ResolvingPower> resolvingPower(List<Finding> findings) {
        for (String key : RESOLVING_POWER_KEYS) {
            Optional<Double> value = text(key).flatMap(Keywords::number);
            if (value.isPresent() && isResolvingPower(key, value.get())) {
                findings.add(
                        Finding.note(
                                Observation.RESOLVING_POWER_FROM_HEADER,
                                "Resolving power "
                                        + Math.round(value.get())
                                        + " taken from keyword "
                                        + key
                                        + " of the file."));
                return Optional.of(new ResolvingPower(value.get(), ResolvingPower.Basis.HEADER));
            }
        }
        return Optional.empty();
    }

    private boolean isResolvingPower(String key, double value) {
        String comment = comment(key).toLowerCase(Locale.ROOT);
        boolean otherUnit =
                comment.contains("angstrom")
                        || comment.contains("km/s")
                        || comment.contains("pix")
                        || comment.contains("nm]")
                        || comment.contains("[um")
                        || comment.contains("mag");
        double least = VAGUE_KEYS.contains(key) ? LEAST_VAGUE : LEAST_RESOLVING_POWER;
        return value >= least && value <= LARGEST_RESOLVING_POWER && !otherUnit;
    }

    private static Optional<Boolean> truth(String text) {
        return switch (text.toLowerCase(Locale.ROOT)) {
            case "t", "true", "1", "yes", "vacuum", "vac" -> Optional.of(true);
            case "f", "false", "0", "no", "air" -> Optional.of(false);
            default -> Optional.empty();
        };
    }

    /** A finite number as written; empty where the text is none. */
    static Optional<Double> number(String text) {
        try {
            double value = Double.parseDouble(text.trim().replace('D', 'E'));
            return Double.isFinite(value) ? Optional.of(value) : Optional.empty();
        } catch (NumberFormatException e) {
            return Optional.empty();
        }
    }
}
