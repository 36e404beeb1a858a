package emberline.reports.ledger;

import java.util.List;

/**
 * What the ledger keeps of an object that is done.
 *
 * @param stem name of its files without folder and ending; known to the ledger
 * @param inputSha256 checksum of its row and its spectra
 * @param cells the texts of all columns of the results table in their order
 * @param pageLine its line of the survey page
 * @param methods the methods its results rest on, as {@code MethodsUsed} writes them
 * @param inputs one JSON object a spectrum that was read: name, path, sha256
 * @param jsonBytes size of its JSON file; -1 where there is none
 * @param pdfBytes size of its report; -1 where there is none
 * @param seconds how long it took on its thread
 */
public record ObjectEntry(
        String stem,
        String inputSha256,
        List<String> cells,
        String pageLine,
        String methods,
        List<String> inputs,
        long jsonBytes,
        long pdfBytes,
        double seconds) {

    /** Copies the lists. */
    public ObjectEntry {
        cells = List.copyOf(cells);
        inputs = List.copyOf(inputs);
    }
}
