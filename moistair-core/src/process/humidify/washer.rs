//! Air washers: much water, of any temperature, in short contact with the air.

use super::contact::{Contact, Unbalanced};
use super::{AirStream, Humidified, infeasible, water_enthalpy};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{HeatFlow, MassFlow, Temperature};
use crate::real::{Scalar, k};

/// A washer and its water.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Washer<S = f64> {
    /// Water sprayed.
    pub water: MassFlow<S>,
    /// Its temperature: chilled below the dew point it takes water out of the air.
    pub temperature: Temperature<S>,
    /// How far the air comes toward the temperature of the water that leaves, (t₁ − t₂) / (t₁ − t_w).
    pub effectiveness: S,
    /// Power of the pump, which ends as heat in the water.
    pub pump_heat: HeatFlow<S>,
    /// Droplets that pass the eliminators, over the water sprayed.
    pub carry_over_fraction: S,
}

/// Whether a washer gives water to the air or takes it.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum Moistening {
    /// The air takes up water, or none.
    Humidifies = 0,
    /// Vapor of the air condenses on water below its dew point.
    Dehumidifies = 1,
}

/// What a washer did.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Washed<S = f64> {
    /// The air with its books: heat and water of the spray.
    pub air: Humidified<S>,
    /// Water that falls back: what is sprayed less what evaporates (or with what condenses) and is carried over.
    pub leaving_water: MassFlow<S>,
    /// Its temperature.
    pub leaving_water_temperature: Temperature<S>,
    /// What the water gains, its pump counted: ṁ h of what leaves less that of what enters; negative where the air cools the water. Less the
    /// enthalpy of what evaporated, on the datum of liquid water: not the load of a chiller or heater, which is that of the sprayed flow.
    pub heat_to_water: HeatFlow<S>,
    /// Which way the water goes.
    pub moistening: Moistening,
}

/// Washes air: heats or cools, humidifies or dehumidifies, by the temperature of the water.
///
/// The water is well mixed, of one temperature t_w throughout, that at which it leaves; air and water balance there:
/// L h_w(t) + P = ṁ (h₂ − h₁) + (L − E) h_w(t_w). Full effectiveness is equilibrium, as [`spray`](super::spray()) of the same water with its
/// surplus drained; with much water t_w is that which enters, the apparatus dew point of a coil; what circulates without heat settles at
/// the wet bulb.
///
/// Accuracy: Lewis factor one, and one temperature of the water; several banks of sprays in counterflow do better than one such stage:
/// wash the leaving air again with colder water. Bounded work: one search, at most 80 evaluations.
///
/// Caution: washers spread *Legionella* where their water is not kept clean; droplets behind eliminators grow mould.
///
/// # Errors
/// [`Error::Infeasible`] where the water would freeze, is hotter than the air can take, or would all evaporate; [`Error::NoFlow`],
/// [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, humidify::{self, Moistening, Washer}};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(30.0), RelativeHumidity::from_percent(50.0), site)?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(2.0))?;
/// let washer = |celsius| Washer {
///     water: MassFlow::from_kilograms_per_second(3.0),
///     temperature: Temperature::from_celsius(celsius),
///     effectiveness: 0.9,
///     pump_heat: HeatFlow::from_watts(1_500.0),
///     carry_over_fraction: 0.0,
/// };
/// // The dew point is 18.4 °C.
/// assert_eq!(humidify::wash(&entering, washer(25.0))?.moistening, Moistening::Humidifies);
/// assert_eq!(humidify::wash(&entering, washer(7.0))?.moistening, Moistening::Dehumidifies);
/// assert!(humidify::wash(&entering, washer(-5.0)).is_err()); // ice
/// # Ok::<(), Error>(())
/// ```
pub fn wash<S: Scalar>(entering: &AirStream<S>, washer: Washer<S>) -> Result<Washed<S>, Error> {
    let sprayed = checked(Quantity::WaterFlow, washer.water.kilograms_per_second())?;
    let effectiveness = checked(Quantity::SaturationEffectiveness, washer.effectiveness)?;
    let pump = checked(Quantity::PumpHeat, washer.pump_heat.watts())?;
    let fraction = checked(Quantity::DriftFraction, washer.carry_over_fraction)?;
    let brought = water_enthalpy(&entering.air(), washer.temperature)?;
    let contact = Contact::new(entering, effectiveness)?;
    let droplets = fraction * sprayed;
    let met = contact
        .balanced(|met| pump + sprayed * (brought - met.water_enthalpy) - met.heat_of_droplets(&contact, droplets));
    let met = met.map_err(|why| match why {
        Unbalanced::Freezes => contact.freezes(),
        Unbalanced::TooMuchHeat => {
            infeasible(Quantity::WaterTemperature, washer.temperature.celsius(), contact.melting(), contact.warmest())
        }
    })?;
    let falls = sprayed - met.evaporated - droplets;
    if falls < k(0.0) {
        let (_, most) = Quantity::WaterFlow.limits();
        return Err(infeasible(Quantity::WaterFlow, sprayed, met.evaporated + droplets, k(most)));
    }
    let moistening = if met.evaporated < k(0.0) { Moistening::Dehumidifies } else { Moistening::Humidifies };
    Ok(Washed {
        air: contact.leaving(&met, droplets)?,
        leaving_water: MassFlow::from_kilograms_per_second(falls),
        leaving_water_temperature: Temperature::from_celsius(met.water),
        heat_to_water: HeatFlow::from_watts(falls * met.water_enthalpy - sprayed * brought),
        moistening,
    })
}
