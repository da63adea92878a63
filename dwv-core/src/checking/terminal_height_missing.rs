//! A terminal whose height is not stated.

use super::{Case, Check, Finding, Report, Severity, Subject};

pub(super) const CHECK: Check = Check {
    name: "terminal-height-missing",
    finds: "a vent terminal whose height above the roof or the ground is not stated",
    matters: "whether it ends high enough cannot be said",
    remedy: "state `above`",
    citation: |edition| edition.rules.vent_above_roof.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for (index, terminal) in case.operands.network.terminals.iter().enumerate() {
        if terminal.above.is_none() {
            let least = super::terminal_too_low::least_height(case, terminal.through);
            report.add(Severity::CannotDecide, Subject::Terminal(index as u32), 0, least.nanometres());
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Terminal(terminal) = finding.subject else { return String::new() };
    format!(
        "the height of the terminal `{}` is not stated, at least {} is needed",
        case.operands.network.terminals[terminal as usize].id,
        case.length(finding.limit)
    )
}
