//! One guard around every call: refusals become a status and an error object, and a panic does not leave the library.

use std::panic::{AssertUnwindSafe, catch_unwind};

use dwv_core::Error;
use dwv_core::quantity::QuantityError;

use crate::error::dwv_error;
use crate::status::dwv_status;

#[cfg(panic = "abort")]
compile_error!("a panic must unwind to its guard: build without `panic = \"abort\"`");

/// Why a call does not do its work.
#[derive(Debug)]
pub enum Refusal {
    /// The engine refuses the input.
    Engine(Error),
    /// An argument is wrong.
    Call {
        /// What the call comes back with.
        status: dwv_status,
        /// The name of the argument; empty where none is to blame.
        argument: &'static str,
        /// What is wrong with it.
        message: String,
    },
}

impl Refusal {
    pub(crate) fn call(status: dwv_status, argument: &'static str, message: String) -> Self {
        Self::Call { status, argument, message }
    }

    pub(crate) fn null(argument: &'static str) -> Self {
        Self::call(dwv_status::DWV_ERROR_NULL, argument, format!("`{argument}` is NULL"))
    }

    pub(crate) fn quantity(argument: &'static str, error: &QuantityError) -> Self {
        Self::call(dwv_status::DWV_ERROR_QUANTITY, argument, error.to_string())
    }

    pub(crate) fn index(argument: &'static str, index: usize, count: usize) -> Self {
        Self::call(
            dwv_status::DWV_ERROR_INDEX,
            argument,
            format!("`{argument}` is {index}, expected less than {count}"),
        )
    }

    fn status(&self) -> dwv_status {
        match self {
            Self::Engine(error) => dwv_status::of(error.kind()),
            Self::Call { status, .. } => *status,
        }
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
pub unsafe fn guard(error: *mut *mut dwv_error, work: impl FnOnce() -> Result<(), Refusal>) -> dwv_status {
    // Nothing is looked at after a panic: handles never change, and the half-made answer is dropped.
    let refusal = match catch_unwind(AssertUnwindSafe(work)) {
        Ok(Ok(())) => {
            // SAFETY: the caller's contract.
            unsafe { put(error, std::ptr::null_mut()) };
            return dwv_status::DWV_OK;
        }
        Ok(Err(refusal)) => refusal,
        Err(payload) => {
            let words = payload
                .downcast_ref::<String>()
                .map(String::as_str)
                .or_else(|| payload.downcast_ref::<&str>().copied())
                .unwrap_or("no words");
            let message = format!("internal error of the engine, please report it: {words}");
            Refusal::call(dwv_status::DWV_ERROR_INTERNAL, "", message)
        }
    };
    let status = refusal.status();
    if !error.is_null() {
        let boxed = Box::into_raw(Box::new(dwv_error::new(status, refusal)));
        // SAFETY: not NULL, and the caller's contract.
        unsafe { error.write(boxed) };
    }
    status
}

/// Makes a handle that the caller owns; when the call is refused, the place of the handle holds NULL.
///
/// # Safety
/// `place` and `error` are NULL or can be written to.
pub(crate) unsafe fn make<T>(
    place: *mut *mut T,
    name: &'static str,
    error: *mut *mut dwv_error,
    work: impl FnOnce() -> Result<T, Refusal>,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe {
        put(place, std::ptr::null_mut());
        give(place, name, error, || work().map(|made| Box::into_raw(Box::new(made))))
    }
}

/// Gives the caller a value; when the call is refused, the place of the value is not written to.
///
/// # Safety
/// `place` and `error` are NULL or can be written to.
pub(crate) unsafe fn give<T>(
    place: *mut T,
    name: &'static str,
    error: *mut *mut dwv_error,
    work: impl FnOnce() -> Result<T, Refusal>,
) -> dwv_status {
    let guarded = || {
        if place.is_null() {
            return Err(Refusal::null(name));
        }
        let value = work()?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(value) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, guarded) }
}

/// Writes an output, when the caller wants it.
///
/// # Safety
/// `place` is NULL or can be written to.
unsafe fn put<T>(place: *mut T, value: T) {
    if !place.is_null() {
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(value) };
    }
}

/// A handle that must be there.
///
/// # Safety
/// `handle` is NULL or came from this library, was not freed and is not written to during the call.
pub(crate) unsafe fn given<'a, T>(handle: *const T, name: &'static str) -> Result<&'a T, Refusal> {
    // SAFETY: the caller's contract.
    unsafe { handle.as_ref() }.ok_or_else(|| Refusal::null(name))
}

/// Frees a handle.
///
/// # Safety
/// `handle` is NULL or was made by [`make`] or [`guard`] and not freed.
pub(crate) unsafe fn free<T>(handle: *mut T) {
    if !handle.is_null() {
        // SAFETY: not NULL, and the caller's contract: it came out of a box.
        drop(unsafe { Box::from_raw(handle) });
    }
}
