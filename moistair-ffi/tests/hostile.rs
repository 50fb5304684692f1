//! Every export with every class of number, selector, structure and pointer, drawn from a seeded generator: a status comes back, nothing
//! panics (a panic in an `extern "C"` function ends the process), nothing is written but on success, no NaN comes back where a value is
//! promised, every state that comes back is accepted again and means the same.
//!
//! `MOISTAIR_CASES=10000000 cargo test --release -p moistair-ffi --test hostile` takes longer and sees more.

#![allow(clippy::unwrap_used, clippy::indexing_slicing, reason = "a test")]

use core::cell::{Cell, RefCell};
use std::collections::{BTreeMap, BTreeSet};
use std::{env, fs};

use moistair::*;
use moistair_core::columns::{Field, Process};
use moistair_tests::checks::Random;
use moistair_tests::plausible::plausible;

const SENTINEL: u64 = 0xA5A5_5A5A_A5A5_5A5A;
const NAN_BITS: u64 = 0x7FF8_0000_0000_0000;

/// A structure of the interface as 8-byte words.
trait Words: Copy {
    /// Words that hold integers, or what the library keeps to itself.
    const INTEGERS: &'static [usize] = &[];
    /// Words that may be NaN on success.
    const OPTIONAL: &'static [usize] = &[];
    /// Words at which a state begins.
    const STATES: &'static [usize] = &[];

    fn words(self) -> Vec<u64> {
        assert_eq!(size_of::<Self>() % 8, 0);
        let mut words = vec![0; size_of::<Self>() / 8];
        // SAFETY: structures of numbers without padding, of this size.
        unsafe { words.as_mut_ptr().cast::<Self>().write_unaligned(self) };
        words
    }

    fn from_words(words: &[u64]) -> Self {
        assert_eq!(size_of::<Self>(), 8 * words.len());
        // SAFETY: structures of numbers, any bits are one.
        unsafe { words.as_ptr().cast::<Self>().read_unaligned() }
    }
}

macro_rules! words {
    ($($name:ty, $integers:expr, $optional:expr, $states:expr;)*) => {$(
        impl Words for $name {
            const INTEGERS: &'static [usize] = &$integers;
            const OPTIONAL: &'static [usize] = &$optional;
            const STATES: &'static [usize] = &$states;
        }
    )*};
}

words! {
    f64, [], [], [];
    u64, [0], [], [];
    moistair_limits, [], [], [];
    moistair_field, [0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20, 21, 22, 23], [], [];
    moistair_basis, [1], [], [];
    moistair_state, [12], [], [0];
    moistair_stream, [12], [], [0];
    moistair_air_with_condensate, [12], [], [0];
    moistair_wet_stream, [12], [], [0];
    moistair_exchange, [], [], [];
    moistair_sensible, [12], [], [0];
    moistair_cooling, [12, 26, 36], [35], [0, 14];
    moistair_reheat, [12, 26, 36, 49], [35, 54], [0, 14, 37];
    moistair_humidified, [12], [], [0];
    moistair_steam_absorption, [], [0, 1], [];
    moistair_throttled_steam, [3], [], [];
    moistair_washed, [12, 26], [], [0];
    moistair_direct_cooled, [12, 28, 29], [], [0];
    moistair_indirect_cooled, [12, 29, 42], [], [0, 17];
    moistair_two_stage_cooled, [12, 29, 42, 55, 71, 72], [], [0, 17, 43];
    moistair_apparatus, [], [], [];
    moistair_apparatus_dew_points, [5], [0, 1, 2, 3], [];
    moistair_coil_surface, [2], [], [];
    moistair_coil_water, [], [], [];
    moistair_water_coil, [12, 26, 36, 40], [35], [0, 14];
    moistair_load_by_water, [], [], [];
    moistair_compressed, [12], [], [0];
    moistair_room_gains, [3], [], [];
    moistair_room_air, [12, 26], [], [0, 14];
    moistair_room_dew_points, [2], [0, 1], [];
    moistair_coil_leaving, [2], [], [];
    moistair_limiting_line, [3], [], [];
    moistair_least_reheat, [12, 26, 30, 32], [], [0, 14];
    moistair_conditioned, [12, 26, 47, 61, 71, 84], [70, 89], [0, 14, 35, 49, 72];
    moistair_sorption, [2], [], [];
    moistair_sorbed, [12], [], [0];
    moistair_wheel, [12, 32, 49, 57], [55], [0, 20, 37];
    moistair_potentials, [], [], [];
    moistair_potential_wheel, [12, 29, 38], [35, 36], [0, 17];
    moistair_books, [5], [], [];
    moistair_sequence_total, [12, 35, 36], [], [0];
    moistair_solved, [12, 35, 36, 44, 45], [], [0];
    moistair_tower_water, [], [], [];
    moistair_water_treatment, [], [], [];
    moistair_water_use, [4], [], [];
    moistair_tower_balance, [12, 21], [25], [0];
    moistair_basin, [], [], [];
    moistair_hot_water, [], [], [];
    moistair_pinch, [], [], [];
    moistair_merkel_number, [], [], [];
    moistair_tower_rating, [9], [8], [];
    moistair_poppe_rating, [12, 30], [29], [0];
    moistair_fill_law, [], [], [];
    moistair_fill_test, [], [], [];
    moistair_reading, [2], [0, 1], [];
    moistair_measured_air, [2, 5, 6], [0, 1, 3, 4], [];
    moistair_outdoor_air_fraction, [2], [0, 1], [];
    moistair_blend, [12, 19], [], [0];
    moistair_economizer, [1, 12], [], [];
    moistair_economizer_state, [0, 1, 2, 3, 4, 5], [], [];
    moistair_decision, [3, 4, 5], [], [];
    moistair_coil_load, [1], [], [];
    moistair_channel, [6, 7], [0, 1, 2, 3, 4, 5], [];
    moistair_channel_state, [0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11], [], [];
    moistair_checked, [1, 2], [0], [];
    moistair_total, [0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14], [], [];
    moistair_total_values, [], [3, 4, 5], [];
    moistair_period, [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15], [], [];
    moistair_periods, [0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16], [], [];
    moistair_books_total, [0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14], [], [];
    moistair_books_total_values, [5, 6, 12, 13, 14], [], [];
    moistair_deviation, [0, 1, 2, 3, 4, 5, 6, 7], [], [];
    moistair_deviation_values, [4, 5], [0, 1, 2, 3], [];
}

impl Words for moistair_counts {}

/// Draws what a hostile, a careless or a careful caller hands over.
struct Caller {
    seed: Cell<u64>,
    /// A required pointer of this call is null or misaligned.
    broken: Cell<bool>,
    /// Structures that came back.
    known: RefCell<BTreeMap<usize, Vec<Vec<u64>>>>,
}

impl Caller {
    /// splitmix64 (Steele, Lea and Flood 2014, OOPSLA '14, 453–472).
    fn bits(&self) -> u64 {
        self.seed.set(self.seed.get().wrapping_add(0x9E37_79B9_7F4A_7C15));
        let mut z = self.seed.get();
        z = (z ^ (z >> 30)).wrapping_mul(0xBF58_476D_1CE4_E5B9);
        z = (z ^ (z >> 27)).wrapping_mul(0x94D0_49BB_1331_11EB);
        z ^ (z >> 31)
    }

    fn below(&self, n: u64) -> u64 {
        self.bits() % n
    }

    fn unit(&self) -> f64 {
        (self.bits() >> 11) as f64 / (1_u64 << 53) as f64
    }

    fn special(&self) -> f64 {
        let all = [
            f64::NAN,
            -f64::NAN,
            f64::from_bits(0x7FF0_0000_0000_0001),
            f64::INFINITY,
            f64::NEG_INFINITY,
            0.0,
            -0.0,
            f64::from_bits(1),
            -f64::MIN_POSITIVE,
            f64::MAX,
            f64::MIN,
            f64::EPSILON,
            1.0,
            -1.0,
        ];
        all[self.below(all.len() as u64) as usize]
    }

    /// An end of a declared range, or the next number to it.
    fn edge(&self) -> f64 {
        let all = moistair_core::Quantity::ALL;
        let (min, max) = all[self.below(all.len() as u64) as usize].limits();
        let end = if self.below(2) == 0 { min } else { max };
        match self.below(3) {
            0 => end,
            1 => f64::from_bits(end.to_bits().wrapping_add(1)),
            _ => f64::from_bits(end.to_bits().wrapping_sub(1)),
        }
    }

    /// Any class of number.
    fn wild(&self) -> f64 {
        match self.below(4) {
            0 => self.special(),
            1 => f64::from_bits(self.bits()),
            2 => self.edge(),
            // Every order of magnitude alike, either sign.
            _ => f64::from_bits(self.bits() & 0x800F_FFFF_FFFF_FFFF | self.below(0x7FF) << 52),
        }
    }

    /// Mostly in a range.
    fn number(&self, low: f64, high: f64) -> f64 {
        if self.below(8) == 0 { self.wild() } else { low + (high - low) * self.unit() }
    }

