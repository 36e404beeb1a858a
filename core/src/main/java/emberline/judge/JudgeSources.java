package emberline.judge;

import emberline.catalogue.Source;
import java.util.List;

/** The papers behind the tables of judging. */
final class JudgeSources {

    private JudgeSources() {}

    /** All papers of {@code sources.csv}, in its order. */
    static List<Source> all() {
        return Loaded.SOURCES;
    }

    private static List<Source> load() {
        return List.copyOf(
                JudgeTable.rows(
                        "sources.csv",
                        row ->
                                new Source(
                                        row.getField("key"),
                                        row.getField("authors"),
                                        Integer.parseInt(row.getField("year")),
                                        row.getField("journal"),
                                        row.getField("volume"),
                                        row.getField("page"),
                                        row.getField("title"),
                                        row.getField("doi"))));
    }

    /** Reads the table at the first use. */
    private static final class Loaded {
        private static final List<Source> SOURCES = load();
    }
}
