"""What one writes in NumPy without a library: the perfect-gas relations of moist air on whole arrays.

Relations, sources and choices are those of plain_loop.c; the solves take a fixed number of Newton steps.

    python3 plain_numpy.py INPUTS ROWS RESULTS

Reads ROWS values each of dry bulb [deg C], relative humidity [1] and pressure [Pa] (native float64) and writes eight columns of results.
Then, for each line with a number n on its standard input, computes n times and prints the seconds of processor time that took.
"""

import sys
import time

import numpy as np

ZERO_CELSIUS = 273.15
CROSSING = 0.01  # of the saturation curves over ice and liquid, deg C
EPSILON = 0.621945
DEW_POINT_STEPS = 3
WET_BULB_STEPS = 4

# Hyland & Wexler 1983, as Eqs. (5) and (6) of ASHRAE Fundamentals 2021 ch. 1
ICE = (-5.6745359e3, 6.3925247, -9.6778430e-3, 6.2215701e-7, 2.0747825e-9, -9.4840240e-13, 4.1635019)
LIQUID = (-5.8002206e3, 1.3914993, -4.8640239e-2, 4.1764768e-5, -1.4452093e-8, 0.0, 6.5459673)


def ln_saturation(T, c):
    return c[0] / T + c[1] + T * (c[2] + T * (c[3] + T * (c[4] + T * c[5]))) + c[6] * np.log(T)


def ln_saturation_slope(T, c):
    return -c[0] / (T * T) + c[2] + T * (2 * c[3] + T * (3 * c[4] + T * 4 * c[5])) + c[6] / T


def dew_point(vapor_pressure):
    target = np.log(vapor_pressure)
    y = target - np.log(611.2)
    T = 243.12 * y / (17.62 - y) + ZERO_CELSIUS
    for _ in range(DEW_POINT_STEPS):
        T = T - (ln_saturation(T, LIQUID) - target) / ln_saturation_slope(T, LIQUID)
    return T - ZERO_CELSIUS


def saturated(x, p, c):
    """Humidity ratio at saturation and its slope."""
    T = x + ZERO_CELSIUS
    pws = np.exp(ln_saturation(T, c))
    Ws = EPSILON * pws / (p - pws)
    return Ws, Ws * ln_saturation_slope(T, c) * p / (p - pws)


def wet_bulb_over(x, t, W, p, c, latent_at_zero, latent_slope, condensed_cp):
    """Newton's method from x, on what the air lacks of being saturated at x."""
    for _ in range(WET_BULB_STEPS):
        Ws, slope = saturated(x, p, c)
        latent = latent_at_zero + latent_slope * x
        deficit = 1006.0 * (t - x) + W * (latent + 1860.0 * (t - x)) - latent * Ws
        x = x + deficit / (latent * slope + latent_slope * Ws + 1006.0 + W * condensed_cp)
    return x


def wet_bulb(t, W, p, t_dew):
    """Over liquid where that one is not below the crossing, else over ice: each row is solved over one of them."""
    start = t - (t - t_dew) / 3.0
    Ws, _ = saturated(CROSSING, p, LIQUID)
    latent = 2501000.0 - 2326.0 * CROSSING
    liquid = 1006.0 * (t - CROSSING) + W * (latent + 1860.0 * (t - CROSSING)) - latent * Ws >= 0.0
    ice = ~liquid
    x = np.empty_like(t)
    x[liquid] = wet_bulb_over(start[liquid], t[liquid], W[liquid], p[liquid], LIQUID, 2501000.0, -2326.0, 4186.0)
    x[ice] = wet_bulb_over(start[ice], t[ice], W[ice], p[ice], ICE, 2834400.0, -240.0, 2100.0)
    return x


def plain_numpy(t, relative_humidity, p):
    T = t + ZERO_CELSIUS
    pws = np.exp(np.where(t < CROSSING, ln_saturation(T, ICE), ln_saturation(T, LIQUID)))
    pw = relative_humidity * pws
    W = EPSILON * pw / (p - pw)
    Ws = EPSILON * pws / (p - pws)
    enthalpy = 1006.0 * t + W * (2501000.0 + 1860.0 * t)
    volume = 287.042 * T * (1.0 + 1.607858 * W) / p
    t_dew = dew_point(pw)
    return pw, W, enthalpy, volume, t_dew, wet_bulb(t, W, p, t_dew), W / Ws, (1.0 + W) / volume


def main():
    inputs, rows, results = sys.argv[1:]
    columns = np.fromfile(inputs).reshape(3, int(rows))
    np.concatenate(plain_numpy(*columns)).tofile(results)
    print("NumPy", np.__version__, "on Python", sys.version.split()[0], flush=True)
    for line in sys.stdin:
        start = time.thread_time()
        for _ in range(int(line)):
            plain_numpy(*columns)
        print(time.thread_time() - start, flush=True)


main()
