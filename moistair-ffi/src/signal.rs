//! Check and repair of measured signals.

use core::ffi::c_char;
use core::mem::transmute;

use moistair_core::columns::NAN;
use moistair_core::signal::{Channel, ChannelState, Checked, Kind, Quality, Reason, Unit};

use crate::memory::{Answer, answer, check, read, report, write};
use crate::status::{Failure, moistair_error};
use crate::text::{Text, texts};

/// A temperature, °C.
pub const MOISTAIR_KIND_TEMPERATURE: i32 = 1;
/// A relative humidity, fraction.
pub const MOISTAIR_KIND_RELATIVE_HUMIDITY: i32 = 2;
/// An absolute pressure, Pa.
pub const MOISTAIR_KIND_PRESSURE: i32 = 3;
/// A difference of pressures, Pa.
pub const MOISTAIR_KIND_PRESSURE_DIFFERENCE: i32 = 4;
/// A volume flow, m³/s.
pub const MOISTAIR_KIND_VOLUME_FLOW: i32 = 5;
/// A mass flow, kg/s.
pub const MOISTAIR_KIND_MASS_FLOW: i32 = 6;
/// A command, a position, a share: fraction.
pub const MOISTAIR_KIND_FRACTION: i32 = 7;
/// A humidity ratio, kg/kg.
pub const MOISTAIR_KIND_HUMIDITY_RATIO: i32 = 8;
/// A heat flow or an electric power, W.
pub const MOISTAIR_KIND_POWER: i32 = 9;
/// A time or a duration, s.
pub const MOISTAIR_KIND_TIME: i32 = 10;
/// An amount of heat or of electric energy, J.
pub const MOISTAIR_KIND_ENERGY: i32 = 11;
/// An enthalpy per mass of dry air, J/kg.
pub const MOISTAIR_KIND_SPECIFIC_ENTHALPY: i32 = 12;

/// °C.
pub const MOISTAIR_UNIT_CELSIUS: i32 = 1;
/// °F.
pub const MOISTAIR_UNIT_FAHRENHEIT: i32 = 2;
/// K.
pub const MOISTAIR_UNIT_KELVIN: i32 = 3;
/// 1.
pub const MOISTAIR_UNIT_FRACTION: i32 = 4;
/// %.
pub const MOISTAIR_UNIT_PERCENT: i32 = 5;
/// Pa.
pub const MOISTAIR_UNIT_PASCAL: i32 = 6;
/// hPa, the same as mbar.
pub const MOISTAIR_UNIT_HECTOPASCAL: i32 = 7;
/// kPa.
pub const MOISTAIR_UNIT_KILOPASCAL: i32 = 8;
/// bar.
pub const MOISTAIR_UNIT_BAR: i32 = 9;
/// lbf/in².
pub const MOISTAIR_UNIT_POUND_PER_SQUARE_INCH: i32 = 10;
/// Inch of mercury at 32 °F: 3386.389 Pa
pub const MOISTAIR_UNIT_INCH_OF_MERCURY: i32 = 11;
/// m³/s.
pub const MOISTAIR_UNIT_CUBIC_METER_PER_SECOND: i32 = 12;
/// m³/h.
pub const MOISTAIR_UNIT_CUBIC_METER_PER_HOUR: i32 = 13;
/// L/s.
pub const MOISTAIR_UNIT_LITER_PER_SECOND: i32 = 14;
/// ft³/min.
pub const MOISTAIR_UNIT_CUBIC_FOOT_PER_MINUTE: i32 = 15;
/// kg/s.
pub const MOISTAIR_UNIT_KILOGRAM_PER_SECOND: i32 = 16;
/// kg/h.
pub const MOISTAIR_UNIT_KILOGRAM_PER_HOUR: i32 = 17;
/// lb/h.
pub const MOISTAIR_UNIT_POUND_PER_HOUR: i32 = 18;
/// kg/kg.
pub const MOISTAIR_UNIT_KILOGRAM_PER_KILOGRAM: i32 = 19;
/// g/kg.
pub const MOISTAIR_UNIT_GRAM_PER_KILOGRAM: i32 = 20;
/// W.
pub const MOISTAIR_UNIT_WATT: i32 = 21;
/// kW.
pub const MOISTAIR_UNIT_KILOWATT: i32 = 22;
/// s.
pub const MOISTAIR_UNIT_SECOND: i32 = 23;
/// min.
pub const MOISTAIR_UNIT_MINUTE: i32 = 24;
/// h.
pub const MOISTAIR_UNIT_HOUR: i32 = 25;
/// J.
pub const MOISTAIR_UNIT_JOULE: i32 = 26;
/// kWh.
pub const MOISTAIR_UNIT_KILOWATT_HOUR: i32 = 27;
/// J/kg.
pub const MOISTAIR_UNIT_JOULE_PER_KILOGRAM: i32 = 28;
/// kJ/kg.
pub const MOISTAIR_UNIT_KILOJOULE_PER_KILOGRAM: i32 = 29;

