//! Moist air from the Helmholtz energies of its components: IAPWS G8-10.
//!
//! With the partial densities ρ_a, ρ_w of dry air and water, and Ψ = F/T the Helmholtz energy per volume over temperature,
//!
//! Ψ = ρ_a R_a (ln δ_a + α°ₐ + αʳ(δ_a)) + ρ_w R_w (ln δ_w + φ°_w + φʳ(δ_w))
//!   + κ ρ_a ρ_w (B_aw + ¾ (ρ_a C_aaw / M_a + ρ_w C_aww / M_w)),   κ = 2R / (M_a M_w)   (G8-10 Eq. (1), (2), (10)),
//!
//! everything else follows by differentiation: p/T = ρ_a Ψ_a + ρ_w Ψ_w − Ψ, μ_w/T = Ψ_w, and U/T = τΨ_τ. Where the functions of
//! temperature and the residuals αʳ, φʳ come from is the choice of a [`Model`].

use super::{Gas, Mixture, Potentials, Saturation, Steps};
use crate::quantity::ZERO_CELSIUS;
use crate::real::{Choose, Real, k};
use crate::saturation::{Surface, hyland_wexler_ice, hyland_wexler_liquid};
use crate::solve;
use crate::substance::pure_phase::PurePhase;
use crate::substance::{DensityDerivatives, Fluid, Jet, TemperatureOrder, dry_air, ice, liquid_water, water_vapor};

/// Newton steps for the melting temperature; see the tests of the models.
const MELTING_STEPS: usize = 2;

/// Between these, °C, ice and liquid are compared; the melting temperature lies between −0.37 and 0.01 °C up to 5 MPa.
const BOTH_PHASES: (f64, f64) = (-0.5, 0.02);

/// 2R / (M_a M_w) with R = 8.314472 J/(mol K): G8-10 Eq. (2) and Table 2.
const KAPPA: f64 = 2.0 * 8.314472 / (dry_air::MOLAR_MASS * water_vapor::MOLAR_MASS);

/// Where the parts of the mixture come from.
pub trait Model<R: Real>: Copy {
    /// Which formulation it stands for.
    const FORMULATION: crate::Formulation;

    /// Steps of the solves over the mixture.
    const STEPS: Steps;

    /// Dry air and water vapor, each alone.
    type Air: Fluid<R>;
    type Water: Fluid<R>;

    /// Newton steps for the density at given temperature, pressure and composition; for saturation; for pure saturation. The test of
    /// each model shows them to be enough and none to be idle.
    const DENSITY_STEPS: usize;
    const SATURATION_STEPS: usize;
    const PURE_STEPS: usize;

    fn air(at: &Warmth<R>) -> Self::Air;
    fn water(at: &Warmth<R>) -> Self::Water;

    fn cross_second_virial(at: &Warmth<R>) -> Jet<R> {
        cross_second_virial(at.kelvins)
    }

    fn liquid(celsius: R, pressure: R) -> Phase<R> {
        Phase::of(celsius, liquid_water::at(celsius, pressure))
    }

    fn ice(celsius: R, pressure: R) -> Phase<R> {
        Phase::of(celsius, ice::at(celsius, pressure))
    }
}

/// A temperature on both scales: the reading in °C keeps bits that its sum with 273.15 K loses.
#[derive(Clone, Copy, Debug)]
pub struct Warmth<R> {
    pub celsius: R,
    pub kelvins: R,
}

impl<R: Real> Warmth<R> {
    pub fn of(celsius: R) -> Self {
        Self { celsius, kelvins: celsius + k(ZERO_CELSIUS) }
    }
}

/// A condensed phase as the gas beside it needs it.
#[derive(Clone, Copy, Debug)]
pub struct Phase<R> {
    /// g / (R_w T) − φ° − 1: the logarithm of the reduced density at which water vapor would be in equilibrium, were it ideal.
    pub potential: R,
    /// J/kg
    pub enthalpy: R,
    /// m³/kg
    pub volume: R,
}

