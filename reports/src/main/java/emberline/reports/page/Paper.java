package emberline.reports.page;

/** The size of the pages. */
public enum Paper {
    /** 210 by 297 millimetres. */
    A4(595.276f, 841.890f),
    /** 8.5 by 11 inches. */
    LETTER(612, 792);

    private final float widthPoint;
    private final float heightPoint;

    Paper(float widthPoint, float heightPoint) {
        this.widthPoint = widthPoint;
        this.heightPoint = heightPoint;
    }

    /**
     * The width of a page.
     *
     * @return width (point)
     */
    public float widthPoint() {
        return widthPoint;
    }

    /**
     * The height of a page.
     *
     * @return height (point)
     */
    public float heightPoint() {
        return heightPoint;
    }
}
