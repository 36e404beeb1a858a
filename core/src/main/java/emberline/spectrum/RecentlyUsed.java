package emberline.spectrum;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * Keeps the values that were used last, and forgets those that were not used for the longest time.
 * Safe for use by several threads.
 *
 * @param <K> what a value is found by
 * @param <V> what is kept
 */
public final class RecentlyUsed<K, V> {

    private final Map<K, V> kept;

    /**
     * An empty keeper.
     *
     * @param capacity how many values are kept, at least 1
     */
    public RecentlyUsed(int capacity) {
        this.kept =
                new LinkedHashMap<>(capacity, 0.75f, true) {
                    private static final long serialVersionUID = 1L;

                    @Override
                    protected boolean removeEldestEntry(Map.Entry<K, V> eldest) {
                        return size() > capacity;
                    }
                };
    }

    /**
     * A value that is kept.
     *
     * @param key what it is found by
     * @return the value; empty where it was never kept or is forgotten
     */
    public synchronized Optional<V> get(K key) {
        return Optional.ofNullable(kept.get(key));
    }

    /**
     * Keeps a value.
     *
     * @param key what it is found by
     * @param value the value
     * @return the value
     */
    public synchronized V keep(K key, V value) {
        kept.put(key, value);
        return value;
    }
}
