package emberline.survey;

/** The seed of one object: from its name and the seed of the run, so that order does not matter. */
final class ObjectSeed {

    private ObjectSeed() {}

    static long of(String name, long runSeed) {
        long mixed = runSeed * 0x9E3779B97F4A7C15L + name.hashCode();
        for (int i = 0; i < name.length(); i++) {
            mixed = (mixed ^ name.charAt(i)) * 0x100000001B3L;
        }
        mixed = (mixed ^ (mixed >>> 30)) * 0xBF58476D1CE4E5B9L;
        mixed = (mixed ^ (mixed >>> 27)) * 0x94D049BB133111EBL;
        return mixed ^ (mixed >>> 31);
    }
}
