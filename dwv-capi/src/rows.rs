//! Results row by row. Texts of a row live until its sizing is freed.

mod read;
mod write;

pub use read::*;
pub(crate) use write::{Rows, hundredths};

use crate::text::dwv_text;

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
    /// The size in hundredths of an inch: 150 for 1-1/2; 0 when it cannot be decided.
    pub hundredths: u32,
    /// The size as the trade writes it: `1-1/2`; empty when it cannot be decided.
    pub text: dwv_text,
}

/// One minimum of a size.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_reason_row {
    /// The stable name of the rule.
    pub rule: dwv_text,
    /// What it says.
    pub says: dwv_text,
    /// The size that it asks for.
    pub asks: dwv_pipe_size,
    /// The clause with the edition.
    pub clause: dwv_text,
    /// How sure the value is: `printed-two` … `unsure`.
    pub witness: dwv_text,
    /// Whether it governs.
    pub governs: bool,
}

/// A drain, from the sewer upstream.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_pipe_row {
    /// The id in the drawing.
    pub id: dwv_text,
    /// What it is called.
    pub name: dwv_text,
    /// Where it begins.
    pub from: dwv_text,
    /// Where it ends.
    pub to: dwv_text,
    /// The load in thousandths of a fixture unit.
    pub load_thousandths: u64,
    /// The traps upstream.
    pub traps: u32,
    /// The water closets upstream.
    pub water_closets: u32,
    /// The size.
    pub size: dwv_pipe_size,
    /// How far the size is decided.
    pub decision: dwv_decision,
    /// What governs the size, in words.
    pub governed_by: dwv_text,
    /// The clause that governs the size.
    pub clause: dwv_text,
    /// The load that it could still take before a table asks for more.
    pub room: dwv_load,
    /// Whether it serves as a wet vent.
    pub wet_vent: bool,
    /// Whether it runs vertically.
    pub vertical: bool,
    /// The slope as it was written, or as a ratio; empty for vertical pipe.
    pub slope: dwv_text,
    /// The developed length.
    pub length: dwv_measure,
    /// The fall.
    pub fall: dwv_measure,
    /// The invert at the upper end.
    pub invert_up: dwv_measure,
    /// The invert at the lower end.
    pub invert_down: dwv_measure,
    /// How many reasons there are, for `dwv_sizing_pipe_reason`.
    pub reasons: usize,
}

/// A vent, from open air inward.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_vent_row {
    /// The id in the drawing.
    pub id: dwv_text,
    /// What it is called.
    pub name: dwv_text,
    /// Where it begins.
    pub from: dwv_text,
    /// Where it ends.
    pub to: dwv_text,
    /// The terminal or valve that its air comes from.
    pub ends_at: dwv_text,
    /// The largest trap that gets its air here.
    pub largest_trap: dwv_pipe_size,
    /// The load that it is sized by, in thousandths of a fixture unit.
    pub load_thousandths: u64,
    /// The developed length that it is sized by; not known where length does not count.
    pub developed_length: dwv_measure,
    /// The size.
    pub size: dwv_pipe_size,
    /// How far the size is decided.
    pub decision: dwv_decision,
    /// What governs the size, in words.
    pub governed_by: dwv_text,
    /// The clause that governs the size.
    pub clause: dwv_text,
    /// How many reasons there are, for `dwv_sizing_vent_reason`.
    pub reasons: usize,
}

/// Where a vent ends in open air.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_terminal_row {
    /// The id in the drawing.
    pub id: dwv_text,
    /// The vent that ends here.
    pub vent: dwv_text,
    /// The size where it passes to open air.
    pub size: dwv_pipe_size,
    /// How far the size is decided.
    pub decision: dwv_decision,
    /// How far it ends above the roof or the ground.
    pub above: dwv_measure,
    /// What governs the size, in words.
    pub governed_by: dwv_text,
    /// The clause that governs the size.
    pub clause: dwv_text,
}

/// A fixture.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_fixture_row {
    /// The id in the drawing.
    pub id: dwv_text,
    /// Its kind in words.
    pub kind: dwv_text,
    /// Its level.
    pub level: dwv_text,
    /// Its trap.
    pub trap: dwv_pipe_size,
    /// The least size of its outlet pipe; undecided when the edition lists none.
    pub outlet: dwv_pipe_size,
    /// The length of its outlet pipe.
    pub outlet_length: dwv_measure,
    /// Its load in thousandths of a fixture unit.
    pub load_thousandths: u64,
    /// Where the load comes from.
    pub load_clause: dwv_text,
    /// How sure the load is: `printed-two` … `unsure`; empty when the drawing states it.
    pub load_witness: dwv_text,
    /// The developed length of the trap arm.
    pub trap_arm: dwv_measure,
    /// How far the trap arm falls.
    pub trap_arm_fall: dwv_measure,
    /// The vent that protects it; empty when it has none.
    pub protected_by: dwv_text,
    /// How it gets its air, in words.
    pub air: dwv_text,
}

/// Something that breaks the code, or that cannot be decided.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_finding_row {
    /// The stable name of the check.
    pub check: dwv_text,
    /// `violation`, `cannot-decide` or `caution`.
    pub severity: dwv_text,
    /// The id of the element; empty for the whole drawing.
    pub element: dwv_text,
    /// What was found.
    pub message: dwv_text,
    /// How to mend it.
    pub remedy: dwv_text,
    /// The clause.
    pub clause: dwv_text,
}
