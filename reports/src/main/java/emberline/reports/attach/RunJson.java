package emberline.reports.attach;

import emberline.survey.ObjectResult;
import emberline.survey.SpectrumResult;
import emberline.survey.Status;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * The record of a run: program version, options, seed, checksums of the list and of all spectra,
 * and how many objects had which status. It holds no times and no number of threads, so that the
 * same input gives the same bytes. Fed object by object in the order of the list; not for use by
 * several threads at once.
 */
public final class RunJson {

    private final String version;
    private final Map<String, String> options;
    private final long seed;
    private final String listSha256;
    private final Map<Status, Integer> counts = new EnumMap<>(Status.class);
    private final List<Map<String, Object>> inputs = new ArrayList<>();

    /**
     * The record of a run of which no object is done.
     *
     * @param version version of the program
     * @param options the options that bear on the results, as given
     * @param seed start of all random draws
     * @param listSha256 checksum of the candidate list, hexadecimal; empty where there is no list
     */
    public RunJson(String version, Map<String, String> options, long seed, String listSha256) {
        this.version = version;
        this.options = new TreeMap<>(options);
        this.seed = seed;
        this.listSha256 = listSha256;
    }

    /**
     * Adds an object.
     *
     * @param result its result
     */
    public void add(ObjectResult result) {
        counts.merge(result.status(), 1, Integer::sum);
        for (SpectrumResult spectrum : result.spectra()) {
            Map<String, Object> input = new LinkedHashMap<>();
            input.put("name", result.candidate().name());
            input.put("path", spectrum.path());
            input.put("sha256", spectrum.sha256());
            inputs.add(input);
        }
    }

    /**
     * The record as JSON.
     *
     * @return one JSON object over several lines, with a line end
     */
    public String text() {
        Map<String, Object> byStatus = new LinkedHashMap<>();
        int total = 0;
        for (Status status : Status.values()) {
            int count = counts.getOrDefault(status, 0);
            byStatus.put(status.word(), count);
            total += count;
        }
        Map<String, Object> map = new LinkedHashMap<>();
        map.put("program", "emberline");
        map.put("version", version);
        map.put("options", options);
        map.put("seed", seed);
        map.put("list_sha256", listSha256);
        map.put("objects", total);
        map.put("objects_by_status", byStatus);
        map.put("inputs", inputs);
        return JsonText.of(map);
    }
}
