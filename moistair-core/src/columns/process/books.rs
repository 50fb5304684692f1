//! The books of a process.

use super::row::{answers, processes};
use super::stream::Streams;
use crate::process::books::{Books, balance};
use crate::process::{Exchange, WetStream};

processes! {
    900 "books.balance": (exchange: Exchange, leaving: WetStream, entering: Streams) -> Books {
        balance(entering.as_slice(), &leaving, &exchange)
    }
}

answers! {
    Books, |x| {
        heat_residual: x.heat_residual,
        heat_scale: x.heat_scale,
        water_residual: x.water_residual,
        water_scale: x.water_scale,
        heat_resolution: x.heat_resolution,
        close: x.close(),
    }
}
