package emberline.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;

/**
 * A document: its lines, and the fenced blocks among them.
 *
 * @param name how messages call it
 * @param lines all its lines
 */
record MarkdownDocument(String name, List<String> lines) {

    private static final String FENCE = "```";

    MarkdownDocument {
        lines = List.copyOf(lines);
    }

    static MarkdownDocument read(Path root, Path file) throws IOException {
        return new MarkdownDocument(root.relativize(file).toString(), Files.readAllLines(file));
    }

    /** The fenced blocks in their order; a block without an end is refused. */
    List<FencedBlock> blocks() {
        List<FencedBlock> blocks = new ArrayList<>();
        int open = -1;
        for (int k = 0; k < lines.size(); k++) {
            if (!lines.get(k).startsWith(FENCE)) {
                continue;
            }
            if (open < 0) {
                open = k;
            } else {
                String word = lines.get(open).substring(FENCE.length()).strip().split(" ", -1)[0];
                blocks.add(new FencedBlock(word, open + 1, lines.subList(open + 1, k)));
                open = -1;
            }
        }
        if (open >= 0) {
            throw new IllegalArgumentException(
                    name + ", line " + (open + 1) + ": a fence that is not closed");
        }
        return List.copyOf(blocks);
    }

    /** What stands outside the fenced blocks, one text. */
    String prose() {
        StringBuilder prose = new StringBuilder();
        boolean fenced = false;
        for (String line : lines) {
            if (line.startsWith(FENCE)) {
                fenced = !fenced;
            } else if (!fenced) {
                prose.append(line).append('\n');
            }
        }
        return prose.toString();
    }

    /** The document with some of its lines replaced, from {@code start} to before {@code end}. */
    MarkdownDocument with(int start, int end, List<String> replacement) {
        List<String> changed = new ArrayList<>(lines.subList(0, start));
        changed.addAll(replacement);
        changed.addAll(lines.subList(end, lines.size()));
        return new MarkdownDocument(name, changed);
    }

    String text() {
        return String.join("\n", lines) + "\n";
    }
}
