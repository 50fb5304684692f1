//! Wet cooling towers, their fills and their water.

use super::row::{Answer, Argument, Out, Outcome, Row, Walk, answers, arguments, choices, processes, statuses};
use crate::process::AirStream;
use crate::process::tower::basin::Basin;
use crate::process::tower::fill::{FillLaw, FillTest};
use crate::process::tower::merkel::{self, MerkelNumber, Pinch, Quadrature};
use crate::process::tower::poppe::{self, PoppeRating, Transfer};
use crate::process::tower::{
    HotWater, TowerBalance, TowerRating, TowerStatus, TowerWater, WaterTreatment, WaterUse, coldest_water,
    cycles_of_concentration, effectiveness_ntu, evaporation_by_rule_of_thumb, water_to_air_ratio, water_use,
    with_air_flow, with_leaving_air,
};
use crate::{Length, MassFlow, MoistAir, Temperature, TemperatureDifference};

processes! {
    700 "tower.water_use": (evaporation: MassFlow, circulating_flow: MassFlow, treatment: WaterTreatment) -> WaterUse {
        water_use(evaporation, circulating_flow, treatment)?
    }
    701 "tower.with_air_flow": (entering: AirStream, water: TowerWater, treatment: WaterTreatment) -> TowerBalance {
        with_air_flow(&entering, water, treatment)?
    }
    702 "tower.with_leaving_air":
        (entering: MoistAir, leaving: MoistAir, water: TowerWater, treatment: WaterTreatment) -> TowerBalance {
        with_leaving_air(&entering, &leaving, water, treatment)?
    }
    703 "tower.water_to_air_ratio": (entering: AirStream, water_flow: MassFlow) -> "water_to_air" f64 {
        water_to_air_ratio(&entering, water_flow)?
    }
    704 "tower.coldest_water": (air: MoistAir) -> "water_temperature" Temperature { coldest_water(&air)? }
    705 "tower.merkel_pinch": (air: MoistAir, hot_water: Temperature, cold_water: Temperature) -> Pinch {
        merkel::pinch(&air, hot_water, cold_water)?
    }
    706 "tower.merkel_number": (entering: AirStream, water: TowerWater, quadrature: Quadrature) -> MerkelNumber {
        merkel::number(&entering, water, quadrature)?
    }
    707 "tower.merkel_rate": (entering: AirStream, water: HotWater, number: f64) -> TowerRating {
        merkel::rate(&entering, water, number)?
    }
    708 "tower.air_for_duty": (air: MoistAir, water: TowerWater, fill: FillLaw) -> AirStream {
        merkel::air_for_duty(&air, water, &fill)?
    }
    709 "tower.effectiveness_number": (entering: AirStream, water: TowerWater) -> "number" f64 {
        effectiveness_ntu::number(&entering, water)?
    }
    710 "tower.effectiveness_rate": (entering: AirStream, water: HotWater, number: f64) -> TowerRating {
        effectiveness_ntu::rate(&entering, water, number)?
    }
    711 "tower.poppe_number": (entering: AirStream, water: TowerWater, transfer: Transfer) -> "number" f64 {
        poppe::number(&entering, water, transfer)?
    }
    712 "tower.poppe_rate": (entering: AirStream, water: HotWater, number: f64, transfer: Transfer) -> PoppeRating {
        poppe::rate(&entering, water, number, transfer)?
    }
    713 "tower.fill_from_two_tests":
        (first_water_to_air: f64, first_number: f64, second_water_to_air: f64, second_number: f64) -> FillLaw {
        FillLaw::from_two_tests([
            FillTest { water_to_air: first_water_to_air, number: first_number },
            FillTest { water_to_air: second_water_to_air, number: second_number },
        ])?
    }
    714 "tower.fill_number": (fill: FillLaw, water_to_air: f64) -> "number" f64 { fill.number(water_to_air)? }
    715 "tower.fill_height": (fill: FillLaw, number: f64, water_to_air: f64, tested_height: Length) -> "height" Length {
        fill.height(number, water_to_air, tested_height)?
    }
    716 "tower.cycles_of_concentration": (circulating: Concentration, make_up: Concentration) -> "cycles" f64 {
        cycles_of_concentration(circulating.0, make_up.0)?
    }
    717 "tower.evaporation_by_rule_of_thumb":
        (circulating_flow: MassFlow, water_range: TemperatureDifference) -> "evaporation" MassFlow {
        evaporation_by_rule_of_thumb(circulating_flow, water_range)?
    }
    718 "tower.basin_after": (
        concentration: Concentration,
        inventory: Inventory,
        duration: Duration,
        flows: WaterUse,
        make_up_concentration: Concentration,
    ) -> "concentration" Concentration {
        let later = Basin::new(inventory.0, concentration.0)?.after(duration.0, &flows, make_up_concentration.0)?;
        Concentration(later.concentration())
    }
}

