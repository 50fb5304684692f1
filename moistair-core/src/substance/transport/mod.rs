//! Viscosity and thermal conductivity of the pure gases, each from its own published equation, as functions of temperature and of the
//! gas's own density.

pub mod dry_air;
pub mod water_vapor;

/// Transport of momentum and heat in a pure gas.
#[derive(Clone, Copy, Debug)]
pub struct Transport<R> {
    /// Dynamic viscosity, Pa s.
    pub viscosity: R,
    /// Thermal conductivity, W/(m K).
    pub conductivity: R,
}

#[cfg(test)]
mod tests;
