/**
 * A survey as a map: every object a point in a plane in which like objects lie near each other, the
 * reference objects underneath. It is for finding one's way; nothing is decided by it.
 */
package emberline.survey.map;
