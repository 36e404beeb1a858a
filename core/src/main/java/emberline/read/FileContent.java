package emberline.read;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.EOFException;
import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.List;
import java.util.zip.GZIPInputStream;
import java.util.zip.ZipException;

/** The bytes of a file, unpacked where they were packed by gzip, and the checksum of the file. */
final class FileContent {

    /** Most bytes that a file may have, packed or unpacked. */
    static final long MAX_BYTES = 512L << 20;

    /**
     * Most that a packed file may grow by. Deflate cannot exceed 1032; real spectra stay below 50.
     */
    private static final int MAX_GROWTH = 250;

    /** A file that unpacks to less than this is never a danger, however well it was packed. */
    private static final int HARMLESS_BYTES = 16 << 20;

    private final String name;
    private final byte[] bytes;
    private final String sha256;
    private final boolean packed;
    private final List<String> units;

    private FileContent(
            String name, byte[] bytes, String sha256, boolean packed, List<String> units) {
        this.name = name;
        this.bytes = bytes;
        this.sha256 = sha256;
        this.packed = packed;
        this.units = units;
    }

    /**
     * Takes a FITS file that was cut out of a larger one.
     *
     * @param bytes the file as it would stand alone
     * @param file name of the larger file
     * @param units where each of its HDUs stands in the larger file, such as {@code HDU 1, row 17}
     * @param main which of them is the spectrum
     */
    static FileContent cut(byte[] bytes, String file, List<String> units, int main) {
        return new FileContent(
                file + ", " + units.get(main),
                bytes,
                Checksum.of(bytes),
                false,
                List.copyOf(units));
    }

    /** Where an HDU stands in the file, such as {@code HDU 1}. */
    String unit(int index) {
        return index < units.size() ? units.get(index) : "HDU " + index;
    }

    /** Name of the file and of one of its HDUs, to begin a message. */
    String where(int index) {
        String unit = unit(index);
        return !units.isEmpty() && name.endsWith(", " + unit) ? name : name + ", " + unit;
    }

    /** Whether this was cut out of a larger file. */
    boolean isCut() {
        return !units.isEmpty();
    }

    /** Reads a file; refuses what is missing, no plain file, unreadable, empty or too large. */
    static FileContent load(Path file) throws UnreadableSpectrumException {
        String name = name(file);
        return reading(
                file,
                () -> {
                    long size = Files.size(file);
                    if (size > MAX_BYTES) {
                        throw tooLarge(name, size + " bytes");
                    }
                    return of(Files.readAllBytes(file), name);
                });
    }

    /** The name of a file as shown to the observer: without its folder. */
    static String name(Path file) {
        Path fileName = file.getFileName();
        return fileName == null ? file.toString() : fileName.toString();
    }

    /**
     * What is done with a plain file.
     *
     * @param <T> what comes of it
     */
    @FunctionalInterface
    interface Reading<T> {
        T read() throws IOException;
    }

    /** Reads a file in some way; says what is wrong where it cannot be read. */
    static <T> T reading(Path file, Reading<T> how) throws UnreadableSpectrumException {
        String name = name(file);
        if (Files.isDirectory(file)) {
            throw new UnreadableSpectrumException(
                    name, "a folder", "a file", "Name the spectrum file within it.");
        }
        try {
            if (Files.exists(file) && !Files.isRegularFile(file)) {
                throw new UnreadableSpectrumException(
                        name,
                        "a device, pipe or other special file",
                        "a plain file",
                        "Save the data to a file first.");
            }
            return how.read();
        } catch (NoSuchFileException e) {
            throw new UnreadableSpectrumException(
                    name,
                    "no such file (looked for " + file + ")",
                    "an existing file",
                    "Check the path; in a list it is relative to the folder of the list.");
        } catch (AccessDeniedException e) {
            throw new UnreadableSpectrumException(
                    name,
                    "no permission to read the file",
                    "a readable file",
                    "Ask its owner for read permission.");
        } catch (UnreadableSpectrumException e) {
            throw e;
        } catch (IOException e) {
            throw new UnreadableSpectrumException(
                    name,
                    "the file cannot be read (" + e.getMessage() + ")",
                    "a readable file",
                    "Check the disk or copy the file again.");
        }
    }

    /** Takes bytes as they lie on disk; unpacks gzip; refuses what is empty. */
    static FileContent of(byte[] onDisk, String name) throws UnreadableSpectrumException {
        String sha256 = Checksum.of(onDisk);
        boolean packed =
                onDisk.length > 2 && (onDisk[0] & 0xff) == 0x1f && (onDisk[1] & 0xff) == 0x8b;
        byte[] bytes = packed ? unpack(onDisk, name) : onDisk;
        if (bytes.length == 0) {
            throw new UnreadableSpectrumException(
                    name,
                    packed ? "nothing in the gzip file" : "an empty file (0 bytes)",
                    "a spectrum",
                    "Fetch or write the file again.");
        }
        return new FileContent(name, bytes, sha256, packed, List.of());
    }

    String name() {
        return name;
    }

    /** The unpacked bytes themselves, not a copy: nothing in this package writes to them. */
    byte[] bytes() {
        return bytes;
    }

    String sha256() {
        return sha256;
    }

    /** The words for a format, with gzip added where the file was packed. */
    String formatWords(String words) {
        return packed ? words + ", gzip" : words;
    }

    private static byte[] unpack(byte[] packed, String name) throws UnreadableSpectrumException {
        long limit =
                Math.min(MAX_BYTES, Math.max(HARMLESS_BYTES, (long) packed.length * MAX_GROWTH));
        ByteArrayOutputStream out = new ByteArrayOutputStream(packed.length * 3);
        byte[] buffer = new byte[1 << 16];
        try (GZIPInputStream in = new GZIPInputStream(new ByteArrayInputStream(packed), 1 << 16)) {
            for (int n = in.read(buffer); n >= 0; n = in.read(buffer)) {
                if (out.size() + (long) n > limit) {
                    throw tooLarge(
                            name, packed.length + " bytes that unpack to more than " + limit);
                }
                out.write(buffer, 0, n);
            }
        } catch (EOFException | ZipException e) {
            throw new UnreadableSpectrumException(
                    name,
                    "a gzip file that is cut off or damaged (" + e.getMessage() + ")",
                    "a whole gzip file",
                    "Fetch the file again.");
        } catch (UnreadableSpectrumException e) {
            throw e;
        } catch (IOException e) {
            throw new UnreadableSpectrumException(
                    name,
                    "a gzip file that cannot be unpacked (" + e.getMessage() + ")",
                    "a whole gzip file",
                    "Fetch the file again.");
        }
        return out.toByteArray();
    }

    private static UnreadableSpectrumException tooLarge(String name, String found) {
        return new UnreadableSpectrumException(
                name,
                found,
                "at most "
                        + (MAX_BYTES >> 20)
                        + " MB, and no more than gzip of a real spectrum"
                        + " unpacks to",
                "One file should hold one spectrum; cut it out of the larger one.");
    }
}