arguments! {
    TowerWater { flow: "water_flow", hot: "hot_water", cold: "cold_water" }
    HotWater { flow: "water_flow", temperature: "hot_water" }
    WaterTreatment { drift_fraction: "drift_fraction", cycles_of_concentration: "cycles_of_concentration" }
}

choices! {
    Quadrature { 0 "Gauss-Legendre" => GaussLegendre, 1 "Gauss-Legendre graded" => GaussLegendreGraded, 2 "four points" => FourPoint }
    Transfer { 0 "Bosnjakovic" => Bosnjakovic, 1 "Lewis factor one" => LewisFactorOne, 2 "evaporation suppressed" => EvaporationSuppressed }
}

statuses! {
    TowerStatus { "0 cooling" => Cooling, "1 reversed" => Reversed }
}

answers! {
    WaterUse, |x| {
        evaporation: x.evaporation,
        drift: x.drift,
        blowdown: x.blowdown,
        make_up: x.make_up,
        limited_by_drift: x.limited_by_drift,
    }
    TowerBalance, |x| {
        leaving: x.leaving,
        exchange: x.exchange,
        heat_rejected: x.heat_rejected,
        water: x.water,
        range: x.range,
        approach: x.approach,
        effectiveness: x.effectiveness(),
    }
    Pinch, |x| { water_to_air: x.water_to_air, temperature: x.temperature }
    MerkelNumber, |x| {
        number: x.number,
        water_to_air: x.water_to_air,
        pinch: x.pinch,
        heat_rejected: x.heat_rejected,
        leaving_enthalpy: x.leaving_enthalpy,
    }
    TowerRating, |x| {
        cold_water: x.water.cold,
        heat_rejected: x.heat_rejected,
        leaving_enthalpy: x.leaving_enthalpy,
        water_to_air: x.water_to_air,
        range: x.range,
        approach: x.approach,
        effectiveness: x.effectiveness(),
        direction: x.status,
    }
    PoppeRating, |x| {
        leaving: x.leaving,
        exchange: x.exchange,
        cold_water: x.water.cold,
        evaporation: x.evaporation,
        heat_rejected: x.heat_rejected,
        water_to_air: x.water_to_air,
        range: x.range,
        approach: x.approach,
        effectiveness: x.effectiveness(),
        direction: x.status,
        is_fogged: x.is_fogged(),
    }
    FillLaw, |x| { coefficient: x.coefficient(), exponent: x.exponent() }
}

impl Argument for FillLaw {
    fn describe(walk: &mut Walk<'_>, _: &'static str) {
        walk.number("coefficient", "1");
        walk.number("exponent", "1");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        Ok(Self::new(row.number()?, row.number()?)?)
    }
}

/// The flows that a basin loses and gains.
impl Argument for WaterUse {
    fn describe(walk: &mut Walk<'_>, _: &'static str) {
        walk.number("blowdown", "kg/s");
        walk.number("drift", "kg/s");
        walk.number("make_up_flow", "kg/s");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        let evaporation = MassFlow::from_kilograms_per_second(0.0);
        let (blowdown, drift, make_up) = (Argument::read(row)?, Argument::read(row)?, Argument::read(row)?);
        Ok(Self { evaporation, drift, blowdown, make_up, limited_by_drift: false })
    }
}

macro_rules! plain {
    ($($(#[$doc:meta])* $type:ident $unit:literal;)*) => {$(
        $(#[$doc])*
        #[derive(Clone, Copy)]
        pub(super) struct $type(f64);

        impl Argument for $type {
            fn describe(walk: &mut Walk<'_>, name: &'static str) {
                walk.number(name, $unit);
            }

            fn read(row: &mut Row<'_>) -> Outcome<Self> {
                row.number().map(Self)
            }
        }
    )*};
}
plain! {
    /// Of a salt, or a conductivity.
    Concentration "mg/kg";
    /// All the water of a plant.
    Inventory "kg";
    /// A span of time.
    Duration "s";
}

impl Answer for Concentration {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <Self as Argument>::describe(walk, name);
    }

    fn write(&self, out: &mut Out<'_>) {
        self.0.write(out);
    }
}
