package emberline.read;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;
import nom.tam.fits.BinaryTable;
import nom.tam.fits.TableData;
import nom.tam.util.ArrayFuncs;

/**
 * The columns of a FITS table, one row a pixel, or one row that holds whole arrays. Only the
 * columns that are asked for are turned into numbers, scaled as the header says.
 */
final class FitsTableColumns implements TabularReader.Columns {

    private static final int MOST_COLUMNS = 999;

    private final FitsUnit unit;
    private final FitsUnit primary;
    private final TableData table;
    private final List<ColumnLabel> labels;

    private FitsTableColumns(
            FitsUnit unit, FitsUnit primary, TableData table, List<ColumnLabel> labels) {
        this.unit = unit;
        this.primary = primary;
        this.table = table;
        this.labels = labels;
    }

    static FitsTableColumns of(FitsUnit unit, FitsUnit primary) throws UnreadableSpectrumException {
        List<ColumnLabel> labels = new ArrayList<>();
        int fields = (int) unit.number("TFIELDS").orElse(0.0).doubleValue();
        for (int i = 1; i <= Math.min(fields, MOST_COLUMNS); i++) {
            labels.add(
                    ColumnLabel.of(
                            unit.text("TTYPE" + i).orElse("column" + i),
                            unit.text("TUNIT" + i),
                            unit.text("TUCD" + i).orElse(""),
                            unit.text("TUTYP" + i).orElse("")));
        }
        if (!TabularReader.holdsSpectrum(labels)) {
            throw TabularReader.noSpectrum(unit.where(), labels);
        }
        FitsTableGuard.check(unit);
        if (!(unit.table() instanceof TableData table) || table.getNRows() == 0) {
            throw new UnreadableSpectrumException(
                    unit.where(),
                    "a table without rows",
                    "one row a pixel, or one row of arrays",
                    "Check that the file was written completely.");
        }
        return new FitsTableColumns(unit, primary, table, List.copyOf(labels));
    }

    @Override
    public List<ColumnLabel> labels() {
        return labels;
    }

    @Override
    public double[] values(int column) throws UnreadableSpectrumException {
        double[] values;
        try {
            values = FitsImage.toDouble(flat(column));
        } catch (RuntimeException e) {
            throw unit.unreadable(e);
        }
        int rows = table.getNRows();
        if (rows > 1 && values.length != rows) {
            throw rowsOfArrays(column);
        }
        return scaled(values, column + 1);
    }

    private Object flat(int column) throws UnreadableSpectrumException {
        refuseHugeHeapArray(column);
        Object cells =
                table.getNRows() == 1 ? table.getElement(0, column) : table.getColumn(column);
        if (cells instanceof boolean[] flags) {
            double[] numbers = new double[flags.length];
            for (int i = 0; i < flags.length; i++) {
                numbers[i] = flags[i] ? 1 : 0;
            }
            return numbers;
        }
        return ArrayFuncs.flatten(cells);
    }

    /** Checks the length that a variable-length array claims, before it is made. */
    @SuppressWarnings("deprecation") // No other way leads to the pointer without the array.
    private void refuseHugeHeapArray(int column) throws UnreadableSpectrumException {
        if (!(table instanceof BinaryTable binary)
                || !binary.getDescriptor(column).isVariableSize()) {
            return;
        }
        if (table.getNRows() > 1) {
            throw rowsOfArrays(column);
        }
        Object pointer = binary.getRawElement(0, column);
        long claimed = pointer instanceof long[] wide ? wide[0] : ((int[]) pointer)[0];
        if (!(claimed >= 0 && claimed <= unit.bytes().length)) {
            throw new UnreadableSpectrumException(
                    unit.where(),
                    "an array of "
                            + claimed
                            + " numbers in column '"
                            + labels.get(column).name()
                            + "'",
                    "no more than the file has bytes (" + unit.bytes().length + ")",
                    "The file is damaged: fetch it again.");
        }
    }

    private UnreadableSpectrumException rowsOfArrays(int column) {
        return new UnreadableSpectrumException(
                unit.where(),
                table.getNRows() + " rows of arrays in column '" + labels.get(column).name() + "'",
                "one row a pixel, or a single row of arrays",
                "Name one of them by its row, FILE#row=1, or sort the file as it is.");
    }

    private double[] scaled(double[] values, int field) {
        double scale = unit.number("TSCAL" + field).orElse(1.0);
        double zero = unit.number("TZERO" + field).orElse(0.0);
        Optional<Double> none = unit.number("TNULL" + field);
        if (scale == 1 && zero == 0 && none.isEmpty()) {
            return values;
        }
        double[] result = Arrays.copyOf(values, values.length);
        for (int i = 0; i < result.length; i++) {
            boolean isNull = none.isPresent() && result[i] == none.get();
            result[i] = isNull ? Double.NaN : zero + scale * result[i];
        }
        return result;
    }

    @Override
    public String format() {
        return "FITS "
                + (table instanceof BinaryTable ? "binary" : "ASCII")
                + " table, "
                + labels.size()
                + " columns"
                + (table.getNRows() == 1 ? ", one row of arrays" : "");
    }

    @Override
    public IntFunction<String> place() {
        String word = table.getNRows() == 1 ? ", element " : ", row ";
        return row -> unit.place() + word + (row + 1);
    }

    @Override
    public Keywords keywords() {
        return key -> unit.text(key).or(() -> primary.text(key));
    }
}
