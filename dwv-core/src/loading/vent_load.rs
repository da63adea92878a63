//! What a vent is sized by: the traps that it serves, their load and the developed length of its way.
//!
//! NPC 2015, 2.5.8.3. (branch vents and headers) and 2.5.8.4. (stack vents and vent stacks).

use super::{Loads, refill};
use crate::naming::{Names, VentName};
use crate::network::{DrainId, Network, VentId};
use crate::quantity::{FixtureUnits, Length, PipeSize};

/// The operands of vent sizes, by vent.
#[derive(Debug, Clone, Default)]
pub struct VentLoads {
    /// The largest trap that gets its air here.
    pub trap: Vec<Option<PipeSize>>,
    /// The load: of the traps served or, for a stack vent, of the stack at its foot and what other vents bring.
    pub load: Vec<FixtureUnits>,
    /// The developed length that the edition prescribes for the vent's name, as far as the drawing tells it.
    pub length: Vec<Length>,
    /// Whether a length on that way is missing.
    pub length_missing: Vec<bool>,
    extra: Vec<FixtureUnits>,
    up: Vec<Way>,
    down: Vec<Way>,
}

/// A sum of lengths, some of which may be missing.
#[derive(Debug, Clone, Copy, Default, PartialEq, Eq, PartialOrd, Ord)]
struct Way {
    length: Length,
    missing: bool,
}

impl Way {
    fn of(length: Option<Length>) -> Self {
        Self { length: length.unwrap_or(Length::ZERO), missing: length.is_none() }
    }

    fn and(self, other: Self) -> Self {
        Self { length: self.length + other.length, missing: self.missing || other.missing }
    }

    fn longer(self, other: Self) -> Self {
        Self { length: self.length.max(other.length), missing: self.missing || other.missing }
    }
}

impl VentLoads {
    /// Adds up what each vent serves, and measures its way.
    pub fn collect(&mut self, network: &Network, names: &Names, loads: &Loads) {
        self.add_traps(network, names);
        self.add_stacks(network, names, loads);
        self.measure(network, names);
    }

    /// Largest trap and load of the traps whose air comes this way.
    fn add_traps(&mut self, network: &Network, names: &Names) {
        let (vents, fixtures) = (&network.vents, &network.fixtures);
        refill(&mut self.trap, vents.len(), None);
        refill(&mut self.load, vents.len(), FixtureUnits::ZERO);
        refill(&mut self.extra, vents.len(), FixtureUnits::ZERO);
        for (fixture, trap) in names.trap.iter().enumerate() {
            let Some(vent) = trap.counted else { continue };
            let at = vent.index();
            let size = fixtures.trap[fixture].value;
            self.trap[at] = self.trap[at].max(Some(size));
            let load = fixtures.load[fixture].value;
            self.load[at] = self.load[at] + load;
            if let Some(major) = names.major[at] {
                let stack = names.vent[major.index()].stack;
                let foot = stack.map(|stack| names.stacks[stack.0 as usize].foot);
                let counted =
                    foot.is_some_and(|foot| network.drains.upstream(foot).contains(&fixtures.drain[fixture].index()));
                if !counted {
                    self.extra[major.index()] = self.extra[major.index()] + load;
                }
            }
        }
    }

    /// Loads down the way of the air; the load of a stack takes the place of its traps.
    fn add_stacks(&mut self, network: &Network, names: &Names, loads: &Loads) {
        let vents = &network.vents;
        for index in 0..vents.len() {
            let role = names.vent[index];
            let foot_load = |stack: crate::naming::StackId| loads.load[names.stacks[stack.0 as usize].foot.index()];
            let mut trap = self.trap[index];
            let mut load = self.load[index];
            let mut extra = self.extra[index];
            let mut major_load = FixtureUnits::ZERO;
            for arriving in vents.arriving(VentId::new(index)).map(VentId::index) {
                trap = trap.max(self.trap[arriving]);
                if names.vent[arriving].name.is_major() {
                    major_load = major_load + self.load[arriving];
                    if role.name != VentName::Header {
                        extra = extra + self.extra[arriving];
                    }
                } else {
                    load = load + self.load[arriving];
                }
            }
            self.trap[index] = trap;
            self.extra[index] = extra;
            self.load[index] = match (role.name, role.stack) {
                (VentName::Header, _) => {
                    let own = vents.drain[index].and_then(|drain| names.stack_of[drain.index()]);
                    major_load + extra + own.map_or(FixtureUnits::ZERO, foot_load)
                }
                (_, Some(stack)) => foot_load(stack) + extra,
                _ => load,
            };
        }
    }

