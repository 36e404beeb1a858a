package emberline.read;

/**
 * In which row each name stood first. Names are kept as hashes of 64 bits in a table of their own,
 * so that a list of millions needs {@value #BYTES_A_ROW} bytes a row at most; among a hundred
 * thousand names the chance that two different ones are taken for the same is below 1e-9.
 */
final class NameRows {

    /** Most bytes that a name takes: while the table grows, the old and the new are held. */
    static final int BYTES_A_ROW = 72;

    private static final int FIRST_SIZE = 1 << 10;

    private long[] hashes = new long[FIRST_SIZE];
    private int[] rows = new int[FIRST_SIZE];
    private int count;

    /** The row in which a name stood first: this one where it is new. Rows count from 1. */
    int firstRow(String name, int row) {
        if (2 * count >= hashes.length) {
            grow();
        }
        long hash = hash(name);
        int place = place(hash);
        if (rows[place] == 0) {
            hashes[place] = hash;
            rows[place] = row;
            count++;
        }
        return rows[place];
    }

    private void grow() {
        long[] oldHashes = hashes;
        int[] oldRows = rows;
        hashes = new long[2 * oldHashes.length];
        rows = new int[hashes.length];
        for (int i = 0; i < oldHashes.length; i++) {
            if (oldRows[i] != 0) {
                int place = place(oldHashes[i]);
                hashes[place] = oldHashes[i];
                rows[place] = oldRows[i];
            }
        }
    }

    /** Where a hash stands, or where it can be put. */
    private int place(long hash) {
        int place = (int) (hash >>> 32) & (hashes.length - 1);
        while (rows[place] != 0 && hashes[place] != hash) {
            place = (place + 1) & (hashes.length - 1);
        }
        return place;
    }

    /** A multiplicative hash with a finish that mixes all bits. */
    private static long hash(String name) {
        long hash = 0x9E3779B97F4A7C15L ^ name.length();
        for (int i = 0; i < name.length(); i++) {
            hash = (hash ^ name.charAt(i)) * 0x100000001B3L;
            hash ^= hash >>> 29;
        }
        hash = (hash ^ (hash >>> 30)) * 0xBF58476D1CE4E5B9L;
        hash = (hash ^ (hash >>> 27)) * 0x94D049BB133111EBL;
        return hash ^ (hash >>> 31);
    }
}
