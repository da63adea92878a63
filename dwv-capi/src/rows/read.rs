//! Reading rows one by one.

use std::ffi::c_char;

use super::{dwv_finding_row, dwv_fixture_row, dwv_pipe_row, dwv_reason_row, dwv_terminal_row, dwv_vent_row};
use crate::guard::{Refusal, given, guard, wanted};
use crate::sizing::dwv_sizing;
use crate::status::dwv_status;
use crate::text::text;

/// Copies one element of a list of a sizing to the caller.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `place` is NULL or can be written to.
unsafe fn copy<T: Copy>(
    sizing: *const dwv_sizing,
    place: *mut T,
    index: usize,
    list: impl FnOnce(&dwv_sizing) -> Option<&[T]>,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let sizing = unsafe { given(sizing, "sizing") }?;
        let place = wanted(place, "row")?;
        let found = list(sizing).and_then(|list| list.get(index));
        let out_of_range = || Refusal::status(dwv_status::DWV_ERROR_INDEX, "the index is not below the count");
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(*found.ok_or_else(out_of_range)?) };
        Ok(())
    };
    // SAFETY: no error object is wanted.
    unsafe { guard(std::ptr::null_mut(), work) }
}

/// How many drains there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_pipe_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { sizing.as_ref() }.map_or(0, |sizing| sizing.rows.pipes.len())
}

/// Copies a pipe row to `*row`: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL` for a NULL argument.
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
    unsafe { copy(sizing, row, index, |sizing| Some(&sizing.rows.pipes)) }
}

/// How many vents there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_vent_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { sizing.as_ref() }.map_or(0, |sizing| sizing.rows.vents.len())
}

/// Copies a vent row to `*row`: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL` for a NULL argument.
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
    unsafe { copy(sizing, row, index, |sizing| Some(&sizing.rows.vents)) }
}

/// How many terminals there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_terminal_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { sizing.as_ref() }.map_or(0, |sizing| sizing.rows.terminals.len())
}

/// Copies a terminal row to `*row`: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL` for a NULL argument.
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
    unsafe { copy(sizing, row, index, |sizing| Some(&sizing.rows.terminals)) }
}

/// How many fixtures there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_fixture_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { sizing.as_ref() }.map_or(0, |sizing| sizing.rows.fixtures.len())
}

/// Copies a fixture row to `*row`: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL` for a NULL argument.
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
    unsafe { copy(sizing, row, index, |sizing| Some(&sizing.rows.fixtures)) }
}

/// How many findings there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_finding_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { sizing.as_ref() }.map_or(0, |sizing| sizing.rows.findings.len())
}

/// Copies a finding row to `*row`: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL` for a NULL argument.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_finding(
    sizing: *const dwv_sizing,
    index: usize,
    row: *mut dwv_finding_row,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, row, index, |sizing| Some(&sizing.rows.findings)) }
}

/// Copies one reason of a pipe to `*row`: `DWV_ERROR_INDEX` when an index is not below its count.
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
    unsafe { copy(sizing, row, reason, |sizing| sizing.rows.pipe_reasons.get(pipe).map(Vec::as_slice)) }
}

/// Copies one reason of a vent to `*row`: `DWV_ERROR_INDEX` when an index is not below its count.
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
    unsafe { copy(sizing, row, reason, |sizing| sizing.rows.vent_reasons.get(vent).map(Vec::as_slice)) }
}

/// Finds the index of a pipe by its id: `DWV_ERROR_QUESTION` when nothing has it.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `id` has `length` readable bytes; `index` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_find_pipe(
    sizing: *const dwv_sizing,
    id: *const c_char,
    length: usize,
    index: *mut usize,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let (sizing, id) = unsafe { (given(sizing, "sizing")?, text(id, length)?) };
        let place = wanted(index, "index")?;
        let found = sizing.rows.pipes.iter().position(|row| row.id.is(id));
        let unknown = || Refusal::status(dwv_status::DWV_ERROR_QUESTION, "nothing has the id");
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(found.ok_or_else(unknown)?) };
        Ok(())
    };
    // SAFETY: no error object is wanted.
    unsafe { guard(std::ptr::null_mut(), work) }
}

/// Finds the index of a vent by its id: `DWV_ERROR_QUESTION` when nothing has it.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `id` has `length` readable bytes; `index` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_find_vent(
    sizing: *const dwv_sizing,
    id: *const c_char,
    length: usize,
    index: *mut usize,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let (sizing, id) = unsafe { (given(sizing, "sizing")?, text(id, length)?) };
        let place = wanted(index, "index")?;
        let found = sizing.rows.vents.iter().position(|row| row.id.is(id));
        let unknown = || Refusal::status(dwv_status::DWV_ERROR_QUESTION, "nothing has the id");
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(found.ok_or_else(unknown)?) };
        Ok(())
    };
    // SAFETY: no error object is wanted.
    unsafe { guard(std::ptr::null_mut(), work) }
}

/// Finds the index of a fixture by its id: `DWV_ERROR_QUESTION` when nothing has it.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `id` has `length` readable bytes; `index` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_find_fixture(
    sizing: *const dwv_sizing,
    id: *const c_char,
    length: usize,
    index: *mut usize,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let (sizing, id) = unsafe { (given(sizing, "sizing")?, text(id, length)?) };
        let place = wanted(index, "index")?;
        let found = sizing.rows.fixtures.iter().position(|row| row.id.is(id));
        let unknown = || Refusal::status(dwv_status::DWV_ERROR_QUESTION, "nothing has the id");
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(found.ok_or_else(unknown)?) };
        Ok(())
    };
    // SAFETY: no error object is wanted.
    unsafe { guard(std::ptr::null_mut(), work) }
}
