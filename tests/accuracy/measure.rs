//! What is measured: the error of one property, and its statistics over many points.

use moistair_core::*;

use crate::sample::{Point, Region};

/// In what an error is told.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Scale {
    /// Of the value.
    Relative,
    /// In the unit of the property; per mass of dry air up to a water mole fraction of 0.3, per mass of moist air above, for
    /// quantities per mass.
    Absolute,
}

fn is_heat_capacity(property: Quantity) -> bool {
    matches!(property, Quantity::SpecificHeat | Quantity::SpecificHeatAtConstantVolume)
}

/// How the error of a property is told.
pub fn scale(property: Quantity) -> Scale {
    match property.unit() {
        "°C" | "J/kg" | "J/(kg K)" if !is_heat_capacity(property) => Scale::Absolute,
        "Pa" if property == Quantity::VaporPressureDeficit => Scale::Absolute,
        _ => Scale::Relative,
    }
}

/// The unit in which the error is told.
pub fn unit(property: Quantity) -> &'static str {
    match (scale(property), property.unit()) {
        (Scale::Relative, _) => "relative",
        (Scale::Absolute, "°C") => "K",
        (Scale::Absolute, unit) => unit,
    }
}

/// The error of a value at a humidity ratio.
pub fn error(property: Quantity, value: f64, truth: f64, humidity_ratio: f64) -> f64 {
    let difference = (value - truth).abs();
    match scale(property) {
        Scale::Relative if difference > 0.0 => difference / truth.abs(),
        Scale::Relative => 0.0,
        Scale::Absolute if property.unit().contains("kg") && humidity_ratio > WATER_RICH => {
            difference / (1.0 + humidity_ratio)
        }
        Scale::Absolute => difference,
    }
}

/// The humidity ratio at a water mole fraction of 0.3.
const WATER_RICH: f64 = 0.621_945 * 0.3 / 0.7;

/// The errors of one quantity over the points of a region.
#[derive(Clone, Debug, Default)]
pub struct Errors {
    /// In the order of the points, as far as there are values.
    all: Vec<f32>,
    worst: Option<(f64, Point)>,
    /// Points where one side has a value and the other has none.
    pub unlike: usize,
}

impl Errors {
    /// One more.
    pub fn add(&mut self, error: f64, at: Point) {
        self.all.push(error as f32);
        self.consider(error, at);
    }

    fn consider(&mut self, error: f64, at: Point) {
        // A NaN is the worst there is.
        if self.worst.is_none_or(|(worst, _)| error.is_nan() || error > worst) {
            self.worst = Some((error, at));
        }
    }

    /// What another thread found.
    pub fn join(&mut self, other: Self) {
        self.all.extend(other.all);
        self.unlike += other.unlike;
        if let Some((error, at)) = other.worst {
            self.consider(error, at);
        }
    }

    /// How many.
    pub fn count(&self) -> usize {
        self.all.len()
    }

    /// The greatest, and where.
    pub fn worst(&self) -> Option<(f64, Point)> {
        self.worst
    }

    /// What 99.9 % of the points do not exceed.
    pub fn most_of(&self) -> f64 {
        let mut sorted = self.all.clone();
        sorted.sort_by(f32::total_cmp);
        sorted.get((sorted.len() * 999).div_ceil(1_000).saturating_sub(1)).map_or(0.0, |error| f64::from(*error))
    }
}

/// The errors of several quantities, by place in their list.
pub type Measured = Vec<Errors>;

/// Measures the points of a region on all cores. `one` adds the errors at one point to the lists of its quantities.
pub fn over(region: Region, points: usize, quantities: usize, one: impl Fn(Point, &mut Measured) + Sync) -> Measured {
    let threads = std::thread::available_parallelism().map_or(1, usize::from);
    let part = |thread: usize| {
        let mut errors = vec![Errors::default(); quantities];
        (thread..points).step_by(threads).for_each(|index| one(region.point(index), &mut errors));
        errors
    };
    std::thread::scope(|scope| {
        let part = &part;
        let workers: Vec<_> = (0..threads).map(|thread| scope.spawn(move || part(thread))).collect();
        workers.into_iter().map(|worker| worker.join().expect("a measurement does not panic")).fold(
            vec![Errors::default(); quantities],
            |mut sum, errors| {
                sum.iter_mut().zip(errors).for_each(|(sum, errors)| sum.join(errors));
                sum
            },
        )
    })
}
