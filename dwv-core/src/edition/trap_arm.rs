//! How long a trap arm may be.

use super::CitationId;
use crate::quantity::{Length, PipeSize, Slope};

/// A row of the trap arm table.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct TrapArmRow {
    /// The size of the arm.
    pub size: PipeSize,
    /// The longest arm.
    pub longest: Length,
    /// Where the length comes from.
    pub longest_citation: CitationId,
    /// The least slope.
    pub least_slope: Slope,
    /// Where the slope comes from.
    pub slope_citation: CitationId,
}

/// The trap arm table, for all traps but siphonic ones.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct TrapArmTable {
    /// The rows, the smallest first.
    pub rows: Vec<TrapArmRow>,
}

impl TrapArmTable {
    /// The row of a size; none when the table does not list it.
    #[must_use]
    pub fn row(&self, size: PipeSize) -> Option<&TrapArmRow> {
        self.rows.iter().find(|row| row.size == size)
    }
}
