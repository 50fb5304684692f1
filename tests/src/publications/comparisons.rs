//! The largest differences between publications, on grids over the ranges in which both hold.

use std::fmt;

use moistair_core::*;

use super::{cipm_2007, henry, saturation, wmo};
use crate::checks::Table;
use crate::helmholtz_reference as reference;

/// What is compared, with what, and where.
#[derive(Clone, Copy, Debug)]
struct Heading {
    quantity: &'static str,
    publication: &'static str,
    beside: &'static str,
    range: &'static str,
    unit: Unit,
}

/// How a difference is counted.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Unit {
    /// As a fraction of what the publication stands beside.
    Relative,
    /// J/kg of dry air.
    JoulesPerKilogram,
    /// K.
    Kelvins,
}

/// Where a difference sits.
#[derive(Clone, Copy, Debug)]
pub struct Place {
    /// °C
    pub celsius: f64,
    /// Pa, where the quantity depends on it.
    pub pascals: Option<f64>,
    /// Relative humidity, where the quantity depends on it.
    pub relative_humidity: Option<f64>,
}

/// The largest difference of a publication from another.
#[derive(Clone, Copy, Debug)]
pub struct Comparison {
    /// Quantity, with the condition under which it is compared.
    pub quantity: &'static str,
    /// The publication.
    pub publication: &'static str,
    /// What it stands beside.
    pub beside: &'static str,
    /// Range of the grid.
    pub range: &'static str,
    /// How the difference is counted.
    pub unit: Unit,
    /// The difference of largest size, `publication` less `beside`.
    pub largest: f64,
    /// Where it sits.
    pub place: Place,
    /// Points of the grid.
    pub points: usize,
    /// What the size is claimed to be at most.
    pub bound: f64,
}

impl fmt::Display for Unit {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.pad(match self {
            Self::Relative => "relative",
            Self::JoulesPerKilogram => "J/kg",
            Self::Kelvins => "K",
        })
    }
}

impl fmt::Display for Place {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(f, "{} °C", self.celsius)?;
        if let Some(pascals) = self.pascals {
            write!(f, ", {} kPa", pascals / 1e3)?;
        }
        if let Some(humidity) = self.relative_humidity {
            write!(f, ", {} %", (100.0 * humidity).round())?;
        }
        Ok(())
    }
}

impl fmt::Display for Comparison {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let Self { quantity, publication, beside, range, unit, largest, place, points, .. } = self;
        write!(
            f,
            "{quantity}: {publication} against {beside}, {range}: at most {largest:+.2e} {unit} at {place} ({points} points)"
        )
    }
}

/// All comparisons.
///
/// G8-10 stands here in the library's real gas, which its own tests hold to within 1e-7 of the release; saturation of pure water
/// by R6-95 and R10-06 in a text of its own.
#[must_use]
pub fn comparisons() -> Vec<Comparison> {
    [density(), saturation_pressure(), enhancement(), saturated_air(), ideal_gas(), dissolved_air()].concat()
}

impl Heading {
    /// The largest of the differences at the points of a grid, and what its size is claimed to be at most.
    fn over(self, bound: f64, points: impl IntoIterator<Item = (Place, f64)>) -> Comparison {
        let Self { quantity, publication, beside, range, unit } = self;
        let (mut largest, mut place, mut count) = (0.0_f64, Place::at(f64::NAN), 0);
        for (at, difference) in points {
            assert!(difference.is_finite(), "{quantity}: {publication} against {beside} at {at}");
            count += 1;
            if difference.abs() > largest.abs() {
                (largest, place) = (difference, at);
            }
        }
        Comparison { quantity, publication, beside, range, unit, largest, place, points: count, bound }
    }
}

impl Place {
    fn at(celsius: f64) -> Self {
        Self { celsius, pascals: None, relative_humidity: None }
    }

    fn under(self, pascals: f64) -> Self {
        Self { pascals: Some(pascals), ..self }
    }

