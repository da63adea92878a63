//! What enters a stack on one storey (NPC 2015, 2.4.10.6. and its table, column `one storey`).

use super::{Loads, refill};
use crate::naming::Names;
use crate::network::{DrainId, Network};
use crate::quantity::FixtureUnits;

/// For each part of a stack the heaviest load that enters on any one storey at or above it.
#[derive(Debug, Clone, Default)]
pub struct StackLoads {
    /// The heaviest load of one storey; 0 for pipes that are no stack.
    pub one_storey: Vec<FixtureUnits>,
    here: Vec<FixtureUnits>,
}

impl StackLoads {
    /// What has entered the stack on the storey of a part, down to that part.
    #[must_use]
    pub fn on_storey(&self, drain: DrainId) -> FixtureUnits {
        self.here[drain.index()]
    }

    /// Follows every stack from its top down.
    pub fn collect(&mut self, network: &Network, names: &Names, loads: &Loads) {
        let drains = &network.drains;
        refill(&mut self.one_storey, drains.len(), FixtureUnits::ZERO);
        refill(&mut self.here, drains.len(), FixtureUnits::ZERO);
        for index in 0..drains.len() {
            if names.stack_of[index].is_none() {
                continue;
            }
            let above = names.line_above(network, DrainId::new(index));
            let entering = match above {
                Some(above) => loads.load[index].checked_sub(loads.load[above.index()]).unwrap_or(FixtureUnits::ZERO),
                None => loads.load[index],
            };
            let (mut here, mut most) = (entering, FixtureUnits::ZERO);
            if let Some(above) = above.map(DrainId::index) {
                if drains.storey[above] == drains.storey[index] {
                    here = here + self.here[above];
                }
                most = self.one_storey[above];
            }
            self.here[index] = here;
            self.one_storey[index] = most.max(here);
        }
    }
}
