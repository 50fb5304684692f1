//! One number of one step from a property that the air is to have.

use core::cell::Cell;

use super::{SequenceError, Step, StepResult, Total, run};
use crate::bounds::Quantity;
use crate::error::{Error, checked_for};
use crate::process::WetStream;
use crate::real::{Scalar, k};
use crate::solve::{ITERATION_CAP, between};

/// Evaluations of the chain at most: both ends, a look between them, two halvings toward the ends of what runs, the search, and the result.
pub const EVALUATION_CAP: u32 = 2 + (1 << LOOKS) + 2 * HALVINGS + ITERATION_CAP + 1;

/// Halvings of the bracket at which a chain is tried that runs at neither end: 15 points inside.
const LOOKS: u32 = 4;

/// Halvings toward the end of what a chain can do: 2^-40 of the bracket.
const HALVINGS: u32 = 40;

/// The number that is free, and where to look for it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Free<S = f64> {
    /// The step that it belongs to, counted from 0.
    pub step: usize,
    /// Which number of the step, by its quantity; see [`Step::with_number`].
    pub number: Quantity,
    /// Where to look from, in the unit of the quantity.
    pub low: S,
    /// Where to look to; above `low`.
    pub high: S,
}

/// What the air is to have.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Target<S = f64> {
    /// The step whose leaving air is meant, counted from 0, at or after the free one; the last if `None`.
    pub after: Option<usize>,
    /// A property of the gas.
    pub quantity: Quantity,
    /// Its value.
    pub value: S,
}

/// How a solve ended.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum SolveStatus {
    /// The property has its value.
    Solved = 0,
    /// The property is on one side of its value at both ends of the bracket, or of the part of it in which the chain runs; the nearer
    /// end is returned.
    NoCrossing = 1,
    /// The property jumps past its value, as where a coil begins to frost or a wet bulb passes from ice to water; the nearer side is
    /// returned.
    Jump = 2,
    /// The chain fails between two ends at which it runs; the nearest value found is returned.
    Interrupted = 3,
}

/// A value of the free number and what the air then has.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct End<S = f64> {
    /// The free number.
    pub number: S,
    /// The property of the air.
    pub reached: S,
}

/// What a solve found.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Solved<S = f64> {
    /// How it ended.
    pub status: SolveStatus,
    /// The free number; the step holds it.
    pub number: S,
    /// The property that the air has with it.
    pub reached: S,
    /// That less the wanted value.
    pub residual: S,
    /// The lower end of the bracket, or of the part of it in which the chain runs.
    pub low: End<S>,
    /// The upper end.
    pub high: End<S>,
    /// What stopped the chain where it does not run, if anything: at the end that was drawn in, or inside.
    pub refused: Option<SequenceError>,
    /// How often steps were evaluated for it.
    pub evaluations: u32,
    /// The chain with the free number in it.
    pub total: Total<S>,
}

/// Finds the value of one number of one step at which the air has a property, and runs the chain with it.
///
/// The property need not be monotone: it is enough that it lies on two sides of its value at the ends of the bracket, and one of the
/// crossings between is found. Where the chain does not run at an end, the end is drawn in to where it does, to 2^-40 of the bracket, or to
/// where the property has crossed its value; where it runs at neither end, 15 points between are tried. Every path is the same for the same
/// arguments. At most [`EVALUATION_CAP`] evaluations of the steps from the free one on, about ten where the chain runs at both ends.
///
/// The number is found to 4 ε of the larger end of the bracket, as finely as the property resolves it; `residual` says how well. The step
/// keeps the number, also where the status is not [`SolveStatus::Solved`]; `results` is filled as by [`run`].
///
/// # Errors
/// With the step at fault: [`Error::UnknownSelector`] for a step that is not there, or before the free one, for a number that it has not,
/// for what is no property; [`Error::NotFinite`] and [`Error::OutOfRange`] for the ends of the bracket and the target; the error of the first step
/// before the free one that fails, or of the chain at the lower end of the bracket if it runs nowhere; that of a step behind the one looked at, which the search leaves out and the
/// last run meets. The steps are then as they were.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, coil::CondensateTemperature};
/// use moistair_core::sequence::{Free, SolveStatus, Step, Target, solve};
/// let air: MoistAir = MoistAir::from_dry_bulb(
///     Temperature::from_celsius(27.0), RelativeHumidity::from_percent(52.0), Pressure::from_kilopascals(101.325))?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(2.0))?.into();
/// let mut steps = [
///     Step::CoilToTemperature {
///         leaving: Temperature::from_celsius(10.0),
///         relative_humidity: RelativeHumidity::from_percent(95.0),
///         condensate: CondensateTemperature::LeavingAir,
///     },
///     Step::WithHeat(HeatFlow::from_kilowatts(4.0)),
/// ];
/// // The coil that gives supply air of 8.5 g/kg, looked for from 5 °C up to more than it can leave.
/// let coil = Free { step: 0, number: Quantity::LeavingTemperature, low: 5.0, high: 40.0 };
/// let supply = Target { after: None, quantity: Quantity::HumidityRatio, value: 0.0085 };
/// let found = solve(&entering, &mut steps, &mut [], coil, supply)?;
/// assert_eq!(found.status, SolveStatus::Solved);
/// assert!((found.number - 12.31).abs() < 0.01 && found.residual.abs() < 1e-15);
/// let supply = Target { value: 0.02, ..supply }; // moister than what enters
/// assert_eq!(solve(&entering, &mut steps, &mut [], coil, supply)?.status, SolveStatus::NoCrossing);
/// let coil = Free { number: Quantity::BypassFactor, ..coil }; // it has none
/// assert!(solve(&entering, &mut steps, &mut [], coil, supply).is_err());
/// # Ok::<(), Box<dyn core::error::Error>>(())
/// ```
pub fn solve<S: Scalar>(
    entering: &WetStream<S>,
    steps: &mut [Step<S>],
    results: &mut [Option<StepResult<S>>],
    free: Free<S>,
    target: Target<S>,
) -> Result<Solved<S>, SequenceError> {
    results.fill(None);
    let chain = Chain::new(entering, steps, free, target)?;
    let outcome = chain.search()?;
    let (evaluations, before, best) = (chain.evaluations.get() + 1, chain.free, outcome.best);
    let after = chain.with(best.number)?;
    replace(steps, free.step, after);
    let total = run(entering, steps, results);
    if total.is_err() {
        replace(steps, free.step, before);
    }
    Ok(Solved {
        status: outcome.status,
        number: best.number,
        reached: best.reached,
        residual: best.beyond,
        low: outcome.low.end(),
        high: outcome.high.end(),
        refused: outcome.refused,
        evaluations,
        total: total?,
    })
}

