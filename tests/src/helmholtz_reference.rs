//! IAPWS G8-10 in full and by itself: Helmholtz energy with all 56 terms of IAPWS-95, all of dry air's, the cross terms; ice by
//! R10-06. Derivatives by forward differentiation, solves by the secant rule: slow, plain, and nothing shared with the library.
#![allow(clippy::disallowed_methods, reason = "the platform's functions, so as to share nothing with the library")]
#![allow(clippy::suspicious_arithmetic_impl, reason = "the product rule adds")]
#![allow(clippy::type_complexity, reason = "tables of coefficients as published")]

use std::ops::{Add, Div, Mul, Neg, Sub};

/// A value with its derivatives by air fraction A, temperature T and density ρ.
#[derive(Clone, Copy, Debug)]
pub struct Derived {
    /// f
    pub value: f64,
    /// f_A, f_T, f_ρ
    pub slopes: [f64; 3],
}

impl Derived {
    fn constant(value: f64) -> Self {
        Self { value, slopes: [0.0; 3] }
    }
    fn variable(value: f64, index: usize) -> Self {
        let mut slopes = [0.0; 3];
        slopes[index] = 1.0;
        Self { value, slopes }
    }
    fn chain(self, value: f64, slope: f64) -> Self {
        Self { value, slopes: self.slopes.map(|s| s * slope) }
    }
    fn exp(self) -> Self {
        let value = self.value.exp();
        self.chain(value, value)
    }
    fn ln(self) -> Self {
        self.chain(self.value.ln(), 1.0 / self.value)
    }
    fn powf(self, exponent: f64) -> Self {
        if exponent == 0.0 {
            return Self::constant(1.0);
        }
        self.chain(self.value.powf(exponent), exponent * self.value.powf(exponent - 1.0))
    }
    fn powi(self, exponent: i32) -> Self {
        if exponent == 0 {
            return Self::constant(1.0);
        }
        self.chain(self.value.powi(exponent), f64::from(exponent) * self.value.powi(exponent - 1))
    }
}

impl Add for Derived {
    type Output = Self;
    fn add(self, other: Self) -> Self {
        Self { value: self.value + other.value, slopes: std::array::from_fn(|i| self.slopes[i] + other.slopes[i]) }
    }
}
impl Mul for Derived {
    type Output = Self;
    fn mul(self, other: Self) -> Self {
        Self {
            value: self.value * other.value,
            slopes: std::array::from_fn(|i| self.slopes[i] * other.value + self.value * other.slopes[i]),
        }
    }
}
impl Neg for Derived {
    type Output = Self;
    fn neg(self) -> Self {
        self.chain(-self.value, -1.0)
    }
}
impl Sub for Derived {
    type Output = Self;
    fn sub(self, other: Self) -> Self {
        self + -other
    }
}
impl Div for Derived {
    type Output = Self;
    fn div(self, other: Self) -> Self {
        self * other.chain(1.0 / other.value, -1.0 / (other.value * other.value))
    }
}
macro_rules! with_numbers {
    ($($trait:ident $method:ident),*) => {$(
        impl $trait<f64> for Derived {
            type Output = Self;
            fn $method(self, other: f64) -> Self {
                self.$method(Self::constant(other))
            }
        }
    )*};
}
with_numbers!(Add add, Sub sub, Mul mul, Div div);