    fn humid(self, relative_humidity: f64) -> Self {
        Self { relative_humidity: Some(relative_humidity), ..self }
    }
}

/// From one end to the other in so many equal steps.
fn steps(ends: (f64, f64), count: u32) -> impl Iterator<Item = f64> + Clone {
    let (from, to) = ends;
    (0..=count).map(move |i| from + (to - from) * f64::from(i) / f64::from(count))
}

/// From one end to the other by half a degree.
fn half_degrees(ends: (f64, f64)) -> impl Iterator<Item = f64> + Clone {
    steps(ends, ((ends.1 - ends.0) * 2.0).round() as u32)
}

/// All pairs.
fn pairs(
    celsius: impl Iterator<Item = f64>,
    pascals: impl Iterator<Item = f64> + Clone,
) -> impl Iterator<Item = (f64, f64)> {
    celsius.flat_map(move |t| pascals.clone().map(move |p| (t, p)))
}

fn relative(value: f64, beside: f64) -> f64 {
    value / beside - 1.0
}

fn air<P: SecondProperty<f64>>(celsius: f64, pascals: f64, second: P, formulation: Formulation) -> MoistAir {
    let basis = Basis::new(Pressure::from_pascals(pascals), formulation);
    MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), second, basis).unwrap()
}

fn saturated(celsius: f64, pascals: f64, formulation: Formulation) -> MoistAir {
    air(celsius, pascals, DegreeOfSaturation::from_fraction(1.0), formulation)
}

/// States of the real gas where CIPM-2007 holds.
fn weighing(humidity: impl Iterator<Item = f64> + Clone) -> impl Iterator<Item = (Place, MoistAir)> {
    pairs(half_degrees((15.0, 27.0)), steps((60e3, 110e3), 10)).flat_map(move |(t, p)| {
        humidity.clone().map(move |humidity| {
            let air = air(t, p, RelativeHumidity::from_fraction(humidity), Formulation::RealGas);
            (Place::at(t).under(p).humid(humidity), air)
        })
    })
}

/// Density of moist air.
fn density() -> Vec<Comparison> {
    let humid = || steps((0.0, 1.0), 10);
    let density = |air: &MoistAir| air.density().kilograms_per_cubic_meter();
    let at_same_humidity = |(place, air): (Place, MoistAir)| {
        let (t, p) = (air.dry_bulb().celsius(), air.pressure().pascals());
        let humidity = air.relative_humidity().unwrap().fraction();
        (place, relative(cipm_2007::density(t, p, humidity), density(&air)))
    };
    let at_same_vapor = |(place, air): (Place, MoistAir)| {
        let (t, p, x) = (air.dry_bulb().celsius(), air.pressure().pascals(), air.water_mole_fraction().fraction());
        (place, relative(cipm_2007::density_at_mole_fraction(t, p, x), density(&air)))
    };
    let heading = Heading {
        quantity: "density at the same relative humidity",
        publication: "CIPM-2007",
        beside: "G8-10",
        range: "15 to 27 °C, 60 to 110 kPa, dry to saturated",
        unit: Unit::Relative,
    };
    let dry = Heading { quantity: "density of dry air", range: "15 to 27 °C, 60 to 110 kPa", ..heading };
    vec![
        heading.over(2.2e-5, weighing(humid()).map(at_same_humidity)),
        Heading { quantity: "density at the same mole fraction of water", ..heading }
            .over(2.2e-5, weighing(humid()).map(at_same_vapor)),
        dry.over(2e-5, weighing(std::iter::once(0.0)).map(at_same_vapor)),
    ]
}

/// Pressure, Pa, of vapor by R6-95 in equilibrium with liquid by R6-95.
fn equilibrium_with_liquid(celsius: f64) -> f64 {
    let kelvins = celsius + 273.15;
    let start = wmo::saturation_pressure_over_liquid(celsius);
    reference::saturation_pressure(kelvins, |p| reference::liquid_potential(kelvins, p), start)
}

