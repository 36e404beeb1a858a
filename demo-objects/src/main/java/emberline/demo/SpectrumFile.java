package emberline.demo;

import java.io.IOException;

/** Writes a spectrum in one format. */
interface SpectrumFile {

    /**
     * The bytes of the file.
     *
     * @param spectrum what was observed
     * @param exposure how it is to be written
     * @return the bytes, the same on every call
     * @throws IOException if the library that writes the format fails
     */
    byte[] bytes(ObservedSpectrum spectrum, Exposure exposure) throws IOException;
}
