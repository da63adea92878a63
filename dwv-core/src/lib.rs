//! Names, loads, sizes and grades of building drainage, waste and vent piping.
#![forbid(unsafe_code)]

pub mod edition;
pub mod error;
pub mod layout;
pub mod loading;
pub mod naming;
pub mod network;
pub mod quantity;
pub mod sizing;

pub use error::{Error, ErrorKind, Fault, FaultCode};
