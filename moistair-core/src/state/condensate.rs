//! Equilibrium of moist air with its own condensate: fog, ice fog, and the three phases at the melting temperature.

use crate::basis::{Basis, Formulation, with_mixture};
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::mixture::Mixture;
use crate::quantity::{HumidityRatio, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::saturation::{Magnus, Surface};
use crate::solve;

use super::MoistAir;
use super::construct::{SATURATION_TOLERANCE, saturation_rounding};
use super::property::{condensed_heat_capacity, dew_point};

/// K. A last step below this has found the temperature: the next would be its square.
const SETTLED: f64 = 1e-3;

/// Moist air with the liquid water and ice that it carries, each per mass of dry air.
///
/// Water that is not vapor is carried beside the vapor, never as a relative humidity above one.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct AirWithCondensate<S = f64> {
    air: MoistAir<S>,
    liquid: S,
    ice: S,
    condensate_enthalpy: S,
}

/// Whether water below the melting temperature freezes in equilibrium or stays liquid, as fog does to about −15 °C (common
/// practice, no source).
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum Freezing {
    /// Ice below the melting temperature.
    #[default]
    Equilibrium = 0,
    /// No ice: liquid stays supercooled, down to −40 °C.
    Supercooled = 1,
}

impl<S: Scalar> From<MoistAir<S>> for AirWithCondensate<S> {
    fn from(air: MoistAir<S>) -> Self {
        Self { air, liquid: k(0.0), ice: k(0.0), condensate_enthalpy: k(0.0) }
    }
}

impl<S: Scalar> AirWithCondensate<S> {
    /// The gas phase.
    pub fn air(&self) -> MoistAir<S> {
        self.air
    }

    /// Liquid water per mass of dry air.
    pub fn liquid(&self) -> HumidityRatio<S> {
        HumidityRatio::from_kilograms_per_kilogram(self.liquid)
    }

    /// Ice per mass of dry air.
    pub fn ice(&self) -> HumidityRatio<S> {
        HumidityRatio::from_kilograms_per_kilogram(self.ice)
    }

    /// Whether there is any condensate.
    #[must_use]
    pub fn is_wet(&self) -> bool {
        self.liquid > k(0.0) || self.ice > k(0.0)
    }

    /// Vapor, liquid and ice together, per mass of dry air.
    pub fn total_water(&self) -> HumidityRatio<S> {
        HumidityRatio::from_kilograms_per_kilogram(
            self.air.humidity_ratio().kilograms_per_kilogram() + self.liquid + self.ice,
        )
    }

    /// Enthalpy of the air and its condensate, per mass of dry air.
    pub fn specific_enthalpy(&self) -> SpecificEnthalpy<S> {
        SpecificEnthalpy::from_joules_per_kilogram(
            self.air.specific_enthalpy().joules_per_kilogram() + self.condensate_enthalpy,
        )
    }

    /// Air that carries stated amounts of liquid and ice at its own temperature, in equilibrium with it or not (such as the
    /// carry-over of a spray).
    ///
    /// # Errors
    /// [`Error::OutOfRange`] or [`Error::NotFinite`] for an amount; [`Error::Infeasible`] for liquid below −40 °C or ice above the
    /// melting temperature, neither of which lasts.
    pub fn new(air: MoistAir<S>, liquid: HumidityRatio<S>, ice: HumidityRatio<S>) -> Result<Self, Error> {
        let liquid = checked(Quantity::TotalWater, liquid.kilograms_per_kilogram())?;
        let ice = checked(Quantity::TotalWater, ice.kilograms_per_kilogram())?;
        let celsius = air.dry_bulb().celsius();
        let melting = with_mixture!(air.formulation(), S, M =>
            <M<S> as Mixture<S>>::melting_temperature(air.pressure().pascals()));
        let (coldest, warmest) = air.formulation().limits(Quantity::DryBulb);
        let min = if liquid > k(0.0) { k(Quantity::DewPoint.limits().0) } else { k(coldest) };
        let max = if ice > k(0.0) { melting } else { k(warmest) };
        if celsius < min || celsius > max {
            let (value, min, max) = (celsius.to_f64(), min.to_f64(), max.to_f64());
            return Err(Error::Infeasible { quantity: Quantity::DryBulb, value, min, max });
        }
        Ok(Self::carrying(air, liquid, ice))
    }

