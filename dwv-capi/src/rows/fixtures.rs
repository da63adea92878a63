//! Fixtures: what each loads, and how its trap gets its air.

use std::ffi::c_char;

use dwv_core::edition::Witness;
use dwv_core::schedule::FixtureRow;

use super::values::{dwv_measure, dwv_pipe_size, measure, size};
use super::{copy, count, find, inner};
use crate::sizing::dwv_sizing;
use crate::status::dwv_status;
use crate::text::{Texts, dwv_text};

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
    /// The least size of its outlet pipe; none when the edition does not list it.
    pub outlet: dwv_pipe_size,
    /// The length of its outlet pipe, when stated.
    pub outlet_length: dwv_measure,
    /// Its load in thousandths of a fixture unit.
    pub load_thousandths: u64,
    /// Where the load comes from.
    pub load_clause: dwv_text,
    /// How sure the load is, as `witness` of `dwv_reason_row`; empty when the drawing states it.
    pub load_witness: dwv_text,
    /// Whether it is only provided for.
    pub future: bool,
    /// The developed length of the trap arm; not known when no air reaches it or a length is missing.
    pub trap_arm: dwv_measure,
    /// How far the trap arm falls.
    pub trap_arm_fall: dwv_measure,
    /// The vent that protects it; empty when it has none.
    pub protected_by: dwv_text,
    /// How it gets its air, in words.
    pub air: dwv_text,
    /// How many steps the way of its air has, for `dwv_sizing_fixture_air`.
    pub air_steps: usize,
}

pub(super) fn write(row: &FixtureRow, texts: &mut Texts) -> (dwv_fixture_row, Vec<dwv_text>) {
    let fixture = dwv_fixture_row {
        id: texts.add(&row.id),
        kind: texts.add(&row.kind),
        level: texts.add(&row.level),
        trap: size(Some(row.trap), texts),
        outlet: size(row.outlet, texts),
        outlet_length: measure(row.outlet_length),
        load_thousandths: row.load.thousandths(),
        load_clause: texts.add(&row.load_clause),
        load_witness: texts.add(row.load_witness.map_or("", Witness::name)),
        future: row.future,
        trap_arm: measure(row.trap_arm_length),
        trap_arm_fall: measure(row.trap_arm_fall),
        protected_by: texts.add(row.protected_by.as_deref().unwrap_or_default()),
        air: texts.add(&row.air),
        air_steps: row.air_path.len(),
    };
    (fixture, row.air_path.iter().map(|step| texts.add(step)).collect())
}

/// How many fixtures there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_fixture_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { count(sizing, |rows| &rows.fixtures) }
}

/// Copies a fixture row to `*row`.
///
/// Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_fixture(
    sizing: *const dwv_sizing,
    index: usize,
    row: *mut dwv_fixture_row,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("index", index), row, |rows| Ok(&rows.fixtures)) }
}

/// One step of the way of a fixture's air: the id of a drain that serves as a wet vent, of a vent, and at last of the terminal or valve.
/// `*id` lives until the sizing is freed.
///
/// Status: `DWV_ERROR_INDEX` when `fixture` is not below the count of fixtures or `step` not below its `air_steps`, `DWV_ERROR_NULL`. Then
/// `*id` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `id` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_fixture_air(
    sizing: *const dwv_sizing,
    fixture: usize,
    step: usize,
    id: *mut dwv_text,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("step", step), id, |rows| inner(&rows.air_paths, "fixture", fixture)) }
}

/// Finds the index of a fixture by its id.
///
/// Status: `DWV_ERROR_QUESTION` when no fixture has it, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*index` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `id` is NULL or has `length` readable bytes; `index` is NULL or can be
/// written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_find_fixture(
    sizing: *const dwv_sizing,
    id: *const c_char,
    length: usize,
    index: *mut usize,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { find(sizing, id, length, index, |rows| &rows.fixtures, |row| row.id) }
}
