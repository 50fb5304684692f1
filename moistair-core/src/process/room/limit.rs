//! Whether a room line meets what a coil can leave, the limit beyond which it does not, and the reheat that is then unavoidable.

use super::{Load, RoomGains, supply_at_flow};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::process::coil::meetings_along;
use crate::process::reheat::{CoilLeaving, Curve, Point};
use crate::process::{AirStream, infeasible, parts, same_formulation, unsaturated};
use crate::quantity::{HeatFlow, MassFlow, RelativeHumidity, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;
use crate::state::MoistAir;

/// Where the line of a room meets saturation: nowhere, once, or twice.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct RoomDewPoints<S = f64> {
    /// The warmer meeting, which is the coil's; `None` for a line that misses saturation: such a room needs reheat.
    pub warmer: Option<Temperature<S>>,
    /// The colder, where the line comes out of saturation again, down to −40 °C.
    pub colder: Option<Temperature<S>>,
}

impl<S: Scalar> RoomDewPoints<S> {
    /// How many there are: 0, 1 or 2.
    #[must_use]
    pub fn count(&self) -> usize {
        usize::from(self.warmer.is_some()) + usize::from(self.colder.is_some())
    }
}

/// The apparatus dew points of a room that is cooled, from its state and its sensible heat ratio (by [`latent_heat`](super::latent_heat)): where the
/// line of supply states, straight in enthalpy and humidity ratio, meets saturation. A ratio above 1 leads to moister supply air, one below 0 as
/// well: more moisture is taken out of such a room than there is sensible heat. Not for a room in which so much liquid water evaporates that its
/// ratio is below 0: its line runs the other way, to supply air that is warmer and drier, and the meetings here are not its own. Bounded work, as
/// [`coil::apparatus_dew_points`](crate::process::coil::apparatus_dew_points).
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`]; [`Error::Infeasible`] for a room of a dew point below −40 °C.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::room::apparatus_dew_points;
/// let site: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let room = MoistAir::from_dry_bulb(Temperature::from_celsius(24.0), RelativeHumidity::from_percent(50.0), site)?;
/// let usual = apparatus_dew_points(&room, 0.90)?;
/// assert!((usual.warmer.unwrap().celsius() - 12.06).abs() < 0.005 && usual.count() == 1);
/// assert_eq!(apparatus_dew_points(&room, 0.65)?.count(), 2);
/// assert_eq!(apparatus_dew_points(&room, 0.60)?.count(), 0); // no coil alone serves this room
/// assert!(apparatus_dew_points(&room, f64::NAN).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn apparatus_dew_points<S: Scalar>(room: &MoistAir<S>, sensible_heat_ratio: S) -> Result<RoomDewPoints<S>, Error> {
    let ratio = checked(Quantity::SensibleHeatRatio, sensible_heat_ratio)?;
    let (zero, one) = (k::<S>(0.0), k::<S>(1.0));
    // Of the two lines of one ratio that of a cooled room: sensible heat |SHR|, latent heat to match.
    let (sensible, latent) = if ratio < zero { (-ratio, ratio - one) } else { (ratio, one - ratio) };
    let dried = latent / room.vapor_enthalpy();
    let celsius = room.dry_bulb().celsius();
    // Toward moister air the line is no warmer than the room, but for the forces between molecules, which bend its isotherm.
    let start = if dried < zero { celsius + k(BENT_ISOTHERM) } else { dew_point(room)?.at_most(celsius) };
    let found = meetings_along(room, sensible + latent, dried, start);
    Ok(RoomDewPoints { warmer: found.warmer.map(|met| met.dew_point), colder: found.colder.map(|met| met.dew_point) })
}

/// K. How far an isotherm of enthalpy over humidity ratio bends between dry and saturated air, at most, with room to spare: 13 K at 150 °C and 600 kPa.
const BENT_ISOTHERM: f64 = 50.0;

/// Where the air saturates when it is cooled, over the stable surface.
fn dew_point<S: Scalar>(room: &MoistAir<S>) -> Result<S, Error> {
    let saturated = CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(k(1.0)));
    let celsius = Curve::of(saturated, room, room)?.parameter()?;
    let (coldest, warmest) = room.formulation().limits(Quantity::ApparatusDewPoint);
    if celsius < k(coldest) {
        return Err(infeasible(Quantity::ApparatusDewPoint, celsius, k(coldest), k(warmest)));
    }
    Ok(celsius)
}

/// The steepest line through a room that a coil still serves without reheat.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct LimitingLine<S = f64> {
    /// Its sensible heat ratio by [`latent_heat`](super::latent_heat): below it reheat is unavoidable.
    pub sensible_heat_ratio: S,
    /// Its slope Δh/ΔW.
    pub slope: SpecificEnthalpy<S>,
    /// Where it touches the curve of the coil: temperature of the leaving air, or the apparatus dew point of a coil with bypass.
    pub touches: Temperature<S>,
    /// Whether the coldest that the coil can hold binds, not the curvature of saturation.
    pub at_coldest: bool,
    /// State in which the air leaves the coil there, as enthalpy and humidity ratio.
    leaving: (S, S),
}

/// The limit of a room: the tangent from its state to the curve of what the coil can leave, or the line to its coldest end.
///
/// For a coil that leaves saturated air ([`CoilLeaving::RelativeHumidity`] of 1) it does not depend on what enters; `entering` counts for a bypass.
/// Bounded work: two searches, 160 evaluations at most.
///
/// # Errors
/// [`Error::Infeasible`]: of the apparatus dew point, where the coil cannot get drier than the room; of the relative humidity or the bypass factor,
/// where it leaves air of the room's humidity ratio warmer than the room, so that it cannot cool the room at all; of the humidity ratio, where what
/// passes and what the surface leaves would mix to fog; [`Error::MixedFormulations`], [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{reheat::CoilLeaving, room::limiting_line};
/// let site: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let state = |t, rh| MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site);
/// let (room, outdoor) = (state(24.0, 50.0)?, state(32.0, 45.0)?);
/// let by_humidity = |percent| CoilLeaving::RelativeHumidity(RelativeHumidity::from_percent(percent));
/// let limit = limiting_line(&room, &outdoor, by_humidity(100.0))?;
/// assert!((0.60..0.65).contains(&limit.sensible_heat_ratio));
/// // A coil that leaves less than saturated air sheds the same water at a higher temperature, and serves steeper lines.
/// assert!(limiting_line(&room, &outdoor, by_humidity(90.0))?.sensible_heat_ratio < limit.sensible_heat_ratio);
/// assert!(limiting_line(&room, &outdoor, by_humidity(45.0)).is_err()); // leaves drier air than the room
/// # Ok::<(), Error>(())
/// ```
pub fn limiting_line<S: Scalar>(
    room: &MoistAir<S>,
    entering: &MoistAir<S>,
    coil_leaving: CoilLeaving<S>,
) -> Result<LimitingLine<S>, Error> {
    let limit = Tangents::of(room, entering, coil_leaving)?.limit(room);
    // Much bypass of moist air and a cold surface mix to fog.
    unsaturated(limit.leaving.0, limit.leaving.1, room).map(|_| limit)
}

