//! Coils known by their conductances: effectiveness and number of transfer units, dry, wet and partly wet.
//!
//! Dry: counterflow, or cross-flow with both streams unmixed. Wet: enthalpy of the air against that of saturated air at the water's
//! temperature (Threlkeld 1970; Braun, Klein & Mitchell 1989, ASHRAE Trans. 95(2)), with two slopes of the saturation curve: over the range of the
//! water, and over the film between water and surface. Partly wet: the surface is at the dew point where the dry part ends.
//!
//! In counterflow, effectiveness ε = (1 − e^(−N(1−m))) / (1 − m e^(−N(1−m))) is the same as N = (drop of the air's potential) / (logarithmic mean
//! of the potential between the streams), which gives the share of the surface that an outcome takes, in closed form and
//! without special cases at m = 1 or m = 0. The outcome that takes the whole surface is found in a bracket.

use super::{
    CoilRegime, CoilWater, CondensateTemperature, Cooling, account, coolant::Liquid, drain_temperature, freezes,
    infeasible, parts,
};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::process::AirStream;
use crate::quantity::{Conductance, HumidityRatio, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k, polynomial};
use crate::saturation::Surface;
use crate::solve;
use crate::state::property::{dew_point, saturates};
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// Stages of equal drop of enthalpy that the wet part is taken in, each with its own slopes: the saturation curve is too bent for one
/// pair of slopes where water warms by 20 K.
const STAGES: usize = 3;

/// Corrections at most where the water has no room for the last of the heat.
const ROOM_STEPS: usize = 4;

/// Newton steps for the film between water and surface; see the test of this module.
const FILM_STEPS: usize = 3;

/// How air and water pass each other.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum Arrangement {
    /// Against each other, as in coils of four rows and more (common practice, no source).
    #[default]
    Counterflow = 0,
    /// Across each other, neither mixed, as in a coil of one or two rows; for coils that stay dry.
    CrossFlow = 1,
}

/// A coil by its conductances at the flows at hand.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CoilSurface<S = f64> {
    /// From air to metal with the fins' efficiency, for sensible heat.
    pub air_side: Conductance<S>,
    /// From metal to water.
    pub water_side: Conductance<S>,
    /// Counterflow or cross-flow.
    pub arrangement: Arrangement,
}

/// What a coil with water in it did.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct WaterCoil<S = f64> {
    /// The air side. A coil that heats has a negative cooling load.
    pub air: Cooling<S>,
    /// Water that leaves. It takes up the heat that `air.exchange` takes out.
    pub leaving_water: Temperature<S>,
    /// Share of the surface on which nothing condenses.
    pub dry_fraction: S,
    /// The coldest metal, at one end of the coil.
    pub coldest_surface: Temperature<S>,
    /// The coldest metal is below the melting temperature and there is water in it. No freezestat.
    pub freezing: bool,
}

