//! Saturation pressure of pure water as published in closed form, Pa, from kelvins.

/// Sum of coefficients times powers.
fn powers(x: f64, terms: &[(f64, f64)]) -> f64 {
    terms.iter().map(|(coefficient, exponent)| coefficient * x.powf(*exponent)).sum()
}

/// Over liquid water: Hyland and Wexler, ASHRAE Trans. 89 (2A) (1983) 500, as Eq. (6) of ASHRAE Fundamentals 2021 ch. 1; 0 to 200 °C.
#[must_use]
pub fn hyland_wexler_over_liquid(kelvins: f64) -> f64 {
    let terms =
        [(-5.8002206e3, -1.0), (1.3914993, 0.0), (-4.8640239e-2, 1.0), (4.1764768e-5, 2.0), (-1.4452093e-8, 3.0)];
    (powers(kelvins, &terms) + 6.5459673 * kelvins.ln()).exp()
}

/// Over ice, Eq. (5) there; −100 to 0 °C.
#[must_use]
pub fn hyland_wexler_over_ice(kelvins: f64) -> f64 {
    let terms = [
        (-5.6745359e3, -1.0),
        (6.3925247, 0.0),
        (-9.6778430e-3, 1.0),
        (6.2215701e-7, 2.0),
        (2.0747825e-9, 3.0),
        (-9.4840240e-13, 4.0),
    ];
    (powers(kelvins, &terms) + 4.1635019 * kelvins.ln()).exp()
}

/// Over ice: IAPWS R14-08(2011), Eq. (6); 50 to 273.16 K.
#[must_use]
pub fn sublimation_pressure(kelvins: f64) -> f64 {
    let theta = kelvins / 273.16;
    let terms = [(-0.212144006e2, 0.333333333e-2), (0.273203819e2, 0.120666667e1), (-0.610598130e1, 0.170333333e1)];
    611.657 * (powers(theta, &terms) / theta).exp()
}

/// Over liquid water: IAPWS SR1-86(1992), Eq. (1); 273.16 to 647.096 K.
#[must_use]
pub fn supplementary_release(kelvins: f64) -> f64 {
    const CRITICAL: f64 = 647.096;
    let terms = [
        (-7.85951783, 1.0),
        (1.84408259, 1.5),
        (-11.7866497, 3.0),
        (22.6807411, 3.5),
        (-15.9618719, 4.0),
        (1.80122502, 7.5),
    ];
    22.064e6 * (CRITICAL / kelvins * powers(1.0 - kelvins / CRITICAL, &terms)).exp()
}

/// IAPWS R7-97(2012) Table 34.
const REGION_4: [f64; 10] = [
    0.11670521452767e4,
    -0.72421316703206e6,
    -0.17073846940092e2,
    0.12020824702470e5,
    -0.32325550322333e7,
    0.14915108613530e2,
    -0.48232657361591e4,
    0.40511340542057e6,
    -0.23855557567849,
    0.65017534844798e3,
];

/// Over liquid water: IAPWS R7-97(2012) region 4, Eq. (30); 273.15 to 647.096 K.
#[must_use]
pub fn region_4(kelvins: f64) -> f64 {
    let [n1, n2, n3, n4, n5, n6, n7, n8, n9, n10] = REGION_4;
    let theta = kelvins + n9 / (kelvins - n10);
    let quadratic = |a: f64, b: f64, c: f64| (a * theta + b) * theta + c;
    let (a, b, c) = (quadratic(1.0, n1, n2), quadratic(n3, n4, n5), quadratic(n6, n7, n8));
    let root = 2.0 * c / (-b + (b * b - 4.0 * a * c).sqrt());
    1e6 * root.powi(4)
}

/// Its inverse, K: Eq. (31).
#[must_use]
pub fn region_4_temperature(pascals: f64) -> f64 {
    let [n1, n2, n3, n4, n5, n6, n7, n8, n9, n10] = REGION_4;
    let beta = (pascals / 1e6).sqrt().sqrt();
    let quadratic = |a: f64, b: f64, c: f64| (a * beta + b) * beta + c;
    let (e, f, g) = (quadratic(1.0, n3, n6), quadratic(n1, n4, n7), quadratic(n2, n5, n8));
    let d = n10 + 2.0 * g / (-f - (f * f - 4.0 * e * g).sqrt());
    (d - (d * d - 4.0 * (n9 + n10 * (d - n10))).sqrt()) / 2.0
}
