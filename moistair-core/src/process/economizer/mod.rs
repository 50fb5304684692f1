//! Air-side economizer: whether outdoor air saves cooling, how sure that is, and how much of it to take.
//!
//! [`Economizer::decide`] compares outdoor air with a limit or with the return air by a [`Rule`], keeps hysteresis and least times
//! in a state that the caller owns, and says by how much and how surely it decided. It always answers. Whatever is wrong with a
//! reading, a setting or the clock, the answer is the safe one, least outdoor air, or where [`Fallback::DryBulb`] is set and only a
//! humidity is missing, that of the dry bulbs alone.
//!
//! Rules are those that ASHRAE Standard 90.1 lists as high limits (2016, Table 6.5.1.1.3, and 2010 for the dew point; its values
//! here are from memory: [`DRY_BULB_LIMIT`], [`ENTHALPY_LIMIT`], [`DEW_POINT_LIMIT`]), and the one that they stand in for: which of
//! the two airs the coil has less work with ([`coil_load`]). On a dry coil that is the cooler one, on a wet coil the one of lower
//! enthalpy. With the errors of real humidity sensors a switch by enthalpy may do worse than one by dry bulb (Taylor and Cheng
//! 2010, "Economizer high limit controls and why enthalpy economizers don't work", ASHRAE Journal 52(11)): look at the confidence
//! before trusting it.
//!
//! *Left out*: heat of fans, pressure drops, the work of humidifying dry air back, leaking dampers, stratification. *Not for* air that may
//! not be recirculated or taken in (smoke, contamination).
//!
//! *Caution.* The freeze lockout is an economy of dampers, not a protection: coils freeze and burst within minutes, and only a
//! hard-wired freezestat, which acts without any of this (trips near 2 to 3 °C, common practice, no source), protects them. The
//! least outdoor air is set by ventilation codes, which govern.

mod criterion;
mod load;
mod state;

pub use load::{CoilLoad, Supply, coil_load};
pub use state::EconomizerState;

use criterion::{Criteria, Criterion};

use crate::basis::Basis;
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::process::measured::MeasuredAir;
use crate::process::mixing::outdoor_air::{Blend, FractionLimits, Reach, for_mixed_temperature, mixed};
use crate::quantity::{DewPoint, RelativeHumidity, SpecificEnthalpy, Temperature, TemperatureDifference};
use crate::real::{Scalar, k};
use crate::signal::Quality;
use crate::signal::coded::coded_enum;
use crate::state::MoistAir;
use crate::state::condensate::checked_pressure;

/// 75 °F, °C: the fixed dry bulb of dry and of marine climates in ASHRAE 90.1 (from memory; 65 or 70 °F in moist ones).
pub const DRY_BULB_LIMIT: f64 = 43.0 / 1.8;
/// 28 Btu/lb on the handbook's datum of 0 °F, as J/kg on that of 0 °C: 47.2 kJ/kg, not 65.1. Near sea level; elsewhere
/// [`enthalpy_limit`]. ASHRAE 90.1 (from memory).
pub const ENTHALPY_LIMIT: f64 = 28.0 * 2_326.0 - 17_884.444;
/// 55 °F, °C: ASHRAE 90.1-2010 (from memory).
pub const DEW_POINT_LIMIT: f64 = 23.0 / 1.8;

/// The fixed enthalpy limit at another pressure: that of air of 75 °F and 50 %, as ASHRAE 90.1 has it away from sea level (from memory).
///
/// # Errors
/// As [`MoistAir::from_dry_bulb`] for the pressure.
pub fn enthalpy_limit<S: Scalar>(basis: Basis<S>) -> Result<SpecificEnthalpy<S>, Error> {
    let at = Temperature::from_celsius(k(DRY_BULB_LIMIT));
    Ok(MoistAir::from_dry_bulb(at, RelativeHumidity::from_fraction(k(0.5)), basis)?.specific_enthalpy())
}

