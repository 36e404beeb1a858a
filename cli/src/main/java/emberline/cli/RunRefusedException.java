package emberline.cli;

import java.io.IOException;

/** A run that cannot begin or go on; its message says all: where, what, what to do. */
final class RunRefusedException extends IOException {

    private static final long serialVersionUID = 1L;

    RunRefusedException(String message) {
        super(message);
    }

    RunRefusedException(String message, IOException cause) {
        super(message, cause);
    }
}
