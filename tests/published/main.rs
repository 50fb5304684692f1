//! Published figures through the public interface; the figures stand in the tables beside, each with its source.
#![allow(
    clippy::disallowed_methods,
    reason = "the reference uses the platform's functions, so as to share nothing with the library"
)]

mod airport_weather;
mod atmosphere;
mod handbook;
mod helmholtz;
mod publications;
mod transport;
