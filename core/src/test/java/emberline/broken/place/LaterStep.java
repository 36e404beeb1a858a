package emberline.broken.place;

/**
 * A class that an earlier step must not use: see ArrowsTest.
 *
 * @param number any
 */
public record LaterStep(int number) {}
