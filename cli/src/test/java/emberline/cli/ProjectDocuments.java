package emberline.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;

/** The documents of the project, in the order in which they are read. */
final class ProjectDocuments {

    /** The chapters; their console sessions are one long session in this order. */
    private static final List<String> CHAPTERS =
            List.of("README.md", "cli/README.md", "core/README.md", "reports/README.md");

    private ProjectDocuments() {}

    static Path root() {
        return Path.of(System.getProperty("emberline.root", "..")).toAbsolutePath().normalize();
    }

    static MarkdownDocument named(String name) throws IOException {
        return MarkdownDocument.read(root(), root().resolve(name));
    }

    /** The files of all documents: the chapters first, then the others by name. */
    static List<Path> files() throws IOException {
        List<Path> files = new ArrayList<>();
        for (String chapter : CHAPTERS) {
            files.add(root().resolve(chapter));
        }
        try (Stream<Path> all = Files.walk(root(), 9)) {
            all.filter(file -> file.toString().endsWith(".md"))
                    .filter(file -> !root().relativize(file).toString().matches("(.*/)?target/.*"))
                    .filter(file -> !root().relativize(file).toString().startsWith("."))
                    .filter(file -> !files.contains(file))
                    .sorted()
                    .forEach(files::add);
        }
        return List.copyOf(files);
    }

    static List<MarkdownDocument> all() throws IOException {
        List<MarkdownDocument> documents = new ArrayList<>();
        for (Path file : files()) {
            documents.add(MarkdownDocument.read(root(), file));
        }
        return List.copyOf(documents);
    }
}
