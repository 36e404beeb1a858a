package emberline.reports.attach;

import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import emberline.place.GravityClass;
import emberline.survey.verdict.VerdictCall;
import emberline.survey.verdict.VerdictFile;
import emberline.survey.verdict.Verdicts;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.util.List;

/** Verdicts as a CSV file that can be read again. */
public final class VerdictTable {

    private VerdictTable() {}

    /**
     * The file.
     *
     * @param verdicts what is written, in its order
     * @return comma, line feed, with a line of names; cells are safe in a spreadsheet
     */
    public static String text(Verdicts verdicts) {
        StringWriter text = new StringWriter();
        try (CsvWriter csv = CsvWriter.builder().lineDelimiter(LineDelimiter.LF).build(text)) {
            csv.writeRecord(VerdictFile.COLUMNS);
            verdicts.entries()
                    .forEach(
                            (name, entry) ->
                                    csv.writeRecord(
                                            List.of(
                                                    SafeCell.of(name),
                                                    entry.verdict()
                                                            .call()
                                                            .map(VerdictCall::word)
                                                            .orElse(""),
                                                    SafeCell.of(entry.verdict().type()),
                                                    entry.verdict()
                                                            .gravity()
                                                            .map(GravityClass::label)
                                                            .orElse(""),
                                                    SafeCell.of(entry.verdict().note()))));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return text.toString();
    }
}