/// A coil from its conductances and the water that enters it; cools or heats, as the water is colder or warmer than the air.
///
/// Model: air and water at constant conductances, Lewis number one, condensate drained at the surface; counterflow effectiveness on
/// temperature (dry) and on enthalpy with the slope of the saturation curve over the water's range and over the film (wet, in three
/// stages). Against a march through 400 cells of the surface the cooling load is within 0.5 %, the leaving dry bulb within 0.1 K, over air
/// of 18 to 42 °C and 25 to 98 %, 0.3 to 5 transfer units and 0.25 to 4 kg of water per kg of air (measured in the tests); cross-flow
/// within 4 % of its own march. Left out: that conductances change with flow and that wet fins have a lower efficiency (give the
/// conductances of the regime), evaporation of condensate at part load or with the fan off, growth of frost beyond its flag, uneven
/// flow: do not use it where these matter. A coil without water flow or without conductance changes nothing. Bounded work: a search of at
/// most 80 trials, about ten.
///
/// # Errors
/// [`Error::NoFlow`] without air; [`Error::Infeasible`] when water would freeze in the coil, when a coil in cross-flow gets wet (its water is
/// colder than the dew point), or the air would leave above 150 °C; [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, coil::*};
/// let site: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(27.0), RelativeHumidity::from_percent(50.0), site)?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(1.0))?;
/// let surface = CoilSurface {
///     air_side: Conductance::from_kilowatts_per_kelvin(3.0),
///     water_side: Conductance::from_kilowatts_per_kelvin(6.0),
///     arrangement: Arrangement::Counterflow,
/// };
/// let water = CoilWater {
///     flow: MassFlow::from_kilograms_per_second(1.6),
///     entering: Temperature::from_celsius(6.0),
///     coolant: Coolant::Water,
/// };
/// let coil = with_water(&entering, surface, water, CondensateTemperature::LeavingAir)?;
/// assert!((coil.air.cooling_load.kilowatts() - 24.3).abs() < 0.1 && coil.air.regime == CoilRegime::Wet);
/// assert!((coil.leaving_water.celsius() - 9.6).abs() < 0.1);
/// let across = CoilSurface { arrangement: Arrangement::CrossFlow, ..surface };
/// assert!(with_water(&entering, across, water, CondensateTemperature::LeavingAir).is_err()); // it would get wet
/// # Ok::<(), Error>(())
/// ```
pub fn with_water<S: Scalar>(
    entering: &AirStream<S>,
    surface: CoilSurface<S>,
    water: CoilWater<S>,
    condensate: CondensateTemperature<S>,
) -> Result<WaterCoil<S>, Error> {
    let coil = Coil::new(entering, surface, &water)?;
    let outcome = with_mixture!(coil.air.formulation(), S, M => coil.outcome::<M<S>>())?;
    let books = |leaving: &MoistAir<S>| {
        let drain = drain_temperature(leaving, condensate, leaving.dry_bulb().celsius(), outcome.effective_surface)?;
        Ok(account(entering, leaving, drain))
    };
    let mut air = books(&outcome.leaving)?;
    // The stages know the condensate's heat nearly, the books exactly: water that leaves as warm as saturated air came in may not have
    // room for the difference. The air then goes a little less far.
    let room = coil.liquid.heat_to(coil.air.dry_bulb().celsius());
    for _ in 0..ROOM_STEPS {
        let taken = -air.exchange.heat.watts();
        if air.regime == CoilRegime::Dry || taken <= room {
            break;
        }
        air = books(&part_way(&coil.air, &air.leaving.air(), room / taken * k(1.0 - 1e-6))?)?;
    }
    let frozen = freezes(&coil.air, outcome.coldest_surface);
    if air.regime != CoilRegime::Dry {
        air.regime = match air.regime {
            _ if frozen => CoilRegime::Frost,
            CoilRegime::Wet if outcome.dry_fraction > k(0.0) => CoilRegime::PartlyWet,
            regime => regime,
        };
    }
    let leaving_water = coil.liquid.heated(-air.exchange.heat.watts(), coil.air.dry_bulb().celsius());
    let coldest = k::<S>(Quantity::WaterTemperature.limits().0);
    if coil.liquid.is_water() && leaving_water < coldest {
        return Err(infeasible(Quantity::WaterTemperature, leaving_water, coldest, coil.liquid.entering));
    }
    Ok(WaterCoil {
        air,
        leaving_water: Temperature::from_celsius(leaving_water),
        dry_fraction: outcome.dry_fraction,
        coldest_surface: Temperature::from_celsius(outcome.coldest_surface),
        freezing: frozen && coil.liquid.is_water() && coil.exchanges,
    })
}

/// Air a share of the way from one state to another.
fn part_way<S: Scalar>(from: &MoistAir<S>, to: &MoistAir<S>, share: S) -> Result<MoistAir<S>, Error> {
    let ((h1, w1), (h2, w2)) = (parts(from), parts(to));
    let air = AirWithCondensate::from_enthalpy_and_water(
        SpecificEnthalpy::from_joules_per_kilogram(h1 + share * (h2 - h1)),
        HumidityRatio::from_kilograms_per_kilogram(w1 + share * (w2 - w1)),
        Freezing::Equilibrium,
        from.basis(),
    )?;
    Ok(air.air())
}

/// Whether a coil of any size could work with this air and water at all.
pub(super) fn check<S: Scalar>(
    entering: &AirStream<S>,
    surface: CoilSurface<S>,
    water: &CoilWater<S>,
) -> Result<(), Error> {
    let coil = Coil::new(entering, surface, water)?;
    let dew = with_mixture!(coil.air.formulation(), S, M => coil.dew_point_above_water::<M<S>>());
    dew.map_or(Ok(()), |dew| coil.refuse_wet_cross_flow(dew))
}

