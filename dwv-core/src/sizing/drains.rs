//! The minimums of a drain.

use super::{Operands, Reason, Rule, Sizes};
use crate::edition::{CitationId, FixtureClass, TableSize};
use crate::loading::refill;
use crate::naming::{Air, DrainName};
use crate::network::DrainId;
use crate::quantity::{FixtureUnits, PipeSize, Slope};

/// A load as the operand of a reason.
pub(super) fn operand(load: FixtureUnits) -> i64 {
    i64::try_from(load.thousandths()).unwrap_or(i64::MAX)
}

/// What a table answers: the size, or that the load is beyond it.
pub(super) fn reason(rule: Rule, load: FixtureUnits, answer: TableSize) -> Reason {
    Reason { operand: operand(load), other: 0, citation: answer.citation, rule, asks: answer.size }
}

/// A minimum that does not depend on a table.
fn minimum(rule: Rule, operand: i64, asks: PipeSize, citation: CitationId) -> Reason {
    Reason { operand, other: 0, citation, rule, asks }
}

impl Sizes {
    /// Sizes all drains once; tells whether any has grown.
    pub(super) fn size_drains(&mut self, operands: &Operands<'_>, least: PipeSize) -> bool {
        let network = operands.network;
        let mut grown = false;
        self.drain_reasons.clear();
        self.drain_beyond.clear();
        for index in 0..network.drains.len() {
            let beyond = !self.put_loads(operands, index);
            self.put_minimums(operands, index);
            self.put_neighbours(operands, index);
            let size = self.drain_reasons.close(operands.edition, least);
            if beyond {
                self.drain_beyond.push(DrainId::new(index));
            }
            grown |= size > self.drain[index];
            self.drain[index] = size.max(self.drain[index]);
        }
        grown
    }

    /// The tables by load; false when the load is beyond one of them.
    fn put_loads(&mut self, operands: &Operands<'_>, index: usize) -> bool {
        let Operands { network, edition, names, loads, stack_loads, .. } = *operands;
        let load = loads.load[index];
        let sizes = network.pipe_sizes;
        let mut within = true;
        // Beyond a table its last row stands, and the drain is marked.
        let mut put = |rule: Rule, load: FixtureUnits, answer: Option<TableSize>, last: Option<TableSize>| {
            within &= answer.is_some();
            if let Some(answer) = answer.or(last) {
                self.drain_reasons.push(reason(rule, load, answer));
            }
        };
        let branch = || (edition.branch.size_for(load, sizes), edition.branch.last(sizes));
        let building_drain = || (building_drain_size(operands, index), edition.building_drain.last(sizes));
        match names.drain[index] {
            DrainName::FixtureDrain | DrainName::Branch => {
                if !is_macerated(operands, index) {
                    let (answer, last) = branch();
                    put(Rule::BranchTable, load, answer, last);
                }
            }
            DrainName::Stack => {
                let one = stack_loads.one_storey[index];
                let (total, one_storey) = edition.stack.size_for(load, one, sizes).unzip();
                let (last_total, last_one) = edition.stack.last(sizes).unzip();
                put(Rule::StackTotal, load, total, last_total);
                put(Rule::StackOneStorey, one, one_storey, last_one);
                if names.long_offset[index] {
                    let (answer, last) = branch();
                    put(Rule::BranchTable, load, answer, last);
                    let (answer, last) = building_drain();
                    put(Rule::BuildingDrainTable, load, answer, last);
                }
            }
            DrainName::BuildingDrain | DrainName::BuildingSewer => {
                let (answer, last) = building_drain();
                put(Rule::BuildingDrainTable, load, answer, last);
            }
        }
        if let Some(end) = names.wet_end[index].map(DrainId::index) {
            let closets = operands.wet_loads.water_closets[end] > 0;
            let wet_load = operands.wet_loads.load[end];
            let answer = edition.wet_vent.size_for(wet_load, closets, sizes);
            put(Rule::WetVentTable, wet_load, answer, edition.wet_vent.last(closets, sizes));
            if let Some(trap) = operands.wet_loads.trap[end]
                && let Some(answer) = edition.vent_by_trap.vent_for(trap)
            {
                let asks = sizes.at_least(answer.size).unwrap_or(answer.size);
                self.drain_reasons.push(minimum(Rule::VentByTrap, trap.index() as i64, asks, answer.citation));
            }
        }
        within
    }

    /// Minimums by role and by what drains into it.
    fn put_minimums(&mut self, operands: &Operands<'_>, index: usize) {
        let Operands { network, edition, names, loads, .. } = *operands;
        let rules = &edition.rules;
        let sizes = network.pipe_sizes;
        let mut put = |rule: Rule, operand: i64, asks: PipeSize, citation: CitationId| {
            let asks = sizes.at_least(asks).unwrap_or(asks);
            self.drain_reasons.push(minimum(rule, operand, asks, citation));
        };
        if let Some(fixture) = network.drains.fixture[index] {
            let trap = network.fixtures.trap[fixture.index()];
            put(Rule::Trap, trap.value.index() as i64, trap.value, trap.citation);
        }
        let name = names.drain[index];
        let closets = loads.water_closets[index];
        if closets > 0 {
            let count = i64::from(closets);
            let every = rules.water_closet_least;
            put(Rule::WaterCloset, count, every.value, every.citation);
            let third = rules.third_water_closet;
            let horizontal = matches!(name, DrainName::Branch | DrainName::BuildingDrain | DrainName::BuildingSewer);
            if horizontal && closets >= third.value.count {
                put(Rule::ThirdWaterCloset, count, third.value.least, third.citation);
            }
            let stack = rules.stack_water_closets;
            if name == DrainName::Stack && closets >= stack.value.count {
                put(Rule::StackWaterClosets, count, stack.value.least, stack.citation);
            }
        }
        if name == DrainName::BuildingSewer {
            put(Rule::SewerLeast, 0, rules.building_sewer_least.value, rules.building_sewer_least.citation);
        }
        let as_sewer =
            edition.readings.building_drain_underground.value == crate::edition::UndergroundDrain::AsBuildingSewer;
        if name == DrainName::BuildingDrain && network.drains.underground[index] && as_sewer {
            let least = rules.building_drain_underground_least;
            put(Rule::UndergroundLeast, 0, least.value, least.citation);
        }
        if let Some(size) = network.drains.stated_size[index] {
            let rule = rules.no_smaller_than_upstream;
            put(Rule::AsDrawn, 0, size, rule.citation);
        }
    }

