//! Makes the log that `plant_day` reads: `cargo run --release --example make_plant_day_log > plant_day.csv`.
//!
//! One invented summer day, minute by minute, of an invented archive with reading rooms in an inland plain: a clear night
//! with fog at dawn, a warm moist afternoon. Its air handler mixes outdoor with recirculated air and holds 21.5 °C and
//! 8 g/kg: steam at night, a cooling coil with reheat in the afternoon, the heat of which a cooling tower rejects. The
//! plant is computed with this library, so that the log is coherent: the coil from its conductances and the chilled water
//! that its valve lets through, the tower by Merkel's method from the law of its fill, which has scaled since it was tested. Sensors
//! add offset, noise and their resolution, and the logger its faults: lost rows, a row twice, empty fields, a stuck sensor,
//! an hour in degrees Fahrenheit, values out of range.
//!
//! The parameters are invented, of the size that such plants have (common practice, no source). Nothing here depends on
//! the machine: the same file comes out everywhere.
use moistair_core::process::coil::{
    self, Arrangement, CoilFlows, CoilSurface, CoilWater, Coolant, FlowExponents, WaterCoil,
};
use moistair_core::process::tower::fill::FillLaw;
use moistair_core::process::tower::{HotWater, merkel, water_to_air_ratio};
use moistair_core::process::{AirStream, humidify, mixing, sensible};
use moistair_core::*;

/// The columns of the log, each with its unit.
pub const HEADER: &str = "time_s,pressure_hPa,outdoor_degC,outdoor_rh_%,mixed_degC,mixed_rh_%,\
    coil_degC,coil_rh_%,heater_degC,supply_degC,supply_rh_%,return_degC,return_rh_%,supply_m3/h,outdoor_m3/h,valve_%,steam_kg/h,\
    tower_water_kg/s,tower_hot_degC,tower_cold_degC,tower_air_m3/h,\
    chilled_water_kg/s,chilled_supply_degC,chilled_return_degC";

/// Columns by their place after the time.
mod column {
    pub const PRESSURE: usize = 0;
    pub const OUTDOOR: usize = 1;
    pub const OUTDOOR_HUMIDITY: usize = 2;
    pub const MIXED_HUMIDITY: usize = 4;
    pub const COIL: usize = 5;
    pub const SUPPLY: usize = 8;
    pub const RETURN: usize = 10;
    pub const RETURN_HUMIDITY: usize = 11;
    pub const VALVE: usize = 14;
    pub const CHILLED_WATER: usize = 20;
    pub const COUNT: usize = 23;
}

#[allow(dead_code, reason = "a test takes this file as a module")]
fn main() -> Result<(), Error> {
    std::print!("{}", log()?);
    Ok(())
}

/// The whole log.
///
/// # Errors
/// None that this day meets.
pub fn log() -> Result<String, Error> {
    let (mut plant, mut noise) = (Plant::at_midnight(), Noise(20));
    let (mut text, mut stuck) = (format!("{HEADER}\n"), String::new());
    for minute in 0..=MINUTES {
        let mut fields = plant.step(f64::from(minute) / 60.0)?.read(&mut noise);
        spoil(minute, &mut fields, &mut stuck);
        let row = format!("{},{}\n", minute * 60, fields.join(","));
        text.push_str(&row.repeat(copies(minute)));
    }
    Ok(text)
}

/// From midnight to midnight.
const MINUTES: u32 = 1440;

// ---- What the logger and the wiring do to the readings ----

/// How often a row is in the log.
fn copies(minute: u32) -> usize {
    match minute {
        77 | 192..=199 | 640 | 1010 | 1241..=1258 | 1333 => 0,
        330 => 2,
        _ => 1,
    }
}

