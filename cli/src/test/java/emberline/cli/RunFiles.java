package emberline.cli;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/** The results of a run: every file that two runs of the same input must have alike. */
final class RunFiles {

    private RunFiles() {}

    /** The content of all files of a folder by name, but those that belong to the process. */
    static Map<String, String> of(Path folder) throws IOException {
        Map<String, String> files = new TreeMap<>();
        try (Stream<Path> all = Files.walk(folder)) {
            for (Path file : all.filter(Files::isRegularFile).toList()) {
                String name = folder.relativize(file).toString();
                if (!name.startsWith("ledger.sqlite") && !name.equals(".run-lock")) {
                    files.put(name, Files.readString(file, StandardCharsets.ISO_8859_1));
                }
            }
        }
        return files;
    }

    /** Names of the files that differ between two runs, or are in one of them only. */
    static List<String> differences(Path one, Path other) throws IOException {
        Map<String, String> first = of(one);
        Map<String, String> second = of(other);
        return Stream.concat(first.keySet().stream(), second.keySet().stream())
                .distinct()
                .filter(name -> !first.getOrDefault(name, "").equals(second.get(name)))
                .toList();
    }

    /** A list of the demo survey, each object so many times under names of its own. */
    static Path repeatedDemo(Path list, int times) throws IOException {
        Path demo = DemoRun.survey();
        List<String> lines = Files.readAllLines(demo);
        StringBuilder text = new StringBuilder(lines.get(0) + "\n");
        for (int k = 0; k < times; k++) {
            for (String line : lines.subList(1, lines.size())) {
                String[] cells = line.split(",", 3);
                text.append(cells[0] + "-" + k + ",")
                        .append(absolute(cells[1]) + ",")
                        .append(cells[2] + "\n");
            }
        }
        return Files.writeString(list, text);
    }

    /** The cell of the spectra of a demo object, with paths that hold from everywhere. */
    private static String absolute(String spectra) {
        return Arrays.stream(spectra.split(";"))
                .filter(path -> !path.isEmpty())
                .map(path -> DemoRun.survey().toAbsolutePath().resolveSibling(path).toString())
                .collect(Collectors.joining(";"));
    }
}
