package emberline.read;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import nom.tam.fits.AsciiTable;
import nom.tam.fits.BinaryTable;
import nom.tam.fits.Data;
import nom.tam.fits.Header;
import nom.tam.fits.HeaderCard;
import nom.tam.fits.PaddingException;
import nom.tam.util.FitsInputStream;

/**
 * A header and data unit (HDU) of a FITS file. Sizes that a header declares are checked against the
 * length of the file before any data are read.
 */
final class FitsUnit implements Keywords {

    private static final int BLOCK = 2880;
    private static final int CARD = 80;
    private static final int MOST_UNITS = 1000;
    private static final int MOST_AXES = 999;
    private static final Set<Double> BITPIX = Set.of(8.0, 16.0, 32.0, 64.0, -32.0, -64.0);

    private final FileContent content;
    private final int index;
    private final Header header;
    private final int dataStart;

    private FitsUnit(FileContent content, int index, Header header, int dataStart) {
        this.content = content;
        this.index = index;
        this.header = header;
        this.dataStart = dataStart;
    }

    /** Reads the headers of all units; refuses a file shorter than its headers declare. */
    static List<FitsUnit> all(FileContent content) throws UnreadableSpectrumException {
        List<FitsUnit> units = new ArrayList<>();
        byte[] bytes = content.bytes();
        long at = 0;
        while (at < bytes.length && units.size() < MOST_UNITS) {
            if (!units.isEmpty() && !startsExtension(bytes, (int) at)) {
                break;
            }
            FitsUnit unit = at(content, units.size(), (int) at);
            units.add(unit);
            at = unit.dataStart + blocks(unit.checkedDataSize());
        }
        return units;
    }

    private static boolean startsExtension(byte[] bytes, int at) {
        String mark = "XTENSION";
        for (int i = 0; i < mark.length(); i++) {
            if (at + i >= bytes.length || bytes[at + i] != mark.charAt(i)) {
                return false;
            }
        }
        return true;
    }

    private static FitsUnit at(FileContent content, int index, int offset)
            throws UnreadableSpectrumException {
        byte[] bytes = content.bytes();
        String where = content.where(index);
        int end = endOfHeader(bytes, offset);
        if (end < 0) {
            throw cutOff(where, "the file ends within the header");
        }
        try (FitsInputStream in =
                new FitsInputStream(new ByteArrayInputStream(bytes, offset, end - offset))) {
            Header header = Header.readHeader(in);
            if (header == null) {
                throw cutOff(where, "no header");
            }
            return new FitsUnit(content, index, header, end);
        } catch (UnreadableSpectrumException e) {
            throw e;
        } catch (IOException | RuntimeException e) {
            throw new UnreadableSpectrumException(
                    where,
                    "a header that cannot be read (" + FitsReader.reason(e) + ")",
                    "a header after the FITS standard",
                    "Write the file again with a FITS library.");
        }
    }

    /** Where the block with the END card ends; -1 if the file ends before. */
    private static int endOfHeader(byte[] bytes, int offset) {
        for (int card = offset; card + CARD <= bytes.length; card += CARD) {
            boolean isEnd =
                    bytes[card] == 'E'
                            && bytes[card + 1] == 'N'
                            && bytes[card + 2] == 'D'
                            && bytes[card + 3] == ' ';
            if (isEnd) {
                long end = offset + blocks(card + CARD - (long) offset);
                return end <= bytes.length ? (int) end : -1;
            }
        }
        return -1;
    }

    private static UnreadableSpectrumException cutOff(String where, String found) {
        return new UnreadableSpectrumException(
                where, found, "a whole FITS file", "The file is cut off: fetch it again.");
    }

    private static long blocks(long size) {
        return (size + BLOCK - 1) / BLOCK * BLOCK;
    }

    /** The size of the data as declared (bytes, without filling), at most what the file has. */
    private long checkedDataSize() throws UnreadableSpectrumException {
        int axes = (int) number("NAXIS").orElse(0.0).doubleValue();
        if (axes < 0 || axes > MOST_AXES) {
            throw new UnreadableSpectrumException(
                    where(),
                    "NAXIS = " + axes,
                    "0 to " + MOST_AXES + " axes",
                    "Write the file again with a FITS library.");
        }
        double size = axes == 0 ? 0 : 1;
        for (int i = 1; i <= axes; i++) {
            double length = number("NAXIS" + i).orElse(Double.NaN);
            if (!(length >= 0)) {
                throw new UnreadableSpectrumException(
                        where(),
                        "no valid keyword NAXIS" + i,
                        "the length of each of the " + axes + " axes",
                        "Write the file again with a FITS library.");
            }
            size *= length;
        }
        double bytesPerNumber = Math.abs(checkedBitpix()) / 8;
        double groups = number("GCOUNT").orElse(1.0);
        double heap = number("PCOUNT").orElse(0.0);
        double declared = bytesPerNumber * Math.max(1, groups) * (Math.max(0, heap) + size);
        long present = content.bytes().length - (long) dataStart;
        if (!(declared <= present)) {
            throw new UnreadableSpectrumException(
                    where(),
                    "the header declares "
                            + String.format(Locale.ROOT, "%.0f", declared)
                            + " bytes of data but the file has "
                            + Math.max(0, present),
                    "a whole FITS file",
                    "The file is cut off or its header wrong: fetch it again.");
        }
        return (long) declared;
    }