fn replace<S: Scalar>(steps: &mut [Step<S>], index: usize, step: Step<S>) {
    if let Some(place) = steps.get_mut(index) {
        *place = step;
    }
}

/// The part of a chain from the free step to the one after which the air is looked at.
struct Chain<'a, S> {
    /// What enters the free step.
    entering: WetStream<S>,
    free: Step<S>,
    behind: &'a [Step<S>],
    bounds: Free<S>,
    target: Target<S>,
    evaluations: Cell<u32>,
}

/// A point of the search.
#[derive(Clone, Copy)]
struct Point<S> {
    number: S,
    reached: S,
    /// How far beyond the wanted value.
    beyond: S,
}

/// The ends of the search, and what the chain met where it did not run.
struct Ends<S> {
    low: Point<S>,
    high: Point<S>,
    refused: Option<SequenceError>,
}

/// What the search found.
struct Outcome<S> {
    status: SolveStatus,
    best: Point<S>,
    low: Point<S>,
    high: Point<S>,
    refused: Option<SequenceError>,
}

impl<S: Scalar> Point<S> {
    fn end(&self) -> End<S> {
        End { number: self.number, reached: self.reached }
    }

    fn distance(&self) -> S {
        self.beyond.at_least(-self.beyond)
    }

    fn nearer(self, other: Self) -> Self {
        if other.distance() < self.distance() { other } else { self }
    }

    /// Whether the wanted value lies between the two, or at one of them.
    fn crosses(&self, other: &Self) -> bool {
        let zero = k::<S>(0.0);
        self.beyond == zero || other.beyond == zero || (self.beyond < zero) != (other.beyond < zero)
    }
}

impl<'a, S: Scalar> Chain<'a, S> {
    fn new(
        entering: &WetStream<S>,
        steps: &'a [Step<S>],
        bounds: Free<S>,
        target: Target<S>,
    ) -> Result<Self, SequenceError> {
        let at_free = |error| SequenceError { step: bounds.step, error };
        let last = target.after.unwrap_or(steps.len().saturating_sub(1));
        let at_target = |error| SequenceError { step: last, error };
        let free = *steps.get(bounds.step).ok_or(at_free(no_step(bounds.step)))?;
        let behind = steps.get(bounds.step..=last).and_then(|part| part.split_first());
        let (_, behind) = behind.ok_or(at_target(no_step(last)))?;
        free.with_number(bounds.number, bounds.low).map_err(at_free)?;
        let formulation = entering.air().air().formulation();
        for end in [bounds.low, bounds.high] {
            checked_for(formulation, bounds.number, end).map_err(at_free)?;
        }
        if bounds.low >= bounds.high {
            let (min, (_, max)) = (bounds.low.to_f64(), formulation.limits(bounds.number));
            let value = bounds.high.to_f64();
            return Err(at_free(Error::OutOfRange { quantity: bounds.number, value, min, max }));
        }
        if !target.quantity.is_property() {
            return Err(at_target(Error::UnknownSelector { code: target.quantity.code() }));
        }
        if !target.value.is_finite() {
            return Err(at_target(Error::NotFinite { quantity: target.quantity }));
        }
        let mut stream = *entering;
        for (step, before) in steps.iter().take(bounds.step).enumerate() {
            stream = before.done(&stream).map_err(|error| SequenceError { step, error })?.leaving;
        }
        Ok(Self { entering: stream, free, behind, bounds, target, evaluations: Cell::new(0) })
    }

