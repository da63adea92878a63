//! Why a pipe has its size: every minimum that the edition sets for it.

use crate::edition::{CitationId, Edition, Witness};
use crate::quantity::PipeSize;

/// The rule that sets a minimum.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
#[repr(u8)]
pub enum Rule {
    /// The trap or outlet of the fixture. Operand: the trap size.
    Trap,
    /// The branch table. Operand: the load.
    BranchTable,
    /// The stack table, all storeys. Operand: the load.
    StackTotal,
    /// The stack table, one storey. Operand: the load of the heaviest storey.
    StackOneStorey,
    /// The table of building drains and sewers. Operand: the load.
    BuildingDrainTable,
    /// A drain that takes a water closet. Operand: their number.
    WaterCloset,
    /// A branch or building drain from the third water closet on. Operand: their number.
    ThirdWaterCloset,
    /// A stack with more than six water closets. Operand: their number.
    StackWaterClosets,
    /// The least size of a building sewer.
    SewerLeast,
    /// The least size of a building drain underground.
    UndergroundLeast,
    /// The largest drain upstream. Other: that drain.
    Upstream,
    /// The vent connected to it. Other: that vent.
    ConnectedVent,
    /// The wet vent table. Operand: the load without the fixtures that join last.
    WetVentTable,
    /// The table of vents by trap. Operand: the largest trap served.
    VentByTrap,
    /// The table of vents by load and length. Operand: the load; other: the length in millimetres.
    VentLength,
    /// The stack vent table in place of a table that nobody here has seen in print. Operand: the load; other: the length in millimetres.
    VentLengthStandIn,
    /// The stack vent table. Operand: the load; other: the length in millimetres.
    StackVentTable,
    /// Half the size of the stack. Operand: the stack's size.
    HalfStack,
    /// The largest vent that joins it. Other: that vent.
    JoinedVent,
    /// One vent of 3 in for each building drain.
    OneLargeVent,
    /// A wet vent that passes more than four storeys keeps its size to open air. Operand: the storeys.
    TallWetVent,
    /// One size larger where frost can close it. Operand: the vent's size.
    Frost,
    /// The vent that ends at the terminal. Operand: its size.
    AtTerminal,
    /// The drawing fixes the size.
    AsDrawn,
}

/// One minimum.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Reason {
    /// What the rule was asked with; its meaning goes with the rule.
    pub operand: i64,
    /// A second operand or another pipe; its meaning goes with the rule.
    pub other: u32,
    /// The clause or table cell.
    pub citation: CitationId,
    /// The rule.
    pub rule: Rule,
    /// The size that it asks for.
    pub asks: PipeSize,
}

/// The reasons of all pipes of one kind: those of one pipe stand together.
#[derive(Debug, Clone, Default)]
pub struct Reasons {
    start: Vec<u32>,
    list: Vec<Reason>,
    governing: Vec<u32>,
}

impl Reasons {
    pub(super) fn clear(&mut self) {
        self.start.clear();
        self.list.clear();
        self.governing.clear();
        self.start.push(0);
    }

    pub(super) fn push(&mut self, reason: Reason) {
        self.list.push(reason);
    }

    /// Ends the reasons of one pipe and returns the size that they ask for.
    pub(super) fn close(&mut self, edition: &Edition, least: PipeSize) -> PipeSize {
        let start = self.start.last().copied().unwrap_or(0) as usize;
        let governing = govern(edition, &self.list, start..self.list.len());
        self.governing.push(governing as u32);
        self.start.push(self.list.len() as u32);
        self.list.get(governing).map_or(least, |reason| reason.asks.max(least))
    }

    /// Changes what one rule asks of a closed pipe, and finds again what governs.
    pub(super) fn change(&mut self, edition: &Edition, index: usize, rule: Rule, asks: PipeSize) {
        let range = self.start[index] as usize..self.start[index + 1] as usize;
        for reason in self.list[range.clone()].iter_mut().filter(|reason| reason.rule == rule) {
            reason.asks = asks;
        }
        self.governing[index] = govern(edition, &self.list, range) as u32;
    }

    /// All reasons of one pipe.
    #[must_use]
    pub fn of(&self, index: usize) -> &[Reason] {
        &self.list[self.start[index] as usize..self.start[index + 1] as usize]
    }

    /// The reason that governs: the largest, and of equal ones the best attested. None for a pipe that nothing bears on.
    #[must_use]
    pub fn governing(&self, index: usize) -> Option<&Reason> {
        let governing = self.governing[index] as usize;
        (governing < self.start[index + 1] as usize).then(|| &self.list[governing])
    }
}

impl Reason {
    /// Whether it only passes on the size of another pipe.
    #[must_use]
    pub fn is_passed_on(&self) -> bool {
        matches!(self.rule, Rule::Upstream | Rule::ConnectedVent | Rule::JoinedVent | Rule::AtTerminal)
    }

    /// Of reasons that ask for one size, the lowest rank is shown: one that stands by itself and was seen in print, then one that passes
    /// on the size of another pipe, then one that nobody here has seen in print.
    fn rank(&self, edition: &Edition) -> (u8, Witness) {
        let witness = edition.witness(self.citation);
        let order = if self.is_passed_on() {
            1
        } else if witness.is_attested() {
            0
        } else {
            2
        };
        (order, witness)
    }
}

/// The largest reason of a range, and of equal ones that of the lowest rank.
fn govern(edition: &Edition, list: &[Reason], range: std::ops::Range<usize>) -> usize {
    let mut governing = range.start;
    for at in range.skip(1) {
        let (best, next) = (list[governing], list[at]);
        if next.asks > best.asks || (next.asks == best.asks && next.rank(edition) < best.rank(edition)) {
            governing = at;
        }
    }
    governing
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_reason_takes_no_more_than_sixteen_bytes() {
        assert_eq!(std::mem::size_of::<Reason>(), 16);
    }
}
