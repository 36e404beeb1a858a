package emberline.read;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.concurrent.ConcurrentHashMap;

/**
 * The spectra of a FITS file that holds many: an HDU each, a row of a table with array columns
 * each, or a row of an image each. One is cut out as the FITS file that would hold it alone, so
 * that it is read as any other file; nothing else of the file is read. Wavelengths that all rows
 * share may stand in an image of one axis that is named after them; the noise of the rows of an
 * image in an image of the same shape. Safe for several threads.
 */
final class PackedSpectra {

    private static final String WAVELENGTHS =
            "(?i)wave(length)?s?|lambda|lam|loglam|wavelength_\\w+";

    private final PackedFits fits;
    private final Map<Integer, RowShape> shapes = new ConcurrentHashMap<>();
    private final byte[] primary;

    PackedSpectra(PackedFits fits) throws UnreadableSpectrumException {
        this.fits = fits;
        this.primary = withoutData(fits.header(0));
    }

    private static byte[] withoutData(FitsCards header) {
        FitsCards bare = header.with("NAXIS", 0);
        for (int i = 1; i <= header.number("NAXIS", 0); i++) {
            bare = bare.without("NAXIS" + i);
        }
        return bare.bytes();
    }

    /**
     * What must be known to cut rows out of an HDU.
     *
     * @param header its header
     * @param table whether it is a table; else an image
     * @param rowBytes length of a row
     * @param rows number of rows
     * @param heap where the heap of a table begins in its data
     * @param pointers columns of a table that lead there
     * @param noise the HDU with the noise of the rows, of an image
     * @param wavelengths wavelengths that all rows share; empty where each has its own
     */
    private record RowShape(
            FitsCards header,
            boolean table,
            long rowBytes,
            long rows,
            long heap,
            List<FitsTableRow.Column> pointers,
            OptionalInt noise,
            Optional<FitsImage> wavelengths) {}

    /** The bytes of one spectrum, to be read as a file of its own. */
    FileContent content(PackedAddress address) throws UnreadableSpectrumException {
        if (address.row().isEmpty()) {
            return unit(known(address.hdu().orElseThrow()));
        }
        int hdu = address.hdu().isPresent() ? known(address.hdu().getAsInt()) : firstWithRows();
        RowShape shape = shape(hdu);
        long row = address.row().getAsLong();
        if (row > shape.rows()) {
            throw new UnreadableSpectrumException(
                    fits.name() + ", HDU " + hdu,
                    "no row " + row,
                    "one of its " + shape.rows() + " rows",
                    "Correct the address; rows count from 1.");
        }
        return shape.table() ? tableRow(hdu, shape, row) : imageRow(hdu, shape, row);
    }

    private int known(int hdu) throws UnreadableSpectrumException {
        if (hdu >= fits.units()) {
            throw new UnreadableSpectrumException(
                    fits.name(),
                    "no HDU " + hdu,
                    "one of its HDUs 0 to " + (fits.units() - 1),
                    "Correct the address; the primary HDU is number 0.");
        }
        return hdu;
    }

    private int firstWithRows() throws UnreadableSpectrumException {
        OptionalInt hdu =
                fits.first(0, header -> header.isTable() || header.number("NAXIS", 0) == 2);
        if (hdu.isEmpty()) {
            throw new UnreadableSpectrumException(
                    fits.name(),
                    "no HDU with rows",
                    "a table with array columns, or an image with a row for each spectrum",
                    "Give the HDU with #hdu=H.");
        }
        return hdu.getAsInt();
    }

