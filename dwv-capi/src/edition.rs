//! Code editions.

use std::ffi::c_char;
use std::sync::Arc;

use dwv_core::Edition;

use crate::error::dwv_error;
use crate::guard::{Refusal, free, give, given, make};
use crate::status::dwv_status;
use crate::string::dwv_string;
use crate::text::{Texts, dwv_text, text};

/// A code edition. It is never changed, so that several threads may read it. Free it with `dwv_edition_free`.
#[derive(Debug)]
pub struct dwv_edition {
    pub(crate) edition: Arc<Edition>,
    title: dwv_text,
    kinds: Vec<dwv_text>,
    _texts: Texts,
}

/// The ids of the editions that come with the library, one a line. The caller owns `*ids`.
///
/// Status: `DWV_ERROR_NULL`.
///
/// # Safety
/// `ids`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_ids(ids: *mut *mut dwv_string, error: *mut *mut dwv_error) -> dwv_status {
    let lines = || Edition::builtin_ids().into_iter().map(|id| format!("{id}\n")).collect::<String>();
    // SAFETY: the caller's contract.
    unsafe { make(ids, "ids", error, || Ok(dwv_string::new(&lines()))) }
}

/// Opens an edition by its id, such as `npc-2015`. The caller owns `*edition`.
///
/// Status: `DWV_ERROR_EDITION` with the nearest id, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.
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
        // SAFETY: the caller's contract.
        let edition = Edition::builtin(unsafe { text(id, length, "id") }?)?;
        let mut texts = Texts::default();
        let title = texts.add(&edition.title);
        let kinds = edition.fixtures.rows.iter().map(|row| texts.add(&row.key)).collect();
        Ok(dwv_edition { edition, title, kinds, _texts: texts })
    };
    // SAFETY: the caller's contract.
    unsafe { make(edition, "edition", error, work) }
}

/// The title of an edition in full. It lives until the edition is freed. NULL gives an empty text.
///
/// # Safety
/// `edition` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_title(edition: *const dwv_edition) -> dwv_text {
    // SAFETY: the caller's contract.
    unsafe { edition.as_ref() }.map_or(dwv_text::EMPTY, |edition| edition.title)
}

/// How many kinds of fixtures an edition lists. NULL lists none.
///
/// # Safety
/// `edition` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_fixture_kind_count(edition: *const dwv_edition) -> usize {
    // SAFETY: the caller's contract.
    unsafe { edition.as_ref() }.map_or(0, |edition| edition.kinds.len())
}

/// The word of a kind of fixture in layout files, in the order of the fixture table. `*kind` lives until the edition is freed.
///
/// Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`.
///
/// # Safety
/// `edition` is NULL or came from this library and was not freed; `kind` is NULL or can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_fixture_kind(
    edition: *const dwv_edition,
    index: usize,
    kind: *mut dwv_text,
) -> dwv_status {
    // SAFETY: the caller's contract; no error object is wanted.
    unsafe {
        give(kind, "kind", std::ptr::null_mut(), || {
            let kinds = &given(edition, "edition")?.kinds;
            kinds.get(index).copied().ok_or_else(|| Refusal::index("index", index, kinds.len()))
        })
    }
}

/// Where every value of an edition comes from, as a page in Markdown. The caller owns `*page`.
///
/// Status: `DWV_ERROR_NULL`.
///
/// # Safety
/// `edition` came from this library and was not freed; `page`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_provenance(
    edition: *const dwv_edition,
    page: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    // SAFETY: the caller's contract.
    unsafe { make(page, "page", error, || Ok(dwv_string::new(&given(edition, "edition")?.edition.provenance()))) }
}

/// Frees an edition with its texts. NULL is accepted.
///
/// # Safety
/// `edition` is NULL or came from this library and was not freed.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_edition_free(edition: *mut dwv_edition) {
    // SAFETY: the caller's contract.
    unsafe { free(edition) }
}
