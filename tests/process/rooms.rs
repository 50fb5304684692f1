//! Rooms: books both ways, sensible heat ratio and slope, where lines meet saturation, and the least reheat.

use crate::support::*;
use moistair_core::process::coil::{self, CondensateTemperature};
use moistair_core::process::reheat::{self, CoilLeaving};
use moistair_core::process::room::{self, MoistureSource, ReheatCause, RoomGains};
use moistair_core::*;
use proptest::prelude::*;
use std::cell::Cell;

const DRAIN: CondensateTemperature = CondensateTemperature::LeavingAir;

fn gains(sensible: f64, moisture: f64, source: MoistureSource) -> RoomGains {
    RoomGains { sensible: HeatFlow::from_watts(sensible), moisture: flow(moisture), source }
}

fn sources() -> impl Strategy<Value = MoistureSource> {
    prop_oneof![
        3 => (0.0..150.0_f64).prop_map(|t| MoistureSource::SaturatedVapor(celsius(t))),
        1 => (0.0..100.0_f64).prop_map(|t| MoistureSource::Liquid(celsius(t))),
        1 => (-4e5..3.5e6_f64).prop_map(|h| MoistureSource::Enthalpy(joules(h))),
    ]
}

/// Gains of either sign, and none.
fn any_gains() -> impl Strategy<Value = RoomGains> {
    let heat = prop_oneof![1 => Just(0.0), 6 => -2e4..4e4_f64, 1 => 1e-6..1.0_f64];
    let water = prop_oneof![1 => Just(0.0), 6 => -4e-3..1e-2_f64, 1 => 1e-12..1e-7_f64];
    (heat, water, sources()).prop_map(|(heat, water, source)| gains(heat, water, source))
}

/// A room that a coil can serve.
fn usual_rooms() -> impl Strategy<Value = MoistAir> {
    (prop::sample::select(Formulation::ALL), 70_000.0..105_000.0_f64, 18.0..30.0_f64, 0.3..0.75_f64).prop_map(
        |(formulation, pressure, t, humidity)| {
            at(t, humidity, Basis::new(Pressure::from_pascals(pressure), formulation))
        },
    )
}

fn usual_coils() -> impl Strategy<Value = CoilLeaving> {
    let bypass = (0.01..0.25_f64, -5.0..8.0_f64)
        .prop_map(|(factor, coldest)| CoilLeaving::Bypass { factor, coldest: celsius(coldest) });
    prop_oneof![
        1 => Just(CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(1.0))),
        2 => (0.85..1.0_f64).prop_map(|x| CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(x))),
        3 => bypass,
    ]
}

fn total(gains: &RoomGains, basis: Basis) -> f64 {
    let enthalpy = match gains.source {
        MoistureSource::SaturatedVapor(t) => {
            moistair_core::process::humidify::saturated_steam_enthalpy(t).unwrap().joules_per_kilogram()
        }
        MoistureSource::Liquid(t) => liquid_water_enthalpy(t, basis).unwrap().joules_per_kilogram(),
        MoistureSource::Enthalpy(h) => h.joules_per_kilogram(),
    };
    gains.sensible.watts() + gains.moisture.kilograms_per_second() * enthalpy
}

#[test]
fn supply_of_a_temperature() {
    let found = Cell::new(0_u32);
    check((airs(), any_gains(), -40.0..40.0_f64), |(room, gains, difference)| {
        let (coldest, warmest) = room.formulation().limits(Quantity::LeavingTemperature);
        let t = (room.dry_bulb().celsius() + difference).clamp(coldest, warmest);
        match room::supply_at_temperature(&room, &gains, celsius(t)) {
            Ok(done) => {
                found.set(found.get() + 1);
                prop_assert_eq!(done.supply.air().dry_bulb().celsius(), t);
                prop_assert!(same_bits(&done.room.air().air(), &room) && valid(&done.supply.air()));
                prop_assert!(done.supply.dry_air_flow().kilograms_per_second() > 0.0);
                holds(&[done.supply.into()], &done.room, &done.exchange)?;
            }
            Err(Error::Infeasible { quantity, value, min, max }) => {
                prop_assert!(matches!(quantity, Quantity::DryAirFlow | Quantity::HumidityRatio));
                prop_assert!(value < min || value > max || value == 0.0 && min == 0.0, "{value} {min} {max}");
            }
            Err(error) => return Err(TestCaseError::fail(format!("{error:?}"))),
        }
        Ok(())
    });
    println!("supplies of a temperature: {}", found.get());
    assert!(found.get() > 50);
}

