package emberline.reports.ledger;

import java.util.Optional;

/**
 * What the ledger knows of an object before it is run.
 *
 * @param stem name of its files without folder and ending
 * @param done what was recorded when it was done; empty where it was not
 */
public record PlannedEntry(String stem, Optional<Done> done) {

    /**
     * What tells whether an object must be done again.
     *
     * @param inputSha256 checksum of its row and its spectra at that time
     * @param jsonBytes size of its JSON file; -1 where there is none
     * @param pdfBytes size of its report; -1 where there is none
     * @param status the word of its status
     */
    public record Done(String inputSha256, long jsonBytes, long pdfBytes, String status) {}
}
