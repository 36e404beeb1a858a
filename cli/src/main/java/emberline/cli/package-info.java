/**
 * The commands. A command parses its arguments, calls the core and prints; it holds no science.
 * Only here does the product talk to the console: results on standard output, everything else on
 * standard error.
 */
package emberline.cli;
