//! Processes, row by row: one loop for all of them. Python's `moistair._rows` makes objects of what comes back.

use moistair_core::columns::{Column, NAN};
use moistair_core::process::{self, AirStream, Exchange, WetStream};
use moistair_core::{
    AirWithCondensate, Basis, Bulb, Conductance, Density, Error, Formulation, Freezing, HeatFlow, HumidityRatio,
    Length, MassFlow, MoistAir as Air, Pressure, Psychrometer, PsychrometerReading, Quantity, RelativeHumidity,
    SpecificEnthalpy, SpecificHeat, Temperature, TemperatureDifference, VolumeFlow, liquid_water_enthalpy,
    saturation_temperature_after,
};
use process::coil::{
    Apparatus, ApparatusDewPoints, Arrangement, CoilSurface, CoilWater, CondensateTemperature, Coolant, Cooling,
    Measured, WaterCoil,
};
use process::compression::Compressed;
use process::humidify::{Absorption, EvaporatingWater, Humidified};
use process::sensible::Sensible;
use process::tower::basin::Basin;
use process::tower::fill::{FillLaw, FillTest};
use process::tower::merkel::{self, MerkelNumber, Pinch, Quadrature};
use process::tower::poppe::{self, PoppeRating, Transfer};
use process::tower::{HotWater, TowerBalance, TowerRating, TowerWater, WaterTreatment, WaterUse, effectiveness_ntu};
use process::{books, coil, compression, humidify, mixing, reheat, sensible, tower};
use pyo3::exceptions::PyTypeError;
use pyo3::prelude::*;
use pyo3::types::PyList;

use crate::column::{self, Arguments, plain_number};
use crate::error::{exception, internal};
use crate::state::{Content, MoistAir, States, restore};

/// Why a row has no result.
enum Failure {
    Core(Error),
    /// A state of this row has failed before, with this status.
    Before(i32),
    /// The arguments are not what the process takes; the Python side rules that out.
    Arguments,
}

impl From<Error> for Failure {
    fn from(error: Error) -> Self {
        Self::Core(error)
    }
}

type Outcome<T = ()> = Result<T, Failure>;

/// One argument of one row.
#[derive(Clone, Copy)]
enum Item {
    Number(f64),
    State(Air),
}

/// The arguments of one row, read from left to right.
struct Row<'a>(core::slice::Iter<'a, Item>);

