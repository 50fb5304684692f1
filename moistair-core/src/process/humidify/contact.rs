//! Air in contact with well-mixed water whose temperature is what the heats make of it: wetted media, washers.
//!
//! The air is led toward saturation at the temperature of the water t_w by the effectiveness ε, t₂ = t₁ − ε (t₁ − t_w). Heat and vapor
//! take the same way (Lewis factor one), so that the air gains ε (h_s − h₁ − (W_s − W₁) h_w) of heat besides the water that it takes
//! up; W₂ follows from the heat book. Without other heat t_w is the wet bulb.

use super::{Humidified, infeasible, parts};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::process::film::Site;
use crate::process::{AirStream, Exchange, WetStream, melting_temperature};
use crate::quantity::{HumidityRatio, MassFlow, SpecificEnthalpy};
use crate::real::{Scalar, k};
use crate::solve;
use crate::state::construct::{greatest_humidity_ratio, search_ratio};
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// Air that meets water.
pub(in crate::process) struct Contact<S> {
    entering: AirStream<S>,
    flow: S,
    effectiveness: S,
    site: Site<S>,
    melting: S,
}

/// What the contact does with water of one temperature.
#[derive(Clone, Copy)]
pub(in crate::process) struct Met<S> {
    /// Of the water, °C, and its enthalpy.
    pub water: S,
    pub water_enthalpy: S,
    /// Of the leaving air, °C.
    pub leaving: S,
    /// Leaving humidity ratio, fog included.
    ratio: S,
    /// Whether there is none.
    clear: bool,
    /// Heat into the air, W, besides the enthalpy of the water taken up.
    pub heat: S,
    /// Water taken up, kg/s; negative where vapor of the air condenses on it.
    pub evaporated: S,
}

impl<S: Scalar> Met<S> {
    /// What droplets, carried along at the temperature of the leaving air, gain.
    pub fn heat_of_droplets(&self, contact: &Contact<S>, droplets: S) -> S {
        if droplets > k(0.0) {
            droplets * (contact.site.water_enthalpy(self.leaving) - self.water_enthalpy)
        } else {
            k(0.0)
        }
    }
}

impl<S: Scalar> Contact<S> {
    /// The effectiveness is checked by the caller.
    pub fn new(entering: &AirStream<S>, effectiveness: S) -> Result<Self, Error> {
        let air = entering.air();
        // Under pressure water melts below 0 °C; no water that enters a process is so cold.
        let melting = melting_temperature(&air).at_least(k(Quantity::WaterTemperature.limits().0));
        let flow = entering.flow()?;
        Ok(Self { entering: *entering, flow, effectiveness, site: Site::of(&air), melting })
    }

    /// Below which the water freezes, °C.
    pub fn melting(&self) -> S {
        self.melting
    }

    pub fn met(&self, water: S) -> Met<S> {
        let air = self.entering.air();
        let (h1, w1) = parts(&air);
        let film = self.site.film(water);
        let water_enthalpy = self.site.water_enthalpy(water);
        let start = air.dry_bulb().celsius();
        let leaving = start - self.effectiveness * (start - water);
        let gain = self.effectiveness * (film.enthalpy - h1 - (film.humidity_ratio - w1) * water_enthalpy);
        let idle = self.effectiveness == k(0.0);
        let (ratio, limit) = if idle { (w1, w1) } else { ratio_with_fog(&air, leaving, water_enthalpy, gain) };
        // In nearly dry air rounding may carry it below zero.
        let ratio = ratio.at_least(k(0.0));
        Met {
            water,
            water_enthalpy,
            leaving,
            ratio,
            clear: ratio <= limit && (idle || self.melting <= leaving),
            heat: self.flow * gain,
            evaporated: self.flow * (ratio - w1),
        }
    }

    /// The temperature of the water at which the heat that the air takes is the heat supplied. `None` where the water would freeze
    /// (`Err` of the heat that it then lacks) or the air could not take it all.
    pub fn balanced(&self, supplied: impl Fn(&Met<S>) -> S) -> Result<Met<S>, Unbalanced> {
        let excess = |celsius: S| {
            let met = self.met(celsius);
            met.heat - supplied(&met)
        };
        let (cold, warm) = (self.melting, self.site.warmest());
        let (least, most) = (excess(cold), excess(warm));
        let freezes = least > k(0.0);
        if freezes {
            return Err(Unbalanced::Freezes);
        }
        let within = least <= k(0.0) && k::<S>(0.0) <= most && cold < warm;
        if !within {
            return Err(Unbalanced::TooMuchHeat);
        }
        let celsius = solve::between((cold, least), (warm, most), solve::temperature_resolution(), excess);
        Ok(self.met(celsius))
    }