#[test]
fn supply_of_a_flow_there_and_back() {
    let found = Cell::new(0_u32);
    check((airs(), any_gains(), 0.02..50.0_f64), |(room, gains, m)| {
        let done = match room::supply_at_flow(&room, &gains, flow(m)) {
            Ok(done) => done,
            Err(Error::Infeasible { value, min, max, .. }) => {
                prop_assert!(value < min || value > max, "{value} {min} {max}");
                return Ok(());
            }
            Err(error) => return Err(TestCaseError::fail(format!("{error:?}"))),
        };
        found.set(found.get() + 1);
        holds(&[done.supply.into()], &done.room, &done.exchange)?;
        // Back to the room, and to the gains.
        let again = room::room_of_supply(&done.supply, &gains).unwrap();
        holds(&[again.supply.into()], &again.room, &again.exchange)?;
        let (t, w, h) = numbers(&room);
        let wet = again.room.air();
        let scale = h.abs() + w * 2.5e6 + total(&gains, room.basis()).abs() / m + 3e5;
        prop_assert!((wet.specific_enthalpy().joules_per_kilogram() - h).abs() <= 1e-13 * scale, "{wet:?}");
        prop_assert!((wet.total_water().kilograms_per_kilogram() - w).abs() <= 1e-14 + 1e-13 * w);
        // Saturated rooms come back as saturated, give or take a drop.
        prop_assert!((wet.air().dry_bulb().celsius() - t).abs() < 1e-8, "{t} {wet:?}");
        let back = room::gains_between(&done.supply, &room, gains.source).unwrap();
        let rounding = 1e-13 * m * scale;
        prop_assert!((back.sensible.watts() - gains.sensible.watts()).abs() <= rounding * 4.0, "{back:?}");
        let drift = back.moisture.kilograms_per_second() - gains.moisture.kilograms_per_second();
        prop_assert!(drift.abs() <= 1e-14 * m * (1.0 + w), "{back:?}");
        // Of the flow given, the supply's own temperature says as much, where it differs from the room's.
        let (supplied, _, _) = numbers(&done.supply.air());
        let apart = (supplied - t).abs() > 1.0 && gains.sensible.watts().abs() > 100.0;
        if let (true, Ok(other)) = (apart, room::supply_at_temperature(&room, &gains, celsius(supplied))) {
            let same = other.supply.dry_air_flow().kilograms_per_second() / m - 1.0;
            prop_assert!(same.abs() < 1e-9, "{same}");
        }
        Ok(())
    });
    println!("supplies of a flow: {}", found.get());
    assert!(found.get() > 100);
}

/// A supply and gains make a room, in fog if need be; the books close all the same.
#[test]
fn rooms_of_supplies() {
    let wet = Cell::new(0_u32);
    check((streams(), any_gains()), |(supply, gains)| match room::room_of_supply(&supply, &gains) {
        Ok(done) => {
            wet.set(wet.get() + u32::from(done.room.air().is_wet()));
            holds(&[supply.into()], &done.room, &done.exchange)
        }
        Err(Error::Infeasible { value, min, max, .. }) => {
            prop_assert!(value < min || value > max, "{value} {min} {max}");
            Ok(())
        }
        Err(error) => Err(TestCaseError::fail(format!("{error:?}"))),
    });
    println!("rooms in fog: {}", wet.get());
    assert!(wet.get() > 0);
}