impl Row<'_> {
    fn number(&mut self) -> Outcome<f64> {
        match self.0.next() {
            Some(Item::Number(value)) => Ok(*value),
            _ => Err(Failure::Arguments),
        }
    }

    fn air(&mut self) -> Outcome<Air> {
        match self.0.next() {
            Some(Item::State(air)) => Ok(*air),
            _ => Err(Failure::Arguments),
        }
    }

    fn code(&mut self) -> Outcome<i32> {
        let value = self.number()?;
        let code = value as i32;
        if (f64::from(code) - value).abs() > 0.0 { Err(Failure::Arguments) } else { Ok(code) }
    }

    fn formulation(&mut self) -> Outcome<Formulation> {
        Formulation::from_code(self.code()?).ok_or(Failure::Arguments)
    }

    fn basis(&mut self) -> Outcome<Basis> {
        Ok(Basis::new(self.pressure()?, self.formulation()?))
    }

    fn quantity(&mut self) -> Outcome<Quantity> {
        Quantity::from_code(self.code()?).ok_or(Failure::Arguments)
    }

    fn psychrometer(&mut self) -> Outcome<Psychrometer> {
        let bulb = Bulb::from_code(self.code()?).ok_or(Failure::Arguments)?;
        Ok(Psychrometer::with_coefficient(bulb, self.number()?)?)
    }

    fn temperature(&mut self) -> Outcome<Temperature> {
        self.number().map(Temperature::from_celsius)
    }

    fn mass_flow(&mut self) -> Outcome<MassFlow> {
        self.number().map(MassFlow::from_kilograms_per_second)
    }

    fn heat_flow(&mut self) -> Outcome<HeatFlow> {
        self.number().map(HeatFlow::from_watts)
    }

    fn humidity_ratio(&mut self) -> Outcome<HumidityRatio> {
        self.number().map(HumidityRatio::from_kilograms_per_kilogram)
    }

    fn relative_humidity(&mut self) -> Outcome<RelativeHumidity> {
        self.number().map(RelativeHumidity::from_fraction)
    }

    fn specific_enthalpy(&mut self) -> Outcome<SpecificEnthalpy> {
        self.number().map(SpecificEnthalpy::from_joules_per_kilogram)
    }

    fn pressure(&mut self) -> Outcome<Pressure> {
        self.number().map(Pressure::from_pascals)
    }

    fn stream(&mut self) -> Outcome<AirStream> {
        Ok(AirStream::new(self.air()?, self.mass_flow()?)?)
    }

    fn wet_air(&mut self) -> Outcome<AirWithCondensate> {
        Ok(AirWithCondensate::new(self.air()?, self.humidity_ratio()?, self.humidity_ratio()?)?)
    }

    fn wet_stream(&mut self) -> Outcome<WetStream> {
        Ok(WetStream::new(self.wet_air()?, self.mass_flow()?)?)
    }

    /// Everything that is left, as streams.
    fn wet_streams(&mut self) -> Outcome<Vec<WetStream>> {
        let mut streams = Vec::with_capacity(self.0.len() / 4);
        while !self.0.as_slice().is_empty() {
            streams.push(self.wet_stream()?);
        }
        Ok(streams)
    }

    fn freezing(&mut self) -> Outcome<Freezing> {
        match self.code()? {
            0 => Ok(Freezing::Equilibrium),
            1 => Ok(Freezing::Supercooled),
            _ => Err(Failure::Arguments),
        }
    }

    fn condensate_temperature(&mut self) -> Outcome<CondensateTemperature> {
        let (choice, given) = (self.code()?, self.temperature()?);
        match choice {
            0 => Ok(CondensateTemperature::LeavingAir),
            1 => Ok(CondensateTemperature::Apparatus),
            2 => Ok(CondensateTemperature::Given(given)),
            _ => Err(Failure::Arguments),
        }
    }

    fn conductance(&mut self) -> Outcome<Conductance> {
        self.number().map(Conductance::from_watts_per_kelvin)
    }

    fn arrangement(&mut self) -> Outcome<Arrangement> {
        match self.code()? {
            0 => Ok(Arrangement::Counterflow),
            1 => Ok(Arrangement::CrossFlow),
            _ => Err(Failure::Arguments),
        }
    }

    fn coil_surface(&mut self) -> Outcome<CoilSurface> {
        let (air_side, water_side) = (self.conductance()?, self.conductance()?);
        Ok(CoilSurface { air_side, water_side, arrangement: self.arrangement()? })
    }

    fn coil_water(&mut self) -> Outcome<CoilWater> {
        let (flow, entering) = (self.mass_flow()?, self.temperature()?);
        let (choice, given) = (self.code()?, SpecificHeat::from_joules_per_kilogram_kelvin(self.number()?));
        let coolant = match choice {
            0 => Coolant::Water,
            2 => Coolant::Brine(given),
            _ => return Err(Failure::Arguments),
        };
        Ok(CoilWater { flow, entering, coolant })
    }

    fn measured(&mut self) -> Outcome<Measured> {
        match self.code()? {
            0 => self.temperature().map(Measured::LeavingAir),
            1 => self.temperature().map(Measured::LeavingWater),
            2 => self.heat_flow().map(Measured::Heat),
            _ => Err(Failure::Arguments),
        }
    }

    fn evaporating_water(&mut self) -> Outcome<EvaporatingWater> {
        let (choice, given) = (self.code()?, self.temperature()?);
        match choice {
            0 => Ok(EvaporatingWater::AtWetBulb),
            2 => Ok(EvaporatingWater::Given(given)),
            _ => Err(Failure::Arguments),
        }
    }

    fn exchange(&mut self) -> Outcome<Exchange> {
        Ok(Exchange { heat: self.heat_flow()?, water: self.mass_flow()?, water_enthalpy_flow: self.heat_flow()? })
    }

    fn tower_water(&mut self) -> Outcome<TowerWater> {
        Ok(TowerWater { flow: self.mass_flow()?, hot: self.temperature()?, cold: self.temperature()? })
    }

    fn hot_water(&mut self) -> Outcome<HotWater> {
        Ok(HotWater { flow: self.mass_flow()?, temperature: self.temperature()? })
    }

    fn quadrature(&mut self) -> Outcome<Quadrature> {
        match self.code()? {
            0 => Ok(Quadrature::GaussLegendre),
            1 => Ok(Quadrature::GaussLegendreGraded),
            2 => Ok(Quadrature::FourPoint),
            _ => Err(Failure::Arguments),
        }
    }

    fn transfer(&mut self) -> Outcome<Transfer> {
        match self.code()? {
            0 => Ok(Transfer::Bosnjakovic),
            1 => Ok(Transfer::LewisFactorOne),
            2 => Ok(Transfer::EvaporationSuppressed),
            _ => Err(Failure::Arguments),
        }
    }

    fn fill(&mut self) -> Outcome<FillLaw> {
        Ok(FillLaw::new(self.number()?, self.number()?)?)
    }

    fn fill_test(&mut self) -> Outcome<FillTest> {
        Ok(FillTest { water_to_air: self.number()?, number: self.number()? })
    }

    /// The flows that a basin loses and gains.
    fn basin_flows(&mut self) -> Outcome<WaterUse> {
        let evaporation = MassFlow::from_kilograms_per_second(0.0);
        let (blowdown, drift, make_up) = (self.mass_flow()?, self.mass_flow()?, self.mass_flow()?);
        Ok(WaterUse { evaporation, drift, blowdown, make_up, limited_by_drift: false })
    }

    fn water_treatment(&mut self) -> Outcome<WaterTreatment> {
        Ok(WaterTreatment { drift_fraction: self.number()?, cycles_of_concentration: self.number()? })
    }
}

