//! The size of every pipe with all of its reasons.
//!
//! A size is the largest of several minimums. Drains look at vents and vents at stacks, so the two are repeated until nothing
//! changes; sizes only grow, which bounds the rounds by the number of pipe sizes.

mod drains;
mod reason;
mod terminals;
mod vents;

pub(crate) use drains::{building_drain_size_at_least_slope, slope_at};
pub use reason::{Reason, Reasons, Rule};

use crate::edition::Edition;
use crate::loading::{Loads, StackLoads, VentLoads, WetLoads, refill};
use crate::naming::Names;
use crate::network::{DrainId, Network, VentId};
use crate::quantity::{FixtureUnits, PipeSize};

/// What sizes are taken from: the columns of the earlier passes.
#[derive(Debug, Clone, Copy)]
pub struct Operands<'a> {
    /// The drawing.
    pub network: &'a Network,
    /// The edition in force.
    pub edition: &'a Edition,
    /// What each pipe is called.
    pub names: &'a Names,
    /// What drains through each drain.
    pub loads: &'a Loads,
    /// What enters each stack on one storey.
    pub stack_loads: &'a StackLoads,
    /// What each vent serves.
    pub vent_loads: &'a VentLoads,
    /// What each wet vent serves.
    pub wet_loads: &'a WetLoads,
}

/// The sizes, as columns.
#[derive(Debug, Clone, Default)]
pub struct Sizes {
    /// The size of each drain.
    pub drain: Vec<PipeSize>,
    /// Why.
    pub drain_reasons: Reasons,
    /// The load that each drain could still take before it must grow; none where no load table bears on it.
    pub room: Vec<Option<FixtureUnits>>,
    /// Drains whose load is beyond the tables of the edition or the sizes at hand.
    pub drain_beyond: Vec<DrainId>,
    /// The size of each vent.
    pub vent: Vec<PipeSize>,
    /// Why.
    pub vent_reasons: Reasons,
    /// Vents whose load or length is beyond the tables of the edition or the sizes at hand.
    pub vent_beyond: Vec<VentId>,
    /// The size of each vent where it passes to open air, by terminal.
    pub terminal: Vec<PipeSize>,
    /// Why.
    pub terminal_reasons: Reasons,
    /// The vent that gives the building drain its 3 in to open air, when a stack vent can.
    pub large_vent: Option<VentId>,
    /// Whether the size of each drain rests on values that were seen in print, also where it is passed on from other pipes.
    pub drain_sure: Vec<bool>,
    /// The same for vents.
    pub vent_sure: Vec<bool>,
    /// The same for terminals.
    pub terminal_sure: Vec<bool>,
    /// How many rounds it took.
    pub rounds: u32,
    /// The size of each drain before vents have asked for more: stack vents are sized for a stack of that size. The table of
    /// stack vents is not in order by stack (a 1-1/2 in stack may have a longer 1-1/4 in vent than a 1-1/4 in stack), so that a
    /// stack which grew for the sake of its vent must not take that vent's reason away.
    pub before_vents: Vec<PipeSize>,
}

impl Sizes {
    /// Sizes everything.
    pub fn find(&mut self, operands: &Operands<'_>) {
        let least = operands.network.pipe_sizes.smallest().unwrap_or(PipeSize::OneAndQuarter);
        refill(&mut self.drain, operands.network.drains.len(), least);
        refill(&mut self.vent, operands.network.vents.len(), least);
        self.large_vent = vents::large_vent(operands);
        self.size_drains(operands, least);
        self.before_vents.clear();
        self.before_vents.extend_from_slice(&self.drain);
        self.rounds = 1;
        // The vents may ask for larger drains, and those for larger vents.
        while self.size_vents(operands, least) {
            self.rounds += 1;
            if self.vents_fit_drains(operands) || !self.size_drains(operands, least) {
                break;
            }
        }
        self.measure_room(operands);
        self.size_terminals(operands, least);
        self.find_sure_sizes(operands.edition);
    }

    /// A size is sure when a reason that asks for it was seen in print or passes on a sure size.
    fn find_sure_sizes(&mut self, edition: &Edition) {
        let attested = |reason: &Reason| edition.witness(reason.citation).is_attested();
        refill(&mut self.vent_sure, self.vent.len(), false);
        for index in 0..self.vent.len() {
            let size = self.vent[index];
            let reasons = self.vent_reasons.of(index);
            let sure = |reason: &Reason| match reason.rule {
                Rule::JoinedVent => self.vent_sure[reason.other as usize],
                _ => attested(reason),
            };
            self.vent_sure[index] =
                reasons.is_empty() || reasons.iter().any(|reason| reason.asks == size && sure(reason));
        }
        refill(&mut self.drain_sure, self.drain.len(), false);
        for index in 0..self.drain.len() {
            let size = self.drain[index];
            let sure = |reason: &Reason| match reason.rule {
                Rule::Upstream => self.drain_sure[reason.other as usize],
                Rule::ConnectedVent => self.vent_sure[reason.other as usize],
                _ => attested(reason),
            };
            self.drain_sure[index] =
                self.drain_reasons.of(index).iter().any(|reason| reason.asks == size && sure(reason));
        }
        self.terminal_sure.clear();
        for index in 0..self.terminal.len() {
            // One size larger than an unsure size is unsure too.
            let vent =
                self.terminal_reasons.of(index).first().is_none_or(|reason| self.vent_sure[reason.other as usize]);
            self.terminal_sure.push(vent);
        }
    }
}