    /// Mostly a selector below a count.
    fn selector(&self, count: i32) -> i32 {
        match self.below(16) {
            0 => self.bits() as i32,
            1 => [-1, i32::MIN, i32::MAX, count][self.below(4) as usize],
            _ => self.below(count as u64) as i32,
        }
    }

    /// Mostly a process.
    fn process(&self) -> i32 {
        let all = Process::ALL;
        let code = all[self.below(all.len() as u64) as usize].code();
        [self.bits() as i32, code + 1, code, code, code, code, code, code][self.below(8) as usize]
    }

    fn mask(&self) -> u64 {
        match self.below(8) {
            0 => self.bits(),
            1 => (1 << MOISTAIR_PROPERTY_COUNT) - 1,
            _ => 1 << self.selector(MOISTAIR_PROPERTY_COUNT).rem_euclid(64),
        }
    }

    /// A second property in its own range.
    fn second(&self) -> (i32, f64) {
        self.value_of(self.selector(MOISTAIR_PROPERTY_COUNT))
    }

    /// Two properties; half of them fix a state.
    fn pair(&self) -> [(i32, f64); 2] {
        let pairs = [
            (MOISTAIR_DEW_POINT, MOISTAIR_RELATIVE_HUMIDITY),
            (MOISTAIR_RELATIVE_HUMIDITY_OVER_LIQUID, MOISTAIR_HUMIDITY_RATIO),
            (MOISTAIR_SPECIFIC_ENTHALPY, MOISTAIR_DEGREE_OF_SATURATION),
            (MOISTAIR_WET_BULB, MOISTAIR_RELATIVE_HUMIDITY),
            (MOISTAIR_WET_BULB_OVER_LIQUID, MOISTAIR_VAPOR_PRESSURE),
            (MOISTAIR_FROST_POINT, MOISTAIR_SPECIFIC_ENTHALPY),
        ];
        let (first, second) = pairs[self.below(pairs.len() as u64) as usize];
        if self.below(2) == 0 { [self.second(), self.second()] } else { [self.value_of(first), self.value_of(second)] }
    }

    fn value_of(&self, selector: i32) -> (i32, f64) {
        let (low, high) = match selector {
            MOISTAIR_HUMIDITY_RATIO | MOISTAIR_SPECIFIC_HUMIDITY | MOISTAIR_ABSOLUTE_HUMIDITY => (0.0, 0.03),
            MOISTAIR_WATER_MOLE_FRACTION => (0.0, 0.05),
            MOISTAIR_VAPOR_PRESSURE => (0.0, 5e3),
            MOISTAIR_SPECIFIC_ENTHALPY => (-2e4, 1e5),
            MOISTAIR_SPECIFIC_VOLUME | MOISTAIR_DENSITY => (0.8, 1.3),
            MOISTAIR_RELATIVE_HUMIDITY | MOISTAIR_RELATIVE_HUMIDITY_OVER_LIQUID | MOISTAIR_DEGREE_OF_SATURATION => {
                (0.0, 1.02)
            }
            _ => (-30.0, 40.0),
        };
        (selector, self.number(low, high))
    }

    /// A structure that the library made; or that with a word changed; or any bits.
    fn structure<T: Words>(&self, fresh: T) -> T {
        let mut words = fresh.words();
        if self.below(2) == 0 {
            if let Some(known) = self.known.borrow().get(&Self::key::<T>()) {
                words.clone_from(&known[self.below(known.len() as u64) as usize]);
            }
        }
        match self.below(16) {
            0 => words.iter_mut().for_each(|word| *word = self.bits()),
            1..=3 => {
                let place = self.below(words.len() as u64) as usize;
                let small = self.below(4) | (self.below(4) << 32);
                words[place] = [self.wild().to_bits(), self.bits(), small][self.below(3) as usize];
            }
            _ => {}
        }
        T::from_words(&words)
    }

    fn key<T>() -> usize {
        // The name's address would do, the size and the name's hash are stable.
        core::any::type_name::<T>().bytes().fold(size_of::<T>(), |sum, byte| sum.wrapping_mul(31) + usize::from(byte))
    }

    fn keep<T: Words>(&self, value: &T) {
        let mut known = self.known.borrow_mut();
        let kept = known.entry(Self::key::<T>()).or_default();
        if kept.len() < 64 {
            kept.push(value.words());
        } else {
            let place = self.below(64) as usize;
            kept[place] = value.words();
        }
    }

    /// Mostly one and the same, since processes want states of one formulation.
    fn formulation(&self) -> i32 {
        match self.below(8) {
            0 => self.selector(3),
            1 => MOISTAIR_HELMHOLTZ,
            2 | 3 => MOISTAIR_IDEAL_GAS,
            _ => MOISTAIR_REAL_GAS,
        }
    }

    /// The highest pressure and temperature of a formulation.
    fn ends(formulation: i32) -> (f64, f64) {
        if formulation == MOISTAIR_HELMHOLTZ { (5e6, 200.0) } else { (1.1e6, 150.0) }
    }

    fn state(&self) -> moistair_state {
        // Half of the states come from the whole range, half from where plant works.
        let wide = self.below(2) == 0;
        let formulation = self.formulation();
        let (highest, warmest) = Self::ends(formulation);
        let pressure = if wide { self.number(2e4, highest) } else { self.number(7e4, 1.1e5) };
        let basis = moistair_basis { pressure, formulation, reserved: self.bits() as i32 };
        let mut state = moistair_state::from_words(&[0; 13]);
        let humidity = self.number(0.0, 1.0);
        // SAFETY: valid places.
        unsafe {
            let dry_bulb = if wide { self.number(-80.0, warmest) } else { self.number(-40.0, 60.0) };
            moistair_from_dry_bulb(
                dry_bulb,
                MOISTAIR_RELATIVE_HUMIDITY,
                humidity,
                basis,
                &mut state,
                core::ptr::null_mut(),
            );
        }
        self.structure(state)
    }

    fn basis(&self) -> moistair_basis {
        let formulation = self.formulation();
        let pressure = self.number(2e4, Self::ends(formulation).0);
        self.structure(moistair_basis { pressure, formulation, reserved: 0 })
    }

    fn stream(&self) -> moistair_stream {
        self.structure(moistair_stream { air: self.state(), dry_air_flow: self.number(0.0, 10.0) })
    }

    fn wet_stream(&self) -> moistair_wet_stream {
        let (liquid, ice) = (self.number(0.0, 0.001), self.number(0.0, 0.001));
        let total_water = 0.0;
        let mixture =
            moistair_air_with_condensate { air: self.state(), liquid, ice, total_water, specific_enthalpy: 0.0 };
        self.structure(moistair_wet_stream { mixture, dry_air_flow: self.number(0.0, 10.0) })
    }

    /// A zeroed structure, or one that came back.
    fn kept<T: Words>(&self) -> T {
        self.structure(T::from_words(&vec![0; size_of::<T>() / 8]))
    }

    /// The pointer, or now and then null or a misaligned one.
    fn pointer<T>(&self, value: &T) -> *const T {
        let pointer = core::ptr::from_ref(value);
        match self.below(96) {
            0 => {
                self.broken.set(true);
                core::ptr::null()
            }
            1 if align_of::<T>() > 1 => {
                self.broken.set(true);
                pointer.wrapping_byte_add(1)
            }
            _ => pointer,
        }
    }

    fn place<T>(&self, value: &mut T) -> *mut T {
        let pointer = core::ptr::from_mut(value);
        let shift = self.pointer(value).addr();
        if shift == 0 { core::ptr::null_mut() } else { pointer.wrapping_byte_add(shift - pointer.addr()) }
    }

    /// Null now and then, which an optional place may be.
    fn optional<T>(&self, value: &mut T) -> *mut T {
        if self.below(4) == 0 { core::ptr::null_mut() } else { core::ptr::from_mut(value) }
    }
}

/// What is the same for every call.
fn verdict(caller: &Caller, name: &str, status: i32, error: Option<&moistair_error>) {
    assert!(text(status).is_some() && status != MOISTAIR_INTERNAL, "{name}: status {status}");
    assert!(!caller.broken.get() || status != MOISTAIR_OK, "{name}: a bad pointer was taken");
    if let Some(error) = error {
        assert_eq!(error.code, status, "{name}");
        for number in [error.value, error.min, error.max] {
            assert!(!number.is_nan() || number.to_bits() == NAN_BITS, "{name}: {:x}", number.to_bits());
        }
    }
}

/// The structure means the same when it comes back to the library.
fn accepted_again(name: &str, words: &[u64]) {
    let state = moistair_state::from_words(words);
    let mut values = [f64::NAN; MOISTAIR_PROPERTY_COUNT as usize];
    let (mut have, always) = (0, 0xFFF);
    // SAFETY: valid places.
    let status = unsafe { moistair_properties(&state, always, values.as_mut_ptr(), &mut have, core::ptr::null_mut()) };
    assert_eq!((status, have), (MOISTAIR_OK, always), "{name}: {state:?}");
    for (value, word) in values.iter().zip(&words[..12]) {
        assert_eq!(value.to_bits(), *word, "{name}: {state:?} {values:?}");
    }
}

