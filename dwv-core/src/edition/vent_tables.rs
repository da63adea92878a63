//! Vents by the largest trap, and wet vents.

use super::{CitationId, Cited, Limit, TableSize};
use crate::quantity::{FixtureUnits, PipeSize, PipeSizes};

/// The least vent by the largest trap that it serves.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct VentByTrapTable {
    /// Trap and vent, the smallest trap first.
    pub rows: Vec<(PipeSize, TableSize)>,
}

impl VentByTrapTable {
    /// The vent for a trap: by the first row whose trap is no smaller.
    #[must_use]
    pub fn vent_for(&self, trap: PipeSize) -> Option<TableSize> {
        self.rows.iter().find(|(listed, _)| *listed >= trap).map(|(_, vent)| *vent)
    }
}

/// What may drain to a wet vent.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct WetVentTable {
    /// Size, load without water closets, load with water closets, and where each comes from.
    pub rows: Vec<WetVentRow>,
}

/// A row of the wet vent table.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct WetVentRow {
    /// The size of the wet vent.
    pub size: PipeSize,
    /// The load when it serves no water closet.
    pub without: Limit<FixtureUnits>,
    /// Where that comes from.
    pub without_citation: CitationId,
    /// The load when it serves water closets.
    pub with: Limit<FixtureUnits>,
    /// Where that comes from.
    pub with_citation: CitationId,
}

impl WetVentTable {
    /// The least wet vent for a load. A size whose figure is not known does not count.
    #[must_use]
    pub fn size_for(&self, load: FixtureUnits, serves_water_closet: bool, available: PipeSizes) -> Option<TableSize> {
        self.rows.iter().filter(|row| available.contains(row.size)).find_map(|row| {
            match self.capacity(row.size, serves_water_closet) {
                Limit::Most(most) if most.value >= load => Some(TableSize { size: row.size, citation: most.citation }),
                _ => None,
            }
        })
    }

    /// The last row with a figure whose size is at hand, for loads beyond the table.
    #[must_use]
    pub fn last(&self, serves_water_closet: bool, available: PipeSizes) -> Option<TableSize> {
        self.rows.iter().rev().filter(|row| available.contains(row.size)).find_map(|row| {
            match self.capacity(row.size, serves_water_closet) {
                Limit::Most(most) => Some(TableSize { size: row.size, citation: most.citation }),
                _ => None,
            }
        })
    }

    /// What a wet vent of a size takes.
    #[must_use]
    pub fn capacity(&self, size: PipeSize, serves_water_closet: bool) -> Limit<Cited<FixtureUnits>> {
        let Some(row) = self.rows.iter().find(|row| row.size == size) else { return Limit::NotKnown };
        let (limit, citation) =
            if serves_water_closet { (row.with, row.with_citation) } else { (row.without, row.without_citation) };
        match limit {
            Limit::Most(value) => Limit::Most(Cited { value, citation }),
            Limit::NotPermitted => Limit::NotPermitted,
            Limit::NotKnown => Limit::NotKnown,
            Limit::NotLimited => Limit::NotLimited,
        }
    }
}