/// The same with ice by R10-06.
fn equilibrium_with_ice(celsius: f64) -> f64 {
    let kelvins = celsius + 273.15;
    let start = wmo::saturation_pressure_over_ice(celsius);
    reference::saturation_pressure(kelvins, |p| reference::ice_potential(kelvins, p), start)
}

/// Saturation pressure of pure water.
fn saturation_pressure() -> Vec<Comparison> {
    const OVER_LIQUID: Heading = Heading {
        quantity: "saturation pressure over liquid water",
        publication: "",
        beside: "R6-95",
        range: "",
        unit: Unit::Relative,
    };
    const OVER_ICE: Heading =
        Heading { quantity: "saturation pressure over ice", beside: "R10-06 with R6-95", ..OVER_LIQUID };
    type Text = fn(f64) -> f64;
    let by_kelvins = |text: Text| move |celsius: f64| text(celsius + 273.15);
    let against = |heading: Heading, ends, bound, text: &dyn Fn(f64) -> f64, equilibrium: Text| {
        heading.over(bound, half_degrees(ends).map(|t| (Place::at(t), relative(text(t), equilibrium(t)))))
    };
    let liquid = |publication, range, ends, bound, text: &dyn Fn(f64) -> f64| {
        against(Heading { publication, range, ..OVER_LIQUID }, ends, bound, text, equilibrium_with_liquid)
    };
    let ice = |publication, range, ends, bound, text: &dyn Fn(f64) -> f64| {
        against(Heading { publication, range, ..OVER_ICE }, ends, bound, text, equilibrium_with_ice)
    };
    let hyland_wexler = by_kelvins(saturation::hyland_wexler_over_liquid);
    vec![
        liquid("R7-97 region 4", "0 to 200 °C", (0.0, 200.0), 2e-4, &by_kelvins(saturation::region_4)),
        liquid("SR1-86", "0 to 200 °C", (0.0, 200.0), 8e-5, &by_kelvins(saturation::supplementary_release)),
        liquid("Hyland-Wexler 1983", "0 to 100 °C", (0.0, 100.0), 2.5e-4, &hyland_wexler),
        liquid("Hyland-Wexler 1983", "100 to 200 °C", (100.0, 200.0), 1e-4, &hyland_wexler),
        liquid("WMO-No. 8", "0 to 60 °C", (0.0, 60.0), 3.5e-3, &wmo::saturation_pressure_over_liquid),
        liquid("WMO-No. 8", "-37 to 0 °C, supercooled", (-37.0, 0.0), 7e-3, &wmo::saturation_pressure_over_liquid),
        liquid("CIPM-2007", "15 to 27 °C", (15.0, 27.0), 8e-5, &cipm_2007::saturation_pressure),
        ice("R14-08", "-100 to 0 °C", (-100.0, 0.0), 1.5e-4, &by_kelvins(saturation::sublimation_pressure)),
        ice(
            "Hyland-Wexler 1983",
            "-100 to 0 °C",
            (-100.0, 0.0),
            3.5e-4,
            &by_kelvins(saturation::hyland_wexler_over_ice),
        ),
        ice("WMO-No. 8", "-65 to 0 °C", (-65.0, 0.0), 2e-3, &wmo::saturation_pressure_over_ice),
    ]
}

