//! Saturation pressure of pure water by published correlations: starts for the real gas, the law itself for the ideal gas.

use crate::real::{Real, k, polynomial};

/// Over what vapor saturates.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum Surface {
    /// The one of lower chemical potential: ice below the melting temperature, liquid water above.
    Stable = 0,
    /// Liquid water, supercooled below the melting temperature.
    Liquid = 1,
    /// Ice.
    Ice = 2,
}

/// ln of the Hyland–Wexler saturation pressure [Pa] over liquid water and its slope [1/K]: Hyland & Wexler 1983, as Eq. (6)
/// of ASHRAE Fundamentals 2021 ch. 1. Published for 0 to 200 °C; continued to −40 °C for supercooled water.
pub fn hyland_wexler_liquid<R: Real>(kelvins: R) -> (R, R) {
    const INVERSE: f64 = -5.8002206e3;
    const LOG: f64 = 6.5459673;
    const POWERS: [f64; 4] = [1.3914993, -4.8640239e-2, 4.1764768e-5, -1.4452093e-8];
    const SLOPE: [f64; 3] = [POWERS[1], 2.0 * POWERS[2], 3.0 * POWERS[3]];
    let inverse = k::<R>(1.0) / kelvins;
    let value = inverse * k(INVERSE) + polynomial(kelvins, POWERS) + kelvins.ln() * k(LOG);
    (value, inverse * (k::<R>(LOG) - inverse * k(INVERSE)) + polynomial(kelvins, SLOPE))
}

/// The same over ice, Eq. (5) there, −100 to 0 °C.
pub fn hyland_wexler_ice<R: Real>(kelvins: R) -> (R, R) {
    const INVERSE: f64 = -5.6745359e3;
    const LOG: f64 = 4.1635019;
    const POWERS: [f64; 5] = [6.3925247, -9.6778430e-3, 6.2215701e-7, 2.0747825e-9, -9.4840240e-13];
    const SLOPE: [f64; 4] = [POWERS[1], 2.0 * POWERS[2], 3.0 * POWERS[3], 4.0 * POWERS[4]];
    let inverse = k::<R>(1.0) / kelvins;
    let value = inverse * k(INVERSE) + polynomial(kelvins, POWERS) + kelvins.ln() * k(LOG);
    (value, inverse * (k::<R>(LOG) - inverse * k(INVERSE)) + polynomial(kelvins, SLOPE))
}

/// A saturation pressure good to 0.5 % between −100 and 200 °C, as a start for solves only: the form of Magnus with the
/// constants of WMO-No. 8 (from memory), e = a exp(b t / (c + t)), Pa.
pub struct Magnus {
    b: f64,
    c: f64,
}

impl Magnus {
    const A: f64 = 611.2;

    pub const fn over(surface: Surface) -> Self {
        match surface {
            Surface::Ice => Self { b: 22.46, c: 272.62 },
            Surface::Stable | Surface::Liquid => Self { b: 17.62, c: 243.12 },
        }
    }

    pub fn pressure<R: Real>(&self, celsius: R) -> R {
        (celsius * k(self.b) / (celsius + k(self.c))).exp() * k(Self::A)
    }

    pub fn temperature<R: Real>(&self, ln_pressure: R) -> R {
        let y = ln_pressure - k(LN_A);
        y * k(self.c) / (k::<R>(self.b) - y)
    }
}

/// ln 611.2
const LN_A: f64 = 6.415424237852311;