/// The checked arguments.
struct Coil<S> {
    air: MoistAir<S>,
    flow: S,
    /// Conductance of the air side, W/K.
    outside: S,
    /// Conductance of the water side, W/K.
    inside: S,
    arrangement: Arrangement,
    liquid: Liquid<S>,
    /// Whether any heat is exchanged beyond rounding.
    exchanges: bool,
}

/// Where the air ends up, and what of the surface was dry.
struct Outcome<S> {
    leaving: MoistAir<S>,
    dry_fraction: S,
    coldest_surface: S,
    /// The one temperature of surface that would lead the air where it went.
    effective_surface: S,
}

/// A dry surface, or the dry part of one, that takes the air to a temperature.
struct Dry<S> {
    /// The share of the whole surface that it takes.
    share: S,
    /// Water that leaves.
    water: S,
}

/// A surface, the wet part of which takes a drop of enthalpy.
struct Wet<S> {
    /// The share of the surface that dry and wet part take together.
    share: S,
    dry_share: S,
    /// The air that enters the wet part.
    inlet: MoistAir<S>,
    /// c_p UA_i / UA_o.
    by_film: S,
    /// In the order of the air.
    stages: [Stage<S>; STAGES],
}

/// A stage of the wet part.
#[derive(Clone, Copy)]
struct Stage<S> {
    /// Of the whole surface.
    share: S,
    /// Of the enthalpy of the air.
    drop: S,
}

impl<S: Scalar> Stage<S> {
    fn none() -> Self {
        Self { share: k(0.0), drop: k(0.0) }
    }
}

impl<S: Scalar> Coil<S> {
    fn new(entering: &AirStream<S>, surface: CoilSurface<S>, water: &CoilWater<S>) -> Result<Self, Error> {
        let air = entering.air();
        let outside = checked(Quantity::Conductance, surface.air_side.watts_per_kelvin())?;
        let inside = checked(Quantity::Conductance, surface.water_side.watts_per_kelvin())?;
        let liquid = Liquid::new(water, &air)?;
        let flow = entering.flow()?;
        let mut coil = Self { air, flow, outside, inside, arrangement: surface.arrangement, liquid, exchanges: false };
        let started = air.dry_bulb().celsius() != liquid.entering && liquid.flow > k(0.0);
        coil.exchanges = started && coil.transfer_units() > S::epsilon();
        Ok(coil)
    }

    /// Of the whole surface, dry, for the air.
    fn transfer_units(&self) -> S {
        let one = k::<S>(1.0);
        one / ((one / self.outside + one / self.inside)
            * self.flow
            * self.air.specific_heat().joules_per_kilogram_kelvin())
    }

    fn outcome<M: Mixture<S>>(&self) -> Result<Outcome<S>, Error> {
        let (celsius, water) = (self.air.dry_bulb().celsius(), self.liquid.entering);
        if !self.exchanges {
            let coldest_surface = celsius.at_most(water);
            let (leaving, dry_fraction) = (self.air, k(1.0));
            return Ok(Outcome { leaving, dry_fraction, coldest_surface, effective_surface: celsius });
        }
        let Some(dew) = self.dew_point_above_water::<M>() else { return self.dry(water) };
        self.refuse_wet_cross_flow(dew)?;
        // The air at which metal over the coldest water is at the dew point: a coil too small to reach it stays dry.
        let driest = self.interface(dew, water);
        if driest < celsius && self.dry_to(driest, water).share >= k(1.0) {
            return self.dry(driest);
        }
        self.wet::<M>(dew)
    }

    fn refuse_wet_cross_flow(&self, dew: S) -> Result<(), Error> {
        match self.arrangement {
            Arrangement::Counterflow => Ok(()),
            Arrangement::CrossFlow => {
                let warmest = k(Quantity::WaterTemperature.limits().1);
                Err(infeasible(Quantity::WaterTemperature, self.liquid.entering, dew, warmest))
            }
        }
    }