/// Enhancement factor x_ws p / p_ws, and what it makes of the vapor pressure of saturated air.
fn enhancement() -> Vec<Comparison> {
    let heading = Heading {
        quantity: "enhancement factor",
        publication: "CIPM-2007",
        beside: "G8-10",
        range: "15 to 27 °C, 60 to 110 kPa",
        unit: Unit::Relative,
    };
    let weather = Heading { publication: "WMO-No. 8", range: "0.5 to 60 °C, 60 to 110 kPa", ..heading };
    let grid = |celsius| pairs(half_degrees(celsius), steps((60e3, 110e3), 10));
    let factor = |theirs: fn(f64, f64) -> f64| {
        move |(t, p)| {
            let ours = saturated(t, p, Formulation::RealGas).enhancement_factor().unwrap();
            (Place::at(t).under(p), relative(theirs(t, p), ours))
        }
    };
    let vapor_pressure = |(t, p)| {
        let ours = saturated(t, p, Formulation::RealGas).vapor_pressure().pascals();
        let theirs = wmo::enhancement_factor(p) * wmo::saturation_pressure_over_liquid(t);
        (Place::at(t).under(p), relative(theirs, ours))
    };
    let of_weather = |_, p| wmo::enhancement_factor(p);
    vec![
        heading.over(3e-4, grid((15.0, 27.0)).map(factor(cipm_2007::enhancement_factor))),
        weather.over(1.2e-3, grid((0.5, 60.0)).map(factor(of_weather))),
        Heading { range: "-65 to 0 °C over ice, 60 to 110 kPa", ..weather }
            .over(3.5e-3, grid((-65.0, 0.0)).map(factor(of_weather))),
        Heading { quantity: "vapor pressure of saturated air", ..weather }
            .over(3.5e-3, grid((0.5, 60.0)).map(vapor_pressure)),
    ]
}

/// Saturated air at 101.325 kPa: the handbook's Table 2, which stands on ASHRAE RP-1485 (with dissolved air; saturation by R7-97 and R14-08).
fn saturated_air() -> Vec<Comparison> {
    let table = Table::read(include_str!("../../published/handbook_table2_moist_air.csv"));
    let heading = Heading {
        quantity: "humidity ratio of saturated air",
        publication: "ASHRAE Fundamentals 2021 ch. 1 Table 2",
        beside: "G8-10",
        range: "0 to 90 °C, 101.325 kPa",
        unit: Unit::Relative,
    };
    // Below 0 °C the print of the table is coarser than the difference.
    let column = |name: &'static str, ours: fn(MoistAir) -> f64| {
        let warm = table.rows().filter(|row| row.number("t_C") >= 0.0);
        warm.map(move |row| {
            let t = row.number("t_C");
            (Place::at(t), relative(row.number(name), ours(saturated(t, 101_325.0, Formulation::RealGas))))
        })
    };
    let ratio = column("Ws_kg_kg", |air| air.humidity_ratio().kilograms_per_kilogram());
    let enthalpy = column("h_s_kJ_kgda", |air| air.specific_enthalpy().kilojoules_per_kilogram());
    vec![
        heading.over(1.6e-4, ratio),
        Heading { quantity: "enthalpy of saturated air", ..heading }.over(1.5e-4, enthalpy),
    ]
}

