package emberline.survey;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import emberline.catalogue.FeatureCatalogue;
import emberline.measure.Measuring;
import emberline.read.CandidateList;
import emberline.read.ListedCandidate;
import emberline.spectrum.Candidate;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class SurveyRunnerTest {

    private static CandidateList listOf(int size) {
        return new CandidateList(
                Path.of("nowhere/list.csv"),
                List.of("name", "spectrum"),
                IntStream.rangeClosed(1, size)
                        .mapToObj(
                                row ->
                                        new ListedCandidate(
                                                new Candidate(
                                                        "n" + row,
                                                        row,
                                                        List.of("gone" + row + ".csv"),
                                                        Map.of()),
                                                row % 7 == 0
                                                        ? Optional.of("a bad row")
                                                        : Optional.empty()))
                        .toList());
    }

    private static SurveyRunner runner(int threads) {
        return new SurveyRunner(
                new Chain(
                        FeatureCatalogue.standard(),
                        Measuring.withDefaults(),
                        SurveySettings.withDefaults()),
                threads);
    }

    @Test
    void outputsComeInTheOrderOfTheListWhateverTheThreads() throws Exception {
        for (int threads : new int[] {1, 2, 5}) {
            List<Integer> rows = new ArrayList<>();
            runner(threads).run(listOf(50), result -> result.candidate().row(), rows::add);
            assertEquals(IntStream.rangeClosed(1, 50).boxed().toList(), rows);
        }
    }

    @Test
    void aFaultInAnOutputIsAFailedObject() throws Exception {
        List<ObjectResult> results = new ArrayList<>();
        runner(2)
                .run(
                        listOf(10),
                        result -> {
                            boolean first = !result.reason().contains("internal error");
                            if (result.candidate().row() == 4 && first) {
                                throw new IllegalStateException("a fault of the report");
                            }
                            return result;
                        },
                        results::add);
        assertEquals(10, results.size());
        assertEquals(Status.FAILED, results.get(3).status());
        assertTrue(results.get(3).reason().contains("a fault of the report"));
        assertTrue(results.get(6).reason().contains("a bad row"));
    }

    @Test
    void anOutputThatCannotBeWrittenStopsTheRun() {
        IOException full =
                assertThrows(
                        IOException.class,
                        () ->
                                runner(2)
                                        .run(
                                                listOf(10),
                                                result -> {
                                                    throw new IOException("disk full");
                                                },
                                                result -> {}));
        assertEquals("disk full", full.getMessage());
    }

    @Test
    void noThreadsAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> runner(0));
    }
}
