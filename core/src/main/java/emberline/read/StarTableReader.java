package emberline.read;

import java.io.IOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.IntFunction;
import uk.ac.starlink.table.ColumnInfo;
import uk.ac.starlink.table.DescribedValue;
import uk.ac.starlink.table.RowSequence;
import uk.ac.starlink.table.StarTable;

/**
 * Reads a spectrum from a VOTable or an ECSV table: from its first table that has a wavelength and
 * a flux, one row a pixel, or one row of whole arrays.
 */
final class StarTableReader {

    private StarTableReader() {}

    static RawSpectrum read(FileContent content, ContentKind kind)
            throws UnreadableSpectrumException {
        List<StarTable> tables = StarTables.open(content, kind);
        if (tables.isEmpty()) {
            throw new UnreadableSpectrumException(
                    content.name(),
                    kind.words() + " without a table",
                    "a table with a spectrum",
                    "Check that the file was written completely.");
        }
        for (StarTable table : tables) {
            if (TabularReader.holdsSpectrum(labelsOf(table))) {
                return TabularReader.read(
                        content.name(), StarColumns.of(content.name(), kind, table));
            }
        }
        throw TabularReader.noSpectrum(content.name(), labelsOf(tables.get(0)));
    }

    private static List<ColumnLabel> labelsOf(StarTable table) {
        List<ColumnLabel> labels = new ArrayList<>();
        for (int i = 0; i < table.getColumnCount(); i++) {
            ColumnInfo info = table.getColumnInfo(i);
            labels.add(
                    ColumnLabel.of(
                            info.getName() == null ? "column" + (i + 1) : info.getName(),
                            Optional.ofNullable(info.getUnitString()),
                            info.getUCD() == null ? "" : info.getUCD(),
                            info.getUtype() == null ? "" : info.getUtype()));
        }
        return labels;
    }

    /** The columns of a table, read in one pass. */
    private static final class StarColumns implements TabularReader.Columns {
        private final ContentKind kind;
        private final StarTable table;
        private final List<ColumnLabel> labels;
        private final double[][] values;
        private final boolean oneRowOfArrays;

        private StarColumns(
                ContentKind kind,
                StarTable table,
                List<ColumnLabel> labels,
                double[][] values,
                boolean oneRowOfArrays) {
            this.kind = kind;
            this.table = table;
            this.labels = labels;
            this.values = values;
            this.oneRowOfArrays = oneRowOfArrays;
        }

        static StarColumns of(String where, ContentKind kind, StarTable table)
                throws UnreadableSpectrumException {
            List<ColumnLabel> labels = labelsOf(table);
            ColumnRoles roles = ColumnRoles.find(labels).orElseThrow();
            int[] wanted = wanted(roles);
            double[][] values = new double[labels.size()][];
            int rows = 0;
            boolean arrays = false;
            try (RowSequence sequence = table.getRowSequence()) {
                while (sequence.next()) {
                    for (int column : wanted) {
                        Object cell = sequence.getCell(column);
                        if (rows == 0 && cell != null && cell.getClass().isArray()) {
                            values[column] = FitsImage.toDouble(numbers(cell));
                            arrays = true;
                        } else {
                            values[column] = with(values[column], rows, number(cell));
                        }
                    }
                    rows++;
                    if (arrays && rows > 1) {
                        throw new UnreadableSpectrumException(
                                where,
                                "several rows of arrays",
                                "one row a pixel, or a single row of arrays",
                                "Write each spectrum to a file of its own.");
                    }
                }
            } catch (UnreadableSpectrumException e) {
                throw e;
            } catch (IOException | RuntimeException e) {
                throw new UnreadableSpectrumException(
                        where + ", row " + (rows + 1),
                        "a row that cannot be read (" + FitsReader.reason(e) + ")",
                        "a cell of the declared kind in each column",
                        "Correct the row.");
            }
            for (int column : wanted) {
                double[] all = values[column] == null ? new double[0] : values[column];
                values[column] = arrays ? all : Arrays.copyOf(all, rows);
            }
            return new StarColumns(kind, table, labels, values, arrays);
        }

        private static int[] wanted(ColumnRoles roles) {
            List<Integer> wanted = new ArrayList<>(List.of(roles.wavelength(), roles.flux()));
            roles.noise().ifPresent(wanted::add);
            roles.mask().ifPresent(wanted::add);
            return wanted.stream().mapToInt(Integer::intValue).distinct().toArray();
        }

        private static Object numbers(Object array) {
            if (array instanceof boolean[] flags) {
                double[] numbers = new double[flags.length];
                for (int i = 0; i < flags.length; i++) {
                    numbers[i] = flags[i] ? 1 : 0;
                }
                return numbers;
            }
            return array;
        }

        private static double number(Object cell) {
            if (cell instanceof Number number) {
                return number.doubleValue();
            }
            if (cell instanceof Boolean flag) {
                return flag ? 1 : 0;
            }
            if (cell instanceof String text && !text.isBlank()) {
                return Keywords.number(text).orElse(Double.NaN);
            }
            return Double.NaN;
        }

        private static double[] with(double[] values, int row, double value) {
            double[] grown = values == null ? new double[1024] : values;
            if (row == grown.length) {
                grown = Arrays.copyOf(grown, row * 2);
            }
            grown[row] = value;
            return grown;
        }

        @Override
        public List<ColumnLabel> labels() {
            return labels;
        }

        @Override
        public double[] values(int column) {
            return values[column];
        }

        @Override
        public String format() {
            return (kind == ContentKind.VOTABLE ? "VOTable, " : "ECSV table, ")
                    + labels.size()
                    + " columns"
                    + (oneRowOfArrays ? ", one row of arrays" : "");
        }

        @Override
        public IntFunction<String> place() {
            return row -> (oneRowOfArrays ? "element " : "row ") + (row + 1);
        }

        @Override
        public Keywords keywords() {
            return this::parameter;
        }

        private Optional<String> parameter(String key) {
            for (DescribedValue value : table.getParameters()) {
                String name = value.getInfo().getName();
                if (name != null
                        && value.getValue() != null
                        && name.toUpperCase(Locale.ROOT).replace(' ', '_').equals(key)) {
                    return Optional.of(value.getValue().toString().trim())
                            .filter(text -> !text.isEmpty());
                }
            }
            return Optional.empty();
        }
    }
}
