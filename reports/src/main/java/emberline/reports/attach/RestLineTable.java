package emberline.reports.attach;

import emberline.catalogue.RestLine;
import java.util.List;
import java.util.Locale;

/** The atomic lines of the catalogue as a table. */
public final class RestLineTable {

    private static final List<String> HEADER =
            List.of(
                    "species",
                    "vacuum_micron",
                    "purpose",
                    "source",
                    "place",
                    "how_known",
                    "confidence_percent",
                    "note");

    private RestLineTable() {}

    /**
     * The table of lines.
     *
     * @param lines the lines in the order of the table
     * @param format how it is printed
     * @return the printed table, with a line end; wavelengths at rest in vacuum (micron)
     */
    public static String print(List<RestLine> lines, TableFormat format) {
        AlignedTable table = new AlignedTable(HEADER);
        lines.forEach(line -> table.add(row(line)));
        return table.print(format);
    }

    private static List<String> row(RestLine line) {
        return List.of(
                line.species(),
                String.format(Locale.ROOT, "%.7f", line.vacuumMicron()),
                line.purpose().name().toLowerCase(Locale.ROOT),
                line.source().key(),
                line.place(),
                line.howKnown().name().toLowerCase(Locale.ROOT),
                Integer.toString(line.confidencePercent()),
                line.note());
    }
}
