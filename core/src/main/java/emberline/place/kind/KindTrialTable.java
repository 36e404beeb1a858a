package emberline.place.kind;

import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import java.io.IOException;
import java.io.Writer;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Writes trials as a table: truth, what was shown, and the probabilities given. */
public final class KindTrialTable {

    private KindTrialTable() {}

    /**
     * Writes the table.
     *
     * @param writer where to; not closed
     * @param trials the trials
     * @throws IOException if it cannot be written
     */
    public static void write(Writer writer, List<KindTrial> trials) throws IOException {
        writer.write(
                "# Verdicts on spectra by models that did not learn from their object, for the"
                        + " prior of prior.csv.\n");
        CsvWriter csv = CsvWriter.builder().lineDelimiter(LineDelimiter.LF).build(writer);
        List<String> header =
                new ArrayList<>(List.of("group", "truth", "how", "shown", "coverage", "kind"));
        for (ObjectKind kind : ObjectKind.values()) {
            header.add("p " + kind.label());
        }
        csv.writeRecord(header);
        for (KindTrial trial : trials) {
            List<String> cells = new ArrayList<>();
            cells.add(trial.group());
            cells.add(trial.truth().label());
            cells.add(trial.how());
            cells.add(trial.regions());
            cells.add(trial.verdict().coverage());
            cells.add(trial.verdict().kind().map(ObjectKind::label).orElse(""));
            for (ObjectKind kind : ObjectKind.values()) {
                Double p = trial.verdict().probabilities().get(kind);
                cells.add(p == null ? "" : String.format(Locale.ROOT, "%.4f", p));
            }
            csv.writeRecord(cells);
        }
        csv.flush();
    }
}
