package emberline.prepare;

import de.siegmar.fastcsv.reader.NamedCsvRecord;
import emberline.read.ProductTable;
import java.util.ArrayList;
import java.util.List;
import org.apache.commons.math3.analysis.interpolation.SplineInterpolator;
import org.apache.commons.math3.analysis.polynomials.PolynomialFunction;
import org.apache.commons.math3.analysis.polynomials.PolynomialSplineFunction;

/**
 * An interstellar extinction law: A(lambda) / A_V for one ratio of total to selective extinction
 * R_V. Valid from {@value #SHORTEST_MICRON} micron on.
 */
public final class ExtinctionLaw {

    /** The shortest wavelength for which a law is given (micron). */
    public static final double SHORTEST_MICRON = 0.3031;

    /** R_V of the diffuse medium. */
    public static final double DIFFUSE_RV = 3.1;

    private static final String RESOURCE = "/emberline/prepare/extinction.csv";
    private static final double LONGEST_OPTICAL_MICRON = 1 / 1.1;
    private static final double[] ULTRAVIOLET_ANCHORS_MICRON = {0.27, 0.26};

    private final Curve curve;
    private final double rv;

    private ExtinctionLaw(Curve curve, double rv) {
        this.curve = curve;
        this.rv = rv;
    }

    /** A(lambda) / A_V against inverse wavelength. */
    private interface Curve {
        double at(double inverseMicron);
    }

    /** One row of the table of coefficients. */
    @SuppressWarnings("ArrayRecordComponent") // never leaves this class, never compared
    private record Term(String law, String name, double atMicron, double[] coefficients) {

        double value(double x) {
            return new PolynomialFunction(coefficients).value(x);
        }
    }

    /**
     * The law of Fitzpatrick (1999): a natural cubic spline in inverse wavelength through anchors
     * of A(lambda) / E(B-V).
     *
     * @param rv ratio of total to selective extinction, 2 to 6
     * @return the law
     * @throws IllegalArgumentException if R_V is outside its range
     */
    public static ExtinctionLaw fitzpatrick1999(double rv) {
        check(rv);
        List<Term> terms = terms();
        List<double[]> points = new ArrayList<>();
        points.add(new double[] {0, 0});
        for (Term term : terms) {
            if (term.law().equals("F99")) {
                points.add(new double[] {1 / term.atMicron(), term.value(rv)});
            }
        }
        double c2 = find(terms, "C2_IN_INVERSE_RV").value(1 / rv);
        double c1 = find(terms, "C1_IN_C2").value(c2);
        double[] bump = find(terms, "BUMP_C3_X0_GAMMA").coefficients();
        for (double micron : ULTRAVIOLET_ANCHORS_MICRON) {
            double x = 1 / micron;
            double offCentre = x * x - bump[1] * bump[1];
            double drude = x * x / (offCentre * offCentre + x * x * bump[2] * bump[2]);
            points.add(new double[] {x, rv + c1 + c2 * x + bump[0] * drude});
        }
        PolynomialSplineFunction spline =
                new SplineInterpolator()
                        .interpolate(
                                points.stream().mapToDouble(p -> p[0]).toArray(),
                                points.stream().mapToDouble(p -> p[1]).toArray());
        return new ExtinctionLaw(x -> spline.value(x) / rv, rv);
    }

    /**
     * The law of Cardelli, Clayton and Mathis (1989).
     *
     * @param rv ratio of total to selective extinction, 2 to 6
     * @return the law
     * @throws IllegalArgumentException if R_V is outside its range
     */
    public static ExtinctionLaw cardelli1989(double rv) {
        check(rv);
        List<Term> terms = terms();
        double infrared =
                find(terms, "INFRARED_A").value(0) + find(terms, "INFRARED_B").value(0) / rv;
        double exponent = find(terms, "INFRARED_EXPONENT").value(0);
        Term a = find(terms, "OPTICAL_A");
        Term b = find(terms, "OPTICAL_B");
        return new ExtinctionLaw(
                x ->
                        x <= 1 / LONGEST_OPTICAL_MICRON
                                ? infrared * Math.pow(x, exponent)
                                : a.value(x - a.atMicron()) + b.value(x - b.atMicron()) / rv,
                rv);
    }

    private static void check(double rv) {
        if (!(rv >= 2 && rv <= 6)) {
            throw new IllegalArgumentException(
                    "R_V = " + rv + ": expected 2 to 6. Use 3.1 where it is not known.");
        }
    }

    /**
     * The extinction at a wavelength in units of that in V.
     *
     * @param wavelengthMicron wavelength (micron), at least {@value #SHORTEST_MICRON}
     * @return A(lambda) / A_V, positive
     * @throws IllegalArgumentException below the shortest wavelength
     */
    public double relativeTo(double wavelengthMicron) {
        if (!(wavelengthMicron >= SHORTEST_MICRON)) {
            throw new IllegalArgumentException(
                    "wavelength "
                            + wavelengthMicron
                            + " micron: expected at least "
                            + SHORTEST_MICRON
                            + ", where the law is known. Leave shorter wavelengths out.");
        }
        return curve.at(1 / wavelengthMicron);
    }

    /**
     * The ratio of total to selective extinction of this law.
     *
     * @return R_V
     */
    public double rv() {
        return rv;
    }

    private static Term find(List<Term> terms, String name) {
        return terms.stream().filter(term -> term.name().equals(name)).findFirst().orElseThrow();
    }

    private static List<Term> terms() {
        List<Term> terms = new ArrayList<>();
        for (NamedCsvRecord row : ProductTable.at(RESOURCE).rows()) {
            double[] coefficients = new double[8];
            for (int k = 0; k < coefficients.length; k++) {
                String cell = row.getField("c" + k);
                coefficients[k] = cell.isBlank() ? 0 : Double.parseDouble(cell);
            }
            String at = row.getField("at_micron");
            terms.add(
                    new Term(
                            row.getField("law"),
                            row.getField("term"),
                            at.isBlank() ? Double.NaN : Double.parseDouble(at),
                            coefficients));
        }
        return terms;
    }
}
