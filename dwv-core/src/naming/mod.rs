//! Which part of the system each pipe is, and which vent protects each trap.
//!
//! Names come from the drawing, by the definitions of the edition (NPC 2015, Division A, 1.4.1.2.): from how pipes connect, from
//! their direction and from the storeys that they pass.

mod air;
mod building_drain;
mod drain_names;
mod stacks;
mod vent_names;

pub use air::{Air, TrapAir};
pub use drain_names::{DrainName, NameReason};
pub use stacks::{Stack, StackId};
pub use vent_names::{VentName, VentRole};

use crate::edition::Edition;
use crate::loading::Loads;
use crate::network::{DrainId, Network, VentId};

/// The names of a network, as columns.
#[derive(Debug, Clone, Default)]
pub struct Names {
    /// The name of each drain.
    pub drain: Vec<DrainName>,
    /// Why each drain has its name.
    pub reason: Vec<NameReason>,
    /// Whether the drain is part of a trap arm.
    pub trap_arm: Vec<bool>,
    /// The stacks.
    pub stacks: Vec<Stack>,
    /// The stack that each drain is part of.
    pub stack_of: Vec<Option<StackId>>,
    /// Whether the drain is an offset of its stack that is long enough to be sized as horizontal pipe.
    pub long_offset: Vec<bool>,
    /// Where air comes from at the joint where each drain begins.
    pub air: Vec<Air>,
    /// Whether the drain serves as a wet vent.
    pub wet: Vec<bool>,
    /// For a wet vent the last drain of it downstream.
    pub wet_end: Vec<Option<DrainId>>,
    /// How each trap gets its air, by fixture.
    pub trap: Vec<TrapAir>,
    /// The role of each vent.
    pub vent: Vec<VentRole>,
    /// The first major vent on the way of each vent to open air, itself when it is one.
    pub major: Vec<Option<VentId>>,
    scratch: stacks::Scratch,
    distance: Vec<i64>,
    through_stack: Vec<bool>,
    vent_of_air: Vec<Option<VentId>>,
    next_vent: Vec<Option<VentId>>,
    served: Vec<vent_names::Served>,
    connected_below: Vec<bool>,
}

impl Names {
    /// Finds all names.
    pub fn find(&mut self, network: &Network, edition: &Edition, loads: &Loads) {
        self.find_stacks(network, edition, loads);
        self.name_drains(network, edition, loads);
        self.trace_air(network, edition, loads);
        self.name_vents(network, loads);
    }

    /// The part of the same stack from which the water of `drain` comes down.
    #[must_use]
    pub fn line_above(&self, network: &Network, drain: DrainId) -> Option<DrainId> {
        let stack = self.stack_of[drain.index()]?;
        let line = self.scratch.line[drain.index()]?;
        (self.stack_of[line.index()] == Some(stack) && network.drains.next[line.index()] == Some(drain)).then_some(line)
    }
}
