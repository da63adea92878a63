//! The canonical result: the same bytes from every face.

use serde::Serialize;

use super::{FindingRow, FixtureRow, PipeRow, Summary, TerminalRow, VentRow};
use crate::Sizing;

/// The whole result.
#[derive(Serialize)]
struct Canonical {
    format: &'static str,
    summary: Summary,
    pipes: Vec<PipeRow>,
    vents: Vec<VentRow>,
    terminals: Vec<TerminalRow>,
    fixtures: Vec<FixtureRow>,
    findings: Vec<FindingRow>,
}

impl Sizing {
    /// The whole result as JSON: fixed order of keys and rows, lengths in metres, loads in fixture units.
    #[must_use]
    pub fn to_json(&self) -> String {
        let canonical = Canonical {
            format: "dwv-sizing/1",
            summary: self.summary(),
            pipes: self.pipes(),
            vents: self.vents(),
            terminals: self.terminals(),
            fixtures: self.fixtures(),
            findings: self.findings(),
        };
        // Plain structs of texts and finite numbers: nothing in them can fail to be written.
        let mut text = serde_json::to_string_pretty(&canonical).unwrap_or_default();
        text.push('\n');
        text
    }
}
