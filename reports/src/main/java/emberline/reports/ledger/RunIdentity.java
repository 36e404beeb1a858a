package emberline.reports.ledger;

import emberline.reports.attach.ResultColumn;
import emberline.reports.attach.ResultColumns;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Collectors;

/**
 * What a run is: two runs of the same identity give the same results.
 *
 * @param version version of the program
 * @param options the options that bear on the results, by name
 * @param recorded what the record of the run tells beside them, by name; it does not decide whether
 *     a record of an object still holds
 * @param seed start of all random draws
 * @param listName name of the candidate list, without its folder
 * @param listSha256 checksum of the candidate list, hexadecimal
 * @param listColumns names of its columns in their order
 * @param part which part of the list is run, such as {@code 3/10}; empty for all of it
 */
public record RunIdentity(
        String version,
        Map<String, String> options,
        Map<String, String> recorded,
        long seed,
        String listName,
        String listSha256,
        List<String> listColumns,
        String part) {

    /** Copies the collections. */
    public RunIdentity {
        options = Collections.unmodifiableMap(new TreeMap<>(options));
        recorded = Collections.unmodifiableMap(new TreeMap<>(recorded));
        listColumns = List.copyOf(listColumns);
    }

    /**
     * The options and what is told beside them.
     *
     * @return by name
     */
    public Map<String, String> optionsAndRecorded() {
        Map<String, String> all = new TreeMap<>(options);
        all.putAll(recorded);
        return Collections.unmodifiableMap(all);
    }

    /**
     * What must be the same that a record made before still holds: version, options, seed and the
     * columns of the list, each on a line. The list and the part do not count.
     *
     * @return by name of what it is
     */
    public Map<String, String> settings() {
        SortedMap<String, String> settings = new TreeMap<>();
        options.forEach((name, value) -> settings.put("option " + name, value));
        settings.put("program version", version);
        settings.put("seed", Long.toString(seed));
        settings.put("columns of the list", String.join(", ", listColumns));
        settings.put(
                "columns of the results",
                ResultColumns.standard().stream()
                        .map(ResultColumn::name)
                        .collect(Collectors.joining(", ")));
        return Collections.unmodifiableMap(settings);
    }

    /**
     * The columns of the results table of this run.
     *
     * @return columns in their order
     */
    public List<ResultColumn> columns() {
        return ResultColumns.forList(listColumns);
    }

    /**
     * The whole of which this is a part.
     *
     * @return the same without its part
     */
    public RunIdentity whole() {
        return new RunIdentity(
                version, options, recorded, seed, listName, listSha256, listColumns, "");
    }
}
