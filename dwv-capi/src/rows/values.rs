//! What cells of rows are made of.

use dwv_core::quantity::{Elevation, FixtureUnits, Length, PipeSize};
use dwv_core::schedule::Status;

use crate::quantity::hundredths;
use crate::text::{Texts, dwv_text};

/// How far a size is decided.
#[repr(C)]
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum dwv_decision {
    /// Decided by values that were seen in print, by practice or by the drawing.
    DWV_DECIDED = 0,
    /// A value that nobody has seen in print bears on it.
    DWV_PROVISIONAL = 1,
    /// Something is missing, the tables end, or unattested values are refused.
    DWV_CANNOT_DECIDE = 2,
}

/// A length or elevation in nanometres, when it is known.
#[repr(C)]
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct dwv_measure {
    /// Whether it is known.
    pub known: bool,
    /// The value in nanometres; 0 when not known.
    pub nanometres: i64,
}

/// A load in thousandths of a fixture unit, when there is one.
#[repr(C)]
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct dwv_load {
    /// Whether there is one.
    pub known: bool,
    /// The value in thousandths of a fixture unit; 0 when there is none.
    pub thousandths: u64,
}

/// A nominal pipe size.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_pipe_size {
    /// The size in hundredths of an inch: 150 for 1-1/2; 0 when there is none or it cannot be decided.
    pub hundredths: u32,
    /// The size as the trade writes it: `1-1/2`; empty when there is none or it cannot be decided.
    pub text: dwv_text,
}

pub(super) fn size(size: Option<PipeSize>, texts: &mut Texts) -> dwv_pipe_size {
    match size {
        Some(size) => dwv_pipe_size { hundredths: hundredths(size), text: texts.add(size.text()) },
        None => dwv_pipe_size { hundredths: 0, text: dwv_text::EMPTY },
    }
}

pub(super) fn decision(status: Status) -> dwv_decision {
    match status {
        Status::Decided => dwv_decision::DWV_DECIDED,
        Status::Provisional => dwv_decision::DWV_PROVISIONAL,
        Status::CannotDecide => dwv_decision::DWV_CANNOT_DECIDE,
    }
}

pub(super) fn measure(length: Option<Length>) -> dwv_measure {
    dwv_measure { known: length.is_some(), nanometres: length.map_or(0, Length::nanometres) }
}

pub(super) fn elevation(elevation: Option<Elevation>) -> dwv_measure {
    measure(elevation.map(|elevation| elevation.0))
}

pub(super) fn load(load: Option<FixtureUnits>) -> dwv_load {
    dwv_load { known: load.is_some(), thousandths: load.map_or(0, FixtureUnits::thousandths) }
}
