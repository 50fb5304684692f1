//! The default real gas: IAPWS G8-10 with its functions of temperature fitted, so that a state costs no more than some polynomials.
//!
//! Every published function of temperature (ideal parts, virial coefficients, Gibbs energies of the condensed phases) is nearly a sum of powers of
//! 1/T. Each is interpolated by one polynomial in a variable linear in 1/T; derivatives in temperature are those of the polynomial, so
//! that the identities of the gas hold whatever the fit is worth; a condensed phase has a polynomial of its own for its enthalpy. `fit.rs` makes the coefficients and measures them.

#[rustfmt::skip]
mod coefficients;
#[cfg(test)]
mod fit;

use self::coefficients as curves;
use super::Steps;
use super::two_component::{HelmholtzMixture, Model, Phase, Warmth};
use crate::quantity::ZERO_CELSIUS;
use crate::real::{Real, k, polynomial, power};
use crate::substance::{
    DensityDerivatives, Fluid, Jet, TemperatureOrder, Term, density_polynomial, dry_air, water, water_vapor,
};

/// Moist air as a virial mixture.
pub type RealGas<R> = HelmholtzMixture<R, Fitted>;

/// Fitted functions of temperature.
#[derive(Clone, Copy, Debug)]
pub struct Fitted;

/// Where a fit holds, °C; beyond, its value at the nearer end stands.
#[derive(Clone, Copy, Debug)]
struct Domain {
    coldest: f64,
    warmest: f64,
}

const GAS: Domain = Domain { coldest: -105.0, warmest: 205.0 };
const ICE: Domain = Domain { coldest: -105.0, warmest: 5.0 };
/// Liquid water in pieces: towards its stability limit the heat capacity rises steeply, and below −37 °C it is continued (see
/// `substance/liquid_water.rs`).
const WARM_LIQUID: Domain = Domain { coldest: -12.0, warmest: 205.0 };
const COLD_LIQUID: Domain = Domain { coldest: -37.0, warmest: WARM_LIQUID.coldest };
const COLDEST_LIQUID: Domain = Domain { coldest: -45.0, warmest: COLD_LIQUID.coldest };

/// Pressure at which the condensed phases are fitted, Pa.
const REFERENCE_PRESSURE: f64 = 101_325.0;

impl Domain {
    /// The temperature midway in 1/T, K.
    const fn middle(self) -> f64 {
        let (cold, warm) = (self.coldest + ZERO_CELSIUS, self.warmest + ZERO_CELSIUS);
        2.0 * cold * warm / (cold + warm)
    }

    /// Slope of the variable in `middle / T`.
    const fn stretch(self) -> f64 {
        let cold = self.coldest + ZERO_CELSIUS;
        cold / (self.middle() - cold)
    }

    fn at<R: Real>(self, celsius: R) -> Place<R> {
        let celsius = celsius.at_least(k(self.coldest)).at_most(k(self.warmest));
        let kelvins = celsius + k(ZERO_CELSIUS);
        // middle / T − 1, from the reading in °C, which in single precision is finer than the kelvins
        let x = (k::<R>(self.middle() - ZERO_CELSIUS) - celsius) * k(self.stretch()) / kelvins;
        Place { kelvins, x, reach: x + k(self.stretch()) }
    }
}

/// A temperature in a domain: the variable of its polynomials, −1 at the warm end to 1 at the cold end, and its distance from 1/T = 0.
#[derive(Clone, Copy, Debug)]
struct Place<R> {
    kelvins: R,
    x: R,
    reach: R,
}

impl<R: Real> Place<R> {
    /// A polynomial f as f, τ ∂f/∂τ or τ² ∂²f/∂τ²: the variable is linear in 1/T, so that τ ∂/∂τ = reach ∂/∂x.
    fn curve<const N: usize>(&self, coefficients: &[f64; N], of: TemperatureOrder) -> R {
        match of {
            TemperatureOrder::Value => polynomial(self.x, *coefficients),
            TemperatureOrder::First => self.reach * self.horner(coefficients, |n| n),
            TemperatureOrder::Second => self.reach * self.reach * self.horner(coefficients, |n| n * (n - 1.0)),
        }
    }

    fn value<const N: usize>(&self, coefficients: &[f64; N]) -> R {
        self.curve(coefficients, TemperatureOrder::Value)
    }