/// Calls an export with one output many times.
fn exercise<T: Words>(
    successes: &mut BTreeMap<&'static str, (u64, u64)>,
    name: &'static str,
    calls: u64,
    caller: &Caller,
    call: impl Fn(&Caller, *mut T, *mut moistair_error) -> i32,
) {
    let mut good = 0;
    for _ in 0..calls {
        caller.broken.set(false);
        let empty = vec![SENTINEL; size_of::<T>() / 8];
        let (mut output, mut error) =
            (T::from_words(&empty), moistair_error { value: 1.0, min: 1.0, max: 1.0, code: -1, quantity: 0 });
        let place = caller.place(&mut output);
        let detail = caller.optional(&mut error);
        let status = call(caller, place, detail);
        verdict(caller, name, status, (!detail.is_null()).then_some(&error));
        let words = output.words();
        if status != MOISTAIR_OK {
            assert_eq!(words, empty, "{name}: written although it failed with {status}");
            continue;
        }
        good += 1;
        for (place, word) in words.iter().enumerate().filter(|(place, _)| !T::INTEGERS.contains(place)) {
            let number = f64::from_bits(*word);
            assert!(
                !number.is_nan() || T::OPTIONAL.contains(&place) && *word == NAN_BITS,
                "{name}: word {place} {number}"
            );
        }
        T::STATES.iter().for_each(|start| accepted_again(name, &words[*start..start + 13]));
        caller.keep(&output);
    }
    successes.insert(name, (good, calls));
}

/// Calls an export that changes a structure many times.
fn change<T: Words>(
    successes: &mut BTreeMap<&'static str, (u64, u64)>,
    name: &'static str,
    calls: u64,
    caller: &Caller,
    call: impl Fn(&Caller, *mut T, *mut moistair_error) -> i32,
) {
    let mut good = 0;
    for _ in 0..calls {
        caller.broken.set(false);
        let mut kept = caller.kept::<T>();
        let before = kept.words();
        let mut error = moistair_error { value: 1.0, min: 1.0, max: 1.0, code: -1, quantity: 0 };
        let (place, detail) = (caller.place(&mut kept), caller.optional(&mut error));
        let status = call(caller, place, detail);
        verdict(caller, name, status, (!detail.is_null()).then_some(&error));
        if status == MOISTAIR_OK {
            good += 1;
            caller.keep(&kept);
        } else {
            assert_eq!(kept.words(), before, "{name}: changed although it failed with {status}");
        }
    }
    successes.insert(name, (good, calls));
}

const KINDS: [i32; 15] = [
    MOISTAIR_STEP_TO_TEMPERATURE,
    MOISTAIR_STEP_WITH_HEAT,
    MOISTAIR_STEP_COIL_TO_STATE,
    MOISTAIR_STEP_COIL_TO_TEMPERATURE,
    MOISTAIR_STEP_COIL_BY_BYPASS_FACTOR,
    MOISTAIR_STEP_COIL_WITH_WATER,
    MOISTAIR_STEP_COIL_WITH_REHEAT,
    MOISTAIR_STEP_STEAM,
    MOISTAIR_STEP_STEAM_TO_HUMIDITY_RATIO,
    MOISTAIR_STEP_STEAM_TO_RELATIVE_HUMIDITY,
    MOISTAIR_STEP_SPRAY,
    MOISTAIR_STEP_EVAPORATIVE,
    MOISTAIR_STEP_MIX,
    MOISTAIR_STEP_ELIMINATE,
    MOISTAIR_STEP_COMPRESS,
];

/// Numbers that may be free, and a step that has each.
const FREE: [(i32, i32); 6] = [
    (MOISTAIR_STEP_TO_TEMPERATURE, MOISTAIR_LEAVING_TEMPERATURE),
    (MOISTAIR_STEP_COIL_TO_TEMPERATURE, MOISTAIR_LEAVING_TEMPERATURE),
    (MOISTAIR_STEP_COIL_BY_BYPASS_FACTOR, MOISTAIR_APPARATUS_DEW_POINT),
    (MOISTAIR_STEP_COIL_WITH_WATER, MOISTAIR_WATER_FLOW),
    (MOISTAIR_STEP_MIX, MOISTAIR_DRY_AIR_MASS_FLOW),
    (MOISTAIR_STEP_SPRAY, MOISTAIR_WATER_TEMPERATURE),
];

fn calls() -> u64 {
    env::var("MOISTAIR_CASES").map_or(10_000, |text| text.parse().unwrap())
}

