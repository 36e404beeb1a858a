package emberline.survey.map;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.place.kind.ShapeVector;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;

class PrincipalAxesTest {

    private static final int SIZE = 20;

    /** Objects that differ along two directions, with a little noise, and what they are made of. */
    private static List<ShapeVector> objects(double missing, List<double[]> truth) {
        Random random = new Random(5);
        List<ShapeVector> objects = new ArrayList<>();
        for (int i = 0; i < 200; i++) {
            double a = 3 * random.nextGaussian();
            double b = random.nextGaussian();
            truth.add(new double[] {a, b});
            double[] values = new double[SIZE];
            for (int k = 0; k < SIZE; k++) {
                values[k] = 7 + a + (k % 2 == 0 ? b : -b) + 0.02 * random.nextGaussian();
                values[k] = random.nextDouble() < missing ? Double.NaN : values[k];
            }
            objects.add(new ShapeVector(values, new double[SIZE]));
        }
        return objects;
    }

    @Test
    void theDirectionsAreFoundThoughCoordinatesAreMissing() {
        for (double missing : new double[] {0, 0.3}) {
            List<double[]> truth = new ArrayList<>();
            List<ShapeVector> objects = objects(missing, truth);
            PrincipalAxes axes = PrincipalAxes.of(objects, 2);
            assertEquals(0.9, axes.share(0), 0.03);
            assertEquals(0.1, axes.share(1), 0.03);
            for (int i = 0; i < objects.size(); i++) {
                double[] scores = axes.scores(objects.get(i)).orElseThrow();
                assertEquals(
                        truth.get(i)[0] / 3, scores[0], 0.25, "first axis, missing " + missing);
            }
        }
    }

    @Test
    void anObjectWithNoisyCoordinatesLiesNearerToTheMiddle() {
        PrincipalAxes axes = PrincipalAxes.of(objects(0, new ArrayList<>()), 2);
        double[] far = new double[SIZE];
        double[] noise = new double[SIZE];
        java.util.Arrays.fill(far, 16);
        java.util.Arrays.fill(noise, 30);
        double sure = axes.scores(new ShapeVector(far, new double[SIZE])).orElseThrow()[0];
        double unsure = axes.scores(new ShapeVector(far, noise)).orElseThrow()[0];
        assertEquals(3, sure, 0.4);
        assertTrue(unsure > 0.2 && unsure < 0.7 * sure, unsure + " of " + sure);
    }

    @Test
    void tooFewCoordinatesGiveNoPlace() {
        PrincipalAxes axes = PrincipalAxes.of(objects(0, new ArrayList<>()), 2);
        double[] values = new double[SIZE];
        java.util.Arrays.fill(values, Double.NaN);
        java.util.Arrays.fill(values, 0, PrincipalAxes.LEAST_COORDINATES - 1, 7);
        assertEquals(Optional.empty(), axes.scores(new ShapeVector(values, new double[SIZE])));
        values[PrincipalAxes.LEAST_COORDINATES] = 7;
        assertTrue(axes.scores(new ShapeVector(values, new double[SIZE])).isPresent());
    }

    @Test
    void tooFewObjectsAreRefused() {
        List<ShapeVector> two = objects(0, new ArrayList<>()).subList(0, 2);
        assertThrows(IllegalArgumentException.class, () -> PrincipalAxes.of(two, 2));
    }

    @Test
    void theAxesOfTheProductSetLateTDwarfsApart() {
        SurveyAxes axes = SurveyAxes.standard().orElseThrow();
        assertTrue(axes.references().size() > 500);
        assertTrue(axes.share(0) + axes.share(1) > 0.7);
        List<double[]> late = new ArrayList<>();
        List<double[]> early = new ArrayList<>();
        for (SurveyAxes.Placed placed : axes.references()) {
            double type = placed.reference().typeNumber().orElse(-99);
            if (type >= 24) {
                late.add(placed.scores());
            } else if (type >= 4 && type < 12) {
                early.add(placed.scores());
            }
        }
        double apart = Math.hypot(mean(late, 0) - mean(early, 0), mean(late, 1) - mean(early, 1));
        assertTrue(apart > 2, "late T dwarfs lie only " + apart + " from M4 to L2");
    }

    private static double mean(List<double[]> scores, int axis) {
        return scores.stream().mapToDouble(s -> s[axis]).average().orElseThrow();
    }

    @Test
    void neighboursStayNeighboursAndTheSameSeedGivesTheSamePlane() {
        Random random = new Random(3);
        List<double[]> scores = new ArrayList<>();
        for (int i = 0; i < 90; i++) {
            double centre = 12 * (i % 3);
            scores.add(
                    new double[] {
                        centre + random.nextGaussian(), -centre + random.nextGaussian(), 0
                    });
        }
        List<double[]> plane = NeighbourMap.of(scores, 11);
        List<double[]> again = NeighbourMap.of(scores, 11);
        for (int i = 0; i < plane.size(); i++) {
            assertArrayEquals(plane.get(i), again.get(i));
            int nearest = i == 0 ? 1 : 0;
            for (int j = 0; j < plane.size(); j++) {
                if (j != i && apart(plane, i, j) < apart(plane, i, nearest)) {
                    nearest = j;
                }
            }
            assertEquals(i % 3, nearest % 3, "the nearest of " + i + " is of another group");
        }
        assertEquals(List.of(), NeighbourMap.of(scores.subList(0, 5), 11));
    }

    private static double apart(List<double[]> plane, int i, int j) {
        return Math.hypot(plane.get(i)[0] - plane.get(j)[0], plane.get(i)[1] - plane.get(j)[1]);
    }
}
