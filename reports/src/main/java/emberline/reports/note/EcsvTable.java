package emberline.reports.note;

import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import emberline.reports.attach.ResultColumn;
import java.io.IOException;
import java.io.Writer;
import java.util.Map;
import java.util.TreeMap;

/** The table as ECSV 1.0: types, units and descriptions in a header of comments, then CSV. */
final class EcsvTable {

    private EcsvTable() {}

    static void write(TableRows rows, String origin, Writer out) throws IOException {
        out.write("# %ECSV 1.0\n# ---\n# delimiter: ','\n# datatype:\n");
        for (int c = 0; c < rows.columns().size(); c++) {
            ResultColumn column = rows.columns().get(c);
            StringBuilder line = new StringBuilder("# - {name: ").append(quoted(column.name()));
            String unit = TableUnit.of(column.unit()).ecsv();
            if (rows.isNumber(c) && !unit.isEmpty()) {
                line.append(", unit: ").append(quoted(unit));
            }
            line.append(", datatype: ")
                    .append(rows.isNumber(c) ? "float64" : "string")
                    .append(", description: ")
                    .append(quoted(column.description()));
            if (!column.ucd().isEmpty()) {
                line.append(", meta: {ucd: ").append(quoted(column.ucd())).append('}');
            }
            out.write(line.append("}\n").toString());
        }
        out.write("# meta: !!omap\n");
        for (Map.Entry<String, String> entry : new TreeMap<>(Map.of("origin", origin)).entrySet()) {
            out.write("# - {" + entry.getKey() + ": " + quoted(entry.getValue()) + "}\n");
        }
        out.write("# schema: astropy-2.0\n");
        CsvWriter csv = CsvWriter.builder().lineDelimiter(LineDelimiter.LF).build(out);
        csv.writeRecord(rows.columns().stream().map(ResultColumn::name).toList());
        rows.forEach(csv::writeRecord);
        csv.flush();
    }

    /** A YAML string in double quotes. */
    private static String quoted(String text) {
        StringBuilder quoted = new StringBuilder("\"");
        text.codePoints()
                .forEach(
                        sign -> {
                            if (sign == '"' || sign == '\\') {
                                quoted.append('\\').appendCodePoint(sign);
                            } else if (Character.isISOControl(sign)) {
                                quoted.append(' ');
                            } else {
                                quoted.appendCodePoint(sign);
                            }
                        });
        return quoted.append('"').toString();
    }
}
