package emberline.read;

import java.io.EOFException;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.OptionalInt;
import java.util.function.Predicate;

/**
 * A FITS file of any size that is read by parts: where its HDUs stand, and any of their headers or
 * data. Sizes are checked against the file before room is made. A value; safe for several threads.
 */
final class PackedFits {

    private static final int MOST_HEADER_BLOCKS = 2000;

    private final Path file;
    private final String name;
    private final long[] headerStarts;
    private final long[] dataStarts;
    private final long[] dataSizes;

    private PackedFits(Path file, long[] headerStarts, long[] dataStarts, long[] dataSizes) {
        this.file = file;
        this.name = FileContent.name(file);
        this.headerStarts = headerStarts;
        this.dataStarts = dataStarts;
        this.dataSizes = dataSizes;
    }

    /** Finds the HDUs of a file by their headers; refuses what is no FITS file or cut off. */
    static PackedFits of(Path file) throws UnreadableSpectrumException {
        return FileContent.reading(
                file,
                () -> {
                    try (FileChannel channel = FileChannel.open(file)) {
                        return scanned(file, channel);
                    }
                });
    }

    private static PackedFits scanned(Path file, FileChannel channel) throws IOException {
        long[][] found = new long[3][8];
        int count = 0;
        long at = 0;
        long size = channel.size();
        while (at < size && isHeader(channel, at, count)) {
            FitsCards cards = header(file, channel, at, count);
            long start = at + cards.bytes().length;
            double declared = cards.dataBytes();
            if (!(declared <= size - start)) {
                throw new UnreadableSpectrumException(
                        FileContent.name(file) + ", HDU " + count,
                        "the header declares "
                                + (long) declared
                                + " bytes of data but the file has "
                                + Math.max(0, size - start),
                        "a whole FITS file",
                        "The file is cut off or its header wrong: fetch it again.");
            }
            if (count == found[0].length) {
                for (int i = 0; i < found.length; i++) {
                    found[i] = Arrays.copyOf(found[i], 2 * count);
                }
            }
            found[0][count] = at;
            found[1][count] = start;
            found[2][count] = (long) declared;
            count++;
            at =
                    start
                            + ((long) declared + FitsCards.BLOCK - 1)
                                    / FitsCards.BLOCK
                                    * FitsCards.BLOCK;
        }
        if (count == 0) {
            throw new UnreadableSpectrumException(
                    FileContent.name(file),
                    "no FITS file",
                    "an unpacked FITS file, of which one HDU or row is wanted",
                    "Name the file without #hdu= and #row=, or unpack it.");
        }
        return new PackedFits(
                file,
                Arrays.copyOf(found[0], count),
                Arrays.copyOf(found[1], count),
                Arrays.copyOf(found[2], count));
    }

    private static boolean isHeader(FileChannel channel, long at, int index) throws IOException {
        ByteBuffer start = ByteBuffer.allocate(9);
        int more = 0;
        while (more >= 0 && start.hasRemaining()) {
            more = channel.read(start, at + start.position());
        }
        String text = new String(start.array(), StandardCharsets.ISO_8859_1);
        return index == 0 ? text.equals("SIMPLE  =") : text.startsWith("XTENSION");
    }

    private static FitsCards header(Path file, FileChannel channel, long start, int index)
            throws IOException {
        byte[] blocks = new byte[0];
        for (int i = 0; i < MOST_HEADER_BLOCKS; i++) {
            long at = start + (long) i * FitsCards.BLOCK;
            if (at + FitsCards.BLOCK > channel.size()) {
                break;
            }
            byte[] block = read(channel, at, FitsCards.BLOCK);
            blocks = Arrays.copyOf(blocks, blocks.length + FitsCards.BLOCK);
            System.arraycopy(block, 0, blocks, i * FitsCards.BLOCK, FitsCards.BLOCK);
            if (FitsCards.holdsEnd(block)) {
                return FitsCards.of(blocks);
            }
        }
        throw new UnreadableSpectrumException(
                FileContent.name(file) + ", HDU " + index,
                "the file ends within the header",
                "a whole FITS file",
                "The file is cut off: fetch it again.");
    }

    private static byte[] read(FileChannel channel, long at, int length) throws IOException {
        ByteBuffer buffer = ByteBuffer.allocate(length);
        while (buffer.hasRemaining()) {
            if (channel.read(buffer, at + buffer.position()) < 0) {
                throw new EOFException("the file became shorter while it was read");
            }
        }
        return buffer.array();
    }

    Path file() {
        return file;
    }

    /** The name as shown to the observer. */
    String name() {
        return name;
    }

    int units() {
        return headerStarts.length;
    }

    /** Size of the data of an HDU (bytes, without filling). */
    long dataBytes(int hdu) {
        return dataSizes[hdu];
    }

    /** The header of an HDU, which is one of this file. */
    FitsCards header(int hdu) throws UnreadableSpectrumException {
        long length = dataStarts[hdu] - headerStarts[hdu];
        return FitsCards.of(bytes(headerStarts[hdu], length, "HDU " + hdu));
    }

    /** Some data of an HDU, which lie within it. */
    byte[] data(int hdu, long from, long length) throws UnreadableSpectrumException {
        if (!(from >= 0 && length >= 0 && from <= dataSizes[hdu] - length)) {
            throw new UnreadableSpectrumException(
                    name + ", HDU " + hdu,
                    "data from byte " + from + " on, " + length + " bytes long",
                    "no more than its " + dataSizes[hdu] + " bytes",
                    "The file is damaged: fetch it again.");
        }
        return bytes(dataStarts[hdu] + from, length, "HDU " + hdu);
    }

    private byte[] bytes(long at, long length, String where) throws UnreadableSpectrumException {
        if (length > FileContent.MAX_BYTES) {
            throw new UnreadableSpectrumException(
                    name + ", " + where,
                    length + " bytes for one spectrum",
                    "at most " + FileContent.MAX_BYTES,
                    "Check that the address names one spectrum, by its row where there are rows.");
        }
        return FileContent.reading(
                file,
                () -> {
                    try (FileChannel channel = FileChannel.open(file)) {
                        return read(channel, at, (int) length);
                    }
                });
    }

    /** The first HDU from one on of which something holds. */
    OptionalInt first(int from, Predicate<FitsCards> holds) throws UnreadableSpectrumException {
        for (int hdu = from; hdu < units(); hdu++) {
            if (holds.test(header(hdu))) {
                return OptionalInt.of(hdu);
            }
        }
        return OptionalInt.empty();
    }
}
