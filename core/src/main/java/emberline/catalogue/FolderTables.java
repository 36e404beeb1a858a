package emberline.catalogue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * The tables of a user's folder; hidden files and notes ({@code .md}, {@code .txt}) do not count.
 */
final class FolderTables implements CatalogueTables {

    private final Path folder;
    private final List<String> files;

    private FolderTables(Path folder, List<String> files) {
        this.folder = folder;
        this.files = List.copyOf(files);
    }

    /** Lists a folder; a table in a place where none is looked for is a fault. */
    static FolderTables of(Path folder) throws InvalidCatalogueException {
        if (!Files.isDirectory(folder)) {
            throw new InvalidCatalogueException(
                    folder.toString(),
                    Files.exists(folder) ? "is a file" : "does not exist",
                    "a folder of catalogue tables",
                    "Give the folder that holds features/ and windows/.");
        }
        List<String> found = listed(folder);
        for (String file : found) {
            if (Stream.of(TableKind.values()).noneMatch(kind -> kind.holds(file))) {
                throw new InvalidCatalogueException(
                        folder.resolve(file).toString(),
                        "is no table of a catalogue",
                        "one of " + places(),
                        "Rename it, move it, or take it away.");
            }
        }
        if (found.isEmpty()) {
            throw new InvalidCatalogueException(
                    folder.toString(),
                    "holds no table",
                    "at least one of " + places(),
                    "Check that it is the right folder.");
        }
        return new FolderTables(folder, found);
    }

    private static List<String> listed(Path folder) throws InvalidCatalogueException {
        try (Stream<Path> walk = Files.walk(folder)) {
            return walk.filter(Files::isRegularFile)
                    .map(file -> folder.relativize(file).toString().replace('\\', '/'))
                    .filter(FolderTables::counts)
                    .sorted()
                    .toList();
        } catch (IOException e) {
            throw new InvalidCatalogueException(
                    folder.toString(),
                    "cannot be listed: " + e.getMessage(),
                    "a folder that may be read",
                    "Check the access rights.");
        }
    }

    private static boolean counts(String file) {
        return Stream.of(file.split("/")).noneMatch(name -> name.startsWith("."))
                && !file.endsWith(".md")
                && !file.endsWith(".txt");
    }

    private static String places() {
        return Stream.of(TableKind.values())
                .map(TableKind::place)
                .collect(Collectors.joining(", "));
    }

    @Override
    public List<String> files() {
        return files;
    }

    @Override
    public String text(String file) throws IOException {
        return Files.readString(folder.resolve(file));
    }

    @Override
    public String label(String file) {
        return folder.resolve(file).toString();
    }
}
