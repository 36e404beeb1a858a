package emberline.survey.verdict;

import emberline.judge.Decision;
import emberline.place.GravityClass;
import emberline.place.kind.ObjectKind;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * What an observer says of one object. It overrides what the program says, which stays beside it:
 * numbers that were measured or derived, such as a mass, are never changed by it.
 *
 * @param call what the observer calls the object; empty where nothing is said
 * @param type its spectral type as the observer writes it, at most {@value #LONGEST_TYPE}
 *     characters; blank where nothing is said
 * @param gravity its gravity class; empty where nothing is said
 * @param note anything, at most {@value #LONGEST_NOTE} characters; may be blank
 */
public record Verdict(
        Optional<VerdictCall> call, String type, Optional<GravityClass> gravity, String note) {

    /** Most characters of a type. */
    public static final int LONGEST_TYPE = 40;

    /** Most characters of a note. */
    public static final int LONGEST_NOTE = 4000;

    /** Checks the lengths. */
    public Verdict {
        type = type.strip();
        note = note.strip();
        if (type.length() > LONGEST_TYPE || note.length() > LONGEST_NOTE) {
            throw new IllegalArgumentException(
                    "a type of "
                            + type.length()
                            + " and a note of "
                            + note.length()
                            + " characters: expected at most "
                            + LONGEST_TYPE
                            + " and "
                            + LONGEST_NOTE);
        }
    }

    /**
     * Whether nothing is said.
     *
     * @return true for a verdict that was taken back
     */
    public boolean isBlank() {
        return call.isEmpty() && type.isEmpty() && gravity.isEmpty() && note.isEmpty();
    }

    /**
     * The type that holds.
     *
     * @param measured what the program says; may be empty
     * @return the observer's, or nothing where the call sets the type aside, or the program's
     */
    public String type(String measured) {
        return !type.isEmpty() ? type : setsAside() ? "" : measured;
    }

    /**
     * The gravity class that holds.
     *
     * @param measured what the program says; may be empty
     * @return the observer's, or nothing where the call sets it aside, or the program's
     */
    public String gravity(String measured) {
        return gravity.map(GravityClass::label).orElse(setsAside() ? "" : measured);
    }

    /**
     * The kind that holds.
     *
     * @param measured what the program says; may be empty
     * @return the observer's, or nothing where the data are bad, or the program's
     */
    public String kind(String measured) {
        return call.flatMap(VerdictCall::kind)
                .map(ObjectKind::label)
                .orElse(call.filter(c -> c == VerdictCall.BAD_DATA).isPresent() ? "" : measured);
    }

    /**
     * The decision that holds.
     *
     * @param measured what the program says; may be empty
     * @return the observer's, or nothing where the call sets it aside, or the program's
     */
    public String decision(String measured) {
        return call.flatMap(VerdictCall::decision)
                .map(Decision::word)
                .orElse(setsAside() ? "" : measured);
    }

    private boolean setsAside() {
        return call.filter(VerdictCall::setsAside).isPresent();
    }

    /**
     * The verdict in words.
     *
     * @return for instance {@code giant, M7 III: strong CO}
     */
    public String words() {
        List<String> parts = new ArrayList<>();
        call.map(VerdictCall::word).ifPresent(parts::add);
        if (!type.isEmpty()) {
            parts.add(type);
        }
        gravity.map(GravityClass::label).ifPresent(parts::add);
        String said = String.join(", ", parts);
        return note.isEmpty() ? said : said.isEmpty() ? note : said + ": " + note;
    }
}
