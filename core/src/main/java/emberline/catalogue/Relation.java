package emberline.catalogue;

import java.util.List;
import java.util.OptionalDouble;

/**
 * A published polynomial from an index to a quantity.
 *
 * <p>Value = printedScaleOffset + printedScaleFactor (c0 + c1 u + c2 u² + ...), u = index -
 * argumentOffset. Coefficients are as printed; offset and factor bring the printed scale to the
 * common one (M0 = 0, L0 = 10, T0 = 20, Y0 = 30).
 *
 * @param id paper and symbol, unique without regard to case
 * @param feature id of the feature whose value is the argument
 * @param quantity what comes out, and its unit
 * @param argumentOffset subtracted from the index first
 * @param coefficients c0, c1, ... as printed; not empty
 * @param printedScaleOffset added after the factor
 * @param printedScaleFactor multiplies the polynomial
 * @param validTypeMin earliest type (subclass) for which it was made; empty: not known
 * @param validTypeMax latest type (subclass) for which it was made; empty: not known
 * @param validIndexMin least index for which it holds; empty: no limit known
 * @param validIndexMax greatest index for which it holds; empty: no limit known
 * @param validIndexBasis how the range of the index is known
 * @param rms scatter of the calibrators about it (unit of the quantity); empty: not known
 * @param population for whom it was made
 * @param needsInstrumentCorrection whether the paper corrects the index to its own instrument first
 * @param trial how it did on spectra of known type
 * @param source the paper
 * @param place table or section in the paper; blank where not known
 * @param howKnown how the numbers reached this catalogue
 * @param confidencePercent how sure it is that the numbers are exactly as printed, 0 to 100
 * @param note a remark; may be blank
 */
public record Relation(
        String id,
        String feature,
        Quantity quantity,
        double argumentOffset,
        List<Double> coefficients,
        double printedScaleOffset,
        double printedScaleFactor,
        OptionalDouble validTypeMin,
        OptionalDouble validTypeMax,
        OptionalDouble validIndexMin,
        OptionalDouble validIndexMax,
        ValidIndexBasis validIndexBasis,
        OptionalDouble rms,
        Population population,
        boolean needsInstrumentCorrection,
        Trial trial,
        Source source,
        String place,
        HowKnown howKnown,
        int confidencePercent,
        String note) {

    /** How the range of the index is known. */
    public enum ValidIndexBasis {
        /** Printed in the paper. */
        PRINTED,
        /** The index values at which the relation gives the limits of the printed type range. */
        DERIVED,
        /** No range is known. */
        NONE
    }

    /** For whom a relation was made. */
    public enum Population {
        /** Dwarfs of any age and near-solar metallicity. */
        ANY,
        /** Young objects only. */
        YOUNG,
        /** Subdwarfs only: not for solar metallicity. */
        SUBDWARF
    }

    /** What a trial on spectra of known type says about a relation. */
    public enum Verdict {
        /** It gives the known types within its claim. */
        CONFIRMED,
        /** It is biased, scatters or drifts; the note says how. */
        CAUTION,
        /** It fails. The product ships none. */
        REFUTED,
        /** Too few spectra in its range, or none of its population. */
        NOT_TESTED
    }

    /**
     * How a relation did on spectra of known type, in the unit of its quantity.
     *
     * @param verdict the outcome
     * @param fieldObjects number of field dwarfs in the trial
     * @param fieldBias mean of given minus known for field dwarfs; positive is too late
     * @param fieldScatter scatter of given minus known for field dwarfs
     * @param veryLowGravityObjects number of dwarfs of very low gravity in the trial
     * @param veryLowGravityBias mean of given minus known for these
     */
    public record Trial(
            Verdict verdict,
            int fieldObjects,
            OptionalDouble fieldBias,
            OptionalDouble fieldScatter,
            int veryLowGravityObjects,
            OptionalDouble veryLowGravityBias) {}

    /** Copies the coefficients and checks that there are some. */
    public Relation {
        coefficients = List.copyOf(coefficients);
        if (coefficients.isEmpty()) {
            throw new IllegalArgumentException("relation " + id + ": expected coefficients");
        }
    }

    /**
     * The outcome of the trial.
     *
     * @return the verdict
     */
    public Verdict verdict() {
        return trial.verdict();
    }

    /**
     * The quantity at an index, whether covered or not: ask {@link #covers} first.
     *
     * @param index value of the feature
     * @return the quantity on the common scale
     */
    public double value(double index) {
        double u = index - argumentOffset;
        double sum = 0;
        for (int k = coefficients.size() - 1; k >= 0; k--) {
            sum = sum * u + coefficients.get(k);
        }
        return printedScaleOffset + printedScaleFactor * sum;
    }

    /**
     * The derivative of the quantity by the index.
     *
     * @param index value of the feature
     * @return the quantity per unit of index
     */
    public double slope(double index) {
        double u = index - argumentOffset;
        double sum = 0;
        for (int k = coefficients.size() - 1; k >= 1; k--) {
            sum = sum * u + k * coefficients.get(k);
        }
        return printedScaleFactor * sum;
    }

    /**
     * Whether an index lies in the valid range, its ends included; a side without a limit is open.
     *
     * @param index value of the feature
     * @return true if the relation may be used there; false for NaN
     */
    public boolean covers(double index) {
        return index >= validIndexMin.orElse(Double.NEGATIVE_INFINITY)
                && index <= validIndexMax.orElse(Double.POSITIVE_INFINITY);
    }
}
