//! The size of a vent where it passes the roof (NPC 2015, 2.5.6.5.(6)).

use super::{Operands, Reason, Rule, Sizes};
use crate::layout::Through;
use crate::quantity::PipeSize;

impl Sizes {
    /// One size larger, and at least 3 in, where frost can close the vent or the drawing does not say that it cannot.
    pub(super) fn size_terminals(&mut self, operands: &Operands<'_>, least: PipeSize) {
        let network = operands.network;
        let rules = &operands.edition.rules;
        self.terminal.clear();
        self.terminal_reasons.clear();
        for terminal in &network.terminals {
            let vent = self.vent[terminal.vent.index()];
            let operand = vent.index() as i64;
            let citation = rules.vent_no_reduction.citation;
            let other = terminal.vent.index() as u32;
            self.terminal_reasons.push(Reason { operand, other, citation, rule: Rule::AtTerminal, asks: vent });
            if terminal.through == Through::Roof && network.frost_can_close_vents.unwrap_or(true) {
                let mut larger = vent;
                for _ in 0..rules.vent_frost.value.sizes_larger {
                    larger = network.pipe_sizes.next_larger(larger).unwrap_or(larger);
                }
                let asks = larger.max(rules.vent_frost.value.least);
                let citation = rules.vent_frost.citation;
                self.terminal_reasons.push(Reason { operand, other, citation, rule: Rule::Frost, asks });
            }
            let size = self.terminal_reasons.close(operands.edition, least);
            self.terminal.push(size);
        }
    }
}
