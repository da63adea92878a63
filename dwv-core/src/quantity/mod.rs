//! Exact quantities: lengths in whole nanometres, slopes as ratios, fixture units in thousandths, pipe sizes as the trade lists them.
//!
//! Sizing never compares floating point. What a user types is kept with its notation, so `3'-6 1/2"` is printed back as such.
//!
//! ```
//! use dwv_core::quantity::{Length, Slope};
//!
//! let run = Length::parse("9 ft 6 in")?;
//! let slope = Slope::parse("1/4 in per ft")?;
//! assert_eq!(slope.value.fall_over(run.value), Length::parse("2-3/8 in")?.value);
//! assert_eq!(run.to_string(), "9'-6\"");
//! # Ok::<(), dwv_core::quantity::QuantityError>(())
//! ```

mod decimal;
mod elevation;
mod error;
mod fixture_units;
mod flow_rate;
mod length;
mod length_text;
mod measure;
mod pipe_size;
mod pipe_sizes;
#[cfg(feature = "schema")]
mod schema;
mod slope;
mod written;

pub use elevation::Elevation;
pub use error::QuantityError;
pub use fixture_units::FixtureUnits;
pub use flow_rate::{FlowRate, FlowUnit};
pub use length::{Length, LengthUnit};
pub use measure::Measure;
pub use pipe_size::PipeSize;
pub use pipe_sizes::PipeSizes;
pub use slope::{Slope, SlopeNotation};
pub use written::{Quantity, Written};
