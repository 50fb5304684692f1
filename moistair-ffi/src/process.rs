//! What air-handling plant does to moist air.
//!
//! Results are estimates for engineering, not a safety function. Wet surfaces grow mould, water systems spread Legionella, coils freeze, steam
//! burns: local codes and licensed practice govern.

use moistair_core::columns::NAN;
use moistair_core::process::coil::{self, CoilRegime, CondensateTemperature, Cooling};
use moistair_core::process::humidify::{self, Absorption, EvaporatingWater, Humidified};
use moistair_core::process::sensible::{self, Sensible};
use moistair_core::process::tower::{self, TowerBalance, TowerWater, WaterTreatment, WaterUse};
use moistair_core::process::{AirStream, Exchange, WetStream, books, mixing, reheat};
use moistair_core::{
    AirWithCondensate, Density, Freezing, HeatFlow, HumidityRatio, MassFlow, Pressure, RelativeHumidity,
    SpecificEnthalpy, Temperature, VolumeFlow,
};

use crate::memory::{Answer, answer, check, read};
use crate::state::{moistair_basis, moistair_state};
use crate::status::{Failure, moistair_error};

/// Condensate leaves at the temperature of the leaving air.
pub const MOISTAIR_CONDENSATE_AT_LEAVING_AIR: i32 = 0;
/// Condensate leaves at the apparatus dew point (moistair_coil_by_bypass_factor only).
pub const MOISTAIR_CONDENSATE_AT_APPARATUS: i32 = 1;
/// Condensate leaves at a given temperature.
pub const MOISTAIR_CONDENSATE_AT_GIVEN: i32 = 2;

/// No water condensed.
pub const MOISTAIR_COIL_DRY: i32 = 0;
/// Water condensed as liquid.
pub const MOISTAIR_COIL_WET: i32 = 1;
/// The coil is cold enough for frost.
pub const MOISTAIR_COIL_FROST: i32 = 2;

/// Water below the melting temperature freezes.
pub const MOISTAIR_FREEZING_EQUILIBRIUM: i32 = 0;
/// Water stays liquid, supercooled, down to -40 °C.
pub const MOISTAIR_FREEZING_SUPERCOOLED: i32 = 1;

/// A wetted medium evaporates water at the wet bulb, where recirculated water settles.
pub const MOISTAIR_WATER_AT_WET_BULB: i32 = 0;
/// A wetted medium evaporates water of a given temperature.
pub const MOISTAIR_WATER_AT_GIVEN: i32 = 1;

/// Most streams that one call takes.
pub const MOISTAIR_MOST_STREAMS: i32 = 16;

/// Moist air with its dry-air mass flow.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_stream {
    /// State of the air.
    pub air: moistair_state,
    /// Dry-air mass flow [kg/s].
    pub dry_air_flow: f64,
}

/// Moist air with the liquid water and ice that it carries.
/// As an input air, liquid and ice are read, and checked; the rest is computed anew.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_air_with_condensate {
    /// State of the gas.
    pub air: moistair_state,
    /// Liquid water per mass of dry air [kg/kg].
    pub liquid: f64,
    /// Ice per mass of dry air [kg/kg].
    pub ice: f64,
    /// Vapor, liquid and ice per mass of dry air [kg/kg].
    pub total_water: f64,
    /// Enthalpy of gas and condensate per mass of dry air [J/kg].
    pub specific_enthalpy: f64,
}

/// Air that may carry condensate, with its dry-air mass flow. The stream of its gas alone is {mixture.air, dry_air_flow}.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_wet_stream {
    /// Gas and condensate.
    pub mixture: moistair_air_with_condensate,
    /// Dry-air mass flow [kg/s].
    pub dry_air_flow: f64,
}

/// What a process gave to the air.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_exchange {
    /// Heat through a surface, into the air [W].
    pub heat: f64,
    /// Water into the air [kg/s]; negative for condensate.
    pub water: f64,
    /// Enthalpy that came with that water [W].
    pub water_enthalpy_flow: f64,
}

/// What a heater or a dry cooler did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_sensible {
    /// The air that leaves.
    pub leaving: moistair_stream,
    /// Heat into the air, no water.
    pub exchange: moistair_exchange,
}

