package emberline.reports.ledger;

import java.util.List;
import java.util.Map;

/**
 * How far a run is.
 *
 * @param version version of the program that runs it
 * @param listName name of the candidate list
 * @param part which part of the list; empty for all of it
 * @param state {@code running}, {@code complete} or {@code stopped}; {@code killed} where it says
 *     running but its process is gone
 * @param objects number of objects of the run
 * @param doneByStatus how many are done, by the word of their status
 * @param doneThisTime how many were done since the run was started last
 * @param seconds how long it has been running since then; the time of the last record counts
 * @param failures the names and reasons of some that failed, those recorded last first
 */
public record RunProgress(
        String version,
        String listName,
        String part,
        String state,
        long objects,
        Map<String, Long> doneByStatus,
        long doneThisTime,
        double seconds,
        List<Failure> failures) {

    /** Copies the collections. */
    public RunProgress {
        doneByStatus = Map.copyOf(doneByStatus);
        failures = List.copyOf(failures);
    }

    /**
     * An object that failed.
     *
     * @param name its name
     * @param reason why
     */
    public record Failure(String name, String reason) {}

    /**
     * The number of objects that are done.
     *
     * @return whatever their status
     */
    public long done() {
        return doneByStatus.values().stream().mapToLong(n -> n).sum();
    }
}
