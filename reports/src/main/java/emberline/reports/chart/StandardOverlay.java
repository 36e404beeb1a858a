package emberline.reports.chart;

import emberline.place.standard.Standard;
import emberline.place.standard.StandardMatch;
import emberline.place.standard.StandardVerdict;
import emberline.spectrum.SpectralType;
import emberline.spectrum.Spectrum;
import java.util.ArrayList;
import java.util.List;

/**
 * The standard that fits best, scaled to the spectrum with which it was compared.
 *
 * @param curve the standard where both have data
 * @param remark what the curve is, in a sentence
 */
record StandardOverlay(Curve curve, String remark) {

    /**
     * The overlay of an object.
     *
     * @param verdict a comparison with at least one match
     * @param spectra the spectra of the object
     * @param factors by what the fluxes of each are multiplied in the chart
     */
    static StandardOverlay of(StandardVerdict verdict, List<Spectrum> spectra, double[] factors) {
        StandardMatch best = verdict.best().get(0);
        Spectrum object = spectra.get(verdict.spectrum());
        Spectrum shown = within(best.first(), object);
        int own = Math.max(1, within(object, shown).size());
        int atOnce = Math.max(1, Math.round(shown.size() / (float) own));
        Reduction reduction = Reduction.ofMeans(shown, atOnce);
        return new StandardOverlay(
                reduction.curve(factors[verdict.spectrum()] * best.scale(), Tone.STANDARD, false),
                "Dashed, orange: the best standard, "
                        + best.first().name()
                        + " ("
                        + new SpectralType(best.first().typeNumber()).code()
                        + "), under one scale.");
    }

    private static Spectrum within(Standard standard, Spectrum object) {
        return within(standard.prepared().spectrum(), object);
    }

    /** The pixels of a spectrum in the range of another one, which it overlaps. */
    private static Spectrum within(Spectrum spectrum, Spectrum other) {
        double from = other.wavelengthMicron(0);
        double to = other.wavelengthMicron(other.size() - 1);
        List<double[]> kept = new ArrayList<>();
        for (int i = 0; i < spectrum.size(); i++) {
            double micron = spectrum.wavelengthMicron(i);
            if (micron >= from && micron <= to) {
                kept.add(new double[] {micron, spectrum.flux(i), spectrum.fluxSigma(i)});
            }
        }
        return Spectrum.of(column(kept, 0), column(kept, 1), column(kept, 2));
    }

    private static double[] column(List<double[]> rows, int column) {
        return rows.stream().mapToDouble(row -> row[column]).toArray();
    }
}
