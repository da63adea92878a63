//! Reasons as rows, and how far a size is decided.

use serde::Serialize;

use crate::Sizing;
use crate::edition::Witness;
use crate::explain::{rule_name, says};
use crate::quantity::PipeSize;
use crate::sizing::{Reason, Reasons, Rule};
use crate::sizing_run::Unattested;

/// How far a size is decided.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(rename_all = "kebab-case")]
pub enum Status {
    /// Decided by values that were seen in print, by practice or by the drawing.
    Decided,
    /// A value that nobody here has seen in print governs it, or a table that is not certain bears on it.
    Provisional,
    /// The drawing lacks what a rule needs, the tables end, or unattested values are refused.
    CannotDecide,
}

impl Status {
    /// The stable name.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Decided => "decided",
            Self::Provisional => "provisional",
            Self::CannotDecide => "cannot-decide",
        }
    }
}

/// One minimum of a size.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
pub struct ReasonRow {
    /// The stable name of the rule.
    pub rule: &'static str,
    /// What it says: `branch table, 6 FU`.
    pub says: String,
    /// The size that it asks for.
    pub asks: PipeSize,
    /// The clause with the edition.
    pub clause: String,
    /// How sure the value is.
    pub witness: Witness,
    /// Whether it governs.
    pub governs: bool,
}

impl Sizing {
    pub(super) fn reason_rows(&self, reasons: &Reasons, index: usize) -> Vec<ReasonRow> {
        let governing = reasons.governing(index);
        let row = |reason: &Reason| {
            let citation = self.edition.citation(reason.citation);
            ReasonRow {
                rule: rule_name(reason.rule),
                says: says(&self.network, reason),
                asks: reason.asks,
                clause: self.clause(reason.citation),
                witness: citation.witness,
                governs: governing.is_some_and(|governing| std::ptr::eq(governing, reason)),
            }
        };
        reasons.of(index).iter().map(row).collect()
    }

    /// Whether a size is decided: by whether it is sure, and whether something that it needs is missing.
    pub(super) fn status(&self, reasons: &[Reason], sure: bool, missing: bool) -> Status {
        // A table that nobody here has seen in print could ask for more than it is remembered to.
        let certain = !reasons
            .iter()
            .any(|reason| reason.rule == Rule::VentLength && !self.edition.witness(reason.citation).is_attested());
        let sure = sure && certain;
        if missing || (!sure && self.unattested == Unattested::Refuse) {
            Status::CannotDecide
        } else if sure {
            Status::Decided
        } else {
            Status::Provisional
        }
    }
}