#[test]
fn no_argument_upsets_an_export() {
    let seed = env::var("MOISTAIR_HOSTILE_SEED").map_or(1, |text| text.parse().unwrap());
    let caller = &Caller { seed: Cell::new(seed), broken: Cell::new(false), known: RefCell::default() };
    let mut successes = BTreeMap::new();
    let n = calls();

    /// `run!(how name: |c, output, error| arguments…)`: one export by its name.
    macro_rules! run {
        // A march takes as long as hundreds of states.
        (march $name:ident: |$c:ident, $out:ident, $error:ident| $(let $before:pat = $value:expr;)* ($($argument:expr),*)) => {
            exercise(&mut successes, stringify!($name), n / 50, caller, |$c, $out, $error| {
                $(let $before = $value;)*
                // SAFETY: pointers are valid, null or misaligned.
                unsafe { $name($($argument),*) }
            });
        };
        ($how:ident $name:ident: |$c:ident, $out:ident, $error:ident| $(let $before:pat = $value:expr;)* ($($argument:expr),*)) => {
            $how(&mut successes, stringify!($name), n, caller, |$c, $out, $error| {
                $(let $before = $value;)*
                // SAFETY: pointers are valid, null or misaligned.
                unsafe { $name($($argument),*) }
            });
        };
    }

    run!(exercise moistair_quantity_limits: |c, out, e| (c.selector(90), out, e));
    run!(exercise moistair_formulation_limits: |c, out, e| (c.selector(3), c.selector(90), out, e));
    run!(exercise moistair_process_input: |c, out, e| (c.process(), c.below(20) as usize, out, e));
    run!(exercise moistair_process_output: |c, out, e| (c.process(), c.below(20) as usize, out, e));
    run!(exercise moistair_pressure_at_elevation: |c, out, e| (c.number(-5e3, 1.1e4), out, e));
    run!(exercise moistair_pressure_at_geometric_elevation: |c, out, e| (c.number(-5e3, 1.1e4), out, e));
    run!(exercise moistair_temperature_at_elevation: |c, out, e| (c.number(-5e3, 1.1e4), out, e));
    run!(exercise moistair_temperature_at_geometric_elevation: |c, out, e| (c.number(-5e3, 1.1e4), out, e));
    run!(exercise moistair_elevation_at_pressure: |c, out, e| (c.number(2e4, 2e5), out, e));
    run!(exercise moistair_geometric_elevation_at_pressure: |c, out, e| (c.number(2e4, 2e5), out, e));
    run!(exercise moistair_from_dry_bulb: |c, out, e| let (property, value) = c.second();
        (c.number(-80.0, 150.0), property, value, c.basis(), out, e));
    run!(exercise moistair_from_psychrometer: |c, out, e| let dry = c.number(-15.0, 40.0);
        (dry, dry - c.number(0.0, 6.0), c.selector(2), c.number(3e-4, 2e-3), c.basis(), out, e));
    run!(exercise moistair_psychrometer_reading: |c, out, e| let air = c.state();
        (c.pointer(&air), c.selector(2), c.number(3e-4, 2e-3), out, e));
    run!(exercise moistair_at_pressure: |c, out, e| let air = c.state(); (c.pointer(&air), c.number(2e4, 1.1e6), out, e));
    run!(exercise moistair_at_temperature_and_pressure: |c, out, e| let air = c.state();
        (c.pointer(&air), c.number(-80.0, 150.0), c.number(2e4, 1.1e6), out, e));
    let point = |c: &Caller| [MOISTAIR_DEW_POINT, MOISTAIR_FROST_POINT, c.selector(90)][c.below(3) as usize];
    run!(exercise moistair_saturation_temperature_at: |c, out, e| let air = c.state();
        (c.pointer(&air), point(c), c.number(2e4, 1.1e6), out, e));
    run!(exercise moistair_saturation_temperature_after: |c, out, e|
        (point(c), c.number(-60.0, 60.0), c.basis(), point(c), c.number(2e4, 1.1e6), out, e));
    run!(exercise moistair_property: |c, out, e| let state = c.state(); (c.pointer(&state), c.selector(MOISTAIR_PROPERTY_COUNT), out, e));
    run!(exercise moistair_from_two_properties: |c, out, e| let [(first, a), (second, b)] = c.pair();
        (first, a, second, b, c.basis(), out, e));
    run!(exercise moistair_stream_from_mass_flow: |c, out, e| let air = c.state();
        (c.pointer(&air), c.number(0.0, 10.0), out, e));
    run!(exercise moistair_stream_from_volume_flow: |c, out, e| let air = c.state();
        (c.pointer(&air), c.number(0.0, 10.0), out, e));
    run!(exercise moistair_stream_from_standard_volume_flow: |c, out, e| let air = c.state();
        (c.pointer(&air), c.number(0.0, 10.0), c.number(1.0, 1.3), out, e));
    run!(exercise moistair_mixing_remainder: |c, out, e| let part = c.stream(); let air = c.state();
        (c.number(5.0, 20.0), c.pointer(&part), c.pointer(&air), out, e));
    run!(exercise moistair_wet_stream_from_stream: |c, out, e| let gas = c.stream();
        (c.pointer(&gas), c.number(0.0, 0.01), c.number(0.0, 0.01), out, e));
    run!(exercise moistair_from_enthalpy_and_water: |c, out, e|
        (c.number(-4e4, 2e5), c.number(0.0, 0.05), c.selector(2), c.basis(), out, e));
    run!(exercise moistair_from_dry_bulb_and_water: |c, out, e|
        (c.number(-80.0, 150.0), c.number(0.0, 0.05), c.selector(2), c.basis(), out, e));
    run!(exercise moistair_compression_to_pressure: |c, out, e| let s = c.wet_stream();
        (c.pointer(&s), c.number(2e4, 1.1e6), c.number(-40.0, 60.0), out, e));
    run!(exercise moistair_liquid_water_enthalpy: |c, out, e| (c.number(0.0, 200.0), c.basis(), out, e));
    run!(exercise moistair_saturated_steam_enthalpy: |c, out, e| (c.number(0.0, 200.0), out, e));
    run!(exercise moistair_sensible_to_temperature: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(-20.0, 60.0), out, e));
    run!(exercise moistair_sensible_with_heat: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(-2e4, 2e5), out, e));
    run!(exercise moistair_coil_to_state: |c, out, e| let s = c.stream(); let leaving = c.state();
        (c.pointer(&s), c.pointer(&leaving), c.selector(3), c.number(-5.0, 20.0), out, e));
    run!(exercise moistair_coil_by_bypass_factor: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(-10.0, 30.0), c.number(0.0, 1.0), c.selector(3), c.number(-5.0, 20.0), out, e));
    run!(exercise moistair_coil_between: |c, out, e| let s = c.stream(); let leaving = c.state();
        (c.pointer(&s), c.pointer(&leaving), c.selector(3), c.number(-5.0, 20.0), c.number(0.0, 0.001), out, e));
    run!(exercise moistair_coil_apparatus_dew_point: |c, out, e| let coil = c.kept::<moistair_cooling>();
        (c.pointer(&coil.entering.air), c.pointer(&coil.leaving.air), out, e));
    run!(exercise moistair_coil_apparatus_dew_points: |c, out, e| let coil = c.kept::<moistair_cooling>();
        (c.pointer(&coil.entering.air), c.pointer(&coil.leaving.air), out, e));
    run!(exercise moistair_coil_bypass_factor_of_rows: |c, out, e| (c.number(0.0, 1.0), c.bits() as u32, out, e));
    let chilled = |c: &Caller| moistair_coil_water {
        flow: c.number(0.0, 5.0),
        entering: c.number(0.0, 20.0),
        specific_heat: if c.below(2) == 0 { 0.0 } else { c.number(3e3, 4.2e3) },
    };
    run!(exercise moistair_coil_with_water: |c, out, e| let s = c.stream(); let water = chilled(c);
        let surface = moistair_coil_surface {
            air_side: c.number(0.0, 1e4),
            water_side: c.number(0.0, 1e4),
            arrangement: c.selector(2),
            reserved: 0,
        };
        (c.pointer(&s), c.pointer(&surface), c.pointer(&water), c.selector(3), c.number(-5.0, 20.0), out, e));
    run!(exercise moistair_coil_surface_from_rating: |c, out, e| let s = c.stream(); let water = chilled(c);
        (c.pointer(&s), c.pointer(&water), c.selector(3), c.number(5.0, 20.0), c.number(0.5, 5.0), c.selector(2), out, e));
    run!(exercise moistair_coil_surface_at_flows: |c, out, e|
        let surface = moistair_coil_surface {
            air_side: c.number(0.0, 1e4),
            water_side: c.number(0.0, 1e4),
            arrangement: c.selector(2),
            reserved: 0,
        };
        let flows = |c: &Caller| moistair_coil_flows { air: c.number(0.0, 9.0), water: c.number(0.0, 9.0) };
        let exponents = moistair_flow_exponents { air_side: c.number(0.0, 1.0), water_side: c.number(0.0, 1.0) };
        (c.pointer(&surface), flows(c), flows(c), exponents, out, e));
    run!(exercise moistair_coil_load_by_water: |c, out, e| let s = c.stream(); let water = chilled(c);
        (c.pointer(&s), c.number(-1e4, 1e5), c.pointer(&water), c.number(0.0, 30.0), out, e));
    run!(exercise moistair_reheat_to_state: |c, out, e| let s = c.stream(); let target = c.state();
        (c.pointer(&s), c.pointer(&target), c.number(0.2, 1.0), c.selector(3), c.number(-5.0, 20.0), out, e));
    let room_gains = |c: &Caller| {
        c.structure(moistair_room_gains {
            sensible: c.number(-5e3, 2e4),
            moisture: c.number(0.0, 5e-3),
            source_value: c.number(0.0, 100.0),
            source: c.selector(3),
            reserved: 0,
        })
    };
    let leaves = |c: &Caller| {
        let kind = c.selector(2);
        let fraction = if kind == 0 { c.number(0.8, 1.0) } else { c.number(0.0, 0.3) };
        c.structure(moistair_coil_leaving { fraction, coldest: c.number(-20.0, 15.0), kind, reserved: 0 })
    };
    // Where rooms and plant are, mostly.
    let usual = |c: &Caller, low: f64, high: f64, humidity: f64| {
        let mut air = c.state();
        if c.below(4) != 0 {
            let basis = moistair_basis { pressure: 101_325.0, formulation: MOISTAIR_REAL_GAS, reserved: 0 };
            let (t, x) = (c.number(low, high), c.number(humidity - 0.1, humidity + 0.1));
            // SAFETY: valid places.
            unsafe { moistair_from_dry_bulb(t, MOISTAIR_RELATIVE_HUMIDITY, x, basis, &mut air, core::ptr::null_mut()) };
        }
        air
    };
    let outdoor = |c: &Caller| moistair_stream { air: usual(c, 24.0, 32.0, 0.7), dry_air_flow: c.number(0.1, 2.0) };
    run!(exercise moistair_reheat_with_coil: |c, out, e| let s = outdoor(c); let target = usual(c, 18.0, 26.0, 0.5); let coil = leaves(c);
        (c.pointer(&s), c.pointer(&target), c.pointer(&coil), c.selector(3), c.number(-5.0, 20.0), out, e));
    run!(exercise moistair_room_supply_at_temperature: |c, out, e| let room = usual(c, 20.0, 27.0, 0.5); let gains = room_gains(c);
        (c.pointer(&room), c.pointer(&gains), c.number(-20.0, 40.0), out, e));
    run!(exercise moistair_room_supply_at_flow: |c, out, e| let room = c.state(); let gains = room_gains(c);
        (c.pointer(&room), c.pointer(&gains), c.number(0.1, 10.0), out, e));
    run!(exercise moistair_room_of_supply: |c, out, e| let s = c.stream(); let gains = room_gains(c);
        (c.pointer(&s), c.pointer(&gains), out, e));
    run!(exercise moistair_room_gains_between: |c, out, e| let s = c.stream(); let room = c.state();
        (c.pointer(&s), c.pointer(&room), c.selector(3), c.number(0.0, 100.0), out, e));
    run!(exercise moistair_room_latent_heat: |c, out, e| let room = c.state(); (c.pointer(&room), out, e));
    run!(exercise moistair_room_sensible_heat_ratio: |c, out, e| let room = c.state(); let gains = room_gains(c);
        (c.pointer(&room), c.pointer(&gains), out, e));
    run!(exercise moistair_room_process_slope: |c, out, e| let gains = room_gains(c); (c.pointer(&gains), c.basis(), out, e));
    run!(exercise moistair_room_slope_of_ratio: |c, out, e| let room = c.state(); (c.pointer(&room), c.number(-1.0, 2.0), out, e));
    run!(exercise moistair_room_ratio_of_slope: |c, out, e| let room = c.state(); (c.pointer(&room), c.number(-1e7, 1e7), out, e));
    run!(exercise moistair_room_apparatus_dew_points: |c, out, e| let room = c.state();
        (c.pointer(&room), c.number(-1.0, 2.0), out, e));
    run!(exercise moistair_room_limiting_line: |c, out, e| let (room, air) = (usual(c, 20.0, 27.0, 0.5), usual(c, 24.0, 32.0, 0.6)); let coil = leaves(c);
        (c.pointer(&room), c.pointer(&air), c.pointer(&coil), out, e));
    run!(exercise moistair_room_least_reheat: |c, out, e| let (room, air) = (usual(c, 20.0, 27.0, 0.5), usual(c, 24.0, 32.0, 0.6)); let gains = room_gains(c);
        let coil = leaves(c);
        (c.pointer(&room), c.pointer(&gains), c.pointer(&air), c.pointer(&coil), out, e));
    run!(exercise moistair_room_conditioned: |c, out, e| let room = usual(c, 20.0, 27.0, 0.5); let gains = room_gains(c); let s = outdoor(c);
        let coil = leaves(c);
        (c.pointer(&room), c.pointer(&gains), c.pointer(&s), c.pointer(&coil), c.selector(3), c.number(-5.0, 20.0), out, e));
    let sorption = |c: &Caller| {
        c.structure(moistair_sorption {
            heat_ratio: c.number(0.8, 1.5),
            carry_over_value: c.number(0.0, 10.0),
            carry_over: c.selector(3),
            reserved: 0,
        })
    };
    let hot = |c: &Caller| {
        let mut stream = c.stream();
        let basis = moistair_basis { pressure: 101_325.0, formulation: MOISTAIR_REAL_GAS, reserved: 0 };
        let t = c.number(60.0, 120.0);
        // SAFETY: valid places.
        unsafe {
            moistair_from_dry_bulb(t, MOISTAIR_HUMIDITY_RATIO, 0.01, basis, &mut stream.air, core::ptr::null_mut())
        };
        stream
    };
    run!(exercise moistair_desiccant_to_humidity_ratio: |c, out, e| let s = c.stream(); let how = sorption(c);
        (c.pointer(&s), c.number(0.0, 0.02), c.pointer(&how), out, e));
    run!(exercise moistair_desiccant_by_effectiveness: |c, out, e| let s = c.stream(); let how = sorption(c);
        (c.pointer(&s), c.number(0.0, 1.0), c.number(0.0, 0.002), c.pointer(&how), out, e));
    run!(exercise moistair_desiccant_wheel: |c, out, e| let (s, other) = (c.stream(), hot(c)); let how = sorption(c);
        let known = c.selector(3); let value = if known == 0 { c.number(0.0, 5e4) } else { c.number(40.0, 140.0) };
        (c.pointer(&s), c.number(0.0, 0.01), c.pointer(&how), c.pointer(&other), known, value, out, e));
    run!(exercise moistair_desiccant_potentials: |c, out, e| let air = c.state(); (c.pointer(&air), out, e));
    run!(exercise moistair_desiccant_wheel_by_potentials: |c, out, e| let (s, other) = (c.stream(), hot(c));
        let share = c.structure(moistair_potentials { first: c.number(0.0, 0.2), second: c.number(0.5, 1.0) });
        (c.pointer(&s), c.pointer(&other), c.pointer(&share), out, e));
    run!(exercise moistair_desiccant_effectiveness_between: |c, out, e| let other = hot(c);
        let done = c.kept::<moistair_potential_wheel>(); let air = c.state();
        (c.pointer(&air), c.pointer(&done.process.air), c.pointer(&other.air), out, e));
    run!(exercise moistair_humidify_steam: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(0.0, 0.05), c.number(2.5e6, 2.8e6), out, e));
    run!(exercise moistair_humidify_steam_to_humidity_ratio: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(0.0, 0.05), c.number(2.5e6, 2.8e6), out, e));
    run!(exercise moistair_humidify_steam_to_relative_humidity: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(0.0, 1.0), c.number(2.5e6, 2.8e6), out, e));
    run!(exercise moistair_humidify_steam_limit: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(2.5e6, 2.8e6), out, e));
    run!(exercise moistair_humidify_spray: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(0.0, 0.05), c.number(0.0, 90.0), out, e));
    run!(exercise moistair_humidify_evaporative: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(0.0, 1.0), c.selector(2), c.number(0.0, 90.0), out, e));
    run!(exercise moistair_humidify_steam_absorption: |c, out, e| let s = c.stream();
        (c.pointer(&s), c.number(2.5e6, 3.2e6), out, e));
    run!(exercise moistair_steam_saturated: |c, out, e| (c.number(1e3, 1.6e6), out, e));
    run!(exercise moistair_steam_wet: |c, out, e| (c.number(1e5, 1.6e6), c.number(0.0, 1.0), out, e));
    run!(exercise moistair_steam_superheated: |c, out, e| (c.number(150.0, 400.0), c.number(1e5, 1.6e6), out, e));
    run!(exercise moistair_steam_throttled: |c, out, e| (c.number(1e6, 3.2e6), c.number(1e3, 1.6e6), out, e));
    run!(exercise moistair_humidify_wash: |c, out, e| let s = c.stream();
        let washer = moistair_washer {
            water: c.number(0.1, 20.0),
            temperature: c.number(1.0, 40.0),
            effectiveness: c.number(0.0, 1.0),
            pump_heat: c.number(0.0, 500.0),
            carry_over_fraction: c.number(0.0, 0.01),
        };
        (c.pointer(&s), c.pointer(&washer), out, e));
    let direct = |c: &Caller| moistair_direct_cooler {
        saturation_effectiveness: c.number(0.1, 1.0),
        circulating: c.number(0.1, 2.0),
        pump_heat: c.number(0.0, 300.0),
        make_up_temperature: c.number(1.0, 30.0),
        treatment: moistair_water_treatment {
            drift_fraction: c.number(0.0, 0.001),
            cycles_of_concentration: c.number(1.5, 8.0),
        },
        make_up: c.selector(2),
        reserved: 0,
    };
    let indirect = |c: &Caller| moistair_indirect_cooler {
        effectiveness: c.number(0.1, 0.9),
        exhaust_humidity: c.number(0.9, 1.0),
        pump_heat: c.number(0.0, 300.0),
        water_temperature: c.number(1.0, 30.0),
        effectiveness_of: c.selector(2),
        water: c.selector(2),
    };
    // Hardly any ten numbers of which one in eight is wild make two stages.
    let staged = |c: &Caller| {
        let (mut first, mut second) = (indirect(c), direct(c));
        if c.below(2) == 0 {
            (first.effectiveness, first.exhaust_humidity, first.pump_heat, first.effectiveness_of) =
                (0.6, 1.0, 50.0, 0);
            (second.saturation_effectiveness, second.circulating, second.pump_heat) = (0.8, 1.0, 50.0);
            second.treatment = moistair_water_treatment { drift_fraction: 0.0, cycles_of_concentration: 3.0 };
        }
        (first, second)
    };
    run!(exercise moistair_evaporative_direct: |c, out, e| let s = c.stream(); let cooler = direct(c);
        (c.pointer(&s), c.pointer(&cooler), out, e));
    run!(exercise moistair_evaporative_indirect: |c, out, e|
        let first = c.stream(); let second = c.stream(); let cooler = indirect(c);
        (c.pointer(&first), c.pointer(&second), c.pointer(&cooler), out, e));
    run!(exercise moistair_evaporative_two_stage: |c, out, e|
        let first = c.stream(); let second = c.stream(); let (stage, next) = staged(c);
        (c.pointer(&first), c.pointer(&second), c.pointer(&stage), c.pointer(&next), out, e));
    run!(exercise moistair_mixing_adiabatic: |c, out, e| let s = [c.wet_stream(), c.wet_stream()];
        (c.pointer(&s).cast(), [1, 2, 2, usize::MAX][c.below(4) as usize], out, e));
    run!(exercise moistair_mixing_adiabatic_at: |c, out, e| let s = [c.wet_stream(), c.wet_stream()];
        (c.pointer(&s).cast(), 1 + c.below(2) as usize, c.number(8e4, 1.1e5), c.selector(2), out, e));
    run!(exercise moistair_books_balance: |c, out, e|
        let s = [c.wet_stream(), c.wet_stream()]; let leaving = c.wet_stream(); let exchange = c.kept::<moistair_exchange>();
        (c.pointer(&s).cast(), 1 + c.below(2) as usize, c.pointer(&leaving), c.pointer(&exchange), out, e));
    let carrying = |c: &Caller| {
        let (gas, liquid) = (c.stream(), if c.below(4) == 0 { c.number(0.0, 1e-3) } else { 0.0 });
        let mixture =
            moistair_air_with_condensate { air: gas.air, liquid, ice: 0.0, total_water: 0.0, specific_enthalpy: 0.0 };
        moistair_wet_stream { mixture, dry_air_flow: gas.dry_air_flow }
    };
    let step = |c: &Caller| moistair_step {
        stream: carrying(c),
        state: c.state(),
        surface: moistair_coil_surface {
            air_side: c.number(0.0, 1e4),
            water_side: c.number(0.0, 1e4),
            arrangement: c.selector(2),
            reserved: 0,
        },
        water: chilled(c),
        leaving_temperature: c.number(-20.0, 60.0),
        heat_flow: c.number(-2e4, 2e5),
        relative_humidity: c.number(0.5, 1.0),
        humidity_ratio: c.number(0.0, 0.03),
        apparatus_dew_point: c.number(-10.0, 20.0),
        bypass_factor: c.number(0.0, 1.0),
        condensate_temperature: c.number(-5.0, 20.0),
        water_flow: c.number(0.0, 0.05),
        water_temperature: c.number(0.0, 90.0),
        steam_enthalpy: c.number(2.5e6, 2.8e6),
        saturation_effectiveness: c.number(0.0, 1.0),
        pressure: c.number(7e4, 3e5),
        kind: if c.below(16) == 0 { c.selector(50) } else { KINDS[c.below(KINDS.len() as u64) as usize] },
        condensate: c.selector(3),
        evaporating_water: c.selector(2),
        reserved: c.bits() as i32,
    };
    // SAFETY: numbers.
    let empty = || unsafe { core::mem::zeroed::<[moistair_step_result; 3]>() };
    run!(exercise moistair_sequence_run: |c, out, e|
        let s = carrying(c); let steps = [step(c), step(c), step(c)]; let mut results = empty(); let mut ran = 0;
        let count = [1, 1, 2, 3, usize::MAX][c.below(5) as usize];
        (c.pointer(&s), c.pointer(&steps).cast(), count, c.optional(&mut results).cast(), c.optional(&mut ran), out, e));
    run!(exercise moistair_sequence_solve: |c, out, e|
        let s = carrying(c); let mut results = empty();
        let (kind, quantity) = FREE[c.below(FREE.len() as u64) as usize];
        let first = moistair_step { kind: if c.below(8) == 0 { c.selector(50) } else { kind }, ..step(c) };
        let steps = [first, step(c), step(c)];
        let free = moistair_free {
            low: c.number(0.0, 10.0),
            high: c.number(10.0, 40.0),
            step: c.selector(1),
            quantity: if c.below(8) == 0 { c.selector(120) } else { quantity },
        };
        let property = if c.below(2) == 0 { MOISTAIR_DRY_BULB } else { c.selector(MOISTAIR_PROPERTY_COUNT) };
        let target = moistair_target { value: c.value_of(property).1, after: [-1, -1, 0, c.selector(3)][c.below(4) as usize], property };
        let count = [1, 1, 1, 2, 3, 33, usize::MAX][c.below(7) as usize];
        (c.pointer(&s), c.pointer(&steps).cast(), count, c.pointer(&free), c.pointer(&target),
            c.optional(&mut results).cast(), out, e));
    let treatment = |c: &Caller| moistair_water_treatment {
        drift_fraction: c.number(0.0, 0.01),
        cycles_of_concentration: c.number(1.0, 8.0),
    };
    let water = |c: &Caller| moistair_tower_water {
        flow: c.number(0.0, 20.0),
        hot: c.number(25.0, 45.0),
        cold: c.number(15.0, 30.0),
    };
    run!(exercise moistair_tower_water_use: |c, out, e| (c.number(0.0, 1.0), c.number(0.0, 20.0), treatment(c), out, e));
    run!(exercise moistair_tower_with_air_flow: |c, out, e| let s = c.stream();
        (c.pointer(&s), water(c), treatment(c), out, e));
    run!(exercise moistair_tower_with_leaving_air: |c, out, e| let entering = c.state(); let leaving = c.state();
        (c.pointer(&entering), c.pointer(&leaving), water(c), treatment(c), out, e));
    run!(exercise moistair_tower_cycles_of_concentration: |c, out, e| (c.number(500.0, 3000.0), c.number(100.0, 500.0), out, e));
    run!(exercise moistair_tower_evaporation_by_rule_of_thumb: |c, out, e| (c.number(0.0, 20.0), c.number(0.0, 20.0), out, e));
    run!(exercise moistair_tower_basin_after: |c, out, e|
        let basin = moistair_basin { inventory: c.number(1e3, 1e5), concentration: c.number(0.0, 3e3) };
        let used = c.kept::<moistair_water_use>();
        (c.pointer(&basin), c.number(0.0, 1e5), c.pointer(&used), c.number(0.0, 500.0), out, e));
    let hot = |c: &Caller| moistair_hot_water { flow: c.number(0.1, 20.0), temperature: c.number(5.0, 50.0) };
    let fill = |c: &Caller| moistair_fill_law { coefficient: c.number(0.5, 2.5), exponent: c.number(0.3, 0.9) };
    let tested = |c: &Caller| moistair_fill_test { water_to_air: c.number(0.5, 2.0), number: c.number(0.5, 3.0) };
    run!(exercise moistair_tower_water_to_air: |c, out, e| let s = c.stream(); (c.pointer(&s), c.number(0.1, 20.0), out, e));
    run!(exercise moistair_tower_coldest_water: |c, out, e| let air = c.state(); (c.pointer(&air), out, e));
    run!(exercise moistair_tower_merkel_pinch: |c, out, e| let air = c.state();
        (c.pointer(&air), c.number(30.0, 45.0), c.number(22.0, 40.0), out, e));
    run!(exercise moistair_tower_merkel_number: |c, out, e| let s = c.stream();
        (c.pointer(&s), water(c), c.selector(3), out, e));
    run!(march moistair_tower_merkel_rate: |c, out, e| let s = c.stream();
        (c.pointer(&s), hot(c), c.number(0.0, 5.0), out, e));
    run!(march moistair_tower_air_for_duty: |c, out, e| let air = c.state();
        (c.pointer(&air), water(c), fill(c), out, e));
    run!(exercise moistair_tower_effectiveness_number: |c, out, e| let s = c.stream(); (c.pointer(&s), water(c), out, e));
    run!(exercise moistair_tower_effectiveness_rate: |c, out, e| let s = c.stream();
        (c.pointer(&s), hot(c), c.number(0.0, 5.0), out, e));
    run!(march moistair_tower_poppe_number: |c, out, e| let s = c.stream();
        (c.pointer(&s), water(c), c.selector(3), out, e));
    run!(march moistair_tower_poppe_rate: |c, out, e| let s = c.stream();
        (c.pointer(&s), hot(c), c.number(0.0, 5.0), c.selector(3), out, e));
    run!(exercise moistair_tower_fill_from_two_tests: |c, out, e| (tested(c), tested(c), out, e));
    run!(exercise moistair_tower_fill_number: |c, out, e| (fill(c), c.number(0.1, 5.0), out, e));
    run!(exercise moistair_tower_fill_height: |c, out, e|
        (fill(c), c.number(0.0, 5.0), c.number(0.1, 5.0), c.number(0.1, 3.0), out, e));
    let reading = |c: &Caller, low: f64, high: f64| {
        c.structure(moistair_reading {
            value: c.number(low, high),
            standard_uncertainty: c.number(0.0, 0.5),
            quality: if c.below(16) == 0 { c.selector(3) } else { MOISTAIR_QUALITY_GOOD },
            reserved: 0,
        })
    };
    let measured = |c: &Caller| {
        c.structure(moistair_measured_air {
            dry_bulb: reading(c, -5.0, 35.0),
            humidity: reading(c, 0.1, 0.9),
            humidity_quantity: if c.below(16) == 0 { c.second().0 } else { MOISTAIR_RELATIVE_HUMIDITY },
            reserved: 0,
        })
    };
    run!(exercise moistair_outdoor_air_from_readings: |c, out, e|
        let quantity = if c.below(4) == 0 { c.selector(160) } else { MOISTAIR_DRY_BULB };
        let air = [reading(c, -5.0, 35.0), reading(c, 20.0, 26.0), c.structure(reading(c, 10.0, 30.0))];
        (quantity, c.pointer(&air[0]), c.pointer(&air[1]), c.pointer(&air[2]), c.number(0.0, 0.1), out, e));
    run!(exercise moistair_outdoor_air_from_air: |c, out, e|
        let quantity = [MOISTAIR_HUMIDITY_RATIO, MOISTAIR_SPECIFIC_ENTHALPY, c.selector(8)][c.below(3) as usize];
        let air = [measured(c), measured(c), measured(c)];
        let (low, basis) = (c.pointer(&air[0]), c.basis());
        (quantity, low, c.pointer(&air[1]), c.pointer(&air[2]), basis, c.number(0.0, 0.1), out, e));
    run!(exercise moistair_outdoor_air_from_flows: |c, out, e|
        let flows = [c.structure(reading(c, 0.0, 2.0)), reading(c, 0.0, 6.0)];
        (c.pointer(&flows[0]), c.pointer(&flows[1]), c.selector(2), c.number(0.0, 0.1), out, e));
    run!(exercise moistair_outdoor_air_for_temperature: |c, out, e| let outdoor = c.state();
        let mut returned = c.state();
        let (_, _) = (returned.pressure = outdoor.pressure, returned.formulation = outdoor.formulation);
        (c.pointer(&outdoor), c.pointer(&returned), c.number(0.0, 30.0), c.number(0.0, 0.5), c.number(0.5, 1.0), out, e));
    run!(exercise moistair_economizer_new: |c, out, e| let basis = c.basis(); (c.selector(8), basis, out, e));
    run!(change moistair_economizer_check: |_c, settings, e| (to_read(settings), e));
    run!(exercise moistair_economizer_decide: |c, out, e|
        let settings = c.kept::<moistair_economizer>(); let mut state = c.kept::<moistair_economizer_state>();
        let air = [measured(c), measured(c)];
        (c.pointer(&settings), c.place(&mut state), c.number(0.0, 1e5), c.pointer(&air[0]), c.pointer(&air[1]), out, e));
    run!(exercise moistair_economizer_outdoor_air: |c, out, e|
        let decision = c.kept::<moistair_decision>(); let outdoor = c.state(); let mut returned = c.state();
        let (_, _) = (returned.pressure = outdoor.pressure, returned.formulation = outdoor.formulation);
        (c.pointer(&decision), c.pointer(&outdoor), c.pointer(&returned), c.number(0.0, 30.0), c.number(0.0, 0.5),
            c.number(0.5, 1.0), out, e));
    run!(exercise moistair_economizer_coil_load: |c, out, e| let air = c.state();
        (c.pointer(&air), c.number(5.0, 20.0), c.number(0.8, 1.0), out, e));
    run!(exercise moistair_economizer_enthalpy_limit: |c, out, e| let basis = c.basis(); (basis, out, e));
    run!(exercise moistair_channel_new: |c, out, e|
        let (kind, unit) = if c.below(2) == 0 { (1, 1) } else { (c.selector(13), c.selector(30)) };
        (kind, unit, c.number(-50.0, 0.0), c.number(1.0, 60.0), out, e));
    run!(exercise moistair_channel_check: |c, out, e|
        let channel = c.kept::<moistair_channel>(); let mut state = c.kept::<moistair_channel_state>();
        (c.pointer(&channel), c.place(&mut state), c.number(0.0, 1e5), c.number(-60.0, 110.0), out, e));
    run!(exercise moistair_channel_check_beside: |c, out, e|
        let channel = c.kept::<moistair_channel>(); let mut state = c.kept::<moistair_channel_state>();
        (c.pointer(&channel), c.place(&mut state), c.number(0.0, 1e5), c.number(-60.0, 110.0), c.number(0.0, 1.0), out, e));
    run!(exercise moistair_unit_to_core: |c, out, e| (c.selector(30), c.number(-60.0, 110.0), out, e));
    run!(exercise moistair_unit_from_core: |c, out, e| (c.selector(30), c.number(-60.0, 110.0), out, e));
    run!(exercise moistair_total_new: |c, out, e| (c.selector(2), c.number(0.0, 1e4), out, e));
    run!(change moistair_total_add: |c, total, e| let mut added = 0;
        (total, c.number(0.0, 1e5), c.number(-1e4, 1e4), c.selector(3), c.optional(&mut added), e));
    run!(change moistair_total_merge: |c, total, e| let other = c.kept(); (total, c.pointer(&other), e));
    run!(exercise moistair_total_read: |c, out, e| let total = c.kept(); (c.pointer(&total), out, e));
    run!(exercise moistair_total_coverage_of: |c, out, e| let total = c.kept();
        (c.pointer(&total), c.number(0.0, 1e5), out, e));
    run!(exercise moistair_periods_new: |c, out, e| (c.number(60.0, 3600.0), c.selector(2), c.number(0.0, 1e4), out, e));
    run!(change moistair_periods_add: |c, periods, e| let mut period = c.kept(); let mut finished = 0;
        (periods, c.number(0.0, 1e5), c.number(-1e4, 1e4), c.selector(3), c.place(&mut period), c.place(&mut finished), e));
    run!(change moistair_books_total_record: |c, total, e| let books = c.kept(); (total, c.pointer(&books), e));
    run!(change moistair_books_total_merge: |c, total, e| let other = c.kept(); (total, c.pointer(&other), e));
    run!(exercise moistair_books_total_read: |c, out, e| let total = c.kept(); (c.pointer(&total), out, e));
    run!(change moistair_deviation_add: |c, deviation, e| (deviation, c.number(-60.0, 60.0), c.number(-60.0, 60.0), e));
    run!(change moistair_deviation_merge: |c, deviation, e| let other = c.kept(); (deviation, c.pointer(&other), e));
    run!(exercise moistair_deviation_read: |c, out, e| let deviation = c.kept(); (c.pointer(&deviation), out, e));
    run!(change moistair_counts_record: |c, counts, e| let checked = c.kept(); (counts, c.pointer(&checked), e));
    run!(change moistair_counts_merge: |c, counts, e| let other = c.kept(); (counts, c.pointer(&other), e));
    several_outputs(caller, n, &mut successes);
    texts(caller, n, &mut successes);

    for (name, (good, calls)) in &successes {
        println!("{name}: {good} of {calls} calls succeeded");
    }
    for (name, (good, calls)) in &successes {
        // Otherwise the test would see refusals only.
        assert!(50 * good >= *calls, "{name}: only {good} of {calls} calls succeeded");
    }
    let covered: BTreeSet<String> = successes.keys().map(|name| name.to_string()).collect();
    let header = fs::read_to_string(concat!(env!("CARGO_MANIFEST_DIR"), "/include/moistair.h")).unwrap();
    let declared =
        header.lines().filter(|line| !line.starts_with("//") && !line.starts_with(" *") && line.contains('('));
    for line in declared.filter_map(|line| line.split_once('(')).map(|(head, _)| head) {
        let name = head_name(line);
        assert!(!name.starts_with("moistair_") || covered.contains(name), "{name} is not exercised");
    }
}

