//! Layouts: read, written, freed.

use std::ffi::c_char;

use dwv_core::Layout;

use crate::error::dwv_error;
use crate::guard::{given, guard, wanted};
use crate::status::dwv_status;
use crate::text::{bytes, dwv_string};

/// A drawn drainage and vent system. It is never changed, so that several threads may read it. Free it with `dwv_layout_free`.
#[derive(Debug)]
pub struct dwv_layout(pub(crate) Layout);

/// Reads a layout file of the format `dwv-layout/1`.
///
/// On `DWV_OK` the caller owns `*layout`; else `*layout` is not written. `error` may be NULL; when it is not, `*error` is an object that
/// the caller owns, or NULL on `DWV_OK`.
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
    let work = || {
        let place = wanted(layout, "layout")?;
        // SAFETY: the caller's contract.
        let read = Layout::from_json(unsafe { bytes(json, length) }?)?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(Box::into_raw(Box::new(dwv_layout(read)))) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// Writes a layout as a file of the format `dwv-layout/1`, one element a line. The caller owns `*json`.
///
/// # Safety
/// `layout` came from this library and was not freed; `json`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_layout_to_json(
    layout: *const dwv_layout,
    json: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let layout = unsafe { given(layout, "layout") }?;
        let place = wanted(json, "json")?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(dwv_string::boxed(&layout.0.to_json())) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// Frees a layout. NULL is accepted.
///
/// # Safety
/// `layout` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_layout_free(layout: *mut dwv_layout) {
    if !layout.is_null() {
        // SAFETY: the caller's contract; the box was made by `dwv_layout_from_json`.
        drop(unsafe { Box::from_raw(layout) });
    }
}
