//! Plain questions to an edition, with scalars for spreadsheets.

use std::ffi::c_char;
use std::num::NonZeroU32;
use std::sync::Arc;

use dwv_core::Edition;
use dwv_core::edition::{DrainRole, Question};
use dwv_core::quantity::{FixtureUnits, Length, PipeSize, QuantityError, Slope, SlopeNotation, Written};

use crate::error::dwv_error;
use crate::guard::{Refusal, given, guard, wanted};
use crate::rows::hundredths;
use crate::status::dwv_status;
use crate::text::{Texts, dwv_string, dwv_text, text};

/// A code edition. It is never changed, so that several threads may read it. Free it with `dwv_edition_free`.
#[derive(Debug)]
pub struct dwv_edition(Arc<Edition>);

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

/// An answer with its source. Free it with `dwv_answer_free`.
#[derive(Debug)]
pub struct dwv_answer {
    text: dwv_text,
    clause: dwv_text,
    witness: dwv_text,
    _texts: Texts,
}

fn quantity(error: &QuantityError) -> Refusal {
    Refusal::status(dwv_status::DWV_ERROR_QUANTITY, &error.to_string())
}

/// Opens an edition by its id, such as `npc-2015`. On `DWV_OK` the caller owns `*edition`.
///
/// # Safety
/// `id` has `length` readable bytes; `edition`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_open(
    id: *const c_char,
    length: usize,
    edition: *mut *mut dwv_edition,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        let place = wanted(edition, "edition")?;
        // SAFETY: the caller's contract.
        let opened = Edition::builtin(unsafe { text(id, length) }?)?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(Box::into_raw(Box::new(dwv_edition(opened)))) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// Frees an edition. NULL is accepted.
///
/// # Safety
/// `edition` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_free(edition: *mut dwv_edition) {
    if !edition.is_null() {
        // SAFETY: the caller's contract; the box was made by `dwv_edition_open`.
        drop(unsafe { Box::from_raw(edition) });
    }
}

/// Where every value of an edition comes from, as a page in Markdown. The caller owns `*page`.
///
/// # Safety
/// `edition` came from this library and was not freed; `page`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_provenance(
    edition: *const dwv_edition,
    page: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let edition = unsafe { given(edition, "edition") }?;
        let place = wanted(page, "page")?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(dwv_string::boxed(&edition.0.provenance())) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// Answers a question written as JSON, such as `{"ask": "vent-for-trap", "trap": "2"}`. The caller owns `*answer`.
///
/// # Safety
/// `edition` came from this library and was not freed; `question` has `length` readable bytes; `answer`, and `error` unless NULL, can be
/// written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_answer(
    edition: *const dwv_edition,
    question: *const c_char,
    length: usize,
    answer: *mut *mut dwv_answer,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let (edition, question) = unsafe { (given(edition, "edition")?, text(question, length)?) };
        let place = wanted(answer, "answer")?;
        let found = edition.0.answer_json(question)?;
        let mut texts = Texts::default();
        let boxed = Box::new(dwv_answer {
            text: texts.add(&found.text),
            clause: texts.add(&found.clause),
            witness: texts.add(found.witness.name()),
            _texts: texts,
        });
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(Box::into_raw(boxed)) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// The answer itself. It lives until the answer is freed. NULL gives an empty text.
///
/// # Safety
/// `answer` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_answer_text(answer: *const dwv_answer) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { answer.as_ref() }.map_or(dwv_text::EMPTY, |answer| answer.text)
}

/// The clause of an answer. It lives until the answer is freed. NULL gives an empty text.
///
/// # Safety
/// `answer` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_answer_clause(answer: *const dwv_answer) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { answer.as_ref() }.map_or(dwv_text::EMPTY, |answer| answer.clause)
}

/// How sure an answer is: `printed-two` … `unsure`. It lives until the answer is freed. NULL gives an empty text.
///
/// # Safety
/// `answer` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_answer_witness(answer: *const dwv_answer) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { answer.as_ref() }.map_or(dwv_text::EMPTY, |answer| answer.witness)
}

/// Frees an answer. NULL is accepted.
///
/// # Safety
/// `answer` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_answer_free(answer: *mut dwv_answer) {
    if !answer.is_null() {
        // SAFETY: the caller's contract; the box was made by `dwv_edition_answer`.
        drop(unsafe { Box::from_raw(answer) });
    }
}