coded_enum! {
    /// What outdoor air must not exceed. Several conditions must all hold.
    Rule {
        /// Outdoor dry bulb: the limit.
        FixedDryBulb = 0, "fixed dry bulb";
        /// Outdoor dry bulb: that of the return air.
        DifferentialDryBulb = 1, "differential dry bulb";
        /// Outdoor enthalpy: the limit.
        FixedEnthalpy = 2, "fixed enthalpy";
        /// Outdoor enthalpy: that of the return air.
        DifferentialEnthalpy = 3, "differential enthalpy";
        /// Outdoor enthalpy and dry bulb: the limits.
        FixedEnthalpyAndDryBulb = 4, "fixed enthalpy and fixed dry bulb";
        /// Outdoor enthalpy: that of the return air; dry bulb: the limit.
        DifferentialEnthalpyAndDryBulb = 5, "differential enthalpy and fixed dry bulb";
        /// Outdoor dew point and dry bulb: the limits.
        DewPointAndDryBulb = 6, "fixed dew point and fixed dry bulb";
        /// What the coil would take out of outdoor air: what it would out of return air.
        LeastCoilEnergy = 7, "least coil energy";
    }
}

coded_enum! {
    /// What to do when a humidity is missing and the temperatures are not.
    Fallback {
        /// Least outdoor air.
        LeastOutdoorAir = 0, "least outdoor air";
        /// Decide by dry bulb: by its limit where the rule has one or has a fixed enthalpy, else by that of the return air.
        DryBulb = 1, "dry bulb";
    }
}

coded_enum! {
    /// Why it was decided so.
    Reason {
        /// On: outdoor air is favorable.
        Favorable = 0, "outdoor air is favorable";
        /// On: no longer favorable, but on for less than the least time.
        LeastTimeOn = 1, "on for the least time";
        /// Off: the outdoor dry bulb is too high.
        DryBulbHigh = 2, "outdoor dry bulb too high";
        /// Off: the outdoor enthalpy is too high.
        EnthalpyHigh = 3, "outdoor enthalpy too high";
        /// Off: the outdoor dew point is too high.
        DewPointHigh = 4, "outdoor dew point too high";
        /// Off: outdoor air would cost the coil as much or more.
        CoilEnergyHigh = 5, "outdoor air costs the coil more";
        /// Off: favorable, but not yet by the hysteresis.
        WithinHysteresis = 6, "within the hysteresis";
        /// Off: favorable, but off for less than the least time.
        LeastTimeOff = 7, "off for the least time";
        /// Off: outdoor air so cold that the dampers stay at their least.
        FreezeLockout = 8, "freeze lockout";
        /// Off: no usable outdoor dry bulb.
        OutdoorDryBulbBad = 9, "outdoor dry bulb not usable";
        /// Off: no usable outdoor humidity, or none at this dry bulb.
        OutdoorHumidityBad = 10, "outdoor humidity not usable";
        /// Off: no usable return dry bulb.
        ReturnDryBulbBad = 11, "return dry bulb not usable";
        /// Off: no usable return humidity, or none at this dry bulb.
        ReturnHumidityBad = 12, "return humidity not usable";
        /// Off: the settings make no sense; [`Economizer::check`] says which.
        SettingsInvalid = 13, "settings not valid";
        /// Off: the time is no number or beyond [`crate::signal::LONGEST_TIME`].
        ClockInvalid = 14, "time not valid";
    }
}

/// The settings of an economizer. [`Economizer::new`] gives usual ones.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Economizer<S = f64> {
    /// The rule.
    pub rule: Rule,
    /// Pressure of the site and formulation.
    pub basis: Basis<S>,
    /// Fixed limit of the outdoor dry bulb.
    pub dry_bulb_limit: Temperature<S>,
    /// Fixed limit of the outdoor enthalpy.
    pub enthalpy_limit: SpecificEnthalpy<S>,
    /// Fixed limit of the outdoor dew point.
    pub dew_point_limit: DewPoint<S>,
    /// What the coil is to supply, for [`Rule::LeastCoilEnergy`].
    pub supply: Supply<S>,
    /// By how much a dry bulb or dew point must be below its limit before it switches on; it switches off at the limit. Also by how much
    /// the outdoor air must warm above the freeze limit.
    pub temperature_hysteresis: TemperatureDifference<S>,
    /// The same of an enthalpy or a coil energy.
    pub enthalpy_hysteresis: SpecificEnthalpy<S>,
    /// Least time on, s. A bad reading and the freeze lockout do not wait for it.
    pub least_time_on: f64,
    /// Least time off, s; the first time does not wait for it.
    pub least_time_off: f64,
    /// Below this outdoor dry bulb the dampers stay at their least.
    pub freeze_limit: Temperature<S>,
    /// When a humidity is missing.
    pub fallback: Fallback,
}