    /// The leaving air with the droplets that it carries, and its books.
    pub fn leaving(&self, met: &Met<S>, droplets: S) -> Result<Humidified<S>, Error> {
        let air = self.entering.air();
        let (h1, w1) = parts(&air);
        let water = met.evaporated + droplets;
        let heat = met.heat + met.heat_of_droplets(self, droplets);
        let exchange = Exchange::new(heat, water, water * met.water_enthalpy);
        let total = checked(Quantity::TotalWater, w1 + water / self.flow)?;
        // Droplets that freeze come to equilibrium.
        let wet = if met.clear && (droplets == k(0.0) || self.melting <= met.leaving) {
            let leaving = MoistAir::assemble(met.leaving, air.pressure().pascals(), met.ratio, air.formulation());
            AirWithCondensate::carrying(leaving, droplets / self.flow, k(0.0))
        } else {
            let enthalpy = h1 + (heat + water * met.water_enthalpy) / self.flow;
            AirWithCondensate::from_enthalpy_and_water(
                SpecificEnthalpy::from_joules_per_kilogram(enthalpy),
                HumidityRatio::from_kilograms_per_kilogram(total),
                Freezing::Equilibrium,
                air.basis(),
            )?
        };
        let carried = self.flow * (wet.liquid().kilograms_per_kilogram() + wet.ice().kilograms_per_kilogram());
        Ok(Humidified {
            leaving: WetStream { air: wet, dry_air_flow: self.flow },
            exchange,
            evaporated: MassFlow::from_kilograms_per_second(water - carried),
            carried: MassFlow::from_kilograms_per_second(carried),
        })
    }

    /// That the water would freeze, of the wet bulb of the entering air.
    pub fn freezes(&self) -> Error {
        let air = self.entering.air();
        let (_, warmest) = air.formulation().limits(Quantity::WetBulb);
        air.wet_bulb().map_or_else(
            |error| error,
            |wet_bulb| infeasible(Quantity::WetBulb, wet_bulb.celsius(), self.melting, k(warmest)),
        )
    }

    /// The warmest water under this air, °C.
    pub fn warmest(&self) -> S {
        self.site.warmest()
    }
}

/// Why no temperature of the water balances the heats.
pub(in crate::process) enum Unbalanced {
    /// The water would be below the melting temperature.
    Freezes,
    /// More heat than the air takes up at the warmest.
    TooMuchHeat,
}

/// Humidity ratio of air at the temperature of `mixture`, up to `limit`, after it took up water and a heat per dry air:
/// h(t₂, W₂) − W₂ h_w = h₁ − W₁ h_w + q.
pub(super) fn ratio_of_heat<M: Mixture<S>, S: Scalar>(
    mixture: &M,
    entering: &MoistAir<S>,
    limit: S,
    water_enthalpy: S,
    heat: S,
) -> S {
    let (h1, w1) = parts(entering);
    search_ratio(mixture, entering.pressure().pascals(), limit, |w, gas| {
        ((gas.enthalpy - h1 - heat) - (w - w1) * water_enthalpy, gas.enthalpy_of_water - water_enthalpy)
    })
}

/// The same beyond saturation too, where the vapor counts with the enthalpy that it has there, and the limit.
fn ratio_with_fog<S: Scalar>(air: &MoistAir<S>, leaving: S, water_enthalpy: S, heat: S) -> (S, S) {
    let (h1, w1) = parts(air);
    let pressure = air.pressure().pascals();
    with_mixture!(air.formulation(), S, M => {
        let mixture = M::<S>::at(leaving);
        let limit = greatest_humidity_ratio(&mixture, leaving, pressure);
        let saturated = mixture.gas(pressure, limit);
        let over = h1 + heat - saturated.enthalpy + (limit - w1) * water_enthalpy;
        if over > k(0.0) {
            return (limit + over / (saturated.enthalpy_of_water - water_enthalpy), limit);
        }
        (ratio_of_heat(&mixture, air, limit, water_enthalpy, heat), limit)
    })
}
