package emberline.cli;

import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import java.util.ArrayList;
import java.util.List;

/** The columns of the results table as a table of a document. */
final class ColumnTable {

    private ColumnTable() {}

    static GeneratedPart part() {
        List<String> lines = new ArrayList<>();
        lines.add("| column | unit | UCD | what it holds |");
        lines.add("|---|---|---|---|");
        for (ResultColumn column : ResultColumns.standard()) {
            lines.add(
                    String.format(
                            "| `%s` | %s | `%s` | %s |",
                            column.name(),
                            unit(column),
                            column.ucd(),
                            column.description().replace("|", "\\|")));
        }
        return new GeneratedPart("reports/README.md", "columns", lines);
    }

    private static String unit(ResultColumn column) {
        if (column.content() == ResultColumn.Content.TEXT) {
            return "text";
        }
        return column.unit().isEmpty() ? "number" : column.unit();
    }
}