/// The results of one row, written from left to right in the order of the fields of their Python classes.
#[derive(Default)]
struct Out(Vec<Item>);

/// Writes itself.
trait Emit {
    fn emit(&self, out: &mut Out);
}

impl Out {
    fn put(&mut self, value: &impl Emit) -> &mut Self {
        value.emit(self);
        self
    }
}

impl Emit for f64 {
    fn emit(&self, out: &mut Out) {
        out.0.push(Item::Number(*self));
    }
}

impl Emit for bool {
    fn emit(&self, out: &mut Out) {
        f64::from(*self).emit(out);
    }
}

impl Emit for Option<f64> {
    fn emit(&self, out: &mut Out) {
        self.unwrap_or(NAN).emit(out);
    }
}

impl Emit for Air {
    fn emit(&self, out: &mut Out) {
        out.0.push(Item::State(*self));
    }
}

macro_rules! emit_number {
    ($($type:ident.$read:ident),*) => {$(
        impl Emit for moistair_core::$type {
            fn emit(&self, out: &mut Out) {
                self.$read().emit(out);
            }
        }
    )*};
}
emit_number!(
    HeatFlow.watts,
    MassFlow.kilograms_per_second,
    VolumeFlow.cubic_meters_per_second,
    HumidityRatio.kilograms_per_kilogram,
    SpecificEnthalpy.joules_per_kilogram,
    DewPoint.celsius,
    FrostPoint.celsius,
    Temperature.celsius,
    TemperatureDifference.kelvins,
    Conductance.watts_per_kelvin
);

