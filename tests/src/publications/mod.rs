//! Publications beside the ones that the library stands on, each in a text of its own that shares nothing with the library, and
//! how far they lie apart: a reader sees what is the model and what is disagreement between models.

pub mod cipm_2007;
mod comparisons;
pub mod henry;
pub mod saturation;
pub mod wmo;

pub use comparisons::{Comparison, Place, Unit, comparisons};