/// What was decided.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Decision<S = f64> {
    /// Whether outdoor air beyond the least may be taken.
    pub enabled: bool,
    /// Why.
    pub reason: Reason,
    /// How far the outdoor air is below what it must not exceed: positive speaks for outdoor air, negative against it. Of several
    /// conditions, the one that is nearest to failing, measured by its hysteresis (1 K, 1 kJ/kg where there is none). Under freeze
    /// lockout, how far it is above the freeze limit. 0 where nothing could be compared. Always finite.
    pub margin: S,
    /// Standard uncertainty of the margin by that of the readings.
    pub margin_uncertainty: S,
    /// What the margin is a difference of: [`Quantity::DryBulb`], [`Quantity::SpecificEnthalpy`], [`Quantity::DewPoint`] or
    /// [`Quantity::CoilEnergy`]; its unit.
    pub margin_quantity: Quantity,
    /// Probability that the air truly lies on the side that was decided for: Φ(margin / uncertainty) when on, 1 − Φ when off. Of
    /// several conditions, the least that it can be however their errors are linked. 0.5 is a coin toss; 0 where nothing could be
    /// compared. While hysteresis or a least time holds a decision it may be below 0.5.
    pub confidence: S,
    /// The worst quality of the readings that were used; at best repaired under fallback, refused where there was none.
    pub quality: Quality,
    /// Whether the dry bulbs alone decided, for want of a humidity.
    pub fallback: bool,
}

impl<S: Scalar> Economizer<S> {
    /// A rule at a site, with the limits of ASHRAE 90.1 (from memory), a supply of 13 °C off a coil at 95 %, hysteresis of 1 K and
    /// 1 kJ/kg, least times of 300 s, lockout below 0 °C and least outdoor air when a humidity is missing (the latter five common
    /// practice, no source).
    pub fn new(rule: Rule, basis: impl Into<Basis<S>>) -> Self {
        Self {
            rule,
            basis: basis.into(),
            dry_bulb_limit: Temperature::from_celsius(k(DRY_BULB_LIMIT)),
            enthalpy_limit: SpecificEnthalpy::from_joules_per_kilogram(k(ENTHALPY_LIMIT)),
            dew_point_limit: DewPoint::from_celsius(k(DEW_POINT_LIMIT)),
            supply: Supply {
                dry_bulb: Temperature::from_celsius(k(13.0)),
                coil_leaving: RelativeHumidity::from_fraction(k(0.95)),
            },
            temperature_hysteresis: TemperatureDifference::from_kelvins(k(1.0)),
            enthalpy_hysteresis: SpecificEnthalpy::from_joules_per_kilogram(k(1_000.0)),
            least_time_on: 300.0,
            least_time_off: 300.0,
            freeze_limit: Temperature::from_celsius(k(0.0)),
            fallback: Fallback::LeastOutdoorAir,
        }
    }

    /// What is wrong with the settings, if anything.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`], and as [`MoistAir::from_dry_bulb`] for a supply that is no state.
    ///
    /// ```
    /// use moistair_core::*;
    /// use moistair_core::process::economizer::{Economizer, Rule};
    /// let settings: Economizer = Economizer::new(Rule::FixedEnthalpy, Pressure::from_kilopascals(101.325));
    /// assert!(settings.check().is_ok());
    /// assert!(Economizer { temperature_hysteresis: TemperatureDifference::from_kelvins(-1.0), ..settings }.check().is_err());
    /// ```
    pub fn check(&self) -> Result<(), Error> {
        let formulation = self.basis.formulation();
        checked_pressure(&self.basis)?;
        checked_for(formulation, Quantity::DryBulb, self.dry_bulb_limit.celsius())?;
        checked_for(formulation, Quantity::SpecificEnthalpy, self.enthalpy_limit.joules_per_kilogram())?;
        checked_for(formulation, Quantity::DewPoint, self.dew_point_limit.celsius())?;
        checked(Quantity::TemperatureHysteresis, self.temperature_hysteresis.kelvins())?;
        checked(Quantity::EnthalpyHysteresis, self.enthalpy_hysteresis.joules_per_kilogram())?;
        checked(Quantity::Duration, self.least_time_on)?;
        checked(Quantity::Duration, self.least_time_off)?;
        checked_for(formulation, Quantity::DryBulb, self.freeze_limit.celsius())?;
        self.supply.off_coil(self.basis).map(|_| ())
    }