    /// Dew point, or frost point, of the entering air if the entering water is below it.
    fn dew_point_above_water<M: Mixture<S>>(&self) -> Option<S> {
        let (celsius, pressure, water) =
            (self.air.dry_bulb().celsius(), self.air.pressure().pascals(), self.liquid.entering);
        let (_, ratio) = parts(&self.air);
        let at_water = M::at(water).saturation(pressure, Surface::Stable);
        if water >= celsius || !saturates(at_water.mole_fraction) || at_water.humidity_ratio >= ratio {
            return None;
        }
        let mole_fraction = M::mole_fraction(ratio);
        let melting = M::melting_temperature(pressure);
        let at_melting = M::at(melting).saturation(pressure, Surface::Liquid).mole_fraction;
        let over = |surface| dew_point::<M, S>(mole_fraction, pressure, surface);
        let dew = if mole_fraction < at_melting { over(Surface::Ice).at_most(melting) } else { over(Surface::Liquid) };
        (dew > water).then(|| dew.at_most(celsius))
    }

    /// The air that stands over metal at the dew point with water of a temperature behind it; no warmer than what enters.
    fn interface(&self, dew: S, water: S) -> S {
        let gap = dew - water;
        let rise = if gap > k(0.0) { gap * (self.inside / self.outside) } else { k(0.0) };
        (dew + rise).at_most(self.air.dry_bulb().celsius())
    }

    fn at(&self, celsius: S) -> MoistAir<S> {
        let ratio = parts(&self.air).1;
        MoistAir::assemble(celsius, self.air.pressure().pascals(), ratio, self.air.formulation())
    }

    /// A dry surface that takes the entering air to a temperature, with water of a temperature entering it.
    fn dry_to(&self, celsius: S, water: S) -> Dry<S> {
        let (start, one) = (self.air.dry_bulb().celsius(), k::<S>(1.0));
        if celsius == start {
            return Dry { share: k(0.0), water };
        }
        let heat = self.flow * (parts(&self.air).0 - parts(&self.at(celsius)).0);
        let leaving = self.liquid.heated(self.liquid.heat_to(water) + heat, start);
        let sign = if self.liquid.entering > start { -one } else { one };
        let mean = logarithmic_mean(sign * (start - leaving), sign * (celsius - water));
        Dry { share: sign * heat * (one / self.outside + one / self.inside) / mean, water: leaving }
    }

    /// A dry coil, whose air leaves between the entering air and a limit toward the water.
    fn dry(&self, limit: S) -> Result<Outcome<S>, Error> {
        let (start, one, water) = (self.air.dry_bulb().celsius(), k::<S>(1.0), self.liquid.entering);
        let warmest = k::<S>(self.air.formulation().limits(Quantity::LeavingTemperature).1);
        let end = limit.at_most(warmest);
        let at = |way: S| if way >= one { end } else { start + way * (end - start) };
        let missing = |way: S| match self.arrangement {
            Arrangement::Counterflow => self.missing(self.dry_to(at(way), water).share),
            Arrangement::CrossFlow => self.missing_across(at(way)),
        };
        if limit > warmest && missing(one) < k(0.0) {
            return Err(infeasible(Quantity::LeavingTemperature, limit, start, warmest));
        }
        let way = solve::increasing_by_chords(k(0.0), one, S::epsilon() * k(0.25), missing);
        let celsius = at(way);
        let warm_water = self.dry_to(celsius, water).water;
        let metal = |air: S, water: S| water + (air - water) * (self.outside / (self.outside + self.inside));
        let coldest_surface = metal(celsius, water).at_most(metal(start, warm_water));
        let leaving = self.at(celsius);
        Ok(Outcome { leaving, dry_fraction: one, coldest_surface, effective_surface: coldest_surface })
    }

    /// What the surface lacks (negative: has to spare) for taking a share of itself, in a measure that stays finite.
    fn missing(&self, share: S) -> S {
        let (one, units) = (k::<S>(1.0), self.transfer_units());
        one / (one + units) - one / (one + share * units)
    }