/// The reading as it came, converted to the unit of the core.
pub const MOISTAIR_QUALITY_GOOD: i32 = 0;
/// A usable value that is not quite the reading: clipped to saturation, or the last good value held.
pub const MOISTAIR_QUALITY_REPAIRED: i32 = 1;
/// No value.
pub const MOISTAIR_QUALITY_REFUSED: i32 = 2;

/// Nothing to remark.
pub const MOISTAIR_REASON_OK: i32 = 0;
/// No reading: NaN.
pub const MOISTAIR_REASON_MISSING: i32 = 1;
/// Below the lowest value that the channel allows.
pub const MOISTAIR_REASON_BELOW_RANGE: i32 = 2;
/// Above the highest value that the channel allows, for a relative humidity above 1.03.
pub const MOISTAIR_REASON_ABOVE_RANGE: i32 = 3;
/// A relative humidity slightly above one, taken as exactly one.
pub const MOISTAIR_REASON_ABOVE_SATURATION: i32 = 4;
/// Unchanged for longer than a living signal would be.
pub const MOISTAIR_REASON_STUCK: i32 = 5;
/// A good reading after a pause: nothing may be integrated across the pause. A total judges that once more, by the longest step that it bridges.
pub const MOISTAIR_REASON_GAP: i32 = 6;
/// The time is not later than the time before.
pub const MOISTAIR_REASON_TIME_NOT_INCREASING: i32 = 7;
/// The time is no number or beyond 1e11 s.
pub const MOISTAIR_REASON_TIME_INVALID: i32 = 8;
/// Refused, and filled with the last good value; the field cause of moistair_checked says what was wrong.
pub const MOISTAIR_REASON_HELD: i32 = 9;
/// The channel itself makes no sense: limits the wrong way round, a unit of another quantity.
pub const MOISTAIR_REASON_CHANNEL_INVALID: i32 = 10;
/// In degrees Celsius the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_CELSIUS: i32 = 11;
/// In degrees Fahrenheit the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_FAHRENHEIT: i32 = 12;
/// In kelvin the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_KELVIN: i32 = 13;
/// A channel in percent that delivers fractions.
pub const MOISTAIR_REASON_LOOKS_LIKE_FRACTION: i32 = 14;
/// A channel in fractions that delivers percent.
pub const MOISTAIR_REASON_LOOKS_LIKE_PERCENT: i32 = 15;
/// In pascal the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_PASCAL: i32 = 16;
/// In hectopascal (millibar) the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_HECTOPASCAL: i32 = 17;
/// In kilopascal the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_KILOPASCAL: i32 = 18;
/// In bar the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_BAR: i32 = 19;
/// In pounds per square inch the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_POUND_PER_SQUARE_INCH: i32 = 20;
/// In inches of mercury the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_INCH_OF_MERCURY: i32 = 21;
/// In a unit without a reason of its own, or in each of several units, the reading would be in range.
pub const MOISTAIR_REASON_LOOKS_LIKE_OTHER_UNIT: i32 = 22;

/// What is known about a channel before its first sample. Limits and resolutions are in the unit of the core, which the kinds name.
/// Make one with moistair_channel_new, then set what differs.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_channel {
    /// The lowest value allowed.
    pub min: f64,
    /// The highest value allowed.
    pub max: f64,
    /// Samples within this of each other count as unchanged. Below the smallest step of the signal.
    pub resolution: f64,
    /// How far the reference of moistair_channel_check_beside must move to show that the plant is not simply steady.
    pub reference_resolution: f64,
    /// How old the last good value may be to stand in for a refused one [s]; 0: never.
    pub hold: f64,
    /// Nominal sample interval [s]; a step longer than 1.5 of it is a gap; 0: no step is.
    pub interval: f64,
    /// What the channel carries, MOISTAIR_KIND_…
    pub kind: i32,
    /// The unit of the raw readings, MOISTAIR_UNIT_…
    pub unit: i32,
    /// Unchanged samples in a row that are taken as stuck; 0: no such rule.
    pub stuck_samples: u32,
    /// Samples after which a channel in percent that delivers fractions is refused; 0: never.
    pub slip_samples: u32,
}