impl<R: Real> Phase<R> {
    pub fn of(celsius: R, condensed: PurePhase<R>) -> Self {
        let kelvins = celsius + k(ZERO_CELSIUS);
        let reduced = condensed.gibbs / (kelvins * k(water_vapor::GAS_CONSTANT));
        let potential = reduced - water_vapor::ideal(kelvins).value - k(1.0);
        Self { potential, enthalpy: condensed.enthalpy, volume: condensed.volume }
    }
}

impl<R: Real> Choose<R> for Phase<R> {
    fn choose(mask: R::Mask, a: Self, b: Self) -> Self {
        Self {
            potential: R::select(mask, a.potential, b.potential),
            enthalpy: R::select(mask, a.enthalpy, b.enthalpy),
            volume: R::select(mask, a.volume, b.volume),
        }
    }
}

/// One component with what reduces it.
#[derive(Clone, Copy, Debug)]
pub struct Component<P> {
    gas_constant: f64,
    reducing_density: f64,
    fluid: P,
}

impl<P> Component<P> {
    fn residual<R: Real>(&self, density: R, of: TemperatureOrder) -> DensityDerivatives<R>
    where
        P: Fluid<R>,
    {
        self.fluid.residual(density / k(self.reducing_density), of)
    }

    /// Pressure over temperature and its slope in density, of this component alone.
    fn pressure<R: Real>(&self, density: R) -> (R, R)
    where
        P: Fluid<R>,
    {
        let series = self.residual(density, TemperatureOrder::Value);
        let gas_constant = k::<R>(self.gas_constant);
        (
            density * gas_constant * (series.first + k(1.0)),
            gas_constant * (series.second + series.first * k(2.0) + k(1.0)),
        )
    }

    /// Ψ_ρ of this component alone, less R (φ° + 1); density times its slope is the slope of `pressure` (Gibbs–Duhem).
    fn potential<R: Real>(&self, density: R) -> R
    where
        P: Fluid<R>,
    {
        let series = self.residual(density, TemperatureOrder::Value);
        let ln_delta = (density / k(self.reducing_density)).ln();
        (ln_delta + series.value + series.first) * k(self.gas_constant)
    }

    /// R (φ° + 1), what [`Component::potential`] leaves out.
    fn ideal_potential<R: Real>(&self) -> R
    where
        P: Fluid<R>,
    {
        (self.fluid.ideal(TemperatureOrder::Value) + k(1.0)) * k(self.gas_constant)
    }

    /// Coefficient of the square of the density in p/T.
    fn second_virial<R: Real>(&self) -> R
    where
        P: Fluid<R>,
    {
        self.fluid.second_virial() * k(self.gas_constant / self.reducing_density)
    }

    /// Ψ of this component alone; nothing at vanishing density.
    fn helmholtz<R: Real>(&self, density: R) -> R
    where
        P: Fluid<R>,
    {
        let residual = self.residual(density, TemperatureOrder::Value);
        // Without any the logarithm multiplies nothing.
        let delta = density / k(self.reducing_density);
        let ln_delta = R::select(k::<R>(0.0).lt(delta), delta, k(1.0)).ln();
        density * k(self.gas_constant) * (ln_delta + self.fluid.ideal(TemperatureOrder::Value) + residual.value)
    }

    fn thermal<R: Real>(&self, density: R) -> Thermal<R>
    where
        P: Fluid<R>,
    {
        let gas_constant = k::<R>(self.gas_constant);
        let ideal = self.fluid.ideal(TemperatureOrder::First);
        let (first, second) =
            (self.residual(density, TemperatureOrder::First), self.residual(density, TemperatureOrder::Second));
        Thermal {
            energy: density * gas_constant * (ideal + first.value),
            energy_slope: gas_constant * (ideal + first.value + first.first),
            heat: -(density * gas_constant * (self.fluid.ideal(TemperatureOrder::Second) + second.value)),
            pressure_first: density * gas_constant * first.first,
        }
    }
}

