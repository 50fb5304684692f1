//! The pure substances, each from its own published equation.
//!
//! Water and dry air are published as Helmholtz energies `f(ρ, T) = R T (ln δ + φ°(τ) + φʳ(δ, τ))` with reduced density δ and
//! reduced inverse temperature τ. Functions of temperature alone come as a [`Jet`], so that the mixture can form
//! energies and heat capacities; the residual of a gas comes as the coefficients of its expansion in powers of density.

#[cfg(any(feature = "helmholtz", test))]
pub mod critical_region;
pub mod dry_air;
pub mod ice;
pub mod liquid_water;
pub mod pure_phase;
pub mod superheated_steam;
pub mod transport;
pub mod water;
pub mod water_vapor;

use crate::real::{Real, k, power};

/// A function of temperature with its first two derivatives in the reduced form that Helmholtz equations use:
/// `f`, `τ ∂f/∂τ`, `τ² ∂²f/∂τ²` (any τ ∝ 1/T gives the same).
#[derive(Clone, Copy, Debug)]
pub struct Jet<R> {
    pub value: R,
    pub first: R,
    pub second: R,
}

impl<R: Real> Jet<R> {
    pub fn zero() -> Self {
        Self { value: k(0.0), first: k(0.0), second: k(0.0) }
    }

    /// `n τᵗ` for a given `τᵗ`.
    pub fn power(tau_to_t: R, t: f64, n: f64) -> Self {
        let value = tau_to_t * k(n);
        let first = value * k(t);
        Self { value, first, second: first * k(t - 1.0) }
    }

    /// `n ln(1 − e^{−γτ})`: a harmonic (Einstein) oscillator.
    pub fn oscillator(tau: R, n: f64, gamma: f64) -> Self {
        let x = tau * k(gamma);
        let decay = (-x).exp();
        let rest = k::<R>(1.0) - decay;
        let occupation = decay / rest;
        Self { value: rest.ln() * k(n), first: x * occupation * k(n), second: -(x * x * occupation / rest) * k(n) }
    }

    pub fn plus(self, other: Self) -> Self {
        Self { value: self.value + other.value, first: self.first + other.first, second: self.second + other.second }
    }

    pub fn get(&self, of: TemperatureOrder) -> R {
        match of {
            TemperatureOrder::Value => self.value,
            TemperatureOrder::First => self.first,
            TemperatureOrder::Second => self.second,
        }
    }

    pub fn times(self, factor: R) -> Self {
        Self { value: self.value * factor, first: self.first * factor, second: self.second * factor }
    }
}

/// One term `n δᵈ τᵗ exp(−δᶜ)` of a residual Helmholtz energy (no exponential when `c` is zero).
#[derive(Clone, Copy, Debug)]
pub struct Term {
    pub c: u32,
    pub d: u32,
    pub t: f64,
    pub n: f64,
}

impl Term {
    pub const fn new(c: u32, d: u32, t: f64, n: f64) -> Self {
        Self { c, d, t, n }
    }

    /// Coefficient of `δᵒʳᵈᵉʳ` in `δᵈ exp(−δᶜ) = Σ (−1)ʲ δᵈ⁺ᶜʲ / j!`.
    #[cfg(test)]
    const fn weight(self, order: u32) -> f64 {
        if order < self.d || (self.c == 0 && order != self.d) {
            return 0.0;
        }
        if order == self.d {
            return 1.0;
        }
        if (order - self.d) % self.c != 0 {
            return 0.0;
        }
        let count = (order - self.d) / self.c;
        let mut weight = 1.0;
        let mut j = 1;
        while j <= count {
            weight /= -(j as f64);
            j += 1;
        }
        weight
    }

    /// The weights of orders 1 to `N`.
    #[cfg(test)]
    #[allow(clippy::indexing_slicing, reason = "evaluated at compile time")]
    pub const fn weights<const N: usize, const L: usize>(terms: [Self; L]) -> [[f64; N]; L] {
        let mut table = [[0.0; N]; L];
        let mut i = 0;
        while i < L {
            let mut order = 0;
            while order < N {
                table[i][order] = terms[i].weight(order as u32 + 1);
                order += 1;
            }
            i += 1;
        }
        table
    }
}

/// The residual as `Σₖ aₖ(τ) δᵏ`, k = 1 … N: the virial expansion of its Helmholtz energy, the truth of the fits.
#[cfg(test)]
pub fn density_series<R: Real, const N: usize, const L: usize>(
    terms: &[Term; L],
    weights: &[[f64; N]; L],
    tau: R,
) -> [Jet<R>; N] {
    let ln_tau = tau.ln();
    let mut series = [Jet::zero(); N];
    for (term, weights) in terms.iter().zip(weights) {
        if weights.iter().all(|weight| weight.to_bits() == 0) {
            continue; // a term of higher order only; decided by the table, never by data
        }
        let jet = Jet::power((ln_tau * k(term.t)).exp(), term.t, term.n);
        for (sum, weight) in series.iter_mut().zip(weights) {
            if weight.to_bits() != 0 {
                *sum = sum.plus(jet.times(k(*weight)));
            }
        }
    }
    series
}