    /**
     * The bits of a number; anything else than the standard has could hide how much is declared.
     */
    private double checkedBitpix() throws UnreadableSpectrumException {
        double bits = number("BITPIX").orElse(8.0);
        if (!BITPIX.contains(bits)) {
            throw new UnreadableSpectrumException(
                    where(),
                    "BITPIX = " + text("BITPIX").orElse(""),
                    "8, 16, 32, 64, -32 or -64",
                    "Write the file again with a FITS library.");
        }
        return bits;
    }

    /** Reads the data of a table through the FITS library. */
    Data table() throws UnreadableSpectrumException {
        byte[] bytes = content.bytes();
        try (FitsInputStream in =
                new FitsInputStream(
                        new ByteArrayInputStream(bytes, dataStart, bytes.length - dataStart))) {
            Data data = emptyTable();
            try {
                data.read(in);
            } catch (PaddingException e) {
                // Only the filling up to a whole block is missing; all data have been read.
                return data;
            }
            return data;
        } catch (IOException | RuntimeException e) {
            throw unreadable(e);
        }
    }

    /**
     * An empty table after the header. The library's other ways read header and data in one go,
     * before any size can be checked; hence its constructors "for internal use".
     */
    @SuppressWarnings("deprecation")
    private Data emptyTable() {
        return text("XTENSION").orElse("").equals("TABLE")
                ? new AsciiTable(header)
                : new BinaryTable(header);
    }

    UnreadableSpectrumException unreadable(Exception e) {
        return new UnreadableSpectrumException(
                where(),
                "data that cannot be read (" + FitsReader.reason(e) + ")",
                "data as the header declares them",
                "Write the file again with a FITS library.");
    }

    /** File name and number of this unit, to begin a message. */
    String where() {
        return content.where(index);
    }

    /** Where this unit stands in the file, such as {@code HDU 1}. */
    String place() {
        return content.unit(index);
    }

    /** Whether this is all that there is to a file, so that nobody wonders which unit is meant. */
    boolean isPlain() {
        return index == 0 && !content.isCut();
    }

    int index() {
        return index;
    }

    Header header() {
        return header;
    }

    byte[] bytes() {
        return content.bytes();
    }

    int dataStart() {
        return dataStart;
    }

    /** Whether this unit is an image with data. */
    boolean isImage() {
        String kind = text("XTENSION").orElse("IMAGE");
        return kind.equals("IMAGE") && number("NAXIS").orElse(0.0) > 0 && axes().length > 0;
    }

    /** Whether this unit is a binary or ASCII table, and not a compressed image. */
    boolean isTable() {
        String kind = text("XTENSION").orElse("");
        return (kind.equals("BINTABLE") || kind.equals("A3DTABLE") || kind.equals("TABLE"))
                && !text("ZIMAGE").orElse("F").equals("T");
    }

    /** The lengths of the axes in FITS order, without trailing axes of length 1. */
    int[] axes() {
        int axes = (int) number("NAXIS").orElse(0.0).doubleValue();
        int[] lengths = new int[axes];
        int used = 0;
        for (int i = 0; i < axes; i++) {
            lengths[i] = (int) number("NAXIS" + (i + 1)).orElse(0.0).doubleValue();
            if (lengths[i] == 0) {
                return new int[0];
            }
            used = lengths[i] > 1 ? i + 1 : used;
        }
        return Arrays.copyOf(lengths, Math.max(1, used));
    }

    @Override
    public Optional<String> text(String key) {
        HeaderCard card = header.findCard(key);
        if (card == null || card.getValue() == null) {
            return Optional.empty();
        }
        return Optional.of(card.getValue().trim()).filter(value -> !value.isEmpty());
    }

    @Override
    public String comment(String key) {
        HeaderCard card = header.findCard(key);
        return card == null || card.getComment() == null ? "" : card.getComment();
    }

    /** The value of a key as a finite number; empty where it is none. */
    Optional<Double> number(String key) {
        return text(key).flatMap(Keywords::number);
    }
}
