//! A short tour: a state of moist air, what can be read from it, and a coil that cools it.

use moistair_core::process::AirStream;
use moistair_core::process::coil::{self, CondensateTemperature};
use moistair_core::{Error, Length, MoistAir, Pressure, RelativeHumidity, Temperature, VolumeFlow};

fn main() -> Result<(), Error> {
    let site = Pressure::at_elevation(Length::from_meters(1_600.0))?;
    let state = |celsius, percent| {
        MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), RelativeHumidity::from_percent(percent), site)
    };
    let outdoor = state(34.0, 38.0)?;
    println!("wet bulb   {:.2} °C", outdoor.wet_bulb()?.celsius());
    println!("dew point  {:.2} °C", outdoor.dew_point()?.celsius());
    println!("enthalpy   {:.2} kJ/kg", outdoor.specific_enthalpy().kilojoules_per_kilogram());

    let entering = AirStream::from_volume_flow(outdoor, VolumeFlow::from_cubic_meters_per_second(5.0))?;
    let cooling = coil::to_state(&entering, &state(13.0, 95.0)?, CondensateTemperature::LeavingAir)?;
    println!("load       {:.2} kW", cooling.cooling_load.kilowatts());
    println!("condensate {:.2} kg/h", cooling.condensate.kilograms_per_hour());
    Ok(())
}
