/** What signal-to-noise a question needs, found by drawing spectra that have not been taken yet. */
package emberline.judge.plan;
