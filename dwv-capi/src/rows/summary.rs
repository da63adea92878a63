//! The head of a report.

use dwv_core::schedule::Summary;

use super::copy;
use crate::guard::{give, given};
use crate::sizing::dwv_sizing;
use crate::status::dwv_status;
use crate::text::{Texts, dwv_text};

/// What was sized, by which edition and readings, and how sure it is.
#[repr(C)]
#[derive(Debug, Clone, Copy)]
pub struct dwv_summary {
    /// What the drawing is called.
    pub name: dwv_text,
    /// The id of the edition.
    pub edition: dwv_text,
    /// The title of the edition.
    pub title: dwv_text,
    /// How many readings of the edition are in force, for `dwv_sizing_reading`.
    pub readings: usize,
    /// How many fixtures there are.
    pub fixtures: usize,
    /// How many drains.
    pub drains: usize,
    /// How many vents.
    pub vents: usize,
    /// The load at the sewer in thousandths of a fixture unit.
    pub load_thousandths: u64,
    /// One line on the sizes that rest on values which nobody has seen in print; empty when there is none.
    pub unattested: dwv_text,
    /// The caution that every report carries.
    pub caution: dwv_text,
}

pub(super) fn write(row: Summary, texts: &mut Texts) -> (dwv_summary, Vec<dwv_text>) {
    let summary = dwv_summary {
        name: texts.add(&row.name),
        edition: texts.add(&row.edition),
        title: texts.add(&row.title),
        readings: row.readings.len(),
        fixtures: row.fixtures,
        drains: row.drains,
        vents: row.vents,
        load_thousandths: row.load.thousandths(),
        unattested: texts.add(row.unattested.as_deref().unwrap_or_default()),
        caution: texts.add(row.caution),
    };
    (summary, row.readings.iter().map(|reading| texts.add(reading)).collect())
}

/// Copies the head of a report to `*summary`. Its texts live until the sizing is freed.
///
/// Status: `DWV_ERROR_NULL`. Then `*summary` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `summary` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_summary(sizing: *const dwv_sizing, summary: *mut dwv_summary) -> dwv_status {
    // SAFETY: the caller's contract; no error object is wanted.
    unsafe { give(summary, "summary", std::ptr::null_mut(), || Ok(given(sizing, "sizing")?.rows.summary)) }
}

/// A reading of the edition that is in force, in words. `*reading` lives until the sizing is freed.
///
/// Status: `DWV_ERROR_INDEX` when `index` is not below `readings` of the summary, `DWV_ERROR_NULL`. Then `*reading` is not written.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `reading` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_reading(
    sizing: *const dwv_sizing,
    index: usize,
    reading: *mut dwv_text,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { copy(sizing, ("index", index), reading, |rows| Ok(&rows.readings)) }
}

/// One line on the sizes that rest on values which nobody has seen in print; empty when there is none, and for NULL. It lives until the
/// sizing is freed.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_sizing_unattested(sizing: *const dwv_sizing) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { sizing.as_ref() }.map_or(dwv_text::EMPTY, |sizing| sizing.rows.summary.unattested)
}
