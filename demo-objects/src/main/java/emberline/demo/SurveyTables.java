package emberline.demo;

import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import java.io.IOException;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.function.Function;
import java.util.stream.Collectors;

/** The candidate list of the survey and the truth beside it. */
final class SurveyTables {

    private static final List<String> CANDIDATE_COLUMNS =
            List.of(
                    "name",
                    "spectrum",
                    "medium",
                    "resolution",
                    "ra_deg",
                    "dec_deg",
                    "parallax_mas",
                    "parallax_mas_err",
                    "pmra_masyr",
                    "pmdec_masyr",
                    "rv_kms",
                    "j_mag",
                    "j_mag_err",
                    "h_mag",
                    "h_mag_err",
                    "k_mag",
                    "k_mag_err",
                    "w1_mag",
                    "w1_mag_err",
                    "w2_mag",
                    "w2_mag_err",
                    "field",
                    "night");

    private static final List<String> TRUTH_COLUMNS =
            List.of(
                    "name",
                    "kind",
                    "type_number",
                    "gravity",
                    "lithium",
                    "av_mag",
                    "distance_pc",
                    "instrument",
                    "signal_to_noise",
                    "remark",
                    "metallicity",
                    "pair_type_number",
                    "spectra",
                    "rv_kms",
                    "list",
                    "faults");

    private SurveyTables() {}

    /** The candidate list: what an observer would know. */
    static byte[] candidates(List<SurveyObject> objects, List<Exposure> exposures)
            throws IOException {
        List<List<String>> rows = new ArrayList<>();
        rows.add(CANDIDATE_COLUMNS);
        for (SurveyObject object : objects) {
            List<Exposure> own = of(object, exposures);
            Photometry photometry = Photometry.of(object);
            List<String> row = new ArrayList<>();
            row.add(object.name());
            row.add(join(own, exposure -> SurveyMaker.SPECTRA + exposure.file()));
            row.add(joinDiffering(own, exposure -> exposure.air() ? "air" : "vacuum"));
            row.add(joinDiffering(own, e -> number("%.0f", e.instrument().resolvingPower())));
            row.add(number("%.4f", object.row().number("ra_deg")));
            row.add(number("%.4f", object.row().number("dec_deg")));
            addMeasured(row, photometry, "parallax_mas", "%.2f");
            row.add(object.row().text("pmra_masyr"));
            row.add(object.row().text("pmdec_masyr"));
            row.add(object.isVelocityListed() ? object.row().text("rv_kms") : "");
            for (String band : List.of("j_mag", "h_mag", "k_mag", "w1_mag", "w2_mag")) {
                addMeasured(row, photometry, band, "%.3f");
            }
            row.add(object.row().text("field"));
            row.add(object.row().text("night"));
            rows.add(row);
        }
        return csv(rows);
    }

    /** The truth: what the simulator put in. */
    static byte[] truth(List<SurveyObject> objects, List<Exposure> exposures) throws IOException {
        List<List<String>> rows = new ArrayList<>();
        rows.add(TRUTH_COLUMNS);
        for (SurveyObject object : objects) {
            List<Exposure> own = of(object, exposures);
            rows.add(
                    List.of(
                            object.name(),
                            kind(object),
                            optional("%.1f", object.typeNumber()),
                            object.gravity(),
                            number("%.1f", object.lithium()),
                            number("%.1f", object.avMag()),
                            object.row().text("distance_pc"),
                            join(own, exposure -> exposure.instrument().name()),
                            join(own, exposure -> number("%.0f", exposure.signalToNoise())),
                            object.row().text("remark"),
                            object.metallicity().orElse(""),
                            optional("%.1f", object.pairTypeNumber()),
                            String.valueOf(own.size()),
                            object.row().text("rv_kms"),
                            object.list(),
                            joinDiffering(own, exposure -> exposure.fault().words())));
        }
        return csv(rows);
    }

    private static String kind(SurveyObject object) {
        return switch (object.recipe()) {
            case "", "sd", "esd" -> "late dwarf";
            case "background" -> "reddened background";
            case "quasar" -> "extragalactic";
            case "giant_late" -> "giant";
            case "early" -> "early star";
            case "carbon" -> "carbon star";
            default -> object.recipe();
        };
    }

    private static List<Exposure> of(SurveyObject object, List<Exposure> exposures) {
        return exposures.stream().filter(e -> e.object().equals(object.name())).toList();
    }

    private static String join(List<Exposure> exposures, Function<Exposure, String> cell) {
        return exposures.stream().map(cell).collect(Collectors.joining(";"));
    }

    /** One cell for all spectra where they are alike, else one for each. */
    private static String joinDiffering(List<Exposure> exposures, Function<Exposure, String> cell) {
        long different = exposures.stream().map(cell).distinct().count();
        return join(different == 1 ? exposures.subList(0, 1) : exposures, cell);
    }

    private static void addMeasured(
            List<String> row, Photometry photometry, String quantity, String format) {
        row.add(optional(format, photometry.measured(quantity)));
        row.add(optional(format, photometry.error(quantity)));
    }

    private static String optional(String format, OptionalDouble value) {
        return value.isPresent() ? number(format, value.getAsDouble()) : "";
    }

    private static String number(String format, double value) {
        return String.format(Locale.ROOT, format, value);
    }

    private static byte[] csv(List<List<String>> rows) throws IOException {
        StringWriter text = new StringWriter();
        try (CsvWriter writer = CsvWriter.builder().lineDelimiter(LineDelimiter.LF).build(text)) {
            rows.forEach(writer::writeRecord);
        }
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }
}