/// No moisture: the humidity ratio stays, bit for bit. No sensible heat, from vapor of the room's own enthalpy: the temperature stays.
#[test]
fn limits_of_gains() {
    check((usual_rooms(), 100.0..2e4_f64, 2.0..12.0_f64, 1e-4..5e-4_f64), |(air, heat, difference, water)| {
        let source = MoistureSource::SaturatedVapor(celsius(30.0));
        let t = numbers(&air).0 - difference;
        if let Ok(dry) = room::supply_at_temperature(&air, &gains(heat, 0.0, source), celsius(t)) {
            prop_assert_eq!(dry.supply.air().humidity_ratio(), air.humidity_ratio());
            let m = dry.supply.dry_air_flow().kilograms_per_second();
            let expected = heat / (numbers(&air).2 - numbers(&dry.supply.air()).2);
            prop_assert!((m / expected - 1.0).abs() < 1e-12);
        }
        let own = MoistureSource::Enthalpy(room::latent_heat(&air));
        let latent = gains(0.0, water, own);
        prop_assert!(room::sensible_heat_ratio(&air, &latent).unwrap().abs() < 1e-15);
        let moist = room::supply_at_flow(&air, &latent, flow(1.0)).unwrap().supply.air();
        // Vapor of other air has nearly the same enthalpy; of the ideal gas, just the same.
        let near = if air.formulation() == Formulation::IdealGas { 1e-10 } else { 1e-3 };
        prop_assert!((numbers(&moist).0 - numbers(&air).0).abs() < near);
        // Nothing gained: nothing to supply, at any temperature; any flow keeps the room.
        let nothing = gains(0.0, 0.0, source);
        prop_assert!(room::supply_at_temperature(&air, &nothing, celsius(t)).is_err());
        prop_assert!(room::supply_at_temperature(&air, &nothing, air.dry_bulb()).is_err());
        prop_assert!(same_bits(&room::room_of_supply(&stream(air, 1.0), &nothing).unwrap().room.air().air(), &air));
        // The flow scales with the gains, and nothing else does.
        if let Ok(one) = room::supply_at_temperature(&air, &gains(heat, water, source), celsius(t)) {
            let four = room::supply_at_temperature(&air, &gains(4.0 * heat, 4.0 * water, source), celsius(t)).unwrap();
            prop_assert!(same_bits(&one.supply.air(), &four.supply.air()));
            prop_assert_eq!(
                one.supply.dry_air_flow().kilograms_per_second() * 4.0,
                four.supply.dry_air_flow().kilograms_per_second()
            );
        }
        Ok(())
    });
}

/// Ratio and slope say the same; neither is clamped.
#[test]
fn ratio_and_slope() {
    let beyond = Cell::new([0_u32; 2]);
    check((airs(), any_gains()), |(air, gains)| {
        let (Ok(ratio), Ok(slope)) =
            (room::sensible_heat_ratio(&air, &gains), room::process_slope(&gains, air.basis()))
        else {
            return Ok(());
        };
        let mut count = beyond.get();
        count[0] += u32::from(ratio < 0.0);
        count[1] += u32::from(ratio > 1.0);
        beyond.set(count);
        // 1 − SHR is the latent share: it carries what the slope is known by.
        let by_slope = room::ratio_of_slope(&air, slope).unwrap();
        prop_assert!((by_slope - ratio).abs() <= 1e-12 * (1.0 + ratio.abs()), "{by_slope} {ratio}");
        if (1.0 - ratio).abs() > 1e-6 {
            let by_ratio = room::slope_of_ratio(&air, ratio).unwrap().joules_per_kilogram();
            let rounding = 1e-15 * (1.0 + ratio.abs()) / (1.0 - ratio).abs();
            prop_assert!((by_ratio / slope.joules_per_kilogram() - 1.0).abs() <= 1e-13 + 10.0 * rounding);
        }
        Ok(())
    });
    println!("ratios below 0 and above 1: {:?}", beyond.get());
    assert!(beyond.get().iter().all(|&count| count > 0));
}

/// What the line meets is saturated and on the line; a coil between states of the line finds the same; the higher the ratio the warmer.
#[test]
fn apparatus_dew_points() {
    let seen = Cell::new([0_u32; 3]);
    check((usual_rooms(), -1.0..2.0_f64, 0.001..0.3_f64), |(air, ratio, more)| {
        let found = room::apparatus_dew_points(&air, ratio).unwrap();
        let mut count = seen.get();
        count[found.count()] += 1;
        seen.set(count);
        let (t, w, h) = numbers(&air);
        let latent = room::latent_heat(&air).joules_per_kilogram();
        for met in [found.warmer, found.colder].into_iter().flatten() {
            let (_, ws, hs) = numbers(&at(met.celsius(), 1.0, air.basis()));
            // (h_r − h_s) (1 − SHR) = h_v (W_r − W_s)
            let off = (h - hs) * (1.0 - ratio) - latent * (w - ws);
            prop_assert!(off.abs() < 1e-6, "{off} of {ratio} at {met:?}");
            prop_assert!(met.celsius() <= t + 1e-2);
        }
        if let (Some(warmer), Some(colder)) = (found.warmer, found.colder) {
            prop_assert!(colder < warmer);
        }
        // Colder air of the line, as a coil would leave it.
        if ratio > 0.0 && ratio < 1.0 {
            let supply = room::supply_at_temperature(
                &air,
                &gains(1e3 * ratio, 1e3 * (1.0 - ratio) / latent, MoistureSource::Enthalpy(joules(latent))),
                celsius(t - 0.5),
            );
            if let Ok(supply) = supply {
                let coil = coil::apparatus_dew_points(&air, &supply.supply.air()).unwrap();
                let same = |one: Option<Temperature>, other: Option<coil::Apparatus>| match (one, other) {
                    (Some(one), Some(other)) => (one.celsius() - other.dew_point.celsius()).abs() < 1e-4,
                    (one, other) => one.is_none() && other.is_none(),
                };
                // A line that all but touches may do so or not, by the rounding of half a kelvin's difference.
                let limit = room::limiting_line(
                    &air,
                    &air,
                    CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(1.0)),
                );
                let touching = limit.is_ok_and(|limit| (limit.sensible_heat_ratio - ratio).abs() < 1e-6);
                prop_assert!(touching || same(found.warmer, coil.warmer), "{found:?} {coil:?}");
            }
        }
        let higher = room::apparatus_dew_points(&air, ratio + more).unwrap();
        if let (true, Some(one), Some(other)) = (ratio > 0.0, found.warmer, higher.warmer) {
            prop_assert!(one < other, "{ratio} {more}: {found:?} {higher:?}");
        }
        prop_assert!(ratio <= 0.0 || found.warmer.is_none() || higher.warmer.is_some());
        Ok(())
    });
    println!("lines that meet saturation nowhere, once, twice: {:?}", seen.get());
    assert!(seen.get().iter().all(|&count| count > 0));
}

