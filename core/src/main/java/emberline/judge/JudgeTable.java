package emberline.judge;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.read.ProductTable;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;

/** Reads the tables of this package: comments with {@code #}, then a header, then rows. */
final class JudgeTable {

    private static final String FOLDER = "/emberline/judge/";

    private JudgeTable() {}

    /** Every row of a table, turned into a value; the message of a failure says where. */
    static <T> List<T> rows(String name, Function<NamedCsvRecord, T> make) {
        ProductTable table = ProductTable.at(FOLDER + name);
        List<T> values = new ArrayList<>();
        for (NamedCsvRecord row : table.rows()) {
            try {
                values.add(make.apply(row));
            } catch (IllegalArgumentException e) {
                IllegalStateException fault = table.fault(row, e.getMessage());
                fault.initCause(e);
                throw fault;
            }
        }
        return values;
    }

    /** A cell as a number. */
    static double number(NamedCsvRecord row, String column) {
        return Double.parseDouble(row.getField(column));
    }

    /** A cell as a number, or another number where it is blank. */
    static double number(NamedCsvRecord row, String column, double blank) {
        String cell = row.getField(column);
        return cell.isBlank() ? blank : Double.parseDouble(cell);
    }
}