/// A place that is only read.
fn to_read(settings: *mut moistair_economizer) -> *const moistair_economizer {
    settings
}

fn head_name(head: &str) -> &str {
    head.rsplit([' ', '*']).next().unwrap_or_default()
}

/// Exports with more than one output, or none.
fn several_outputs(caller: &Caller, n: u64, successes: &mut BTreeMap<&'static str, (u64, u64)>) {
    let (mut read, mut sloped, mut columned, mut processed, mut unfinished) = (0, 0, 0, 0, 0);
    for call in 0..n {
        caller.broken.set(false);
        let (state, mask) = (caller.state(), caller.mask());
        let mut values = [f64::from_bits(SENTINEL); MOISTAIR_PROPERTY_COUNT as usize];
        let mut have = SENTINEL;
        let place = caller.place(&mut values).cast();
        let (pointer, bits) = (caller.pointer(&state), caller.optional(&mut have));
        // SAFETY: pointers are valid, null or misaligned.
        let status = unsafe { moistair_properties(pointer, mask, place, bits, core::ptr::null_mut()) };
        verdict(caller, "moistair_properties", status, None);
        for (code, value) in values.iter().enumerate() {
            let (asked, found) = (status == MOISTAIR_OK && mask >> code & 1 == 1, have >> code & 1 == 1);
            match (asked, found && !bits.is_null()) {
                (false, _) => assert_eq!(value.to_bits(), SENTINEL, "moistair_properties: {code}"),
                (true, true) => assert!(value.is_finite(), "moistair_properties: {code} {value}"),
                (true, false) if bits.is_null() => assert!(!value.is_nan() || value.to_bits() == NAN_BITS),
                (true, false) => assert_eq!(value.to_bits(), NAN_BITS, "moistair_properties: {code}"),
            }
        }
        read += u64::from(status == MOISTAIR_OK);
        sloped += u64::from(derivatives(caller));
        columned += u64::from(columns(caller) != 0);
        // A row may be a march, which takes as long as hundreds of states.
        if call % 10 == 0 {
            processed += u64::from(process_columns(caller));
        }
        caller.broken.set(false);
        let (periods, mut period, mut begun) = (caller.kept(), caller.kept::<moistair_period>(), 0);
        let (periods, period, begun) = (caller.pointer(&periods), caller.place(&mut period), caller.place(&mut begun));
        // SAFETY: pointers are valid, null or misaligned.
        let status = unsafe { moistair_periods_unfinished(periods, period, begun, core::ptr::null_mut()) };
        verdict(caller, "moistair_periods_unfinished", status, None);
        unfinished += u64::from(status == MOISTAIR_OK);
    }
    successes.insert("moistair_properties", (read, n));
    successes.insert("moistair_derivatives", (sloped, n));
    successes.insert("moistair_state_columns", (columned, n));
    successes.insert("moistair_process_columns", (processed, n.div_ceil(10)));
    successes.insert("moistair_periods_unfinished", (unfinished, n));
}