/// A chart whose coordinates are temperature and humidity ratio bends the line: 0.3 K at the apparatus dew point of a moist room.
#[test]
fn straight_on_another_chart() {
    let site = sea_level(Formulation::IdealGas);
    let air = at(24.0, 0.5, site);
    let (t, w, _) = numbers(&air);
    let heat_capacity = air.specific_heat().joules_per_kilogram_kelvin();
    let latent = room::latent_heat(&air).joules_per_kilogram();
    for (ratio, apart) in [(0.9, 0.005), (0.8, 0.01), (0.75, 0.03), (0.7, 0.07), (0.65, 0.3)] {
        let slope = heat_capacity * (1.0 - ratio) / (ratio * latent);
        let (mut low, mut high) = (0.0, t);
        while high - low > 1e-9 {
            let middle = 0.5 * (low + high);
            if numbers(&at(middle, 1.0, site)).1 < w + slope * (middle - t) { low = middle } else { high = middle }
        }
        let found = room::apparatus_dew_points(&air, ratio).unwrap().warmer.unwrap().celsius();
        assert!((0.0..apart).contains(&(found - low)), "{ratio}: {found} {low}");
    }
}

/// Just above its limit a line meets saturation, just below it does not; a coil without bypass has the limit of one that saturates.
#[test]
fn limiting_ratio() {
    check(usual_rooms(), |air| {
        let saturating = CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(1.0));
        let limit = room::limiting_line(&air, &air, saturating).unwrap();
        let ratio = limit.sensible_heat_ratio;
        let count = |ratio| room::apparatus_dew_points(&air, ratio).unwrap().count();
        prop_assert!(count(ratio + 1e-6) > 0 && count(ratio - 1e-6) == 0, "{limit:?}");
        let no_bypass = CoilLeaving::Bypass { factor: 0.0, coldest: celsius(-40.0) };
        let other = room::limiting_line(&air, &air, no_bypass).unwrap();
        prop_assert!((other.sensible_heat_ratio - ratio).abs() < 1e-12);
        // The room's own air through a bypass: the same lines, less of the way.
        let bypass = CoilLeaving::Bypass { factor: 0.2, coldest: celsius(-40.0) };
        let shorter = room::limiting_line(&air, &air, bypass).unwrap();
        prop_assert!((shorter.sensible_heat_ratio - ratio).abs() < 1e-9, "{limit:?} {shorter:?}");
        // A coil that cannot get so cold serves less.
        let warm = CoilLeaving::Bypass { factor: 0.0, coldest: celsius(limit.touches.celsius() + 1.0) };
        if let Ok(bound) = room::limiting_line(&air, &air, warm) {
            // Next to the melting temperature liquid and ice have a tangent each.
            let melts = limit.touches.celsius().abs() < 3.0;
            prop_assert!((bound.at_coldest || melts) && bound.sensible_heat_ratio > ratio, "{bound:?}");
        }
        let moister = CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(0.9));
        prop_assert!(room::limiting_line(&air, &air, moister).unwrap().sensible_heat_ratio < ratio);
        Ok(())
    });
}

