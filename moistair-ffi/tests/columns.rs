//! Columns through C: the same bits as the calls for one state, strides, and what is refused before anything is written.

#![allow(clippy::unwrap_used, clippy::indexing_slicing, clippy::float_cmp, reason = "a test")]

use core::ptr::{null, null_mut};

use moistair::*;

const ROWS: usize = 64;
const MOST: usize = MOISTAIR_PROPERTY_COUNT as usize;
const SITE: f64 = 95_000.0;

fn records() -> [[f64; 3]; ROWS] {
    core::array::from_fn(|i| {
        let share = i as f64 / ROWS as f64;
        // Every eighth record is damaged.
        [i as f64, 50.0 - 100.0 * share, if i % 8 == 7 { f64::NAN } else { 0.02 + 0.95 * share }]
    })
}

struct Call {
    rows: usize,
    dry_bulb: moistair_column,
    second: moistair_column,
    pressure: moistair_column,
    mask: u64,
    status: *mut i32,
    report: *mut moistair_column_report,
}

impl Call {
    fn new(records: &[[f64; 3]; ROWS]) -> Self {
        let field = |place: usize| moistair_column { values: &records[0][place], stride: 3 };
        Self {
            rows: ROWS,
            dry_bulb: field(1),
            second: field(2),
            pressure: moistair_column { values: &SITE, stride: 0 },
            mask: 1 << MOISTAIR_SPECIFIC_ENTHALPY | 1 << MOISTAIR_FROST_POINT,
            status: null_mut(),
            report: null_mut(),
        }
    }

    fn run(&self, outputs: *const *mut f64) -> i32 {
        // SAFETY: each test gives valid memory, or what the library refuses before it looks.
        unsafe {
            moistair_state_columns(
                self.rows,
                self.dry_bulb,
                MOISTAIR_RELATIVE_HUMIDITY,
                self.second,
                self.pressure,
                MOISTAIR_REAL_GAS,
                self.mask,
                outputs,
                self.status,
                self.report,
                null_mut(),
            )
        }
    }
}

fn pointers(enthalpy: *mut f64, frost_point: *mut f64) -> [*mut f64; MOST] {
    let mut all = [null_mut(); MOST];
    all[MOISTAIR_SPECIFIC_ENTHALPY as usize] = enthalpy;
    all[MOISTAIR_FROST_POINT as usize] = frost_point;
    all
}

#[test]
fn columns_have_the_bits_of_single_states() {
    let records = records();
    let (mut enthalpy, mut frost_point, mut status) = ([0.0; ROWS], [0.0; ROWS], [0; ROWS]);
    let mut report = moistair_column_report { failed: 0, first_failed: 0 };
    let call = Call { status: status.as_mut_ptr(), report: &mut report, ..Call::new(&records) };
    let first = call.run(pointers(enthalpy.as_mut_ptr(), frost_point.as_mut_ptr()).as_ptr());
    let mut good = 0;
    for (row, record) in records.iter().enumerate() {
        let basis = moistair_basis { pressure: SITE, formulation: MOISTAIR_REAL_GAS, reserved: 0 };
        let mut state = core::mem::MaybeUninit::uninit();
        let mut single = [f64::NAN; MOST];
        // SAFETY: valid places.
        let code = unsafe {
            let place = state.as_mut_ptr();
            let made =
                moistair_from_dry_bulb(record[1], MOISTAIR_RELATIVE_HUMIDITY, record[2], basis, place, null_mut());
            if made == MOISTAIR_OK {
                moistair_properties(place, call.mask, single.as_mut_ptr(), null_mut(), null_mut());
                moistair_property(place, MOISTAIR_FROST_POINT, &mut 0.0, null_mut())
            } else {
                made
            }
        };
        assert_eq!(enthalpy[row].to_bits(), single[MOISTAIR_SPECIFIC_ENTHALPY as usize].to_bits(), "row {row}");
        assert_eq!(frost_point[row].to_bits(), single[MOISTAIR_FROST_POINT as usize].to_bits(), "row {row}");
        assert_eq!(status[row], code, "row {row}");
        good += usize::from(code == MOISTAIR_OK);
    }
    // Warm rows have an enthalpy but no frost point.
    assert!(good > ROWS / 4 && enthalpy.iter().filter(|value| value.is_finite()).count() > good);
    let first_failed = status.iter().position(|code| *code != MOISTAIR_OK).unwrap();
    assert_eq!((report.failed, report.first_failed, first), (ROWS - good, first_failed, status[first_failed]));
}

