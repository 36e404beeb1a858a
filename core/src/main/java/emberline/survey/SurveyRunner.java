package emberline.survey;

import emberline.read.CandidateList;
import emberline.read.ListedCandidate;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.Iterator;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;

/**
 * Takes a candidate list through the chain on several threads and hands the results on in the order
 * of the list, so that the output does not depend on the number of threads. At most a few objects a
 * thread are held at once, so that memory does not grow with the list.
 */
public final class SurveyRunner {

    /** Objects in flight for each thread. */
    private static final int AHEAD = 4;

    private final Chain chain;
    private final int threads;

    /**
     * A runner.
     *
     * @param chain what is done with each object
     * @param threads number of threads, at least 1
     */
    public SurveyRunner(Chain chain, int threads) {
        if (threads < 1) {
            throw new IllegalArgumentException(threads + " threads: expected at least 1");
        }
        this.chain = chain;
        this.threads = threads;
    }

    /**
     * What is made of a result on the thread that computed it: files, rows.
     *
     * @param <T> what is handed on
     */
    @FunctionalInterface
    public interface Output<T> {

        /**
         * Makes the output of one object.
         *
         * @param result the result
         * @return what is handed on in the order of the list
         * @throws IOException if a file cannot be written; this stops the run
         */
        T make(ObjectResult result) throws IOException;
    }

    /**
     * Takes the outputs in the order of the list.
     *
     * @param <T> what is handed on
     */
    @FunctionalInterface
    public interface Sink<T> {

        /**
         * Takes the output of the next object.
         *
         * @param output what was made of it
         * @throws IOException if it cannot be written; this stops the run
         */
        void take(T output) throws IOException;
    }

    /**
     * Runs the list.
     *
     * @param <T> what is made of each object
     * @param list the candidates
     * @param output what is made of a result, called on several threads at once
     * @param sink what takes the outputs in order, called on the calling thread
     * @throws IOException if an output cannot be written
     * @throws InterruptedException if the calling thread is interrupted
     */
    public <T> void run(CandidateList list, Output<T> output, Sink<T> sink)
            throws IOException, InterruptedException {
        Path folder = list.file().toAbsolutePath().getParent();
        ExecutorService workers = Executors.newFixedThreadPool(threads);
        try {
            Deque<Future<T>> flying = new ArrayDeque<>();
            Iterator<ListedCandidate> rows = list.rows().iterator();
            while (rows.hasNext() || !flying.isEmpty()) {
                while (rows.hasNext() && flying.size() < AHEAD * threads) {
                    ListedCandidate row = rows.next();
                    flying.add(workers.submit(() -> made(output, result(row, folder))));
                }
                sink.take(finished(flying.remove()));
            }
        } finally {
            workers.shutdownNow();
            workers.awaitTermination(1, TimeUnit.MINUTES);
        }
    }

    private ObjectResult result(ListedCandidate row, Path folder) {
        if (row.problem().isPresent()) {
            return Chain.failed(row.candidate(), row.problem().get());
        }
        return chain.run(row.candidate(), folder);
    }

    /**
     * The output of a result; where making it fails by a fault of the product, that of a failure.
     */
    private static <T> T made(Output<T> output, ObjectResult result) throws IOException {
        try {
            return output.make(result);
        } catch (RuntimeException e) {
            return output.make(Chain.internalError(result.candidate(), e));
        }
    }

    private static <T> T finished(Future<T> future) throws IOException, InterruptedException {
        try {
            return future.get();
        } catch (ExecutionException e) {
            if (e.getCause() instanceof IOException io) {
                throw io;
            }
            throw new IllegalStateException(e.getCause());
        }
    }
}
