//! The validated, indexed drawing: drains as a tree toward the sewer, vents as trees toward open air.
//!
//! Everything is a column indexed by a dense id. Drains are numbered so that water only runs to a higher number and
//! everything upstream of a drain stands directly before it: [`Drains::upstream`] is a plain range. Numbers depend on the
//! ids of the drawing and never on the order of the file.

mod build;
mod dense;
mod drain_order;
mod fixture;
mod geometry;
mod loose_ends;
mod register;
mod vent_columns;
mod vent_order;

pub use dense::{DrainId, FixtureId, VentId};
pub use fixture::{LoadSource, TrapSource};

use std::ops::Range;

use crate::edition::{Cited, FixtureClass, FixtureKindId};
use crate::layout::{Grounds, Id, StatedName, Through};
use crate::quantity::{Elevation, FixtureUnits, Length, LengthUnit, PipeSize, PipeSizes, Slope, SlopeNotation};

/// A storey: the rank of its floor, the lowest 0.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct Storey(pub u8);

/// A drawing that is known to be a drainage system.
#[derive(Debug, Clone)]
pub struct Network {
    /// What the drawing is called.
    pub name: String,
    /// The drains.
    pub drains: Drains,
    /// The vents.
    pub vents: Vents,
    /// The fixtures with their traps.
    pub fixtures: Fixtures,
    /// The levels from the lowest up.
    pub levels: Vec<LevelRow>,
    /// Where vents end in open air, each with the vent that ends there.
    pub terminals: Vec<TerminalRow>,
    /// Air admittance valves, each with the vent that ends there.
    pub valves: Vec<ValveRow>,
    /// Bathroom groups by name, each with its fixtures.
    pub groups: Vec<GroupRow>,
    /// The joint of the sewer connection.
    pub sewer_joint: Id,
    /// The invert of the sewer connection.
    pub sewer_invert: Option<Elevation>,
    /// The drain that begins where the user ends the building drain.
    pub building_drain_ends_at: Option<DrainId>,
    /// Whether frost can close vents, when stated.
    pub frost_can_close_vents: Option<bool>,
    /// The sizes that an answer may take.
    pub pipe_sizes: PipeSizes,
    /// The unit that results write lengths in: metres, or feet and inches.
    pub length_unit: LengthUnit,
}

/// The drains as columns.
#[derive(Debug, Clone, Default)]
pub struct Drains {
    /// The id in the drawing.
    pub id: Vec<Id>,
    /// The position in the drawing's list.
    pub drawn: Vec<u32>,
    /// The fixture or joint where it begins.
    pub from: Vec<Id>,
    /// The joint where it ends.
    pub to: Vec<Id>,
    /// The drain that it runs into; none at the sewer.
    pub next: Vec<Option<DrainId>>,
    /// The first drain upstream of it, itself when there is none.
    pub first: Vec<u32>,
    /// The fixture that it takes, when it begins at one.
    pub fixture: Vec<Option<FixtureId>>,
    /// The vent that leaves the joint where it begins.
    pub vent: Vec<Option<VentId>>,
    /// The developed length, when known.
    pub length: Vec<Option<Length>>,
    /// The fall, where the drawing fixes it: vertical and sloped pipe.
    pub drop: Vec<Option<Length>>,
    /// The slope, where it is stated or follows from a stated drop.
    pub slope: Vec<Option<Slope>>,
    /// How the slope was written.
    pub slope_notation: Vec<Option<SlopeNotation>>,
    /// Within 45° of the vertical.
    pub vertical: Vec<bool>,
    /// In or under the ground.
    pub underground: Vec<bool>,
    /// Outside the building's wall.
    pub outside: Vec<bool>,
    /// The drawn elevation of its upper end.
    pub top: Vec<Length>,
    /// The drawn elevation of its lower end.
    pub foot: Vec<Length>,
    /// The storey that the joint or fixture where it begins belongs to.
    pub storey: Vec<Storey>,
    /// Its size as drawn.
    pub stated_size: Vec<Option<PipeSize>>,
    /// Its name as stated.
    pub stated_name: Vec<Option<StatedName>>,
    /// The sum of its turns in degrees, when stated.
    pub turns: Vec<Option<u16>>,
}

impl Drains {
    /// How many drains there are.
    #[must_use]
    pub fn len(&self) -> usize {
        self.id.len()
    }

    /// Whether there are none.
    #[must_use]
    pub fn is_empty(&self) -> bool {
        self.id.is_empty()
    }

    /// The numbers of all drains upstream of `drain`, and its own.
    #[must_use]
    pub fn upstream(&self, drain: DrainId) -> Range<usize> {
        self.first[drain.index()] as usize..drain.index() + 1
    }