/// What a channel remembers from sample to sample. Zeroed at first; may be copied and stored, not looked into.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_channel_state {
    /// Zero at first.
    pub words: [u64; 12],
}

/// A checked sample.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_checked {
    /// The value in the unit of the core; NaN when refused.
    pub value: f64,
    /// How far it can be trusted, MOISTAIR_QUALITY_…
    pub quality: i32,
    /// Why, MOISTAIR_REASON_…
    pub reason: i32,
    /// What was wrong with the reading: the reason, unless that is MOISTAIR_REASON_HELD.
    pub cause: i32,
    /// 1 if a gap lies before this sample, so that nothing may be integrated across it; else 0.
    pub after_gap: i32,
}

impl moistair_channel {
    fn to_core(self) -> Result<Channel, Failure> {
        let (kind, unit) = (self::kind(self.kind)?, self::unit(self.unit)?);
        Ok(Channel::new(kind, unit, self.min, self.max)
            .with_stuck(self.resolution, self.stuck_samples)
            .with_reference_resolution(self.reference_resolution)
            .with_hold(self.hold)
            .with_interval(self.interval)
            .with_slip_samples(self.slip_samples))
    }
}

impl moistair_channel_state {
    fn to_core(self) -> ChannelState {
        // SAFETY: a state is numbers without padding, and any bits are one.
        unsafe { transmute::<[u64; 12], ChannelState>(self.words) }
    }
}

impl From<ChannelState> for moistair_channel_state {
    fn from(state: ChannelState) -> Self {
        // SAFETY: as above.
        Self { words: unsafe { transmute::<ChannelState, [u64; 12]>(state) } }
    }
}

impl From<Checked> for moistair_checked {
    fn from(checked: Checked) -> Self {
        Self {
            value: checked.value_or(NAN),
            quality: checked.quality().code(),
            reason: checked.reason().code(),
            cause: checked.cause().code(),
            after_gap: checked.after_gap().into(),
        }
    }
}

impl moistair_checked {
    pub(crate) fn to_core(self) -> Result<Checked, Failure> {
        quality(self.quality)?;
        let reason = |code| Reason::from_code(code).ok_or(Failure::UnknownSelector(code));
        let (_, cause) = (reason(self.reason)?, reason(self.cause)?);
        let value = if self.value.is_nan() { NAN } else { self.value };
        Checked::from_codes(value, self.quality, self.reason, cause.code(), self.after_gap != 0).ok_or(Failure::Damaged)
    }
}

impl Answer for moistair_channel {
    fn is_finite(&self) -> bool {
        true
    }
}

impl Answer for moistair_checked {
    fn is_finite(&self) -> bool {
        self.value.is_finite() || self.quality == MOISTAIR_QUALITY_REFUSED
    }
}

fn kind(selector: i32) -> Result<Kind, Failure> {
    Kind::from_code(selector).ok_or(Failure::UnknownSelector(selector))
}

fn unit(selector: i32) -> Result<Unit, Failure> {
    Unit::from_code(selector).ok_or(Failure::UnknownSelector(selector))
}

pub(crate) fn quality(selector: i32) -> Result<Quality, Failure> {
    Quality::from_code(selector).ok_or(Failure::UnknownSelector(selector))
}

/// A channel of a kind in a raw unit, with no stuck rule, no hold, no gap rule.
///
/// kind: MOISTAIR_KIND_…; unit: MOISTAIR_UNIT_…; min, max: limits in the unit of the core; channel: output; error: may be null.
/// Returns 0, 101, 102, 103, 208.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_channel_new(
    kind: i32,
    unit: i32,
    min: f64,
    max: f64,
    channel: *mut moistair_channel,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let core = Channel::new(self::kind(kind)?, self::unit(unit)?, min, max);
        let plain = moistair_channel {
            min,
            max,
            resolution: 0.0,
            reference_resolution: 0.0,
            hold: 0.0,
            interval: 0.0,
            kind,
            unit,
            stuck_samples: 0,
            slip_samples: moistair_core::signal::SLIP_SAMPLES,
        };
        if core.is_valid() { Ok(plain) } else { Err(Failure::InvalidChannel) }
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(channel, error, call) }
}