/// Temperature derivatives at given density: of one component, or of the mixture.
struct Thermal<R> {
    /// τΨ_τ = U/T
    energy: R,
    /// its slope in the density
    energy_slope: R,
    /// −τ²Ψ_ττ, heat capacity at constant volume
    heat: R,
    /// τ ∂(p/T)/∂τ
    pressure_first: R,
}

/// p/T of the mixture with its slopes in the partial densities.
struct Pressure<R> {
    value: R,
    of_air: R,
    of_water: R,
}

/// The temperature functions of the mixture.
#[derive(Clone, Copy, Debug)]
pub struct HelmholtzMixture<R: Real, M: Model<R>> {
    celsius: R,
    kelvins: R,
    air: Component<M::Air>,
    water: Component<M::Water>,
    /// κ B_aw, κ ¾ C_aaw / M_a, κ ¾ C_aww / M_w.
    pair: Jet<R>,
    two_air: Jet<R>,
    two_water: Jet<R>,
}

/// B_aw, m³/mol: Harvey & Huang 2007, G8-10 Eq. (11).
pub fn cross_second_virial<R: Real>(kelvins: R) -> Jet<R> {
    const TERMS: [(f64, f64); 3] = [(0.665687e2, -0.237), (-0.238834e3, -1.048), (-0.176755e3, -3.183)];
    let ln_theta = (kelvins * k(0.01)).ln();
    TERMS.iter().fold(Jet::zero(), |sum, &(c, d)| sum.plus(Jet::power((ln_theta * k(d)).exp(), -d, c * 1e-6)))
}

/// Σ cᵢ (T/100 K)⁻ⁱ.
fn inverse_powers<R: Real, const N: usize>(kelvins: R, coefficients: [f64; N]) -> Jet<R> {
    let inverse = k::<R>(100.0) / kelvins;
    let (mut sum, mut power) = (Jet::zero(), k(1.0));
    for (i, c) in coefficients.into_iter().enumerate() {
        sum = sum.plus(Jet::power(power, i as f64, c));
        power = power * inverse;
    }
    sum
}

/// C_aaw, m⁶/mol²: Nelson & Sauer 2002, G8-10 Eq. (12).
pub fn cross_third_virial_air<R: Real>(kelvins: R) -> Jet<R> {
    inverse_powers(kelvins, [0.482737e-3, 0.105678e-2, -0.656394e-2, 0.294442e-1, -0.319317e-1]).times(k(1e-6))
}

/// C_aww, m⁶/mol²: Hyland & Wexler 1983, G8-10 Eq. (13).
pub fn cross_third_virial_water<R: Real>(kelvins: R) -> Jet<R> {
    let exponent = inverse_powers(kelvins, [-0.10728876e2, 0.347802e2, -0.383383e2, 0.33406e2]);
    let value = exponent.value.exp() * k(-1e-6);
    Jet { value, first: value * exponent.first, second: value * (exponent.second + exponent.first * exponent.first) }
}

impl<R: Real, M: Model<R>> HelmholtzMixture<R, M> {
    fn pressure(&self, air: R, water: R) -> Pressure<R> {
        let (air_value, air_slope) = self.air.pressure(air);
        let (water_value, water_slope) = self.water.pressure(water);
        let (two_air, two_water) = (air * self.two_air.value * k(2.0), water * self.two_water.value * k(2.0));
        let inner = self.pair.value + two_air + two_water;
        Pressure {
            value: air_value + water_value + air * water * inner,
            of_air: air_slope + water * (inner + two_air),
            of_water: water_slope + air * (inner + two_water),
        }
    }

    /// What dry air adds to Ψ_w.
    fn interaction(&self, air: R, water: R) -> R {
        air * (self.pair.value + air * self.two_air.value + water * self.two_water.value * k(2.0))
    }

