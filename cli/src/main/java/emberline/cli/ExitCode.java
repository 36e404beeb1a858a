package emberline.cli;

/** The exit codes of all commands. */
final class ExitCode {

    /** All was done. */
    static final int DONE = 0;

    /** The run finished, but some objects failed. */
    static final int SOME_FAILED = 1;

    /** The arguments are wrong. */
    static final int WRONG_USAGE = 2;

    /** Nothing could be read. */
    static final int NOTHING_READ = 3;

    /** An output could not be written, or the product failed. */
    static final int NOT_WRITTEN = 4;

    private ExitCode() {}

    /** The code for a number of objects of which some failed. */
    static int of(long objects, long failed) {
        if (failed == 0) {
            return DONE;
        }
        return failed == objects ? NOTHING_READ : SOME_FAILED;
    }
}