    /// The drains that run into the joint where `drain` begins, the last numbered first.
    pub fn arriving(&self, drain: DrainId) -> impl Iterator<Item = DrainId> + '_ {
        let first = self.first[drain.index()] as usize;
        let mut end = drain.index();
        std::iter::from_fn(move || {
            if end == first {
                return None;
            }
            let arriving = DrainId::new(end - 1);
            end = self.first[arriving.index()] as usize;
            Some(arriving)
        })
    }
}

/// Where a vent ends.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum VentEnd {
    /// In open air: the number of its terminal.
    Terminal(u32),
    /// At an air admittance valve: its number.
    Valve(u32),
}

/// The vents as columns, numbered so that air only runs to a higher number on its way out.
#[derive(Debug, Clone, Default)]
pub struct Vents {
    /// The id in the drawing.
    pub id: Vec<Id>,
    /// The position in the drawing's list.
    pub drawn: Vec<u32>,
    /// The joint where it begins.
    pub from: Vec<Id>,
    /// The joint, terminal or valve where it ends.
    pub to: Vec<Id>,
    /// The vent that it runs into; none at a terminal or valve.
    pub next: Vec<Option<VentId>>,
    /// The first vent that runs into it, itself when there is none; those between stand together.
    pub first: Vec<u32>,
    /// Where its air comes from in the end.
    pub end: Vec<VentEnd>,
    /// The drain that leaves the joint where it begins, when that is on a drain.
    pub drain: Vec<Option<DrainId>>,
    /// The developed length, when known.
    pub length: Vec<Option<Length>>,
    /// Its size as drawn.
    pub stated_size: Vec<Option<PipeSize>>,
    /// Its name as stated.
    pub stated_name: Vec<Option<StatedName>>,
}

impl Vents {
    /// The vents that run into the joint where `vent` begins, the last numbered first.
    pub fn arriving(&self, vent: VentId) -> impl Iterator<Item = VentId> + '_ {
        let first = self.first[vent.index()] as usize;
        let mut end = vent.index();
        std::iter::from_fn(move || {
            if end == first {
                return None;
            }
            let arriving = VentId::new(end - 1);
            end = self.first[arriving.index()] as usize;
            Some(arriving)
        })
    }

    /// How many vents there are.
    #[must_use]
    pub fn len(&self) -> usize {
        self.id.len()
    }

    /// Whether there are none.
    #[must_use]
    pub fn is_empty(&self) -> bool {
        self.id.is_empty()
    }
}

/// The fixtures as columns, numbered in the order of their drains.
#[derive(Debug, Clone, Default)]
pub struct Fixtures {
    /// The id in the drawing.
    pub id: Vec<Id>,
    /// The position in the drawing's list.
    pub drawn: Vec<u32>,
    /// The kind in the edition's table; none for a custom fixture.
    pub kind: Vec<Option<FixtureKindId>>,
    /// What sort of fixture it is.
    pub class: Vec<FixtureClass>,
    /// The drain that takes its waste.
    pub drain: Vec<DrainId>,
    /// The size of its trap.
    pub trap: Vec<Cited<PipeSize>>,
    /// Where the trap size comes from.
    pub trap_source: Vec<TrapSource>,
    /// The least size of its outlet pipe, when the edition lists it.
    pub outlet: Vec<Option<Cited<PipeSize>>>,
    /// Its load.
    pub load: Vec<Cited<FixtureUnits>>,
    /// Where the load comes from.
    pub load_source: Vec<LoadSource>,
    /// The length of the pipe between outlet and trap, when stated.
    pub outlet_length: Vec<Option<Length>>,
    /// Its storey.
    pub storey: Vec<Storey>,
    /// Only provided for.
    pub future: Vec<bool>,
}

impl Fixtures {
    /// How many fixtures there are.
    #[must_use]
    pub fn len(&self) -> usize {
        self.id.len()
    }

    /// Whether there are none.
    #[must_use]
    pub fn is_empty(&self) -> bool {
        self.id.is_empty()
    }
}

/// A level.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct LevelRow {
    /// Its id.
    pub id: Id,
    /// Its floor.
    pub floor: Length,
}

/// A terminal.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct TerminalRow {
    /// Its id.
    pub id: Id,
    /// Roof or wall.
    pub through: Through,
    /// How far it ends above the roof or the ground, when stated.
    pub above: Option<Length>,
    /// The vent that ends here.
    pub vent: VentId,
}

/// An air admittance valve.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct ValveRow {
    /// Its id.
    pub id: Id,
    /// Why it is permitted, when stated.
    pub grounds: Option<Grounds>,
    /// The vent that ends here.
    pub vent: VentId,
}

/// A bathroom group.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct GroupRow {
    /// Its name in the drawing.
    pub name: Id,
    /// Its fixtures.
    pub fixtures: Vec<FixtureId>,
}