    /// Ψ_a = μ_a / T, less R_a (α° + 1).
    fn potential_of_air(&self, air: R, water: R) -> R {
        let inner = self.pair.value + air * self.two_air.value * k(2.0) + water * self.two_water.value;
        self.air.potential(air) + water * inner
    }

    /// Ψ_w = μ_w / T, less R_w (φ° + 1), with its slopes in the density of air and in the logarithm of the density of water.
    fn potential(&self, air: R, water: R) -> (R, R, R) {
        let (two_air, two_water) = (air * self.two_air.value, water * self.two_water.value * k(2.0));
        let (_, slope) = self.water.pressure(water);
        (
            self.water.potential(water) + self.interaction(air, water),
            self.pair.value + two_air * k(2.0) + two_water,
            slope + air * two_water,
        )
    }

    /// Temperature derivatives of the mixture; `energy_slope` is here that in the density of water.
    fn thermal(&self, air: R, water: R) -> (Thermal<R>, R) {
        let (of_air, of_water) = (self.air.thermal(air), self.water.thermal(water));
        let cross = air * water;
        let (two_air, two_water) = (air * self.two_air.first, water * self.two_water.first);
        let inner = self.pair.first + two_air + two_water;
        let curvature = self.pair.second + air * self.two_air.second + water * self.two_water.second;
        let mixture = Thermal {
            energy: of_air.energy + of_water.energy + cross * inner,
            energy_slope: of_water.energy_slope + air * (inner + two_water),
            heat: of_air.heat + of_water.heat - cross * curvature,
            pressure_first: of_air.pressure_first + of_water.pressure_first + cross * (inner + two_air + two_water),
        };
        (mixture, of_air.energy_slope + water * (inner + two_air))
    }

    /// Dry-air density at a pressure and humidity ratio.
    fn air_density(&self, steps: usize, pressure: R, humidity_ratio: R) -> R {
        let target = pressure / self.kelvins;
        let gas_constant = humidity_ratio * k(water_vapor::GAS_CONSTANT) + k(dry_air::GAS_CONSTANT);
        // Start: the second virial coefficient of the mixture.
        let second =
            self.air.second_virial() + humidity_ratio * (humidity_ratio * self.water.second_virial() + self.pair.value);
        let ideal = target / gas_constant;
        let start = ideal / (k::<R>(1.0) + ideal * second / gas_constant);
        solve::repeated(steps, start, |air| {
            let p = self.pressure(air, air * humidity_ratio);
            air + (target - p.value) / (p.of_air + humidity_ratio * p.of_water)
        })
    }

    /// The condensed phase at a temperature, °C.
    fn condensed(celsius: R, pressure: R, surface: Surface) -> Phase<R> {
        match surface {
            Surface::Liquid => M::liquid(celsius, pressure),
            Surface::Ice => M::ice(celsius, pressure),
            Surface::Stable => {
                // The lower chemical potential; far from the melting temperature it is known without asking.
                let liquid = || M::liquid(celsius, pressure);
                let ice = || M::ice(celsius, pressure);
                let lower = || {
                    let (liquid, ice) = (liquid(), ice());
                    Phase::choose(ice.potential.lt(liquid.potential), ice, liquid)
                };
                let (cold, warm) = BOTH_PHASES;
                R::pick(celsius.lt(k(cold)), ice, || R::pick(k::<R>(warm).lt(celsius), liquid, lower))
            }
        }
    }