/// A size in hundredths of an inch as the trade lists it.
fn size_of(size: u32) -> Result<PipeSize, Refusal> {
    PipeSize::ALL.into_iter().find(|listed| hundredths(*listed) == size).ok_or_else(|| {
        let message = format!("no pipe size is {size} hundredths of an inch");
        Refusal::status(dwv_status::DWV_ERROR_QUANTITY, &message)
    })
}

/// The answer of an edition as a size in hundredths of an inch.
fn answered_size(edition: &Edition, question: &Question) -> Result<u32, Refusal> {
    let answer = edition.answer(question)?;
    PipeSize::parse(&answer.text)
        .map(hundredths)
        .map_err(|_| Refusal::status(dwv_status::DWV_ERROR_QUESTION, &format!("{}: {}", answer.clause, answer.text)))
}

/// The least vent for the largest trap that it serves; both in hundredths of an inch: 200 for a 2 in trap.
///
/// # Safety
/// `edition` came from this library and was not freed; `vent`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_vent_for_trap(
    edition: *const dwv_edition,
    trap_hundredths: u32,
    vent_hundredths: *mut u32,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let edition = unsafe { given(edition, "edition") }?;
        let place = wanted(vent_hundredths, "vent_hundredths")?;
        let found = answered_size(&edition.0, &Question::VentForTrap { trap: size_of(trap_hundredths)? })?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(found) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// The least drain for a load by its role, in hundredths of an inch; `role` is one of `dwv_drain_role`. The slope counts for building drains:
/// `slope_rise` in `slope_run`, or 0 in 0 for the least slope of each size.
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
        let edition = unsafe { given(edition, "edition") }?;
        let place = wanted(size_hundredths, "size_hundredths")?;
        let role = match role {
            0 => DrainRole::Branch,
            1 => DrainRole::Stack,
            2 => DrainRole::StackStorey,
            3 => DrainRole::BuildingDrain,
            other => {
                let message = format!("no drain role has the number {other}");
                return Err(Refusal::status(dwv_status::DWV_ERROR_QUESTION, &message));
            }
        };
        let slope = match (slope_rise, slope_run) {
            (0, 0) => None,
            _ => Some(Written::new(ratio(slope_rise, slope_run)?, SlopeNotation::Ratio)),
        };
        let load = FixtureUnits::from_thousandths(load_thousandths);
        let found = answered_size(&edition.0, &Question::DrainForLoad { role, load, slope })?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(found) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// The load of a kind of fixture in thousandths of a fixture unit. `trap_hundredths` is its trap in hundredths of an inch, or 0 for the
/// trap of the table.
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
        let (edition, kind) = unsafe { (given(edition, "edition")?, text(kind, length)?) };
        let place = wanted(load_thousandths, "load_thousandths")?;
        let trap = if trap_hundredths == 0 { None } else { Some(size_of(trap_hundredths)?) };
        let answer = edition.0.answer(&Question::FixtureLoad { fixture: kind.to_owned(), trap })?;
        let load = FixtureUnits::parse(&answer.text).map_err(|error| quantity(&error))?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(load.thousandths()) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

fn ratio(rise: u32, run: u32) -> Result<Slope, Refusal> {
    let slope = NonZeroU32::new(rise).and_then(|rise| Slope::new(rise.get(), run));
    slope.ok_or_else(|| {
        Refusal::status(
            dwv_status::DWV_ERROR_QUANTITY,
            &format!("{rise}:{run} is no slope, expected a rise and a run above 0"),
        )
    })
}

/// The fall of a length in nanometres at a slope of `rise` in `run`, to the nearest nanometre.
///
/// # Safety
/// `fall_nm`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_fall(
    length_nm: i64,
    rise: u32,
    run: u32,
    fall_nm: *mut i64,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        let place = wanted(fall_nm, "fall_nm")?;
        let fall = ratio(rise, run)?.fall_over(Length::from_nanometres(length_nm));
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(fall.nanometres()) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}

/// Reads a length with its unit, such as `3'-6 1/2"` or `1.2 m`, as nanometres.
///
/// # Safety
/// `written` has `length` readable bytes; `length_nm`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_length_parse(
    written: *const c_char,
    length: usize,
    length_nm: *mut i64,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        let place = wanted(length_nm, "length_nm")?;
        // SAFETY: the caller's contract.
        let read = Length::parse(unsafe { text(written, length) }?).map_err(|error| quantity(&error))?;
        // SAFETY: not NULL, and the caller's contract.
        unsafe { place.write(read.value.nanometres()) };
        Ok(())
    };
    // SAFETY: the caller's contract.
    unsafe { guard(error, work) }
}
