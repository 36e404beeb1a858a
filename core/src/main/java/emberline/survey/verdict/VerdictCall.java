package emberline.survey.verdict;

import emberline.judge.Decision;
import emberline.place.kind.ObjectKind;
import java.util.Arrays;
import java.util.Optional;
import java.util.stream.Collectors;

/** What an observer calls an object. */
public enum VerdictCall {
    /** The program is right. */
    AGREE("agree"),
    /** Below the hydrogen-burning limit, and so a late dwarf. */
    SUBSTELLAR(Decision.SUBSTELLAR.word()),
    /** Above the hydrogen-burning limit. */
    STELLAR(Decision.STELLAR.word()),
    /** The evidence does not decide between the two. */
    UNDECIDED(Decision.UNDECIDED.word()),
    /** A late dwarf, whatever its mass. */
    LATE_DWARF(ObjectKind.LATE_DWARF.label()),
    /** A giant or supergiant. */
    GIANT(ObjectKind.GIANT.label()),
    /** A dwarf earlier than M0, or a white dwarf. */
    EARLY_STAR(ObjectKind.EARLY_STAR.label()),
    /** A carbon star. */
    CARBON_STAR(ObjectKind.CARBON_STAR.label()),
    /** A star behind much interstellar dust. */
    REDDENED_BACKGROUND(ObjectKind.REDDENED_BACKGROUND.label()),
    /** A galaxy or quasar. */
    EXTRAGALACTIC(ObjectKind.EXTRAGALACTIC.label()),
    /** None of the kinds. */
    UNLIKE_KNOWN(ObjectKind.UNLIKE_KNOWN.label()),
    /** The spectrum does not allow any call. */
    BAD_DATA("bad data");

    private final String word;

    VerdictCall(String word) {
        this.word = word;
    }

    /**
     * The word used in all files.
     *
     * @return lower-case words
     */
    public String word() {
        return word;
    }

    /**
     * The call of a word.
     *
     * @param word in any case
     * @return the call; empty where there is none of this word
     */
    public static Optional<VerdictCall> of(String word) {
        return Arrays.stream(values()).filter(c -> c.word.equalsIgnoreCase(word)).findFirst();
    }

    /**
     * All words.
     *
     * @return joined by commas
     */
    public static String words() {
        return Arrays.stream(values()).map(VerdictCall::word).collect(Collectors.joining(", "));
    }

    /** Whether what the program says of type, gravity and mass no longer holds. */
    boolean setsAside() {
        return this == BAD_DATA || kind().filter(k -> k != ObjectKind.LATE_DWARF).isPresent();
    }

    /** The kind that is meant; empty where the call says nothing of it. */
    Optional<ObjectKind> kind() {
        return this == SUBSTELLAR ? Optional.of(ObjectKind.LATE_DWARF) : ObjectKind.labelled(word);
    }

    /** The decision that is meant; empty where the call says nothing of it. */
    Optional<Decision> decision() {
        return Arrays.stream(Decision.values()).filter(d -> d.word().equals(word)).findFirst();
    }
}
