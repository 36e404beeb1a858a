/**
 * From type, gravity and what else is known to physical properties, age, mass and a decision:
 * substellar, stellar or undecided, each probability with the ledger of the evidence that made it.
 *
 * <p>One posterior over mass and age, on the nodes of published evolution grids, carries all:
 * {@code P(mass, age | evidence) ~ mass function x age prior x likelihood of each piece}. Numbers
 * that stand behind it are tables beside this package, each row with its source.
 */
package emberline.judge;