    /// Partial densities in equilibrium with a condensed phase: equal pressure, equal chemical potential of water.
    fn saturated(&self, steps: usize, pressure: R, condensed: &Phase<R>) -> (R, R) {
        let (target, potential) = (pressure / self.kelvins, condensed.potential * k(water_vapor::GAS_CONSTANT));
        // Start: water as an ideal gas, dry air for the rest of the pressure; then what their second virial coefficients make of it.
        let ideal = condensed.potential.exp() * k(water_vapor::REDUCING_DENSITY);
        let rest = (target - ideal * k(water_vapor::GAS_CONSTANT)) / k(dry_air::GAS_CONSTANT);
        let (of_air, of_water) = (self.air.second_virial(), self.water.second_virial());
        let step = (ideal * of_water * k(2.0) + rest * self.pair.value) / k(water_vapor::GAS_CONSTANT);
        let water = ideal / (k::<R>(1.0) + step + step * step * k(0.5));
        let interaction = water * (water * of_water + rest * self.pair.value) + rest * rest * of_air;
        let air = (target - water * k(water_vapor::GAS_CONSTANT) - interaction) / k(dry_air::GAS_CONSTANT);
        solve::repeated_for_two(steps, (air, water), |air, water| {
            let p = self.pressure(air, water);
            let (mu, mu_of_air, mu_of_ln_water) = self.potential(air, water);
            let (air_step, water_step) = solve_pair(
                (p.of_air, water * p.of_water, p.value - target),
                (mu_of_air, mu_of_ln_water, mu - potential),
            );
            // e^{−step} of the logarithm, near enough and positive.
            (air - air_step, water / (k::<R>(1.0) + water_step + water_step * water_step * k(0.5)))
        })
    }

    /// d ln(ρ_w / ρ_a) / dT along saturation at constant pressure.
    fn saturation_slope(&self, pressure: R, condensed: &Phase<R>, air: R, water: R) -> R {
        let p = self.pressure(air, water);
        let (_, mu_of_air, mu_of_ln_water) = self.potential(air, water);
        let (thermal, _) = self.thermal(air, water);
        let (air_step, water_step) = solve_pair(
            (p.of_air, water * p.of_water, (thermal.pressure_first - pressure / self.kelvins) / self.kelvins),
            (mu_of_air, mu_of_ln_water, (thermal.energy_slope - condensed.enthalpy / self.kelvins) / self.kelvins),
        );
        water_step - air_step / air
    }

    /// Density of pure water vapor in equilibrium with a condensed phase.
    fn pure_density(&self, steps: usize, surface: Surface) -> R {
        let start = match surface {
            Surface::Ice => hyland_wexler_ice(self.kelvins).0.exp(),
            Surface::Liquid | Surface::Stable => hyland_wexler_liquid(self.kelvins).0.exp(),
        };
        let phase = Self::condensed(self.celsius, start, surface);
        let ideal = start / (self.kelvins * k(water_vapor::GAS_CONSTANT));
        let start_density = ideal / (k::<R>(1.0) + ideal * self.water.second_virial() / k(water_vapor::GAS_CONSTANT));
        solve::repeated(steps, start_density, |water| {
            let (p, p_slope) = self.water.pressure(water);
            let potential = self.water.potential(water) - phase.potential * k(water_vapor::GAS_CONSTANT);
            // The condensed phase is linear in the little pressure between the start and the result.
            let error = potential - phase.volume * (p - start / self.kelvins);
            let slope = p_slope * (k::<R>(1.0) - phase.volume * water);
            let step = error / slope;
            water / (k::<R>(1.0) + step + step * step * k(0.5))
        })
    }

    /// Enthalpy of saturated steam at this temperature, J/kg.
    pub fn saturated_steam_enthalpy(&self) -> R {
        let density = self.pure_density(M::PURE_STEPS, Surface::Liquid);
        let thermal = self.water.thermal(density);
        (thermal.energy + self.water.pressure(density).0) * self.kelvins / density
    }
}

