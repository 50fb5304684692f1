//! One row: arguments read from left to right, results written from left to right, and both described.

use core::fmt;
use core::slice::{Iter, IterMut};

use crate::basis::{Basis, Formulation};
use crate::columns::NAN;
use crate::error::Error;
use crate::quantity::{HumidityRatio, Pressure, Temperature};
use crate::state::MoistAir;

/// Why a row has no result.
#[derive(Clone, Copy, Debug, PartialEq, thiserror::Error)]
#[non_exhaustive]
pub enum RowError {
    /// What the process itself says.
    #[error(transparent)]
    Process(Error),
    /// A choice that is none of those that the input has.
    #[error("{0} is none of the choices of this input")]
    Choice(i32),
    /// Not as many numbers, or not of the kind, that the process takes and gives.
    #[error("the values do not fit this process")]
    Misfit,
}

impl From<Error> for RowError {
    fn from(error: Error) -> Self {
        Self::Process(error)
    }
}

pub(super) type Outcome<T = ()> = Result<T, RowError>;

/// A number, or a state that is at hand as such.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Value {
    /// A number in the unit of its field, or the code of a choice.
    Number(f64),
    /// A state, in place of its dry bulb, humidity ratio and pressure.
    State(MoistAir),
}

/// The arguments of a row.
pub(super) struct Row<'a> {
    pub source: Source<'a>,
    pub formulation: Formulation,
}

pub(super) enum Source<'a> {
    Numbers(Iter<'a, f64>),
    Values(Iter<'a, Value>),
}

impl Row<'_> {
    pub fn number(&mut self) -> Outcome<f64> {
        match &mut self.source {
            Source::Numbers(numbers) => numbers.next().copied().ok_or(RowError::Misfit),
            Source::Values(values) => match values.next() {
                Some(Value::Number(number)) => Ok(*number),
                _ => Err(RowError::Misfit),
            },
        }
    }

    fn air(&mut self) -> Outcome<MoistAir> {
        if let Source::Values(values) = &mut self.source {
            return match values.next() {
                Some(Value::State(air)) => Ok(*air),
                _ => Err(RowError::Misfit),
            };
        }
        let (dry_bulb, ratio) = (Temperature::read(self)?, HumidityRatio::read(self)?);
        Ok(MoistAir::restore(dry_bulb, ratio, Basis::read(self)?)?)
    }

    /// A whole number, as codes are.
    pub fn code(&mut self) -> Outcome<i32> {
        let value = self.number()?;
        let code = value as i32;
        if (f64::from(code) - value).abs() > 0.0 || value.is_nan() { Err(RowError::Choice(code)) } else { Ok(code) }
    }

    pub fn is_finished(&self) -> bool {
        match &self.source {
            Source::Numbers(numbers) => numbers.as_slice().is_empty(),
            Source::Values(values) => values.as_slice().is_empty(),
        }
    }
}

/// Places for the results of a row.
pub(super) struct Out<'a> {
    pub places: Places<'a>,
    pub written: usize,
    pub is_short: bool,
}

pub(super) enum Places<'a> {
    Numbers(IterMut<'a, f64>),
    Values(IterMut<'a, Value>),
}

impl Out<'_> {
    fn number(&mut self, number: f64) {
        let found = match &mut self.places {
            Places::Numbers(places) => places.next().map(|place| *place = number),
            Places::Values(places) => places.next().map(|place| *place = Value::Number(number)),
        };
        self.count(found);
    }

    fn air(&mut self, air: &MoistAir) {
        if let Places::Values(places) = &mut self.places {
            let found = places.next().map(|place| *place = Value::State(*air));
            return self.count(found);
        }
        air.dry_bulb().write(self);
        air.humidity_ratio().write(self);
        air.pressure().write(self);
    }

    fn count(&mut self, found: Option<()>) {
        self.is_short |= found.is_none();
        self.written += usize::from(found.is_some());
    }
}

/// Records within records: as deep as names go.
const DEEPEST: usize = 6;

/// What a number of a row is: its name and its unit.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Field {
    path: [&'static str; DEEPEST],
    unit: &'static str,
}

impl Field {
    /// The names of the records that it stands in, from the outermost, and its own.
    pub fn path(&self) -> impl Iterator<Item = &'static str> {
        self.path.into_iter().filter(|name| !name.is_empty())
    }

    /// The unit; `choice: ` and the meaning of each code for a choice, `flag` for 0 or 1.
    #[must_use]
    pub const fn unit(&self) -> &'static str {
        self.unit
    }
}

/// The name: those of the records that it stands in and its own, with points between them, as in `leaving.air.dry_bulb`.
impl fmt::Display for Field {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let mut names = self.path();
        if let Some(first) = names.next() {
            f.write_str(first)?;
        }
        names.try_for_each(|name| {
            f.write_str(".")?;
            f.write_str(name)
        })
    }
}

