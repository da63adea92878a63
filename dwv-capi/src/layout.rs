//! Layouts: read, written, freed.

use std::ffi::c_char;

use dwv_core::Layout;

use crate::error::dwv_error;
use crate::guard::{free, given, make};
use crate::status::dwv_status;
use crate::string::dwv_string;
use crate::text::bytes;

/// A drawn drainage and vent system. It is never changed, so that several threads may read it. Free it with `dwv_layout_free`.
#[derive(Debug)]
pub struct dwv_layout(pub(crate) Layout);

/// Reads a layout file of the format `dwv-layout/1`. The caller owns `*layout`; the bytes are not needed any more.
///
/// Status: `DWV_ERROR_FORMAT` with all faults of the file, `DWV_ERROR_NULL`.
///
/// # Safety
/// `json` has `length` readable bytes; `layout`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_layout_from_json(
    json: *const c_char,
    length: usize,
    layout: *mut *mut dwv_layout,
    error: *mut *mut dwv_error,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { make(layout, "layout", error, || Ok(dwv_layout(Layout::from_json(bytes(json, length, "json")?)?))) }
}

/// Writes a layout as a file of the format `dwv-layout/1`, one element a line. The caller owns `*json`.
///
/// Status: `DWV_ERROR_NULL`.
///
/// # Safety
/// `layout` came from this library and was not freed; `json`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_layout_to_json(
    layout: *const dwv_layout,
    json: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { make(json, "json", error, || Ok(dwv_string::new(&given(layout, "layout")?.0.to_json()))) }
}

/// Frees a layout. NULL is accepted.
///
/// # Safety
/// `layout` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_layout_free(layout: *mut dwv_layout) {
    // SAFETY: the caller's contract.
    unsafe { free(layout) }
}