/// What a cooling coil did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_cooling {
    /// The air that leaves.
    pub leaving: moistair_stream,
    /// Heat and water into the air, both negative for a wet coil.
    pub exchange: moistair_exchange,
    /// Heat taken from the air, positive [W].
    pub cooling_load: f64,
    /// Sensible part of the load [W].
    pub sensible: f64,
    /// Latent part of the load [W].
    pub latent: f64,
    /// Condensate, positive [kg/s].
    pub condensate: f64,
    /// Sensible part over the load [1]; NaN without a load.
    pub sensible_heat_ratio: f64,
    /// MOISTAIR_COIL_DRY, MOISTAIR_COIL_WET or MOISTAIR_COIL_FROST.
    pub regime: i32,
    /// 0.
    pub reserved: i32,
}

/// What a coil and the heater behind it did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_reheat {
    /// The coil.
    pub cooling: moistair_cooling,
    /// The heater.
    pub heating: moistair_sensible,
    /// Heat of the heater over the cooling load [1]; NaN without a load.
    pub reheat_fraction: f64,
}

/// What a humidifier did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_humidified {
    /// The air that leaves, with what it could not take up.
    pub leaving: moistair_wet_stream,
    /// Water into the air and its enthalpy, no heat.
    pub exchange: moistair_exchange,
    /// Water that became vapor [kg/s].
    pub evaporated: f64,
    /// Water carried as droplets or ice [kg/s].
    pub carried: f64,
}

/// The water that a tower cools.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_tower_water {
    /// Flow that enters hot [kg/s].
    pub flow: f64,
    /// Temperature of the hot water [°C], 0 to 200.
    pub hot: f64,
    /// Temperature of the cold water [°C], 0 to 200.
    pub cold: f64,
}

/// How a tower loses and renews water besides evaporation.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_water_treatment {
    /// Drift over the circulating flow [1], 0 to 0.05.
    pub drift_fraction: f64,
    /// Concentration of the circulating water over that of the make-up [1], above 1.
    pub cycles_of_concentration: f64,
}

/// Evaporation, drift, blowdown and what makes up for them, all positive.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_water_use {
    /// Evaporation [kg/s].
    pub evaporation: f64,
    /// Drift [kg/s].
    pub drift: f64,
    /// Blowdown [kg/s].
    pub blowdown: f64,
    /// Make-up [kg/s].
    pub make_up: f64,
    /// 1 if drift alone keeps the concentration below the one wanted, so that there is no blowdown; else 0.
    pub limited_by_drift: i32,
    /// 0.
    pub reserved: i32,
}

/// The overall balance of a cooling tower.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_tower_balance {
    /// The air that leaves.
    pub leaving: moistair_stream,
    /// Heat and water into the air.
    pub exchange: moistair_exchange,
    /// Water use.
    pub water: moistair_water_use,
    /// Heat that the water gives up, positive [W].
    pub heat_rejected: f64,
    /// Hot less cold water temperature [K].
    pub range: f64,
    /// Cold water over the wet bulb of the entering air [K].
    pub approach: f64,
    /// Range over range and approach [1]; NaN without either.
    pub effectiveness: f64,
}

/// Whether heat and water close over a process.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_books {
    /// Heat out less heat in less heat exchanged [W].
    pub heat_residual: f64,
    /// Sum of the magnitudes of all heat terms [W].
    pub heat_scale: f64,
    /// What the last place of the temperatures is worth [W].
    pub heat_resolution: f64,
    /// Water out less water in less water exchanged [kg/s].
    pub water_residual: f64,
    /// Sum of the magnitudes of all water terms [kg/s].
    pub water_scale: f64,
    /// 1 if both close to rounding, else 0.
    pub close: i32,
    /// 0.
    pub reserved: i32,
}

impl moistair_stream {
    fn to_core(self) -> Result<AirStream, Failure> {
        Ok(AirStream::new(self.air.to_core()?, mass_flow(self.dry_air_flow))?)
    }
}

impl moistair_air_with_condensate {
    fn to_core(self) -> Result<AirWithCondensate, Failure> {
        Ok(AirWithCondensate::new(self.air.to_core()?, ratio(self.liquid), ratio(self.ice))?)
    }
}

impl moistair_wet_stream {
    fn to_core(self) -> Result<WetStream, Failure> {
        Ok(WetStream::new(self.mixture.to_core()?, mass_flow(self.dry_air_flow))?)
    }
}

impl From<AirStream> for moistair_stream {
    fn from(stream: AirStream) -> Self {
        Self { air: stream.air().into(), dry_air_flow: stream.dry_air_flow().kilograms_per_second() }
    }
}

