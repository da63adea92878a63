//! Where vents end in open air.

use std::ffi::c_char;

use dwv_core::layout::Through;
use dwv_core::schedule::TerminalRow;

use super::values::{decision, dwv_decision, dwv_measure, dwv_pipe_size, measure, size};
use super::{copy, count, dwv_reason_row, find, inner, reasons};
use crate::sizing::dwv_sizing;
use crate::status::dwv_status;
use crate::text::{Texts, dwv_text};

/// Where a vent ends in open air.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_terminal_row {
    /// The id in the drawing.
    pub id: dwv_text,
    /// The vent that ends here.
    pub vent: dwv_text,
    /// `roof` or `wall`.
    pub through: dwv_text,
    /// How far it ends above the roof or the ground.
    pub above: dwv_measure,
    /// The size where it passes to open air.
    pub size: dwv_pipe_size,
    /// How far the size is decided.
    pub decision: dwv_decision,
    /// What governs the size, in words.
    pub governed_by: dwv_text,
    /// The clause that governs the size.
    pub clause: dwv_text,
    /// How many reasons there are, for `dwv_sizing_terminal_reason`.
    pub reasons: usize,
}

pub(super) fn write(row: &TerminalRow, texts: &mut Texts) -> (dwv_terminal_row, Vec<dwv_reason_row>) {
    let reasons = reasons::write(&row.reasons, texts);
    let through = match row.through {
        Through::Roof => c"roof",
        Through::Wall => c"wall",
    };
    let terminal = dwv_terminal_row {
        id: texts.add(&row.id),
        vent: texts.add(&row.vent),
        through: dwv_text::of_static(through),
        above: measure(row.above),
        size: size(row.size, texts),
        decision: decision(row.status),
        governed_by: texts.add(&row.governed_by),
        clause: texts.add(&row.clause),
        reasons: reasons.len(),
    };
    (terminal, reasons)
}

/// How many terminals there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_terminal_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { count(sizing, |rows| &rows.terminals) }
}

/// Copies a terminal row to `*row`.
///
/// Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_terminal(
    sizing: *const dwv_sizing,
    index: usize,
    row: *mut dwv_terminal_row,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("index", index), row, |rows| Ok(&rows.terminals)) }
}

/// Copies one reason of a terminal to `*row`.
///
/// Status: `DWV_ERROR_INDEX` when `terminal` is not below the count of terminals or `reason` not below its `reasons`, `DWV_ERROR_NULL`. Then `*row`
/// is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_terminal_reason(
    sizing: *const dwv_sizing,
    terminal: usize,
    reason: usize,
    row: *mut dwv_reason_row,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("reason", reason), row, |rows| inner(&rows.terminal_reasons, "terminal", terminal)) }
}

/// Finds the index of a terminal by its id.
///
/// Status: `DWV_ERROR_QUESTION` when no terminal has it, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*index` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `id` is NULL or has `length` readable bytes; `index` is NULL or can be
/// written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_find_terminal(
    sizing: *const dwv_sizing,
    id: *const c_char,
    length: usize,
    index: *mut usize,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { find(sizing, id, length, index, |rows| &rows.terminals, |row| row.id) }
}
