package emberline.judge;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.function.Function;

/**
 * Keeps what was laid out for the ages that were stated last: objects of one group share theirs.
 * Safe for use by several threads.
 *
 * @param <T> what is kept
 */
final class StatedAges<T> {

    private static final int CAPACITY = 16;

    private final Function<AgeStatement, T> make;
    private final Map<AgeStatement, T> kept =
            new LinkedHashMap<>(CAPACITY, 0.75f, true) {
                private static final long serialVersionUID = 1L;

                @Override
                protected boolean removeEldestEntry(Map.Entry<AgeStatement, T> eldest) {
                    return size() > CAPACITY;
                }
            };

    StatedAges(Function<AgeStatement, T> make) {
        this.make = make;
    }

    /** What belongs to an age; made now if it is not kept. */
    T of(AgeStatement age) {
        synchronized (kept) {
            T known = kept.get(age);
            if (known != null) {
                return known;
            }
        }
        T made = make.apply(age);
        synchronized (kept) {
            kept.put(age, made);
        }
        return made;
    }
}