macro_rules! emit_fields {
    ($($type:ty, |$this:ident| $($field:expr),+;)*) => {$(
        impl Emit for $type {
            fn emit(&self, out: &mut Out) {
                let $this = self;
                out$(.put(&$field))+;
            }
        }
    )*};
}
emit_fields! {
    AirStream, |x| x.air(), x.dry_air_flow(), x.volume_flow();
    AirWithCondensate, |x| x.air(), x.liquid(), x.ice(), x.total_water(), x.specific_enthalpy(), x.is_wet();
    WetStream, |x| x.air(), x.dry_air_flow();
    Exchange, |x| x.heat, x.water, x.water_enthalpy_flow;
    Sensible, |x| x.leaving, x.exchange;
    Cooling, |x| x.entering, x.leaving, x.exchange, x.cooling_load, x.sensible, x.latent, x.condensate, f64::from(x.regime as i32),
        x.sensible_heat_ratio();
    Apparatus, |x| x.dew_point, x.bypass_factor;
    ApparatusDewPoints, |x| x.warmer, x.colder, x.nearest;
    WaterCoil, |x| x.air, x.leaving_water, x.dry_fraction, x.coldest_surface, x.freezing;
    CoilSurface, |x| x.air_side, x.water_side;
    Compressed, |x| x.leaving, x.exchange, x.condensate;
    reheat::Reheat, |x| x.cooling, x.heating, x.reheat(), x.reheat_fraction();
    mixing::Mixed, |x| x.leaving, x.exchange;
    Humidified, |x| x.leaving, x.exchange, x.evaporated, x.carried;
    WaterUse, |x| x.evaporation, x.drift, x.blowdown, x.make_up, x.limited_by_drift;
    TowerBalance, |x| x.leaving, x.exchange, x.heat_rejected, x.water, x.range, x.approach, x.effectiveness();
    Pinch, |x| x.water_to_air, x.temperature;
    MerkelNumber, |x| x.number, x.water_to_air, x.pinch, x.heat_rejected, x.leaving_enthalpy;
    TowerRating, |x| x.water.cold, x.heat_rejected, x.leaving_enthalpy, x.water_to_air, x.range, x.approach, x.effectiveness(),
        f64::from(x.status as i32);
    PoppeRating, |x| x.leaving, x.exchange, x.water.cold, x.evaporation, x.heat_rejected, x.water_to_air, x.range, x.approach,
        x.effectiveness(), f64::from(x.status as i32), x.is_fogged();
    FillLaw, |x| x.coefficient(), x.exponent();
    books::Books, |x| x.heat_residual, x.heat_scale, x.water_residual, x.water_scale, x.heat_resolution, x.close();
}

impl Emit for Option<Apparatus> {
    fn emit(&self, out: &mut Out) {
        match self {
            Some(apparatus) => out.put(apparatus),
            None => out.put(&NAN).put(&NAN),
        };
    }
}

impl Emit for Absorption {
    fn emit(&self, out: &mut Out) {
        match self {
            Absorption::UpTo(flow) => out.put(flow),
            Absorption::Unlimited => out.put(&f64::INFINITY),
        };
    }
}

