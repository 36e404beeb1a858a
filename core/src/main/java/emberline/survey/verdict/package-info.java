/**
 * What an observer says of the objects of a survey: verdicts, the file that holds them, and what
 * they override.
 */
package emberline.survey.verdict;
