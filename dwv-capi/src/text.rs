//! Texts across the border.

use std::ffi::{CStr, c_char};

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
    pub(crate) const EMPTY: Self = Self::of_static(c"");

    pub(crate) const fn of_static(text: &'static CStr) -> Self {
        Self { data: text.as_ptr(), length: text.count_bytes() }
    }

    /// Whether it is this text.
    ///
    /// # Safety
    /// The owner of the view is still there.
    pub(crate) unsafe fn is(&self, other: &str) -> bool {
        // SAFETY: a view is as long as its text, which lives as long as its owner.
        unsafe { std::slice::from_raw_parts(self.data.cast::<u8>(), self.length) == other.as_bytes() }
    }
}

/// Texts that live together; their addresses do not change when more are added.
#[derive(Debug, Default)]
pub(crate) struct Texts {
    /// Each page takes its room once: a vector that never grows beyond its room never moves.
    pages: Vec<Vec<u8>>,
}

/// Room for the texts of a few rows; a longer text has a page of its own.
const PAGE: usize = 4096;

impl Texts {
    /// Adds a text. A zero byte within, which C could not tell from the end, is shown as a replacement character.
    pub(crate) fn add(&mut self, text: &str) -> dwv_text {
        if text.is_empty() {
            return dwv_text::EMPTY;
        }
        if text.contains('\0') {
            return self.add(&text.replace('\0', "\u{fffd}"));
        }
        let needed = text.len() + 1;
        if self.pages.last().is_none_or(|page| page.capacity() - page.len() < needed) {
            self.pages.push(Vec::with_capacity(PAGE.max(needed)));
        }
        let Some(page) = self.pages.last_mut() else { return dwv_text::EMPTY };
        let start = page.len();
        page.extend_from_slice(text.as_bytes());
        page.push(0);
        dwv_text { data: page[start..].as_ptr().cast(), length: text.len() }
    }
}

/// The bytes that a caller hands in.
///
/// # Safety
/// `data` is NULL or has `length` readable bytes that do not change during the call.
pub(crate) unsafe fn bytes<'a>(data: *const c_char, length: usize, name: &'static str) -> Result<&'a [u8], Refusal> {
    if data.is_null() {
        return Err(Refusal::null(name));
    }
    if length > isize::MAX as usize {
        return Err(Refusal::call(dwv_status::DWV_ERROR_TEXT, name, "the text is longer than any memory".to_owned()));
    }
    // SAFETY: not NULL, no longer than any object, and the caller's contract.
    Ok(unsafe { std::slice::from_raw_parts(data.cast(), length) })
}

/// The text that a caller hands in.
///
/// # Safety
/// As [`bytes`].
pub(crate) unsafe fn text<'a>(data: *const c_char, length: usize, name: &'static str) -> Result<&'a str, Refusal> {
    // SAFETY: the caller's contract.
    utf8(unsafe { bytes(data, length, name) }?, name)
}

/// The text that ends with a zero byte, which a caller hands in; none for NULL.
///
/// # Safety
/// `data` is NULL or ends with a zero byte.
pub(crate) unsafe fn optional<'a>(data: *const c_char, name: &'static str) -> Result<Option<&'a str>, Refusal> {
    if data.is_null() {
        return Ok(None);
    }
    // SAFETY: not NULL, and the caller's contract.
    let text = unsafe { CStr::from_ptr(data) };
    utf8(text.to_bytes(), name).map(Some)
}

fn utf8<'a>(bytes: &'a [u8], name: &'static str) -> Result<&'a str, Refusal> {
    std::str::from_utf8(bytes).map_err(|error| {
        let message = format!("the text is not UTF-8 at byte {}", error.valid_up_to());
        Refusal::call(dwv_status::DWV_ERROR_TEXT, name, message)
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn texts_stay_where_they_are() {
        let mut texts = Texts::default();
        let written: Vec<String> = (0..2000).map(|index| "ü".repeat(index % 700) + &index.to_string()).collect();
        let views: Vec<dwv_text> = written.iter().map(|text| texts.add(text)).collect();
        for (text, view) in written.iter().zip(views) {
            // SAFETY: `texts` is still there.
            let read = unsafe { CStr::from_ptr(view.data) };
            assert_eq!((read.to_str(), view.length), (Ok(text.as_str()), text.len()));
        }
        let view = texts.add("a\0b");
        // SAFETY: `texts` is still there.
        assert_eq!(unsafe { CStr::from_ptr(view.data) }.to_str(), Ok("a\u{fffd}b"));
    }
}
