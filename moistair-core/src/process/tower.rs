//! Wet cooling towers: the overall balance of heat and water, and the use of water.
//!
//! Water enters hot at t₁ and leaves cold at t₂; ṁ_w (h_w1 − h_w2) = ṁ_a ((h₂ − h₁) − (W₂ − W₁) h_w2): what evaporates is taken
//! out of the cold end, and drift leaves with the enthalpy of the cold water.
//!
//! Towers spread *Legionella* if they are not treated, cleaned and fitted with drift eliminators: national hygiene rules and licensed
//! practice govern. Not modeled: natural draft, by-pass, freezing basins.

use super::{AirStream, Exchange, WetStream, infeasible, parts};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::quantity::{HeatFlow, MassFlow, Temperature, TemperatureDifference};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;
use crate::state::MoistAir;
use crate::state::condensate::condensed_enthalpy;
use crate::state::property::saturates;

/// The water that a tower cools.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct TowerWater<S = f64> {
    /// Flow that enters hot.
    pub flow: MassFlow<S>,
    /// Temperature of the hot water.
    pub hot: Temperature<S>,
    /// Temperature of the cold water.
    pub cold: Temperature<S>,
}

/// How a tower loses and renews water besides evaporation.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct WaterTreatment<S = f64> {
    /// Drift over the circulating flow. With eliminators 0.000 05 to 0.0002, without up to 0.003 (common practice, no source).
    pub drift_fraction: S,
    /// Concentration of the circulating water over that of the make-up, above one.
    pub cycles_of_concentration: S,
}

/// The overall balance of a tower.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct TowerBalance<S = f64> {
    /// The air that leaves.
    pub leaving: AirStream<S>,
    /// Heat and water into the air; the heat book counts all of it as the enthalpy of the cold water evaporated plus heat.
    pub exchange: Exchange<S>,
    /// Heat that the water gives up, positive: ṁ_w (h_w1 − h_w2).
    pub heat_rejected: HeatFlow<S>,
    /// Water use.
    pub water: WaterUse<S>,
    /// t₁ − t₂ of the water.
    pub range: TemperatureDifference<S>,
    /// Cold water over the wet bulb of the entering air.
    pub approach: TemperatureDifference<S>,
}

impl<S: Scalar> TowerBalance<S> {
    /// Range over range and approach; `None` without either.
    #[must_use]
    pub fn effectiveness(&self) -> Option<S> {
        let whole = self.range.kelvins() + self.approach.kelvins();
        (whole != k(0.0)).then(|| self.range.kelvins() / whole)
    }
}

/// Evaporation, drift, blowdown and what makes up for them. All positive.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct WaterUse<S = f64> {
    /// Evaporation E.
    pub evaporation: MassFlow<S>,
    /// Drift D.
    pub drift: MassFlow<S>,
    /// Blowdown B = E / (C − 1) − D, not below zero.
    pub blowdown: MassFlow<S>,
    /// Make-up M = E + D + B.
    pub make_up: MassFlow<S>,
    /// Drift alone already keeps the concentration below the one wanted: no blowdown is needed.
    pub limited_by_drift: bool,
}

/// Water use for an evaporation, a circulating flow and the treatment; also for humidifiers with bleed.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`]; [`Error::Infeasible`] at one cycle of concentration, which takes endless blowdown.
///
/// ```
/// use moistair_core::MassFlow;
/// use moistair_core::process::tower::{WaterTreatment, water_use};
/// let flow = MassFlow::<f64>::from_kilograms_per_second;
/// let treatment = WaterTreatment { drift_fraction: 0.002, cycles_of_concentration: 4.0 };
/// let used = water_use(flow(0.346), flow(15.0), treatment)?;
/// assert!((used.make_up.kilograms_per_second() - 0.4613).abs() < 1e-4);
/// assert!(water_use(flow(0.346), flow(15.0), WaterTreatment { cycles_of_concentration: 1.0, ..treatment }).is_err());
/// # Ok::<(), moistair_core::Error>(())
/// ```
pub fn water_use<S: Scalar>(
    evaporation: MassFlow<S>,
    circulating: MassFlow<S>,
    treatment: WaterTreatment<S>,
) -> Result<WaterUse<S>, Error> {
    let evaporation = checked(Quantity::WaterFlow, evaporation.kilograms_per_second())?;
    let circulating = checked(Quantity::WaterFlow, circulating.kilograms_per_second())?;
    let fraction = checked(Quantity::DriftFraction, treatment.drift_fraction)?;
    let cycles = checked(Quantity::CyclesOfConcentration, treatment.cycles_of_concentration)?;
    if cycles <= k(1.0) {
        let (_, max) = Quantity::CyclesOfConcentration.limits();
        return Err(Error::Infeasible { quantity: Quantity::CyclesOfConcentration, value: 1.0, min: 1.0, max });
    }
    let drift = circulating * fraction;
    let wanted = evaporation / (cycles - k(1.0)) - drift;
    let blowdown = wanted.at_least(k(0.0));
    let flow = MassFlow::from_kilograms_per_second;
    Ok(WaterUse {
        evaporation: flow(evaporation),
        drift: flow(drift),
        blowdown: flow(blowdown),
        make_up: flow(evaporation + drift + blowdown),
        limited_by_drift: wanted < k(0.0),
    })
}

