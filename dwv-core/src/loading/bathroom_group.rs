//! A bathroom group counts less than its fixtures one by one (NPC 2015, Table 2.4.9.3, row `bathroom group`).

use crate::edition::{Edition, FixtureClass};
use crate::network::{DrainId, FixtureId, GroupRow, Network};
use crate::quantity::FixtureUnits;

/// The groups of a drawing that are not whole.
#[derive(Debug, Clone, Default)]
pub(super) struct Groups {
    incomplete: Vec<usize>,
}

/// One water closet, one lavatory and one bathtub or shower.
struct Members {
    water_closet: FixtureId,
    lavatory: FixtureId,
    bath: FixtureId,
}

impl Groups {
    /// Writes to `relief`, at the drain where a whole group has met, what the group counts less.
    pub(super) fn relieve(&mut self, network: &Network, edition: &Edition, relief: &mut [FixtureUnits]) {
        self.incomplete.clear();
        for (index, group) in network.groups.iter().enumerate() {
            let Some(members) = members(network, group) else {
                self.incomplete.push(index);
                continue;
            };
            let flush_valve = network.fixtures.kind[members.water_closet.index()]
                .is_some_and(|kind| edition.fixtures.row(kind).flush_valve);
            let Some(listed) = edition.bathroom_groups.iter().find(|listed| listed.flush_valve == flush_valve) else {
                continue;
            };
            let each = [members.water_closet, members.lavatory, members.bath];
            let sum: FixtureUnits = each.iter().map(|fixture| network.fixtures.load[fixture.index()].value).sum();
            if let Some(less) = sum.checked_sub(listed.load.value) {
                let meet = meeting(network, each.map(|fixture| network.fixtures.drain[fixture.index()])).index();
                relief[meet] = relief[meet] + less;
            }
        }
    }

    pub(super) fn incomplete(&self) -> &[usize] {
        &self.incomplete
    }
}

fn members(network: &Network, group: &GroupRow) -> Option<Members> {
    let find = |wanted: &[FixtureClass]| {
        group.fixtures.iter().copied().find(|fixture| wanted.contains(&network.fixtures.class[fixture.index()]))
    };
    Some(Members {
        water_closet: find(&[FixtureClass::WaterCloset])?,
        lavatory: find(&[FixtureClass::Lavatory])?,
        bath: find(&[FixtureClass::Bath, FixtureClass::Shower])?,
    })
}

/// The first drain that takes all three.
fn meeting(network: &Network, drains: [DrainId; 3]) -> DrainId {
    let first = drains.iter().map(|drain| drain.index()).min().unwrap_or(0);
    let mut meet = drains.into_iter().max().unwrap_or_else(|| DrainId::new(0));
    while network.drains.first[meet.index()] as usize > first {
        match network.drains.next[meet.index()] {
            Some(next) => meet = next,
            None => break,
        }
    }
    meet
}
