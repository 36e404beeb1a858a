package emberline.place.kind;

import java.io.DataInputStream;
import java.io.IOException;
import java.nio.ByteBuffer;

/**
 * Reads many numbers at once, big-endian as {@link java.io.DataOutputStream} writes them one by
 * one.
 */
final class NumberBlocks {

    private NumberBlocks() {}

    /** The next whole numbers of four bytes. */
    static int[] ints(DataInputStream in, int count) throws IOException {
        int[] numbers = new int[count];
        bytes(in, count).asIntBuffer().get(numbers);
        return numbers;
    }

    /** The next numbers of four bytes. */
    static float[] floats(DataInputStream in, int count) throws IOException {
        float[] numbers = new float[count];
        bytes(in, count).asFloatBuffer().get(numbers);
        return numbers;
    }

    private static ByteBuffer bytes(DataInputStream in, int count) throws IOException {
        byte[] bytes = new byte[Math.multiplyExact(count, Integer.BYTES)];
        in.readFully(bytes);
        return ByteBuffer.wrap(bytes);
    }
}
