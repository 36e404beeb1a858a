package emberline.survey.verdict;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * The verdicts on a survey by name of the object, with the place where each stands.
 *
 * @param entries in their order; a blank verdict takes an earlier one back
 */
public record Verdicts(Map<String, Entry> entries) {

    /**
     * A verdict with its place.
     *
     * @param verdict what is said
     * @param where file and line, for messages
     */
    public record Entry(Verdict verdict, String where) {}

    /** Copies the map. */
    public Verdicts {
        entries = Collections.unmodifiableMap(new LinkedHashMap<>(entries));
    }

    /**
     * No verdicts.
     *
     * @return an empty collection
     */
    public static Verdicts none() {
        return new Verdicts(Map.of());
    }

    /**
     * The verdict on an object.
     *
     * @param name its name as listed
     * @return the verdict; empty where there is none, or it was taken back
     */
    public Optional<Verdict> of(String name) {
        return Optional.ofNullable(entries.get(name))
                .map(Entry::verdict)
                .filter(verdict -> !verdict.isBlank());
    }

    /**
     * These verdicts with newer ones, which win; what a blank one takes back is gone.
     *
     * @param newer later verdicts
     * @return all that hold
     */
    public Verdicts with(Verdicts newer) {
        Map<String, Entry> all = new LinkedHashMap<>(entries);
        all.putAll(newer.entries);
        all.values().removeIf(entry -> entry.verdict().isBlank());
        return new Verdicts(all);
    }

    /**
     * Which verdicts are on objects that a list does not hold.
     *
     * @param names the names of the list
     * @return one sentence each: where the verdict stands and what it is about
     */
    public List<String> strangers(Collection<String> names) {
        Set<String> known = new HashSet<>(names);
        List<String> sentences = new ArrayList<>();
        entries.forEach(
                (name, entry) -> {
                    if (!known.contains(name)) {
                        sentences.add(
                                entry.where()
                                        + ", column name: '"
                                        + name
                                        + "' is not in the list; expected a name as listed. The"
                                        + " verdict is kept, but used for nothing; check the name.");
                    }
                });
        return List.copyOf(sentences);
    }
}
