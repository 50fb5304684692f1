//! Cooling coils, and coils with water in them.

use super::row::{
    Answer, Argument, Out, Outcome, Row, RowError, Walk, answers, arguments, choices, processes, statuses,
};
use crate::columns::NAN;
use crate::process::AirStream;
use crate::process::coil::{
    Apparatus, ApparatusDewPoints, Arrangement, CoilFlows, CoilRegime, CoilSurface, CoilWater, CondensateTemperature,
    Coolant, Cooling, FlowExponents, LoadByWater, Measured, WaterCoil, apparatus_dew_point, apparatus_dew_points,
    between, by_bypass_factor, bypass_factor_of_rows, load_by_water, surface_from_rating, to_state, with_water,
};
use crate::{HeatFlow, HumidityRatio, MassFlow, MoistAir, SpecificHeat, Temperature};

processes! {
    400 "coil.to_state":
        (entering: AirStream, leaving: MoistAir, condensate_temperature: CondensateTemperature) -> Cooling {
        to_state(&entering, &leaving, condensate_temperature)?
    }
    401 "coil.by_bypass_factor":
        (entering: AirStream, apparatus_dew_point: Temperature, bypass_factor: f64, condensate_temperature: CondensateTemperature) -> Cooling {
        by_bypass_factor(&entering, apparatus_dew_point, bypass_factor, condensate_temperature)?
    }
    402 "coil.apparatus_dew_point": (entering: MoistAir, leaving: MoistAir) -> Apparatus {
        apparatus_dew_point(&entering, &leaving)?
    }
    403 "coil.apparatus_dew_points": (entering: MoistAir, leaving: MoistAir) -> ApparatusDewPoints {
        apparatus_dew_points(&entering, &leaving)?
    }
    404 "coil.bypass_factor_of_rows": (of_one_row: f64, rows: Count) -> "bypass_factor" f64 {
        bypass_factor_of_rows(of_one_row, rows.0)?
    }
    405 "coil.with_water":
        (entering: AirStream, surface: CoilSurface, water: CoilWater, condensate_temperature: CondensateTemperature) -> WaterCoil {
        with_water(&entering, surface, water, condensate_temperature)?
    }
    406 "coil.surface_from_rating":
        (entering: AirStream, water: CoilWater, measured: Measured, conductance_ratio: f64, arrangement: Arrangement) -> CoilSurface {
        surface_from_rating(&entering, water, measured, conductance_ratio, arrangement)?
    }
    407 "coil.between":
        (entering: AirStream, leaving: MoistAir, condensate_temperature: CondensateTemperature, dead_band: HumidityRatio) -> Cooling {
        between(&entering, &leaving, condensate_temperature, dead_band)?
    }
    408 "coil.surface_at_flows":
        (surface: CoilSurface, found_at_air_flow: MassFlow, found_at_water_flow: MassFlow, air_flow: MassFlow, water_flow: MassFlow, exponents: FlowExponents) -> CoilSurface {
        let found_at = CoilFlows { air: found_at_air_flow, water: found_at_water_flow };
        surface.at_flows(found_at, CoilFlows { air: air_flow, water: water_flow }, exponents)?
    }
    409 "coil.load_by_water":
        (entering: AirStream, load_by_air: HeatFlow, water: CoilWater, leaving_water: Temperature) -> LoadByWater {
        load_by_water(&entering, load_by_air, water, leaving_water)?
    }
}

arguments! {
    CoilSurface { air_side: "air_side", water_side: "water_side", arrangement: "arrangement" }
    FlowExponents { air_side: "air_side_exponent", water_side: "water_side_exponent" }
    CoilWater { flow: "water_flow", entering: "entering_water", coolant: "specific_heat" }
}

choices! {
    Arrangement { 0 "counterflow" => Counterflow, 1 "cross flow" => CrossFlow }
}

statuses! {
    CoilRegime { "0 dry" => Dry, "1 wet" => Wet, "2 frost" => Frost, "3 partly wet" => PartlyWet }
}

answers! {
    Cooling, |x| {
        entering: x.entering,
        leaving: x.leaving,
        exchange: x.exchange,
        cooling_load: x.cooling_load,
        sensible: x.sensible,
        latent: x.latent,
        condensate: x.condensate,
        regime: x.regime,
        sensible_heat_ratio: x.sensible_heat_ratio(),
    }
    Apparatus, |x| { dew_point: x.dew_point, bypass_factor: x.bypass_factor }
    ApparatusDewPoints, |x| { warmer: x.warmer, colder: x.colder, nearest: x.nearest }
    WaterCoil, |x| {
        air: x.air,
        leaving_water: x.leaving_water,
        dry_fraction: x.dry_fraction,
        coldest_surface: x.coldest_surface,
        freezing: x.freezing,
    }
    CoilSurface, |x| { air_side: x.air_side, water_side: x.water_side }
    LoadByWater, |x| { load: x.load, air_less_water: x.air_less_water }
}

/// A number of equal things.
pub(super) struct Count(u32);

impl Argument for Count {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "1");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        let count = row.code()?;
        u32::try_from(count).map(Self).map_err(|_| RowError::Choice(count))
    }
}

impl Argument for CondensateTemperature {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: 0 leaving air, 1 apparatus, 2 given");
        walk.within(name, |walk| walk.number("given", "°C"));
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match (row.code()?, Temperature::read(row)?) {
            (0, _) => Ok(Self::LeavingAir),
            (1, _) => Ok(Self::Apparatus),
            (2, given) => Ok(Self::Given(given)),
            (other, _) => Err(RowError::Choice(other)),
        }
    }
}

impl Argument for Coolant {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: 0 of water, 2 given");
        walk.within(name, |walk| walk.number("given", "J/(kg K)"));
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match (row.code()?, SpecificHeat::read(row)?) {
            (0, _) => Ok(Self::Water),
            (2, given) => Ok(Self::Brine(given)),
            (other, _) => Err(RowError::Choice(other)),
        }
    }
}

impl Argument for Measured {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: 0 leaving air, 1 leaving water, 2 heat");
        walk.number("value", "°C or W");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match row.code()? {
            0 => Temperature::read(row).map(Self::LeavingAir),
            1 => Temperature::read(row).map(Self::LeavingWater),
            2 => HeatFlow::read(row).map(Self::Heat),
            other => Err(RowError::Choice(other)),
        }
    }
}

/// NaN where there is none.
impl Answer for Option<Apparatus> {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <Apparatus as Answer>::describe(walk, name);
    }

    fn write(&self, out: &mut Out<'_>) {
        let none = Apparatus { dew_point: Temperature::from_celsius(NAN), bypass_factor: NAN };
        self.unwrap_or(none).write(out);
    }
}