/// The line from a room to a point of the curve of a coil.
#[derive(Clone, Copy)]
struct Chord<S> {
    slope: S,
    celsius: S,
    at_coldest: bool,
    leaving: (S, S),
}

/// A part of the curve of a coil, over one surface, and where it lies farthest from the room in slope.
#[derive(Clone, Copy)]
struct Branch<S> {
    surface: Surface,
    high: S,
    tangent: Chord<S>,
}

/// The curve of a coil as seen from a room, in its parts from warm to cold.
struct Tangents<S> {
    sight: Sight<S>,
    branches: [Option<Branch<S>>; 2],
    /// The least slope of all.
    least: Chord<S>,
}

impl<S: Scalar> Tangents<S> {
    fn of(room: &MoistAir<S>, entering: &MoistAir<S>, coil: CoilLeaving<S>) -> Result<Self, Error> {
        same_formulation(room, entering)?;
        let mut curve = Curve::of(coil, entering, room)?;
        // No surface of liquid or ice is looked for below.
        let (coldest, warmest) = room.formulation().limits(Quantity::ApparatusDewPoint);
        curve.coldest = curve.coldest.at_least(k(coldest));
        let top = curve.parameter()?;
        let (enthalpy, ratio) = parts(room);
        // The coil would leave the room's humidity ratio warmer than the room; rounding apart.
        let capacity = room.specific_heat().joules_per_kilogram_kelvin();
        let rounding = capacity * solve::temperature_resolution::<S>() * k(1e3);
        if curve.point(top, Surface::Stable).enthalpy > enthalpy + rounding {
            return Err(match coil {
                CoilLeaving::RelativeHumidity(humidity) => {
                    let least = room.relative_humidity().map_or(k(0.0), RelativeHumidity::fraction);
                    infeasible(Quantity::RelativeHumidity, humidity.fraction(), least, k(1.0))
                }
                CoilLeaving::Bypass { factor, .. } => infeasible(Quantity::BypassFactor, factor, k(0.0), factor),
            });
        }
        let sight = Sight { curve, room: (enthalpy, ratio), near: capacity * S::epsilon().sqrt() * k(100.0) };
        let (coldest, melting) = (sight.curve.coldest, sight.curve.melting_temperature());
        let branches = [
            sight.branch(Surface::Liquid, coldest.at_least(melting), top),
            sight.branch(Surface::Ice, coldest, top.at_most(melting)),
        ];
        let chords = branches.iter().flatten().map(|branch| branch.tangent);
        let least = chords.reduce(|least, other| if other.slope < least.slope { other } else { least });
        // The coil gets as dry as the room, and no drier.
        let least = least.ok_or_else(|| infeasible(Quantity::ApparatusDewPoint, top, coldest, k(warmest)))?;
        Ok(Self { sight, branches, least })
    }

