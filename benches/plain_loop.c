/*
 * What one writes in C without a library: a loop over the perfect-gas relations of moist air.
 *
 * Relations: ASHRAE Fundamentals 2021 (SI), chapter 1; saturation pressure: Hyland & Wexler 1983, as Eqs. (5) and (6) there.
 * Wet bulb: Eqs. (33) and (35), the latter with the sublimation enthalpy 2834.4 kJ/kg of its own ice (-333.4 + 2.1 t) in place of
 * the rounded 2830, over liquid where that wet bulb is not below the crossing of the two saturation curves, else over ice.
 * Dew point: over liquid. Relative humidity: over ice below that crossing. Start of the dew point: the form of Magnus with the
 * constants of WMO-No. 8 (from memory).
 *
 * Newton stops when a step is small, as one writes it; with -DFIXED_STEPS it always takes the same number of steps, so that a
 * compiler that is allowed to (-Ofast) turns the loop into vector instructions, which GCC then does.
 */
#include <math.h>
#include <stddef.h>

#define ZERO_CELSIUS 273.15
#define CROSSING 0.01 /* of the saturation curves over ice and liquid [deg C] */
#define EPSILON 0.621945

#ifdef FIXED_STEPS
enum { DEW_POINT_STEPS = 3, WET_BULB_STEPS = 4 };
#define STOP(step) 0
#define UNROLL _Pragma("GCC unroll 8")
#define INDEPENDENT _Pragma("GCC ivdep")
#else
enum { DEW_POINT_STEPS = 50, WET_BULB_STEPS = 40 };
#define STOP(step) (fabs(step) < 1e-6)
#define UNROLL
#define INDEPENDENT
#endif

static const double ICE[] = {-5.6745359e3, 6.3925247, -9.6778430e-3, 6.2215701e-7, 2.0747825e-9, -9.4840240e-13, 4.1635019};
static const double LIQUID[] = {-5.8002206e3, 1.3914993, -4.8640239e-2, 4.1764768e-5, -1.4452093e-8, 0.0, 6.5459673};
#define C(i) (over_ice ? ICE[i] : LIQUID[i])

/* ln of the saturation pressure [Pa] and its slope [1/K]. */
static inline double ln_saturation(double kelvins, int over_ice, double *slope)
{
    const double T = kelvins;
    *slope = -C(0) / (T * T) + C(2) + T * (2.0 * C(3) + T * (3.0 * C(4) + T * 4.0 * C(5))) + C(6) / T;
    return C(0) / T + C(1) + T * (C(2) + T * (C(3) + T * (C(4) + T * C(5)))) + C(6) * log(T);
}

static inline double dew_point(double vapor_pressure)
{
    const double target = log(vapor_pressure), y = target - log(611.2);
    double T = 243.12 * y / (17.62 - y) + ZERO_CELSIUS;
    UNROLL
    for (int i = 0; i < DEW_POINT_STEPS; i++) {
        double slope, step = ln_saturation(T, 0, &slope) - target;
        step /= slope;
        T -= step;
        if (STOP(step))
            break;
    }
    return T - ZERO_CELSIUS;
}

/* What the air lacks at a trial wet bulb x, J/kg: zero at the wet bulb, falling with x. */
static inline double deficit(double x, double t, double W, double p, int over_ice, double *slope)
{
    double ln_slope;
    const double pws = exp(ln_saturation(x + ZERO_CELSIUS, over_ice, &ln_slope));
    const double Ws = EPSILON * pws / (p - pws), dWs = Ws * ln_slope * p / (p - pws);
    /* enthalpy of vaporization or sublimation at x, and of vapor at t over water or ice at x */
    const double latent = over_ice ? 2834400.0 - 240.0 * x : 2501000.0 - 2326.0 * x;
    const double latent_slope = over_ice ? -240.0 : -2326.0, condensed_cp = over_ice ? 2100.0 : 4186.0;
    const double supply = latent + 1860.0 * (t - x);
    *slope = -latent * dWs - latent_slope * Ws - 1006.0 - W * condensed_cp;
    return 1006.0 * (t - x) + W * supply - latent * Ws;
}

static inline double wet_bulb(double t, double W, double p, double t_dew)
{
    double slope;
    const int over_ice = deficit(CROSSING, t, W, p, 0, &slope) < 0.0;
    double x = t - (t - t_dew) / 3.0;
    UNROLL
    for (int i = 0; i < WET_BULB_STEPS; i++) {
        double step = deficit(x, t, W, p, over_ice, &slope);
        step /= slope;
        x -= step;
        if (STOP(step))
            break;
    }
    return x;
}

/*
 * rows states from dry bulb [deg C], relative humidity [1], pressure [Pa]. Outputs: vapor pressure [Pa], humidity ratio [kg/kg],
 * enthalpy [J/kg], specific volume [m3/kg], dew point [deg C], wet bulb [deg C], degree of saturation [1], density [kg/m3].
 */
void plain_loop(size_t rows, const double *dry_bulb, const double *relative_humidity, const double *pressure,
                double *const outputs[8])
{
    double *restrict vapor_pressure = outputs[0], *restrict humidity_ratio = outputs[1], *restrict enthalpy = outputs[2];
    double *restrict volume = outputs[3], *restrict dew = outputs[4], *restrict wet = outputs[5];
    double *restrict degree = outputs[6], *restrict density = outputs[7];
    INDEPENDENT
    for (size_t i = 0; i < rows; i++) {
        const double t = dry_bulb[i], p = pressure[i], T = t + ZERO_CELSIUS;
        double slope;
        const double pws = exp(ln_saturation(T, t < CROSSING, &slope));
        const double pw = relative_humidity[i] * pws;
        const double W = EPSILON * pw / (p - pw), Ws = EPSILON * pws / (p - pws);
        const double v = 287.042 * T * (1.0 + 1.607858 * W) / p, t_dew = dew_point(pw);
        vapor_pressure[i] = pw;
        humidity_ratio[i] = W;
        enthalpy[i] = 1006.0 * t + W * (2501000.0 + 1860.0 * t);
        volume[i] = v;
        dew[i] = t_dew;
        wet[i] = wet_bulb(t, W, p, t_dew);
        degree[i] = W / Ws;
        density[i] = (1.0 + W) / v;
    }
}