/// A process on the arguments of one row.
type Process = fn(&mut Row<'_>, &mut Out) -> Outcome;

/// Arguments are read in the order in which they are written here, which is the order in which Python gives them.
macro_rules! processes {
    ($($name:literal, |$row:ident| $result:expr;)*) => {
        fn process_named(name: &str) -> Option<Process> {
            match name {
                $($name => Some(|$row, out| {
                    out.put(&$result);
                    Ok(())
                }),)*
                _ => None,
            }
        }
    };
}
processes! {
    "stream", |r| r.stream()?;
    "stream.from_volume_flow", |r| {
        AirStream::from_volume_flow(r.air()?, VolumeFlow::from_cubic_meters_per_second(r.number()?))?
    };
    "stream.from_standard_volume_flow", |r| {
        let (air, flow) = (r.air()?, VolumeFlow::from_cubic_meters_per_second(r.number()?));
        AirStream::from_standard_volume_flow(air, flow, Density::from_kilograms_per_cubic_meter(r.number()?))?
    };
    "wet_stream", |r| r.wet_stream()?;
    "wet_air", |r| r.wet_air()?;
    "wet_air.from_enthalpy_and_water", |r| {
        let (enthalpy, water, freezing) = (r.specific_enthalpy()?, r.humidity_ratio()?, r.freezing()?);
        AirWithCondensate::from_enthalpy_and_water(enthalpy, water, freezing, r.basis()?)?
    };
    "wet_air.from_dry_bulb_and_water", |r| {
        AirWithCondensate::from_dry_bulb_and_water(r.temperature()?, r.humidity_ratio()?, r.freezing()?, r.basis()?)?
    };
    "air.from_psychrometer", |r| {
        let reading = PsychrometerReading { dry_bulb: r.temperature()?, wet_bulb: r.temperature()? };
        Air::from_psychrometer(r.psychrometer()?, reading, r.basis()?)?
    };
    "air.psychrometer_reading", |r| r.air()?.psychrometer_reading(r.psychrometer()?)?.wet_bulb;
    "air.at_pressure", |r| r.air()?.at_pressure(r.pressure()?)?;
    "air.at_temperature_and_pressure", |r| r.air()?.at_temperature_and_pressure(r.temperature()?, r.pressure()?)?;
    "air.dew_point_at", |r| r.air()?.dew_point_at(r.pressure()?)?;
    "air.frost_point_at", |r| r.air()?.frost_point_at(r.pressure()?)?;
    "saturation_temperature_after", |r| {
        saturation_temperature_after(r.quantity()?, r.number()?, r.basis()?, r.quantity()?, r.pressure()?)?
    };
    "compression.to_pressure", |r| compression::to_pressure(&r.wet_stream()?, r.pressure()?, r.temperature()?)?;
    "liquid_water_enthalpy", |r| {
        liquid_water_enthalpy(r.temperature()?, r.basis()?)?
    };
    "sensible.to_temperature", |r| sensible::to_temperature(&r.stream()?, r.temperature()?)?;
    "sensible.with_heat", |r| sensible::with_heat(&r.stream()?, r.heat_flow()?)?;
    "coil.to_state", |r| coil::to_state(&r.stream()?, &r.air()?, r.condensate_temperature()?)?;
    "coil.by_bypass_factor", |r| {
        coil::by_bypass_factor(&r.stream()?, r.temperature()?, r.number()?, r.condensate_temperature()?)?
    };
    "coil.apparatus_dew_point", |r| coil::apparatus_dew_point(&r.air()?, &r.air()?)?;
    "coil.apparatus_dew_points", |r| coil::apparatus_dew_points(&r.air()?, &r.air()?)?;
    "coil.bypass_factor_of_rows", |r| {
        let (of_one_row, rows) = (r.number()?, r.code()?);
        coil::bypass_factor_of_rows(of_one_row, u32::try_from(rows).map_err(|_| Failure::Arguments)?)?
    };
    "coil.with_water", |r| {
        coil::with_water(&r.stream()?, r.coil_surface()?, r.coil_water()?, r.condensate_temperature()?)?
    };
    "coil.surface_from_rating", |r| {
        coil::surface_from_rating(&r.stream()?, r.coil_water()?, r.measured()?, r.number()?, r.arrangement()?)?
    };
    "coil.between", |r| coil::between(&r.stream()?, &r.air()?, r.condensate_temperature()?, r.humidity_ratio()?)?;
    "reheat.to_state", |r| {
        reheat::to_state(&r.stream()?, &r.air()?, r.relative_humidity()?, r.condensate_temperature()?)?
    };
    "mixing.adiabatic", |r| mixing::adiabatic(&r.wet_streams()?)?;
    "mixing.adiabatic_at", |r| {
        let (outlet, freezing) = (r.pressure()?, r.freezing()?);
        mixing::adiabatic_at(&r.wet_streams()?, outlet, freezing)?
    };
    "mixing.remainder", |r| mixing::remainder(r.mass_flow()?, &r.stream()?, r.air()?)?;
    "humidify.saturated_steam_enthalpy", |r| humidify::saturated_steam_enthalpy(r.temperature()?)?;
    "humidify.steam", |r| humidify::steam(&r.stream()?, r.mass_flow()?, r.specific_enthalpy()?)?;
    "humidify.steam_to_humidity_ratio", |r| {
        humidify::steam_to_humidity_ratio(&r.stream()?, r.humidity_ratio()?, r.specific_enthalpy()?)?
    };
    "humidify.steam_to_relative_humidity", |r| {
        humidify::steam_to_relative_humidity(&r.stream()?, r.relative_humidity()?, r.specific_enthalpy()?)?
    };
    "humidify.steam_limit", |r| humidify::steam_limit(&r.stream()?, r.specific_enthalpy()?)?;
    "humidify.spray", |r| humidify::spray(&r.stream()?, r.mass_flow()?, r.temperature()?)?;
    "humidify.evaporative", |r| humidify::evaporative(&r.stream()?, r.number()?, r.evaporating_water()?)?;
    "tower.water_use", |r| tower::water_use(r.mass_flow()?, r.mass_flow()?, r.water_treatment()?)?;
    "tower.with_air_flow", |r| tower::with_air_flow(&r.stream()?, r.tower_water()?, r.water_treatment()?)?;
    "tower.with_leaving_air", |r| {
        tower::with_leaving_air(&r.air()?, &r.air()?, r.tower_water()?, r.water_treatment()?)?
    };
    "tower.water_to_air_ratio", |r| tower::water_to_air_ratio(&r.stream()?, r.mass_flow()?)?;
    "tower.coldest_water", |r| tower::coldest_water(&r.air()?)?;
    "tower.merkel_pinch", |r| merkel::pinch(&r.air()?, r.temperature()?, r.temperature()?)?;
    "tower.merkel_number", |r| merkel::number(&r.stream()?, r.tower_water()?, r.quadrature()?)?;
    "tower.merkel_rate", |r| merkel::rate(&r.stream()?, r.hot_water()?, r.number()?)?;
    "tower.air_for_duty", |r| merkel::air_for_duty(&r.air()?, r.tower_water()?, &r.fill()?)?;
    "tower.effectiveness_number", |r| effectiveness_ntu::number(&r.stream()?, r.tower_water()?)?;
    "tower.effectiveness_rate", |r| effectiveness_ntu::rate(&r.stream()?, r.hot_water()?, r.number()?)?;
    "tower.poppe_number", |r| poppe::number(&r.stream()?, r.tower_water()?, r.transfer()?)?;
    "tower.poppe_rate", |r| poppe::rate(&r.stream()?, r.hot_water()?, r.number()?, r.transfer()?)?;
    "tower.fill_from_two_tests", |r| FillLaw::from_two_tests([r.fill_test()?, r.fill_test()?])?;
    "tower.fill_number", |r| r.fill()?.number(r.number()?)?;
    "tower.fill_height", |r| {
        r.fill()?.height(r.number()?, r.number()?, Length::from_meters(r.number()?))?.meters()
    };
    "tower.cycles_of_concentration", |r| tower::cycles_of_concentration(r.number()?, r.number()?)?;
    "tower.evaporation_by_rule_of_thumb", |r| {
        tower::evaporation_by_rule_of_thumb(r.mass_flow()?, TemperatureDifference::from_kelvins(r.number()?))?
    };
    "tower.basin_after", |r| {
        let (concentration, inventory, seconds) = (r.number()?, r.number()?, r.number()?);
        let flows = r.basin_flows()?;
        Basin::new(inventory, concentration)?.after(seconds, &flows, r.number()?)?.concentration()
    };
    "books.balance", |r| {
        let (exchange, leaving) = (r.exchange()?, r.wet_stream()?);
        books::balance(&r.wet_streams()?, &leaving, &exchange)
    };
}

/// Runs a process on numbers, arrays and states; `layout` says what each result is: `N` a number, `S` a state.
///
/// Returns the results and the status. One row raises; of many rows, those without a result hold NaN.
#[pyfunction]
pub fn run<'py>(
    py: Python<'py>,
    name: &str,
    layout: &str,
    labels: Bound<'py, PyAny>,
    values: Vec<Bound<'py, PyAny>>,
) -> PyResult<(Bound<'py, PyList>, Bound<'py, PyAny>)> {
    let process = process_named(name).ok_or_else(|| internal(format!("no process {name:?}")))?;
    let plain = values.iter().map(plain_item).collect::<Option<PyResult<Vec<Item>>>>();
    if let Some(items) = plain {
        return run_once(py, process, layout, &items?);
    }
    let labels = labels.extract::<Vec<String>>()?;
    let named = named_formulation(&labels, &values);
    let (sources, names, flat) = flatten(py, &labels, &values)?;
    let names: Vec<&str> = names.iter().map(String::as_str).collect();
    let arguments = Arguments::read(py, &names, &flat)?;
    let table = Table { sources, columns: arguments.columns()? };
    if arguments.shape.is_empty() {
        let mut items = Vec::new();
        table.read(0, &mut items).map_err(|failure| raise(py, &failure))?;
        return run_once(py, process, layout, &items);
    }
    let mut results = Results::new(layout, arguments.rows)?;
    py.detach(|| results.fill(process, &table));
    results.finish(py, table.formulation().or(named).unwrap_or_default(), &arguments.shape)
}

