//! One guard around every call: refusals become a status and an error object, and a panic does not leave the library.

use std::panic::{AssertUnwindSafe, catch_unwind};

use dwv_core::Error;

use crate::error::dwv_error;
use crate::status::dwv_status;

/// Why a call does not do its work.
pub(crate) enum Refusal {
    /// The engine refuses the input.
    Engine(Error),
    /// The call itself is wrong.
    Call(dwv_status, String),
}

impl Refusal {
    pub(crate) fn status(status: dwv_status, message: &str) -> Self {
        Self::Call(status, message.to_owned())
    }
}

impl From<Error> for Refusal {
    fn from(error: Error) -> Self {
        Self::Engine(error)
    }
}

/// Runs the work of a call.
///
/// # Safety
/// `error` is NULL or can be written to.
pub(crate) unsafe fn guard(error: *mut *mut dwv_error, work: impl FnOnce() -> Result<(), Refusal>) -> dwv_status {
    let refusal = match catch_unwind(AssertUnwindSafe(work)) {
        Ok(Ok(())) => {
            // SAFETY: the caller's contract.
            unsafe { put(error, std::ptr::null_mut()) };
            return dwv_status::DWV_OK;
        }
        Ok(Err(refusal)) => refusal,
        Err(_) => Refusal::status(dwv_status::DWV_ERROR_INTERNAL, "a fault of this library, please report it"),
    };
    let status = match &refusal {
        Refusal::Engine(error) => dwv_status::of(error.kind()),
        Refusal::Call(status, _) => *status,
    };
    if !error.is_null() {
        // SAFETY: the caller's contract.
        unsafe { put(error, dwv_error::boxed(status, refusal)) };
    }
    status
}

/// Runs work that cannot be refused.
pub(crate) fn guard_plain<T>(otherwise: T, work: impl FnOnce() -> T) -> T {
    catch_unwind(AssertUnwindSafe(work)).unwrap_or(otherwise)
}

/// Writes an output, when the caller wants it.
///
/// # Safety
/// `place` is NULL or can be written to.
pub(crate) unsafe fn put<T>(place: *mut T, value: T) {
    if !place.is_null() {
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(value) };
    }
}

/// An output that must be wanted.
pub(crate) fn wanted<T>(place: *mut T, name: &str) -> Result<*mut T, Refusal> {
    if place.is_null() {
        return Err(Refusal::status(dwv_status::DWV_ERROR_NULL, &format!("`{name}` is NULL")));
    }
    Ok(place)
}

/// A handle that must be there.
///
/// # Safety
/// `handle` is NULL or came from this library, was not freed and is not written to during the call.
pub(crate) unsafe fn given<'a, T>(handle: *const T, name: &str) -> Result<&'a T, Refusal> {
    // SAFETY: the caller's contract.
    unsafe { handle.as_ref() }.ok_or_else(|| Refusal::status(dwv_status::DWV_ERROR_NULL, &format!("`{name}` is NULL")))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_panic_stays_inside_and_becomes_a_status() {
        let mut error = std::ptr::null_mut();
        // SAFETY: the place of the error can be written to.
        let status = unsafe { guard(&mut error, || panic!("provoked by a test")) };
        assert_eq!(status, dwv_status::DWV_ERROR_INTERNAL);
        assert!(!error.is_null());
        // SAFETY: the error came from the guard.
        unsafe { crate::error::dwv_error_free(error) };
        assert_eq!(guard_plain(7, || panic!("provoked by a test")), 7);
    }
}
