//! What every call comes back with.

use dwv_core::ErrorKind;

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
    /// Nothing has the id, kind or name that was asked for, or the edition gives no such value.
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

use dwv_status::*;

impl dwv_status {
    const ALL: [Self; 10] = [
        DWV_OK,
        DWV_ERROR_FORMAT,
        DWV_ERROR_DRAWING,
        DWV_ERROR_QUANTITY,
        DWV_ERROR_EDITION,
        DWV_ERROR_QUESTION,
        DWV_ERROR_NULL,
        DWV_ERROR_INDEX,
        DWV_ERROR_TEXT,
        DWV_ERROR_INTERNAL,
    ];

    pub(crate) fn of(kind: ErrorKind) -> Self {
        match kind {
            ErrorKind::Format => DWV_ERROR_FORMAT,
            ErrorKind::Drawing => DWV_ERROR_DRAWING,
            ErrorKind::Quantity => DWV_ERROR_QUANTITY,
            ErrorKind::Edition => DWV_ERROR_EDITION,
            ErrorKind::Question => DWV_ERROR_QUESTION,
            // A kind that this face does not know yet.
            _ => DWV_ERROR_INTERNAL,
        }
    }

    /// The stable name of the fault of a wrong call.
    pub(crate) fn code(self) -> &'static str {
        match self {
            DWV_OK => "ok",
            DWV_ERROR_FORMAT => "wrong-format",
            DWV_ERROR_DRAWING => "wrong-drawing",
            DWV_ERROR_QUANTITY => "wrong-quantity",
            DWV_ERROR_EDITION => "unknown-edition",
            DWV_ERROR_QUESTION => "no-answer",
            DWV_ERROR_NULL => "null",
            DWV_ERROR_INDEX => "out-of-range",
            DWV_ERROR_TEXT => "not-utf8",
            DWV_ERROR_INTERNAL => "internal",
        }
    }

    fn text(self) -> dwv_text {
        dwv_text::of_static(match self {
            DWV_OK => c"ok",
            DWV_ERROR_FORMAT => c"the bytes are no layout file",
            DWV_ERROR_DRAWING => c"the drawing is no drainage system",
            DWV_ERROR_QUANTITY => c"a quantity cannot be read or is out of range",
            DWV_ERROR_EDITION => c"the edition is not known",
            DWV_ERROR_QUESTION => {
                c"nothing has the id, kind or name that was asked for, or the edition gives no such value"
            }
            DWV_ERROR_NULL => c"a pointer is NULL that must not be",
            DWV_ERROR_INDEX => c"an index is not below the count",
            DWV_ERROR_TEXT => c"a text is not UTF-8",
            DWV_ERROR_INTERNAL => c"a fault of this library, please report it",
        })
    }
}

/// A status in words, for any number. The text lives as long as the program.
#[unsafe(no_mangle)]
pub extern "C" fn dwv_status_text(status: i32) -> dwv_text {
    let found = dwv_status::ALL.into_iter().find(|listed| *listed as i32 == status);
    found.map_or(dwv_text::of_static(c"unknown status"), dwv_status::text)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_status_has_its_number() {
        for (number, status) in dwv_status::ALL.into_iter().enumerate() {
            assert_eq!(status as usize, number);
        }
    }
}
