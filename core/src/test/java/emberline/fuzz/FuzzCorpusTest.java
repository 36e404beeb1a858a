package emberline.fuzz;

import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * The kept corpus of every target, and for a few seconds what comes of it by cutting, joining and
 * changing at random (seeded). The long run is that of the profile {@code fuzz}.
 */
class FuzzCorpusTest {

    private static final long MUTATING_NANOS = 3_000_000_000L;
    private static final int MOST_MUTANTS = 4000;
    private static final Duration SOON = Duration.ofSeconds(20);
    private static final int LONGEST = 40_000;

    private static List<byte[]> seeds(FuzzTarget target) throws IOException, URISyntaxException {
        List<byte[]> seeds = new ArrayList<>();
        for (String folder : target.seeds()) {
            Path path = Path.of(FuzzCorpusTest.class.getResource("/emberline/" + folder).toURI());
            try (Stream<Path> files = Files.walk(path)) {
                for (Path file : files.filter(Files::isRegularFile).sorted().toList()) {
                    seeds.add(Files.readAllBytes(file));
                }
            }
        }
        return seeds;
    }

    private static void run(FuzzTarget target, byte[] input) {
        try {
            assertTimeoutPreemptively(SOON, () -> target.run(input));
        } catch (RuntimeException | AssertionError e) {
            String start =
                    new String(input, 0, Math.min(300, input.length), StandardCharsets.ISO_8859_1);
            throw new AssertionError(target + " on " + input.length + " bytes: " + start, e);
        }
    }

    @ParameterizedTest
    @EnumSource
    void theCorpusRaisesDeclaredExceptionsOnly(FuzzTarget target)
            throws IOException, URISyntaxException {
        List<byte[]> seeds = seeds(target);
        assertTrue(!seeds.isEmpty(), "no seeds");
        run(target, new byte[0]);
        for (byte[] seed : seeds) {
            run(target, seed);
            for (int tenth = 1; tenth < 10; tenth++) {
                run(target, Arrays.copyOf(seed, seed.length * tenth / 10));
            }
        }
    }

    @ParameterizedTest
    @EnumSource
    void mutantsOfTheCorpusRaiseDeclaredExceptionsOnly(FuzzTarget target)
            throws IOException, URISyntaxException {
        List<byte[]> seeds = seeds(target);
        SplittableRandom random = new SplittableRandom(target.name().length());
        long end = System.nanoTime() + MUTATING_NANOS;
        for (int k = 0; k < MOST_MUTANTS && System.nanoTime() < end; k++) {
            byte[] one = seeds.get(random.nextInt(seeds.size()));
            byte[] two = seeds.get(random.nextInt(seeds.size()));
            run(target, mutant(one, two, random));
        }
    }

    private static byte[] mutant(byte[] one, byte[] two, SplittableRandom random) {
        byte[] mutant = Arrays.copyOf(one, Math.min(one.length, LONGEST));
        for (int change = random.nextInt(1, 6); change > 0 && mutant.length > 0; change--) {
            int place = random.nextInt(mutant.length);
            switch (random.nextInt(6)) {
                case 0 -> mutant[place] = (byte) random.nextInt(256);
                case 1 -> mutant[place] = (byte) random.nextInt(32, 127);
                case 2 -> mutant[place] ^= (byte) (1 << random.nextInt(8));
                case 3 -> mutant = spliced(mutant, place, two, random);
                case 4 -> mutant = cut(mutant, place, random.nextInt(1, 50));
                default -> mutant = digits(mutant, place, random);
            }
        }
        return mutant;
    }

    private static byte[] spliced(byte[] into, int place, byte[] from, SplittableRandom random) {
        if (from.length == 0 || into.length > LONGEST) {
            return into;
        }
        int start = random.nextInt(from.length);
        int size = Math.min(from.length - start, random.nextInt(1, 200));
        byte[] joined = Arrays.copyOf(into, into.length + size);
        System.arraycopy(into, place, joined, place + size, into.length - place);
        System.arraycopy(from, start, joined, place, size);
        return joined;
    }

    private static byte[] cut(byte[] from, int place, int size) {
        int end = Math.min(from.length, place + size);
        byte[] left = Arrays.copyOf(from, from.length - (end - place));
        System.arraycopy(from, end, left, place, from.length - end);
        return left;
    }

    /** Writes a telling number over what stands there. */
    private static byte[] digits(byte[] into, int place, SplittableRandom random) {
        String[] tell = {
            "-1",
            "0",
            "2147483647",
            "-2147483648",
            "9223372036854775807",
            "1e308",
            "1e-320",
            "nan",
            "inf",
            "99999999999999999999"
        };
        byte[] number = tell[random.nextInt(tell.length)].getBytes(StandardCharsets.US_ASCII);
        System.arraycopy(number, 0, into, place, Math.min(number.length, into.length - place));
        return into;
    }
}
