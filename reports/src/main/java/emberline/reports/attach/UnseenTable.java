package emberline.reports.attach;

import de.siegmar.fastcsv.writer.CsvWriter;
import de.siegmar.fastcsv.writer.LineDelimiter;
import emberline.place.GravityClass;
import emberline.place.TypeEstimate;
import emberline.place.TypePosterior;
import emberline.place.calibrated.Calibrator.Unseen;
import emberline.place.reference.ReferenceRow;
import java.io.StringWriter;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** The objects of a calibration, each placed without having been learned from, as CSV. */
public final class UnseenTable {

    private UnseenTable() {}

    /**
     * The table.
     *
     * @param unseen the objects
     * @param remarks lines that go before the header, without mark
     * @return CSV text; cells are empty where an object was not placed
     */
    public static String text(List<Unseen> unseen, List<String> remarks) {
        StringWriter text = new StringWriter();
        remarks.forEach(remark -> text.write("# " + remark + "\n"));
        CsvWriter csv = CsvWriter.builder().lineDelimiter(LineDelimiter.LF).build(text);
        csv.writeRecord(
                "object",
                "tier",
                "source",
                "resolution",
                "known_type_number",
                "known_gravity",
                "type_number",
                "type_lo68",
                "type_hi68",
                "type_lo95",
                "type_hi95",
                "p_fldg",
                "p_intg",
                "p_vlg");
        for (Unseen one : unseen) {
            csv.writeRecord(cells(one));
        }
        return text.toString();
    }

    private static List<String> cells(Unseen one) {
        ReferenceRow row = one.row();
        List<String> cells =
                new ArrayList<>(
                        List.of(
                                row.object(),
                                row.tier(),
                                row.source(),
                                String.format(Locale.ROOT, "%.0f", row.resolvingPower()),
                                number(row.typeNumber().orElseThrow()),
                                row.gravity()));
        Optional<TypePosterior> posterior = one.placed().posterior();
        if (posterior.isEmpty()) {
            cells.addAll(List.of("", "", "", "", "", "", "", ""));
            return cells;
        }
        TypeEstimate type = posterior.get().estimate();
        cells.addAll(
                List.of(
                        number(type.typeNumber()),
                        number(type.lo68()),
                        number(type.hi68()),
                        number(type.lo95()),
                        number(type.hi95())));
        for (GravityClass gravity : GravityClass.values()) {
            cells.add(String.format(Locale.ROOT, "%.3f", posterior.get().probability(gravity)));
        }
        return cells;
    }

    private static String number(double value) {
        return String.format(Locale.ROOT, "%.2f", value);
    }
}
