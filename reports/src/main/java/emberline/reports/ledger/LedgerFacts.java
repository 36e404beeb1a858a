package emberline.reports.ledger;

import com.fasterxml.jackson.jr.ob.JSON;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.InetAddress;
import java.net.UnknownHostException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.NavigableSet;
import java.util.TreeSet;

/** The facts of a run as the table {@code run} of a ledger holds them. */
final class LedgerFacts {

    private LedgerFacts() {}

    /** Writes what a run is into a new table. */
    static void put(Database database, RunIdentity identity) throws LedgerException {
        database.setFact("schema", LedgerSchema.VERSION);
        database.setFact("version", identity.version());
        database.setFact("options", json(identity.options()));
        database.setFact("seed", Long.toString(identity.seed()));
        database.setFact("list_columns", json(identity.listColumns()));
        database.setFact("part", identity.part());
        database.setFact("settings", json(identity.settings()));
    }

    /** Reads what a run is. */
    static RunIdentity identity(Database database) throws LedgerException {
        try {
            Map<String, String> options =
                    JSON.std.mapOfFrom(String.class, database.fact("options").orElse("{}"));
            List<String> columns =
                    JSON.std.listOfFrom(String.class, database.fact("list_columns").orElse("[]"));
            return new RunIdentity(
                    database.fact("version").orElse(""),
                    options,
                    JSON.std.mapOfFrom(String.class, database.fact("recorded").orElse("{}")),
                    Long.parseLong(database.fact("seed").orElse("0")),
                    database.fact("list").orElse(""),
                    database.fact("list_sha256").orElse(""),
                    columns,
                    database.fact("part").orElse(""));
        } catch (IOException | NumberFormatException e) {
            throw new LedgerException(
                    database.file(),
                    "facts of the run that cannot be read (" + e.getMessage() + ")",
                    "the table run as the program writes it",
                    "Remove the file and run again.");
        }
    }

    /** What decides whether records still hold, as it was written down. */
    static Map<String, String> settings(Database database) throws LedgerException {
        Map<String, String> settings = new HashMap<>();
        try {
            settings.putAll(
                    JSON.std.mapOfFrom(String.class, database.fact("settings").orElse("{}")));
        } catch (IOException e) {
            settings.put("settings", "unreadable");
        }
        settings.put("format of the ledger", database.fact("schema").orElse(""));
        return settings;
    }

    /** Which settings differ and how, in words. */
    static String difference(Map<String, String> former, Map<String, String> now) {
        NavigableSet<String> names = new TreeSet<>(former.keySet());
        names.addAll(now.keySet());
        List<String> words = new ArrayList<>();
        for (String name : names) {
            String before = former.getOrDefault(name, "");
            String after = now.getOrDefault(name, "");
            if (!before.equals(after)) {
                boolean longer = before.length() + after.length() > 120;
                words.add(
                        longer
                                ? name + " differ"
                                : name + " was '" + before + "', is '" + after + "'");
            }
        }
        return String.join("; ", words);
    }

    /** The state of a run; one that says running while its process is gone was killed. */
    static String state(Database database) throws LedgerException {
        String state = database.fact("state").orElse("");
        boolean here = database.fact("host").orElse("").equals(host());
        long pid = Long.parseLong(database.fact("pid").orElse("0"));
        boolean gone = here && ProcessHandle.of(pid).filter(ProcessHandle::isAlive).isEmpty();
        return state.equals("running") && gone ? "killed" : state;
    }

    /** The name of this machine; empty where it has none. */
    static String host() {
        try {
            return InetAddress.getLocalHost().getHostName();
        } catch (UnknownHostException e) {
            return "";
        }
    }

    /** A value as JSON on one line. */
    static String json(Object value) {
        try {
            return JSON.std.asString(value instanceof Map<?, ?> m ? new LinkedHashMap<>(m) : value);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
