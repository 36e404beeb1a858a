package emberline.read;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * Where the objects of a run come from. It can be opened several times, and gives the same rows
 * each time as long as nothing changes on disk.
 */
public interface CandidateSource {

    /**
     * What it is called.
     *
     * @return name without folder
     */
    String name();

    /**
     * The folder to which the addresses of spectra are relative.
     *
     * @return a folder
     */
    Path folder();

    /**
     * The rows from the first on.
     *
     * @return rows, to be closed
     * @throws UnreadableListException if there are none to read; its message says what to do
     */
    CandidateRows open() throws UnreadableListException;

    /**
     * The checksum of all that the rows are read from, without the spectra they name.
     *
     * @return SHA-256, hexadecimal
     * @throws IOException if it cannot be read
     */
    String sha256() throws IOException;

    /**
     * A candidate list in a file.
     *
     * @param list path of the list
     * @return its rows; addresses are relative to its folder
     */
    static CandidateSource list(Path list) {
        return new ListFile(list);
    }

    /**
     * Whatever an argument names: a candidate list; a FITS file that holds many spectra; a folder
     * of spectra; or files by a pattern with {@code *} or {@code ?}.
     *
     * @param argument as given
     * @return its objects; for a file that is none of these, what {@link #list} gives
     * @throws UnreadableListException if there are no files; its message says what to do
     */
    static CandidateSource of(Path argument) throws UnreadableListException {
        if (Files.isDirectory(argument)) {
            return FileSource.ofFolder(argument);
        }
        if (SpectrumPattern.isPattern(Path.of(""), argument.toString())) {
            return FileSource.ofPattern(argument.toString().replace('\\', '/'));
        }
        return ListFile.isPackedSpectra(argument) ? FileSource.ofFile(argument) : list(argument);
    }
}
