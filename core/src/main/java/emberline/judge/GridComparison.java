package emberline.judge;

/**
 * The same evidence on another grid of evolution.
 *
 * @param grid the grid
 * @param pSubstellar probability of a mass below the hydrogen-burning limit
 * @param massMedianMsun median mass (solar)
 */
public record GridComparison(EvolutionGrid.Name grid, double pSubstellar, double massMedianMsun) {}
