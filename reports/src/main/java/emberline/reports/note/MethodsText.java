package emberline.reports.note;

import emberline.catalogue.Source;
import emberline.reports.note.MethodsUsed.Part;
import emberline.survey.Status;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;

/** A paragraph on the methods in plain words, made from what was done. */
final class MethodsText {

    private static final int WIDTH = 100;

    private MethodsText() {}

    /**
     * The paragraph.
     *
     * @param used what was done
     * @param version version of the program
     * @param options the options of the run that bear on the results
     * @param seed start of the random draws
     */
    static String of(MethodsUsed used, String version, Map<String, String> options, long seed) {
        StringBuilder text = new StringBuilder();
        int measured = used.count(Status.MEASURED) + used.count(Status.PARTIAL);
        text.append("The spectra of ")
                .append(objects(measured))
                .append(" were measured with Emberline ")
                .append(version)
                .append(". ");
        if (used.count(Status.FAILED) > 0) {
            text.append("Of ")
                    .append(objects(used.count(Status.FAILED)))
                    .append(" no spectrum could be used. ");
        }
        text.append(
                "Wavelengths were brought to vacuum; errors and covariances of all features follow"
                        + " from the noise of the pixels. ");
        text.append(prepared(options));
        if (used.wasDone(Part.POSTERIOR) || used.wasDone(Part.RELATIONS)) {
            text.append("The types rest on band indices and lines as defined by ")
                    .append(cited(used.papers(Part.INDICES)))
                    .append(". ");
        }
        if (used.wasDone(Part.POSTERIOR)) {
            text.append(
                            "Each type is the median of a posterior over type and gravity, from"
                                    + " loci of the features against type that were learned from"
                                    + " public spectra of known type, with the prior '")
                    .append(options.getOrDefault("prior", "flat"))
                    .append("'. ");
        }
        if (used.wasDone(Part.RELATIONS)) {
            text.append("As a second witness the published type relations of ")
                    .append(cited(used.papers(Part.RELATIONS)))
                    .append(" were combined, weighted by inverse variance. ");
        }
        others(text, used, options);
        text.append("Random draws start from the seed ").append(seed).append('.');
        return wrapped(text.toString());
    }

    private static void others(StringBuilder text, MethodsUsed used, Map<String, String> options) {
        if (used.wasDone(Part.REDDENING)) {
            text.append("Type and extinction were fitted together. ");
        }
        if (used.wasDone(Part.GRAVITY)) {
            text.append("Gravity was also scored by the limits of ")
                    .append(cited(used.papers(Part.GRAVITY)))
                    .append(". ");
        }
        if (used.wasDone(Part.METALLICITY)) {
            text.append("Metallicity classes are by zeta as calibrated by ")
                    .append(cited(used.papers(Part.METALLICITY)))
                    .append(". ");
        }
        if (used.wasDone(Part.ACTIVITY)) {
            text.append("Widths of H alpha were turned into activity by ")
                    .append(cited(used.papers(Part.ACTIVITY)))
                    .append(". ");
        }
        if (used.wasDone(Part.PAIR)) {
            text.append("Unresolved pairs were sought by the criteria of ")
                    .append(cited(used.papers(Part.PAIR)))
                    .append(". ");
        }
        if (used.wasDone(Part.JUDGEMENT)) {
            text.append(
                            "Mass, age and the probability of a mass below the hydrogen-burning"
                                    + " limit follow by Bayes' theorem from evolution grids and"
                                    + " relations of ")
                    .append(cited(used.papers(Part.JUDGEMENT)))
                    .append("; an object is called substellar or stellar where that probability")
                    .append(" passes the thresholds ")
                    .append(options.getOrDefault("decide", "0.95,0.05").replace(",", " and "))
                    .append(" at 0.070, 0.072 and 0.075 solar masses alike. ");
            String age = options.getOrDefault("age", "");
            if (!age.isEmpty()) {
                text.append("An age of ").append(age).append(" was stated. ");
            }
        }
    }

    private static String prepared(Map<String, String> options) {
        String av = options.getOrDefault("av_mag", "");
        String velocity = options.getOrDefault("velocity_kms", "");
        return (av.isEmpty() ? "" : "An extinction of A_V = " + av + " mag was taken out. ")
                + (velocity.isEmpty()
                        ? ""
                        : "A radial velocity of " + velocity + " km/s was taken out. ")
                + (Boolean.parseBoolean(options.getOrDefault("to_rest", "false"))
                        ? "Radial velocities measured from the lines were taken out. "
                        : "");
    }

    private static String objects(int number) {
        return number + (number == 1 ? " object" : " objects");
    }

    private static String cited(List<Source> papers) {
        List<String> cites = papers.stream().map(Source::shortCite).toList();
        if (cites.size() < 2) {
            return String.join("", cites);
        }
        return cites.subList(0, cites.size() - 1).stream().collect(Collectors.joining("; "))
                + "; and "
                + cites.get(cites.size() - 1);
    }

    private static String wrapped(String text) {
        StringBuilder lines = new StringBuilder();
        int length = 0;
        for (String word : text.strip().split(" +", -1)) {
            if (length > 0 && length + 1 + word.length() > WIDTH) {
                lines.append('\n');
                length = 0;
            }
            lines.append(length == 0 ? "" : " ").append(word);
            length += word.length() + (length == 0 ? 0 : 1);
        }
        return String.format(Locale.ROOT, "%s%n", lines).replace("\r\n", "\n");
    }
}
