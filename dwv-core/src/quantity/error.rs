//! What is wrong with a quantity that a person typed.

/// A quantity that cannot be read.
#[derive(Debug, Clone, PartialEq, Eq, thiserror::Error)]
#[non_exhaustive]
pub enum QuantityError {
    /// Nothing was written.
    #[error("an empty text is no {what}, expected {expected}")]
    Empty {
        /// What was being read.
        what: &'static str,
        /// What would be right.
        expected: &'static str,
    },
    /// It does not read as this kind of quantity.
    #[error("cannot read `{input}` as a {what}, expected {expected}")]
    Unreadable {
        /// What was being read.
        what: &'static str,
        /// What was written, cut when long.
        input: String,
        /// What would be right.
        expected: &'static str,
    },
    /// A number with a decimal comma.
    #[error("cannot read `{input}` as a {what}: write the decimal point as `.`, expected {expected}")]
    DecimalComma {
        /// What was being read.
        what: &'static str,
        /// What was written, cut when long.
        input: String,
        /// What would be right.
        expected: &'static str,
    },
    /// A unit that this kind of quantity does not have.
    #[error("cannot read `{input}` as a {what}: unknown unit `{unit}`, expected {expected}")]
    UnknownUnit {
        /// What was being read.
        what: &'static str,
        /// What was written, cut when long.
        input: String,
        /// The unit that is not known.
        unit: String,
        /// What would be right.
        expected: &'static str,
    },
    /// A number without a unit.
    #[error("the {what} `{input}` has no unit, expected {expected}")]
    MissingUnit {
        /// What was being read.
        what: &'static str,
        /// What was written, cut when long.
        input: String,
        /// What would be right.
        expected: &'static str,
    },
    /// Beyond what the engine reckons with.
    #[error("the {what} `{input}` is out of range, expected {expected}")]
    OutOfRange {
        /// What was being read.
        what: &'static str,
        /// What was written, cut when long.
        input: String,
        /// What would be right.
        expected: &'static str,
    },
}

/// The start of what was typed, for a message.
pub(super) fn shown(input: &str) -> String {
    const LONGEST: usize = 60;
    let line = input.trim();
    if line.chars().count() <= LONGEST {
        return line.to_owned();
    }
    let mut start: String = line.chars().take(LONGEST).collect();
    start.push('…');
    start
}