    /// The effectiveness that a leaving temperature takes over that of cross-flow with both streams unmixed,
    /// ε = 1 − exp(N^0.22 (exp(−c N^0.78) − 1) / c) (Kays & London 1984; Incropera & DeWitt, Table 11.3; from memory).
    fn missing_across(&self, celsius: S) -> S {
        let (start, water, one) = (self.air.dry_bulb().celsius(), self.liquid.entering, k::<S>(1.0));
        let of_air = (celsius - start) / (water - start);
        let leaving = self.dry_to(celsius, water).water;
        // None of either, and all of either, which takes endless surface.
        if of_air == k(0.0) {
            return -one;
        }
        if of_air >= one || leaving == start {
            return one;
        }
        let of_water = (leaving - water) / (start - water);
        // The stream of less capacity changes more.
        let (effectiveness, ratio) =
            if of_air >= of_water { (of_air, of_water / of_air) } else { (of_water, of_air / of_water) };
        let capacity = (self.flow * (parts(&self.air).0 - parts(&self.at(celsius)).0) / (start - celsius))
            .at_most(self.liquid.heat_to(leaving) / (leaving - water));
        let units = one / ((one / self.outside + one / self.inside) * capacity);
        let logarithm = units.ln();
        let (small, large) = ((logarithm * k(0.22)).exp(), (logarithm * k(0.78)).exp());
        let exponent = small * quotient_of_exponential(ratio, large);
        effectiveness - (one - exponent.exp())
    }

    /// The surface that gives a heat per dry air to the water where it is wet: its dry part, then its stages.
    fn wet_by<M: Mixture<S>>(&self, heat: S, dew: S) -> Wet<S> {
        let pressure = self.air.pressure().pascals();
        let part = heat / k(STAGES as f64);
        let warm = self.liquid.heated(self.flow * heat, dew);
        let air = self.interface(dew, warm);
        let dry_share = self.dry_to(air, warm).share;
        let inlet = self.at(air);
        // Beyond, the metal is as warm as the water to the last bit, and infinity times no rise has no value.
        let sides = (self.inside / self.outside).at_most(k(1e12));
        let by_film = inlet.specific_heat().joules_per_kilogram_kelvin() * sides;
        let mut wet = Wet { share: dry_share, dry_share, inlet, by_film, stages: [Stage::none(); STAGES] };
        let (mut enthalpy, mut ratio) = parts(&inlet);
        let (mut water, mut at_water) = (warm, Saturated::at::<M>(warm, pressure));
        let mut rise = dew - warm;
        for (left, stage) in (0..STAGES).rev().zip(&mut wet.stages) {
            let colder = self.liquid.heated(self.flow * part * k(left as f64), dew);
            let at_colder = Saturated::at::<M>(colder, pressure);
            let surface;
            (rise, surface) =
                film::<M, S, FILM_STEPS>(water, at_water, enthalpy - at_water.enthalpy, by_film, rise, dew, pressure);
            // What condensate takes along of the enthalpy that the air gives up, on the line toward the surface as the stage begins; on that
            // toward the coldest there could be, as far as the air would pass the surface.
            let toward = |at: Saturated<S>, least: S| {
                let (dries, cools) = (ratio - at.humidity_ratio, (enthalpy - at.enthalpy).at_least(least));
                if dries > k(0.0) && cools > k(0.0) { dries / cools } else { k(0.0) }
            };
            let short = (k::<S>(1.0) - (enthalpy - surface.enthalpy) / part).at_least(k(0.0)).at_most(k(1.0));
            let dried = toward(surface, part) + short * toward(at_colder, k(0.0));
            let kept = (k::<S>(1.0) - dried * surface.condensed_enthalpy).at_least(k(0.5));
            let drop = part / kept;
            let leaving = enthalpy - drop;
            let potential = logarithmic_mean(enthalpy - at_water.enthalpy, leaving - at_colder.enthalpy);
            let middle = (water + colder) * k(0.5);
            let at_middle = Saturated::at::<M>(middle, pressure);
            (rise, _) = film::<M, S, FILM_STEPS>(middle, at_middle, potential, by_film / kept, rise, dew, pressure);
            let driven = potential > k(0.0) && rise > k(0.0);
            let share = if driven { self.flow * part / (self.inside * rise) } else { S::infinity() };
            *stage = Stage { share, drop };
            wet.share = wet.share + stage.share;
            (enthalpy, ratio, water, at_water) = (leaving, ratio - dried * drop, colder, at_colder);
        }
        if heat == k(0.0) {
            wet.share = dry_share;
        }
        wet
    }

