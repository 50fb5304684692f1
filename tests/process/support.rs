//! Short names, random states over the whole domain, and what is asked of every outlet.

use moistair_core::process::books::{self, Books};
use moistair_core::process::{AirStream, Exchange, WetStream};
use moistair_core::*;
use proptest::prelude::*;
use proptest::test_runner::{Config, RngAlgorithm, TestRng, TestRunner};

pub fn celsius(t: f64) -> Temperature {
    Temperature::from_celsius(t)
}

pub fn ratio(w: f64) -> HumidityRatio {
    HumidityRatio::from_kilograms_per_kilogram(w)
}

pub fn flow(m: f64) -> MassFlow {
    MassFlow::from_kilograms_per_second(m)
}

pub fn joules(h: f64) -> SpecificEnthalpy {
    SpecificEnthalpy::from_joules_per_kilogram(h)
}

pub fn at(t: f64, relative_humidity: f64, basis: Basis) -> MoistAir {
    MoistAir::from_dry_bulb(celsius(t), RelativeHumidity::from_fraction(relative_humidity), basis).unwrap()
}

pub fn stream(air: MoistAir, dry_air: f64) -> AirStream {
    AirStream::new(air, flow(dry_air)).unwrap()
}

pub fn sea_level(formulation: Formulation) -> Basis {
    Basis::new(Pressure::from_pascals(101_325.0), formulation)
}

/// t, W, h as plain numbers.
pub fn numbers(air: &MoistAir) -> (f64, f64, f64) {
    (
        air.dry_bulb().celsius(),
        air.humidity_ratio().kilograms_per_kilogram(),
        air.specific_enthalpy().joules_per_kilogram(),
    )
}

pub fn same_bits(a: &MoistAir, b: &MoistAir) -> bool {
    let bits = |air: &MoistAir| {
        let (t, w, h) = numbers(air);
        [t, w, h, air.pressure().pascals(), air.specific_volume().cubic_meters_per_kilogram()].map(f64::to_bits)
    };
    bits(a) == bits(b) && a.formulation() == b.formulation()
}

/// Tries a law on random cases; the same ones each time.
pub fn check<T: Strategy>(cases: T, law: impl Fn(T::Value) -> Result<(), TestCaseError>) {
    let wanted = std::env::var("MOISTAIR_CASES").map_or(500, |cases| cases.parse().unwrap());
    let config =
        Config { cases: wanted, failure_persistence: None, max_global_rejects: 100 * wanted, ..Config::default() };
    let random = TestRng::from_seed(RngAlgorithm::ChaCha, &[7; 32]);
    if let Err(failure) = TestRunner::new_with_rng(config, random).run(&cases, law) {
        panic!("{failure}");
    }
}

/// Ends of the range, what most plants run at, and everything between.
fn pressures(formulation: Formulation) -> impl Strategy<Value = f64> {
    let (low, high) = formulation.limits(Quantity::Pressure);
    prop_oneof![
        1 => Just(low),
        1 => Just(high),
        4 => 70_000.0..110_000.0,
        4 => (low.ln()..high.ln()).prop_map(move |x| x.exp().clamp(low, high)),
    ]
}

pub fn bases() -> impl Strategy<Value = Basis> {
    prop::sample::select(Formulation::ALL).prop_flat_map(|formulation| {
        pressures(formulation).prop_map(move |pressure| Basis::new(Pressure::from_pascals(pressure), formulation))
    })
}

pub fn dry_bulbs_of(formulation: Formulation) -> impl Strategy<Value = f64> {
    let (coldest, warmest) = formulation.limits(Quantity::DryBulb);
    prop_oneof![
        1 => Just(coldest), 1 => Just(warmest), 1 => Just(0.0), 1 => Just(0.01), 1 => Just(-40.0),
        5 => -5.0..5.0, 15 => -20.0..60.0, 10 => coldest..warmest
    ]
}

/// Within the range of every formulation.
pub fn dry_bulbs() -> impl Strategy<Value = f64> {
    dry_bulbs_of(Formulation::RealGas)
}

/// Dry, saturated, and between.
pub fn fractions() -> impl Strategy<Value = f64> {
    prop_oneof![1 => Just(0.0), 2 => Just(1.0), 9 => 0.0..1.0, 1 => 0.99..1.0]
}

