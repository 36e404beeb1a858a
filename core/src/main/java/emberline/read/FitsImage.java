package emberline.read;

import java.lang.reflect.Array;
import java.nio.ByteBuffer;
import java.util.Optional;

/** The numbers of a FITS image in the order of the file, scaled as its header says. */
final class FitsImage {

    private final int[] axes;
    private final double[] values;

    private FitsImage(int[] axes, double[] values) {
        this.axes = axes;
        this.values = values;
    }

    static FitsImage of(FitsUnit unit) throws UnreadableSpectrumException {
        double[] values = stored(unit);
        double scale = unit.number("BSCALE").orElse(1.0);
        double zero = unit.number("BZERO").orElse(0.0);
        boolean integers = unit.number("BITPIX").orElse(0.0) > 0;
        Optional<Double> blank = integers ? unit.number("BLANK") : Optional.empty();
        for (int i = 0; i < values.length; i++) {
            boolean isBlank = blank.isPresent() && values[i] == blank.get();
            values[i] = isBlank ? Double.NaN : zero + scale * values[i];
        }
        return new FitsImage(unit.axes(), values);
    }

    /**
     * The numbers as stored, in one pass over the bytes: FITS numbers are big-endian (FITS standard
     * 4.0, section 5). The size has been checked against the file; a test holds this to the FITS
     * library for every kind of number.
     */
    private static double[] stored(FitsUnit unit) throws UnreadableSpectrumException {
        int count = 1;
        for (int length : unit.axes()) {
            count = Math.multiplyExact(count, length);
        }
        double[] values = new double[count];
        ByteBuffer bytes = ByteBuffer.wrap(unit.bytes()).position(unit.dataStart());
        int kind = (int) unit.number("BITPIX").orElse(0.0).doubleValue();
        for (int i = 0; i < count; i++) {
            values[i] =
                    switch (kind) {
                        case 8 -> bytes.get() & 0xff;
                        case 16 -> bytes.getShort();
                        case 32 -> bytes.getInt();
                        case 64 -> (double) bytes.getLong();
                        case -32 -> bytes.getFloat();
                        case -64 -> bytes.getDouble();
                        default ->
                                throw new UnreadableSpectrumException(
                                        unit.where(),
                                        "BITPIX = " + kind,
                                        "8, 16, 32, 64, -32 or -64",
                                        "Write the file again with a FITS library.");
                    };
        }
        return values;
    }

    /** All numbers in the order of the file. */
    double[] values() {
        return values.clone();
    }

    /** The lengths of the axes in FITS order: the first runs fastest. */
    int[] axes() {
        return axes.clone();
    }

    /** The length of an axis counted from 1; 1 where there is none. */
    int length(int axis) {
        return axis <= axes.length ? axes[axis - 1] : 1;
    }

    /** A run of numbers along the first axis. */
    double[] row(int row) {
        int length = axes[0];
        double[] found = new double[length];
        System.arraycopy(values, row * length, found, 0, length);
        return found;
    }

    /** A run of numbers along the second axis of a two-dimensional image. */
    double[] column(int column) {
        double[] found = new double[axes[1]];
        for (int i = 0; i < found.length; i++) {
            found[i] = values[i * axes[0] + column];
        }
        return found;
    }

    /** The smallest finite number. */
    double smallest() {
        double smallest = Double.POSITIVE_INFINITY;
        for (double value : values) {
            smallest = value < smallest ? value : smallest;
        }
        return smallest;
    }

    /** This image with a number taken off every value. */
    FitsImage minus(double offset) {
        double[] less = values.clone();
        for (int i = 0; i < less.length; i++) {
            less[i] -= offset;
        }
        return new FitsImage(axes, less);
    }

    /** A copy of a primitive array of any kind as doubles. */
    static double[] toDouble(Object array) {
        if (array instanceof double[] doubles) {
            return doubles.clone();
        }
        if (array instanceof float[] floats) {
            double[] copy = new double[floats.length];
            for (int i = 0; i < copy.length; i++) {
                copy[i] = floats[i];
            }
            return copy;
        }
        int length = Array.getLength(array);
        double[] copy = new double[length];
        for (int i = 0; i < length; i++) {
            copy[i] = array instanceof byte[] bytes ? bytes[i] & 0xff : Array.getDouble(array, i);
        }
        return copy;
    }
}
