package emberline.demo;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import uk.ac.starlink.fits.FitsTableWriter;
import uk.ac.starlink.table.ArrayColumn;
import uk.ac.starlink.table.ColumnData;
import uk.ac.starlink.table.ColumnInfo;
import uk.ac.starlink.table.ColumnStarTable;
import uk.ac.starlink.table.DefaultValueInfo;
import uk.ac.starlink.table.DescribedValue;
import uk.ac.starlink.table.StarTableWriter;
import uk.ac.starlink.votable.DataFormat;
import uk.ac.starlink.votable.VOTableWriter;

/** Writes a table of one row a pixel, as FITS binary table or as VOTable. */
final class TableFile implements SpectrumFile {

    private final boolean votable;

    TableFile(boolean votable) {
        this.votable = votable;
    }

    @Override
    public byte[] bytes(ObservedSpectrum spectrum, Exposure exposure) throws IOException {
        FileColumns columns = FileColumns.of(spectrum, exposure);
        ColumnStarTable table = ColumnStarTable.makeTableWithRows(spectrum.size());
        String wave = exposure.wavelengthUnit().symbol();
        String flux = exposure.fluxUnit().plain();
        table.addColumn(column("wavelength", wave, "em.wl", columns.wavelength(), 8));
        table.addColumn(column("flux", flux, "phot.flux.density;em.wl", columns.flux(), 5));
        table.addColumn(
                column("sigma", flux, "stat.error;phot.flux.density;em.wl", columns.sigma(), 5));
        table.setName(exposure.object());
        add(table, "OBJECT", exposure.object());
        add(table, "MEDIUM", exposure.air() ? "air" : "vacuum");
        add(table, "SPEC_RP", exposure.instrument().resolvingPower());
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        writer().writeStarTable(table, bytes);
        return bytes.toByteArray();
    }

    private StarTableWriter writer() {
        if (!votable) {
            FitsTableWriter writer = new FitsTableWriter();
            writer.setWriteDate(false);
            return writer;
        }
        VOTableWriter writer = new VOTableWriter(DataFormat.TABLEDATA, true);
        writer.setWriteDate(false);
        return writer;
    }

    private static void add(ColumnStarTable table, String name, Object value) {
        DefaultValueInfo info = new DefaultValueInfo(name, value.getClass(), "");
        table.setParameter(new DescribedValue(info, value));
    }

    /** A column of numbers rounded to a number of significant digits. */
    private static ColumnData column(
            String name, String unit, String ucd, double[] values, int digits) {
        ColumnInfo info = new ColumnInfo(name, Double.class, "");
        info.setUnitString(unit);
        info.setUCD(ucd);
        double[] rounded = new double[values.length];
        for (int i = 0; i < values.length; i++) {
            rounded[i] = SignificantDigits.round(values[i], digits);
        }
        return ArrayColumn.makeColumn(info, rounded);
    }
}
