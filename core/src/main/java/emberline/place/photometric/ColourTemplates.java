package emberline.place.photometric;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.place.GravityClass;
import emberline.place.kind.ObjectKind;
import emberline.place.photometric.ColourCurve.Point;
import emberline.read.ProductTable;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;

/**
 * Colours of late dwarfs on a grid of types and of other kinds of objects, from {@code
 * templates.csv} and {@code other-kinds.csv}.
 */
final class ColourTemplates {

    /** First type of the grid (M5); there are no templates of earlier dwarfs. */
    static final double FIRST_TYPE = 5;

    /** Distance of the grid (subclass). */
    static final double STEP = 0.1;

    /** Number of grid points: M5 to Y1. */
    static final int SIZE = 261;

    private static final String FOLDER = "/emberline/place/photometric/";
    private static final double FIRST_L = 10;
    private static final double FIRST_T = 20;

    private final Map<TemplateColour, Map<GravityClass, double[]>> median =
            new EnumMap<>(TemplateColour.class);
    private final Map<TemplateColour, double[]> scatter = new EnumMap<>(TemplateColour.class);
    private final double[] correlation = new double[SIZE];
    private final List<Other> others = new ArrayList<>();

    /**
     * An object of another kind.
     *
     * @param kind what it is
     * @param jMinusH J - H (mag, 2MASS)
     * @param hMinusK H - Ks (mag, 2MASS)
     */
    record Other(ObjectKind kind, double jMinusH, double hMinusK) {}

    /** Reads the templates anew. */
    ColourTemplates() {
        ColourSettings settings = ColourSettings.standard();
        Map<TemplateColour, Map<GravityClass, List<Point>>> points = read();
        for (TemplateColour colour : TemplateColour.values()) {
            add(colour, points.get(colour), settings);
        }
        for (int i = 0; i < SIZE; i++) {
            correlation[i] = correlation(typeNumber(i), settings);
        }
        ProductTable table = ProductTable.at(FOLDER + "other-kinds.csv");
        for (NamedCsvRecord row : table.rows()) {
            others.add(
                    new Other(
                            ObjectKind.labelled(row.getField("kind"))
                                    .orElseThrow(() -> table.fault(row, "expected a kind")),
                            Double.parseDouble(row.getField("j_h_2mass")),
                            Double.parseDouble(row.getField("h_k_2mass"))));
        }
    }

    /** The templates of the product. */
    static ColourTemplates standard() {
        return Loaded.STANDARD;
    }

    /** Read once, when first asked for. */
    private static final class Loaded {
        private static final ColourTemplates STANDARD = new ColourTemplates();
    }

    private static Map<TemplateColour, Map<GravityClass, List<Point>>> read() {
        Map<TemplateColour, Map<GravityClass, List<Point>>> points =
                new EnumMap<>(TemplateColour.class);
        ProductTable table = ProductTable.at(FOLDER + "templates.csv");
        for (NamedCsvRecord row : table.rows()) {
            GravityClass gravity =
                    GravityClass.ofLabel(row.getField("gravity"))
                            .orElseThrow(
                                    () ->
                                            table.fault(
                                                    row,
                                                    "gravity: expected one of "
                                                            + GravityClass.labels()));
            points.computeIfAbsent(
                            TemplateColour.valueOf(row.getField("colour")),
                            colour -> new EnumMap<>(GravityClass.class))
                    .computeIfAbsent(gravity, one -> new ArrayList<>())
                    .add(
                            new Point(
                                    Double.parseDouble(row.getField("type_number")),
                                    Double.parseDouble(row.getField("median")),
                                    orNaN(row.getField("scatter")),
                                    orNaN(row.getField("objects"))));
        }
        return points;
    }

    private static double orNaN(String cell) {
        return cell.isEmpty() ? Double.NaN : Double.parseDouble(cell);
    }

    /** The curves of a colour; a gravity class without medians at a type has the field's there. */
    private void add(
            TemplateColour colour, Map<GravityClass, List<Point>> points, ColourSettings settings) {
        double narrow = settings.of("smoothing-types");
        double wide = settings.of("smoothing-shift");
        List<Point> field = points.get(GravityClass.FLD_G);
        double[] ofField = new double[SIZE];
        double[] sigma = new double[SIZE];
        for (int i = 0; i < SIZE; i++) {
            ofField[i] = ColourCurve.line(field, typeNumber(i), narrow);
            sigma[i] =
                    ColourCurve.scatter(
                            field,
                            typeNumber(i),
                            settings.of("smoothing-scatter"),
                            settings.of("scatter-floor"),
                            settings.of("scatter-beyond"));
        }
        Map<GravityClass, double[]> curves = new EnumMap<>(GravityClass.class);
        for (GravityClass gravity : GravityClass.values()) {
            double[] curve = ofField.clone();
            if (gravity != GravityClass.FLD_G && points.containsKey(gravity)) {
                List<Point> shift =
                        points.get(gravity).stream()
                                .map(
                                        point ->
                                                point.less(
                                                        ColourCurve.line(
                                                                field, point.typeNumber(), narrow)))
                                .toList();
                double first = shift.get(0).typeNumber() - STEP / 2;
                double last = shift.get(shift.size() - 1).typeNumber() + STEP / 2;
                for (int i = 0; i < SIZE; i++) {
                    if (typeNumber(i) > first && typeNumber(i) < last) {
                        curve[i] += ColourCurve.mean(shift, typeNumber(i), wide);
                    }
                }
            }
            curves.put(gravity, curve);
        }
        median.put(colour, curves);
        scatter.put(colour, sigma);
    }

    private static double correlation(double type, ColourSettings settings) {
        double early = settings.of("correlation-early");
        double ofL = settings.of("correlation-l");
        double ofT = settings.of("correlation-t");
        if (type < FIRST_L) {
            double part = Math.max(0, Math.min(1, type - FIRST_L + 1));
            return early + part * (ofL - early);
        }
        double part = Math.max(0, Math.min(1, type - FIRST_T + 1));
        return ofL + part * (ofT - ofL);
    }

    /** Type of a grid point (M0 = 0). */
    static double typeNumber(int point) {
        return FIRST_TYPE + point * STEP;
    }

    /** The grid point nearest to a type, at the ends for types beyond. */
    static int point(double typeNumber) {
        long nearest = Math.round((typeNumber - FIRST_TYPE) / STEP);
        return (int) Math.max(0, Math.min(SIZE - 1, nearest));
    }

    /** Median of a colour (mag). */
    double median(TemplateColour colour, GravityClass gravity, int point) {
        return median.get(colour).get(gravity)[point];
    }

    /** Scatter of a colour (mag). */
    double scatter(TemplateColour colour, int point) {
        return scatter.get(colour)[point];
    }

    /** Correlation of the scatter of two colours. */
    double correlation(int point) {
        return correlation[point];
    }

    /** Objects of other kinds. */
    List<Other> others() {
        return others;
    }
}