/// What the ideal gas of the handbook differs from the real gas, at the same humidity ratio.
fn ideal_gas() -> Vec<Comparison> {
    const FORMULATIONS: [Formulation; 2] = [Formulation::IdealGas, Formulation::RealGas];
    const SATURATED: Heading = Heading {
        quantity: "humidity ratio of saturated air",
        publication: "ideal gas with Hyland-Wexler 1983",
        beside: "G8-10",
        range: "-40 to 60 °C, 80 to 106 kPa",
        unit: Unit::Relative,
    };
    let saturation = |(t, p)| {
        let [ideal, real] = FORMULATIONS.map(|f| saturated(t, p, f).humidity_ratio().kilograms_per_kilogram());
        (Place::at(t).under(p), relative(ideal, real))
    };
    // States at a share of what both formulations hold.
    let states = |celsius: (f64, f64), pascals: (f64, f64), humidity: (f64, f64)| {
        pairs(half_degrees(celsius), steps(pascals, 5)).flat_map(move |(t, p)| {
            let limits = FORMULATIONS.map(|f| saturated(t, p, f).humidity_ratio().kilograms_per_kilogram());
            steps(humidity, 5).map(move |share| {
                let ratio = HumidityRatio::from_kilograms_per_kilogram(share * limits[0].min(limits[1]));
                (Place::at(t).under(p).humid(share), FORMULATIONS.map(|f| air(t, p, ratio, f)))
            })
        })
    };
    let comfort = || states((15.0, 30.0), (95e3, 105e3), (0.2, 0.7));
    let plant = || states((-20.0, 50.0), (80e3, 106e3), (0.0, 1.0));
    let volume = |(place, air): (Place, [MoistAir; 2])| {
        let [ideal, real] = air.map(|air| air.specific_volume().cubic_meters_per_kilogram());
        (place, relative(ideal, real))
    };
    let enthalpy = |(place, air): (Place, [MoistAir; 2])| {
        let [ideal, real] = air.map(|air| air.specific_enthalpy().joules_per_kilogram());
        (place, ideal - real)
    };
    const VOLUME: Heading = Heading {
        quantity: "specific volume",
        publication: "ideal gas",
        range: "15 to 30 °C, 95 to 105 kPa, 20 to 70 %",
        ..SATURATED
    };
    const ENTHALPY: Heading = Heading { quantity: "specific enthalpy", unit: Unit::JoulesPerKilogram, ..VOLUME };
    const PLANT: &str = "-20 to 50 °C, 80 to 106 kPa, dry to saturated";
    vec![
        SATURATED.over(8e-3, pairs(half_degrees((-40.0, 60.0)), steps((80e3, 106e3), 5)).map(saturation)),
        Heading { range: "0 to 60 °C, 1.1 MPa", ..SATURATED }
            .over(4e-2, half_degrees((0.0, 60.0)).map(|t| saturation((t, 1.1e6)))),
        VOLUME.over(5e-4, comfort().map(volume)),
        Heading { range: PLANT, ..VOLUME }.over(1e-3, plant().map(volume)),
        ENTHALPY.over(40.0, comfort().map(enthalpy)),
        Heading { range: PLANT, ..ENTHALPY }.over(320.0, plant().map(enthalpy)),
    ]
}

/// What G8-10 leaves out by taking the liquid as pure water, estimated with G7-04.
fn dissolved_air() -> Vec<Comparison> {
    const MOLE_FRACTION: Heading = Heading {
        quantity: "mole fraction of water in saturated air",
        publication: "with dissolved air by G7-04",
        beside: "G8-10, which neglects it",
        range: "0.5 to 95 °C, 101.325 kPa",
        unit: Unit::Relative,
    };
    const DEW_POINT: Heading =
        Heading { quantity: "dew point of a given mole fraction", unit: Unit::Kelvins, ..MOLE_FRACTION };
    let lowered = |t: f64, p: f64| {
        let water = saturated(t, p, Formulation::RealGas).vapor_pressure().pascals();
        -henry::dissolved_air(t + 273.15, p, water)
    };
    let warmer = |t: f64, p: f64| {
        let ln = |t| saturated(t, p, Formulation::RealGas).water_mole_fraction().fraction().ln();
        let slope = (ln(t + 0.02) - ln(t - 0.02)) / 0.04;
        -lowered(t, p) / slope
    };
    let over = |heading: Heading, warmest: f64, p: f64, bound: f64, difference: &dyn Fn(f64, f64) -> f64| {
        heading.over(bound, half_degrees((0.5, warmest)).map(|t| (Place::at(t).under(p), difference(t, p))))
    };
    let compressed = "0.5 to 100 °C, 1.1 MPa";
    vec![
        over(MOLE_FRACTION, 95.0, 101_325.0, 2.5e-5, &lowered),
        over(Heading { range: compressed, ..MOLE_FRACTION }, 100.0, 1.1e6, 2.6e-4, &lowered),
        over(DEW_POINT, 95.0, 101_325.0, 3.5e-4, &warmer),
        over(Heading { range: compressed, ..DEW_POINT }, 100.0, 1.1e6, 3.6e-3, &warmer),
    ]
}
