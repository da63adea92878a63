//! What went wrong with an input, told to the person who made it.

use std::fmt;

use serde::Serialize;

/// How many faults one [`Error`] lists; the rest are counted.
pub const MOST_FAULTS: usize = 100;

/// The kind of input that was refused. Faces map kinds to exception classes and status codes.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize)]
#[serde(rename_all = "kebab-case")]
#[non_exhaustive]
pub enum ErrorKind {
    /// The bytes are not a layout file: not UTF-8, not JSON, a key or a value that the format does not have.
    Format,
    /// The layout reads well, but the drawing is no drainage system: an unknown id, a cycle, no way to the sewer.
    Drawing,
    /// A quantity cannot be read: a length without a unit, a size that the trade does not list.
    Quantity,
    /// The edition is not known, or its data is faulty.
    Edition,
    /// A question that the edition or the sizing cannot answer: an id or a kind that is not there.
    Question,
}

/// The fault that was found. Every fault has a stable kebab-case name.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord, Serialize)]
#[serde(rename_all = "kebab-case")]
#[non_exhaustive]
pub enum FaultCode {
    /// The bytes are not UTF-8.
    NotUtf8,
    /// The text is not JSON, or it is cut off.
    NotJson,
    /// The file names another format or none.
    WrongFormat,
    /// A value of another type was expected.
    WrongType,
    /// A key that the format does not have.
    UnknownKey,
    /// A key that must be there is not.
    MissingKey,
    /// A key stands twice in one object.
    RepeatedKey,
    /// A word that is none of the words allowed here.
    UnknownWord,
    /// A quantity that cannot be read.
    WrongQuantity,
    /// A length, load or count outside the limits of the engine.
    OutOfRange,
    /// A reference to an id that is not in the layout.
    UnknownId,
    /// Two elements share one id.
    DuplicateId,
    /// An id that is empty or too long.
    BadId,
    /// A kind of fixture that the edition does not list.
    UnknownKind,
    /// A fixture whose load or trap cannot be known from what is stated.
    FixtureIncomplete,
    /// A pipe that begins or ends at an element where it cannot.
    WrongEnd,
    /// Drains or vents that run in a circle.
    Cycle,
    /// A fixture or joint from which no way leads to the sewer.
    ReachesNoSewer,
    /// Two drains leave one fixture or joint.
    TwoWaysDown,
    /// Two vents leave one joint.
    TwoWaysUp,
    /// A vent that reaches neither open air nor a valve.
    VentWithoutAir,
    /// A drain that carries nothing and has no cleanout or vent.
    DeadEnd,
    /// A vertical drain whose lower end is not below its upper end.
    GoesUp,
    /// Two statements about one pipe that cannot both be true.
    Contradiction,
}

impl FaultCode {
    /// The stable name, as it stands in results.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::NotUtf8 => "not-utf8",
            Self::NotJson => "not-json",
            Self::WrongFormat => "wrong-format",
            Self::WrongType => "wrong-type",
            Self::UnknownKey => "unknown-key",
            Self::MissingKey => "missing-key",
            Self::RepeatedKey => "repeated-key",
            Self::UnknownWord => "unknown-word",
            Self::WrongQuantity => "wrong-quantity",
            Self::OutOfRange => "out-of-range",
            Self::UnknownId => "unknown-id",
            Self::DuplicateId => "duplicate-id",
            Self::BadId => "bad-id",
            Self::UnknownKind => "unknown-kind",
            Self::FixtureIncomplete => "fixture-incomplete",
            Self::WrongEnd => "wrong-end",
            Self::Cycle => "cycle",
            Self::ReachesNoSewer => "reaches-no-sewer",
            Self::TwoWaysDown => "two-ways-down",
            Self::TwoWaysUp => "two-ways-up",
            Self::VentWithoutAir => "vent-without-air",
            Self::DeadEnd => "dead-end",
            Self::GoesUp => "goes-up",
            Self::Contradiction => "contradiction",
        }
    }
}

/// One fault: where it is, what it is and how to mend it.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
pub struct Fault {
    /// What kind of fault.
    pub code: FaultCode,
    /// Where in the layout: `drains[3].to`. Empty when the whole input is meant.
    pub path: String,
    /// The id of the element, where it has one.
    pub element: Option<String>,
    /// What was found and what was expected, in one line.
    pub message: String,
    /// The likely fix.
    pub help: Option<String>,
}

impl Fault {
    pub(crate) fn new(code: FaultCode, path: impl Into<String>, message: impl Into<String>) -> Self {
        Self { code, path: path.into(), element: None, message: message.into(), help: None }
    }

    pub(crate) fn of(mut self, element: &str) -> Self {
        self.element = Some(element.to_owned());
        self
    }

    pub(crate) fn help(mut self, help: impl Into<String>) -> Self {
        self.help = Some(help.into());
        self
    }
}

impl fmt::Display for Fault {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        if !self.path.is_empty() {
            write!(out, "{}: ", self.path)?;
        }
        if let Some(element) = self.element.as_deref().filter(|element| !self.message.contains(*element)) {
            write!(out, "`{element}`: ")?;
        }
        out.write_str(&self.message)?;
        if let Some(help) = &self.help {
            write!(out, "; {help}")?;
        }
        Ok(())
    }
}

