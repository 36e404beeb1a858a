package emberline.cli;

/**
 * One line of what {@code doctor} finds.
 *
 * @param what what was looked at
 * @param passed whether the program can work with it
 * @param found what was found
 * @param advice what to do where it did not pass; blank where there is nothing to do
 */
record DoctorCheck(String what, boolean passed, String found, String advice) {

    static DoctorCheck passed(String what, String found) {
        return new DoctorCheck(what, true, found, "");
    }

    static DoctorCheck failed(String what, String found, String advice) {
        return new DoctorCheck(what, false, found, advice);
    }

    static DoctorCheck of(boolean passed, String what, String found, String advice) {
        return passed ? passed(what, found) : failed(what, found, advice);
    }
}