/// Derivatives of some properties; whether there were any.
fn derivatives(caller: &Caller) -> bool {
    caller.broken.set(false);
    let (state, mask, (second, _)) = (caller.state(), caller.mask(), caller.second());
    let blank = f64::from_bits(SENTINEL);
    let blank =
        moistair_property_derivatives { value: blank, by_dry_bulb: blank, by_second: blank, by_pressure: blank };
    let mut values = [blank; MOISTAIR_PROPERTY_COUNT as usize];
    let mut have = SENTINEL;
    let place = caller.place(&mut values).cast();
    let (pointer, bits) = (caller.pointer(&state), caller.optional(&mut have));
    // SAFETY: pointers are valid, null or misaligned.
    let status = unsafe { moistair_derivatives(pointer, second, mask, place, bits, core::ptr::null_mut()) };
    verdict(caller, "moistair_derivatives", status, None);
    for (code, of) in values.iter().enumerate() {
        let (asked, found) = (status == MOISTAIR_OK && mask >> code & 1 == 1, have >> code & 1 == 1);
        for number in [of.value, of.by_dry_bulb, of.by_second, of.by_pressure] {
            match (asked, found && !bits.is_null()) {
                (false, _) => assert_eq!(number.to_bits(), SENTINEL, "moistair_derivatives: {code}"),
                (true, true) => assert!(number.is_finite(), "moistair_derivatives: {code} {number}"),
                (true, false) if bits.is_null() => assert!(number.is_finite() || number.to_bits() == NAN_BITS),
                (true, false) => assert_eq!(number.to_bits(), NAN_BITS, "moistair_derivatives: {code}"),
            }
        }
    }
    status == MOISTAIR_OK
}