/// Checks one sample and remembers it.
///
/// channel: a channel; state: its memory, read and written; time: [s] since any fixed instant; raw: the reading in the unit of the channel, NaN
/// if there is none; checked: output; error: may be null.
/// Returns 0 (also for a refused sample), 101, 102, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_channel_check(
    channel: *const moistair_channel,
    state: *mut moistair_channel_state,
    time: f64,
    raw: f64,
    checked: *mut moistair_checked,
    error: *mut moistair_error,
) -> i32 {
    // SAFETY: the caller's pointers.
    unsafe { check_sample(channel, state, checked, error, |channel, state| channel.check(state, time, raw)) }
}

/// Checks one sample beside a reference: a sample counts as unchanged only when the reference has moved since the last one.
///
/// channel: a channel; state: its memory, read and written; time: [s] since any fixed instant; raw: the reading in the unit of the channel, NaN
/// if there is none; reference: in its own unit; checked: output; error: may be null.
/// Returns 0 (also for a refused sample), 101, 102, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_channel_check_beside(
    channel: *const moistair_channel,
    state: *mut moistair_channel_state,
    time: f64,
    raw: f64,
    reference: f64,
    checked: *mut moistair_checked,
    error: *mut moistair_error,
) -> i32 {
    // SAFETY: the caller's pointers.
    unsafe {
        check_sample(channel, state, checked, error, |channel, state| channel.check_beside(state, time, raw, reference))
    }
}

unsafe fn check_sample(
    channel: *const moistair_channel,
    state: *mut moistair_channel_state,
    checked: *mut moistair_checked,
    error: *mut moistair_error,
    judge: impl FnOnce(&Channel, &mut ChannelState) -> Checked,
) -> i32 {
    let call = || {
        check(checked)?;
        // SAFETY: the caller's pointers.
        let (channel, mut memory) = unsafe { (read(channel)?.to_core()?, read(state)?.to_core()) };
        let sample = moistair_checked::from(judge(&channel, &mut memory));
        if !sample.is_finite() {
            return Err(Failure::Internal);
        }
        // SAFETY: the caller's pointers.
        unsafe {
            write(state, memory.into());
            write(checked, sample);
        }
        Ok(())
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

/// A reading in a raw unit, in the unit of the core.
///
/// unit: MOISTAIR_UNIT_…; raw: the reading; value: output; error: may be null.
/// Returns 0, 101, 102, 103, 201.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_unit_to_core(
    unit: i32,
    raw: f64,
    value: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || converted(self::unit(unit)?.to_core(raw));
    // SAFETY: the caller's pointers.
    unsafe { answer(value, error, call) }
}

/// A value in the unit of the core, in another unit: for display, logs and controllers.
///
/// unit: MOISTAIR_UNIT_…; value: in the unit of the core; converted: output; error: may be null.
/// Returns 0, 101, 102, 103, 201.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_unit_from_core(
    unit: i32,
    value: f64,
    converted: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || self::converted(self::unit(unit)?.from_core(value));
    // SAFETY: the caller's pointers.
    unsafe { answer(converted, error, call) }
}

fn converted(value: f64) -> Result<f64, Failure> {
    if value.is_finite() { Ok(value) } else { Err(Failure::NotFinite) }
}

pub(crate) fn place(found: Option<usize>, table: &'static [Text]) -> *const c_char {
    found.and_then(|place| table.get(place)).map_or(c"".as_ptr(), Text::as_ptr)
}

/// The symbol of a unit, such as "kPa": static, UTF-8. Empty for an unknown code.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_unit_text(unit: i32) -> *const c_char {
    place(Unit::ALL.iter().position(|one| one.code() == unit), texts!(Unit, Text::new, text))
}

/// A quality in words: static, lower case. Empty for an unknown code.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_quality_text(quality: i32) -> *const c_char {
    place(Quality::ALL.iter().position(|one| one.code() == quality), texts!(Quality, Text::new, text))
}

/// A reason in words: static, lower case. Empty for an unknown code.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_reason_text(reason: i32) -> *const c_char {
    place(Reason::ALL.iter().position(|one| one.code() == reason), texts!(Reason, Text::new, text))
}

const _: () = {
    assert!(size_of::<moistair_channel>() == 64 && core::mem::offset_of!(moistair_channel, kind) == 48);
    assert!(size_of::<moistair_checked>() == 24 && core::mem::offset_of!(moistair_checked, quality) == 8);
};