    /// A minor vent is measured from the most distant drain to a major vent or open air, a major vent from its foot to open air.
    fn measure(&mut self, network: &Network, names: &Names) {
        let vents = &network.vents;
        let major = |index: usize| names.vent[index].name.is_major();
        refill(&mut self.up, vents.len(), Way::default());
        refill(&mut self.down, vents.len(), Way::default());
        for index in 0..vents.len() {
            let header = names.vent[index].name == VentName::Header;
            let before = vents
                .arriving(VentId::new(index))
                .map(VentId::index)
                .filter(|arriving| header || major(*arriving) == major(index))
                .fold(Way::default(), |way, arriving| way.longer(self.up[arriving]));
            self.up[index] = before.and(Way::of(vents.length[index]));
        }
        self.length.clear();
        self.length_missing.clear();
        self.length.resize(vents.len(), Length::ZERO);
        self.length_missing.resize(vents.len(), false);
        for index in (0..vents.len()).rev() {
            let beyond = match vents.next[index].map(VentId::index) {
                Some(next) if major(index) || !major(next) => self.down[next],
                _ => Way::default(),
            };
            self.down[index] = beyond.and(Way::of(vents.length[index]));
            let way = self.up[index].and(beyond);
            self.length[index] = way.length;
            self.length_missing[index] = way.missing;
        }
    }

    /// The vents along which the developed length of `vent` is measured, in the direction of the air's way out.
    #[must_use]
    pub fn way(&self, network: &Network, names: &Names, vent: VentId) -> Vec<VentId> {
        let major = |vent: VentId| names.vent[vent.index()].name.is_major();
        let mut way = vec![vent];
        let mut first = vent;
        loop {
            let header = names.vent[first.index()].name == VentName::Header;
            let before = network
                .vents
                .arriving(first)
                .filter(|arriving| header || major(*arriving) == major(first))
                .max_by_key(|arriving| self.up[arriving.index()].length);
            let Some(before) = before else { break };
            way.push(before);
            first = before;
        }
        way.reverse();
        let mut last = vent;
        while let Some(next) = network.vents.next[last.index()].filter(|next| major(last) || !major(*next)) {
            way.push(next);
            last = next;
        }
        way
    }

    /// Whether load and length count at all for a vent of this name.
    #[must_use]
    pub fn length_counts(name: VentName) -> bool {
        !matches!(name, VentName::Individual | VentName::Dual | VentName::Spare)
    }
}

/// The load of a wet vent and what it serves, for every drain that is the lower end of one.
#[derive(Debug, Clone, Default)]
pub struct WetLoads {
    /// The load, without the fixtures that join last.
    pub load: Vec<FixtureUnits>,
    /// The water closets that get their air through it.
    pub water_closets: Vec<u32>,
    /// The largest trap that gets its air through it.
    pub trap: Vec<Option<PipeSize>>,
    last: Vec<u32>,
    last_load: Vec<FixtureUnits>,
}

impl WetLoads {
    /// Adds up what each wet vent serves. The most downstream fixture, or the pair that joins there, is left out (NPC 2015, 2.5.8.1.(2)).
    pub fn collect(&mut self, network: &Network, names: &Names, loads: &Loads) {
        let count = network.drains.len();
        refill(&mut self.load, count, FixtureUnits::ZERO);
        refill(&mut self.water_closets, count, 0);
        refill(&mut self.trap, count, None);
        refill(&mut self.last, count, 0);
        refill(&mut self.last_load, count, FixtureUnits::ZERO);
        for (fixture, trap) in names.trap.iter().enumerate() {
            let Some(wet) = trap.wet else { continue };
            let Some(end) = names.wet_end[wet.index()].map(DrainId::index) else { continue };
            let closet = network.fixtures.class[fixture] == crate::edition::FixtureClass::WaterCloset;
            self.water_closets[end] += u32::from(closet);
            self.trap[end] = self.trap[end].max(Some(network.fixtures.trap[fixture].value));
            if wet.index() == end {
                self.last[end] += 1;
                self.last_load[end] = self.last_load[end] + network.fixtures.load[fixture].value;
            }
        }
        for index in 0..count {
            if names.wet_end[index] == Some(DrainId::new(index)) {
                // More than a pair at the lowest joint is no `most downstream fixture`: then all of them count.
                let beyond = if self.last[index] > 2 { self.last_load[index] } else { FixtureUnits::ZERO };
                self.load[index] = loads.single[index] + beyond;
            }
        }
    }
}