/// A refused input with all the faults that were found in it.
#[derive(Debug, Clone, PartialEq, Eq, thiserror::Error)]
#[error("{}", self.text())]
pub struct Error(Box<Inner>);

#[derive(Debug, Clone, PartialEq, Eq)]
struct Inner {
    kind: ErrorKind,
    faults: Vec<Fault>,
    total: usize,
}

impl Error {
    pub(crate) fn one(kind: ErrorKind, fault: Fault) -> Self {
        Self(Box::new(Inner { kind, faults: vec![fault], total: 1 }))
    }

    /// What kind of input was refused.
    #[must_use]
    pub fn kind(&self) -> ErrorKind {
        self.0.kind
    }

    /// The faults, in the order of the input; at most [`MOST_FAULTS`] of them.
    #[must_use]
    pub fn faults(&self) -> &[Fault] {
        &self.0.faults
    }

    /// How many faults there are, with those that are not listed.
    #[must_use]
    pub fn total(&self) -> usize {
        self.0.total
    }

    fn text(&self) -> String {
        let Inner { faults, total, .. } = &*self.0;
        if let [fault] = faults.as_slice() {
            return fault.to_string();
        }
        let mut text = format!("{total} faults:");
        for fault in faults {
            text.push_str("\n  ");
            text.push_str(&fault.to_string());
        }
        if *total > faults.len() {
            text.push_str(&format!("\n  and {} more", total - faults.len()));
        }
        text
    }
}

/// Gathers faults, so that several are reported together.
#[derive(Debug, Default)]
pub(crate) struct Faults {
    list: Vec<Fault>,
    total: usize,
}

impl Faults {
    pub(crate) fn push(&mut self, fault: Fault) {
        self.total += 1;
        if self.list.len() < MOST_FAULTS {
            self.list.push(fault);
        }
    }

    pub(crate) fn into_result<T>(self, kind: ErrorKind, value: T) -> Result<T, Error> {
        if self.total == 0 { Ok(value) } else { Err(self.into_error(kind)) }
    }

    /// The error with what was gathered.
    pub(crate) fn into_error(self, kind: ErrorKind) -> Error {
        Error(Box::new(Inner { kind, faults: self.list, total: self.total }))
    }
}

/// The word of `known` that is nearest to `word`, when it is near enough to be meant.
pub(crate) fn nearest<'a>(word: &str, known: impl IntoIterator<Item = &'a str>) -> Option<&'a str> {
    // One letter in three may be wrong; of a word of one or two letters only its case.
    let most = (word.chars().count() / 3).min(3);
    known
        .into_iter()
        .map(|candidate| (edits(word, candidate), candidate))
        .filter(|(edits, _)| *edits <= most)
        .min()
        .map(|(_, candidate)| candidate)
}

/// The number of letters to insert, drop, change or swap with a neighbour to turn one word into the other.
fn edits(left: &str, right: &str) -> usize {
    let (left, right): (Vec<char>, Vec<char>) =
        (left.chars().flat_map(char::to_lowercase).collect(), right.chars().flat_map(char::to_lowercase).collect());
    if left.len().abs_diff(right.len()) > 3 || left.len() > 100 {
        return usize::MAX;
    }
    let width = right.len() + 1;
    let mut table: Vec<usize> = (0..width).collect();
    for (row, a) in left.iter().enumerate() {
        let start = row * width;
        table.push(row + 1);
        for (column, b) in right.iter().enumerate() {
            let above = table[start + column + 1] + 1;
            let before = table[start + width + column] + 1;
            let diagonal = table[start + column] + usize::from(a != b);
            let mut least = above.min(before).min(diagonal);
            if row > 0 && column > 0 && *a == right[column - 1] && left[row - 1] == *b {
                least = least.min(table[start - width + column - 1] + 1);
            }
            table.push(least);
        }
    }
    table[left.len() * width + right.len()]
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn finds_the_word_that_was_meant() {
        assert_eq!(nearest("lenght", ["length", "slope", "drop"]), Some("length"));
        assert_eq!(nearest("kichen-sink", ["kitchen-sink", "bar-sink"]), Some("kitchen-sink"));
        assert_eq!(nearest("elephant", ["length", "slope"]), None);
    }

    #[test]
    fn lists_faults_together_and_counts_those_beyond_the_limit() {
        let mut faults = Faults::default();
        for index in 0..MOST_FAULTS + 7 {
            faults.push(Fault::new(FaultCode::UnknownId, format!("drains[{index}].to"), "no joint `X`"));
        }
        let error = faults.into_result(ErrorKind::Drawing, ()).unwrap_err();
        assert_eq!((error.faults().len(), error.total()), (MOST_FAULTS, MOST_FAULTS + 7));
        assert!(error.to_string().ends_with("and 7 more"));
    }

    #[test]
    fn an_error_is_as_small_as_a_pointer() {
        assert_eq!(std::mem::size_of::<Error>(), std::mem::size_of::<usize>());
    }
}