    /// Never smaller than what empties into it or a vent connected to it.
    fn put_neighbours(&mut self, operands: &Operands<'_>, index: usize) {
        let network = operands.network;
        let rule = operands.edition.rules.no_smaller_than_upstream;
        let largest = network
            .drains
            .arriving(DrainId::new(index))
            .max_by_key(|arriving| (self.drain[arriving.index()], std::cmp::Reverse(*arriving)));
        if let Some(arriving) = largest {
            let asks = self.drain[arriving.index()];
            let other = arriving.index() as u32;
            self.drain_reasons.push(Reason { operand: 0, other, citation: rule.citation, rule: Rule::Upstream, asks });
        }
        if let Air::Vent(vent) = operands.names.air[index] {
            let asks = self.vent[vent.index()];
            let other = vent.index() as u32;
            let rule = Reason { operand: 0, other, citation: rule.citation, rule: Rule::ConnectedVent, asks };
            self.drain_reasons.push(rule);
        }
    }

    /// Whether no vent is larger than the drain that it is connected to; if so, their reasons are brought up to date.
    pub(super) fn vents_fit_drains(&mut self, operands: &Operands<'_>) -> bool {
        let vents = || operands.network.vents.drain.iter().enumerate();
        let fits = vents().all(|(vent, drain)| drain.is_none_or(|drain| self.vent[vent] <= self.drain[drain.index()]));
        if fits {
            for (vent, drain) in vents() {
                if let Some(drain) = drain {
                    let asks = self.vent[vent];
                    self.drain_reasons.change(operands.edition, drain.index(), Rule::ConnectedVent, asks);
                }
            }
        }
        fits
    }

    /// The load that each drain could still take, by every table that bears on it.
    pub(super) fn measure_room(&mut self, operands: &Operands<'_>) {
        refill(&mut self.room, self.drain.len(), None);
        for index in 0..self.drain.len() {
            self.room[index] = room(operands, index, self.drain[index]);
        }
    }
}

/// A drain that only carries the pumped discharge of a macerating toilet.
fn is_macerated(operands: &Operands<'_>, index: usize) -> bool {
    operands.network.drains.fixture[index]
        .is_some_and(|fixture| operands.network.fixtures.class[fixture.index()] == FixtureClass::Macerating)
}

/// The slope that a drain has at a size: as drawn, else the least that the edition allows for the size.
pub(crate) fn slope_at(operands: &Operands<'_>, index: usize, size: PipeSize) -> Slope {
    operands.network.drains.slope[index].unwrap_or_else(|| operands.edition.least_slope(size).value)
}

fn building_drain_size(operands: &Operands<'_>, index: usize) -> Option<TableSize> {
    let load = operands.loads.load[index];
    operands.network.pipe_sizes.iter().find_map(|size| {
        let capacity = operands.edition.building_drain.capacity(size, slope_at(operands, index, size))?;
        (capacity.value >= load).then_some(TableSize { size, citation: capacity.citation })
    })
}

/// The size that the table of building drains asks for when each size lies at its least slope.
pub(crate) fn building_drain_size_at_least_slope(operands: &Operands<'_>, index: usize) -> Option<PipeSize> {
    let load = operands.loads.load[index];
    operands.network.pipe_sizes.iter().find(|size| {
        let slope = operands.edition.least_slope(*size).value;
        operands.edition.building_drain.capacity(*size, slope).is_some_and(|capacity| capacity.value >= load)
    })
}

fn room(operands: &Operands<'_>, index: usize, size: PipeSize) -> Option<FixtureUnits> {
    let Operands { network: _, edition, names, loads, stack_loads, wet_loads, .. } = *operands;
    let load = loads.load[index];
    let mut least: Option<FixtureUnits> = None;
    let mut take = |capacity: Option<FixtureUnits>, load: FixtureUnits| {
        if let Some(capacity) = capacity {
            let left = capacity.checked_sub(load).unwrap_or(FixtureUnits::ZERO);
            least = Some(least.map_or(left, |least| least.min(left)));
        }
    };
    let branch = || edition.branch.capacity(size).map(|capacity| capacity.value);
    let building_drain =
        || edition.building_drain.capacity(size, slope_at(operands, index, size)).map(|capacity| capacity.value);
    match names.drain[index] {
        DrainName::FixtureDrain | DrainName::Branch => take(branch(), load),
        DrainName::Stack => {
            if let Some((total, one_storey)) = edition.stack.capacity(size) {
                take(Some(total.value), load);
                take(Some(one_storey.value), stack_loads.one_storey[index]);
            }
            if names.long_offset[index] {
                take(branch(), load);
                take(building_drain(), load);
            }
        }
        DrainName::BuildingDrain | DrainName::BuildingSewer => take(building_drain(), load),
    }
    if let Some(end) = names.wet_end[index].map(DrainId::index)
        && let crate::edition::Limit::Most(most) = edition.wet_vent.capacity(size, wet_loads.water_closets[end] > 0)
    {
        take(Some(most.value), wet_loads.load[end]);
    }
    least
}
