package emberline.reports.note;

/** Which units tables can write, for tests of other packages. */
public final class UnitNames {

    private UnitNames() {}

    /** Fails where tables cannot write a unit. */
    public static void check(String unit) {
        TableUnit.of(unit);
    }
}
