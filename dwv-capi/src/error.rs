//! Errors as objects.

use crate::guard::{Refusal, free, give, given};
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
    /// Where in the layout: `drains[3].to`; for a wrong argument, its name.
    pub path: dwv_text,
    /// The id of the element.
    pub element: dwv_text,
    /// What was found and what was expected.
    pub message: dwv_text,
    /// The likely fix.
    pub help: dwv_text,
}

impl dwv_error {
    pub(crate) fn new(status: dwv_status, refusal: Refusal) -> Self {
        let mut texts = Texts::default();
        match refusal {
            Refusal::Call { argument, message, .. } => {
                let message = texts.add(&message);
                let fault = dwv_fault {
                    code: texts.add(status.code()),
                    path: texts.add(argument),
                    element: dwv_text::EMPTY,
                    message,
                    help: dwv_text::EMPTY,
                };
                Self { status, message, faults: vec![fault], total: 1, _texts: texts }
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
        }
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

/// Copies one fault of an error to `*fault`.
///
/// Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`.
///
/// # Safety
/// `error` is NULL or came from this library and was not freed; `fault` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_error_fault(error: *const dwv_error, index: usize, fault: *mut dwv_fault) -> dwv_status {
    // SAFETY: the caller's contract; no error object is wanted.
    unsafe {
        give(fault, "fault", std::ptr::null_mut(), || {
            let error = given(error, "error")?;
            error.faults.get(index).copied().ok_or_else(|| Refusal::index("index", index, error.faults.len()))
        })
    }
}

/// Frees an error. NULL is accepted.
///
/// # Safety
/// `error` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_error_free(error: *mut dwv_error) {
    // SAFETY: the caller's contract.
    unsafe { free(error) }
}