/// c, d, t, n of terms 1 to 51: R6-95 Table 2.
const POLYNOMIAL: [(i32, i32, f64, f64); 51] = [
    (0, 1, -0.5, 0.012533547935523),
    (0, 1, 0.875, 7.8957634722828),
    (0, 1, 1.0, -8.7803203303561),
    (0, 2, 0.5, 0.31802509345418),
    (0, 2, 0.75, -0.26145533859358),
    (0, 3, 0.375, -0.0078199751687981),
    (0, 4, 1.0, 0.0088089493102134),
    (1, 1, 4.0, -0.66856572307965),
    (1, 1, 6.0, 0.20433810950965),
    (1, 1, 12.0, -6.6212605039687e-05),
    (1, 2, 1.0, -0.19232721156002),
    (1, 2, 5.0, -0.25709043003438),
    (1, 3, 4.0, 0.16074868486251),
    (1, 4, 2.0, -0.040092828925807),
    (1, 4, 13.0, 3.9343422603254e-07),
    (1, 5, 9.0, -7.5941377088144e-06),
    (1, 7, 3.0, 0.00056250979351888),
    (1, 9, 4.0, -1.5608652257135e-05),
    (1, 10, 11.0, 1.1537996422951e-09),
    (1, 11, 4.0, 3.6582165144204e-07),
    (1, 13, 13.0, -1.3251180074668e-12),
    (1, 15, 1.0, -6.2639586912454e-10),
    (2, 1, 7.0, -0.10793600908932),
    (2, 2, 1.0, 0.017611491008752),
    (2, 2, 9.0, 0.22132295167546),
    (2, 2, 10.0, -0.40247669763528),
    (2, 3, 10.0, 0.58083399985759),
    (2, 4, 3.0, 0.0049969146990806),
    (2, 4, 7.0, -0.031358700712549),
    (2, 4, 10.0, -0.74315929710341),
    (2, 5, 10.0, 0.4780732991548),
    (2, 6, 6.0, 0.020527940895948),
    (2, 6, 10.0, -0.13636435110343),
    (2, 7, 10.0, 0.014180634400617),
    (2, 9, 1.0, 0.0083326504880713),
    (2, 9, 2.0, -0.029052336009585),
    (2, 9, 3.0, 0.038615085574206),
    (2, 9, 4.0, -0.020393486513704),
    (2, 9, 8.0, -0.0016554050063734),
    (2, 10, 6.0, 0.0019955571979541),
    (2, 10, 9.0, 0.00015870308324157),
    (2, 12, 8.0, -1.638856834253e-05),
    (3, 3, 16.0, 0.043613615723811),
    (3, 4, 22.0, 0.034994005463765),
    (3, 4, 23.0, -0.076788197844621),
    (3, 5, 23.0, 0.022446277332006),
    (4, 14, 10.0, -6.2689710414685e-05),
    (6, 3, 50.0, -5.5711118565645e-10),
    (6, 6, 44.0, -0.19905718354408),
    (6, 6, 46.0, 0.31777497330738),
    (6, 6, 50.0, -0.11841182425981),
];

/// d, t, n, α, β, γ, ε of terms 52 to 54.
const BELLS: [(f64, f64, f64, f64, f64, f64, f64); 3] = [
    (3.0, 0.0, -31.306260323435, 20.0, 150.0, 1.21, 1.0),
    (3.0, 1.0, 31.546140237781, 20.0, 150.0, 1.21, 1.0),
    (3.0, 4.0, -2521.3154341695, 20.0, 250.0, 1.25, 1.0),
];

/// a, b, B, n, C, D, A, β of terms 55 and 56.
const CUSPS: [(f64, f64, f64, f64, f64, f64, f64, f64); 2] = [
    (3.5, 0.85, 0.2, -0.14874640856724, 28.0, 700.0, 0.32, 0.3),
    (3.5, 0.95, 0.2, 0.31806110878444, 32.0, 800.0, 0.32, 0.3),
];

/// i, j, l, n: G8-10 Table 4.
const AIR: [(i32, f64, i32, f64); 19] = [
    (1, 0.0, 0, 0.118160747229),
    (1, 0.33, 0, 0.713116392079),
    (1, 1.01, 0, -0.161824192067e1),
    (2, 0.0, 0, 0.714140178971e-1),
    (3, 0.0, 0, -0.865421396646e-1),
    (3, 0.15, 0, 0.134211176704),
    (4, 0.0, 0, 0.112626704218e-1),
    (4, 0.2, 0, -0.420533228842e-1),
    (4, 0.35, 0, 0.349008431982e-1),
    (6, 1.35, 0, 0.164957183186e-3),
    (1, 1.6, 1, -0.101365037912),
    (3, 0.8, 1, -0.173813690970),
    (5, 0.95, 1, -0.472103183731e-1),
    (6, 1.25, 1, -0.122523554253e-1),
    (1, 3.6, 2, -0.146629609713),
    (3, 6.0, 2, -0.316055879821e-1),
    (11, 3.25, 2, 0.233594806142e-3),
    (1, 3.5, 3, 0.148287891978e-1),
    (3, 15.0, 3, -0.938782884667e-2),
];

const R_WATER: f64 = 461.51805;
const M_WATER: f64 = 0.018015268;
const M_AIR: f64 = 0.02896546;

