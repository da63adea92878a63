//! The minimums of a vent.

use super::drains::reason;
use super::{Operands, Reason, Rule, Sizes};
use crate::edition::{CitationId, TableSize, VentLengthReading};
use crate::naming::{DrainName, StackId, VentName};
use crate::network::{DrainId, VentEnd, VentId};
use crate::quantity::{FixtureUnits, Length, PipeSize};

/// A length as the second operand of a reason, in whole millimetres rounded up.
fn millimetres(length: Length) -> u32 {
    let whole = length.nanometres().max(0).saturating_add(999_999) / 1_000_000;
    u32::try_from(whole).unwrap_or(u32::MAX)
}

/// The stack vent that can give the building drain its large vent: that of the stack at its upstream end, else of the soil stack
/// with the most load.
pub(super) fn large_vent(operands: &Operands<'_>) -> Option<VentId> {
    let names = operands.names;
    let at_end = |stack: StackId| {
        let foot = names.stacks[stack.0 as usize].foot;
        let Some(next) = operands.network.drains.next[foot.index()] else { return false };
        let mut upstream = operands.network.drains.arriving(next);
        names.drain[next.index()] == DrainName::BuildingDrain
            && upstream.all(|at| names.drain[at.index()] != DrainName::BuildingDrain)
    };
    let mut best = None;
    for (index, role) in names.vent.iter().enumerate() {
        let Some(stack) = role.stack.filter(|_| role.name == VentName::StackVent) else { continue };
        let begins =
            operands.network.vents.drain[index].is_some_and(|drain| names.stack_of[drain.index()] == Some(stack));
        let open = matches!(operands.network.vents.end[index], VentEnd::Terminal(_));
        if !begins || !open {
            continue;
        }
        let rank = (at_end(stack), names.stacks[stack.0 as usize].soil, std::cmp::Reverse(index));
        if best.is_none_or(|(most, _)| rank > most) {
            best = Some((rank, VentId::new(index)));
        }
    }
    best.map(|(_, vent)| vent)
}

impl Sizes {
    /// Sizes all vents once; tells whether any has grown.
    pub(super) fn size_vents(&mut self, operands: &Operands<'_>, least: PipeSize) -> bool {
        let network = operands.network;
        let mut grown = false;
        self.vent_reasons.clear();
        self.vent_beyond.clear();
        for index in 0..network.vents.len() {
            let beyond = !self.put_vent_tables(operands, index);
            self.put_vent_minimums(operands, index);
            let size = self.vent_reasons.close(operands.edition, least);
            if beyond {
                self.vent_beyond.push(VentId::new(index));
            }
            grown |= size > self.vent[index];
            self.vent[index] = size.max(self.vent[index]);
        }
        grown
    }

    /// The tables; false when load or length is beyond one of them.
    fn put_vent_tables(&mut self, operands: &Operands<'_>, index: usize) -> bool {
        let Operands { network, edition, names, vent_loads, .. } = *operands;
        let sizes = network.pipe_sizes;
        let role = names.vent[index];
        let (load, length) = (vent_loads.load[index], vent_loads.length[index]);
        let mut within = true;
        if let Some(trap) = vent_loads.trap[index]
            && let Some(answer) = edition.vent_by_trap.vent_for(trap)
        {
            let asks = sizes.at_least(answer.size).unwrap_or(answer.size);
            let operand = trap.index() as i64;
            self.vent_reasons.push(Reason {
                operand,
                other: 0,
                citation: answer.citation,
                rule: Rule::VentByTrap,
                asks,
            });
        }
        // Beyond a table its last column stands, and the vent is marked.
        let mut put = |rule: Rule, answer: Option<TableSize>, last: Option<TableSize>| {
            within &= answer.is_some();
            if let Some(answer) = answer.or(last) {
                let other = millimetres(length);
                self.vent_reasons.push(Reason { other, ..reason(rule, load, answer) });
            }
        };
        match role.name {
            VentName::Individual | VentName::Dual | VentName::Spare => {}
            VentName::Continuous | VentName::Branch | VentName::Header => {
                let table = &edition.vent_length;
                put(Rule::VentLength, table.size_for(load, length, sizes), table.last(sizes));
                if edition.readings.vent_length.value == VentLengthReading::LargerOfRecalledAndStandIn {
                    put(Rule::VentLengthStandIn, stand_in(operands, load, length), table.last(sizes));
                }
            }
            VentName::StackVent | VentName::VentStack => {
                if let Some(stack) = role.stack {
                    let foot = names.stacks[stack.0 as usize].foot;
                    let size = self.before_vents[foot.index()];
                    let table = &edition.stack_vent;
                    put(Rule::StackVentTable, table.size_for(size, load, length, sizes), table.last(size, load, sizes));
                }
            }
        }
        within
    }