    /// Decides at a time, s since any fixed instant, from the readings of outdoor and return air, and notes it in the state.
    ///
    /// Only what the rule needs is read: a fixed limit no return air, a rule of dry bulbs no humidity. Relative humidities above one are
    /// refused; [`crate::signal::Channel`] takes those slightly above as saturated. Clocks may stand still or be set back.
    ///
    /// Accuracy: that of the state; uncertainties by exact derivatives, to the first order, one-sided where a coil turns from dry to wet.
    /// Work: fixed, but for the making of the two states.
    ///
    /// ```
    /// use moistair_core::*;
    /// use moistair_core::process::economizer::{Economizer, EconomizerState, Reason, Rule};
    /// use moistair_core::process::measured::{MeasuredAir, Reading};
    /// let site = Pressure::from_kilopascals(101.325);
    /// let settings = Economizer::new(Rule::DifferentialEnthalpy, site);
    /// let air = |t, rh| MeasuredAir::from_relative_humidity(Reading::within(t, 0.5), Reading::within(rh, 0.03));
    /// let mut state = EconomizerState::default();
    ///
    /// let cool = settings.decide(&mut state, 0.0, &air(16.0, 0.70), &air(24.0, 0.50));
    /// assert!(cool.enabled && cool.confidence > 0.99);
    /// let toss = settings.decide(&mut state, 600.0, &air(22.0, 0.60), &air(24.0, 0.50));
    /// assert!(toss.enabled && toss.confidence < 0.7);
    ///
    /// // A sensor without a reading: off, at once.
    /// let blind = settings.decide(&mut state, 601.0, &air(16.0, f64::NAN), &air(24.0, 0.50));
    /// assert!(!blind.enabled && blind.reason == Reason::OutdoorHumidityBad);
    /// ```
    pub fn decide(
        &self,
        state: &mut EconomizerState,
        time: f64,
        outdoor: &MeasuredAir<S>,
        returned: &MeasuredAir<S>,
    ) -> Decision<S> {
        let decision = if !state.take_time(time) {
            Decision::safe(Reason::ClockInvalid)
        } else if self.check().is_err() {
            Decision::safe(Reason::SettingsInvalid)
        } else {
            self.judge(state, outdoor, returned)
        };
        state.set(decision.enabled);
        decision
    }

    /// What the readings say, held by hysteresis and least times.
    fn judge(&self, state: &mut EconomizerState, outdoor: &MeasuredAir<S>, returned: &MeasuredAir<S>) -> Decision<S> {
        let formulation = self.basis.formulation();
        let Ok((celsius, uncertainty)) = outdoor.dry_bulb.usable(Quantity::DryBulb, formulation) else {
            return Decision::safe(Reason::OutdoorDryBulbBad);
        };
        let cold = Criterion {
            quantity: Quantity::DryBulb,
            margin: celsius - self.freeze_limit.celsius(),
            uncertainty,
            hysteresis: self.temperature_hysteresis.kelvins(),
        };
        state.set_frozen(!cold.holds(!state.is_frozen()));
        if state.is_frozen() {
            let confidence = k::<S>(1.0) - cold.probability();
            return Decision::by(false, Reason::FreezeLockout, &cold, confidence, outdoor.dry_bulb.quality);
        }
        match self.criteria(outdoor, returned) {
            Ok(criteria) => self.hold(state, &criteria),
            Err(reason) => Decision::safe(reason),
        }
    }

