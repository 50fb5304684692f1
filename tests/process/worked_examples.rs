//! Worked examples of the literature and values recomputed from the published equations.

use crate::checks::{Row, Table, Tally};
use crate::support::*;
use moistair_core::process::coil::{self, Arrangement, CoilSurface, CoilWater, CondensateTemperature, Coolant};
use moistair_core::process::desiccant::potentials::{self, Effectiveness};
use moistair_core::process::economizer::{self, Economizer, EconomizerState, Rule};
use moistair_core::process::humidify::{self, Absorption, EvaporatingWater, Steam};
use moistair_core::process::measured::{MeasuredAir, Reading};
use moistair_core::process::mixing::outdoor_air;
use moistair_core::process::reheat::CoilLeaving;
use moistair_core::process::room::{self, MoistureSource, RoomGains};
use moistair_core::process::tower::merkel::{self, Quadrature};
use moistair_core::process::tower::poppe::{self, Transfer};
use moistair_core::process::tower::{self, HotWater, TowerWater, WaterTreatment};
use moistair_core::process::{AirStream, mixing, reheat, sensible};
use moistair_core::*;

/// What a row gives, as far as its process needs it.
struct Given<'a>(Row<'a>);

impl Given<'_> {
    fn has(&self, name: &str) -> bool {
        self.0.text("inputs").split(';').any(|part| part.split_once('=').is_some_and(|(key, _)| key == name))
    }

    fn basis(&self) -> Basis {
        Basis::ideal_gas(Pressure::from_pascals(self.0.input("p")))
    }

    /// Air `n` from its dry bulb and whichever second property stands there.
    fn air(&self, n: u8) -> MoistAir {
        let number = |name: &str| self.0.input(&format!("{name}{n}"));
        let t = celsius(number("t"));
        if self.has(&format!("wb{n}")) {
            MoistAir::from_dry_bulb(t, WetBulb::from_celsius(number("wb")), self.basis())
        } else if self.has(&format!("rhl{n}")) {
            MoistAir::from_dry_bulb(t, RelativeHumidityOverLiquid::from_fraction(number("rhl")), self.basis())
        } else if self.has(&format!("w{n}")) {
            MoistAir::from_dry_bulb(t, ratio(number("w")), self.basis())
        } else {
            MoistAir::from_dry_bulb(t, RelativeHumidity::from_fraction(number("rh")), self.basis())
        }
        .unwrap()
    }

    /// Stream `n` from its dry-air flow or its volume flow.
    fn stream(&self, n: u8) -> AirStream {
        if self.has(&format!("v{n}")) {
            let volume = VolumeFlow::from_cubic_meters_per_second(self.0.input(&format!("v{n}")));
            return AirStream::from_volume_flow(self.air(n), volume).unwrap();
        }
        stream(self.air(n), self.0.input(&format!("m{n}")))
    }

    fn steam(&self) -> SpecificEnthalpy {
        SpecificEnthalpy::from_kilojoules_per_kilogram(self.0.input("hs"))
    }

    fn tower(&self) -> TowerWater {
        let input = |name| self.0.input(name);
        TowerWater { flow: flow(input("L")), hot: celsius(input("hot")), cold: celsius(input("cold")) }
    }
}

fn percent(humidity: Result<RelativeHumidity, Error>) -> f64 {
    humidity.unwrap().percent()
}

fn grams(w: HumidityRatio) -> f64 {
    w.grams_per_kilogram()
}

fn enthalpy(air: &MoistAir) -> f64 {
    air.specific_enthalpy().kilojoules_per_kilogram()
}

const TREATMENT: WaterTreatment = WaterTreatment { drift_fraction: 0.0, cycles_of_concentration: 5.0 };