    private FileContent unit(int hdu) throws UnreadableSpectrumException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        List<String> units = new ArrayList<>();
        if (hdu > 0) {
            bytes.writeBytes(primary);
            units.add("HDU 0");
        }
        append(bytes, fits.header(hdu).bytes(), fits.data(hdu, 0, fits.dataBytes(hdu)));
        units.add("HDU " + hdu);
        int beside = hdu + 1;
        if (fits.header(hdu).isImage()
                && beside < fits.units()
                && isNoise(fits.header(beside))
                && fits.dataBytes(beside) > 0) {
            append(
                    bytes,
                    fits.header(beside).bytes(),
                    fits.data(beside, 0, fits.dataBytes(beside)));
            units.add("HDU " + beside);
        }
        return FileContent.cut(bytes.toByteArray(), fits.name(), units, hdu > 0 ? 1 : 0);
    }

    private static boolean isNoise(FitsCards header) {
        return header.isImage()
                && header.text("EXTNAME").filter(FitsPlanes::namesNoise).isPresent();
    }

    private RowShape shape(int hdu) throws UnreadableSpectrumException {
        RowShape known = shapes.get(hdu);
        if (known != null) {
            return known;
        }
        RowShape found = foundShape(hdu);
        shapes.put(hdu, found);
        return found;
    }

    private RowShape foundShape(int hdu) throws UnreadableSpectrumException {
        FitsCards header = fits.header(hdu);
        long first = header.number("NAXIS1", 0);
        long second = header.number("NAXIS2", 0);
        if (header.isTable()) {
            boolean own = TabularReader.holdsSpectrum(FitsTableRow.labels(header));
            Optional<FitsImage> shared = own ? Optional.empty() : sharedWavelengths();
            return new RowShape(
                    shared.isEmpty() ? header : withWavelengths(header, shared.get().length(1)),
                    true,
                    first,
                    second,
                    header.number("THEAP", first * second),
                    FitsTableRow.columns(header).stream()
                            .filter(FitsTableRow.Column::isPointer)
                            .toList(),
                    OptionalInt.empty(),
                    shared);
        }
        if (header.isImage() && header.number("NAXIS", 0) == 2) {
            OptionalInt noise =
                    fits.first(
                            hdu + 1,
                            other ->
                                    isNoise(other)
                                            && other.number("NAXIS1", 0) == first
                                            && other.number("NAXIS2", 0) == second);
            long bytes = first * Math.abs(header.number("BITPIX", 8)) / 8;
            return new RowShape(
                    header, false, bytes, second, 0, List.of(), noise, Optional.empty());
        }
        throw new UnreadableSpectrumException(
                fits.name() + ", HDU " + hdu,
                "no rows",
                "a table with array columns, or an image of two axes",
                "Give the address without row=, or that of another HDU.");
    }

    /** Wavelengths in an image of one axis. */
    private Optional<FitsImage> sharedWavelengths() throws UnreadableSpectrumException {
        OptionalInt hdu = fits.first(0, PackedSpectra::isWavelengths);
        if (hdu.isEmpty()) {
            return Optional.empty();
        }
        FileContent content = unit(hdu.getAsInt());
        List<FitsUnit> units = FitsUnit.all(content);
        return Optional.of(FitsImage.of(units.get(units.size() - 1)));
    }

    private static boolean isWavelengths(FitsCards header) {
        return header.isImage()
                && header.number("NAXIS", 0) == 1
                && header.text("EXTNAME").filter(n -> n.matches(WAVELENGTHS)).isPresent();
    }

    /** The header of a table with a further column for the wavelengths. */
    private FitsCards withWavelengths(FitsCards header, int length)
            throws UnreadableSpectrumException {
        FitsCards shared = fits.header(fits.first(0, PackedSpectra::isWavelengths).getAsInt());
        long fields = header.number("TFIELDS", 0) + 1;
        boolean log = shared.text("EXTNAME").orElse("").equalsIgnoreCase("loglam");
        Map<String, Object> column = new LinkedHashMap<>();
        column.put("TTYPE" + fields, log ? "loglam" : "wavelength");
        column.put("TFORM" + fields, length + "D");
        shared.text("BUNIT")
                .or(() -> shared.text("CUNIT1"))
                .ifPresent(unit -> column.put("TUNIT" + fields, unit));
        return header.with("TFIELDS", fields)
                .with("NAXIS1", header.number("NAXIS1", 0) + 8L * length)
                .plus(column);
    }

    private FileContent tableRow(int hdu, RowShape shape, long row)
            throws UnreadableSpectrumException {
        byte[] cells = fits.data(hdu, (row - 1) * shape.rowBytes(), shape.rowBytes());
        double[] wavelengths = shape.wavelengths().map(FitsImage::values).orElse(new double[0]);
        byte[] heap = FitsTableRow.heap(fits, hdu, shape.heap(), shape.pointers(), cells);
        ByteBuffer data = ByteBuffer.allocate(cells.length + 8 * wavelengths.length + heap.length);
        data.put(cells);
        for (double wavelength : wavelengths) {
            data.putDouble(wavelength);
        }
        data.put(heap);
        FitsCards header =
                shape.header().with("NAXIS2", 1).with("PCOUNT", heap.length).without("THEAP");
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        bytes.writeBytes(primary);
        append(bytes, header.bytes(), data.array());
        return FileContent.cut(
                bytes.toByteArray(), fits.name(), List.of("HDU 0", place(hdu, row)), 1);
    }

    private FileContent imageRow(int hdu, RowShape shape, long row)
            throws UnreadableSpectrumException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        List<String> units = new ArrayList<>();
        if (hdu > 0) {
            bytes.writeBytes(primary);
            units.add("HDU 0");
        }
        append(
                bytes,
                oneRow(shape.header()),
                fits.data(hdu, (row - 1) * shape.rowBytes(), shape.rowBytes()));
        units.add(place(hdu, row));
        if (shape.noise().isPresent()) {
            int noise = shape.noise().getAsInt();
            FitsCards header = fits.header(noise);
            long length = header.number("NAXIS1", 0) * Math.abs(header.number("BITPIX", 8)) / 8;
            append(bytes, oneRow(header), fits.data(noise, (row - 1) * length, length));
            units.add(place(noise, row));
        }
        return FileContent.cut(bytes.toByteArray(), fits.name(), units, hdu > 0 ? 1 : 0);
    }

    private static byte[] oneRow(FitsCards header) {
        return header.with("NAXIS", 1).without("NAXIS2").bytes();
    }

    private static String place(int hdu, long row) {
        return "HDU " + hdu + ", row " + row;
    }

    private static void append(ByteArrayOutputStream bytes, byte[] header, byte[] data) {
        bytes.writeBytes(header);
        bytes.writeBytes(
                Arrays.copyOf(
                        data,
                        (data.length + FitsCards.BLOCK - 1) / FitsCards.BLOCK * FitsCards.BLOCK));
    }

    /** The addresses of all spectra of the file; empty where it holds one spectrum or none. */
    List<PackedRange> ranges() throws UnreadableSpectrumException {
        List<PackedRange> ranges = new ArrayList<>();
        List<PackedRange> single = new ArrayList<>();
        for (int hdu = 0; hdu < fits.units(); hdu++) {
            FitsCards header = fits.header(hdu);
            if (header.isTable() && FitsTableRow.holdsSpectra(header, this::hasSharedWavelengths)) {
                ranges.add(new PackedRange(hdu, OptionalLong.of(header.number("NAXIS2", 0))));
            } else if (header.isImage()
                    && header.number("NAXIS", 0) == 2
                    && header.number("NAXIS2", 0) > FitsImageReader.MOST_PLANES
                    && !isNoise(header)) {
                ranges.add(new PackedRange(hdu, OptionalLong.of(header.number("NAXIS2", 0))));
            } else if (holdsOne(header)) {
                single.add(new PackedRange(hdu, OptionalLong.empty()));
            }
        }
        if (single.size() > 1) {
            ranges.addAll(single);
        }
        return ranges;
    }

    private boolean hasSharedWavelengths() {
        try {
            return fits.first(0, PackedSpectra::isWavelengths).isPresent();
        } catch (UnreadableSpectrumException e) {
            return false;
        }
    }

    /** Whether an HDU looks like one spectrum, and not like something that stands beside one. */
    private static boolean holdsOne(FitsCards header) {
        if (header.isTable()) {
            return TabularReader.holdsSpectrum(FitsTableRow.labels(header));
        }
        String name = header.text("EXTNAME").orElse("");
        boolean beside =
                FitsPlanes.namesNoise(name)
                        || name.matches(WAVELENGTHS)
                        || name.matches("(?i).*(mask|flag|dq|qual|sky|model|weight|trans|cont).*");
        return header.isImage() && !beside;
    }

    /** The file. */
    PackedFits fits() {
        return fits;
    }
}