    /// Enthalpy of the condensate, per mass of dry air.
    pub(crate) fn condensate_enthalpy(&self) -> S {
        self.condensate_enthalpy
    }

    pub(crate) fn carrying(air: MoistAir<S>, liquid: S, ice: S) -> Self {
        let (celsius, pressure) = (air.dry_bulb().celsius(), air.pressure().pascals());
        let enthalpy = |surface| condensed_enthalpy(air.formulation(), celsius, pressure, surface);
        // An absent phase adds nothing, and may have no equation here.
        let part = |amount: S, surface| if amount > k(0.0) { amount * enthalpy(surface) } else { k(0.0) };
        let condensate_enthalpy = part(liquid, Surface::Liquid) + part(ice, Surface::Ice);
        Self { air, liquid, ice, condensate_enthalpy }
    }

    /// Vapor and condensate in equilibrium at a temperature, from the water of all phases together, per mass of dry air: as much vapor as the
    /// air holds, the rest ice below the melting temperature and liquid from there on (liquid down to −40 °C if supercooled). No search.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`].
    ///
    /// ```
    /// use moistair_core::*;
    /// let line = Basis::real_gas(Pressure::from_kilopascals(800.0));
    /// let water = HumidityRatio::from_grams_per_kilogram(10.0);
    /// let at = |t| AirWithCondensate::from_dry_bulb_and_water(
    ///     Temperature::from_celsius(t), water, Freezing::Equilibrium, line);
    /// assert!(!at(60.0)?.is_wet() && at(20.0)?.is_wet());
    /// let ice: f64 = at(-10.0)?.ice().grams_per_kilogram();
    /// assert!((9.5..10.0).contains(&ice));
    /// assert!(at(500.0).is_err());
    /// # Ok::<(), Error>(())
    /// ```
    pub fn from_dry_bulb_and_water(
        dry_bulb: Temperature<S>,
        total_water: HumidityRatio<S>,
        freezing: Freezing,
        basis: impl Into<Basis<S>>,
    ) -> Result<Self, Error> {
        let basis = basis.into();
        let celsius = checked_for(basis.formulation(), Quantity::DryBulb, dry_bulb.celsius())?;
        let water = checked(Quantity::TotalWater, total_water.kilograms_per_kilogram())?;
        let pressure = checked_pressure(&basis)?;
        with_mixture!(basis.formulation(), S, M => {
            let held = capacity::<M<S>, S>(celsius, pressure, freezing);
            let state = |ratio| MoistAir::assemble(celsius, pressure, ratio, basis.formulation());
            // Saturated to rounding is not fog.
            if water <= held + saturation_rounding(held) {
                return Ok(state(water).into());
            }
            let freezes_below = match freezing {
                Freezing::Equilibrium => <M<S> as Mixture<S>>::melting_temperature(pressure),
                Freezing::Supercooled => k(Quantity::DewPoint.limits().0),
            };
            let surplus = water - held;
            Ok(if celsius < freezes_below {
                Self::carrying(state(held), k(0.0), surplus)
            } else {
                Self::carrying(state(held), surplus, k(0.0))
            })
        })
    }

    /// Vapor, liquid and ice in equilibrium, from the enthalpy and the water of all phases together, per mass of dry air.
    ///
    /// At the melting temperature all three phases coexist over a range of enthalpy. Bounded work: at most
    /// 80 evaluations, ten in the middle.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`], or [`Error::Infeasible`] where the result would leave the range of states.
    ///
    /// ```
    /// use moistair_core::*;
    /// let site = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
    /// // The mixture of equal parts of 30 °C, 90 % and −10 °C, 80 % is fog.
    /// let fog = AirWithCondensate::from_enthalpy_and_water(
    ///     SpecificEnthalpy::from_kilojoules_per_kilogram(42.9),
    ///     HumidityRatio::from_grams_per_kilogram(12.84), Freezing::Equilibrium, site)?;
    /// assert!(fog.is_wet() && (15.0..15.6).contains(&fog.air().dry_bulb().celsius()));
    /// # Ok::<(), Error>(())
    /// ```
    pub fn from_enthalpy_and_water(
        enthalpy: SpecificEnthalpy<S>,
        total_water: HumidityRatio<S>,
        freezing: Freezing,
        basis: impl Into<Basis<S>>,
    ) -> Result<Self, Error> {
        let basis = basis.into();
        let enthalpy = checked(Quantity::LeavingEnthalpy, enthalpy.joules_per_kilogram())?;
        let water = checked(Quantity::TotalWater, total_water.kilograms_per_kilogram())?;
        let pressure = checked_pressure(&basis)?;
        with_mixture!(basis.formulation(), S, M => equilibrium::<M<S>, S>(enthalpy, water, pressure, freezing))
    }
}

