//! Air: from each trap down to where air is admitted, and from there to the open air.
//!
//! NPC 2015, 2.5.1.1. (every trap is protected by a vent) and 2.5.2.1. (a drain may serve as a wet vent).

use super::{DrainName, Names};
use crate::edition::{Edition, FixtureClass};
use crate::loading::{Loads, refill};
use crate::network::{DrainId, FixtureId, Network, VentId};
use crate::quantity::Length;

/// Where the air comes from at the joint where a drain begins.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Air {
    /// No air reaches it.
    None,
    /// A vent leaves the joint.
    Vent(VentId),
    /// Air comes against the flow, down the drain that arrives there.
    Through(DrainId),
}

/// How a trap gets its air.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub struct TrapAir {
    /// The last pipe of the trap arm or, for a trap without air, of its fixture drain.
    pub arm_end: DrainId,
    /// The vent that protects it in the end.
    pub vent: Option<VentId>,
    /// The vent that is sized for it: the one that protects it or, for a trap without air, the next one downstream.
    pub counted: Option<VentId>,
    /// The drain that brings the air to the end of the arm, when that serves as a wet vent.
    pub wet: Option<DrainId>,
}

impl Names {
    pub(super) fn trace_air(&mut self, network: &Network, edition: &Edition, loads: &Loads) {
        self.admit(network);
        self.trace_traps(network, edition, loads);
        self.mark_wet_vents(network, edition);
    }

    /// Finds where air is admitted, from the traps down. Of several ways the shortest counts.
    fn admit(&mut self, network: &Network) {
        let drains = &network.drains;
        refill(&mut self.air, drains.len(), Air::None);
        refill(&mut self.distance, drains.len(), 0);
        for index in 0..drains.len() {
            if let Some(vent) = drains.vent[index] {
                self.air[index] = Air::Vent(vent);
                continue;
            }
            let mut best: Option<(i64, DrainId)> = None;
            for arriving in drains.arriving(DrainId::new(index)) {
                let at = arriving.index();
                let main = matches!(self.drain[at], DrainName::BuildingDrain | DrainName::BuildingSewer);
                if drains.fixture[at].is_some() || main || self.air[at] == Air::None {
                    continue;
                }
                let length = drains.length[at].map_or(0, |length| length.nanometres());
                let candidate = (self.distance[at].saturating_add(length), arriving);
                if best.is_none_or(|best| candidate < best) {
                    best = Some(candidate);
                }
            }
            if let Some((distance, arriving)) = best {
                self.air[index] = Air::Through(arriving);
                self.distance[index] = distance;
            }
        }
    }

    /// Follows every trap down its fixture drain to the first joint that admits air.
    fn trace_traps(&mut self, network: &Network, edition: &Edition, loads: &Loads) {
        let drains = &network.drains;
        refill(&mut self.trap_arm, drains.len(), false);
        refill(&mut self.wet, drains.len(), false);
        self.trap.clear();
        for (fixture, start) in network.fixtures.drain.iter().enumerate() {
            let mut end = *start;
            let found = loop {
                let Some(joint) = drains.next[end.index()] else { break Air::None };
                let found = self.air[joint.index()];
                let ends = self.drain[joint.index()] != DrainName::FixtureDrain || loads.traps[joint.index()] != 1;
                if found != Air::None || ends {
                    break found;
                }
                end = joint;
            };
            // A floor drain that needs no vent is not made to need a wet one.
            let exempt = !matches!(found, Air::Vent(_)) && may_go_without(network, edition, fixture, end);
            let found = if exempt { Air::None } else { found };
            let trap = match found {
                Air::None => TrapAir { arm_end: end, vent: None, counted: None, wet: None },
                Air::Vent(vent) => TrapAir { arm_end: end, vent: Some(vent), counted: Some(vent), wet: None },
                Air::Through(drain) => {
                    self.wet[drain.index()] = true;
                    TrapAir { arm_end: end, vent: None, counted: None, wet: Some(drain) }
                }
            };
            if found != Air::None && self.drain[end.index()] == DrainName::FixtureDrain {
                self.mark_arm(network, *start, end);
            }
            self.trap.push(trap);
        }
    }