    fn limit(&self, room: &MoistAir<S>) -> LimitingLine<S> {
        let Chord { slope, celsius, at_coldest, leaving } = self.least;
        LimitingLine {
            sensible_heat_ratio: k::<S>(1.0) - room.vapor_enthalpy() / slope,
            slope: SpecificEnthalpy::from_joules_per_kilogram(slope),
            touches: Temperature::from_celsius(celsius),
            at_coldest,
            leaving,
        }
    }

    /// The warmest meeting of a line from the room, of so much enthalpy over so much water, with the curve.
    fn meeting(&self, total: S, water: S) -> Option<Point<S>> {
        let Sight { curve, room: (enthalpy, ratio), .. } = &self.sight;
        let branch = self.branches.iter().flatten().find(|branch| branch.tangent.slope * water <= total)?;
        let celsius = solve::increasing(branch.tangent.celsius, branch.high, solve::temperature_resolution(), |t| {
            let point = curve.point(t, branch.surface);
            let beyond = (point.ratio - *ratio) * total - (point.enthalpy - *enthalpy) * water;
            (beyond, point.ratio_slope * total - point.enthalpy_slope * water)
        });
        Some(curve.point(celsius, branch.surface))
    }
}

/// The curve of a coil, and the room that it is seen from.
struct Sight<S> {
    curve: Curve<S>,
    /// Enthalpy and humidity ratio.
    room: (S, S),
    /// A difference of enthalpy within which the room lies on the curve.
    near: S,
}

impl<S: Scalar> Sight<S> {
    /// Where on a part of the curve the slope from the room is least: W′ (h_r − h) = h′ (W_r − W), which rises along a convex curve.
    fn branch(&self, surface: Surface, low: S, high: S) -> Option<Branch<S>> {
        if low >= high {
            return None;
        }
        let (enthalpy, ratio) = self.room;
        let resolution = solve::temperature_resolution();
        let celsius = solve::increasing_by_chords(low, high, resolution, |celsius| {
            let point = self.curve.point(celsius, surface);
            point.ratio_slope * (enthalpy - point.enthalpy) - point.enthalpy_slope * (ratio - point.ratio)
        });
        Some(Branch { surface, high, tangent: self.chord(celsius, surface) })
    }

    fn chord(&self, celsius: S, surface: Surface) -> Chord<S> {
        let (enthalpy, ratio) = self.room;
        let point = self.curve.point(celsius, surface);
        let drop = enthalpy - point.enthalpy;
        // A room on the curve has the curve's own direction for its limit.
        let slope = if drop > self.near {
            drop / (ratio - point.ratio).at_least(ratio * S::epsilon())
        } else {
            point.enthalpy_slope / point.ratio_slope
        };
        let at_coldest = celsius - self.curve.coldest <= solve::temperature_resolution::<S>() * k(64.0);
        Chord { slope, celsius, at_coldest, leaving: (point.enthalpy, point.ratio) }
    }
}

/// Why a room needs reheat, or that it does not.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum ReheatCause {
    /// It needs none.
    NotNeeded = 0,
    /// Its line misses what any setting of the coil leaves.
    LineMissesCoil = 1,
    /// Its line would meet the coil, or come nearer to it, below the coldest that the coil can hold.
    ColdestCoil = 2,
}