    fn hold(&self, state: &EconomizerState, criteria: &Criteria<S>) -> Decision<S> {
        let nearest = criteria.nearest();
        let wanted = criteria.all(|criterion| criterion.holds(state.is_on()));
        let (enabled, reason) = match (state.is_on(), wanted) {
            (true, true) => (true, Reason::Favorable),
            (true, false) if state.is_younger_than(self.least_time_on) => (true, Reason::LeastTimeOn),
            (false, true) if state.is_younger_than(self.least_time_off) => (false, Reason::LeastTimeOff),
            (false, true) => (true, Reason::Favorable),
            (_, false) => (false, criteria.first_failing().map_or(Reason::WithinHysteresis, Criterion::reason)),
        };
        let confidence = criteria.confidence(enabled);
        let decision = Decision::by(enabled, reason, nearest, confidence, criteria.quality);
        Decision { fallback: criteria.fallback, ..decision }
    }
}

impl<S: Scalar> Decision<S> {
    /// Least outdoor air, since nothing could be compared.
    fn safe(reason: Reason) -> Self {
        let zero = k(0.0);
        Self {
            enabled: false,
            reason,
            margin: zero,
            margin_uncertainty: zero,
            margin_quantity: Quantity::DryBulb,
            confidence: zero,
            quality: Quality::Refused,
            fallback: false,
        }
    }

    fn by(enabled: bool, reason: Reason, nearest: &Criterion<S>, confidence: S, quality: Quality) -> Self {
        Self {
            enabled,
            reason,
            margin: nearest.margin,
            margin_uncertainty: nearest.uncertainty,
            margin_quantity: nearest.quantity,
            confidence,
            quality,
            fallback: false,
        }
    }

    /// How much outdoor air to take by a decision, of two states: the least when off; when on, what mixes to the wanted
    /// temperature. Where that is colder than both, outdoor air as far as the dampers go, and the coil does the rest; where it is
    /// warmer than both, the nearest.
    ///
    /// # Errors
    /// As [`for_mixed_temperature`].
    ///
    /// ```
    /// use moistair_core::*;
    /// use moistair_core::process::economizer::{Economizer, EconomizerState, Rule};
    /// use moistair_core::process::measured::{MeasuredAir, Reading};
    /// use moistair_core::process::mixing::outdoor_air::FractionLimits;
    /// let settings: Economizer = Economizer::new(Rule::DifferentialDryBulb, Pressure::from_kilopascals(101.325));
    /// let air = |t, rh| MeasuredAir::from_relative_humidity(Reading::new(t, 0.2), Reading::new(rh, 0.02));
    /// let (outdoor, returned) = (air(5.0, 0.7), air(24.0, 0.45));
    /// let decision = settings.decide(&mut EconomizerState::default(), 0.0, &outdoor, &returned);
    /// let (outdoor, returned) = (outdoor.state(settings.basis)?, returned.state(settings.basis)?);
    /// let limits = FractionLimits::from_least(0.2);
    /// let blend = decision.outdoor_air(&outdoor, &returned, Temperature::from_celsius(14.0), limits)?;
    /// assert!((blend.fraction - 0.525).abs() < 0.005);
    /// # Ok::<(), Error>(())
    /// ```
    pub fn outdoor_air(
        &self,
        outdoor: &MoistAir<S>,
        returned: &MoistAir<S>,
        wanted: Temperature<S>,
        limits: FractionLimits<S>,
    ) -> Result<Blend<S>, Error> {
        outdoor_air(self.enabled, outdoor, returned, wanted, limits)
    }
}

/// [`Decision::outdoor_air`] where only is left whether outdoor air may be taken.
///
/// # Errors
/// As [`for_mixed_temperature`].
pub fn outdoor_air<S: Scalar>(
    enabled: bool,
    outdoor: &MoistAir<S>,
    returned: &MoistAir<S>,
    wanted: Temperature<S>,
    limits: FractionLimits<S>,
) -> Result<Blend<S>, Error> {
    let limits = limits.checked()?;
    let celsius = checked_for(outdoor.formulation(), Quantity::LeavingTemperature, wanted.celsius())?;
    let at = |fraction, reach| mixed(outdoor, returned, fraction).map(|mixed| Blend { fraction, mixed, reach });
    if !enabled {
        return at(limits.least, Reach::AtLeast);
    }
    if celsius < outdoor.dry_bulb().celsius().at_most(returned.dry_bulb().celsius()) {
        return at(limits.most, Reach::AtMost);
    }
    for_mixed_temperature(outdoor, returned, wanted, limits)
}
