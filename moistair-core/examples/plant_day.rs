//! A day of an air handler and its cooling tower from a log of one-minute readings: states, loads, water, what coil and
//! tower should have done, and how far all of it can be trusted. `cargo run --release --example plant_day [LOG.csv]`
//!
//! The program reads, calls the library, and prints. `moistair-ffi/examples/plant_day.c` and
//! `moistair-py/examples/plant_day.py` print the same bytes. `make_plant_day_log.rs` made the log and tells its story.
#![allow(clippy::indexing_slicing, reason = "every place is a constant below the length of its array")]
use core::error::Error;
use std::fs::File;
use std::io::{BufRead, BufReader};

use moistair_core::account::{Added, BooksTotal, Counts, Deviation, Periods, Rule, Total};
use moistair_core::process::books::balance;
use moistair_core::process::coil::{
    self, Arrangement, CoilFlows, CoilSurface, CoilWater, CondensateTemperature, Coolant, Cooling, FlowExponents,
    Measured,
};
use moistair_core::process::economizer::{Economizer, EconomizerState, Rule as EconomizerRule, Supply};
use moistair_core::process::measured::{MeasuredAir, Reading};
use moistair_core::process::mixing::outdoor_air::{self, FractionStatus, OtherFlow, OutdoorAirFraction};
use moistair_core::process::room::{self, MoistureSource, RoomGains};
use moistair_core::process::tower::fill::FillLaw;
use moistair_core::process::tower::merkel::{self, Quadrature};
use moistair_core::process::tower::{self, HotWater, TowerWater, WaterTreatment};
use moistair_core::process::{AirStream, Exchange, WetStream, humidify, mixing, sensible};
use moistair_core::signal::{Channel, ChannelState, Checked, Quality, Reason, Unit};
use moistair_core::*;

// ---- What is known of the plant ----

const LOG: &str = concat!(env!("CARGO_MANIFEST_DIR"), "/examples/plant_day.csv");
/// Times in s.
const INTERVAL: f64 = 60.0;
const LONGEST_STEP: f64 = 90.0;
const HOLD: f64 = 300.0;
const HOUR: f64 = 3_600.0;
const DAY: f64 = 86_400.0;
/// Humidity ratios before and behind the coil that differ by less make no condensate, kg/kg.
const DEAD_BAND: f64 = 0.0003;
/// Steam comes saturated at about atmospheric pressure, °C.
const STEAM_TEMPERATURE: f64 = 100.0;
const TREATMENT: WaterTreatment = WaterTreatment { drift_fraction: 0.0001, cycles_of_concentration: 4.0 };

/// At this elevation, Pa.
const PRESSURE: f64 = 98_500.0;
/// The coil on the day when it was handed over: what entered it, and how cold the air left.
mod commissioning {
    pub const AIR: f64 = 27.0;
    pub const HUMIDITY: f64 = 0.5;
    /// kg/s.
    pub const DRY_AIR: f64 = 5.8;
    pub const CHILLED_WATER: f64 = 6.0;
    pub const CHILLED_SUPPLY: f64 = 7.0;
    pub const LEAVING_AIR: f64 = 11.1;
}
/// Conductance of the water side of the coil over that of its air side, from its data sheet.
const CONDUCTANCE_RATIO: f64 = 2.2;
const FLOW_EXPONENTS: FlowExponents = FlowExponents { air_side: 0.6, water_side: 0.8 };
/// The fill of the tower as its maker tested it, evaluated by Merkel's method: Merkel number at L/G = 1, and exponent.
const FILL: (f64, f64) = (1.12, 0.6);
/// Standard uncertainties of thermometers, K, hygrometers, and flows of dry air, kg/s.
const THERMOMETER: f64 = 0.2;
const HYGROMETER: f64 = 0.01;
const AIR_FLOW: f64 = 0.05;
/// That of a share of outdoor air up to which it says something.
const ACCEPTABLE: f64 = 0.05;
/// What the coil is to make of any air, °C and relative humidity.
const OFF_COIL: (f64, f64) = (10.0, 0.97);
/// The moisture of the rooms comes from people, as vapor of this temperature, °C.
const PEOPLE: f64 = 32.0;