/// The least reheat of a room, over all flows of supply air.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct LeastReheat<S = f64> {
    /// Heat of the heater; zero where none is needed.
    pub reheat: HeatFlow<S>,
    /// Whether reheat is needed, and why.
    pub cause: ReheatCause,
    /// Flow at which it is least, with the supply behind the heater.
    pub supply: AirStream<S>,
    /// The air that leaves the coil.
    pub coil_leaving: MoistAir<S>,
    /// The limit of the room.
    pub limit: LimitingLine<S>,
}

/// The least reheat with which coil and heater keep a room of given gains: ṁ_w times what the slope of the room lacks to the limiting slope
/// (that of the tangent from the room to the curve of the coil). Any other flow takes more. Without need of reheat the supply is what the coil leaves.
///
/// Codes restrict simultaneous heating and cooling; this reports the reheat and does not judge it.
///
/// # Errors
/// [`Error::Infeasible`]: of the moisture gain, where none has to be taken out; of the dry-air flow, where the supply would need more than the
/// range allows; as [`limiting_line`]. [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::reheat::CoilLeaving;
/// use moistair_core::process::room::{MoistureSource, ReheatCause, RoomGains, least_reheat};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let room = MoistAir::from_dry_bulb(Temperature::from_celsius(24.0), RelativeHumidity::from_percent(50.0), site)?;
/// let gains = |kilowatts, per_hour| RoomGains {
///     sensible: HeatFlow::from_kilowatts(kilowatts),
///     moisture: MassFlow::from_kilograms_per_hour(per_hour),
///     source: MoistureSource::SaturatedVapor(Temperature::from_celsius(32.0)),
/// };
/// let coil = CoilLeaving::RelativeHumidity(RelativeHumidity::from_percent(95.0));
/// assert_eq!(least_reheat(&room, &gains(8.0, 3.0), &room, coil)?.cause, ReheatCause::NotNeeded);
/// let moist = least_reheat(&room, &gains(4.0, 5.0), &room, coil)?;
/// assert!(moist.cause == ReheatCause::LineMissesCoil && (1.5..3.5).contains(&moist.reheat.kilowatts()));
/// assert!(least_reheat(&room, &gains(4.0, -1.0), &room, coil).is_err()); // nothing to shed
/// # Ok::<(), Error>(())
/// ```
pub fn least_reheat<S: Scalar>(
    room: &MoistAir<S>,
    gains: &RoomGains<S>,
    entering: &MoistAir<S>,
    coil_leaving: CoilLeaving<S>,
) -> Result<LeastReheat<S>, Error> {
    let load = Load::of(gains, room.basis())?;
    if load.water <= k(0.0) {
        let (_, most) = Quantity::MoistureGain.limits();
        return Err(infeasible(Quantity::MoistureGain, load.water, k(0.0), k(most)));
    }
    let tangents = Tangents::of(room, entering, coil_leaving)?;
    let limit = tangents.limit(room);
    let (enthalpy, ratio) = parts(room);
    let met = tangents.meeting(load.total, load.water);
    let leaving = met.as_ref().map_or(limit.leaving, |point| (point.enthalpy, point.ratio));
    // The better conditioned of the two balances.
    let flow = if met.is_some() { load.total / (enthalpy - leaving.0) } else { load.water / (ratio - leaving.1) };
    let (_, most) = Quantity::DryAirFlow.limits();
    if !(flow > k(0.0) && flow <= k(most)) {
        let flow = if flow.is_nan() { S::infinity() } else { flow };
        return Err(infeasible(Quantity::DryAirFlow, flow, k(0.0), k(most)));
    }
    let needed = supply_at_flow(room, gains, MassFlow::from_kilograms_per_second(flow));
    let coil_air = unsaturated(leaving.0, leaving.1, room)?;
    let cause = match (met.is_some(), limit.at_coldest) {
        (true, _) => ReheatCause::NotNeeded,
        (false, false) => ReheatCause::LineMissesCoil,
        (false, true) => ReheatCause::ColdestCoil,
    };
    let (supply, reheat) = if met.is_some() {
        (AirStream { air: coil_air, dry_air_flow: flow }, k(0.0))
    } else {
        let supply = needed?.supply;
        (supply, (flow * (parts(&supply.air()).0 - leaving.0)).at_least(k(0.0)))
    };
    Ok(LeastReheat { reheat: HeatFlow::from_watts(reheat), cause, supply, coil_leaving: coil_air, limit })
}
