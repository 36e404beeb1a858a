/**
 * Draws charts with JFreeChart; the only package that sees it. A {@link
 * emberline.reports.paint.Theme} holds colours, line widths and font sizes; {@link
 * emberline.reports.paint.Face} names the fonts, which come with the product.
 */
package emberline.reports.paint;
