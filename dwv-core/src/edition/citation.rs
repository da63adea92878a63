//! Where a value of an edition comes from.

use serde::Serialize;

use super::Witness;
use crate::quantity::PipeSize;

/// A published source.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
pub struct Source {
    /// A short word for it within the edition.
    pub key: String,
    /// Its title.
    pub title: String,
    /// Where it was found.
    pub url: String,
}

/// A source of the edition, by number.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct SourceId(pub(super) u16);

impl SourceId {
    /// The index into [`super::Edition::sources`].
    #[must_use]
    pub fn index(self) -> usize {
        usize::from(self.0)
    }
}

/// A citation of the edition, by number.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct CitationId(pub(super) u16);

impl CitationId {
    /// The index into [`super::Edition::citations`].
    #[must_use]
    pub fn index(self) -> usize {
        usize::from(self.0)
    }
}

/// The clause or table cell behind a value, and how sure it is.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Citation {
    /// The clause or table: `Table 2.4.10.6.B`.
    pub clause: String,
    /// Which row or what rule, in a few words: `branch, 3 in`.
    pub subject: String,
    /// How the value is attested.
    pub witness: Witness,
    /// The sources that attest it.
    pub sources: Vec<SourceId>,
    /// What a reader should know: disputes, other readings.
    pub note: Option<String>,
}

/// A value with its citation.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Cited<T> {
    /// The value.
    pub value: T,
    /// Where it comes from.
    pub citation: CitationId,
}

/// A size that a table gives, with the row that gave it.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct TableSize {
    /// The size.
    pub size: PipeSize,
    /// The row.
    pub citation: CitationId,
}

/// A cell of a table of limits.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Limit<T> {
    /// The size may not be used.
    NotPermitted,
    /// Nobody here knows the figure.
    NotKnown,
    /// There is no limit.
    NotLimited,
    /// At most this.
    Most(T),
}
