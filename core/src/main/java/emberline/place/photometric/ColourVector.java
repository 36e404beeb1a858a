package emberline.place.photometric;

import emberline.spectrum.Magnitude;
import emberline.spectrum.MagnitudeBand;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * The colours of an object, mostly each of two bands that follow one another in wavelength, with
 * the covariance of their noise. Where a band is missing its neighbours make one colour.
 */
final class ColourVector {

    /** The bands from blue to red. */
    private static final List<MagnitudeBand> MKO =
            List.of(
                    MagnitudeBand.Y_MKO,
                    MagnitudeBand.J_MKO,
                    MagnitudeBand.H_MKO,
                    MagnitudeBand.K_MKO,
                    MagnitudeBand.W1,
                    MagnitudeBand.W2);

    private static final List<MagnitudeBand> TWO_MASS =
            List.of(
                    MagnitudeBand.Y_MKO,
                    MagnitudeBand.J_2MASS,
                    MagnitudeBand.H_2MASS,
                    MagnitudeBand.K_2MASS,
                    MagnitudeBand.W1,
                    MagnitudeBand.W2);

    private static final List<String> EXTINCTION =
            List.of("a-y", "a-j", "a-h", "a-k", "a-w1", "a-w2");

    private static final Term W1_W2 = new Term(TemplateColour.W1_W2, 1);

    private static final List<List<Term>> MKO_STEPS =
            List.of(
                    List.of(new Term(TemplateColour.Y_J_MKO, 1)),
                    List.of(new Term(TemplateColour.J_H_MKO, 1)),
                    List.of(new Term(TemplateColour.H_K_MKO, 1)),
                    List.of(new Term(TemplateColour.K_MKO_W1, 1)),
                    List.of(W1_W2));

    private static final List<List<Term>> TWO_MASS_STEPS =
            List.of(
                    List.of(
                            new Term(TemplateColour.Y_J_MKO, 1),
                            new Term(TemplateColour.J_2MASS_J_MKO, -1)),
                    List.of(new Term(TemplateColour.J_H_2MASS, 1)),
                    List.of(new Term(TemplateColour.H_K_2MASS, 1)),
                    List.of(new Term(TemplateColour.K_2MASS_W1, 1)),
                    List.of(W1_W2));

    private final List<MagnitudeBand> chain;
    private final boolean isTwoMass;
    private final List<Pair> pairs;
    private final double[] values;
    private final double[][] noise;
    private final double[] reddening;

    /** One colour of the templates with its sign. */
    record Term(TemplateColour colour, int sign) {}

    /** A colour by the places of its two bands among all from blue to red. */
    private record Pair(int blue, int red) {

        /** How a band enters: 1, -1 or not at all. */
        int sign(int place) {
            return place == blue ? 1 : place == red ? -1 : 0;
        }
    }

    private ColourVector(
            boolean isTwoMass, List<Pair> pairs, Map<MagnitudeBand, Magnitude> magnitudes) {
        this.chain = isTwoMass ? TWO_MASS : MKO;
        this.isTwoMass = isTwoMass;
        this.pairs = List.copyOf(pairs);
        int size = pairs.size();
        this.values = new double[size];
        this.noise = new double[size][size];
        this.reddening = new double[size];
        ColourSettings settings = ColourSettings.standard();
        for (int place = 0; place < chain.size(); place++) {
            Magnitude magnitude = magnitudes.get(chain.get(place));
            for (int c = 0; c < size; c++) {
                int sign = pairs.get(c).sign(place);
                if (sign == 0) {
                    continue;
                }
                values[c] += sign * magnitude.mag();
                reddening[c] += sign * settings.of(EXTINCTION.get(place));
                for (int d = 0; d < size; d++) {
                    noise[c][d] +=
                            sign * pairs.get(d).sign(place) * Math.pow(magnitude.sigmaMag(), 2);
                }
            }
        }
    }

    /**
     * The colours of an object.
     *
     * @param magnitudes by band; J, H and K of one system
     * @return one colour less than there are bands; none for fewer than two bands
     */
    static ColourVector of(Map<MagnitudeBand, Magnitude> magnitudes) {
        boolean mko = MKO.subList(1, 4).stream().anyMatch(magnitudes::containsKey);
        boolean twoMass = TWO_MASS.subList(1, 4).stream().anyMatch(magnitudes::containsKey);
        if (mko && twoMass) {
            throw new IllegalArgumentException(
                    "magnitudes in 2MASS and in MKO: expected J, H and K of one system");
        }
        List<MagnitudeBand> chain = twoMass ? TWO_MASS : MKO;
        List<Pair> pairs = new ArrayList<>();
        int before = -1;
        for (int place = 0; place < chain.size(); place++) {
            if (magnitudes.containsKey(chain.get(place))) {
                if (before >= 0) {
                    pairs.add(new Pair(before, place));
                }
                before = place;
            }
        }
        return new ColourVector(twoMass, pairs, magnitudes);
    }

    /**
     * The colours by which kinds are told: J - H and H - Ks of 2MASS and, where it is there, W1 -
     * W2.
     *
     * @param magnitudes by band
     * @return two or three colours; none where J, H or Ks of 2MASS is missing
     */
    static ColourVector ofKinds(Map<MagnitudeBand, Magnitude> magnitudes) {
        List<Pair> pairs = new ArrayList<>();
        if (magnitudes.keySet().containsAll(TWO_MASS.subList(1, 4))) {
            pairs.add(new Pair(1, 2));
            pairs.add(new Pair(2, 3));
            if (magnitudes.keySet().containsAll(TWO_MASS.subList(4, 6))) {
                pairs.add(new Pair(4, 5));
            }
        }
        return new ColourVector(true, pairs, magnitudes);
    }

    int size() {
        return values.length;
    }

    double value(int colour) {
        return values[colour];
    }

    /** Covariance of the noise of two colours (mag squared). */
    double noise(int one, int two) {
        return noise[one][two];
    }

    /** What one magnitude of extinction in V adds to a colour (mag). */
    double reddening(int colour) {
        return reddening[colour];
    }

    /** The colours of the templates that add up to a colour. */
    List<Term> terms(int colour) {
        List<Term> terms = new ArrayList<>();
        List<List<Term>> steps = isTwoMass ? TWO_MASS_STEPS : MKO_STEPS;
        for (int step = pairs.get(colour).blue; step < pairs.get(colour).red; step++) {
            terms.addAll(steps.get(step));
        }
        return terms;
    }

    /** The colours in words, e.g. {@code J-H}. */
    List<String> labels() {
        List<String> labels = new ArrayList<>();
        for (int c = 0; c < size(); c++) {
            labels.add(
                    letter(chain.get(pairs.get(c).blue))
                            + "-"
                            + letter(chain.get(pairs.get(c).red)));
        }
        return labels;
    }

    private static String letter(MagnitudeBand band) {
        return band.label().replaceFirst(" .*", "");
    }
}
