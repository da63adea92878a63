//! A vent that ends too low (NPC 2015, 2.5.6.5.).

use super::{Case, Check, Finding, Report, Subject};
use crate::layout::Through;
use crate::quantity::Length;

pub(super) const CHECK: Check = Check {
    name: "terminal-too-low",
    finds: "a vent terminal that ends too near to the roof or the ground",
    matters: "snow or standing water closes it, or its air reaches people",
    remedy: "carry it higher",
    citation: |edition| edition.rules.vent_above_roof.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for (index, terminal) in case.operands.network.terminals.iter().enumerate() {
        let least = least_height(case, terminal.through);
        if let Some(above) = terminal.above
            && above < least
        {
            report.violation(Subject::Terminal(index as u32), above.nanometres(), least.nanometres());
        }
    }
}

/// How high a terminal must end above the roof or the ground.
pub(super) fn least_height(case: &Case<'_>, through: Through) -> Length {
    let rules = &case.operands.edition.rules;
    match through {
        Through::Roof => rules.vent_above_roof.value,
        Through::Wall => rules.vent_above_ground.value,
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Terminal(terminal) = finding.subject else { return String::new() };
    let terminal = &case.operands.network.terminals[terminal as usize];
    let from = match terminal.through {
        Through::Roof => "the roof",
        Through::Wall => "the ground",
    };
    format!(
        "the terminal `{}` ends {} above {from}, at least {} is needed",
        terminal.id,
        case.length(finding.found),
        case.length(finding.limit)
    )
}