    /// A derivative of a polynomial: the factor of the coefficient of order n is zero where the derivative has no such term.
    fn horner<const N: usize>(&self, coefficients: &[f64; N], factor: impl Fn(f64) -> f64) -> R {
        let mut sum = k::<R>(0.0);
        for (i, c) in coefficients.iter().enumerate().rev() {
            let factor = factor(i as f64);
            if factor > 0.0 {
                sum = sum * self.x + k(c * factor);
            }
        }
        sum
    }

    fn jet<const N: usize>(&self, coefficients: &[f64; N]) -> Jet<R> {
        let [value, first, second] = [TemperatureOrder::Value, TemperatureOrder::First, TemperatureOrder::Second]
            .map(|of| self.curve(coefficients, of));
        Jet { value, first, second }
    }
}

/// Dry air.
#[derive(Clone, Copy, Debug)]
pub struct Air<R> {
    place: Place<R>,
    residual: [R; dry_air::ORDERS],
}

impl<R: Real> Air<R> {
    fn residual_at(place: &Place<R>, of: TemperatureOrder) -> [R; dry_air::ORDERS] {
        [
            place.curve(&curves::AIR_1, of),
            place.curve(&curves::AIR_2, of),
            place.curve(&curves::AIR_3, of),
            place.curve(&curves::AIR_4, of),
            place.curve(&curves::AIR_5, of),
        ]
    }
}

impl<R: Real> Fluid<R> for Air<R> {
    fn ideal(&self, of: TemperatureOrder) -> R {
        self.place.curve(&curves::AIR_IDEAL, of)
    }

    fn residual(&self, delta: R, of: TemperatureOrder) -> DensityDerivatives<R> {
        let coefficients = match of {
            TemperatureOrder::Value => self.residual,
            _ => Self::residual_at(&self.place, of),
        };
        density_polynomial(delta, coefficients)
    }

    fn second_virial(&self) -> R {
        let [second, ..] = self.residual;
        second
    }
}

/// Water vapor.
#[derive(Clone, Copy, Debug)]
pub struct Water<R> {
    place: Place<R>,
    steep: Steep<R>,
    residual: [R; water_vapor::ORDERS],
}

impl<R: Real> Water<R> {
    fn residual_at(place: &Place<R>, steep: &Steep<R>, of: TemperatureOrder) -> [R; water_vapor::ORDERS] {
        let [third, fourth, fifth, sixth] = steep.orders(of);
        [
            place.curve(&curves::WATER_1, of),
            place.curve(&curves::WATER_2, of),
            place.curve(&curves::WATER_3, of) + third,
            place.curve(&curves::WATER_4, of) + fourth,
            place.curve(&curves::WATER_5, of) + fifth,
            place.curve(&curves::WATER_6, of) + sixth,
        ]
    }
}

impl<R: Real> Fluid<R> for Water<R> {
    fn ideal(&self, of: TemperatureOrder) -> R {
        self.place.curve(&curves::WATER_IDEAL, of)
    }

    fn residual(&self, delta: R, of: TemperatureOrder) -> DensityDerivatives<R> {
        let coefficients = match of {
            TemperatureOrder::Value => self.residual,
            _ => Self::residual_at(&self.place, &self.steep, of),
        };
        density_polynomial(delta, coefficients)
    }

    fn second_virial(&self) -> R {
        let [second, ..] = self.residual;
        second
    }
}

/// The powers of τ in [`STEEP`]: too steep for a polynomial, and cheap as they are.
#[derive(Clone, Copy, Debug)]
struct Steep<R> {
    /// τ¹⁶, τ²², τ²³, τ⁴⁴, τ⁴⁶, τ⁵⁰
    powers: [R; 6],
}

/// The terms of R6-95 with c ≥ 3 that reach the third to sixth order of density, in the order of the release.
#[allow(clippy::indexing_slicing, reason = "evaluated at compile time")]
const STEEP: [Term; 8] = {
    let terms = water::TERMS;
    [terms[42], terms[43], terms[44], terms[45], terms[47], terms[48], terms[49], terms[50]]
};

impl<R: Real> Steep<R> {
    fn at(kelvins: R) -> Self {
        let tau = k::<R>(water::CRITICAL_TEMPERATURE) / kelvins;
        let (fourth, sixteenth) = (power(tau, 4), power(tau, 16));
        let twenty_second = sixteenth * fourth * tau * tau;
        let twenty_third = twenty_second * tau;
        let forty_sixth = twenty_third * twenty_third;
        let forty_fourth = twenty_second * twenty_second;
        Self { powers: [sixteenth, twenty_second, twenty_third, forty_fourth, forty_sixth, forty_sixth * fourth] }
    }