impl From<AirWithCondensate> for moistair_air_with_condensate {
    fn from(wet: AirWithCondensate) -> Self {
        Self {
            air: wet.air().into(),
            liquid: wet.liquid().kilograms_per_kilogram(),
            ice: wet.ice().kilograms_per_kilogram(),
            total_water: wet.total_water().kilograms_per_kilogram(),
            specific_enthalpy: wet.specific_enthalpy().joules_per_kilogram(),
        }
    }
}

impl From<WetStream> for moistair_wet_stream {
    fn from(stream: WetStream) -> Self {
        Self { mixture: stream.air().into(), dry_air_flow: stream.dry_air_flow().kilograms_per_second() }
    }
}

impl From<Exchange> for moistair_exchange {
    fn from(exchange: Exchange) -> Self {
        Self {
            heat: exchange.heat.watts(),
            water: exchange.water.kilograms_per_second(),
            water_enthalpy_flow: exchange.water_enthalpy_flow.watts(),
        }
    }
}

impl From<moistair_exchange> for Exchange {
    fn from(exchange: moistair_exchange) -> Self {
        Self {
            heat: HeatFlow::from_watts(exchange.heat),
            water: mass_flow(exchange.water),
            water_enthalpy_flow: HeatFlow::from_watts(exchange.water_enthalpy_flow),
        }
    }
}

impl From<Sensible> for moistair_sensible {
    fn from(done: Sensible) -> Self {
        Self { leaving: done.leaving.into(), exchange: done.exchange.into() }
    }
}

impl From<Cooling> for moistair_cooling {
    fn from(done: Cooling) -> Self {
        Self {
            leaving: done.leaving.into(),
            exchange: done.exchange.into(),
            cooling_load: done.cooling_load.watts(),
            sensible: done.sensible.watts(),
            latent: done.latent.watts(),
            condensate: done.condensate.kilograms_per_second(),
            sensible_heat_ratio: done.sensible_heat_ratio().unwrap_or(NAN),
            regime: done.regime as i32,
            reserved: 0,
        }
    }
}

impl From<Humidified> for moistair_humidified {
    fn from(done: Humidified) -> Self {
        Self {
            leaving: done.leaving.into(),
            exchange: done.exchange.into(),
            evaporated: done.evaporated.kilograms_per_second(),
            carried: done.carried.kilograms_per_second(),
        }
    }
}

impl From<WaterUse> for moistair_water_use {
    fn from(water: WaterUse) -> Self {
        Self {
            evaporation: water.evaporation.kilograms_per_second(),
            drift: water.drift.kilograms_per_second(),
            blowdown: water.blowdown.kilograms_per_second(),
            make_up: water.make_up.kilograms_per_second(),
            limited_by_drift: water.limited_by_drift.into(),
            reserved: 0,
        }
    }
}

impl From<TowerBalance> for moistair_tower_balance {
    fn from(balance: TowerBalance) -> Self {
        Self {
            leaving: balance.leaving.into(),
            exchange: balance.exchange.into(),
            water: balance.water.into(),
            heat_rejected: balance.heat_rejected.watts(),
            range: balance.range.kelvins(),
            approach: balance.approach.kelvins(),
            effectiveness: balance.effectiveness().unwrap_or(NAN),
        }
    }
}

impl moistair_tower_water {
    fn to_core(self) -> TowerWater {
        TowerWater { flow: mass_flow(self.flow), hot: celsius(self.hot), cold: celsius(self.cold) }
    }
}

impl moistair_water_treatment {
    fn to_core(self) -> WaterTreatment {
        let Self { drift_fraction, cycles_of_concentration } = self;
        WaterTreatment { drift_fraction, cycles_of_concentration }
    }
}

fn finite<const N: usize>(numbers: [f64; N]) -> bool {
    numbers.iter().all(|number| number.is_finite())
}

impl Answer for moistair_stream {
    fn is_finite(&self) -> bool {
        self.air.is_finite() && finite([self.dry_air_flow])
    }
}

impl Answer for moistair_air_with_condensate {
    fn is_finite(&self) -> bool {
        self.air.is_finite() && finite([self.liquid, self.ice, self.total_water, self.specific_enthalpy])
    }
}

impl Answer for moistair_wet_stream {
    fn is_finite(&self) -> bool {
        self.mixture.is_finite() && finite([self.dry_air_flow])
    }
}

impl Answer for moistair_exchange {
    fn is_finite(&self) -> bool {
        finite([self.heat, self.water, self.water_enthalpy_flow])
    }
}

