//! The C face of the engine: it translates and decides nothing.
//!
//! Handles are opaque and freed by their own function, which accepts NULL. Every function that can fail returns a [`dwv_status`] and
//! takes its outputs last; an optional `dwv_error **` receives an object with all faults. There is no global state.
#![allow(non_camel_case_types)] // The names of C.

mod edition;
mod error;
mod guard;
mod layout;
mod rows;
mod sizing;
mod status;
mod text;

pub use edition::*;
pub use error::*;
pub use layout::*;
pub use rows::*;
pub use sizing::*;
pub use status::*;
pub use text::*;
