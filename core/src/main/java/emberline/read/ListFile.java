package emberline.read;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;

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
        try (InputStream bytes = Files.newInputStream(file)) {
            MessageDigest digest = MessageDigest.getInstance("SHA-256");
            byte[] buffer = new byte[1 << 16];
            for (int n = bytes.read(buffer); n >= 0; n = bytes.read(buffer)) {
                digest.update(buffer, 0, n);
            }
            return HexFormat.of().formatHex(digest.digest());
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }
}
