//! What is timed and how: rows of air, a race of contenders in turns, and the programs that a user would otherwise write.
#![allow(missing_docs)]

pub mod air;
pub mod race;
pub mod rivals;
