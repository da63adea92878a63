//! The names of vents, from what they connect.
//!
//! NPC 2015, Division A, 1.4.1.2. A minor vent that joins a major one leaves its name; two major vents make a header;
//! minor vents that meet make a branch vent.

use serde::{Deserialize, Serialize};

use super::{DrainName, Names, StackId};
use crate::loading::{Loads, refill};
use crate::network::{DrainId, Network, VentId};

/// What a vent is called.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize, Deserialize)]
#[serde(rename_all = "kebab-case")]
pub enum VentName {
    /// It protects one trap.
    Individual,
    /// It protects two traps that meet at its foot.
    Dual,
    /// It carries on from a drain that serves as a wet vent.
    Continuous,
    /// Minor vents meet in it.
    Branch,
    /// The dry top of a stack.
    StackVent,
    /// A vent beside a stack, from its foot.
    VentStack,
    /// Stack vents or vent stacks meet in it.
    Header,
    /// It protects no trap.
    Spare,
}

impl VentName {
    /// Stack vents, vent stacks and headers are major; the others end where they meet one.
    #[must_use]
    pub fn is_major(self) -> bool {
        matches!(self, Self::StackVent | Self::VentStack | Self::Header)
    }
}

/// A vent's name with the stack that it belongs to.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub struct VentRole {
    /// The name.
    pub name: VentName,
    /// The stack of a stack vent or vent stack.
    pub stack: Option<StackId>,
}

/// How many traps get their air at the foot of a vent.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Served {
    direct: u32,
    wet: u32,
}

impl Names {
    pub(super) fn name_vents(&mut self, network: &Network, loads: &Loads) {
        let vents = &network.vents;
        refill(&mut self.served, vents.len(), Served::default());
        for trap in &self.trap {
            if let Some(vent) = trap.vent {
                let served = &mut self.served[vent.index()];
                match trap.wet {
                    None => served.direct += 1,
                    Some(_) => served.wet += 1,
                }
            }
        }
        self.find_lowest_connections(network);
        self.vent.clear();
        for index in 0..vents.len() {
            let own = vents.drain[index].map(|drain| self.foot_role(network, loads, drain, index));
            let role = self.joined_role(network, VentId::new(index), own);
            self.vent.push(role);
        }
        self.major.clear();
        self.major.resize(vents.len(), None);
        for index in (0..vents.len()).rev() {
            self.major[index] = if self.vent[index].name.is_major() {
                Some(VentId::new(index))
            } else {
                vents.next[index].and_then(|next| self.major[next.index()])
            };
        }
    }

    /// For each part of a stack: whether anything else runs into the stack below its upper end.
    fn find_lowest_connections(&mut self, network: &Network) {
        let drains = &network.drains;
        refill(&mut self.connected_below, drains.len(), false);
        for index in (0..drains.len()).rev() {
            let (Some(stack), Some(next)) = (self.stack_of[index], drains.next[index]) else { continue };
            if self.stack_of[next.index()] == Some(stack) {
                let joined = drains.arriving(next).nth(1).is_some();
                self.connected_below[index] = joined || self.connected_below[next.index()];
            }
        }
    }

    /// What a vent would be called by the joint on a drain where it begins.
    fn foot_role(&self, network: &Network, loads: &Loads, drain: DrainId, vent: usize) -> VentRole {
        let at = drain.index();
        let served = self.served[vent];
        if let Some(stack) = self.stack_of[at] {
            let top = self.line_above(network, drain).is_none();
            if top {
                return VentRole { name: VentName::StackVent, stack: Some(stack) };
            }
            if !self.connected_below[at] {
                return VentRole { name: VentName::VentStack, stack: Some(stack) };
            }
        }
        let foot_of = network.drains.arriving(drain).find_map(|arriving| self.stack_of[arriving.index()]);
        if let Some(stack) = foot_of.filter(|_| served.direct == 0 && self.stack_of[at].is_none()) {
            return VentRole { name: VentName::VentStack, stack: Some(stack) };
        }
        let name = match (served.direct, served.wet) {
            (0, 0) => VentName::Spare,
            (1, 0) => VentName::Individual,
            (2, 0) if self.two_arms_meet(network, loads, drain) => VentName::Dual,
            _ => VentName::Continuous,
        };
        VentRole { name, stack: None }
    }

    /// Whether exactly two trap arms arrive at the joint.
    fn two_arms_meet(&self, network: &Network, loads: &Loads, drain: DrainId) -> bool {
        let mut arms = 0;
        for arriving in network.drains.arriving(drain) {
            let at = arriving.index();
            let arm = self.drain[at] == DrainName::FixtureDrain && loads.traps[at] == 1;
            if arm {
                arms += 1;
            }
        }
        arms == 2
    }

    /// What a vent is called with those that run into it.
    fn joined_role(&self, network: &Network, vent: VentId, own: Option<VentRole>) -> VentRole {
        let mut majors = own.iter().filter(|role| role.name.is_major()).count();
        let mut minors = own.iter().filter(|role| !role.name.is_major()).count();
        let mut major = own.filter(|role| role.name.is_major());
        let mut minor = own;
        for arriving in network.vents.arriving(vent) {
            let role = self.vent[arriving.index()];
            if role.name.is_major() {
                majors += 1;
                major = Some(role);
            } else {
                minors += 1;
                minor = Some(role);
            }
        }
        match (majors, minors) {
            (0, 0) => VentRole { name: VentName::Spare, stack: None },
            (0, 1) => minor.unwrap_or(VentRole { name: VentName::Spare, stack: None }),
            (0, _) => VentRole { name: VentName::Branch, stack: None },
            (1, _) => major.unwrap_or(VentRole { name: VentName::Header, stack: None }),
            _ => VentRole { name: VentName::Header, stack: None },
        }
    }
}
