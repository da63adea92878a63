//! The canonical result: the same bytes from every face.

use serde::Serialize;

use super::{FindingRow, FixtureRow, PipeRow, Summary, TerminalRow, VentRow};
use crate::Sizing;

/// The whole result.
#[derive(Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
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

/// The JSON Schema of the canonical result.
#[cfg(feature = "schema")]
#[must_use]
pub fn sizing_schema() -> String {
    let mut schema = schemars::schema_for!(Canonical);
    schema.insert("$id".to_owned(), "dwv-sizing-1.schema.json".into());
    schema.insert("title".to_owned(), "dwv sizing, version 1".into());
    let mut text = serde_json::to_string_pretty(&schema).unwrap_or_default();
    text.push('\n');
    text
}