/// Enthalpy of liquid water or ice on the datum of a formulation.
pub(crate) fn condensed_enthalpy<S: Scalar>(formulation: Formulation, celsius: S, pressure: S, surface: Surface) -> S {
    with_mixture!(formulation, S, M => <M<S> as Mixture<S>>::condensed_enthalpy(celsius, pressure, surface))
}

/// Dry bulb, °C, of air with a given enthalpy, pressure and humidity ratio; NaN where the search found none.
///
/// Far beyond saturation the equation of the real gas has no meaning, nor has what Newton finds there: its last step tells.
pub(crate) fn temperature_of_enthalpy<M: Mixture<S>, S: Scalar>(enthalpy: S, pressure: S, humidity_ratio: S) -> S {
    let (celsius, last_step) = search_temperature::<M, S>(M::STEPS.temperature, enthalpy, pressure, humidity_ratio);
    let settled = k::<S>(SETTLED);
    if -settled < last_step && last_step < settled {
        // What the last bits of the enthalpy are worth comes to the temperature's own.
        let bits = enthalpy.at_least(-enthalpy) * S::epsilon() * k(4.0) / heat_capacity(humidity_ratio);
        within_states::<M, S>(celsius, bits)
    } else {
        S::nan()
    }
}

/// Of the gas, near enough, per kilogram of dry air, J/(kg K).
fn heat_capacity<S: Scalar>(humidity_ratio: S) -> S {
    humidity_ratio * k(1_860.0) + k(1_006.0)
}

/// The temperature after some steps, and the last of them.
fn search_temperature<M: Mixture<S>, S: Scalar>(steps: usize, enthalpy: S, pressure: S, humidity_ratio: S) -> (S, S) {
    let mut celsius = (enthalpy - humidity_ratio * k(2_501_000.0)) / heat_capacity(humidity_ratio);
    // The forces in dense steam cost it up to 45 K here; started so far within saturation, the search would not end.
    let saturated = Magnus::over(Surface::Liquid).temperature((M::mole_fraction(humidity_ratio) * pressure).ln());
    celsius = celsius.at_least(saturated - k(20.0));
    let mut step = S::infinity();
    let (coldest, warmest) = M::FORMULATION.limits(Quantity::DryBulb);
    for _ in 0..steps {
        // An enthalpy far outside leads far outside the equations; the caller checks the range.
        celsius = celsius.at_least(k(coldest - 40.0)).at_most(k(warmest + 50.0));
        let gas = M::at(celsius).gas(pressure, humidity_ratio);
        step = (gas.enthalpy - enthalpy) / gas.specific_heat;
        celsius = celsius - step;
    }
    (celsius, step)
}

/// The temperature, at an end of the range of states where rounding carried it past.
fn within_states<M: Mixture<S>, S: Scalar>(celsius: S, bits: S) -> S {
    let (coldest, warmest) = M::FORMULATION.limits(Quantity::DryBulb);
    let rounding = solve::temperature_resolution::<S>() * k(32.0) + bits;
    let near = |end: S| end - rounding <= celsius && celsius <= end + rounding;
    if near(k(coldest)) {
        k(coldest)
    } else if near(k(warmest)) {
        k(warmest)
    } else {
        celsius
    }
}

/// Saturated air with the rest of a given water condensed, at a trial temperature.
struct Wet<S> {
    humidity_ratio: S,
    surplus: S,
    /// Of air and condensate.
    enthalpy: S,
    /// d(enthalpy)/dT.
    slope: S,
    /// Enthalpy of vapor over that of condensate.
    latent: S,
}

impl<S: Scalar> Wet<S> {
    fn at<M: Mixture<S>>(celsius: S, pressure: S, water: S, surface: Surface) -> Self {
        let mixture = M::at(celsius);
        let saturation = mixture.saturation(pressure, surface);
        let (humidity_ratio, condensed) = (saturation.humidity_ratio, saturation.condensed_enthalpy);
        let gas = mixture.gas(pressure, humidity_ratio);
        let surplus = water - humidity_ratio;
        let latent = gas.enthalpy_of_water - condensed;
        Self {
            humidity_ratio,
            surplus,
            enthalpy: gas.enthalpy + surplus * condensed,
            slope: gas.specific_heat
                + humidity_ratio * saturation.log_slope * latent
                + surplus * k(condensed_heat_capacity(surface)),
            latent,
        }
    }
}

