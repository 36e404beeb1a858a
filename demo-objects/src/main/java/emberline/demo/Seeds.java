package emberline.demo;

import java.nio.charset.StandardCharsets;

/**
 * Seeds of the random sequences: each purpose has a name, and its seed depends on the name alone.
 */
final class Seeds {

    private static final long OFFSET = 0xcbf29ce484222325L;
    private static final long PRIME = 0x100000001b3L;

    private Seeds() {}

    /**
     * The seed of a purpose: the 64-bit Fowler-Noll-Vo hash (FNV-1a) of its name.
     *
     * @param purpose any text
     * @return the seed
     */
    static long of(String purpose) {
        long hash = OFFSET;
        for (byte b : purpose.getBytes(StandardCharsets.UTF_8)) {
            hash ^= b & 0xff;
            hash *= PRIME;
        }
        return hash;
    }
}