/// What the least reheat says is what coil and heater do at its flow, and at any other flow they do more.
#[test]
fn least_reheat_is_least() {
    let seen = Cell::new([0_u32; 3]);
    let cases =
        (usual_rooms(), usual_coils(), 500.0..8e3_f64, 2e-4..4e-3_f64, (0.0..8.0_f64, 0.0..0.5_f64), 0.5..2.0_f64);
    check(cases, |(air, coil, heat, water, (warmer, moister), other)| {
        let (t, w, _) = numbers(&air);
        let entering = air_at(t + warmer, 0.9, air.basis());
        let moist = ratio((w * (1.0 + moister)).min(numbers(&entering).1));
        let entering = MoistAir::from_dry_bulb(entering.dry_bulb(), moist, air.basis()).unwrap();
        let gains = gains(heat, water, MoistureSource::SaturatedVapor(celsius(32.0)));
        let least = match room::least_reheat(&air, &gains, &entering, coil) {
            Ok(least) => least,
            Err(Error::Infeasible { quantity, .. }) => {
                prop_assert!(
                    matches!(
                        quantity,
                        Quantity::ApparatusDewPoint
                            | Quantity::BypassFactor
                            | Quantity::RelativeHumidity
                            | Quantity::HumidityRatio
                    ),
                    "{quantity:?}"
                );
                return Ok(());
            }
            Err(error) => return Err(TestCaseError::fail(format!("{error:?}"))),
        };
        let mut count = seen.get();
        count[least.cause as usize] += 1;
        seen.set(count);
        let slope = room::process_slope(&gains, air.basis()).unwrap().joules_per_kilogram();
        let lacking = water * (least.limit.slope.joules_per_kilogram() - slope);
        let reheat = least.reheat.watts();
        if least.cause == ReheatCause::NotNeeded {
            prop_assert!(reheat == 0.0 && lacking <= 1e-6 * heat, "{least:?}");
            prop_assert_eq!(least.supply.air(), least.coil_leaving);
        } else {
            prop_assert!((reheat - lacking).abs() <= 1e-7 * total(&gains, air.basis()), "{reheat} {lacking}");
            prop_assert_eq!(least.cause == ReheatCause::ColdestCoil, least.limit.at_coldest);
        }
        // The room is kept by this supply.
        let kept = room::room_of_supply(&least.supply, &gains).unwrap().room.air().air();
        prop_assert!((numbers(&kept).0 - t).abs() < 1e-6 && (numbers(&kept).1 / w - 1.0).abs() < 1e-7, "{kept:?}");
        // By coil and heater; where the tangent lies, the flow is known to the square root of rounding only.
        let m = least.supply.dry_air_flow().kilograms_per_second();
        let at_flow = |m: f64| room::conditioned(&air, &gains, &stream(entering, m), coil, DRAIN);
        if least.cause != ReheatCause::NotNeeded {
            let there = at_flow(m * (1.0 + 1e-9)).or_else(|_| at_flow(m)).unwrap();
            let done = there.reheat.reheat().watts();
            prop_assert!((done - reheat).abs() <= 1e-5 * total(&gains, air.basis()), "{done} {reheat} {least:?}");
            holds(
                &[stream(entering, m).into()].map(|_: process::WetStream| there.reheat.cooling.entering.into()),
                &there.reheat.cooling.leaving.into(),
                &there.reheat.cooling.exchange,
            )?;
            let heater = there.reheat.heating;
            holds(&[there.reheat.cooling.leaving.into()], &heater.leaving.into(), &heater.exchange)?;
            prop_assert!(same_bits(&heater.leaving.air(), &there.room.supply.air()));
        }
        if let Ok(elsewhere) = at_flow(m * other) {
            let done = elsewhere.reheat.reheat().watts();
            prop_assert!(done >= reheat - 1e-6 * total(&gains, air.basis()), "{done} {reheat}");
        }
        Ok(())
    });
    println!("reheat not needed, line misses the coil, coldest of the coil: {:?}", seen.get());
    assert!(seen.get().iter().all(|&count| count > 0));
}

