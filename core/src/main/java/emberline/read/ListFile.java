package emberline.read;

import java.io.IOException;
import java.nio.file.Path;

/**
 * A candidate list in a file.
 *
 * @param file path of the list
 */
record ListFile(Path file) implements CandidateSource {

    /** Whether a file is a FITS file of many spectra, and no list with a column of paths. */
    static boolean isPackedSpectra(Path file) {
        try {
            PackedSpectra spectra = new PackedSpectra(PackedFits.of(file));
            for (PackedRange range : spectra.ranges()) {
                FitsCards header = spectra.fits().header(range.hdu());
                boolean list =
                        header.isTable()
                                && FitsTableRow.columns(header).stream()
                                        .anyMatch(
                                                column ->
                                                        column.isSingle()
                                                                && column.name()
                                                                        .trim()
                                                                        .equalsIgnoreCase(
                                                                                "spectrum"));
                if (!list) {
                    return true;
                }
            }
            return false;
        } catch (UnreadableSpectrumException e) {
            return false; // no FITS file, or one that is read as a list and says what is wrong
        }
    }

    @Override
    public String name() {
        return FileContent.name(file);
    }

    @Override
    public Path folder() {
        return file.toAbsolutePath().getParent();
    }

    @Override
    public CandidateRows open() throws UnreadableListException {
        return new CandidateListReader().open(file);
    }

    @Override
    public String sha256() throws IOException {
        return Checksum.of(file);
    }
}