/// A column call; how many rows had every value.
fn columns(caller: &Caller) -> usize {
    const MOST: usize = 5;
    let rows =
        if caller.below(16) == 0 { usize::MAX >> caller.below(3) } else { caller.below(MOST as u64 + 1) as usize };
    let (property, _) = caller.second();
    let humidity = if property == MOISTAIR_RELATIVE_HUMIDITY { 1.0 } else { 0.02 };
    let draw = |low, high| -> [f64; 3 * MOST] { core::array::from_fn(|_| caller.number(low, high)) };
    let inputs = [draw(-40.0, 60.0), draw(0.0, humidity), draw(7e4, 1.1e5)];
    let column = |input: &[f64; 3 * MOST]| {
        let stride = if caller.below(16) == 0 { usize::MAX / 4 } else { caller.below(4) as usize };
        // A stride that large reaches no second row.
        let stride = if rows > 1 || stride < 4 { stride } else { 1 };
        moistair_column { values: input.as_ptr(), stride }
    };
    let [dry_bulb, second, pressure] = [column(&inputs[0]), column(&inputs[1]), column(&inputs[2])];
    let mask = caller.mask();
    let mut memory = [[f64::from_bits(SENTINEL); MOST]; MOISTAIR_PROPERTY_COUNT as usize];
    let outputs: Vec<*mut f64> = memory.iter_mut().map(|column| column.as_mut_ptr()).collect();
    let mut status = [77; MOST];
    let mut report = moistair_column_report { failed: 77, first_failed: 77 };
    let mut error = moistair_error { value: 0.0, min: 0.0, max: 0.0, code: -1, quantity: -1 };
    let formulation = caller.selector(3);
    // SAFETY: valid memory for as many rows, or more rows than the library takes.
    let first = unsafe {
        moistair_state_columns(
            rows,
            dry_bulb,
            property,
            second,
            pressure,
            formulation,
            mask,
            outputs.as_ptr(),
            status.as_mut_ptr(),
            &mut report,
            &mut error,
        )
    };
    caller.broken.set(false);
    verdict(caller, "moistair_state_columns", first, Some(&error));
    let begun = first == MOISTAIR_OK || first >= 200;
    if !begun {
        assert!(memory.iter().flatten().all(|value| value.to_bits() == SENTINEL) && report.failed == 77);
        return 0;
    }
    assert_eq!(report.failed, status.iter().take(rows).filter(|status| **status != 0).count());
    assert_eq!(first, if report.first_failed < rows { status[report.first_failed] } else { 0 });
    for (code, column) in memory.iter().enumerate() {
        for (row, value) in column.iter().enumerate() {
            match (mask >> code & 1 == 1 && row < rows, status[row]) {
                (false, _) => assert_eq!(value.to_bits(), SENTINEL),
                (true, 0) => assert!(value.is_finite(), "{value}"),
                (true, _) => assert!(value.is_finite() || value.to_bits() == NAN_BITS, "{:x}", value.to_bits()),
            }
        }
    }
    1 + rows - report.failed
}

