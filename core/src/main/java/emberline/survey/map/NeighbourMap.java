package emberline.survey.map;

import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ForkJoinPool;
import smile.manifold.TSNE;
import smile.math.MathEx;

/**
 * Objects in a plane so that near neighbours stay near (t-distributed stochastic neighbour
 * embedding, van der Maaten and Hinton 2008, Journal of Machine Learning Research 9, 2579).
 * Distances between groups mean little. Time and memory grow with the square of the number of
 * objects, so it is for a few thousand at most.
 *
 * <p>The library draws its start from a generator of the thread and adds in the order in which a
 * pool of threads divides the work; a pool of its own with a fixed number of threads makes both the
 * same at every call.
 */
public final class NeighbourMap {

    /** With fewer objects there are no neighbours to keep. */
    public static final int LEAST_OBJECTS = 12;

    private static final int THREADS = 2;
    private static final double MOST_PERPLEXITY = 30;
    private static final double LEARNING_RATE = 200;
    private static final int ROUNDS = 500;

    private NeighbourMap() {}

    /**
     * The plane of a set of objects.
     *
     * @param scores places of the objects in any number of dimensions, all with as many
     * @param seed start of the random draws
     * @return x and y of each object, centred, with unit variance of both together; empty where
     *     there are fewer than {@value #LEAST_OBJECTS}
     */
    public static List<double[]> of(List<double[]> scores, long seed) {
        if (scores.size() < LEAST_OBJECTS || scores.get(0).length >= scores.size()) {
            return List.of();
        }
        double[][] rows = scores.stream().map(double[]::clone).toArray(double[][]::new);
        double perplexity = Math.min(MOST_PERPLEXITY, (rows.length - 1) / 4.0);
        ForkJoinPool pool = new ForkJoinPool(THREADS);
        try {
            double[][] places =
                    pool.submit(
                                    () -> {
                                        MathEx.setSeed(seed);
                                        return new TSNE(rows, 2, perplexity, LEARNING_RATE, ROUNDS)
                                                .coordinates;
                                    })
                            .get();
            return scaled(places);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            return List.of();
        } catch (ExecutionException e) {
            throw new IllegalStateException("the map could not be made", e.getCause());
        } finally {
            pool.shutdownNow();
        }
    }

    private static List<double[]> scaled(double[][] places) {
        double[] mean = new double[2];
        for (double[] place : places) {
            mean[0] += place[0] / places.length;
            mean[1] += place[1] / places.length;
        }
        double variance = 0;
        for (double[] place : places) {
            variance +=
                    (square(place[0] - mean[0]) + square(place[1] - mean[1]))
                            / (2.0 * places.length);
        }
        double unit = variance > 0 ? Math.sqrt(variance) : 1;
        return java.util.Arrays.stream(places)
                .map(
                        place ->
                                new double[] {
                                    (place[0] - mean[0]) / unit, (place[1] - mean[1]) / unit
                                })
                .toList();
    }

    private static double square(double x) {
        return x * x;
    }
}
