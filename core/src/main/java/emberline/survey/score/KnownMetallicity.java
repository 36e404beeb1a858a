package emberline.survey.score;

import emberline.catalogue.MetallicityClass;
import emberline.spectrum.Candidate;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** The metallicity class that a list states: a column, or the prefix of the type. */
final class KnownMetallicity {

    private static final Pattern PREFIX = Pattern.compile("^(usd|esd|sd)\\s*[KMLT].*");

    private KnownMetallicity() {}

    static Optional<MetallicityClass.Name> of(Candidate candidate, String kind, boolean typed) {
        Optional<MetallicityClass.Name> stated =
                candidate.text("known_metallicity").flatMap(KnownMetallicity::withPrefix);
        if (stated.isPresent()) {
            return stated;
        }
        Matcher matcher = PREFIX.matcher(candidate.text("known_type").orElse(""));
        if (matcher.matches()) {
            return withPrefix(matcher.group(1));
        }
        return kind.equals(ScoredObject.DWARF) && typed
                ? Optional.of(MetallicityClass.Name.DWARF)
                : Optional.empty();
    }

    private static Optional<MetallicityClass.Name> withPrefix(String prefix) {
        for (MetallicityClass.Name name : MetallicityClass.Name.values()) {
            if (name.prefix().equals(prefix)) {
                return Optional.of(name);
            }
        }
        return Optional.empty();
    }
}