fn spoil(minute: u32, fields: &mut [String; column::COUNT], stuck: &mut String) {
    let mut replace = |column: usize, text: &str| {
        if let Some(field) = fields.get_mut(column) {
            field.replace_range(.., text);
        }
    };
    match minute {
        545..=552 => replace(column::MIXED_HUMIDITY, ""),
        120 | 121 | 480 => replace(column::OUTDOOR_HUMIDITY, ""),
        860..=880 => replace(column::PRESSURE, ""),
        411 => replace(column::VALVE, "n/a"),
        805..=807 => replace(column::SUPPLY, "-999.0"),
        1100 => replace(column::RETURN, "-999.0"),
        930..=931 => replace(column::COIL, "850.0"),
        1120..=1134 => replace(column::CHILLED_WATER, ""),
        _ => (),
    }
    if (600..660).contains(&minute) {
        // Somebody tried the display of the weather station.
        let celsius = fields.get(column::OUTDOOR).and_then(|field| field.parse().ok()).unwrap_or(f64::NAN);
        let fahrenheit = Temperature::from_celsius(celsius).fahrenheit();
        if let Some(field) = fields.get_mut(column::OUTDOOR) {
            *field = format!("{fahrenheit:.1}");
        }
    }
    if let Some(field) = fields.get_mut(column::RETURN_HUMIDITY) {
        match minute {
            900 => stuck.clone_from(field),
            901..1020 => field.clone_from(stuck),
            _ => (),
        }
    }
}

// ---- Sensors ----

/// What is true at one moment, °C, fractions, hPa, m³/h, kg/h, kg/s, in the order of the columns.
struct Truth([f64; column::COUNT]);

/// Offset, noise (standard deviation), and decimals of each sensor, in the unit of its column.
const SENSORS: [(f64, f64, usize); column::COUNT] = [
    (0.2, 0.04, 1),
    (0.1, 0.05, 1),
    (0.6, 0.25, 1),
    (0.2, 0.12, 1),
    (-0.5, 0.30, 1),
    (0.0, 0.05, 1),
    (0.3, 0.25, 1),
    (0.0, 0.05, 1),
    (-0.1, 0.05, 1),
    (0.4, 0.20, 1),
    (0.1, 0.04, 1),
    (-0.3, 0.15, 1),
    (40.0, 70.0, 0),
    (-30.0, 35.0, 0),
    (0.0, 0.0, 1),
    (0.0, 0.15, 1),
    (0.0, 0.02, 2),
    (0.05, 0.03, 1),
    (0.0, 0.03, 1),
    (0.0, 60.0, 0),
    (0.03, 0.03, 2),
    (0.05, 0.03, 1),
    (-0.05, 0.03, 1),
];

impl Truth {
    /// The readings as the logger writes them.
    fn read(&self, noise: &mut Noise) -> [String; column::COUNT] {
        let mut sensors = self.0.iter().zip(SENSORS);
        core::array::from_fn(|_| {
            let Some((truth, (offset, spread, decimals))) = sensors.next() else { return String::new() };
            // Drawn also where it is not used, so that no column shifts the others. What stands still reads zero.
            let error = offset + spread * noise.bell();
            let value = if *truth > 0.0 { (truth + error).max(0.0) } else { 0.0 };
            format!("{value:.decimals$}")
        })
    }
}

/// Pseudo-random numbers: SplitMix64 (Steele, Lea and Flood 2014, OOPSLA '14, 453–472).
struct Noise(u64);

impl Noise {
    fn uniform(&mut self) -> f64 {
        self.0 = self.0.wrapping_add(0x9E37_79B9_7F4A_7C15);
        let mut z = self.0;
        z = (z ^ (z >> 30)).wrapping_mul(0xBF58_476D_1CE4_E5B9);
        z = (z ^ (z >> 27)).wrapping_mul(0x94D0_49BB_1331_11EB);
        ((z ^ (z >> 31)) >> 11) as f64 / (1_u64 << 53) as f64
    }

    /// Mean 0, standard deviation 1: the sum of four uniform numbers.
    fn bell(&mut self) -> f64 {
        let sum = self.uniform() + self.uniform() + self.uniform() + self.uniform();
        (sum - 2.0) * 3.0_f64.sqrt()
    }
}

// ---- The day ----