/// Which derivative in temperature, in the reduced form of [`Jet`].
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum TemperatureOrder {
    Value,
    First,
    Second,
}

/// `f` with `δ ∂f/∂δ` and `δ² ∂²f/∂δ²`.
#[derive(Clone, Copy, Debug)]
pub struct DensityDerivatives<R> {
    pub value: R,
    pub first: R,
    pub second: R,
}

/// The reduced Helmholtz energy `ln δ + φ° + φʳ` of a pure fluid at one temperature.
pub trait Fluid<R>: Copy {
    /// φ°, τφ°_τ or τ²φ°_ττ, less ln δ.
    fn ideal(&self, of: TemperatureOrder) -> R;

    /// Density derivatives of φʳ, τφʳ_τ or τ²φʳ_ττ.
    fn residual(&self, delta: R, of: TemperatureOrder) -> DensityDerivatives<R>;

    /// Coefficient of δ in φʳ, the reduced second virial coefficient: for the starts of solves.
    fn second_virial(&self) -> R;
}

/// A fluid as published: its ideal part, and its residual as a sum of terms with their `n τᵗ` at this temperature.
#[derive(Clone, Copy, Debug)]
pub struct Terms<R, const L: usize> {
    ideal: Jet<R>,
    terms: &'static [Term; L],
    amplitudes: [R; L],
}

impl<R: Real, const L: usize> Terms<R, L> {
    pub fn at(ideal: Jet<R>, terms: &'static [Term; L], tau: R) -> Self {
        let ln_tau = tau.ln();
        Self { ideal, terms, amplitudes: terms.map(|term| (ln_tau * k(term.t)).exp() * k(term.n)) }
    }
}

impl<R: Real, const L: usize> Fluid<R> for Terms<R, L> {
    fn ideal(&self, of: TemperatureOrder) -> R {
        self.ideal.get(of)
    }

    /// The derivatives of IAPWS R6-95 Table 5, for terms `n δᵈ τᵗ exp(−δᶜ)`.
    fn residual(&self, delta: R, of: TemperatureOrder) -> DensityDerivatives<R> {
        let mut sum = DensityDerivatives { value: k(0.0), first: k(0.0), second: k(0.0) };
        let mut run = (0, k::<R>(0.0), k::<R>(1.0)); // c, δᶜ and exp(−δᶜ), shared by runs of terms
        for (term, amplitude) in self.terms.iter().zip(&self.amplitudes) {
            if term.c != run.0 {
                let cutoff = power(delta, term.c);
                run = (term.c, cutoff, (-cutoff).exp());
            }
            let (_, cutoff, decay) = run;
            let factor = match of {
                TemperatureOrder::Value => 1.0,
                TemperatureOrder::First => term.t,
                TemperatureOrder::Second => term.t * (term.t - 1.0),
            };
            let value = *amplitude * power(delta, term.d) * decay * k(factor);
            let slope = k::<R>(f64::from(term.d)) - cutoff * k(f64::from(term.c));
            let curvature = slope * (slope - k(1.0)) - cutoff * k(f64::from(term.c * term.c));
            sum.value = sum.value + value;
            sum.first = sum.first + value * slope;
            sum.second = sum.second + value * curvature;
        }
        sum
    }

    fn second_virial(&self) -> R {
        let linear = self.terms.iter().zip(&self.amplitudes).filter(|(term, _)| term.d == 1);
        linear.fold(k(0.0), |sum, (_, amplitude)| sum + *amplitude)
    }
}

/// A fluid with its residual expanded in powers of density: coefficients of δ¹ to δᴺ.
#[cfg(test)]
#[derive(Clone, Copy, Debug)]
pub struct Series<R, const N: usize> {
    pub ideal: Jet<R>,
    pub residual: [Jet<R>; N],
}

#[cfg(test)]
impl<R: Real, const N: usize> Fluid<R> for Series<R, N> {
    fn ideal(&self, of: TemperatureOrder) -> R {
        self.ideal.get(of)
    }

    fn residual(&self, delta: R, of: TemperatureOrder) -> DensityDerivatives<R> {
        density_polynomial(delta, self.residual.map(|jet| jet.get(of)))
    }

    fn second_virial(&self) -> R {
        let [second, ..] = self.residual.as_slice() else { return k(0.0) };
        second.value
    }
}

/// `Σₖ aₖ δᵏ`, k = 1 … N, with its derivatives: by Horner's rule from the highest order, with weights 1, k, k(k−1).
pub fn density_polynomial<R: Real, const N: usize>(delta: R, coefficients: [R; N]) -> DensityDerivatives<R> {
    let mut sum = DensityDerivatives { value: k(0.0), first: k(0.0), second: k(0.0) };
    for (i, a) in coefficients.into_iter().enumerate().rev() {
        let order = (i + 1) as f64;
        sum.value = (sum.value + a) * delta;
        sum.first = (sum.first + a * k(order)) * delta;
        sum.second = (sum.second + a * k(order * (order - 1.0))) * delta;
    }
    sum
}

#[cfg(test)]
mod tests;
