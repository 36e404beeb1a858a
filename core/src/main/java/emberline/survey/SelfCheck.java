package emberline.survey;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.catalogue.FeatureCatalogue;
import emberline.judge.Evidence;
import emberline.judge.Judge;
import emberline.judge.Judging;
import emberline.measure.Measurement.Measured;
import emberline.measure.Measurements;
import emberline.measure.Measurer;
import emberline.measure.Measuring;
import emberline.prepare.ExtinctionLaw;
import emberline.prepare.Preparer;
import emberline.prepare.Preparing;
import emberline.read.ProductTable;
import emberline.read.SpectrumReader;
import emberline.read.UnreadableSpectrumException;
import emberline.spectrum.AirToVacuum;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Finds values anew that are known from outside the product: indices of a built-in spectrum, read
 * and measured as any other, printed relations, wavelengths, extinction and a mass judgement. It
 * shows that an installation computes what the product was tested to compute; it says nothing about
 * spectra.
 */
public final class SelfCheck {

    private static final double LOW_MICRON = 0.6;
    private static final double STEP_MICRON = 1e-4;
    private static final int PIXELS = 19_001;
    private static final double ANGSTROM_PER_MICRON = 1e4;

    private final FeatureCatalogue catalogue;

    /**
     * A check.
     *
     * @param catalogue the definitions, those of the product or with others beside
     */
    public SelfCheck(FeatureCatalogue catalogue) {
        this.catalogue = catalogue;
    }

    /**
     * One value.
     *
     * @param what what was found anew
     * @param expected the value known from outside
     * @param tolerance how far it may be off
     * @param origin where the expected value comes from
     * @param found what was found; NaN where nothing was
     */
    public record Line(
            String what, double expected, double tolerance, String origin, double found) {

        /**
         * Whether the value was found.
         *
         * @return false also where nothing was found
         */
        public boolean passed() {
            return Math.abs(found - expected) <= tolerance;
        }
    }

    /**
     * A spectrum as it would lie in a file: flux proportional to the wavelength, 0.6 to 2.5 micron,
     * with an error of a thousandth.
     *
     * @return CSV
     */
    public static byte[] builtInSpectrum() {
        StringBuilder text = new StringBuilder("# medium: vacuum\nwavelength_micron,flux,sigma\n");
        for (int i = 0; i < PIXELS; i++) {
            double micron = LOW_MICRON + STEP_MICRON * i;
            text.append(
                    String.format(Locale.ROOT, "%.4f,%.4f,%.6f\n", micron, micron, micron / 1000));
        }
        return text.toString().getBytes(StandardCharsets.UTF_8);
    }

    /**
     * Finds every value.
     *
     * @return one line a value
     */
    public List<Line> run() {
        Measurements measured = measured();
        Judge judge = new Judge(Judging.withDefaults());
        ProductTable table = ProductTable.at("/emberline/survey/self-check.csv");
        List<Line> lines = new ArrayList<>();
        for (NamedCsvRecord row : table.rows()) {
            String quantity = row.getField("quantity");
            String id = row.getField("id");
            double input = Double.parseDouble(row.getField("input"));
            double found =
                    switch (quantity) {
                        case "FEATURE" ->
                                measured.measured(id).map(Measured::value).orElse(Double.NaN);
                        case "RELATION" -> relation(id, input);
                        case "VACUUM" ->
                                ANGSTROM_PER_MICRON
                                        * AirToVacuum.vacuumMicron(input / ANGSTROM_PER_MICRON);
                        case "EXTINCTION" ->
                                ExtinctionLaw.fitzpatrick1999(ExtinctionLaw.DIFFUSE_RV)
                                        .relativeTo(input);
                        case "SUBSTELLAR" ->
                                judge.judge(Evidence.ofType(input, 0.5, Optional.empty()))
                                        .limits()
                                        .pSubstellar();
                        default -> throw table.fault(row, "no such quantity: " + quantity);
                    };
            lines.add(
                    new Line(
                            words(quantity, id, row.getField("input")),
                            Double.parseDouble(row.getField("expected")),
                            Double.parseDouble(row.getField("tolerance")),
                            row.getField("origin"),
                            found));
        }
        return List.copyOf(lines);
    }

    private Measurements measured() {
        try {
            return new Measurer(catalogue, Measuring.withDefaults())
                    .measure(
                            new Preparer()
                                    .prepare(
                                            new SpectrumReader()
                                                    .read(builtInSpectrum(), "built-in spectrum"),
                                            Preparing.withDefaults()));
        } catch (UnreadableSpectrumException e) {
            throw new IllegalStateException("the built-in spectrum cannot be read", e);
        }
    }

    private double relation(String id, double index) {
        return catalogue.relations().stream()
                .filter(relation -> relation.id().equals(id))
                .findFirst()
                .map(relation -> relation.value(index))
                .orElse(Double.NaN);
    }

    private static String words(String quantity, String id, String input) {
        return switch (quantity) {
            case "FEATURE" -> id + " on a flux proportional to the wavelength";
            case "RELATION" -> "type number by " + id + " at " + input;
            case "VACUUM" -> id + " " + input + " in air, in vacuum (Angstrom)";
            case "EXTINCTION" -> "A/A_V at " + input + " micron, " + id;
            default -> "probability of " + id + " being substellar";
        };
    }
}
