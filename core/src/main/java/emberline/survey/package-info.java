/**
 * The chain over one candidate or a whole list: order, parallelism, failures. No science of its
 * own.
 */
package emberline.survey;
