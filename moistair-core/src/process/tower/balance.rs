//! The overall balance of heat and water.
//!
//! Water enters hot at t₁ and leaves cold at t₂; ṁ_w (h_w1 − h_w2) = ṁ_a ((h₂ − h₁) − (W₂ − W₁) h_w2): what evaporates is taken
//! out of the cold end, and drift leaves with the enthalpy of the cold water. Nothing is said of how large the tower must be.

use super::rating::effectiveness;
use super::{AirStream, Exchange, TowerWater, WetStream, infeasible, parts, same_formulation};
use super::{WaterTreatment, WaterUse, water_use};
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
        effectiveness(self.range, self.approach)
    }
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
    same_formulation(entering, leaving)?;
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