/// The formulation that is given by name, where none comes with a state.
fn named_formulation(labels: &[String], values: &[Bound<'_, PyAny>]) -> Option<Formulation> {
    let place = labels.iter().position(|label| label == "formulation")?;
    values.get(place)?.extract::<f64>().ok().and_then(|code| Formulation::from_code(code as i32))
}

/// A plain number or one state; `None` for what holds an array.
fn plain_item(value: &Bound<'_, PyAny>) -> Option<PyResult<Item>> {
    if let Some(number) = plain_number(value) {
        return Some(number.map(Item::Number));
    }
    match value.cast::<MoistAir>().ok()?.get().content() {
        Content::One(air) => Some(Ok(Item::State(*air))),
        Content::Many(_) => None,
    }
}

fn run_once<'py>(
    py: Python<'py>,
    process: Process,
    layout: &str,
    items: &[Item],
) -> PyResult<(Bound<'py, PyList>, Bound<'py, PyAny>)> {
    let mut out = Out::default();
    process(&mut Row(items.iter()), &mut out).map_err(|failure| raise(py, &failure))?;
    if !fits(layout, &out.0) {
        return Err(internal("results do not fit their layout"));
    }
    let results = PyList::empty(py);
    for item in out.0 {
        match item {
            Item::Number(value) => results.append(value)?,
            Item::State(air) => results.append(MoistAir::from(Content::One(air)))?,
        }
    }
    Ok((results, 0_i32.into_pyobject(py)?.into_any()))
}

