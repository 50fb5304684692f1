//! The conditions of a rule.

use super::load::load_of;
use super::{Economizer, Fallback, Reason, Rule};
use crate::bounds::Quantity;
use crate::error::{Error, NoValue};
use crate::process::measured::{MeasuredAir, Sensed, root_of_squares};
use crate::real::{Scalar, k, normal_probability};
use crate::signal::Quality;

/// One condition: what the outdoor air must not exceed, less what it has.
#[derive(Clone, Copy, Debug)]
pub(super) struct Criterion<S> {
    pub quantity: Quantity,
    pub margin: S,
    pub uncertainty: S,
    pub hysteresis: S,
}

impl<S: Scalar> Criterion<S> {
    /// A condition on a limit that is known, or on the same property of another air.
    fn new(quantity: Quantity, limit: (S, S), outdoor: (S, S), hysteresis: S) -> Option<Self> {
        let (margin, uncertainty) = (limit.0 - outdoor.0, root_of_squares([limit.1, outdoor.1]));
        (margin.is_finite() && uncertainty.is_finite()).then_some(Self { quantity, margin, uncertainty, hysteresis })
    }

    /// Whether it lets an economizer stay on, or go on. Never with a NaN.
    pub fn holds(&self, on: bool) -> bool {
        if on { self.margin >= k(0.0) } else { self.margin > k(0.0) && self.margin >= self.hysteresis }
    }

    /// The probability that the margin is truly positive.
    pub fn probability(&self) -> S {
        if self.uncertainty > k(0.0) {
            return normal_probability(self.margin / self.uncertainty);
        }
        match self.margin.partial_cmp(&k(0.0)) {
            Some(core::cmp::Ordering::Greater) => k(1.0),
            Some(core::cmp::Ordering::Less) => k(0.0),
            _ => k(0.5),
        }
    }

    /// Why it fails.
    pub fn reason(&self) -> Reason {
        match self.quantity {
            Quantity::SpecificEnthalpy => Reason::EnthalpyHigh,
            Quantity::DewPoint => Reason::DewPointHigh,
            Quantity::CoilEnergy => Reason::CoilEnergyHigh,
            _ => Reason::DryBulbHigh,
        }
    }

    /// The margin in units of the hysteresis, so that kelvins can stand beside joules.
    fn relative(&self) -> S {
        let usual = match self.quantity {
            Quantity::SpecificEnthalpy | Quantity::CoilEnergy => k(1_000.0),
            _ => k(1.0),
        };
        self.margin / if self.hysteresis > k(0.0) { self.hysteresis } else { usual }
    }
}

/// All conditions of a rule: one or two.
#[derive(Clone, Copy, Debug)]
pub(super) struct Criteria<S> {
    first: Criterion<S>,
    second: Option<Criterion<S>>,
    pub quality: Quality,
    pub fallback: bool,
}

impl<S: Scalar> Criteria<S> {
    fn one(first: Criterion<S>, quality: Quality) -> Self {
        Self { first, second: None, quality, fallback: false }
    }

    pub fn all(&self, holds: impl Fn(&Criterion<S>) -> bool) -> bool {
        holds(&self.first) && self.second.as_ref().is_none_or(holds)
    }

    /// The one that is nearest to failing, or fails worst.
    pub fn nearest(&self) -> &Criterion<S> {
        match &self.second {
            Some(second) if second.relative() < self.first.relative() => second,
            _ => &self.first,
        }
    }

    /// The one nearest to failing, if it fails and not only the hysteresis is short.
    pub fn first_failing(&self) -> Option<&Criterion<S>> {
        Some(self.nearest()).filter(|nearest| nearest.margin <= k(0.0))
    }

    /// The least probability that a decision is right: of two conditions whose errors may be linked in any way, both hold at least with
    /// p + q − 1, and either fails at least with the larger of their complements (Fréchet 1935).
    pub fn confidence(&self, enabled: bool) -> S {
        let (zero, one) = (k::<S>(0.0), k::<S>(1.0));
        let first = self.first.probability();
        let second = self.second.map_or(one, |second| second.probability());
        if enabled { (first + second - one).at_least(zero) } else { one - first.at_most(second) }
    }
}

impl<S: Scalar> Economizer<S> {
    /// The conditions of the rule by these readings, or why there are none.
    pub(super) fn criteria(&self, outdoor: &MeasuredAir<S>, returned: &MeasuredAir<S>) -> Result<Criteria<S>, Reason> {
        match self.by_rule(outdoor, returned) {
            Err(Reason::OutdoorHumidityBad | Reason::ReturnHumidityBad) if self.fallback == Fallback::DryBulb => {
                let criteria = self.by_dry_bulb(outdoor, returned)?;
                Ok(Criteria { fallback: true, quality: criteria.quality.worst(Quality::Repaired), ..criteria })
            }
            criteria => criteria,
        }
    }

