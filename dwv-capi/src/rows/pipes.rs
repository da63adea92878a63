//! Drains, from the sewer upstream.

use std::ffi::c_char;

use dwv_core::schedule::PipeRow;

use super::values::{decision, dwv_decision, dwv_load, dwv_measure, dwv_pipe_size, elevation, load, measure, size};
use super::{copy, count, dwv_reason_row, find, inner, reasons};
use crate::sizing::dwv_sizing;
use crate::status::dwv_status;
use crate::text::{Texts, dwv_text};

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
    /// The load that it could still take before a table asks for more; none where no load table bears on it.
    pub room: dwv_load,
    /// Whether it serves as a wet vent.
    pub wet_vent: bool,
    /// Whether it runs vertically.
    pub vertical: bool,
    /// The slope as it was written, or as a ratio; empty where there is none. `dwv_slope_parse` reads it.
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

pub(super) fn write(row: &PipeRow, texts: &mut Texts) -> (dwv_pipe_row, Vec<dwv_reason_row>) {
    let reasons = reasons::write(&row.reasons, texts);
    let pipe = dwv_pipe_row {
        id: texts.add(&row.id),
        name: texts.add(row.name),
        from: texts.add(&row.from),
        to: texts.add(&row.to),
        load_thousandths: row.load.thousandths(),
        traps: row.traps,
        water_closets: row.water_closets,
        size: size(row.size, texts),
        decision: decision(row.status),
        governed_by: texts.add(&row.governed_by),
        clause: texts.add(&row.clause),
        room: load(row.room),
        wet_vent: row.wet_vent,
        vertical: row.vertical,
        slope: texts.add(row.slope.as_deref().unwrap_or_default()),
        length: measure(row.length),
        fall: measure(row.fall),
        invert_up: elevation(row.invert_up),
        invert_down: elevation(row.invert_down),
        reasons: reasons.len(),
    };
    (pipe, reasons)
}

/// How many drains there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_pipe_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { count(sizing, |rows| &rows.pipes) }
}

/// Copies a pipe row to `*row`.
///
/// Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_pipe(
    sizing: *const dwv_sizing,
    index: usize,
    row: *mut dwv_pipe_row,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("index", index), row, |rows| Ok(&rows.pipes)) }
}

/// Copies one reason of a pipe to `*row`.
///
/// Status: `DWV_ERROR_INDEX` when `pipe` is not below the count of pipes or `reason` not below its `reasons`, `DWV_ERROR_NULL`. Then `*row`
/// is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_pipe_reason(
    sizing: *const dwv_sizing,
    pipe: usize,
    reason: usize,
    row: *mut dwv_reason_row,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("reason", reason), row, |rows| inner(&rows.pipe_reasons, "pipe", pipe)) }
}

/// Finds the index of a pipe by its id.
///
/// Status: `DWV_ERROR_QUESTION` when no pipe has it, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*index` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `id` is NULL or has `length` readable bytes; `index` is NULL or can be
/// written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_find_pipe(
    sizing: *const dwv_sizing,
    id: *const c_char,
    length: usize,
    index: *mut usize,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { find(sizing, id, length, index, |rows| &rows.pipes, |row| row.id) }
}