/// Balance with a known air flow: the air is taken to leave saturated, which over-predicts evaporation where it does
/// not (common practice, no source). Without water the air leaves as it came: a tower at rest, whatever its thermometers read.
///
/// # Errors
/// [`Error::Infeasible`] when the water is not cooled, or so little air would leave warmer than the hot water; [`Error::NoFlow`],
/// [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, tower::{TowerWater, WaterTreatment, with_air_flow}};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let outdoor = MoistAir::from_dry_bulb(Temperature::from_celsius(30.0), RelativeHumidity::from_percent(50.0), site)?;
/// let entering = AirStream::from_volume_flow(outdoor, VolumeFlow::from_cubic_meters_per_second(10.0))?;
/// let treatment = WaterTreatment { drift_fraction: 0.0001, cycles_of_concentration: 4.0 };
/// let (flow, celsius) = (MassFlow::from_kilograms_per_second, Temperature::from_celsius);
/// let water = TowerWater { flow: flow(12.0), hot: celsius(32.0), cold: celsius(27.0) };
/// let running = with_air_flow(&entering, water, treatment)?;
/// assert!((running.heat_rejected.kilowatts() - 251.0).abs() < 1.0);
/// assert!((running.water.evaporation.kilograms_per_second() - 0.115).abs() < 0.001);
/// let still = with_air_flow(&entering, TowerWater { flow: flow(0.0), ..water }, treatment)?;
/// assert_eq!((still.leaving, still.water.make_up), (entering, flow(0.0)));
/// let calm = AirStream::new(outdoor, flow(0.0))?;
/// assert_eq!(with_air_flow(&calm, water, treatment), Err(Error::NoFlow));
/// # Ok::<(), Error>(())
/// ```
pub fn with_air_flow<S: Scalar>(
    entering: &AirStream<S>,
    water: TowerWater<S>,
    treatment: WaterTreatment<S>,
) -> Result<TowerBalance<S>, Error> {
    let air = entering.air();
    let side = WaterSide::new(&air, water)?;
    if water.flow.kilograms_per_second() == k(0.0) {
        return side.balance(entering, air, treatment);
    }
    let flow = entering.flow()?;
    let pressure = air.pressure().pascals();
    let (h1, w1) = parts(&air);
    // h₂ − W₂ h_w2 that the leaving air must have.
    let target = (h1 - w1 * side.cold) + side.heat / flow;
    // It leaves no warmer than the hot water.
    let (coldest, _) = air.formulation().limits(Quantity::DewPoint);
    let (_, warmest) = air.formulation().limits(Quantity::DryBulb);
    let (coldest, warmest) = (k::<S>(coldest), k::<S>(warmest).at_most(water.hot.celsius()));
    let leaving = with_mixture!(air.formulation(), S, M => {
        // What saturated air has beyond the target, the slope of that, and the humidity ratio that is left without it.
        let saturated = |celsius: S| {
            let mixture = M::<S>::at(celsius);
            let saturation = mixture.saturation(pressure, Surface::Liquid);
            let ratio = saturation.humidity_ratio;
            let gas = mixture.gas(pressure, ratio);
            let latent = gas.enthalpy_of_water - side.cold;
            let beyond = S::select(
                saturates(saturation.mole_fraction),
                gas.enthalpy - ratio * side.cold - target,
                S::infinity(),
            );
            (beyond, gas.specific_heat + ratio * saturation.log_slope * latent, ratio - beyond / latent)
        };
        let within = saturated(coldest).0 <= k(0.0) && saturated(warmest).0 >= k(0.0);
        within.then(|| {
            let celsius = solve::increasing(coldest, warmest, solve::temperature_resolution(), |celsius| {
                let (beyond, slope, _) = saturated(celsius);
                (beyond, slope)
            });
            // What the last unit of the temperature leaves over goes into the vapor, so that the books close.
            (celsius, saturated(celsius).2)
        })
    });
    let most = k::<S>(Quantity::HumidityRatio.limits().1);
    let Some((celsius, ratio)) = leaving.filter(|&(_, ratio)| w1 <= ratio && ratio <= most) else {
        return Err(infeasible(Quantity::HeatFlow, side.heat, k(0.0), k(Quantity::HeatFlow.limits().1)));
    };
    side.balance(entering, MoistAir::assemble(celsius, pressure, ratio, air.formulation()), treatment)
}