    fn by_rule(&self, outdoor: &MeasuredAir<S>, returned: &MeasuredAir<S>) -> Result<Criteria<S>, Reason> {
        let known = |limit: S| (limit, k::<S>(0.0));
        let enthalpy = self.enthalpy_hysteresis.joules_per_kilogram();
        let condition = |quantity, limit: (S, S), outdoor: (S, S), hysteresis| {
            Criterion::new(quantity, limit, outdoor, hysteresis).ok_or(Reason::OutdoorHumidityBad)
        };
        let of_outdoor = |quantity| property(&self.outdoor(outdoor)?, quantity).ok_or(Reason::OutdoorHumidityBad);
        let of_returned = |quantity| property(&self.returned(returned)?, quantity).ok_or(Reason::ReturnHumidityBad);
        let moist = match self.rule {
            Rule::FixedDryBulb | Rule::DifferentialDryBulb => return self.by_dry_bulb(outdoor, returned),
            Rule::FixedEnthalpy | Rule::FixedEnthalpyAndDryBulb => {
                let limit = known(self.enthalpy_limit.joules_per_kilogram());
                condition(Quantity::SpecificEnthalpy, limit, of_outdoor(Quantity::SpecificEnthalpy)?, enthalpy)?
            }
            Rule::DifferentialEnthalpy | Rule::DifferentialEnthalpyAndDryBulb => {
                let other = of_returned(Quantity::SpecificEnthalpy)?;
                condition(Quantity::SpecificEnthalpy, other, of_outdoor(Quantity::SpecificEnthalpy)?, enthalpy)?
            }
            Rule::DewPointAndDryBulb => {
                let (limit, hysteresis) = (self.dew_point_limit.celsius(), self.temperature_hysteresis.kelvins());
                condition(Quantity::DewPoint, known(limit), of_outdoor(Quantity::DewPoint)?, hysteresis)?
            }
            Rule::LeastCoilEnergy => {
                let of = |air: &Sensed<S>| load_of(air, self.supply);
                let other = of(&self.returned(returned)?).map_err(|_| Reason::ReturnHumidityBad)?;
                let own = of(&self.outdoor(outdoor)?).map_err(|_| Reason::OutdoorHumidityBad)?;
                condition(Quantity::CoilEnergy, other, own, enthalpy)?
            }
        };
        let quality =
            if self.reads_return_air() { outdoor.quality().worst(returned.quality()) } else { outdoor.quality() };
        let criteria = Criteria::one(moist, quality);
        if self.limits_dry_bulb() {
            let second = Some(self.by_dry_bulb(outdoor, returned)?.first);
            return Ok(Criteria { second, ..criteria });
        }
        Ok(criteria)
    }

    /// By dry bulbs alone.
    fn by_dry_bulb(&self, outdoor: &MeasuredAir<S>, returned: &MeasuredAir<S>) -> Result<Criteria<S>, Reason> {
        let read = |air: &MeasuredAir<S>, reason| {
            air.dry_bulb.usable(Quantity::DryBulb, self.basis.formulation()).map_err(|_| reason)
        };
        let own = read(outdoor, Reason::OutdoorDryBulbBad)?;
        let quality = outdoor.dry_bulb.quality;
        let (limit, quality) = if self.reads_return_air() && !self.limits_dry_bulb() {
            (read(returned, Reason::ReturnDryBulbBad)?, quality.worst(returned.dry_bulb.quality))
        } else {
            ((self.dry_bulb_limit.celsius(), k(0.0)), quality)
        };
        let criterion = Criterion::new(Quantity::DryBulb, limit, own, self.temperature_hysteresis.kelvins());
        Ok(Criteria::one(criterion.ok_or(Reason::OutdoorDryBulbBad)?, quality))
    }

    fn limits_dry_bulb(&self) -> bool {
        matches!(
            self.rule,
            Rule::FixedEnthalpyAndDryBulb | Rule::DifferentialEnthalpyAndDryBulb | Rule::DewPointAndDryBulb
        )
    }

    fn reads_return_air(&self) -> bool {
        matches!(
            self.rule,
            Rule::DifferentialDryBulb
                | Rule::DifferentialEnthalpy
                | Rule::DifferentialEnthalpyAndDryBulb
                | Rule::LeastCoilEnergy
        )
    }

    fn outdoor(&self, air: &MeasuredAir<S>) -> Result<Sensed<S>, Reason> {
        self.sensed(air, Reason::OutdoorDryBulbBad, Reason::OutdoorHumidityBad)
    }

    fn returned(&self, air: &MeasuredAir<S>) -> Result<Sensed<S>, Reason> {
        self.sensed(air, Reason::ReturnDryBulbBad, Reason::ReturnHumidityBad)
    }

    fn sensed(&self, air: &MeasuredAir<S>, dry_bulb: Reason, humidity: Reason) -> Result<Sensed<S>, Reason> {
        air.dry_bulb.usable(Quantity::DryBulb, self.basis.formulation()).map_err(|_| dry_bulb)?;
        air.sensed(self.basis).map_err(|_| humidity)
    }
}

/// A property and its standard uncertainty. Air too dry for a dew point has the lowest there is.
fn property<S: Scalar>(air: &Sensed<S>, quantity: Quantity) -> Option<(S, S)> {
    match air.property(quantity) {
        Err(Error::NoValue { quantity: Quantity::DewPoint, reason: NoValue::DryAir | NoValue::BelowSurfaceRange }) => {
            Some((k(Quantity::DewPoint.limits().0), k(0.0)))
        }
        property => property.ok(),
    }
}
