/**
 * Scores the product on a list of known objects: how far types, gravities, kinds and metallicity
 * classes agree with those listed. No science of its own; results in, figures out.
 */
package emberline.survey.score;
