//! The names of drains, in order of precedence: building sewer, stack, building drain, fixture drain, branch.

use serde::{Deserialize, Serialize};

use super::Names;
use crate::edition::Edition;
use crate::loading::{Loads, refill};
use crate::network::{DrainId, Network};

/// What a drain is called.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize, Deserialize)]
#[serde(rename_all = "kebab-case")]
pub enum DrainName {
    /// From a trap to where it meets other waste.
    FixtureDrain,
    /// Between fixture drains and a stack or the building drain.
    Branch,
    /// A soil or waste stack with its offsets.
    Stack,
    /// The lowest horizontal piping inside, from the sewer to the foot of the most remote stack.
    BuildingDrain,
    /// The piping outside.
    BuildingSewer,
}

/// Why a drain is called so.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum NameReason {
    /// It carries the water of one trap only.
    OneTrap,
    /// It carries the water of several traps.
    SeveralTraps,
    /// It leads on from the foot of a stack.
    BelowStack,
    /// It carries no water; it leads to a cleanout or a vent.
    NoTrap,
    /// It is part of a vertical line that passes at least one storey.
    PassesStorey,
    /// It is a level stretch between two vertical parts of a stack.
    StackOffset,
    /// It lies outside, beyond the first metre.
    Outside,
    /// It is on the way from the most remote soil stack to the sewer.
    RemoteSoilStack,
    /// It is on the way from the most remote stack to the sewer; no soil stack is there, or the reading counts all stacks.
    RemoteStack,
    /// There is no stack; it is on the way from the highest junction that counts.
    HighestJunction,
    /// The drawing says where the building drain ends.
    StatedEnd,
}

impl Names {
    pub(super) fn name_drains(&mut self, network: &Network, edition: &Edition, loads: &Loads) {
        let drains = &network.drains;
        let count = drains.len();
        refill(&mut self.drain, count, DrainName::Branch);
        refill(&mut self.reason, count, NameReason::SeveralTraps);
        refill(&mut self.distance, count, 0);
        self.name_main_line(network, edition, loads);
        // Whether a stack or a part of the main line is upstream.
        for index in 0..count {
            if self.stack_of[index].is_some() {
                self.drain[index] = DrainName::Stack;
                let vertical = drains.vertical[index];
                self.reason[index] = if vertical { NameReason::PassesStorey } else { NameReason::StackOffset };
            }
            if self.drain[index] != DrainName::Branch {
                continue;
            }
            let below_stack = drains.arriving(DrainId::new(index)).any(|arriving| {
                let arriving = arriving.index();
                self.drain[arriving] == DrainName::Stack || self.reason[arriving] == NameReason::BelowStack
            });
            let (name, reason) = match loads.traps[index] {
                _ if below_stack => (DrainName::Branch, NameReason::BelowStack),
                0 => (DrainName::Branch, NameReason::NoTrap),
                1 => (DrainName::FixtureDrain, NameReason::OneTrap),
                _ => (DrainName::Branch, NameReason::SeveralTraps),
            };
            self.drain[index] = name;
            self.reason[index] = reason;
        }
    }
}