/// What evaporates where the leaving air is saturated at the enthalpy that Merkel's balance gives it.
fn saturated_exit(entering: &AirStream, enthalpy: SpecificEnthalpy) -> f64 {
    let saturated = |t: f64| at(t, 1.0, entering.air().basis());
    let (mut low, mut high) = (0.0, 60.0);
    while high - low > 1e-10 {
        let middle = 0.5 * (low + high);
        if saturated(middle).specific_enthalpy() < enthalpy { low = middle } else { high = middle }
    }
    let gained = saturated(low).humidity_ratio().kilograms_per_kilogram() - numbers(&entering.air()).1;
    gained * entering.dry_air_flow().kilograms_per_second()
}

/// The quantity of a row, by its process.
fn computed(row: Row<'_>) -> f64 {
    let given = Given(row);
    let outputs: Vec<(&str, f64)> = match row.text("process") {
        "state" => {
            let air = given.air(1);
            let kept = air.specific_volume().cubic_meters_per_kilogram();
            vec![
                ("W1", grams(air.humidity_ratio())),
                ("h1", enthalpy(&air)),
                ("excess of standard air", 100.0 * (1.2 * kept - 1.0)),
                ("wet bulb over liquid", air.wet_bulb_over_liquid().map_or(f64::NAN, |wet| wet.celsius())),
                ("wet bulb over ice", air.wet_bulb_over_ice().map_or(f64::NAN, |wet| wet.celsius())),
            ]
        }
        "heater" => {
            let done = sensible::to_temperature(&given.stream(1), celsius(row.input("t2"))).unwrap();
            vec![("Q", done.exchange.heat.kilowatts()), ("rh2", percent(done.leaving.air().relative_humidity()))]
        }
        "coil" => {
            let (entering, leaving) = (given.stream(1), given.air(2));
            let done = coil::to_state(&entering, &leaving, CondensateTemperature::LeavingAir).unwrap();
            vec![
                ("Q", done.cooling_load.kilowatts()),
                ("condensate", done.condensate.kilograms_per_second()),
                ("heat per air", done.exchange.heat.kilowatts() / entering.dry_air_flow().kilograms_per_second()),
            ]
        }
        "coil with water" => {
            let conductance = |name| Conductance::from_kilowatts_per_kelvin(row.input(name));
            let surface = CoilSurface {
                air_side: conductance("UAo"),
                water_side: conductance("UAi"),
                arrangement: Arrangement::Counterflow,
            };
            let water =
                CoilWater { flow: flow(row.input("mw")), entering: celsius(row.input("tw")), coolant: Coolant::Water };
            let done = coil::with_water(&given.stream(1), surface, water, CondensateTemperature::LeavingAir).unwrap();
            vec![("Q", done.air.cooling_load.kilowatts())]
        }
        "reheat" => {
            let (entering, target) = (given.stream(1), given.air(3));
            let off = RelativeHumidity::from_fraction(row.input("off"));
            let done = reheat::to_state(&entering, &target, off, CondensateTemperature::LeavingAir).unwrap();
            vec![("h3-h2", enthalpy(&target) - enthalpy(&done.cooling.leaving.air()))]
        }
        "mixing" => {
            let mixed = mixing::adiabatic(&[given.stream(1).into(), given.stream(2).into()]).unwrap().leaving.air();
            let air = mixed.air();
            vec![
                ("t3", air.dry_bulb().celsius()),
                ("W3", grams(air.humidity_ratio())),
                ("W3 total", grams(mixed.total_water())),
                ("liquid", grams(mixed.liquid())),
                ("rh3", percent(air.relative_humidity())),
                ("wet bulb", air.wet_bulb().unwrap().celsius()),
            ]
        }
        "steam limit" => {
            let entering = given.stream(1);
            match humidify::steam_limit(&entering, given.steam()).unwrap() {
                Absorption::Unlimited => vec![("unlimited", 1.0)],
                limit @ (Absorption::UpTo(most) | Absorption::UpToAndFrom { up_to: most, .. }) => {
                    let done = humidify::steam(&entering, most, given.steam()).unwrap();
                    let again = limit.unsaturated_again().map_or(f64::NAN, |from| from.kilograms_per_second() * 1e3);
                    vec![
                        ("limit", most.kilograms_per_second() * 1e3),
                        ("again", again),
                        ("t2", done.leaving.air().air().dry_bulb().celsius()),
                    ]
                }
            }
        }
        "steam supply" => {
            let pressure = Pressure::from_pascals(row.input("p"));
            let superheated = given.has("t").then(|| Steam::superheated(celsius(row.input("t")), pressure).unwrap());
            let steam = superheated.unwrap_or_else(|| Steam::saturated_at_pressure(pressure).unwrap());
            vec![
                ("h", steam.specific_enthalpy().kilojoules_per_kilogram()),
                ("t", steam.throttled_to(pressure).unwrap().temperature.celsius()),
            ]
        }
        "steam to dew point" => {
            let entering = given.stream(1);
            // The dew point fixes the humidity ratio whatever the temperature.
            let wanted =
                MoistAir::from_dry_bulb(celsius(60.0), DewPoint::from_celsius(row.input("dp2")), given.basis());
            let done =
                humidify::steam_to_humidity_ratio(&entering, wanted.unwrap().humidity_ratio(), given.steam()).unwrap();
            vec![
                ("t2", done.leaving.air().air().dry_bulb().celsius()),
                ("steam per minute", done.evaporated.kilograms_per_second() * 60.0),
            ]
        }
        "heat and steam" => {
            let heated = sensible::to_temperature(&given.stream(1), celsius(row.input("t2"))).unwrap();
            let wanted = at(row.input("t2"), row.input("rh3"), given.basis());
            let done =
                humidify::steam_to_humidity_ratio(&heated.leaving, wanted.humidity_ratio(), given.steam()).unwrap();
            vec![
                ("Q", heated.exchange.heat.kilowatts()),
                ("steam at one temperature", done.evaporated.kilograms_per_second()),
            ]
        }
        "evaporative" => {
            let entering = given.stream(1);
            let air = entering.air();
            let (t, wet_bulb) = (air.dry_bulb().celsius(), air.wet_bulb().unwrap().celsius());
            let effectiveness =
                if given.has("eff") { row.input("eff") } else { (t - row.input("t2")) / (t - wet_bulb) };
            let water = if given.has("wb") {
                EvaporatingWater::AtWetBulb
            } else {
                EvaporatingWater::Given(celsius(row.input("tw")))
            };
            let done = humidify::evaporative(&entering, effectiveness, water).unwrap().leaving.air().air();
            let (_, before, _) = numbers(&air);
            vec![
                ("W2", grams(done.humidity_ratio())),
                ("W2-W1", done.humidity_ratio().kilograms_per_kilogram() - before),
                ("rh2", percent(done.relative_humidity())),
                ("wet bulb", wet_bulb),
            ]
        }
        "altitude" => {
            vec![("p", Pressure::<f64>::at_elevation(Length::from_meters(row.input("z"))).unwrap().pascals())]
        }
        "water use" => {
            let treatment =
                WaterTreatment { drift_fraction: row.input("drift"), cycles_of_concentration: row.input("cycles") };
            let used = tower::water_use(flow(row.input("E")), flow(row.input("L")), treatment).unwrap();
            vec![
                ("drift", used.drift.kilograms_per_second()),
                ("blowdown", used.blowdown.kilograms_per_second()),
                ("make-up", used.make_up.kilograms_per_second()),
            ]
        }
        "tower" => {
            let done = tower::with_air_flow(&given.stream(1), given.tower(), TREATMENT).unwrap();
            vec![("evaporation", done.water.evaporation.kilograms_per_second())]
        }
        "tower between" => {
            let done = tower::with_leaving_air(&given.air(1), &given.air(2), given.tower(), TREATMENT).unwrap();
            vec![("dry air", done.leaving.dry_air_flow().kilograms_per_second())]
        }
        "merkel" => {
            let (entering, water) = (given.stream(1), given.tower());
            let by = |rule| merkel::number(&entering, water, rule).unwrap().number;
            vec![("Me", by(Quadrature::GaussLegendre)), ("Me of four points", by(Quadrature::FourPoint))]
        }
        "poppe" => {
            let entering = given.stream(1);
            let water = HotWater { flow: flow(row.input("L")), temperature: celsius(row.input("hot")) };
            let number = row.input("Me");
            let by = |transfer| poppe::rate(&entering, water, number, transfer).unwrap();
            let (done, merkel) = (by(Transfer::Bosnjakovic), merkel::rate(&entering, water, number).unwrap());
            let cold = |water: TowerWater| water.cold.celsius();
            vec![
                ("cold", cold(done.water)),
                ("evaporation", done.evaporation.kilograms_per_second()),
                ("fogged", f64::from(u8::from(done.is_fogged()))),
                ("cold with Lewis factor one", cold(by(Transfer::LewisFactorOne).water)),
                ("cold by Merkel", cold(merkel.water)),
                ("evaporation by Merkel", saturated_exit(&entering, merkel.leaving_enthalpy)),
            ]
        }
        "economizer" => {
            let air = |t, rh| {
                MeasuredAir::from_relative_humidity(
                    Reading::within(row.input(t), 0.5),
                    Reading::within(row.input(rh), 0.03),
                )
            };
            let (outdoor, returned) = (air("t1", "rh1"), air("t2", "rh2"));
            let settings = Economizer::new(Rule::DifferentialEnthalpy, given.basis());
            let decision = settings.decide(&mut EconomizerState::default(), 0.0, &outdoor, &returned);
            vec![("margin", decision.margin / 1e3), ("uncertainty", decision.margin_uncertainty / 1e3)]
        }
        "enthalpy limit" => {
            let site = Pressure::at_elevation(Length::from_meters(row.input("z"))).unwrap();
            let limit = economizer::enthalpy_limit(Basis::ideal_gas(site)).unwrap();
            // On the handbook's other datum: dry air at 0 °F.
            let dry_air = 1.006 * 32.0 / 1.8;
            vec![("limit", (limit.kilojoules_per_kilogram() + dry_air) / 2.326)]
        }
        "outdoor-air fraction" => {
            let reading = |name| Reading::new(row.input(name), row.input("u"));
            let (outdoor, returned, mixed) = (reading("t1"), reading("t2"), reading("t3"));
            let found = outdoor_air::from_readings(Quantity::DryBulb, outdoor, returned, mixed, 0.05).unwrap();
            vec![("uncertainty of fraction", found.standard_uncertainty.unwrap())]
        }
        "limit" => vec![("T*", tower::coldest_water(&given.air(1)).unwrap().celsius())],
        "treybal" => {
            let (air, water) = (given.air(1), given.tower());
            let least = merkel::pinch(&air, water.hot, water.cold).unwrap().least_air(water.flow);
            let entering = stream(air, 1.5 * least.kilograms_per_second());
            let done = merkel::number(&entering, water, Quadrature::GaussLegendre).unwrap();
            vec![
                ("least air", least.kilograms_per_second()),
                ("air", entering.dry_air_flow().kilograms_per_second()),
                ("h2", done.leaving_enthalpy.kilojoules_per_kilogram()),
                ("transfer units of air", done.number * done.water_to_air),
            ]
        }
        "room" => {
            let gains = RoomGains {
                sensible: HeatFlow::from_kilowatts(row.input("Q")),
                moisture: flow(row.input("mw")),
                source: MoistureSource::Enthalpy(given.steam()),
            };
            let done = room::supply_at_temperature(&given.air(1), &gains, celsius(row.input("ts"))).unwrap().supply;
            vec![
                ("slope", room::process_slope(&gains, given.basis()).unwrap().kilojoules_per_kilogram()),
                ("wet bulb of supply", done.air().wet_bulb().unwrap().celsius()),
                ("dry air", done.dry_air_flow().kilograms_per_second()),
                ("volume of supply", done.volume_flow().cubic_meters_per_second()),
            ]
        }
        "room line" => {
            let air = given.air(1);
            let found = room::apparatus_dew_points(&air, row.input("SHR")).unwrap();
            let number = |met: Option<Temperature>| met.map_or(f64::NAN, |met| met.celsius());
            let saturating = CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(1.0));
            vec![
                ("dew point", number(found.warmer)),
                ("colder dew point", number(found.colder)),
                ("meetings", found.count() as f64),
                ("limiting ratio", room::limiting_line(&air, &air, saturating).unwrap().sensible_heat_ratio),
            ]
        }
        "potentials" => {
            let air = |t, w| {
                let grams = HumidityRatio::from_grams_per_kilogram(row.input(w));
                stream(MoistAir::from_dry_bulb(celsius(row.input(t)), grams, given.basis()).unwrap(), 1.0)
            };
            let effectiveness = Effectiveness { first: row.input("e1"), second: row.input("e2") };
            let done = potentials::wheel(&air("t1", "W1"), &air("t8", "W8"), effectiveness).unwrap().process.air();
            vec![("t2", done.dry_bulb().celsius()), ("W2", grams(done.humidity_ratio()))]
        }
        other => panic!("no process {other}"),
    };
    let wanted = row.text("quantity");
    outputs.iter().find(|(name, _)| *name == wanted).unwrap_or_else(|| panic!("no {wanted} in {row:?}: {outputs:?}")).1
}