    fn mark_arm(&mut self, network: &Network, start: DrainId, end: DrainId) {
        let mut arm = Some(start);
        while let Some(at) = arm {
            self.trap_arm[at.index()] = true;
            arm = network.drains.next[at.index()].filter(|_| at != end);
        }
    }

    /// Marks each wet vent up to its dry vent, and tells every trap the vent that its air comes from.
    fn mark_wet_vents(&mut self, network: &Network, edition: &Edition) {
        let drains = &network.drains;
        refill(&mut self.wet_end, drains.len(), None);
        for index in (0..drains.len()).rev() {
            if !self.wet[index] {
                continue;
            }
            let drain = DrainId::new(index);
            self.wet_end[index] = match drains.next[index].map(DrainId::index) {
                Some(next) if self.wet[next] && self.air[next] == Air::Through(drain) => self.wet_end[next],
                _ => Some(drain),
            };
            if let Air::Through(above) = self.air[index] {
                self.wet[above.index()] = true;
            }
        }
        // Each drain passes the vent of its air on downstream.
        self.vent_of_air.clear();
        for index in 0..drains.len() {
            let vent = match self.air[index] {
                Air::None => None,
                Air::Vent(vent) => Some(vent),
                Air::Through(above) => self.vent_of_air[above.index()],
            };
            self.vent_of_air.push(vent);
        }
        self.find_next_vents(network);
        for (fixture, trap) in self.trap.iter_mut().enumerate() {
            if let Some(wet) = trap.wet {
                trap.vent = self.vent_of_air[wet.index()];
            }
            trap.counted = trap.vent;
            if trap.vent.is_none() && !may_go_without(network, edition, fixture, trap.arm_end) {
                trap.counted = self.next_vent[trap.arm_end.index()];
            }
        }
    }

    /// For each drain the first vent whose air is admitted downstream of it.
    fn find_next_vents(&mut self, network: &Network) {
        refill(&mut self.next_vent, network.drains.len(), None);
        for index in (0..network.drains.len()).rev() {
            if let Some(next) = network.drains.next[index].map(DrainId::index) {
                self.next_vent[index] = self.vent_of_air[next].or(self.next_vent[next]);
            }
        }
    }

    /// The way of the air from a trap to the open: wet vents first, then dry vents.
    #[must_use]
    pub fn air_path(&self, network: &Network, fixture: FixtureId) -> (Vec<DrainId>, Vec<VentId>) {
        let trap = self.trap[fixture.index()];
        let mut wet = Vec::new();
        let mut drain = trap.wet;
        while let Some(at) = drain {
            wet.push(at);
            drain = match self.air[at.index()] {
                Air::Through(above) => Some(above),
                _ => None,
            };
        }
        let mut dry = Vec::new();
        let mut vent = trap.vent;
        while let Some(at) = vent {
            dry.push(at);
            vent = network.vents.next[at.index()];
        }
        (wet, dry)
    }
}

/// Whether a floor drain has the trap and the length of fixture drain that let it go without a vent (NPC 2015, 2.5.1.1.(3)). Its
/// fall is looked at by the check of traps without vents.
fn may_go_without(network: &Network, edition: &Edition, fixture: usize, end: DrainId) -> bool {
    let fixtures = &network.fixtures;
    if !matches!(fixtures.class[fixture], FixtureClass::FloorDrain | FixtureClass::EmergencyFloorDrain) {
        return false;
    }
    let rule = edition.rules.floor_drain_unvented.value;
    let mut length = Length::ZERO;
    let mut pipe = Some(fixtures.drain[fixture]);
    while let Some(at) = pipe {
        length = length + network.drains.length[at.index()].unwrap_or(Length::ZERO);
        pipe = network.drains.next[at.index()].filter(|_| at != end);
    }
    fixtures.trap[fixture].value >= rule.least_trap && length >= rule.least_length
}
