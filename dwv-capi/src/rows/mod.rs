//! Results row by row. Texts of a row live until its sizing is freed.

mod findings;
mod fixtures;
mod pipes;
mod reasons;
mod summary;
mod terminals;
mod values;
mod vents;

pub use findings::*;
pub use fixtures::*;
pub use pipes::*;
pub use reasons::*;
pub use summary::*;
pub use terminals::*;
pub use values::*;
pub use vents::*;

use std::ffi::c_char;

use dwv_core::Sizing;

use crate::guard::{Refusal, give, given};
use crate::sizing::dwv_sizing;
use crate::status::dwv_status;
use crate::text::{Texts, dwv_text, text};

/// All rows of a sizing with the texts that they point to.
#[derive(Debug)]
pub(crate) struct Rows {
    summary: dwv_summary,
    readings: Vec<dwv_text>,
    pipes: Vec<dwv_pipe_row>,
    pipe_reasons: Reasons,
    vents: Vec<dwv_vent_row>,
    vent_reasons: Reasons,
    terminals: Vec<dwv_terminal_row>,
    terminal_reasons: Reasons,
    fixtures: Vec<dwv_fixture_row>,
    air_paths: Vec<Vec<dwv_text>>,
    findings: Vec<dwv_finding_row>,
    _texts: Texts,
}

/// The reasons of each row of a list.
type Reasons = Vec<Vec<dwv_reason_row>>;

impl Rows {
    pub(crate) fn new(sizing: &Sizing) -> Self {
        let mut texts = Texts::default();
        let (summary, readings) = summary::write(sizing.summary(), &mut texts);
        let (pipes, pipe_reasons) = sizing.pipes().iter().map(|row| pipes::write(row, &mut texts)).unzip();
        let (vents, vent_reasons) = sizing.vents().iter().map(|row| vents::write(row, &mut texts)).unzip();
        let ends = sizing.terminals();
        let (terminals, terminal_reasons) = ends.iter().map(|row| terminals::write(row, &mut texts)).unzip();
        let (fixtures, air_paths) = sizing.fixtures().iter().map(|row| fixtures::write(row, &mut texts)).unzip();
        let findings = sizing.findings().iter().map(|row| findings::write(row, &mut texts)).collect();
        Self {
            summary,
            readings,
            pipes,
            pipe_reasons,
            vents,
            vent_reasons,
            terminals,
            terminal_reasons,
            fixtures,
            air_paths,
            findings,
            _texts: texts,
        }
    }
}

/// Counts a list of a sizing; NULL has none.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed.
unsafe fn count<T>(sizing: *const dwv_sizing, list: impl FnOnce(&Rows) -> &[T]) -> usize {
    // SAFETY: the caller's contract.
    unsafe { sizing.as_ref() }.map_or(0, |sizing| list(&sizing.rows).len())
}

/// Copies one element of a list of a sizing to the caller.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `place` is NULL or can be written to.
unsafe fn copy<T: Copy>(
    sizing: *const dwv_sizing,
    (name, index): (&'static str, usize),
    place: *mut T,
    list: impl FnOnce(&Rows) -> Result<&[T], Refusal>,
) -> dwv_status {
    // SAFETY: the caller's contract; no error object is wanted.
    unsafe {
        give(place, "row", std::ptr::null_mut(), || {
            let list = list(&given(sizing, "sizing")?.rows)?;
            list.get(index).copied().ok_or_else(|| Refusal::index(name, index, list.len()))
        })
    }
}

/// The inner list of a row.
fn inner<'a, T>(lists: &'a [Vec<T>], name: &'static str, index: usize) -> Result<&'a [T], Refusal> {
    lists.get(index).map(Vec::as_slice).ok_or_else(|| Refusal::index(name, index, lists.len()))
}

/// Finds the index of the row that has an id.
///
/// # Safety
/// `sizing` is NULL or came from this library and was not freed; `id` is NULL or has `length` readable bytes; `place` is NULL or can be
/// written to.
unsafe fn find<T>(
    sizing: *const dwv_sizing,
    id: *const c_char,
    length: usize,
    place: *mut usize,
    list: impl FnOnce(&Rows) -> &[T],
    id_of: impl Fn(&T) -> dwv_text,
) -> dwv_status {
    // SAFETY: the caller's contract; no error object is wanted.
    unsafe {
        give(place, "index", std::ptr::null_mut(), || {
            let (sizing, id) = (given(sizing, "sizing")?, text(id, length, "id")?);
            let found = list(&sizing.rows).iter().position(|row| id_of(row).is(id));
            found.ok_or_else(|| {
                Refusal::call(dwv_status::DWV_ERROR_QUESTION, "id", format!("nothing has the id `{id}`"))
            })
        })
    }
}