/// The melting temperature, °C. Start: the slope of the melting curve at the triple point. Then equal chemical potentials.
fn melting<R: Real, M: Model<R>>(steps: usize, pressure: R) -> R {
    solve::repeated(steps, k::<R>(0.01) - pressure * k(7.4e-8), |celsius| {
        let (liquid, ice) = (M::liquid(celsius, pressure), M::ice(celsius, pressure));
        let kelvins = celsius + k(ZERO_CELSIUS);
        // ∂(g/T)/∂T = −h/T²
        let fusion = (liquid.enthalpy - ice.enthalpy) / (kelvins * kelvins * k(water_vapor::GAS_CONSTANT));
        celsius + (liquid.potential - ice.potential) / fusion
    })
}

/// Solves `aᵢ x + bᵢ y = cᵢ`.
fn solve_pair<R: Real>(first: (R, R, R), second: (R, R, R)) -> (R, R) {
    let determinant = first.0 * second.1 - first.1 * second.0;
    ((first.2 * second.1 - first.1 * second.2) / determinant, (first.0 * second.2 - first.2 * second.0) / determinant)
}

impl<R: Real, M: Model<R>> Mixture<R> for HelmholtzMixture<R, M> {
    const FORMULATION: crate::Formulation = M::FORMULATION;
    const STEPS: Steps = M::STEPS;
    const MOLAR_MASS_RATIO: f64 = water_vapor::MOLAR_MASS / dry_air::MOLAR_MASS;

    fn at(celsius: R) -> Self {
        let at = Warmth::of(celsius);
        let (two_air, two_water) = (cross_third_virial_air(at.kelvins), cross_third_virial_water(at.kelvins));
        Self {
            celsius,
            kelvins: at.kelvins,
            air: Component {
                gas_constant: dry_air::GAS_CONSTANT,
                reducing_density: dry_air::REDUCING_DENSITY,
                fluid: M::air(&at),
            },
            water: Component {
                gas_constant: water_vapor::GAS_CONSTANT,
                reducing_density: water_vapor::REDUCING_DENSITY,
                fluid: M::water(&at),
            },
            pair: M::cross_second_virial(&at).times(k(KAPPA)),
            two_air: two_air.times(k(KAPPA * 0.75 / dry_air::MOLAR_MASS)),
            two_water: two_water.times(k(KAPPA * 0.75 / water_vapor::MOLAR_MASS)),
        }
    }

    fn gas(&self, pressure: R, humidity_ratio: R) -> Gas<R> {
        let air = self.air_density(M::DENSITY_STEPS, pressure, humidity_ratio);
        let p = self.pressure(air, air * humidity_ratio);
        let (thermal, energy_of_air) = self.thermal(air, air * humidity_ratio);
        let volume = k::<R>(1.0) / air;
        let gas_constant = humidity_ratio * k(water_vapor::GAS_CONSTANT) + k(dry_air::GAS_CONSTANT);
        // ∂(p/T)/∂ ln ρ along constant W, and ∂p/∂T = p/T − τ ∂(p/T)/∂τ
        let slope = air * (p.of_air + humidity_ratio * p.of_water);
        let tension = p.value - thermal.pressure_first;
        // Along constant T and p a change of W moves the densities: dρ_a = −ρ_a² p_w dW / (∂p/∂ ln ρ), dρ_w = ρ_a dW + W dρ_a.
        let air_shift = -(air * air * p.of_water / slope);
        let water_shift = air + humidity_ratio * air_shift;
        let energy_shift = energy_of_air * air_shift + thermal.energy_slope * water_shift;
        let enthalpy = (self.kelvins * thermal.energy + pressure) * volume;
        Gas {
            volume,
            enthalpy,                                                           // H = T τΨ_τ + p
            specific_heat: (thermal.heat + tension * tension / slope) * volume, // C_v + T p_T² / (ρ p_ρ)
            compressibility: pressure * volume / (gas_constant * self.kelvins),
            volume_of_water: -(air_shift * volume * volume),
            enthalpy_of_water: (self.kelvins * energy_shift - enthalpy * air_shift) * volume,
        }
    }

