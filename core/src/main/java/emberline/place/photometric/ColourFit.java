package emberline.place.photometric;

import emberline.place.GravityClass;
import emberline.place.LowerFactor;
import emberline.place.photometric.ColourVector.Term;
import java.util.List;

/**
 * The colours of one object against the templates of late dwarfs: chi-square with the noise of the
 * magnitudes and the scatter of objects of one type, at each grid point of the types.
 */
final class ColourFit {

    private final ColourVector colours;
    private final LowerFactor[] factor = new LowerFactor[ColourTemplates.SIZE];
    private final double[][][] residual =
            new double[GravityClass.values().length][ColourTemplates.SIZE][];

    ColourFit(ColourTemplates templates, ColourVector colours) {
        this.colours = colours;
        int size = colours.size();
        List<List<Term>> terms = new java.util.ArrayList<>();
        for (int c = 0; c < size; c++) {
            terms.add(colours.terms(c));
        }
        for (int point = 0; point < ColourTemplates.SIZE; point++) {
            factor[point] = LowerFactor.of(covariance(templates, terms, point));
            int g = 0;
            for (GravityClass gravity : GravityClass.values()) {
                double[] rest = new double[size];
                for (int c = 0; c < size; c++) {
                    rest[c] = colours.value(c);
                    for (Term term : terms.get(c)) {
                        rest[c] -= term.sign() * templates.median(term.colour(), gravity, point);
                    }
                }
                residual[g++][point] = rest;
            }
        }
    }

    private double[][] covariance(ColourTemplates templates, List<List<Term>> terms, int point) {
        int size = colours.size();
        double correlation = templates.correlation(point);
        double[][] matrix = new double[size][size];
        for (int c = 0; c < size; c++) {
            for (int d = 0; d < size; d++) {
                double sum = colours.noise(c, d);
                for (Term one : terms.get(c)) {
                    for (Term two : terms.get(d)) {
                        boolean same = one.colour() == two.colour();
                        sum +=
                                (same ? 1 : correlation)
                                        * one.sign()
                                        * two.sign()
                                        * templates.scatter(one.colour(), point)
                                        * templates.scatter(two.colour(), point);
                    }
                }
                matrix[c][d] = sum;
            }
        }
        return matrix;
    }

    /**
     * Chi-square of a template.
     *
     * @param point grid point of the type
     * @param gravity place of the gravity class among the classes
     * @param avMag extinction in V (mag)
     * @return chi-square with as many terms as there are colours
     */
    double chiSquare(int point, int gravity, double avMag) {
        double[] rest = residual[gravity][point].clone();
        for (int c = 0; c < rest.length; c++) {
            rest[c] -= avMag * colours.reddening(c);
        }
        return factor[point].chiSquare(rest);
    }

    /** Logarithm of the likelihood, up to a constant of the object. */
    double logLikelihood(int point, int gravity, double avMag) {
        return -0.5 * (chiSquare(point, gravity, avMag) + factor[point].logDeterminant());
    }
}
