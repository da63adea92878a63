//! Plain questions to an edition, answered in text with the clause.

use std::ffi::c_char;

use crate::edition::dwv_edition;
use crate::error::dwv_error;
use crate::guard::{free, given, make};
use crate::status::dwv_status;
use crate::text::{Texts, dwv_text, text};

/// An answer with its source. Free it with `dwv_answer_free`.
#[derive(Debug)]
pub struct dwv_answer {
    text: dwv_text,
    clause: dwv_text,
    witness: dwv_text,
    attested: bool,
    _texts: Texts,
}

/// Answers a question written as JSON, such as `{"ask": "vent-for-trap", "trap": "2"}`. The caller owns `*answer`, which does not need
/// the edition any more.
///
/// Status: `DWV_ERROR_QUESTION` when it is no question or asks for a kind or rule that the edition does not have, `DWV_ERROR_TEXT`,
/// `DWV_ERROR_NULL`.
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
        let (edition, question) = unsafe { (given(edition, "edition")?, text(question, length, "question")?) };
        let found = edition.edition.answer_json(question)?;
        let mut texts = Texts::default();
        Ok(dwv_answer {
            text: texts.add(&found.text),
            clause: texts.add(&found.clause),
            witness: texts.add(found.witness.name()),
            attested: found.witness.is_attested(),
            _texts: texts,
        })
    };
    // SAFETY: the caller's contract.
    unsafe { make(answer, "answer", error, work) }
}

/// The answer itself: `6`, `1.8 m`, `1:50`, `not permitted`, `not limited`, `not known`, `beyond the table`. It lives until the answer is
/// freed. NULL gives an empty text.
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

/// How sure an answer is, as `witness` of `dwv_reason_row`. It lives until the answer is freed. NULL gives an empty text.
///
/// # Safety
/// `answer` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_answer_witness(answer: *const dwv_answer) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { answer.as_ref() }.map_or(dwv_text::EMPTY, |answer| answer.witness)
}

/// Whether somebody has seen the value of an answer in print, or it is practice or a parameter of the engine. NULL gives false.
///
/// # Safety
/// `answer` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_answer_is_attested(answer: *const dwv_answer) -> bool {
    // SAFETY: the caller's contract.
    unsafe { answer.as_ref() }.is_some_and(|answer| answer.attested)
}

/// Frees an answer with its texts. NULL is accepted.
///
/// # Safety
/// `answer` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_answer_free(answer: *mut dwv_answer) {
    // SAFETY: the caller's contract.
    unsafe { free(answer) }
}
