package emberline.cli;

import java.util.ArrayList;
import java.util.List;

/**
 * What a document says that a command prints. A line of three dots stands for any lines; run times
 * may differ.
 *
 * @param lines as they stand in the document
 */
record PrintedLines(List<String> lines) {

    /** Stands for lines that are left out. */
    static final String LEFT_OUT = "...";

    PrintedLines {
        lines = List.copyOf(lines);
    }

    private static String withoutTimes(String line) {
        return line.stripTrailing().replaceAll("\\bin \\d+\\.\\d s$", "in T s");
    }

    private static boolean same(String said, String printed) {
        return withoutTimes(said).equals(withoutTimes(printed));
    }

    /** Whether the lines that were printed are those that the document tells. */
    boolean agreesWith(List<String> printed) {
        return agrees(lines, printed);
    }

    private static boolean agrees(List<String> said, List<String> printed) {
        if (said.isEmpty()) {
            return printed.isEmpty();
        }
        if (said.get(0).equals(LEFT_OUT)) {
            for (int k = 0; k <= printed.size(); k++) {
                if (agrees(said.subList(1, said.size()), printed.subList(k, printed.size()))) {
                    return true;
                }
            }
            return false;
        }
        return !printed.isEmpty()
                && same(said.get(0), printed.get(0))
                && agrees(said.subList(1, said.size()), printed.subList(1, printed.size()));
    }

    /**
     * The lines of the document brought up to date: before the first dots as many lines from the
     * beginning as now, after the last dots as many from the end; a part between dots is found by
     * the first word of its first line.
     *
     * @throws IllegalArgumentException if a part between dots is not found any more
     */
    List<String> broughtUpToDate(List<String> printed) {
        if (agreesWith(printed)) {
            return lines;
        }
        List<List<String>> parts = parts();
        if (parts.size() == 1) {
            return printed;
        }
        List<String> fresh = new ArrayList<>();
        for (int k = 0; k < parts.size(); k++) {
            int size = parts.get(k).size();
            int from =
                    k == 0
                            ? 0
                            : k == parts.size() - 1
                                    ? printed.size() - size
                                    : found(parts.get(k), printed);
            if (k > 0) {
                fresh.add(LEFT_OUT);
            }
            fresh.addAll(printed.subList(Math.max(0, from), Math.min(printed.size(), from + size)));
        }
        return fresh;
    }

    private static int found(List<String> part, List<String> printed) {
        String first = part.get(0).strip().split("\\s", -1)[0];
        for (int k = 0; k < printed.size(); k++) {
            if (printed.get(k).strip().split("\\s", -1)[0].equals(first)) {
                return k;
            }
        }
        throw new IllegalArgumentException(
                "no printed line begins with '" + first + "' any more; edit the document by hand");
    }

    private List<List<String>> parts() {
        List<List<String>> parts = new ArrayList<>();
        parts.add(new ArrayList<>());
        for (String line : lines) {
            if (line.equals(LEFT_OUT)) {
                parts.add(new ArrayList<>());
            } else {
                parts.get(parts.size() - 1).add(line);
            }
        }
        return parts;
    }
}
