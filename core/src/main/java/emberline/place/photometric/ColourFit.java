package emberline.place.photometric;

import emberline.place.GravityClass;
import emberline.place.photometric.ColourVector.Term;
import java.util.List;

/**
 * The colours of one object against the templates of late dwarfs: chi-square with the noise of the
 * magnitudes and the scatter of objects of one type, at each grid point of the types.
 */
final class ColourFit {

    private final ColourVector colours;
    private final double[][] lower = new double[ColourTemplates.SIZE][];
    private final double[] logDeterminant = new double[ColourTemplates.SIZE];
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
            double[] matrix = covariance(templates, terms, point);
            lower[point] = cholesky(matrix, size);
            for (int c = 0; c < size; c++) {
                logDeterminant[point] += 2 * Math.log(lower[point][c * size + c]);
            }
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

    private double[] covariance(ColourTemplates templates, List<List<Term>> terms, int point) {
        int size = colours.size();
        double correlation = templates.correlation(point);
        double[] matrix = new double[size * size];
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
                matrix[c * size + d] = sum;
            }
        }
        return matrix;
    }

    /** The lower factor of a positive definite matrix, in place. */
    static double[] cholesky(double[] a, int size) {
        for (int row = 0; row < size; row++) {
            for (int col = 0; col <= row; col++) {
                double sum = a[row * size + col];
                for (int k = 0; k < col; k++) {
                    sum -= a[row * size + k] * a[col * size + k];
                }
                a[row * size + col] = row == col ? Math.sqrt(sum) : sum / a[col * size + col];
            }
        }
        return a;
    }

    /** The squared length of a vector once the triangle is solved for it; the vector is used up. */
    static double solved(double[] lower, double[] vector) {
        int size = vector.length;
        double square = 0;
        for (int row = 0; row < size; row++) {
            double sum = vector[row];
            for (int k = 0; k < row; k++) {
                sum -= lower[row * size + k] * vector[k];
            }
            vector[row] = sum / lower[row * size + row];
            square += vector[row] * vector[row];
        }
        return square;
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
        return solved(lower[point], rest);
    }

    /** Logarithm of the likelihood, up to a constant of the object. */
    double logLikelihood(int point, int gravity, double avMag) {
        return -0.5 * (chiSquare(point, gravity, avMag) + logDeterminant[point]);
    }
}