/// A process on a few rows; whether one of them had a result.
fn process_columns(caller: &Caller) -> bool {
    const MOST: usize = 4;
    let selector = caller.process();
    let process = Process::from_code(selector).unwrap_or(Process::ALL[0]);
    let rows =
        if caller.below(16) == 0 { usize::MAX >> caller.below(3) } else { caller.below(MOST as u64 + 1) as usize };
    let fields: Vec<Field> = (0..process.input_count()).map_while(|place| process.input(place)).collect();
    let mut random = Random(caller.bits());
    // One number in eight is wild in half of the calls, each number plausible in the others.
    let careless = caller.below(2) == 0;
    let mut draw = |field: &Field| -> [f64; MOST] {
        core::array::from_fn(|row| {
            let sound = plausible(process.name(), &field.to_string(), field.unit(), row, &mut random);
            if careless && caller.below(8) == 0 { caller.wild() } else { sound }
        })
    };
    let inputs: Vec<[f64; MOST]> = fields.iter().map(&mut draw).collect();
    let column = |input: &[f64; MOST]| {
        let stride = if caller.below(256) == 0 && rows > 1 { usize::MAX / 4 } else { caller.below(2) as usize };
        moistair_column { values: caller.pointer(input).cast(), stride }
    };
    caller.broken.set(false);
    let columns: Vec<moistair_column> = inputs.iter().map(column).collect();
    let mut memory = vec![[f64::from_bits(SENTINEL); MOST]; process.output_count()];
    let outputs: Vec<*mut f64> = memory.iter_mut().map(|column| caller.optional(column).cast()).collect();
    let (takes, gives) = (columns.len(), outputs.len());
    let count = |count: usize| if caller.below(32) == 0 { caller.bits() as usize } else { count };
    let mut status = [77; MOST];
    let mut report = moistair_column_report { failed: 77, first_failed: 77 };
    let mut error = moistair_error { value: 0.0, min: 0.0, max: 0.0, code: -1, quantity: -1 };
    // SAFETY: valid memory for as many rows, or more rows or columns than the library takes.
    let first = unsafe {
        moistair_process_columns(
            rows,
            selector,
            columns.as_ptr(),
            count(takes),
            caller.formulation(),
            outputs.as_ptr(),
            count(gives),
            status.as_mut_ptr(),
            &mut report,
            &mut error,
        )
    };
    // Without rows no pointer is looked at.
    if rows == 0 {
        caller.broken.set(false);
    }
    verdict(caller, "moistair_process_columns", first, Some(&error));
    if report.failed == 77 {
        assert!(memory.iter().flatten().all(|value| value.to_bits() == SENTINEL) && status == [77; MOST]);
        return false;
    }
    assert_eq!(report.failed, status.iter().take(rows).filter(|status| **status != 0).count());
    assert_eq!(first, if report.first_failed < rows { status[report.first_failed] } else { 0 });
    for (column, place) in memory.iter().zip(&outputs) {
        for (row, value) in column.iter().enumerate() {
            match (!place.is_null() && row < rows, status[row]) {
                (false, _) => assert_eq!(value.to_bits(), SENTINEL),
                (true, 0) => {
                    assert!(!value.is_nan() || value.to_bits() == NAN_BITS, "{process:?} {:x}", value.to_bits())
                }
                (true, _) => assert_eq!(value.to_bits(), NAN_BITS),
            }
        }
    }
    assert!(status.iter().take(rows).all(|status| text(*status).is_some() && *status != MOISTAIR_INTERNAL));
    report.failed < rows
}

/// Texts are terminated and static whatever the code.
fn texts(caller: &Caller, n: u64, successes: &mut BTreeMap<&'static str, (u64, u64)>) {
    type Text = extern "C" fn(i32) -> *const core::ffi::c_char;
    let all: [(&str, Text); 10] = [
        ("moistair_process_name", moistair_process_name),
        ("moistair_status_text", moistair_status_text),
        ("moistair_quantity_name", moistair_quantity_name),
        ("moistair_quantity_unit", moistair_quantity_unit),
        ("moistair_unit_text", moistair_unit_text),
        ("moistair_quality_text", moistair_quality_text),
        ("moistair_reason_text", moistair_reason_text),
        ("moistair_fraction_status_text", moistair_fraction_status_text),
        ("moistair_economizer_reason_text", moistair_economizer_reason_text),
        ("moistair_economizer_rule_text", moistair_economizer_rule_text),
    ];
    for (name, function) in all {
        for _ in 0..n {
            // SAFETY: a static text.
            let text = unsafe { core::ffi::CStr::from_ptr(function(caller.selector(400))) };
            assert!(text.to_str().unwrap().len() < 100, "{name}");
        }
        successes.insert(name, (n, n));
    }
    type Count = extern "C" fn(i32) -> usize;
    let counts: [(&str, Count); 3] = [
        ("moistair_process_input_count", moistair_process_input_count),
        ("moistair_process_repeated_count", moistair_process_repeated_count),
        ("moistair_process_output_count", moistair_process_output_count),
    ];
    for (name, function) in counts {
        assert!((0..n).all(|_| function(caller.process()) < 100), "{name}");
        successes.insert(name, (n, n));
    }
    assert!(moistair_version() > 0 && moistair_abi_version() > 0 && moistair_numerics_version() > 0);
    for name in ["moistair_version", "moistair_abi_version", "moistair_numerics_version"] {
        successes.insert(name, (1, 1));
    }
}
