package emberline.read;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import uk.ac.starlink.ecsv.EcsvTableBuilder;
import uk.ac.starlink.ecsv.MessagePolicy;
import uk.ac.starlink.table.StarTable;
import uk.ac.starlink.table.StoragePolicy;
import uk.ac.starlink.table.TableSequence;
import uk.ac.starlink.util.ByteArrayDataSource;
import uk.ac.starlink.votable.VOTableBuilder;

/**
 * Opens VOTable and ECSV content through the table library. The library only ever gets bytes, never
 * a name, and VOTables only after {@link VotableGuard} has let them pass.
 */
final class StarTables {

    private static final int MOST_TABLES = 100;

    private StarTables() {}

    /** All tables of a VOTable, or the one of an ECSV file. */
    static List<StarTable> open(FileContent content, ContentKind kind)
            throws UnreadableSpectrumException {
        if (kind == ContentKind.VOTABLE) {
            VotableGuard.check(content);
        }
        try {
            ByteArrayDataSource source = new ByteArrayDataSource("content", content.bytes());
            return kind == ContentKind.VOTABLE ? votables(source) : List.of(ecsv(source));
        } catch (IOException | RuntimeException e) {
            throw new UnreadableSpectrumException(
                    content.name(),
                    kind.words() + " that cannot be read (" + FitsReader.reason(e) + ")",
                    "a table after the standard",
                    "Write the table again with a table library.");
        }
    }

    private static StarTable ecsv(ByteArrayDataSource source) throws IOException {
        EcsvTableBuilder builder = new EcsvTableBuilder();
        builder.setColcheck(MessagePolicy.FAIL);
        return builder.makeStarTable(source, false, StoragePolicy.PREFER_MEMORY);
    }

    private static List<StarTable> votables(ByteArrayDataSource source) throws IOException {
        List<StarTable> tables = new ArrayList<>();
        TableSequence sequence =
                new VOTableBuilder().makeStarTables(source, StoragePolicy.PREFER_MEMORY);
        for (StarTable table = sequence.nextTable();
                table != null && tables.size() < MOST_TABLES;
                table = sequence.nextTable()) {
            tables.add(table);
        }
        return tables;
    }
}