    fn wet<M: Mixture<S>>(&self, dew: S) -> Result<Outcome<S>, Error> {
        let (zero, one, cold) = (k::<S>(0.0), k::<S>(1.0), self.liquid.entering);
        let pressure = self.air.pressure().pascals();
        let at_cold = Saturated::at::<M>(cold, pressure);
        // Neither does water get warmer than the dew point while it wets, nor the air colder than the water.
        let most = (self.liquid.heat_to(dew) / self.flow).at_most(parts(&self.air).0 - at_cold.enthalpy);
        let heat = solve::increasing_by_chords(zero, most, most * S::epsilon() * k(0.25), |heat| {
            self.missing(self.wet_by::<M>(heat, dew).share)
        });
        let wet = self.wet_by::<M>(heat, dew);
        // Through the stages, each to the surface that leads it there: saturated at h − drop / (1 − bypass).
        let (mut enthalpy, mut ratio) = parts(&wet.inlet);
        let (mut condensed, mut warmth) = (zero, zero);
        for Stage { share, drop } in wet.stages.into_iter().filter(|stage| stage.drop > zero) {
            let specific_heat = wet.inlet.specific_heat().joules_per_kilogram_kelvin();
            let bypass = (-(self.outside / self.flow) * share / specific_heat).exp();
            let target = enthalpy - drop / (one - bypass);
            let surface = solve::increasing(cold, dew, solve::temperature_resolution(), |celsius| {
                let at = Saturated::at::<M>(celsius, pressure);
                (at.enthalpy - target, at.slope)
            });
            let at_surface = Saturated::at::<M>(surface, pressure).humidity_ratio.at_most(ratio);
            let dried = (ratio - at_surface) * (one - bypass);
            (enthalpy, ratio) = (enthalpy - drop, ratio - dried);
            (condensed, warmth) = (condensed + dried, warmth + dried * surface);
        }
        let (_, wettest) = parts(&wet.inlet);
        let leaving = AirWithCondensate::from_enthalpy_and_water(
            SpecificEnthalpy::from_joules_per_kilogram(enthalpy),
            HumidityRatio::from_kilograms_per_kilogram(ratio.at_most(wettest)),
            Freezing::Equilibrium,
            self.air.basis(),
        )?;
        let potential = (enthalpy - at_cold.enthalpy).at_least(zero);
        let coldest_surface =
            cold + film::<M, S, FILM_STEPS>(cold, at_cold, potential, wet.by_film, dew - cold, dew, pressure).0;
        Ok(Outcome {
            leaving: leaving.air(),
            dry_fraction: wet.dry_share.at_most(one),
            coldest_surface: coldest_surface.at_most(dew),
            effective_surface: if condensed > zero { warmth / condensed } else { dew },
        })
    }
}

/// Air saturated over the stable surface.
#[derive(Clone, Copy)]
struct Saturated<S> {
    enthalpy: S,
    /// d(enthalpy)/dT.
    slope: S,
    humidity_ratio: S,
    condensed_enthalpy: S,
}

impl<S: Scalar> Saturated<S> {
    fn at<M: Mixture<S>>(celsius: S, pressure: S) -> Self {
        let mixture = M::at(celsius);
        let saturation = mixture.saturation(pressure, Surface::Stable);
        let (humidity_ratio, condensed_enthalpy) = (saturation.humidity_ratio, saturation.condensed_enthalpy);
        let gas = mixture.gas(pressure, humidity_ratio);
        let slope = gas.specific_heat + humidity_ratio * saturation.log_slope * gas.enthalpy_of_water;
        let endless = S::infinity();
        if saturates(saturation.mole_fraction) {
            Self { enthalpy: gas.enthalpy, slope, humidity_ratio, condensed_enthalpy }
        } else {
            Self { enthalpy: endless, slope: endless, humidity_ratio: endless, condensed_enthalpy }
        }
    }
}

/// How much warmer the surface is than water, and saturated air there: what the potential of the enthalpy drives through the air side,
/// the film takes on, so that c_sw = (h_s(t_s) − h_s(t_w)) / (t_s − t_w) is the slope of saturation over the film. Newton from above on
/// a convex curve. `by_film` is c_p UA_i / UA_o; no surface
/// that wets is warmer than the dew point.
fn film<M: Mixture<S>, S: Scalar, const STEPS: usize>(
    water: S,
    at_water: Saturated<S>,
    potential: S,
    by_film: S,
    start: S,
    dew: S,
    pressure: S,
) -> (S, Saturated<S>) {
    let mut rise = start.at_most(potential / (by_film + at_water.slope));
    let mut surface = at_water;
    for _ in 0..STEPS {
        surface = Saturated::at::<M>(water + rise, pressure);
        let beyond = by_film * rise + (surface.enthalpy - at_water.enthalpy) - potential;
        rise = (rise - beyond / (by_film + surface.slope)).at_most(dew - water);
    }
    (rise, surface)
}