fn equilibrium<M: Mixture<S>, S: Scalar>(
    enthalpy: S,
    water: S,
    pressure: S,
    freezing: Freezing,
) -> Result<AirWithCondensate<S>, Error> {
    let state = |celsius, ratio| MoistAir::assemble(celsius, pressure, ratio, M::FORMULATION);
    let (coldest, warmest) = M::FORMULATION.limits(Quantity::DryBulb);
    let in_range = |celsius: S| k::<S>(coldest) <= celsius && celsius <= k(warmest);
    let dry_bulb = temperature_of_enthalpy::<M, S>(enthalpy, pressure, water);
    // Saturated to rounding is not fog.
    let held = capacity::<M, S>(dry_bulb, pressure, freezing);
    if in_range(dry_bulb) && water <= held + saturation_rounding(held) {
        return Ok(state(dry_bulb, water).into());
    }
    // Wet: saturated air and condensate, warmer than the gas alone would be and no warmer than the dew point of all the water.
    // One curve is followed, chosen by the side of the melting temperature on which the result lies.
    let melting = M::melting_temperature(pressure);
    let wet = |celsius, surface| Wet::at::<M>(celsius, pressure, water, surface);
    let mole_fraction = M::mole_fraction(water);
    let dew = |surface| dew_point::<M, S>(mole_fraction, pressure, surface);
    let (curve, low, high) = match freezing {
        Freezing::Supercooled => (Surface::Liquid, k(Quantity::DewPoint.limits().0), dew(Surface::Liquid)),
        Freezing::Equilibrium => {
            let melted = wet(melting, Surface::Liquid);
            let fusion = M::condensed_enthalpy(melting, pressure, Surface::Liquid)
                - M::condensed_enthalpy(melting, pressure, Surface::Ice);
            let frozen = (melted.enthalpy - enthalpy) / fusion;
            if melted.surplus > k(0.0) && k::<S>(0.0) <= frozen && frozen <= melted.surplus {
                let air = state(melting, melted.humidity_ratio);
                return Ok(AirWithCondensate::carrying(air, melted.surplus - frozen, frozen));
            }
            if melted.surplus > k(0.0) && melted.enthalpy < enthalpy {
                (Surface::Liquid, melting, dew(Surface::Liquid).at_least(melting))
            } else {
                (Surface::Ice, k(coldest), dew(Surface::Ice).at_most(melting))
            }
        }
    };
    let floor = wet(low, curve);
    let warmest = k::<S>(warmest);
    let held = capacity::<M, S>(warmest, pressure, freezing).at_most(water);
    let liquid = (water - held) * M::condensed_enthalpy(warmest, pressure, Surface::Liquid);
    let ceiling = state(warmest, held).specific_enthalpy().joules_per_kilogram() + liquid;
    if !(k::<S>(0.0) <= floor.surplus && floor.enthalpy <= enthalpy && enthalpy <= ceiling) {
        // The least of all, on whichever curve: with the surplus condensed, or down to the frost point without any.
        let (low, curve) = if melting <= low { (k(coldest), Surface::Ice) } else { (low, curve) };
        let least = wet(low, curve);
        let least = if k::<S>(0.0) <= least.surplus {
            least.enthalpy
        } else {
            // Hardly any water has a frost point far from all states, and none has none.
            let frost = dew(Surface::Ice);
            state(if in_range(frost) { frost } else { k(coldest) }, water).specific_enthalpy().joules_per_kilogram()
        };
        return Err(Error::Infeasible {
            quantity: Quantity::LeavingEnthalpy,
            value: enthalpy.to_f64(),
            min: least.to_f64(),
            max: ceiling.to_f64(),
        });
    }
    let celsius = solve::increasing(low, high, solve::temperature_resolution(), |celsius| {
        let trial = wet(celsius, curve);
        (trial.enthalpy - enthalpy, trial.slope)
    });
    // What the last unit of the temperature leaves over goes into the vapor, well within the tolerance of saturation, so that the
    // books close: the enthalpy of much liquid is rougher than that of the air.
    let reached = wet(celsius, curve);
    let tenth = reached.humidity_ratio * k(SATURATION_TOLERANCE * 0.1);
    let most = saturation_rounding(reached.humidity_ratio).at_least(tenth);
    let over = ((reached.enthalpy - enthalpy) / reached.latent).at_least(-most).at_most(most);
    let ratio = (reached.humidity_ratio - over).at_most(water);
    let (air, surplus) = (state(celsius, ratio), water - ratio);
    Ok(match curve {
        Surface::Ice => AirWithCondensate::carrying(air, k(0.0), surplus),
        _ => AirWithCondensate::carrying(air, surplus, k(0.0)),
    })
}

