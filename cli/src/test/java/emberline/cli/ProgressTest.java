package emberline.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.PrintWriter;
import java.io.StringWriter;
import org.junit.jupiter.api.Test;

class ProgressTest {

    private static String run(boolean terminal) {
        StringWriter text = new StringWriter();
        PrintWriter err = new PrintWriter(text);
        Progress progress = new Progress(err, terminal, 3);
        progress.step();
        progress.say("a message");
        progress.step();
        progress.step();
        progress.finish("all done");
        err.flush();
        return text.toString();
    }

    @Test
    void aTerminalSeesRateAndTimeLeft() {
        String text = run(true);
        assertTrue(text.contains("\r3 of 3 objects, "), text);
        assertTrue(text.contains(" a second, 0:00 left"), text);
        assertTrue(text.contains("a message"), text);
    }

    @Test
    void aFileSeesMessagesAndTheSummaryOnly() {
        assertEquals(2, run(false).lines().count());
    }
}