/// φ° + φʳ of water: R6-95 Eq. (5) and (6).
fn water_function(delta: Derived, tau: Derived) -> Derived {
    let oscillators = [
        (0.012436, 1.28728967),
        (0.97315, 3.53734222),
        (1.27950, 7.74073708),
        (0.96956, 9.24437796),
        (0.24873, 27.5075105),
    ];
    let mut sum = delta.ln() + tau * 6.6832105275932 + tau.ln() * 3.00632 - 8.3204464837497;
    for (n, gamma) in oscillators {
        sum = sum + (-((tau * -gamma).exp() - 1.0)).ln() * n;
    }
    for (c, d, t, n) in POLYNOMIAL {
        let term = delta.powi(d) * tau.powf(t) * n;
        sum = sum + if c == 0 { term } else { term * (-delta.powi(c)).exp() };
    }
    let apart = delta - 1.0;
    for (d, t, n, alpha, beta, gamma, epsilon) in BELLS {
        let (x, y) = (delta - epsilon, tau - gamma);
        sum = sum + delta.powf(d) * tau.powf(t) * (-(x * x * alpha) - y * y * beta).exp() * n;
    }
    for (a, b, big_b, n, c, d, big_a, beta) in CUSPS {
        let square = apart * apart;
        let theta = -(tau - 1.0) + square.powf(1.0 / (2.0 * beta)) * big_a;
        let distance = theta * theta + square.powf(a) * big_b;
        let psi = (-(square * c) - (tau - 1.0) * (tau - 1.0) * d).exp();
        sum = sum + distance.powf(b) * delta * psi * n;
    }
    sum
}

/// α° + αʳ of dry air: G8-10 Eq. (5) to (7).
fn air_function(delta: Derived, tau: Derived) -> Derived {
    let powers = [
        (0.605719400e-7, -3.0),
        (-0.210274769e-4, -2.0),
        (-0.158860716e-3, -1.0),
        (0.974502517439480e1, 0.0),
        (0.100986147428912e2, 1.0),
        (-0.195363420e-3, 1.5),
    ];
    let mut sum = delta.ln() + tau.ln() * 0.249088803200e1;
    for (n, t) in powers {
        sum = sum + tau.powf(t) * n;
    }
    for (n, gamma) in [(0.791309509, 0.253636500e2), (0.212236768, 0.169074100e2)] {
        sum = sum + (-((tau * -gamma).exp() - 1.0)).ln() * n;
    }
    sum = sum + ((tau * 0.873127900e2).exp() + 2.0 / 3.0).ln() * -0.197938904;
    for (i, j, l, n) in AIR {
        let term = delta.powi(i) * tau.powf(j) * n;
        sum = sum + if l == 0 { term } else { term * (-delta.powi(l)).exp() };
    }
    sum
}

/// B_aw, C_aaw, C_aww: G8-10 Eq. (11) to (13).
fn cross_virials(kelvins: Derived) -> (Derived, Derived, Derived) {
    let theta = kelvins / 100.0;
    let mut b = Derived::constant(0.0);
    for (c, d) in [(0.665687e2, -0.237), (-0.238834e3, -1.048), (-0.176755e3, -3.183)] {
        b = b + theta.powf(d) * (c * 1e-6);
    }
    let series = |coefficients: &[f64]| {
        let mut sum = Derived::constant(0.0);
        for (i, c) in coefficients.iter().enumerate() {
            sum = sum + theta.powi(-(i as i32)) * *c;
        }
        sum
    };
    let caaw = series(&[0.482737e-3, 0.105678e-2, -0.656394e-2, 0.294442e-1, -0.319317e-1]) * 1e-6;
    let caww = series(&[-0.10728876e2, 0.347802e2, -0.383383e2, 0.33406e2]).exp() * -1e-6;
    (b, caaw, caww)
}

/// f(A, T, ρ) in J/kg: G8-10 Eq. (1).
pub fn helmholtz(air: f64, kelvins: f64, density: f64) -> Derived {
    let (a, t, rho) = (Derived::variable(air, 0), Derived::variable(kelvins, 1), Derived::variable(density, 2));
    let w = -(a - 1.0);
    let of_water = t * R_WATER * water_function(w * rho / 322.0, Derived::constant(647.096) / t);
    let of_air = t * (8.31451 / M_AIR) * air_function(a * rho / (10447.7 * M_AIR), Derived::constant(132.6312) / t);
    let (baw, caaw, caww) = cross_virials(t);
    let third = rho * 0.75 * (a * caaw / M_AIR + w * caww / M_WATER);
    let mix = a * w * rho * t * (2.0 * 8.314472 / (M_AIR * M_WATER)) * (baw + third);
    w * of_water + a * of_air + mix
}

/// f(T, ρ) of water alone, R6-95; its slope by A is zero.
pub fn water(kelvins: f64, density: f64) -> Derived {
    let (t, rho) = (Derived::variable(kelvins, 1), Derived::variable(density, 2));
    t * R_WATER * water_function(rho / 322.0, Derived::constant(647.096) / t)
}

/// The root of `f` from two starts, by the secant rule.
fn secant(mut a: f64, mut b: f64, f: impl Fn(f64) -> f64) -> f64 {
    let mut value = f(a);
    for _ in 0..60 {
        let other = f(b);
        let step = other * (b - a) / (other - value);
        if !step.is_finite() || step == 0.0 {
            break;
        }
        (a, value) = (b, other);
        b -= step;
        if step.abs() <= 1e-15 * b.abs() {
            break;
        }
    }
    b
}

