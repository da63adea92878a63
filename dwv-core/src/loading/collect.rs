//! The load on a drain is that of every fixture upstream, in place or provided for (NPC 2015, 2.4.10.1).

use super::{bathroom_group, refill};
use crate::edition::{Edition, FixtureClass};
use crate::network::{DrainId, Network};
use crate::quantity::FixtureUnits;

/// What drains through each drain.
#[derive(Debug, Clone, Default)]
pub struct Loads {
    /// The traps upstream.
    pub traps: Vec<u32>,
    /// The water closets upstream.
    pub water_closets: Vec<u32>,
    /// The load by which drains are sized: a whole bathroom group upstream counts as such.
    pub load: Vec<FixtureUnits>,
    /// The load of each fixture by itself, without the relief for bathroom groups; wet vents are sized by it.
    pub single: Vec<FixtureUnits>,
    relief: Vec<FixtureUnits>,
    groups: bathroom_group::Groups,
}

impl Loads {
    /// Adds up what drains through each drain.
    pub fn collect(&mut self, network: &Network, edition: &Edition) {
        let drains = &network.drains;
        let fixtures = &network.fixtures;
        let count = drains.len();
        refill(&mut self.traps, count, 0);
        refill(&mut self.water_closets, count, 0);
        refill(&mut self.load, count, FixtureUnits::ZERO);
        refill(&mut self.single, count, FixtureUnits::ZERO);
        refill(&mut self.relief, count, FixtureUnits::ZERO);
        self.groups.relieve(network, edition, &mut self.relief);
        for index in 0..count {
            if let Some(fixture) = drains.fixture[index] {
                let fixture = fixture.index();
                self.traps[index] += 1;
                self.water_closets[index] += u32::from(fixtures.class[fixture] == FixtureClass::WaterCloset);
                self.load[index] = self.load[index] + fixtures.load[fixture].value;
                self.single[index] = self.single[index] + fixtures.load[fixture].value;
            }
            let relief = self.relief[index];
            self.load[index] = self.load[index].checked_sub(relief).unwrap_or(self.load[index]);
            if let Some(next) = drains.next[index].map(DrainId::index) {
                self.traps[next] += self.traps[index];
                self.water_closets[next] += self.water_closets[index];
                self.load[next] = self.load[next] + self.load[index];
                self.single[next] = self.single[next] + self.single[index];
            }
        }
    }

    /// How much less the drain carries because whole bathroom groups meet in it.
    #[must_use]
    pub fn group_relief(&self, drain: DrainId) -> FixtureUnits {
        self.relief[drain.index()]
    }

    /// Which bathroom groups are not whole, by their number in the network.
    #[must_use]
    pub fn incomplete_groups(&self) -> &[usize] {
        self.groups.incomplete()
    }
}
