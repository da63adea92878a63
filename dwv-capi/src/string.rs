//! Texts that the caller owns.

use crate::guard::free;
use crate::text::{Texts, dwv_text};

/// A text that the caller owns. Free it with `dwv_string_free`.
#[derive(Debug)]
pub struct dwv_string {
    text: dwv_text,
    _texts: Texts,
}

impl dwv_string {
    pub(crate) fn new(text: &str) -> Self {
        let mut texts = Texts::default();
        Self { text: texts.add(text), _texts: texts }
    }
}

/// The text of a string. It lives until the string is freed. NULL gives an empty text.
///
/// # Safety
/// `string` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_string_text(string: *const dwv_string) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { string.as_ref() }.map_or(dwv_text::EMPTY, |string| string.text)
}

/// Frees a string. NULL is accepted.
///
/// # Safety
/// `string` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_string_free(string: *mut dwv_string) {
    // SAFETY: the caller's contract.
    unsafe { free(string) }
}