/// Humidity ratio that the gas can hold in equilibrium; without limit where nothing saturates. Supercooled liquid lasts down to
/// −40 °C, below which there is ice.
fn capacity<M: Mixture<S>, S: Scalar>(celsius: S, pressure: S, freezing: Freezing) -> S {
    let surface = match freezing {
        Freezing::Supercooled if celsius >= k(Quantity::DewPoint.limits().0) => Surface::Liquid,
        _ => Surface::Stable,
    };
    let saturation = M::at(celsius).saturation(pressure, surface);
    if super::property::saturates(saturation.mole_fraction) { saturation.humidity_ratio } else { S::infinity() }
}

/// The pressure of a basis, checked.
pub(crate) fn checked_pressure<S: Scalar>(basis: &Basis<S>) -> Result<S, Error> {
    checked_for(basis.formulation(), Quantity::Pressure, basis.pressure().pascals())
}

/// Enthalpy per kilogram of liquid water, on the datum of a basis.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`]: 0 to 200 °C.
pub fn liquid_water_enthalpy<S: Scalar>(
    temperature: Temperature<S>,
    basis: impl Into<Basis<S>>,
) -> Result<SpecificEnthalpy<S>, Error> {
    let basis = basis.into();
    let celsius = checked(Quantity::WaterTemperature, temperature.celsius())?;
    let pressure = checked_pressure(&basis)?;
    let enthalpy = condensed_enthalpy(basis.formulation(), celsius, pressure, Surface::Liquid);
    Ok(SpecificEnthalpy::from_joules_per_kilogram(enthalpy))
}

#[cfg(test)]
mod steps {
    use std::println;

    use super::*;
    use crate::mixture::{Helmholtz, IdealGas, RealGas, Steps};
    use crate::state::property::tests::states;

    fn left_over<M: Mixture<f64>>(steps: usize) -> f64 {
        let error = |(celsius, pressure, w, gas): (f64, f64, f64, crate::mixture::Gas<f64>)| {
            (search_temperature::<M, f64>(steps, gas.enthalpy, pressure, w).0 - celsius).abs()
        };
        let left = states::<M>().map(error).fold(0.0, |most, error| if error <= most { most } else { error });
        println!("temperature of an enthalpy, {:?}: after {steps} steps {left:e} K", M::FORMULATION);
        left
    }

    /// The constants pass the bound and one step fewer does not.
    #[test]
    fn temperature_steps_are_enough_and_none_is_idle() {
        const BOUND: f64 = 1e-11;
        let check = |steps: usize, left: &dyn Fn(usize) -> f64| {
            assert!(left(steps) <= BOUND);
            assert!(left(steps - 1) > BOUND, "one step fewer does as well: the constant is stale");
        };
        check(Steps::TO_150_CELSIUS.temperature, &|steps| {
            left_over::<RealGas<f64>>(steps).max(left_over::<IdealGas<f64>>(steps))
        });
        check(<Helmholtz<f64> as Mixture<f64>>::STEPS.temperature, &left_over::<Helmholtz<f64>>);
    }

    /// No state is taken for one that the search did not find.
    #[test]
    fn every_state_is_found() {
        fn longest<M: Mixture<f64>>() -> f64 {
            let last = states::<M>().fold(0.0, |most: f64, (_, pressure, w, gas)| {
                most.max(search_temperature::<M, f64>(M::STEPS.temperature, gas.enthalpy, pressure, w).1.abs())
            });
            println!("last step of the temperature, {:?}: {last:e} K", M::FORMULATION);
            last
        }
        let all = [longest::<RealGas<f64>>(), longest::<IdealGas<f64>>(), longest::<Helmholtz<f64>>()];
        assert!(all.iter().all(|last| *last < 0.1 * SETTLED));
    }
}