    fn with(&self, number: S) -> Result<Step<S>, SequenceError> {
        let step = self.bounds.step;
        self.free.with_number(self.bounds.number, number).map_err(|error| SequenceError { step, error })
    }

    fn at(&self, number: S) -> Result<Point<S>, SequenceError> {
        self.evaluations.set(self.evaluations.get() + 1);
        let (mut index, free) = (self.bounds.step, self.with(number)?);
        let mut stream = self.entering;
        for (step, done) in core::iter::once(&free).chain(self.behind).enumerate() {
            index = self.bounds.step + step;
            stream = done.done(&stream).map_err(|error| SequenceError { step: index, error })?.leaving;
        }
        let reached = stream.air().air().value(self.target.quantity);
        let reached = reached.map_err(|error| SequenceError { step: index, error })?;
        Ok(Point { number, reached, beyond: reached - self.target.value })
    }

    fn search(&self) -> Result<Outcome<S>, SequenceError> {
        let Ends { low, high, refused } = self.ends()?;
        let found = |status, best, refused| Ok(Outcome { status, best, low, high, refused });
        if !low.crosses(&high) {
            return found(SolveStatus::NoCrossing, low.nearer(high), refused);
        }
        let nearest = low.nearer(high);
        if nearest.beyond == k(0.0) {
            return found(SolveStatus::Solved, nearest, refused);
        }
        let (mut below, mut above, mut interrupted) = (low, high, None);
        let sign = if low.beyond < k(0.0) { k::<S>(1.0) } else { k(-1.0) };
        let larger = low.number.at_least(-low.number).at_least(high.number.at_least(-high.number));
        let resolution = larger * S::epsilon() * k(4.0);
        let edge = |point: &Point<S>| (point.number, sign * point.beyond);
        let number = between(edge(&low), edge(&high), resolution, |number| match self.at(number) {
            Ok(point) => {
                let side = if sign * point.beyond < k(0.0) { &mut below } else { &mut above };
                *side = point;
                sign * point.beyond
            }
            Err(error) => {
                interrupted = Some(error);
                k(0.0)
            }
        });
        let best = below.nearer(above);
        if interrupted.is_some() {
            return found(SolveStatus::Interrupted, best, interrupted);
        }
        let best = if best.beyond == k(0.0) { best } else { self.at(number).map_or(best, |last| best.nearer(last)) };
        // A line however steep comes closer than this; a step does not.
        let jumps = best.distance() > S::epsilon().sqrt() * (low.distance() + high.distance());
        found(if jumps { SolveStatus::Jump } else { SolveStatus::Solved }, best, refused)
    }

    /// The ends of the bracket, drawn in to where the chain runs.
    fn ends(&self) -> Result<Ends<S>, SequenceError> {
        match (self.at(self.bounds.low), self.at(self.bounds.high)) {
            (Ok(low), Ok(high)) => Ok(Ends { low, high, refused: None }),
            (Ok(low), Err(error)) => {
                let (high, error) = self.toward(low, self.bounds.high, error);
                Ok(Ends { low, high, refused: Some(error) })
            }
            (Err(error), Ok(high)) => {
                let (low, error) = self.toward(high, self.bounds.low, error);
                Ok(Ends { low, high, refused: Some(error) })
            }
            (Err(at_low), Err(at_high)) => {
                let inside = self.inside().ok_or(at_low)?;
                let (high, at_high) = self.toward(inside, self.bounds.high, at_high);
                if inside.crosses(&high) {
                    return Ok(Ends { low: inside, high, refused: Some(at_high) });
                }
                let (low, at_low) = self.toward(inside, self.bounds.low, at_low);
                let high = if low.crosses(&inside) { inside } else { high };
                Ok(Ends { low, high, refused: Some(at_low) })
            }
        }
    }

    /// A point at which the chain runs: the middle, the quarters, and so on.
    fn inside(&self) -> Option<Point<S>> {
        let mut part = self.bounds.high - self.bounds.low;
        for look in 0..LOOKS {
            let half = part * k(0.5);
            for place in 0..1_u32 << look {
                let number = self.bounds.low + half + part * k(f64::from(place));
                if let Ok(point) = self.at(number) {
                    return Some(point);
                }
            }
            part = half;
        }
        None
    }

    /// From where the chain runs toward an end at which it does not: the last point at which it runs, or the first beyond the wanted value;
    /// and what the chain met there.
    fn toward(&self, from: Point<S>, end: S, error: SequenceError) -> (Point<S>, SequenceError) {
        let (mut runs, mut fails, mut error) = (from, end, error);
        for _ in 0..HALVINGS {
            let middle = runs.number + (fails - runs.number) * k(0.5);
            match self.at(middle) {
                Ok(point) => {
                    runs = point;
                    if from.crosses(&point) {
                        break;
                    }
                }
                Err(met) => {
                    fails = middle;
                    error = met;
                }
            }
        }
        (runs, error)
    }
}

fn no_step(index: usize) -> Error {
    Error::UnknownSelector { code: i32::try_from(index).unwrap_or(i32::MAX) }
}
