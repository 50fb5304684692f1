//! A chain of processes, one behind the other, and its books.
//!
//! [`run`] takes a stream through [`Step`]s in their order and adds up heat, water and work, by step and in total; the books of the whole
//! chain are recomputed from its ends. [`solve`] finds one number of one step from a property that the air is to have: the
//! leaving temperature of a coil that gives a room its humidity, for one. All memory is the caller's.
//!
//! Each step is the process function that it names, with the same bits as that function alone. Between steps goes a [`WetStream`]: air
//! with the droplets and the ice that it carries. What a step does with them:
//!
//! - [`Step::Mix`], [`Step::Compress`] and [`Step::Eliminate`] take them as they are;
//! - [`Step::ToTemperature`] (upward) and [`Step::WithHeat`] evaporate what the air at its new state holds, by equilibrium; without
//!   droplets they are the functions of [`crate::process::sensible`];
//! - every other step refuses them with [`Error::CarriesCondensate`]: its model has no droplets. Put [`Step::Eliminate`] before it.
//!
//! A chain is a steady state. It knows no control, no dynamics and no order of starting; what a step leaves out, the chain leaves out.
//! Results are estimates for engineering, not a safety function: each process names its own cautions, of which [`StepResult::frost`]
//! and [`StepResult::condenses`] are carried along. A frost flag is no freezestat.

mod solve;
mod step;

pub use solve::{EVALUATION_CAP, End, Free, SolveStatus, Solved, Target, solve};

