//! Adiabatic mixing, and whether the books of a process close.

use moistair_core::Pressure;
use moistair_core::process::books::{self, Books};
use moistair_core::process::{WetStream, mixing};

use super::stream::{moistair_exchange, moistair_stream, moistair_wet_stream};
use super::{finite, mass_flow};
use crate::memory::{Answer, answer, check, read};
use crate::state::moistair_state;
use crate::status::{Failure, moistair_error};

/// Most streams that one call takes.
pub const MOISTAIR_MOST_STREAMS: i32 = 16;

/// Whether heat and water close over a process.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_books {
    /// Heat out less heat in less heat exchanged [W].
    pub heat_residual: f64,
    /// Sum of the magnitudes of all heat terms [W].
    pub heat_scale: f64,
    /// What the last place of the temperatures is worth [W].
    pub heat_resolution: f64,
    /// Water out less water in less water exchanged [kg/s].
    pub water_residual: f64,
    /// Sum of the magnitudes of all water terms [kg/s].
    pub water_scale: f64,
    /// 1 if both close to rounding, else 0.
    pub close: i32,
    /// 0.
    pub reserved: i32,
}

impl From<Books> for moistair_books {
    fn from(books: Books) -> Self {
        Self {
            heat_residual: books.heat_residual.watts(),
            heat_scale: books.heat_scale.watts(),
            heat_resolution: books.heat_resolution.watts(),
            water_residual: books.water_residual.kilograms_per_second(),
            water_scale: books.water_scale.kilograms_per_second(),
            close: books.close().into(),
            reserved: 0,
        }
    }
}

impl Answer for moistair_books {
    fn is_finite(&self) -> bool {
        let heat = [self.heat_residual, self.heat_scale, self.heat_resolution];
        finite(heat) && finite([self.water_residual, self.water_scale])
    }
}

/// The streams of an array, on the stack.
struct Streams {
    streams: [WetStream; MOISTAIR_MOST_STREAMS as usize],
    count: usize,
}

impl Streams {
    /// `None` for an empty array.
    unsafe fn read(streams: *const moistair_wet_stream, count: usize) -> Result<Option<Self>, Failure> {
        if count == 0 {
            return Ok(None);
        }
        if count > MOISTAIR_MOST_STREAMS as usize {
            return Err(Failure::TooLong);
        }
        check(streams)?;
        // SAFETY: the caller's array of `count` streams.
        let stream = |i| unsafe { streams.add(i).read() }.to_core();
        let mut all = Self { streams: [stream(0)?; MOISTAIR_MOST_STREAMS as usize], count };
        for (i, place) in all.streams.iter_mut().enumerate().take(count).skip(1) {
            *place = stream(i)?;
        }
        Ok(Some(all))
    }

    fn as_slice(this: Option<&Self>) -> &[WetStream] {
        this.and_then(|all| all.streams.get(..all.count)).unwrap_or_default()
    }
}

/// Mixes streams at one pressure adiabatically, with all condensate, then phase equilibrium.
///
/// streams: the streams that enter; those without flow take no part; count: number of streams, to MOISTAIR_MOST_STREAMS; leaving: output;
/// error: may be null.
/// Returns 0, 1xx, 2xx, 205, 206, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_mixing_adiabatic(
    streams: *const moistair_wet_stream,
    count: usize,
    leaving: *mut moistair_wet_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's array.
        let streams = unsafe { Streams::read(streams, count) }?;
        let streams = Streams::as_slice(streams.as_ref());
        Ok(mixing::adiabatic(streams)?.leaving.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(leaving, error, call) }
}

/// Mixes streams adiabatically at a given outlet pressure.
///
/// streams: the streams that enter; those without flow take no part; count: number of streams, to MOISTAIR_MOST_STREAMS; pressure: of the
/// outlet [Pa]; freezing: MOISTAIR_FREEZING_EQUILIBRIUM or MOISTAIR_FREEZING_SUPERCOOLED; leaving: output; error: may be null.
/// Returns 0, 1xx, 2xx, 205, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_mixing_adiabatic_at(
    streams: *const moistair_wet_stream,
    count: usize,
    pressure: f64,
    freezing: i32,
    leaving: *mut moistair_wet_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let freezing = super::stream::freezing(freezing)?;
        // SAFETY: the caller's array.
        let streams = unsafe { Streams::read(streams, count) }?;
        let streams = Streams::as_slice(streams.as_ref());
        let pressure = Pressure::from_pascals(pressure);
        Ok(mixing::adiabatic_at(streams, pressure, freezing)?.leaving.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(leaving, error, call) }
}

/// The stream of air that is left of a total flow when a part of it is known: the recirculated air behind measured outdoor and supply air.
///
/// total_dry_air_flow: [kg/s]; part: the known stream; air: state of the rest; rest: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the part is more than the total).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_mixing_remainder(
    total_dry_air_flow: f64,
    part: *const moistair_stream,
    air: *const moistair_state,
    rest: *mut moistair_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (part, air) = unsafe { (read(part)?.to_core()?, read(air)?.to_core()?) };
        Ok(mixing::remainder(mass_flow(total_dry_air_flow), &part, air)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(rest, error, call) }
}

/// Whether heat and water close between streams that enter, one that leaves and what was exchanged.
///
/// streams: the streams that enter; those without flow take no part; count: number of streams, to MOISTAIR_MOST_STREAMS; leaving: the
/// stream that leaves; exchange: what was exchanged; books: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_books_balance(
    streams: *const moistair_wet_stream,
    count: usize,
    leaving: *const moistair_wet_stream,
    exchange: *const moistair_exchange,
    books: *mut moistair_books,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's array.
        let streams = unsafe { Streams::read(streams, count) }?;
        let streams = Streams::as_slice(streams.as_ref());
        // SAFETY: the caller's pointers.
        let exchange = unsafe { read(exchange) }?;
        if !exchange.is_finite() {
            return Err(moistair_core::Error::NotFinite { quantity: moistair_core::Quantity::HeatFlow }.into());
        }
        // SAFETY: the caller's pointers.
        let books = books::balance(streams, &unsafe { read(leaving) }?.to_core()?, &exchange.into());
        Ok(books.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(books, error, call) }
}

const _: () = assert!(size_of::<moistair_books>() == 48);