#[test]
fn overlap_is_refused() {
    let records = records();
    let (mut memory, mut status) = ([7.0; 2 * ROWS], [7; ROWS]);
    let start = memory.as_mut_ptr();
    let call = Call { status: status.as_mut_ptr(), ..Call::new(&records) };
    // Two outputs that share their last and first element; then apart.
    assert_eq!(call.run(pointers(start, start.wrapping_add(ROWS - 1)).as_ptr()), MOISTAIR_OVERLAPPING);
    assert_eq!(call.run(pointers(start, start).as_ptr()), MOISTAIR_OVERLAPPING);
    // An output that is also an input, an output that is also the status, an input that is also the status.
    let input = Call { second: moistair_column { values: start, stride: 1 }, ..call };
    assert_eq!(
        input.run(pointers(start.wrapping_add(ROWS - 1), start.wrapping_add(ROWS)).as_ptr()),
        MOISTAIR_OVERLAPPING
    );
    let shared = Call { status: start.wrapping_add(ROWS).cast(), ..Call::new(&records) };
    assert_eq!(shared.run(pointers(start, start.wrapping_add(ROWS)).as_ptr()), MOISTAIR_OVERLAPPING);
    let written = Call { status: records.as_ptr().cast_mut().cast(), ..Call::new(&records) };
    assert_eq!(written.run(pointers(start, start.wrapping_add(ROWS)).as_ptr()), MOISTAIR_OVERLAPPING);
    // The array of pointers itself.
    let mut outputs = pointers(start, null_mut());
    outputs[MOISTAIR_FROST_POINT as usize] = outputs.as_mut_ptr().cast();
    let few = Call { rows: 2, status: null_mut(), ..Call::new(&records) };
    assert_eq!(few.run(outputs.as_ptr()), MOISTAIR_OVERLAPPING);
    assert!(memory.iter().all(|value| *value == 7.0) && status.iter().all(|status| *status == 7));
    let call = Call { status: status.as_mut_ptr(), ..Call::new(&records) };
    let start = memory.as_mut_ptr();
    assert!(call.run(pointers(start, start.wrapping_add(ROWS)).as_ptr()) >= 200);
}

#[test]
fn bad_arguments_are_refused() {
    let records = records();
    let (mut a, mut b) = ([7.0; ROWS], [7.0; ROWS]);
    let good = pointers(a.as_mut_ptr(), b.as_mut_ptr());
    let call = || Call::new(&records);
    let missing = moistair_column { values: null(), stride: 0 };
    assert_eq!(Call { dry_bulb: missing, ..call() }.run(good.as_ptr()), MOISTAIR_NULL_POINTER);
    assert_eq!(call().run(null()), MOISTAIR_NULL_POINTER);
    assert_eq!(call().run(pointers(null_mut(), good[MOISTAIR_FROST_POINT as usize]).as_ptr()), MOISTAIR_NULL_POINTER);
    let odd = good[MOISTAIR_SPECIFIC_ENTHALPY as usize].wrapping_byte_add(4);
    assert_eq!(call().run(pointers(odd, good[MOISTAIR_FROST_POINT as usize]).as_ptr()), MOISTAIR_MISALIGNED);
    assert_eq!(Call { mask: 1 << 40, ..call() }.run(good.as_ptr()), MOISTAIR_UNKNOWN_SELECTOR);
    let far = moistair_column { values: &SITE, stride: usize::MAX / 2 };
    assert_eq!(Call { pressure: far, ..call() }.run(good.as_ptr()), MOISTAIR_TOO_LONG);
    assert_eq!(Call { rows: usize::MAX, ..call() }.run(good.as_ptr()), MOISTAIR_TOO_LONG);
    assert_eq!(Call { rows: usize::MAX / 8, ..call() }.run(good.as_ptr()), MOISTAIR_TOO_LONG);
    assert!(a.iter().chain(&b).all(|value| *value == 7.0));
}

#[test]
fn no_rows_need_no_memory() {
    let missing = moistair_column { values: null(), stride: 1 };
    let mut report = moistair_column_report { failed: 7, first_failed: 7 };
    let call = Call {
        rows: 0,
        dry_bulb: missing,
        second: missing,
        pressure: missing,
        mask: (1 << MOISTAIR_PROPERTY_COUNT) - 1,
        status: null_mut(),
        report: &mut report,
    };
    assert_eq!(call.run(null()), MOISTAIR_OK);
    assert_eq!((report.failed, report.first_failed), (0, 0));
    // No streams either.
    let mut leaving = core::mem::MaybeUninit::uninit();
    // SAFETY: a valid place.
    assert_eq!(unsafe { moistair_mixing_adiabatic(null(), 0, leaving.as_mut_ptr(), null_mut()) }, MOISTAIR_NO_FLOW);
}