    fn put_vent_minimums(&mut self, operands: &Operands<'_>, index: usize) {
        let Operands { network, edition, names, .. } = *operands;
        let rules = &edition.rules;
        let sizes = network.pipe_sizes;
        let role = names.vent[index];
        let mut put = |rule: Rule, operand: i64, other: u32, asks: PipeSize, citation: CitationId| {
            let asks = sizes.at_least(asks).unwrap_or(asks);
            self.vent_reasons.push(Reason { operand, other, citation, rule, asks });
        };
        if let Some(stack) = role.stack {
            let foot = self.drain[names.stacks[stack.0 as usize].foot.index()];
            if let Some(half) = sizes.iter().find(|size| size.nominal() + size.nominal() >= foot.nominal()) {
                put(Rule::HalfStack, foot.index() as i64, 0, half, rules.stack_vent_least_share.citation);
            }
            if let Some((storeys, size)) = tall_wet_vent(operands, stack, &self.drain) {
                put(Rule::TallWetVent, i64::from(storeys), 0, size, rules.wet_vent_tall.citation);
            }
        }
        if self.large_vent == Some(VentId::new(index)) {
            put(Rule::OneLargeVent, 0, 0, rules.one_large_vent.value, rules.one_large_vent.citation);
        }
        let joined = network.vents.arriving(VentId::new(index));
        let largest = joined.max_by_key(|arriving| (self.vent[arriving.index()], std::cmp::Reverse(*arriving)));
        if let Some(arriving) = largest {
            let asks = self.vent[arriving.index()];
            put(Rule::JoinedVent, 0, arriving.index() as u32, asks, rules.vent_no_reduction.citation);
        }
        if let Some(size) = network.vents.stated_size[index] {
            put(Rule::AsDrawn, 0, 0, size, rules.vent_no_reduction.citation);
        }
    }
}

/// The stack vent table for a stack just large enough for the load: a cautious stand-in for a table known from memory only.
fn stand_in(operands: &Operands<'_>, load: FixtureUnits, length: Length) -> Option<TableSize> {
    let sizes = operands.network.pipe_sizes;
    let (stack, _) = operands.edition.stack.size_for(load, FixtureUnits::ZERO, sizes)?;
    operands.edition.stack_vent.size_for(stack.size, load, length, sizes)
}

/// A stack that serves as wet vent through more storeys than the edition lets its vent be smaller: the storeys and its size.
fn tall_wet_vent(operands: &Operands<'_>, stack: StackId, drain: &[PipeSize]) -> Option<(u32, PipeSize)> {
    let names = operands.names;
    let top = names.stacks[stack.0 as usize].top;
    let end = names.wet_end[top.index()]?;
    let network = operands.network;
    let lowest = network.drains.next[end.index()].map_or(end, |next: DrainId| next);
    let storeys = u32::from(network.drains.storey[top.index()].0.abs_diff(network.drains.storey[lowest.index()].0));
    (storeys > operands.edition.rules.wet_vent_tall.value).then(|| (storeys, drain[end.index()]))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn lengths_in_reasons_are_rounded_up() {
        assert_eq!(millimetres(Length::from_nanometres(1_000_001)), 2);
        assert_eq!(millimetres(Length::from_nanometres(-1)), 0);
    }
}
