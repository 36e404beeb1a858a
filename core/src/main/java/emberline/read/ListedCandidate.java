package emberline.read;

import emberline.spectrum.Candidate;
import java.util.Optional;

/**
 * A row of a candidate list.
 *
 * @param candidate the row; where it has no name it is called {@code row 7} after its place
 * @param problem why the row cannot be used: says column, what was found and what was expected;
 *     empty where the row is fit for use
 */
public record ListedCandidate(Candidate candidate, Optional<String> problem) {}
