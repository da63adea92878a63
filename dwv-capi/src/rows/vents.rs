//! Vents, from open air inward.

use std::ffi::c_char;

use dwv_core::schedule::VentRow;

use super::values::{decision, dwv_decision, dwv_measure, dwv_pipe_size, measure, size};
use super::{copy, count, dwv_reason_row, find, inner, reasons};
use crate::sizing::dwv_sizing;
use crate::status::dwv_status;
use crate::text::{Texts, dwv_text};

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
    /// Its own length.
    pub length: dwv_measure,
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

pub(super) fn write(row: &VentRow, texts: &mut Texts) -> (dwv_vent_row, Vec<dwv_reason_row>) {
    let reasons = reasons::write(&row.reasons, texts);
    let vent = dwv_vent_row {
        id: texts.add(&row.id),
        name: texts.add(row.name),
        from: texts.add(&row.from),
        to: texts.add(&row.to),
        ends_at: texts.add(&row.ends_at),
        largest_trap: size(row.largest_trap, texts),
        load_thousandths: row.load.thousandths(),
        developed_length: measure(row.developed_length),
        length: measure(row.length),
        size: size(row.size, texts),
        decision: decision(row.status),
        governed_by: texts.add(&row.governed_by),
        clause: texts.add(&row.clause),
        reasons: reasons.len(),
    };
    (vent, reasons)
}

/// How many vents there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_vent_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { count(sizing, |rows| &rows.vents) }
}

/// Copies a vent row to `*row`.
///
/// Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_vent(
    sizing: *const dwv_sizing,
    index: usize,
    row: *mut dwv_vent_row,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("index", index), row, |rows| Ok(&rows.vents)) }
}

/// Copies one reason of a vent to `*row`.
///
/// Status: `DWV_ERROR_INDEX` when `vent` is not below the count of vents or `reason` not below its `reasons`, `DWV_ERROR_NULL`. Then `*row`
/// is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_vent_reason(
    sizing: *const dwv_sizing,
    vent: usize,
    reason: usize,
    row: *mut dwv_reason_row,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("reason", reason), row, |rows| inner(&rows.vent_reasons, "vent", vent)) }
}

/// Finds the index of a vent by its id.
///
/// Status: `DWV_ERROR_QUESTION` when no vent has it, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*index` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `id` is NULL or has `length` readable bytes; `index` is NULL or can be
/// written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_find_vent(
    sizing: *const dwv_sizing,
    id: *const c_char,
    length: usize,
    index: *mut usize,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { find(sizing, id, length, index, |rows| &rows.vents, |row| row.id) }
}
