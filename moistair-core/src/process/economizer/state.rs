//! What an economizer remembers.

use crate::signal::{Clock, Tick, seconds};

/// What an economizer remembers from call to call; owned by the caller, zeroed at first: off.
///
/// Any bits are a state: a damaged one may keep a least time too long or too short once and then recovers.
#[repr(C)]
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub struct EconomizerState {
    clock: Clock,
    switched_at: i64,
    has_switched: u32,
    on: u32,
    frozen: u32,
    switches: u32,
}

impl EconomizerState {
    /// Whether the last decision was on.
    #[must_use]
    pub fn is_on(&self) -> bool {
        self.on != 0
    }

    /// Whether the freeze lockout holds.
    #[must_use]
    pub fn is_frozen(&self) -> bool {
        self.frozen != 0
    }

    /// How often it has switched, on and off; stays at the largest number.
    #[must_use]
    pub fn switches(&self) -> u32 {
        self.switches
    }

    /// Takes the time of a call; whether it is one.
    pub(super) fn take_time(&mut self, time: f64) -> bool {
        match self.clock.step(time) {
            Tick::Invalid => return false,
            // The time since the last switch is unknown: it begins anew.
            Tick::Restarted => self.switched_at = self.clock.now(),
            Tick::First | Tick::Forward { .. } | Tick::NotIncreasing => {}
        }
        self.switched_at = self.switched_at.min(self.clock.now());
        true
    }

    /// Whether the last switch is less than this ago, s.
    pub(super) fn is_younger_than(&self, least: f64) -> bool {
        self.has_switched != 0 && seconds(self.clock.now().saturating_sub(self.switched_at)) < least
    }

    pub(super) fn set_frozen(&mut self, frozen: bool) {
        self.frozen = frozen.into();
    }

    /// Notes a decision.
    pub(super) fn set(&mut self, on: bool) {
        if on != self.is_on() {
            (self.switched_at, self.has_switched) = (self.clock.now(), 1);
            self.switches = self.switches.saturating_add(1);
        }
        self.on = on.into();
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::Random;
    use crate::process::economizer::{Economizer, Rule};
    use crate::process::measured::{MeasuredAir, Reading};
    use crate::quantity::Pressure;

    /// Whatever bits a state has: a decision of finite numbers, then within the least time the right one, and one that stays.
    #[test]
    fn any_bits_are_a_state() {
        let settings = Economizer::new(Rule::DifferentialDryBulb, Pressure::from_pascals(101_325.0));
        let air = |t: f64| MeasuredAir::from_dry_bulb(Reading::new(t, 0.2));
        let mut random = Random(12);
        for _ in 0..10_000 {
            let mut words = || random.bits();
            let mut state = EconomizerState {
                clock: Clock::from_parts([words() as i64, words() as i64], [words() as u32, words() as u32]),
                switched_at: words() as i64,
                has_switched: words() as u32 & 1,
                on: words() as u32,
                frozen: words() as u32,
                switches: words() as u32,
            };
            let start = (words() >> 32) as f64;
            for cold in [true, false, true] {
                let outdoor = air(if cold { 15.0 } else { 30.0 });
                for step in 1..8 {
                    let time = start + if cold { 0.0 } else { 1e4 } + 400.0 * f64::from(step);
                    let decision = settings.decide(&mut state, time, &outdoor, &air(24.0));
                    assert!(decision.margin.is_finite() && (0.0..=1.0).contains(&decision.confidence));
                    assert!(step < 6 || decision.enabled == cold, "{state:?}");
                }
            }
        }
        assert_eq!(size_of::<EconomizerState>(), 48);
    }
}