impl Answer for moistair_sensible {
    fn is_finite(&self) -> bool {
        self.leaving.is_finite() && self.exchange.is_finite()
    }
}

impl Answer for moistair_cooling {
    fn is_finite(&self) -> bool {
        let parts = [self.cooling_load, self.sensible, self.latent, self.condensate];
        self.leaving.is_finite() && self.exchange.is_finite() && finite(parts)
    }
}

impl Answer for moistair_reheat {
    fn is_finite(&self) -> bool {
        self.cooling.is_finite() && self.heating.is_finite()
    }
}

impl Answer for moistair_humidified {
    fn is_finite(&self) -> bool {
        self.leaving.is_finite() && self.exchange.is_finite() && finite([self.evaporated, self.carried])
    }
}

impl Answer for moistair_water_use {
    fn is_finite(&self) -> bool {
        finite([self.evaporation, self.drift, self.blowdown, self.make_up])
    }
}

impl Answer for moistair_tower_balance {
    fn is_finite(&self) -> bool {
        let own = [self.heat_rejected, self.range, self.approach];
        self.leaving.is_finite() && self.exchange.is_finite() && self.water.is_finite() && finite(own)
    }
}

impl Answer for moistair_books {
    fn is_finite(&self) -> bool {
        let heat = [self.heat_residual, self.heat_scale, self.heat_resolution];
        finite(heat) && finite([self.water_residual, self.water_scale])
    }
}

/// A flow that may be without limit.
#[repr(transparent)]
#[derive(Clone, Copy)]
struct Limit(f64);

impl Answer for Limit {
    fn is_finite(&self) -> bool {
        !self.0.is_nan()
    }
}

fn celsius(value: f64) -> Temperature {
    Temperature::from_celsius(value)
}

fn mass_flow(value: f64) -> MassFlow {
    MassFlow::from_kilograms_per_second(value)
}

fn ratio(value: f64) -> HumidityRatio {
    HumidityRatio::from_kilograms_per_kilogram(value)
}

fn enthalpy(value: f64) -> SpecificEnthalpy {
    SpecificEnthalpy::from_joules_per_kilogram(value)
}

fn freezing(selector: i32) -> Result<Freezing, Failure> {
    match selector {
        MOISTAIR_FREEZING_EQUILIBRIUM => Ok(Freezing::Equilibrium),
        MOISTAIR_FREEZING_SUPERCOOLED => Ok(Freezing::Supercooled),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

fn condensate(selector: i32, temperature: f64) -> Result<CondensateTemperature, Failure> {
    match selector {
        MOISTAIR_CONDENSATE_AT_LEAVING_AIR => Ok(CondensateTemperature::LeavingAir),
        MOISTAIR_CONDENSATE_AT_APPARATUS => Ok(CondensateTemperature::Apparatus),
        MOISTAIR_CONDENSATE_AT_GIVEN => Ok(CondensateTemperature::Given(celsius(temperature))),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

/// The streams of an array, on the stack.
struct Streams {
    streams: [WetStream; MOISTAIR_MOST_STREAMS as usize],
    count: usize,
}

impl Streams {
    /// `None` for an empty array.
    unsafe fn read(streams: *const moistair_wet_stream, count: usize) -> Result<Option<Self>, Failure> {
        if count == 0 {
            return Ok(None);
        }
        if count > MOISTAIR_MOST_STREAMS as usize {
            return Err(Failure::TooLong);
        }
        check(streams)?;
        // SAFETY: the caller's array of `count` streams.
        let stream = |i| unsafe { streams.add(i).read() }.to_core();
        let mut all = Self { streams: [stream(0)?; MOISTAIR_MOST_STREAMS as usize], count };
        for (i, place) in all.streams.iter_mut().enumerate().take(count).skip(1) {
            *place = stream(i)?;
        }
        Ok(Some(all))
    }

    fn as_slice(this: Option<&Self>) -> &[WetStream] {
        this.and_then(|all| all.streams.get(..all.count)).unwrap_or_default()
    }
}

/// A stream from its dry-air mass flow.
///
/// air: a state; dry_air_flow: [kg/s], 0 to 1e6; stream: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_stream_from_mass_flow(
    air: *const moistair_state,
    dry_air_flow: f64,
    stream: *mut moistair_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(AirStream::new(unsafe { read(air) }?.to_core()?, mass_flow(dry_air_flow))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(stream, error, call) }
}

/// A stream from its volume flow at the state of the air.
///
/// air: a state; volume_flow: [m³/s], 0 to 1e6; stream: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_stream_from_volume_flow(
    air: *const moistair_state,
    volume_flow: f64,
    stream: *mut moistair_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let flow = VolumeFlow::from_cubic_meters_per_second(volume_flow);
        // SAFETY: the caller's pointers.
        Ok(AirStream::from_volume_flow(unsafe { read(air) }?.to_core()?, flow)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(stream, error, call) }
}

/// A stream from a standard volume flow: that of its dry air at a reference density.
///
/// air: a state; volume_flow: [m³/s], 0 to 1e6; reference_density: [kg/m³] of dry air, such as 1.2; 0.5 to 2; stream: output; error: may be
/// null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_stream_from_standard_volume_flow(
    air: *const moistair_state,
    volume_flow: f64,
    reference_density: f64,
    stream: *mut moistair_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let flow = VolumeFlow::from_cubic_meters_per_second(volume_flow);
        let density = Density::from_kilograms_per_cubic_meter(reference_density);
        // SAFETY: the caller's pointers.
        Ok(AirStream::from_standard_volume_flow(unsafe { read(air) }?.to_core()?, flow, density)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(stream, error, call) }
}

/// A stream that carries liquid water and ice.
///
/// stream: the gas; liquid: [kg/kg] of dry air, 0 to 10; ice: [kg/kg] of dry air, 0 to 10; wet_stream: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_wet_stream_from_stream(
    stream: *const moistair_stream,
    liquid: f64,
    ice: f64,
    wet_stream: *mut moistair_wet_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let gas = unsafe { read(stream) }?.to_core()?;
        let wet = AirWithCondensate::new(gas.air(), ratio(liquid), ratio(ice))?;
        Ok(WetStream::new(wet, gas.dry_air_flow())?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(wet_stream, error, call) }
}

