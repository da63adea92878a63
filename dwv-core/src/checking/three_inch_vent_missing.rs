//! A building drain without a vent of 3 in to open air (NPC 2015, 2.5.8.4.(5)).

use super::{Case, Check, Finding, Report, Subject};
use crate::naming::DrainName;

pub(super) const CHECK: Check = Check {
    name: "three-inch-vent-missing",
    finds: "a building drain that has no vent of 3 in to open air",
    matters: "the sewer has no way to breathe but through traps",
    remedy: "carry one vent of 3 in to open air, such as that of a stack or a water closet",
    citation: |edition| edition.rules.one_large_vent.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let least = case.operands.edition.rules.one_large_vent.value;
    let drained = case.operands.names.drain.contains(&DrainName::BuildingDrain);
    let open = case.operands.network.terminals.iter().any(|terminal| case.sizes.vent[terminal.vent.index()] >= least);
    if drained && !open {
        report.violation(Subject::Layout, 0, least.index() as i64);
    }
}

fn words(case: &Case<'_>, _: &Finding) -> String {
    let least = case.operands.edition.rules.one_large_vent.value;
    format!("the building drain has no vent of {least} in that ends in open air")
}
