//! The library with one function more, which panics behind the guard: for a test only, so that the library itself has no such hook.
#![allow(clippy::panic)] // That is what it is for.

use dwv::{dwv_error, dwv_status, guard};

/// Panics.
///
/// # Safety
/// `error` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_provoke_panic(error: *mut *mut dwv_error) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { guard::guard(error, || panic!("provoked")) }
}
