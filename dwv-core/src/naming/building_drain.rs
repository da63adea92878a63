//! The building sewer and the building drain.
//!
//! NPC 2015, Division A, 1.4.1.2., `building drain` and `building sewer`. Where the building drain ends upstream is disputed; the reading
//! in force is a named choice of the edition.

use super::{DrainName, NameReason, Names, StackId};
use crate::edition::{BuildingDrainEnd, Edition};
use crate::loading::Loads;
use crate::network::{DrainId, Network};
use crate::quantity::Length;

impl Names {
    /// Names the piping outside and the main line inside; all other drains keep the name `branch`.
    pub(super) fn name_main_line(&mut self, network: &Network, edition: &Edition, loads: &Loads) {
        self.name_building_sewer(network, edition);
        let (start, reason) = self.upstream_end(network, edition, loads);
        // It is horizontal piping: a drop at its upper end still belongs to what drains into it.
        let mut drain = start;
        while let Some(at) = drain.filter(|at| network.drains.vertical[at.index()]) {
            drain = network.drains.next[at.index()];
        }
        while let Some(at) = drain.filter(|at| self.drain[at.index()] != DrainName::BuildingSewer) {
            self.drain[at.index()] = DrainName::BuildingDrain;
            self.reason[at.index()] = reason;
            drain = network.drains.next[at.index()];
        }
    }

    /// Outside piping is building sewer from 1 m beyond the wall: a pipe that ends no farther out is still building drain.
    fn name_building_sewer(&mut self, network: &Network, edition: &Edition) {
        let drains = &network.drains;
        let begins = edition.rules.building_sewer_begins.value;
        for index in 0..drains.len() {
            if !drains.outside[index] || self.stack_of[index].is_some() {
                continue;
            }
            let before = drains.arriving(DrainId::new(index)).filter(|arriving| drains.outside[arriving.index()]);
            let mut beyond = false;
            let mut out = Length::ZERO;
            for arriving in before {
                beyond |= self.drain[arriving.index()] == DrainName::BuildingSewer;
                out = out.max(Length::from_nanometres(self.distance[arriving.index()]));
            }
            let end = drains.length[index].map(|length| out + length);
            self.distance[index] = end.unwrap_or(out).nanometres();
            if beyond || end.is_none_or(|end| end > begins) {
                self.drain[index] = DrainName::BuildingSewer;
                self.reason[index] = NameReason::Outside;
            }
        }
    }

    /// The most upstream pipe of the building drain.
    fn upstream_end(&mut self, network: &Network, edition: &Edition, loads: &Loads) -> (Option<DrainId>, NameReason) {
        let drains = &network.drains;
        if let Some(stated) = network.building_drain_ends_at {
            return (Some(stated), NameReason::StatedEnd);
        }
        self.measure_from_sewer(network);
        let remote = |names: &Self, soil_only: bool| {
            let mut most: Option<(i64, DrainId)> = None;
            for stack in names.stacks.iter().filter(|stack| stack.soil || !soil_only) {
                let Some(foot) = drains.next[stack.foot.index()] else { continue };
                if names.leads_through_stack(foot) {
                    continue;
                }
                let candidate = (names.distance[foot.index()], foot);
                if most.is_none_or(|most| candidate > most) {
                    most = Some(candidate);
                }
            }
            most.map(|(_, foot)| foot)
        };
        let soil = match edition.readings.building_drain_end.value {
            BuildingDrainEnd::MostRemoteSoilStack => remote(self, true),
            BuildingDrainEnd::MostRemoteStack => None,
        };
        if let Some(foot) = soil {
            return (Some(foot), NameReason::RemoteSoilStack);
        }
        if let Some(foot) = remote(self, false) {
            return (Some(foot), NameReason::RemoteStack);
        }
        (self.junction_without_stack(network, loads), NameReason::HighestJunction)
    }

    /// For each drain how far its upper end is from the sewer, along the pipes. A missing length counts as none.
    fn measure_from_sewer(&mut self, network: &Network) {
        let drains = &network.drains;
        self.through_stack.clear();
        self.through_stack.resize(drains.len(), false);
        for index in (0..drains.len()).rev() {
            let own = drains.length[index].unwrap_or(Length::ZERO).nanometres();
            let (on, stack) = match drains.next[index].map(DrainId::index) {
                Some(next) => (self.distance[next], self.through_stack[next]),
                None => (0, false),
            };
            self.distance[index] = on.saturating_add(own);
            self.through_stack[index] = stack || self.stack_of[index].is_some();
        }
    }

    fn leads_through_stack(&self, drain: DrainId) -> bool {
        self.through_stack[drain.index()]
    }

    /// With no stack at all: the most remote junction that takes a water closet, else the one with the most load.
    fn junction_without_stack(&self, network: &Network, loads: &Loads) -> Option<DrainId> {
        let drains = &network.drains;
        let rank = |index: usize| {
            let closet = loads.water_closets[index] > 0;
            let load = if closet { 0 } else { loads.load[index].thousandths() };
            (closet, load, self.distance[index], index)
        };
        (0..drains.len())
            .filter(|index| drains.arriving(DrainId::new(*index)).nth(1).is_some())
            .filter(|index| self.stack_of[*index].is_none())
            .max_by_key(|index| rank(*index))
            .map(DrainId::new)
    }

    /// The stack that a pipe belongs to.
    #[must_use]
    pub fn stack(&self, drain: DrainId) -> Option<StackId> {
        self.stack_of[drain.index()]
    }
}