/// Vapor, liquid and ice in equilibrium, from the enthalpy and the water of all phases together.
///
/// specific_enthalpy: [J/kg] of dry air; total_water: [kg/kg] of dry air, 0 to 10; freezing: MOISTAIR_FREEZING_EQUILIBRIUM or
/// MOISTAIR_FREEZING_SUPERCOOLED; basis: pressure and formulation; mixture: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (outside the range of states).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_from_enthalpy_and_water(
    specific_enthalpy: f64,
    total_water: f64,
    freezing: i32,
    basis: moistair_basis,
    mixture: *mut moistair_air_with_condensate,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let freezing = self::freezing(freezing)?;
        let (enthalpy, water) = (enthalpy(specific_enthalpy), ratio(total_water));
        Ok(AirWithCondensate::from_enthalpy_and_water(enthalpy, water, freezing, basis.to_core()?)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(mixture, error, call) }
}

/// Specific enthalpy of liquid water on the datum of a basis.
///
/// temperature: [°C], 0 to 200; basis: pressure and formulation; specific_enthalpy: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_liquid_water_enthalpy(
    temperature: f64,
    basis: moistair_basis,
    specific_enthalpy: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let enthalpy = moistair_core::liquid_water_enthalpy(celsius(temperature), basis.to_core()?)?;
        Ok(enthalpy.joules_per_kilogram())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(specific_enthalpy, error, call) }
}

/// Specific enthalpy of saturated steam, IAPWS-95, on the datum of liquid water at the triple point.
///
/// temperature: [°C], 0 to 200; specific_enthalpy: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_saturated_steam_enthalpy(
    temperature: f64,
    specific_enthalpy: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(humidify::saturated_steam_enthalpy(celsius(temperature))?.joules_per_kilogram());
    // SAFETY: the caller's pointers.
    unsafe { answer(specific_enthalpy, error, call) }
}