/// (a − b) / ln(a / b), smooth at a = b; zero unless both are positive.
fn logarithmic_mean<S: Scalar>(a: S, b: S) -> S {
    if !(a > k(0.0) && b > k(0.0)) {
        return k(0.0);
    }
    let x = (a - b) / (a + b);
    let square = x * x;
    if square < k(0.01) {
        // ln(a/b) = 2 artanh x.
        let series =
            polynomial(square, [1.0, 1.0 / 3.0, 0.2, 1.0 / 7.0, 1.0 / 9.0, 1.0 / 11.0, 1.0 / 13.0, 1.0 / 15.0]);
        return (a + b) * k(0.5) / series;
    }
    (a - b) / (a / b).ln()
}

/// (e^(−c x) − 1) / c, smooth at c = 0.
fn quotient_of_exponential<S: Scalar>(c: S, x: S) -> S {
    let exponent = c * x;
    if exponent < k(1e-3) {
        let series = polynomial(exponent, [1.0, -1.0 / 2.0, 1.0 / 6.0, -1.0 / 24.0, 1.0 / 120.0, -1.0 / 720.0]);
        return -x * series;
    }
    ((-exponent).exp() - k(1.0)) / c
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::Random;
    use crate::mixture::RealGas;
    use crate::real::Real;

    /// How far, as a share of itself, the film is off after some steps from the dew point of the entering air.
    fn left_over<const STEPS: usize>() -> f64 {
        let mut random = Random(31);
        let mut worst = 0.0_f64;
        for _ in 0..3_000 {
            let pressure = random.between(7e4, 1.1e5);
            let (water, rise) = (random.between(2.0, 25.0), random.between(0.0, 15.0));
            let by_film = 1_010.0 * random.between(0.3, 6.0);
            let saturated = |celsius| Saturated::at::<RealGas<f64>>(celsius, pressure);
            let at_water = saturated(water);
            let potential = by_film * rise + saturated(water + rise).enthalpy - at_water.enthalpy;
            // Air not far from saturation: a dew point that much above the surface.
            let dew = water + rise + random.between(0.0, 10.0);
            let found =
                film::<RealGas<f64>, f64, STEPS>(water, at_water, potential, by_film, dew - water, dew, pressure);
            worst = worst.max((found.0 / rise - 1.0).abs());
        }
        std::println!("film after {STEPS} steps: off by {worst:e} of itself");
        worst
    }

    /// Far below what the stages leave, and not so with one step fewer.
    #[test]
    fn film_steps_are_enough_and_none_is_idle() {
        const BOUND: f64 = 1e-5;
        assert!(left_over::<FILM_STEPS>() < BOUND);
        assert!(left_over::<{ FILM_STEPS - 1 }>() > BOUND, "one step fewer does as well: the constant is stale");
    }

    /// The series are what they stand for, as far as that can be evaluated.
    #[test]
    fn series_meet_their_functions() {
        for x in [0.01_f64, 0.05, 0.0999, 0.1001, 0.5] {
            let (a, b) = (1.0 + x, 1.0 - x);
            let wanted = 2.0 * x / Real::ln(a / b);
            assert!((logarithmic_mean(a, b) / wanted - 1.0).abs() < 1e-14, "{x}");
        }
        let bits = |a: f64, b| logarithmic_mean(a, b).to_bits();
        assert_eq!([bits(2.0, 2.0), bits(1.0, 0.0), bits(-1.0, 2.0)], [2.0_f64, 0.0, 0.0].map(f64::to_bits));
        for x in [0.9e-3_f64, 0.99e-3, 1.01e-3] {
            assert!((quotient_of_exponential(x, 1.0) / ((Real::exp(-x) - 1.0) / x) - 1.0).abs() < 1e-12, "{x}");
        }
        assert_eq!(quotient_of_exponential(0.0_f64, 3.0).to_bits(), (-3.0_f64).to_bits());
    }
}