/// Air at a share of what it can hold in equilibrium.
pub fn air_at(t: f64, share: f64, basis: Basis) -> MoistAir {
    let by_humidity = MoistAir::from_dry_bulb(celsius(t), RelativeHumidity::from_fraction(share), basis);
    let most = WaterMoleFraction::from_fraction(0.94 * share);
    by_humidity.or_else(|_| MoistAir::from_dry_bulb(celsius(t), most, basis)).unwrap()
}

pub fn airs_on(basis: Basis) -> impl Strategy<Value = MoistAir> {
    (dry_bulbs_of(basis.formulation()), fractions()).prop_map(move |(t, share)| air_at(t, share, basis))
}

pub fn airs() -> impl Strategy<Value = MoistAir> {
    bases().prop_flat_map(airs_on)
}

pub fn flows() -> impl Strategy<Value = f64> {
    prop_oneof![1 => Just(1.0), 1 => 1e-6..1e-3, 3 => 0.01..100.0]
}

pub fn streams() -> impl Strategy<Value = AirStream> {
    (airs(), flows()).prop_map(|(air, flow)| stream(air, flow))
}

/// Air with liquid, ice or both in equilibrium, or with none; made from a temperature-like mixture of enthalpy and water.
pub fn wet_airs_on(basis: Basis) -> impl Strategy<Value = AirWithCondensate> {
    (dry_bulbs_of(basis.formulation()), fractions(), 0.0..0.05_f64, prop::bool::ANY).prop_filter_map(
        "a state",
        move |(t, share, surplus, wet)| {
            let air = air_at(t, share, basis);
            if !wet {
                return Some(air.into());
            }
            let (_, w, h) = numbers(&air);
            AirWithCondensate::from_enthalpy_and_water(
                joules(h),
                ratio((w + surplus).min(10.0)),
                Freezing::Equilibrium,
                basis,
            )
            .ok()
        },
    )
}

/// Whether rounding apart the numbers make a valid state.
pub fn valid(air: &MoistAir) -> bool {
    let restored = MoistAir::restore(air.dry_bulb(), air.humidity_ratio(), air.basis());
    restored.is_ok_and(|restored| same_bits(&restored, air))
}

/// Every outlet is a state, with no negative condensate and nothing that is not a number.
pub fn sound(leaving: &WetStream) -> Result<(), TestCaseError> {
    let wet = leaving.air();
    let (liquid, ice) = (wet.liquid().kilograms_per_kilogram(), wet.ice().kilograms_per_kilogram());
    prop_assert!(liquid >= 0.0 && ice >= 0.0, "condensate {liquid} {ice}");
    prop_assert!(valid(&wet.air()), "no state: {:?}", wet.air());
    prop_assert!(wet.specific_enthalpy().joules_per_kilogram().is_finite());
    Ok(())
}

/// The share of its allowance that the heat book takes.
pub fn share(books: &Books) -> f64 {
    let allowed = 8.0 * f64::EPSILON * books.heat_scale.watts() + books.heat_resolution.watts();
    if books.heat_residual.watts() == 0.0 { 0.0 } else { books.heat_residual.watts().abs() / allowed }
}

/// The largest share of the allowance so far, per formulation.
static WORST: std::sync::Mutex<[f64; 3]> = std::sync::Mutex::new([0.0; 3]);

fn record(formulation: Formulation, books: &Books) {
    let mut worst = WORST.lock().unwrap();
    let slot = &mut worst[formulation.code() as usize];
    if share(books) > *slot {
        *slot = share(books);
        println!("books of {formulation:?}: {:.3} of the allowance", *slot);
    }
}

/// Every process: a sound outlet, dry air kept, books that close.
pub fn holds(entering: &[WetStream], leaving: &WetStream, exchange: &Exchange) -> Result<(), TestCaseError> {
    sound(leaving)?;
    let dry_air = |stream: &WetStream| stream.dry_air_flow().kilograms_per_second();
    let (came, went) = (entering.iter().map(dry_air).sum::<f64>(), dry_air(leaving));
    prop_assert!((came - went).abs() <= came * 1e-15, "dry air {came} {went}");
    let books = books::balance(entering, leaving, exchange);
    record(leaving.air().air().formulation(), &books);
    prop_assert!(books.close(), "{:.2} of the allowance, {books:?}\n{entering:?}\n{leaving:?}", share(&books));
    Ok(())
}
