//! Totals over time: heat, water, means of states, counts, and how well the books close.
//!
//! Everything is a plain structure owned by the caller: it can be stored, restored, and merged (hours into a day,
//! channels into a plant). Sums are compensated, time is counted in whole microseconds, and what is not covered by
//! trusted samples is never counted as zero: a total carries its [coverage](Total::coverage).

mod books;
mod counts;
mod deviation;
mod periods;
mod sum;
mod total;

#[cfg(test)]
mod tests;

pub use books::{BooksTotal, Residuals};
pub use counts::{Counts, QUALITY_SLOTS, REASON_SLOTS};
pub use deviation::Deviation;
pub use periods::{Period, Periods, SHORTEST_PERIOD};
pub use sum::Sum;
pub use total::{Added, Rule, Total};