/// A walk over the fields of a record.
pub(super) struct Walk<'a> {
    path: [&'static str; DEEPEST],
    visit: &'a mut dyn FnMut(Field),
    /// How many of the last fields repeat.
    pub repeated: usize,
}

impl<'a> Walk<'a> {
    pub fn new(visit: &'a mut dyn FnMut(Field)) -> Self {
        Self { path: [""; DEEPEST], visit, repeated: 0 }
    }

    /// A field of one number.
    pub fn number(&mut self, name: &'static str, unit: &'static str) {
        self.within(name, |walk| (walk.visit)(Field { path: walk.path, unit }));
    }

    /// The fields of a record in the record that the walk is in.
    pub fn within(&mut self, name: &'static str, fields: impl FnOnce(&mut Self)) {
        let outer = self.path;
        if let (Some(place), false) = (self.path.iter_mut().find(|place| place.is_empty()), name.is_empty()) {
            *place = name;
        }
        fields(self);
        self.path = outer;
    }
}

impl Walk<'_> {
    /// Fields that stand there any number of times, at the end.
    pub fn group(&mut self, fields: impl FnOnce(&mut Walk<'_>)) {
        let mut count = 0;
        let (path, visit) = (self.path, &mut *self.visit);
        let mut counted = |field| {
            count += 1;
            visit(field);
        };
        fields(&mut Walk { path, visit: &mut counted, repeated: 0 });
        self.repeated = count;
    }
}

/// What a process takes.
pub(super) trait Argument: Sized {
    /// Its fields, in the order in which they are read.
    fn describe(walk: &mut Walk<'_>, name: &'static str);
    /// Reads it from the row.
    fn read(row: &mut Row<'_>) -> Outcome<Self>;
}

/// What a process gives.
pub(super) trait Answer {
    /// Its fields, in the order in which they are written.
    fn describe(walk: &mut Walk<'_>, name: &'static str);
    /// Writes it to the row.
    fn write(&self, out: &mut Out<'_>);
}

/// Describes the argument that is a part of another one.
pub(super) fn describe_argument<T, P: Argument>(_: impl Fn(&T) -> P, walk: &mut Walk<'_>, name: &'static str) {
    P::describe(walk, name);
}

/// Describes the answer that is a part of another one.
pub(super) fn describe_answer<T, P: Answer>(_: impl Fn(&T) -> P, walk: &mut Walk<'_>, name: &'static str) {
    P::describe(walk, name);
}

/// Arguments of several numbers that are named each by itself.
macro_rules! arguments {
    ($($type:ident { $($field:ident: $name:literal),+ $(,)? })*) => {$(
        impl $crate::columns::process::row::Argument for $type {
            fn describe(walk: &mut $crate::columns::process::row::Walk<'_>, _: &'static str) {
                $($crate::columns::process::row::describe_argument(|argument: &Self| argument.$field, walk, $name);)+
            }

            fn read(row: &mut $crate::columns::process::row::Row<'_>) -> $crate::columns::process::row::Outcome<Self> {
                Ok(Self { $($field: $crate::columns::process::row::Argument::read(row)?),+ })
            }
        }
    )*};
}

/// Answers that are records: the name of each field and where it is read.
macro_rules! answers {
    ($($type:ty, |$this:ident| { $($name:ident: $value:expr),+ $(,)? })*) => {$(
        impl $crate::columns::process::row::Answer for $type {
            fn describe(walk: &mut $crate::columns::process::row::Walk<'_>, name: &'static str) {
                walk.within(name, |walk| {
                    $($crate::columns::process::row::describe_answer(|$this: &Self| $value, walk, stringify!($name));)+
                });
            }

            fn write(&self, out: &mut $crate::columns::process::row::Out<'_>) {
                let $this = self;
                $($crate::columns::process::row::Answer::write(&$value, out);)+
            }
        }
    )*};
}

/// Choices that a process is given, with their codes.
macro_rules! choices {
    ($($type:ident { $($code:literal $text:literal => $variant:ident),+ $(,)? })*) => {$(
        impl $crate::columns::process::row::Argument for $type {
            fn describe(walk: &mut $crate::columns::process::row::Walk<'_>, name: &'static str) {
                walk.number(name, concat!("choice:" $(, " ", $code, " ", $text)+));
            }

            fn read(row: &mut $crate::columns::process::row::Row<'_>) -> $crate::columns::process::row::Outcome<Self> {
                match row.code()? {
                    $($code => Ok(Self::$variant),)+
                    other => Err($crate::columns::process::row::RowError::Choice(other)),
                }
            }
        }
    )*};
}

/// Statuses that a process answers with, by their codes.
macro_rules! statuses {
    ($($type:ident { $($text:literal => $variant:ident),+ $(,)? })*) => {$(
        impl $crate::columns::process::row::Answer for $type {
            fn describe(walk: &mut $crate::columns::process::row::Walk<'_>, name: &'static str) {
                walk.number(name, concat!("choice" $(, ", ", $text)+));
            }

            fn write(&self, out: &mut $crate::columns::process::row::Out<'_>) {
                let code = match self { $(Self::$variant => Self::$variant as i32),+ };
                $crate::columns::process::row::Answer::write(&f64::from(code), out);
            }
        }
    )*};
}

/// The entries of a file of the catalogue: `code "name": (arguments) -> answer { call }`. Arguments are read in the order in which they
/// are written; an answer that is no record has a name.
macro_rules! processes {
    ($($code:literal $name:literal: ($($argument:ident: $type:ty),* $(,)?) -> $($label:literal)? $answer:ty $call:block)*) => {
        pub(super) const ENTRIES: &[$crate::columns::process::Entry] = &[$($crate::columns::process::Entry {
            code: $code,
            name: $name,
            inputs: |walk| {
                $(<$type as $crate::columns::process::row::Argument>::describe(walk, stringify!($argument));)*
            },
            outputs: |walk| <$answer as $crate::columns::process::row::Answer>::describe(walk, concat!("" $(, $label)?)),
            run: |row, out| {
                $(let $argument = <$type as $crate::columns::process::row::Argument>::read(row)?;)*
                let answer: $answer = $call;
                $crate::columns::process::row::Answer::write(&answer, out);
                Ok(())
            },
        }),*];
    };
}
pub(super) use {answers, arguments, choices, processes, statuses};

impl Argument for MoistAir {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.within(name, describe_state);
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        row.air()
    }
}

impl Answer for MoistAir {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.within(name, describe_state);
    }

