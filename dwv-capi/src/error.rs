//! Errors as objects.

use crate::guard::{Refusal, given, guard, wanted};
use crate::status::dwv_status;
use crate::text::{Texts, dwv_text};

/// Why a call was refused, with all faults of the input. Free it with `dwv_error_free`.
#[derive(Debug)]
pub struct dwv_error {
    status: dwv_status,
    message: dwv_text,
    faults: Vec<dwv_fault>,
    total: usize,
    _texts: Texts,
}

/// One fault: where it is, what it is and how to mend it. Texts live until the error is freed; those that do not apply are empty.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_fault {
    /// Its stable name, such as `unknown-id`.
    pub code: dwv_text,
    /// Where in the layout: `drains[3].to`.
    pub path: dwv_text,
    /// The id of the element.
    pub element: dwv_text,
    /// What was found and what was expected.
    pub message: dwv_text,
    /// The likely fix.
    pub help: dwv_text,
}

impl dwv_error {
    pub(crate) fn boxed(status: dwv_status, refusal: Refusal) -> *mut Self {
        let mut texts = Texts::default();
        let error = match refusal {
            Refusal::Call(_, message) => {
                Self { status, message: texts.add(&message), faults: Vec::new(), total: 0, _texts: texts }
            }
            Refusal::Engine(error) => {
                let message = texts.add(&error.to_string());
                let mut faults = Vec::with_capacity(error.faults().len());
                for fault in error.faults() {
                    faults.push(dwv_fault {
                        code: texts.add(fault.code.name()),
                        path: texts.add(&fault.path),
                        element: texts.add(fault.element.as_deref().unwrap_or_default()),
                        message: texts.add(&fault.message),
                        help: texts.add(fault.help.as_deref().unwrap_or_default()),
                    });
                }
                Self { status, message, faults, total: error.total(), _texts: texts }
            }
        };
        Box::into_raw(Box::new(error))
    }
}

/// The status of an error; `DWV_OK` for NULL.
///
/// # Safety
/// `error` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_error_status(error: *const dwv_error) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { error.as_ref() }.map_or(dwv_status::DWV_OK, |error| error.status)
}

/// The whole message with all faults, a line each. It lives until the error is freed. NULL gives an empty text.
///
/// # Safety
/// `error` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_error_message(error: *const dwv_error) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { error.as_ref() }.map_or(dwv_text::EMPTY, |error| error.message)
}

/// How many faults the error lists. NULL has none.
///
/// # Safety
/// `error` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_error_fault_count(error: *const dwv_error) -> usize {
    // SAFETY: the caller's contract.
    unsafe { error.as_ref() }.map_or(0, |error| error.faults.len())
}

/// How many faults there are with those that are not listed. NULL has none.
///
/// # Safety
/// `error` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_error_fault_total(error: *const dwv_error) -> usize {
    // SAFETY: the caller's contract.
    unsafe { error.as_ref() }.map_or(0, |error| error.total)
}

/// One fault of an error: `DWV_ERROR_INDEX` when `index` is not below the count.
///
/// # Safety
/// `error` came from this library and was not freed; `fault` can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_error_fault(error: *const dwv_error, index: usize, fault: *mut dwv_fault) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let error = unsafe { given(error, "error") }?;
        let place = wanted(fault, "fault")?;
        let found = error.faults.get(index).ok_or_else(|| {
            let message = format!("the error has {} faults", error.faults.len());
            Refusal::status(dwv_status::DWV_ERROR_INDEX, &message)
        })?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(*found) };
        Ok(())
    };
    // SAFETY: no error object is wanted.
    unsafe { guard(std::ptr::null_mut(), work) }
}

/// Frees an error. NULL is accepted.
///
/// # Safety
/// `error` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_error_free(error: *mut dwv_error) {
    if !error.is_null() {
        // SAFETY: the caller's contract; the box was made by `dwv_error::boxed`.
        drop(unsafe { Box::from_raw(error) });
    }
}
