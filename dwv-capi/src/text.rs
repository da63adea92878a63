//! Texts across the border.

use std::ffi::{CStr, CString, c_char};

use crate::guard::Refusal;
use crate::status::dwv_status;

/// A view of UTF-8 text. It ends with a zero byte that `length` does not count, and lives as long as the object that it came from.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_text {
    /// The first byte; never NULL.
    pub data: *const c_char,
    /// The number of bytes.
    pub length: usize,
}

impl dwv_text {
    pub(crate) const EMPTY: Self = Self { data: c"".as_ptr(), length: 0 };

    pub(crate) fn of_static(text: &'static CStr) -> Self {
        Self { data: text.as_ptr(), length: text.count_bytes() }
    }

    /// Whether it is this text.
    pub(crate) fn is(&self, other: &str) -> bool {
        // SAFETY: a view is only made of a text that lives as long as its owner, which holds the view.
        unsafe { std::slice::from_raw_parts(self.data.cast::<u8>(), self.length) == other.as_bytes() }
    }

    pub(crate) fn of(text: &CStr) -> Self {
        Self { data: text.as_ptr(), length: text.count_bytes() }
    }
}

/// Text with a zero byte at its end. A zero byte within, which C could not tell from the end, is shown as a replacement character.
pub(crate) fn c_string(text: &str) -> CString {
    CString::new(text).unwrap_or_else(|_| CString::new(text.replace('\0', "\u{fffd}")).unwrap_or_default())
}

/// Texts that live together; their addresses do not change when more are added.
#[derive(Debug, Default)]
pub(crate) struct Texts(Vec<CString>);

impl Texts {
    pub(crate) fn add(&mut self, text: &str) -> dwv_text {
        if text.is_empty() {
            return dwv_text::EMPTY;
        }
        let text = c_string(text);
        let view = dwv_text::of(&text);
        self.0.push(text);
        view
    }
}

/// A text that the caller owns; free it with `dwv_string_free`.
#[derive(Debug)]
pub struct dwv_string(CString);

impl dwv_string {
    pub(crate) fn boxed(text: &str) -> *mut Self {
        Box::into_raw(Box::new(Self(c_string(text))))
    }
}

/// The text of a string. It lives until the string is freed. NULL gives an empty text.
///
/// # Safety
/// `string` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_string_text(string: *const dwv_string) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { string.as_ref() }.map_or(dwv_text::EMPTY, |string| dwv_text::of(&string.0))
}

/// Frees a string. NULL is accepted.
///
/// # Safety
/// `string` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_string_free(string: *mut dwv_string) {
    if !string.is_null() {
        // SAFETY: the caller's contract; the box was made by `dwv_string::boxed`.
        drop(unsafe { Box::from_raw(string) });
    }
}

/// The bytes that a caller hands in.
///
/// # Safety
/// `data` is NULL or has `length` readable bytes that do not change during the call.
pub(crate) unsafe fn bytes<'a>(data: *const c_char, length: usize) -> Result<&'a [u8], Refusal> {
    if data.is_null() {
        return Err(Refusal::status(dwv_status::DWV_ERROR_NULL, "a text is NULL"));
    }
    if length > isize::MAX as usize {
        return Err(Refusal::status(dwv_status::DWV_ERROR_TEXT, "a text is longer than any memory"));
    }
    // SAFETY: not NULL, and the caller's contract.
    Ok(unsafe { std::slice::from_raw_parts(data.cast(), length) })
}

/// The text that a caller hands in.
///
/// # Safety
/// As [`bytes`].
pub(crate) unsafe fn text<'a>(data: *const c_char, length: usize) -> Result<&'a str, Refusal> {
    // SAFETY: the caller's contract.
    let bytes = unsafe { bytes(data, length) }?;
    std::str::from_utf8(bytes).map_err(|error| {
        let message = format!("the text is not UTF-8 at byte {}", error.valid_up_to());
        Refusal::status(dwv_status::DWV_ERROR_TEXT, &message)
    })
}

/// The text that ends with a zero byte, which a caller hands in; none for NULL.
///
/// # Safety
/// `data` is NULL or ends with a zero byte.
pub(crate) unsafe fn optional<'a>(data: *const c_char) -> Result<Option<&'a str>, Refusal> {
    if data.is_null() {
        return Ok(None);
    }
    // SAFETY: not NULL, and the caller's contract.
    let text = unsafe { CStr::from_ptr(data) };
    text.to_str().map(Some).map_err(|_| Refusal::status(dwv_status::DWV_ERROR_TEXT, "a text is not UTF-8"))
}
