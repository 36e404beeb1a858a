package emberline.judge;

import java.util.List;

/**
 * A young group near the Sun.
 *
 * @param name short name
 * @param age its age
 * @param uKms velocity to the galactic centre (km/s)
 * @param vKms velocity along the rotation of the Galaxy (km/s)
 * @param wKms velocity to the north galactic pole (km/s)
 */
record YoungGroup(String name, AgeStatement age, double uKms, double vKms, double wKms) {

    /** The groups of {@code groups.csv}. */
    static List<YoungGroup> all() {
        return Loaded.GROUPS;
    }

    /** Read once, when first asked for. */
    private static final class Loaded {
        private static final List<YoungGroup> GROUPS =
                List.copyOf(
                        JudgeTable.rows(
                                "groups.csv",
                                row ->
                                        new YoungGroup(
                                                row.getField("group"),
                                                AgeStatement.about(
                                                        row.getField("group"),
                                                        JudgeTable.number(row, "age_myr"),
                                                        JudgeTable.number(row, "age_minus_myr"),
                                                        JudgeTable.number(row, "age_plus_myr")),
                                                JudgeTable.number(row, "u_kms"),
                                                JudgeTable.number(row, "v_kms"),
                                                JudgeTable.number(row, "w_kms"))));
    }
}
