package emberline.demo;

/** The formats in which the survey writes its spectra. */
enum FileFormat {
    /** Comma-separated values with a header line. */
    CSV(new TextFile(",", false)),
    /** Plain text, columns separated by blanks, comments with {@code #}. */
    TEXT(new TextFile(" ", false)),
    /** Enhanced CSV with units. */
    ECSV(new TextFile(" ", true)),
    /** FITS image of the flux alone, wavelengths by keywords. */
    FITS_IMAGE(new FitsImageFile()),
    /** FITS image of the flux with the noise in an extension. */
    FITS_IMAGE_SIGMA(new FitsImageFile()),
    /** FITS image of three rows: wavelength, flux, sigma. */
    FITS_ROWS(new FitsRowsFile()),
    /** FITS binary table. */
    FITS_TABLE(new TableFile(false)),
    /** VOTable. */
    VOTABLE(new TableFile(true));

    private final SpectrumFile file;

    FileFormat(SpectrumFile file) {
        this.file = file;
    }

    /** What writes this format. */
    SpectrumFile file() {
        return file;
    }
}
