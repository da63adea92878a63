//! Tables of loads: by trap, by flow, and what stacks, branches and building drains take.

use super::{Cited, TableSize};
use crate::quantity::{FixtureUnits, FlowRate, PipeSize, PipeSizes, Slope};

/// Loads of fixtures that are not listed, by trap size.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct LoadByTrap {
    /// Trap and load, the smallest trap first.
    pub rows: Vec<(PipeSize, Cited<FixtureUnits>)>,
}

impl LoadByTrap {
    /// The load of the first row whose trap is no smaller.
    #[must_use]
    pub fn load(&self, trap: PipeSize) -> Option<Cited<FixtureUnits>> {
        self.rows.iter().find(|(listed, _)| *listed >= trap).map(|(_, load)| *load)
    }
}

/// Loads of semi-continuous flows, by trap size and flow.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct SemiContinuousTable {
    /// Trap, largest flow and load, the smallest first.
    pub rows: Vec<(PipeSize, FlowRate, Cited<FixtureUnits>)>,
}

impl SemiContinuousTable {
    /// The load of the first row that takes both trap and flow.
    #[must_use]
    pub fn load(&self, trap: PipeSize, flow: FlowRate) -> Option<Cited<FixtureUnits>> {
        self.rows.iter().find(|(listed, most, _)| *listed >= trap && *most >= flow).map(|(_, _, load)| *load)
    }
}

/// What a stack takes: in all, and from one storey.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct StackTable {
    /// Size, load in all, load from one storey; the smallest first.
    pub rows: Vec<(PipeSize, Cited<FixtureUnits>, Cited<FixtureUnits>)>,
}

impl StackTable {
    /// The least size for each of the two loads.
    #[must_use]
    pub fn size_for(
        &self,
        total: FixtureUnits,
        one_storey: FixtureUnits,
        available: PipeSizes,
    ) -> Option<(TableSize, TableSize)> {
        let rows = || self.rows.iter().filter(|(size, _, _)| available.contains(*size));
        let (size, all, _) = rows().find(|(_, most, _)| most.value >= total)?;
        let (storey_size, _, one) = rows().find(|(_, _, most)| most.value >= one_storey)?;
        Some((
            TableSize { size: *size, citation: all.citation },
            TableSize { size: *storey_size, citation: one.citation },
        ))
    }

    /// The last row whose size is at hand, for loads beyond the table.
    #[must_use]
    pub fn last(&self, available: PipeSizes) -> Option<(TableSize, TableSize)> {
        let (size, all, one) = self.rows.iter().rfind(|(size, _, _)| available.contains(*size))?;
        Some((TableSize { size: *size, citation: all.citation }, TableSize { size: *size, citation: one.citation }))
    }

    /// What a stack of a size takes, in all and from one storey.
    #[must_use]
    pub fn capacity(&self, size: PipeSize) -> Option<(Cited<FixtureUnits>, Cited<FixtureUnits>)> {
        self.rows.iter().find(|(listed, _, _)| *listed == size).map(|(_, total, one)| (*total, *one))
    }
}

/// What a branch takes.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct BranchTable {
    /// Size and load, the smallest first.
    pub rows: Vec<(PipeSize, Cited<FixtureUnits>)>,
}

impl BranchTable {
    /// The least size that takes a load.
    #[must_use]
    pub fn size_for(&self, load: FixtureUnits, available: PipeSizes) -> Option<TableSize> {
        let (size, most) = self.rows.iter().find(|(size, most)| available.contains(*size) && most.value >= load)?;
        Some(TableSize { size: *size, citation: most.citation })
    }

    /// The last row whose size is at hand, for loads beyond the table.
    #[must_use]
    pub fn last(&self, available: PipeSizes) -> Option<TableSize> {
        let (size, most) = self.rows.iter().rfind(|(size, _)| available.contains(*size))?;
        Some(TableSize { size: *size, citation: most.citation })
    }

    /// What a branch of a size takes.
    #[must_use]
    pub fn capacity(&self, size: PipeSize) -> Option<Cited<FixtureUnits>> {
        self.rows.iter().find(|(listed, _)| *listed == size).map(|(_, load)| *load)
    }
}

/// What a building drain or sewer takes, by slope.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct BuildingDrainTable {
    /// The slopes of the columns, the flattest first.
    pub slopes: Vec<Slope>,
    /// Size and load by slope; none where the slope may not be used with the size.
    pub rows: Vec<(PipeSize, Vec<Option<Cited<FixtureUnits>>>)>,
}

impl BuildingDrainTable {
    /// What a size takes at a slope: between two columns the flatter one counts. None when the size is not listed or the slope is
    /// flatter than any that it may have.
    #[must_use]
    pub fn capacity(&self, size: PipeSize, slope: Slope) -> Option<Cited<FixtureUnits>> {
        let (_, loads) = self.rows.iter().find(|(listed, _)| *listed == size)?;
        self.slopes.iter().zip(loads).rev().find(|(listed, _)| **listed <= slope).and_then(|(_, load)| *load)
    }

    /// The last row whose size is at hand, for loads beyond the table.
    #[must_use]
    pub fn last(&self, available: PipeSizes) -> Option<TableSize> {
        let (size, loads) = self.rows.iter().rfind(|(size, _)| available.contains(*size))?;
        let citation = loads.iter().rev().find_map(|load| *load)?.citation;
        Some(TableSize { size: *size, citation })
    }

    /// The flattest slope that a size may have.
    #[must_use]
    pub fn flattest(&self, size: PipeSize) -> Option<Cited<Slope>> {
        let (_, loads) = self.rows.iter().find(|(listed, _)| *listed == size)?;
        self.slopes
            .iter()
            .zip(loads)
            .find_map(|(slope, load)| load.map(|load| Cited { value: *slope, citation: load.citation }))
    }
}

#[cfg(test)]
mod tests {
    use proptest::prelude::*;

    use super::super::Edition;
    use super::*;

    #[test]
    fn a_slope_between_two_columns_counts_as_the_flatter() {
        let edition = Edition::builtin("npc-2015").unwrap();
        let capacity = |run: u32| {
            edition
                .building_drain
                .capacity(PipeSize::Four, Slope::one_in(run))
                .map(|load| load.value.thousandths() / 1000)
        };
        assert_eq!(capacity(100), Some(180));
        assert_eq!(capacity(60), Some(180));
        assert_eq!(capacity(50), Some(240));
        assert_eq!(capacity(10), Some(300), "steeper than the last column");
        assert_eq!(capacity(101), None, "flatter than 4 in may be");
    }

    proptest! {
        #[test]
        fn more_load_never_asks_for_less(load in 0_u64..60_000_000, more in 0_u64..60_000_000) {
            let edition = Edition::builtin("npc-2015").unwrap();
            let sizes = edition.pipe_sizes;
            let (light, heavy) = (FixtureUnits::from_thousandths(load), FixtureUnits::from_thousandths(load + more));
            if let Some(heavy) = edition.branch.size_for(heavy, sizes) {
                prop_assert!(edition.branch.size_for(light, sizes).unwrap().size <= heavy.size);
            }
            if let Some((total, one)) = edition.stack.size_for(heavy, heavy, sizes) {
                let (light_total, light_one) = edition.stack.size_for(light, light, sizes).unwrap();
                prop_assert!(light_total.size <= total.size && light_one.size <= one.size);
            }
        }
    }
}
