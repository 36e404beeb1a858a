package emberline.reports.ledger;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** Joins the ledgers of the parts of a run into one. */
public final class LedgerMerge {

    private LedgerMerge() {}

    /**
     * What a run in a folder is.
     *
     * @param folder the folder of the run
     * @return its identity
     * @throws LedgerException if there is no ledger or it cannot be read
     */
    public static RunIdentity identity(Path folder) throws LedgerException {
        Path file = folder.resolve(RunLedger.FILE);
        if (!Files.exists(file)) {
            throw new LedgerException(
                    file,
                    "no such file",
                    "the ledger of a run",
                    "Name the folders that were given to sort with --out.");
        }
        try (Database database = Database.toRead(file)) {
            if (!database.hasTable("run")) {
                throw new LedgerException(
                        file,
                        "a database without the table run",
                        "the ledger of a run",
                        "Run this part first.");
            }
            return LedgerFacts.identity(database);
        }
    }

    /**
     * Checks that folders hold all parts of one run, each once and complete.
     *
     * @param folders the folders of the parts in any order
     * @return the identity of the whole
     * @throws LedgerException if a ledger cannot be read, settings differ, a part is missing, given
     *     twice or not complete; its message says which and what to do
     */
    public static RunIdentity checked(List<Path> folders) throws LedgerException {
        RunIdentity first = identity(folders.get(0));
        Map<String, Path> byPart = new TreeMap<>();
        for (Path folder : folders) {
            RunIdentity one = identity(folder);
            requireSame(folders.get(0), first, folder, one);
            Path twin = byPart.putIfAbsent(one.part(), folder);
            if (twin != null) {
                throw refused(
                        folder,
                        (one.part().isEmpty() ? "the whole list" : "part " + one.part())
                                + ", which "
                                + twin
                                + " holds too",
                        "each part once",
                        "Leave one of the two out.");
            }
            requireComplete(folder);
        }
        requireAll(folders.get(0), first, byPart);
        return first.whole();
    }

    private static void requireSame(
            Path firstFolder, RunIdentity first, Path folder, RunIdentity one)
            throws LedgerException {
        String difference = LedgerFacts.difference(first.settings(), one.settings());
        if (!difference.isEmpty()) {
            throw refused(
                    folder,
                    "a run of other settings than " + firstFolder + ": " + difference,
                    "parts of the same version, options and seed",
                    "Run the parts again that differ.");
        }
        String told = LedgerFacts.difference(first.recorded(), one.recorded());
        if (!told.isEmpty()) {
            throw refused(
                    folder,
                    "a run with other verdicts than " + firstFolder + ": " + told,
                    "parts with the same verdicts",
                    "Run the parts again with the same --verdicts; only objects with a verdict are"
                            + " done again.");
        }
        if (!first.listSha256().equals(one.listSha256())) {
            throw refused(
                    folder,
                    "a run of another list, or of the list '"
                            + one.listName()
                            + "' at another time, than "
                            + firstFolder,
                    "parts of the same list",
                    "Run the parts again with the list as it is now; what has not changed is not"
                            + " done again.");
        }
    }

    private static void requireComplete(Path folder) throws LedgerException {
        RunProgress progress = RunLedger.progress(folder);
        if (!progress.state().equals("complete") || progress.done() != progress.objects()) {
            throw refused(
                    folder,
                    "a run that is "
                            + progress.state()
                            + ", "
                            + progress.done()
                            + " of "
                            + progress.objects()
                            + " objects done",
                    "a complete run",
                    "Run this part again; it goes on where it stopped.");
        }
    }

    private static void requireAll(Path folder, RunIdentity first, Map<String, Path> byPart)
            throws LedgerException {
        int slash = first.part().indexOf('/');
        int of = slash < 0 ? 1 : Integer.parseInt(first.part().substring(slash + 1));
        List<String> missing = new ArrayList<>();
        for (int number = 1; number <= of && of > 1; number++) {
            if (!byPart.containsKey(number + "/" + of)) {
                missing.add(number + "/" + of);
            }
        }
        if (!missing.isEmpty() || byPart.size() != of) {
            throw refused(
                    folder,
                    missing.isEmpty()
                            ? "parts of different divisions: " + byPart.keySet()
                            : "part "
                                    + String.join(
                                            ", ", missing.subList(0, Math.min(5, missing.size())))
                                    + (missing.size() > 5 ? " and more" : "")
                                    + " missing",
                    "all " + of + " parts of the list",
                    "Name the folders of all parts.");
        }
    }

    private static LedgerException refused(
            Path folder, String found, String expected, String advice) {
        return new LedgerException(folder, found, expected, advice);
    }

    /**
     * Copies the records of parts into the ledger of the whole, whose own are replaced.
     *
     * @param ledger the ledger of the whole
     * @param folders the folders of the parts, as {@link #checked}
     * @throws LedgerException if a ledger cannot be read or written
     */
    public static void copy(RunLedger ledger, List<Path> folders) throws LedgerException {
        Database database = ledger.database();
        database.run(List.of("DELETE FROM object"));
        database.commit();
        for (Path folder : folders) {
            database.attach(folder.resolve(RunLedger.FILE), "part");
            database.run(List.of("INSERT INTO main.object SELECT * FROM part.object"));
            database.commit();
            database.detach("part");
        }
    }
}
