//! Terms 55 and 56, by which the heat capacity rises to its peak at the critical point. At the densest vapor of a state they are less than
//! 1e-40: only the tests, which reproduce the release's tables near that point, have a use for them.

use crate::real::{Real, k};
use crate::substance::{Fluid, TemperatureOrder, water};

use super::Complete;

/// φ, δφ_δ, δ²φ_δδ, τφ_τ, τ²φ_ττ, δτφ_δτ.
pub type Derivatives<R> = [R; 6];

/// `n Δᵇ δ ψ` with `Δ = θ² + B[(δ−1)²]ᵃ`, `θ = (1−τ) + A[(δ−1)²]^{1/2β}`, `ψ = exp(−C(δ−1)² − D(τ−1)²)`.
struct Cusp {
    a: f64,
    b: f64,
    big_b: f64,
    n: f64,
    c: f64,
    d: f64,
    big_a: f64,
    beta: f64,
}

const CUSPS: [Cusp; 2] = [
    Cusp { a: 3.5, b: 0.85, big_b: 0.2, n: -0.14874640856724, c: 28.0, d: 700.0, big_a: 0.32, beta: 0.3 },
    Cusp { a: 3.5, b: 0.95, big_b: 0.2, n: 0.31806110878444, c: 32.0, d: 800.0, big_a: 0.32, beta: 0.3 },
];

impl Cusp {
    fn derivatives<R: Real>(&self, delta: R, tau: R) -> Derivatives<R> {
        let (x, y) = (delta - k(1.0), tau - k(1.0));
        let square = x * x;
        let to = |exponent: f64| (square.ln() * k(exponent)).exp();
        let e = 0.5 / self.beta;
        let theta = to(e) * k(self.big_a) - y;
        let theta_delta = x * to(e - 1.0) * k(2.0 * e * self.big_a);
        let theta_delta_delta = to(e - 1.0) * k(2.0 * e * (2.0 * e - 1.0) * self.big_a);
        let distance = theta * theta + to(self.a) * k(self.big_b);
        let twice = theta * k(2.0);
        // Δ_δ, Δ_δδ, Δ_τ = −2θ, Δ_ττ = 2, Δ_δτ = −2θ_δ, each over Δ and times δ or τ.
        let of_delta = (twice * theta_delta + x * to(self.a - 1.0) * k(2.0 * self.a * self.big_b)) * delta / distance;
        let of_delta_delta = (theta_delta * theta_delta * k(2.0)
            + twice * theta_delta_delta
            + to(self.a - 1.0) * k(2.0 * self.a * (2.0 * self.a - 1.0) * self.big_b))
            * delta
            * delta
            / distance;
        let of_tau = -(twice * tau / distance);
        let of_tau_tau = tau * tau * k(2.0) / distance;
        let of_delta_tau = -(theta_delta * delta * tau * k(2.0) / distance);
        let b = k::<R>(self.b);
        let exponent = distance.ln() * b - square * k(self.c) - y * y * k(self.d);
        product(
            delta * exponent.exp() * k(self.n),
            b * of_delta + k(1.0) - delta * x * k(2.0 * self.c),
            b * of_tau - tau * y * k(2.0 * self.d),
            b * (of_delta + of_delta_delta - of_delta * of_delta) - delta * (delta + x) * k(2.0 * self.c),
            b * (of_tau + of_tau_tau - of_tau * of_tau) - tau * (tau + y) * k(2.0 * self.d),
            b * (of_delta_tau - of_delta * of_tau),
        )
    }
}

/// The derivatives of a function from its logarithmic slopes u = ∂ ln f/∂ ln δ, v = ∂ ln f/∂ ln τ and theirs: ∂u/∂ ln δ, ∂v/∂ ln τ,
/// ∂u/∂ ln τ.
fn product<R: Real>(value: R, u: R, v: R, u_delta: R, v_tau: R, u_tau: R) -> Derivatives<R> {
    [value, value * u, value * (u * u + u_delta - u), value * v, value * (v * v + v_tau - v), value * (u * v + u_tau)]
}

/// Terms 55 and 56; not at the critical point itself, where the release defines no second derivatives.
pub fn cusps<R: Real>(delta: R, tau: R) -> Derivatives<R> {
    CUSPS.iter().map(|cusp| cusp.derivatives(delta, tau)).fold([k(0.0); 6], sum)
}

fn at<R: Real>(tau: R) -> Complete<R> {
    Complete::at(k::<R>(water::CRITICAL_TEMPERATURE) / tau)
}

/// Terms 52 to 56 alone.
pub fn of_the_critical_region<R: Real>(delta: R, tau: R) -> Derivatives<R> {
    let mut bells = at(tau);
    bells.terms.amplitudes = bells.terms.amplitudes.map(|_| k(0.0));
    sum(of(&bells, delta), cusps(delta, tau))
}

/// All 56 terms.
pub fn residual<R: Real>(delta: R, tau: R) -> Derivatives<R> {
    sum(of(&at(tau), delta), cusps(delta, tau))
}

/// The six derivatives of a residual.
pub fn of<R: Real>(fluid: &impl Fluid<R>, delta: R) -> Derivatives<R> {
    let [value, first, second] = [TemperatureOrder::Value, TemperatureOrder::First, TemperatureOrder::Second]
        .map(|order| fluid.residual(delta, order));
    [value.value, value.first, value.second, first.value, second.value, first.first]
}

fn sum<R: Real>(a: Derivatives<R>, b: Derivatives<R>) -> Derivatives<R> {
    let mut sum = a;
    for (place, term) in sum.iter_mut().zip(b) {
        *place = *place + term;
    }
    sum
}