    fn write(&self, out: &mut Out<'_>) {
        out.air(self);
    }
}

fn describe_state(walk: &mut Walk<'_>) {
    <Temperature as Argument>::describe(walk, "dry_bulb");
    <HumidityRatio as Argument>::describe(walk, "humidity_ratio");
    <Pressure as Argument>::describe(walk, "pressure");
}

/// The pressure; the formulation is that of the call.
impl Argument for Basis {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <Pressure as Argument>::describe(walk, name);
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        let pressure = Pressure::read(row)?;
        Ok(Self::new(pressure, row.formulation))
    }
}

impl Argument for f64 {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "1");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        row.number()
    }
}

impl Answer for f64 {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "1");
    }

    fn write(&self, out: &mut Out<'_>) {
        out.number(*self);
    }
}

impl Answer for bool {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "flag");
    }

    fn write(&self, out: &mut Out<'_>) {
        out.number(f64::from(*self));
    }
}

/// NaN where there is none.
impl Answer for Option<f64> {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <f64 as Answer>::describe(walk, name);
    }

    fn write(&self, out: &mut Out<'_>) {
        out.number(self.unwrap_or(NAN));
    }
}

macro_rules! numbers {
    ($($type:ident: $from:ident, $read:ident, $unit:literal;)*) => {$(
        impl Argument for crate::quantity::$type {
            fn describe(walk: &mut Walk<'_>, name: &'static str) {
                walk.number(name, $unit);
            }

            fn read(row: &mut Row<'_>) -> Outcome<Self> {
                row.number().map(Self::$from)
            }
        }

        impl Answer for crate::quantity::$type {
            fn describe(walk: &mut Walk<'_>, name: &'static str) {
                walk.number(name, $unit);
            }

            fn write(&self, out: &mut Out<'_>) {
                out.number(self.$read());
            }
        }
    )*};
}
numbers! {
    Temperature: from_celsius, celsius, "°C";
    DewPoint: from_celsius, celsius, "°C";
    FrostPoint: from_celsius, celsius, "°C";
    TemperatureDifference: from_kelvins, kelvins, "K";
    Pressure: from_pascals, pascals, "Pa";
    Length: from_meters, meters, "m";
    RelativeHumidity: from_fraction, fraction, "1";
    HumidityRatio: from_kilograms_per_kilogram, kilograms_per_kilogram, "kg/kg";
    SpecificEnthalpy: from_joules_per_kilogram, joules_per_kilogram, "J/kg";
    SpecificHeat: from_joules_per_kilogram_kelvin, joules_per_kilogram_kelvin, "J/(kg K)";
    Density: from_kilograms_per_cubic_meter, kilograms_per_cubic_meter, "kg/m³";
    MassFlow: from_kilograms_per_second, kilograms_per_second, "kg/s";
    VolumeFlow: from_cubic_meters_per_second, cubic_meters_per_second, "m³/s";
    HeatFlow: from_watts, watts, "W";
    Conductance: from_watts_per_kelvin, watts_per_kelvin, "W/K";
}
