//! A drainage system with valves only (NPC 2015, 2.5.9.3.).

use super::{Case, Check, Finding, Report, Subject};

pub(super) const CHECK: Check = Check {
    name: "no-open-air-vent",
    finds: "a drainage system without any vent to open air",
    matters: "valves let air in but never out, and the sewer must breathe",
    remedy: "carry at least one vent to open air",
    citation: |edition| edition.rules.open_air_vent.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    if case.operands.network.terminals.is_empty() {
        report.violation(Subject::Layout, 0, 0);
    }
}

fn words(_: &Case<'_>, _: &Finding) -> String {
    "no vent of the system ends in open air".to_owned()
}