    /// Coefficients of δ³ to δ⁶. By exp(−δ³) the first term counts in the sixth order too, with the opposite sign.
    fn orders(&self, of: TemperatureOrder) -> [R; 4] {
        let [third, fourth, fourth_too, fifth, third_too, sixth, sixth_too, sixth_last] = STEEP.map(|term| {
            k::<R>(match of {
                TemperatureOrder::Value => term.n,
                TemperatureOrder::First => term.n * term.t,
                TemperatureOrder::Second => term.n * term.t * (term.t - 1.0),
            })
        });
        let [p16, p22, p23, p44, p46, p50] = self.powers;
        let first = p16 * third;
        [
            first + p50 * third_too,
            p22 * fourth + p23 * fourth_too,
            p23 * fifth,
            p44 * sixth + p46 * sixth_too + p50 * sixth_last - first,
        ]
    }
}

/// A condensed phase at [`REFERENCE_PRESSURE`].
struct Curves<const P: usize, const H: usize, const V: usize, const C: usize> {
    /// g/(R_w T) − φ° − 1
    potential: [f64; P],
    /// J/kg
    enthalpy: [f64; H],
    /// m³/kg
    volume: [f64; V],
    /// v κ, what compression takes from the volume, m³/(kg Pa)
    compression: [f64; C],
}

impl Domain {
    fn phase<R: Real, const P: usize, const H: usize, const V: usize, const C: usize>(
        self,
        celsius: R,
        pressure: R,
        curves: &Curves<P, H, V, C>,
    ) -> Phase<R> {
        let place = self.at(celsius);
        let above = pressure - k(REFERENCE_PRESSURE);
        let half_square = above * above * k(0.5);
        let (volume, compression) = (place.value(&curves.volume), place.value(&curves.compression));
        // g = g₀ + v Δp − v κ Δp²/2, and h = g − T ∂g/∂T
        let work = above * volume - half_square * compression;
        let heat = above * place.curve(&curves.volume, TemperatureOrder::First)
            - half_square * place.curve(&curves.compression, TemperatureOrder::First);
        Phase {
            potential: place.value(&curves.potential) + work / (place.kelvins * k(water_vapor::GAS_CONSTANT)),
            enthalpy: place.value(&curves.enthalpy) + work + heat,
            volume: volume - above * compression,
        }
    }
}

impl<R: Real> Model<R> for Fitted {
    const FORMULATION: crate::Formulation = crate::Formulation::RealGas;
    const STEPS: Steps = Steps::TO_150_CELSIUS;
    type Air = Air<R>;
    type Water = Water<R>;
    const DENSITY_STEPS: usize = 2;
    const SATURATION_STEPS: usize = 2;
    const PURE_STEPS: usize = 2;

    fn air(at: &Warmth<R>) -> Self::Air {
        let place = GAS.at(at.celsius);
        Air { place, residual: Air::residual_at(&place, TemperatureOrder::Value) }
    }

    fn water(at: &Warmth<R>) -> Self::Water {
        let (place, steep) = (GAS.at(at.celsius), Steep::at(at.kelvins));
        Water { place, steep, residual: Water::residual_at(&place, &steep, TemperatureOrder::Value) }
    }

    fn cross_second_virial(at: &Warmth<R>) -> Jet<R> {
        GAS.at(at.celsius).jet(&curves::CROSS_SECOND_VIRIAL)
    }

    fn liquid(celsius: R, pressure: R) -> Phase<R> {
        let warm = || WARM_LIQUID.phase(celsius, pressure, &curves::WARM_LIQUID);
        let cold = || COLD_LIQUID.phase(celsius, pressure, &curves::COLD_LIQUID);
        let coldest = || COLDEST_LIQUID.phase(celsius, pressure, &curves::COLDEST_LIQUID);
        R::pick(celsius.lt(k(WARM_LIQUID.coldest)), || R::pick(celsius.lt(k(COLD_LIQUID.coldest)), coldest, cold), warm)
    }

    fn ice(celsius: R, pressure: R) -> Phase<R> {
        ICE.phase(celsius, pressure, &curves::ICE)
    }
}