fn raise(py: Python<'_>, failure: &Failure) -> PyErr {
    match failure {
        Failure::Core(error) => exception(py, error),
        Failure::Before(code) => internal(format!("a state has failed with status {code}")),
        Failure::Arguments => PyTypeError::new_err("arguments do not fit this process"),
    }
}

fn fits(layout: &str, items: &[Item]) -> bool {
    let kinds = items.iter().map(|item| match item {
        Item::Number(_) => b'N',
        Item::State(_) => b'S',
    });
    kinds.eq(layout.bytes())
}

/// Where the arguments of a row come from, and the columns that they are read from.
struct Table<'a> {
    sources: Vec<Source>,
    columns: Vec<Column<'a>>,
}

/// A number takes one column; a state takes four: dry bulb, humidity ratio, pressure and status.
enum Source {
    Number,
    One(Air),
    Many(Formulation),
}

type Flat<'py> = (Vec<Source>, Vec<String>, Vec<Bound<'py, PyAny>>);

/// Takes states apart into columns.
fn flatten<'py>(py: Python<'py>, labels: &[String], values: &[Bound<'py, PyAny>]) -> PyResult<Flat<'py>> {
    let (mut sources, mut names, mut flat) = (Vec::new(), Vec::new(), Vec::new());
    for (label, value) in labels.iter().zip(values) {
        let Ok(state) = value.cast::<MoistAir>() else {
            sources.push(Source::Number);
            names.push(label.clone());
            flat.push(value.clone());
            continue;
        };
        match state.get().content() {
            Content::One(air) => sources.push(Source::One(*air)),
            Content::Many(states) => {
                sources.push(Source::Many(states.formulation));
                let status = column::array(py, states.status.clone(), &states.shape)?;
                let column = |values: &Vec<f64>| column::array(py, values.clone(), &states.shape);
                flat.push(column(&states.dry_bulb)?);
                flat.push(column(&states.humidity_ratio)?);
                flat.push(column(&states.pressure)?);
                flat.push(status);
                names.extend(core::iter::repeat_n(label.clone(), 4));
            }
        }
    }
    Ok((sources, names, flat))
}

impl Table<'_> {
    /// The arguments of a row.
    fn read(&self, row: usize, items: &mut Vec<Item>) -> Outcome {
        items.clear();
        let mut columns = self.columns.iter();
        let mut next = || columns.next().and_then(|column| column.get(row)).ok_or(Failure::Arguments);
        for source in &self.sources {
            items.push(match source {
                Source::Number => Item::Number(next()?),
                Source::One(air) => Item::State(*air),
                Source::Many(formulation) => {
                    let (t, w, p, status) = (next()?, next()?, next()?, next()? as i32);
                    if status != 0 {
                        return Err(Failure::Before(status));
                    }
                    Item::State(restore(t, w, p, *formulation)?)
                }
            });
        }
        Ok(())
    }

    /// Of the first state.
    fn formulation(&self) -> Option<Formulation> {
        let of = |source: &Source| match source {
            Source::Number => None,
            Source::One(air) => Some(air.formulation()),
            Source::Many(formulation) => Some(*formulation),
        };
        self.sources.iter().find_map(of)
    }
}

