package emberline.cli;

import emberline.survey.StageTimes;
import emberline.survey.StageTimes.Stage;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.lang.management.MemoryPoolMXBean;
import java.lang.management.MemoryType;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.OptionalLong;

/** Where the time of a run went and how much memory it took, as text. */
final class TimingText {

    private static final double MEGABYTE = 1 << 20;

    private TimingText() {}

    /**
     * The text.
     *
     * @param times sums over all threads
     * @param threads number of threads
     * @param objects number of objects that went through the chain
     * @param seconds how long the run took by the clock
     * @return several lines
     */
    static String of(StageTimes times, int threads, long objects, double seconds) {
        StringBuilder text = new StringBuilder();
        text.append("where time went, summed over ")
                .append(threads)
                .append(threads == 1 ? " thread:\n" : " threads:\n");
        double sum = 0;
        for (Stage stage : Stage.values()) {
            sum += times.seconds(stage);
        }
        for (Stage stage : Stage.values()) {
            text.append(
                    String.format(
                            Locale.ROOT,
                            "  %-8s %9.2f s %5.1f%%  %8.3f ms an object%n",
                            stage.name().toLowerCase(Locale.ROOT),
                            times.seconds(stage),
                            100 * times.seconds(stage) / Math.max(1e-9, sum),
                            1000 * times.seconds(stage) / Math.max(1, objects)));
        }
        text.append(
                String.format(
                        Locale.ROOT,
                        "%d objects through the chain in %.1f s: %.1f a second%s%n",
                        objects,
                        seconds,
                        objects / Math.max(1e-9, seconds),
                        processorSeconds()));
        text.append(
                String.format(
                        Locale.ROOT,
                        "peak memory: heap at most %.0f MB%s",
                        peakHeapBytes() / MEGABYTE,
                        residentText()));
        return text.toString();
    }

    private static String processorSeconds() {
        return ManagementFactory.getOperatingSystemMXBean()
                        instanceof com.sun.management.OperatingSystemMXBean system
                ? String.format(
                        Locale.ROOT, "; processor time %.1f s", system.getProcessCpuTime() * 1e-9)
                : "";
    }

    private static long peakHeapBytes() {
        long bytes = 0;
        for (MemoryPoolMXBean pool : ManagementFactory.getMemoryPoolMXBeans()) {
            if (pool.getType() == MemoryType.HEAP) {
                bytes += pool.getPeakUsage().getUsed();
            }
        }
        return bytes;
    }

    private static String residentText() {
        OptionalLong kilobytes = residentKilobytes();
        return kilobytes.isPresent()
                ? String.format(
                        Locale.ROOT, ", process %.0f MB", kilobytes.getAsLong() * 1024 / MEGABYTE)
                : "";
    }

    /** The most memory that the process had, where the system tells it. */
    private static OptionalLong residentKilobytes() {
        Path status = Path.of("/proc/self/status");
        try {
            if (Files.isReadable(status)) {
                for (String line : Files.readAllLines(status)) {
                    if (line.startsWith("VmHWM:")) {
                        return OptionalLong.of(Long.parseLong(line.replaceAll("\\D", "")));
                    }
                }
            }
        } catch (IOException e) {
            return OptionalLong.empty();
        }
        return OptionalLong.empty();
    }
}
