package emberline.cli;

import java.io.Closeable;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * Whether the process is asked to end (SIGINT, SIGTERM) while something is under way. The process
 * waits until this is closed, and then ends with the exit code of the signal: 130 or 143.
 */
final class StopSignal implements Closeable {

    private final AtomicBoolean asked = new AtomicBoolean();
    private final CountDownLatch finished = new CountDownLatch(1);
    private final Thread hook = new Thread(this::stop, "stop");

    /** Listens from now on. */
    StopSignal() {
        Runtime.getRuntime().addShutdownHook(hook);
    }

    private void stop() {
        asked.set(true);
        try {
            finished.await();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    /** Whether the process is asked to end. */
    boolean isAsked() {
        return asked.get();
    }

    @Override
    public void close() {
        finished.countDown();
        if (!isAsked()) {
            try {
                Runtime.getRuntime().removeShutdownHook(hook);
            } catch (IllegalStateException e) {
                // The process began to end just now; the hook sees that nothing is under way.
                return;
            }
        }
    }
}
