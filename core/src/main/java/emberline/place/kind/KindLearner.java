package emberline.place.kind;

/**
 * What learned to tell kinds of one coverage apart.
 *
 * @param <T> the learner itself
 */
interface KindLearner<T extends KindLearner<T>> {

    /**
     * Probabilities of the kinds for equal prior probabilities of those that it knows; 0 for kinds
     * that it never saw.
     *
     * @param values all features in the order of {@link KindFeatures}, NaN where not measured
     */
    double[] probabilities(double[] values);

    /** The same with another exponent of the probabilities; 1 leaves them as they were learned. */
    T withSharpness(float exponent);
}
