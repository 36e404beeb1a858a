package emberline.read;

import java.nio.file.Path;

/**
 * Reads a one-dimensional spectrum from a file, by its content and never by the ending of its name:
 * plain text, CSV, ECSV, VOTable, FITS image or FITS table, each also packed by gzip. Has no state;
 * one reader may serve many threads.
 */
public final class SpectrumReader {

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
