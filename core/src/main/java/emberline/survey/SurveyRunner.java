package emberline.survey;

import emberline.read.CandidateList;
import emberline.read.ListedCandidate;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.Iterator;
import java.util.Optional;
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
     * Gives the rows of a run one after the other.
     *
     * @param <R> a row and whatever is known of it
     */
    @FunctionalInterface
    public interface Feed<R> {

        /**
         * The next row.
         *
         * @return the row, or empty after the last or where the run shall end early
         * @throws IOException if the rows cannot be read on; this stops the run
         */
        Optional<R> next() throws IOException;
    }

    /**
     * What is done with a row, on several threads at once.
     *
     * @param <R> the row
     * @param <T> what is handed on
     */
    @FunctionalInterface
    public interface Work<R, T> {

        /**
         * Does the work of one row.
         *
         * @param row the row
         * @return what is handed on in the order of the rows
         * @throws IOException if a file cannot be written; this stops the run
         */
        T done(R row) throws IOException;
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
        Iterator<ListedCandidate> rows = list.rows().iterator();
        run(
                () -> rows.hasNext() ? Optional.of(rows.next()) : Optional.empty(),
                row -> output(row, folder, output),
                sink);
    }

    /**
     * Runs rows of any kind; at most {@value #AHEAD} a thread are in flight at once.
     *
     * @param <R> a row
     * @param <T> what is made of each row
     * @param feed gives the rows, called on the calling thread
     * @param work what is done with each, called on several threads at once
     * @param sink what takes the outputs in the order of the rows, called on the calling thread
     * @throws IOException if the rows cannot be read or an output cannot be written
     * @throws InterruptedException if the calling thread is interrupted
     */
    public <R, T> void run(Feed<R> feed, Work<R, T> work, Sink<T> sink)
            throws IOException, InterruptedException {
        ExecutorService workers = Executors.newFixedThreadPool(threads);
        try {
            Deque<Future<T>> flying = new ArrayDeque<>();
            boolean more = true;
            while (more || !flying.isEmpty()) {
                while (more && flying.size() < AHEAD * threads) {
                    Optional<R> row = feed.next();
                    more = row.isPresent();
                    row.ifPresent(one -> flying.add(workers.submit(() -> work.done(one))));
                }
                if (!flying.isEmpty()) {
                    sink.take(finished(flying.remove()));
                }
            }
        } finally {
            workers.shutdownNow();
            workers.awaitTermination(1, TimeUnit.MINUTES);
        }
    }

    /**
     * Takes a row through the chain and makes its output; where making it fails by a fault of the
     * product, that of a failure.
     *
     * @param <T> what is made
     * @param row the row; one with a problem is a failed object
     * @param folder the folder to which the paths of its spectra are relative
     * @param output what is made of the result
     * @return the output
     * @throws IOException if a file cannot be written
     */
    public <T> T output(ListedCandidate row, Path folder, Output<T> output) throws IOException {
        ObjectResult result =
                row.problem().isPresent()
                        ? Chain.failed(row.candidate(), row.problem().get())
                        : chain.run(row.candidate(), folder);
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
