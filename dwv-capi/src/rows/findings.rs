//! What breaks the code, and what cannot be decided.

use dwv_core::schedule::FindingRow;

use super::{copy, count};
use crate::sizing::dwv_sizing;
use crate::status::dwv_status;
use crate::text::{Texts, dwv_text};

/// Something that breaks the code, or that cannot be decided.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_finding_row {
    /// The stable name of the check.
    pub check: dwv_text,
    /// `violation`, `cannot-decide` or `caution`.
    pub severity: dwv_text,
    /// The id of the element; empty for the whole drawing.
    pub element: dwv_text,
    /// What was found.
    pub message: dwv_text,
    /// How to mend it.
    pub remedy: dwv_text,
    /// The clause.
    pub clause: dwv_text,
}

pub(super) fn write(row: &FindingRow, texts: &mut Texts) -> dwv_finding_row {
    dwv_finding_row {
        check: texts.add(row.check),
        severity: texts.add(row.severity.name()),
        element: texts.add(row.element.as_deref().unwrap_or_default()),
        message: texts.add(&row.message),
        remedy: texts.add(&row.remedy),
        clause: texts.add(&row.clause),
    }
}

/// How many findings there are. NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_finding_count(sizing: *const dwv_sizing) -> usize {
    // SAFETY: the caller's contract.
    unsafe { count(sizing, |rows| &rows.findings) }
}

/// Copies a finding row to `*row`.
///
/// Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_finding(
    sizing: *const dwv_sizing,
    index: usize,
    row: *mut dwv_finding_row,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("index", index), row, |rows| Ok(&rows.findings)) }
}
