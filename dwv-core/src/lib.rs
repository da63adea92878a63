//! Names, loads, sizes and grades of building drainage, waste and vent piping.
#![forbid(unsafe_code)]

pub mod edition;
pub mod quantity;
