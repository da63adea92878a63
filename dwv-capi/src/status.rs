//! What every call comes back with.

use dwv_core::ErrorKind;

use crate::guard::guard_plain;
use crate::text::dwv_text;

/// What a call came back with. Values never change; new ones may be added.
#[repr(C)]
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum dwv_status {
    /// The call has done its work.
    DWV_OK = 0,
    /// The bytes are no layout file.
    DWV_ERROR_FORMAT = 1,
    /// The drawing is no drainage system.
    DWV_ERROR_DRAWING = 2,
    /// A quantity cannot be read or is out of range.
    DWV_ERROR_QUANTITY = 3,
    /// The edition is not known.
    DWV_ERROR_EDITION = 4,
    /// Nothing has the id, kind or name that was asked for.
    DWV_ERROR_QUESTION = 5,
    /// A pointer that must not be NULL is NULL.
    DWV_ERROR_NULL = 6,
    /// An index is not below the count.
    DWV_ERROR_INDEX = 7,
    /// A text is not UTF-8.
    DWV_ERROR_TEXT = 8,
    /// A fault of this library: please report it.
    DWV_ERROR_INTERNAL = 9,
}

impl dwv_status {
    pub(crate) fn of(kind: ErrorKind) -> Self {
        match kind {
            ErrorKind::Format => Self::DWV_ERROR_FORMAT,
            ErrorKind::Drawing => Self::DWV_ERROR_DRAWING,
            ErrorKind::Quantity => Self::DWV_ERROR_QUANTITY,
            ErrorKind::Edition => Self::DWV_ERROR_EDITION,
            ErrorKind::Question => Self::DWV_ERROR_QUESTION,
            _ => Self::DWV_ERROR_INTERNAL,
        }
    }
}

/// A status in words, for any number. The text lives as long as the program.
#[unsafe(no_mangle)]
pub extern "C" fn dwv_status_text(status: i32) -> dwv_text {
    guard_plain(dwv_text::EMPTY, || {
        dwv_text::of_static(match status {
            0 => c"ok",
            1 => c"the bytes are no layout file",
            2 => c"the drawing is no drainage system",
            3 => c"a quantity cannot be read or is out of range",
            4 => c"the edition is not known",
            5 => c"nothing has the id, kind or name that was asked for",
            6 => c"a pointer is NULL that must not be",
            7 => c"an index is not below the count",
            8 => c"a text is not UTF-8",
            9 => c"a fault of this library, please report it",
            _ => c"unknown status",
        })
    })
}

/// The version of this binary interface: it rises when a program built for an older one could break.
#[unsafe(no_mangle)]
pub extern "C" fn dwv_abi_version() -> u32 {
    1
}

/// The caution that every report carries. The text lives as long as the program.
#[unsafe(no_mangle)]
pub extern "C" fn dwv_caution() -> dwv_text {
    dwv_text::of_static(
        c"These results support, and do not replace, the local code in force, the authority having jurisdiction and a licensed practitioner.",
    )
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_caution_is_that_of_the_core() {
        // SAFETY: the text is static.
        let text = unsafe { std::ffi::CStr::from_ptr(dwv_caution().data) };
        assert_eq!(text.to_str(), Ok(dwv_core::schedule::CAUTION));
    }
}
