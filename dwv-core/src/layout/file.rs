//! Reading and writing layout files.

mod strict;
mod write;

use serde::Deserialize;

use self::strict::Strict;
use super::{Layout, diagnose};
use crate::error::Error;

/// The mark that some editors put before UTF-8 text.
const BYTE_ORDER_MARK: &str = "\u{feff}";

impl Layout {
    /// Reads a layout file: JSON of the format `dwv-layout/1` in UTF-8.
    ///
    /// A key that may be left out may also be `null`, but lists and switches may not.
    /// What the drawing means (ids, limits, whether it drains) is asked when a network is made of it.
    ///
    /// # Errors
    /// All faults of the file together, each with its path: keys that the format does not have, values of another
    /// type, words and quantities that cannot be read; or the line and column where the text is no JSON.
    ///
    /// ```
    /// use dwv_core::layout::Layout;
    ///
    /// let text = r#"{
    ///   "format": "dwv-layout/1", "name": "Laundry", "edition": "npc-2015",
    ///   "levels": [ { "id": "basement", "flor": "-2.7 m" } ],
    ///   "fixtures": [], "drains": [], "sewer": { "at": "S" }
    /// }"#;
    /// let error = Layout::from_json(text.as_bytes()).unwrap_err();
    /// assert_eq!(error.faults()[0].path, "levels[0].flor");
    /// assert_eq!(error.faults()[0].help.as_deref(), Some("did you mean `floor`?"));
    /// ```
    pub fn from_json(bytes: &[u8]) -> Result<Self, Error> {
        read(bytes).ok_or_else(|| diagnose::diagnose(bytes))
    }

    /// Writes a layout file that reads back to the same layout: keys in the order of the format, one element a line.
    #[must_use]
    pub fn to_json(&self) -> String {
        write::text(self)
    }
}

/// The quick way: reads a file without fault, or tells nothing.
pub(super) fn read(bytes: &[u8]) -> Option<Layout> {
    let text = std::str::from_utf8(bytes).ok()?;
    let text = text.strip_prefix(BYTE_ORDER_MARK).unwrap_or(text);
    let mut reader = serde_json::Deserializer::from_str(text);
    let layout = Layout::deserialize(Strict(&mut reader)).ok()?;
    reader.end().ok()?;
    Some(layout)
}
