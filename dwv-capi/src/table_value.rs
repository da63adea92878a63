//! Single table values as numbers, for spreadsheets.

use std::ffi::c_char;

use dwv_core::Edition;
use dwv_core::edition::{Answer, DrainRole, Question};
use dwv_core::quantity::{FixtureUnits, PipeSize};

use crate::edition::dwv_edition;
use crate::error::dwv_error;
use crate::guard::{Refusal, give, given};
use crate::quantity::{hundredths, ratio, size_of};
use crate::status::dwv_status;
use crate::text::text;

/// What a drain does.
#[repr(C)]
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum dwv_drain_role {
    /// A branch or fixture drain.
    DWV_BRANCH = 0,
    /// A stack, by its load in all.
    DWV_STACK = 1,
    /// A stack, by the load of one storey.
    DWV_STACK_STOREY = 2,
    /// A building drain or sewer.
    DWV_BUILDING_DRAIN = 3,
}

/// The answer holds no number: the table ends, or nobody knows the figure.
fn no_number(answer: &Answer) -> Refusal {
    Refusal::call(dwv_status::DWV_ERROR_QUESTION, "", format!("{}: {}", answer.clause, answer.text))
}

/// The answer of an edition as a size in hundredths of an inch.
fn answered_size(edition: &Edition, question: &Question) -> Result<u32, Refusal> {
    let answer = edition.answer(question)?;
    PipeSize::parse(&answer.text).map(hundredths).map_err(|_| no_number(&answer))
}

/// The least vent for the largest trap that it serves; both in hundredths of an inch: 200 for a 2 in trap.
///
/// Status: `DWV_ERROR_QUANTITY` for a size that the trade does not list, `DWV_ERROR_QUESTION` for a trap that the table does not have,
/// `DWV_ERROR_NULL`. Then `*vent_hundredths` is not written.
///
/// # Safety
/// `edition` came from this library and was not freed; `vent_hundredths`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_vent_for_trap(
    edition: *const dwv_edition,
    trap_hundredths: u32,
    vent_hundredths: *mut u32,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let edition = &unsafe { given(edition, "edition") }?.edition;
        answered_size(edition, &Question::VentForTrap { trap: size_of(trap_hundredths, "trap_hundredths")? })
    };
    // SAFETY: the caller's contract.
    unsafe { give(vent_hundredths, "vent_hundredths", error, work) }
}

/// The least drain for a load by its role, in hundredths of an inch, by the table of that role alone: size a layout to have all rules.
/// `role` is one of `dwv_drain_role`. The slope counts for building drains: `slope_rise` in `slope_run`, or 0 in 0 for the least
/// slope of each size.
///
/// Status: `DWV_ERROR_QUANTITY` for what is no slope, `DWV_ERROR_QUESTION` for an unknown role or a load beyond the table,
/// `DWV_ERROR_NULL`. Then `*size_hundredths` is not written.
///
/// # Safety
/// `edition` came from this library and was not freed; `size_hundredths`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_drain_for_load(
    edition: *const dwv_edition,
    role: i32,
    load_thousandths: u64,
    slope_rise: u32,
    slope_run: u32,
    size_hundredths: *mut u32,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let edition = &unsafe { given(edition, "edition") }?.edition;
        let role = match role {
            0 => DrainRole::Branch,
            1 => DrainRole::Stack,
            2 => DrainRole::StackStorey,
            3 => DrainRole::BuildingDrain,
            other => {
                let message = format!("`role` is {other}, expected a number of dwv_drain_role");
                return Err(Refusal::call(dwv_status::DWV_ERROR_QUESTION, "role", message));
            }
        };
        let slope = match (slope_rise, slope_run) {
            (0, 0) => None,
            _ => Some(ratio(slope_rise, slope_run, "slope_rise")?),
        };
        let load = FixtureUnits::from_thousandths(load_thousandths);
        answered_size(edition, &Question::DrainForLoad { role, load, slope })
    };
    // SAFETY: the caller's contract.
    unsafe { give(size_hundredths, "size_hundredths", error, work) }
}

/// The load of a kind of fixture in thousandths of a fixture unit. `trap_hundredths` is its trap in hundredths of an inch, or 0 for the
/// trap of the table.
///
/// Status: `DWV_ERROR_QUESTION` for a kind that the edition does not list, with the nearest, or one without a load;
/// `DWV_ERROR_QUANTITY` for a size that the trade does not list, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*load_thousandths` is not
/// written.
///
/// # Safety
/// `edition` came from this library and was not freed; `kind` has `length` readable bytes; `load_thousandths`, and `error` unless NULL,
/// can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_load_of_fixture(
    edition: *const dwv_edition,
    kind: *const c_char,
    length: usize,
    trap_hundredths: u32,
    load_thousandths: *mut u64,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let (edition, kind) = unsafe { (given(edition, "edition")?, text(kind, length, "kind")?) };
        let trap = if trap_hundredths == 0 { None } else { Some(size_of(trap_hundredths, "trap_hundredths")?) };
        let answer = edition.edition.answer(&Question::FixtureLoad { fixture: kind.to_owned(), trap })?;
        FixtureUnits::parse(&answer.text).map(FixtureUnits::thousandths).map_err(|_| no_number(&answer))
    };
    // SAFETY: the caller's contract.
    unsafe { give(load_thousandths, "load_thousandths", error, work) }
}
