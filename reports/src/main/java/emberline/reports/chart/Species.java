package emberline.reports.chart;

/** Names of molecules and atoms as they are written. */
public final class Species {

    private static final String SUBSCRIPTS = "₀₁₂₃₄₅₆₇₈₉";

    private Species() {}

    /**
     * The name with its numbers as subscripts.
     *
     * @param species for instance {@code CH4}
     * @return for instance CH₄
     */
    public static String written(String species) {
        StringBuilder written = new StringBuilder();
        for (int i = 0; i < species.length(); i++) {
            char sign = species.charAt(i);
            written.append(sign >= '0' && sign <= '9' ? SUBSCRIPTS.charAt(sign - '0') : sign);
        }
        return written.toString();
    }
}