/// Smooth steps between points (hour, value).
fn curve(points: &[(f64, f64)], hour: f64) -> f64 {
    let mut value = f64::NAN;
    for pair in points.windows(2) {
        if let &[(from, before), (to, after)] = pair {
            let x = ((hour - from) / (to - from)).clamp(0.0, 1.0);
            if from <= hour {
                value = before + (after - before) * x * x * (3.0 - 2.0 * x);
            }
        }
    }
    value
}

const OUTDOOR: [(f64, f64); 8] =
    [(0.0, 11.0), (5.2, 5.6), (9.0, 15.5), (12.0, 24.5), (15.3, 29.6), (18.0, 26.5), (21.0, 20.5), (24.0, 17.0)];
const DEW_POINT: [(f64, f64); 8] =
    [(0.0, 6.2), (5.0, 5.5), (8.0, 8.5), (11.0, 12.5), (14.0, 17.2), (17.0, 18.2), (20.0, 16.8), (24.0, 14.5)];
const PRESSURE: [(f64, f64); 4] = [(0.0, 988.4), (10.0, 986.9), (17.0, 984.6), (24.0, 985.2)];
const PEOPLE: [(f64, f64); 8] =
    [(0.0, 0.0), (8.5, 0.0), (9.5, 1.0), (12.5, 0.7), (14.0, 1.0), (18.0, 0.9), (19.5, 0.0), (24.0, 0.0)];
const SUN: [(f64, f64); 5] = [(0.0, 0.0), (5.0, 0.0), (13.0, 1.0), (20.5, 0.0), (24.0, 0.0)];

const SECONDS_PER_STEP: f64 = 60.0;
const ROOM_CELSIUS: f64 = 21.5;
const ROOM_RATIO: f64 = 0.0080;
/// Heat capacity of what changes its temperature within an hour, J/K.
const ROOM_HEAT_CAPACITY: f64 = 9.0e7;
/// Dry air that would store as much water as room and paper do, kg.
const ROOM_MASS: f64 = 6.0e4;
const FAN_RISE: f64 = 0.7;

/// The coil at its rated flows: kW/K of the air side and of the water side, kg/s of dry air and of chilled water.
const CONDUCTANCES: (f64, f64) = (21.0, 50.0);
const RATED_FLOWS: (f64, f64) = (6.0, 6.0);
const FLOW_EXPONENTS: FlowExponents = FlowExponents { air_side: 0.6, water_side: 0.8 };
/// What the chiller makes, °C.
const CHILLED_CELSIUS: f64 = 7.0;
/// Water of the tower, kg/s, and its fill as it is now: Merkel number at L/G = 1, and exponent.
const TOWER_WATER: f64 = 5.5;
const FILL: (f64, f64) = (1.0, 0.6);

/// What the plant remembers from minute to minute.
struct Plant {
    room_celsius: f64,
    room_ratio: f64,
    /// Of the coil; chilled water flows as it is open.
    valve: f64,
    /// Temperature rise in the heater, K.
    heater: f64,
    /// Steam, kg/s.
    steam: f64,
    drying: bool,
    chilling: bool,
    /// Chilled water before and behind the coil, °C.
    chilled: (f64, f64),
    /// Hot and cold water of the tower, °C.
    basin: (f64, f64),
}

impl Plant {
    fn at_midnight() -> Self {
        Self {
            room_celsius: 21.6,
            room_ratio: 0.0079,
            valve: 0.0,
            heater: 2.0,
            steam: 0.004,
            drying: false,
            chilling: false,
            chilled: (19.2, 19.6),
            basin: (18.4, 18.1),
        }
    }