/// Names for the places of an array.
macro_rules! places {
    ($(#[$doc:meta])* $module:ident: $($name:ident)*) => {
        $(#[$doc])*
        mod $module {
            #[allow(non_camel_case_types, clippy::upper_case_acronyms, reason = "it only counts")]
            enum Place { $($name,)* COUNT }
            $(pub const $name: usize = Place::$name as usize;)*
            pub const COUNT: usize = Place::COUNT as usize;
        }
    };
}

places! {
    /// The columns of the log after the time.
    channel:
    PRESSURE OUTDOOR OUTDOOR_RH MIXED MIXED_RH COIL COIL_RH HEATER SUPPLY SUPPLY_RH RETURN RETURN_RH
    SUPPLY_FLOW OUTDOOR_FLOW VALVE STEAM TOWER_WATER TOWER_HOT TOWER_COLD TOWER_AIR
    CHILLED_WATER CHILLED_SUPPLY CHILLED_RETURN
}

places! {
    /// What is added up over the hours and the day.
    rate:
    PRESSURE
    OUTDOOR OUTDOOR_RH OUTDOOR_RATIO OUTDOOR_ENTHALPY
    SUPPLY SUPPLY_RH SUPPLY_RATIO SUPPLY_ENTHALPY
    RETURN RETURN_RH RETURN_RATIO RETURN_ENTHALPY
    MIXED MIXED_RATIO COIL COIL_RATIO SUPPLY_AIR OUTDOOR_AIR VALVE
    SENSIBLE LATENT COOLING CONDENSATE HEATING REHEAT STEAM
    TOWER_WATER REJECTED RANGE APPROACH EVAPORATION DRIFT BLOWDOWN MAKE_UP
    CHILLED_WATER CHILLED_SUPPLY CHILLED_RETURN LOAD_BY_WATER AIR_LESS_WATER
    PREDICTED_LOAD PREDICTED_COIL PREDICTED_COIL_RATIO
    SHARE_BY_FLOWS SHARE_BY_TEMPERATURES OUTDOOR_CHEAPER ROOM_SENSIBLE ROOM_MOISTURE
    WATER_TO_AIR MERKEL_NUMBER MERKEL_NUMBER_BY_LAW COLD_WATER PREDICTED_COLD_WATER
}

places! {
    /// The processes whose books are kept.
    process:
    MIXING COIL HEATER HUMIDIFIER TOWER PREDICTED_COIL PREDICTED_TOWER
}

places! {
    /// Where a measured value stands beside a computed one.
    check:
    MIXED MIXED_RATIO SUPPLY SUPPLY_RATIO COIL COIL_RATIO COIL_LOAD MERKEL_NUMBER COLD_WATER
}

const PROCESSES: [&str; process::COUNT] =
    ["mixing", "cooling coil", "fan and heater", "humidifier", "cooling tower", "coil, predicted", "tower, predicted"];

/// Name and unit; a difference in °C is one in K.
const CHECKS: [(&str, &str, Unit); check::COUNT] = [
    ("mixed air, dry bulb", "K", Unit::Celsius),
    ("mixed air, humidity ratio", "g/kg", Unit::GramPerKilogram),
    ("supply air, dry bulb", "K", Unit::Celsius),
    ("supply air, humidity ratio", "g/kg", Unit::GramPerKilogram),
    ("off coil, dry bulb", "K", Unit::Celsius),
    ("off coil, humidity ratio", "g/kg", Unit::GramPerKilogram),
    ("coil load", "kW", Unit::Kilowatt),
    ("tower, Merkel number", "1", Unit::Fraction),
    ("tower, cold water", "K", Unit::Celsius),
];

/// Name and limits of each column, the limits in the unit of the library.
fn channels() -> [(&'static str, Channel); channel::COUNT] {
    let temperature = |min, max| Channel::temperature(min, max).with_interval(INTERVAL).with_hold(HOLD);
    let humidity = Channel::relative_humidity_percent().with_interval(INTERVAL).with_hold(HOLD);
    // Below the last digit of the log, so that any change counts; a living humidity moves within half an hour.
    let humidity = humidity.with_stuck(0.0004, 30);
    let pressure = Channel::pressure(93_000.0, 104_000.0).with_unit(Unit::Hectopascal).with_interval(INTERVAL);
    let air_flow = |max| Channel::volume_flow(0.0, max).with_unit(Unit::CubicMeterPerHour).with_interval(INTERVAL);
    let steam = Channel::mass_flow(0.0, 0.03).with_unit(Unit::KilogramPerHour).with_interval(INTERVAL);
    [
        ("barometer", pressure.with_hold(HOUR)),
        ("outdoor air", temperature(-25.0, 45.0)),
        ("outdoor air", humidity),
        ("mixed air", temperature(0.0, 45.0)),
        ("mixed air", humidity),
        ("air off the coil", temperature(0.0, 45.0)),
        ("air off the coil", humidity),
        ("air off the heater", temperature(0.0, 60.0)),
        ("supply air", temperature(0.0, 60.0)),
        ("supply air", humidity),
        ("return air", temperature(0.0, 45.0)),
        ("return air", humidity),
        ("supply air", air_flow(8.0)),
        ("outdoor air", air_flow(4.0)),
        ("coil valve", Channel::command_percent().with_interval(INTERVAL).with_slip_samples(0)),
        ("steam", steam),
        ("tower water", Channel::mass_flow(0.0, 12.0).with_interval(INTERVAL)),
        ("tower water, hot", temperature(0.0, 60.0)),
        ("tower water, cold", temperature(0.0, 60.0)),
        ("tower air", air_flow(12.0)),
        ("chilled water", Channel::mass_flow(0.0, 12.0).with_interval(INTERVAL)),
        ("chilled water supply", temperature(0.0, 40.0)),
        ("chilled water return", temperature(0.0, 40.0)),
    ]
}

/// The channels that a result rests on: it can be trusted as far as the worst of them.
mod basis {
    use super::channel::*;
    pub const OUTDOOR_STATE: &[usize] = &[PRESSURE, OUTDOOR, OUTDOOR_RH];
    pub const SUPPLY_STATE: &[usize] = &[PRESSURE, SUPPLY, SUPPLY_RH];
    pub const RETURN_STATE: &[usize] = &[PRESSURE, RETURN, RETURN_RH];
    pub const MIXED_STATE: &[usize] = &[PRESSURE, MIXED, MIXED_RH];
    pub const COIL_STATE: &[usize] = &[PRESSURE, COIL, COIL_RH];
    pub const OUTDOOR_STREAM: &[usize] = &[PRESSURE, OUTDOOR, OUTDOOR_RH, OUTDOOR_FLOW];
    pub const SUPPLY_STREAM: &[usize] = &[PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW];
    pub const COOLING: &[usize] = &[PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, MIXED, MIXED_RH, COIL, COIL_RH];
    pub const HEATING: &[usize] = &[PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, MIXED, MIXED_RH, COIL, COIL_RH, HEATER];
    pub const REHEAT: &[usize] =
        &[PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, MIXED, MIXED_RH, COIL, COIL_RH, HEATER, VALVE];
    pub const TOWER: &[usize] = &[PRESSURE, OUTDOOR, OUTDOOR_RH, TOWER_WATER, TOWER_HOT, TOWER_COLD, TOWER_AIR];
    pub const AIR_FLOWS: &[usize] = &[PRESSURE, OUTDOOR, OUTDOOR_RH, OUTDOOR_FLOW, SUPPLY, SUPPLY_RH, SUPPLY_FLOW];
    pub const DRY_BULBS: &[usize] = &[OUTDOOR, RETURN, MIXED];
    pub const ECONOMIZER: &[usize] = &[OUTDOOR, OUTDOOR_RH, RETURN, RETURN_RH, CHILLED_WATER];
    pub const ROOMS: &[usize] = &[PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, RETURN, RETURN_RH];
    pub const TOWER_INLETS: &[usize] = &[PRESSURE, OUTDOOR, OUTDOOR_RH, TOWER_WATER, TOWER_HOT, TOWER_AIR];
    pub const COIL_INLETS: &[usize] =
        &[PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, MIXED, MIXED_RH, CHILLED_WATER, CHILLED_SUPPLY];
    pub const COIL_SIDES: &[usize] = &[
        PRESSURE,
        SUPPLY,
        SUPPLY_RH,
        SUPPLY_FLOW,
        MIXED,
        MIXED_RH,
        COIL,
        COIL_RH,
        CHILLED_WATER,
        CHILLED_SUPPLY,
        CHILLED_RETURN,
    ];
}

// ---- The equipment ----

/// What coil and tower should be able to do.
struct Plant {
    surface: CoilSurface,
    found_at: CoilFlows,
    fill: FillLaw,
    economizer: Economizer,
}

impl Plant {
    fn described() -> Result<Self, moistair_core::Error> {
        use commissioning::*;
        let air = MoistAir::from_dry_bulb(
            Temperature::from_celsius(AIR),
            RelativeHumidity::from_fraction(HUMIDITY),
            Pressure::from_pascals(PRESSURE),
        )?;
        let flow = MassFlow::from_kilograms_per_second;
        let found_at = CoilFlows { air: flow(DRY_AIR), water: flow(CHILLED_WATER) };
        let water = chilled_water(found_at.water, Temperature::from_celsius(CHILLED_SUPPLY));
        let measured = Measured::LeavingAir(Temperature::from_celsius(LEAVING_AIR));
        let entering = AirStream::new(air, found_at.air)?;
        let surface =
            coil::surface_from_rating(&entering, water, measured, CONDUCTANCE_RATIO, Arrangement::Counterflow)?;
        let supply = Supply {
            dry_bulb: Temperature::from_celsius(OFF_COIL.0),
            coil_leaving: RelativeHumidity::from_fraction(OFF_COIL.1),
        };
        let economizer = Economizer::new(EconomizerRule::LeastCoilEnergy, Pressure::from_pascals(PRESSURE));
        let economizer = Economizer { supply, ..economizer };
        Ok(Self { surface, found_at, fill: FillLaw::new(FILL.0, FILL.1)?, economizer })
    }
}

fn chilled_water(flow: MassFlow, entering: Temperature) -> CoilWater {
    CoilWater { flow, entering, coolant: Coolant::Water }
}

// ---- One row of the log ----

/// How well the books close, and how far measured and computed states lie apart.
#[derive(Clone, Copy, Default)]
struct Checks {
    books: [BooksTotal; process::COUNT],
    deviations: [Deviation; check::COUNT],
}

impl Checks {
    fn merge(&mut self, other: &Self) {
        for (books, other) in self.books.iter_mut().zip(&other.books) {
            books.merge(other);
        }
        for (deviation, other) in self.deviations.iter_mut().zip(&other.deviations) {
            deviation.merge(other);
        }
    }

    /// Adds the books of a process.
    fn record(&mut self, process: usize, entering: &[WetStream], leaving: WetStream, exchange: Exchange) {
        self.books[process].record(&balance(entering, &leaving, &exchange));
    }

    /// Counts a process without a result.
    fn missing(&mut self, process: usize) {
        self.books[process].add(f64::NAN, 0.0, f64::NAN, 0.0);
    }

    /// Adds a measured state beside a computed one.
    fn compare(&mut self, [celsius, ratio]: [usize; 2], measured: Option<MoistAir>, computed: &MoistAir) {
        if let Some(measured) = measured {
            self.deviations[celsius].add(measured.dry_bulb().celsius(), computed.dry_bulb().celsius());
            self.deviations[ratio].add(ratio_of(&measured), ratio_of(computed));
        }
    }
}

fn people() -> MoistureSource {
    MoistureSource::SaturatedVapor(Temperature::from_celsius(PEOPLE))
}

fn ratio_of(air: &MoistAir) -> f64 {
    air.humidity_ratio().kilograms_per_kilogram()
}

/// A value and how far it can be trusted; NaN where there is none.
#[derive(Clone, Copy)]
struct Rate {
    value: f64,
    quality: Quality,
}

/// The plant at one moment: checked readings, and the rates that come of them.
struct Moment {
    readings: [Checked; channel::COUNT],
    rates: [Rate; rate::COUNT],
    checks: Checks,
}

impl Moment {
    fn new(readings: [Checked; channel::COUNT]) -> Self {
        let nothing = Rate { value: f64::NAN, quality: Quality::Refused };
        Self { readings, rates: [nothing; rate::COUNT], checks: Checks::default() }
    }

    fn value(&self, channel: usize) -> Option<f64> {
        self.readings[channel].value()
    }

    fn set(&mut self, rate: usize, value: f64, channels: &[usize]) {
        let quality = channels.iter().fold(Quality::Good, |worst, i| worst.worst(self.readings[*i].quality()));
        self.rates[rate] = Rate { value, quality };
    }

    fn state(&self, celsius: usize, humidity: usize) -> Option<MoistAir> {
        MoistAir::from_dry_bulb(
            Temperature::from_celsius(self.value(celsius)?),
            RelativeHumidityOverLiquid::from_fraction(self.value(humidity)?),
            Pressure::from_pascals(self.value(channel::PRESSURE)?),
        )
        .ok()
    }

    /// The stream of air whose volume flow is measured.
    fn stream(&self, air: Option<MoistAir>, flow: usize) -> Option<AirStream> {
        AirStream::from_volume_flow(air?, VolumeFlow::from_cubic_meters_per_second(self.value(flow)?)).ok()
    }

    fn evaluate(&mut self, plant: &Plant, time: f64, economizer: &mut EconomizerState) {
        self.copy_readings();
        let outdoor = self.state(channel::OUTDOOR, channel::OUTDOOR_RH);
        let supply = self.state(channel::SUPPLY, channel::SUPPLY_RH);
        let room = self.state(channel::RETURN, channel::RETURN_RH);
        let mixed = self.state(channel::MIXED, channel::MIXED_RH);
        let off_coil = self.state(channel::COIL, channel::COIL_RH);
        for (air, ratio, enthalpy, channels) in [
            (&outdoor, rate::OUTDOOR_RATIO, Some(rate::OUTDOOR_ENTHALPY), basis::OUTDOOR_STATE),
            (&supply, rate::SUPPLY_RATIO, Some(rate::SUPPLY_ENTHALPY), basis::SUPPLY_STATE),
            (&room, rate::RETURN_RATIO, Some(rate::RETURN_ENTHALPY), basis::RETURN_STATE),
            (&mixed, rate::MIXED_RATIO, None, basis::MIXED_STATE),
            (&off_coil, rate::COIL_RATIO, None, basis::COIL_STATE),
        ] {
            let Some(air) = air else { continue };
            self.set(ratio, ratio_of(air), channels);
            if let Some(enthalpy) = enthalpy {
                self.set(enthalpy, air.specific_enthalpy().joules_per_kilogram(), channels);
            }
        }
        let outdoor_air = self.stream(outdoor, channel::OUTDOOR_FLOW);
        let supply_air = self.stream(supply, channel::SUPPLY_FLOW);
        for (stream, rate, channels) in [
            (&outdoor_air, rate::OUTDOOR_AIR, basis::OUTDOOR_STREAM),
            (&supply_air, rate::SUPPLY_AIR, basis::SUPPLY_STREAM),
        ] {
            if let Some(stream) = stream {
                self.set(rate, stream.dry_air_flow().kilograms_per_second(), channels);
            }
        }
        let flow = supply_air.map(|stream| stream.dry_air_flow());
        self.compare_outdoor_air(outdoor_air, supply_air);
        self.decide(plant, time, economizer);
        self.gain(supply_air, room);
        self.mix(outdoor_air, room, flow, mixed).unwrap_or_else(|| self.checks.missing(process::MIXING));
        let cooled = self.cool(mixed, flow, off_coil);
        let on_coil = mixed.zip(flow).and_then(|(air, flow)| AirStream::new(air, flow).ok());
        self.meter_the_water(on_coil);
        self.predict_coil(plant, on_coil, off_coil).unwrap_or_else(|| self.checks.missing(process::PREDICTED_COIL));
        let heated = self.heat(cooled);
        self.humidify(heated, supply).unwrap_or_else(|| self.checks.missing(process::HUMIDIFIER));
        self.reject(outdoor).unwrap_or_else(|| self.checks.missing(process::TOWER));
        self.predict_tower(plant, outdoor).unwrap_or_else(|| self.checks.missing(process::PREDICTED_TOWER));
    }

    fn copy_readings(&mut self) {
        for (rate, channel) in [
            (rate::PRESSURE, channel::PRESSURE),
            (rate::OUTDOOR, channel::OUTDOOR),
            (rate::OUTDOOR_RH, channel::OUTDOOR_RH),
            (rate::SUPPLY, channel::SUPPLY),
            (rate::SUPPLY_RH, channel::SUPPLY_RH),
            (rate::RETURN, channel::RETURN),
            (rate::RETURN_RH, channel::RETURN_RH),
            (rate::MIXED, channel::MIXED),
            (rate::COIL, channel::COIL),
            (rate::VALVE, channel::VALVE),
            (rate::STEAM, channel::STEAM),
            (rate::TOWER_WATER, channel::TOWER_WATER),
            (rate::CHILLED_WATER, channel::CHILLED_WATER),
        ] {
            self.set(rate, self.readings[channel].value_or(f64::NAN), &[channel]);
        }
    }

    /// Outdoor and recirculated air as the flows say, beside the state measured behind the mixing box.
    fn mix(
        &mut self,
        outdoor: Option<AirStream>,
        room: Option<MoistAir>,
        flow: Option<MassFlow>,
        measured: Option<MoistAir>,
    ) -> Option<()> {
        let recirculated = mixing::remainder(flow?, &outdoor?, room?).ok()?;
        let entering = [outdoor?.into(), recirculated.into()];
        let mixing = mixing::adiabatic(&entering).ok()?;
        self.checks.record(process::MIXING, &entering, mixing.leaving, mixing.exchange);
        self.checks.compare([check::MIXED, check::MIXED_RATIO], measured, &mixing.leaving.air().air());
        Some(())
    }

    /// The share of outdoor air in the supply air, by flows and by temperatures, where they are sure enough.
    fn compare_outdoor_air(&mut self, outdoor: Option<AirStream>, supply: Option<AirStream>) {
        let flow = |stream: AirStream| Reading::new(stream.dry_air_flow().kilograms_per_second(), AIR_FLOW);
        let by_flows = outdoor.zip(supply).and_then(|(outdoor, supply)| {
            outdoor_air::from_flows(flow(outdoor), OtherFlow::Total(flow(supply)), ACCEPTABLE).ok()
        });
        let reading = |channel: usize| Reading::from_checked(&self.readings[channel], THERMOMETER);
        let [outdoor, returned, mixed] = [channel::OUTDOOR, channel::RETURN, channel::MIXED].map(reading);
        let by_temperatures = outdoor_air::from_readings(Quantity::DryBulb, outdoor, returned, mixed, ACCEPTABLE).ok();
        let share = |found: Option<OutdoorAirFraction>| {
            found.filter(|found| found.status == FractionStatus::Determined).and_then(|found| found.fraction)
        };
        self.set(rate::SHARE_BY_FLOWS, share(by_flows).unwrap_or(f64::NAN), basis::AIR_FLOWS);
        self.set(rate::SHARE_BY_TEMPERATURES, share(by_temperatures).unwrap_or(f64::NAN), basis::DRY_BULBS);
    }

    /// Whether the coil, while it works, would have had less to do with outdoor air than with return air: 1 or 0.
    fn decide(&mut self, plant: &Plant, time: f64, economizer: &mut EconomizerState) {
        let air = |dry_bulb: usize, humidity: usize| {
            MeasuredAir::from_relative_humidity(
                Reading::from_checked(&self.readings[dry_bulb], THERMOMETER),
                Reading::from_checked(&self.readings[humidity], HYGROMETER),
            )
        };
        let outdoor = air(channel::OUTDOOR, channel::OUTDOOR_RH);
        let returned = air(channel::RETURN, channel::RETURN_RH);
        let decision = plant.economizer.decide(economizer, time, &outdoor, &returned);
        let Some(flow) = self.value(channel::CHILLED_WATER) else { return };
        if decision.quality != Quality::Refused {
            let cheaper = decision.enabled && flow > 0.0;
            self.set(rate::OUTDOOR_CHEAPER, if cheaper { 1.0 } else { 0.0 }, basis::ECONOMIZER);
        }
    }

    /// What the rooms, and all that stores heat and water in them, give to the air.
    fn gain(&mut self, supply: Option<AirStream>, room: Option<MoistAir>) -> Option<()> {
        let gains = room::gains_between(&supply?, &room?, people()).ok()?;
        self.set(rate::ROOM_SENSIBLE, gains.sensible.watts(), basis::ROOMS);
        self.set(rate::ROOM_MOISTURE, gains.moisture.kilograms_per_second(), basis::ROOMS);
        Some(())
    }

    /// The cooling coil between the two measured states.
    fn cool(
        &mut self,
        mixed: Option<MoistAir>,
        flow: Option<MassFlow>,
        off_coil: Option<MoistAir>,
    ) -> Option<AirStream> {
        let cooling = || -> Option<Cooling> {
            let entering = AirStream::new(mixed?, flow?).ok()?;
            let dead_band = HumidityRatio::from_kilograms_per_kilogram(DEAD_BAND);
            coil::between(&entering, &off_coil?, CondensateTemperature::LeavingAir, dead_band).ok()
        };
        let Some(coil) = cooling() else {
            self.checks.missing(process::COIL);
            return None;
        };
        self.checks.record(process::COIL, &[coil.entering.into()], coil.leaving.into(), coil.exchange);
        self.set(rate::SENSIBLE, coil.sensible.watts(), basis::COOLING);
        self.set(rate::LATENT, coil.latent.watts(), basis::COOLING);
        self.set(rate::COOLING, coil.cooling_load.watts(), basis::COOLING);
        self.set(rate::CONDENSATE, coil.condensate.kilograms_per_second(), basis::COOLING);
        Some(coil.leaving)
    }

    /// Fan and heater, up to the temperature measured behind them. Heat counts as reheat while the valve is open.
    fn heat(&mut self, entering: Option<AirStream>) -> Option<AirStream> {
        let heating = || {
            let leaving = Temperature::from_celsius(self.value(channel::HEATER)?);
            Some((entering?, sensible::to_temperature(&entering?, leaving).ok()?))
        };
        let Some((entering, heating)) = heating() else {
            self.checks.missing(process::HEATER);
            return None;
        };
        self.checks.record(process::HEATER, &[entering.into()], heating.leaving.into(), heating.exchange);
        let heat = heating.exchange.heat.watts();
        self.set(rate::HEATING, heat, basis::HEATING);
        if let Some(valve) = self.value(channel::VALVE) {
            self.set(rate::REHEAT, if valve > 0.0 { heat } else { 0.0 }, basis::REHEAT);
        }
        Some(heating.leaving)
    }

    /// The metered steam, beside the state measured in the supply air.
    fn humidify(&mut self, entering: Option<AirStream>, measured: Option<MoistAir>) -> Option<()> {
        let steam = MassFlow::from_kilograms_per_second(self.value(channel::STEAM)?);
        let enthalpy = humidify::saturated_steam_enthalpy(Temperature::from_celsius(STEAM_TEMPERATURE)).ok()?;
        let humidified = humidify::steam(&entering?, steam, enthalpy).ok()?;
        self.checks.record(process::HUMIDIFIER, &[entering?.into()], humidified.leaving, humidified.exchange);
        self.checks.compare([check::SUPPLY, check::SUPPLY_RATIO], measured, &humidified.leaving.air().air());
        Some(())
    }

    /// The cooling tower on outdoor air.
    fn reject(&mut self, outdoor: Option<MoistAir>) -> Option<()> {
        let entering = self.stream(outdoor, channel::TOWER_AIR)?;
        let flow = self.value(channel::TOWER_WATER)?;
        let water = TowerWater {
            flow: MassFlow::from_kilograms_per_second(flow),
            hot: Temperature::from_celsius(self.value(channel::TOWER_HOT)?),
            cold: Temperature::from_celsius(self.value(channel::TOWER_COLD)?),
        };
        let tower = tower::with_air_flow(&entering, water, TREATMENT).ok()?;
        self.checks.record(process::TOWER, &[entering.into()], tower.leaving_stream(), tower.exchange);
        self.set(rate::REJECTED, tower.heat_rejected.watts(), basis::TOWER);
        self.set(rate::EVAPORATION, tower.water.evaporation.kilograms_per_second(), basis::TOWER);
        self.set(rate::DRIFT, tower.water.drift.kilograms_per_second(), basis::TOWER);
        self.set(rate::BLOWDOWN, tower.water.blowdown.kilograms_per_second(), basis::TOWER);
        self.set(rate::MAKE_UP, tower.water.make_up.kilograms_per_second(), basis::TOWER);
        if flow > 0.0 {
            self.set(rate::RANGE, tower.range.kelvins(), basis::TOWER);
            self.set(rate::APPROACH, tower.approach.kelvins(), basis::TOWER);
        }
        Some(())
    }

    /// The load of the coil by its water, beside that by its air.
    fn meter_the_water(&mut self, entering: Option<AirStream>) -> Option<()> {
        let by_air = HeatFlow::from_watts(self.rates[rate::COOLING].value);
        let flow = self.value(channel::CHILLED_WATER)?;
        let supply = self.value(channel::CHILLED_SUPPLY)?;
        let back = self.value(channel::CHILLED_RETURN)?;
        if flow > 0.0 {
            self.set(rate::CHILLED_SUPPLY, supply, &[channel::CHILLED_SUPPLY]);
            self.set(rate::CHILLED_RETURN, back, &[channel::CHILLED_RETURN]);
        }
        let water = chilled_water(MassFlow::from_kilograms_per_second(flow), Temperature::from_celsius(supply));
        let found = coil::load_by_water(&entering?, by_air, water, Temperature::from_celsius(back)).ok()?;
        self.set(rate::LOAD_BY_WATER, found.load.watts(), basis::COIL_SIDES);
        self.set(rate::AIR_LESS_WATER, found.air_less_water.watts(), basis::COIL_SIDES);
        Some(())
    }

    /// What the coil should do with the air and the water that enter it, beside what it does.
    fn predict_coil(&mut self, plant: &Plant, entering: Option<AirStream>, measured: Option<MoistAir>) -> Option<()> {
        let flow = self.value(channel::CHILLED_WATER)?;
        let supply = Temperature::from_celsius(self.value(channel::CHILLED_SUPPLY)?);
        let flows = CoilFlows { air: entering?.dry_air_flow(), water: MassFlow::from_kilograms_per_second(flow) };
        let surface = plant.surface.at_flows(plant.found_at, flows, FLOW_EXPONENTS).ok()?;
        let water = chilled_water(flows.water, supply);
        let coil = coil::with_water(&entering?, surface, water, CondensateTemperature::LeavingAir).ok()?.air;
        self.checks.record(process::PREDICTED_COIL, &[entering?.into()], coil.leaving.into(), coil.exchange);
        self.set(rate::PREDICTED_LOAD, coil.cooling_load.watts(), basis::COIL_INLETS);
        if flow > 0.0 {
            let air = coil.leaving.air();
            self.set(rate::PREDICTED_COIL, air.dry_bulb().celsius(), basis::COIL_INLETS);
            self.set(rate::PREDICTED_COIL_RATIO, ratio_of(&air), basis::COIL_INLETS);
            self.checks.compare([check::COIL, check::COIL_RATIO], measured, &air);
            self.checks.deviations[check::COIL_LOAD].add(self.rates[rate::COOLING].value, coil.cooling_load.watts());
        }
        Some(())
    }

    /// What the tower should do with the air and the water that enter it, beside what it does; nothing while it rests.
    fn predict_tower(&mut self, plant: &Plant, outdoor: Option<MoistAir>) -> Option<()> {
        let entering = self.stream(outdoor, channel::TOWER_AIR)?;
        let flow = MassFlow::from_kilograms_per_second(self.value(channel::TOWER_WATER)?);
        let hot = Temperature::from_celsius(self.value(channel::TOWER_HOT)?);
        let water_to_air = tower::water_to_air_ratio(&entering, flow).ok()?;
        let number = plant.fill.number(water_to_air).ok()?;
        let rated = merkel::rate(&entering, HotWater { flow, temperature: hot }, number).ok()?.water;
        let tower = tower::with_air_flow(&entering, rated, TREATMENT).ok()?;
        self.checks.record(process::PREDICTED_TOWER, &[entering.into()], tower.leaving_stream(), tower.exchange);
        self.set(rate::WATER_TO_AIR, water_to_air, basis::TOWER_INLETS);
        self.set(rate::MERKEL_NUMBER_BY_LAW, number, basis::TOWER_INLETS);
        self.set(rate::PREDICTED_COLD_WATER, rated.cold.celsius(), basis::TOWER_INLETS);
        if let Some(cold) = self.value(channel::TOWER_COLD) {
            self.set(rate::COLD_WATER, cold, &[channel::TOWER_COLD]);
            self.checks.deviations[check::COLD_WATER].add(cold, rated.cold.celsius());
            let done = TowerWater { flow, hot, cold: Temperature::from_celsius(cold) };
            if let Ok(found) = merkel::number(&entering, done, Quadrature::GaussLegendre) {
                self.set(rate::MERKEL_NUMBER, found.number, basis::TOWER);
                self.checks.deviations[check::MERKEL_NUMBER].add(found.number, number);
            }
        }
        Some(())
    }
}

// ---- The log ----

/// An hour, or the day.
struct Span {
    start: f64,
    length: f64,
    totals: [Total; rate::COUNT],
    checks: Checks,
}

impl Span {
    fn merge(&mut self, other: &Self) {
        for (total, other) in self.totals.iter_mut().zip(&other.totals) {
            total.merge(other);
        }
        self.checks.merge(&other.checks);
    }
}

/// What the log holds.
struct Summary {
    rows: u32,
    not_in_time: u32,
    unreadable: u32,
    /// One for every row: what the rows cover.
    log: Total,
    counts: [Counts; channel::COUNT],
    hours: Vec<Span>,
    day: Span,
}

/// The time and the readings of a line; a field that is no number is a missing reading.
fn parse(line: &str) -> Option<(f64, [f64; channel::COUNT])> {
    let mut fields = line.trim_end().split(',').map(|field| field.parse().unwrap_or(f64::NAN));
    let time = fields.next()?;
    let mut raw = [f64::NAN; channel::COUNT];
    for raw in &mut raw {
        *raw = fields.next()?;
    }
    fields.next().is_none().then_some((time, raw))
}

fn read(file: impl BufRead, plant: &Plant) -> Result<Summary, Box<dyn Error>> {
    let channels = channels();
    let empty = Total::new(Rule::Step, LONGEST_STEP);
    let mut log = empty;
    let mut states = [ChannelState::default(); channel::COUNT];
    let mut counts = [Counts::default(); channel::COUNT];
    let mut periods = [Periods::new(HOUR, empty); rate::COUNT];
    let mut checks = Checks::default();
    let mut economizer = EconomizerState::default();
    let mut hours = Vec::new();
    let (mut rows, mut not_in_time, mut unreadable) = (0, 0, 0);

    for line in file.lines().skip(1) {
        rows += 1;
        let Some((time, raw)) = parse(&line?) else {
            unreadable += 1;
            continue;
        };
        if log.add(time, 1.0, Quality::Good) == Added::TimeRefused {
            not_in_time += 1;
            continue;
        }
        let mut moment = Moment::new(core::array::from_fn(|i| channels[i].1.check(&mut states[i], time, raw[i])));
        for (counts, reading) in counts.iter_mut().zip(&moment.readings) {
            counts.record(reading);
        }
        moment.evaluate(plant, time, &mut economizer);
        let finished: [_; rate::COUNT] =
            core::array::from_fn(|i| periods[i].add(time, moment.rates[i].value, moment.rates[i].quality));
        // All of them finish at the same time.
        if let Some(hour) = finished[0] {
            let totals = finished.map(|hour| hour.map_or(empty, |hour| hour.total));
            hours.push(Span { start: hour.start, length: HOUR, totals, checks });
            checks = Checks::default();
        }
        checks.merge(&moment.checks);
    }
    if let Some(hour) = periods[0].unfinished() {
        let totals = periods.map(|hour| hour.unfinished().map_or(empty, |hour| hour.total));
        hours.push(Span { start: hour.start, length: HOUR, totals, checks });
    }
    let mut day = Span { start: 0.0, length: DAY, totals: [empty; rate::COUNT], checks: Checks::default() };
    for hour in &hours {
        day.merge(hour);
    }
    Ok(Summary { rows, not_in_time, unreadable, log, counts, hours, day })
}

// ---- The tables ----

const TITLE: &str = "\
Air handler and cooling tower: a day of one-minute readings

";

const LOG_NOTE: &str = "
Sums and means stand for the covered time only and are not extrapolated. cover: the share of the hour or of the
day for which every reading that the result needs was there and plausible. rep.: minutes of it with a reading
that was repaired, by the last good value or at saturation. Table 7 says what was refused, and why.
";

const AIR_HEAD: &str = "
1  Air: means of dry bulb, relative humidity over liquid water, humidity ratio, enthalpy; cover in %

    pressure  --------- outdoor air ----------  ---------- supply air ----------  ---------- return air ----------
hour     hPa      °C     %   g/kg  kJ/kg cover      °C     %   g/kg  kJ/kg cover      °C     %   g/kg  kJ/kg cover
";

const HANDLER_HEAD: &str = "
2  Air handler: dry air, means before and behind the coil, heat and water

     - dry air -  -- mixed --- - off coil -  valve ----- coil load ------ conden- fan and heater  steam  - cover - rep.
hour supply outd.                                  sensible latent  total    sate   heat reheat
       kg/s  kg/s     °C  g/kg     °C  g/kg     %      kWh    kWh    kWh     kg     kWh    kWh     kg  coil% heat%  min
";

const HANDLER_NOTE: [&str; 2] = [
    "
Peaks in kW and kg/h. Condensate leaves at the temperature of the air off the coil; humidity ratios that differ by
less than ",
    " g/kg make none. Cooling at a closed valve: the thermometers differ, or the valve passes. Reheat: the heat
of fan and heater while the coil valve is open.
",
];

const TOWER_HEAD: &str = "
3  Cooling tower: heat and water

        water  rejected   range  approach  evaporation   drift  blowdown   make-up    cover     rep.
hour     kg/s       kWh       K         K           kg      kg        kg        kg        %      min
";

const TOWER_NOTE: [&str; 3] = [
    "
Peaks in kW, K and kg/h. Range and approach: while water flows. The leaving air is taken as saturated, which
over-predicts evaporation where it does not. Drift ",
    " % of the water, ",
    " cycles of concentration. Estimates: towers
and humidifiers can spread Legionella; hygiene rules and licensed practice govern, not these numbers.
",
];

const COIL_HEAD: &str = "
4  Equipment: predicted beside measured

      - chilled water --    --------- load of the coil ---------    ---- air off the coil -----  cover
hour  flow supply return    by air by water difference predicted      predicted      difference
      kg/s     °C     °C       kWh      kWh        kWh       kWh       °C  g/kg        K   g/kg      %
";

const TOWER_RATING_HEAD: &str = "
     water     - Merkel number -     -- cold water of the tower ---   cover
hour  /air    measured  fill law    measured  predicted  difference
         1           1         1          °C         °C           K       %
";

const EQUIPMENT_NOTE: [&str; 7] = [
    "
Differences: the load by air less that by water, where both are there; else measured less predicted. Temperatures,
humidity ratios and Merkel numbers: while water flows. The coil: ",
    " kW/K on the side of the air and ",
    " kW/K on
that of the water explain the point at which it was handed over; they go with the powers ",
    " and ",
    " of the flows.
Air and water should agree on the load within some per cent, or a meter is off. The tower: Merkel number ",
    "
(L/G)^-",
    " as the fill was tested, by Merkel's method. What falls short of the prediction asks for a look at the
meters first, then at flows, fouling and scale. A tower that scales or fouls is also a place where Legionella grows:
hygiene rules govern its cleaning.
",
];

const ROOMS_HEAD: &str = "
5  Outdoor air and rooms

      ---- share of outdoor air ----    outdoor     --------- rooms ---------   cover
hour  by flows  by dry bulbs    sure    cheaper    sensible  moisture   ratio
             %             %       %        min         kWh        kg       1       %
";

const ROOMS_NOTE: [&str; 5] = [
    "
Share of outdoor air in the dry air of the supply: by the flows, and by the dry bulbs of outdoor, return and mixed air
for as much of the time as thermometers good to ",
    " K make sure of it to ",
    " %. Outdoor cheaper: while the coil works,
to bring outdoor air to ",
    " °C would have cost it less than return air. Rooms: what they give to the air, with what
walls and paper store; moisture as vapor of ",
    " °C. Ratio: sensible to all heat, by the means; where the two cancel it
says nothing. How much outdoor air people need is a matter of ventilation codes.
",
];

const CHECKS_HEAD: &str = "
6  Checks: means of measured less computed; books of heat and water of all processes

     -- mixed air -- --- supply air -- ------ books ----- largest residual
hour        K    g/kg         K    g/kg  computed  closed     heat   water
";

const DEVIATIONS_HEAD: &str = "
measured less computed      unit  samples     mean      rms   lowest  highest
";

const BOOKS_HEAD: &str = "
books                   computed  closed  no result  largest residual: heat   water
";

const CHECKS_NOTE: &str = "
Mixed air is computed from the flows and states of outdoor and return air, supply air from the air off the heater
and the metered steam. Residuals are in units of 2^-52 of the terms of a book; a book is closed within 8 of them
and what the last bit of the temperatures is worth. No result: a reading was refused, no process does
that, or the tower to predict was at rest.
";

const CHANNELS_HEAD: &str = "
7  Readings

channel              unit     good repaired refused gaps  why
";

/// A value, its width, its decimals.
type Cell = (f64, usize, usize);

/// "-" where there is no value, and no minus before zero.
fn text((value, width, decimals): Cell) -> String {
    if !value.is_finite() {
        return format!("{:>width$}", "-");
    }
    let text = format!("{value:.decimals$}");
    let zero = !text.contains(|c| matches!(c, '1'..='9'));
    format!("{:>width$}", if zero { text.trim_start_matches('-') } else { &text })
}

fn print_row<const N: usize>(label: &str, cells: [Cell; N]) {
    println!("{label:<4}{}", cells.map(text).concat());
}

/// A table with a row for each hour and one for the day.
fn print_hours<const N: usize>(summary: &Summary, cells: fn(&Span) -> [Cell; N]) {
    for hour in &summary.hours {
        print_row(&format!("{:02.0}", Unit::Hour.from_core(hour.start)), cells(hour));
    }
    print_row("day", cells(&summary.day));
}

impl Span {
    fn mean(&self, rate: usize, unit: Unit) -> f64 {
        unit.from_core(self.totals[rate].mean().unwrap_or(f64::NAN))
    }

    fn highest(&self, rate: usize, unit: Unit) -> f64 {
        unit.from_core(self.totals[rate].highest().unwrap_or(f64::NAN))
    }

    /// In the unit of the rate times s.
    fn total(&self, rate: usize) -> f64 {
        let total = &self.totals[rate];
        if total.covered_seconds() > 0.0 { total.total() } else { f64::NAN }
    }

    fn kilowatt_hours(&self, rate: usize) -> f64 {
        Unit::KilowattHour.from_core(self.total(rate))
    }

    fn cover(&self, rate: usize) -> f64 {
        Unit::Percent.from_core(self.totals[rate].coverage_of(self.length))
    }

    fn repaired(&self, rate: usize) -> f64 {
        Unit::Minute.from_core(self.totals[rate].repaired_seconds())
    }

    fn deviation(&self, check: usize) -> f64 {
        let (_, _, unit) = CHECKS[check];
        unit.from_core(self.checks.deviations[check].mean().unwrap_or(f64::NAN))
    }

    /// The books of all processes.
    fn books(&self) -> BooksTotal {
        let mut all = BooksTotal::default();
        for books in &self.checks.books {
            all.merge(books);
        }
        all
    }
}

fn air_cells(span: &Span) -> [Cell; 16] {
    [
        (span.mean(rate::PRESSURE, Unit::Hectopascal), 8, 1),
        (span.mean(rate::OUTDOOR, Unit::Celsius), 8, 1),
        (span.mean(rate::OUTDOOR_RH, Unit::Percent), 6, 1),
        (span.mean(rate::OUTDOOR_RATIO, Unit::GramPerKilogram), 7, 2),
        (span.mean(rate::OUTDOOR_ENTHALPY, Unit::KilojoulePerKilogram), 7, 1),
        (span.cover(rate::OUTDOOR_RATIO), 6, 1),
        (span.mean(rate::SUPPLY, Unit::Celsius), 8, 1),
        (span.mean(rate::SUPPLY_RH, Unit::Percent), 6, 1),
        (span.mean(rate::SUPPLY_RATIO, Unit::GramPerKilogram), 7, 2),
        (span.mean(rate::SUPPLY_ENTHALPY, Unit::KilojoulePerKilogram), 7, 1),
        (span.cover(rate::SUPPLY_RATIO), 6, 1),
        (span.mean(rate::RETURN, Unit::Celsius), 8, 1),
        (span.mean(rate::RETURN_RH, Unit::Percent), 6, 1),
        (span.mean(rate::RETURN_RATIO, Unit::GramPerKilogram), 7, 2),
        (span.mean(rate::RETURN_ENTHALPY, Unit::KilojoulePerKilogram), 7, 1),
        (span.cover(rate::RETURN_RATIO), 6, 1),
    ]
}

fn handler_cells(span: &Span) -> [Cell; 17] {
    [
        (span.mean(rate::SUPPLY_AIR, Unit::KilogramPerSecond), 7, 2),
        (span.mean(rate::OUTDOOR_AIR, Unit::KilogramPerSecond), 6, 2),
        (span.mean(rate::MIXED, Unit::Celsius), 7, 1),
        (span.mean(rate::MIXED_RATIO, Unit::GramPerKilogram), 6, 2),
        (span.mean(rate::COIL, Unit::Celsius), 7, 1),
        (span.mean(rate::COIL_RATIO, Unit::GramPerKilogram), 6, 2),
        (span.mean(rate::VALVE, Unit::Percent), 6, 1),
        (span.kilowatt_hours(rate::SENSIBLE), 9, 1),
        (span.kilowatt_hours(rate::LATENT), 7, 1),
        (span.kilowatt_hours(rate::COOLING), 7, 1),
        (span.total(rate::CONDENSATE), 7, 1),
        (span.kilowatt_hours(rate::HEATING), 8, 1),
        (span.kilowatt_hours(rate::REHEAT), 7, 1),
        (span.total(rate::STEAM), 7, 1),
        (span.cover(rate::COOLING), 7, 1),
        (span.cover(rate::HEATING), 6, 1),
        (span.repaired(rate::HEATING), 5, 0),
    ]
}

fn tower_cells(span: &Span) -> [Cell; 10] {
    [
        (span.mean(rate::TOWER_WATER, Unit::KilogramPerSecond), 9, 2),
        (span.kilowatt_hours(rate::REJECTED), 10, 1),
        (span.mean(rate::RANGE, Unit::Celsius), 8, 2),
        (span.mean(rate::APPROACH, Unit::Celsius), 10, 2),
        (span.total(rate::EVAPORATION), 13, 1),
        (span.total(rate::DRIFT), 8, 2),
        (span.total(rate::BLOWDOWN), 10, 1),
        (span.total(rate::MAKE_UP), 10, 1),
        (span.cover(rate::REJECTED), 9, 1),
        (span.repaired(rate::REJECTED), 9, 0),
    ]
}

fn coil_cells(span: &Span) -> [Cell; 12] {
    [
        (span.mean(rate::CHILLED_WATER, Unit::KilogramPerSecond), 6, 2),
        (span.mean(rate::CHILLED_SUPPLY, Unit::Celsius), 7, 1),
        (span.mean(rate::CHILLED_RETURN, Unit::Celsius), 7, 1),
        (span.kilowatt_hours(rate::COOLING), 10, 1),
        (span.kilowatt_hours(rate::LOAD_BY_WATER), 9, 1),
        (span.kilowatt_hours(rate::AIR_LESS_WATER), 11, 1),
        (span.kilowatt_hours(rate::PREDICTED_LOAD), 10, 1),
        (span.mean(rate::PREDICTED_COIL, Unit::Celsius), 9, 1),
        (span.mean(rate::PREDICTED_COIL_RATIO, Unit::GramPerKilogram), 6, 2),
        (span.deviation(check::COIL), 9, 2),
        (span.deviation(check::COIL_RATIO), 7, 2),
        (span.cover(rate::PREDICTED_LOAD), 7, 1),
    ]
}

fn tower_rating_cells(span: &Span) -> [Cell; 7] {
    [
        (span.mean(rate::WATER_TO_AIR, Unit::Fraction), 6, 2),
        (span.mean(rate::MERKEL_NUMBER, Unit::Fraction), 12, 2),
        (span.mean(rate::MERKEL_NUMBER_BY_LAW, Unit::Fraction), 10, 2),
        (span.mean(rate::COLD_WATER, Unit::Celsius), 12, 1),
        (span.mean(rate::PREDICTED_COLD_WATER, Unit::Celsius), 11, 1),
        (span.deviation(check::COLD_WATER), 12, 2),
        (span.cover(rate::PREDICTED_COLD_WATER), 8, 1),
    ]
}

/// Of the means of a span: of minutes in which hardly any heat comes in it says nothing.
fn sensible_heat_ratio(span: &Span) -> f64 {
    let mean = |rate: usize| span.totals[rate].mean().unwrap_or(f64::NAN);
    let room = MoistAir::from_dry_bulb(
        Temperature::from_celsius(mean(rate::RETURN)),
        HumidityRatio::from_kilograms_per_kilogram(mean(rate::RETURN_RATIO)),
        Pressure::from_pascals(mean(rate::PRESSURE)),
    );
    let gains = RoomGains {
        sensible: HeatFlow::from_watts(mean(rate::ROOM_SENSIBLE)),
        moisture: MassFlow::from_kilograms_per_second(mean(rate::ROOM_MOISTURE)),
        source: people(),
    };
    room.and_then(|room| room::sensible_heat_ratio(&room, &gains)).unwrap_or(f64::NAN)
}

fn room_cells(span: &Span) -> [Cell; 8] {
    [
        (span.mean(rate::SHARE_BY_FLOWS, Unit::Percent), 10, 1),
        (span.mean(rate::SHARE_BY_TEMPERATURES, Unit::Percent), 14, 1),
        (span.cover(rate::SHARE_BY_TEMPERATURES), 8, 1),
        (Unit::Minute.from_core(span.total(rate::OUTDOOR_CHEAPER)), 11, 0),
        (span.kilowatt_hours(rate::ROOM_SENSIBLE), 12, 1),
        (span.total(rate::ROOM_MOISTURE), 10, 1),
        (sensible_heat_ratio(span), 8, 2),
        (span.cover(rate::ROOM_SENSIBLE), 8, 1),
    ]
}

fn check_cells(span: &Span) -> [Cell; 8] {
    let books = span.books();
    [
        (span.deviation(check::MIXED), 9, 2),
        (span.deviation(check::MIXED_RATIO), 8, 3),
        (span.deviation(check::SUPPLY), 10, 2),
        (span.deviation(check::SUPPLY_RATIO), 8, 3),
        (books.heat().samples() as f64, 10, 0),
        (books.closed() as f64, 8, 0),
        (books.heat().largest_in_epsilons(), 9, 2),
        (books.water().largest_in_epsilons(), 8, 2),
    ]
}

fn print_log(summary: &Summary) {
    print!("{TITLE}");
    println!("rows read          {:>6}", summary.rows);
    println!("time not increasing{:>6}  ignored", summary.not_in_time);
    println!("not a row          {:>6}  ignored", summary.unreadable);
    println!("day covered by rows{}  %", text((Unit::Percent.from_core(summary.log.coverage_of(DAY)), 6, 1)));
    print!("{LOG_NOTE}");
}

fn print_air(summary: &Summary) {
    print!("{AIR_HEAD}");
    print_hours(summary, air_cells);
}

fn print_handler(summary: &Summary) {
    print!("{HANDLER_HEAD}");
    print_hours(summary, handler_cells);
    let day = &summary.day;
    print_row(
        "peak",
        [
            (day.highest(rate::SENSIBLE, Unit::Kilowatt), 54, 1),
            (day.highest(rate::LATENT, Unit::Kilowatt), 7, 1),
            (day.highest(rate::COOLING, Unit::Kilowatt), 7, 1),
            (day.highest(rate::CONDENSATE, Unit::KilogramPerHour), 7, 1),
            (day.highest(rate::HEATING, Unit::Kilowatt), 8, 1),
            (day.highest(rate::REHEAT, Unit::Kilowatt), 7, 1),
            (day.highest(rate::STEAM, Unit::KilogramPerHour), 7, 1),
        ],
    );
    let [before, after] = HANDLER_NOTE;
    print!("{before}{}{after}", text((Unit::GramPerKilogram.from_core(DEAD_BAND), 0, 1)));
}

fn print_tower(summary: &Summary) {
    print!("{TOWER_HEAD}");
    print_hours(summary, tower_cells);
    let day = &summary.day;
    print_row(
        "peak",
        [
            (day.highest(rate::REJECTED, Unit::Kilowatt), 19, 1),
            (day.highest(rate::RANGE, Unit::Celsius), 8, 2),
            (day.highest(rate::APPROACH, Unit::Celsius), 10, 2),
            (day.highest(rate::EVAPORATION, Unit::KilogramPerHour), 13, 1),
            (day.highest(rate::DRIFT, Unit::KilogramPerHour), 8, 2),
            (day.highest(rate::BLOWDOWN, Unit::KilogramPerHour), 10, 1),
            (day.highest(rate::MAKE_UP, Unit::KilogramPerHour), 10, 1),
        ],
    );
    let [before, between, after] = TOWER_NOTE;
    let drift = text((Unit::Percent.from_core(TREATMENT.drift_fraction), 0, 2));
    let cycles = text((TREATMENT.cycles_of_concentration, 0, 1));
    print!("{before}{drift}{between}{cycles}{after}");
}

fn print_equipment(summary: &Summary, plant: &Plant) {
    print!("{COIL_HEAD}");
    print_hours(summary, coil_cells);
    print!("{TOWER_RATING_HEAD}");
    print_hours(summary, tower_rating_cells);
    let kilowatts = |side: Conductance| text((Unit::Kilowatt.from_core(side.watts_per_kelvin()), 0, 1));
    let [coil, air, water, and, tower, law, after] = EQUIPMENT_NOTE;
    print!("{coil}{}{air}{}{water}", kilowatts(plant.surface.air_side), kilowatts(plant.surface.water_side));
    let exponents = [FLOW_EXPONENTS.air_side, FLOW_EXPONENTS.water_side].map(|exponent| text((exponent, 0, 1)));
    print!("{}{and}{}{tower}", exponents[0], exponents[1]);
    print!("{}{law}{}{after}", text((plant.fill.coefficient(), 0, 2)), text((plant.fill.exponent(), 0, 1)));
}

fn print_rooms(summary: &Summary) {
    print!("{ROOMS_HEAD}");
    print_hours(summary, room_cells);
    let [share, sure, cheaper, rooms, after] = ROOMS_NOTE;
    print!("{share}{}{sure}{}", text((THERMOMETER, 0, 1)), text((Unit::Percent.from_core(ACCEPTABLE), 0, 0)));
    print!("{cheaper}{}{rooms}{}{after}", text((OFF_COIL.0, 0, 0)), text((PEOPLE, 0, 0)));
}

fn print_checks(summary: &Summary) {
    print!("{CHECKS_HEAD}");
    print_hours(summary, check_cells);
    print!("{DEVIATIONS_HEAD}");
    for ((name, unit, core), deviation) in CHECKS.iter().zip(&summary.day.checks.deviations) {
        let value = |value: Option<f64>| text((core.from_core(value.unwrap_or(f64::NAN)), 9, 3));
        let [mean, rms] = [value(deviation.mean()), value(deviation.root_mean_square())];
        let [lowest, highest] = [value(deviation.lowest()), value(deviation.highest())];
        println!("{name:<28}{unit:<4}{:>9}{mean}{rms}{lowest}{highest}", deviation.samples());
    }
    print!("{BOOKS_HEAD}");
    for (name, books) in PROCESSES.iter().zip(&summary.day.checks.books) {
        let (heat, water) = (books.heat(), books.water());
        print!("{name:<20}{:>12}{:>8}{:>11}", heat.samples(), books.closed(), heat.refused());
        println!("{}{}", text((heat.largest_in_epsilons(), 24, 2)), text((water.largest_in_epsilons(), 8, 2)));
    }
    print!("{CHECKS_NOTE}");
}

fn print_channels(summary: &Summary) {
    print!("{CHANNELS_HEAD}");
    for ((name, channel), counts) in channels().iter().zip(&summary.counts) {
        let unit = channel.unit().map_or("", Unit::text);
        let quality = |quality| counts.quality(quality);
        print!("{name:<20} {unit:<5}{:>8}{:>9}", quality(Quality::Good), quality(Quality::Repaired));
        print!("{:>8}{:>5}", quality(Quality::Refused), counts.gaps());
        print_reasons(counts);
    }
}

/// Where the reasons begin after the first.
const INDENT: usize = 56;

/// Every reason on a line of its own, the first on the line of the channel.
fn print_reasons(counts: &Counts) {
    let mut indent = 0;
    let mut print_reason = |count: u64, held: &str, reason: Reason| {
        if count > 0 {
            println!("{:indent$}{count:>5} {held}{reason}", "");
            indent = INDENT;
        }
    };
    for reason in Reason::ALL {
        if !matches!(reason, Reason::Ok | Reason::Gap | Reason::Held) {
            print_reason(counts.reason(reason), "", reason);
        }
        print_reason(counts.held_because(reason), "held: ", reason);
    }
    if indent == 0 {
        println!();
    }
}

fn main() -> Result<(), Box<dyn Error>> {
    let path = std::env::args().nth(1).unwrap_or_else(|| LOG.to_owned());
    let plant = Plant::described()?;
    let summary = read(BufReader::new(File::open(path)?), &plant)?;
    print_log(&summary);
    print_air(&summary);
    print_handler(&summary);
    print_tower(&summary);
    print_equipment(&summary, &plant);
    print_rooms(&summary);
    print_checks(&summary);
    print_channels(&summary);
    Ok(())
}
