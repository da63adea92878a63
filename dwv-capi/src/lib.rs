//! The C face of the engine: it translates and decides nothing.
//!
//! Handles are opaque and freed by their own function, which accepts NULL. Every function that can fail returns a [`dwv_status`] and
//! takes its outputs last; an optional `dwv_error **` receives an object with all faults. There is no global state.
#![allow(non_camel_case_types)] // The names of C.

mod answer;
mod edition;
mod error;
#[doc(hidden)] // Public for a test that provokes a panic behind the guard; nothing of it is exported to C.
pub mod guard;
mod layout;
mod quantity;
mod rows;
mod sizing;
mod status;
mod string;
mod table_value;
mod text;
mod version;

pub use answer::*;
pub use edition::*;
pub use error::*;
pub use layout::*;
pub use quantity::*;
pub use rows::*;
pub use sizing::*;
pub use status::*;
pub use string::*;
pub use table_value::*;
pub use text::*;
pub use version::*;
