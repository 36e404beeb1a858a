package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

/** Links between the documents lead to files and headings that are there. */
class DocumentedLinksTest {

    private static final Pattern LINK = Pattern.compile("\\]\\(([^)#\\s]*)(?:#([^)\\s]+))?\\)");

    private static String anchor(String heading) {
        return heading.replaceFirst("^#+ ", "")
                .toLowerCase(Locale.ROOT)
                .replaceAll("[^\\p{L}\\p{N} _-]", "")
                .replace(' ', '-');
    }

    private static List<String> anchors(Path file) throws IOException {
        return Files.readAllLines(file).stream()
                .filter(line -> line.matches("#+ .*"))
                .map(DocumentedLinksTest::anchor)
                .collect(Collectors.toList());
    }

    @Test
    void everyLinkLeadsSomewhere() throws IOException {
        List<String> broken = new ArrayList<>();
        int links = 0;
        for (Path file : ProjectDocuments.files()) {
            MarkdownDocument document = MarkdownDocument.read(ProjectDocuments.root(), file);
            Matcher link = LINK.matcher(document.prose());
            while (link.find()) {
                String target = link.group(1);
                if (target.matches("[a-z]+:.*")) {
                    continue;
                }
                links++;
                Path there = target.isEmpty() ? file : file.resolveSibling(target).normalize();
                if (Files.isDirectory(there)) {
                    there = there.resolve("README.md");
                }
                if (!Files.exists(there)
                        || (link.group(2) != null && !anchors(there).contains(link.group(2)))) {
                    broken.add(document.name() + ": " + link.group());
                }
            }
        }
        assertEquals(List.of(), broken);
        assertTrue(links > 10, "links: " + links);
    }
}
