//! What is known about a channel before its first sample.

use super::{Kind, Reason, Unit};

/// Relative humidity up to here is taken as saturated: capacitive sensors read so near saturation.
/// Common practice, no source.
pub const HIGHEST_RELATIVE_HUMIDITY: f64 = 1.03;

/// A step longer than this many nominal intervals is a gap: at least one sample was lost.
/// Common practice, no source.
pub const GAP_INTERVALS: f64 = 1.5;

/// Read in another unit, a value must lie this share of the range above its lower end to name that unit. It keeps an
/// overshoot in L/s from looking like a trickle in L/h. Common practice, no source.
pub const SLIP_FLOOR: f64 = 0.05;

/// A channel in percent that never delivers more than this is suspected of delivering fractions.
/// Common practice, no source.
pub const SLIP_HIGHEST_FRACTION: f64 = 1.05;

/// … if it reaches at least this at some time: a fraction of a fifth is ordinary, 0.2 % is not.
/// Common practice, no source.
pub const SLIP_REACH: f64 = 0.2;

/// … in this many samples that differ from the one before. Common practice, no source.
pub const SLIP_SAMPLES: u32 = 30;

/// … over at least this time, s. Common practice, no source.
pub const SLIP_SECONDS: f64 = 3600.0;

/// What is known about a channel: what it carries, in which unit, within which limits.
///
/// Limits and resolutions are in the unit of the core ([`Kind`]), whatever the raw unit is. A channel that makes no
/// sense is not an error here; [`check`](Self::check) then refuses every sample as [`Reason::ChannelInvalid`].
///
/// ```
/// use moistair_core::signal::{Channel, Unit};
/// let outdoor = Channel::temperature(-40.0, 60.0).with_unit(Unit::Fahrenheit).with_interval(60.0).with_hold(300.0);
/// assert!(outdoor.is_valid());
/// // A temperature does not come in percent, and limits do not go downwards.
/// assert!(!outdoor.with_unit(Unit::Percent).is_valid());
/// assert!(!Channel::temperature(60.0, -40.0).is_valid());
/// ```
#[repr(C)]
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Channel {
    min: f64,
    max: f64,
    pub(super) resolution: f64,
    pub(super) reference_resolution: f64,
    pub(super) hold: f64,
    pub(super) interval: f64,
    kind: i32,
    unit: i32,
    pub(super) stuck_samples: u32,
    pub(super) slip_samples: u32,
}

impl Channel {
    /// A channel of this kind in this raw unit; `min` and `max` in the unit of the core.
    #[must_use]
    pub const fn new(kind: Kind, unit: Unit, min: f64, max: f64) -> Self {
        Self {
            min,
            max,
            resolution: 0.0,
            reference_resolution: 0.0,
            hold: 0.0,
            interval: 0.0,
            kind: kind.code(),
            unit: unit.code(),
            stuck_samples: 0,
            slip_samples: SLIP_SAMPLES,
        }
    }

    /// A temperature in °C, limits °C.
    #[must_use]
    pub const fn temperature(min: f64, max: f64) -> Self {
        Self::new(Kind::Temperature, Unit::Celsius, min, max)
    }

    /// A relative humidity in percent, from 0 to saturation.
    #[must_use]
    pub const fn relative_humidity_percent() -> Self {
        Self::new(Kind::RelativeHumidity, Unit::Percent, 0.0, 1.0)
    }

    /// A relative humidity as a fraction, from 0 to saturation.
    #[must_use]
    pub const fn relative_humidity_fraction() -> Self {
        Self::new(Kind::RelativeHumidity, Unit::Fraction, 0.0, 1.0)
    }

    /// A humidity ratio in kg/kg, limits kg/kg.
    #[must_use]
    pub const fn humidity_ratio(min: f64, max: f64) -> Self {
        Self::new(Kind::HumidityRatio, Unit::KilogramPerKilogram, min, max)
    }

    /// An absolute pressure in Pa, limits Pa.
    #[must_use]
    pub const fn pressure(min: f64, max: f64) -> Self {
        Self::new(Kind::Pressure, Unit::Pascal, min, max)
    }

    /// A difference of pressures in Pa, limits Pa.
    #[must_use]
    pub const fn pressure_difference(min: f64, max: f64) -> Self {
        Self::new(Kind::PressureDifference, Unit::Pascal, min, max)
    }

    /// A volume flow in m³/s, limits m³/s.
    #[must_use]
    pub const fn volume_flow(min: f64, max: f64) -> Self {
        Self::new(Kind::VolumeFlow, Unit::CubicMeterPerSecond, min, max)
    }

    /// A mass flow in kg/s, limits kg/s.
    #[must_use]
    pub const fn mass_flow(min: f64, max: f64) -> Self {
        Self::new(Kind::MassFlow, Unit::KilogramPerSecond, min, max)
    }

    /// A command or a position in percent, from 0 to 100 %.
    #[must_use]
    pub const fn command_percent() -> Self {
        Self::new(Kind::Fraction, Unit::Percent, 0.0, 1.0)
    }

