package emberline.survey;

import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;
import java.util.concurrent.atomic.LongAdder;

/** Where the time of a run goes: sums over all objects and threads. Safe for several threads. */
public final class StageTimes {

    private final Map<Stage, LongAdder> nanos;

    /** Times of which none has passed. */
    public StageTimes() {
        Map<Stage, LongAdder> map = new EnumMap<>(Stage.class);
        for (Stage stage : Stage.values()) {
            map.put(stage, new LongAdder());
        }
        nanos = Collections.unmodifiableMap(map);
    }

    /** A stage of the way of an object. */
    public enum Stage {
        /** Files become observations. */
        READ,
        /** Observations become prepared spectra. */
        PREPARE,
        /** Features, lines and velocities are measured. */
        MEASURE,
        /** Type, gravity and kind. */
        PLACE,
        /** Mass, age and decision. */
        JUDGE,
        /** Results become files and records. */
        WRITE
    }

    /**
     * Something that takes time.
     *
     * @param <T> what comes of it
     * @param <E> what it may throw
     */
    @FunctionalInterface
    public interface Timed<T, E extends Exception> {

        /**
         * Does it.
         *
         * @return what comes of it
         * @throws E if it fails
         */
        T done() throws E;
    }

    /**
     * Does something and counts its time.
     *
     * @param <T> what comes of it
     * @param <E> what it may throw
     * @param stage to which stage it belongs
     * @param what what is done
     * @return what came of it
     * @throws E if it fails; the time counts all the same
     */
    public <T, E extends Exception> T timed(Stage stage, Timed<T, E> what) throws E {
        long start = System.nanoTime();
        try {
            return what.done();
        } finally {
            nanos.get(stage).add(System.nanoTime() - start);
        }
    }

    /**
     * The time that a stage took so far.
     *
     * @param stage a stage
     * @return sum over all threads (seconds by the clock)
     */
    public double seconds(Stage stage) {
        return nanos.get(stage).sum() * 1e-9;
    }
}