/// What binds is named.
#[test]
fn what_binds() {
    let site = sea_level(Formulation::RealGas);
    let entering = stream(at(27.0, 0.55, site), 1.0);
    let binding = |target: &MoistAir, coil| match reheat::with_coil(&entering, target, coil, DRAIN) {
        Err(Error::Infeasible { quantity, value, min, max }) => {
            assert!(value < min || value > max, "{value} {min} {max}");
            Some(quantity)
        }
        Err(error) => panic!("{error:?}"),
        Ok(_) => None,
    };
    let bypass = |factor, coldest| CoilLeaving::Bypass { factor, coldest: celsius(coldest) };
    let target = at(20.0, 0.5, site);
    assert_eq!(binding(&target, bypass(0.1, 4.0)), None);
    assert_eq!(binding(&target, bypass(0.1, 9.0)), Some(Quantity::ApparatusDewPoint));
    assert_eq!(binding(&target, bypass(0.7, -40.0)), Some(Quantity::BypassFactor));
    assert_eq!(binding(&at(26.0, 0.95, site), bypass(0.1, 4.0)), Some(Quantity::HumidityRatio));
    assert_eq!(binding(&at(9.5, 0.97, site), bypass(0.3, -10.0)), Some(Quantity::LeavingTemperature));
    assert_eq!(binding(&target, bypass(1.0, 4.0)), Some(Quantity::BypassFactor));
    // Dry air to dry air: no number without a meaning in the error.
    let dry = at(20.0, 0.0, site);
    let error = reheat::with_coil(&stream(dry, 1.0), &dry, bypass(0.1, 4.0), DRAIN).unwrap_err();
    assert!(matches!(error, Error::Infeasible { max, .. } if !max.is_nan()), "{error:?}");
}

/// With one bypass factor and no limit, a target on the line of the coil needs no reheat: by_bypass_factor there and back.
#[test]
fn reheat_behind_a_bypass() {
    let cases = (usual_rooms(), 0.01..0.4_f64, 1.0..12.0_f64, 0.0..10.0_f64);
    check(cases, |(air, factor, apparatus, warmer)| {
        let entering = stream(air, 1.0);
        let coil = coil::by_bypass_factor(&entering, celsius(apparatus), factor, DRAIN).unwrap();
        let leaving = coil.leaving.air();
        // A coil that leaves saturated air may have led it through fog, whose droplets drain.
        let saturated = leaving.relative_humidity().unwrap().fraction() > 1.0 - 1e-9;
        if coil.condensate.kilograms_per_second() < 1e-4 || saturated {
            return Ok(());
        }
        let t = numbers(&leaving).0 + warmer;
        let target = MoistAir::restore(celsius(t), leaving.humidity_ratio(), leaving.basis()).unwrap();
        let kind = CoilLeaving::Bypass { factor, coldest: celsius(apparatus - 0.001) };
        let done = reheat::with_coil(&entering, &target, kind, DRAIN).unwrap();
        let off = numbers(&done.cooling.leaving.air()).0 - numbers(&leaving).0;
        prop_assert!(off.abs() < 1e-9, "{off}");
        let heat = numbers(&target).2 - numbers(&leaving).2;
        prop_assert!((done.reheat().watts() - heat).abs() < 1e-5);
        Ok(())
    });
}

/// A saturated room has the direction of saturation itself for its limit; a coil that gets as dry as the room and no drier has none.
#[test]
fn rooms_at_the_ends_of_the_curve() {
    for &formulation in Formulation::ALL {
        let site = sea_level(formulation);
        let full = CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(1.0));
        let saturated = at(20.0, 1.0, site);
        let limit = room::limiting_line(&saturated, &saturated, full).unwrap();
        let (one, other) = (numbers(&at(19.999, 1.0, site)), numbers(&at(20.001, 1.0, site)));
        let slope = (other.2 - one.2) / (other.1 - one.1);
        assert!((limit.slope.joules_per_kilogram() / slope - 1.0).abs() < 1e-6, "{limit:?} {slope}");
        // Nearly so: the line to the curve turns into its direction.
        let nearly = at(20.0, 1.0 - 1e-7, site);
        let near = room::limiting_line(&nearly, &nearly, full).unwrap().slope;
        assert!((near.joules_per_kilogram() / slope - 1.0).abs() < 1e-3, "{near:?} {slope}");

        let space = at(24.0, 0.5, site);
        let dew_point = space.dew_point().unwrap().celsius();
        let down_to = |t| CoilLeaving::Bypass { factor: 0.0, coldest: celsius(t) };
        let just = room::limiting_line(&space, &space, down_to(dew_point - 1e-6)).unwrap();
        assert!(just.at_coldest && just.sensible_heat_ratio > 0.999, "{just:?}");
        let error = room::limiting_line(&space, &space, down_to(dew_point + 1e-9)).unwrap_err();
        assert!(matches!(error, Error::Infeasible { quantity: Quantity::ApparatusDewPoint, .. }), "{error:?}");
    }
}
