//! Fixtures with their outlets, traps and loads.

use serde::{Deserialize, Serialize};

use super::Cited;
use crate::quantity::{FixtureUnits, PipeSize};

/// What sort of fixture a kind is; rules that speak of water closets or floor drains go by it.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize, Deserialize)]
#[serde(rename_all = "kebab-case")]
pub enum FixtureClass {
    /// A water closet.
    WaterCloset,
    /// A urinal.
    Urinal,
    /// A lavatory.
    Lavatory,
    /// A bathtub.
    Bath,
    /// A shower.
    Shower,
    /// A bidet.
    Bidet,
    /// A sink.
    Sink,
    /// A laundry tray.
    Laundry,
    /// A clothes washer.
    ClothesWasher,
    /// A dishwasher.
    Dishwasher,
    /// A floor drain.
    FloorDrain,
    /// A floor drain for accidental water only.
    EmergencyFloorDrain,
    /// A macerating toilet.
    Macerating,
    /// Any other.
    Other,
}

/// A kind of fixture, by its row.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct FixtureKindId(u16);

impl FixtureKindId {
    /// The index into [`FixtureTable::rows`].
    #[must_use]
    pub fn index(self) -> usize {
        usize::from(self.0)
    }
}

/// The load of a kind, for a trap size where it depends on that.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct LoadForTrap {
    /// The trap; none where the load does not depend on it.
    pub trap: Option<PipeSize>,
    /// The load.
    pub load: Cited<FixtureUnits>,
}

/// A row of the fixture table.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct FixtureKind {
    /// The word for it in layout files: `kitchen-sink`.
    pub key: String,
    /// What it is called in schedules.
    pub words: String,
    /// What sort of fixture it is.
    pub class: FixtureClass,
    /// Whether it empties by siphonic action, which gives its trap arm other limits.
    pub siphonic: bool,
    /// Whether a flush valve empties it.
    pub flush_valve: bool,
    /// The least size of its outlet.
    pub outlet: Cited<PipeSize>,
    /// Its trap, when none is stated.
    pub trap: Cited<PipeSize>,
    /// Its loads, by trap size where they depend on it, the smallest trap first.
    pub loads: Vec<LoadForTrap>,
}

/// The fixture table.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct FixtureTable {
    /// The kinds, in the order of the table.
    pub rows: Vec<FixtureKind>,
}

impl FixtureTable {
    /// The kind with this key.
    #[must_use]
    pub fn kind(&self, key: &str) -> Option<FixtureKindId> {
        let index = self.rows.iter().position(|row| row.key == key)?;
        u16::try_from(index).ok().map(FixtureKindId)
    }

    /// The row of a kind.
    #[must_use]
    pub fn row(&self, kind: FixtureKindId) -> &FixtureKind {
        &self.rows[kind.index()]
    }

    /// The trap of a kind, when none is stated.
    #[must_use]
    pub fn default_trap(&self, kind: FixtureKindId) -> Cited<PipeSize> {
        self.row(kind).trap
    }

    /// The load of a kind. Of several rows by trap size it is the first that is no smaller than `trap`, or the last.
    #[must_use]
    pub fn load(&self, kind: FixtureKindId, trap: Option<PipeSize>) -> Option<Cited<FixtureUnits>> {
        let row = self.row(kind);
        let trap = trap.unwrap_or(row.trap.value);
        let found = row.loads.iter().find(|load| load.trap.is_none_or(|listed| listed >= trap));
        found.or(row.loads.last()).map(|found| found.load)
    }
}

/// What a whole bathroom counts.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct BathroomGroup {
    /// Whether its water closet has a direct flush valve.
    pub flush_valve: bool,
    /// The load of one water closet, one lavatory and one bathtub or one-head shower together.
    pub load: Cited<FixtureUnits>,
}
