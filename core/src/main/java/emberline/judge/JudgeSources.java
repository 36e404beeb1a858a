package emberline.judge;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.catalogue.Source;
import emberline.place.TypeEstimate;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Predicate;

/** The papers behind the tables of judging. */
final class JudgeSources {

    /** Key of the assumptions and derivations of the program itself. */
    private static final String OWN = "emberline2026";

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

    /** The papers that a judgement rests on, by key; assumptions of the program are none. */
    static List<Source> of(Judgement judgement, Optional<TypeEstimate> type) {
        Set<String> keys = new HashSet<>(Loaded.ALWAYS);
        type.ifPresent(
                t ->
                        Loaded.RELATIONS.stream()
                                .filter(r -> r.high() >= t.lo95() && r.low() <= t.hi95())
                                .forEach(r -> keys.add(r.source())));
        for (LedgerEntry entry : judgement.substellarLedger().entries()) {
            keys.addAll(Loaded.BY_PIECE.getOrDefault(entry.piece(), Set.of()));
        }
        return Loaded.SOURCES.stream()
                .filter(source -> keys.contains(source.key()))
                .sorted(Comparator.comparing(Source::key))
                .toList();
    }

    /** Where a relation by type holds, and its paper. */
    private record Range(double low, double high, String source) {}

    private static Set<String> keys(String table, Predicate<NamedCsvRecord> wanted) {
        Set<String> keys = new HashSet<>();
        JudgeTable.rows(table, row -> wanted.test(row) && keys.add(row.getField("source")));
        keys.remove(OWN);
        return keys;
    }

    private static Set<String> always() {
        Set<String> keys = keys("evolution.csv", row -> true);
        keys.addAll(
                keys(
                        "settings.csv",
                        row -> row.getField("id").matches("(hydrogen|deuterium|mass)-.*")));
        return keys;
    }

    private static List<Range> relations() {
        List<Range> ranges =
                JudgeTable.rows(
                        "relations.csv",
                        row ->
                                new Range(
                                        JudgeTable.number(row, "low"),
                                        row.getField("quantity").equals("LOG_L_FROM_MAG")
                                                ? Double.NEGATIVE_INFINITY
                                                : JudgeTable.number(row, "high"),
                                        row.getField("source")));
        return ranges.stream().filter(range -> !range.source().equals(OWN)).toList();
    }

    private static Map<Piece, Set<String>> byPiece() {
        Map<Piece, Set<String>> sources = new EnumMap<>(Piece.class);
        sources.put(Piece.GRAVITY, keys("gravity-by-age.csv", row -> true));
        Set<String> lithium = keys("lithium.csv", row -> true);
        lithium.addAll(keys("settings.csv", row -> row.getField("id").startsWith("lithium")));
        sources.put(Piece.LITHIUM, lithium);
        Set<String> halpha = keys("activity.csv", row -> true);
        halpha.addAll(keys("settings.csv", row -> row.getField("id").startsWith("halpha")));
        sources.put(Piece.HALPHA, halpha);
        sources.put(Piece.VELOCITY, keys("velocities.csv", row -> true));
        sources.put(
                Piece.LUMINOSITY,
                keys("relations.csv", row -> row.getField("quantity").equals("LOG_L_FROM_MAG")));
        return sources;
    }

    /** Reads the table at the first use. */
    private static final class Loaded {
        private static final List<Source> SOURCES = load();
        private static final Set<String> ALWAYS = always();
        private static final List<Range> RELATIONS = relations();
        private static final Map<Piece, Set<String>> BY_PIECE = byPiece();
    }
}
