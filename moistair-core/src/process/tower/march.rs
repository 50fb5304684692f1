//! The march up the tower from the cold water, in a variable that neither the cold end nor the hot end can stretch.
//!
//! In transfer units N a temperature hardly leaves the pinch at the cold end and runs away at the hot one; over the temperature N runs away
//! at the pinch. Here the variable is s = N / Me + (T − T₂) / θ, so that dN/ds = 1 / (1 / Me + (dT/dN) / θ): neither part of the sum can
//! run away. θ is the range t₁ − t₂, or one kelvin where the range is less. A tower that does what is asked reaches N = Me and T = t₁
//! together, at s = 1 + (t₁ − t₂) / θ.

use crate::real::{Scalar, k};

/// Steps of Runge's and Kutta's fourth order, at least; see [`steps`].
pub const MARCH_STEPS: u32 = 32;

/// So many, and one more for each unit of Me · L/G, which sets how fast the air warms to the water.
pub(super) fn steps<S: Scalar>(least: u32, number: S, water_to_air: S) -> u32 {
    least + (number * water_to_air).to_f64() as u32
}

/// Water temperature and humidity ratio of the air at one height, or their rates.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Height<S> {
    pub celsius: S,
    pub humidity_ratio: S,
}

impl<S: Scalar> Height<S> {
    fn along(self, rate: Self, step: S) -> Self {
        Self {
            celsius: self.celsius + rate.celsius * step,
            humidity_ratio: self.humidity_ratio + rate.humidity_ratio * step,
        }
    }
}

/// θ: the range, of at least one kelvin either way.
fn scale<S: Scalar>(range: S) -> S {
    if range < k(0.0) { range.at_most(k(-1.0)) } else { range.at_least(k(1.0)) }
}

/// The top of the march from the foot at the cold water; `rates` are per unit of N.
pub(super) fn march<S: Scalar>(
    foot: Height<S>,
    hot: S,
    number: S,
    steps: u32,
    rates: impl Fn(Height<S>) -> Height<S>,
) -> Height<S> {
    let range = hot - foot.celsius;
    let scale = scale(range);
    let paced = |at: Height<S>| {
        let rate = rates(at);
        // A step may overshoot a pinch and find the rate a little below zero.
        let pace = number / (number * (rate.celsius / scale).at_least(k(0.0)) + k(1.0));
        Height { celsius: rate.celsius * pace, humidity_ratio: rate.humidity_ratio * pace }
    };
    let step = (range / scale + k(1.0)) / k(f64::from(steps));
    let (half, sixth) = (step * k(0.5), step / k(6.0));
    let mut at = foot;
    for _ in 0..steps {
        let first = paced(at);
        let second = paced(at.along(first, half));
        let third = paced(at.along(second, half));
        let fourth = paced(at.along(third, step));
        at = at.along(first, sixth).along(second, sixth + sixth).along(third, sixth + sixth).along(fourth, sixth);
    }
    at
}

/// What the top of a march is off: (T − t₁) / θ = 1 − N / Me. Positive where the cold water was taken too near to the hot, negative where
/// too far from it; between minus one and one.
pub(super) fn excess<S: Scalar>(cold: S, hot: S, top: Height<S>) -> S {
    (top.celsius - hot) / scale(hot - cold)
}