    fn entropy(&self, _pressure: R, humidity_ratio: R, gas: &Gas<R>) -> R {
        let air = k::<R>(1.0) / gas.volume;
        let water = air * humidity_ratio;
        let cross = air * water * (self.pair.value + air * self.two_air.value + water * self.two_water.value);
        let psi = self.air.helmholtz(air) + self.water.helmholtz(water) + cross;
        // S = τΨ_τ − Ψ
        (self.thermal(air, water).0.energy - psi) * gas.volume
    }

    fn speed_of_sound(&self, humidity_ratio: R, gas: &Gas<R>) -> R {
        let air = k::<R>(1.0) / gas.volume;
        let p = self.pressure(air, air * humidity_ratio);
        let (thermal, _) = self.thermal(air, air * humidity_ratio);
        let slope = air * (p.of_air + humidity_ratio * p.of_water);
        let tension = p.value - thermal.pressure_first;
        // w² = (∂p/∂ρ)_T + T p_T² / (ρ² c_v)
        (self.kelvins * (slope + tension * tension / thermal.heat) * gas.volume / (humidity_ratio + k(1.0))).sqrt()
    }

    fn specific_heat_at_constant_volume(&self, humidity_ratio: R, gas: &Gas<R>) -> R {
        let air = k::<R>(1.0) / gas.volume;
        self.thermal(air, air * humidity_ratio).0.heat * gas.volume
    }

    fn potentials(&self, _pressure: R, humidity_ratio: R, gas: &Gas<R>) -> Potentials<R> {
        let air = k::<R>(1.0) / gas.volume;
        let water = air * humidity_ratio;
        let (of_water, of_air) = (self.potential(air, water).0, self.potential_of_air(air, water));
        Potentials {
            water: (of_water + self.water.ideal_potential()) * self.kelvins,
            dry_air: (of_air + self.air.ideal_potential()) * self.kelvins,
        }
    }

    /// f = ρ_w R_w T e^{Ψʳ_w / R_w}, with the residual part of Ψ_w: its limit at low pressure is the partial pressure of water as the mixture
    /// has it, and vapor in equilibrium with pure water has the fugacity of that water.
    fn fugacity(&self, _pressure: R, humidity_ratio: R, gas: &Gas<R>) -> R {
        let air = k::<R>(1.0) / gas.volume;
        let water = air * humidity_ratio;
        let gas_constant = k::<R>(water_vapor::GAS_CONSTANT);
        let alone = self.water.residual(water, TemperatureOrder::Value);
        let residual = alone.value + alone.first + self.interaction(air, water) / gas_constant;
        water * gas_constant * self.kelvins * residual.exp()
    }

    fn saturation(&self, pressure: R, surface: Surface) -> Saturation<R> {
        let condensed = Self::condensed(self.celsius, pressure, surface);
        let (air, water) = self.saturated(M::SATURATION_STEPS, pressure, &condensed);
        Saturation {
            // from the densities, which stay regular where the air vanishes
            mole_fraction: water / (water + air * k(<Self as Mixture<R>>::MOLAR_MASS_RATIO)),
            humidity_ratio: water / air,
            log_slope: self.saturation_slope(pressure, &condensed, air, water),
            condensed_enthalpy: condensed.enthalpy,
        }
    }

    fn pure_saturation_pressure(&self, pressure: R, surface: Surface) -> R {
        let over = |surface| self.water.pressure(self.pure_density(M::PURE_STEPS, surface)).0 * self.kelvins;
        match surface {
            Surface::Stable => R::pick(
                self.celsius.lt(Self::melting_temperature(pressure)),
                || over(Surface::Ice),
                || over(Surface::Liquid),
            ),
            surface => over(surface),
        }
    }

    fn melting_temperature(pressure: R) -> R {
        melting::<R, M>(MELTING_STEPS, pressure)
    }

    fn condensed_enthalpy(celsius: R, pressure: R, surface: Surface) -> R {
        Self::condensed(celsius, pressure, surface).enthalpy
    }
}

#[cfg(test)]
mod tests;
