//! Vents by load and developed length.

use super::{CitationId, Limit, TableSize};
use crate::quantity::{FixtureUnits, Length, PipeSize, PipeSizes};

/// A row: up to a load, how long a vent of each size may be.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct LengthRow {
    /// The largest load of the row.
    pub load: FixtureUnits,
    /// The longest vent by size, in the order of the table's columns.
    pub longest: Vec<Limit<Length>>,
    /// Where the row comes from.
    pub citation: CitationId,
}

impl LengthRow {
    /// The smallest size that may be as long.
    fn size_for(&self, vents: &[PipeSize], length: Length, available: PipeSizes) -> Option<PipeSize> {
        vents.iter().zip(&self.longest).find_map(|(size, longest)| {
            let long_enough = match longest {
                Limit::Most(most) => *most >= length,
                Limit::NotLimited => true,
                Limit::NotPermitted | Limit::NotKnown => false,
            };
            (long_enough && available.contains(*size)).then_some(*size)
        })
    }
}

/// Stack vents and vent stacks: by the size of the stack, its load and the length to open air.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct StackVentTable {
    /// The vent sizes of the columns.
    pub vents: Vec<PipeSize>,
    /// The stack size of each row with the row; by stack, then by load.
    pub rows: Vec<(PipeSize, LengthRow)>,
}

impl StackVentTable {
    /// The row for a stack and a load: of the stack size or the next larger that is listed; beyond the last load, the last row.
    fn row(&self, stack: PipeSize, load: FixtureUnits) -> Option<&LengthRow> {
        let listed = self.rows.iter().map(|(size, _)| *size).find(|size| *size >= stack)?;
        let rows = || self.rows.iter().filter(|(size, _)| *size == listed).map(|(_, row)| row);
        rows().find(|row| row.load >= load).or_else(|| rows().next_back())
    }

    /// The least vent of a stack.
    #[must_use]
    pub fn size_for(
        &self,
        stack: PipeSize,
        load: FixtureUnits,
        length: Length,
        available: PipeSizes,
    ) -> Option<TableSize> {
        let row = self.row(stack, load)?;
        let size = row.size_for(&self.vents, length, available)?;
        Some(TableSize { size, citation: row.citation })
    }

    /// The last column whose size is at hand, for vents beyond the table.
    #[must_use]
    pub fn last(&self, stack: PipeSize, load: FixtureUnits, available: PipeSizes) -> Option<TableSize> {
        let size = self.vents.iter().rfind(|size| available.contains(**size))?;
        Some(TableSize {
            size: *size,
            citation: self.row(stack, load).or(self.rows.last().map(|(_, row)| row))?.citation,
        })
    }

    /// How long a vent of a size may be.
    #[must_use]
    pub fn longest(&self, stack: PipeSize, load: FixtureUnits, vent: PipeSize) -> (Limit<Length>, Option<CitationId>) {
        let Some(row) = self.row(stack, load) else { return (Limit::NotKnown, None) };
        (cell(&self.vents, row, vent), Some(row.citation))
    }
}

/// Branch vents, headers and continuous vents: by load and length.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct VentLengthTable {
    /// The vent sizes of the columns.
    pub vents: Vec<PipeSize>,
    /// The rows, by load.
    pub rows: Vec<LengthRow>,
}

impl VentLengthTable {
    /// The least vent for a load and length; none beyond the last load. Where a cell is not known, the next heavier row's counts.
    #[must_use]
    pub fn size_for(&self, load: FixtureUnits, length: Length, available: PipeSizes) -> Option<TableSize> {
        let index = self.rows.iter().position(|row| row.load >= load)?;
        let row = &self.rows[index];
        let found = self.vents.iter().enumerate().find(|(column, size)| {
            available.contains(**size)
                && match self.known(index, *column) {
                    Limit::Most(most) => most >= length,
                    Limit::NotLimited => true,
                    Limit::NotPermitted | Limit::NotKnown => false,
                }
        });
        found.map(|(_, size)| TableSize { size: *size, citation: row.citation })
    }

    /// The last column whose size is at hand, for vents beyond the table.
    #[must_use]
    pub fn last(&self, available: PipeSizes) -> Option<TableSize> {
        let size = self.vents.iter().rfind(|size| available.contains(**size))?;
        Some(TableSize { size: *size, citation: self.rows.last()?.citation })
    }

    fn known(&self, row: usize, column: usize) -> Limit<Length> {
        let cells = self.rows[row..].iter().map(|row| row.longest[column]);
        cells.into_iter().find(|cell| *cell != Limit::NotKnown).unwrap_or(Limit::NotKnown)
    }

    /// How long a vent of a size may be; none where the table ends.
    #[must_use]
    pub fn longest(&self, load: FixtureUnits, vent: PipeSize) -> (Limit<Length>, Option<CitationId>) {
        let Some(row) = self.rows.iter().find(|row| row.load >= load) else { return (Limit::NotKnown, None) };
        (cell(&self.vents, row, vent), Some(row.citation))
    }
}

/// The cell of a size. Sizes larger than the last column are not limited; smaller than the first, not permitted.
fn cell(vents: &[PipeSize], row: &LengthRow, vent: PipeSize) -> Limit<Length> {
    match vents.iter().position(|size| *size == vent) {
        Some(column) => row.longest[column],
        None if vents.last().is_some_and(|last| vent > *last) => Limit::NotLimited,
        None => Limit::NotPermitted,
    }
}

#[cfg(test)]
mod tests {
    use proptest::prelude::*;

    use super::super::Edition;
    use super::*;

    proptest! {
        #[test]
        fn more_load_or_length_never_asks_for_less(
            load in 0_u64..1_100_000, more in 0_u64..1_100_000, metres in 0_i64..400, longer in 0_i64..400,
        ) {
            let edition = Edition::builtin("npc-2015").unwrap();
            let sizes = edition.pipe_sizes;
            let (light, heavy) = (FixtureUnits::from_thousandths(load), FixtureUnits::from_thousandths(load + more));
            let (short, long) = (Length::from_millimetres(metres * 1000), Length::from_millimetres((metres + longer) * 1000));
            if let Some(more) = edition.vent_length.size_for(heavy, long, sizes) {
                prop_assert!(edition.vent_length.size_for(light, short, sizes).unwrap().size <= more.size);
            }
            for stack in sizes.iter() {
                if let Some(more) = edition.stack_vent.size_for(stack, heavy, long, sizes) {
                    let less = edition.stack_vent.size_for(stack, light, short, sizes).unwrap();
                    prop_assert!(less.size <= more.size);
                }
            }
        }
    }
}