    /// One minute.
    fn step(&mut self, hour: f64) -> Result<Truth, Error> {
        let basis = Basis::from(Pressure::from_hectopascals(curve(&PRESSURE, hour)));
        let celsius = curve(&OUTDOOR, hour);
        let dew_point = curve(&DEW_POINT, hour).min(celsius);
        let outdoor_air =
            MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), DewPoint::from_celsius(dew_point), basis)?;
        let room = air(self.room_celsius, self.room_ratio, basis)?;
        let people = curve(&PEOPLE, hour);

        // What the controllers ask for.
        let supply_target = (ROOM_CELSIUS + 4.0 * (ROOM_CELSIUS - self.room_celsius)).clamp(14.0, 26.0);
        self.drying = self.room_ratio > if self.drying { 0.0080 } else { 0.00815 };
        let dry_target = (ROOM_RATIO - 2.0 * (self.room_ratio - ROOM_RATIO)).clamp(0.0070, 0.0080);
        let dry_celsius = if self.drying { air(30.0, dry_target, basis)?.dew_point()?.celsius() } else { 50.0 };
        let coil_target = dry_celsius.min(supply_target - FAN_RISE + 0.3);

        // The air's way.
        let supply_flow = 12_000.0 + 6_000.0 * people;
        let outdoor_flow = 2_400.0 + 2_600.0 * people;
        let outdoor = AirStream::from_volume_flow(outdoor_air, VolumeFlow::from_cubic_meters_per_hour(outdoor_flow))?;
        let total = AirStream::from_volume_flow(room, VolumeFlow::from_cubic_meters_per_hour(supply_flow))?;
        let recirculated = mixing::remainder(total.dry_air_flow(), &outdoor, room)?;
        let mixed = mixing::adiabatic(&[outdoor.into(), recirculated.into()])?.leaving.without_condensate();
        let coil = self.cool(&mixed, coil_target)?;
        let cooled = coil.air;
        let off_coil = cooled.leaving.air().dry_bulb().celsius();
        self.heater += 0.3 * ((supply_target - off_coil - FAN_RISE).max(0.0) - self.heater);
        let heated_celsius = Temperature::from_celsius(off_coil + FAN_RISE + self.heater);
        let heated = sensible::to_temperature(&cooled.leaving, heated_celsius)?.leaving;
        let wanted_steam = if self.drying { 0.0 } else { (30.0 * (ROOM_RATIO - self.room_ratio)).clamp(0.0, 0.011) };
        self.steam += 0.25 * (wanted_steam - self.steam);
        let steam = if self.steam > 2e-4 { self.steam } else { 0.0 };
        let enthalpy = humidify::saturated_steam_enthalpy(Temperature::from_celsius(100.0))?;
        let supply = humidify::steam(&heated, MassFlow::from_kilograms_per_second(steam), enthalpy)?
            .leaving
            .without_condensate();

        let tower = self.reject(cooled.cooling_load.watts(), &outdoor_air)?;
        self.live(&supply, &outdoor_air, people, curve(&SUN, hour));

        let humidity = |air: MoistAir| Ok::<_, Error>(air.relative_humidity_over_liquid()?.percent());
        let degrees = |air: MoistAir| air.dry_bulb().celsius();
        Ok(Truth([
            basis.pressure().hectopascals(),
            degrees(outdoor_air),
            humidity(outdoor_air)?,
            degrees(mixed.air()),
            humidity(mixed.air())?,
            off_coil,
            humidity(cooled.leaving.air())?,
            degrees(heated.air()),
            degrees(supply.air()),
            humidity(supply.air())?,
            degrees(room),
            humidity(room)?,
            supply.volume_flow().cubic_meters_per_hour(),
            outdoor_flow,
            self.valve * 100.0,
            steam * 3600.0,
            tower.water,
            self.basin.0,
            self.basin.1,
            tower.air,
            self.valve * RATED_FLOWS.1,
            self.chilled.0,
            self.chilled.1,
        ]))
    }

    /// The coil under its valve, and the chiller, which runs while the valve is open.
    fn cool(&mut self, mixed: &AirStream, target: f64) -> Result<WaterCoil, Error> {
        self.chilling = self.valve > if self.chilling { 0.02 } else { 0.06 };
        let (supply, back) = &mut self.chilled;
        if self.chilling {
            *supply += 0.3 * (CHILLED_CELSIUS - *supply);
        } else {
            // Standing water takes the temperature of the cellar.
            *supply += 0.006 * (19.0 - *supply);
            *back += 0.006 * (19.5 - *back);
        }
        let entering = Temperature::from_celsius(*supply);
        let coil = |valve: f64| {
            let flow = MassFlow::from_kilograms_per_second(valve * RATED_FLOWS.1);
            let surface = surface_at(CoilFlows { air: mixed.dry_air_flow(), water: flow })?;
            let water = CoilWater { flow, entering, coolant: Coolant::Water };
            coil::with_water(mixed, surface, water, coil::CondensateTemperature::LeavingAir)
        };
        let error = coil(self.valve)?.air.leaving.air().dry_bulb().celsius() - target;
        self.valve = (self.valve + 0.025 * error).clamp(0.0, 1.0);
        let done = coil(self.valve)?;
        if self.valve > 0.0 {
            *back = done.leaving_water.celsius();
        }
        Ok(done)
    }

    /// The chiller's heat and its tower, for a load in W.
    fn reject(&mut self, load: f64, outdoor: &MoistAir) -> Result<Tower, Error> {
        let (hot, cold) = &mut self.basin;
        if !self.chilling {
            // Standing water follows the weather.
            let wet_bulb = outdoor.wet_bulb()?.celsius();
            *hot += 0.004 * (wet_bulb + 1.5 - *hot);
            *cold += 0.005 * (wet_bulb + 1.0 - *cold);
            return Ok(Tower { water: 0.0, air: 0.0 });
        }
        let rejected = 1.22 * load.max(0.0) + 3_000.0;
        let air = 9_000.0 + 0.1 * rejected;
        *hot = *cold + rejected / (TOWER_WATER * 4_186.0);
        let entering = AirStream::from_volume_flow(*outdoor, VolumeFlow::from_cubic_meters_per_hour(air))?;
        let flow = MassFlow::from_kilograms_per_second(TOWER_WATER);
        let number = FillLaw::new(FILL.0, FILL.1)?.number(water_to_air_ratio(&entering, flow)?)?;
        let water = HotWater { flow, temperature: Temperature::from_celsius(*hot) };
        let rated = merkel::rate(&entering, water, number)?;
        // The basin holds the water of three minutes.
        *cold += 0.3 * (rated.water.cold.celsius() - *cold);
        Ok(Tower { water: TOWER_WATER, air })
    }

    /// A minute of the rooms.
    fn live(&mut self, supply: &AirStream, outdoor: &MoistAir, people: f64, sun: f64) {
        let flow = supply.dry_air_flow().kilograms_per_second();
        let heat = 5_000.0
            + 9_000.0 * sun
            + 14_000.0 * people
            + 900.0 * (outdoor.dry_bulb().celsius() - self.room_celsius)
            + flow * 1_020.0 * (supply.air().dry_bulb().celsius() - self.room_celsius);
        let leaking = outdoor.humidity_ratio().kilograms_per_kilogram() - self.room_ratio;
        let drying = supply.air().humidity_ratio().kilograms_per_kilogram() - self.room_ratio;
        let water = 1.5e-3 * people + 0.15 * leaking + flow * drying;
        self.room_celsius += heat / ROOM_HEAT_CAPACITY * SECONDS_PER_STEP;
        self.room_ratio += water / ROOM_MASS * SECONDS_PER_STEP;
    }
}

/// Flows through the tower: water in kg/s, air in m³/h.
struct Tower {
    water: f64,
    air: f64,
}

/// The coil at flows.
fn surface_at(flows: CoilFlows) -> Result<CoilSurface, Error> {
    let flow = MassFlow::from_kilograms_per_second;
    let rated = CoilSurface {
        air_side: Conductance::from_kilowatts_per_kelvin(CONDUCTANCES.0),
        water_side: Conductance::from_kilowatts_per_kelvin(CONDUCTANCES.1),
        arrangement: Arrangement::Counterflow,
    };
    let rated_at = CoilFlows { air: flow(RATED_FLOWS.0), water: flow(RATED_FLOWS.1) };
    rated.at_flows(rated_at, flows, FLOW_EXPONENTS)
}

fn air(celsius: f64, ratio: f64, basis: Basis) -> Result<MoistAir, Error> {
    let ratio = HumidityRatio::from_kilograms_per_kilogram(ratio);
    MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), ratio, basis)
}
