package emberline.place;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.catalogue.FeatureCatalogue;
import emberline.catalogue.Quantity;
import emberline.catalogue.Relation;
import emberline.read.ProductTable;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** Which published relations enter the combined type, and over which part of their range. */
final class ConsensusTable {

    private static final String RESOURCE = "/emberline/place/consensus.csv";

    private final Map<String, Member> members;

    private ConsensusTable(Map<String, Member> members) {
        this.members = members;
    }

    /**
     * A relation that enters.
     *
     * @param fromType earliest type for which it is used (subclass)
     * @param toType latest type for which it is used (subclass)
     * @param branchBy relations that decide on which branch of a double-valued index the object is
     * @param branchFrom the relation is set aside where one of these gives this type or later
     */
    record Member(double fromType, double toType, List<String> branchBy, double branchFrom) {}

    /** Reads the product's table and checks it against a catalogue. */
    static ConsensusTable of(FeatureCatalogue catalogue) {
        List<String> known =
                catalogue.relations(Quantity.SPECTRAL_TYPE).stream().map(Relation::id).toList();
        ProductTable table = ProductTable.at(RESOURCE);
        Map<String, Member> members = new LinkedHashMap<>();
        for (NamedCsvRecord row : table.rows()) {
            String relation = row.getField("relation");
            if (!known.contains(relation)) {
                throw table.fault(row, "the catalogue has no type relation " + relation);
            }
            members.put(relation, member(row));
        }
        return new ConsensusTable(members);
    }

    private static Member member(NamedCsvRecord row) {
        String by = row.getField("branch_by");
        return new Member(
                Double.parseDouble(row.getField("from_type")),
                Double.parseDouble(row.getField("to_type")),
                by.isBlank() ? List.of() : List.of(by.split(" ")),
                by.isBlank()
                        ? Double.POSITIVE_INFINITY
                        : Double.parseDouble(row.getField("branch_from")));
    }

    /** The terms on which a relation enters; empty where it is only shown. */
    Optional<Member> member(Relation relation) {
        return Optional.ofNullable(members.get(relation.id()));
    }
}