    /// A command or a position as a fraction, from 0 to 1.
    #[must_use]
    pub const fn command_fraction() -> Self {
        Self::new(Kind::Fraction, Unit::Fraction, 0.0, 1.0)
    }

    /// A heat flow or an electric power in W, limits W.
    #[must_use]
    pub const fn power(min: f64, max: f64) -> Self {
        Self::new(Kind::Power, Unit::Watt, min, max)
    }

    /// With another raw unit. Limits stay: they are in the unit of the core.
    #[must_use]
    pub const fn with_unit(mut self, unit: Unit) -> Self {
        self.unit = unit.code();
        self
    }

    /// With other limits, in the unit of the core.
    #[must_use]
    pub const fn with_range(mut self, min: f64, max: f64) -> Self {
        (self.min, self.max) = (min, max);
        self
    }

    /// With a nominal sample interval, s; a step longer than [`GAP_INTERVALS`] of it is a gap. Zero (the default): no
    /// step is a gap.
    #[must_use]
    pub const fn with_interval(mut self, seconds: f64) -> Self {
        self.interval = seconds;
        self
    }

    /// With the last good value standing in for a refused one, up to this age of it, s. Zero (the default): never.
    ///
    /// A stuck signal, fractions in place of percent, and a time that does not increase are not filled.
    #[must_use]
    pub const fn with_hold(mut self, seconds: f64) -> Self {
        self.hold = seconds;
        self
    }

    /// Refused as [`Reason::Stuck`] from the sample on that is the `samples`th in a row within `resolution` (unit of the
    /// core) of the first of them, until one is not. Zero (the default) or one sample: no stuck rule.
    ///
    /// Choose the resolution below the smallest step of the signal, since two decimals exactly one resolution apart can
    /// round to either side. Choose the row longer than the longest true calm: outdoor air stays at 100 % for a foggy night, a command for a
    /// season. Missing and out-of-range samples neither lengthen nor break the row.
    #[must_use]
    pub const fn with_stuck(mut self, resolution: f64, samples: u32) -> Self {
        self.resolution = resolution;
        self.stuck_samples = samples;
        self
    }

    /// How far the reference of [`check_beside`](Self::check_beside) must move, in its own unit, to prove that the
    /// plant is not simply steady.
    #[must_use]
    pub const fn with_reference_resolution(mut self, resolution: f64) -> Self {
        self.reference_resolution = resolution;
        self
    }

    /// A channel in percent is refused as [`Reason::LooksLikeFraction`] after this many samples that speak for it
    /// (default [`SLIP_SAMPLES`]). Zero: never, for air that really is that dry.
    #[must_use]
    pub const fn with_slip_samples(mut self, samples: u32) -> Self {
        self.slip_samples = samples;
        self
    }

    /// What it carries; `None` when the code is none.
    #[must_use]
    pub const fn kind(&self) -> Option<Kind> {
        Kind::from_code(self.kind)
    }

    /// The unit of the raw signal; `None` when the code is none.
    #[must_use]
    pub const fn unit(&self) -> Option<Unit> {
        Unit::from_code(self.unit)
    }

    /// The lowest value allowed, in the unit of the core.
    #[must_use]
    pub const fn min(&self) -> f64 {
        self.min
    }

    /// The highest value allowed, in the unit of the core.
    #[must_use]
    pub const fn max(&self) -> f64 {
        self.max
    }

    /// Whether the channel makes sense: limits finite and in order, times and resolutions not negative, unit and kind of
    /// one quantity.
    #[must_use]
    pub const fn is_valid(&self) -> bool {
        self.decode().is_some()
    }

    /// Kind and unit of a valid channel.
    pub(super) const fn decode(&self) -> Option<(Kind, Unit)> {
        let limits = self.min.is_finite() && self.max.is_finite() && self.min < self.max;
        let widths = self.resolution >= 0.0 && self.reference_resolution >= 0.0;
        let times = self.hold >= 0.0 && self.interval >= 0.0;
        match (self.kind(), self.unit()) {
            (Some(kind), Some(unit)) if limits && widths && times && unit.measures(kind) => Some((kind, unit)),
            _ => None,
        }
    }

    /// Whether a value in the unit of the core is within the limits.
    pub(super) const fn contains(&self, value: f64) -> bool {
        self.min <= value && value <= self.max
    }

    /// Why an out-of-range reading may be out of range: the one other unit in which it would be in range, or plainly
    /// `otherwise`.
    pub(super) fn likely_slip(&self, kind: Kind, unit: Unit, raw: f64, otherwise: Reason) -> Reason {
        let floor = self.min + SLIP_FLOOR * (self.max - self.min);
        let mut fitting = Unit::ALL.into_iter().filter(|other| {
            let value = other.to_core(raw);
            *other != unit && other.measures(kind) && floor <= value && value <= self.max
        });
        match (fitting.next(), fitting.next()) {
            (Some(only), None) => only.looks_like(),
            (Some(_), Some(_)) => Reason::LooksLikeOtherUnit,
            _ => otherwise,
        }
    }
}
