//! A sized layout: its texts. Its rows are in `rows`.

use std::ffi::c_char;

use dwv_core::{Edition, Sizing, Unattested};

use crate::error::dwv_error;
use crate::guard::{Refusal, given, guard, wanted};
use crate::layout::dwv_layout;
use crate::rows::Rows;
use crate::status::dwv_status;
use crate::text::{Texts, dwv_string, dwv_text, optional, text};

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
    pub(crate) sizing: Sizing,
    pub(crate) rows: Rows,
    unattested: dwv_text,
    _texts: Texts,
}

/// Sizes a layout. On `DWV_OK` the caller owns `*sizing`, which does not need the layout any more. `options` and `error` may be NULL.
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
        let layout = unsafe { given(layout, "layout") }?;
        let place = wanted(sizing, "sizing")?;
        // SAFETY: the caller's contract.
        let options = unsafe { options.as_ref() };
        let named = match options {
            // SAFETY: the caller's contract.
            Some(options) => unsafe { optional(options.edition) }?,
            None => None,
        };
        let unattested = match options.map_or(0, |options| options.unattested) {
            0 => Unattested::Tell,
            1 => Unattested::Refuse,
            other => {
                let message = format!("`unattested` is {other}, expected 0 or 1");
                return Err(Refusal::status(dwv_status::DWV_ERROR_QUESTION, &message));
            }
        };
        let edition = Edition::builtin(named.unwrap_or(&layout.0.edition))?;
        let sized = Sizing::of(&layout.0, edition, unattested)?;
        let mut texts = Texts::default();
        let told = texts.add(sized.summary().unattested.as_deref().unwrap_or_default());
        let rows = Rows::new(&sized);
        let boxed = Box::new(dwv_sizing { sizing: sized, rows, unattested: told, _texts: texts });
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(Box::into_raw(boxed)) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// Frees a sizing. NULL is accepted.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_free(sizing: *mut dwv_sizing) {
    if !sizing.is_null() {
        // SAFETY: the caller's contract; the box was made by `dwv_size`.
        drop(unsafe { Box::from_raw(sizing) });
    }
}

/// Gives the caller a text of a sizing.
///
/// # Safety
/// As the functions that call it.
unsafe fn give(
    sizing: *const dwv_sizing,
    place: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
    write: impl FnOnce(&Sizing) -> Result<String, Refusal>,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let sizing = unsafe { given(sizing, "sizing") }?;
        let place = wanted(place, "string")?;
        let text = write(&sizing.sizing)?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(dwv_string::boxed(&text)) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// The whole result as canonical JSON, the same bytes from every face. The caller owns `*json`.
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
    unsafe { give(sizing, json, error, |sizing| Ok(sizing.to_json())) }
}

/// The whole report as aligned text. The caller owns `*report`.
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
    unsafe { give(sizing, report, error, |sizing| Ok(sizing.to_text())) }
}

/// One schedule as comma-separated values: `pipes`, `vents`, `fixtures`, `inverts` or `findings`. The caller owns `*csv`.
///
/// # Safety
/// `sizing` came from this library and was not freed; `name` has `length` readable bytes; `csv`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_schedule_csv(
    sizing: *const dwv_sizing,
    name: *const c_char,
    length: usize,
    csv: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { give(sizing, csv, error, |sizing| Ok(sizing.schedule(text(name, length)?)?.to_csv())) }
}

/// Why a pipe, fixture or terminal is what it is, in words. The caller owns `*explanation`.
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
    unsafe { give(sizing, explanation, error, |sizing| Ok(sizing.why(text(id, length)?)?)) }
}

/// One line on the sizes that rest on values which nobody has seen in print; empty when there is none, and for NULL. It lives until the
/// sizing is freed.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_unattested(sizing: *const dwv_sizing) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { sizing.as_ref() }.map_or(dwv_text::EMPTY, |sizing| sizing.unattested)
}