#[test]
fn worked_examples() {
    let table = Table::read(include_str!("worked_examples.csv"));
    let mut tally = Tally::new("worked examples");
    for row in table.rows() {
        tally.within(row.text("process"), row.text("id"), computed(row), row.value(), row.number("tolerance"));
    }
    tally.finish(128);
}

/// Examples 1 to 6 of the handbook chapter as its text solves them, on both formulations: within half a unit of
/// the print, or 1 %, what its chart can be read to. Example 1 is all chart reading, hence a whole unit.
#[test]
fn handbook_examples() {
    let table = Table::read(include_str!("../published/handbook_examples.csv"));
    let mut tally = Tally::new("handbook examples");
    for &formulation in Formulation::ALL {
        let site = sea_level(formulation);
        let by_wet_bulb =
            |t: f64, wet: f64| MoistAir::from_dry_bulb(celsius(t), WetBulb::from_celsius(wet), site).unwrap();
        let by_volume = |air: MoistAir, volume: f64| {
            AirStream::from_volume_flow(air, VolumeFlow::from_cubic_meters_per_second(volume)).unwrap()
        };
        let volume = |air: &MoistAir| air.specific_volume().cubic_meters_per_kilogram();

        let first = by_wet_bulb(40.0, 20.0);
        let heated = by_volume(at(2.0, 1.0, site), 10.0);
        let heater = sensible::to_temperature(&heated, celsius(40.0)).unwrap();
        let cooled = by_volume(at(30.0, 0.5, site), 5.0);
        let cold = at(10.0, 1.0, site);
        let coil = coil::to_state(&cooled, &cold, CondensateTemperature::LeavingAir).unwrap();
        let (outdoor, room) = (by_volume(by_wet_bulb(4.0, 2.0), 2.0), by_volume(at(25.0, 0.5, site), 6.25));
        let mixed = mixing::adiabatic(&[outdoor.into(), room.into()]).unwrap().leaving;
        let (m1, m2) = (outdoor.dry_air_flow().kilograms_per_second(), room.dry_air_flow().kilograms_per_second());
        let steam = humidify::saturated_steam_enthalpy(celsius(110.0)).unwrap();
        let dry = stream(by_wet_bulb(20.0, 8.0), 2.0);
        let wanted = MoistAir::from_dry_bulb(celsius(40.0), DewPoint::from_celsius(13.0), site).unwrap();
        let moist = humidify::steam_to_humidity_ratio(&dry, wanted.humidity_ratio(), steam).unwrap();
        let person = humidify::saturated_steam_enthalpy(celsius(30.0)).unwrap();
        let space = by_wet_bulb(25.0, 19.0);
        let gains = RoomGains {
            sensible: HeatFlow::from_kilowatts(9.0),
            moisture: flow(0.0015),
            source: MoistureSource::SaturatedVapor(celsius(30.0)),
        };
        let supply = room::supply_at_temperature(&space, &gains, celsius(15.0)).unwrap().supply;
        let values = [
            ("ASH-E1-W", grams(first.humidity_ratio())),
            ("ASH-E1-h", enthalpy(&first)),
            ("ASH-E1-td", first.dew_point().unwrap().celsius()),
            ("ASH-E1-rh", percent(first.relative_humidity())),
            ("ASH-E1-v", volume(&first)),
            ("ASH-E2-h1", enthalpy(&heated.air())),
            ("ASH-E2-W1", grams(heated.air().humidity_ratio())),
            ("ASH-E2-v1", volume(&heated.air())),
            ("ASH-E2-h2", enthalpy(&heater.leaving.air())),
            ("ASH-E2-mdot_da", heated.dry_air_flow().kilograms_per_second()),
            ("ASH-E2-q12", heater.exchange.heat.kilowatts()),
            ("ASH-E3-h1", enthalpy(&cooled.air())),
            ("ASH-E3-W1", grams(cooled.air().humidity_ratio())),
            ("ASH-E3-v1", volume(&cooled.air())),
            ("ASH-E3-h2", enthalpy(&cold)),
            ("ASH-E3-W2", grams(cold.humidity_ratio())),
            ("ASH-E3-h_w2", liquid_water_enthalpy(celsius(10.0), site).unwrap().kilojoules_per_kilogram()),
            ("ASH-E3-mdot_da", cooled.dry_air_flow().kilograms_per_second()),
            ("ASH-E3-q12", coil.cooling_load.kilowatts()),
            ("ASH-E4-v1", volume(&outdoor.air())),
            ("ASH-E4-v2", volume(&room.air())),
            ("ASH-E4-mdot_da1", m1),
            ("ASH-E4-mdot_da2", m2),
            ("ASH-E4-mdot ratio da2/da3", m2 / (m1 + m2)),
            ("ASH-E4-t3", mixed.air().air().dry_bulb().celsius()),
            ("ASH-E4-t_wb3", mixed.air().air().wet_bulb().unwrap().celsius()),
            ("ASH-E5-h_g(110C)", steam.kilojoules_per_kilogram()),
            ("ASH-E5-t2", moist.leaving.air().air().dry_bulb().celsius()),
            ("ASH-E5-W1", numbers(&dry.air()).1),
            ("ASH-E5-W2", numbers(&moist.leaving.air().air()).1),
            ("ASH-E5-mdot_w", moist.evaporated.kilograms_per_second() * 1e3),
            ("ASH-E6-h_g(30C)", person.kilojoules_per_kilogram()),
            ("ASH-E6-dh/dW", room::process_slope(&gains, site).unwrap().kilojoules_per_kilogram()),
            ("ASH-E6-SHR", room::sensible_heat_ratio(&space, &gains).unwrap()),
            ("ASH-E6-t_wb1", supply.air().wet_bulb().unwrap().celsius()),
            ("ASH-E6-h2", enthalpy(&space)),
            ("ASH-E6-h1", enthalpy(&supply.air())),
            ("ASH-E6-mdot_da", supply.dry_air_flow().kilograms_per_second()),
            ("ASH-E6-v1", volume(&supply.air())),
            ("ASH-E6-Vdot supply", supply.volume_flow().cubic_meters_per_second()),
        ];
        for (id, value) in values {
            let row = table.rows().find(|row| row.text("id") == id).unwrap();
            let reading = if id.starts_with("ASH-E1") { 2.0 } else { 1.0 };
            tally.row_within(row, value, (reading * row.half_unit()).max(0.01 * row.value()));
        }
    }
    tally.finish(80);
}
