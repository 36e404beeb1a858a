package emberline.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.PublishedRows;
import emberline.catalogue.HowKnown;
import emberline.catalogue.Source;
import emberline.judge.PropertyRelations.Quantity;
import emberline.spectrum.MagnitudeBand;
import java.io.IOException;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

class RelationValuesTest {

    private final PropertyRelations relations = new PropertyRelations();

    private Optional<TypeRelation> relation(NamedCsvRecord row, double x) {
        Quantity quantity = Quantity.valueOf(row.getField("quantity"));
        Sequence sequence = Sequence.valueOf(row.getField("sequence"));
        String band = row.getField("band");
        return band.isBlank()
                ? relations.at(quantity, sequence, x)
                : relations.at(quantity, MagnitudeBand.valueOf(band), sequence, x);
    }

    @Test
    void relationsGiveTheValuesComputedElsewhere() throws IOException {
        List<NamedCsvRecord> rows = PublishedRows.of("judge-relations.csv");
        assertTrue(rows.size() > 500);
        int compared = 0;
        for (NamedCsvRecord row : rows) {
            double x = PublishedRows.number(row, "x");
            Optional<TypeRelation> relation = relation(row, x);
            if (relation.isPresent()) {
                double expected = PublishedRows.number(row, "expected");
                double tolerance = Math.abs(expected) > 100 ? 0.02 : 2e-4;
                assertEquals(expected, relation.get().at(x), tolerance, row.toString());
                compared++;
            }
        }
        assertTrue(compared > 490, compared + " of " + rows.size());
    }

    @Test
    void temperaturesFallWithTypeOnBothSequencesAndPiecesJoin() {
        for (Sequence sequence : List.of(Sequence.FIELD, Sequence.YOUNG)) {
            double last = Double.POSITIVE_INFINITY;
            for (int n = 0; n < TypeAxis.SIZE; n++) {
                double type = TypeAxis.type(n);
                double teff = relations.at(Quantity.TEFF, sequence, type).orElseThrow().at(type);
                assertTrue(teff < last, sequence + " at " + type + ": " + teff);
                assertTrue(last - teff < 60 || n == 0, sequence + " jumps at " + type);
                last = teff;
            }
        }
    }

    /** Every row of every table names a paper that is listed, and says how it is known. */
    @Test
    void everyNumberHasASource() {
        Set<String> listed = new TreeSet<>(Judge.sources().stream().map(Source::key).toList());
        Set<String> used = new TreeSet<>();
        for (String table :
                List.of(
                        "evolution.csv",
                        "relations.csv",
                        "settings.csv",
                        "gravity-by-age.csv",
                        "lithium.csv",
                        "activity.csv",
                        "velocities.csv",
                        "groups.csv",
                        "follow-up.csv")) {
            used.addAll(
                    JudgeTable.rows(
                            table,
                            row -> {
                                HowKnown.valueOf(row.getField("how_known"));
                                return row.getField("source");
                            }));
        }
        assertTrue(listed.containsAll(used), used + " of " + listed);
        listed.removeAll(used);
        assertEquals(Set.of(), listed, "sources that no table uses");
    }
}