/// Results of many rows.
struct Results {
    layout: Vec<u8>,
    columns: Vec<Vec<f64>>,
    status: Vec<i32>,
    formulation: Option<Formulation>,
    misfit: bool,
}

impl Results {
    fn new(layout: &str, rows: usize) -> PyResult<Self> {
        let width = layout.bytes().map(|kind| if kind == b'S' { 3 } else { 1 }).sum();
        Ok(Self {
            layout: layout.as_bytes().to_vec(),
            columns: (0..width).map(|_| column::blank(rows, NAN)).collect::<PyResult<_>>()?,
            status: column::blank(rows, 0)?,
            formulation: None,
            misfit: false,
        })
    }

    fn fill(&mut self, process: Process, table: &Table<'_>) {
        let (mut items, mut out) = (Vec::new(), Out::default());
        for row in 0..self.status.len() {
            out.0.clear();
            let result = table.read(row, &mut items).and_then(|()| process(&mut Row(items.iter()), &mut out));
            let code = match result {
                Ok(()) => {
                    self.store(row, &out.0);
                    0
                }
                Err(Failure::Core(error)) => error.code(),
                Err(Failure::Before(status)) => status,
                Err(Failure::Arguments) => {
                    self.misfit = true;
                    continue;
                }
            };
            if let Some(place) = self.status.get_mut(row) {
                *place = code;
            }
        }
    }

    fn store(&mut self, row: usize, items: &[Item]) {
        let mut places = self.columns.iter_mut();
        let mut put = |value| {
            if let Some(place) = places.next().and_then(|column| column.get_mut(row)) {
                *place = value;
            }
        };
        for item in items {
            match item {
                Item::Number(value) => put(*value),
                Item::State(air) => {
                    put(air.dry_bulb().celsius());
                    put(air.pressure().pascals());
                    put(air.humidity_ratio().kilograms_per_kilogram());
                    self.formulation = Some(air.formulation());
                }
            }
        }
        self.misfit |= items.len() != self.layout.len();
    }

    fn finish<'py>(
        self,
        py: Python<'py>,
        formulation: Formulation,
        shape: &[usize],
    ) -> PyResult<(Bound<'py, PyList>, Bound<'py, PyAny>)> {
        if self.misfit {
            return Err(PyTypeError::new_err("arguments do not fit this process"));
        }
        let formulation = self.formulation.unwrap_or(formulation);
        let failed = self.status.iter().filter(|code| **code != 0).count();
        let mut columns = self.columns.into_iter();
        let mut next = || columns.next().ok_or_else(|| internal("a column is missing"));
        let results = PyList::empty(py);
        for kind in self.layout {
            if kind == b'S' {
                let (dry_bulb, pressure, humidity_ratio) = (next()?, next()?, next()?);
                let (shape, status) = (shape.to_vec(), self.status.clone());
                let states =
                    States { formulation, shape, dry_bulb, pressure, humidity_ratio, status, failed, settled: false };
                results.append(MoistAir::from(Content::Many(states)))?;
            } else {
                results.append(column::array(py, next()?, shape)?)?;
            }
        }
        Ok((results, column::array(py, self.status, shape)?))
    }
}
