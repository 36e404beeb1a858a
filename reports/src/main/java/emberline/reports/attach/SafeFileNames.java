package emberline.reports.attach;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HexFormat;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.regex.Pattern;

/**
 * File names for the objects of a run, safe on every file system and unique without regard to case.
 *
 * <p>Letters and digits of ASCII and {@code + - . _} are kept, every other character becomes {@code
 * _}; a name does not begin with a dot or a hyphen, is not one of the device names of Windows and
 * has at most {@value #LONGEST} characters. Where the safe form differs from the name, or another
 * name of the run has the same one but for case, the start of the SHA-256 of the name follows after
 * a hyphen. The result depends on the names alone, not on the order of the work.
 */
public final class SafeFileNames {

    /** Most rounds after which all stems differ. */
    public static final int ROUNDS = 5;

    private static final int LONGEST = 100;
    private static final int SHORT_HASH = 8;
    private static final int FULL_HASH = 64;
    private static final Pattern UNSAFE = Pattern.compile("[^A-Za-z0-9+._-]");
    private static final Pattern DEVICE =
            Pattern.compile("(?i)(con|prn|aux|nul|com[0-9]|lpt[0-9])(\\..*)?");

    private final List<String> stems;
    private final Map<String, String> stemByName;

    private SafeFileNames(List<String> stems, Map<String, String> stemByName) {
        this.stems = stems;
        this.stemByName = stemByName;
    }

    /**
     * The file names of a run.
     *
     * @param names the names of all objects of the run in the order of the list; a name may stand
     *     there more than once
     * @return one stem a position, all different
     */
    public static SafeFileNames of(List<String> names) {
        List<String> unique = withOccurrence(names);
        List<String> stems = unique.stream().map(name -> stem(name, 0)).toList();
        for (int digits = SHORT_HASH; digits <= FULL_HASH; digits *= 2) {
            Map<String, Integer> uses = new HashMap<>();
            stems.forEach(stem -> uses.merge(folded(stem), 1, Integer::sum));
            if (uses.size() == stems.size()) {
                break;
            }
            stems = withLongerHash(unique, stems, uses, digits);
        }
        Map<String, String> stemByName = new HashMap<>();
        for (int i = 0; i < names.size(); i++) {
            stemByName.putIfAbsent(names.get(i), stems.get(i));
        }
        return new SafeFileNames(List.copyOf(stems), stemByName);
    }

    /**
     * The stem of a name in one round of making stems unique, for those who keep the names of a run
     * elsewhere: round 0 for all, then the next round for those whose stems are still shared
     * without regard to case, until none is or {@link #ROUNDS} are done.
     *
     * @param name a name
     * @param before how many rows before it have the same name
     * @param round number of the round, from 0, less than {@link #ROUNDS}
     * @return file name without folder and ending
     */
    public static String stemInRound(String name, int before, int round) {
        String unique = before == 0 ? name : name + '\0' + before;
        return stem(unique, round == 0 ? 0 : SHORT_HASH << (round - 1));
    }

    /**
     * The stem of an object by its place in the list.
     *
     * @param position index in the list of names, from 0
     * @return file name without folder and ending
     */
    public String stem(int position) {
        return stems.get(position);
    }

    /**
     * The stem of an object by its name; of a name that stands in the list more than once, that of
     * the first.
     *
     * @param name one of the names
     * @return file name without folder and ending
     * @throws IllegalArgumentException if the name is not one of the run
     */
    public String stem(String name) {
        String stem = stemByName.get(name);
        if (stem == null) {
            throw new IllegalArgumentException(
                    "name '" + name + "': expected one of the names of the run");
        }
        return stem;
    }

    /** Makes repeated names differ by a mark that no name can hold. */
    private static List<String> withOccurrence(List<String> names) {
        Map<String, Integer> seen = new HashMap<>();
        List<String> unique = new ArrayList<>();
        for (String name : names) {
            int before = seen.merge(name, 1, Integer::sum) - 1;
            unique.add(before == 0 ? name : name + '\0' + before);
        }
        return unique;
    }

    private static List<String> withLongerHash(
            List<String> names, List<String> stems, Map<String, Integer> uses, int digits) {
        List<String> longer = new ArrayList<>();
        for (int i = 0; i < stems.size(); i++) {
            boolean shared = uses.get(folded(stems.get(i))) > 1;
            longer.add(shared ? stem(names.get(i), digits) : stems.get(i));
        }
        return longer;
    }

    /** The safe form with so many digits of the hash, or as few as are needed for 0. */
    private static String stem(String name, int digits) {
        int end = name.indexOf('\0');
        String shown = end < 0 ? name : name.substring(0, end);
        String safe = UNSAFE.matcher(shown).replaceAll("_");
        if (safe.startsWith(".") || safe.startsWith("-")) {
            safe = "_" + safe.substring(1);
        }
        if (DEVICE.matcher(safe).matches() || safe.isEmpty()) {
            safe = "_" + safe;
        }
        boolean changed = !safe.equals(name) || safe.length() > LONGEST || safe.endsWith(".");
        int length = digits == 0 && changed ? SHORT_HASH : digits;
        if (length == 0) {
            return safe;
        }
        int room = LONGEST - 1 - length;
        String cut = safe.length() > room ? safe.substring(0, room) : safe;
        return cut + "-" + sha256(name).substring(0, length);
    }

    private static String folded(String stem) {
        return stem.toLowerCase(Locale.ROOT);
    }

    private static String sha256(String name) {
        try {
            byte[] digest =
                    MessageDigest.getInstance("SHA-256")
                            .digest(name.getBytes(StandardCharsets.UTF_8));
            return HexFormat.of().formatHex(digest);
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform has SHA-256", e);
        }
    }
}
