package emberline.place.reference;

import de.siegmar.fastcsv.reader.CommentStrategy;
import de.siegmar.fastcsv.reader.CsvReader;
import de.siegmar.fastcsv.reader.NamedCsvRecord;
import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import emberline.measure.Measurement.Measured;
import emberline.read.ProductTable;
import java.io.IOException;
import java.io.Reader;
import java.io.Writer;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;

/**
 * Spectra of known kind with what was measured on them.
 *
 * @param features ids of the features that have columns
 * @param rows the spectra
 */
public record ReferenceTable(List<String> features, List<ReferenceRow> rows) {

    private static final String FEATURES = "/emberline/place/reference-features.csv";
    private static final String SIGMA = " sigma";
    private static final List<String> LABELS =
            List.of(
                    "object",
                    "group",
                    "type_number",
                    "gravity",
                    "kind",
                    "tier",
                    "source",
                    "resolution",
                    "snr");

    /** Copies the lists. */
    public ReferenceTable {
        features = List.copyOf(features);
        rows = List.copyOf(rows);
    }

    /**
     * The features that a reference table holds.
     *
     * @return feature ids
     */
    public static List<String> standardFeatures() {
        return ProductTable.at(FEATURES).rows().stream()
                .map(row -> row.getField("feature"))
                .toList();
    }

    /**
     * Reads a table.
     *
     * @param reader the text of the table
     * @return the table
     * @throws IOException if it cannot be read
     */
    public static ReferenceTable read(Reader reader) throws IOException {
        try (CsvReader<NamedCsvRecord> records =
                CsvReader.builder()
                        .commentStrategy(CommentStrategy.SKIP)
                        .ofNamedCsvRecord(reader)) {
            List<ReferenceRow> rows = new ArrayList<>();
            List<String> features = new ArrayList<>();
            for (NamedCsvRecord row : records) {
                if (features.isEmpty()) {
                    row.getHeader().stream()
                            .filter(name -> !LABELS.contains(name) && !name.endsWith(SIGMA))
                            .forEach(features::add);
                }
                rows.add(row(row, features));
            }
            return new ReferenceTable(features, rows);
        }
    }

    private static ReferenceRow row(NamedCsvRecord row, List<String> features) {
        Map<String, Measured> values = new LinkedHashMap<>();
        for (String id : features) {
            String value = row.getField(id);
            if (!value.isBlank()) {
                values.put(
                        id,
                        new Measured(
                                Double.parseDouble(value),
                                Double.parseDouble(row.getField(id + SIGMA))));
            }
        }
        String type = row.getField("type_number");
        String signal = row.getField("snr");
        return new ReferenceRow(
                row.getField("object"),
                row.getField("group"),
                type.isBlank()
                        ? OptionalDouble.empty()
                        : OptionalDouble.of(Double.parseDouble(type)),
                row.getField("gravity"),
                row.getField("kind"),
                row.getField("tier"),
                row.getField("source"),
                Double.parseDouble(row.getField("resolution")),
                signal.isBlank()
                        ? OptionalDouble.empty()
                        : OptionalDouble.of(Double.parseDouble(signal)),
                values);
    }

    /**
     * Writes the table.
     *
     * @param writer where to; not closed
     * @param remarks lines that go before the header, without mark
     * @throws IOException if it cannot be written
     */
    public void write(Writer writer, List<String> remarks) throws IOException {
        for (String remark : remarks) {
            writer.write("# " + remark + "\n");
        }
        CsvWriter csv = CsvWriter.builder().lineDelimiter(LineDelimiter.LF).build(writer);
        List<String> header = new ArrayList<>(LABELS);
        features.forEach(id -> header.addAll(List.of(id, id + SIGMA)));
        csv.writeRecord(header);
        for (ReferenceRow row : rows) {
            List<String> cells = new ArrayList<>();
            cells.add(row.object());
            cells.add(row.group());
            cells.add(
                    row.typeNumber().isPresent()
                            ? String.format(Locale.ROOT, "%.1f", row.typeNumber().getAsDouble())
                            : "");
            cells.addAll(List.of(row.gravity(), row.kind(), row.tier(), row.source()));
            cells.add(String.format(Locale.ROOT, "%.0f", row.resolvingPower()));
            cells.add(
                    row.signalToNoise().isPresent()
                            ? digits("%.1f", row.signalToNoise().getAsDouble())
                            : "");
            for (String id : features) {
                Measured value = row.features().get(id);
                cells.add(value == null ? "" : digits("%.4f", value.value()));
                cells.add(value == null ? "" : digits("%.2g", value.oneSigma()));
            }
            csv.writeRecord(cells);
        }
        csv.flush();
    }

    private static String digits(String format, double value) {
        return String.format(Locale.ROOT, format, value);
    }
}
