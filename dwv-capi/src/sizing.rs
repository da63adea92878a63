//! Sizing a layout, and the texts of the result. Its rows are in `rows`.

use std::ffi::c_char;

use dwv_core::{Edition, Sizing, Unattested};

use crate::error::dwv_error;
use crate::guard::{Refusal, free, given, make};
use crate::layout::dwv_layout;
use crate::rows::Rows;
use crate::status::dwv_status;
use crate::string::dwv_string;
use crate::text::{optional, text};

/// What is done with a size that rests on a value which nobody has seen in print.
#[repr(C)]
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum dwv_unattested {
    /// The size is given and marked.
    DWV_UNATTESTED_TELL = 0,
    /// No size is given.
    DWV_UNATTESTED_REFUSE = 1,
}

/// How to size. Set all bytes to zero for the defaults.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_size_options {
    /// The id of an edition, ending with a zero byte; NULL for the edition that the layout names.
    pub edition: *const c_char,
    /// One of `dwv_unattested`.
    pub unattested: i32,
}

/// A sized layout. It is never changed, so that several threads may read it. Free it with `dwv_sizing_free`.
#[derive(Debug)]
pub struct dwv_sizing {
    sizing: Sizing,
    pub(crate) rows: Rows,
}

/// Sizes a layout. The caller owns `*sizing`, which does not need the layout any more. `options` may be NULL for the defaults.
///
/// Status: `DWV_ERROR_DRAWING` with all faults of the drawing, `DWV_ERROR_EDITION`, `DWV_ERROR_QUESTION` for an unknown option,
/// `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.
///
/// # Safety
/// `layout` came from this library and was not freed; `options` is NULL or can be read; `sizing`, and `error` unless NULL, can be
/// written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_size(
    layout: *const dwv_layout,
    options: *const dwv_size_options,
    sizing: *mut *mut dwv_sizing,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let (layout, options) = unsafe { (given(layout, "layout")?, options.as_ref()) };
        let named = match options {
            // SAFETY: the caller's contract.
            Some(options) => unsafe { optional(options.edition, "options.edition") }?,
            None => None,
        };
        let unattested = match options.map_or(0, |options| options.unattested) {
            0 => Unattested::Tell,
            1 => Unattested::Refuse,
            other => {
                let message = format!("`options.unattested` is {other}, expected a number of dwv_unattested");
                return Err(Refusal::call(dwv_status::DWV_ERROR_QUESTION, "options.unattested", message));
            }
        };
        let edition = Edition::builtin(named.unwrap_or(&layout.0.edition))?;
        let sizing = Sizing::of(&layout.0, edition, unattested)?;
        Ok(dwv_sizing { rows: Rows::new(&sizing), sizing })
    };
    // SAFETY: the caller's contract.
    unsafe { make(sizing, "sizing", error, work) }
}

/// Frees a sizing with all texts and rows that point into it. NULL is accepted.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_free(sizing: *mut dwv_sizing) {
    // SAFETY: the caller's contract.
    unsafe { free(sizing) }
}

/// Makes a text of a sizing for the caller.
///
/// # Safety
/// As the functions that call it.
unsafe fn write(
    sizing: *const dwv_sizing,
    place: *mut *mut dwv_string,
    name: &'static str,
    error: *mut *mut dwv_error,
    words: impl FnOnce(&Sizing) -> Result<String, Refusal>,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { make(place, name, error, || Ok(dwv_string::new(&words(&given(sizing, "sizing")?.sizing)?))) }
}

/// The whole result as canonical JSON, the same bytes from every face. The caller owns `*json`.
///
/// Status: `DWV_ERROR_NULL`.
///
/// # Safety
/// `sizing` came from this library and was not freed; `json`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_to_json(
    sizing: *const dwv_sizing,
    json: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { write(sizing, json, "json", error, |sizing| Ok(sizing.to_json())) }
}

/// The whole report as aligned text. The caller owns `*report`.
///
/// Status: `DWV_ERROR_NULL`.
///
/// # Safety
/// `sizing` came from this library and was not freed; `report`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_to_text(
    sizing: *const dwv_sizing,
    report: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { write(sizing, report, "report", error, |sizing| Ok(sizing.to_text())) }
}

/// One schedule as comma-separated values: `pipes`, `vents`, `fixtures`, `inverts` or `findings`. The caller owns `*csv`.
///
/// Status: `DWV_ERROR_QUESTION` for another name, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.
///
/// # Safety
/// `sizing` came from this library and was not freed; `name` has `length` readable bytes; `csv`, and `error` unless NULL, can be
/// written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_schedule_csv(
    sizing: *const dwv_sizing,
    name: *const c_char,
    length: usize,
    csv: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { write(sizing, csv, "csv", error, |sizing| Ok(sizing.schedule(text(name, length, "name")?)?.to_csv())) }
}

/// One schedule as aligned text, by the names of `dwv_sizing_schedule_csv`. The caller owns `*table`.
///
/// Status: `DWV_ERROR_QUESTION` for another name, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.
///
/// # Safety
/// `sizing` came from this library and was not freed; `name` has `length` readable bytes; `table`, and `error` unless NULL, can be
/// written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_schedule_text(
    sizing: *const dwv_sizing,
    name: *const c_char,
    length: usize,
    table: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe {
        write(sizing, table, "table", error, |sizing| Ok(sizing.schedule(text(name, length, "name")?)?.to_text()))
    }
}

/// Why a pipe, fixture or terminal is what it is, in words. The caller owns `*explanation`.
///
/// Status: `DWV_ERROR_QUESTION` when nothing has the id, with the nearest; `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.
///
/// # Safety
/// `sizing` came from this library and was not freed; `id` has `length` readable bytes; `explanation`, and `error` unless NULL, can be
/// written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_why(
    sizing: *const dwv_sizing,
    id: *const c_char,
    length: usize,
    explanation: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { write(sizing, explanation, "explanation", error, |sizing| Ok(sizing.why(text(id, length, "id")?)?)) }
}
