//! The minimums of a size.

use dwv_core::schedule::ReasonRow;

use super::values::{dwv_pipe_size, size};
use crate::text::{Texts, dwv_text};

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
    /// How sure the value is: `printed-two`, `printed-one`, `printed-provincial`, `common-practice`, `engine`, `disputed`, `memory`
    /// or `unsure`.
    pub witness: dwv_text,
    /// Whether somebody has seen the value in print, or it is practice or a parameter of the engine.
    pub attested: bool,
    /// Whether it governs.
    pub governs: bool,
}

pub(super) fn write(reasons: &[ReasonRow], texts: &mut Texts) -> Vec<dwv_reason_row> {
    let row = |reason: &ReasonRow| dwv_reason_row {
        rule: texts.add(reason.rule),
        says: texts.add(&reason.says),
        asks: size(Some(reason.asks), texts),
        clause: texts.add(&reason.clause),
        witness: texts.add(reason.witness.name()),
        attested: reason.witness.is_attested(),
        governs: reason.governs,
    };
    reasons.iter().map(row).collect()
}