use crate::error::Error;
use crate::process::books::{Books, Ledger};
use crate::process::coil::{CoilRegime, CoilSurface, CoilWater, CondensateTemperature};
use crate::process::desiccant::Sorption;
use crate::process::evaporative::{DirectCooler, IndirectCooler};
use crate::process::humidify::{EvaporatingWater, Washer};
use crate::process::room::RoomGains;
use crate::process::{AirStream, Exchange, WetStream};
use crate::quantity::{HeatFlow, HumidityRatio, MassFlow, Pressure, RelativeHumidity, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::state::MoistAir;

/// One process of a chain.
#[derive(Clone, Copy, Debug, PartialEq)]
#[non_exhaustive]
pub enum Step<S = f64> {
    /// Heating or cooling to a temperature: [`crate::process::sensible::to_temperature`].
    ToTemperature(Temperature<S>),
    /// Heating or cooling by a heat flow: [`crate::process::sensible::with_heat`].
    WithHeat(HeatFlow<S>),
    /// A coil that leaves a state: [`crate::process::coil::to_state`].
    CoilToState {
        /// The air that leaves.
        leaving: MoistAir<S>,
        /// Where the condensate's temperature comes from.
        condensate: CondensateTemperature<S>,
    },
    /// A coil that leaves a temperature and a relative humidity (0.90 to 0.95 is common practice, no source), by
    /// [`crate::process::coil::to_state`]. Where that would be moister than the air that enters, the coil stays dry: the air keeps its
    /// humidity ratio and leaves at the temperature.
    CoilToTemperature {
        /// Leaving temperature.
        leaving: Temperature<S>,
        /// Leaving relative humidity of a wet coil, over the stable surface.
        relative_humidity: RelativeHumidity<S>,
        /// Where the condensate's temperature comes from.
        condensate: CondensateTemperature<S>,
    },
    /// A coil by its apparatus: [`crate::process::coil::by_bypass_factor`].
    CoilByBypassFactor {
        /// Apparatus dew point.
        apparatus_dew_point: Temperature<S>,
        /// Bypass factor, 0 to 1.
        bypass_factor: S,
        /// Where the condensate's temperature comes from.
        condensate: CondensateTemperature<S>,
    },
    /// A coil by its conductances and its water, cooling or heating: [`crate::process::coil::with_water`].
    CoilWithWater {
        /// Its conductances.
        surface: CoilSurface<S>,
        /// Its water.
        water: CoilWater<S>,
        /// Where the condensate's temperature comes from.
        condensate: CondensateTemperature<S>,
    },
    /// A coil and the heater behind it, to a state: [`crate::process::reheat::to_state`].
    CoilWithReheat {
        /// The air that leaves the heater.
        target: MoistAir<S>,
        /// Relative humidity that leaves the coil.
        coil_leaving: RelativeHumidity<S>,
        /// Where the condensate's temperature comes from.
        condensate: CondensateTemperature<S>,
    },
    /// Steam of a flow: [`crate::process::humidify::steam`].
    Steam {
        /// Its mass flow.
        flow: MassFlow<S>,
        /// Its specific enthalpy.
        enthalpy: SpecificEnthalpy<S>,
    },
    /// Steam up to a humidity ratio: [`crate::process::humidify::steam_to_humidity_ratio`].
    SteamToHumidityRatio {
        /// The humidity ratio that leaves.
        target: HumidityRatio<S>,
        /// Specific enthalpy of the steam.
        enthalpy: SpecificEnthalpy<S>,
    },
    /// Steam up to a relative humidity: [`crate::process::humidify::steam_to_relative_humidity`].
    SteamToRelativeHumidity {
        /// The relative humidity that leaves.
        target: RelativeHumidity<S>,
        /// Specific enthalpy of the steam.
        enthalpy: SpecificEnthalpy<S>,
    },
    /// Water sprayed in: [`crate::process::humidify::spray`].
    Spray {
        /// Its mass flow.
        flow: MassFlow<S>,
        /// Its temperature.
        temperature: Temperature<S>,
    },
    /// Wetted media: [`crate::process::humidify::evaporative`].
    Evaporative {
        /// Saturation effectiveness, 0 to 1.
        saturation_effectiveness: S,
        /// Temperature of the water.
        water: EvaporatingWater<S>,
    },
    /// Wetted media with circulating water, pump and bleed: [`crate::process::evaporative::direct`].
    DirectCooler(DirectCooler<S>),
    /// A washer: [`crate::process::humidify::wash`].
    Wash(Washer<S>),
    /// Another stream mixed in, outdoor air or return air: [`crate::process::mixing::adiabatic`].
    Mix(WetStream<S>),
    /// All droplets and ice taken out of the air at its own temperature: a perfect eliminator. Real ones pass the finest droplets.
    Eliminate,
    /// Another pressure and temperature, by whatever machine: [`crate::process::compression::to_pressure`].
    Compress {
        /// Leaving pressure, absolute.
        pressure: Pressure<S>,
        /// Leaving temperature.
        leaving: Temperature<S>,
    },
    /// Indirect evaporative cooling, as the primary side of [`crate::process::evaporative::indirect`].
    IndirectCooler {
        /// The air that is wetted behind the wall.
        secondary: AirStream<S>,
        /// The cooler.
        cooler: IndirectCooler<S>,
    },
    /// A room and its gains; its air leaves: [`crate::process::room::room_of_supply`].
    Room(RoomGains<S>),
    /// A desiccant, to a humidity ratio: [`crate::process::desiccant::to_humidity_ratio`].
    DesiccantToHumidityRatio {
        /// The humidity ratio that leaves.
        target: HumidityRatio<S>,
        /// What the desiccant does beside.
        sorption: Sorption<S>,
    },
    /// A desiccant by its effectiveness: [`crate::process::desiccant::by_effectiveness`].
    DesiccantByEffectiveness {
        /// (W₁ − W₂) / (W₁ − W_least).
        effectiveness: S,
        /// What the desiccant could reach at best.
        driest: HumidityRatio<S>,
        /// What the desiccant does beside.
        sorption: Sorption<S>,
    },
}

/// Declares [`Loads`].
macro_rules! loads {
    ($($(#[$doc:meta])* $field:ident: $type:ident::$from:ident;)*) => {
        /// What a step asks of the plant, or all steps together, by name. Magnitudes, unless they are said to be signed: then into the air.
        ///
        /// Heat of an exchange is heating − cooling + recovered + gains + water heat + fan work + compression; its water is steam + humidifying
        /// water + moisture gain + recovered water − condensate.
        #[derive(Clone, Copy, Debug, PartialEq)]
        #[must_use]
        pub struct Loads<S = f64> {
            $($(#[$doc])* pub $field: $type<S>,)*
        }

        impl<S: Scalar> Loads<S> {
            /// Nothing.
            pub fn none() -> Self {
                Self { $($field: $type::$from(k(0.0)),)* }
            }

            fn plus(&self, other: &Self) -> Self {
                Self { $($field: self.$field + other.$field,)* }
            }
        }
    };
}
loads! {
    /// Heat from heaters and warm coils.
    heating: HeatFlow::from_watts;
    /// Heat taken out by coils and dry coolers.
    cooling: HeatFlow::from_watts;
    /// The sensible part of that.
    sensible_cooling: HeatFlow::from_watts;
    /// The rest of it.
    latent_cooling: HeatFlow::from_watts;
    /// Heat from another stream through an indirect cooler, or carried over by a desiccant; signed.
    recovered: HeatFlow::from_watts;
    /// Sensible heat of rooms; signed.
    gains: HeatFlow::from_watts;
    /// Heat that circulating water brings with it: of its pump, of its make-up, of chilled spray; signed.
    water_heat: HeatFlow::from_watts;
    /// Power of fans that reaches the air: zero, as no step is a fan yet.
    fan_work: HeatFlow::from_watts;
    /// Electric power of fans, that part of it included: zero likewise.
    fan_power: HeatFlow::from_watts;
    /// Of compression and expansion: work less the heat of cooling; signed.
    compression: HeatFlow::from_watts;
    /// Water that drains from coils, eliminators, coolers and washers.
    condensate: MassFlow::from_kilograms_per_second;
    /// Steam into the air.
    steam: MassFlow::from_kilograms_per_second;
    /// Liquid water into the air, with what it carries on as droplets.
    humidifying_water: MassFlow::from_kilograms_per_second;
    /// Moisture of rooms; signed.
    moisture_gain: MassFlow::from_kilograms_per_second;
    /// Vapor from a desiccant; signed.
    recovered_water: MassFlow::from_kilograms_per_second;
    /// Water that evaporates into a secondary stream, not into this one.
    secondary_water: MassFlow::from_kilograms_per_second;
    /// Dry air of other streams mixed in.
    mixed_in: MassFlow::from_kilograms_per_second;
}

/// What one step did.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct StepResult<S = f64> {
    /// The air that enters.
    pub entering: WetStream<S>,
    /// The air that leaves.
    pub leaving: WetStream<S>,
    /// Heat and water into the air.
    pub exchange: Exchange<S>,
    /// The same by name.
    pub loads: Loads<S>,
    /// Of a coil: dry, wet or frosting.
    pub regime: Option<CoilRegime>,
    /// Frost forms, or water in a coil may freeze.
    pub frost: bool,
    /// Water condenses where no coil drains it: in an indirect cooler.
    pub condenses: bool,
    /// What enters, with a stream mixed in, against what leaves.
    pub books: Books<S>,
}

/// What all steps did together.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Total<S = f64> {
    /// The air that leaves the last step.
    pub leaving: WetStream<S>,
    /// The sum of all exchanges.
    pub exchange: Exchange<S>,
    /// The sum of all loads.
    pub loads: Loads<S>,
    /// Whether any step reports frost.
    pub frost: bool,
    /// Whether any step reports condensation.
    pub condenses: bool,
    /// What enters the first step and is mixed in, against what leaves the last and all that was exchanged; measured against the terms of
    /// these ends alone, and the rounding of each temperature that was solved for on the way.
    pub books: Books<S>,
}

/// Which step failed, and why.
#[derive(Clone, Copy, Debug, PartialEq, thiserror::Error)]
#[error("step {step} (from 0): {error}")]
pub struct SequenceError {
    /// The step at fault, counted from 0.
    pub step: usize,
    /// What it said.
    #[source]
    pub error: Error,
}

/// Takes a stream through steps in their order.
///
/// `results` gets what each step did, at its own place, as far as there is room; places without a step that ran become `None`. An empty
/// slice serves where only the total is asked for. A chain without steps changes nothing.
///
/// # Errors
/// The error of the first step that fails, and which it is. Later steps are not run; the results of those before it stand.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, coil::CondensateTemperature};
/// use moistair_core::sequence::{Step, run};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let stream = |t, rh, flow| AirStream::new(
///     MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site)?,
///     MassFlow::from_kilograms_per_second(flow));
/// let (outdoor, room) = (stream(33.0, 45.0, 0.6)?, stream(24.0, 50.0, 1.4)?);
/// let steps = [
///     Step::Mix(room.into()),
///     Step::CoilToTemperature {
///         leaving: Temperature::from_celsius(13.0),
///         relative_humidity: RelativeHumidity::from_percent(95.0),
///         condensate: CondensateTemperature::LeavingAir,
///     },
///     Step::ToTemperature(Temperature::from_celsius(15.0)),
/// ];
/// let mut results = [None; 3];
/// let total = run(&outdoor.into(), &steps, &mut results)?;
/// assert!(total.books.close() && results.iter().flatten().all(|step| step.books.close()));
/// assert!((total.loads.cooling.kilowatts() - 37.7).abs() < 0.1);
/// assert!((total.loads.heating.kilowatts() - 4.1).abs() < 0.1);
/// // Without a coil the air cannot be led below its dew point: the second step says so.
/// let failed = run(&outdoor.into(), &[Step::Mix(room.into()), Step::ToTemperature(Temperature::from_celsius(5.0))], &mut []);
/// assert_eq!(failed.unwrap_err().step, 1);
/// # Ok::<(), Box<dyn core::error::Error>>(())
/// ```
pub fn run<S: Scalar>(
    entering: &WetStream<S>,
    steps: &[Step<S>],
    results: &mut [Option<StepResult<S>>],
) -> Result<Total<S>, SequenceError> {
    results.fill(None);
    let mut places = results.iter_mut();
    let mut sequence = Sequence::new(entering);
    for (index, step) in steps.iter().enumerate() {
        let done = sequence.pass(step).map_err(|error| SequenceError { step: index, error })?;
        if let Some(place) = places.next() {
            *place = Some(done);
        }
    }
    Ok(sequence.total())
}

/// A chain that is built while it runs, for a caller without an array of its steps. [`run`] is this with each step of a slice.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::AirStream;
/// use moistair_core::sequence::{Sequence, Step};
/// let air: MoistAir = MoistAir::from_dry_bulb(
///     Temperature::from_celsius(5.0), RelativeHumidity::from_percent(70.0), Pressure::from_kilopascals(101.325))?;
/// let mut sequence = Sequence::new(&AirStream::new(air, MassFlow::from_kilograms_per_second(1.0))?.into());
/// let heater = sequence.pass(&Step::ToTemperature(Temperature::from_celsius(22.0)))?;
/// assert_eq!(heater.loads.heating, sequence.total().loads.heating);
/// // What a step refuses changes nothing.
/// assert!(sequence.pass(&Step::ToTemperature(Temperature::from_celsius(900.0))).is_err());
/// assert_eq!(sequence.total().leaving, heater.leaving);
/// # Ok::<(), Error>(())
/// ```
#[derive(Clone, Copy, Debug)]
pub struct Sequence<S = f64> {
    leaving: WetStream<S>,
    exchange: Exchange<S>,
    loads: Loads<S>,
    frost: bool,
    condenses: bool,
    ledger: Ledger<S>,
}

impl<S: Scalar> Sequence<S> {
    /// With what enters the first step.
    #[must_use]
    pub fn new(entering: &WetStream<S>) -> Self {
        let mut ledger = Ledger::empty();
        ledger.entering(entering);
        Self {
            leaving: *entering,
            exchange: Exchange::none(),
            loads: Loads::none(),
            frost: false,
            condenses: false,
            ledger,
        }
    }

    /// Takes the air through one more step.
    ///
    /// # Errors
    /// That of the process; the sequence then stands where it was.
    pub fn pass(&mut self, step: &Step<S>) -> Result<StepResult<S>, Error> {
        let done = step.done(&self.leaving)?;
        let result = done.result(&self.leaving, step.mixed_in());
        self.ledger.exchange(&done.exchange);
        self.ledger.solved(&done.leaving);
        if let Some(other) = step.mixed_in() {
            self.ledger.entering(&other);
        }
        self.leaving = done.leaving;
        self.exchange = self.exchange.plus(&done.exchange);
        self.loads = self.loads.plus(&done.loads);
        self.frost |= done.frost;
        self.condenses |= done.condenses;
        Ok(result)
    }

    /// What the steps did together so far.
    pub fn total(&self) -> Total<S> {
        let mut ledger = self.ledger;
        ledger.leaving(&self.leaving);
        Total {
            leaving: self.leaving,
            exchange: self.exchange,
            loads: self.loads,
            frost: self.frost,
            condenses: self.condenses,
            books: ledger.books(),
        }
    }
}