/// Density of moist air, kg/m³.
pub fn density(air: f64, kelvins: f64, pascals: f64) -> f64 {
    let gas_constant = air * 8.31451 / M_AIR + (1.0 - air) * R_WATER;
    let ideal = pascals / (gas_constant * kelvins);
    secant(ideal, 1.01 * ideal, |rho| rho * rho * helmholtz(air, kelvins, rho).slopes[2] - pascals)
}

/// μ_w of moist air of a humidity ratio, J/kg.
fn potential(ratio: f64, kelvins: f64, pascals: f64) -> f64 {
    let air = 1.0 / (1.0 + ratio);
    let rho = density(air, kelvins, pascals);
    let f = helmholtz(air, kelvins, rho);
    f.value + rho * f.slopes[2] - air * f.slopes[0]
}

/// Gibbs energy of liquid water, J/kg.
pub fn liquid_potential(kelvins: f64, pascals: f64) -> f64 {
    let rho = secant(1_000.0, 1_000.5, |rho| rho * rho * water(kelvins, rho).slopes[2] - pascals);
    water(kelvins, rho).value + pascals / rho
}

/// Gibbs energy of ice, J/kg: R10-06 Eq. (1) to (3).
pub fn ice_potential(kelvins: f64, pascals: f64) -> f64 {
    type Complex = (f64, f64);
    let times = |a: Complex, b: Complex| (a.0 * b.0 - a.1 * b.1, a.0 * b.1 + a.1 * b.0);
    let add = |a: Complex, b: Complex, scale: f64| (a.0 + scale * b.0, a.1 + scale * b.1);
    let ln = |a: Complex| (0.5 * (a.0 * a.0 + a.1 * a.1).ln(), a.1.atan2(a.0));
    let over = |a: f64, b: Complex| (a * b.0 / (b.0 * b.0 + b.1 * b.1), -a * b.1 / (b.0 * b.0 + b.1 * b.1));
    let (tau, y) = (kelvins / 273.16, (pascals - 101_325.0) / 611.657);
    let g0 =
        [-0.632020233335886e6, 0.655022213658955, -0.189369929326131e-7, 0.339746123271053e-14, -0.556464869058991e-21];
    let g0: f64 = g0.iter().enumerate().map(|(i, g)| g * y.powi(i as i32)).sum();
    let (t1, r1) = ((0.368017112855051e-1, 0.510878114959572e-1), (0.447050716285388e2, 0.656876847463481e2));
    let t2 = (0.337315741065416, 0.335449415919309);
    let r2 = add((-0.725974574329220e2, -0.781008427112870e2), (-0.557107698030123e-4, 0.464578634580806e-4), y);
    let r2 = add(r2, (0.234801409215913e-10, -0.285651142904972e-10), y * y);
    let vibration = |t: Complex| {
        let (below, above) = (add(t, (1.0, 0.0), -tau), add(t, (1.0, 0.0), tau));
        let sum = add(times(below, ln(below)), times(above, ln(above)), 1.0);
        add(add(sum, times(t, ln(t)), -2.0), over(tau * tau, t), -1.0)
    };
    let real = times(r1, vibration(t1)).0 + times(r2, vibration(t2)).0;
    g0 + 0.332733756492168e4 * kelvins + 273.16 * real
}

/// Humidity ratio of saturation: μ_w of the gas equal to the Gibbs energy of a condensed phase; from a start near it.
pub fn saturation_ratio(kelvins: f64, pascals: f64, condensed: f64, start: f64) -> f64 {
    let target = |ln_ratio: f64| potential(ln_ratio.exp(), kelvins, pascals) - condensed;
    secant(start.ln() - 2e-3, start.ln() + 3e-3, target).exp()
}

/// Pressure at which vapor and a condensed phase, whose Gibbs energy is given by the pressure, are in equilibrium; from a start near it.
pub fn saturation_pressure(kelvins: f64, condensed: impl Fn(f64) -> f64, start: f64) -> f64 {
    let pressure = |rho: f64| rho * rho * water(kelvins, rho).slopes[2];
    let unequal = |ln_rho: f64| {
        let rho = ln_rho.exp();
        water(kelvins, rho).value + pressure(rho) / rho - condensed(pressure(rho))
    };
    let ideal = (start / (R_WATER * kelvins)).ln();
    pressure(secant(ideal - 2e-3, ideal + 3e-3, unequal).exp())
}

/// Water mole fraction of a humidity ratio.
pub fn mole_fraction(ratio: f64) -> f64 {
    ratio / (ratio + M_WATER / M_AIR)
}
