package emberline.read;

import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/**
 * Reads a one-dimensional spectrum from a file, by its content and never by the ending of its name:
 * plain text, CSV, ECSV, VOTable, FITS image or FITS table, each also packed by gzip. Keeps where
 * the parts of the packed files stand that were read last; one reader may serve many threads.
 */
public final class SpectrumReader {

    private final PackedFiles packed = new PackedFiles();

    /**
     * Reads a spectrum.
     *
     * @param file path of the file
     * @return what the file holds; wavelengths in micron in the medium of the file, flux per unit
     *     wavelength
     * @throws UnreadableSpectrumException if the file is missing, unreadable, damaged or no
     *     spectrum; its message says what to do
     */
    public Observation read(Path file) throws UnreadableSpectrumException {
        return read(FileContent.load(file));
    }

    /**
     * Reads a spectrum by its address.
     *
     * @param folder what the address is relative to
     * @param address path of a file, or of one spectrum of a FITS file that holds many: {@code
     *     FILE#hdu=2}, {@code FILE#row=17}, {@code FILE#hdu=1&row=17}, with HDUs from 0 and rows
     *     from 1
     * @return what the file holds there
     * @throws UnreadableSpectrumException as {@link #read(Path)}, or if there is no such HDU or row
     * @throws InvalidPathException if the address is no path
     */
    public Observation read(Path folder, String address) throws UnreadableSpectrumException {
        return read(content(folder, address));
    }

    private FileContent content(Path folder, String address) throws UnreadableSpectrumException {
        Path plain = folder.resolve(address);
        Optional<PackedAddress> within =
                address.indexOf('#') < 0 || Files.exists(plain)
                        ? Optional.empty()
                        : PackedAddress.parse(address);
        return within.isEmpty()
                ? FileContent.load(plain)
                : packed.of(folder.resolve(within.get().file())).content(within.get());
    }

    /**
     * The checksum of a spectrum as {@link Observation#sha256} gives it, without making sense of
     * its content.
     *
     * @param folder what the address is relative to
     * @param address as {@link #read(Path, String)}
     * @return SHA-256, hexadecimal; empty where there is nothing that can be read
     */
    public Optional<String> checksum(Path folder, String address) {
        try {
            Path file = folder.resolve(address);
            return address.indexOf('#') >= 0 && !Files.exists(file)
                    ? Optional.of(content(folder, address).sha256())
                    : Optional.of(FileContent.reading(file, () -> Checksum.of(file)));
        } catch (UnreadableSpectrumException | InvalidPathException e) {
            return Optional.empty();
        }
    }

    /**
     * The addresses that a pattern stands for: {@code night1/*.fits} names the files that are
     * there, in the order of their names.
     *
     * @param folder what the pattern is relative to
     * @param pattern a pattern, or an address
     * @return addresses; the text itself where it is no pattern or names nothing
     * @throws UnreadableSpectrumException if a folder cannot be listed
     */
    public List<String> expanded(Path folder, String pattern) throws UnreadableSpectrumException {
        if (!SpectrumPattern.isPattern(folder, pattern)) {
            return List.of(pattern);
        }
        List<String> files = SpectrumPattern.files(folder, pattern);
        return files.isEmpty() ? List.of(pattern) : files;
    }

    /**
     * Reads a spectrum from bytes as they would lie on disk.
     *
     * @param content the bytes, packed by gzip or not
     * @param name name to show to the observer
     * @return what the bytes hold
     * @throws UnreadableSpectrumException if they are no spectrum; its message says what to do
     */
    public Observation read(byte[] content, String name) throws UnreadableSpectrumException {
        return read(FileContent.of(content.clone(), name));
    }

    private static Observation read(FileContent content) throws UnreadableSpectrumException {
        ContentKind kind = ContentKind.of(content.bytes());
        if (!kind.known()) {
            throw new UnreadableSpectrumException(
                    content.name(),
                    kind.words(),
                    "a spectrum as FITS, VOTable, ECSV, CSV or plain text",
                    "Save the spectrum in one of these formats.");
        }
        RawSpectrum raw =
                switch (kind) {
                    case FITS -> FitsReader.read(content);
                    case VOTABLE, ECSV -> StarTableReader.read(content, kind);
                    default -> PlainTextReader.read(content);
                };
        requireEqualLengths(content, raw.samples());
        return ObservationAssembly.assemble(content, raw);
    }

    private static void requireEqualLengths(FileContent content, RawSpectrum.Samples samples)
            throws UnreadableSpectrumException {
        int size = samples.wavelengths().length;
        boolean equal =
                samples.fluxes().length == size
                        && samples.noise().map(n -> n.length == size).orElse(true)
                        && samples.mask().map(m -> m.length == size).orElse(true);
        if (!equal) {
            throw new UnreadableSpectrumException(
                    content.name(),
                    size
                            + " wavelengths beside "
                            + samples.fluxes().length
                            + " fluxes or a noise"
                            + " or mask of another length",
                    "columns of equal length",
                    "Check that the file was written completely.");
        }
    }
}