/// Heats or cools to a temperature at constant humidity ratio.
///
/// entering: the stream that enters; leaving_temperature: [°C]; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (saturation would be crossed: use a coil).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_sensible_to_temperature(
    entering: *const moistair_stream,
    leaving_temperature: f64,
    done: *mut moistair_sensible,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(sensible::to_temperature(&unsafe { read(entering) }?.to_core()?, celsius(leaving_temperature))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Heats or cools by a heat flow at constant humidity ratio.
///
/// entering: the stream that enters; heat: [W], positive into the air; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207 (heat into no air), 301 (saturation or the range of states would be crossed).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_sensible_with_heat(
    entering: *const moistair_stream,
    heat: f64,
    done: *mut moistair_sensible,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(sensible::with_heat(&unsafe { read(entering) }?.to_core()?, HeatFlow::from_watts(heat))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// A cooling coil that leaves a given state.
///
/// entering: the stream that enters; leaving: the state that leaves; condensate: where the condensate temperature comes from,
/// MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may
/// be null.
/// Returns 0, 1xx, 2xx, 301 (the leaving air is warmer or moister).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_to_state(
    entering: *const moistair_stream,
    leaving: *const moistair_state,
    condensate: i32,
    condensate_temperature: f64,
    done: *mut moistair_cooling,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let condensate = self::condensate(condensate, condensate_temperature)?;
        // SAFETY: the caller's pointers.
        Ok(coil::to_state(&unsafe { read(entering) }?.to_core()?, &unsafe { read(leaving) }?.to_core()?, condensate)?
            .into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// A cooling coil known by its apparatus dew point and bypass factor.
///
/// entering: the stream that enters; apparatus_dew_point: [°C], -40 to 150; bypass_factor: [1], 0 to 1; condensate: where the condensate
/// temperature comes from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only;
/// done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the apparatus is warmer than the air).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_by_bypass_factor(
    entering: *const moistair_stream,
    apparatus_dew_point: f64,
    bypass_factor: f64,
    condensate: i32,
    condensate_temperature: f64,
    done: *mut moistair_cooling,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, condensate) =
            (unsafe { read(entering) }?.to_core()?, self::condensate(condensate, condensate_temperature)?);
        Ok(coil::by_bypass_factor(&entering, celsius(apparatus_dew_point), bypass_factor, condensate)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The coil between two measured states; differences of humidity ratio within a dead band count as noise of the sensors.
///
/// entering: the stream that enters; leaving: the state that leaves; condensate: where the condensate temperature comes from,
/// MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only; dead_band: [kg/kg], 0 to
/// 10; done: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_between(
    entering: *const moistair_stream,
    leaving: *const moistair_state,
    condensate: i32,
    condensate_temperature: f64,
    dead_band: f64,
    done: *mut moistair_cooling,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let condensate = self::condensate(condensate, condensate_temperature)?;
        // SAFETY: the caller's pointers.
        Ok(coil::between(
            &unsafe { read(entering) }?.to_core()?,
            &unsafe { read(leaving) }?.to_core()?,
            condensate,
            ratio(dead_band),
        )?
        .into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Reaches a state by cooling to its humidity ratio, then heating. Codes restrict simultaneous heating and cooling.
///
/// entering: the stream that enters; target: the state to reach; coil_leaving_relative_humidity: [1] of the air between coil and heater,
/// 0.2 to 1; condensate: where the condensate temperature comes from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150,
/// read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the target is moister, or cooler than the coil would leave).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_reheat_to_state(
    entering: *const moistair_stream,
    target: *const moistair_state,
    coil_leaving_relative_humidity: f64,
    condensate: i32,
    condensate_temperature: f64,
    done: *mut moistair_reheat,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let condensate = self::condensate(condensate, condensate_temperature)?;
        let humidity = RelativeHumidity::from_fraction(coil_leaving_relative_humidity);
        // SAFETY: the caller's pointers.
        let done = reheat::to_state(
            &unsafe { read(entering) }?.to_core()?,
            &unsafe { read(target) }?.to_core()?,
            humidity,
            condensate,
        )?;
        let reheat_fraction = done.reheat_fraction().unwrap_or(NAN);
        Ok(moistair_reheat { cooling: done.cooling.into(), heating: done.heating.into(), reheat_fraction })
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Adds steam; what the air cannot take up is carried.
///
/// entering: the stream that enters; steam: [kg/s], 0 to 1e6; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; done:
/// output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_with_steam(
    entering: *const moistair_stream,
    steam: f64,
    steam_enthalpy: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(humidify::steam(&unsafe { read(entering) }?.to_core()?, mass_flow(steam), enthalpy(steam_enthalpy))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Adds steam up to a humidity ratio.
///
/// entering: the stream that enters; humidity_ratio: [kg/kg]; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; done:
/// output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (below what enters).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_with_steam_to_humidity_ratio(
    entering: *const moistair_stream,
    humidity_ratio: f64,
    steam_enthalpy: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (target, enthalpy) = (ratio(humidity_ratio), enthalpy(steam_enthalpy));
        // SAFETY: the caller's pointers.
        Ok(humidify::steam_to_humidity_ratio(&unsafe { read(entering) }?.to_core()?, target, enthalpy)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Adds steam up to a relative humidity over the stable surface.
///
/// entering: the stream that enters; relative_humidity: [1], 0 to 1; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; done:
/// output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (below what enters, or never reached).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_with_steam_to_relative_humidity(
    entering: *const moistair_stream,
    relative_humidity: f64,
    steam_enthalpy: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let target = RelativeHumidity::from_fraction(relative_humidity);
        let enthalpy = enthalpy(steam_enthalpy);
        // SAFETY: the caller's pointers.
        Ok(humidify::steam_to_relative_humidity(&unsafe { read(entering) }?.to_core()?, target, enthalpy)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The steam flow at which the air first saturates.
///
/// entering: the stream that enters; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; limit: output [kg/s], infinite if
/// there is none; error: may be null.
/// Returns 0, 1xx, 2xx, 207.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_steam_limit(
    entering: *const moistair_stream,
    steam_enthalpy: f64,
    limit: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let limit = humidify::steam_limit(&unsafe { read(entering) }?.to_core()?, enthalpy(steam_enthalpy))?;
        Ok(Limit(match limit {
            Absorption::UpTo(flow) => flow.kilograms_per_second(),
            Absorption::Unlimited => f64::INFINITY,
        }))
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(limit.cast::<Limit>(), error, call) }
}

/// Sprays liquid water; what equilibrium does not evaporate is carried.
///
/// entering: the stream that enters; water: [kg/s], 0 to 1e6; water_temperature: [°C], 0 to 200; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_with_spray(
    entering: *const moistair_stream,
    water: f64,
    water_temperature: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(humidify::spray(&unsafe { read(entering) }?.to_core()?, mass_flow(water), celsius(water_temperature))?
            .into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// A wetted medium or full spray of a known saturation effectiveness.
///
/// entering: the stream that enters; saturation_effectiveness: [1], 0 to 1; water: MOISTAIR_WATER_AT_WET_BULB or MOISTAIR_WATER_AT_GIVEN;
/// water_temperature: [°C], 0 to 200, read for MOISTAIR_WATER_AT_GIVEN only; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the wet bulb is below freezing), 31x.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_with_medium(
    entering: *const moistair_stream,
    saturation_effectiveness: f64,
    water: i32,
    water_temperature: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let water = match water {
            MOISTAIR_WATER_AT_WET_BULB => EvaporatingWater::AtWetBulb,
            MOISTAIR_WATER_AT_GIVEN => EvaporatingWater::Given(celsius(water_temperature)),
            _ => return Err(Failure::UnknownSelector(water)),
        };
        // SAFETY: the caller's pointers.
        Ok(humidify::evaporative(&unsafe { read(entering) }?.to_core()?, saturation_effectiveness, water)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Mixes streams at one pressure adiabatically, with all condensate, then phase equilibrium.
///
/// streams: the streams that enter; those without flow take no part; count: number of streams, to MOISTAIR_MOST_STREAMS; leaving: output;
/// error: may be null.
/// Returns 0, 1xx, 2xx, 205, 206, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_mix(
    streams: *const moistair_wet_stream,
    count: usize,
    leaving: *mut moistair_wet_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's array.
        let streams = unsafe { Streams::read(streams, count) }?;
        let streams = Streams::as_slice(streams.as_ref());
        Ok(mixing::adiabatic(streams)?.leaving.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(leaving, error, call) }
}

/// Mixes streams adiabatically at a given outlet pressure.
///
/// streams: the streams that enter; those without flow take no part; count: number of streams, to MOISTAIR_MOST_STREAMS; pressure: of the
/// outlet [Pa]; freezing: MOISTAIR_FREEZING_EQUILIBRIUM or MOISTAIR_FREEZING_SUPERCOOLED; leaving: output; error: may be null.
/// Returns 0, 1xx, 2xx, 205, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_mix_at(
    streams: *const moistair_wet_stream,
    count: usize,
    pressure: f64,
    freezing: i32,
    leaving: *mut moistair_wet_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let freezing = self::freezing(freezing)?;
        // SAFETY: the caller's array.
        let streams = unsafe { Streams::read(streams, count) }?;
        let streams = Streams::as_slice(streams.as_ref());
        let pressure = Pressure::from_pascals(pressure);
        Ok(mixing::adiabatic_at(streams, pressure, freezing)?.leaving.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(leaving, error, call) }
}

/// Whether heat and water close between streams that enter, one that leaves and what was exchanged.
///
/// streams: the streams that enter; those without flow take no part; count: number of streams, to MOISTAIR_MOST_STREAMS; leaving: the
/// stream that leaves; exchange: what was exchanged; books: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_balance(
    streams: *const moistair_wet_stream,
    count: usize,
    leaving: *const moistair_wet_stream,
    exchange: *const moistair_exchange,
    books: *mut moistair_books,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's array.
        let streams = unsafe { Streams::read(streams, count) }?;
        let streams = Streams::as_slice(streams.as_ref());
        // SAFETY: the caller's pointers.
        let exchange = unsafe { read(exchange) }?;
        if !exchange.is_finite() {
            return Err(moistair_core::Error::NotFinite { quantity: moistair_core::Quantity::HeatFlow }.into());
        }
        // SAFETY: the caller's pointers.
        let books = books::balance(streams, &unsafe { read(leaving) }?.to_core()?, &exchange.into());
        Ok(moistair_books {
            heat_residual: books.heat_residual.watts(),
            heat_scale: books.heat_scale.watts(),
            heat_resolution: books.heat_resolution.watts(),
            water_residual: books.water_residual.kilograms_per_second(),
            water_scale: books.water_scale.kilograms_per_second(),
            close: books.close().into(),
            reserved: 0,
        })
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(books, error, call) }
}

/// Blowdown and make-up for an evaporation; also for humidifiers with bleed.
///
/// evaporation: [kg/s], 0 to 1e6; circulating: circulating water [kg/s], 0 to 1e6; treatment: drift and concentration; water: output;
/// error: may be null.
/// Returns 0, 1xx, 2xx, 301 (one cycle of concentration).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_water_use(
    evaporation: f64,
    circulating: f64,
    treatment: moistair_water_treatment,
    water: *mut moistair_water_use,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(tower::water_use(mass_flow(evaporation), mass_flow(circulating), treatment.to_core())?.into());
    // SAFETY: the caller's pointers.
    unsafe { answer(water, error, call) }
}

/// Balance of a tower with a known air flow; the air is taken to leave saturated.
///
/// entering: the air that enters; water: the water that is cooled; treatment: drift and concentration; balance: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_with_air_flow(
    entering: *const moistair_stream,
    water: moistair_tower_water,
    treatment: moistair_water_treatment,
    balance: *mut moistair_tower_balance,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(tower::with_air_flow(&unsafe { read(entering) }?.to_core()?, water.to_core(), treatment.to_core())?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(balance, error, call) }
}

/// Balance of a tower with a known leaving state: the dry-air flow that it takes.
///
/// entering: the state that enters; leaving: the state that leaves; water: the water that is cooled; treatment: drift and concentration;
/// balance: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_with_leaving_air(
    entering: *const moistair_state,
    leaving: *const moistair_state,
    water: moistair_tower_water,
    treatment: moistair_water_treatment,
    balance: *mut moistair_tower_balance,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, leaving) = (unsafe { read(entering) }?.to_core()?, unsafe { read(leaving) }?.to_core()?);
        Ok(tower::with_leaving_air(&entering, &leaving, water.to_core(), treatment.to_core())?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(balance, error, call) }
}

