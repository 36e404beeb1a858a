"""Window means and equivalent widths of real spectra by numpy, to compare our own with.

Run in this folder:  python3 widths_and_means.py > widths_and_means.csv
Needs numpy and the folder shared/spectra beside the checkout. Nothing of Emberline is used: windows
are written out here once more, and a pixel covers what the documentation of a spectrum says: the
interval between the midpoints to its neighbours, but never more than 0.75 of the local spacing to
either side, the local spacing being the upper median of the six nearest distances between
neighbours.
"""
import pathlib
import sys

import numpy as np

SPECTRA = pathlib.Path(__file__).resolve().parents[7].parent / "shared" / "spectra"

M5 = "sdss_bochanski07/m5_all_na_k.csv"
M8 = "sdss_bochanski07/m8_all_na_k.csv"
M0 = "originals/irtf_library/M0V_HD19305.fits"

# id, spectrum, medium, unit per micron, line, continua, continuum: line through two or their mean
WIDTHS = [
    ("lepine2013/ew_halpha", M5, "air", 1e4, (6557.6, 6571.6), [(6500, 6550), (6575, 6625)], "mean"),
    ("emberline2026/ew_lii_0.6708", M8, "air", 1e4, (6704.3, 6711.3),
     [(6692, 6703), (6711.3, 6714.3)], "straight"),
    ("emberline2026/ew_ki_0.7699", M8, "air", 1e4, (7689, 7709), [(7550, 7570), (7755, 7775)], "straight"),
    ("emberline2026/ew_nai_0.8183", M5, "air", 1e4, (8178.3, 8188.3), [(8149, 8169), (8236, 8258)],
     "straight"),
    ("morelli2020/ew_ki_1.252", M0, "vacuum", 1, (1.2495, 1.2540),
     [(1.2460, 1.2490), (1.2560, 1.2580)], "straight"),
    ("morelli2020/ew_ali_1.31", M0, "vacuum", 1, (1.3115, 1.3168),
     [(1.3050, 1.3075), (1.3230, 1.3250)], "straight"),
]

# spectrum, medium, unit per micron, windows
MEANS = [
    (M5, "air", 1e4, [(7126, 7135), (7042, 7046), (6814, 6846), (6960, 6990), (6380, 6390),
                      (7550, 7570), (8440, 8470), (8230, 8270), (7540, 7580), (8136.5, 8165.25)]),
    (M0, "vacuum", 1, [(1.14, 1.165), (1.26, 1.285), (1.315, 1.335), (1.48, 1.52), (1.56, 1.60),
                          (1.635, 1.675), (2.08, 2.12), (2.215, 2.255), (2.2053, 2.2101),
                          (1.25121, 1.25219)]),
]


def vacuum(air):
    """Vacuum wavelength (micron) by the formula of Morton (2000), by iteration."""
    value = air
    for _ in range(6):
        s2 = 1 / value**2
        value = air * (1 + 8.34254e-5 + 0.02406147 / (130 - s2) + 0.00015998 / (38.9 - s2))
    return value


def window(edges, medium, per_micron):
    low, high = (edge / per_micron for edge in edges)
    return (vacuum(low), vacuum(high)) if medium == "air" else (low, high)


def read(name):
    """Wavelength (micron), flux, sigma of a CSV file or of a FITS image of three rows."""
    path = SPECTRA / name
    if path.suffix == ".csv":
        data = np.genfromtxt(path, delimiter=",", names=True)
        return [data[column] for column in data.dtype.names]
    raw = path.read_bytes()
    cards = [raw[i:i + 80].decode("latin-1") for i in range(0, min(len(raw), 160000), 80)]
    end = next(i for i, card in enumerate(cards) if card.startswith("END "))
    keys = {card[:8].strip(): card[10:].split("/")[0].strip() for card in cards[:end]}
    start = -(-(end + 1) * 80 // 2880) * 2880
    kind = {"-32": ">f4", "-64": ">f8"}[keys["BITPIX"]]
    size = int(keys["NAXIS1"]) * int(keys["NAXIS2"])
    rows = np.frombuffer(raw, kind, size, start).reshape(int(keys["NAXIS2"]), -1)
    return [rows[k].astype(float) for k in range(3)]


class Spectrum:
    def __init__(self, name):
        self.wavelength, flux, sigma = read(name)
        self.good = np.isfinite(flux) & (sigma > 0)
        self.flux = np.where(self.good, flux, 0)
        w = self.wavelength
        steps = np.diff(w)
        spacing = np.array([
            np.sort(steps[max(0, i - 3):min(len(w) - 1, i + 3)])[
                (min(len(w) - 1, i + 3) - max(0, i - 3)) // 2]
            for i in range(len(w))])
        below = np.append(steps[0], steps) / 2
        above = np.append(steps, steps[-1]) / 2
        self.low = w - np.minimum(below, 0.75 * spacing)
        self.high = w + np.minimum(above, 0.75 * spacing)

    def overlap(self, low, high):
        shared = np.minimum(self.high, high) - np.maximum(self.low, low)
        return np.where(self.good, np.clip(shared, 0, None), 0)

    def mean(self, low, high):
        return np.average(self.flux, weights=self.overlap(low, high))

    def width(self, line, continua, form):
        centres = [np.mean(side) for side in continua]
        levels = [self.mean(*side) for side in continua]
        overlap = self.overlap(*line)
        if form == "mean":
            over_continuum = overlap / np.mean(levels)
        else:
            # the flux is constant over a pixel, the continuum c is not: the integral of 1 / c over
            # the part of the pixel in the window is log(c(high) / c(low)) over the slope of c
            straight = np.polyfit(np.array(centres) - 1, levels, 1)
            low, high = np.maximum(self.low, line[0]), np.minimum(self.high, line[1])
            used = overlap > 0
            over_continuum = np.zeros(len(overlap))
            over_continuum[used] = np.log(
                np.polyval(straight, high[used] - 1) / np.polyval(straight, low[used] - 1)
            ) / straight[0]
        covered = overlap.sum() / (line[1] - line[0])
        return 1e4 * (np.sum(overlap) - np.sum(self.flux * over_continuum)) / covered


def main():
    cache = {}

    def spectrum(name):
        if name not in cache:
            cache[name] = Spectrum(name)
        return cache[name]

    print("# Made by widths_and_means.py with numpy " + np.__version__ + ", Python "
          + sys.version.split()[0] + ".")
    print("# Windows in micron, vacuum; widths in angstrom; means in the flux unit of the file.")
    print("what,spectrum,feature,low_micron,high_micron,value")
    for name, file, medium, unit, line, continua, form in WIDTHS:
        edges = window(line, medium, unit)
        sides = [window(side, medium, unit) for side in continua]
        print("width,%s,%s,%.12g,%.12g,%.12g"
              % (file, name, *edges, spectrum(file).width(edges, sides, form)))
    for file, medium, unit, windows in MEANS:
        for printed in windows:
            edges = window(printed, medium, unit)
            print("mean,%s,,%.17g,%.17g,%.12g" % (file, *edges, spectrum(file).mean(*edges)))


main()