/// Balance with a known leaving state: the dry-air flow that it takes.
///
/// # Errors
/// [`Error::Infeasible`] when the leaving air carries no more than the entering; otherwise as [`with_air_flow`].
pub fn with_leaving_air<S: Scalar>(
    entering: &MoistAir<S>,
    leaving: &MoistAir<S>,
    water: TowerWater<S>,
    treatment: WaterTreatment<S>,
) -> Result<TowerBalance<S>, Error> {
    super::same_formulation(entering, leaving)?;
    let side = WaterSide::new(entering, water)?;
    let ((h1, w1), (h2, w2)) = (parts(entering), parts(leaving));
    let gain = (h2 - h1) - (w2 - w1) * side.cold;
    if !(gain > k(0.0) && w2 >= w1) {
        return Err(Error::Infeasible {
            quantity: Quantity::LeavingEnthalpy,
            value: h2.to_f64(),
            min: h1.to_f64(),
            max: Quantity::LeavingEnthalpy.limits().1,
        });
    }
    let flow = checked(Quantity::DryAirFlow, side.heat / gain)?;
    let entering = AirStream::new(*entering, MassFlow::from_kilograms_per_second(flow))?;
    side.balance(&entering, *leaving, treatment)
}

/// The checked water side: flow, enthalpy of the cold water, heat given up.
struct WaterSide<S> {
    water: TowerWater<S>,
    cold: S,
    heat: S,
}

impl<S: Scalar> WaterSide<S> {
    fn new(air: &MoistAir<S>, water: TowerWater<S>) -> Result<Self, Error> {
        let flow = checked(Quantity::WaterFlow, water.flow.kilograms_per_second())?;
        let hot = checked(Quantity::WaterTemperature, water.hot.celsius())?;
        let cold = checked(Quantity::WaterTemperature, water.cold.celsius())?;
        if hot < cold && flow > k(0.0) {
            let (min, max) = Quantity::TowerRange.limits();
            return Err(Error::Infeasible { quantity: Quantity::TowerRange, value: (hot - cold).to_f64(), min, max });
        }
        let pressure = air.pressure().pascals();
        let enthalpy = |celsius| condensed_enthalpy(air.formulation(), celsius, pressure, Surface::Liquid);
        let (hot, cold) = (enthalpy(hot), enthalpy(cold));
        Ok(Self { water, cold, heat: flow * (hot - cold) })
    }

    fn balance(
        &self,
        entering: &AirStream<S>,
        leaving: MoistAir<S>,
        treatment: WaterTreatment<S>,
    ) -> Result<TowerBalance<S>, Error> {
        let flow = entering.dry_air_flow;
        let evaporation = flow * (parts(&leaving).1 - parts(&entering.air()).1);
        let water = water_use(MassFlow::from_kilograms_per_second(evaporation), self.water.flow, treatment)?;
        Ok(TowerBalance {
            leaving: entering.with_air(leaving),
            exchange: Exchange::new(self.heat, evaporation, evaporation * self.cold),
            heat_rejected: HeatFlow::from_watts(self.heat),
            water,
            range: self.water.hot - self.water.cold,
            approach: self.water.cold - Temperature::from(entering.air().wet_bulb()?),
        })
    }
}

impl<S: Scalar> TowerBalance<S> {
    /// The leaving air as a stream for further processes.
    pub fn leaving_stream(&self) -> WetStream<S> {
        self.leaving.into()
    }
}