const _: () = {
    assert!(size_of::<moistair_stream>() == 112 && size_of::<moistair_exchange>() == 24);
    assert!(size_of::<moistair_air_with_condensate>() == 136 && size_of::<moistair_wet_stream>() == 144);
    assert!(size_of::<moistair_sensible>() == 136 && size_of::<moistair_cooling>() == 184);
    assert!(core::mem::offset_of!(moistair_cooling, regime) == 176);
    assert!(size_of::<moistair_reheat>() == 328 && size_of::<moistair_humidified>() == 184);
    assert!(size_of::<moistair_tower_water>() == 24 && size_of::<moistair_water_treatment>() == 16);
    assert!(size_of::<moistair_water_use>() == 40 && size_of::<moistair_tower_balance>() == 208);
    assert!(size_of::<moistair_books>() == 48);
    assert!(CoilRegime::Dry as i32 == MOISTAIR_COIL_DRY && CoilRegime::Frost as i32 == MOISTAIR_COIL_FROST);
    assert!(CoilRegime::Wet as i32 == MOISTAIR_COIL_WET);
    assert!(Freezing::Equilibrium as i32 == MOISTAIR_FREEZING_EQUILIBRIUM);
    assert!(Freezing::Supercooled as i32 == MOISTAIR_FREEZING_SUPERCOOLED);
};
