package emberline.place.kind;

/**
 * A spectrum to learn from: one of the reference list, or a copy of it made worse.
 *
 * @param group name of the object
 * @param kind what it is; a star behind much dust becomes {@link ObjectKind#REDDENED_BACKGROUND}
 * @param how {@code as observed}, or what was done to it
 * @param vector its features
 */
record TrainingRow(String group, ObjectKind kind, String how, FeatureVector vector) {

    static final String AS_OBSERVED = "as observed";
    static final String NOISY = "noise added";
}
